import { bar, blob, block, cord, solid, type Shape, type Solid } from '../optics/solid.ts';
import { outlineOf, turned } from '../optics/turned.ts';
import { shifted, type Frame, type Vec3 } from '../optics/vector.ts';
import { banded, colour, glowing, metal, plain, printed } from './materials.ts';
import { boardSheet } from './sheets.ts';

export const WIRE = {
  red: [0.5, 0.025, 0.02],
  black: [0.018, 0.018, 0.02],
  yellow: [0.62, 0.42, 0.03],
  blue: [0.03, 0.1, 0.42],
  green: [0.04, 0.26, 0.08],
  white: [0.66, 0.65, 0.62],
} satisfies Record<string, Vec3>;

const tin = metal({ tone: [0.66, 0.66, 0.67], rough: 0.13, marks: 0, seed: 801 });
const gold = metal({ tone: [0.8, 0.6, 0.24], rough: 0.25, marks: 0, seed: 803 });

/** A wire through points in `frame`, insulated, its last stretch bare and tinned. */
export function wire(frame: Frame, points: readonly Vec3[], tone: Vec3, radiusMm = 0.75): Solid {
  return solid(frame, cord(points, radiusMm), plain(tone, 0.34, 0.06));
}

/** A joint of solder with the wire's end in it. */
export const joint = (frame: Frame, at: Vec3, radiusMm = 1.5): Solid =>
  solid(shifted(frame, at), blob(radiusMm, 0.8), tin);

/** A sound board 42 by 20 mm, top at y = 0.8: chips, socket, pads along both long edges. */
export async function soundBoard(frame: Frame): Promise<Solid[]> {
  const mask = printed(await boardSheet(), { widthMm: 42, depthMm: 20 }, 0.28);
  const chip = (x: number, z: number, w: number, d: number, h = 1.2): Solid[] => [
    solid(shifted(frame, [x, 0.8 + h / 2, z]), block(w, h, d, 0.15), plain([0.022, 0.022, 0.024], 0.42)),
    ...[-1, 1].map((side) => solid(shifted(frame, [x, 1, z + side * (d / 2 + 0.5)]), pins(w), tin)),
  ];
  const small = (x: number, z: number, tone: Vec3): Solid =>
    solid(
      shifted(frame, [x, 1.15, z]),
      block(1.6, 0.7, 0.9, 0.12),
      banded([
        [-0.45, tin],
        [0.45, plain(tone, 0.4)],
        [9, tin],
      ]),
    );
  return [
    solid(frame, block(42, 1.6, 20, 0.2), (x, y, z, surface) => {
      if (y > 0.6) return mask(x, y, z, surface);
      colour(surface, [0.16, 0.17, 0.08]);
    }),
    ...chip(-6, 0.5, 9, 7),
    ...chip(8.5, -1.5, 5.4, 4.4),
    solid(
      shifted(frame, [16.4, 2.4, 0.5]),
      block(7.6, 3.1, 8.6, 0.5),
      metal({ tone: [0.6, 0.6, 0.62], rough: 0.2, marks: 0.1, seed: 805 }),
    ),
    solid(
      shifted(frame, [-16, 1.5, 1]),
      block(6, 1.5, 10, 0.2),
      metal({ tone: [0.62, 0.62, 0.62], rough: 0.25, marks: 0.1, seed: 807 }),
    ),
    ...[
      [2.2, -5],
      [4.6, -5],
      [2.2, 4.8],
      [4.6, 4.8],
      [9, 4.4],
    ].map(([x = 0, z = 0]) => small(x, z, [0.3, 0.2, 0.12])),
    ...[
      [-12, -6],
      [12, 5.6],
      [7, 4.4],
    ].map(([x = 0, z = 0]) => small(x, z, [0.05, 0.05, 0.05])),
  ];
}

/** Where the board's pads are, in its own axes: `side` -1 is the far edge. */
export const padAt = (index: number, side: -1 | 1): Vec3 => [-17 + index * 4.2, 0.9, side * 8.6];

/** A round cell, 65 by 18 mm, along x, in a plain wrap. */
export function roundCell(frame: Frame, tone: Vec3 = [0.03, 0.2, 0.21]): Solid[] {
  return [
    solid(
      frame,
      bar(9.1, 65, 1),
      banded([
        [62.2, plain(tone, 0.2, 0.05)],
        [63, plain([0.7, 0.7, 0.68], 0.5)],
        [99, tin],
      ]),
    ),
    solid(shifted(frame, [64.5, 0, 0]), bar(3, 1.6, 0.4), tin),
  ];
}

