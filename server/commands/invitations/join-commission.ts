import { IsNull } from 'typeorm';
import type { acceptInvitation as contract } from '../../../shared/contracts/accounts.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import type { UnitOfWork } from '../../db/unit-of-work.ts';
import type { Account } from '../../entities/account.ts';
import { Commission } from '../../entities/commission.ts';
import type { Invitation } from '../../entities/invitation.ts';
import { Party } from '../../entities/party.ts';
import { Shop } from '../../entities/shop.ts';
import { ShopMember } from '../../entities/shop-member.ts';
import { AppError, InputInvalid, NotPermitted } from '../../errors.ts';
import { needsShop } from '../../queries/invitations/find-invitation.ts';
import { refreshCommissionNames } from '../commissions/refresh-members.ts';

type ShopChoice = Pick<ParsedInput<typeof contract>['body'], 'shopId' | 'newShop'>;

/** Gives the person, or the shop they chose, the invited part. @returns the shop that takes part, null for a person */
export async function joinCommission(
  uow: UnitOfWork,
  invitation: Invitation & { commissionId: string },
  account: Account,
  choice: ShopChoice,
): Promise<string | null> {
  const { commissionId, roles } = invitation;
  // Parties of one commission change one after another.
  await uow.manager.findOneOrFail(Commission, { where: { id: commissionId }, lock: { mode: 'pessimistic_write' } });
  const shop = needsShop(invitation) ? await shopFor(uow, account, choice) : null;
  const partyId = await seat(uow, invitation, shop ? { shopId: shop.id } : { accountId: account.id });
  await refreshCommissionNames(uow.manager, commissionId);
  uow.record({
    commissionId,
    accountId: account.id,
    subject: 'parties',
    subjectId: partyId,
    words: `${shop?.name ?? account.displayName} joined as ${roles.join(', ')}`,
  });
  uow.announce('membership.changed', { commissionId }, { to: 'keys', keys: [shop?.id ?? account.id, account.id] });
  uow.announce('parties.changed', { commissionId }, { to: 'everyone', commissionId });
  return shop?.id ?? null;
}

/** Adds a party, or widens the one that is there: whoever takes on another kind of work stays one party. */
async function seat(
  uow: UnitOfWork,
  { commissionId, roles, guestSees, seesUntil }: Invitation & { commissionId: string },
  who: { shopId: string } | { accountId: string },
): Promise<string> {
  const earlier = await uow.manager.findOneBy(Party, { commissionId, ...who, leftAt: IsNull() });
  if (!earlier) {
    const party = await uow.manager.save(
      uow.manager.create(Party, { commissionId, ...who, roles, guestSees, seesUntil }),
    );
    return party.id;
  }
  const asGuest = roles.includes('guest');
  // A guest sees less than anyone else, so the two are never mixed in one party.
  if (asGuest && !earlier.roles.includes('guest'))
    throw new AppError('already-there', 'You take part in this commission already and see more than a guest.');
  const merged = asGuest ? roles : [...new Set([...earlier.roles.filter((role) => role !== 'guest'), ...roles])];
  await uow.manager.update(Party, { id: earlier.id }, { roles: merged, guestSees, seesUntil });
  return earlier.id;
}

/** The shop that takes the part: one of the person's own, where they work, or one made now. */
async function shopFor(uow: UnitOfWork, account: Account, { shopId, newShop }: ShopChoice): Promise<Shop> {
  if (newShop) {
    const shop = await uow.manager.save(uow.manager.create(Shop, { ...newShop, timeZone: account.timeZone }));
    await uow.manager.insert(ShopMember, { shopId: shop.id, accountId: account.id, role: 'owner' });
    return shop;
  }
  const member = shopId ? await uow.manager.findOneBy(ShopMember, { shopId, accountId: account.id }) : null;
  if (!member)
    throw new InputInvalid([
      { pointer: '/body/shopId', message: 'Choose one of your shops, or give a new one a name' },
    ]);
  if (member.role === 'bookkeeper')
    throw new NotPermitted('A bookkeeper cannot take work on for a shop; ask its owner.');
  return uow.manager.findOneByOrFail(Shop, { id: member.shopId });
}
