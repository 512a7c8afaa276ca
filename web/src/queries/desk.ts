import { Desk } from '@furrowlight/shared/contract/desk';
import { queryOptions } from '@tanstack/react-query';
import { request } from '../lib/api';

export const deskQuery = queryOptions({
  queryKey: ['desk'],
  queryFn: ({ signal }) => request(Desk, '/api/desk', { signal }),
  staleTime: 15_000,
});
