import type { DataSource } from 'typeorm';
import type { AppAbility } from '../../../shared/abilities/ability.ts';
import { poolOf } from '../../db/data-source.ts';
import type { Thread } from '../../entities/thread.ts';
import { authorize } from '../../policies/authorize.ts';

/** What rights and pages ask of a thread. */
export type ThreadFacts = Pick<Thread, 'id' | 'commissionId' | 'audience' | 'partyIds' | 'lastSequence'>;

/** The thread, whoever asks. A named statement: every page and every message begins with it. */
export async function findThread(db: DataSource, commissionId: string, threadId: string): Promise<ThreadFacts | null> {
  const { rows } = await poolOf(db).query<ThreadFacts>({
    name: 'thread-facts',
    text: `SELECT "id", "commission_id" AS "commissionId", "audience", "party_ids" AS "partyIds", "last_sequence" AS "lastSequence"
             FROM "thread" WHERE "id" = $1 AND "commission_id" = $2`,
    values: [threadId, commissionId],
  });
  return rows[0] ?? null;
}

/** The thread, when the reader may read it. */
export async function loadThread(
  db: DataSource,
  ability: AppAbility,
  commissionId: string,
  threadId: string,
): Promise<ThreadFacts> {
  const row = await findThread(db, commissionId, threadId);
  authorize(ability, 'read', 'Thread', row);
  return row;
}
