import type { Material } from '../optics/surface.ts';
import { solid, type Solid } from '../optics/solid.ts';
import { dome, outlineOf, swell, turned, type Corner, type Relief } from '../optics/turned.ts';
import { noise2 } from '../optics/noise.ts';
import { mix, shifted, smooth, type Frame } from '../optics/vector.ts';
import { BRASS, banded, colour, metal, walnut } from './materials.ts';
import { flutes, knurl } from './reliefs.ts';

/** Largest radius, mm: how high the axis lies above the bench. */
export const SALT_LANTERN_RADIUS_MM = 21;
const SHOULDER_MM = 36;
const SPIGOT_RADIUS_MM = 16;
const SPIGOT_MM = 16;

const agedBrass = (age: number, seed: number): Material =>
  metal({ tone: BRASS, rough: 0.2, marks: 0.5, age, ageTone: [0.13, 0.085, 0.035], seed });

export interface SpigotLook {
  /** Freshly cut: bright, even, a hair thinner. */
  turnedDown: boolean;
}

/** Section of the cap, one side of the axis. */
export const saltPommelOutline = (turnedDown: boolean): Corner[] =>
  outlineOf(
    [
      [0, 6],
      [1.5, 7.5],
      [3, 7.5],
      [4, 6],
      ...dome([5, 9], [25, 19]),
      [26, 17.6],
      [27.5, 17.6],
      [28.2, 19],
      [SHOULDER_MM, 19],
      [SHOULDER_MM, 15.4],
      [SHOULDER_MM + 1.5, 15.4],
      [SHOULDER_MM + 1.6, turnedDown ? SPIGOT_RADIUS_MM - 0.12 : SPIGOT_RADIUS_MM],
      [SHOULDER_MM + SPIGOT_MM, SPIGOT_RADIUS_MM],
    ],
    { radius: 12.5, depth: 15, from: 'end' },
  );

/** The lantern cap: a fluted dome, a ring, and the spigot that goes into the bore (towards +x). */
export function saltPommel(frame: Frame, look: SpigotLook = { turnedDown: false }): Solid {
  const neck = flutes(14, 7, 27, 1.1);
  const shape = turned(saltPommelOutline(look.turnedDown), { relief: neck, bevelMm: 0.5 });
  const skin = agedBrass(0.62, 301);
  const bright = metal({
    tone: BRASS,
    rough: look.turnedDown ? 0.12 : 0.22,
    marks: look.turnedDown ? 1 : 0.35,
    age: look.turnedDown ? 0 : 0.4,
    seed: 303,
  });
  return solid(frame, shape, (x, y, z, surface) => {
    if (x < SHOULDER_MM + 0.3) return skin(x, y, z, surface);
    bright(x, y, z, surface);
    if (look.turnedDown) return;
    // Rubbed on one side: bright scores along the axis, smeared metal at their ends.
    const angle = Math.atan2(z, y);
    const rub = smooth(0.75, 0.2, Math.abs(angle - 0.5)) * smooth(SHOULDER_MM + 2, SHOULDER_MM + 5, x);
    surface.rough -= rub * 0.1;
    surface.tiltY += rub * (((angle * 40) % 1) - 0.5) * 0.25;
    colour(surface, [surface.r + rub * 0.25, surface.g + rub * 0.22, surface.b + rub * 0.15]);
  });
}

const CAGE = { from: 134, to: 182 };

/** Section of the body, one side of the axis. */
export const SALT_BODY_OUTLINE: readonly Corner[] = outlineOf([
  [0, 19],
  [3, 19],
  [3.6, 18.2],
  [5, 18.2],
  [5.6, 19.6],
  [20, 19.6],
  [20.6, 18.2],
  [22, 18.2],
  [22.6, 19],
  [26, 19],
  [26.5, 17],
  ...swell([28, 16.6], [74, 17.4], 1.2),
  [74.4, 16.2],
  [77, 16.2],
  [77.4, 17.4],
  ...swell([78, 17.4], [122, 16.6], 1.2),
  [123, 17],
  [123.6, 20],
  [126, 21],
  [131, 21],
  [133, 19.4],
  [CAGE.from + 2, 18.4],
  [CAGE.to - 2, 18.4],
  [183, 19.4],
  [185, 21],
  [189, 21],
  [191, 18],
  ...swell([193, 17], [226, 18.6], -1.6),
  [227, 20],
  [234, 20],
  [235, 19],
  [235, 13],
  [234, 11.3],
  [200, 11.3],
  [200, 5],
  [60, 5],
  [60, 14.05],
  [17, 14.05],
  [17, SPIGOT_RADIUS_MM + 0.03],
  [1, SPIGOT_RADIUS_MM + 0.03],
  [0, SPIGOT_RADIUS_MM + 1],
]).slice(1, -1);

