import type { createLeg as contract } from '../../../shared/contracts/parts-and-legs.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { Leg } from '../../entities/leg.ts';
import { NotFound } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorizeCreate } from '../../policies/authorize.ts';
import { loadAllLegs, loadLeg, type LegRecord } from '../../queries/legs/load-legs.ts';
import { requireShops } from '../../queries/parties/load-party.ts';
import { requireParts } from '../../queries/parts/load-part.ts';
import { announceLegs } from './announce-legs.ts';
import { setLegOrder } from './leg-order.ts';

export const createLeg = (ctx: RequestContext, { params, body }: ParsedInput<typeof contract>): Promise<LegRecord> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId } = params;
    authorizeCreate(ctx.ability, 'Leg', { commissionId, partyId: body.partyId });
    // One plan at a time: two saves that each look sound could make a loop together.
    await uow.manager.findOneOrFail(Commission, { where: { id: commissionId }, lock: { mode: 'pessimistic_write' } });
    await requireShops(uow.manager, commissionId, [['/body/partyId', body.partyId]]);
    await requireParts(uow.manager, commissionId, [['/body/partId', body.partId]]);
    const { afterLegIds, ...fields } = body;
    const legs = await loadAllLegs(uow.manager, commissionId);
    const row = await uow.manager.save(uow.manager.create(Leg, { ...fields, commissionId, position: legs.length }));
    await setLegOrder(uow.manager, legs, row, afterLegIds);
    announceLegs(uow, ctx, commissionId, row, `Added the leg ${row.title}`);
    const made = await loadLeg(uow.manager, commissionId, row.id);
    if (!made) throw new NotFound();
    return made;
  });
