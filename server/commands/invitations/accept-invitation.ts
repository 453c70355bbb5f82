import { IsNull } from 'typeorm';
import type { acceptInvitation as contract } from '../../../shared/contracts/accounts.ts';
import type { ParsedInput, RouteOutput } from '../../../shared/contracts/route.ts';
import { inTransaction, type UnitOfWork } from '../../db/unit-of-work.ts';
import { Account } from '../../entities/account.ts';
import type { Invitation } from '../../entities/invitation.ts';
import { Party } from '../../entities/party.ts';
import { Shop } from '../../entities/shop.ts';
import { ShopMember } from '../../entities/shop-member.ts';
import { AppError, InputInvalid, NotPermitted } from '../../errors.ts';
import type { OpenContext } from '../../http/context.ts';
import { findInvitation, needsShop } from '../../queries/invitations/find-invitation.ts';
import { hashPassword } from '../../security/passwords.ts';
import { guardPassword } from '../accounts/passwords.ts';
import { openSession } from '../accounts/sessions.ts';
import { refreshCommissionNames } from '../commissions/refresh-members.ts';

type Body = ParsedInput<typeof contract>['body'];
type Accepted = RouteOutput<typeof contract>;

/** Takes an invitation: with the account that is signed in, or with a new one for the invited address. */
export async function acceptInvitation(ctx: OpenContext, { body }: ParsedInput<typeof contract>): Promise<Accepted> {
  await ctx.services.limits.take('link', ctx.req.ip ?? 'unknown');
  const { accountId, madeNow, ...accepted } = await inTransaction(ctx, async (uow) => {
    const invitation = await findInvitation(uow.manager, body.token, ctx.now, true);
    const { account, madeNow: isNew } = await accountFor(ctx, uow, invitation, body);
    invitation.acceptedAt = ctx.now;
    await uow.manager.save(invitation);
    const target = invitation.commissionId ? await joinCommission(uow, invitation, account, body, invitation.commissionId) : await joinShop(uow, invitation, account);
    return { ...target, accountId: account.id, madeNow: isNew };
  });
  if (madeNow) await openSession(ctx.req, accountId, ctx.now);
  return { ...accepted, signedIn: true };
}

/** The link proves the address, so a new account is made for that address and no other. */
async function accountFor(ctx: OpenContext, uow: UnitOfWork, invitation: Invitation, body: Body): Promise<{ account: Account; madeNow: boolean }> {
  if (ctx.sessionAccountId) {
    const account = await uow.manager.findOneByOrFail(Account, { id: ctx.sessionAccountId });
    if (account.email !== invitation.email)
      throw new NotPermitted(`This invitation is for ${invitation.email}. You are signed in as ${account.email}; sign out and open the link again.`);
    return { account, madeNow: false };
  }
  if ((await uow.manager.countBy(Account, { email: invitation.email })) > 0)
    throw new AppError('not-signed-in', `There is an account for ${invitation.email}. Sign in and open the link again; it is still good.`);
  if (!body.newAccount) throw new InputInvalid([{ pointer: '/body/newAccount/displayName', message: 'Give your name and a password' }]);
  const { displayName, password, timeZone } = body.newAccount;
  guardPassword(password, { email: invitation.email, displayName }, '/body/newAccount/password');
  const account = await uow.manager.save(
    uow.manager.create(Account, { email: invitation.email, displayName, passwordHash: await hashPassword(password), ...(timeZone ? { timeZone } : {}) }),
  );
  return { account, madeNow: true };
}

async function joinShop(uow: UnitOfWork, invitation: Invitation, account: Account): Promise<Omit<Accepted, 'signedIn'>> {
  const { shopId, shopRole } = invitation;
  if (!shopId || !shopRole) throw new AppError('link-expired');
  if ((await uow.manager.countBy(ShopMember, { shopId, accountId: account.id })) > 0) throw new AppError('already-there', 'You belong to this shop already.');
  await uow.manager.insert(ShopMember, { shopId, accountId: account.id, role: shopRole });
  const parts = await uow.manager.findBy(Party, { shopId, leftAt: IsNull() });
  for (const { commissionId } of parts) {
    uow.announce('membership.changed', { commissionId }, { to: 'keys', keys: [account.id] });
    uow.announce('parties.changed', { commissionId }, { to: 'everyone', commissionId });
  }
  return { commissionId: null, shopId };
}

/** The shop that takes the part: one of the person's own, where they work, or one made now. */
async function shopFor(uow: UnitOfWork, account: Account, body: Body): Promise<string> {
  if (body.newShop) {
    const shop = await uow.manager.save(uow.manager.create(Shop, { ...body.newShop, timeZone: account.timeZone }));
    await uow.manager.insert(ShopMember, { shopId: shop.id, accountId: account.id, role: 'owner' });
    return shop.id;
  }
  const member = body.shopId ? await uow.manager.findOneBy(ShopMember, { shopId: body.shopId, accountId: account.id }) : null;
  if (!member) throw new InputInvalid([{ pointer: '/body/shopId', message: 'Choose one of your shops, or give a new one a name' }]);
  if (member.role === 'bookkeeper') throw new NotPermitted('A bookkeeper can not take work on for a shop; ask its owner.');
  return member.shopId;
}

async function joinCommission(uow: UnitOfWork, invitation: Invitation, account: Account, body: Body, commissionId: string): Promise<Omit<Accepted, 'signedIn'>> {
  const shopId = needsShop(invitation) ? await shopFor(uow, account, body) : null;
  const who = shopId ? { shopId } : { accountId: account.id };
  const earlier = await uow.manager.findOneBy(Party, { commissionId, ...who, leftAt: IsNull() });
  if (earlier) {
    // A shop that takes on another kind of work stays one party.
    await uow.manager.update(Party, { id: earlier.id }, { roles: [...new Set([...earlier.roles, ...invitation.roles])] });
  } else {
    await uow.manager.insert(Party, { commissionId, ...who, roles: invitation.roles, guestSees: invitation.guestSees, seesUntil: invitation.seesUntil });
  }
  await refreshCommissionNames(uow.manager, commissionId);
  const name = shopId ? (await uow.manager.findOneByOrFail(Shop, { id: shopId })).name : account.displayName;
  uow.record({ commissionId, accountId: account.id, subject: 'parties', subjectId: commissionId, words: `${name} joined as ${invitation.roles.join(', ')}` });
  uow.announce('membership.changed', { commissionId }, { to: 'keys', keys: [shopId ?? account.id, account.id] });
  uow.announce('parties.changed', { commissionId }, { to: 'everyone', commissionId });
  return { commissionId, shopId };
}
