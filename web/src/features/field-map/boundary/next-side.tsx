import { Button } from '@mantine/core';
import { useState } from 'react';
import { NumberField } from '../../../components/number-field';
import classes from './boundary-panel.module.css';
import { endOfSide } from './measure';
import { addCorner, openRing } from './shape';
import type { BoundaryEditor } from './use-boundary-editor';

/** The next side of an open boundary by typed length and bearing, as measured on the ground. */
export function NextSide({ editor }: { editor: BoundaryEditor }) {
  const [lengthM, setLength] = useState<number | null>(null);
  const [bearingDeg, setBearing] = useState<number | null>(null);
  const index = openRing(editor.shape);
  const last = index >= 0 ? editor.shape.rings[index].corners.at(-1) : undefined;
  if (!last) return null;
  const ready = lengthM !== null && lengthM > 0 && lengthM <= 5000 && bearingDeg !== null;
  const add = () => {
    if (!ready) return;
    editor.edit(addCorner(editor.shape, endOfSide(last, { lengthM, bearingDeg })));
    setLength(null);
    setBearing((bearingDeg + 90) % 360);
  };
  return (
    <form
      className={classes.side}
      onSubmit={(event) => {
        event.preventDefault();
        add();
      }}
    >
      <NumberField label="Next side" unit="m" value={lengthM} onChange={setLength} min={0} />
      <NumberField label="Bearing" unit="°" value={bearingDeg} onChange={setBearing} />
      <Button type="submit" variant="default" disabled={!ready}>
        Add
      </Button>
    </form>
  );
}
