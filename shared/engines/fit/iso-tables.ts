/**
 * ISO 286-1:2010 tables for nominal sizes above 0 to 180 mm, in micrometres. Rows are "over, up to and including". The
 * widths agree with i = 0.45 ∛D + 0.001 D and the deviations with the formulas of annex A after the standard's rounding;
 * tests hold both against published extracts.
 */
export const SIZE_STEPS_MM = [3, 6, 10, 18, 30, 50, 80, 120, 180] as const;

/** Standard tolerances IT5 to IT13 per size step. */
export const STANDARD_TOLERANCES_UM: readonly (readonly number[])[] = [
  [4, 6, 10, 14, 25, 40, 60, 100, 140],
  [5, 8, 12, 18, 30, 48, 75, 120, 180],
  [6, 9, 15, 22, 36, 58, 90, 150, 220],
  [8, 11, 18, 27, 43, 70, 110, 180, 270],
  [9, 13, 21, 33, 52, 84, 130, 210, 330],
  [11, 16, 25, 39, 62, 100, 160, 250, 390],
  [13, 19, 30, 46, 74, 120, 190, 300, 460],
  [15, 22, 35, 54, 87, 140, 220, 350, 540],
  [18, 25, 40, 63, 100, 160, 250, 400, 630],
];

/** IT4 per size step, needed for the delta of IT5 holes. */
export const IT4_UM = [3, 4, 4, 5, 6, 7, 8, 10, 12] as const;

export const FIRST_GRADE = 5;
export const LAST_GRADE = 13;

/** Size steps of the fundamental deviations; c, r and s divide the larger ones. */
export const DEVIATION_STEPS_MM = [3, 6, 10, 18, 30, 40, 50, 65, 80, 100, 120, 140, 160, 180] as const;

/** Fundamental deviation of shafts per step: `es` for c to h, `ei` for k (IT4 to IT7; otherwise 0) to s. */
export const SHAFT_DEVIATIONS_UM: Readonly<Record<string, readonly number[]>> = {
  c: [-60, -70, -80, -95, -110, -120, -130, -140, -150, -170, -180, -200, -210, -230],
  d: [-20, -30, -40, -50, -65, -80, -80, -100, -100, -120, -120, -145, -145, -145],
  e: [-14, -20, -25, -32, -40, -50, -50, -60, -60, -72, -72, -85, -85, -85],
  f: [-6, -10, -13, -16, -20, -25, -25, -30, -30, -36, -36, -43, -43, -43],
  g: [-2, -4, -5, -6, -7, -9, -9, -10, -10, -12, -12, -14, -14, -14],
  h: [0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0],
  k: [0, 1, 1, 1, 2, 2, 2, 2, 2, 3, 3, 3, 3, 3],
  m: [2, 4, 6, 7, 8, 9, 9, 11, 11, 13, 13, 15, 15, 15],
  n: [4, 8, 10, 12, 15, 17, 17, 20, 20, 23, 23, 27, 27, 27],
  p: [6, 12, 15, 18, 22, 26, 26, 32, 32, 37, 37, 43, 43, 43],
  r: [10, 15, 19, 23, 28, 34, 34, 41, 43, 51, 54, 63, 65, 68],
  s: [14, 19, 23, 28, 35, 43, 43, 53, 59, 71, 79, 92, 100, 108],
};
