import { spawn } from 'node:child_process';
import { readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { Halt } from './halt.mjs';
import { endLeftBehind, startTicks } from './process-table.mjs';
import { endChild, hasEnded } from './scope.mjs';

/** Longer than the application takes to let requests under way finish. */
const STOP_GRACE_MS = 15_000;
const READY_LIMIT_MS = 60_000;

/** What Node needs to run the server's TypeScript. */
export const TSX = ['--import', 'tsx'];

/** @param {Record<string, string | undefined>} env */
export const withTsx = (env) => ({ ...env, TSX_TSCONFIG_PATH: 'server/tsconfig.json' });

/**
 * Starts the application, noting who it is so that the next start finds it should this process be killed.
 * @param {import('./scope.mjs').Scope} scope
 * @param {{ checkout: string, folder: string, env: Record<string, string | undefined>, watch?: boolean }} options
 * @returns {import('node:child_process').ChildProcess}
 */
export function startServer(scope, { checkout, folder, env, watch = false }) {
  const follow = new URL('follow-parent.mjs', import.meta.url).href;
  const before = watch
    ? ['--watch-path=server', '--watch-path=shared', '--watch-preserve-output']
    : ['--import', follow];
  const child = spawn(process.execPath, [...before, ...TSX, 'server/index.ts'], {
    cwd: checkout,
    env: withTsx(env),
    stdio: watch ? ['ignore', 'inherit', 'inherit'] : ['ignore', 'inherit', 'inherit', 'ipc'],
    // Ctrl-C reaches the script alone, which ends application and database in that order.
    detached: true,
  });
  scope.add(async () => {
    await endChild(child, { graceMs: STOP_GRACE_MS, group: watch });
    rmSync(noteIn(folder), { force: true });
  });
  if (child.pid !== undefined)
    writeFileSync(noteIn(folder), JSON.stringify({ pid: child.pid, ticks: startTicks(child.pid) }));
  return child;
}

/** @param {string} folder */
const noteIn = (folder) => join(folder, 'application.json');

/**
 * Ends an application that a killed run left behind.
 * @param {string} folder
 */
export async function endEarlierServer(folder) {
  let note;
  try {
    note = JSON.parse(readFileSync(noteIn(folder), 'utf8'));
  } catch {
    return;
  }
  if (typeof note.pid === 'number' && typeof note.ticks === 'string')
    await endLeftBehind(note.pid, note.ticks, STOP_GRACE_MS);
  rmSync(noteIn(folder), { force: true });
}

/**
 * Waits until the application answers, first that it lives, then that it is ready.
 * @param {import('node:child_process').ChildProcess} child
 * @param {string} origin
 * @param {number} [limitMs]
 */
export async function waitHealthy(child, origin, limitMs = READY_LIMIT_MS) {
  for (const path of ['/healthz', '/readyz']) await waitForAnswer(child, `${origin}${path}`, limitMs);
}

/**
 * Waits until a child answers at an address with a success.
 * @param {import('node:child_process').ChildProcess} child
 * @param {string} url
 * @param {number} [limitMs]
 * @throws {Halt} when it ends first or takes too long
 */
export async function waitForAnswer(child, url, limitMs = READY_LIMIT_MS) {
  const end = Date.now() + limitMs;
  while (!(await answers(url))) {
    if (hasEnded(child))
      throw new Halt('The application ended while starting: see its message above. Nothing that was saved is lost.');
    if (Date.now() > end) throw new Halt(`Nothing answered at ${url} within ${limitMs / 1000} s.`);
    await pause(100);
  }
}

/** @param {string} url */
const answers = (url) =>
  fetch(url, { signal: AbortSignal.timeout(2000) }).then(
    (response) => response.ok,
    () => false,
  );
