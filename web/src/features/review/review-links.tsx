import { Skeleton } from '@mantine/core';

export function ReviewLinks({ fieldId }: { fieldId: string }) {
  return <Skeleton height={60} data-field={fieldId} />;
}
