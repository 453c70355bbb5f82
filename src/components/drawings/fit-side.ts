/** One side of a joint as the drawings take it. Deviations are from the nominal size, in micrometres. */
export interface FitSide {
  /** The feature's name in the shop's words: "bore", "spigot". */
  name: string;
  /** Agreed limits with their label, as "H8"; null while none are agreed. */
  agreed: { label: string; lowerUm: number; upperUm: number } | null;
  readingsUm: readonly number[];
}

export interface WorstPair {
  holeMinUm: number;
  shaftMaxUm: number;
  /** Below zero is interference. */
  clearanceUm: number;
}

/** Smallest hole against largest shaft; null until both sides have a reading. */
export function worstPairOf(hole: FitSide, shaft: FitSide): WorstPair | null {
  if (hole.readingsUm.length === 0 || shaft.readingsUm.length === 0) return null;
  const holeMinUm = Math.min(...hole.readingsUm);
  const shaftMaxUm = Math.max(...shaft.readingsUm);
  return { holeMinUm, shaftMaxUm, clearanceUm: holeMinUm - shaftMaxUm };
}

export const worstPairInWords = ({ clearanceUm }: WorstPair): string =>
  clearanceUm < 0 ? `${Math.round(-clearanceUm)} µm interference` : `${Math.round(clearanceUm)} µm clearance`;

/** "+39", "0", "−25". */
export const signedUm = (valueUm: number): string => {
  const rounded = Math.round(valueUm);
  return rounded === 0 ? '0' : `${rounded > 0 ? '+' : '−'}${Math.abs(rounded)}`;
};

const sideInWords = ({ name, agreed, readingsUm }: FitSide): string[] => [
  agreed
    ? `${name} agreed ${agreed.label}: ${signedUm(agreed.lowerUm)} to ${signedUm(agreed.upperUm)} µm`
    : `${name}: nothing agreed`,
  readingsUm.length === 0
    ? `${name}: no readings`
    : `${name}, ${countOfReadings(readingsUm.length)}: ${signedUm(Math.min(...readingsUm))} to ${signedUm(Math.max(...readingsUm))} µm`,
];

export const countOfReadings = (count: number): string => `${count} ${count === 1 ? 'reading' : 'readings'}`;

/** The whole zone drawing in sentences. */
export function fitInWords(zeroLine: string, hole: FitSide, shaft: FitSide): string {
  const worst = worstPairOf(hole, shaft);
  const sentences = [
    `Deviations from ${zeroLine}`,
    ...sideInWords(hole),
    ...sideInWords(shaft),
    worst ? `worst pair: ${worstPairInWords(worst)}` : 'worst pair: not known yet',
  ];
  return sentences.map((sentence) => sentence.charAt(0).toUpperCase() + sentence.slice(1)).join('. ') + '.';
}
