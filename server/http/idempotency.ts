import { createHash } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import { AppError } from '../errors.ts';

const KEY_FORM = /^[\x21-\x7e]{8,128}$/;

export interface KeptAnswer {
  status: number;
  response: unknown;
}

export function readIdempotencyKey(header: string | undefined): string {
  if (!header || !KEY_FORM.test(header))
    throw new AppError(
      'idempotency-key-missing',
      'Send an Idempotency-Key header of 8 to 128 visible characters, new for each act.',
    );
  return header;
}

export const hashRequest = (method: string, url: string, body: unknown): string =>
  createHash('sha256')
    .update(`${method} ${url}\n${JSON.stringify(body)}`)
    .digest('hex');

/**
 * Claims a key inside the transaction that does the work. A second request with the same key waits for the first one's
 * commit and then gets its answer; a first one that fails leaves no trace, so the key can be tried again.
 */
export async function claimKey(
  manager: EntityManager,
  accountId: string,
  key: string,
  requestHash: string,
): Promise<KeptAnswer | null> {
  const claimed = await manager.query<unknown[]>(
    `INSERT INTO "idempotency_key" ("account_id", "key", "request_hash") VALUES ($1, $2, $3)
     ON CONFLICT ("account_id", "key") DO NOTHING RETURNING 1`,
    [accountId, key, requestHash],
  );
  if (claimed.length > 0) return null;
  const [kept] = await manager.query<{ request_hash: string; status: number; response: unknown }[]>(
    `SELECT "request_hash", "status", "response" FROM "idempotency_key" WHERE "account_id" = $1 AND "key" = $2`,
    [accountId, key],
  );
  if (kept?.request_hash !== requestHash)
    throw new AppError(
      'idempotency-key-reused',
      'This key belongs to another request. Nothing was done; use a new key.',
    );
  return { status: kept.status, response: kept.response };
}

export async function keepAnswer(
  manager: EntityManager,
  accountId: string,
  key: string,
  answer: KeptAnswer,
): Promise<void> {
  await manager.query(
    `UPDATE "idempotency_key" SET "status" = $3, "response" = $4::jsonb WHERE "account_id" = $1 AND "key" = $2`,
    [accountId, key, answer.status, JSON.stringify(answer.response)],
  );
}

/** Keys are kept for 72 hours. */
export const forgetOldKeys = (manager: EntityManager): Promise<unknown> =>
  manager.query(`DELETE FROM "idempotency_key" WHERE "created_at" < now() - interval '72 hours'`);
