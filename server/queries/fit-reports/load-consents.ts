import type { EntityManager } from 'typeorm';
import type { ConsentView } from '../../../shared/contracts/fit-reports.ts';
import type { ConsentState } from '../../../shared/contracts/vocabulary.ts';

interface Row {
  note_id: string;
  report_id: string;
  piece_title: string;
  asked_by: string;
  consent_asked_at: Date;
  method: string;
  where_it_shows: string;
  client_words: string;
  consent_state: ConsentState;
  consent_answered_at: Date | null;
  consent_words: string;
  before_file_ids: string[];
}

/**
 * What the client is asked, and what they answered. The maker's own words on the method stay with the makers; the client
 * reads the lead's words, or a plain default, and where it will show.
 */
export async function loadConsents(
  manager: EntityManager,
  commissionId: string,
  noteId: string | null = null,
): Promise<ConsentView[]> {
  const rows = await manager.query<Row[]>(
    `SELECT n."id" AS note_id, n."report_id", c."title" AS piece_title, COALESCE(s."name", '') AS asked_by, n."consent_asked_at",
       n."where_it_shows", f."client_words", n."consent_state", n."consent_answered_at", n."consent_words",
       COALESCE((SELECT jsonb_agg(x."id" ORDER BY x."created_at", x."id") FROM "stored_file" x
         WHERE x."place" = 'report' AND x."place_id" = f."id" AND x."purpose" = 'before' AND x."width" IS NOT NULL), '[]') AS before_file_ids
     FROM "rework_note" n JOIN "fit_report" f ON f."id" = n."report_id" JOIN "commission" c ON c."id" = f."commission_id"
       JOIN "party" p ON p."id" = n."party_id" LEFT JOIN "shop" s ON s."id" = p."shop_id"
     WHERE f."commission_id" = $1 AND n."consent_state" IS NOT NULL AND ($2::uuid IS NULL OR n."id" = $2)
     ORDER BY n."consent_asked_at" DESC, n."id"`,
    [commissionId, noteId],
  );
  return rows.map((row) => ({
    noteId: row.note_id,
    reportId: row.report_id,
    pieceTitle: row.piece_title,
    askedBy: row.asked_by,
    askedAt: row.consent_asked_at.toISOString(),
    whatIsDone: row.client_words || 'A part is eased so that it goes together as agreed',
    whereItShows: row.where_it_shows,
    state: row.consent_state,
    answeredAt: row.consent_answered_at?.toISOString() ?? null,
    words: row.consent_words,
    beforeFileIds: row.before_file_ids,
  }));
}
