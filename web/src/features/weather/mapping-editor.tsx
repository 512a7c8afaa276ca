import type {
  WeatherMapping,
  WeatherPreview,
  WeatherQuantity,
} from '@furrowlight/shared/contract/weather';
import { Button, Select, SimpleGrid, Table } from '@mantine/core';
import { NumberField } from '../../components/number-field';
import { QUANTITIES } from './quantities';
import classes from './weather.module.css';

interface Props {
  mapping: WeatherMapping;
  preview: WeatherPreview;
  onChange: (mapping: WeatherMapping) => void;
  onRead: () => void;
  busy: boolean;
}

const DELIMITERS = [
  { value: ',', label: 'comma ,' },
  { value: ';', label: 'semicolon ;' },
  { value: '\t', label: 'tab' },
  { value: '|', label: 'bar |' },
];

const quantityChoices = QUANTITIES.map(({ quantity, label }) => ({ value: quantity, label }));

const unitsOf = (quantity: string): string[] =>
  QUANTITIES.find((known) => known.quantity === quantity)?.units ?? [];

/** How a general CSV is read: separators, clock, and what each column holds. */
export function MappingEditor({ mapping, preview, onChange, onRead, busy }: Props) {
  const set = (part: Partial<WeatherMapping>) => onChange({ ...mapping, ...part });
  const setColumn = (index: number, part: Partial<WeatherMapping['columns'][number]>) =>
    set({ columns: mapping.columns.map((old, i) => (i === index ? { ...old, ...part } : old)) });
  return (
    <fieldset className={classes.mapping}>
      <legend>How the file is read</legend>
      <SimpleGrid cols={{ base: 1, xs: 2, md: 3 }} mb="sm">
        <Select
          label="Columns are separated by"
          data={DELIMITERS}
          value={mapping.delimiter}
          allowDeselect={false}
          onChange={(value) => value && set({ delimiter: value as WeatherMapping['delimiter'] })}
        />
        <Select
          label="Decimals are written with"
          data={[
            { value: '.', label: 'point 3.5' },
            { value: ',', label: 'comma 3,5' },
          ]}
          value={mapping.decimal}
          allowDeselect={false}
          onChange={(value) => value && set({ decimal: value as WeatherMapping['decimal'] })}
        />
        <NumberField
          label="Lines above the data"
          value={mapping.headerLines}
          min={0}
          onChange={(value) => set({ headerLines: Math.round(value ?? 0) })}
        />
        <Select
          label="A time names the hour that"
          data={[
            { value: 'beginning', label: 'begins then' },
            { value: 'ending', label: 'ends then' },
          ]}
          value={mapping.stamp}
          allowDeselect={false}
          onChange={(value) => value && set({ stamp: value as WeatherMapping['stamp'] })}
        />
        <Select
          label="Times are in"
          data={[
            { value: 'standard', label: 'local standard time' },
            { value: 'utc', label: 'UTC' },
          ]}
          value={mapping.clock}
          allowDeselect={false}
          onChange={(value) => value && set({ clock: value as WeatherMapping['clock'] })}
        />
        <NumberField
          label="Standard time, hours east of UTC"
          unit="h"
          value={mapping.utcOffsetHours}
          onChange={(value) => set({ utcOffsetHours: value ?? 0 })}
        />
      </SimpleGrid>
      <div className={classes.scroll} tabIndex={0} role="region" aria-label="Columns of the file">
        <Table className={classes.columns}>
          <Table.Thead>
            <Table.Tr>
              {mapping.columns.map((column, i) => (
                <Table.Th key={i} scope="col">
                  <div className={classes.header}>{preview.headers[i] || `Column ${i + 1}`}</div>
                  <Select
                    size="xs"
                    aria-label={`Column ${i + 1} holds`}
                    data={quantityChoices}
                    value={column.quantity}
                    allowDeselect={false}
                    onChange={(value) =>
                      value &&
                      setColumn(i, {
                        quantity: value as WeatherQuantity,
                        unit: unitsOf(value)[0] ?? '',
                      })
                    }
                  />
                  {unitsOf(column.quantity).length > 1 && (
                    <Select
                      size="xs"
                      mt={4}
                      aria-label={`Unit of column ${i + 1}`}
                      data={unitsOf(column.quantity)}
                      value={column.unit}
                      allowDeselect={false}
                      onChange={(unit) => unit && setColumn(i, { unit })}
                    />
                  )}
                </Table.Th>
              ))}
            </Table.Tr>
          </Table.Thead>
          <Table.Tbody>
            {preview.sample.map((row, r) => (
              <Table.Tr key={r}>
                {mapping.columns.map((_, i) => (
                  <Table.Td key={i}>{row[i] ?? ''}</Table.Td>
                ))}
              </Table.Tr>
            ))}
          </Table.Tbody>
        </Table>
      </div>
      <Button variant="default" onClick={onRead} loading={busy} mt="sm">
        Read the file again
      </Button>
    </fieldset>
  );
}
