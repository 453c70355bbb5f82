import type { EntityManager } from 'typeorm';

/**
 * Brings the columns that lists read (member keys, lead's and client's name) in line with the parties. Called in the same
 * transaction as every change of parties, shop name or client name.
 */
export async function refreshCommissionNames(manager: EntityManager, commissionId: string): Promise<void> {
  await manager.query(
    `UPDATE "commission" SET
       "member_keys" = COALESCE((SELECT array_agg(COALESCE(p."shop_id", p."account_id")) FROM "party" p
          WHERE p."commission_id" = $1 AND p."left_at" IS NULL AND NOT 'guest' = ANY(p."roles")), '{}'),
       "lead_name" = COALESCE((SELECT s."name" FROM "party" p JOIN "shop" s ON s."id" = p."shop_id"
          WHERE p."commission_id" = $1 AND p."left_at" IS NULL AND 'lead' = ANY(p."roles")), ''),
       "client_name" = (SELECT a."display_name" FROM "party" p JOIN "account" a ON a."id" = p."account_id"
          WHERE p."commission_id" = $1 AND p."left_at" IS NULL AND 'client' = ANY(p."roles") LIMIT 1)
     WHERE "id" = $1`,
    [commissionId],
  );
}
