import type { Field } from '@furrowlight/shared/contract/fields';
import { ActionIcon, Menu } from '@mantine/core';
import { IconDots, IconFileExport, IconTrash } from '@tabler/icons-react';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { showUndo } from '../../../components/undo-notice';
import { saveText } from '../../../lib/save-text';
import { forgetRecent } from '../../../lib/recent';
import { showRefusal } from '../../../lib/show-refusal';
import { useMay } from '../../../lib/use-may';
import { restore } from '../../../queries/bin';
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
  const mayWrite = useMay('fields:write');
  const remove = useMutation(removeField(client));
  const bringBack = useMutation(restore(client));
  const undo = () =>
    bringBack
      .mutateAsync({ kind: 'field', id: field.id })
      .then(() => navigate(`/fields/${field.id}`))
      .catch((error: unknown) => showRefusal(`${field.name} stays in the bin`, error));
  const putAway = () =>
    remove
      .mutateAsync({ id: field.id, version: field.version })
      .then(() => {
        forgetRecent(memberId, `/fields/${field.id}`);
        showUndo(`${field.name} is in the bin for 30 days.`, () => void undo());
        return navigate('/fields');
      })
      .catch((error: unknown) => showRefusal(`${field.name} stays`, error));
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
        {mayWrite && (
          <Menu.Item
            color="danger"
            leftSection={<IconTrash size={16} stroke={1.6} />}
            onClick={() => void putAway()}
          >
            Put into the bin
          </Menu.Item>
        )}
      </Menu.Dropdown>
    </Menu>
  );
}
