import type { LonLat } from '@furrowlight/shared/contract/fields';
import { invalid } from '../common/domain-error.js';

const FAR_KM = 300;
const EARTH_KM = 6371;

/** Great-circle distance, km (haversine on a sphere, good to 0.5 %). */
export function distanceKm([lonA, latA]: LonLat, [lonB, latB]: LonLat): number {
  const rad = Math.PI / 180;
  const a =
    Math.sin(((latB - latA) * rad) / 2) ** 2 +
    Math.cos(latA * rad) * Math.cos(latB * rad) * Math.sin(((lonB - lonA) * rad) / 2) ** 2;
  return 2 * EARTH_KM * Math.asin(Math.min(1, Math.sqrt(a)));
}

/**
 * Notice longitude and latitude in the wrong order: far from home as given, near it the other way
 * round. A field far away either way is taken as it is.
 *
 * @throws DomainError invalid-input that offers the swap
 */
export function refuseSwapped(point: LonLat, home: LonLat | null, path: 'pin' | 'boundary'): void {
  if (!home || distanceKm(point, home) <= FAR_KM) return;
  const turned: LonLat = [point[1], point[0]];
  if (Math.abs(turned[1]) > 90 || distanceKm(turned, home) > FAR_KM) return;
  const away = Math.round(distanceKm(point, home));
  throw invalid({
    path,
    message: `This lies ${away} km from your other fields, but near them with longitude and latitude swapped. Swap them: longitude comes first.`,
  });
}
