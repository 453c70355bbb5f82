import { existsSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { Halt } from './halt.mjs';
import { processesIn, waitUntil } from './process-table.mjs';

/**
 * What PostgreSQL wrote about the server of a data folder.
 * @param {string} text of postmaster.pid
 * @returns {{ pid: number, port: number, ready: boolean }}
 */
export function parsePostmaster(text) {
  const lines = text.split('\n').map((line) => line.trim());
  return { pid: Number(lines[0]), port: Number(lines[3]), ready: lines[7] === 'ready' };
}

/**
 * @param {string} dataFolder
 * @returns {ReturnType<typeof parsePostmaster> | null} null when there is no such file
 */
export function readPostmaster(dataFolder) {
  try {
    return parsePostmaster(readFileSync(join(dataFolder, 'postmaster.pid'), 'utf8'));
  } catch {
    return null;
  }
}

/**
 * @param {string} dataFolder
 * @returns {ReturnType<typeof parsePostmaster> | null} the server that runs on that folder now
 */
export function livingPostmaster(dataFolder) {
  const written = readPostmaster(dataFolder);
  return written && processesIn(dataFolder).includes(written.pid) ? written : null;
}

/**
 * Ends a server that an earlier run left behind, waits for orphaned backends, and removes a postmaster.pid whose number
 * belongs to a stranger or to a dead process that nobody has reaped: PostgreSQL takes both for a running server.
 * @param {string} dataFolder
 * @throws {Halt} when something still works on the data: starting then would damage it
 */
export async function clearLeftovers(dataFolder) {
  const living = livingPostmaster(dataFolder);
  // SIGINT is PostgreSQL's fast shutdown: sessions are ended, everything committed is on disk.
  if (living) process.kill(living.pid, 'SIGINT');
  const quiet = await waitUntil(() => processesIn(dataFolder).length === 0, 30_000);
  if (!quiet)
    throw new Halt(
      `A PostgreSQL process (${processesIn(dataFolder).join(', ')}) still works on ${dataFolder} and does not end. End it, then start again.`,
    );
  const written = readPostmaster(dataFolder);
  if (written && existsSync(`/proc/${written.pid}`)) rmSync(join(dataFolder, 'postmaster.pid'), { force: true });
}
