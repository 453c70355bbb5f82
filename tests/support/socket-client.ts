import { io, type Socket } from 'socket.io-client';
import type { TestClient } from './test-client.ts';

/** A browser's realtime connection, with the cookie and origin of a signed-in person. */
export function openSocket(client: Pick<TestClient, 'cookie'>, port: number, origin: string): Socket {
  return io(`http://127.0.0.1:${port}`, {
    transports: ['websocket'],
    forceNew: true,
    reconnectionDelay: 50,
    reconnectionDelayMax: 300,
    extraHeaders: { cookie: client.cookie, origin },
  });
}

export const connected = (socket: Socket): Promise<void> =>
  new Promise((resolve, reject) => {
    if (socket.connected) return resolve();
    socket.once('connect', resolve);
    socket.once('connect_error', reject);
  });

/** The next event of a name, or null when none comes in time. */
export const nextEvent = <T>(socket: Socket, name: string, withinMs = 3000): Promise<T | null> =>
  new Promise((resolve) => {
    const timer = setTimeout(() => {
      socket.off(name, hear);
      resolve(null);
    }, withinMs);
    const hear = (payload: T): void => {
      clearTimeout(timer);
      resolve(payload);
    };
    socket.once(name, hear);
  });
