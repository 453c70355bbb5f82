import { cloud3, hash, noise2, noise3 } from '../optics/noise.ts';
import type { Material, Surface } from '../optics/surface.ts';
import { mix, smooth, type Vec3 } from '../optics/vector.ts';

export const colour = (surface: Surface, [r, g, b]: Vec3, factor = 1): void => {
  surface.r = r * factor;
  surface.g = g * factor;
  surface.b = b * factor;
};

/** Something even: plastic, paper, rubber. */
export const plain =
  (tone: Vec3, rough = 0.5, mottle = 0.12, seed = 3): Material =>
  (x, y, z, surface) => {
    const n = cloud3(x * 0.16, y * 0.16, z * 0.16, 2, seed);
    colour(surface, tone, 1 - mottle + n * mottle * 2);
    surface.rough = rough + (n - 0.5) * 0.1;
  };

/** Something that shines by itself. */
export const glowing =
  (tone: Vec3, strength: number): Material =>
  (_x, _y, _z, surface) => {
    colour(surface, tone, 0.7);
    surface.rough = 0.4;
    surface.glowR = tone[0] * strength;
    surface.glowG = tone[1] * strength;
    surface.glowB = tone[2] * strength;
  };

export interface MetalLook {
  tone: Vec3;
  rough: number;
  /** Tool marks along the axis: 0 none, 1 coarse turning. */
  marks: number;
  /** Share of the skin that has gone dull or dark. */
  age?: number;
  ageTone?: Vec3;
  /** Fine grain of blasting. */
  grain?: number;
  seed?: number;
}

/** Turned metal: rings from the tool, fine scratches, dull patches where it was handled. */
export function metal(look: MetalLook): Material {
  const { tone, rough, marks, age = 0, ageTone = [0.12, 0.09, 0.05], grain = 0, seed = 7 } = look;
  return (x, y, z, surface) => {
    colour(surface, tone);
    surface.metal = 1;
    const ring = noise2(x * 2.3, 0.5, seed) + noise2(x * 7.9, 0.5, seed + 1) * 0.7 - 0.85;
    surface.tiltX = ring * 0.05 * marks;
    surface.streak = 0.03 + marks * 0.26;
    const hand = cloud3(x * 0.07, y * 0.09, z * 0.09, 3, seed + 2);
    const scratch = noise3(x * 0.5, y * 3, z * 3, seed + 3);
    surface.rough = rough + (hand - 0.5) * 0.16 + (scratch > 0.72 ? 0.08 : 0);
    if (age > 0) {
      const patch =
        cloud3(x * 0.11, y * 0.11, z * 0.11, 4, seed + 4) + (noise3(x * 1.3, y * 1.3, z * 1.3, seed + 5) - 0.5) * 0.12;
      const share = smooth(0.72 - age * 0.55, 0.8 - age * 0.3, patch) * 0.92;
      surface.r = mix(surface.r, ageTone[0], share);
      surface.g = mix(surface.g, ageTone[1], share);
      surface.b = mix(surface.b, ageTone[2], share);
      surface.metal = 1 - share * 0.45;
      surface.rough = mix(surface.rough, 0.55, share);
      surface.streak *= 1 - share * 0.7;
    }
    if (grain > 0) {
      const bx = Math.floor(x * 5);
      const by = Math.floor(y * 5);
      const bz = Math.floor(z * 5);
      surface.tiltX += (hash(bx, by, bz, seed) - 0.5) * grain;
      surface.tiltY += (hash(bx, by, bz, seed + 1) - 0.5) * grain;
      surface.tiltZ += (hash(bx, by, bz, seed + 2) - 0.5) * grain;
      surface.streak = 0;
    }
  };
}

export const BRASS: Vec3 = [0.86, 0.66, 0.3];
export const COPPER: Vec3 = [0.88, 0.5, 0.36];
export const STEEL: Vec3 = [0.56, 0.56, 0.57];
export const ALUMINIUM: Vec3 = [0.74, 0.75, 0.77];
export const BRONZE: Vec3 = [0.56, 0.36, 0.19];

