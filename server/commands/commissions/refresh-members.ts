import type { EntityManager } from 'typeorm';

/**
 * Brings the columns that lists read (member keys, lead's and client's name) in line with the parties. Called in the same
 * transaction as every change of parties, shop name or client name.
 */
export async function refreshCommissionNames(manager: EntityManager, commissionId: string): Promise<void> {
  // A statement of its own: the next one then sees what an earlier holder of the row committed. The lock is the one an
  // update takes, since a stronger one would block on the keys that new parties hold.
  await manager.query('SELECT 1 FROM "commission" WHERE "id" = $1 FOR NO KEY UPDATE', [commissionId]);
  await manager.query(
    `UPDATE "commission" SET
       "member_keys" = COALESCE((SELECT array_agg(COALESCE(p."shop_id", p."account_id")) FROM "party" p
          WHERE p."commission_id" = $1 AND p."left_at" IS NULL AND NOT 'guest' = ANY(p."roles")), '{}'),
       "lead_name" = COALESCE((SELECT s."name" FROM "party" p JOIN "shop" s ON s."id" = p."shop_id"
          WHERE p."commission_id" = $1 AND p."left_at" IS NULL AND 'lead' = ANY(p."roles")), ''),
       "client_name" = (SELECT string_agg(a."display_name", ' and ' ORDER BY p."joined_at", p."id")
          FROM "party" p JOIN "account" a ON a."id" = p."account_id"
          WHERE p."commission_id" = $1 AND p."left_at" IS NULL AND 'client' = ANY(p."roles"))
     WHERE "id" = $1`,
    [commissionId],
  );
}
