import { EngineInputError } from '../engine-input-error.ts';
import { fitKindOf, type FitKind } from './limits.ts';

/** One measured diameter. */
export interface FitReading {
  readonly valueMm: number;
  /** Smallest step of the gauge. */
  readonly resolutionUm: number;
}

export interface SideSummary {
  readonly count: number;
  readonly minMm: number;
  readonly meanMm: number;
  readonly maxMm: number;
  /** Largest less smallest reading, micrometres: out-of-round and taper together. */
  readonly spreadUm: number;
  readonly resolutionUm: number;
}

export type Verdict = 'conforms' | 'does-not-conform' | 'cannot-be-decided';

export interface ClearanceInput {
  readonly hole: readonly FitReading[];
  readonly shaft: readonly FitReading[];
  /** Agreed clearance on diameter. */
  readonly clearanceMinUm: number;
  readonly clearanceMaxUm: number;
}

export interface ClearanceResult {
  readonly hole: SideSummary;
  readonly shaft: SideSummary;
  /** Smallest hole less largest shaft: what decides whether it goes together. */
  readonly worstPairUm: number;
  /** Largest hole less smallest shaft. */
  readonly loosestPairUm: number;
  readonly meanClearanceUm: number;
  /** Standard uncertainties by resolution, d / (2√3) each, and their root of squares. */
  readonly holeStandardUm: number;
  readonly shaftStandardUm: number;
  readonly standardUm: number;
  /** Expanded with k = 2. */
  readonly doubtUm: number;
  readonly kind: FitKind;
  readonly verdict: Verdict;
}

const summarise = (field: 'hole' | 'shaft', readings: readonly FitReading[]): SideSummary => {
  if (readings.length === 0) throw new EngineInputError(field, `There are no readings of the ${field}`);
  for (const { valueMm, resolutionUm } of readings) {
    if (!(valueMm > 0) || !Number.isFinite(valueMm)) throw new EngineInputError(field, 'A diameter is above zero');
    if (!(resolutionUm > 0)) throw new EngineInputError(field, 'A gauge has a smallest step above zero');
  }
  const values = readings.map((reading) => reading.valueMm);
  const minMm = Math.min(...values);
  const maxMm = Math.max(...values);
  return {
    count: values.length,
    minMm,
    maxMm,
    meanMm: values.reduce((sum, value) => sum + value, 0) / values.length,
    spreadUm: (maxMm - minMm) * 1000,
    // The coarsest gauge of a set speaks for the set.
    resolutionUm: Math.max(...readings.map((reading) => reading.resolutionUm)),
  };
};

/**
 * Standard uncertainty of a reading by the gauge's resolution d alone: a uniform distribution of half-width d / 2, so
 * d / (2√3) (JCGM 100:2008, F.2.2.1), micrometres.
 */
export const resolutionUncertaintyUm = (resolutionUm: number): number => resolutionUm / (2 * Math.sqrt(3));

/** Coverage factor of the expanded uncertainty (JCGM 100:2008, 6.3.3: about 95 of 100). */
export const COVERAGE_FACTOR = 2;

/**
 * Clearance of a joint from readings of both sides, with the decision rule of ISO 14253-1 on the worst pair, which is where
 * the parts touch first: it conforms inside the agreed range narrowed by the doubt, does not conform outside the range
 * widened by it, and between the two these readings cannot decide.
 *
 * @throws EngineInputError when a side has no readings or the agreed range is out of order
 */
export function assessClearance(input: ClearanceInput): ClearanceResult {
  const { clearanceMinUm, clearanceMaxUm } = input;
  if (!(clearanceMinUm <= clearanceMaxUm))
    throw new EngineInputError('clearanceMinUm', 'The least clearance is above the greatest');
  const hole = summarise('hole', input.hole);
  const shaft = summarise('shaft', input.shaft);
  const worstPairUm = (hole.minMm - shaft.maxMm) * 1000;
  const loosestPairUm = (hole.maxMm - shaft.minMm) * 1000;
  const holeStandardUm = resolutionUncertaintyUm(hole.resolutionUm);
  const shaftStandardUm = resolutionUncertaintyUm(shaft.resolutionUm);
  const standardUm = Math.hypot(holeStandardUm, shaftStandardUm);
  const doubtUm = COVERAGE_FACTOR * standardUm;
  return {
    hole,
    shaft,
    worstPairUm,
    loosestPairUm,
    meanClearanceUm: (hole.meanMm - shaft.meanMm) * 1000,
    holeStandardUm,
    shaftStandardUm,
    standardUm,
    doubtUm,
    kind: fitKindOf(worstPairUm, loosestPairUm),
    verdict: decide(worstPairUm, clearanceMinUm, clearanceMaxUm, doubtUm),
  };
}

function decide(worstUm: number, minUm: number, maxUm: number, doubtUm: number): Verdict {
  if (worstUm >= minUm + doubtUm && worstUm <= maxUm - doubtUm) return 'conforms';
  if (worstUm < minUm - doubtUm || worstUm > maxUm + doubtUm) return 'does-not-conform';
  return 'cannot-be-decided';
}