/** Walnut, oiled: growth rings, dark streaks, open pores along x. */
export function walnut(seed = 17): Material {
  return (x, y, z, surface) => {
    const warpY = y + (noise3(x * 0.018, y * 0.05, z * 0.05, seed) - 0.5) * 12;
    const warpZ = z + 26 + (noise3(x * 0.018 + 9, y * 0.05, z * 0.05, seed) - 0.5) * 12;
    const ring = Math.sqrt(warpY * warpY + warpZ * warpZ) * 0.62;
    const grainBand = 0.5 + 0.5 * Math.sin(ring * 2.4 + noise3(x * 0.03, y * 0.2, z * 0.2, seed + 1) * 3);
    const streak = smooth(0.5, 0.78, noise3(x * 0.012, y * 0.24, z * 0.24, seed + 2));
    const pore = smooth(0.66, 0.8, noise3(x * 0.22, y * 3.6, z * 3.6, seed + 3));
    const fine = noise3(x * 0.5, y * 6, z * 6, seed + 4);
    const shade = (0.62 + grainBand * 0.5) * (1 - streak * 0.5) * (0.86 + fine * 0.28) * (1 - pore * 0.55);
    colour(surface, [0.215, 0.098, 0.042], shade);
    surface.rough = 0.34 + pore * 0.3 + fine * 0.08;
    surface.tiltY = (fine - 0.5) * 0.05;
    surface.tiltZ = pore * 0.06;
  };
}

/** Bone-coloured cast resin with a faint cloud in it. */
export function boneResin(seed = 27): Material {
  return (x, y, z, surface) => {
    const cloud = cloud3(x * 0.1, y * 0.1, z * 0.1, 4, seed);
    const vein = smooth(0.46, 0.5, cloud) * smooth(0.54, 0.5, cloud);
    colour(surface, [0.74, 0.63, 0.44], 0.82 + cloud * 0.3 - vein * 0.2);
    surface.rough = 0.27;
    surface.tiltX = (noise2(x * 6, 0.5, seed) - 0.5) * 0.02;
  };
}

/** One material along the axis up to each place, in mm; the last has no end. */
export function banded(bands: readonly (readonly [upTo: number, material: Material])[]): Material {
  return (x, y, z, surface) => {
    for (const [upTo, material] of bands)
      if (x < upTo) {
        material(x, y, z, surface);
        return;
      }
  };
}

/** A picture laid on the flat top of a thing: `pixels` is sRGB, three per point. */
export function printed(
  sheet: { pixels: Buffer; width: number; height: number },
  size: { widthMm: number; depthMm: number },
  rough = 0.9,
): Material {
  const linear = Array.from({ length: 256 }, (_, value) => (value / 255) ** 2.2);
  return (x, y, z, surface) => {
    const u = (x / size.widthMm + 0.5) * sheet.width - 0.5;
    const v = (z / size.depthMm + 0.5) * sheet.height - 0.5;
    const column = Math.min(Math.max(Math.floor(u), 0), sheet.width - 2);
    const row = Math.min(Math.max(Math.floor(v), 0), sheet.height - 2);
    const fu = Math.min(Math.max(u - column, 0), 1);
    const fv = Math.min(Math.max(v - row, 0), 1);
    const read = (k: number): number => {
      const at = (row * sheet.width + column) * 3 + k;
      const value = (index: number): number => linear[sheet.pixels[index] ?? 0] ?? 0;
      const top = mix(value(at), value(at + 3), fu);
      return mix(top, mix(value(at + sheet.width * 3), value(at + sheet.width * 3 + 3), fu), fv);
    };
    const fibre = noise2(x * 2.2, z * 2.2 + y, 5);
    colour(surface, [read(0), read(1), read(2)], 0.97 + fibre * 0.06);
    surface.rough = rough;
    surface.tiltX = (fibre - 0.5) * 0.03 + (noise2(x * 0.02, z * 0.02, 6) - 0.5) * 0.12;
    surface.tiltZ = (noise2(x * 0.02 + 9, z * 0.02, 6) - 0.5) * 0.12;
  };
}
