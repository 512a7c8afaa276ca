import { Skeleton } from '@mantine/core';

export function ResultPage() {
  return <Skeleton height={320} />;
}
