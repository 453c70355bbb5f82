import { queryOptions } from '@tanstack/react-query';
import * as contracts from '../../../shared/contracts/shops.ts';
import { api } from '../api.ts';
import { keys } from '../query-keys.ts';

export const shopQueries = {
  list: () =>
    queryOptions({ queryKey: keys.shops.lists(), queryFn: ({ signal }) => api(contracts.listShops, {}, { signal }) }),
  detail: (shopId: string) =>
    queryOptions({
      queryKey: keys.shops.detail(shopId),
      queryFn: ({ signal }) => api(contracts.getShop, { params: { shopId } }, { signal }),
    }),
  members: (shopId: string) =>
    queryOptions({
      queryKey: keys.shops.members(shopId),
      queryFn: ({ signal }) => api(contracts.listShopMembers, { params: { shopId } }, { signal }),
    }),
};
