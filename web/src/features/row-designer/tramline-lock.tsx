import type { Layout } from '@furrowlight/shared/contract/layout';
import { pitchForBouts } from '@furrowlight/shared/layout/machine-passes';
import { Button } from '@mantine/core';
import { useState } from 'react';
import { NumberField } from '../../components/number-field';
import { withUnit } from '../../lib/format';
import classes from './designer.module.css';

interface Props {
  layout: Layout;
  disabled: boolean;
  onPitch: (pitchM: number) => void;
}

/** The pitch that lets whole passes of a working width through. */
export function TramlineLock({ layout, disabled, onPitch }: Props) {
  const [width, setWidth] = useState<number | null>(6);
  const [passes, setPasses] = useState<number | null>(1);
  const pitch =
    width !== null && passes !== null && width > 0 && passes >= 1
      ? Math.round(pitchForBouts(layout, width, Math.round(passes)) * 100) / 100
      : null;
  return (
    <fieldset className={classes.window}>
      <legend className={classes.legend}>Pitch for whole passes</legend>
      <NumberField
        label="Working width"
        unit="m"
        step={0.5}
        value={width}
        onChange={setWidth}
        disabled={disabled}
      />
      <NumberField
        label="Passes a bay"
        step={1}
        value={passes}
        onChange={setPasses}
        disabled={disabled}
      />
      <Button
        variant="default"
        size="compact-md"
        disabled={disabled || pitch === null || pitch > 60}
        onClick={() => pitch !== null && onPitch(pitch)}
      >
        {pitch === null ? 'Give width and passes' : `Set the pitch to ${withUnit(pitch, 'm', 2)}`}
      </Button>
    </fieldset>
  );
}
