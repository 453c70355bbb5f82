import { spawn, type ChildProcess } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { API_BASE } from '../../../shared/contracts/route.ts';
import { onApplicationCore } from './cores.ts';
import { SESSION_SECRET } from './data.ts';
import { freePort } from './free-port.ts';

export interface Running {
  readonly child: ChildProcess;
  readonly origin: string;
  /** Origin and API base. */
  readonly api: string;
  /** Where it keeps files. */
  readonly folder: string;
  stop(): Promise<void>;
}

const START_LIMIT_MS = 60_000;
const POLL_MS = 5;
const DRAIN_MS = 500;

/** Resident memory of a process, bytes. The child is `taskset` turned into node, so its id is the program's. */
export const residentBytes = (child: ChildProcess): number => {
  const kilobytes = /VmRSS:\s+(\d+) kB/.exec(readFileSync(`/proc/${child.pid ?? 0}/status`, 'utf8'))?.[1];
  return Number(kilobytes) * 1024;
};

async function waitReady(child: ChildProcess, url: string): Promise<void> {
  const end = Date.now() + START_LIMIT_MS;
  while (Date.now() < end) {
    if (child.exitCode !== null) throw new Error(`The program at ${url} ended while starting`);
    const ok = await fetch(url).then(
      (response) => response.ok,
      () => false,
    );
    if (ok) return;
    await pause(POLL_MS);
  }
  throw new Error(`Nothing answered at ${url}`);
}

const ended = (child: ChildProcess): Promise<void> =>
  new Promise((resolve) => {
    if (child.exitCode !== null || child.signalCode !== null) return resolve();
    child.once('exit', () => resolve());
  });

interface Program {
  readonly file: string;
  readonly flags?: readonly string[];
  readonly env: Readonly<Record<string, string>>;
  readonly ready: string;
}

async function start(program: Program, port: number, folder: string): Promise<Running> {
  const [command, args] = onApplicationCore(process.execPath, [
    ...(program.flags ?? []),
    '--import',
    'tsx',
    program.file,
  ]);
  const child = spawn(command, args, {
    env: { PATH: process.env['PATH'], TSX_TSCONFIG_PATH: 'server/tsconfig.json', ...program.env },
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  const origin = `http://127.0.0.1:${port}`;
  const stop = async (): Promise<void> => {
    // Requests that the load let go of at its end are still being answered.
    await pause(DRAIN_MS);
    child.kill('SIGTERM');
    await ended(child);
    await rm(folder, { recursive: true, force: true });
  };
  try {
    await waitReady(child, `${origin}${program.ready}`);
  } catch (error) {
    await stop();
    throw error;
  }
  return { child, origin, api: `${origin}${API_BASE}`, folder, stop };
}

const newFolder = (): Promise<string> => mkdtemp(join(tmpdir(), 'ferrule-bench-'));

/** The environment of the application as it is measured: nothing logged but warnings, limits as wide as the load. */
export const applicationEnv = (databaseUrl: string, port: number, folder: string): Record<string, string> => ({
  NODE_ENV: 'development',
  RELAXED_LIMITS: '1',
  LOG_LEVEL: 'warn',
  DATABASE_URL: databaseUrl,
  DATABASE_POOL_SIZE: '10',
  PORT: String(port),
  PUBLIC_ORIGIN: `http://127.0.0.1:${port}`,
  SESSION_SECRET,
  FIELD_KEY: '0123456789abcdef'.repeat(4),
  UPLOADS_DIR: join(folder, 'uploads'),
  MAIL_DIR: join(folder, 'mail'),
});

/** The whole application in a process of its own, once it says that it is ready. */
export async function startApplication(databaseUrl: string, file = 'server/index.ts'): Promise<Running> {
  const [port, folder] = [await freePort(), await newFolder()];
  const env = applicationEnv(databaseUrl, port, folder);
  return start({ file, flags: ['--expose-gc'], env, ready: '/readyz' }, port, folder);
}

/** A bare program of tests/bench/bare, which reads its settings from `BARE_SETTINGS`. */
export async function startBare(file: string, settings: object): Promise<Running> {
  const [port, folder] = [await freePort(), await newFolder()];
  const env = { BARE_SETTINGS: JSON.stringify({ ...settings, port, folder }) };
  return start({ file, flags: ['--expose-gc'], env, ready: '/ready' }, port, folder);
}
