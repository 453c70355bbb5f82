import { execFileSync } from 'node:child_process';
import { readdirSync, readFileSync } from 'node:fs';
import { availableParallelism } from 'node:os';
import type pg from 'pg';

/** The application under measure has this core to itself; PostgreSQL and the load share the other. */
const APPLICATION_CORE = '0';
const LOAD_CORE = '1';

const hasTwoCores = availableParallelism() >= 2;

const pin = (pid: number, core: string): boolean => {
  try {
    execFileSync('taskset', ['-a', '-p', '-c', core, String(pid)], { stdio: 'ignore' });
    return true;
  } catch {
    return false;
  }
};

/** Command and arguments that start a program on the application's core. */
export const onApplicationCore = (command: string, args: readonly string[]): [string, string[]] =>
  hasTwoCores ? ['taskset', ['-c', APPLICATION_CORE, command, ...args]] : [command, [...args]];

const parentOf = (pid: number): number | null => {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return Number(stat.slice(stat.lastIndexOf(')') + 2).split(' ')[1]);
  } catch {
    return null;
  }
};

/**
 * Puts this process and PostgreSQL on the load's core; connections made later inherit it.
 * @returns what was done, in words for the report
 */
export async function pinLoadAndDatabase(client: pg.Client): Promise<string> {
  if (!hasTwoCores) return 'one core for everything';
  const { rows } = await client.query<{ pid: number }>('SELECT pg_backend_pid() AS pid');
  const postmaster = parentOf(rows[0]?.pid ?? 0);
  const processes = readdirSync('/proc')
    .map(Number)
    .filter((pid) => pid === postmaster || (postmaster !== null && parentOf(pid) === postmaster));
  const databasePinned = processes.length > 0 && processes.every((pid) => pin(pid, LOAD_CORE));
  const loadPinned = pin(process.pid, LOAD_CORE);
  if (databasePinned && loadPinned) return 'application on one core, PostgreSQL and load on the other';
  return `application on one core; ${databasePinned ? 'PostgreSQL' : loadPinned ? 'load' : 'nothing else'} held to the other`;
}
