import type { DataSource } from 'typeorm';
import { abilityFor } from '../../../shared/abilities/ability.ts';
import { actorStatement, loadActor, type KnownActor } from '../../../server/policies/load-actor.ts';
import { listStatement } from '../../../server/queries/commissions/list-commissions.ts';
import { messagesStatement } from '../../../server/queries/threads/list-messages.ts';
import type { Statement } from '../bare/settings.ts';
import type { PostPlace, Reader } from './data.ts';

export const PAGE_ROWS = 50;

/** The statement that connect-pg-simple sends for each request. */
const sessionStatement = (reader: Reader): Statement => ({
  text: 'SELECT sess FROM "web_session" WHERE sid = $1 AND expire >= to_timestamp($2)',
  values: [reader.sessionId, Math.ceil(Date.now() / 1000)],
});

/** The application's own look-up of who is asking, and its answer. */
async function actorOf(
  db: DataSource,
  reader: Reader,
  commissionId: string | null,
): Promise<{ known: KnownActor; statement: Statement }> {
  const known = await loadActor(db, reader.accountId, { commissionId });
  if (!known) throw new Error('The reader is not known to the application');
  return { known, statement: actorStatement(reader.accountId, { commissionId }) };
}

export interface PageStatements {
  readonly page: Statement;
  /** Session and actor; for a thread also the row of the thread. */
  readonly before: readonly Statement[];
}

export async function listStatements(db: DataSource, reader: Reader, cursor?: string): Promise<PageStatements> {
  const { known, statement } = await actorOf(db, reader, null);
  const ctx = { ability: abilityFor(known.actor), actor: known.actor };
  return {
    page: listStatement(ctx, { limit: PAGE_ROWS, cursor }),
    before: [sessionStatement(reader), statement],
  };
}

export async function threadStatements(
  db: DataSource,
  reader: Reader,
  place: PostPlace,
  before?: number,
): Promise<PageStatements> {
  const { statement } = await actorOf(db, reader, place.commissionId);
  const thread = {
    text: 'SELECT * FROM "thread" WHERE "id" = $1 AND "commission_id" = $2 LIMIT 1',
    values: [place.threadId, place.commissionId],
  };
  return {
    page: messagesStatement(place.threadId, { before, limit: PAGE_ROWS }),
    before: [sessionStatement(reader), statement, thread],
  };
}
