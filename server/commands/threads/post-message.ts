import { QueryFailedError } from 'typeorm';
import type { MessageView, postMessage as contract } from '../../../shared/contracts/threads.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { poolOf } from '../../db/data-source.ts';
import { StoredFile } from '../../entities/stored-file.ts';
import { AppError, InputInvalid } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { actingParty } from '../../policies/acting-party.ts';
import { authorize } from '../../policies/authorize.ts';
import { loadMessage } from '../../queries/threads/list-messages.ts';
import { findThread, type ThreadFacts } from '../../queries/threads/load-thread.ts';
import { readersOf } from '../../queries/threads/thread-readers.ts';

/**
 * Sequence, message and outbox row in one statement and so in one transaction and one round trip. The thread's row lock
 * gives sequences one after another without a gap; a message that is there already takes none, since the update is tied to
 * its absence.
 */
const POST_SQL = `
  WITH fresh AS (
    UPDATE "thread" SET "last_sequence" = "last_sequence" + 1, "last_message_at" = $8
    WHERE "id" = $1 AND NOT EXISTS (SELECT 1 FROM "message" WHERE "author_account_id" = $3 AND "id" = $2)
    RETURNING "id", "commission_id", "last_sequence"
  ), posted AS (
    INSERT INTO "message" ("thread_id", "sequence", "id", "author_account_id", "author_party_id", "body", "mentioned_account_ids", "file_ids", "created_at")
    SELECT "id", "last_sequence", $2, $3, $4, $5, $6, $7, $8 FROM fresh RETURNING "thread_id", "sequence"
  )
  INSERT INTO "outbox_message" ("topic", "payload")
  SELECT 'event:thread.message-added', jsonb_build_object(
    'event', jsonb_build_object('commissionId', fresh."commission_id", 'threadId', posted."thread_id", 'sequence', posted."sequence"),
    'audience', jsonb_build_object('to', 'thread', 'threadId', posted."thread_id"))
  FROM posted, fresh RETURNING ("payload"->'event'->>'sequence')::int AS sequence`;

async function guardMentions(ctx: RequestContext, thread: ThreadFacts, accountIds: readonly string[]): Promise<void> {
  if (accountIds.length === 0) return;
  const readers = await readersOf(ctx.manager, thread.id);
  const errors = accountIds.flatMap((id, index) =>
    readers.has(id)
      ? []
      : [
          {
            pointer: `/body/mentionedAccountIds/${index}`,
            message: 'This person does not read the thread, so naming them would reach nobody',
          },
        ],
  );
  if (errors.length > 0) throw new InputInvalid(errors);
}

/** A message takes along files that its own writer put into this thread. */
async function guardFiles(ctx: RequestContext, thread: ThreadFacts, fileIds: readonly string[]): Promise<void> {
  for (const [index, id] of fileIds.entries()) {
    const ours = await ctx.manager.countBy(StoredFile, {
      id,
      place: 'thread',
      placeId: thread.id,
      addedByAccountId: ctx.actor.accountId,
    });
    if (ours === 0)
      throw new InputInvalid([
        { pointer: `/body/fileIds/${index}`, message: 'This file was not added to this thread by you' },
      ]);
  }
}

const isRepeat = (thrown: unknown): boolean => {
  const cause = thrown instanceof QueryFailedError ? (thrown.driverError as unknown) : thrown;
  return (cause as { constraint?: string } | null)?.constraint === 'message_author_client_id_key';
};

/** Stores a message under the id its writer made. The same id again gives the stored message, whatever is resent. */
export async function postMessage(
  ctx: RequestContext,
  { params, body }: ParsedInput<typeof contract>,
): Promise<MessageView> {
  const { commissionId, threadId } = params;
  const thread = await findThread(ctx.db, commissionId, threadId);
  authorize(ctx.ability, 'post', 'Thread', thread);
  await guardMentions(ctx, thread, body.mentionedAccountIds);
  await guardFiles(ctx, thread, body.fileIds);
  const { partyId } = actingParty(ctx.actor, commissionId, thread.partyIds);
  const { accountId } = ctx.actor;
  const fileIds = [...new Set(body.fileIds)];
  const sequence = await poolOf(ctx.db)
    .query<{ sequence: number }>({
      name: 'post-message',
      text: POST_SQL,
      values: [threadId, body.id, accountId, partyId, body.body, body.mentionedAccountIds, fileIds, ctx.now],
    })
    .then(
      ({ rows }) => rows[0]?.sequence ?? null,
      (error: unknown) => {
        // Two sends of one message at the same moment: the unique key lets one through, the other finds it stored.
        if (isRepeat(error)) return null;
        throw error;
      },
    );
  if (sequence === null || fileIds.length > 0) {
    const stored = await loadMessage(ctx, threadId, accountId, body.id);
    if (!stored) throw new AppError('already-there', 'A message with this id is in another thread.');
    ctx.wakeRelay();
    return stored;
  }
  ctx.wakeRelay();
  return {
    id: body.id,
    sequence,
    authorAccountId: accountId,
    authorName: ctx.person.displayName,
    authorPartyId: partyId,
    body: body.body,
    mentionedAccountIds: body.mentionedAccountIds,
    files: [],
    at: ctx.now.toISOString(),
  };
}
