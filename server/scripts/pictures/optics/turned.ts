import type { Shape } from './solid.ts';

/** A corner of a turned outline: how far along the axis, and radius, both mm. */
export type Corner = readonly [x: number, radius: number];

const CELL_MM = 0.2;
const MARGIN_MM = 3;

/** Changes the distance at a point of a turned thing: flutes, knurling, windows. `angle` in radians. */
export type Relief = (distance: number, x: number, angle: number, radius: number) => number;

/**
 * A thing turned about x from a closed outline; corners on the axis are given the radius 0. Edges get a small bevel,
 * as a turner breaks them.
 */
export function turned(outline: readonly Corner[], options: { bevelMm?: number; relief?: Relief } = {}): Shape {
  const corners = bevelled(
    outline.map(([x, r]): Corner => [x, r === 0 ? -4 : r]),
    options.bevelMm ?? 0.35,
  );
  const xs = corners.map(([x]) => x);
  const lowX = Math.min(...xs);
  const highX = Math.max(...xs);
  const highR = Math.max(...corners.map(([, r]) => r));
  const grid = distanceGrid(corners, lowX - MARGIN_MM, highX + MARGIN_MM, highR + MARGIN_MM);
  const { relief } = options;
  return {
    min: [lowX, -highR, -highR],
    max: [highX, highR, highR],
    stride: relief ? 0.6 : 0.92,
    distance: relief
      ? (x, y, z) => {
          const radius = Math.sqrt(y * y + z * z);
          const d = grid(x, radius);
          return d > 2.5 ? d - 1 : relief(d, x, Math.atan2(z, y), radius);
        }
      : (x, y, z) => grid(x, Math.sqrt(y * y + z * z)),
  };
}

/** The closed outline of a bar with given radii at given places, from the axis and back to it, or down to a bore. */
export function outlineOf(
  outside: readonly Corner[],
  bore?: { radius: number; depth: number; from: 'start' | 'end' },
): Corner[] {
  const first = outside[0]?.[0] ?? 0;
  const last = outside.at(-1)?.[0] ?? 0;
  if (!bore) return [[first, 0], ...outside, [last, 0]];
  const { radius, depth, from } = bore;
  return from === 'start'
    ? [[first, radius], ...outside, [last, 0], [first + depth, 0], [first + depth, radius]]
    : [[first, 0], ...outside, [last, radius], [last - depth, radius], [last - depth, 0]];
}

/** Points of a rounded run between two corners, bulging by `bulgeMm` in the middle. */
export function swell(from: Corner, to: Corner, bulgeMm: number, steps = 14): Corner[] {
  return Array.from({ length: steps + 1 }, (_, step): Corner => {
    const t = step / steps;
    return [from[0] + (to[0] - from[0]) * t, from[1] + (to[1] - from[1]) * t + bulgeMm * 4 * t * (1 - t)];
  });
}

/** A quarter of an ellipse from `from` to `to`, leaving `from` along the radius. */
export function dome(from: Corner, to: Corner, steps = 14): Corner[] {
  return Array.from({ length: steps + 1 }, (_, step): Corner => {
    const a = (step / steps) * (Math.PI / 2);
    return [from[0] + (to[0] - from[0]) * (1 - Math.cos(a)), from[1] + (to[1] - from[1]) * Math.sin(a)];
  });
}

function bevelled(corners: readonly Corner[], size: number): Corner[] {
  return corners.flatMap((corner, index): Corner[] => {
    const before = corners.at(index - 1) ?? corner;
    const after = corners[(index + 1) % corners.length] ?? corner;
    const toBefore = [before[0] - corner[0], before[1] - corner[1]] as const;
    const toAfter = [after[0] - corner[0], after[1] - corner[1]] as const;
    const a = Math.hypot(...toBefore);
    const b = Math.hypot(...toAfter);
    const straight = -(toBefore[0] * toAfter[0] + toBefore[1] * toAfter[1]) / (a * b);
    if (corner[1] < 0 || straight > 0.9) return [corner];
    const cutA = Math.min(size, a / 3) / a;
    const cutB = Math.min(size, b / 3) / b;
    return [
      [corner[0] + toBefore[0] * cutA, corner[1] + toBefore[1] * cutA],
      [corner[0] + toAfter[0] * cutB, corner[1] + toAfter[1] * cutB],
    ];
  });
}

/** Signed distance to the outline on a grid, read between its points. */
function distanceGrid(
  corners: readonly Corner[],
  lowX: number,
  highX: number,
  highR: number,
): (x: number, r: number) => number {
  const columns = Math.ceil((highX - lowX) / CELL_MM) + 2;
  const rows = Math.ceil(highR / CELL_MM) + 2;
  const values = new Float32Array(columns * rows);
  for (let column = 0; column < columns; column += 1)
    for (let row = 0; row < rows; row += 1)
      values[row * columns + column] = outlineDistance(corners, lowX + column * CELL_MM, row * CELL_MM);
  return (x, r) => {
    const gx = (x - lowX) / CELL_MM;
    const gr = r / CELL_MM;
    const fx = Math.min(Math.max(gx, 0), columns - 1.001);
    const fr = Math.min(gr, rows - 1.001);
    const column = Math.floor(fx);
    const row = Math.floor(fr);
    const u = fx - column;
    const v = fr - row;
    const at = row * columns + column;
    const low = (values[at] ?? 0) * (1 - u) + (values[at + 1] ?? 0) * u;
    const high = (values[at + columns] ?? 0) * (1 - u) + (values[at + columns + 1] ?? 0) * u;
    const near = low + (high - low) * v;
    // Off the grid the way to its edge is added, so that distances far off are never short.
    const off = Math.abs(gx - fx) + Math.max(gr - fr, 0);
    return off < 0.01 ? near : Math.hypot(gx - fx, gr - fr) * CELL_MM + near * 0.7;
  };
}

function outlineDistance(corners: readonly Corner[], x: number, r: number): number {
  let best = 1e9;
  let inside = false;
  let before = corners.at(-1) ?? [0, 0];
  for (const corner of corners) {
    const ex = before[0] - corner[0];
    const er = before[1] - corner[1];
    const px = x - corner[0];
    const pr = r - corner[1];
    const t = Math.min(Math.max((px * ex + pr * er) / (ex * ex + er * er + 1e-12), 0), 1);
    const d = (px - ex * t) ** 2 + (pr - er * t) ** 2;
    if (d < best) best = d;
    if (corner[1] > r !== before[1] > r && x < (ex * pr) / er + corner[0]) inside = !inside;
    before = corner;
  }
  return inside ? -Math.sqrt(best) : Math.sqrt(best);
}
