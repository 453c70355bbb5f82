import { EngineInputError } from '../engine-input-error.ts';

export interface ThreePoint {
  readonly hopeful: number;
  readonly likely: number;
  readonly bad: number;
}

/** Mean of a three-point estimate, (a + 4m + b) / 6 (Malcolm, Roseboom, Clark and Fazar 1959), in the estimate's unit. */
export function pertMean({ hopeful, likely, bad }: ThreePoint): number {
  if (!(hopeful <= likely && likely <= bad))
    throw new EngineInputError('likely', 'Estimates must be in order: hopeful, likely, bad');
  return (hopeful + 4 * likely + bad) / 6;
}

/** Its variance, ((b − a) / 6)², in the unit squared. */
export const pertVariance = ({ hopeful, bad }: ThreePoint): number => ((bad - hopeful) / 6) ** 2;

/** Standard normal quantile of 0.9 (0.1 by symmetry): between the two lie 8 cases of 10. */
export const Z_90 = 1.2815515655446004;
