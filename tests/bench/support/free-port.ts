import { createServer } from 'node:net';

const isFree = (port: number): Promise<boolean> =>
  new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen(port, '127.0.0.1', () => probe.close(() => resolve(true)));
  });

/** A free port below the range from which outgoing connections take theirs. */
export async function freePort(): Promise<number> {
  for (let attempt = 0; attempt < 100; attempt += 1) {
    const port = 20_000 + Math.floor(Math.random() * 10_000);
    if (await isFree(port)) return port;
  }
  throw new Error('No free port was found');
}
