import { Alert, Button } from '@mantine/core';
import { useState } from 'react';
import { ErrorPanel } from '../../components/error-panel';
import { ErrorSummary } from '../../components/error-summary';
import { NumberField } from '../../components/number-field';
import { PlaceFields, weatherInputId, type PlaceValues } from './place-fields';
import { useStoreWeather } from './use-store-weather';

/** A year without clouds, for want of anything better. */
export function ClearSkyForm({ onDone }: { onDone: () => void }) {
  const [place, setPlace] = useState<PlaceValues>({
    name: 'Clear sky',
    latitude: null,
    longitude: null,
    elevationM: 0,
  });
  const [offset, setOffset] = useState<number | null>(1);
  const { store, messages, pending, problem } = useStoreWeather(onDone);
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        store({ kind: 'clear-sky', ...place, utcOffsetHours: offset });
      }}
    >
      <ErrorSummary messages={messages} idOf={weatherInputId} />
      <Alert color="straw" variant="light" mb="md" title="An upper bound">
        A sky without clouds gives far more light than any real year. Use it to compare layouts, not
        to judge a crop.
      </Alert>
      <PlaceFields values={place} onChange={setPlace} messages={messages} />
      <NumberField
        id={weatherInputId('utcOffsetHours')}
        label="Standard time, hours east of UTC"
        unit="h"
        maw={260}
        mb="md"
        value={offset}
        onChange={setOffset}
        error={messages.utcOffsetHours}
      />
      {problem && <ErrorPanel error={problem} />}
      <Button type="submit" loading={pending}>
        Put it on the shelf
      </Button>
    </form>
  );
}
