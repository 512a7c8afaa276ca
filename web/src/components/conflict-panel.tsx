import { Button, Group, Text } from '@mantine/core';
import classes from './conflict-panel.module.css';

interface Props {
  /** What was changed by someone else, e.g. `this farm`. */
  what: string;
  onTheirs: () => void;
  onMine: () => void;
  busy?: boolean;
}

/** Two people wrote at once: nothing is overwritten until one of them decides. */
export function ConflictPanel({ what, onTheirs, onMine, busy }: Props) {
  return (
    <div role="alert" className={classes.panel}>
      <Text fw={600}>Someone else changed {what} while you were writing</Text>
      <Text size="sm" mt={2}>
        Your input is still here. Look at their version first, or save yours over it.
      </Text>
      <Group mt="sm" gap="xs">
        <Button size="compact-sm" variant="default" onClick={onTheirs} disabled={busy}>
          Show theirs, drop mine
        </Button>
        <Button size="compact-sm" onClick={onMine} loading={busy}>
          Save mine over it
        </Button>
      </Group>
    </div>
  );
}
