import { MemberList } from '@furrowlight/shared/contract/members';
import { queryOptions } from '@tanstack/react-query';
import { request } from '../lib/api';

export const memberListQuery = queryOptions({
  queryKey: ['members'],
  queryFn: async ({ signal }) => (await request(MemberList, '/api/members', { signal })).items,
  staleTime: 60_000,
});
