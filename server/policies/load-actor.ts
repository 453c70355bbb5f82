import type { EntityManager } from 'typeorm';
import type { Actor, Membership } from '../../shared/abilities/actor.ts';
import type { LengthUnit, ShopRole } from '../../shared/contracts/vocabulary.ts';
import type { Person } from '../http/context.ts';

interface ActorRow {
  id: string;
  email: string;
  display_name: string;
  is_steward: boolean;
  preferred_unit: LengthUnit;
  time_zone: string;
  shops: { shopId: string; role: ShopRole }[];
  memberships: Membership[];
}

/**
 * One statement for who is asking: the account, its shops, and its memberships. Memberships are those in the commission
 * at hand, or in every commission that has not ended; those as a guest are always among them, since a guest is not in a
 * commission's member keys.
 */
const ACTOR_SQL = `
  WITH mine AS (SELECT "shop_id", "role" FROM "shop_member" WHERE "account_id" = $1)
  SELECT a."id", a."email", a."display_name", a."is_steward", a."preferred_unit", a."time_zone",
    COALESCE((SELECT jsonb_agg(jsonb_build_object('shopId', m."shop_id", 'role', m."role")) FROM mine m), '[]') AS shops,
    COALESCE((
      SELECT jsonb_agg(jsonb_build_object(
        'commissionId', p."commission_id", 'partyId', p."id", 'roles', to_jsonb(p."roles"), 'shopId', p."shop_id",
        'shopRole', m."role", 'guestSees', to_jsonb(p."guest_sees")) ORDER BY p."joined_at", p."id")
      FROM "party" p LEFT JOIN mine m ON m."shop_id" = p."shop_id"
      WHERE (p."account_id" = $1 OR m."shop_id" IS NOT NULL)
        AND p."left_at" IS NULL AND (p."sees_until" IS NULL OR p."sees_until" >= CURRENT_DATE)
        AND ('guest' = ANY(p."roles") OR p."commission_id" = $2
          OR ($3 AND EXISTS (SELECT 1 FROM "commission" c WHERE c."id" = p."commission_id" AND c."state" <> 'ended')))
    ), '[]') AS memberships
  FROM "account" a WHERE a."id" = $1`;

const isUuid = /^[0-9a-f]{8}-(?:[0-9a-f]{4}-){3}[0-9a-f]{12}$/i;

export interface KnownActor {
  person: Person;
  actor: Actor;
}

export async function loadActor(
  manager: EntityManager,
  accountId: string,
  scope: { commissionId?: string | null; everyOpenCommission?: boolean },
): Promise<KnownActor | null> {
  const commissionId = scope.commissionId && isUuid.test(scope.commissionId) ? scope.commissionId : null;
  const [row] = await manager.query<ActorRow[]>(ACTOR_SQL, [
    accountId,
    commissionId,
    scope.everyOpenCommission ?? false,
  ]);
  if (!row) return null;
  return {
    person: {
      accountId: row.id,
      displayName: row.display_name,
      email: row.email,
      timeZone: row.time_zone,
      preferredUnit: row.preferred_unit,
    },
    actor: { accountId: row.id, isSteward: row.is_steward, shops: row.shops, memberships: row.memberships },
  };
}
