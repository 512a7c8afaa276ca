import { SegmentedControl } from '@mantine/core';
import { useEffect, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { lightRgb } from '../app/theme/ramp';
import { formatNumber, percent, withUnit } from '../lib/format';
import classes from './light-weave.module.css';
import {
  brightestWeek,
  cell,
  cellAt,
  monthTicks,
  rampShare,
  weekStart,
  type WeaveCell,
  type WeaveData,
  type WeaveMode,
} from './weave-geometry';

interface Props {
  data: WeaveData;
  /** Share of open field below which cells are hatched; null hatches none. */
  needShare?: number | null;
  /** Says which side of the row is up in the cloth. */
  sides: { front: string; back: string };
}

/** Pixels a cell is drawn with; the browser scales the cloth to its frame. */
const CELL = { width: 14, height: 4 };

function paint(canvas: HTMLCanvasElement, data: WeaveData, mode: WeaveMode, need: number | null) {
  const weeks = data.weekly.length;
  const positions = data.positionsM.length;
  canvas.width = weeks * CELL.width;
  canvas.height = positions * CELL.height;
  const context = canvas.getContext('2d');
  if (!context) return;
  for (let week = 0; week < weeks; week += 1) {
    for (let position = 0; position < positions; position += 1) {
      const at = cell(data, week, position);
      const [r, g, b] = lightRgb(rampShare(data, at, mode));
      const x = week * CELL.width;
      const y = (positions - 1 - position) * CELL.height;
      context.fillStyle = `rgb(${r} ${g} ${b})`;
      // A hair of ground between the weeks lets the cloth read as woven.
      context.fillRect(x, y, CELL.width - 1, CELL.height);
      if (need !== null && at.share < need && (week + position) % 3 === 0) {
        context.fillStyle = 'rgb(255 255 255 / 0.55)';
        context.fillRect(x + 2, y + 1, CELL.width - 6, 1);
      }
    }
  }
}

function words(at: WeaveCell): string {
  const side =
    Math.abs(at.metres) < 0.05 ? 'under the row' : `${withUnit(at.metres, 'm', 1)} from the row`;
  return `Week of ${weekStart(at.week)}, ${side}: ${formatNumber(at.dli, 1)} mol m⁻² d⁻¹, ${percent(at.share)} of open field (${formatNumber(at.openDli, 1)})`;
}

/** Light over the year: position across one pitch by week, one coloured cloth. */
export function LightWeave({ data, needShare = null, sides }: Props) {
  const [mode, setMode] = useState<WeaveMode>('share');
  const [at, setAt] = useState<WeaveCell | null>(null);
  const canvas = useRef<HTMLCanvasElement>(null);
  const weeks = data.weekly.length;
  const positions = data.positionsM.length;

  useEffect(() => {
    if (canvas.current) paint(canvas.current, data, mode, needShare);
  }, [data, mode, needShare]);

  const point = (event: PointerEvent<HTMLDivElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    setAt(
      cellAt(data, (event.clientX - box.left) / box.width, (event.clientY - box.top) / box.height),
    );
  };
  const walk = (event: KeyboardEvent<HTMLDivElement>) => {
    const moves: Record<string, [number, number]> = {
      ArrowLeft: [-1, 0],
      ArrowRight: [1, 0],
      ArrowUp: [0, 1],
      ArrowDown: [0, -1],
    };
    const move = moves[event.key];
    if (!move) return;
    event.preventDefault();
    const from = at ?? cell(data, Math.floor(weeks / 2), Math.floor(positions / 2));
    const clamp = (value: number, count: number) => Math.min(Math.max(value, 0), count - 1);
    const stride = event.shiftKey ? 5 : 1;
    setAt(
      cell(
        data,
        clamp(from.week + move[0] * stride, weeks),
        clamp(from.position + move[1] * stride, positions),
      ),
    );
  };

  return (
    <div className={classes.weave}>
      <div className={classes.top}>
        <SegmentedControl
          size="xs"
          value={mode}
          onChange={(value) => setMode(value === 'dli' ? 'dli' : 'share')}
          data={[
            { value: 'share', label: 'Share of open field' },
            { value: 'dli', label: 'Daily light (DLI)' },
          ]}
          aria-label="What the colour shows"
        />
        <p className={classes.readout} role="status">
          {at ? words(at) : 'Point at the cloth, or walk over it with the arrow keys.'}
        </p>
      </div>
      <div className={classes.frame}>
        <div className={classes.sides} aria-hidden>
          <span>{sides.front}</span>
          <span>row</span>
          <span>{sides.back}</span>
        </div>
        <div
          className={classes.cloth}
          role="img"
          tabIndex={0}
          aria-label={`Light weave: ${positions} strips across ${withUnit(data.pitchM, 'm', 1)} of pitch by ${weeks} weeks. Use the arrow keys to read single cells.`}
          onPointerMove={point}
          onPointerLeave={() => setAt(null)}
          onKeyDown={walk}
        >
          <canvas ref={canvas} className={classes.canvas} />
          <span className={classes.rowLine} aria-hidden />
          {at && (
            <span
              className={classes.cursor}
              aria-hidden
              style={{
                left: `${((at.week + 0.5) / weeks) * 100}%`,
                top: `${(1 - (at.position + 0.5) / positions) * 100}%`,
              }}
            />
          )}
        </div>
        <div className={classes.months} aria-hidden>
          {monthTicks(weeks).map(({ label, at: left }) => (
            <span key={label} style={{ left: `${left * 100}%` }}>
              {label}
            </span>
          ))}
        </div>
      </div>
      <div className={classes.legend}>
        <span>{mode === 'share' ? '0 %' : '0'}</span>
        <span className={classes.ramp} aria-hidden />
        <span>
          {mode === 'share'
            ? '100 % of open field'
            : `${formatNumber(brightestWeek(data), 0)} mol m⁻² d⁻¹`}
        </span>
        {needShare !== null && (
          <span className={classes.hatch}>hatched: below {percent(needShare)} of open field</span>
        )}
      </div>
    </div>
  );
}
