import * as contracts from '../../shared/contracts/standing.ts';
import { markBenchSeen } from '../commands/bench/mark-bench-seen.ts';
import { InputInvalid } from '../errors.ts';
import type { Api } from '../http/api.ts';
import { authorizeCommissionSight } from '../policies/authorize.ts';
import { getBench } from '../queries/bench/get-bench.ts';
import { loadMoved } from '../queries/bench/load-bench.ts';

export function mountBench(api: Api): void {
  api.signedIn(contracts.getBench, getBench);
  api.signedIn(contracts.markBenchSeen, async (ctx) => {
    await markBenchSeen(ctx);
    return {};
  });
  api.signedIn(contracts.listMoved, async (ctx, { params: { commissionId }, query }) => {
    authorizeCommissionSight(ctx.ability, commissionId);
    if (query.cursor !== undefined && !/^\d{1,18}$/.test(query.cursor))
      throw new InputInvalid([
        { pointer: '/query/cursor', message: 'This page mark is not one of ours; start from the first page' },
      ]);
    const mine = ctx.actor.memberships
      .filter((one) => one.commissionId === commissionId && one.shopRole !== 'bookkeeper')
      .map((one) => one.partyId);
    const rows = await loadMoved(ctx.manager, mine, {
      commissionId,
      limit: query.limit + 1,
      ...(query.cursor ? { before: query.cursor } : {}),
    });
    const items = rows.slice(0, query.limit);
    return { items, nextCursor: rows.length > query.limit ? (items.at(-1)?.id ?? null) : null };
  });
}
