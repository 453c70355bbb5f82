import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query';
import * as contracts from '../../../shared/contracts/commissions.ts';
import * as partsAndLegs from '../../../shared/contracts/parts-and-legs.ts';
import * as standing from '../../../shared/contracts/standing.ts';
import type { CommissionState } from '../../../shared/contracts/vocabulary.ts';
import { api } from '../api.ts';
import { keys } from '../query-keys.ts';

export const commissionQueries = {
  list: (filter: { search?: string; state?: CommissionState }) =>
    infiniteQueryOptions({
      queryKey: [...keys.commissions.lists(), filter] as const,
      queryFn: ({ signal, pageParam }) =>
        api(
          contracts.listCommissions,
          { query: { ...filter, ...(pageParam ? { cursor: pageParam } : {}) } },
          { signal },
        ),
      initialPageParam: '',
      getNextPageParam: (last) => last.nextCursor,
    }),
  detail: (commissionId: string) =>
    queryOptions({
      queryKey: keys.commissions.detail(commissionId),
      queryFn: ({ signal }) => api(contracts.getCommission, { params: { commissionId } }, { signal }),
    }),
  parties: (commissionId: string) =>
    queryOptions({
      queryKey: keys.parties.list(commissionId),
      queryFn: ({ signal }) => api(contracts.listParties, { params: { commissionId } }, { signal }),
    }),
  parts: (commissionId: string) =>
    queryOptions({
      queryKey: keys.parts.list(commissionId),
      queryFn: ({ signal }) => api(partsAndLegs.listParts, { params: { commissionId } }, { signal }),
    }),
  legs: (commissionId: string) =>
    queryOptions({
      queryKey: keys.legs.list(commissionId),
      queryFn: ({ signal }) => api(partsAndLegs.listLegs, { params: { commissionId } }, { signal }),
    }),
  standing: (commissionId: string) =>
    queryOptions({
      queryKey: keys.standing.detail(commissionId),
      queryFn: ({ signal }) => api(standing.getStanding, { params: { commissionId } }, { signal }),
    }),
  history: (commissionId: string) =>
    infiniteQueryOptions({
      queryKey: keys.history.list(commissionId),
      queryFn: ({ signal, pageParam }) =>
        api(
          standing.listMoved,
          { params: { commissionId }, query: pageParam ? { cursor: pageParam } : {} },
          { signal },
        ),
      initialPageParam: '',
      getNextPageParam: (last) => last.nextCursor,
    }),
};
