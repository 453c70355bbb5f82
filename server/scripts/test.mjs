// npm test: every check and every test on a throw-away cluster. The last line is the count and nothing else.
import { ensureChromium } from './chromium.mjs';
import { summaryLine, total } from './counts.mjs';
import { CHECKOUT } from './folders.mjs';
import { say } from './halt.mjs';
import { ensurePackages } from './packages.mjs';
import { runCheck, runSuite } from './run-stage.mjs';
import { runCommand } from './scope.mjs';
import { selectStages } from './stages.mjs';
import { throwAwayCluster } from './throw-away-cluster.mjs';

/** All stages together; each has its own limit below this one. */
const WHOLE_LIMIT_MS = 38 * 60_000;

/** @type {import('./counts.mjs').Counts[]} */
const results = [];

/**
 * @param {import('./stages.mjs').Stage} stage
 * @param {import('./counts.mjs').Counts} counts
 */
function record(stage, counts) {
  results.push(counts);
  const extra = [counts.skipped > 0 ? `${counts.skipped} skipped` : '', counts.note ?? ''].filter(Boolean).join(', ');
  say(
    `${counts.failed === 0 ? 'ok    ' : 'FAILED'}  ${stage.name} (${stage.part}): ${summaryLine(counts)}${extra ? `; ${extra}` : ''}`,
  );
}

/**
 * Runs the static checks two at a time and tells them in their order.
 * @param {import('./scope.mjs').Scope} scope
 * @param {readonly import('./stages.mjs').Stage[]} checks
 */
async function runChecks(scope, checks) {
  const waiting = [...checks];
  /** @type {Map<import('./stages.mjs').Stage, Awaited<ReturnType<typeof runCheck>>>} */
  const done = new Map();
  const worker = async () => {
    for (let check = waiting.shift(); check; check = waiting.shift()) done.set(check, await runCheck(scope, check));
  };
  await Promise.all([worker(), worker()]);
  for (const check of checks) {
    const result = done.get(check);
    if (!result) continue;
    if (result.counts.failed > 0) say(`\n${result.output}\n`);
    record(check, result.counts);
  }
}

/**
 * @param {import('./scope.mjs').Scope} scope
 * @param {readonly import('./stages.mjs').Stage[]} suites
 */
async function runSuites(scope, suites) {
  let adminUrl = '';
  for (const suite of suites) {
    try {
      if (suite.needsCluster) adminUrl ||= await throwAwayCluster(scope, 'test-run');
      if (suite.kind === 'playwright') await ensureChromium(scope);
      record(suite, await runSuite(scope, suite, suite.needsCluster ? { FERRULE_TEST_ADMIN_URL: adminUrl } : {}));
    } catch (error) {
      record(suite, { passed: 0, failed: 1, skipped: 0, note: error instanceof Error ? error.message : String(error) });
    }
  }
}

// Written last of all, after whatever the stopping of things may print.
process.on('exit', (code) => {
  const counts = total(results);
  if (code !== 0 && counts.failed === 0) counts.failed = 1;
  say(summaryLine(counts));
});

await runCommand(
  async (scope) => {
    const stages = selectStages(process.argv.slice(2));
    const tooLong = setTimeout(() => {
      say(`Stopped: the whole run took longer than ${WHOLE_LIMIT_MS / 60_000} minutes.`);
      process.kill(process.pid, 'SIGTERM');
    }, WHOLE_LIMIT_MS);
    await ensurePackages(scope, CHECKOUT);
    await runChecks(
      scope,
      stages.filter(({ kind }) => kind === 'check'),
    );
    await runSuites(
      scope,
      stages.filter(({ kind }) => kind !== 'check'),
    );
    clearTimeout(tooLong);
    return total(results).failed > 0 ? 1 : 0;
  },
  { signalCode: 130 },
);
