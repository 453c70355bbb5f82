import type { listThreads as contract, ThreadView } from '../../../shared/contracts/threads.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import type { RequestContext } from '../../http/context.ts';
import { abilityToSql } from '../../policies/ability-to-sql.ts';
import { authorizeCommissionSight } from '../../policies/authorize.ts';

type Row = Omit<ThreadView, 'lastMessageAt'> & { lastMessageAt: Date | null };

/** Threads the reader may read, with how far they have read; one statement whatever their number. */
export async function loadThreadViews(
  ctx: RequestContext,
  commissionId: string,
  filter: { subject?: string | undefined; subjectId?: string | undefined; threadId?: string },
): Promise<ThreadView[]> {
  const sight = abilityToSql(ctx.ability, 'read', 'Thread', 't', 6);
  const rows = await ctx.manager.query<Row[]>(
    `SELECT t."id", t."subject", t."subject_id" AS "subjectId", t."title", t."audience", to_jsonb(t."party_ids") AS "partyIds",
       t."last_sequence" AS "lastSequence", COALESCE(k."read_sequence", 0) AS "readSequence", t."last_message_at" AS "lastMessageAt",
       CASE WHEN t."last_sequence" > COALESCE(k."read_sequence", 0) THEN
         (SELECT count(*)::int FROM "message" m WHERE m."thread_id" = t."id" AND m."sequence" > COALESCE(k."read_sequence", 0) AND $2 = ANY(m."mentioned_account_ids"))
         ELSE 0 END AS "unreadMentions"
     FROM "thread" t LEFT JOIN "thread_mark" k ON k."thread_id" = t."id" AND k."account_id" = $2
     WHERE t."commission_id" = $1 AND ($3::text IS NULL OR t."subject" = $3) AND ($4::uuid IS NULL OR t."subject_id" = $4) AND ($5::uuid IS NULL OR t."id" = $5)
       AND ${sight.sql}
     ORDER BY t."last_message_at" DESC NULLS LAST, t."created_at" DESC, t."id"`,
    [
      commissionId,
      ctx.actor.accountId,
      filter.subject ?? null,
      filter.subjectId ?? null,
      filter.threadId ?? null,
      ...sight.params,
    ],
  );
  return rows.map((row) => ({ ...row, lastMessageAt: row.lastMessageAt?.toISOString() ?? null }));
}

export async function listThreads(
  ctx: RequestContext,
  { params, query }: ParsedInput<typeof contract>,
): Promise<ThreadView[]> {
  authorizeCommissionSight(ctx.ability, params.commissionId);
  return loadThreadViews(ctx, params.commissionId, query);
}
