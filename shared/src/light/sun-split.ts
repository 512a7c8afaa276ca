import type { SunSplit } from '../contract/result.js';

/** Sums that make a sun split, J m-2 of land. */
export interface SplitSums {
  incoming: number;
  electricity: number;
  /** Light kept by panels and structure, electricity included. */
  kept: number;
  reflected: number;
  cropPar: number;
  cropOther: number;
}

export const noSplit = (): SplitSums => ({
  incoming: 0,
  electricity: 0,
  kept: 0,
  reflected: 0,
  cropPar: 0,
  cropOther: 0,
});

/** Add one period's sums to another's. */
export function addSplit(to: SplitSums, from: SplitSums): void {
  to.incoming += from.incoming;
  to.electricity += from.electricity;
  to.kept += from.kept;
  to.reflected += from.reflected;
  to.cropPar += from.cropPar;
  to.cropOther += from.cropOther;
}

/**
 * Where 100 units of sunlight on the land went. The five parts sum to 100 because every unit is
 * followed to where it stays (rows/endless balance). Panel heat holds all losses of the plant.
 */
export function sunSplit(label: string, sums: SplitSums): SunSplit {
  const unit = sums.incoming > 0 ? 100 / sums.incoming : 0;
  return {
    label,
    incomingMjM2: sums.incoming / 1e6,
    electricity: sums.electricity * unit,
    panelHeat: (sums.kept - sums.electricity) * unit,
    reflected: sums.reflected * unit,
    cropPar: sums.cropPar * unit,
    otherOnCrop: sums.cropOther * unit,
  };
}
