import { noise3 } from '../optics/noise.ts';
import { solid, type Solid } from '../optics/solid.ts';
import type { Material } from '../optics/surface.ts';
import { dome, outlineOf, swell, turned, type Corner, type Relief } from '../optics/turned.ts';
import { mix, shifted, smooth, type Frame } from '../optics/vector.ts';
import { banded, COPPER, metal, STEEL } from './materials.ts';
import { facets, reliefs } from './reliefs.ts';

export const HERON_RADIUS_MM = 18.5;
const MOUTH_MM = 232;
const SPIGOT_MM = 12;

/** Chemically blackened steel: dark, waxed, worn to bright on what sticks out. */
const blackened = (seed: number): Material => {
  const bare = metal({ tone: STEEL, rough: 0.24, marks: 0.5, seed });
  return (x, y, z, surface) => {
    bare(x, y, z, surface);
    const radius = Math.hypot(y, z);
    const worn = smooth(
      0.66,
      0.86,
      noise3(x * 0.35, y * 0.35, z * 0.35, seed + 3) * 0.75 + smooth(16.5, 18.6, radius) * 0.3,
    );
    const cloud = noise3(x * 0.06, y * 0.06, z * 0.06, seed + 4);
    surface.r = mix(0.13 + cloud * 0.05, 0.46, worn);
    surface.g = mix(0.132 + cloud * 0.042, 0.45, worn);
    surface.b = mix(0.15 + cloud * 0.045, 0.44, worn);
    surface.rough = mix(0.33, 0.22, worn);
  };
};

export type HeronStage = 'bright' | 'blackened';
const steelOf = (stage: HeronStage, seed: number): Material =>
  stage === 'bright' ? metal({ tone: STEEL, rough: 0.17, marks: 0.8, seed }) : blackened(seed);

/** Section of the body, one side of the axis. */
export const HERON_BODY_OUTLINE: readonly Corner[] = outlineOf([
  ...dome([0, 4], [9, 15.5], 8),
  [12, 16.6],
  [16, 16.6],
  [17, 14],
  [20, 14],
  [21, 15.6],
  ...swell([24, 15.4], [132, 13.6], 1),
  [134, 15.6],
  [138, 15.6],
  [138.6, 17.6],
  [152, 17.6],
  [152.6, 15.8],
  [157, 15.8],
  [158, 14.4],
  [161, 14.4],
  [162, 15.6],
  ...swell([164, 15.4], [218, 17.2], -0.8),
  [220, 18.5],
  [MOUTH_MM, 18.5],
  [MOUTH_MM, 15.8],
  [MOUTH_MM - 1, 15.02],
  [MOUTH_MM - 16, 15.02],
  [MOUTH_MM - 16, 11.3],
  [150, 11.3],
  [150, 0],
]);

/** Slender body with long facets and one copper band; x = 0 is the pommel's end, the mouth is at 232 mm. */
export function heronBody(frame: Frame, stage: HeronStage): Solid {
  const relief: Relief = reliefs(facets(10, 26, 130, 15.6, 0.55), facets(10, 166, 214, 16.4, 0.3));
  const steel = steelOf(stage, 401);
  const copper = metal({
    tone: COPPER,
    rough: 0.16,
    marks: 0.6,
    age: stage === 'bright' ? 0 : 0.3,
    ageTone: [0.2, 0.075, 0.045],
    seed: 409,
  });
  return solid(
    frame,
    turned(HERON_BODY_OUTLINE, { relief, bevelMm: 0.45 }),
    banded([
      [138.3, steel],
      [152.3, copper],
      [999, steel],
    ]),
  );
}

/** Section of the front piece before the slanting cut. */
export const HERON_EMITTER_OUTLINE: readonly Corner[] = outlineOf([
  [-SPIGOT_MM, 11.3],
  [-SPIGOT_MM, 14.6],
  [-SPIGOT_MM + 0.6, 15],
  [0, 15],
  [0, 18.5],
  [5, 18.5],
  [6, 17.4],
  ...swell([8, 17.2], [60, 17.8], -1.3),
  [60, 14.2],
  [56, 11.3],
]).slice(1, -1);

/** The front piece, cut off slantwise like a beak; its spigot points to -x and its shoulder is at x = 0. */
export function heronEmitter(frame: Frame, stage: HeronStage): Solid {
  const beak: Relief = (d, x, angle, radius) => Math.max(d, (x - 42 + radius * Math.cos(angle) * 0.8) * 0.78);
  const grooves: Relief = (d, x) => (x > 9 && x < 19 ? d + 0.55 * smooth(0.55, 0.95, Math.cos((x - 9.5) * 2.1)) : d);
  const steel = steelOf(stage, 421);
  const bright = metal({ tone: STEEL, rough: 0.16, marks: 0.7, age: 0.15, ageTone: [0.1, 0.1, 0.1], seed: 423 });
  return solid(
    frame,
    turned(HERON_EMITTER_OUTLINE, { relief: reliefs(grooves, beak), bevelMm: 0.45 }),
    banded([
      [-0.1, bright],
      [999, steel],
    ]),
  );
}

/** Body and front piece; `gapMm` is how far the front piece stands off its seat. */
export const heron = (frame: Frame, options: { stage?: HeronStage; gapMm?: number } = {}): Solid[] => [
  heronBody(frame, options.stage ?? 'blackened'),
  heronEmitter(shifted(frame, [MOUTH_MM + 0.15 + (options.gapMm ?? 0), 0, 0]), options.stage ?? 'blackened'),
];