/** Body, grip, lantern cage and emitter; the bore is at x = 0. */
export function saltBody(frame: Frame, options: { lit?: boolean; age?: number; rubbed?: boolean } = {}): Solid {
  const { lit = false, age = 0.55, rubbed = false } = options;
  const pillars = 8;
  const knurling = knurl(22, 5.8, 19.8);
  const emitterFlutes = flutes(24, 195, 224, 0.7);
  const relief: Relief = (d, x, angle, radius) => {
    if (x > CAGE.from && x < CAGE.to && radius > 12) {
      // Windows between pillars, rounded ends, frosted tube behind.
      const turn = (angle / (2 * Math.PI)) * pillars;
      const arc = Math.abs(turn - Math.round(turn)) * ((2 * Math.PI) / pillars) * 18.4;
      const alongMm = Math.max(Math.abs(x - (CAGE.from + CAGE.to) / 2) - 15.5, 0);
      const window = Math.hypot(alongMm, arc) - 4.6;
      return Math.max(d, Math.min(-window, radius - 14.6));
    }
    if (x > 5.6 && x < 20) return knurling(d, x, angle, radius);
    if (x > 193 && x < 226 && radius > 14) return emitterFlutes(d, x, angle, radius);
    return d;
  };
  const brass = agedBrass(age, 311);
  const wood = walnut(319);
  const wire = metal({ tone: BRASS, rough: 0.16, marks: 0.3, age: 0.25, seed: 313 });
  const bore = metal({
    tone: [0.5, 0.36, 0.17],
    rough: 0.34,
    marks: 0.7,
    age: 0.5,
    ageTone: [0.1, 0.065, 0.03],
    seed: 315,
  });
  const bands = banded([
    [26.6, brass],
    [74.2, wood],
    [77.5, wire],
    [122.8, wood],
    [999, brass],
  ]);
  return solid(frame, turned(SALT_BODY_OUTLINE, { relief, bevelMm: 0.5 }), (x, y, z, surface) => {
    const radius = Math.hypot(y, z);
    if (x > CAGE.from && x < CAGE.to && radius < 15.2 && radius > 12.5) {
      colour(surface, [0.82, 0.74, 0.58], 0.9);
      surface.rough = 0.5;
      if (lit) {
        surface.glowR = 2.6;
        surface.glowG = 1.5;
        surface.glowB = 0.62;
      }
      return;
    }
    if (radius < 16.2 && x > 0.4 && x < 199) {
      bore(x, y, z, surface);
      if (!rubbed) return;
      // Where the spigot bound: a bright smear on one side, in short scores round the bore.
      const angle = Math.atan2(z, y) - 2.5;
      const off = Math.abs(angle - Math.round(angle / (2 * Math.PI)) * 2 * Math.PI);
      const edge = noise2(x * 0.9, angle * 9, 331) * 0.35;
      const rub = smooth(0.62 + edge, 0.34 + edge, off) * smooth(0.5, 2, x) * smooth(13 + edge * 6, 9, x);
      colour(surface, [mix(surface.r, 1, rub), mix(surface.g, 0.86, rub), mix(surface.b, 0.52, rub)]);
      surface.metal = mix(surface.metal, 0.6, rub);
      surface.rough = mix(surface.rough, 0.3, rub);
      surface.tiltX += rub * (noise2(x * 5, angle * 2, 333) - 0.5) * 0.3;
      return;
    }
    bands(x, y, z, surface);
  });
}

/** Cap and body together; `gapMm` draws the cap out of the bore. */
export function saltLantern(frame: Frame, options: { gapMm?: number; lit?: boolean; age?: number } = {}): Solid[] {
  const gap = options.gapMm ?? 0;
  return [saltBody(frame, options), saltPommel(shifted(frame, [-SHOULDER_MM - 0.12 - gap, 0, 0]))];
}
