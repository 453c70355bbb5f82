import { cloud2, cloud3, hash, noise2, pebble2 } from '../optics/noise.ts';
import type { Surface } from '../optics/surface.ts';
import { mix, smooth, type Vec3 } from '../optics/vector.ts';

/** The surface that things lie on, at a point of the plane (mm). */
export type Bench = (x: number, z: number, surface: Surface) => void;

const paint = (surface: Surface, colour: Vec3, factor = 1): void => {
  surface.r = colour[0] * factor;
  surface.g = colour[1] * factor;
  surface.b = colour[2] * factor;
};

/** Planks of an old bench top, oiled, with scratches and dents. */
export function woodBench(options: { tone?: Vec3; plankMm?: number; turned?: boolean; seed?: number } = {}): Bench {
  const { tone = [0.24, 0.125, 0.058], plankMm = 118, turned = false, seed = 11 } = options;
  return (px, pz, surface) => {
    const x = turned ? pz : px;
    const z = turned ? -px : pz;
    const plank = Math.floor(z / plankMm + 0.37);
    const across = z / plankMm + 0.37 - plank;
    const own = hash(plank, 0, 0, seed);
    const lx = x + own * 900;
    const sway = (cloud2(lx * 0.004, z * 0.012, 3, seed + 1) - 0.5) * 46;
    const ring = Math.sin((z + sway) * 0.42 + own * 9 + cloud2(lx * 0.012, z * 0.07, 2, seed + 2) * 5);
    const fibre = noise2(lx * 0.035, z * 2.6, seed + 3);
    const pore = smooth(0.68, 0.85, noise2(lx * 0.09, z * 4.4, seed + 4));
    const stain = cloud2(px * 0.008, pz * 0.008, 3, seed + 5);
    const scratch =
      smooth(0.492, 0.5, noise2((px + pz * 0.7) * 0.012, (pz - px * 0.5) * 0.35, seed + 6)) *
      smooth(0.508, 0.5, noise2((px + pz * 0.7) * 0.012, (pz - px * 0.5) * 0.35, seed + 6));
    const gap = smooth(0.012, 0.004, Math.min(across, 1 - across));
    let factor =
      (0.78 + own * 0.4) * (0.9 + 0.1 * ring) * (0.8 + fibre * 0.38) * (0.68 + stain * 0.62) * (1 - pore * 0.45);
    factor = factor * (1 - gap * 0.85) + scratch * 0.22;
    paint(surface, [tone[0], tone[1] * (0.94 + stain * 0.1), tone[2] * (0.85 + own * 0.25)], factor);
    surface.rough = 0.46 + fibre * 0.12 + pore * 0.2 + gap * 0.3;
    surface.tiltX = (fibre - 0.5) * 0.02;
    surface.tiltZ =
      (noise2(lx * 0.035, z * 2.6 + 0.4, seed + 3) - fibre) * 0.16 + (across < 0.01 ? 0.5 : across > 0.99 ? -0.5 : 0);
  };
}

/** A self-healing cutting mat with a printed grid, worn by knives. */
export function cuttingMat(options: { tone?: Vec3; seed?: number } = {}): Bench {
  const { tone = [0.026, 0.058, 0.052], seed = 21 } = options;
  return (x, z, surface) => {
    const speck = noise2(x * 3.1, z * 3.1, seed);
    const wear = cloud2(x * 0.011, z * 0.011, 3, seed + 1);
    const near = (v: number, step: number): number => Math.abs(v - Math.round(v / step) * step);
    const fine = Math.max(smooth(0.32, 0.14, near(x, 10)), smooth(0.32, 0.14, near(z, 10)));
    const bold = Math.max(smooth(0.55, 0.3, near(x, 50)), smooth(0.55, 0.3, near(z, 50)));
    const slope = Math.abs(((x - z + 8000) % 200) - 100);
    const diagonal = smooth(0.45, 0.2, slope);
    const cutNoise = noise2(x * 0.009 + z * 0.014, z * 0.19 - x * 0.12, seed + 2);
    const cut = smooth(0.494, 0.5, cutNoise) * smooth(0.506, 0.5, cutNoise);
    const ink = Math.max(fine * 0.3, bold * 0.75, diagonal * 0.4) * (0.45 + wear * 0.75);
    const base = (0.82 + speck * 0.22) * (0.75 + wear * 0.5);
    surface.r = mix(tone[0] * base, 0.5, ink) + cut * 0.05;
    surface.g = mix(tone[1] * base, 0.52, ink) + cut * 0.05;
    surface.b = mix(tone[2] * base, 0.44, ink) + cut * 0.05;
    surface.rough = 0.5;
    surface.tiltX = (speck - 0.5) * 0.1;
    surface.tiltZ = (noise2(x * 3.1 + 7, z * 3.1, seed) - 0.5) * 0.1;
  };
}

