import type { Crop } from '@furrowlight/shared/contract/crops';

/** Usual sowing and harvest of a crop as dates: the next sowing from `today` on, and its harvest. */
export function usualDates(crop: Crop, today: string): { sowing: string; harvest: string } | null {
  if (!crop.sowFrom || !crop.harvestFrom) return null;
  const year = Number(today.slice(0, 4));
  const sowing =
    `${year}-${crop.sowFrom}` >= today ? `${year}-${crop.sowFrom}` : `${year + 1}-${crop.sowFrom}`;
  const sameYear = `${sowing.slice(0, 4)}-${crop.harvestFrom}`;
  const harvest =
    sameYear > sowing ? sameYear : `${Number(sowing.slice(0, 4)) + 1}-${crop.harvestFrom}`;
  return { sowing, harvest };
}

/** Whole days between two calendar dates. */
export function daysBetween(from: string, to: string): number {
  return Math.round((Date.parse(`${to}T00:00Z`) - Date.parse(`${from}T00:00Z`)) / 86_400_000);
}
