import { queryOptions } from '@tanstack/react-query';
import { getBench } from '../../../shared/contracts/standing.ts';
import { api } from '../api.ts';
import { keys } from '../query-keys.ts';

export const benchQuery = () =>
  queryOptions({ queryKey: keys.bench(), queryFn: ({ signal }) => api(getBench, {}, { signal }) });
