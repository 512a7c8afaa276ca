import { Text } from '@mantine/core';
import { formatNumber } from '../../../lib/format';
import { crossingOf, figuresOf } from './measure';
import classes from './boundary-panel.module.css';
import type { Shape } from './shape';

/** Hectares and metres of the shape under the hand, and the first fault in it. */
export function ShapeFigures({ shape }: { shape: Shape }) {
  const figures = figuresOf(shape);
  const crossing = crossingOf(shape);
  return (
    <div>
      <dl className={classes.figures}>
        <div>
          <dt>Area</dt>
          <dd>{figures ? formatNumber(figures.areaM2 / 10_000, 3) : '–'} ha</dd>
        </div>
        <div>
          <dt>Round it</dt>
          <dd>{figures ? formatNumber(figures.perimeterM) : '–'} m</dd>
        </div>
        <div>
          <dt>Corners</dt>
          <dd>{shape.rings.reduce((sum, ring) => sum + ring.corners.length, 0)}</dd>
        </div>
      </dl>
      {crossing && (
        <Text role="alert" size="sm" c="var(--fl-danger)" fw={500} mt="xs">
          The boundary crosses itself at the red mark. Drag a corner until it no longer does.
        </Text>
      )}
    </div>
  );
}
