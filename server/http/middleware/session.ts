import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import type { DataSource } from 'typeorm';
import type { Env } from '../../config/env.ts';
import { poolOf } from '../../db/data-source.ts';

declare module 'express-session' {
  interface SessionData {
    accountId: string;
    /** Password was right, the second factor is still asked for. */
    pendingAccountId: string;
    pendingSince: number;
    signedInAt: number;
  }
}

const FOURTEEN_DAYS_MS = 14 * 24 * 60 * 60 * 1000;

/**
 * Sessions in PostgreSQL. The cookie is signed, HttpOnly and SameSite=Lax, and on TLS Secure under a `__Host-` name. A
 * session is written when someone signs in and not on every request.
 */
export function createSessionMiddleware(db: DataSource, env: Env): { middleware: RequestHandler; close: () => void } {
  const Store = connectPgSimple(session);
  const store = new Store({
    pool: poolOf(db),
    tableName: 'web_session',
    disableTouch: true,
    pruneSessionInterval: env.NODE_ENV === 'test' ? false : 15 * 60,
  });
  const onTls = env.PUBLIC_ORIGIN.startsWith('https://');
  const middleware = session({
    store,
    name: onTls ? '__Host-ferrule' : 'ferrule',
    secret: env.SESSION_SECRET,
    resave: false,
    saveUninitialized: false,
    cookie: { httpOnly: true, sameSite: 'lax', secure: onTls, path: '/', maxAge: FOURTEEN_DAYS_MS },
  });
  return { middleware, close: () => void store.close() };
}
