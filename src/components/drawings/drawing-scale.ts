/** The CSS inch is 96 pixels (CSS Values and Units 4), so a drawing has a true size on paper. */
export const PX_PER_MM = 96 / 25.4;

/**
 * The largest ratio of the series 1-2-5 (the enlargements and reductions that ISO 5455 recommends go on in this way)
 * that is not above `atMost`.
 */
export function standardRatio(atMost: number): number {
  const power = 10 ** Math.floor(Math.log10(atMost));
  const step = [5, 2, 1].find((candidate) => candidate * power <= atMost * (1 + 1e-9)) ?? 1;
  return step * power;
}

/** "200:1", "1:2". */
export const ratioInWords = (ratio: number): string =>
  ratio >= 1 ? `${+ratio.toPrecision(3)}:1` : `1:${+(1 / ratio).toPrecision(3)}`;
