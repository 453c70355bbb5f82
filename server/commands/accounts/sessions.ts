import { promisify } from 'node:util';
import type { Request } from 'express';
import type { EntityManager } from 'typeorm';

/** A new session id for the same browser, so that an id known before sign-in is worth nothing after it. */
const regenerate = (req: Request): Promise<void> =>
  promisify((done: (error: unknown) => void) => req.session.regenerate(done))();

const save = (req: Request): Promise<void> => promisify((done: (error: unknown) => void) => req.session.save(done))();

export async function openSession(req: Request, accountId: string, now: Date): Promise<void> {
  await regenerate(req);
  req.session.accountId = accountId;
  req.session.signedInAt = now.getTime();
  await save(req);
}

/** The password was right; the second factor is still asked for, for ten minutes. */
export async function openPendingSession(req: Request, accountId: string, now: Date): Promise<void> {
  await regenerate(req);
  req.session.pendingAccountId = accountId;
  req.session.pendingSince = now.getTime();
  await save(req);
}

export const closeSession = (req: Request): Promise<void> =>
  promisify((done: (error: unknown) => void) => req.session.destroy(done))();

/** Ends an account's sessions on every device, those that still wait for the second factor too. */
export const endSessionsOf = (manager: EntityManager, accountId: string): Promise<unknown> =>
  manager.query(`DELETE FROM "web_session" WHERE "sess"->>'accountId' = $1 OR "sess"->>'pendingAccountId' = $1`, [
    accountId,
  ]);
