import type { EntityManager } from 'typeorm';
import { keysOf } from '../../outbox/audience.ts';

/** Accounts of everyone who reads a thread, through a shop or in their own name; bookkeepers read no threads. */
export async function readersOf(manager: EntityManager, threadId: string): Promise<Set<string>> {
  const keys = await keysOf(manager, { to: 'thread', threadId });
  const rows = await manager.query<{ id: string }[]>(
    `SELECT "account_id" AS id FROM "shop_member" WHERE "shop_id" = ANY($1) AND "role" <> 'bookkeeper'
     UNION SELECT "id" FROM "account" WHERE "id" = ANY($1)`,
    [keys],
  );
  return new Set(rows.map((row) => row.id));
}
