import { In, IsNull, type EntityManager } from 'typeorm';
import { Party } from '../../entities/party.ts';
import { InputInvalid } from '../../errors.ts';

/** Checks that named parties take part in the commission now, and do not only look on; `pointer` names the field. */
export async function requireParties(
  manager: EntityManager,
  commissionId: string,
  wanted: readonly [pointer: string, partyId: string][],
): Promise<Map<string, Party>> {
  const ids = [...new Set(wanted.map(([, partyId]) => partyId))];
  const rows = await manager.findBy(Party, { commissionId, id: In(ids), leftAt: IsNull() });
  const byId = new Map(rows.map((row) => [row.id, row]));
  refuse(wanted, (partyId) =>
    byId.has(partyId)
      ? byId.get(partyId)?.roles.includes('guest')
        ? 'A guest only looks on'
        : null
      : 'This party does not take part in the commission',
  );
  return byId;
}

/** As `requireParties`, for what is a shop's work or answer. */
export async function requireShops(
  manager: EntityManager,
  commissionId: string,
  wanted: readonly [pointer: string, partyId: string][],
): Promise<void> {
  const parties = await requireParties(manager, commissionId, wanted);
  refuse(wanted, (partyId) => (parties.get(partyId)?.shopId ? null : 'This is work of a shop'));
}

function refuse(
  wanted: readonly [pointer: string, partyId: string][],
  troubleWith: (partyId: string) => string | null,
): void {
  const errors = wanted.flatMap(([pointer, partyId]) => {
    const message = troubleWith(partyId);
    return message ? [{ pointer, message }] : [];
  });
  if (errors.length > 0) throw new InputInvalid(errors);
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
