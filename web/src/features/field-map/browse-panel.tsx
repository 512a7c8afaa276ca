import type { Farm } from '@furrowlight/shared/contract/farms';
import type { Field } from '@furrowlight/shared/contract/fields';
import { Button, Group, Select, Skeleton, TextInput } from '@mantine/core';
import { IconSearch } from '@tabler/icons-react';
import { EmptyState } from '../../components/empty-state';
import type { AddMode } from './add/add-mode';
import classes from './browse-panel.module.css';
import { FieldList } from './field-list';
import { SelectedField } from './selected-field';

interface Props {
  fields: readonly Field[];
  pending: boolean;
  /** True when the cooperative has no field at all. */
  none: boolean;
  farms: readonly Farm[];
  farmId: string | null;
  query: string;
  selectedId: string | null;
  onFarm: (id: string | null) => void;
  onQuery: (text: string) => void;
  onSelect: (id: string | null) => void;
  onOpen: (id: string) => void;
  /** Absent for those who may not add fields. */
  onAdd?: (mode: AddMode) => void;
}

export function BrowsePanel(props: Props) {
  const { fields, selectedId } = props;
  const { onAdd } = props;
  const selected = fields.find((field) => field.id === selectedId);
  if (props.none) {
    return (
      <EmptyState
        title="No field is recorded yet"
        action={
          onAdd && (
            <Group gap="xs">
              <Button onClick={() => onAdd('draw')}>Draw a field</Button>
              <Button variant="default" onClick={() => onAdd('import')}>
                Import boundaries
              </Button>
            </Group>
          )
        }
      >
        A field needs a name and a boundary. Draw it on the map, type its corners or side lengths,
        or bring a GeoJSON file.
      </EmptyState>
    );
  }
  return (
    <div className={classes.panel}>
      <div className={classes.filters}>
        <TextInput
          aria-label="Find a field by its name or farm"
          placeholder="Field or farm"
          leftSection={<IconSearch size={16} stroke={1.7} />}
          value={props.query}
          onChange={(event) => props.onQuery(event.currentTarget.value)}
        />
        <Select
          aria-label="Farm"
          placeholder="All farms"
          clearable
          searchable
          data={props.farms.map(({ id, name }) => ({ value: id, label: name }))}
          value={props.farmId}
          onChange={props.onFarm}
        />
      </div>
      {props.pending && <ListSkeleton />}
      {!props.pending && fields.length === 0 && (
        <p className={classes.none}>
          No field answers to this.{' '}
          <Button
            variant="default"
            size="compact-sm"
            onClick={() => {
              props.onQuery('');
              props.onFarm(null);
            }}
          >
            Show all
          </Button>
        </p>
      )}
      {fields.length > 0 && (
        <FieldList
          fields={fields}
          selectedId={selectedId}
          onSelect={props.onSelect}
          onOpen={props.onOpen}
        />
      )}
      {selected && <SelectedField field={selected} />}
    </div>
  );
}

function ListSkeleton() {
  return (
    <div aria-hidden>
      {[0, 1, 2, 3, 4, 5, 6, 7].map((i) => (
        <Skeleton key={i} height={48} mb={6} />
      ))}
    </div>
  );
}
