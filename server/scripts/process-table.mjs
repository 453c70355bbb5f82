import { readdirSync, readFileSync, readlinkSync } from 'node:fs';
import { setTimeout as pause } from 'node:timers/promises';

/**
 * When a process began, in clock ticks since boot; tells a process from a later one with the same id.
 * @param {number} pid
 * @returns {string | null} null when it is gone or only a zombie
 */
export function startTicks(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The command's name stands in brackets and may hold anything, so fields are counted from the last bracket.
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return fields[0] === 'Z' ? null : (fields[19] ?? null);
  } catch {
    return null;
  }
}

/**
 * @param {string} folder
 * @returns {number[]} processes whose working folder it is; each process of a PostgreSQL server works in its data folder
 */
export function processesIn(folder) {
  return readdirSync('/proc').flatMap((entry) => {
    if (!/^\d+$/.test(entry)) return [];
    try {
      return readlinkSync(`/proc/${entry}/cwd`) === folder && startTicks(Number(entry)) !== null ? [Number(entry)] : [];
    } catch {
      return [];
    }
  });
}

/**
 * @param {() => boolean} done
 * @param {number} limitMs
 * @returns {Promise<boolean>} whether it came true in time
 */
export async function waitUntil(done, limitMs) {
  const end = Date.now() + limitMs;
  while (!done()) {
    if (Date.now() > end) return false;
    await pause(50);
  }
  return true;
}

/**
 * Ends a process that an earlier run left behind: asked first, killed after the grace.
 * @param {number} pid
 * @param {string} ticks from startTicks(), so that a stranger with the same id is let be
 * @param {number} graceMs
 */
export async function endLeftBehind(pid, ticks, graceMs) {
  const gone = () => startTicks(pid) !== ticks;
  for (const [signal, waitMs] of /** @type {const} */ ([
    ['SIGTERM', graceMs],
    ['SIGKILL', 5000],
  ])) {
    if (gone()) return;
    try {
      process.kill(pid, signal);
    } catch {
      return;
    }
    await waitUntil(gone, waitMs);
  }
}
