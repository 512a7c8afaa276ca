import type { Field } from '@furrowlight/shared/contract/fields';
import { Button } from '@mantine/core';
import { useState } from 'react';
import { NumberField } from '../../../components/number-field';
import { addCorner } from '../boundary/shape';
import type { BoundaryEditor } from '../boundary/use-boundary-editor';
import classes from './add-panel.module.css';

interface Props {
  editor: BoundaryEditor;
  fields: readonly Field[];
}

/** The corner a typed boundary starts from. */
export function FirstCorner({ editor, fields }: Props) {
  const near = fields[0]?.pin;
  const [lon, setLon] = useState<number | null>(near ? Number(near[0].toFixed(4)) : null);
  const [lat, setLat] = useState<number | null>(near ? Number(near[1].toFixed(4)) : null);
  const ready = lon !== null && lat !== null && Math.abs(lon) <= 180 && Math.abs(lat) <= 66;
  return (
    <form
      className={classes.panel}
      onSubmit={(event) => {
        event.preventDefault();
        if (ready) editor.edit(addCorner(editor.shape, [lon, lat]));
      }}
    >
      <p className={classes.hint}>
        Start with one corner in decimal degrees; then give side lengths and bearings as measured,
        or all corners as numbers.
      </p>
      <div className={classes.two}>
        <NumberField label="Longitude" unit="°" step={0.001} value={lon} onChange={setLon} />
        <NumberField
          label="Latitude"
          unit="°"
          step={0.001}
          value={lat}
          onChange={setLat}
          error={lat !== null && Math.abs(lat) > 66 ? 'Between −66° and 66°.' : undefined}
        />
      </div>
      <Button type="submit" variant="default" disabled={!ready}>
        Start here
      </Button>
    </form>
  );
}
