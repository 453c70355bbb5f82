import type { EntityManager } from 'typeorm';
import { HANDOFF_FIELDS, type AppAbility } from '../../../shared/abilities/ability.ts';
import type { HandoffOfferView, HandoffView } from '../../../shared/contracts/handoffs.ts';
import { abilityToSql } from '../../policies/ability-to-sql.ts';
import { fieldsFor, pickFields } from '../../presenters/pick-fields.ts';

export interface HandoffRecord {
  id: string;
  commissionId: string;
  fromPartyId: string;
  toPartyId: string;
  partIds: string[];
  fromLegId: string | null;
  toLegId: string | null;
  transitDays: number;
  carriage: string;
  agreedOn: string | null;
  doneOn: string | null;
  revision: number;
  offers: HandoffOfferView[];
}

const handoffsSql = (where: string): string => `
  SELECT h."id", h."commission_id" AS "commissionId", h."from_party_id" AS "fromPartyId", h."to_party_id" AS "toPartyId",
    to_jsonb(h."part_ids") AS "partIds", h."from_leg_id" AS "fromLegId", h."to_leg_id" AS "toLegId", h."transit_days" AS "transitDays",
    h."carriage", h."agreed_on"::text AS "agreedOn", h."done_on"::text AS "doneOn", h."revision",
    COALESCE((SELECT jsonb_agg(jsonb_build_object(
        'id', o."id", 'byPartyId', o."by_party_id", 'byName', b."display_name", 'onDay', o."on_day"::text, 'words', o."words", 'state', o."state",
        'at', to_char(o."created_at" AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"'), 'answeredBy', r."display_name",
        'answeredAt', to_char(o."answered_at" AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"'), 'reason', o."reason")
        ORDER BY o."created_at" DESC, o."id")
      FROM "handoff_offer" o JOIN "account" b ON b."id" = o."by_account_id" LEFT JOIN "account" r ON r."id" = o."answered_by_account_id"
      WHERE o."handoff_id" = h."id"), '[]') AS "offers"
  FROM "handoff" h WHERE h."commission_id" = $1 AND h."dropped_at" IS NULL AND ${where}
  ORDER BY h."done_on" NULLS LAST, h."agreed_on" NULLS LAST, h."id"`;

export function loadVisibleHandoffs(
  manager: EntityManager,
  ability: AppAbility,
  commissionId: string,
): Promise<HandoffRecord[]> {
  const sight = abilityToSql(ability, 'read', 'Handoff', 'h', 2);
  return manager.query<HandoffRecord[]>(handoffsSql(sight.sql), [commissionId, ...sight.params]);
}

/** Every handoff, for computing. */
export const loadAllHandoffs = (manager: EntityManager, commissionId: string): Promise<HandoffRecord[]> =>
  manager.query<HandoffRecord[]>(handoffsSql('TRUE'), [commissionId]);

export async function loadHandoff(
  manager: EntityManager,
  commissionId: string,
  handoffId: string,
): Promise<HandoffRecord | null> {
  const [row] = await manager.query<HandoffRecord[]>(handoffsSql('h."id" = $2'), [commissionId, handoffId]);
  return row ?? null;
}

const FIELDS = Object.values(HANDOFF_FIELDS).flat();

export function presentHandoff(ability: AppAbility, row: HandoffRecord): HandoffView {
  const { commissionId: _commissionId, ...full } = row;
  return pickFields(full, fieldsFor(ability, 'read', 'Handoff', row, FIELDS));
}
