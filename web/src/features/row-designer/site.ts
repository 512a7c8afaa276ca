import type { Field } from '@furrowlight/shared/contract/fields';
import type { Site } from '@furrowlight/shared/contract/run';

/** The field's place as the engine needs it. */
export function siteOf(field: Field): Site {
  const [longitude, latitude] = field.pin;
  const { elevationM, slopePercent, aspectDeg, albedo } = field;
  return { latitude, longitude, elevationM, slopePercent, aspectDeg, albedo };
}
