import type { EntityManager } from 'typeorm';
import type { MovedView } from '../../../shared/contracts/standing.ts';
import {
  OPEN_REPORT_STATES,
  type CommissionState,
  type LegState,
  type PartyRole,
  type ReportState,
} from '../../../shared/contracts/vocabulary.ts';

const OPEN = OPEN_REPORT_STATES.map((state) => `'${state}'`).join(', ');

/** What the bench looks at, each in one statement over all of a person's open commissions. */
export interface BenchFacts {
  commissions: {
    id: string;
    title: string;
    code: string;
    coverFileId: string | null;
    state: CommissionState;
    leadName: string;
  }[];
  parties: { id: string; commissionId: string; name: string; roles: PartyRole[]; left: boolean }[];
  legs: {
    id: string;
    commissionId: string;
    partyId: string;
    title: string;
    state: LegState;
    plannedStartOn: string | null;
    revision: number;
    openBefore: number;
    heldSince: string | null;
    waiting: number;
  }[];
  reports: {
    id: string;
    commissionId: string;
    title: string;
    state: ReportState;
    raisedByPartyId: string;
    answerPartyId: string;
    revision: number;
    heldLegId: string | null;
    noteId: string | null;
    shows: boolean | null;
    consentState: string | null;
    raisedOn: string;
  }[];
  handoffs: {
    id: string;
    commissionId: string;
    fromPartyId: string;
    toPartyId: string;
    agreedOn: string | null;
    revision: number;
    partNames: string;
    offerId: string | null;
    offerByPartyId: string | null;
    offerOn: string | null;
    holderReady: boolean;
  }[];
  mentions: { threadId: string; commissionId: string; title: string; count: number }[];
}

export async function loadBenchFacts(
  manager: EntityManager,
  accountId: string,
  commissionIds: string[],
): Promise<BenchFacts> {
  const ask = <T>(sql: string, params: unknown[] = [commissionIds]): Promise<T[]> => manager.query<T[]>(sql, params);
  const [commissions, parties, legs, reports, handoffs, mentions] = await Promise.all([
    ask<BenchFacts['commissions'][number]>(
      `SELECT "id", "title", "code", "cover_file_id" AS "coverFileId", "state" FROM "commission" WHERE "id" = ANY($1) AND "state" <> 'ended'`,
    ),
    ask<BenchFacts['parties'][number]>(
      `SELECT p."id", p."commission_id" AS "commissionId", p."roles", p."left_at" IS NOT NULL AS left, COALESCE(s."name", a."display_name") AS name FROM "party" p
         LEFT JOIN "shop" s ON s."id" = p."shop_id" LEFT JOIN "account" a ON a."id" = p."account_id" WHERE p."commission_id" = ANY($1)`,
    ),
    ask<BenchFacts['legs'][number]>(
      `SELECT l."id", l."commission_id" AS "commissionId", l."party_id" AS "partyId", l."title", l."state", l."planned_start_on"::text AS "plannedStartOn", l."revision",
         (SELECT count(*)::int FROM "leg_order" o JOIN "leg" b ON b."id" = o."after_leg_id" WHERE o."leg_id" = l."id" AND b."state" IN ('planned', 'under-way')) AS "openBefore",
         (SELECT count(*)::int FROM "leg_order" o JOIN "leg" w ON w."id" = o."leg_id" WHERE o."after_leg_id" = l."id" AND w."state" = 'planned') AS "waiting",
         (SELECT min(f."raised_at")::date::text FROM "fit_report" f WHERE f."held_leg_id" = l."id" AND f."blocking" AND f."state" IN (${OPEN})) AS "heldSince"
       FROM "leg" l WHERE l."commission_id" = ANY($1) AND l."state" IN ('planned', 'under-way') ORDER BY l."position"`,
    ),
    ask<BenchFacts['reports'][number]>(
      `SELECT f."id", f."commission_id" AS "commissionId", f."title", f."state", f."raised_by_party_id" AS "raisedByPartyId", f."answer_party_id" AS "answerPartyId",
         f."revision", f."held_leg_id" AS "heldLegId", n."id" AS "noteId", n."shows", n."consent_state" AS "consentState", f."raised_at"::date::text AS "raisedOn"
       FROM "fit_report" f LEFT JOIN LATERAL (SELECT * FROM "rework_note" r WHERE r."report_id" = f."id" ORDER BY r."created_at" DESC, r."id" DESC LIMIT 1) n ON TRUE
       WHERE f."commission_id" = ANY($1) AND f."state" IN (${OPEN}) ORDER BY f."raised_at"`,
    ),
    ask<BenchFacts['handoffs'][number]>(
      `SELECT h."id", h."commission_id" AS "commissionId", h."from_party_id" AS "fromPartyId", h."to_party_id" AS "toPartyId", h."agreed_on"::text AS "agreedOn", h."revision",
         (SELECT string_agg(p."name", ', ' ORDER BY p."position") FROM "part" p WHERE p."id" = ANY(h."part_ids")) AS "partNames",
         NOT EXISTS (SELECT 1 FROM "part" p WHERE p."id" = ANY(h."part_ids") AND p."holder_party_id" <> h."from_party_id") AS "holderReady",
         o."id" AS "offerId", o."by_party_id" AS "offerByPartyId", o."on_day"::text AS "offerOn"
       FROM "handoff" h LEFT JOIN "handoff_offer" o ON o."handoff_id" = h."id" AND o."state" = 'standing'
       WHERE h."commission_id" = ANY($1) AND h."done_on" IS NULL AND h."dropped_at" IS NULL ORDER BY h."agreed_on" NULLS LAST`,
    ),
    ask<BenchFacts['mentions'][number]>(
      `SELECT t."id" AS "threadId", t."commission_id" AS "commissionId", t."title", count(*)::int AS count
       FROM "message" m JOIN "thread" t ON t."id" = m."thread_id" LEFT JOIN "thread_mark" k ON k."thread_id" = t."id" AND k."account_id" = $2
       WHERE t."commission_id" = ANY($1) AND $2 = ANY(m."mentioned_account_ids") AND m."sequence" > COALESCE(k."read_sequence", 0)
       GROUP BY t."id" ORDER BY max(m."created_at")`,
      [commissionIds, accountId],
    ),
  ]);
  return { commissions, parties, legs, reports, handoffs, mentions };
}

