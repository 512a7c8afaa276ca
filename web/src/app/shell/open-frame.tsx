import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Wordmark } from '../../components/wordmark';
import classes from './open-frame.module.css';

/** A plain head over pages that anyone may read. */
export function OpenFrame({ children }: { children: ReactNode }) {
  return (
    <div className={classes.page}>
      <header className={classes.head}>
        <Link to="/" aria-label="Furrowlight, to the desk">
          <Wordmark />
        </Link>
        <Link to="/sign-in">Sign in</Link>
      </header>
      <main>{children}</main>
    </div>
  );
}
