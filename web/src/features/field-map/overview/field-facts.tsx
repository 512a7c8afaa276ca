import type { Field } from '@furrowlight/shared/contract/fields';
import { Button } from '@mantine/core';
import { Link } from 'react-router-dom';
import { Figure, FigureRow } from '../../../components/figure';
import { Term } from '../../../components/term';
import { compassPoint, formatNumber } from '../../../lib/format';
import type { NextStep } from './next-step';
import classes from './overview.module.css';

interface Props {
  field: Field;
  step: NextStep | null;
}

/** The field in numbers, and the step that brings it forward. */
export function FieldFacts({ field, step }: Props) {
  const { geometry } = field;
  return (
    <div className={classes.facts}>
      {step && (
        <section className={classes.next} aria-labelledby="next-title">
          <h2 id="next-title">Next</h2>
          <p>{step.text}</p>
          <Button component={Link} to={step.to}>
            {step.label}
          </Button>
        </section>
      )}
      <FigureRow>
        <Figure
          label="Area"
          value={geometry ? formatNumber(geometry.areaM2 / 10_000, 2) : '–'}
          unit="ha"
        />
        <Figure
          label="Round it"
          value={geometry ? formatNumber(geometry.perimeterM) : '–'}
          unit="m"
        />
        <Figure
          label="Longest side"
          value={geometry ? formatNumber(geometry.longestSideM) : '–'}
          unit="m"
          note={
            geometry &&
            `runs ${formatNumber(geometry.longestSideBearingDeg)}° ${compassPoint(geometry.longestSideBearingDeg)}`
          }
        />
        <Figure
          label="Slope"
          value={formatNumber(field.slopePercent, 1)}
          unit="%"
          note={field.slopePercent > 0 ? `falls ${compassPoint(field.aspectDeg)}` : 'level'}
        />
        <Figure label="Elevation" value={formatNumber(field.elevationM)} unit="m" />
        <Figure label={<Term of="albedo">Albedo</Term>} value={formatNumber(field.albedo, 2)} />
      </FigureRow>
      <p className={classes.hint}>
        {formatNumber(field.pin[1], 4)}°, {formatNumber(field.pin[0], 4)}°, clock of{' '}
        {field.timeZone}
      </p>
    </div>
  );
}
