import type { Field } from '@furrowlight/shared/contract/fields';
import { ActionIcon, Menu } from '@mantine/core';
import { modals } from '@mantine/modals';
import { notifications } from '@mantine/notifications';
import { IconDots, IconFileExport, IconTrash } from '@tabler/icons-react';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { ApiProblem } from '../../../lib/api';
import { saveText } from '../../../lib/save-text';
import { forgetRecent } from '../../../lib/recent';
import { removeField } from '../../../queries/fields';

function asGeoJson(field: Field): string {
  return JSON.stringify(
    {
      type: 'FeatureCollection',
      features: [
        {
          type: 'Feature',
          properties: { name: field.name, farm: field.farmName },
          geometry: field.boundary ?? { type: 'Point', coordinates: field.pin },
        },
      ],
    },
    null,
    1,
  );
}

/** Seldom-used steps on a whole field. */
export function FieldMenu({ field, memberId }: { field: Field; memberId: string }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const remove = useMutation(removeField(client));
  const ask = () =>
    modals.openConfirmModal({
      title: `Remove ${field.name}?`,
      children:
        field.scenarioCount + field.seasonCount > 0
          ? `Its ${field.seasonCount} seasons and ${field.scenarioCount} scenarios with their results go with it. This cannot be undone.`
          : 'This cannot be undone.',
      labels: { confirm: 'Remove the field', cancel: 'Keep it' },
      confirmProps: { color: 'danger' },
      onConfirm: () => {
        remove
          .mutateAsync({ id: field.id, version: field.version })
          .then(() => {
            forgetRecent(memberId, `/fields/${field.id}`);
            notifications.show({ message: `${field.name} is removed.` });
            return navigate('/fields');
          })
          .catch((error: unknown) =>
            notifications.show({
              color: 'danger',
              title: 'The field stays',
              message: error instanceof ApiProblem ? error.detail : 'It could not be removed.',
            }),
          );
      },
    });
  return (
    <Menu position="bottom-end" shadow="md" width={220}>
      <Menu.Target>
        <ActionIcon variant="default" size={36} aria-label="More for this field">
          <IconDots size={18} stroke={1.6} />
        </ActionIcon>
      </Menu.Target>
      <Menu.Dropdown>
        <Menu.Item
          leftSection={<IconFileExport size={16} stroke={1.6} />}
          onClick={() =>
            saveText(`${field.name}.geojson`, 'application/geo+json', asGeoJson(field))
          }
        >
          Save as GeoJSON
        </Menu.Item>
        <Menu.Item color="danger" leftSection={<IconTrash size={16} stroke={1.6} />} onClick={ask}>
          Remove the field
        </Menu.Item>
      </Menu.Dropdown>
    </Menu>
  );
}
