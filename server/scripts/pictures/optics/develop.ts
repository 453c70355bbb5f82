import { hash, noise2 } from './noise.ts';
import type { Film, Scene } from './scene.ts';
import { Tracer } from './tracer.ts';
import { add, clamp, cross, dot, minus, times, unit, type Vec3 } from './vector.ts';

export interface PictureSize {
  width: number;
  height: number;
  /** Rays per picture point. */
  rays: number;
}

/** Exposes a scene: linear light per picture point, three values each. Rows may be drawn apart and put together. */
export function expose(scene: Scene, size: PictureSize, firstRow = 0, rowCount = size.height): Float32Array {
  const { width, height, rays } = size;
  const { camera } = scene;
  const forward = unit(minus(camera.at, camera.from));
  const level = unit(cross(forward, Math.abs(forward[1]) > 0.995 ? [0, 0, -1] : [0, 1, 0]));
  const roll = ((camera.rollDeg ?? 0) * Math.PI) / 180;
  const right = add(times(level, Math.cos(roll)), times(cross(level, forward), Math.sin(roll)));
  const up = cross(right, forward);
  const spread = Math.tan(((camera.fieldDeg / 2) * Math.PI) / 180) / Math.max(width, height);
  const sharpAt = dot(minus(camera.focus ?? camera.at, camera.from), forward);
  const tracer = new Tracer(scene);
  const light = new Float32Array(width * rowCount * 3);
  const seen: [number, number, number] = [0, 0, 0];
  for (let row = 0; row < rowCount; row += 1)
    for (let column = 0; column < width; column += 1) {
      const y = row + firstRow;
      const at = (row * width + column) * 3;
      for (let ray = 0; ray < rays; ray += 1) {
        const sample = (y * width + column) * 64 + ray;
        // A golden-ratio sequence, shifted per point, covers both the point and the opening evenly.
        const jx = (hash(column, y, 0, 5) + ray * 0.7548776662) % 1;
        const jy = (hash(column, y, 1, 5) + ray * 0.569840291) % 1;
        const u = (2 * (column + jx) - width) * spread;
        const v = (height - 2 * (y + jy)) * spread;
        const target = add(times(add(forward, add(times(right, u), times(up, v))), sharpAt), camera.from);
        let eye: Vec3 = camera.from;
        if (camera.openingMm > 0) {
          const radius = Math.sqrt((hash(column, y, 2, 5) + (ray + 0.5) / rays) % 1) * camera.openingMm;
          const angle = (hash(column, y, 3, 5) + ray * 0.618033989) * Math.PI * 2;
          eye = add(eye, add(times(right, Math.cos(angle) * radius), times(up, Math.sin(angle) * radius)));
        }
        const d = unit(minus(target, eye));
        tracer.see(eye[0], eye[1], eye[2], d[0], d[1], d[2], sample, seen);
        // One stray bright ray must not leave a white speck.
        for (const k of [0, 1, 2] as const) light[at + k] = (light[at + k] ?? 0) + Math.min(seen[k], 9) / rays;
      }
    }
  return light;
}

/** Exposed light as 8-bit sRGB: bleeding of bright places, white balance, darker corners, a soft shoulder, grain. */
export function develop(light: Float32Array, size: { width: number; height: number }, film: Film): Buffer {
  const { width, height } = size;
  const bled = film.bloom > 0 ? bleed(light, width, height) : null;
  const pixels = Buffer.alloc(width * height * 3);
  const grainScale = 1600 / Math.max(width, height);
  for (let y = 0; y < height; y += 1)
    for (let x = 0; x < width; x += 1) {
      const at = (y * width + x) * 3;
      const u = (x / width - 0.5) * 2;
      const v = (y / height - 0.5) * 2;
      const fall = 1 - film.vignette * clamp((u * u + v * v) * 0.5, 0, 1) ** 1.2;
      const grain = (noise2(x * 0.6 * grainScale, y * 0.6 * grainScale, 77) - 0.5) * film.grain * 3;
      for (const k of [0, 1, 2] as const) {
        let value = light[at + k] ?? 0;
        if (bled) value += (bled[at + k] ?? 0) * film.bloom;
        value *= film.exposure * fall * (k === 0 ? film.warmth : k === 2 ? 1 / film.warmth : 1);
        const toned = encode(shoulder(value)) * 255;
        pixels[at + k] = clamp(Math.round(toned + grain * (0.5 + 0.5 * Math.sin((Math.PI * toned) / 255))), 0, 255);
      }
    }
  return pixels;
}

/** Keeps darks and middles, rolls bright light off to white as film does (curve of K. Narkowicz, 2015; from memory). */
const shoulder = (value: number): number => {
  const v = value * 0.72;
  return clamp((v * (2.51 * v + 0.03)) / (v * (2.43 * v + 0.59) + 0.14), 0, 1);
};

const encode = (value: number): number => (value <= 0.0031308 ? value * 12.92 : 1.055 * value ** (1 / 2.4) - 0.055);

/** What spills over from the bright places, near and wide. */
function bleed(light: Float32Array, width: number, height: number): Float32Array {
  const bright = light.map((value) => Math.max(0, Math.min(value, 6) - 0.8));
  const scale = Math.max(width, height) / 1600;
  const near = blurred(bright, width, height, Math.max(1, Math.round(6 * scale)));
  const wide = blurred(near, width, height, Math.max(1, Math.round(44 * scale)));
  return near.map((value, at) => value * 0.4 + (wide[at] ?? 0));
}

/** Three box blurs of each row and column, close to a Gaussian. */
function blurred(source: Float32Array, width: number, height: number, radius: number): Float32Array {
  let from = source;
  for (let pass = 0; pass < 3; pass += 1) {
    from = boxed(from, width, height, radius, 3, width * 3);
    from = boxed(from, height, width, radius, width * 3, 3);
  }
  return from;
}

function boxed(
  from: Float32Array,
  length: number,
  lines: number,
  radius: number,
  step: number,
  lineStep: number,
): Float32Array {
  const to = new Float32Array(from.length);
  const share = 1 / (radius * 2 + 1);
  for (let line = 0; line < lines; line += 1)
    for (let k = 0; k < 3; k += 1) {
      const start = line * lineStep + k;
      let sum = 0;
      for (let at = -radius; at < length; at += 1) {
        if (at + radius < length) sum += from[start + (at + radius) * step] ?? 0;
        if (at - radius - 1 >= 0) sum -= from[start + (at - radius - 1) * step] ?? 0;
        if (at >= 0) to[start + at * step] = sum * share;
      }
    }
  return to;
}
