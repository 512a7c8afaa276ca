import { AuditPage } from '@furrowlight/shared/contract/audit';
import { infiniteQueryOptions } from '@tanstack/react-query';
import { request } from '../lib/api';

/** Who did what to which, newest first, page after page. */
export const auditQuery = infiniteQueryOptions({
  queryKey: ['audit'],
  queryFn: ({ pageParam, signal }) =>
    request(AuditPage, `/api/audit?size=50${pageParam ? `&before=${pageParam}` : ''}`, { signal }),
  initialPageParam: null as number | null,
  getNextPageParam: (page) => page.next,
  staleTime: 10_000,
});
