import { cloud3 } from '../optics/noise.ts';
import { solid, type Solid } from '../optics/solid.ts';
import type { Material } from '../optics/surface.ts';
import { outlineOf, swell, turned, type Corner, type Relief } from '../optics/turned.ts';
import { mix, shifted, smooth, type Frame } from '../optics/vector.ts';
import { BRONZE, metal } from './materials.ts';
import { contour, country, knurl } from './reliefs.ts';

export const CARTOGRAPHER_RADIUS_MM = 20.5;
const SHOULDER_MM = 40;
const MAP = { from: 34, to: 176, seed: 61, lines: 22 };

/** How deep the engraver went at a point of the body, 0 to 1. */
function engraved(x: number, angle: number): number {
  const height = country(x, angle, MAP.seed);
  const slope = Math.hypot(
    (country(x + 0.4, angle, MAP.seed) - height) / 0.4,
    (country(x, angle + 0.022, MAP.seed) - height) / 0.4,
  );
  return (
    contour(height, MAP.lines, slope, 0.34) * smooth(MAP.from, MAP.from + 0.6, x) * smooth(MAP.to, MAP.to - 0.6, x)
  );
}

export type Patina = 'bare' | 'half' | 'full';

/** Bronze that was darkened and rubbed back: brown on the flats, green where it is deep. `depth` 0 to 1. */
function bronze(patina: Patina, seed: number, depth: (x: number, y: number, z: number) => number): Material {
  const bare = metal({ tone: BRONZE, rough: 0.2, marks: 0.5, seed });
  return (x, y, z, surface) => {
    bare(x, y, z, surface);
    const cloud = cloud3(x * 0.08, y * 0.08, z * 0.08, 4, seed + 3);
    const deep = depth(x, y, z);
    const front = 96 + (cloud - 0.5) * 60;
    const done = patina === 'full' ? 1 : patina === 'bare' ? 0 : smooth(front + 9, front - 9, x);
    const brown = done * smooth(0.25, 0.62, cloud + 0.12) * 0.82;
    const green = done * Math.min(1, deep * 0.85 + smooth(0.62, 0.74, cloud) * 0.7);
    surface.r = mix(surface.r, 0.17, brown);
    surface.g = mix(surface.g, 0.085, brown);
    surface.b = mix(surface.b, 0.04, brown);
    surface.rough = mix(surface.rough, 0.36, brown);
    surface.r = mix(surface.r, 0.11, green);
    surface.g = mix(surface.g, 0.27, green);
    surface.b = mix(surface.b, 0.22, green);
    surface.metal = 1 - green * 0.85 - brown * 0.2;
    surface.rough = mix(surface.rough, 0.75, green);
    surface.streak *= 1 - done * 0.6;
    if (patina !== 'full') {
      const cut = deep * (1 - done);
      surface.r *= 1 - cut * 0.75;
      surface.g *= 1 - cut * 0.8;
      surface.b *= 1 - cut * 0.8;
    }
  };
}

/** Section of the body, one side of the axis. */
export const CARTOGRAPHER_BODY_OUTLINE: readonly Corner[] = outlineOf([
  [0, 19],
  [4, 20.5],
  [9, 20.5],
  [11, 18.6],
  [14, 18.6],
  [15, 19.4],
  [27, 19.4],
  [28, 18.4],
  [31, 18.4],
  [32, 19.2],
  ...swell([34, 18.6], [176, 18.6], -0.9, 24),
  [178, 19.2],
  [180, 18.2],
  [183, 18.2],
  [185, 20.5],
  [190, 20.5],
  [192, 18.4],
  ...swell([194, 17.6], [212, 17.6], -1.2, 8),
  [214, 19.6],
  [234, 19.6],
  [234, 14],
  [232, 11.3],
  [190, 11.3],
  [190, 4],
  [90, 4],
  [90, 14],
  [17, 14],
  [17, 15.55],
  [1, 15.55],
  [0, 16.4],
]).slice(1, -1);

