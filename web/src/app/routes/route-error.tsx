import { isRouteErrorResponse, useRouteError } from 'react-router-dom';
import { ErrorPanel } from '../../components/error-panel';
import { NotFound } from './not-found';

/** What a page shows when it could not be drawn at all. */
export function RouteError() {
  const error = useRouteError();
  if (isRouteErrorResponse(error) && error.status === 404) return <NotFound />;
  return (
    <main style={{ padding: 'var(--mantine-spacing-xl)' }}>
      <ErrorPanel error={error} onRetry={() => window.location.reload()} />
    </main>
  );
}
