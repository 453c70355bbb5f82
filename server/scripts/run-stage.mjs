import { spawn } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { countPlaywright, countVitest, judgeDependencies } from './counts.mjs';
import { CHECKOUT } from './folders.mjs';
import { endChild } from './scope.mjs';

/** @typedef {import('./counts.mjs').Counts} Counts */
/** @typedef {import('./stages.mjs').Stage} Stage */

/**
 * Runs Node on a stage's arguments in a process group of its own, all of which is ended at the limit of time.
 * @param {import('./scope.mjs').Scope} scope
 * @param {Stage} stage
 * @param {{ args?: readonly string[], env?: Record<string, string | undefined>, capture: boolean }} how
 * @returns {Promise<{ code: number, output: string, late: boolean }>}
 */
function runNode(scope, stage, { args = stage.args, env = {}, capture }) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, [...args], {
      cwd: CHECKOUT,
      env: { ...process.env, CI: process.env['CI'] ?? 'true', ...env },
      stdio: capture ? ['ignore', 'pipe', 'pipe'] : ['ignore', 'inherit', 'inherit'],
      detached: true,
    });
    let output = '';
    let late = false;
    for (const stream of [child.stdout, child.stderr])
      stream?.setEncoding('utf8').on('data', (part) => (output += part));
    const stop = () => endChild(child, { graceMs: 5000, group: true });
    scope.add(stop);
    const timer = setTimeout(() => {
      late = true;
      void stop();
    }, stage.limitMs);
    child.once('error', (error) => (output += error.message));
    child.once('close', (code) => {
      clearTimeout(timer);
      resolve({ code: code ?? 1, output, late });
    });
  });
}

/**
 * A static check: one pass or one failure. What it printed is kept, so that checks can run side by side.
 * @param {import('./scope.mjs').Scope} scope
 * @param {Stage} stage
 * @returns {Promise<{ counts: Counts, output: string }>}
 */
export async function runCheck(scope, stage) {
  const { code, output, late } = await runNode(scope, stage, { capture: true });
  const judged = stage.name === 'dependencies' ? judgeDependencies(output) : { ok: code === 0, words: output };
  const ok = judged.ok && !late;
  return {
    counts: {
      passed: ok ? 1 : 0,
      failed: ok ? 0 : 1,
      skipped: 0,
      ...(late ? { note: 'stopped at its limit of time' } : {}),
    },
    output: judged.words.trim(),
  };
}

/**
 * A suite of tests, counted from its JSON report.
 * @param {import('./scope.mjs').Scope} scope
 * @param {Stage} stage
 * @param {Record<string, string | undefined>} env
 * @returns {Promise<Counts>}
 */
export async function runSuite(scope, stage, env) {
  const folder = mkdtempSync(join(tmpdir(), 'ferrule-report-'));
  const report = join(folder, 'report.json');
  const args = stage.kind === 'vitest' ? [...stage.args, `--outputFile.json=${report}`] : stage.args;
  const { code, late } = await runNode(scope, stage, {
    args,
    env: { ...env, PLAYWRIGHT_JSON_OUTPUT_FILE: report },
    capture: false,
  });
  let text = null;
  try {
    text = readFileSync(report, 'utf8');
  } catch {
    // Counted as a crash.
  }
  rmSync(folder, { recursive: true, force: true });
  const counts = stage.kind === 'vitest' ? countVitest(text, code) : countPlaywright(text, code);
  return late ? { ...counts, failed: counts.failed || 1, note: 'stopped at its limit of time' } : counts;
}
