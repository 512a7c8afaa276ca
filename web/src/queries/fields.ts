import {
  Field,
  FieldList,
  type FieldInput,
  type FieldPatch,
} from '@furrowlight/shared/contract/fields';
import { mutationOptions, queryOptions, type QueryClient } from '@tanstack/react-query';
import { call, request } from '../lib/api';

const key = ['fields'] as const;

export const fieldListQuery = (farmId?: string) =>
  queryOptions({
    queryKey: [...key, 'list', farmId ?? null],
    queryFn: async ({ signal }) => {
      const search = farmId ? `?farmId=${encodeURIComponent(farmId)}` : '';
      return (await request(FieldList, `/api/fields${search}`, { signal })).items;
    },
    staleTime: 30_000,
  });

export const fieldQuery = (id: string) =>
  queryOptions({
    queryKey: [...key, 'one', id],
    queryFn: ({ signal }) => request(Field, `/api/fields/${id}`, { signal }),
    staleTime: 15_000,
  });

const invalidate = (client: QueryClient) =>
  Promise.all([
    client.invalidateQueries({ queryKey: key }),
    client.invalidateQueries({ queryKey: ['farms'] }),
    client.invalidateQueries({ queryKey: ['desk'] }),
    client.invalidateQueries({ queryKey: ['scenarios'] }),
  ]);

export const createField = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ input, idempotencyKey }: { input: FieldInput; idempotencyKey: string }) =>
      request(Field, '/api/fields', { method: 'POST', body: input, idempotencyKey }),
    onSuccess: (field) => {
      client.setQueryData(fieldQuery(field.id).queryKey, field);
      return invalidate(client);
    },
  });

export const changeField = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ id, version, patch }: { id: string; version: number; patch: FieldPatch }) =>
      request(Field, `/api/fields/${id}`, { method: 'PATCH', body: patch, version }),
    onSuccess: (field) => {
      client.setQueryData(fieldQuery(field.id).queryKey, field);
      return invalidate(client);
    },
  });

export const removeField = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ id, version }: { id: string; version: number }) =>
      call(`/api/fields/${id}`, { method: 'DELETE', version }),
    // Only lists: the page of the removed field is still open and must not ask for it again.
    onSuccess: () =>
      Promise.all(
        [fieldListQuery().queryKey.slice(0, 2), ['farms'], ['desk']].map((queryKey) =>
          client.invalidateQueries({ queryKey }),
        ),
      ),
  });
