import type { QueryConfig } from 'pg';
import { memberKeysOf } from '../../../shared/abilities/actor.ts';
import { showCode } from '../../../shared/engines/codes/crockford.ts';
import type { listCommissions as contract } from '../../../shared/contracts/commissions.ts';
import { type CommissionRow } from '../../../shared/contracts/commissions.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { OPEN_REPORT_STATES, type CommissionState, type PartyRole } from '../../../shared/contracts/vocabulary.ts';
import { poolOf } from '../../db/data-source.ts';
import type { RequestContext } from '../../http/context.ts';
import { abilityToSql } from '../../policies/ability-to-sql.ts';
import { decodeCursor, encodeCursor } from '../keyset.ts';

interface Row {
  id: string;
  code: string;
  title: string;
  state: CommissionState;
  lead_name: string;
  client_name: string | null;
  your_roles: PartyRole[] | null;
  date_wanted: string | null;
  cover_file_id: string | null;
  held_legs: number;
  updated_at: Date;
  /** The instant with its microseconds, for the page mark. */
  updated_mark: string;
}

const OPEN = OPEN_REPORT_STATES.map((state) => `'${state}'`).join(', ');

/** The statement of one page; also what the bench puts behind its bare handler. */
export function listStatement(
  ctx: Pick<RequestContext, 'ability' | 'actor'>,
  query: ParsedInput<typeof contract>['query'],
): QueryConfig {
  const sight = abilityToSql(ctx.ability, 'read', 'Commission', 'c', 3);
  const values: unknown[] = [query.limit + 1, memberKeysOf(ctx.actor), ...sight.params];
  const bind = (value: unknown): string => `$${values.push(value)}`;
  const where = [sight.sql];
  if (query.state) where.push(`c."state" = ${bind(query.state)}`);
  if (query.search) {
    const pattern = bind(`%${query.search.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`);
    // Codes have signs of patterns among their check characters, so the code is looked for as it is, from its beginning.
    const code = bind(query.search.replaceAll(' ', '').toUpperCase());
    where.push(
      `(c."title" ILIKE ${pattern} OR c."client_name" ILIKE ${pattern} OR c."lead_name" ILIKE ${pattern} OR starts_with(c."code", ${code}))`,
    );
  }
  if (query.cursor) {
    const [instant, id] = decodeCursor(query.cursor, ['instant', 'uuid']);
    where.push(`(c."updated_at", c."id") < (${bind(instant)}::timestamptz, ${bind(id)}::uuid)`);
  }
  const text = `
    SELECT c."id", c."code", c."title", c."state", c."lead_name", c."client_name", c."date_wanted"::text, c."cover_file_id",
      c."updated_at", c."updated_at"::text AS updated_mark,
      (SELECT array_agg(DISTINCT r.role) FROM "party" p, unnest(p."roles") AS r(role)
        WHERE p."commission_id" = c."id" AND p."left_at" IS NULL AND COALESCE(p."shop_id", p."account_id") = ANY($2)) AS your_roles,
      (SELECT count(DISTINCT f."held_leg_id")::int FROM "fit_report" f
        WHERE f."commission_id" = c."id" AND f."blocking" AND f."state" IN (${OPEN})) AS held_legs
    FROM "commission" c WHERE ${where.join(' AND ')}
    ORDER BY c."updated_at" DESC, c."id" DESC LIMIT $1`;
  // Not a named statement: how many commissions are a reader's decides between the index on member keys and the one on
  // time, and a plan made once for all readers walks every commission there is for a shop that has forty.
  return { text, values };
}

export async function listCommissions(
  ctx: RequestContext,
  { query }: ParsedInput<typeof contract>,
): Promise<{ items: CommissionRow[]; nextCursor: string | null }> {
  const { rows } = await poolOf(ctx.db).query<Row>(listStatement(ctx, query));
  const shown = rows.slice(0, query.limit);
  const last = shown.at(-1);
  return {
    items: shown.map(presentRow),
    nextCursor: rows.length > query.limit && last ? encodeCursor([last.updated_mark, last.id]) : null,
  };
}

const presentRow = (row: Row): CommissionRow => ({
  id: row.id,
  code: showCode(row.code),
  title: row.title,
  state: row.state,
  leadName: row.lead_name,
  clientName: row.client_name,
  yourRoles: row.your_roles ?? [],
  dateWanted: row.date_wanted,
  coverFileId: row.cover_file_id,
  heldLegs: row.held_legs,
  updatedAt: row.updated_at.toISOString(),
});
