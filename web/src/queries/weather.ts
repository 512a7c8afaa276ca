import {
  HourlyYearAnswer,
  Weather,
  WeatherList,
  WeatherPreview,
  type WeatherInput,
  type WeatherPreviewRequest,
} from '@furrowlight/shared/contract/weather';
import { mutationOptions, queryOptions, type QueryClient } from '@tanstack/react-query';
import { call, request } from '../lib/api';

const key = ['weather'] as const;

export const weatherListQuery = queryOptions({
  queryKey: [...key, 'list'],
  queryFn: async ({ signal }) => (await request(WeatherList, '/api/weather', { signal })).items,
  staleTime: 60_000,
});

/** Hours of a stored year; they never change. */
export const weatherYearQuery = (id: string) =>
  queryOptions({
    queryKey: [...key, 'year', id],
    queryFn: ({ signal }) => request(HourlyYearAnswer, `/api/weather/${id}/year`, { signal }),
    staleTime: Infinity,
    gcTime: 10 * 60_000,
  });

export const previewWeather = () =>
  mutationOptions({
    mutationFn: (body: WeatherPreviewRequest) =>
      request(WeatherPreview, '/api/weather/preview', { method: 'POST', body }),
  });

const settle = (client: QueryClient) => client.invalidateQueries({ queryKey: [...key, 'list'] });

export const createWeather = (client: QueryClient) =>
  mutationOptions({
    mutationFn: ({ input, idempotencyKey }: { input: WeatherInput; idempotencyKey: string }) =>
      request(Weather, '/api/weather', { method: 'POST', body: input, idempotencyKey }),
    onSuccess: () => settle(client),
  });

export const removeWeather = (client: QueryClient) =>
  mutationOptions({
    mutationFn: (id: string) => call(`/api/weather/${id}`, { method: 'DELETE' }),
    onSuccess: () => settle(client),
  });
