import { cutOut } from '../optics/shapes.ts';
import { bar, block, solid, type Solid } from '../optics/solid.ts';
import { dome, outlineOf, turned } from '../optics/turned.ts';
import { frameAlong, place, shifted, type Frame } from '../optics/vector.ts';
import { banded, colour, metal, plain, printed, STEEL, walnut } from './materials.ts';
import { facets } from './reliefs.ts';
import { displaySheet, ruleSheet } from './sheets.ts';

const satin = (seed: number) => metal({ tone: STEEL, rough: 0.24, marks: 0.1, seed });

/** A plain digital caliper lying flat: x along the beam, jaws towards +z, measuring `openingMm`. */
export async function caliper(frame: Frame, openingMm: number, reading: string): Promise<Solid[]> {
  const display = await displaySheet(reading);
  const beam = shifted(frame, [0, 0, -11]);
  const slide = (x: number, y: number, z: number): Frame => shifted(frame, [openingMm + x, y, z]);
  const digits = printed(display, { widthMm: 33, depthMm: 13 }, 0.14);
  return [
    solid(shifted(beam, [72, 0, 0]), block(196, 3.4, 15, 0.5), satin(701)),
    solid(
      frame,
      cutOut(
        [
          [-22, -19],
          [-22, -3.6],
          [-9, 2],
          [-4.5, 40],
          [-1.6, 40],
          [0, 24],
          [0, -3.6],
          [0, -19],
        ],
        3.5,
      ),
      satin(703),
    ),
    solid(
      slide(0, 0, 0),
      cutOut(
        [
          [0, -19.5],
          [0, 24],
          [1.6, 40],
          [4.5, 40],
          [9, 2],
          [18, -2],
          [62, -2],
          [62, -19.5],
        ],
        3.7,
      ),
      satin(705),
    ),
    solid(slide(38, 2.6, -11), block(58, 6.6, 23, 2), plain([0.035, 0.036, 0.038], 0.38)),
    solid(slide(33, 5.9, -13), block(36, 0.7, 15, 0.3), plain([0.2, 0.21, 0.2], 0.2)),
    solid(slide(33, 6.2, -13), block(33, 0.5, 13, 0.1), digits),
    solid(slide(22, 5.4, -2.6), block(7, 1.6, 3.4, 0.8), plain([0.32, 0.08, 0.05], 0.4)),
    solid(slide(33, 5.4, -2.6), block(7, 1.6, 3.4, 0.8), plain([0.22, 0.23, 0.24], 0.4)),
    solid(slide(44, 5.4, -2.6), block(7, 1.6, 3.4, 0.8), plain([0.22, 0.23, 0.24], 0.4)),
    solid(
      { ...slide(60, 0.4, 3.4), x: frame.y, y: frame.x, z: frame.z },
      turned(
        outlineOf([
          [-2.4, 5],
          [2.4, 5],
        ]),
        { relief: (d, _x, a) => d + 0.3 * Math.max(0, Math.cos(a * 26)), bevelMm: 0.6 },
      ),
      satin(707),
    ),
  ];
}

/** A ground steel block that carries a caliper at the right height. Its top is at `heightMm`. */
export const gaugeBlock = (at: Frame, heightMm: number): Solid =>
  solid(
    shifted(at, [0, heightMm / 2, 0]),
    block(34, heightMm, 50, 0.7),
    metal({ tone: [0.46, 0.46, 0.47], rough: 0.2, marks: 0.15, seed: 711 }),
  );

/** A steel rule lying flat, 160 mm, x along it. */
export async function rule(frame: Frame): Promise<Solid> {
  const face = printed(await ruleSheet(), { widthMm: 166, depthMm: 19 }, 0.35);
  return solid(shifted(frame, [0, 0.5, 0]), block(166, 1, 19, 0.2), (x, y, z, surface) => {
    face(x, y, z, surface);
    surface.metal = surface.r > 0.18 ? 0.9 : 0.1;
    surface.streak = 0.25;
    surface.rough = 0.3;
  });
}

/** A hexagonal pencil lying on what is at `frame`, point towards +x. */
export function pencil(frame: Frame): Solid {
  const shape = turned(
    [
      [0, 0],
      [0, 3.9],
      [118, 3.9],
      [136, 0.9],
      [137, 0.5],
      [139.5, 0],
    ],
    {
      relief: facets(6, -4, 117, 3.9, 0.45),
      bevelMm: 0.2,
    },
  );
  const lacquer = plain([0.035, 0.075, 0.14], 0.24);
  const wood = plain([0.5, 0.33, 0.18], 0.7);
  const lead = plain([0.05, 0.05, 0.052], 0.4);
  return solid(shifted(frame, [0, 3.3, 0]), shape, (x, y, z, surface) =>
    (x < 1 ? wood : Math.hypot(y, z) > 3.05 - (x > 116 ? 2 : 0) && x < 119 ? lacquer : x > 134.6 ? lead : wood)(
      x,
      y,
      z,
      surface,
    ),
  );
}

