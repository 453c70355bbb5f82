import type { markThreadRead as contract } from '../../../shared/contracts/threads.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import type { RequestContext } from '../../http/context.ts';
import { loadThread } from '../../queries/threads/load-thread.ts';

/** Moves a person's mark forward, never back and never past the last message. */
export async function markThreadRead(
  ctx: RequestContext,
  { params, body }: ParsedInput<typeof contract>,
): Promise<void> {
  const thread = await loadThread(ctx.db, ctx.ability, params.commissionId, params.threadId);
  await ctx.manager.query(
    `INSERT INTO "thread_mark" ("thread_id", "account_id", "read_sequence") VALUES ($1, $2, $3)
     ON CONFLICT ("thread_id", "account_id") DO UPDATE SET "read_sequence" = GREATEST("thread_mark"."read_sequence", EXCLUDED."read_sequence")`,
    [thread.id, ctx.actor.accountId, Math.min(body.readSequence, thread.lastSequence)],
  );
}
