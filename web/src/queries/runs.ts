import { ScenarioResult } from '@furrowlight/shared/contract/result';
import { Run } from '@furrowlight/shared/contract/run';
import { mutationOptions, queryOptions, type QueryClient } from '@tanstack/react-query';
import { request } from '../lib/api';

const FOLLOW_MS = 700;

const isOver = (run: Run | undefined) => run && run.status !== 'queued' && run.status !== 'running';

/** A run, asked for again until it is over. */
export const runQuery = (id: string) =>
  queryOptions({
    queryKey: ['runs', id],
    queryFn: ({ signal }) => request(Run, `/api/runs/${id}`, { signal }),
    refetchInterval: (query) => (isOver(query.state.data) ? false : FOLLOW_MS),
    staleTime: 0,
  });

/** Newest finished result of a scenario; it does not change once it is there. */
export const resultQuery = (scenarioId: string) =>
  queryOptions({
    queryKey: ['results', scenarioId],
    queryFn: ({ signal }) =>
      request(ScenarioResult, `/api/scenarios/${scenarioId}/result`, { signal }),
    staleTime: 5 * 60_000,
  });

const settle = (client: QueryClient, run: Run) => {
  client.setQueryData(runQuery(run.id).queryKey, run);
  return Promise.all([
    client.invalidateQueries({ queryKey: ['scenarios'] }),
    client.invalidateQueries({ queryKey: ['results', run.scenarioId] }),
    client.invalidateQueries({ queryKey: ['desk'] }),
  ]);
};

export const startRun = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ scenarioId, idempotencyKey }: { scenarioId: string; idempotencyKey: string }) =>
      request(Run, `/api/scenarios/${scenarioId}/runs`, { method: 'POST', idempotencyKey }),
    onSuccess: (run) => settle(client, run),
  });

export const cancelRun = (client: QueryClient) =>
  mutationOptions({
    mutationFn: (id: string) => request(Run, `/api/runs/${id}/cancel`, { method: 'POST' }),
    onSuccess: (run) => settle(client, run),
  });
