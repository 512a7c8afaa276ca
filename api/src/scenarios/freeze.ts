import type { Crop } from '@furrowlight/shared/contract/crops';
import type { Field, FieldSeason } from '@furrowlight/shared/contract/fields';
import type { Layout } from '@furrowlight/shared/contract/layout';
import type { FrozenInput, RunOptions } from '@furrowlight/shared/contract/run';
import { runCropOf } from '@furrowlight/shared/crops/stages';

/** How finely a run of the product looks: strips across a pitch, minutes between suns, sky. */
const OPTIONS: RunOptions = { positions: 100, sunStepMinutes: 10, sky: 'hay-davies' };

/** Seasons a run counts: the newest this many by sowing. */
const MOST_SEASONS = 12;

/**
 * Freeze all a run depends on: the field as it is now, the layout, the crops, the weather by hash.
 *
 * @param cropOf the crop table's row; seasons whose crop has left the table are not counted
 */
export function freeze(
  field: Field,
  seasons: readonly FieldSeason[],
  cropOf: (id: string) => Crop | null,
  layout: Layout,
  weatherHash: string,
): FrozenInput {
  const crops = seasons.slice(0, MOST_SEASONS).flatMap((season) => {
    const crop = cropOf(season.cropId);
    return crop ? [runCropOf(crop, { ...season, seasonId: season.id })] : [];
  });
  const [longitude, latitude] = field.pin;
  return {
    site: {
      latitude,
      longitude,
      elevationM: field.elevationM,
      slopePercent: field.slopePercent,
      aspectDeg: field.aspectDeg,
      albedo: field.albedo,
    },
    layout,
    crops: crops.reverse(),
    options: OPTIONS,
    weatherHash,
  };
}
