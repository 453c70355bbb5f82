import type { createPart as contract } from '../../../shared/contracts/parts-and-legs.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { Part } from '../../entities/part.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorizeCreate } from '../../policies/authorize.ts';
import { requireParties } from '../../queries/parties/load-party.ts';

export const createPart = (ctx: RequestContext, { params, body }: ParsedInput<typeof contract>): Promise<Part> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId } = params;
    authorizeCreate(ctx.ability, 'Part', { commissionId });
    // Custody changes one at a time with parties leaving, so that no part is left with one who is gone.
    await uow.manager.findOne(Commission, { where: { id: commissionId }, lock: { mode: 'pessimistic_write' } });
    await requireParties(uow.manager, commissionId, [['/body/holderPartyId', body.holderPartyId]]);
    const position = await uow.manager.countBy(Part, { commissionId });
    const row = await uow.manager.save(
      uow.manager.create(Part, { ...body, commissionId, position, holderSince: ctx.todayIso }),
    );
    uow.record({
      commissionId,
      accountId: ctx.actor.accountId,
      subject: 'part',
      subjectId: row.id,
      words: `Added the part ${row.name}`,
    });
    uow.announce('parts.changed', { commissionId }, { to: 'everyone', commissionId });
    uow.announce('standing.changed', { commissionId }, { to: 'everyone', commissionId });
    return row;
  });
