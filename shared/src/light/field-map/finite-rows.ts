import { InputError, requireWithin } from '../../errors.js';
import { planeFactor, requireRowGeometry, type RowGeometry } from '../rows/geometry.js';

/**
 * One stretch of a row. The frame is that of the rows: u across, positive the way the front looks, v
 * along, towards surfaceAzimuth - 90 degrees; metres.
 */
export interface RowStretch {
  /** Place of the row's centre line across. */
  u: number;
  /** Where the stretch begins and ends along. */
  from: number;
  to: number;
}

/** Direction of a sun or ray per metre of height: across (u) and along (v). */
export interface Bearing {
  tangent: number;
  along: number;
}

/** Place in the frame of rows that face `surfaceAzimuth`, of a point east and north of the origin. */
export function toRowFrame(surfaceAzimuth: number, east: number, north: number): [number, number] {
  const s = Math.sin(surfaceAzimuth);
  const c = Math.cos(surfaceAzimuth);
  return [east * s + north * c, -east * c + north * s];
}

/** Bearing of the sun in the frame of the rows. */
export function sunBearing(
  surfaceAzimuth: number,
  sunAzimuth: number,
  sunAltitude: number,
): Bearing {
  const turn = sunAzimuth - surfaceAzimuth;
  const reach = 1 / Math.tan(sunAltitude);
  return { tangent: Math.cos(turn) * reach, along: -Math.sin(turn) * reach };
}

/** Rows of one field, sorted across, with what every ray needs. */
export interface FiniteRows {
  geometry: RowGeometry;
  stretches: readonly RowStretch[];
  /** Centre lines, rising, one a stretch. */
  places: Float64Array;
}

/**
 * Sort and check the stretches of a field's rows. `geometry.pitch` is used for checks only.
 *
 * @throws InputError naming `stretches` or the part of the geometry that cannot stand
 */
export function prepareFiniteRows(
  geometry: RowGeometry,
  stretches: readonly RowStretch[],
): FiniteRows {
  requireRowGeometry(geometry);
  for (const { u, from, to } of stretches) {
    requireWithin('stretches', u, -1e5, 1e5, 'm');
    requireWithin('stretches', from, -1e5, 1e5, 'm');
    requireWithin('stretches', to, -1e5, 1e5, 'm');
    if (to <= from) throw new InputError('stretches', 'A row must end behind its beginning.');
  }
  const sorted = [...stretches].sort((a, b) => a.u - b.u);
  return { geometry, stretches: sorted, places: Float64Array.from(sorted, ({ u }) => u) };
}

/** First stretch at or beyond a place across. */
export function firstAt(places: Float64Array, u: number): number {
  let low = 0;
  let high = places.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (places[middle] < u) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Height above a point at which a ray meets the panel plane of a row at `place`. */
export function meetingHeight(
  { geometry }: FiniteRows,
  place: number,
  u: number,
  z: number,
  factor: number,
): number {
  const s = Math.sin(geometry.tilt);
  const c = Math.cos(geometry.tilt);
  return ((place - u) * s + (geometry.midHeight - z) * c) / factor;
}

/** Closest a ray's beginning may be to a panel without being on it, m. */
const TOUCH = 1e-7;

/**
 * Panels crossed by a ray up towards the sun, from any point.
 *
 * Exact: in the plane across, a ray meets slant coordinate (u - place + (mid - z) tangent) / plane
 * factor of each row; along, the meeting must lie within the stretch.
 */
export function panelsCrossed(
  rows: FiniteRows,
  u: number,
  v: number,
  z: number,
  { tangent, along }: Bearing,
): number {
  const { geometry, places, stretches } = rows;
  const factor = planeFactor(geometry, tangent);
  if (Math.abs(factor) < 1e-12) return 0;
  const middle = u + (geometry.midHeight - z) * tangent;
  const reach = (geometry.width / 2) * Math.abs(factor);
  let count = 0;
  for (let k = firstAt(places, middle - reach); k < places.length; k += 1) {
    if (places[k] > middle + reach) break;
    const up = meetingHeight(rows, places[k], u, z, factor);
    if (up <= TOUCH) continue;
    const at = v + up * along;
    if (at >= stretches[k].from && at < stretches[k].to) count += 1;
  }
  return count;
}

/**
 * Beam left at a level line along the rows, as a mean from v = `from` to `to`.
 *
 * Exact: each panel crossed shades one interval of the line.
 */
export function meanThrough(
  rows: FiniteRows,
  transmittance: number,
  u: number,
  [from, to]: readonly [number, number],
  z: number,
  { tangent, along }: Bearing,
): number {
  const { geometry, places, stretches } = rows;
  const factor = planeFactor(geometry, tangent);
  if (Math.abs(factor) < 1e-12) return 1;
  const middle = u + (geometry.midHeight - z) * tangent;
  const reach = (geometry.width / 2) * Math.abs(factor);
  const shades: [number, number][] = [];
  for (let k = firstAt(places, middle - reach); k < places.length; k += 1) {
    if (places[k] > middle + reach) break;
    const up = meetingHeight(rows, places[k], u, z, factor);
    if (up <= TOUCH) continue;
    const low = Math.max(stretches[k].from - up * along, from);
    const high = Math.min(stretches[k].to - up * along, to);
    if (high > low) shades.push([low, high]);
  }
  if (shades.length === 0) return 1;
  const edges = [from, to, ...shades.flat()].sort((a, b) => a - b);
  let light = 0;
  for (let e = 1; e < edges.length; e += 1) {
    const at = (edges[e] + edges[e - 1]) / 2;
    const crossed = shades.filter(([low, high]) => low <= at && at < high).length;
    light += (edges[e] - edges[e - 1]) * transmittance ** crossed;
  }
  return light / (to - from);
}
