import { useQuery } from '@tanstack/react-query';
import { Navigate, Outlet, useLocation, useMatches } from 'react-router-dom';
import { ErrorPanel } from '../../components/error-panel';
import { sessionQuery } from '../../queries/session';
import { OpenFrame } from './open-frame';
import { RouteLoading } from './route-loading';
import { Shell } from './shell';

export interface PageHandle {
  /** The page may be read without signing in. */
  open?: boolean;
}

/** The shell for signed-in people; others see open pages, or are led to the door and back. */
export function AppLayout() {
  const location = useLocation();
  const open = useMatches().some(({ handle }) => (handle as PageHandle | undefined)?.open);
  const session = useQuery(sessionQuery);
  if (session.isPending) return <RouteLoading />;
  if (session.data) {
    return (
      <Shell session={session.data}>
        <Outlet />
      </Shell>
    );
  }
  if (open) {
    return (
      <OpenFrame>
        <Outlet />
      </OpenFrame>
    );
  }
  if (session.isError) {
    return <ErrorPanel error={session.error} onRetry={() => void session.refetch()} />;
  }
  const next = `${location.pathname}${location.search}`;
  return <Navigate to={`/sign-in?next=${encodeURIComponent(next)}`} replace />;
}
