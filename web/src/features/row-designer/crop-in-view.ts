import type { FieldSeason } from '@furrowlight/shared/contract/fields';
import { dayOfMonthDay } from '@furrowlight/shared/crops/windows';

/** The crop for which live light is counted. */
export interface CropInView {
  id: string;
  name: string;
  canopyHeightM: number;
  season: { firstDay: number; days: number };
}

const DAY_MS = 86_400_000;

/** Light at the ground from April to September, for a field without seasons. */
export const BARE_SEASON: CropInView = {
  id: '',
  name: 'April to September, at the ground',
  canopyHeightM: 0,
  season: { firstDay: 90, days: 183 },
};

/** A field's season as the preview counts it. */
export function cropInView(season: FieldSeason): CropInView {
  const days = Math.round((Date.parse(season.harvest) - Date.parse(season.sowing)) / DAY_MS) + 1;
  return {
    id: season.id,
    name: `${season.cropName} ${season.harvest.slice(0, 4)}`,
    canopyHeightM: season.canopyHeightM,
    season: {
      firstDay: dayOfMonthDay(season.sowing.slice(5)),
      days: Math.min(Math.max(days, 1), 365),
    },
  };
}
