import type { UnitOfWork } from '../../db/unit-of-work.ts';
import type { RequestContext } from '../../http/context.ts';

/** Both sides and the lead read the line; everyone's plan and the merged status move. */
export function announceHandoff(
  uow: UnitOfWork,
  ctx: RequestContext,
  handoff: { id: string; commissionId: string; fromPartyId: string; toPartyId: string },
  words: string,
  clientMayRead = false,
): void {
  const { commissionId } = handoff;
  uow.record({
    commissionId,
    accountId: ctx.actor.accountId,
    subject: 'handoff',
    subjectId: handoff.id,
    words,
    partyIds: clientMayRead ? null : [handoff.fromPartyId, handoff.toPartyId],
    clientMayRead,
  });
  uow.announce('handoff.changed', { commissionId, handoffId: handoff.id }, { to: 'everyone', commissionId });
  uow.announce('standing.changed', { commissionId }, { to: 'everyone', commissionId });
}
