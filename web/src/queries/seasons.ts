import {
  FieldSeason,
  FieldSeasonList,
  type SeasonInput,
  type SeasonPatch,
} from '@furrowlight/shared/contract/fields';
import { mutationOptions, queryOptions, type QueryClient } from '@tanstack/react-query';
import { call, request } from '../lib/api';

export const seasonListQuery = (fieldId: string) =>
  queryOptions({
    queryKey: ['seasons', fieldId],
    queryFn: async ({ signal }) =>
      (await request(FieldSeasonList, `/api/fields/${fieldId}/seasons`, { signal })).items,
    staleTime: 30_000,
  });

const invalidate = (client: QueryClient, fieldId: string) =>
  Promise.all([
    client.invalidateQueries({ queryKey: seasonListQuery(fieldId).queryKey }),
    client.invalidateQueries({ queryKey: ['fields'] }),
    client.invalidateQueries({ queryKey: ['desk'] }),
  ]);

export const createSeason = (client: QueryClient, fieldId: string) =>
  mutationOptions({
    mutationFn: ({ input, idempotencyKey }: { input: SeasonInput; idempotencyKey: string }) =>
      request(FieldSeason, `/api/fields/${fieldId}/seasons`, {
        method: 'POST',
        body: input,
        idempotencyKey,
      }),
    onSuccess: () => invalidate(client, fieldId),
  });

export const changeSeason = (client: QueryClient, fieldId: string) =>
  mutationOptions({
    mutationFn: ({ id, version, patch }: { id: string; version: number; patch: SeasonPatch }) =>
      request(FieldSeason, `/api/seasons/${id}`, { method: 'PATCH', body: patch, version }),
    onSuccess: () => invalidate(client, fieldId),
  });

export const removeSeason = (client: QueryClient, fieldId: string) =>
  mutationOptions({
    mutationFn: ({ id, version }: { id: string; version: number }) =>
      call(`/api/seasons/${id}`, { method: 'DELETE', version }),
    onSuccess: () => invalidate(client, fieldId),
  });
