import { bar, solid, type Solid } from '../optics/solid.ts';
import type { Material } from '../optics/surface.ts';
import { dome, outlineOf, turned, type Corner, type Relief } from '../optics/turned.ts';
import { place, shifted, type Frame, type Vec3 } from '../optics/vector.ts';
import { ALUMINIUM, banded, boneResin, glowing, metal, plain } from './materials.ts';
import { holes, reliefs } from './reliefs.ts';

export const SECOND_WINTER_RADIUS_MM = 20;
/** Rings of resin: from and to, mm from the pommel's seam. */
const RINGS: readonly (readonly [number, number])[] = [
  [40, 50],
  [56, 66],
  [72, 82],
  [88, 98],
];
const SWITCH_AT_MM = 142;

export type Blast = 'turned' | 'blasted';
const skin = (blast: Blast, seed: number): Material =>
  blast === 'blasted'
    ? metal({ tone: ALUMINIUM, rough: 0.46, marks: 0.05, grain: 0.2, seed })
    : metal({ tone: ALUMINIUM, rough: 0.15, marks: 1, seed });

const ringed = RINGS.flatMap(([from, to]): Corner[] => [
  [from - 0.5, 17.4],
  [from, 16.4],
  [from + 0.3, 18.2],
  [to - 0.3, 18.2],
  [to, 16.4],
  [to + 0.5, 17.4],
]);

/** Section of the body, one side of the axis. */
export const WINTER_BODY_OUTLINE: readonly Corner[] = outlineOf([
  [0, 18.6],
  [22, 18.6],
  [22.5, 17.2],
  [26, 17.2],
  [26.5, 18.2],
  [33, 18.2],
  [34, 17.4],
  ...ringed,
  [106, 17.4],
  [107, 18.4],
  [116, 18.4],
  [117, 20],
  [168, 20],
  [169, 18],
  [174, 18],
  [175, 19],
  [180, 19],
  [181, 17],
  [214, 17],
  [216, 19.2],
  [246, 19.2],
  [246, 12.6],
  [244.6, 11.2],
  [196, 11.2],
  [196, 4],
  [80, 4],
  [80, 14],
  [16, 14],
  [16, 15.03],
  [1, 15.03],
  [0, 15.8],
]).slice(1, -1);

/** Body of 246 mm with resin rings, a switch in a well and a crown of holes; the bore is at x = 0. */
export function winterBody(frame: Frame, blast: Blast): Solid {
  const well: Relief = (d, x, angle, radius) => {
    const arc = Math.hypot(x - SWITCH_AT_MM, (angle - Math.PI / 2) * 20);
    return arc < 14 && radius > 14 ? Math.max(d, Math.min(9.4 - arc, radius - 17.6)) : d;
  };
  const metalSkin = skin(blast, 501);
  const resin = boneResin(507);
  const bands = banded([
    ...RINGS.flatMap(([from, to]) => [[from + 0.1, metalSkin] as const, [to - 0.1, resin] as const]),
    [999, metalSkin],
  ]);
  return solid(
    frame,
    turned(WINTER_BODY_OUTLINE, { relief: reliefs(well, holes(8, 230, 3.6, 19.2, 13)), bevelMm: 0.5 }),
    bands,
  );
}

/** Section of the pommel, one side of the axis. */
export const WINTER_POMMEL_OUTLINE: readonly Corner[] = outlineOf(
  [...dome([0, 2], [12, 18.6], 16), [24, 18.6], [24.5, 17.4], [27, 17.4], [27.5, 18.6], [36, 18.6], [36, 15], [50, 15]],
  { radius: 11.5, depth: 14, from: 'end' },
);

export function winterPommel(frame: Frame, blast: Blast): Solid {
  const slots: Relief = holes(6, 19, 1.7, 18.6, 14);
  const outside = skin(blast, 511);
  const bright = metal({ tone: ALUMINIUM, rough: 0.15, marks: 0.9, seed: 513 });
  return solid(
    frame,
    turned(WINTER_POMMEL_OUTLINE, { relief: slots, bevelMm: 0.6 }),
    banded([
      [36, outside],
      [999, bright],
    ]),
  );
}

/** Button and its lit ring, seated in the well of the body in `frame`. */
export function winterSwitch(frame: Frame, lit: boolean): Solid[] {
  // The well is on the body's z side.
  const seat: Frame = { origin: place(frame, [SWITCH_AT_MM, 0, 17.4]), x: frame.z, y: frame.y, z: times3(frame.x, -1) };
  const ringShape = turned(
    [
      [0, 5.6],
      [1.5, 5.6],
      [1.5, 7.6],
      [0, 7.6],
    ],
    { bevelMm: 0.4 },
  );
  const rim = turned(
    [
      [0, 7.7],
      [2.3, 7.7],
      [2.3, 9.1],
      [0, 9.1],
    ],
    { bevelMm: 0.4 },
  );
  return [
    solid(seat, rim, metal({ tone: ALUMINIUM, rough: 0.18, marks: 0.4, seed: 521 })),
    solid(seat, ringShape, lit ? glowing([0.5, 0.8, 1], 1.5) : plain([0.7, 0.72, 0.72], 0.3), !lit),
    solid(seat, bar(5.4, 2.6, 0.7), metal({ tone: [0.5, 0.5, 0.52], rough: 0.22, marks: 0.2, seed: 523 })),
  ];
}

const times3 = (v: Vec3, factor: number): Vec3 => [v[0] * factor, v[1] * factor, v[2] * factor];

export const secondWinter = (frame: Frame, options: { blast?: Blast; lit?: boolean; gapMm?: number } = {}): Solid[] => [
  winterBody(frame, options.blast ?? 'blasted'),
  winterPommel(shifted(frame, [-36.15 - (options.gapMm ?? 0), 0, 0]), options.blast ?? 'blasted'),
  ...winterSwitch(frame, options.lit ?? false),
];
