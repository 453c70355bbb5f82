import { add, cross, mix, smooth, times, unit, type Vec3 } from './vector.ts';

/** A bright pane seen from the bench: a window, a lamp, a reflecting card. It lights, and it shows in polished metal. */
export interface Pane {
  toward: Vec3;
  across: Vec3;
  up: Vec3;
  /** Half sizes as tangents of the angle seen from the bench. */
  halfWidth: number;
  halfHeight: number;
  /** How bright it looks in a mirror. */
  shine: Vec3;
  /** What it gives to a white sheet that faces it. */
  light: Vec3;
  /** Higher is a crisper shadow edge. */
  crisp: number;
  /** Glazing bars, seen only in reflections. */
  bars: boolean;
}

/** A glowing rod, such as a lit blade. */
export interface Rod {
  from: Vec3;
  to: Vec3;
  light: Vec3;
}

export interface LightRig {
  panes: readonly Pane[];
  rods: readonly Rod[];
  above: Vec3;
  level: Vec3;
  below: Vec3;
}

export function pane(options: {
  azimuthDeg: number;
  heightDeg: number;
  width: number;
  height: number;
  colour: Vec3;
  light: number;
  shine: number;
  crisp?: number;
  bars?: boolean;
}): Pane {
  const a = (options.azimuthDeg * Math.PI) / 180;
  const h = (options.heightDeg * Math.PI) / 180;
  const toward: Vec3 = [Math.sin(a) * Math.cos(h), Math.sin(h), -Math.cos(a) * Math.cos(h)];
  const across = unit(cross(toward, [0, 1, 0.001]));
  return {
    toward,
    across,
    up: cross(across, toward),
    halfWidth: options.width,
    halfHeight: options.height,
    shine: times(options.colour, options.shine),
    light: times(options.colour, options.light),
    crisp: options.crisp ?? 6,
    bars: options.bars ?? false,
  };
}

/** What a mirror of roughness `rough` shows in direction (x, y, z), written into `out`. */
export function seenIn(
  rig: LightRig,
  x: number,
  y: number,
  z: number,
  rough: number,
  out: [number, number, number],
): void {
  const up = smooth(-0.15 - rough * 0.5, 0.75, y);
  const down = smooth(0.1 + rough * 0.5, -0.35, y);
  for (const k of [0, 1, 2] as const) out[k] = mix(mix(rig.level[k], rig.above[k], up), rig.below[k], down);
  const edge = 0.05 + rough * 1.3;
  for (const one of rig.panes) {
    const c = x * one.toward[0] + y * one.toward[1] + z * one.toward[2];
    if (c <= 0.02) continue;
    const px = Math.abs((x * one.across[0] + y * one.across[1] + z * one.across[2]) / c);
    const py = Math.abs((x * one.up[0] + y * one.up[1] + z * one.up[2]) / c);
    let share =
      smooth(one.halfWidth + edge, one.halfWidth - edge, px) * smooth(one.halfHeight + edge, one.halfHeight - edge, py);
    if (share <= 0) continue;
    share *= (one.halfWidth * one.halfHeight) / ((one.halfWidth + edge * 0.6) * (one.halfHeight + edge * 0.6));
    if (one.bars && rough < 0.35) share *= mix(smooth(0.01, 0.06, px) * smooth(0.01, 0.05, py), 1, rough / 0.35);
    out[0] += one.shine[0] * share;
    out[1] += one.shine[1] * share;
    out[2] += one.shine[2] * share;
  }
}

const WARM: Vec3 = [1, 0.84, 0.66];
const COOL: Vec3 = [0.86, 0.94, 1.06];
const WHITE: Vec3 = [1, 0.98, 0.95];

/** Daylight from a big window at the left, a pale wall at the right. */
export function windowLight(azimuthDeg = -70, strength = 1): LightRig {
  return {
    panes: [
      pane({
        azimuthDeg,
        heightDeg: 42,
        width: 0.62,
        height: 0.5,
        colour: COOL,
        light: 1.75 * strength,
        shine: 5.5 * strength,
        crisp: 8,
        bars: true,
      }),
      pane({
        azimuthDeg: azimuthDeg + 165,
        heightDeg: 35,
        width: 0.8,
        height: 0.5,
        colour: WARM,
        light: 0.28 * strength,
        shine: 0.6 * strength,
        crisp: 3,
      }),
    ],
    rods: [],
    above: times([0.5, 0.53, 0.57], strength),
    level: times([0.2, 0.19, 0.18], strength),
    below: times([0.09, 0.075, 0.06], strength),
  };
}

/** A warm bench lamp close above, a dim room, a cool card on the other side. */
export function lampLight(azimuthDeg = 35, strength = 1): LightRig {
  return {
    panes: [
      pane({
        azimuthDeg,
        heightDeg: 58,
        width: 0.34,
        height: 0.3,
        colour: WARM,
        light: 2.1 * strength,
        shine: 11 * strength,
        crisp: 9,
      }),
      pane({
        azimuthDeg: azimuthDeg - 130,
        heightDeg: 30,
        width: 0.7,
        height: 0.35,
        colour: COOL,
        light: 0.3 * strength,
        shine: 0.9 * strength,
        crisp: 3,
      }),
    ],
    rods: [],
    above: times([0.27, 0.25, 0.23], strength),
    level: times([0.1, 0.09, 0.085], strength),
    below: times([0.07, 0.055, 0.04], strength),
  };
}

/** Two long tubes over the bench, as a workshop has them. */
export function tubeLight(azimuthDeg = 10, strength = 1): LightRig {
  return {
    panes: [
      pane({
        azimuthDeg,
        heightDeg: 62,
        width: 0.95,
        height: 0.13,
        colour: WHITE,
        light: 1.35 * strength,
        shine: 9 * strength,
        crisp: 5,
      }),
      pane({
        azimuthDeg: azimuthDeg + 175,
        heightDeg: 50,
        width: 0.95,
        height: 0.13,
        colour: WHITE,
        light: 0.7 * strength,
        shine: 6 * strength,
        crisp: 4,
      }),
    ],
    rods: [],
    above: times([0.4, 0.41, 0.41], strength),
    level: times([0.17, 0.17, 0.165], strength),
    below: times([0.09, 0.085, 0.08], strength),
  };
}

/** A dark room in which a rod of light is the main lamp. */
export function darkRoom(rod: Rod): LightRig {
  return {
    panes: [
      pane({
        azimuthDeg: -120,
        heightDeg: 40,
        width: 0.5,
        height: 0.4,
        colour: COOL,
        light: 0.3,
        shine: 1.3,
        crisp: 4,
      }),
    ],
    rods: [rod],
    above: [0.05, 0.054, 0.065],
    level: [0.028, 0.028, 0.034],
    below: [0.012, 0.012, 0.014],
  };
}

/** The point of `rod` at share `t`. */
export const along = (rod: Rod, t: number): Vec3 => add(rod.from, times(add(rod.to, times(rod.from, -1)), t));
