import { queryOptions } from '@tanstack/react-query';
import * as contracts from '../../../shared/contracts/handoffs.ts';
import { api } from '../api.ts';
import { keys } from '../query-keys.ts';

export const handoffQueries = {
  list: (commissionId: string) =>
    queryOptions({
      queryKey: keys.handoffs.lists(commissionId),
      queryFn: ({ signal }) => api(contracts.listHandoffs, { params: { commissionId } }, { signal }),
    }),
  detail: (commissionId: string, handoffId: string) =>
    queryOptions({
      queryKey: keys.handoffs.detail(commissionId, handoffId),
      queryFn: ({ signal }) => api(contracts.getHandoff, { params: { commissionId, handoffId } }, { signal }),
    }),
  effect: (commissionId: string, handoffId: string, onDay: string) =>
    queryOptions({
      queryKey: [...keys.handoffs.detail(commissionId, handoffId), 'effect', onDay] as const,
      queryFn: ({ signal }) =>
        api(contracts.previewHandoffDay, { params: { commissionId, handoffId }, query: { onDay } }, { signal }),
    }),
};
