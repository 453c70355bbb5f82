import type { updateLeg as contract } from '../../../shared/contracts/parts-and-legs.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { Leg } from '../../entities/leg.ts';
import { InputInvalid, NotFound, NotPermitted } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { presentLeg } from '../../presenters/leg.ts';
import { fieldsFor } from '../../presenters/pick-fields.ts';
import { loadAllLegs, loadLeg, type LegRecord } from '../../queries/legs/load-legs.ts';
import { requireShops } from '../../queries/parties/load-party.ts';
import { requireParts } from '../../queries/parts/load-part.ts';
import { given, guardRevision } from '../revision.ts';
import { announceLegs } from './announce-legs.ts';
import { setLegOrder } from './leg-order.ts';

/** Changes a leg field by field: the ability says which fields the caller may set, and any other one refuses the save. */
export const updateLeg = (ctx: RequestContext, { params, body }: ParsedInput<typeof contract>): Promise<LegRecord> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, legId } = params;
    await uow.manager.findOne(Commission, { where: { id: commissionId }, lock: { mode: 'pessimistic_write' } });
    const legs = await loadAllLegs(uow.manager, commissionId);
    const leg = legs.find((one) => one.id === legId) ?? null;
    authorize(ctx.ability, 'update', 'Leg', leg);
    const { revision, afterLegIds, ...rest } = body;
    const changes = given(rest);
    const settable = fieldsFor(ctx.ability, 'update', 'Leg', leg, []);
    const refused = [...Object.keys(changes), ...(afterLegIds ? ['afterLegIds'] : [])].filter(
      (field) => !settable.has(field),
    );
    if (refused.length > 0)
      throw new NotPermitted(`Your role cannot change ${refused.join(', ')} of this leg. Nothing was saved.`);
    guardRevision(leg, revision, () => presentLeg(ctx.ability, leg));
    const days = { ...leg, ...changes };
    if (days.hopefulDays > days.likelyDays || days.likelyDays > days.badDays)
      throw new InputInvalid([
        { pointer: '/body/likelyDays', message: 'Hopeful cannot be longer than likely, nor likely longer than bad' },
      ]);
    if (changes.partyId) await requireShops(uow.manager, commissionId, [['/body/partyId', changes.partyId]]);
    if (changes.partId) await requireParts(uow.manager, commissionId, [['/body/partId', changes.partId]]);
    // A shop's own note does not go over to another shop with the leg.
    const ownNote = changes.partyId && changes.partyId !== leg.partyId ? { privateNote: '' } : {};
    await uow.manager.update(Leg, { id: legId }, { ...changes, ...ownNote, revision: leg.revision + 1 });
    if (afterLegIds)
      await setLegOrder(uow.manager, legs, { id: legId, title: changes.title ?? leg.title }, afterLegIds);
    // A private note is the shop's own: it moves nothing and nobody else hears of it.
    if (Object.keys(changes).some((field) => field !== 'privateNote') || afterLegIds)
      announceLegs(uow, ctx, commissionId, leg, `Changed the leg ${leg.title}`);
    const saved = await loadLeg(uow.manager, commissionId, legId);
    if (!saved) throw new NotFound();
    return saved;
  });
