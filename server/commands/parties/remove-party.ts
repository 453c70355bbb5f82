import { In, IsNull } from 'typeorm';
import type { removeParty as contract } from '../../../shared/contracts/commissions.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { Handoff } from '../../entities/handoff.ts';
import { Leg } from '../../entities/leg.ts';
import { Part } from '../../entities/part.ts';
import { Party } from '../../entities/party.ts';
import { NotFound, NotInThisState } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { partyNames } from '../../queries/parties/load-party.ts';
import { refreshCommissionNames } from '../commissions/refresh-members.ts';

/** Takes a party out. It must hold no part, have no leg to do and be in no handoff to come: those always belong to someone. */
export const removeParty = (ctx: RequestContext, { params }: ParsedInput<typeof contract>): Promise<void> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, partyId } = params;
    const commission = await uow.manager.findOne(Commission, {
      where: { id: commissionId },
      lock: { mode: 'pessimistic_write' },
    });
    authorize(ctx.ability, 'remove', 'Commission', commission);
    const party = await uow.manager.findOneBy(Party, { id: partyId, commissionId, leftAt: IsNull() });
    if (!party) throw new NotFound();
    if (party.roles.includes('lead'))
      throw new NotInThisState("The lead holds the client's contract and stays. Nothing was changed.");
    const name = (await partyNames(uow.manager, commissionId)).get(partyId) ?? 'This party';
    const held = await uow.manager.findBy(Part, { commissionId, holderPartyId: partyId });
    if (held.length > 0)
      throw new NotInThisState(
        `${name} holds ${held.map((part) => part.name).join(', ')}. Hand that over first; nothing was changed.`,
      );
    const legs = await uow.manager.findBy(Leg, { commissionId, partyId, state: In(['planned', 'under-way']) });
    if (legs.length > 0)
      throw new NotInThisState(
        `${name} has ${legs.map((leg) => leg.title).join(', ')} to do. Give it to another shop or drop it first; nothing was changed.`,
      );
    const open = { commissionId, doneOn: IsNull(), droppedAt: IsNull() };
    const handoffs = await uow.manager.countBy(Handoff, [
      { ...open, fromPartyId: partyId },
      { ...open, toPartyId: partyId },
    ]);
    if (handoffs > 0)
      throw new NotInThisState(
        `${name} is one side of ${handoffs === 1 ? 'a planned handoff' : `${handoffs} planned handoffs`}. Drop what will not come about first; nothing was changed.`,
      );
    await uow.manager.update(Party, { id: partyId }, { leftAt: ctx.now });
    await refreshCommissionNames(uow.manager, commissionId);
    uow.record({
      commissionId,
      accountId: ctx.actor.accountId,
      subject: 'parties',
      subjectId: partyId,
      words: `${name} left the commission`,
    });
    uow.announce('membership.changed', { commissionId }, { to: 'keys', keys: [party.shopId ?? party.accountId ?? ''] });
    uow.announce('parties.changed', { commissionId }, { to: 'everyone', commissionId });
  });
