import { ScenarioCopy } from '@furrowlight/shared/contract/scenarios';
import { Button, Group, Modal, TextInput } from '@mantine/core';
import { useState, type FormEvent } from 'react';
import { fieldMessages } from '../../../lib/field-messages';

interface Props {
  name: string;
  onClose: () => void;
  onRename: (name: string) => Promise<boolean>;
}

export function RenameScenario({ name, onClose, onRename }: Props) {
  const [text, setText] = useState(name);
  const [message, setMessage] = useState<string | undefined>();
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    const found = fieldMessages(ScenarioCopy, { name: text }).name;
    setMessage(found);
    if (!found && (await onRename(text.trim()))) onClose();
  };
  return (
    <Modal opened onClose={onClose} title="Rename" closeButtonProps={{ 'aria-label': 'Close' }}>
      <form onSubmit={(event) => void submit(event)} noValidate>
        <TextInput
          label="Scenario name"
          data-autofocus
          value={text}
          onChange={(event) => setText(event.currentTarget.value)}
          error={message}
        />
        <Group mt="md" gap="xs">
          <Button type="submit">Rename</Button>
          <Button variant="subtle" onClick={onClose}>
            Cancel
          </Button>
        </Group>
      </form>
    </Modal>
  );
}
