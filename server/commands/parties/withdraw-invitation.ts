import { IsNull } from 'typeorm';
import type { withdrawInvitation as contract } from '../../../shared/contracts/commissions.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { Invitation } from '../../entities/invitation.ts';
import { NotFound } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';

export const withdrawInvitation = (ctx: RequestContext, { params }: ParsedInput<typeof contract>): Promise<void> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, invitationId } = params;
    authorize(ctx.ability, 'invite', 'Commission', await uow.manager.findOneBy(Commission, { id: commissionId }));
    const taken = await uow.manager.update(
      Invitation,
      { id: invitationId, commissionId, acceptedAt: IsNull(), withdrawnAt: IsNull() },
      { withdrawnAt: ctx.now },
    );
    if (taken.affected !== 1) throw new NotFound();
    uow.announce('parties.changed', { commissionId }, { to: 'parties', commissionId, partyIds: [] });
  });