/** Grained leather over a board. */
export function leather(options: { tone?: Vec3; seed?: number } = {}): Bench {
  const { tone = [0.1, 0.104, 0.108], seed = 31 } = options;
  const height = (x: number, z: number): number =>
    smooth(0.05, 0.62, pebble2(x * 0.62 + cloud2(x * 0.1, z * 0.1, 2, seed) * 2, z * 0.62, seed)) +
    noise2(x * 2.4, z * 2.4, seed + 1) * 0.25;
  return (x, z, surface) => {
    const h = height(x, z);
    const use = cloud2(x * 0.007, z * 0.007, 3, seed + 2);
    const crease = noise2(x * 0.01 + 4, z * 0.028, seed + 3);
    paint(surface, tone, (1.12 - h * 0.34) * (0.72 + use * 0.56));
    surface.rough = 0.44 + use * 0.12;
    surface.tiltX = (height(x + 0.25, z) - h) * -0.5;
    surface.tiltZ = (height(x, z + 0.25) - h) * -0.5 + smooth(0.48, 0.5, crease) * smooth(0.52, 0.5, crease) * 0.12;
  };
}

/** Felt: matted fibres that take up light. */
export function felt(options: { tone?: Vec3; seed?: number } = {}): Bench {
  const { tone = [0.02, 0.02, 0.022], seed = 41 } = options;
  return (x, z, surface) => {
    const a = noise2(x * 0.9 + noise2(x * 0.4, z * 0.4, seed) * 4, z * 5.2, seed + 1);
    const b = noise2(x * 4.8, z * 0.8 + noise2(x * 0.5, z * 0.5, seed + 2) * 4, seed + 3);
    const lump = cloud2(x * 0.03, z * 0.03, 3, seed + 4);
    const lint = smooth(0.93, 0.96, noise2(x * 0.9, z * 0.5, seed + 6)) * 0.7 + 1;
    paint(surface, tone, (0.45 + a * 0.6 + b * 0.6) * (0.75 + lump * 0.5) * lint);
    surface.rough = 0.98;
    surface.tiltX = (a - 0.5) * 0.5;
    surface.tiltZ = (b - 0.5) * 0.5;
  };
}

/** A linen cloth with its weave and soft folds. */
export function linen(options: { tone?: Vec3; seed?: number } = {}): Bench {
  const { tone = [0.56, 0.52, 0.45], seed = 51 } = options;
  const fold = (x: number, z: number): number =>
    cloud2(x * 0.006 + z * 0.004, z * 0.011 - x * 0.003, 3, seed) * 40 +
    Math.abs(cloud2(x * 0.009, z * 0.006, 2, seed + 9) - 0.5) * 30;
  return (x, z, surface) => {
    const h = fold(x, z);
    const warp = Math.sin(x * 3.6 + noise2(x * 0.5, z * 0.06, seed + 1) * 3);
    const weft = Math.sin(z * 3.6 + noise2(x * 0.06, z * 0.5, seed + 2) * 3);
    const slub = noise2(x * 0.08, z * 1.4, seed + 3) * 0.5 + noise2(x * 1.4, z * 0.08, seed + 4) * 0.5;
    paint(surface, tone, 0.78 + slub * 0.32 + warp * weft * 0.06);
    surface.rough = 0.95;
    surface.tiltX = (h - fold(x + 1, z)) * 0.75 + warp * 0.07;
    surface.tiltZ = (h - fold(x, z + 1)) * 0.75 + weft * 0.07;
  };
}

/** A painted board: window sill or bench of a clean shop. */
export function paintedBoard(tone: Vec3 = [0.62, 0.6, 0.55], seed = 61): Bench {
  return (x, z, surface) => {
    const brush = noise2(x * 0.02, z * 1.9, seed);
    const worn = smooth(0.7, 0.74, cloud3(x * 0.02, z * 0.035, 0.5, 4, seed + 1));
    const dirt = cloud2(x * 0.012, z * 0.012, 4, seed + 2);
    paint(surface, [mix(tone[0], 0.22, worn), mix(tone[1], 0.14, worn), mix(tone[2], 0.08, worn)], 0.74 + dirt * 0.42);
    surface.rough = 0.36 + worn * 0.3;
    surface.tiltZ = (brush - 0.5) * 0.09;
    surface.tiltX = (dirt - 0.5) * 0.03;
  };
}

/** A mat with rounded corners lying on another bench, `edge` half sizes in mm. */
export function laidOn(
  under: Bench,
  over: Bench,
  edge: { x: number; z: number; halfX: number; halfZ: number; yawDeg: number },
): Bench {
  const c = Math.cos((edge.yawDeg * Math.PI) / 180);
  const s = Math.sin((edge.yawDeg * Math.PI) / 180);
  return (x, z, surface) => {
    const dx = x - edge.x;
    const dz = z - edge.z;
    const lx = dx * c - dz * s;
    const lz = dx * s + dz * c;
    const qx = Math.max(Math.abs(lx) - edge.halfX + 8, 0);
    const qz = Math.max(Math.abs(lz) - edge.halfZ + 8, 0);
    const outside = Math.hypot(qx, qz) - 8;
    if (outside < 0) {
      over(lx, lz, surface);
      if (outside > -0.8) {
        surface.tiltX += Math.sign(lx) * (qx > 0 ? 0.6 : 0);
        surface.tiltZ += Math.sign(lz) * (qz > 0 ? 0.6 : 0);
      }
    } else {
      under(x, z, surface);
      const shade = 0.4 + 0.6 * smooth(0, 5, outside);
      surface.r *= shade;
      surface.g *= shade;
      surface.b *= shade;
    }
  };
}
