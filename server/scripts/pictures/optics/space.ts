import type { Solid } from './solid.ts';
import { place } from './vector.ts';

const TOUCH_MM = 0.02;

/** The things of a scene, asked where rays meet them. It keeps the last answer, so one space serves one tracer. */
export class Space {
  readonly #bounds: readonly Bound[];
  hitSolid: Solid | null = null;
  /** How far along the ray, mm; the limit when nothing was met. */
  hitAt = 0;

  constructor(solids: readonly Solid[]) {
    this.#bounds = solids.map(boundOf);
  }

  /** Nearest thing along a ray, left in `hitSolid` and `hitAt`. */
  meet(ox: number, oy: number, oz: number, dx: number, dy: number, dz: number, limit: number): void {
    this.hitSolid = null;
    let nearest = limit;
    for (const { one, cx, cy, cz, reach } of this.#bounds) {
      if (misses(cx - ox, cy - oy, cz - oz, dx, dy, dz, reach)) continue;
      const { x, y, z, origin } = one.frame;
      const ex = ox - origin[0];
      const ey = oy - origin[1];
      const ez = oz - origin[2];
      const lx = ex * x[0] + ey * x[1] + ez * x[2];
      const ly = ex * y[0] + ey * y[1] + ez * y[2];
      const lz = ex * z[0] + ey * z[1] + ez * z[2];
      const mx = dx * x[0] + dy * x[1] + dz * x[2];
      const my = dx * y[0] + dy * y[1] + dz * y[2];
      const mz = dx * z[0] + dy * z[1] + dz * z[2];
      if (!slab(one, lx, ly, lz, mx, my, mz, 0.3)) continue;
      let t = Math.max(slabNear, 0);
      const end = Math.min(slabFar, nearest);
      for (let step = 0; step < 160 && t < end; step += 1) {
        const d = one.distance(lx + mx * t, ly + my * t, lz + mz * t);
        if (d < TOUCH_MM) {
          nearest = t;
          this.hitSolid = one;
          break;
        }
        t += d * one.stride;
      }
    }
    this.hitAt = nearest;
  }

  /** Share of a pane or rod that is seen past the things in between, 0 to 1. */
  sight(ox: number, oy: number, oz: number, dx: number, dy: number, dz: number, limit: number, crisp: number): number {
    let seen = 1;
    for (const { one, cx, cy, cz, reach } of this.#bounds) {
      if (!one.opaque) continue;
      const ax = cx - ox;
      const ay = cy - oy;
      const az = cz - oz;
      const away = Math.sqrt(ax * ax + ay * ay + az * az);
      // The farther the thing, the wider its soft edge.
      const edge = Math.min(Math.min(away + 40, limit) / crisp, 95);
      if (misses(ax, ay, az, dx, dy, dz, reach + edge)) continue;
      const { x, y, z, origin } = one.frame;
      const ex = ox - origin[0];
      const ey = oy - origin[1];
      const ez = oz - origin[2];
      const lx = ex * x[0] + ey * x[1] + ez * x[2];
      const ly = ex * y[0] + ey * y[1] + ez * y[2];
      const lz = ex * z[0] + ey * z[1] + ez * z[2];
      const mx = dx * x[0] + dy * x[1] + dz * x[2];
      const my = dx * y[0] + dy * y[1] + dz * y[2];
      const mz = dx * z[0] + dy * z[1] + dz * z[2];
      if (!slab(one, lx, ly, lz, mx, my, mz, edge)) continue;
      let t = Math.max(slabNear, 0.2);
      const end = Math.min(slabFar, limit);
      for (let step = 0; step < 48 && t < end; step += 1) {
        const d = one.distance(lx + mx * t, ly + my * t, lz + mz * t);
        const clear = (crisp * d) / (t + 1);
        if (clear < seen) seen = clear;
        if (seen < 0.01) return 0;
        t += Math.max(d * one.stride, 0.15);
      }
    }
    return seen * seen * (3 - 2 * seen);
  }

