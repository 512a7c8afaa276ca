import { useQuery } from '@tanstack/react-query';
import { Link, Outlet } from 'react-router-dom';
import { Wordmark } from '../../components/wordmark';
import { sessionQuery } from '../../queries/session';
import classes from './open-layout.module.css';
import { Shell } from './shell';

/** Pages that anyone may read: in the shell for those signed in, under a plain head for others. */
export function OpenLayout() {
  const session = useQuery(sessionQuery);
  if (session.data) {
    return (
      <Shell session={session.data}>
        <Outlet />
      </Shell>
    );
  }
  return (
    <div className={classes.page}>
      <header className={classes.head}>
        <Link to="/" aria-label="Furrowlight, to the desk">
          <Wordmark />
        </Link>
        <Link to="/sign-in">Sign in</Link>
      </header>
      <main>
        <Outlet />
      </main>
    </div>
  );
}
