import type { EntityManager } from 'typeorm';

/** Who hears an event, by rule and not by list, so that a party that left a moment ago hears nothing. */
export type EventAudience =
  /**
   * Everyone with a part in the commission, client and guests included: such an event says that something changed, and
   * what may be read of it is for the ability to say.
   */
  | { to: 'everyone'; commissionId: string }
  /** Shops of the commission. */
  | { to: 'shops'; commissionId: string }
  /** These parties, and the lead. */
  | { to: 'parties'; commissionId: string; partyIds: string[] }
  /** Those who may read the thread. */
  | { to: 'thread'; threadId: string }
  /** These accounts or shops, whatever they are now: for telling someone that their rights changed. */
  | { to: 'keys'; keys: string[] };

const CURRENT = '"left_at" IS NULL AND ("sees_until" IS NULL OR "sees_until" >= CURRENT_DATE)';
const KEY = 'COALESCE("shop_id", "account_id")';

/**
 * The account and shop ids that hear an event. The rules mirror the ability's: `audience.test.ts` holds both against
 * each other.
 */
export async function keysOf(manager: EntityManager, audience: EventAudience): Promise<string[]> {
  const rows = async (sql: string, params: unknown[]): Promise<string[]> =>
    (await manager.query<{ key: string }[]>(sql, params)).map((row) => row.key);
  switch (audience.to) {
    case 'keys':
      return audience.keys;
    case 'everyone':
      return rows(`SELECT ${KEY} AS key FROM "party" WHERE "commission_id" = $1 AND ${CURRENT}`, [
        audience.commissionId,
      ]);
    case 'shops':
      return rows(
        `SELECT "shop_id" AS key FROM "party" WHERE "commission_id" = $1 AND "shop_id" IS NOT NULL AND ${CURRENT}`,
        [audience.commissionId],
      );
    case 'parties':
      return rows(
        `SELECT ${KEY} AS key FROM "party"
          WHERE "commission_id" = $1 AND ("id" = ANY($2) OR 'lead' = ANY("roles")) AND ${CURRENT}`,
        [audience.commissionId, audience.partyIds],
      );
    case 'thread':
      return rows(
        `SELECT COALESCE(p."shop_id", p."account_id") AS key
           FROM "thread" t JOIN "party" p ON p."commission_id" = t."commission_id"
          WHERE t."id" = $1 AND p."left_at" IS NULL AND (p."sees_until" IS NULL OR p."sees_until" >= CURRENT_DATE)
            AND ((p."id" = ANY(t."party_ids") AND NOT 'guest' = ANY(p."roles"))
              OR (t."audience" = 'everyone' AND (NOT 'guest' = ANY(p."roles") OR 'threads' = ANY(p."guest_sees")))
              OR (t."audience" = 'makers' AND p."shop_id" IS NOT NULL)
              OR (t."audience" = 'named' AND 'lead' = ANY(p."roles")))`,
        [audience.threadId],
      );
  }
}
