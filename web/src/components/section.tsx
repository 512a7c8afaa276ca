import { Title } from '@mantine/core';
import { useId, type ReactNode } from 'react';
import classes from './section.module.css';

interface Props {
  title: string;
  actions?: ReactNode;
  /** One sentence on what this part is for. */
  intro?: ReactNode;
  children: ReactNode;
}

/** A part of a page under its own furrow line. */
export function Section({ title, actions, intro, children }: Props) {
  const id = useId();
  return (
    <section className={classes.section} aria-labelledby={id}>
      <div className={classes.head}>
        <Title order={2} id={id}>
          {title}
        </Title>
        {actions && <div className={classes.actions}>{actions}</div>}
      </div>
      {intro && <p className={classes.intro}>{intro}</p>}
      {children}
    </section>
  );
}
