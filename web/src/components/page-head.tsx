import { Title } from '@mantine/core';
import { IconChevronRight } from '@tabler/icons-react';
import { useEffect, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import classes from './page-head.module.css';

export interface Crumb {
  label: string;
  to: string;
}

interface Props {
  title: string;
  /** The way here, from the widest place; without the page itself. */
  crumbs?: Crumb[];
  actions?: ReactNode;
  /** One line under the title. */
  children?: ReactNode;
}

/** Where am I: the way here, the page's name, what can be done. */
export function PageHead({ title, crumbs = [], actions, children }: Props) {
  useEffect(() => {
    document.title = `${title} · Furrowlight`;
  }, [title]);
  return (
    <header className={classes.head}>
      {crumbs.length > 0 && (
        <nav aria-label="Breadcrumbs">
          <ol className={classes.crumbs}>
            {crumbs.map((crumb) => (
              <li key={crumb.to}>
                <Link to={crumb.to}>{crumb.label}</Link>
                <IconChevronRight size={13} stroke={1.8} aria-hidden />
              </li>
            ))}
          </ol>
        </nav>
      )}
      <div className={classes.row}>
        <div className={classes.words}>
          <Title order={1}>{title}</Title>
          {children && <div className={classes.under}>{children}</div>}
        </div>
        {actions && <div className={classes.actions}>{actions}</div>}
      </div>
    </header>
  );
}
