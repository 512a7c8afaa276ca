import { Skeleton } from '@mantine/core';

export function ComparePage() {
  return <Skeleton height={320} />;
}
