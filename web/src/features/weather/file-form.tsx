import type { WeatherMapping, WeatherPreview } from '@furrowlight/shared/contract/weather';
import { Button, FileButton } from '@mantine/core';
import { IconFileUpload } from '@tabler/icons-react';
import { useMutation } from '@tanstack/react-query';
import { useState, type DragEvent } from 'react';
import { ErrorPanel } from '../../components/error-panel';
import { ErrorSummary } from '../../components/error-summary';
import { formatNumber, percent } from '../../lib/format';
import { previewWeather } from '../../queries/weather';
import { FindingList } from './finding-list';
import { MappingEditor } from './mapping-editor';
import { MonthBars } from './month-bars';
import { PlaceFields, weatherInputId, type PlaceValues } from './place-fields';
import { useStoreWeather } from './use-store-weather';
import classes from './weather.module.css';

const FORMATS = {
  epw: 'EPW, hour-ending standard time',
  tmy3: 'Typical-year CSV with station line, hour-ending standard time',
  csv: 'General hourly CSV',
};

interface ChosenFile {
  fileName: string;
  content: string;
}

/** Upload of an hourly file: choose, look at how it is read, correct, store. */
export function FileForm({ onDone }: { onDone: () => void }) {
  const [file, setFile] = useState<ChosenFile | null>(null);
  const [mapping, setMapping] = useState<WeatherMapping | null>(null);
  const [place, setPlace] = useState<PlaceValues>({
    name: '',
    latitude: null,
    longitude: null,
    elevationM: null,
  });
  const preview = useMutation(previewWeather());
  const { store, messages, pending, problem } = useStoreWeather(onDone);

  const look = (next: ChosenFile, used: WeatherMapping | null, at: PlaceValues) =>
    preview.mutate(
      { ...next, mapping: used, latitude: at.latitude, longitude: at.longitude },
      {
        onSuccess: (answer) => {
          setMapping(answer.mapping);
          setPlace((old) => ({
            name: old.name || next.fileName.replace(/\.[^.]+$/, ''),
            latitude: old.latitude ?? answer.latitude,
            longitude: old.longitude ?? answer.longitude,
            elevationM: old.elevationM ?? answer.elevationM ?? 0,
          }));
        },
      },
    );
  const take = async (chosen: File | null) => {
    if (!chosen) return;
    const next = { fileName: chosen.name, content: await chosen.text() };
    const fresh = { name: '', latitude: null, longitude: null, elevationM: null };
    setFile(next);
    setPlace(fresh);
    look(next, null, fresh);
  };
  const drop = (event: DragEvent) => {
    event.preventDefault();
    void take(event.dataTransfer.files.item(0));
  };
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (file) store({ kind: 'file', ...file, mapping, ...place });
      }}
    >
      <div
        className={classes.drop}
        onDragOver={(event) => event.preventDefault()}
        onDrop={drop}
        data-filled={file ? true : undefined}
      >
        <FileButton onChange={(chosen) => void take(chosen)} accept=".epw,.csv,.txt,text/csv">
          {(button) => (
            <Button
              {...button}
              variant={file ? 'default' : 'filled'}
              leftSection={<IconFileUpload size={16} stroke={1.6} />}
              loading={preview.isPending}
            >
              {file ? 'Choose another file' : 'Choose a file'}
            </Button>
          )}
        </FileButton>
        <p className={classes.quiet}>
          {file
            ? file.fileName
            : 'One year of hourly values: EPW, or a CSV with global light (and diffuse or direct light, temperature and wind where known). You can also drop the file here.'}
        </p>
      </div>
      {preview.isError && (
        <ErrorPanel error={preview.error} title="The file could not be looked at" />
      )}
      {file && preview.data && (
        <>
          <ErrorSummary messages={messages} idOf={weatherInputId} />
          <PlaceFields values={place} onChange={setPlace} messages={messages} />
          {preview.data.mapping && mapping && (
            <MappingEditor
              mapping={mapping}
              preview={preview.data}
              onChange={setMapping}
              busy={preview.isPending}
              onRead={() => look(file, mapping, place)}
            />
          )}
          {!preview.data.mapping && !preview.data.summary && (
            <Button variant="default" mb="md" onClick={() => look(file, null, place)}>
              Read again with this place
            </Button>
          )}
          <Reading preview={preview.data} />
          {problem && <ErrorPanel error={problem} />}
          <Button type="submit" loading={pending} disabled={!preview.data.summary}>
            Put it on the shelf
          </Button>
        </>
      )}
    </form>
  );
}

function Reading({ preview }: { preview: WeatherPreview }) {
  const { summary } = preview;
  return (
    <div className={classes.reading}>
      <div>
        <h3 className={classes.name}>{FORMATS[preview.format]}</h3>
        {summary ? (
          <p>
            {formatNumber(summary.ghiKwhM2)} kWh m⁻² a year, {percent(summary.diffuseShare)} of it
            diffuse
            {summary.meanTemperatureC !== null &&
              `, mean temperature ${formatNumber(summary.meanTemperatureC, 1)} °C`}
            .
          </p>
        ) : (
          <p>The file cannot be used like this yet.</p>
        )}
        <FindingList findings={preview.findings} />
      </div>
      {summary && <MonthBars monthlyMjM2={summary.monthlyMjM2} />}
    </div>
  );
}
