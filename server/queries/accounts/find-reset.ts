import type { EntityManager } from 'typeorm';

export interface ResetFacts {
  accountId: string;
  email: string;
  displayName: string;
}

/** Whose reset link this is, while it can still be taken. */
export async function findReset(manager: EntityManager, tokenHash: string, now: Date): Promise<ResetFacts | null> {
  const [row] = await manager.query<ResetFacts[]>(
    `SELECT a."id" AS "accountId", a."email", a."display_name" AS "displayName"
     FROM "password_reset" r JOIN "account" a ON a."id" = r."account_id"
     WHERE r."token_hash" = $1 AND r."used_at" IS NULL AND r."expires_at" > $2`,
    [tokenHash, now],
  );
  return row ?? null;
}
