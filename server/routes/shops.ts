import * as contracts from '../../shared/contracts/shops.ts';
import { mayDo } from '../../shared/abilities/ability.ts';
import * as commands from '../commands/shops/shop-commands.ts';
import { Shop } from '../entities/shop.ts';
import { NotFound, NotPermitted } from '../errors.ts';
import type { Api } from '../http/api.ts';
import { authorize } from '../policies/authorize.ts';
import { presentShop } from '../presenters/shop.ts';
import { loadMembers, loadShopInvitations } from '../queries/shops/list-members.ts';

export function mountShops(api: Api): void {
  api.signedIn(contracts.listShops, async (ctx) => {
    if (!ctx.ability.can('administer', 'Installation')) throw new NotPermitted();
    return (await ctx.manager.find(Shop, { order: { name: 'ASC', id: 'ASC' } })).map((shop) =>
      presentShop(ctx.actor, shop),
    );
  });
  api.signedIn(contracts.createShop, async (ctx, input) =>
    presentShop(ctx.actor, await commands.createShop(ctx, input)),
  );
  api.signedIn(contracts.getShop, async (ctx, { params }) => {
    const shop = await ctx.manager.findOneBy(Shop, { id: params.shopId });
    authorize(ctx.ability, 'read', 'Shop', shop);
    return presentShop(ctx.actor, shop);
  });
  api.signedIn(contracts.updateShop, async (ctx, input) =>
    presentShop(ctx.actor, await commands.updateShop(ctx, input)),
  );
  api.signedIn(contracts.listShopMembers, async (ctx, { params: { shopId } }) => {
    authorize(ctx.ability, 'read', 'Shop', await ctx.manager.findOneBy(Shop, { id: shopId }));
    const members = await loadMembers(ctx.manager, shopId);
    return {
      members,
      invitations: mayDo(ctx.ability, 'invite', 'Shop', { id: shopId })
        ? await loadShopInvitations(ctx.manager, shopId)
        : [],
    };
  });
  api.signedIn(contracts.inviteShopMember, async (ctx, input) => {
    const row = await commands.inviteShopMember(ctx, input);
    return {
      id: row.id,
      email: row.email,
      role: input.body.role,
      invitedAt: row.createdAt.toISOString(),
      expiresAt: row.expiresAt.toISOString(),
    };
  });
  api.signedIn(contracts.withdrawShopInvitation, async (ctx, input) => {
    await commands.withdrawShopInvitation(ctx, input);
    return {};
  });
  api.signedIn(contracts.changeShopMember, async (ctx, input) => {
    await commands.changeShopMember(ctx, input);
    const member = (await loadMembers(ctx.manager, input.params.shopId)).find(
      (one) => one.accountId === input.params.accountId,
    );
    if (!member) throw new NotFound();
    return member;
  });
  api.signedIn(contracts.removeShopMember, async (ctx, input) => {
    await commands.removeShopMember(ctx, input);
    return {};
  });
}
