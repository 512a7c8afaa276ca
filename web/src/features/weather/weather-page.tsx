import { Skeleton } from '@mantine/core';

export function WeatherPage() {
  return <Skeleton height={320} />;
}
