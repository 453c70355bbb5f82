import { ServerResponse, type IncomingMessage } from 'node:http';
import type { Request, RequestHandler, Response } from 'express';

/**
 * The account whose session a handshake carries, or null. The session is read on a stand-in for the request: engine.io
 * keeps the request for as long as the connection is, and with it all that a session hangs on it.
 */
export const handshakeAccountId = (session: RequestHandler, handshake: IncomingMessage): Promise<string | null> =>
  new Promise((resolve, reject) => {
    const standIn = Object.create(handshake) as Request;
    const nowhere = new ServerResponse(handshake) as unknown as Response;
    void session(standIn, nowhere, (error?: unknown) =>
      error instanceof Error ? reject(error) : resolve(standIn.session.accountId ?? null),
    );
  });
