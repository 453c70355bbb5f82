import { In, Not } from 'typeorm';
import type { completeHandoff as contract } from '../../../shared/contracts/handoffs.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { weekdayDayMonth } from '../../../shared/units/calendar-day.ts';
import { inTransaction, type UnitOfWork } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { HandoffOffer } from '../../entities/handoff-offer.ts';
import { Part } from '../../entities/part.ts';
import { Party } from '../../entities/party.ts';
import { InputInvalid, NotFound, NotInThisState } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { partyNames } from '../../queries/parties/load-party.ts';
import { announceHandoff } from './announce-handoff.ts';
import { guardHandoff, lockHandoff } from './handoff-days.ts';

/** The receiver says the parts are there: they hold them from that day, and the handoff is done. */
export const completeHandoff = (ctx: RequestContext, { params, body }: ParsedInput<typeof contract>): Promise<string> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, handoffId } = params;
    // Custody changes one at a time with parties leaving, so that no part is left with one who is gone.
    const commission = await uow.manager.findOne(Commission, {
      where: { id: commissionId },
      lock: { mode: 'pessimistic_write' },
    });
    if (!commission) throw new NotFound();
    const handoff = await lockHandoff(uow.manager, commissionId, handoffId);
    authorize(ctx.ability, 'receive', 'Handoff', handoff);
    const receiver = await uow.manager.findOneByOrFail(Party, { id: handoff.toPartyId });
    if (receiver.leftAt) throw new NotFound();
    await guardHandoff(ctx, uow.manager, handoff, body.revision);
    if (handoff.doneOn) throw new NotInThisState('These parts were received already.');
    if (body.onDay > ctx.todayIso)
      throw new InputInvalid([{ pointer: '/body/onDay', message: 'Parts cannot have arrived on a day to come' }]);
    const parts = await uow.manager.find(Part, {
      where: { id: In(handoff.partIds), commissionId },
      lock: { mode: 'pessimistic_write' },
    });
    const elsewhere = parts.filter((part) => part.holderPartyId !== handoff.fromPartyId);
    if (elsewhere.length > 0) {
      const names = await partyNames(uow.manager, commissionId);
      throw new NotInThisState(
        `${elsewhere.map((part) => `${part.name} is with ${names.get(part.holderPartyId)}`).join('; ')}. The lead can correct the holder; nothing was changed.`,
      );
    }
    for (const part of parts)
      Object.assign(part, { holderPartyId: handoff.toPartyId, holderSince: body.onDay, revision: part.revision + 1 });
    await uow.manager.save(parts);
    await uow.manager.update(
      HandoffOffer,
      { handoffId, state: 'standing' },
      { state: 'withdrawn', answeredAt: ctx.now, answeredByAccountId: ctx.actor.accountId },
    );
    handoff.doneOn = body.onDay;
    handoff.revision += 1;
    await uow.manager.save(handoff);
    if (receiver.roles.includes('client')) await deliver(uow, commission, handoff.toPartyId, body.onDay);
    const name = (await partyNames(uow.manager, commissionId)).get(handoff.toPartyId) ?? '';
    announceHandoff(
      uow,
      ctx,
      handoff,
      `${name} received ${parts.map((part) => part.name).join(', ')} on ${weekdayDayMonth(body.onDay)}`,
      true,
    );
    uow.announce('parts.changed', { commissionId }, { to: 'everyone', commissionId });
    return handoffId;
  });

/** The piece is delivered when the client has every part of it; one that was ended by then stays so. */
async function deliver(uow: UnitOfWork, commission: Commission, clientPartyId: string, onDay: string): Promise<void> {
  const elsewhere = await uow.manager.countBy(Part, { commissionId: commission.id, holderPartyId: Not(clientPartyId) });
  if (elsewhere > 0 || commission.state === 'ended') return;
  Object.assign(commission, { deliveredOn: onDay, state: 'delivered', revision: commission.revision + 1 });
  await uow.manager.save(commission);
  uow.announce('commission.changed', { commissionId: commission.id }, { to: 'everyone', commissionId: commission.id });
}
