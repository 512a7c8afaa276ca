import { Button, Group, Text } from '@mantine/core';
import { IconAlertTriangle } from '@tabler/icons-react';
import { ApiProblem } from '../lib/api';
import classes from './error-panel.module.css';

interface Props {
  error: unknown;
  onRetry?: () => void;
  /** What could not be done, in a few words. */
  title?: string;
}

/** Says what went wrong, what to do, and the request id to quote. */
export function ErrorPanel({ error, onRetry, title }: Props) {
  const problem = error instanceof ApiProblem ? error : null;
  return (
    <div className={classes.panel} role="alert">
      <IconAlertTriangle size={22} stroke={1.6} aria-hidden className={classes.icon} />
      <div>
        <Text fw={600}>{title ?? problem?.title ?? 'This page could not be shown'}</Text>
        <Text size="sm" mt={2}>
          {problem?.detail ??
            'Something in the program went wrong. Your saved work is not affected; reload the page.'}
        </Text>
        {problem?.requestId && (
          <Text size="xs" c="dimmed" mt="xs">
            If you ask for help, quote request <code>{problem.requestId}</code>
          </Text>
        )}
        {onRetry && (
          <Group mt="sm">
            <Button size="compact-sm" variant="default" onClick={onRetry}>
              Try again
            </Button>
          </Group>
        )}
      </div>
    </div>
  );
}
