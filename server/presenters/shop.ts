import type { Actor } from '../../shared/abilities/actor.ts';
import type { ShopView } from '../../shared/contracts/shops.ts';
import type { Shop } from '../entities/shop.ts';

export const presentShop = (actor: Actor, row: Shop): ShopView => ({
  id: row.id,
  name: row.name,
  craft: row.craft,
  country: row.country,
  timeZone: row.timeZone,
  tint: row.tint,
  revision: row.revision,
  yourRole: actor.shops.find((shop) => shop.shopId === row.id)?.role ?? null,
});
