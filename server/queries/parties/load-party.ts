import { In, IsNull, type EntityManager } from 'typeorm';
import { Party } from '../../entities/party.ts';
import { InputInvalid } from '../../errors.ts';

/** Checks that named parties take part in the commission now; `pointer` names the field when one does not. */
export async function requireParties(
  manager: EntityManager,
  commissionId: string,
  wanted: readonly [pointer: string, partyId: string][],
): Promise<Map<string, Party>> {
  const ids = [...new Set(wanted.map(([, partyId]) => partyId))];
  const rows = await manager.findBy(Party, { commissionId, id: In(ids), leftAt: IsNull() });
  const byId = new Map(rows.map((row) => [row.id, row]));
  const errors = wanted
    .filter(([, partyId]) => !byId.has(partyId))
    .map(([pointer]) => ({ pointer, message: 'This party does not take part in the commission' }));
  if (errors.length > 0) throw new InputInvalid(errors);
  return byId;
}

/** Names of parties as they are printed, those that left included. */
export async function partyNames(manager: EntityManager, commissionId: string): Promise<Map<string, string>> {
  const rows = await manager.query<{ id: string; name: string }[]>(
    `SELECT p."id", COALESCE(s."name", a."display_name") AS name
       FROM "party" p LEFT JOIN "shop" s ON s."id" = p."shop_id" LEFT JOIN "account" a ON a."id" = p."account_id"
      WHERE p."commission_id" = $1`,
    [commissionId],
  );
  return new Map(rows.map((row) => [row.id, row.name]));
}
