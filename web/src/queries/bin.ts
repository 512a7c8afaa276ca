import { BinList, type BinItem } from '@furrowlight/shared/contract/bin';
import { mutationOptions, queryOptions, type QueryClient } from '@tanstack/react-query';
import { call, request } from '../lib/api';

/** Removed farms and fields that can still be brought back. */
export const binQuery = queryOptions({
  queryKey: ['bin'],
  queryFn: async ({ signal }) => (await request(BinList, '/api/bin', { signal })).items,
  staleTime: 10_000,
});

export const restore = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ kind, id }: Pick<BinItem, 'kind' | 'id'>) =>
      call(`/api/${kind}s/${id}/restore`, { method: 'POST' }),
    onSuccess: () =>
      Promise.all(
        ['bin', 'farms', 'fields', 'desk'].map((key) =>
          client.invalidateQueries({ queryKey: [key] }),
        ),
      ),
  });
