import type { Boundary, LonLat } from '@furrowlight/shared/contract/fields';
import tzLookup from '@photostructure/tz-lookup';
import { measureBoundary, middleOf, pinWithin, requireLatitude } from './boundary-checks.js';
import type { FieldEntity } from './field.entity.js';
import { refuseSwapped } from './swapped-coordinates.js';

/** The columns that follow from where a field lies. */
export type Ground = Pick<
  FieldEntity,
  | 'longitude'
  | 'latitude'
  | 'boundary'
  | 'areaM2'
  | 'perimeterM'
  | 'longestSideM'
  | 'longestSideBearingDeg'
  | 'timeZone'
>;

/**
 * Check where a field lies and work out what follows from it.
 *
 * @param home middle of the fields around it, to notice swapped coordinates; null when there are none
 * @throws DomainError invalid-input naming pin or boundary
 */
export function groundOf(pin: LonLat, boundary: Boundary | null, home: LonLat | null): Ground {
  if (boundary) refuseSwapped(middleOf(boundary), home, 'boundary');
  else refuseSwapped(pin, home, 'pin');
  const figures = boundary ? measureBoundary(boundary) : null;
  const spot = boundary ? pinWithin(boundary, pin) : pin;
  requireLatitude(spot, 'pin');
  const [longitude, latitude] = spot;
  return {
    longitude,
    latitude,
    boundary,
    areaM2: figures?.areaM2 ?? null,
    perimeterM: figures?.perimeterM ?? null,
    longestSideM: figures?.longestSideM ?? null,
    longestSideBearingDeg: figures?.longestSideBearingDeg ?? null,
    timeZone: tzLookup(latitude, longitude),
  };
}
