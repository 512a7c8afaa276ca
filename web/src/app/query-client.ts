import { QueryClient } from '@tanstack/react-query';
import { ApiProblem } from '../lib/api';

/** A refusal is an answer; only a missing or failing server is worth asking again. */
function worthRetrying(failures: number, error: Error): boolean {
  if (failures >= 2) return false;
  return !(error instanceof ApiProblem) || error.status === 0 || error.status >= 500;
}

export function makeQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: { retry: worthRetrying, refetchOnWindowFocus: true },
      mutations: { retry: false },
    },
  });
}
