/** What the light meets at one point of a thing. Colours are linear, 0 to 1. One object is reused for every point. */
export interface Surface {
  r: number;
  g: number;
  b: number;
  /** 0 for wood, paper, plastic; 1 for bare metal. */
  metal: number;
  /** 0 mirror, 1 chalk. */
  rough: number;
  /** How far tool marks spread a highlight along the thing's own x. */
  streak: number;
  /** Added to the normal, in the thing's own axes. */
  tiltX: number;
  tiltY: number;
  tiltZ: number;
  glowR: number;
  glowG: number;
  glowB: number;
}

export const blankSurface = (): Surface => ({
  r: 0.5,
  g: 0.5,
  b: 0.5,
  metal: 0,
  rough: 0.6,
  streak: 0,
  tiltX: 0,
  tiltY: 0,
  tiltZ: 0,
  glowR: 0,
  glowG: 0,
  glowB: 0,
});

export function clearSurface(surface: Surface): void {
  surface.metal = 0;
  surface.rough = 0.6;
  surface.streak = 0;
  surface.tiltX = 0;
  surface.tiltY = 0;
  surface.tiltZ = 0;
  surface.glowR = 0;
  surface.glowG = 0;
  surface.glowB = 0;
}

/** Writes the surface at a point (mm, the thing's own axes). */
export type Material = (x: number, y: number, z: number, surface: Surface) => void;
