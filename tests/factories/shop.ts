import { randomUUID } from 'node:crypto';
import type { ShopRole } from '../../shared/contracts/vocabulary.ts';
import { Shop } from '../../server/entities/shop.ts';
import { ShopMember } from '../../server/entities/shop-member.ts';
import type { TestApp } from '../support/test-app.ts';
import { makeAccount, type MadeAccount } from './account.ts';

export interface MadeShop {
  id: string;
  name: string;
}

export async function makeShop(app: TestApp, overrides: Partial<Shop> = {}): Promise<MadeShop> {
  const id = overrides.id ?? randomUUID();
  const shop = { id, name: `Shop ${id.slice(0, 4)}`, craft: 'Hilts', country: 'DE', ...overrides };
  await app.services.db.manager.insert(Shop, shop);
  return { id, name: shop.name };
}

/** A person of a shop; makes the account where none is given. */
export async function makeMember(
  app: TestApp,
  shop: { id: string },
  role: ShopRole = 'owner',
  person?: MadeAccount,
): Promise<MadeAccount> {
  const account = person ?? (await makeAccount(app));
  await app.services.db.manager.insert(ShopMember, { shopId: shop.id, accountId: account.id, role });
  return account;
}
