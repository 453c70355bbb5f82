import { randomInt } from 'node:crypto';
import { createServer } from 'node:net';
import { Halt } from './halt.mjs';

export const DEFAULT_APP_PORT = 4310;

/**
 * @param {number} port
 * @param {string} [host]
 * @returns {Promise<boolean>}
 */
export function isFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/**
 * A free port below 32768: the kernel hands out those above to outgoing connections, which could take it in between.
 * @param {(port: number) => Promise<boolean>} [free]
 * @returns {Promise<number>}
 */
export async function quietPort(free = isFree) {
  for (let tries = 0; tries < 200; tries += 1) {
    const port = randomInt(20_000, 32_000);
    if (await free(port)) return port;
  }
  throw new Halt('No free port between 20000 and 32000 was found on 127.0.0.1.');
}

/**
 * The port people open. One that was asked for is taken or refused; without a wish the first free one from `first` on.
 * @param {string | undefined} asked value of PORT
 * @param {(port: number) => Promise<boolean>} free
 * @param {number} [first]
 * @returns {Promise<number>}
 */
export async function choosePort(asked, free, first = DEFAULT_APP_PORT) {
  if (asked) {
    const port = Number(asked);
    if (!/^\d+$/.test(asked) || port < 1 || port > 65535)
      throw new Halt(`PORT is "${asked}", which is not a port. Set it to a number from 1 to 65535.`);
    if (await free(port)) return port;
    throw new Halt(
      `Port ${port} is in use by another program. Set PORT to a free one, or leave it unset and Ferrule takes the next free one.`,
    );
  }
  for (let port = first; port < first + 100; port += 1) if (await free(port)) return port;
  throw new Halt(`No port from ${first} to ${first + 99} is free. Set PORT to a free one.`);
}
