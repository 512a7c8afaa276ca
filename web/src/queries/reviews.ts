import {
  Review,
  ReviewCreated,
  ReviewList,
  ReviewPage,
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

export const createReview = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ input, idempotencyKey }: { input: ReviewInput; idempotencyKey: string }) =>
      request(ReviewCreated, '/api/reviews', { method: 'POST', body: input, idempotencyKey }),
    onSuccess: () => client.invalidateQueries({ queryKey: key }),
  });

export const revokeReview = (client: QueryClient) =>
  mutationOptions({
    mutationFn: (id: string) => request(Review, `/api/reviews/${id}/revoke`, { method: 'POST' }),
    onSuccess: () => client.invalidateQueries({ queryKey: key }),
  });

/** Swap the token of a link for a cookie. */
export const enterReview = (token: string) =>
  call('/api/review-session', { method: 'POST', body: { token } });

export const reviewPageQuery = queryOptions({
  queryKey: [...key, 'page'],
  queryFn: ({ signal }) => request(ReviewPage, '/api/review', { signal }),
  staleTime: Infinity,
  retry: false,
});