/** Body with the engraved country and a crenellated mouth; the bore is at x = 0. */
export function cartographerBody(frame: Frame, patina: Patina): Solid {
  const rope = knurl(26, 15.4, 26.6, 0.45, 0.9);
  const relief: Relief = (d, x, angle, radius) => {
    if (x > MAP.from && x < MAP.to && radius > 16) return d < 0.6 ? d + 0.42 * engraved(x, angle) : d - 0.1;
    if (x > 15 && x < 27 && radius > 16) return rope(d, x, angle, radius);
    if (x > 220 && radius > 11) {
      const step = Math.PI / 3;
      const off = Math.abs(angle - Math.round(angle / step) * step) * 19;
      return Math.max(d, Math.min(4.2 - off, x - 226));
    }
    return d;
  };
  const skin = bronze(patina, 601, (x, y, z) =>
    x > MAP.from && x < MAP.to
      ? engraved(x, Math.atan2(z, y))
      : x < 212 && x > 1
        ? smooth(18.9, 18.2, Math.hypot(y, z)) * smooth(0.3, 0.6, cloud3(x * 0.2, y * 0.2, z * 0.2, 3, 605)) * 0.7
        : 0,
  );
  const inside = metal({ tone: BRONZE, rough: 0.2, marks: 0.7, seed: 603 });
  return solid(frame, turned(CARTOGRAPHER_BODY_OUTLINE, { relief, bevelMm: 0.5 }), (x, y, z, surface) =>
    (Math.hypot(y, z) < 15.8 && x > 1 ? inside : skin)(x, y, z, surface),
  );
}

/** A globe with meridians; the spigot points to +x. `eased` is polished after the rework. */
export function cartographerPommel(frame: Frame, patina: Patina, eased: boolean): Solid {
  const globe = Array.from({ length: 20 }, (_, step): Corner => {
    const a = 0.28 + (step / 19) * 2.2;
    return [17 - 17.5 * Math.cos(a), 19.2 * Math.sin(a)];
  });
  const outline = outlineOf(
    [
      ...globe,
      [30, 15.5],
      [32, 15.5],
      [33, 19],
      [SHOULDER_MM, 19],
      [SHOULDER_MM, 15],
      [SHOULDER_MM + 1.6, 15],
      [SHOULDER_MM + 1.7, 15.5],
      [SHOULDER_MM + 15, 15.5],
    ],
    { radius: 12, depth: 14, from: 'end' },
  );
  const meridian = (x: number, angle: number): number => {
    const step = Math.PI / 6;
    const off = Math.abs(angle - Math.round(angle / step) * step) * 18;
    const parallel = Math.min(Math.abs(x - 17), Math.abs(x - 9), Math.abs(x - 24.5));
    return x > 3 && x < 29 ? Math.max(smooth(0.5, 0.2, off), smooth(0.5, 0.2, parallel)) : 0;
  };
  const skin = bronze(patina, 611, (x, y, z) => meridian(x, Math.atan2(z, y)));
  const spigot = metal({
    tone: BRONZE,
    rough: eased ? 0.09 : 0.24,
    marks: eased ? 0.35 : 0.6,
    age: eased ? 0 : 0.5,
    ageTone: [0.16, 0.08, 0.04],
    seed: 613,
  });
  return solid(
    frame,
    turned(outline, { relief: (d, x, angle) => (d < 0.6 ? d + 0.4 * meridian(x, angle) : d - 0.1), bevelMm: 0.45 }),
    (x, y, z, surface) => {
      if (x < SHOULDER_MM + 0.2) return skin(x, y, z, surface);
      spigot(x, y, z, surface);
      if (eased) return;
      const angle = Math.atan2(z, y);
      const score = smooth(0.9, 0.3, Math.abs(angle + 0.4)) * smooth(0.35, 0.65, Math.sin(angle * 46) * 0.5 + 0.5);
      surface.r = mix(surface.r, 0.8, score * 0.7);
      surface.g = mix(surface.g, 0.6, score * 0.7);
      surface.b = mix(surface.b, 0.38, score * 0.7);
      surface.tiltY += score * 0.2;
    },
  );
}

export const cartographer = (frame: Frame, options: { patina?: Patina; gapMm?: number } = {}): Solid[] => [
  cartographerBody(frame, options.patina ?? 'full'),
  cartographerPommel(
    shifted(frame, [-SHOULDER_MM - 0.12 - (options.gapMm ?? 0), 0, 0]),
    options.patina ?? 'full',
    false,
  ),
];
