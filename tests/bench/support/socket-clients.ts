import { fork, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';

/** Processes on the client side: one alone would be the limit itself. */
const WORKERS = 2;

export interface SocketClients {
  /** Answers once every socket has heard an event `times` more. */
  heard(times: number): Promise<void>;
  stop(): Promise<void>;
}

/** Opens sockets from two processes and counts what each of them hears. */
export async function openSockets(
  origin: string,
  sockets: number,
  event: string,
  headers: Readonly<Record<string, string>>,
): Promise<SocketClients> {
  const each = sockets / WORKERS;
  const workers: ChildProcess[] = [];
  const total = new Map<ChildProcess, number>();
  let onCount = (): void => undefined;
  for (let worker = 0; worker < WORKERS; worker += 1) {
    const child = fork(new URL('../bare/socket-worker.ts', import.meta.url), [], {
      execArgv: ['--import', 'tsx'],
      env: {
        PATH: process.env['PATH'],
        TSX_TSCONFIG_PATH: 'server/tsconfig.json',
        WORKER_SETTINGS: JSON.stringify({ origin, sockets: each, event, headers }),
      },
    });
    workers.push(child);
    total.set(child, 0);
  }
  const stop = async (): Promise<void> => {
    await Promise.all(
      workers.map(async (child) => {
        if (child.exitCode !== null) return;
        const exited = once(child, 'exit');
        child.kill('SIGTERM');
        await exited;
      }),
    );
  };
  await Promise.all(
    workers.map(async (child) => {
      const [first] = (await once(child, 'message')) as [{ open?: number; failed?: string }];
      if (first.open !== each) throw new Error(`Sockets did not open: ${first.failed ?? 'no reason given'}`);
    }),
  ).catch(async (error: unknown) => {
    await stop();
    throw error;
  });
  for (const child of workers)
    child.on('message', ({ heard }: { heard: number }) => {
      total.set(child, heard);
      onCount();
    });
  let expected = 0;
  return {
    heard(times) {
      expected += times * each;
      return new Promise((resolve, reject) => {
        const late = setTimeout(() => reject(new Error('Not every socket heard every event in time')), 60_000);
        onCount = () => {
          const counts = [...total.values()];
          if (counts.some((count) => count > expected)) return reject(new Error('A socket heard an event twice'));
          if (counts.every((count) => count === expected)) {
            clearTimeout(late);
            resolve();
          }
        };
        onCount();
      });
    },
    stop,
  };
}
