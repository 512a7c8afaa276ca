import { Button, Group, SegmentedControl } from '@mantine/core';
import { useState } from 'react';
import { Section } from '../../components/section';
import { ClearSkyForm } from './clear-sky-form';
import { ClimateForm } from './climate-form';
import { FileForm } from './file-form';

type Way = 'file' | 'climate' | 'clear-sky';

/** Three ways to a weather year: a file, twelve monthly means, or a sky without clouds. */
export function AddWeather({ onDone }: { onDone: () => void }) {
  const [way, setWay] = useState<Way>('file');
  return (
    <Section
      title="Add a weather year"
      actions={
        <Group gap="xs">
          <SegmentedControl
            value={way}
            onChange={(value) => setWay(value as Way)}
            data={[
              { value: 'file', label: 'Hourly file' },
              { value: 'climate', label: 'Monthly means' },
              { value: 'clear-sky', label: 'Clear sky' },
            ]}
            aria-label="Where the weather comes from"
          />
          <Button variant="subtle" color="ink" onClick={onDone}>
            Close
          </Button>
        </Group>
      }
    >
      {way === 'file' && <FileForm onDone={onDone} />}
      {way === 'climate' && <ClimateForm onDone={onDone} />}
      {way === 'clear-sky' && <ClearSkyForm onDone={onDone} />}
    </Section>
  );
}
