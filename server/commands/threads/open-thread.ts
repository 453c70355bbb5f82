import { mayDo } from '../../../shared/abilities/ability.ts';
import type { openThread as contract } from '../../../shared/contracts/threads.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import type { ThreadSubject } from '../../../shared/contracts/vocabulary.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { FitReport } from '../../entities/fit-report.ts';
import { Handoff } from '../../entities/handoff.ts';
import { Joint } from '../../entities/joint.ts';
import { Leg } from '../../entities/leg.ts';
import { Thread } from '../../entities/thread.ts';
import { InputInvalid, NotPermitted } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { actingParty } from '../../policies/acting-party.ts';
import { authorizeCreate } from '../../policies/authorize.ts';
import { requireParties } from '../../queries/parties/load-party.ts';

/** A thread is about something of this commission that its opener may see. */
async function mayReadSubject(
  ctx: RequestContext,
  commissionId: string,
  subject: ThreadSubject,
  id: string,
): Promise<boolean> {
  const where = { id, commissionId };
  switch (subject) {
    case 'commission':
      return id === commissionId;
    case 'leg': {
      const row = await ctx.manager.findOneBy(Leg, where);
      return row !== null && mayDo(ctx.ability, 'read', 'Leg', row);
    }
    case 'joint': {
      const row = await ctx.manager.findOneBy(Joint, where);
      return row !== null && mayDo(ctx.ability, 'read', 'Joint', row);
    }
    case 'report': {
      const row = await ctx.manager.findOneBy(FitReport, where);
      return row !== null && mayDo(ctx.ability, 'read', 'FitReport', row);
    }
    case 'handoff': {
      const row = await ctx.manager.findOneBy(Handoff, where);
      return row !== null && mayDo(ctx.ability, 'read', 'Handoff', row);
    }
  }
}

/** Opens a thread. Its audience is fixed from here on: no act widens it. */
export const openThread = (ctx: RequestContext, { params, body }: ParsedInput<typeof contract>): Promise<string> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId } = params;
    authorizeCreate(ctx.ability, 'Thread', { commissionId, audience: body.audience, partyIds: [] });
    const opener = actingParty(ctx.actor, commissionId);
    if (opener.shopId === null && (body.audience === 'makers' || body.audience === 'own-shop'))
      throw new NotPermitted('As the client you write to everyone, or to parties you name.');
    if (!(await mayReadSubject(ctx, commissionId, body.subject, body.subjectId)))
      throw new InputInvalid([{ pointer: '/body/subjectId', message: 'There is nothing here for you to write about' }]);
    await requireParties(
      uow.manager,
      commissionId,
      body.partyIds.map((id, index) => [`/body/partyIds/${index}`, id]),
    );
    const partyIds =
      body.audience === 'named'
        ? [...new Set([opener.partyId, ...body.partyIds])]
        : body.audience === 'own-shop'
          ? [opener.partyId]
          : [];
    const row = await uow.manager.save(
      uow.manager.create(Thread, {
        commissionId,
        subject: body.subject,
        subjectId: body.subjectId,
        title: body.title,
        audience: body.audience,
        partyIds,
        openedByPartyId: opener.partyId,
      }),
    );
    uow.announce(
      'thread.opened',
      { commissionId, threadId: row.id, subject: row.subject, subjectId: row.subjectId },
      { to: 'thread', threadId: row.id },
    );
    return row.id;
  });
