import { IsNull, MoreThan } from 'typeorm';
import type { inviteParty as contract } from '../../../shared/contracts/commissions.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import type { PartyRole } from '../../../shared/contracts/vocabulary.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Commission } from '../../entities/commission.ts';
import { Invitation } from '../../entities/invitation.ts';
import { AppError, InputInvalid } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { newLinkToken } from '../../security/tokens.ts';

const FOURTEEN_DAYS_MS = 14 * 24 * 60 * 60 * 1000;

export const inviteParty = (ctx: RequestContext, { params, body }: ParsedInput<typeof contract>): Promise<Invitation> =>
  inTransaction(ctx, async (uow) => {
    const commission = await uow.manager.findOne(Commission, {
      where: { id: params.commissionId },
      lock: { mode: 'pessimistic_write' },
    });
    authorize(ctx.ability, 'invite', 'Commission', commission);
    await ctx.services.limits.take('invite', ctx.actor.accountId);
    if (body.kind === 'guest' && body.seesUntil < ctx.todayIso)
      throw new InputInvalid([{ pointer: '/body/seesUntil', message: 'Choose a day that is not past' }]);
    const waiting = await uow.manager.countBy(Invitation, {
      commissionId: commission.id,
      email: body.email,
      acceptedAt: IsNull(),
      withdrawnAt: IsNull(),
      expiresAt: MoreThan(ctx.now),
    });
    if (waiting > 0)
      throw new AppError(
        'already-there',
        'An invitation to this address is waiting. Take it back first to send another.',
      );
    const { token, tokenHash } = newLinkToken();
    const roles: PartyRole[] = body.kind === 'shop' ? body.roles : [body.kind];
    const row = await uow.manager.save(
      uow.manager.create(Invitation, {
        email: body.email,
        tokenHash,
        commissionId: commission.id,
        roles,
        guestSees: body.kind === 'guest' ? body.sees : [],
        seesUntil: body.kind === 'guest' ? body.seesUntil : null,
        shopId: null,
        shopRole: null,
        invitedByAccountId: ctx.actor.accountId,
        expiresAt: new Date(ctx.now.getTime() + FOURTEEN_DAYS_MS),
      }),
    );
    uow.mail({
      letter: 'commission-invitation',
      to: body.email,
      invitedBy: ctx.person.displayName,
      commissionTitle: commission.title,
      roles,
      token,
    });
    uow.announce(
      'parties.changed',
      { commissionId: commission.id },
      { to: 'parties', commissionId: commission.id, partyIds: [] },
    );
    return row;
  });
