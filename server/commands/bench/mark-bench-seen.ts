import { Account } from '../../entities/account.ts';
import type { RequestContext } from '../../http/context.ts';

/** What moved until now counts as seen by this person. */
export async function markBenchSeen(ctx: RequestContext): Promise<void> {
  await ctx.manager.update(Account, { id: ctx.actor.accountId }, { benchSeenAt: ctx.now });
}
