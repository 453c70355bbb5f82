import type { EntityManager } from 'typeorm';
import type { AppAbility } from '../../../shared/abilities/ability.ts';
import { OPEN_REPORT_STATES } from '../../../shared/contracts/vocabulary.ts';
import type { Joint } from '../../entities/joint.ts';
import type { Reading } from '../../entities/reading.ts';
import { abilityToSql } from '../../policies/ability-to-sql.ts';

export type JointRecord = Joint & { openReportId: string | null };
export type ReadingRecord = Reading & { takenBy: string };

const OPEN = OPEN_REPORT_STATES.map((state) => `'${state}'`).join(', ');

const jointsSql = (where: string): string => `
  SELECT j."id", j."commission_id" AS "commissionId", j."name", j."kind", j."hole_part_id" AS "holePartId", j."shaft_part_id" AS "shaftPartId",
    j."hole_party_id" AS "holePartyId", j."shaft_party_id" AS "shaftPartyId", j."nominal_mm" AS "nominalMm",
    j."clearance_min_um" AS "clearanceMinUm", j."clearance_max_um" AS "clearanceMaxUm", j."hole_class" AS "holeClass",
    j."shaft_class" AS "shaftClass", j."hand_fit" AS "handFit", j."engagement_mm" AS "engagementMm",
    j."hidden_length_mm" AS "hiddenLengthMm", j."note", j."revision",
    (SELECT f."id" FROM "fit_report" f WHERE f."joint_id" = j."id" AND f."state" IN (${OPEN})) AS "openReportId"
  FROM "joint" j WHERE j."commission_id" = $1 AND ${where} ORDER BY j."name", j."id"`;

/** Joints the reader answers for; the lead's sight is all of them. */
export function loadVisibleJoints(
  manager: EntityManager,
  ability: AppAbility,
  commissionId: string,
): Promise<JointRecord[]> {
  const sight = abilityToSql(ability, 'read', 'Joint', 'j', 2);
  return manager.query<JointRecord[]>(jointsSql(sight.sql), [commissionId, ...sight.params]);
}

export async function loadJoint(
  manager: EntityManager,
  commissionId: string,
  jointId: string,
): Promise<JointRecord | null> {
  const [row] = await manager.query<JointRecord[]>(jointsSql('j."id" = $2'), [commissionId, jointId]);
  return row ?? null;
}

/** Readings of a joint in the order they were taken. */
export const loadReadings = (manager: EntityManager, jointId: string): Promise<ReadingRecord[]> =>
  manager.query<ReadingRecord[]>(
    `SELECT r."id", r."joint_id" AS "jointId", r."report_id" AS "reportId", r."side", r."set_number" AS "setNumber", r."position",
       r."value_mm" AS "valueMm", r."entered_text" AS "enteredText", r."entered_unit" AS "enteredUnit", r."resolution_um" AS "resolutionUm",
       r."station_mm" AS "stationMm", r."angle_deg" AS "angleDeg", r."temperature_c" AS "temperatureC", r."humidity_pct" AS "humidityPct",
       r."gauge", r."party_id" AS "partyId", r."account_id" AS "accountId", r."taken_at" AS "takenAt", a."display_name" AS "takenBy"
     FROM "reading" r JOIN "account" a ON a."id" = r."account_id"
     WHERE r."joint_id" = $1 ORDER BY r."set_number", r."side", r."position"`,
    [jointId],
  );
