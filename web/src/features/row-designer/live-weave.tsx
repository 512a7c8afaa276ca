import type { Layout } from '@furrowlight/shared/contract/layout';
import { useEffect, useRef } from 'react';
import { lightRgb } from '../../app/theme/ramp';
import { monthTicks } from '../../charts/weave-geometry';
import { compassPoint, percent } from '../../lib/format';
import classes from './designer.module.css';

const CELL = { width: 20, height: 4 };

/** Half-monthly light by strip, repainted while the sliders move. */
export function LiveWeave({ weave, layout }: { weave: number[][]; layout: Layout }) {
  const canvas = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    const context = canvas.current?.getContext('2d');
    if (!context) return;
    weave.forEach((part, x) =>
      part.forEach((share, i) => {
        const [r, g, b] = lightRgb(share);
        context.fillStyle = `rgb(${r} ${g} ${b})`;
        context.fillRect(
          x * CELL.width,
          (part.length - 1 - i) * CELL.height,
          CELL.width - 1,
          CELL.height,
        );
      }),
    );
  }, [weave]);
  const strips = weave[0]?.length ?? 0;
  const darkest = Math.min(...weave.flat());
  return (
    <div className={classes.weave}>
      <div className={classes.weaveSides} aria-hidden>
        <span>{compassPoint(layout.azimuthDeg)}</span>
        <span>row</span>
        <span>{compassPoint(layout.azimuthDeg + 180)}</span>
      </div>
      <canvas
        ref={canvas}
        width={weave.length * CELL.width}
        height={strips * CELL.height}
        className={classes.cloth}
        role="img"
        aria-label={`Light weave preview: share of open field by half-month and strip; the darkest cell has ${percent(darkest)}.`}
      />
      <div className={classes.weaveMonths} aria-hidden>
        {monthTicks(365 / 7).map(({ label, at }) => (
          <span key={label} style={{ left: `${at * 100}%` }}>
            {label}
          </span>
        ))}
      </div>
      <div className={classes.weaveLegend}>
        0 % <span className={classes.ramp} aria-hidden /> 100 % of open field
      </div>
    </div>
  );
}
