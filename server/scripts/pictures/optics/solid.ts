import type { Material } from './surface.ts';
import type { Frame, Vec3 } from './vector.ts';

/** Distance to the skin in mm at a point of the thing's own axes; negative inside. */
export type Distance = (x: number, y: number, z: number) => number;

export interface Solid {
  frame: Frame;
  /** Box round the thing, in its own axes, mm. */
  min: Vec3;
  max: Vec3;
  distance: Distance;
  material: Material;
  /** Part of the distance that may be walked at once; below 1 where relief makes the distance inexact. */
  stride: number;
  /** False for what lets light through: it throws no shadow. */
  opaque: boolean;
}

export type Shape = Pick<Solid, 'min' | 'max' | 'distance'> & { stride?: number };

export const solid = (frame: Frame, shape: Shape, material: Material, opaque = true): Solid => ({
  frame,
  min: shape.min,
  max: shape.max,
  distance: shape.distance,
  material,
  stride: shape.stride ?? 0.95,
  opaque,
});

/** A block about its centre, edges rounded by `round`. Sizes in mm. */
export function block(width: number, height: number, depth: number, round = 0.6): Shape {
  const hx = width / 2 - round;
  const hy = height / 2 - round;
  const hz = depth / 2 - round;
  return {
    min: [-width / 2, -height / 2, -depth / 2],
    max: [width / 2, height / 2, depth / 2],
    distance: (x, y, z) => {
      const qx = Math.abs(x) - hx;
      const qy = Math.abs(y) - hy;
      const qz = Math.abs(z) - hz;
      const ox = qx > 0 ? qx : 0;
      const oy = qy > 0 ? qy : 0;
      const oz = qz > 0 ? qz : 0;
      return Math.sqrt(ox * ox + oy * oy + oz * oz) + Math.min(Math.max(qx, qy, qz), 0) - round;
    },
  };
}

/** A round bar along x from 0 to `length`, edges rounded. */
export function bar(radius: number, length: number, round = 0.5): Shape {
  return {
    min: [0, -radius, -radius],
    max: [length, radius, radius],
    distance: (x, y, z) => {
      const qr = Math.sqrt(y * y + z * z) - radius + round;
      const qx = Math.abs(x - length / 2) - length / 2 + round;
      const or = qr > 0 ? qr : 0;
      const ox = qx > 0 ? qx : 0;
      return Math.min(Math.max(qr, qx), 0) + Math.sqrt(or * or + ox * ox) - round;
    },
  };
}

/** A ball flattened along y. */
export function blob(radius: number, flatten: number): Shape {
  return {
    min: [-radius, -radius * flatten, -radius],
    max: [radius, radius * flatten, radius],
    distance: (x, y, z) => (Math.sqrt(x * x + (y * y) / (flatten * flatten) + z * z) - radius) * flatten,
  };
}

/** A wire or cord through `points`, drawn as a smooth curve. */
export function cord(points: readonly Vec3[], radius: number): Shape {
  const path = smoothPath(points, 7);
  const low: [number, number, number] = [1e9, 1e9, 1e9];
  const high: [number, number, number] = [-1e9, -1e9, -1e9];
  for (const point of path)
    for (const k of [0, 1, 2] as const) {
      low[k] = Math.min(low[k], point[k] - radius);
      high[k] = Math.max(high[k], point[k] + radius);
    }
  const flat = new Float64Array(path.flat());
  const legs = path.length - 1;
  return {
    min: low,
    max: high,
    distance: (x, y, z) => {
      let best = 1e9;
      for (let leg = 0; leg < legs; leg += 1) {
        const at = leg * 3;
        const ax = flat[at] ?? 0;
        const ay = flat[at + 1] ?? 0;
        const az = flat[at + 2] ?? 0;
        const ex = (flat[at + 3] ?? 0) - ax;
        const ey = (flat[at + 4] ?? 0) - ay;
        const ez = (flat[at + 5] ?? 0) - az;
        const px = x - ax;
        const py = y - ay;
        const pz = z - az;
        let t = (px * ex + py * ey + pz * ez) / (ex * ex + ey * ey + ez * ez);
        t = t < 0 ? 0 : t > 1 ? 1 : t;
        const dx = px - ex * t;
        const dy = py - ey * t;
        const dz = pz - ez * t;
        const d = dx * dx + dy * dy + dz * dz;
        if (d < best) best = d;
      }
      return Math.sqrt(best) - radius;
    },
  };
}

/** Points on a Catmull-Rom curve through `points`. */
function smoothPath(points: readonly Vec3[], steps: number): Vec3[] {
  const at = (index: number): Vec3 => points[Math.min(Math.max(index, 0), points.length - 1)] ?? [0, 0, 0];
  const path: Vec3[] = [];
  for (let leg = 0; leg < points.length - 1; leg += 1)
    for (let step = 0; step < steps; step += 1)
      path.push(between(at(leg - 1), at(leg), at(leg + 1), at(leg + 2), step / steps));
  path.push(at(points.length - 1));
  return path;
}

function between(a: Vec3, b: Vec3, c: Vec3, d: Vec3, t: number): Vec3 {
  const one = (k: 0 | 1 | 2): number =>
    0.5 *
    (2 * b[k] +
      (c[k] - a[k]) * t +
      (2 * a[k] - 5 * b[k] + 4 * c[k] - d[k]) * t * t +
      (3 * b[k] - a[k] - 3 * c[k] + d[k]) * t * t * t);
  return [one(0), one(1), one(2)];
}
