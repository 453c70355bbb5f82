import type { EntityManager } from 'typeorm';
import type { AppAbility } from '../../../shared/abilities/ability.ts';
import type { FitReportDetail, FitReportView, ReworkNoteView } from '../../../shared/contracts/fit-reports.ts';
import { OPEN_REPORT_STATES } from '../../../shared/contracts/vocabulary.ts';
import type { FitReport } from '../../entities/fit-report.ts';
import type { ReportEvent } from '../../entities/report-event.ts';
import type { ReworkNote } from '../../entities/rework-note.ts';
import { abilityToSql } from '../../policies/ability-to-sql.ts';

type ReportRow = FitReport & { raisedByName: string };

const reportsSql = (where: string): string => `
  SELECT f."id", f."commission_id" AS "commissionId", f."joint_id" AS "jointId", f."title", f."plain_words" AS "plainWords", f."state",
    f."blocking", f."held_leg_id" AS "heldLegId", f."raised_by_party_id" AS "raisedByPartyId",
    f."answer_party_id" AS "answerPartyId", f."client_words" AS "clientWords", f."reopened_count" AS "reopenedCount",
    f."raised_at" AS "raisedAt", f."revision", a."display_name" AS "raisedByName"
  FROM "fit_report" f JOIN "account" a ON a."id" = f."raised_by_account_id"
  WHERE f."commission_id" = $1 AND ${where} ORDER BY f."raised_at" DESC, f."id"`;

const presentReport = (row: ReportRow): FitReportView => ({
  id: row.id,
  jointId: row.jointId,
  title: row.title,
  plainWords: row.plainWords,
  state: row.state,
  blocking: row.blocking,
  heldLegId: row.heldLegId,
  raisedByPartyId: row.raisedByPartyId,
  raisedByName: row.raisedByName,
  answerPartyId: row.answerPartyId,
  raisedAt: row.raisedAt.toISOString(),
  reopenedCount: row.reopenedCount,
  clientWords: row.clientWords,
  revision: row.revision,
});

/** Reports the reader raised or answers; the lead's sight is all of them. */
export async function loadVisibleReports(
  manager: EntityManager,
  ability: AppAbility,
  commissionId: string,
  open: 'yes' | 'no' | undefined,
): Promise<FitReportView[]> {
  const sight = abilityToSql(ability, 'read', 'FitReport', 'f', 3);
  const states = `(f."state" = ANY($2)) = ${open === 'no' ? 'FALSE' : 'TRUE'}`;
  const where = `${sight.sql} AND (${open === undefined ? '$2::text[] IS NOT NULL' : states})`;
  const rows = await manager.query<ReportRow[]>(reportsSql(where), [
    commissionId,
    [...OPEN_REPORT_STATES],
    ...sight.params,
  ]);
  return rows.map(presentReport);
}

type NoteRow = ReworkNote & { authorName: string };
type EventRow = ReportEvent & { by: string };

const presentNote = (row: NoteRow): ReworkNoteView => ({
  id: row.id,
  partyId: row.partyId,
  authorName: row.authorName,
  at: row.createdAt.toISOString(),
  state: row.state,
  method: row.method,
  cutSide: row.cutSide,
  removeOnDiameterUm: row.removeOnDiameterUm,
  overLengthMm: row.overLengthMm,
  risk: row.risk,
  shows: row.shows,
  whereItShows: row.whereItShows,
  costMinor: row.costMinor,
  currency: row.currency,
  costBorneByPartyId: row.costBorneByPartyId,
  effectDays: row.effectDays,
  consent: row.consentState && {
    state: row.consentState,
    at: (row.consentAnsweredAt ?? row.consentAskedAt)?.toISOString() ?? null,
    words: row.consentWords,
  },
});

/** One report whole: its notes, newest last, and its history. The caller has authorized reading it. */
export async function loadReportDetail(
  manager: EntityManager,
  commissionId: string,
  reportId: string,
): Promise<FitReportDetail> {
  // One after another: acts ask this inside their transaction, whose connection takes one statement at a time.
  const [report] = await manager.query<ReportRow[]>(reportsSql('f."id" = $2'), [commissionId, reportId]);
  const notes = await manager.query<NoteRow[]>(
    `SELECT n."id", n."party_id" AS "partyId", n."state", n."method", n."cut_side" AS "cutSide", n."remove_on_diameter_um" AS "removeOnDiameterUm",
         n."over_length_mm" AS "overLengthMm", n."risk", n."shows", n."where_it_shows" AS "whereItShows", n."cost_minor" AS "costMinor", n."currency",
         n."cost_borne_by_party_id" AS "costBorneByPartyId", n."effect_days" AS "effectDays", n."consent_state" AS "consentState",
         n."consent_asked_at" AS "consentAskedAt", n."consent_answered_at" AS "consentAnsweredAt", n."consent_words" AS "consentWords",
         n."created_at" AS "createdAt", a."display_name" AS "authorName"
       FROM "rework_note" n JOIN "account" a ON a."id" = n."account_id" WHERE n."report_id" = $1 ORDER BY n."created_at", n."id"`,
    [reportId],
  );
  const events = await manager.query<EventRow[]>(
    `SELECT e."id", e."act", e."from_state" AS "fromState", e."to_state" AS "toState", e."words", e."at", a."display_name" AS "by"
       FROM "report_event" e JOIN "account" a ON a."id" = e."account_id" WHERE e."report_id" = $1 ORDER BY e."at", e."id"`,
    [reportId],
  );
  if (!report) throw new Error('A report that was just authorized is gone');
  return {
    report: presentReport(report),
    notes: notes.map(presentNote),
    events: events.map((row) => ({
      id: row.id,
      act: row.act,
      fromState: row.fromState,
      toState: row.toState,
      by: row.by,
      at: row.at.toISOString(),
      words: row.words,
    })),
  };
}
