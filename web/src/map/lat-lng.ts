import type { Boundary, LonLat } from '@furrowlight/shared/contract/fields';
import type { LatLng } from 'leaflet';

/** Leaflet's order of a position. */
export type LatLngPair = [latitude: number, longitude: number];

export const toPair = ([lon, lat]: LonLat): LatLngPair => [lat, lon];

/** Seven decimals are about a centimetre; more would only pretend. */
export const fromLatLng = ({ lat, lng }: LatLng): LonLat => [
  Number(lng.toFixed(7)),
  Number(lat.toFixed(7)),
];

export const ringsOf = (boundary: Boundary): LatLngPair[][] =>
  boundary.coordinates.map((ring) => ring.map(toPair));

/** Box round some positions; null when there are none. */
export function boxOf(positions: readonly LonLat[]): [LatLngPair, LatLngPair] | null {
  if (positions.length === 0) return null;
  let [west, south] = positions[0];
  let [east, north] = positions[0];
  for (const [lon, lat] of positions) {
    west = Math.min(west, lon);
    east = Math.max(east, lon);
    south = Math.min(south, lat);
    north = Math.max(north, lat);
  }
  return [
    [south, west],
    [north, east],
  ];
}
