import { IsNull } from 'typeorm';
import type * as contracts from '../../../shared/contracts/shops.ts';
import type { AnyRoute, ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction, type UnitOfWork } from '../../db/unit-of-work.ts';
import { Invitation } from '../../entities/invitation.ts';
import { Party } from '../../entities/party.ts';
import { Shop } from '../../entities/shop.ts';
import { ShopMember } from '../../entities/shop-member.ts';
import { NotFound, NotInThisState, NotPermitted } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { presentShop } from '../../presenters/shop.ts';
import { refreshCommissionNames } from '../commissions/refresh-members.ts';
import { given, guardRevision } from '../revision.ts';
import { inviteIntoShop } from './invite-member.ts';

type Input<N extends keyof typeof contracts> = ParsedInput<Extract<(typeof contracts)[N], AnyRoute>>;

const lockShop = (uow: UnitOfWork, shopId: string): Promise<Shop | null> =>
  uow.manager.findOne(Shop, { where: { id: shopId }, lock: { mode: 'pessimistic_write' } });

/** A shop starts with nobody in it; its owner comes by the letter. */
export const createShop = (ctx: RequestContext, { body }: Input<'createShop'>): Promise<Shop> =>
  inTransaction(ctx, async (uow) => {
    if (!ctx.ability.can('administer', 'Installation')) throw new NotPermitted();
    const { ownerEmail, ...fields } = body;
    const shop = await uow.manager.save(uow.manager.create(Shop, fields));
    await inviteIntoShop(ctx, uow, shop, ownerEmail, 'owner');
    return uow.manager.findOneByOrFail(Shop, { id: shop.id });
  });

export const updateShop = (ctx: RequestContext, { params, body }: Input<'updateShop'>): Promise<Shop> =>
  inTransaction(ctx, async (uow) => {
    const shop = await lockShop(uow, params.shopId);
    authorize(ctx.ability, 'update', 'Shop', shop);
    const { revision, ...changes } = body;
    guardRevision(shop, revision, () => presentShop(ctx.actor, shop));
    Object.assign(shop, given(changes), { revision: shop.revision + 1 });
    await uow.manager.save(shop);
    for (const commissionId of await commissionsOf(uow, shop.id)) {
      if (changes.name !== undefined) await refreshCommissionNames(uow.manager, commissionId);
      uow.announce('parties.changed', { commissionId }, { to: 'everyone', commissionId });
    }
    return shop;
  });

export const inviteShopMember = (
  ctx: RequestContext,
  { params, body }: Input<'inviteShopMember'>,
): Promise<Invitation> =>
  inTransaction(ctx, async (uow) => {
    const shop = await lockShop(uow, params.shopId);
    authorize(ctx.ability, 'invite', 'Shop', shop);
    return inviteIntoShop(ctx, uow, shop, body.email, body.role);
  });

export const withdrawShopInvitation = (
  ctx: RequestContext,
  { params }: Input<'withdrawShopInvitation'>,
): Promise<void> =>
  inTransaction(ctx, async (uow) => {
    authorize(ctx.ability, 'invite', 'Shop', await lockShop(uow, params.shopId));
    const taken = await uow.manager.update(
      Invitation,
      { id: params.invitationId, shopId: params.shopId, acceptedAt: IsNull(), withdrawnAt: IsNull() },
      { withdrawnAt: ctx.now },
    );
    if (taken.affected !== 1) throw new NotFound();
  });

/** A shop always has an owner; the shop's row is locked, so that two owners cannot demote each other at once. */
async function guardLastOwner(uow: UnitOfWork, shopId: string, member: ShopMember): Promise<void> {
  if (member.role === 'owner' && (await uow.manager.countBy(ShopMember, { shopId, role: 'owner' })) === 1)
    throw new NotInThisState("This is the shop's only owner. Make someone else an owner first; nothing was changed.");
}

/** In one order for everybody, since their rows are locked one after another. */
async function commissionsOf(uow: UnitOfWork, shopId: string): Promise<string[]> {
  const parties = await uow.manager.find(Party, {
    where: { shopId, leftAt: IsNull() },
    order: { commissionId: 'ASC' },
  });
  return parties.map((party) => party.commissionId);
}

/** Rights of a person in every commission of the shop change with their place in it. */
async function announceMember(uow: UnitOfWork, shopId: string, accountId: string): Promise<void> {
  for (const commissionId of await commissionsOf(uow, shopId)) {
    uow.announce('membership.changed', { commissionId }, { to: 'keys', keys: [accountId, shopId] });
    uow.announce('parties.changed', { commissionId }, { to: 'everyone', commissionId });
  }
}

export const changeShopMember = (ctx: RequestContext, { params, body }: Input<'changeShopMember'>): Promise<void> =>
  inTransaction(ctx, async (uow) => {
    const { shopId, accountId } = params;
    authorize(ctx.ability, 'update', 'Shop', await lockShop(uow, shopId));
    const member = await uow.manager.findOneBy(ShopMember, { shopId, accountId });
    if (!member) throw new NotFound();
    if (body.role !== 'owner') await guardLastOwner(uow, shopId, member);
    await uow.manager.update(ShopMember, { shopId, accountId }, { role: body.role });
    await announceMember(uow, shopId, accountId);
  });

export async function removeShopMember(ctx: RequestContext, { params }: Input<'removeShopMember'>): Promise<void> {
  const { shopId, accountId } = params;
  await inTransaction(ctx, async (uow) => {
    const itself = accountId === ctx.actor.accountId;
    authorize(ctx.ability, itself ? 'read' : 'remove', 'Shop', await lockShop(uow, shopId));
    const member = await uow.manager.findOneBy(ShopMember, { shopId, accountId });
    if (!member) throw new NotFound();
    await guardLastOwner(uow, shopId, member);
    await uow.manager.delete(ShopMember, { shopId, accountId });
    await announceMember(uow, shopId, accountId);
  });
  // A shop without commissions has nothing to announce, and yet its next one is no longer theirs to hear of.
  ctx.services.endConnections(accountId);
}
