import { useQuery } from '@tanstack/react-query';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { ErrorPanel } from '../../components/error-panel';
import { sessionQuery } from '../../queries/session';
import { RouteLoading } from './route-loading';
import { Shell } from './shell';

/** Pages for signed-in people; everyone else is led to the door and back. */
export function AppLayout() {
  const location = useLocation();
  const session = useQuery(sessionQuery);
  if (session.isPending) return <RouteLoading />;
  if (session.isError) {
    return <ErrorPanel error={session.error} onRetry={() => void session.refetch()} />;
  }
  if (!session.data) {
    const next = `${location.pathname}${location.search}`;
    return <Navigate to={`/sign-in?next=${encodeURIComponent(next)}`} replace />;
  }
  return (
    <Shell session={session.data}>
      <Outlet />
    </Shell>
  );
}
