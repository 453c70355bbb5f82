import type { updatePart as contract } from '../../../shared/contracts/parts-and-legs.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { Part } from '../../entities/part.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { presentPart } from '../../presenters/part.ts';
import { partyNames, requireParties } from '../../queries/parties/load-party.ts';
import { given, guardRevision } from '../revision.ts';

export const updatePart = (ctx: RequestContext, { params, body }: ParsedInput<typeof contract>): Promise<Part> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, partId } = params;
    // As in createPart: custody changes one at a time with parties leaving.
    await uow.manager.findOne(Commission, { where: { id: commissionId }, lock: { mode: 'pessimistic_write' } });
    const row = await uow.manager.findOne(Part, {
      where: { id: partId, commissionId },
      lock: { mode: 'pessimistic_write' },
    });
    authorize(ctx.ability, 'update', 'Part', row);
    const { revision, ...changes } = body;
    guardRevision(row, revision, () => presentPart(row));
    const moves = changes.holderPartyId !== undefined && changes.holderPartyId !== row.holderPartyId;
    if (changes.holderPartyId)
      await requireParties(uow.manager, commissionId, [['/body/holderPartyId', changes.holderPartyId]]);
    Object.assign(row, given(changes), { revision: row.revision + 1 }, moves ? { holderSince: ctx.todayIso } : {});
    await uow.manager.save(row);
    const holder = moves ? (await partyNames(uow.manager, commissionId)).get(row.holderPartyId) : null;
    uow.record({
      commissionId,
      accountId: ctx.actor.accountId,
      subject: 'part',
      subjectId: row.id,
      words: holder ? `Corrected the holder of ${row.name} to ${holder}` : `Changed the part ${row.name}`,
    });
    uow.announce('parts.changed', { commissionId }, { to: 'everyone', commissionId });
    uow.announce('standing.changed', { commissionId }, { to: 'everyone', commissionId });
    return row;
  });
