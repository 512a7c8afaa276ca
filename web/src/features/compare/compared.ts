import type { Layout } from '@furrowlight/shared/contract/layout';
import type { PeriodBudget, RunResult } from '@furrowlight/shared/contract/result';
import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import { bearing, formatNumber, percent, withUnit } from '../../lib/format';
import { LAYOUT_KINDS } from '../../lib/layout-kinds';

/** A scenario with its result, as one column of the comparison. */
export interface Compared {
  scenario: Scenario;
  result: RunResult;
}

export type Measure = 'mean' | 'darkest';

/** DLI and share of open field of a period by what is compared. */
export function light(budget: PeriodBudget, measure: Measure): { dli: number; share: number } {
  return measure === 'mean'
    ? { dli: budget.meanDli, share: budget.meanShare }
    : { dli: budget.darkestDli, share: budget.darkestShare };
}

/** Periods every column has: crops first, then seasons and the year. */
export function periodsOf(compared: readonly Compared[]): {
  label: string;
  budgets: (PeriodBudget | null)[];
}[] {
  const crops = new Map<string, string>();
  for (const { result } of compared) {
    for (const crop of result.crops) crops.set(crop.seasonId, crop.cropName);
  }
  const byCrop = [...crops].map(([seasonId, label]) => ({
    label,
    budgets: compared.map(
      ({ result }) => result.crops.find((crop) => crop.seasonId === seasonId)?.season ?? null,
    ),
  }));
  const seasons = compared[0].result.planes[0].seasons.map((season, i) => ({
    label: season.label,
    budgets: compared.map(({ result }) => result.planes[0].seasons[i]),
  }));
  const year = { label: 'Year', budgets: compared.map(({ result }) => result.planes[0].year) };
  return [...byCrop, ...seasons, year];
}

const PARAMETERS: { label: string; of: (layout: Layout) => string }[] = [
  { label: 'Kind', of: ({ kind }) => LAYOUT_KINDS[kind].name },
  { label: 'Pitch', of: ({ pitchM }) => withUnit(pitchM, 'm', 1) },
  { label: 'Collector width', of: ({ collectorWidthM }) => withUnit(collectorWidthM, 'm', 1) },
  {
    label: 'Tilt',
    of: ({ tiltDeg, tracker }) =>
      tracker ? `turns to ±${formatNumber(tracker.maxAngleDeg)}°` : `${formatNumber(tiltDeg)}°`,
  },
  { label: 'Front looks', of: ({ azimuthDeg }) => bearing(azimuthDeg) },
  { label: 'Clear height', of: ({ clearHeightM }) => withUnit(clearHeightM, 'm', 1) },
  { label: 'Uncropped strip', of: ({ stripWidthM }) => withUnit(stripWidthM, 'm', 1) },
  { label: 'Light transmittance', of: ({ module }) => percent(module.transmittance) },
];

/** Rows of the parameter table; `differs` where the columns are not all alike. */
export function parameterRows(
  compared: readonly Compared[],
): { label: string; values: string[]; differs: boolean }[] {
  return PARAMETERS.map(({ label, of }) => {
    const values = compared.map(({ scenario }) => of(scenario.frozen?.layout ?? scenario.layout));
    return { label, values, differs: new Set(values).size > 1 };
  });
}
