import { IsNull } from 'typeorm';
import type { UnitOfWork } from '../../db/unit-of-work.ts';
import type { Account } from '../../entities/account.ts';
import type { Invitation } from '../../entities/invitation.ts';
import { Party } from '../../entities/party.ts';
import { ShopMember } from '../../entities/shop-member.ts';
import { AppError } from '../../errors.ts';

/** Makes the person a member of the shop that invited them. */
export async function joinShop(uow: UnitOfWork, invitation: Invitation, account: Account): Promise<string> {
  const { shopId, shopRole } = invitation;
  if (!shopId || !shopRole) throw new AppError('link-expired');
  if ((await uow.manager.countBy(ShopMember, { shopId, accountId: account.id })) > 0)
    throw new AppError('already-there', 'You belong to this shop already.');
  await uow.manager.insert(ShopMember, { shopId, accountId: account.id, role: shopRole });
  for (const { commissionId } of await uow.manager.findBy(Party, { shopId, leftAt: IsNull() })) {
    uow.announce('membership.changed', { commissionId }, { to: 'keys', keys: [account.id] });
    uow.announce('parties.changed', { commissionId }, { to: 'everyone', commissionId });
  }
  return shopId;
}
