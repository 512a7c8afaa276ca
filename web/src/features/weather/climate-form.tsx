import { Button, SegmentedControl, Table, TextInput } from '@mantine/core';
import { useState } from 'react';
import { DraftNote } from '../../components/draft-note';
import { ErrorPanel } from '../../components/error-panel';
import { ErrorSummary } from '../../components/error-summary';
import { NumberField } from '../../components/number-field';
import { useDraft } from '../../lib/use-draft';
import { PlaceFields, weatherInputId, type PlaceValues } from './place-fields';
import { useStoreWeather } from './use-store-weather';
import classes from './weather.module.css';

const MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];

type Column = 'monthlyMjM2' | 'monthlyMinC' | 'monthlyMaxC';

interface Values extends PlaceValues {
  utcOffsetHours: number | null;
  source: string;
  monthlyMjM2: (number | null)[];
  monthlyMinC: (number | null)[];
  monthlyMaxC: (number | null)[];
}

const blank = (): (number | null)[] => MONTHS.map(() => null);

const EMPTY: Values = {
  name: '',
  latitude: null,
  longitude: null,
  elevationM: null,
  utcOffsetHours: 1,
  source: '',
  monthlyMjM2: blank(),
  monthlyMinC: blank(),
  monthlyMaxC: blank(),
};

const MJ_PER_KWH = 3.6;

/** Twelve rows of monthly means, typed in from a climate table. */
export function ClimateForm({ onDone }: { onDone: () => void }) {
  const draft = useDraft<Values>('weather:climate', EMPTY);
  const [unit, setUnit] = useState<'MJ' | 'kWh'>('MJ');
  const values = draft.value;
  const { store, messages, pending, problem } = useStoreWeather(() => {
    draft.clear(EMPTY);
    onDone();
  });
  const factor = unit === 'MJ' ? 1 : MJ_PER_KWH;
  const setMonth = (column: Column, month: number, value: number | null) =>
    draft.set({
      ...values,
      [column]: values[column].map((old, i) => (i === month ? value : old)),
    });
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        store({ kind: 'climate', ...values });
      }}
    >
      <ErrorSummary messages={messages} idOf={weatherInputId} />
      <PlaceFields
        values={values}
        onChange={(place) => draft.set({ ...values, ...place })}
        messages={messages}
      />
      <div className={classes.pair}>
        <NumberField
          id={weatherInputId('utcOffsetHours')}
          label="Standard time, hours east of UTC"
          unit="h"
          value={values.utcOffsetHours}
          onChange={(utcOffsetHours) => draft.set({ ...values, utcOffsetHours })}
          error={messages.utcOffsetHours}
        />
        <TextInput
          id={weatherInputId('source')}
          label="Source of the table"
          value={values.source}
          onChange={(event) => draft.set({ ...values, source: event.currentTarget.value })}
          error={messages.source}
        />
      </div>
      <SegmentedControl
        size="xs"
        my="sm"
        value={unit}
        onChange={(value) => setUnit(value === 'kWh' ? 'kWh' : 'MJ')}
        data={[
          { value: 'MJ', label: 'MJ m⁻² d⁻¹' },
          { value: 'kWh', label: 'kWh m⁻² d⁻¹' },
        ]}
        aria-label="Unit of the radiation"
      />
      <Table className={classes.months} withRowBorders={false}>
        <Table.Thead>
          <Table.Tr>
            <Table.Th scope="col">Month</Table.Th>
            <Table.Th scope="col">Mean daily global light</Table.Th>
            <Table.Th scope="col">Mean minimum</Table.Th>
            <Table.Th scope="col">Mean maximum</Table.Th>
          </Table.Tr>
        </Table.Thead>
        <Table.Tbody>
          {MONTHS.map((name, month) => (
            <Table.Tr key={name}>
              <Table.Th scope="row">{name}</Table.Th>
              <Table.Td>
                <NumberField
                  id={weatherInputId(`monthlyMjM2.${month}`)}
                  aria-label={`${name}, mean daily global light`}
                  unit={unit}
                  step={0.1}
                  value={perUnit(values.monthlyMjM2[month], factor)}
                  onChange={(value) =>
                    setMonth('monthlyMjM2', month, value === null ? null : value * factor)
                  }
                  error={messages[`monthlyMjM2.${month}`]}
                />
              </Table.Td>
              {(['monthlyMinC', 'monthlyMaxC'] as const).map((column) => (
                <Table.Td key={column}>
                  <NumberField
                    id={weatherInputId(`${column}.${month}`)}
                    aria-label={`${name}, mean ${column === 'monthlyMinC' ? 'minimum' : 'maximum'} temperature`}
                    unit="°C"
                    step={0.1}
                    value={values[column][month]}
                    onChange={(value) => setMonth(column, month, value)}
                    error={messages[`${column}.${month}`]}
                  />
                </Table.Td>
              ))}
            </Table.Tr>
          ))}
        </Table.Tbody>
      </Table>
      <DraftNote
        savedAt={draft.savedAt}
        restored={draft.restored}
        onDrop={() => draft.clear(EMPTY)}
      />
      {problem && <ErrorPanel error={problem} />}
      <Button type="submit" loading={pending} mt="sm">
        Build the year
      </Button>
    </form>
  );
}

const perUnit = (value: number | null, factor: number): number | null =>
  value === null ? null : Number((value / factor).toFixed(4));
