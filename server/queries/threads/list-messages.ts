import type { QueryConfig } from 'pg';
import type { listMessages as contract, MessageFileView, MessageView } from '../../../shared/contracts/threads.ts';
import type { ParsedInput, RouteOutput } from '../../../shared/contracts/route.ts';
import { poolOf } from '../../db/data-source.ts';
import type { RequestContext } from '../../http/context.ts';
import { loadThread } from './load-thread.ts';

export interface MessageRow {
  id: string;
  sequence: number;
  author_account_id: string;
  author_name: string;
  author_party_id: string;
  body: string;
  mentioned_account_ids: string[];
  created_at: Date;
  files: MessageFileView[] | null;
}

const COLUMNS = `m."id", m."sequence", m."author_account_id", a."display_name" AS author_name, m."author_party_id", m."body",
  m."mentioned_account_ids", m."created_at",
  CASE WHEN cardinality(m."file_ids") = 0 THEN NULL ELSE
    (SELECT jsonb_agg(jsonb_build_object('id', f."id", 'name', f."name", 'mediaType', f."media_type", 'byteSize', f."byte_size", 'width', f."width", 'height', f."height")
       ORDER BY array_position(m."file_ids", f."id")) FROM "stored_file" f WHERE f."id" = ANY(m."file_ids")) END AS files`;

const FROM = '"message" m JOIN "account" a ON a."id" = m."author_account_id"';

/** One page by sequence, always ascending; also what the bench puts behind its bare handler. */
export function messagesStatement(
  threadId: string,
  query: { before?: number | undefined; after?: number | undefined; limit: number },
): QueryConfig {
  if (query.after !== undefined)
    return {
      name: 'messages-after',
      text: `SELECT ${COLUMNS} FROM ${FROM} WHERE m."thread_id" = $1 AND m."sequence" > $2 ORDER BY m."sequence" LIMIT $3`,
      values: [threadId, query.after, query.limit],
    };
  return {
    name: 'messages-before',
    text: `SELECT * FROM (SELECT ${COLUMNS} FROM ${FROM} WHERE m."thread_id" = $1 AND m."sequence" < $2 ORDER BY m."sequence" DESC LIMIT $3) page ORDER BY "sequence"`,
    values: [threadId, query.before ?? 2_147_483_647, query.limit],
  };
}

export const presentMessage = (row: MessageRow): MessageView => ({
  id: row.id,
  sequence: row.sequence,
  authorAccountId: row.author_account_id,
  authorName: row.author_name,
  authorPartyId: row.author_party_id,
  body: row.body,
  mentionedAccountIds: row.mentioned_account_ids,
  files: row.files ?? [],
  at: row.created_at.toISOString(),
});

export async function listMessages(
  ctx: RequestContext,
  { params, query }: ParsedInput<typeof contract>,
): Promise<RouteOutput<typeof contract>> {
  const thread = await loadThread(ctx.db, ctx.ability, params.commissionId, params.threadId);
  const { rows } = await poolOf(ctx.db).query<MessageRow>(messagesStatement(thread.id, query));
  // The row of the thread was read first: a message stored in between may be in the page already.
  const last = Math.max(thread.lastSequence, rows.at(-1)?.sequence ?? 0);
  return { messages: rows.map(presentMessage), lastSequence: last };
}

/** One message by its writer's id. */
export async function loadMessage(
  ctx: RequestContext,
  threadId: string,
  authorAccountId: string,
  id: string,
): Promise<MessageView | null> {
  const [row] = await ctx.manager.query<MessageRow[]>(
    `SELECT ${COLUMNS} FROM ${FROM} WHERE m."thread_id" = $1 AND m."author_account_id" = $2 AND m."id" = $3`,
    [threadId, authorAccountId, id],
  );
  return row ? presentMessage(row) : null;
}
