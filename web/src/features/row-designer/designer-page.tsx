import { Skeleton } from '@mantine/core';

export function DesignerPage() {
  return <Skeleton height={320} />;
}
