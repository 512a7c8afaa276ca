import type { Farm } from '@furrowlight/shared/contract/farms';
import { Drawer } from '@mantine/core';
import { FarmForm } from './farm-form';

interface Props {
  opened: boolean;
  /** The farm to change; null for a new one. */
  farm: Farm | null;
  onClose: () => void;
}

export function FarmDrawer({ opened, farm, onClose }: Props) {
  return (
    <Drawer
      opened={opened}
      onClose={onClose}
      position="right"
      size="md"
      title={farm ? farm.name : 'Add a farm'}
      closeButtonProps={{ 'aria-label': 'Close' }}
    >
      <FarmForm key={farm?.id ?? 'new'} farm={farm} onDone={onClose} />
    </Drawer>
  );
}