/** A printed cradle: an open half tube of 14 mm radius with ribs, along x from 0 to `length`. */
export function cradle(frame: Frame, length: number, ribs: readonly number[]): Solid {
  return solid(
    frame,
    {
      min: [0, -14, -14],
      max: [length, 8, 14],
      stride: 0.8,
      distance: (x, y, z) => {
        const radius = Math.sqrt(y * y + z * z);
        let d = Math.max(radius - 14, 11.8 - radius, y - 1.5);
        for (const rib of ribs) d = Math.min(d, Math.max(Math.abs(x - rib) - 1.4, radius - 14, y - 7, 9.6 - radius));
        for (const end of [1.6, length - 1.6]) d = Math.min(d, Math.max(Math.abs(x - end) - 1.6, radius - 14, y - 8));
        return Math.max(d, -x, x - length) - 0.15;
      },
    },
    (x, _y, _z, surface) => {
      // Printed in layers across the axis.
      colour(surface, [0.052, 0.054, 0.058], 0.92 + 0.08 * Math.sin(x * 31));
      surface.rough = 0.42;
      surface.tiltX = Math.sin(x * 31) * 0.16;
    },
  );
}

/** A loudspeaker of 28 mm facing +x. */
export function speaker(frame: Frame): Solid[] {
  const basket = turned(
    outlineOf([
      [0, 7],
      [3, 8],
      [3.5, 13],
      [4, 14],
      [6.4, 14],
      [6.4, 12.4],
      [5.6, 12],
      [5.6, 11.6],
    ]),
    { bevelMm: 0.2 },
  );
  const cone = turned(
    [
      [4.4, 0],
      [6.4, 0],
      [6.3, 3],
      [5.8, 5],
      [4.6, 5.4],
      [5.2, 8],
      [6.2, 10.4],
      [5.6, 11.8],
      [4.4, 11.8],
    ],
    { bevelMm: 0.5 },
  );
  return [
    solid(frame, basket, metal({ tone: [0.5, 0.5, 0.52], rough: 0.2, marks: 0.3, seed: 811 })),
    solid(frame, cone, plain([0.03, 0.03, 0.034], 0.35)),
  ];
}

/** A flexible strip with `count` LEDs, along x, lying on what is under `frame`. */
export function ledStrip(frame: Frame, count: number, lit: Vec3 | null, pitchMm = 9): Solid[] {
  const length = count * pitchMm;
  const tape = solid(shifted(frame, [length / 2, 0.3, 0]), block(length, 0.5, 8, 0.1), (x, _y, z, surface) => {
    const off = Math.abs(((x + length / 2 + pitchMm / 2) % pitchMm) - pitchMm / 2);
    if (off < 1.6 && Math.abs(Math.abs(z) - 1.4 * Math.round(Math.abs(z) / 1.4)) < 0.5 && Math.abs(z) < 3.6)
      gold(x, 0, z, surface);
    else plain([0.6, 0.58, 0.53], 0.5)(x, 0, z, surface);
  });
  const leds = Array.from({ length: count }, (_, index) => {
    const at = shifted(frame, [(index + 0.5) * pitchMm, 1.1, 0]);
    return [
      solid(at, block(5, 1.5, 5, 0.2), plain([0.72, 0.71, 0.68], 0.4)),
      solid(shifted(at, [0, 0.62, 0]), bar3(1.9, 0.5), lit ? glowing(lit, 3) : plain([0.6, 0.5, 0.2], 0.25), false),
    ];
  }).flat();
  return [tape, ...leds];
}

/** A row of pins along x under a chip `widthMm` wide. */
const pins = (widthMm: number): Shape => ({
  min: [-widthMm / 2, -0.2, -0.55],
  max: [widthMm / 2, 0.2, 0.55],
  stride: 0.7,
  distance: (x, y, z) =>
    Math.max(
      Math.abs(x - Math.round(x / 1.3) * 1.3) - 0.26,
      Math.abs(y) - 0.2,
      Math.abs(z) - 0.55,
      Math.abs(x) - widthMm / 2 + 0.4,
    ),
});

const bar3 = (radius: number, height: number) => ({
  min: [-radius, -height, -radius] as Vec3,
  max: [radius, height, radius] as Vec3,
  distance: (x: number, y: number, z: number) => Math.max(Math.sqrt(x * x + z * z) - radius, Math.abs(y) - height),
});
