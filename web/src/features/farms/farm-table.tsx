import type { Farm } from '@furrowlight/shared/contract/farms';
import { ActionIcon, Tooltip } from '@mantine/core';
import { IconPencil } from '@tabler/icons-react';
import { useMemo } from 'react';
import { Link } from 'react-router-dom';
import { DataTable, type Column } from '../../components/data-table';
import { hectares } from '../../lib/format';
import classes from './farms.module.css';

export function FarmTable({
  farms,
  onEdit,
}: {
  farms: readonly Farm[];
  /** Absent for those who may not change farms. */
  onEdit?: (id: string) => void;
}) {
  const columns = useMemo<Column<Farm>[]>(
    () => [
      {
        id: 'name',
        head: 'Farm',
        sortBy: (farm) => farm.name,
        cell: (farm) => (
          <Link to={`/fields?farm=${farm.id}`} className={classes.name}>
            {farm.name}
          </Link>
        ),
      },
      { id: 'holder', head: 'Holder', sortBy: (farm) => farm.holder, cell: (farm) => farm.holder },
      {
        id: 'place',
        head: 'Place',
        sortBy: (farm) => farm.place,
        cell: (farm) => farm.place || '–',
      },
      {
        id: 'number',
        head: 'Number',
        sortBy: (farm) => farm.farmNumber,
        cell: (farm) => farm.farmNumber || '–',
      },
      {
        id: 'advisor',
        head: 'Advisor',
        sortBy: (farm) => farm.advisorName ?? '',
        cell: (farm) => farm.advisorName ?? 'nobody yet',
      },
      {
        id: 'fields',
        head: 'Fields',
        numeric: true,
        sortBy: (farm) => farm.fieldCount,
        cell: (farm) => farm.fieldCount,
      },
      {
        id: 'area',
        head: 'Area',
        numeric: true,
        sortBy: (farm) => farm.areaM2,
        cell: (farm) => (farm.areaM2 > 0 ? hectares(farm.areaM2) : '–'),
      },
      {
        id: 'edit',
        head: 'Change',
        headHidden: true,
        numeric: true,
        cell: (farm) =>
          onEdit && (
            <Tooltip label="Change">
              <ActionIcon
                variant="subtle"
                color="ink"
                aria-label={`Change ${farm.name}`}
                onClick={() => onEdit(farm.id)}
              >
                <IconPencil size={17} stroke={1.6} />
              </ActionIcon>
            </Tooltip>
          ),
      },
    ],
    [onEdit],
  );
  return (
    <DataTable
      caption="Farms of the cooperative"
      rows={farms}
      columns={columns}
      rowKey={(farm) => farm.id}
      initialSort="name"
    />
  );
}
