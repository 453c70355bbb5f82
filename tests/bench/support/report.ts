import type { PairedRatio, Verdict } from './paired.ts';

/** One printed line: what was measured, the figure with its spread, and the goal. */
export interface Line {
  readonly what: string;
  readonly figure: string;
  readonly detail?: string;
  readonly goal?: string;
  readonly verdict?: Verdict;
}

export const ratioWords = (ratio: { median: number; min: number; max: number }): string =>
  `${ratio.median.toFixed(2)} [${ratio.min.toFixed(2)}-${ratio.max.toFixed(2)}]`;

export const rateWords = (ratio: PairedRatio, unit: string): string =>
  `${Math.round(ratio.ours)} against ${Math.round(ratio.theirs)} ${unit}, ${ratio.rounds} pairs`;

/** A Markdown table, so that what is printed can be kept as it is. */
export function printTable(title: string, lines: readonly Line[]): void {
  const rows = lines.map((line) => [line.what, line.figure, line.detail ?? '', line.goal ?? '', line.verdict ?? '']);
  const table = [['measured', 'figure', 'detail', 'goal', 'goal is'], ['---', '---', '---', '---', '---'], ...rows];
  process.stdout.write(`\n### ${title}\n\n${table.map((row) => `| ${row.join(' | ')} |`).join('\n')}\n`);
}
