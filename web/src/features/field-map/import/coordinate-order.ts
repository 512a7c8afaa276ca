import type { Boundary, LonLat } from '@furrowlight/shared/contract/fields';
import type { ReadPolygon } from './parse-geojson';

export type OrderFinding =
  | 'fine'
  /** Latitude and longitude seem to have changed places. */
  | 'swapped'
  /** Numbers too large for degrees: metres of some map projection. */
  | 'projected'
  /** Valid degrees, but far from everything the cooperative farms. */
  | 'far';

const FAR_DEGREES = 8;

function corners(polygons: readonly ReadPolygon[]): LonLat[] {
  return polygons.flatMap(({ boundary }) => boundary.coordinates.flat());
}

const away = ([lon, lat]: LonLat, home: LonLat) =>
  Math.hypot((lon - home[0]) * Math.cos((home[1] * Math.PI) / 180), lat - home[1]);

/**
 * Judge whether positions are longitude, latitude in degrees as RFC 7946 asks.
 *
 * @param home a place the cooperative farms, [longitude, latitude]; null when none is known
 */
export function judgeOrder(polygons: readonly ReadPolygon[], home: LonLat | null): OrderFinding {
  const all = corners(polygons);
  if (all.some(([lon, lat]) => Math.abs(lon) > 180 || Math.abs(lat) > 180)) return 'projected';
  if (all.some(([, lat]) => Math.abs(lat) > 90)) return 'swapped';
  const first = all[0];
  if (!home || !first || away(first, home) <= FAR_DEGREES) return 'fine';
  return away([first[1], first[0]], home) <= FAR_DEGREES ? 'swapped' : 'far';
}

function swapped(boundary: Boundary): Boundary {
  return {
    ...boundary,
    coordinates: boundary.coordinates.map((ring) => ring.map(([lon, lat]): LonLat => [lat, lon])),
  };
}

export function swapOrder(polygons: readonly ReadPolygon[]): ReadPolygon[] {
  return polygons.map((polygon) => ({ ...polygon, boundary: swapped(polygon.boundary) }));
}
