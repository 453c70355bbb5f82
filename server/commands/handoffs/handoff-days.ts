import { IsNull, type EntityManager } from 'typeorm';
import type * as contracts from '../../../shared/contracts/handoffs.ts';
import type { AnyRoute, ParsedInput } from '../../../shared/contracts/route.ts';
import { checkOfferAct, type OfferAct } from '../../../shared/engines/handoffs/offer-rules.ts';
import { weekdayDayMonth } from '../../../shared/units/calendar-day.ts';
import { inTransaction, type UnitOfWork } from '../../db/unit-of-work.ts';
import { Handoff } from '../../entities/handoff.ts';
import { HandoffOffer } from '../../entities/handoff-offer.ts';
import { NotInThisState } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { actingParty } from '../../policies/acting-party.ts';
import { authorize } from '../../policies/authorize.ts';
import { loadHandoff, presentHandoff } from '../../queries/handoffs/load-handoffs.ts';
import { partyNames } from '../../queries/parties/load-party.ts';
import { guardRevision } from '../revision.ts';
import { announceHandoff } from './announce-handoff.ts';

type Input<N extends keyof typeof contracts> = ParsedInput<Extract<(typeof contracts)[N], AnyRoute>>;

interface Side {
  partyId: string;
  name: string;
}

interface Act {
  handoff: Handoff;
  standing: HandoffOffer | null;
  side: Side;
}

/**
 * One act on a handoff's day. The handoff's row is locked first and its revision held against the one the person saw, so
 * that of two people answering at the same moment one gets the outcome and the other a clear conflict.
 */
const handoffAct = (
  ctx: RequestContext,
  input: { commissionId: string; handoffId: string; revision: number; offerId?: string },
  act: OfferAct,
  change: (uow: UnitOfWork, facts: Act, answers: 'countered' | 'withdrawn' | null) => Promise<string>,
  onDay?: string,
): Promise<string> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, handoffId } = input;
    const handoff = await lockHandoff(uow.manager, commissionId, handoffId);
    authorize(ctx.ability, 'offer', 'Handoff', handoff);
    await guardHandoff(ctx, uow.manager, handoff, input.revision);
    const standing = await uow.manager.findOneBy(HandoffOffer, { handoffId, state: 'standing' });
    const mine = ctx.actor.memberships
      .filter((one) => one.commissionId === commissionId && one.shopRole !== 'bookkeeper')
      .map((one) => one.partyId);
    if (input.offerId && standing?.id !== input.offerId)
      throw new NotInThisState('That offer does not stand any more. Look at what stands now.');
    const answer = checkOfferAct({ ...handoff, standing }, act, mine, onDay);
    if (!answer.ok) throw new NotInThisState(answer.words);
    const sides = [handoff.fromPartyId, handoff.toPartyId];
    // Who holds both sides answers for the one that did not offer.
    const { partyId } = actingParty(
      ctx.actor,
      commissionId,
      standing && act !== 'withdraw' ? sides.filter((id) => id !== standing.byPartyId) : sides,
    );
    const name = (await partyNames(uow.manager, commissionId)).get(partyId) ?? '';
    const words = await change(uow, { handoff, standing, side: { partyId, name } }, answer.answers);
    handoff.revision += 1;
    await uow.manager.save(handoff);
    announceHandoff(uow, ctx, handoff, words, act === 'accept');
    return handoffId;
  });

const lockHandoff = (manager: EntityManager, commissionId: string, handoffId: string): Promise<Handoff | null> =>
  manager.findOne(Handoff, {
    where: { id: handoffId, commissionId, droppedAt: IsNull() },
    lock: { mode: 'pessimistic_write' },
  });

async function guardHandoff(
  ctx: RequestContext,
  manager: EntityManager,
  handoff: Handoff,
  revision: number,
): Promise<void> {
  if (handoff.revision === revision) return;
  const record = await loadHandoff(manager, handoff.commissionId, handoff.id);
  guardRevision(handoff, revision, () => record && presentHandoff(ctx.ability, record));
}

const answered = (ctx: RequestContext): Pick<HandoffOffer, 'answeredByAccountId' | 'answeredAt'> => ({
  answeredByAccountId: ctx.actor.accountId,
  answeredAt: ctx.now,
});

/** Offers a day; one that stands is countered, or replaced when it is the side's own. An agreed day stays in force meanwhile. */
export const offerHandoffDay = (ctx: RequestContext, { params, body }: Input<'offerHandoffDay'>): Promise<string> =>
  handoffAct(
    ctx,
    { ...params, revision: body.revision },
    'offer',
    async (uow, { handoff, standing, side }, answers) => {
      if (standing && answers)
        await uow.manager.update(HandoffOffer, { id: standing.id }, { state: answers, ...answered(ctx) });
      await uow.manager.insert(HandoffOffer, {
        handoffId: handoff.id,
        byPartyId: side.partyId,
        byAccountId: ctx.actor.accountId,
        onDay: body.onDay,
        words: body.words,
        createdAt: ctx.now,
      });
      return `${side.name} ${answers === 'countered' ? 'countered with' : 'offered'} ${weekdayDayMonth(body.onDay)}`;
    },
    body.onDay,
  );

export const acceptHandoffDay = (ctx: RequestContext, { params, body }: Input<'acceptHandoffDay'>): Promise<string> =>
  handoffAct(ctx, { ...params, revision: body.revision }, 'accept', async (uow, { handoff, standing, side }) => {
    if (!standing) throw new NotInThisState('No offer stands.');
    await uow.manager.update(HandoffOffer, { id: standing.id }, { state: 'accepted', ...answered(ctx) });
    handoff.agreedOn = standing.onDay;
    return `${side.name} accepted ${weekdayDayMonth(standing.onDay)}`;
  });

export const declineHandoffDay = (ctx: RequestContext, { params, body }: Input<'declineHandoffDay'>): Promise<string> =>
  handoffAct(ctx, { ...params, revision: body.revision }, 'decline', async (uow, { standing, side }) => {
    if (!standing) throw new NotInThisState('No offer stands.');
    await uow.manager.update(
      HandoffOffer,
      { id: standing.id },
      { state: 'declined', reason: body.reason, ...answered(ctx) },
    );
    return `${side.name} declined ${weekdayDayMonth(standing.onDay)}: ${body.reason}`;
  });

export const withdrawHandoffDay = (
  ctx: RequestContext,
  { params, body }: Input<'withdrawHandoffDay'>,
): Promise<string> =>
  handoffAct(ctx, { ...params, revision: body.revision }, 'withdraw', async (uow, { standing, side }) => {
    if (!standing) throw new NotInThisState('No offer stands.');
    await uow.manager.update(HandoffOffer, { id: standing.id }, { state: 'withdrawn', ...answered(ctx) });
    return `${side.name} took back the offer of ${weekdayDayMonth(standing.onDay)}`;
  });

export { guardHandoff, lockHandoff };
