import type { LonLat } from '@furrowlight/shared/contract/fields';
import type L from 'leaflet';
import { fromLatLng, toPair } from '../../../map/lat-lng';

const REACH_PX = 12;

/** The nearest of `targets` within a finger's width on the screen, or the place itself. */
export function snapped(map: L.Map, latLng: L.LatLng, targets: readonly LonLat[]): LonLat {
  const at = map.latLngToContainerPoint(latLng);
  let best = REACH_PX;
  let found: LonLat | null = null;
  for (const target of targets) {
    const distance = map.latLngToContainerPoint(toPair(target)).distanceTo(at);
    if (distance < best) {
      best = distance;
      found = target;
    }
  }
  return found ?? fromLatLng(latLng);
}
