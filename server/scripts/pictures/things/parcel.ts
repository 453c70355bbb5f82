import { noise2, noise3 } from '../optics/noise.ts';
import { crumpled } from '../optics/shapes.ts';
import { block, solid, type Solid } from '../optics/solid.ts';
import { outlineOf, turned } from '../optics/turned.ts';
import type { Material } from '../optics/surface.ts';
import { add, frameFlat, shifted, times, type Frame } from '../optics/vector.ts';
import { colour, plain } from './materials.ts';

const board: Material = (x, y, z, surface) => {
  const flute = Math.sin(x * 1.4 + y * 0.05) * 0.5;
  const fibre = noise2(x * 0.4, z * 2.4 + y, 901);
  colour(surface, [0.4, 0.262, 0.148], 0.86 + fibre * 0.2 + flute * 0.03);
  surface.rough = 0.85;
  surface.tiltX = flute * 0.03;
};

/** An open carton, its floor at the origin of `frame`; flaps stand outwards. */
export function carton(frame: Frame, width: number, depth: number, height: number): Solid[] {
  const flap = (at: readonly [number, number, number], yaw: 'x' | 'z', side: number, long: number): Solid => {
    const hinge = shifted(frame, at);
    const lean = 0.6 * side;
    const tilt = (one: Frame): Frame =>
      yaw === 'x'
        ? {
            ...one,
            x: add(times(one.x, Math.cos(lean)), times(one.y, -Math.sin(lean))),
            y: add(times(one.y, Math.cos(lean)), times(one.x, Math.sin(lean))),
          }
        : {
            ...one,
            z: add(times(one.z, Math.cos(lean)), times(one.y, -Math.sin(lean))),
            y: add(times(one.y, Math.cos(lean)), times(one.z, Math.sin(lean))),
          };
    const turnedOut = tilt(hinge);
    return yaw === 'x'
      ? solid(shifted(turnedOut, [side * 34, 0, 0]), block(68, 3.4, long, 0.6), board)
      : solid(shifted(turnedOut, [0, 0, side * 34]), block(long, 3.4, 68, 0.6), board);
  };
  return [
    solid(shifted(frame, [0, 1.7, 0]), block(width, 3.4, depth, 0.5), board),
    solid(shifted(frame, [0, height / 2, -depth / 2]), block(width, height, 3.4, 0.6), board),
    solid(shifted(frame, [0, height / 2, depth / 2]), block(width, height, 3.4, 0.6), board),
    solid(shifted(frame, [-width / 2, height / 2, 0]), block(3.4, height, depth, 0.6), board),
    solid(shifted(frame, [width / 2, height / 2, 0]), block(3.4, height, depth, 0.6), board),
    flap([-width / 2, height, 0], 'x', -1, depth - 4),
    flap([width / 2, height, 0], 'x', 1, depth - 4),
    flap([0, height, -depth / 2], 'z', -1, width - 4),
    flap([0, height, depth / 2], 'z', 1, width - 4),
  ];
}

/** Crumpled packing paper on the floor of a carton. */
export const packing = (
  frame: Frame,
  width: number,
  depth: number,
  base: number,
  height: number,
  seed: number,
): Solid =>
  solid(frame, crumpled(width, depth, base, height, seed), (x, y, z, surface) => {
    colour(surface, [0.5, 0.36, 0.215], 0.9 + noise3(x * 0.3, y * 0.3, z * 0.3, seed) * 0.2);
    surface.rough = 0.85;
  });

/** Tissue wound round a bar of radius `radiusMm`, from x = 0 to `length`. */
export function tissue(frame: Frame, radiusMm: number, length: number, seed = 911): Solid {
  const shape = turned(
    outlineOf([
      [0, radiusMm + 1.4],
      [length, radiusMm + 1.4],
    ]),
    {
      bevelMm: 0.3,
      relief: (d, x, angle) => {
        const a = Math.cos(angle) * 3;
        const b = Math.sin(angle) * 3;
        const fold = 1 - Math.abs(noise3(x * 0.05 + a * 0.3, a, b, seed) * 2 - 1);
        const fine = 1 - Math.abs(noise3(x * 0.16, a * 2.4, b * 2.4, seed + 1) * 2 - 1);
        return d - fold * 1.3 - fine * 0.6;
      },
    },
  );
  const grown = {
    ...shape,
    min: [-1, -radiusMm - 4, -radiusMm - 4] as const,
    max: [length + 1, radiusMm + 4, radiusMm + 4] as const,
  };
  return solid(frame, grown, plain([0.76, 0.75, 0.71], 0.8, 0.05));
}

/** A paper tag or card lying on something. */
export const card = (
  at: readonly [number, number, number],
  yawDeg: number,
  material: Material,
  width: number,
  depth: number,
): Solid => solid(frameFlat(at, yawDeg), block(width, 0.5, depth, 0.1), material);
