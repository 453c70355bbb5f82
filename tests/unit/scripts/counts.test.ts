import { describe, expect, it } from 'vitest';
import {
  countPlaywright,
  countVitest,
  FEWEST_MODULES,
  judgeDependencies,
  summaryLine,
  total,
} from '../../../server/scripts/counts.mjs';
import { selectStages, STAGES } from '../../../server/scripts/stages.mjs';

const vitest = (over: object = {}): string =>
  JSON.stringify({
    numPassedTests: 5,
    numFailedTests: 0,
    numPendingTests: 1,
    numTodoTests: 0,
    testResults: [{ status: 'passed', assertionResults: [{}] }],
    ...over,
  });
const playwright = (stats: object): string =>
  JSON.stringify({ stats: { expected: 3, unexpected: 0, flaky: 0, skipped: 0, ...stats } });

describe('count of a vitest suite', () => {
  it.each([
    ['all passed', vitest(), 0, 5, 0],
    ['some failed', vitest({ numFailedTests: 2 }), 1, 5, 2],
    ['a file that could not be loaded', vitest({ testResults: [{ status: 'failed', assertionResults: [] }] }), 1, 5, 1],
    ['an error outside any test', vitest(), 1, 5, 1],
    ['no test at all', vitest({ numPassedTests: 0 }), 0, 0, 1],
    ['only skipped tests', vitest({ numPassedTests: 0, numPendingTests: 9 }), 0, 0, 1],
    ['no report', null, 0, 0, 1],
    ['half a report', '{"numPassed', 0, 0, 1],
  ])('%s', (_case, report, exitCode, passed, failed) => {
    expect(countVitest(report, exitCode)).toMatchObject({ passed, failed });
  });
});

describe('count of the browser tests', () => {
  it.each([
    ['all passed', playwright({}), 0, 3, 0],
    ['one failed', playwright({ unexpected: 1 }), 1, 3, 1],
    ['one passed at the second try', playwright({ flaky: 1 }), 0, 3, 1],
    ['set-up failed', playwright({ expected: 0 }), 1, 0, 1],
    ['no report', null, 1, 0, 1],
  ])('%s', (_case, report, exitCode, passed, failed) => {
    expect(countPlaywright(report, exitCode)).toMatchObject({ passed, failed });
  });
});

describe('dependency rules', () => {
  const report = (totalCruised: number, violations: object[] = []): string =>
    JSON.stringify({ summary: { totalCruised, violations } });
  it('fails on a violation, on too few modules and on no report', () => {
    expect(judgeDependencies(report(FEWEST_MODULES)).ok).toBe(true);
    expect(judgeDependencies(report(FEWEST_MODULES - 1)).ok).toBe(false);
    const broken = judgeDependencies(report(500, [{ rule: { name: 'no-circular' }, from: 'a.ts', to: 'b.ts' }]));
    expect(broken.ok).toBe(false);
    expect(broken.words).toContain('no-circular: a.ts -> b.ts');
    expect(judgeDependencies('Error: no such option').ok).toBe(false);
  });
});

describe('the whole run', () => {
  it('adds up', () => {
    const all = total([
      { passed: 1, failed: 0, skipped: 0 },
      { passed: 20, failed: 2, skipped: 3 },
    ]);
    expect(all).toEqual({ passed: 21, failed: 2, skipped: 3 });
    expect(summaryLine(all)).toBe('21 passed, 2 failed');
  });

  it('takes all stages, or those named in their order, and refuses others', () => {
    expect(selectStages([])).toBe(STAGES);
    expect(selectStages(['api', 'unit']).map(({ name }) => name)).toEqual(['unit', 'api']);
    expect(selectStages(['types'])).toHaveLength(4);
    expect(() => selectStages(['units'])).toThrow('There is no stage "units"');
  });
});
