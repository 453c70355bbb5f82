import type { EntityManager } from 'typeorm';
import type { listShopMembers, ShopMemberView } from '../../../shared/contracts/shops.ts';
import type { RouteOutput } from '../../../shared/contracts/route.ts';
import type { ShopRole } from '../../../shared/contracts/vocabulary.ts';

type Members = RouteOutput<typeof listShopMembers>;

interface MemberRow {
  account_id: string;
  display_name: string;
  email: string;
  role: ShopRole;
  joined_at: Date;
}

const presentMember = (row: MemberRow): ShopMemberView => ({
  accountId: row.account_id,
  displayName: row.display_name,
  email: row.email,
  role: row.role,
  joinedAt: row.joined_at.toISOString(),
});

export async function loadMembers(manager: EntityManager, shopId: string): Promise<Members['members']> {
  const rows = await manager.query<MemberRow[]>(
    `SELECT m."account_id", a."display_name", a."email", m."role", m."joined_at" FROM "shop_member" m JOIN "account" a ON a."id" = m."account_id"
     WHERE m."shop_id" = $1 ORDER BY a."display_name", a."id"`,
    [shopId],
  );
  return rows.map(presentMember);
}

export async function loadShopInvitations(manager: EntityManager, shopId: string): Promise<Members['invitations']> {
  const rows = await manager.query<
    { id: string; email: string; shop_role: ShopRole; created_at: Date; expires_at: Date }[]
  >(
    `SELECT "id", "email", "shop_role", "created_at", "expires_at" FROM "invitation"
     WHERE "shop_id" = $1 AND "accepted_at" IS NULL AND "withdrawn_at" IS NULL AND "expires_at" > now() ORDER BY "created_at", "id"`,
    [shopId],
  );
  return rows.map((row) => ({
    id: row.id,
    email: row.email,
    role: row.shop_role,
    invitedAt: row.created_at.toISOString(),
    expiresAt: row.expires_at.toISOString(),
  }));
}
