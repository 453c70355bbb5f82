import { cloud2 } from '../optics/noise.ts';
import type { Relief } from '../optics/turned.ts';
import { smooth } from '../optics/vector.ts';

/** Rounded grooves along the axis, `count` round the turn, between two places (mm). */
export const flutes =
  (count: number, from: number, to: number, depthMm: number): Relief =>
  (d, x, angle) => {
    const within = smooth(from, from + 2.5, x) * smooth(to, to - 2.5, x);
    return within > 0 ? d + within * depthMm * (0.5 + 0.5 * Math.cos(angle * count)) ** 2 : d;
  };

/** Crossed cuts of a knurling wheel. `pitch` in turns of the cut per mm along the axis. */
export const knurl =
  (count: number, from: number, to: number, depthMm = 0.55, pitch = 1.1): Relief =>
  (d, x, angle, radius) => {
    const within = smooth(from, from + 1.2, x) * smooth(to, to - 1.2, x);
    if (within === 0 || radius < 17) return d;
    const a = angle * count;
    const cut = Math.max(Math.abs(Math.sin(a + x * pitch)), Math.abs(Math.sin(a - x * pitch)));
    return d + smooth(0.84, 1, cut) * depthMm * within;
  };

/** Facets planed along the axis: what is left of a round bar of radius `radiusMm`. */
export const facets =
  (count: number, from: number, to: number, radiusMm: number, depthMm: number): Relief =>
  (d, x, angle, radius) => {
    const within = smooth(from, from + 3, x) * smooth(to, to - 3, x);
    if (within === 0) return d;
    const step = (2 * Math.PI) / count;
    const off = angle - Math.round(angle / step) * step;
    return Math.max(d, radius * Math.cos(off) - radiusMm + depthMm * within);
  };

/** Holes through the wall, `count` round the turn, at a place along the axis; `outside` is the least radius they cut. */
export const holes =
  (count: number, at: number, radiusMm: number, wallRadiusMm: number, outside: number, turn = 0): Relief =>
  (d, x, angle, radius) => {
    if (radius < outside || Math.abs(x - at) > radiusMm + 3) return d;
    const step = (2 * Math.PI) / count;
    const off = angle - turn - Math.round((angle - turn) / step) * step;
    return Math.max(d, radiusMm - Math.hypot(x - at, off * wallRadiusMm));
  };

/** Height of an invented country wrapped round the bar, 0 to 1; seamless round the turn. */
export function country(x: number, angle: number, seed: number): number {
  const y = Math.cos(angle) * 1.15;
  const z = Math.sin(angle) * 1.15;
  return (cloud2(x * 0.03 + y, z + x * 0.008, 3, seed) + cloud2(x * 0.022 - z, y - x * 0.006, 3, seed + 7)) / 2;
}

/** How deep in a contour line a point is, 0 to 1; every fifth line is wider. */
export function contour(height: number, lines: number, slopePerMm: number, halfWidthMm: number): number {
  const level = height * lines;
  const nearest = Math.round(level);
  const off = Math.abs(level - nearest) / Math.max(slopePerMm * lines, 1e-4);
  const half = nearest % 5 === 0 ? halfWidthMm * 1.7 : halfWidthMm;
  return smooth(half, half * 0.35, off);
}

/** Several reliefs, one after the other. */
export const reliefs =
  (...parts: readonly Relief[]): Relief =>
  (d, x, angle, radius) =>
    parts.reduce((sofar, part) => part(sofar, x, angle, radius), d);
