import type { QueryConfig } from 'pg';
import type { DataSource, EntityManager } from 'typeorm';
import type { Actor, Membership } from '../../shared/abilities/actor.ts';
import type { LengthUnit, ShopRole } from '../../shared/contracts/vocabulary.ts';
import { poolOf } from '../db/data-source.ts';
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

const MINE = 'SELECT "shop_id", "role" FROM "shop_member" WHERE "account_id" = $1';

/** Each looked up by an index of its own: in one condition joined by OR they make a shop of ten thousand walk all its parties. */
const PARTIES = {
  here: 'SELECT "id" FROM "party" WHERE "commission_id" = $2',
  everyOpenOne: `SELECT p."id" FROM "party" p JOIN "commission" c ON c."id" = p."commission_id" AND c."state" <> 'ended'
    WHERE p."account_id" = $1 OR p."shop_id" IN (SELECT "shop_id" FROM mine)`,
};

/**
 * One statement for who is asking: the account, its shops, and its memberships. Memberships are those in the commission
 * at hand, or in every commission that has not ended; those as a guest are always among them, since a guest is not in a
 * commission's member keys.
 */
const actorSql = (parties: string): string => `
  WITH mine AS (${MINE}), looked AS (
    ${parties}
    UNION SELECT "id" FROM "party" WHERE "account_id" = $1 AND 'guest' = ANY("roles")
    UNION SELECT "id" FROM "party" WHERE "shop_id" IN (SELECT "shop_id" FROM mine) AND 'guest' = ANY("roles")
  )
  SELECT a."id", a."email", a."display_name", a."is_steward", a."preferred_unit", a."time_zone",
    COALESCE((SELECT jsonb_agg(jsonb_build_object('shopId', m."shop_id", 'role', m."role")) FROM mine m), '[]') AS shops,
    COALESCE((
      SELECT jsonb_agg(jsonb_build_object(
        'commissionId', p."commission_id", 'partyId', p."id", 'roles', to_jsonb(p."roles"), 'shopId', p."shop_id",
        'shopRole', m."role", 'guestSees', to_jsonb(p."guest_sees")) ORDER BY p."joined_at", p."id")
      FROM looked JOIN "party" p ON p."id" = looked."id" LEFT JOIN mine m ON m."shop_id" = p."shop_id"
      WHERE (p."account_id" = $1 OR m."shop_id" IS NOT NULL)
        AND p."left_at" IS NULL AND (p."sees_until" IS NULL OR p."sees_until" >= CURRENT_DATE)
    ), '[]') AS memberships
  FROM "account" a WHERE a."id" = $1`;

const HERE_SQL = actorSql(PARTIES.here);
const EVERYWHERE_SQL = actorSql(PARTIES.everyOpenOne);

const isUuid = /^[0-9a-f]{8}-(?:[0-9a-f]{4}-){3}[0-9a-f]{12}$/i;

export interface KnownActor {
  person: Person;
  actor: Actor;
}

interface ActorScope {
  commissionId?: string | null;
  everyOpenCommission?: boolean;
}

/** The statement that says who is asking; also what the bench puts before its bare handler. */
export function actorStatement(
  accountId: string,
  { commissionId, everyOpenCommission = false }: ActorScope,
): QueryConfig {
  if (everyOpenCommission) return { text: EVERYWHERE_SQL, values: [accountId] };
  const here = commissionId && isUuid.test(commissionId) ? commissionId : null;
  // Planned once per connection: it comes before every request.
  return { name: 'actor', text: HERE_SQL, values: [accountId, here] };
}

const known = (row: ActorRow | undefined): KnownActor | null =>
  row
    ? {
        person: {
          accountId: row.id,
          displayName: row.display_name,
          email: row.email,
          timeZone: row.time_zone,
          preferredUnit: row.preferred_unit,
        },
        actor: { accountId: row.id, isSteward: row.is_steward, shops: row.shops, memberships: row.memberships },
      }
    : null;

/** Who is asking, as committed. */
export async function loadActor(db: DataSource, accountId: string, scope: ActorScope): Promise<KnownActor | null> {
  const { rows } = await poolOf(db).query<ActorRow>(actorStatement(accountId, scope));
  return known(rows[0]);
}

/** Who is asking, as a transaction that is not over sees it. */
export async function loadActorWithin(
  manager: EntityManager,
  accountId: string,
  scope: ActorScope,
): Promise<KnownActor | null> {
  const { text, values = [] } = actorStatement(accountId, scope);
  const [row] = await manager.query<ActorRow[]>(text, values as unknown[]);
  return known(row);
}
