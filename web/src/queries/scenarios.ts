import {
  Scenario,
  ScenarioList,
  type ScenarioInput,
  type ScenarioPatch,
} from '@furrowlight/shared/contract/scenarios';
import { mutationOptions, queryOptions, type QueryClient } from '@tanstack/react-query';
import { request } from '../lib/api';

const key = ['scenarios'] as const;

export const scenarioListQuery = (fieldId: string) =>
  queryOptions({
    queryKey: [...key, 'list', fieldId],
    queryFn: async ({ signal }) =>
      (await request(ScenarioList, `/api/fields/${fieldId}/scenarios`, { signal })).items,
    staleTime: 15_000,
  });

export const scenarioQuery = (id: string) =>
  queryOptions({
    queryKey: [...key, 'one', id],
    queryFn: ({ signal }) => request(Scenario, `/api/scenarios/${id}`, { signal }),
    staleTime: 15_000,
  });

const settle = (client: QueryClient, scenario: Scenario) => {
  client.setQueryData(scenarioQuery(scenario.id).queryKey, scenario);
  return Promise.all([
    client.invalidateQueries({ queryKey: key }),
    client.invalidateQueries({ queryKey: ['fields'] }),
    client.invalidateQueries({ queryKey: ['desk'] }),
  ]);
};

export const createScenario = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ input, idempotencyKey }: { input: ScenarioInput; idempotencyKey: string }) =>
      request(Scenario, '/api/scenarios', { method: 'POST', body: input, idempotencyKey }),
    onSuccess: (scenario) => settle(client, scenario),
  });

export const changeScenario = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ id, version, patch }: { id: string; version: number; patch: ScenarioPatch }) =>
      request(Scenario, `/api/scenarios/${id}`, { method: 'PATCH', body: patch, version }),
    onSuccess: (scenario) => settle(client, scenario),
  });

export const copyScenario = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({
      id,
      name,
      idempotencyKey,
    }: {
      id: string;
      name: string;
      idempotencyKey: string;
    }) =>
      request(Scenario, `/api/scenarios/${id}/copy`, {
        method: 'POST',
        body: { name },
        idempotencyKey,
      }),
    onSuccess: (scenario) => settle(client, scenario),
  });
