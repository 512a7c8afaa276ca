import type { Field } from '@furrowlight/shared/contract/fields';
import { Button, FileButton, Select, Textarea } from '@mantine/core';
import { useQuery } from '@tanstack/react-query';
import { useState, type DragEvent } from 'react';
import { farmListQuery } from '../../../queries/farms';
import classes from '../add/add-panel.module.css';
import { middleOf } from '../add/middle-of';
import { judgeOrder, swapOrder } from './coordinate-order';
import { FoundPolygons } from './found-polygons';
import { parseGeoJson, type ImportReading, type ReadPolygon } from './parse-geojson';
import { useImport } from './use-import';

interface Props {
  polygons: readonly ReadPolygon[];
  onPolygons: (polygons: ReadPolygon[]) => void;
  fields: readonly Field[];
  farmId: string | null;
  onDone: () => void;
}

const MAX_BYTES = 20_000_000;

/** Boundaries from a GeoJSON file or text: read, judged, shown, and only then saved. */
export function ImportPanel({ polygons, onPolygons, fields, farmId, onDone }: Props) {
  const farms = useQuery(farmListQuery);
  const [farm, setFarm] = useState(farmId);
  const [over, setOver] = useState(false);
  const [reading, setReading] = useState<ImportReading | null>(null);
  const work = useImport(onDone);
  const home = fields[0]
    ? fields[0].boundary
      ? middleOf(fields[0].boundary)
      : fields[0].pin
    : null;
  const order = judgeOrder(polygons, home);

  const take = (text: string) => {
    const result = parseGeoJson(text);
    setReading(result);
    onPolygons(result.polygons);
  };
  const takeFile = async (file: File | null | undefined) => {
    if (!file) return;
    if (file.size > MAX_BYTES) {
      setReading({ polygons: [], skipped: [], problem: 'The file is larger than 20 MB.' });
      return;
    }
    take(await file.text());
  };
  const onDrop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    void takeFile(event.dataTransfer.files[0]);
  };

  return (
    <>
      <div
        className={classes.drop}
        data-over={over || undefined}
        onDragOver={(event) => {
          event.preventDefault();
          setOver(true);
        }}
        onDragLeave={() => setOver(false)}
        onDrop={onDrop}
      >
        <FileButton
          onChange={(file) => void takeFile(file)}
          accept=".geojson,.json,application/geo+json,application/json"
        >
          {(props) => (
            <Button variant="default" {...props}>
              Choose a GeoJSON file
            </Button>
          )}
        </FileButton>
        <p className={classes.hint}>or drop it here, or paste its text:</p>
        <Textarea
          aria-label="GeoJSON text"
          placeholder='{"type":"FeatureCollection", …'
          w="100%"
          rows={2}
          onChange={(event) => {
            const text = event.currentTarget.value;
            if (text.trim() === '') setReading(null);
            else take(text);
          }}
        />
      </div>
      {reading?.problem && <p role="alert">{reading.problem}</p>}
      {reading && !reading.problem && (
        <p role="status">
          <strong>
            {reading.polygons.length} read, {reading.skipped.length} skipped
          </strong>
        </p>
      )}
      {reading && reading.skipped.length > 0 && (
        <ul className={classes.skipped}>
          {reading.skipped.slice(0, 20).map(({ at, why }) => (
            <li key={at + why}>
              {at}: {why}
            </li>
          ))}
          {reading.skipped.length > 20 && <li>and {reading.skipped.length - 20} more</li>}
        </ul>
      )}
      {order === 'projected' && (
        <div className={classes.notice} role="alert">
          These positions are metres of a map projection, not degrees. Save the file again as WGS 84
          (EPSG:4326) longitude and latitude.
        </div>
      )}
      {order === 'swapped' && (
        <div className={classes.notice} role="alert">
          <p>
            Latitude and longitude seem to have changed places: as written the fields would lie far
            from your farms.
          </p>
          <Button
            size="compact-sm"
            variant="default"
            onClick={() => onPolygons(swapOrder(polygons))}
          >
            Swap them
          </Button>
        </div>
      )}
      {order === 'far' && (
        <div className={classes.notice} role="status">
          These fields lie far from all others of the cooperative. Look at the map before you save.
        </div>
      )}
      {polygons.length > 0 && order !== 'projected' && (
        <div className={classes.form}>
          <FoundPolygons polygons={polygons} onPolygons={onPolygons} outcomes={work.outcomes} />
          <Select
            label="Farm they belong to"
            searchable
            data={(farms.data ?? []).map(({ id, name }) => ({ value: id, label: name }))}
            value={farm}
            onChange={setFarm}
          />
          <Button
            disabled={!farm || order === 'swapped'}
            loading={work.busy}
            onClick={() => farm && void work.run(farm, polygons)}
          >
            {polygons.length === 1 ? 'Add this field' : `Add ${polygons.length} fields`}
          </Button>
        </div>
      )}
    </>
  );
}