/** A round brush with a turned handle, bristles towards +x, lying on the bench. */
export function brush(frame: Frame): Solid[] {
  const body = turned(
    outlineOf([...dome([0, 1.5], [8, 3.6], 6), [70, 3], [95, 5.6], [108, 4.6], [109, 5.4], [124, 5.4], [126, 5]]),
  );
  const hair = turned(
    [
      [125, 0],
      [125, 4.6],
      [134, 6.6],
      [148, 3.4],
      [152, 0],
    ],
    { relief: (d, x, a) => d + 0.35 * Math.sin(a * 37 + x * 0.2) * Math.sin(a * 13), bevelMm: 1 },
  );
  const raised = shifted(frame, [0, 6, 0]);
  return [
    solid(
      raised,
      body,
      banded([
        [109, plain([0.36, 0.2, 0.09], 0.3)],
        [200, metal({ tone: [0.6, 0.58, 0.55], rough: 0.2, marks: 0.3, seed: 721 })],
      ]),
    ),
    solid(raised, hair, plain([0.14, 0.1, 0.06], 0.85, 0.3)),
  ];
}

/** A glazed dish with liquid in it, standing at `frame`. */
export function dish(frame: Frame, liquid: readonly [number, number, number]): Solid[] {
  const stood: Frame = { origin: frame.origin, x: frame.y, y: frame.x, z: frame.z };
  const wall = turned(
    [
      [0, 0],
      [0, 24],
      [3, 30],
      [22, 39],
      [23, 38.4],
      [22.4, 36],
      [4, 27],
      [2.4, 20],
      [2.4, 0],
    ],
    { bevelMm: 0.8 },
  );
  return [
    solid(stood, wall, plain([0.68, 0.66, 0.6], 0.16)),
    solid(
      shifted(stood, [10, 0, 0]),
      turned(
        outlineOf([
          [0, 29],
          [1, 30.4],
        ]),
        { bevelMm: 0.1 },
      ),
      (_x, _y, _z, surface) => {
        colour(surface, liquid);
        surface.rough = 0.04;
      },
    ),
  ];
}

/** A folded polishing cloth. */
export const cloth = (frame: Frame): Solid =>
  solid(
    frame,
    {
      min: [-50, 0, -38],
      max: [50, 16, 38],
      stride: 0.5,
      distance: (x, y, z) => {
        const lift = 7 + 3 * Math.sin(x * 0.07 + z * 0.03) + 2.4 * Math.sin(z * 0.11 - x * 0.04);
        const side = Math.max(Math.abs(x + 4 * Math.sin(z * 0.06)) - 44, Math.abs(z + 3 * Math.sin(x * 0.09)) - 32);
        const top = Math.abs(y - lift / 2) - lift / 2;
        return Math.hypot(Math.max(side + 3, 0), Math.max(top + 3, 0)) + Math.min(Math.max(side + 3, top + 3), 0) - 3;
      },
    },
    (x, _y, z, surface) => {
      const weave = Math.sin(x * 3) * Math.sin(z * 3);
      colour(surface, [0.46, 0.3, 0.1], 0.85 + weave * 0.12);
      surface.rough = 0.95;
    },
  );

/** A screwdriver with a turned walnut handle, blade towards +x. */
export function screwdriver(frame: Frame): Solid[] {
  const handle = turned(outlineOf([...dome([0, 3], [10, 11], 8), [40, 12], [62, 8], [72, 7], [74, 8], [80, 8]]), {
    relief: facets(8, 8, 58, 11.4, 0.4),
  });
  const raised = shifted(frame, [0, 11, 0]);
  const blade: Frame = frameAlong(place(raised, [79, 0, 0]), frame.x);
  return [
    solid(
      raised,
      handle,
      banded([
        [73, walnut(731)],
        [200, metal({ tone: STEEL, rough: 0.15, marks: 0.4, seed: 733 })],
      ]),
    ),
    solid(blade, bar(2.6, 92, 0.4), metal({ tone: STEEL, rough: 0.14, marks: 0.2, seed: 735 })),
  ];
}
