import { Skeleton, VisuallyHidden } from '@mantine/core';

/** Holds the shape of a page while its code or data is on the way. */
export function RouteLoading() {
  return (
    <div role="status" style={{ maxWidth: '72rem', padding: 'var(--mantine-spacing-xl)' }}>
      <VisuallyHidden>Loading the page</VisuallyHidden>
      <Skeleton height={14} width="18%" mb="md" />
      <Skeleton height={34} width="42%" mb="xl" />
      <Skeleton height={120} mb="md" />
      <Skeleton height={260} />
    </div>
  );
}