interface MovedRow {
  id: string;
  commission_id: string;
  title: string;
  words: string;
  by: string | null;
  at: Date;
  subject: string;
  subject_id: string;
}

/** Sight of a history line, by the reader's parties: named ones, every shop, or the client where it is theirs to read. */
const SIGHT = `(
  (h."party_ids" IS NULL AND p."shop_id" IS NOT NULL) OR p."id" = ANY(h."party_ids")
  OR 'lead' = ANY(p."roles") OR (h."client_may_read" AND 'client' = ANY(p."roles")))`;

/**
 * History lines the person may read, newest first.
 * @param before only lines with a smaller id
 * @param notBy leaves out what this account did itself
 */
export async function loadMoved(
  manager: EntityManager,
  partyIds: readonly string[],
  options: { commissionId?: string; before?: string; since?: Date; notBy?: string; limit: number },
): Promise<MovedView[]> {
  const rows = await manager.query<MovedRow[]>(
    `SELECT h."id", h."commission_id", c."title", h."words", a."display_name" AS by, h."at", h."subject", h."subject_id"
     FROM "history_line" h JOIN "commission" c ON c."id" = h."commission_id" LEFT JOIN "account" a ON a."id" = h."account_id"
     WHERE h."commission_id" IN (SELECT q."commission_id" FROM "party" q WHERE q."id" = ANY($1))
       AND EXISTS (SELECT 1 FROM "party" p WHERE p."id" = ANY($1) AND p."commission_id" = h."commission_id" AND ${SIGHT})
       AND ($2::uuid IS NULL OR h."commission_id" = $2) AND ($3::bigint IS NULL OR h."id" < $3)
       AND ($4::timestamptz IS NULL OR h."at" > $4) AND ($5::uuid IS NULL OR h."account_id" IS DISTINCT FROM $5)
     ORDER BY h."id" DESC LIMIT $6`,
    [
      partyIds,
      options.commissionId ?? null,
      options.before ?? null,
      options.since ?? null,
      options.notBy ?? null,
      options.limit,
    ],
  );
  return rows.map((row) => ({
    id: row.id,
    commissionId: row.commission_id,
    commissionTitle: row.title,
    words: row.words,
    by: row.by ?? 'Ferrule',
    at: row.at.toISOString(),
    subject: row.subject,
    subjectId: row.subject_id,
  }));
}
