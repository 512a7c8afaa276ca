import { Session, type SignIn } from '@furrowlight/shared/contract/session';
import { mutationOptions, queryOptions, type QueryClient } from '@tanstack/react-query';
import { ApiProblem, call, request } from '../lib/api';

/** Who is signed in; null when nobody is. */
export const sessionQuery = queryOptions({
  queryKey: ['session'],
  queryFn: async ({ signal }): Promise<Session | null> => {
    try {
      return await request(Session, '/api/session', { signal });
    } catch (error) {
      if (error instanceof ApiProblem && error.status === 401) return null;
      throw error;
    }
  },
  staleTime: 5 * 60_000,
});

export const signIn = (client: QueryClient) =>
  mutationOptions({
    mutationFn: (body: SignIn) => request(Session, '/api/session', { method: 'POST', body }),
    onSuccess: (session) => {
      client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'config' });
      client.setQueryData(sessionQuery.queryKey, session);
    },
  });

export const signOut = (client: QueryClient) =>
  mutationOptions({
    mutationFn: () => call('/api/session', { method: 'DELETE' }),
    onSuccess: () => {
      client.setQueryData(sessionQuery.queryKey, null);
      client.removeQueries({
        predicate: (query) => !['session', 'config'].includes(String(query.queryKey[0])),
      });
    },
  });
