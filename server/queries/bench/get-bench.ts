import type { EntityManager } from 'typeorm';
import type { Membership } from '../../../shared/abilities/actor.ts';
import type { BenchItemView, getBench as contract } from '../../../shared/contracts/standing.ts';
import type { RouteOutput } from '../../../shared/contracts/route.ts';
import type { CommissionState } from '../../../shared/contracts/vocabulary.ts';
import { showCode } from '../../../shared/engines/codes/crockford.ts';
import type { RequestContext } from '../../http/context.ts';
import { loadActor } from '../../policies/load-actor.ts';
import { byUrgency, waitsOf } from './bench-items.ts';
import { loadBenchFacts, loadMoved } from './load-bench.ts';

const THIRTY_DAYS_MS = 30 * 24 * 60 * 60 * 1000;

/** What waits on a person's hands over all their open commissions; bookkeepers' and guests' parts give no work. */
export async function getBench(ctx: RequestContext): Promise<RouteOutput<typeof contract>> {
  const known = await loadActor(ctx.db, ctx.actor.accountId, { everyOpenCommission: true });
  const working = (known?.actor.memberships ?? []).filter(
    (one) => one.shopRole !== 'bookkeeper' && !one.roles.includes('guest'),
  );
  const mine = new Set(working.map((one) => one.partyId));
  const leading = new Set(working.filter((one) => one.roles.includes('lead')).map((one) => one.commissionId));
  const commissionIds = [...new Set(working.map((one) => one.commissionId))];
  const [{ bench_seen_at: seenAt } = { bench_seen_at: null }] = await ctx.manager.query<
    { bench_seen_at: Date | null }[]
  >('SELECT "bench_seen_at" FROM "account" WHERE "id" = $1', [ctx.actor.accountId]);
  const facts = await loadBenchFacts(ctx.manager, ctx.actor.accountId, commissionIds);
  const waits = waitsOf(facts, ctx.todayIso);
  const onMe = waits.filter((wait) => mine.has(wait.partyId)).map((wait) => wait.item);
  const onOthers = waits
    .filter(
      (wait) =>
        !mine.has(wait.partyId) && (wait.concerns.some((id) => mine.has(id)) || leading.has(wait.item.commissionId)),
    )
    .map((wait) => wait.item);
  const mentions = facts.mentions.flatMap<BenchItemView>((mention) => {
    const piece = facts.commissions.find((one) => one.id === mention.commissionId);
    return piece
      ? [
          {
            kind: 'read-mention',
            commissionId: piece.id,
            commissionTitle: piece.title,
            commissionCode: showCode(piece.code),
            coverFileId: piece.coverFileId,
            refId: mention.threadId,
            refRevision: null,
            offerId: null,
            noteId: null,
            words: `You are named in ${mention.title}`,
            day: null,
            holdsUp: 0,
            whoName: null,
          },
        ]
      : [];
  });
  const unread = await unreadThreads(ctx, commissionIds, [...mine]);
  const titles = new Map(facts.commissions.map((piece) => [piece.id, piece.title]));
  const memberships = (known?.actor.memberships ?? []).filter((one) => one.shopRole !== 'bookkeeper');
  const pieces = await loadPieces(
    ctx.manager,
    memberships.filter((one) => one.roles.includes('client') || one.roles.includes('guest')),
  );
  return {
    waitsOnYou: [...onMe, ...mentions].sort(byUrgency),
    youWaitOn: onOthers.sort(byUrgency),
    moved: await loadMoved(ctx.manager, [...mine], {
      since: seenAt ?? new Date(ctx.now.getTime() - THIRTY_DAYS_MS),
      notBy: ctx.actor.accountId,
      limit: 40,
    }),
    lastHereAt: seenAt?.toISOString() ?? null,
    unreadThreads: unread.count,
    unread: unread.rows.map((row) => ({
      threadId: row.thread_id,
      commissionId: row.commission_id,
      commissionTitle: titles.get(row.commission_id) ?? '',
      title: row.title,
      messages: row.messages,
    })),
    yourPieces: pieces,
    roles: [...new Set(memberships.flatMap((one) => one.roles))],
  };
}

interface UnreadRow {
  thread_id: string;
  commission_id: string;
  title: string;
  messages: number;
  threads: number;
}

const UNREAD_SHOWN = 20;

/**
 * Threads with something unread, newest first, among those the person's parties may read; the same rules as the ability,
 * over all commissions at once.
 */
async function unreadThreads(
  ctx: RequestContext,
  commissionIds: string[],
  partyIds: string[],
): Promise<{ count: number; rows: UnreadRow[] }> {
  const rows = await ctx.manager.query<UnreadRow[]>(
    `SELECT t."id" AS thread_id, t."commission_id", t."title", t."last_sequence" - COALESCE(k."read_sequence", 0) AS messages,
       count(*) OVER ()::int AS threads
     FROM "thread" t LEFT JOIN "thread_mark" k ON k."thread_id" = t."id" AND k."account_id" = $3
     WHERE t."commission_id" = ANY($1) AND t."last_sequence" > COALESCE(k."read_sequence", 0)
       AND EXISTS (SELECT 1 FROM "party" p WHERE p."id" = ANY($2) AND p."commission_id" = t."commission_id" AND (
         t."audience" = 'everyone' OR p."id" = ANY(t."party_ids") OR (t."audience" = 'makers' AND p."shop_id" IS NOT NULL)
         OR (t."audience" = 'named' AND 'lead' = ANY(p."roles"))))
     ORDER BY t."last_message_at" DESC NULLS LAST, t."id" LIMIT $4`,
    [commissionIds, partyIds, ctx.actor.accountId, UNREAD_SHOWN],
  );
  return { count: rows[0]?.threads ?? 0, rows };
}

/** The pieces that someone is the client of, or looks on at. */
async function loadPieces(
  manager: EntityManager,
  memberships: readonly Membership[],
): Promise<RouteOutput<typeof contract>['yourPieces']> {
  const rows = await manager.query<
    { id: string; title: string; code: string; lead_name: string; state: CommissionState }[]
  >(
    `SELECT "id", "title", "code", "lead_name", "state" FROM "commission" WHERE "id" = ANY($1) AND "state" <> 'ended'
     ORDER BY "updated_at" DESC, "id"`,
    [memberships.map((one) => one.commissionId)],
  );
  return rows.map((row) => ({
    commissionId: row.id,
    title: row.title,
    code: showCode(row.code),
    leadName: row.lead_name,
    state: row.state,
  }));
}
