import type { previewInvitation as contract } from '../../../shared/contracts/accounts.ts';
import type { ParsedInput, RouteOutput } from '../../../shared/contracts/route.ts';
import { Account } from '../../entities/account.ts';
import { Commission } from '../../entities/commission.ts';
import { Shop } from '../../entities/shop.ts';
import type { OpenContext } from '../../http/context.ts';
import { addressKey } from '../../security/address-key.ts';
import { loadAccountView } from '../accounts/load-account.ts';
import { findInvitation, needsShop } from './find-invitation.ts';

export async function previewInvitation(
  ctx: OpenContext,
  { body }: ParsedInput<typeof contract>,
): Promise<RouteOutput<typeof contract>> {
  await ctx.services.limits.take('link', addressKey(ctx.req.ip));
  const invitation = await findInvitation(ctx.manager, body.token, ctx.now);
  const inviter = await ctx.manager.findOneByOrFail(Account, { id: invitation.invitedByAccountId });
  const commission = invitation.commissionId
    ? await ctx.manager.findOneBy(Commission, { id: invitation.commissionId })
    : null;
  const shop = invitation.shopId ? await ctx.manager.findOneBy(Shop, { id: invitation.shopId }) : null;
  const me = ctx.sessionAccountId ? await loadAccountView(ctx.manager, ctx.sessionAccountId) : null;
  const forYou = me?.email === invitation.email;
  return {
    kind: commission ? 'commission' : 'shop',
    invitedBy: inviter.displayName,
    ...(commission ? { commissionTitle: commission.title } : {}),
    ...(shop ? { shopName: shop.name } : {}),
    roles: invitation.shopRole ? [invitation.shopRole] : invitation.roles,
    email: invitation.email,
    expiresAt: invitation.expiresAt.toISOString(),
    forYou,
    yourShops:
      forYou && me
        ? me.shops.filter((one) => one.role !== 'bookkeeper').map(({ shopId, name }) => ({ shopId, name }))
        : [],
    needsShop: needsShop(invitation),
  };
}
