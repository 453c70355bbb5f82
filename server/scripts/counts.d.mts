/**
 * @param {string | null} report text that vitest's json reporter wrote; null when it wrote none
 * @param {number} exitCode
 * @returns {Counts}
 */
export function countVitest(report: string | null, exitCode: number): Counts;
/**
 * @param {string | null} report text that Playwright's json reporter wrote; null when it wrote none
 * @param {number} exitCode
 * @returns {Counts}
 */
export function countPlaywright(report: string | null, exitCode: number): Counts;
/**
 * @param {string} report JSON of dependency-cruiser
 * @returns {{ ok: boolean, words: string }}
 */
export function judgeDependencies(report: string): {
  ok: boolean;
  words: string;
};
/** Fewer modules than the product has means that the tool did not see them, and its "no violations" says nothing. */
export const FEWEST_MODULES: 60;
export function total(all: readonly Counts[]): Counts;
export function summaryLine({ passed, failed }: Counts): string;
/**
 * Results of one stage. `skipped` is said but counts as neither.
 */
export type Counts = {
  passed: number;
  failed: number;
  skipped: number;
  note?: string;
};
