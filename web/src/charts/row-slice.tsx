import type { Layout } from '@furrowlight/shared/contract/layout';
import { passOf, type Implement } from '@furrowlight/shared/layout/machine-passes';
import type { RowSlice as Slice } from '@furrowlight/shared/run/slice';
import { useMemo } from 'react';
import { lightColour } from '../app/theme/ramp';
import { compassPoint, formatNumber, percent, withUnit } from '../lib/format';
import { Person, Tractor } from './row-slice-figures';
import {
  SLICE,
  croppedStretches,
  curvePath,
  curveY,
  frameOf,
  shadowBody,
  sliceShares,
  stripsOf,
  sunSpot,
  xOf,
  yOf,
  type SliceFrame,
} from './row-slice-geometry';
import classes from './row-slice.module.css';

const TRACTOR: Implement = {
  name: 'Tractor',
  workingWidthM: 2.5,
  workingHeightM: 3,
  foldedWidthM: 2.5,
  foldedHeightM: 3,
};

interface Props {
  layout: Layout;
  slice: Slice;
  canopyHeightM: number;
}

/** What the slice shows, in words. */
export function sliceWords(slice: Slice): string {
  const shares = sliceShares(slice);
  if (!shares) return 'The sun is down.';
  const sun = `Sun ${formatNumber(slice.sunAltitudeDeg)}° high in the ${compassPoint(slice.sunAzimuthDeg)}`;
  return `${sun}, clear sky: ${withUnit(slice.openPpfd, 'µmol m⁻² s⁻¹')} in the open, ${percent(shares.mean)} of it across the pitch, ${percent(shares.darkest)} where it is darkest.`;
}

function Rows({ layout, slice, frame, canopyHeightM }: Props & { frame: SliceFrame }) {
  const [one, other] = slice.edges;
  const middle = (one.z + other.z) / 2;
  return frame.rows.map((row) => {
    const body = shadowBody(frame, slice, row, canopyHeightM);
    return (
      <g key={row}>
        {body && <polygon points={body} className={classes.shade} />}
        <path
          d={`M${xOf(frame, row)} ${SLICE.ground}V${yOf(frame, layout.kind === 'vertical-bifacial' ? Math.max(one.z, other.z) : middle)}`}
          className={classes.post}
        />
        <path
          d={`M${xOf(frame, row + one.u)} ${yOf(frame, one.z)}L${xOf(frame, row + other.u)} ${yOf(frame, other.z)}`}
          className={classes.panel}
          strokeDasharray={layout.gaps ? '10 4' : undefined}
        />
      </g>
    );
  });
}

/** Cross-section to scale: sun, panels, shade, crop, people, and the light curve under them. */
export function RowSlicePicture({ layout, slice, canopyHeightM }: Props) {
  const frame = useMemo(() => frameOf(layout), [layout]);
  const strips = stripsOf(frame, layout, slice);
  const sun = sunSpot(slice);
  const middle = layout.pitchM / 2;
  const crop = Math.max(canopyHeightM * frame.perMetre, 3);
  const tractor = passOf(layout, TRACTOR);
  return (
    <svg
      viewBox={`0 0 ${SLICE.width} ${SLICE.height}`}
      className={classes.slice}
      role="img"
      aria-label={`Cross-section of the rows to scale. ${sliceWords(slice)}`}
    >
      <rect
        width={SLICE.width}
        height={SLICE.ground}
        className={sun ? classes.day : classes.night}
      />
      {sun && <circle cx={sun.x} cy={sun.y} r="17" className={classes.sun} />}
      {croppedStretches(frame, layout).map(({ x, width }) => (
        <rect
          key={x}
          x={x}
          y={SLICE.ground - crop}
          width={width}
          height={crop}
          className={classes.crop}
        />
      ))}
      <Rows layout={layout} slice={slice} frame={frame} canopyHeightM={canopyHeightM} />
      <Tractor
        x={xOf(frame, middle)}
        y={SLICE.ground}
        perMetre={frame.perMetre}
        passes={tractor.way !== 'blocked'}
      />
      <Person
        x={xOf(frame, middle - Math.min(2.4, middle * 0.7))}
        y={SLICE.ground}
        perMetre={frame.perMetre}
      />
      <path d={`M0 ${SLICE.ground}H${SLICE.width}`} className={classes.ground} />
      {strips.map(({ x, width, share }) => (
        <rect
          key={x}
          x={x}
          y={SLICE.ground + 2}
          width={width + 0.4}
          height="16"
          fill={lightColour(share)}
        />
      ))}
      {[0, 0.5, 1].map((share) => (
        <g key={share}>
          <path d={`M0 ${curveY(share)}H${SLICE.width}`} className={classes.grid} />
          <text x="6" y={curveY(share) - 4} className={classes.label}>
            {share === 1 ? 'open field' : percent(share)}
          </text>
        </g>
      ))}
      <path d={curvePath(strips)} className={classes.curve} />
      <g className={classes.label}>
        <text x="6" y="18">
          {compassPoint(layout.azimuthDeg + 180)}
        </text>
        <text x={SLICE.width - 6} y="18" textAnchor="end">
          {compassPoint(layout.azimuthDeg)}
        </text>
        <text x={xOf(frame, 0)} y={SLICE.height - 6} textAnchor="middle">
          row
        </text>
        <text x={xOf(frame, middle)} y={SLICE.height - 6} textAnchor="middle">
          {withUnit(layout.pitchM, 'm', 1)} pitch
        </text>
        <text x={xOf(frame, layout.pitchM)} y={SLICE.height - 6} textAnchor="middle">
          row
        </text>
      </g>
    </svg>
  );
}
