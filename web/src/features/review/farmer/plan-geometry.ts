import type { Layout } from '@furrowlight/shared/contract/layout';
import {
  planeAt,
  toPlane,
  type LonLatPoint,
  type LonLatRings,
} from '@furrowlight/shared/layout/plane';
import { layRows } from '@furrowlight/shared/layout/rows-over-field';

/** A field with its rows as a plain drawing, north up, one unit a metre. */
export interface PlanDrawing {
  width: number;
  height: number;
  field: string;
  rows: string;
  /** Round length for the scale bar, m. */
  scaleM: number;
}

const MARGIN = 0.06;

/** A round length of about a quarter of a width. */
export function roundLength(width: number): number {
  const power = 10 ** Math.floor(Math.log10(width / 4));
  return [5, 2, 1].map((n) => n * power).find((length) => length <= width / 4) ?? power;
}

/** Draw a boundary and the rows of a layout over it. */
export function planDrawing(layout: Layout, rings: LonLatRings): PlanDrawing {
  const plane = planeAt(rings[0][0]);
  const corners = rings[0].map((point) => toPlane(plane, point));
  const east = corners.map(([x]) => x);
  const north = corners.map(([, y]) => y);
  const reach = Math.max(...east) - Math.min(...east);
  const rise = Math.max(...north) - Math.min(...north);
  const pad = MARGIN * Math.max(reach, rise);
  const left = Math.min(...east) - pad;
  const top = Math.max(...north) + pad;
  const path = (ring: readonly LonLatPoint[]) =>
    `M${ring
      .map((point) => toPlane(plane, point))
      .map(([x, y]) => `${(x - left).toFixed(1)} ${(top - y).toFixed(1)}`)
      .join('L')}Z`;
  return {
    width: reach + 2 * pad,
    height: rise + 2 * pad,
    field: rings.map(path).join(''),
    rows: layRows(layout, rings).outlines.map(path).join(''),
    scaleM: roundLength(reach + 2 * pad),
  };
}
