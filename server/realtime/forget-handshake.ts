import type { EventEmitter } from 'node:events';
import type { IncomingMessage } from 'node:http';
import type { Server, Socket } from 'socket.io';

/**
 * Lets go of the requests that connections began with: of no more use once the person is known, and a third of an idle
 * connection's memory. engine.io 6.6 holds them in three places (its `server.js` and `socket.js`): the response it makes
 * for middleware, the scope of a listener for errors before the upgrade, and the connection itself.
 * @returns lets go of the rest, for a connection whose person is known
 */
export function forgetHandshakes(io: Pick<Server, 'engine'>): (socket: Pick<Socket, 'conn'>) => void {
  io.engine.use((_req: IncomingMessage, response: { req?: IncomingMessage }, next: () => void) => {
    next();
    delete response.req;
  });
  return (socket) => {
    const conn = socket.conn as unknown as { request: unknown; transport: { socket?: EventEmitter } };
    conn.request = undefined;
    const webSocket = conn.transport.socket;
    for (const listener of webSocket?.listeners('error') ?? [])
      if (listener.name === 'onUpgradeError') webSocket?.removeListener('error', listener as () => void);
  };
}
