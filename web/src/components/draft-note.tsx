import { Anchor, Text } from '@mantine/core';

interface Props {
  savedAt: Date | null;
  restored: boolean;
  onDrop: () => void;
}

/** Says that unsaved input is kept on this device, and lets it go. */
export function DraftNote({ savedAt, restored, onDrop }: Props) {
  if (!savedAt) return null;
  const time = savedAt.toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' });
  return (
    <Text size="xs" c="dimmed" role="status">
      {restored ? `Your unsaved draft of ${time} is back. ` : `Draft kept on this device ${time}. `}
      <Anchor component="button" type="button" size="xs" onClick={onDrop}>
        Drop the draft
      </Anchor>
    </Text>
  );
}
