import { mayDo } from '../../../shared/abilities/ability.ts';
import type { listParties as contract, PartyView } from '../../../shared/contracts/commissions.ts';
import type { ParsedInput, RouteOutput } from '../../../shared/contracts/route.ts';
import type { GuestSight, PartyRole, ShopTint } from '../../../shared/contracts/vocabulary.ts';
import { NotPermitted } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorizeCommissionSight } from '../../policies/authorize.ts';

interface PartyRow {
  id: string;
  roles: PartyRole[];
  display_name: string;
  shop_id: string | null;
  tint: ShopTint | null;
  sees_until: string | null;
  joined_at: Date;
  guest_sees: GuestSight[];
  people: PartyView['people'];
}

const PARTIES_SQL = `
  SELECT p."id", p."roles", COALESCE(s."name", a."display_name") AS display_name, p."shop_id", s."tint",
    p."sees_until"::text, p."joined_at", p."guest_sees",
    CASE WHEN p."shop_id" IS NULL THEN jsonb_build_array(jsonb_build_object('accountId', a."id", 'displayName', a."display_name"))
      ELSE COALESCE((SELECT jsonb_agg(jsonb_build_object('accountId', w."id", 'displayName', w."display_name") ORDER BY w."display_name", w."id")
        FROM "shop_member" m JOIN "account" w ON w."id" = m."account_id"
        WHERE m."shop_id" = p."shop_id" AND m."role" <> 'bookkeeper'), '[]') END AS people
  FROM "party" p LEFT JOIN "shop" s ON s."id" = p."shop_id" LEFT JOIN "account" a ON a."id" = p."account_id"
  WHERE p."commission_id" = $1 AND p."left_at" IS NULL
  ORDER BY p."joined_at", p."id"`;

const INVITATIONS_SQL = `
  SELECT "id", "email", "roles", "created_at", "expires_at" FROM "invitation"
  WHERE "commission_id" = $1 AND "accepted_at" IS NULL AND "withdrawn_at" IS NULL AND "expires_at" > now() ORDER BY "created_at", "id"`;

export async function listParties(
  ctx: RequestContext,
  { params }: ParsedInput<typeof contract>,
): Promise<RouteOutput<typeof contract>> {
  const { commissionId } = params;
  authorizeCommissionSight(ctx.ability, commissionId);
  if (!mayDo(ctx.ability, 'read', 'Party', { commissionId, roles: [] })) throw new NotPermitted();
  const rows = await ctx.manager.query<PartyRow[]>(PARTIES_SQL, [commissionId]);
  const mayInvite = mayDo(ctx.ability, 'invite', 'Commission', { id: commissionId, memberKeys: [] });
  const invitations = mayInvite
    ? await ctx.manager.query<{ id: string; email: string; roles: PartyRole[]; created_at: Date; expires_at: Date }[]>(
        INVITATIONS_SQL,
        [commissionId],
      )
    : [];
  return {
    parties: rows.map((row) => ({
      id: row.id,
      roles: row.roles,
      displayName: row.display_name,
      shopId: row.shop_id,
      tint: row.tint,
      people: row.people,
      seesUntil: row.sees_until,
      joinedAt: row.joined_at.toISOString(),
    })),
    invitations: invitations.map((row) => ({
      id: row.id,
      email: row.email,
      roles: row.roles,
      invitedAt: row.created_at.toISOString(),
      expiresAt: row.expires_at.toISOString(),
    })),
  };
}
