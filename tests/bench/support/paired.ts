/** One side of a comparison: runs a slice and answers its rate, in acts per second. */
export type Slice = () => Promise<number>;

export interface PairedRatio {
  /** Median of the ratios of neighbouring slices. */
  readonly median: number;
  readonly min: number;
  readonly max: number;
  readonly rounds: number;
  /** Median rate of each side, acts per second. */
  readonly ours: number;
  readonly theirs: number;
}

export const median = (values: readonly number[]): number => {
  const sorted = [...values].sort((one, other) => one - other);
  const middle = sorted.length >> 1;
  const upper = sorted[middle];
  if (upper === undefined) throw new Error('The median of nothing was asked for');
  return sorted.length % 2 === 1 ? upper : ((sorted[middle - 1] ?? upper) + upper) / 2;
};

/**
 * Alternates short slices of both sides, A B B A, so that a machine that slows down slows both. One ratio a pair; two
 * long runs one after the other would compare moments and not programs.
 */
export async function pairedRatio(ours: Slice, theirs: Slice, rounds: number): Promise<PairedRatio> {
  await ours();
  await theirs();
  const rates: { ours: number; theirs: number }[] = [];
  for (let round = 0; round < rounds; round += 1) {
    if (round % 2 === 0) {
      const first = await ours();
      rates.push({ ours: first, theirs: await theirs() });
    } else {
      const first = await theirs();
      rates.push({ ours: await ours(), theirs: first });
    }
  }
  const ratios = rates.map((pair) => pair.ours / pair.theirs);
  return {
    median: median(ratios),
    min: Math.min(...ratios),
    max: Math.max(...ratios),
    rounds,
    ours: median(rates.map((pair) => pair.ours)),
    theirs: median(rates.map((pair) => pair.theirs)),
  };
}

export type Verdict = 'met' | 'missed' | 'undecided';

/** A goal is met or missed only when every round says so, or when the spread is within a tenth of the median. */
export function verdictOf(
  spread: { readonly median: number; readonly min: number; readonly max: number },
  goal: { readonly atLeast: number } | { readonly atMost: number },
): Verdict {
  const passes = (value: number): boolean => ('atLeast' in goal ? value >= goal.atLeast : value <= goal.atMost);
  const agreed = passes(spread.min) === passes(spread.max);
  const narrow = spread.max - spread.min <= spread.median * 0.1;
  if (!agreed && !narrow) return 'undecided';
  return passes(spread.median) ? 'met' : 'missed';
}
