import { Skeleton } from '@mantine/core';

export function ReviewEntryPage() {
  return <Skeleton height={320} />;
}
