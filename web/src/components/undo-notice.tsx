import { Button, Group } from '@mantine/core';
import { notifications } from '@mantine/notifications';

/** Says what was done and offers to take it back. */
export function showUndo(message: string, onUndo: () => void): void {
  const id = notifications.show({
    autoClose: 12_000,
    message: (
      <Group justify="space-between" wrap="nowrap">
        <span>{message}</span>
        <Button
          size="compact-sm"
          variant="default"
          onClick={() => {
            notifications.hide(id);
            onUndo();
          }}
        >
          Undo
        </Button>
      </Group>
    ),
  });
}
