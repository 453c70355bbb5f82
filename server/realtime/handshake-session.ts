import { IncomingMessage, ServerResponse } from 'node:http';
import type { Request, RequestHandler, Response } from 'express';

/**
 * The account whose session a handshake carries, or null. The session is read on a stand-in for the request: engine.io
 * keeps the request for as long as the connection is, and with it all that a session hangs on it.
 */
export const handshakeAccountId = (session: RequestHandler, handshake: IncomingMessage): Promise<string | null> =>
  new Promise((resolve, reject) => {
    const copy = new IncomingMessage(handshake.socket);
    copy.method = handshake.method ?? 'GET';
    copy.url = handshake.url ?? '/';
    copy.headers = handshake.headers;
    const standIn = copy as Request;
    void session(standIn, new ServerResponse(copy) as unknown as Response, (error?: unknown) =>
      error instanceof Error ? reject(error) : resolve(standIn.session.accountId ?? null),
    );
  });
