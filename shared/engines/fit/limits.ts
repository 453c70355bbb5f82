import { EngineInputError } from '../engine-input-error.ts';
import {
  DEVIATION_STEPS_MM,
  FIRST_GRADE,
  IT4_UM,
  LAST_GRADE,
  SHAFT_DEVIATIONS_UM,
  SIZE_STEPS_MM,
  STANDARD_TOLERANCES_UM,
} from './iso-tables.ts';

/** Limit deviations from the nominal size, micrometres. */
export interface Limits {
  readonly upperUm: number;
  readonly lowerUm: number;
}

/** The step a size belongs to: a boundary size belongs to the lower one. */
function stepOf(nominalMm: number, steps: readonly number[]): number {
  const step = nominalMm > 0 ? steps.findIndex((limit) => nominalMm <= limit) : -1;
  if (step < 0)
    throw new EngineInputError('nominalMm', `The tables go from above 0 to 180 mm; ${nominalMm} mm is outside them`);
  return step;
}

/**
 * Standard tolerance of a grade, IT4 to IT13 (ISO 286-1:2010, table 1), micrometres.
 * @throws EngineInputError outside the table
 */
export function standardToleranceUm(nominalMm: number, grade: number): number {
  const step = stepOf(nominalMm, SIZE_STEPS_MM);
  if (grade === 4) return IT4_UM[step] ?? NaN;
  const tolerance = STANDARD_TOLERANCES_UM[step]?.[grade - FIRST_GRADE];
  if (tolerance === undefined)
    throw new EngineInputError('grade', `Grades IT4 to IT${LAST_GRADE} are carried; IT${grade} is not`);
  return tolerance;
}

/**
 * Limits of a tolerance class at a nominal size (ISO 286-1:2010, tables 2 to 5): holes `C` to `S`, shafts `c` to `s`,
 * `JS`/`js`. Holes follow from shafts: EI = −es for C to H; for K to N up to IT8 and P to S up to IT7 above 3 mm,
 * ES = −ei + Δ with Δ = ITn − IT(n−1); otherwise ES = −ei, and N of IT9 and coarser has ES = 0.
 *
 * @param toleranceClass for instance `H8` or `f7`
 * @throws EngineInputError for a class or size outside the tables
 */
export function limitsFor(toleranceClass: string, nominalMm: number): Limits {
  const match = /^([A-Za-z]{1,2})(\d{1,2})$/.exec(toleranceClass.trim());
  const letters = match?.[1] ?? '';
  const grade = Number(match?.[2]);
  const lower = letters.toLowerCase();
  const isHole = letters === letters.toUpperCase();
  if (!match || (letters !== lower && !isHole))
    throw new EngineInputError('toleranceClass', `${toleranceClass} is not a class such as H8 or f7`);
  const widthUm = standardToleranceUm(nominalMm, grade);
  if (lower === 'js') return { upperUm: widthUm / 2, lowerUm: -widthUm / 2 };
  const table = SHAFT_DEVIATIONS_UM[lower];
  if (!table)
    throw new EngineInputError('toleranceClass', `${toleranceClass} is not among the classes carried (C to S, c to s)`);
  const tabled = table[stepOf(nominalMm, DEVIATION_STEPS_MM)] ?? NaN;
  return isHole ? holeLimits(lower, grade, nominalMm, tabled, widthUm) : shaftLimits(lower, grade, tabled, widthUm);
}

const negated = (value: number): number => (value === 0 ? 0 : -value);

function shaftLimits(letter: string, grade: number, tabled: number, widthUm: number): Limits {
  if (letter <= 'h') return { upperUm: tabled, lowerUm: tabled - widthUm };
  const lowerUm = letter === 'k' && grade > 7 ? 0 : tabled;
  return { upperUm: lowerUm + widthUm, lowerUm };
}

function holeLimits(letter: string, grade: number, nominalMm: number, tabled: number, widthUm: number): Limits {
  if (letter <= 'h') return { upperUm: negated(tabled) + widthUm, lowerUm: negated(tabled) };
  const upperUm = upperOfTightHole(letter, grade, nominalMm, tabled, widthUm);
  return { upperUm, lowerUm: upperUm - widthUm };
}

function upperOfTightHole(letter: string, grade: number, nominalMm: number, tabled: number, widthUm: number): number {
  if (letter === 'n' && grade >= 9 && nominalMm > 3) return 0;
  if (letter === 'k' && grade > 8) return 0;
  const deltaApplies = nominalMm > 3 && grade <= (letter <= 'n' ? 8 : 7);
  const delta = deltaApplies ? widthUm - standardToleranceUm(nominalMm, grade - 1) : 0;
  return negated(tabled) + delta;
}

export interface FitLimits {
  readonly hole: Limits;
  readonly shaft: Limits;
  readonly minClearanceUm: number;
  readonly maxClearanceUm: number;
  readonly kind: FitKind;
}

/** ISO 286-1: by the limits, whatever single parts measure. */
export type FitKind = 'clearance' | 'transition' | 'interference';

export const fitKindOf = (minClearanceUm: number, maxClearanceUm: number): FitKind =>
  minClearanceUm >= 0 ? 'clearance' : maxClearanceUm <= 0 ? 'interference' : 'transition';

/** Clearances that two classes give at a nominal size, micrometres; negative is interference. */
export function fitOf(holeClass: string, shaftClass: string, nominalMm: number): FitLimits {
  const hole = limitsFor(holeClass, nominalMm);
  const shaft = limitsFor(shaftClass, nominalMm);
  const minClearanceUm = hole.lowerUm - shaft.upperUm;
  const maxClearanceUm = hole.upperUm - shaft.lowerUm;
  return { hole, shaft, minClearanceUm, maxClearanceUm, kind: fitKindOf(minClearanceUm, maxClearanceUm) };
}
