import { Farm, FarmList, type FarmInput, type FarmPatch } from '@furrowlight/shared/contract/farms';
import { mutationOptions, queryOptions, type QueryClient } from '@tanstack/react-query';
import { call, request } from '../lib/api';

const key = ['farms'] as const;

export const farmListQuery = queryOptions({
  queryKey: [...key, 'list'],
  queryFn: async ({ signal }) => (await request(FarmList, '/api/farms', { signal })).items,
  staleTime: 30_000,
});

export const farmQuery = (id: string) =>
  queryOptions({
    queryKey: [...key, 'one', id],
    queryFn: ({ signal }) => request(Farm, `/api/farms/${id}`, { signal }),
    staleTime: 30_000,
  });

const invalidate = (client: QueryClient) =>
  Promise.all([
    client.invalidateQueries({ queryKey: key }),
    client.invalidateQueries({ queryKey: ['fields'] }),
    client.invalidateQueries({ queryKey: ['desk'] }),
  ]);

export const createFarm = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ input, idempotencyKey }: { input: FarmInput; idempotencyKey: string }) =>
      request(Farm, '/api/farms', { method: 'POST', body: input, idempotencyKey }),
    onSuccess: () => invalidate(client),
  });

export const changeFarm = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ id, version, patch }: { id: string; version: number; patch: FarmPatch }) =>
      request(Farm, `/api/farms/${id}`, { method: 'PATCH', body: patch, version }),
    onSuccess: () => invalidate(client),
  });

export const removeFarm = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ id, version }: { id: string; version: number }) =>
      call(`/api/farms/${id}`, { method: 'DELETE', version }),
    onSuccess: () => invalidate(client),
  });
