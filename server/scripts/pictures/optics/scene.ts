import type { Bench } from '../things/benches.ts';
import type { LightRig } from './light.ts';
import type { Solid } from './solid.ts';
import type { Vec3 } from './vector.ts';

export interface Camera {
  /** mm, y up, bench at 0. */
  from: Vec3;
  at: Vec3;
  /** Field of view over the longer side. */
  fieldDeg: number;
  /** Radius of the opening; 0 is sharp everywhere. */
  openingMm: number;
  /** What is sharp; `at` when left out. */
  focus?: Vec3;
  rollDeg?: number;
}

export interface Scene {
  camera: Camera;
  bench: Bench;
  light: LightRig;
  solids: readonly Solid[];
  /** How the light is turned into a print. */
  film: Film;
}

export interface Film {
  exposure: number;
  /** Multiplies red and divides blue: 1 is neutral, above is warmer. */
  warmth: number;
  vignette: number;
  /** How far bright things bleed, 0 to 1. */
  bloom: number;
  grain: number;
}

export const film = (change: Partial<Film> = {}): Film => ({
  exposure: 1,
  warmth: 1,
  vignette: 0.35,
  bloom: 0.08,
  grain: 1,
  ...change,
});
