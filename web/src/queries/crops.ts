import { CropList } from '@furrowlight/shared/contract/crops';
import { queryOptions } from '@tanstack/react-query';
import { request } from '../lib/api';

export const cropListQuery = queryOptions({
  queryKey: ['crops'],
  queryFn: async ({ signal }) => (await request(CropList, '/api/crops', { signal })).items,
  staleTime: 60 * 60_000,
});
