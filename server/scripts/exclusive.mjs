import { connect, createServer } from 'node:net';
import { setTimeout as pause } from 'node:timers/promises';

/**
 * Locks are sockets in Linux's abstract namespace: taking one is atomic, and the kernel lets go of it when the process
 * ends in whatever way, so no lock is ever stale.
 * @param {string} name
 */
const addressOf = (name) => `\0ferrule/${process.getuid?.() ?? 0}/${name}`;

/**
 * @param {string} name
 * @returns {Promise<{ setNote(note: string): void, release(): Promise<void> } | null>} null when another process holds it
 */
export function takeExclusive(name) {
  let note = '';
  return new Promise((resolve, reject) => {
    const server = createServer((socket) => {
      socket.on('error', () => undefined);
      socket.end(note);
    });
    server.on('error', (/** @type {NodeJS.ErrnoException} */ error) =>
      error.code === 'EADDRINUSE' ? resolve(null) : reject(error),
    );
    server.listen(addressOf(name), () => {
      server.unref();
      resolve({
        setNote: (text) => void (note = text),
        release: () => new Promise((done) => server.close(() => done())),
      });
    });
  });
}

/**
 * @param {string} name
 * @returns {Promise<string>} the note of the process that holds the lock, or nothing
 */
export function noteOf(name) {
  return new Promise((resolve) => {
    let text = '';
    const socket = connect(addressOf(name));
    socket.setTimeout(2000, () => socket.destroy());
    socket.setEncoding('utf8').on('data', (part) => (text += part));
    socket.on('error', () => undefined).on('close', () => resolve(text));
  });
}

/**
 * Runs work while no other process holds the same lock; waits for its turn.
 * @template T
 * @param {string} name
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function inTurn(name, work) {
  let lock = await takeExclusive(name);
  while (!lock) {
    await pause(100);
    lock = await takeExclusive(name);
  }
  try {
    return await work();
  } finally {
    await lock.release();
  }
}
