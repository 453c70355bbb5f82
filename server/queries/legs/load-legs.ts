import type { EntityManager } from 'typeorm';
import type { AppAbility } from '../../../shared/abilities/ability.ts';
import { OPEN_REPORT_STATES, type LegKind, type LegState } from '../../../shared/contracts/vocabulary.ts';
import { abilityToSql } from '../../policies/ability-to-sql.ts';

/** A leg with what it waits for and what holds it, in one statement whatever the number of legs. */
export interface LegRecord {
  id: string;
  commissionId: string;
  partyId: string;
  partId: string;
  kind: LegKind;
  title: string;
  state: LegState;
  hopefulDays: number;
  likelyDays: number;
  badDays: number;
  plannedStartOn: string | null;
  startedOn: string | null;
  finishedOn: string | null;
  privateNote: string;
  position: number;
  revision: number;
  afterLegIds: string[];
  heldBy: { reportId: string; title: string; sinceDay: string; raisedByPartyId: string; answerPartyId: string } | null;
}

const OPEN = OPEN_REPORT_STATES.map((state) => `'${state}'`).join(', ');

const legsSql = (sight: string): string => `
  SELECT l."id", l."commission_id" AS "commissionId", l."party_id" AS "partyId", l."part_id" AS "partId", l."kind", l."title", l."state",
    l."hopeful_days" AS "hopefulDays", l."likely_days" AS "likelyDays", l."bad_days" AS "badDays",
    l."planned_start_on"::text AS "plannedStartOn", l."started_on"::text AS "startedOn", l."finished_on"::text AS "finishedOn",
    l."private_note" AS "privateNote", l."position", l."revision",
    COALESCE((SELECT jsonb_agg(o."after_leg_id" ORDER BY o."after_leg_id") FROM "leg_order" o WHERE o."leg_id" = l."id"), '[]') AS "afterLegIds",
    (SELECT jsonb_build_object('reportId', f."id", 'title', f."title", 'sinceDay', (f."raised_at" AT TIME ZONE 'UTC')::date::text,
        'raisedByPartyId', f."raised_by_party_id", 'answerPartyId', f."answer_party_id")
      FROM "fit_report" f WHERE f."held_leg_id" = l."id" AND f."blocking" AND f."state" IN (${OPEN})
      ORDER BY f."raised_at", f."id" LIMIT 1) AS "heldBy"
  FROM "leg" l WHERE l."commission_id" = $1 AND ${sight} ORDER BY l."position", l."id"`;

/** Legs the reader may see. */
export function loadVisibleLegs(
  manager: EntityManager,
  ability: AppAbility,
  commissionId: string,
): Promise<LegRecord[]> {
  const sight = abilityToSql(ability, 'read', 'Leg', 'l', 2);
  return manager.query<LegRecord[]>(legsSql(sight.sql), [commissionId, ...sight.params]);
}

/** Every leg, for computing; what comes of it is shown only through a presenter or the merged status. */
export const loadAllLegs = (manager: EntityManager, commissionId: string): Promise<LegRecord[]> =>
  manager.query<LegRecord[]>(legsSql('TRUE'), [commissionId]);

export async function loadLeg(manager: EntityManager, commissionId: string, legId: string): Promise<LegRecord | null> {
  return (await loadAllLegs(manager, commissionId)).find((leg) => leg.id === legId) ?? null;
}
