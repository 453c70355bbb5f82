import { IsNull, MoreThan } from 'typeorm';
import type { ShopRole } from '../../../shared/contracts/vocabulary.ts';
import type { UnitOfWork } from '../../db/unit-of-work.ts';
import { Account } from '../../entities/account.ts';
import { Invitation } from '../../entities/invitation.ts';
import type { Shop } from '../../entities/shop.ts';
import { ShopMember } from '../../entities/shop-member.ts';
import { AppError } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { newLinkToken } from '../../security/tokens.ts';

const FOURTEEN_DAYS_MS = 14 * 24 * 60 * 60 * 1000;

/** Writes an invitation into a shop and its letter; the caller has authorized it. */
export async function inviteIntoShop(
  ctx: RequestContext,
  uow: UnitOfWork,
  shop: Shop,
  email: string,
  role: ShopRole,
): Promise<Invitation> {
  await ctx.services.limits.take('invite', ctx.actor.accountId);
  const account = await uow.manager.findOneBy(Account, { email });
  if (account && (await uow.manager.countBy(ShopMember, { shopId: shop.id, accountId: account.id })) > 0)
    throw new AppError('already-there', `${email} belongs to this shop already.`);
  if (
    (await uow.manager.countBy(Invitation, {
      shopId: shop.id,
      email,
      acceptedAt: IsNull(),
      withdrawnAt: IsNull(),
      expiresAt: MoreThan(ctx.now),
    })) > 0
  )
    throw new AppError(
      'already-there',
      'An invitation to this address is waiting. Take it back first to send another.',
    );
  const { token, tokenHash } = newLinkToken();
  const row = await uow.manager.save(
    uow.manager.create(Invitation, {
      email,
      tokenHash,
      commissionId: null,
      roles: [],
      guestSees: [],
      seesUntil: null,
      shopId: shop.id,
      shopRole: role,
      invitedByAccountId: ctx.actor.accountId,
      expiresAt: new Date(ctx.now.getTime() + FOURTEEN_DAYS_MS),
    }),
  );
  uow.mail({
    letter: 'shop-invitation',
    to: email,
    invitedBy: ctx.person.displayName,
    shopName: shop.name,
    role,
    token,
  });
  return row;
}
