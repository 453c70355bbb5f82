import type { acceptInvitation as contract } from '../../../shared/contracts/accounts.ts';
import type { ParsedInput, RouteOutput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Account } from '../../entities/account.ts';
import type { OpenContext } from '../../http/context.ts';
import { findInvitation } from '../../queries/invitations/find-invitation.ts';
import { addressKey } from '../../security/address-key.ts';
import { openSession } from '../accounts/sessions.ts';
import { takerOf } from './taker-of.ts';
import { joinCommission } from './join-commission.ts';
import { joinShop } from './join-shop.ts';

/** Takes an invitation: with the account that is signed in, or with a new one for the invited address. */
export async function acceptInvitation(
  ctx: OpenContext,
  { body }: ParsedInput<typeof contract>,
): Promise<RouteOutput<typeof contract>> {
  await ctx.services.limits.take('link', addressKey(ctx.req.ip));
  const taker = await takerOf(ctx, await findInvitation(ctx.manager, body.token, ctx.now), body.newAccount);
  const { accountId, commissionId, shopId } = await inTransaction(ctx, async (uow) => {
    // Asked again under a lock, so that of two tries at once one gets it.
    const invitation = await findInvitation(uow.manager, body.token, ctx.now, true);
    const account =
      'account' in taker ? taker.account : await uow.manager.save(uow.manager.create(Account, taker.toMake));
    invitation.acceptedAt = ctx.now;
    await uow.manager.save(invitation);
    const joined = invitation.commissionId
      ? await joinCommission(uow, { ...invitation, commissionId: invitation.commissionId }, account, body)
      : await joinShop(uow, invitation, account);
    return { accountId: account.id, commissionId: invitation.commissionId, shopId: joined };
  });
  if ('toMake' in taker) await openSession(ctx.req, accountId, ctx.now);
  return { commissionId, shopId, signedIn: true };
}