  /** 1 in the open, towards 0 in corners and where things touch. */
  openness(px: number, py: number, pz: number, nx: number, ny: number, nz: number): number {
    let closed = 0;
    for (const { one, cx, cy, cz, reach } of this.#bounds) {
      if (!one.opaque) continue;
      if ((cx - px) ** 2 + (cy - py) ** 2 + (cz - pz) ** 2 > (reach + 41) ** 2) continue;
      const { x, y, z, origin } = one.frame;
      const ex = px - origin[0];
      const ey = py - origin[1];
      const ez = pz - origin[2];
      const lx = ex * x[0] + ey * x[1] + ez * x[2];
      const ly = ex * y[0] + ey * y[1] + ez * y[2];
      const lz = ex * z[0] + ey * z[1] + ez * z[2];
      const away = Math.max(
        one.min[0] - lx,
        lx - one.max[0],
        one.min[1] - ly,
        ly - one.max[1],
        one.min[2] - lz,
        lz - one.max[2],
      );
      if (away > 41) continue;
      const mx = nx * x[0] + ny * x[1] + nz * x[2];
      const my = nx * y[0] + ny * y[1] + nz * y[2];
      const mz = nx * z[0] + ny * z[1] + nz * z[2];
      for (let h = 1.2, weight = 0.5; h < 40; h *= 2.4, weight *= 0.82) {
        const d = one.distance(lx + mx * h, ly + my * h, lz + mz * h);
        if (d < h) closed += ((h - Math.max(d, 0)) / h) * weight * 0.55;
      }
    }
    // The bench closes off what lies low and looks down.
    for (let h = 2; py > 0.01 && h < 40; h *= 3) {
      const d = py + ny * h;
      if (d < h) closed += ((h - Math.max(d, 0)) / h) * 0.16;
    }
    return closed > 0.94 ? 0.06 : 1 - closed;
  }
}

/** A thing with the ball round it, so that most rays are done with it at once. */
interface Bound {
  one: Solid;
  cx: number;
  cy: number;
  cz: number;
  reach: number;
}

function boundOf(one: Solid): Bound {
  const { min, max } = one;
  const [cx, cy, cz] = place(one.frame, [(min[0] + max[0]) / 2, (min[1] + max[1]) / 2, (min[2] + max[2]) / 2]);
  return { one, cx, cy, cz, reach: Math.hypot(max[0] - min[0], max[1] - min[1], max[2] - min[2]) / 2 + 0.4 };
}

/** Whether a ray passes a ball whose centre lies at (ax, ay, az) from the ray's start. */
function misses(ax: number, ay: number, az: number, dx: number, dy: number, dz: number, reach: number): boolean {
  const ahead = ax * dx + ay * dy + az * dz;
  const square = ax * ax + ay * ay + az * az;
  return square > reach * reach && (ahead < 0 || square - ahead * ahead > reach * reach);
}

let slabNear = 0;
let slabFar = 0;

/** Whether a ray in a thing's own axes passes its box, grown by `grow`; sets `slabNear` and `slabFar`. */
function slab(
  one: Solid,
  lx: number,
  ly: number,
  lz: number,
  mx: number,
  my: number,
  mz: number,
  grow: number,
): boolean {
  slabNear = -1e9;
  slabFar = 1e9;
  return (
    cutSlab(lx, mx, one.min[0] - grow, one.max[0] + grow) &&
    cutSlab(ly, my, one.min[1] - grow, one.max[1] + grow) &&
    cutSlab(lz, mz, one.min[2] - grow, one.max[2] + grow) &&
    slabFar > 0
  );
}

function cutSlab(from: number, direction: number, low: number, high: number): boolean {
  if (Math.abs(direction) < 1e-9) return from > low && from < high;
  const a = (low - from) / direction;
  const b = (high - from) / direction;
  slabNear = Math.max(slabNear, Math.min(a, b));
  slabFar = Math.min(slabFar, Math.max(a, b));
  return slabNear < slabFar;
}
