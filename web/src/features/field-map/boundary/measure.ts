import type { LonLat } from '@furrowlight/shared/contract/fields';
import {
  boundaryFigures,
  planeAt,
  ringsToPlane,
  selfCrossing,
  toLonLat,
  toPlane,
  type BoundaryFigures,
} from '@furrowlight/shared/layout/plane';
import type { Shape } from './shape';

const RAD = Math.PI / 180;

/** Seven decimals of a degree are about a centimetre. */
const rounded = ([lon, lat]: readonly [number, number]): LonLat => [
  Number(lon.toFixed(7)),
  Number(lat.toFixed(7)),
];

/** The place so many metres east and north of another. */
export function shifted(from: LonLat, eastM: number, northM: number): LonLat {
  return rounded(toLonLat(planeAt(from), [eastM, northM]));
}

export interface Side {
  lengthM: number;
  /** Clockwise from north, 0-360. */
  bearingDeg: number;
}

export function sideBetween(from: LonLat, to: LonLat): Side {
  const [east, north] = toPlane(planeAt(from), to);
  return {
    lengthM: Math.hypot(east, north),
    bearingDeg: (Math.atan2(east, north) / RAD + 360) % 360,
  };
}

/** The end of a side that starts at `from`. */
export function endOfSide(from: LonLat, { lengthM, bearingDeg }: Side): LonLat {
  return shifted(from, lengthM * Math.sin(bearingDeg * RAD), lengthM * Math.cos(bearingDeg * RAD));
}

/** Figures less cut-outs, as if an open ring were closed; null below three corners. */
export function figuresOf(shape: Shape): BoundaryFigures | null {
  const rings = shape.rings.map(({ corners }) => corners).filter(({ length }) => length >= 3);
  if (rings.length === 0) return null;
  return boundaryFigures(ringsToPlane(planeAt(rings[0][0]), rings));
}

/** Where finished sides of the shape cross, or null. */
export function crossingOf(shape: Shape): LonLat | null {
  const rings = shape.rings.filter(({ closed }) => closed).map(({ corners }) => corners);
  if (rings.length === 0) return null;
  const plane = planeAt(rings[0][0]);
  const point = selfCrossing(ringsToPlane(plane, rings));
  return point && rounded(toLonLat(plane, point));
}
