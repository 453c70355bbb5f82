import type { ClearanceResult } from './clearance.ts';

export interface Removal {
  /** What brings the worst pair to the middle of the agreed range. */
  readonly onDiameterUm: number;
  readonly perSideUm: number;
  /** Least and most that still leave the worst pair inside the range. */
  readonly leastOnDiameterUm: number;
  readonly mostOnDiameterUm: number;
  /** The worst pair after it. */
  readonly thenWorstPairUm: number;
  /** The loosest pair after it; above the range when the parts are further from round than the range is wide. */
  readonly thenLoosestPairUm: number;
  /** True when no size alone brings every pair inside: the parts have to become rounder first. */
  readonly spreadTooWide: boolean;
}

/**
 * What has to come off, on either part, to reach the agreed clearance. Taking it off the shaft or out of the hole opens
 * the joint alike. Nothing comes off a joint that is loose already.
 */
export function removalFor(
  result: ClearanceResult,
  range: { clearanceMinUm: number; clearanceMaxUm: number },
): Removal {
  const { worstPairUm, loosestPairUm } = result;
  const middleUm = (range.clearanceMinUm + range.clearanceMaxUm) / 2;
  const inRange = worstPairUm >= range.clearanceMinUm;
  const onDiameterUm = inRange ? 0 : middleUm - worstPairUm;
  return {
    onDiameterUm,
    perSideUm: onDiameterUm / 2,
    leastOnDiameterUm: Math.max(0, range.clearanceMinUm - worstPairUm),
    mostOnDiameterUm: Math.max(0, range.clearanceMaxUm - worstPairUm),
    thenWorstPairUm: worstPairUm + onDiameterUm,
    thenLoosestPairUm: loosestPairUm + onDiameterUm,
    spreadTooWide: loosestPairUm - worstPairUm > range.clearanceMaxUm - range.clearanceMinUm,
  };
}
