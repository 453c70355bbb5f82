import { checkLegMove } from '../../../shared/engines/legs/leg-states.ts';
import type { moveLeg as contract } from '../../../shared/contracts/parts-and-legs.ts';
import { addDays } from '../../../shared/units/calendar-day.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { Leg } from '../../entities/leg.ts';
import { InputInvalid, NotFound, NotInThisState } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { presentLeg } from '../../presenters/leg.ts';
import { loadAllLegs, loadLeg, type LegRecord } from '../../queries/legs/load-legs.ts';
import { guardRevision } from '../revision.ts';
import { announceLegs } from './announce-legs.ts';

const WORDS = {
  planned: 'Put back to planned',
  'under-way': 'Started',
  finished: 'Finished',
  dropped: 'Dropped',
} as const;

export const moveLeg = (ctx: RequestContext, { params, body }: ParsedInput<typeof contract>): Promise<LegRecord> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, legId } = params;
    // Locks the commission's plan and not the leg alone: whether a leg may start depends on other legs.
    const commission = await uow.manager.findOne(Commission, {
      where: { id: commissionId },
      lock: { mode: 'pessimistic_write' },
    });
    const legs = await loadAllLegs(uow.manager, commissionId);
    const leg = legs.find((one) => one.id === legId) ?? null;
    authorize(ctx.ability, body.state === 'dropped' ? 'drop' : 'move', 'Leg', leg);
    guardRevision(leg, body.revision, () => presentLeg(ctx.ability, leg));
    const unfinished = legs.filter(
      (one) => leg.afterLegIds.includes(one.id) && one.state !== 'finished' && one.state !== 'dropped',
    );
    const move = checkLegMove(
      { state: leg.state, held: leg.heldBy !== null, waitsFor: unfinished.map((one) => one.title) },
      { to: body.state, early: body.early },
    );
    if (!move.ok) throw new NotInThisState(move.words);
    if (body.onDay > addDays(ctx.todayIso, 1))
      throw new InputInvalid([{ pointer: '/body/onDay', message: 'That day is still to come; say what has happened' }]);
    if (body.state === 'finished' && leg.startedOn && body.onDay < leg.startedOn)
      throw new InputInvalid([{ pointer: '/body/onDay', message: 'A leg cannot be finished before it was started' }]);
    await uow.manager.update(
      Leg,
      { id: legId },
      {
        state: body.state,
        revision: leg.revision + 1,
        ...(body.state === 'under-way' ? { startedOn: leg.startedOn ?? body.onDay, finishedOn: null } : {}),
        ...(body.state === 'finished' ? { finishedOn: body.onDay } : {}),
        ...(body.state === 'planned' ? { startedOn: null, finishedOn: null } : {}),
      },
    );
    announceLegs(uow, ctx, commissionId, leg, `${WORDS[body.state]}: ${leg.title}`, true);
    if (body.state === 'under-way' && commission?.state === 'in-brief') {
      Object.assign(commission, { state: 'at-work', revision: commission.revision + 1, updatedAt: ctx.now });
      await uow.manager.save(commission);
      uow.announce('commission.changed', { commissionId }, { to: 'everyone', commissionId });
    }
    const saved = await loadLeg(uow.manager, commissionId, legId);
    if (!saved) throw new NotFound();
    return saved;
  });
