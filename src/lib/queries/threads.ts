import { queryOptions } from '@tanstack/react-query';
import * as files from '../../../shared/contracts/files.ts';
import * as contracts from '../../../shared/contracts/threads.ts';
import type { FilePlace } from '../../../shared/contracts/vocabulary.ts';
import { api } from '../api.ts';
import { keys } from '../query-keys.ts';

export const threadQueries = {
  list: (commissionId: string) =>
    queryOptions({
      queryKey: keys.threads.lists(commissionId),
      queryFn: ({ signal }) => api(contracts.listThreads, { params: { commissionId } }, { signal }),
    }),
};

export const fileQueries = {
  list: (commissionId: string, place: FilePlace, placeId: string) =>
    queryOptions({
      queryKey: keys.files.list(commissionId, place, placeId),
      queryFn: ({ signal }) =>
        api(files.listFiles, { params: { commissionId }, query: { place, placeId } }, { signal }),
    }),
};
