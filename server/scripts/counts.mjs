/**
 * Results of one stage. `skipped` is said but counts as neither.
 * @typedef {{ passed: number, failed: number, skipped: number, note?: string }} Counts
 */

/**
 * A suite that ended badly without naming a failed test, or that ran none at all, counts as one failure.
 * @param {Counts} counts
 * @param {number} exitCode
 * @returns {Counts}
 */
function judged(counts, exitCode) {
  if (counts.failed > 0) return counts;
  if (counts.passed === 0) return { ...counts, failed: 1, note: 'no test ran' };
  if (exitCode !== 0) return { ...counts, failed: 1, note: `ended with code ${exitCode} though no test failed` };
  return counts;
}

/**
 * @param {string | null} report text that vitest's json reporter wrote; null when it wrote none
 * @param {number} exitCode
 * @returns {Counts}
 */
export function countVitest(report, exitCode) {
  const parsed = parse(report);
  if (!parsed) return { passed: 0, failed: 1, skipped: 0, note: 'left no report' };
  // A file that could not be loaded holds no tests, and would go unseen in the count of tests.
  const broken = (parsed.testResults ?? []).filter(
    (/** @type {{ status: string, assertionResults: unknown[] }} */ file) =>
      file.status === 'failed' && file.assertionResults.length === 0,
  ).length;
  return judged(
    {
      passed: parsed.numPassedTests ?? 0,
      failed: (parsed.numFailedTests ?? 0) + broken,
      skipped: (parsed.numPendingTests ?? 0) + (parsed.numTodoTests ?? 0),
    },
    exitCode,
  );
}

/**
 * @param {string | null} report text that Playwright's json reporter wrote; null when it wrote none
 * @param {number} exitCode
 * @returns {Counts}
 */
export function countPlaywright(report, exitCode) {
  const parsed = parse(report);
  if (!parsed?.stats) return { passed: 0, failed: 1, skipped: 0, note: 'left no report' };
  const { expected, unexpected, flaky, skipped } = parsed.stats;
  // A test that passes only at the second try is not proven.
  return judged({ passed: expected, failed: unexpected + flaky, skipped }, exitCode);
}

/** Fewer modules than the product has means that the tool did not see them, and its "no violations" says nothing. */
export const FEWEST_MODULES = 60;

/**
 * @param {string} report JSON of dependency-cruiser
 * @returns {{ ok: boolean, words: string }}
 */
export function judgeDependencies(report) {
  const summary = parse(report)?.summary;
  if (!summary) return { ok: false, words: `dependency-cruiser gave no report:\n${report.slice(0, 2000)}` };
  const violations = summary.violations.map(
    (/** @type {{ rule: { name: string }, from: string, to: string }} */ found) =>
      `${found.rule.name}: ${found.from} -> ${found.to}`,
  );
  if (summary.totalCruised < FEWEST_MODULES)
    violations.push(`only ${summary.totalCruised} modules were seen, at least ${FEWEST_MODULES} are expected`);
  return { ok: violations.length === 0, words: [...violations, `${summary.totalCruised} modules seen`].join('\n') };
}

/**
 * @param {readonly Counts[]} all
 * @returns {Counts}
 */
export const total = (all) => ({
  passed: all.reduce((sum, { passed }) => sum + passed, 0),
  failed: all.reduce((sum, { failed }) => sum + failed, 0),
  skipped: all.reduce((sum, { skipped }) => sum + skipped, 0),
});

/** @param {Counts} counts */
export const summaryLine = ({ passed, failed }) => `${passed} passed, ${failed} failed`;

/**
 * @param {string | null} text
 * @returns {any}
 */
function parse(text) {
  try {
    return text === null ? null : JSON.parse(text);
  } catch {
    return null;
  }
}
