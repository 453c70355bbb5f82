/** Repeatable noise: the same whole numbers and seed always give the same value, 0 to under 1. */
export function hash(x: number, y: number, z: number, seed: number): number {
  let h =
    Math.imul(x | 0, 374761393) ^
    Math.imul(y | 0, 668265263) ^
    Math.imul(z | 0, 1274126177) ^
    Math.imul(seed | 0, 1103515245);
  h = Math.imul(h ^ (h >>> 15), 2246822519);
  h = Math.imul(h ^ (h >>> 13), 3266489917);
  return ((h ^ (h >>> 16)) >>> 0) / 4294967296;
}

/** Smooth noise in space, 0 to 1, one cell per unit. */
export function noise3(x: number, y: number, z: number, seed: number): number {
  const ix = Math.floor(x);
  const iy = Math.floor(y);
  const iz = Math.floor(z);
  let u = x - ix;
  let v = y - iy;
  let w = z - iz;
  u = u * u * (3 - 2 * u);
  v = v * v * (3 - 2 * v);
  w = w * w * (3 - 2 * w);
  const low = plane(ix, iy, iz, u, v, seed);
  return low + (plane(ix, iy, iz + 1, u, v, seed) - low) * w;
}

/** Smooth noise in a plane, 0 to 1. */
export function noise2(x: number, y: number, seed: number): number {
  const ix = Math.floor(x);
  const iy = Math.floor(y);
  let u = x - ix;
  let v = y - iy;
  u = u * u * (3 - 2 * u);
  v = v * v * (3 - 2 * v);
  return plane(ix, iy, 0, u, v, seed);
}

function plane(ix: number, iy: number, iz: number, u: number, v: number, seed: number): number {
  const a = hash(ix, iy, iz, seed);
  const b = hash(ix + 1, iy, iz, seed);
  const c = hash(ix, iy + 1, iz, seed);
  const d = hash(ix + 1, iy + 1, iz, seed);
  const near = a + (b - a) * u;
  return near + (c + (d - c) * u - near) * v;
}

/** Several octaves of plane noise, about 0 to 1. */
export function cloud2(x: number, y: number, octaves: number, seed: number): number {
  let sum = 0;
  let weight = 0.5;
  let total = 0;
  for (let octave = 0; octave < octaves; octave += 1) {
    sum += weight * noise2(x, y, seed + octave);
    total += weight;
    weight *= 0.5;
    x = x * 2.03 + 17.7;
    y = y * 2.03 - 9.1;
  }
  return sum / total;
}

/** Several octaves of space noise, about 0 to 1. */
export function cloud3(x: number, y: number, z: number, octaves: number, seed: number): number {
  let sum = 0;
  let weight = 0.5;
  let total = 0;
  for (let octave = 0; octave < octaves; octave += 1) {
    sum += weight * noise3(x, y, z, seed + octave);
    total += weight;
    weight *= 0.5;
    x = x * 2.03 + 17.7;
    y = y * 2.03 - 9.1;
    z = z * 2.03 + 3.3;
  }
  return sum / total;
}

/** Distance to the nearest of scattered points, one point per cell: pebbles, grains. */
export function pebble2(x: number, y: number, seed: number): number {
  const ix = Math.floor(x);
  const iy = Math.floor(y);
  let best = 9;
  for (let cx = ix - 1; cx <= ix + 1; cx += 1)
    for (let cy = iy - 1; cy <= iy + 1; cy += 1) {
      const dx = cx + hash(cx, cy, 1, seed) - x;
      const dy = cy + hash(cx, cy, 2, seed) - y;
      const d = dx * dx + dy * dy;
      if (d < best) best = d;
    }
  return Math.sqrt(best);
}

/** A stream of repeatable numbers, 0 to under 1, for what is scattered by hand. */
export function stream(seed: number): () => number {
  let count = 0;
  return () => hash((count += 1), 0, 0, seed);
}
