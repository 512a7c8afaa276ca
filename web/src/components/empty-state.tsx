import { Text, Title } from '@mantine/core';
import type { ReactNode } from 'react';
import classes from './empty-state.module.css';

interface Props {
  title: string;
  /** What belongs here and how it gets here. */
  children: ReactNode;
  action?: ReactNode;
}

/** An empty place that teaches what grows there. */
export function EmptyState({ title, children, action }: Props) {
  return (
    <div className={classes.empty}>
      <svg className={classes.furrows} viewBox="0 0 240 72" aria-hidden focusable="false">
        {Array.from({ length: 9 }, (_, i) => (
          <path key={i} d={`M120 8 ${(i - 4) * 58 + 120} 72`} />
        ))}
        <path className={classes.horizon} d="M0 8h240" />
      </svg>
      <Title order={2} className={classes.title}>
        {title}
      </Title>
      <Text component="div" className={classes.text}>
        {children}
      </Text>
      {action && <div className={classes.action}>{action}</div>}
    </div>
  );
}
