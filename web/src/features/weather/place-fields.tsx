import { SimpleGrid, TextInput } from '@mantine/core';
import { NumberField } from '../../components/number-field';

/** Name and place of a weather year as typed. */
export interface PlaceValues {
  name: string;
  latitude: number | null;
  longitude: number | null;
  elevationM: number | null;
}

interface Props {
  values: PlaceValues;
  onChange: (values: PlaceValues) => void;
  messages: Record<string, string>;
}

/** Id of an input by its path in the request. */
export const weatherInputId = (path: string) => `weather-${path.replaceAll('.', '-')}`;

export function PlaceFields({ values, onChange, messages }: Props) {
  return (
    <SimpleGrid cols={{ base: 1, xs: 2, md: 4 }} mb="md">
      <TextInput
        id={weatherInputId('name')}
        label="Name on the shelf"
        value={values.name}
        onChange={(event) => onChange({ ...values, name: event.currentTarget.value })}
        error={messages.name}
      />
      <NumberField
        id={weatherInputId('latitude')}
        label="Latitude, north positive"
        unit="°"
        step={0.01}
        value={values.latitude}
        onChange={(latitude) => onChange({ ...values, latitude })}
        error={messages.latitude}
      />
      <NumberField
        id={weatherInputId('longitude')}
        label="Longitude, east positive"
        unit="°"
        step={0.01}
        value={values.longitude}
        onChange={(longitude) => onChange({ ...values, longitude })}
        error={messages.longitude}
      />
      <NumberField
        id={weatherInputId('elevationM')}
        label="Elevation"
        unit="m"
        value={values.elevationM}
        onChange={(elevationM) => onChange({ ...values, elevationM })}
        error={messages.elevationM}
      />
    </SimpleGrid>
  );
}
