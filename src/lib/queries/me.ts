import { queryOptions } from '@tanstack/react-query';
import { getMe } from '../../../shared/contracts/accounts.ts';
import { api } from '../api.ts';
import { keys } from '../query-keys.ts';

export const meQuery = () =>
  queryOptions({ queryKey: keys.me(), queryFn: ({ signal }) => api(getMe, {}, { signal }), staleTime: 60_000 });
