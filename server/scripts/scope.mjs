import { spawn } from 'node:child_process';
import { say, wordsOf } from './halt.mjs';
import { waitUntil } from './process-table.mjs';

const GRACE_MS = 15_000;

/**
 * @param {import('node:child_process').ChildProcess} child
 * @returns {boolean}
 */
export const hasEnded = (child) => child.exitCode !== null || child.signalCode !== null;

/**
 * Asks a child to end, and kills it after the grace.
 * @param {import('node:child_process').ChildProcess} child
 * @param {{ signal?: NodeJS.Signals, graceMs?: number, group?: boolean }} [how] group: the child leads a process group, all of which is to end
 */
export async function endChild(child, { signal = 'SIGTERM', graceMs = GRACE_MS, group = false } = {}) {
  const send = (/** @type {NodeJS.Signals} */ which) => {
    try {
      if (child.pid !== undefined) process.kill(group ? -child.pid : child.pid, which);
    } catch {
      // It ended in between.
    }
  };
  if (!hasEnded(child)) send(signal);
  await waitUntil(() => hasEnded(child), graceMs);
  if (group || !hasEnded(child)) send('SIGKILL');
  await waitUntil(() => hasEnded(child), 5000);
}

/** What a run has started, ended in reverse order when the run ends. */
export class Scope {
  /** @type {(() => Promise<void>)[]} */
  #undo = [];
  #closed = false;

  /** @param {() => Promise<void>} undo */
  add(undo) {
    this.#undo.push(undo);
  }

  get closed() {
    return this.#closed;
  }

  async close() {
    this.#closed = true;
    // Something that was just being started may still be added while the rest ends.
    for (let undo = this.#undo.pop(); undo; undo = this.#undo.pop()) await undo().catch((error) => say(wordsOf(error)));
  }

  /**
   * Runs a program to its end; it ends with the scope.
   * @param {string} command
   * @param {readonly string[]} args
   * @param {import('node:child_process').SpawnOptions} [options]
   * @returns {Promise<number>} exit code; 1 when it was ended by a signal or could not be run
   */
  run(command, args, options = {}) {
    return new Promise((resolve) => {
      const child = spawn(command, args, { stdio: ['ignore', 'inherit', 'inherit'], ...options });
      child.once('error', (error) => {
        if (options.stdio !== 'ignore') say(`${command}: ${error.message}`);
        resolve(1);
      });
      child.once('exit', (code) => resolve(code ?? 1));
      this.add(() => endChild(child, { graceMs: 5000 }));
    });
  }
}

/**
 * Runs a command of this folder: undoes all it started at its end, at Ctrl-C and at SIGTERM, then leaves.
 * @param {(scope: Scope) => Promise<number>} work answers the exit code
 * @param {{ signalCode?: number, onFailure?: () => void }} [options] signalCode: exit code when asked to stop
 */
export async function runCommand(work, { signalCode = 0, onFailure } = {}) {
  const scope = new Scope();
  const asked = new Promise((resolve) => {
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => resolve(signalCode));
  });
  const done = work(scope).catch((error) => {
    // Steps that fail because they are being ended are no news.
    if (scope.closed) return signalCode;
    process.stderr.write(`${wordsOf(error)}\n`);
    onFailure?.();
    return 1;
  });
  const code = await Promise.race([done, asked]);
  await scope.close();
  process.exit(code);
}
