import { ClientConfig } from '@furrowlight/shared/contract/config';
import { queryOptions } from '@tanstack/react-query';
import { request } from '../lib/api';

export const configQuery = queryOptions({
  queryKey: ['config'],
  queryFn: ({ signal }) => request(ClientConfig, '/api/config', { signal }),
  staleTime: Infinity,
});
