import type { UnitOfWork } from '../../db/unit-of-work.ts';
import type { RequestContext } from '../../http/context.ts';

/** A change of the plan is heard by all who see it, and moves the merged status. */
export function announceLegs(
  uow: UnitOfWork,
  ctx: RequestContext,
  commissionId: string,
  leg: { id: string },
  words: string,
  clientMayRead = false,
): void {
  uow.record({ commissionId, accountId: ctx.actor.accountId, subject: 'leg', subjectId: leg.id, words, clientMayRead });
  uow.announce('legs.changed', { commissionId }, { to: 'everyone', commissionId });
  uow.announce('standing.changed', { commissionId }, { to: 'everyone', commissionId });
}
