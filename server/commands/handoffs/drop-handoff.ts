import type { dropHandoff as contract } from '../../../shared/contracts/handoffs.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { HandoffOffer } from '../../entities/handoff-offer.ts';
import { NotInThisState } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { partyNames } from '../../queries/parties/load-party.ts';
import { announceHandoff } from './announce-handoff.ts';
import { guardHandoff, lockHandoff } from './handoff-days.ts';

/** Takes a handoff that will not come about out of the plan. What was offered and agreed stays on record, with the reason. */
export const dropHandoff = (ctx: RequestContext, { params, body }: ParsedInput<typeof contract>): Promise<void> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, handoffId } = params;
    const handoff = await lockHandoff(uow.manager, commissionId, handoffId);
    authorize(ctx.ability, 'drop', 'Handoff', handoff);
    await guardHandoff(ctx, uow.manager, handoff, body.revision);
    if (handoff.doneOn) throw new NotInThisState('These parts were received already; that cannot be undone.');
    await uow.manager.update(
      HandoffOffer,
      { handoffId, state: 'standing' },
      { state: 'withdrawn', answeredAt: ctx.now, answeredByAccountId: ctx.actor.accountId },
    );
    Object.assign(handoff, { droppedAt: ctx.now, droppedWords: body.words, revision: handoff.revision + 1 });
    await uow.manager.save(handoff);
    const names = await partyNames(uow.manager, commissionId);
    announceHandoff(
      uow,
      ctx,
      handoff,
      `Dropped the handoff from ${names.get(handoff.fromPartyId)} to ${names.get(handoff.toPartyId)}: ${body.words}`,
      true,
    );
  });
