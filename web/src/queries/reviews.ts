import {
  Review,
  ReviewCreated,
  ReviewList,
  ReviewPage,
  type ReviewEntry,
  type ReviewInput,
} from '@furrowlight/shared/contract/reviews';
import { mutationOptions, queryOptions, type QueryClient } from '@tanstack/react-query';
import { call, request } from '../lib/api';

const key = ['reviews'] as const;

export const reviewListQuery = (fieldId: string) =>
  queryOptions({
    queryKey: [...key, 'list', fieldId],
    queryFn: async ({ signal }) =>
      (await request(ReviewList, `/api/fields/${fieldId}/reviews`, { signal })).items,
    staleTime: 15_000,
  });

/** What the holder of a review link sees. */
export const reviewPageQuery = queryOptions({
  queryKey: [...key, 'page'],
  queryFn: ({ signal }) => request(ReviewPage, '/api/review', { signal }),
  staleTime: 5 * 60_000,
  retry: false,
});

const settle = (client: QueryClient) =>
  Promise.all([
    client.invalidateQueries({ queryKey: key }),
    client.invalidateQueries({ queryKey: ['desk'] }),
  ]);

export const createReview = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ input, idempotencyKey }: { input: ReviewInput; idempotencyKey: string }) =>
      request(ReviewCreated, '/api/reviews', { method: 'POST', body: input, idempotencyKey }),
    onSuccess: () => settle(client),
  });

export const revokeReview = (client: QueryClient) =>
  mutationOptions({
    mutationFn: (id: string) => request(Review, `/api/reviews/${id}/revoke`, { method: 'POST' }),
    onSuccess: () => settle(client),
  });

/** Swap the token of a link for a cookie. */
export const enterReview = (entry: ReviewEntry) =>
  call('/api/review-session', { method: 'POST', body: entry });
