import type { EntityManager } from 'typeorm';
import type { AccountView } from '../../../shared/contracts/accounts.ts';
import type { LengthUnit, ShopRole } from '../../../shared/contracts/vocabulary.ts';
import { AppError } from '../../errors.ts';

interface Row {
  id: string;
  email: string;
  display_name: string;
  preferred_unit: LengthUnit;
  time_zone: string;
  totp_confirmed_at: Date | null;
  is_steward: boolean;
  recovery_codes_left: number;
  shops: { shopId: string; name: string; role: ShopRole }[];
}

/** The account as its own person sees it. */
export async function loadAccountView(manager: EntityManager, accountId: string): Promise<AccountView> {
  const [row] = await manager.query<Row[]>(
    `SELECT a."id", a."email", a."display_name", a."preferred_unit", a."time_zone", a."totp_confirmed_at", a."is_steward",
       (SELECT count(*)::int FROM "recovery_code" c WHERE c."account_id" = a."id" AND c."used_at" IS NULL) AS recovery_codes_left,
       COALESCE((SELECT jsonb_agg(jsonb_build_object('shopId', s."id", 'name', s."name", 'role', m."role") ORDER BY s."name", s."id")
         FROM "shop_member" m JOIN "shop" s ON s."id" = m."shop_id" WHERE m."account_id" = a."id"), '[]') AS shops
     FROM "account" a WHERE a."id" = $1`,
    [accountId],
  );
  if (!row) throw new AppError('not-signed-in');
  return {
    id: row.id,
    email: row.email,
    displayName: row.display_name,
    preferredUnit: row.preferred_unit,
    timeZone: row.time_zone,
    secondFactor: row.totp_confirmed_at !== null,
    recoveryCodesLeft: row.recovery_codes_left,
    isSteward: row.is_steward,
    shops: row.shops,
  };
}

export interface SignInFacts {
  id: string;
  displayName: string;
  email: string;
  passwordHash: string;
  secondFactor: boolean;
}

/** What a sign-in needs to know, by address or id. */
export async function loadSignInFacts(
  manager: EntityManager,
  by: { email: string } | { id: string },
): Promise<SignInFacts | null> {
  const [row] = await manager.query<SignInFacts[]>(
    `SELECT "id", "display_name" AS "displayName", "email", "password_hash" AS "passwordHash", "totp_confirmed_at" IS NOT NULL AS "secondFactor"
     FROM "account" WHERE ${'email' in by ? '"email"' : '"id"'} = $1`,
    ['email' in by ? by.email : by.id],
  );
  return row ?? null;
}
