import type { Crop } from '../contract/crops.js';
import type { RunCrop } from '../contract/run.js';
import { InputError } from '../errors.js';
import { dayOfMonthDay } from './windows.js';

/** Where BBCH principal stages begin within the growing time, share 0-1 (common practice, ours). */
const STAGE_STARTS = [0, 0.05, 0.2, 0.33, 0.45, 0.55, 0.63, 0.72, 0.86, 0.96];

/** Winter crops sown in autumn: what lies before this day of the year is establishment and rest. */
const SPRING = dayOfMonthDay('03-01');
const DAY_MS = 86_400_000;
const DAYS_IN_YEAR = 365;
/** Weight of light in the critical window against 1 in the rest of the season. */
const CRITICAL_WEIGHT = 2;

/** First range of BBCH codes in a crop's note, e.g. "31-69 (peak 37-61)"; null where it is words only. */
export function criticalRange(text: string): { from: number; to: number } | null {
  const match = /(\d{1,2})\s*-\s*(\d{1,2})/.exec(text);
  return match ? { from: Number(match[1]), to: Number(match[2]) } : null;
}

/** Share of the growing time at which a BBCH code (0-99) is reached. */
export function shareAtBbch(code: number): number {
  const stage = Math.min(Math.floor(code / 10), 9);
  const next = STAGE_STARTS[stage + 1] ?? 1;
  return STAGE_STARTS[stage] + ((code % 10) / 10) * (next - STAGE_STARTS[stage]);
}

/** A crop's light use, where the table has all three values. */
function lightUseOf({ lightUseGPerMj, extinction, leafAreaMax }: Crop): Pick<RunCrop, 'lightUse'> {
  if (lightUseGPerMj === null || extinction === null || leafAreaMax === null) return {};
  return { lightUse: { lightUseGPerMj, extinction, leafAreaMax } };
}

/** A sown crop as a field's season holds it. */
export interface SownCrop {
  seasonId: string;
  /** ISO dates. */
  sowing: string;
  harvest: string;
  canopyHeightM: number;
}

/**
 * A crop of a field as a run counts it: whole season, and three windows of which the middle one is
 * the critical stage, at twice the weight.
 *
 * The dates of the critical stage are laid over the growing time by shares of the season (common
 * practice, no phenology model); of an autumn-sown crop only the time from 1 March on is laid out.
 *
 * @throws InputError naming harvest when it is not after sowing
 */
export function runCropOf(crop: Crop, sown: SownCrop): RunCrop {
  const length = Math.round((Date.parse(sown.harvest) - Date.parse(sown.sowing)) / DAY_MS) + 1;
  if (!(length > 1)) throw new InputError('harvest', 'The harvest must come after the sowing.');
  const firstDay = dayOfMonthDay(sown.sowing.slice(5));
  const days = Math.min(length, DAYS_IN_YEAR);
  const base = {
    seasonId: sown.seasonId,
    cropId: crop.id,
    cropName: crop.name,
    shadeClass: crop.shadeClass,
    canopyHeightM: sown.canopyHeightM,
    firstDay,
    days,
    ...lightUseOf(crop),
  };
  const range = criticalRange(crop.criticalBbch);
  if (!range) return { ...base, stages: [] };
  const overWinter = firstDay + days > DAYS_IN_YEAR + SPRING;
  const rest = overWinter ? DAYS_IN_YEAR - firstDay + SPRING : 0;
  const growing = days - rest;
  const from = rest + Math.round(shareAtBbch(range.from) * growing);
  const to = Math.min(rest + Math.round(shareAtBbch(range.to + 1) * growing), days);
  const window = (label: string, start: number, end: number, critical: boolean) => ({
    label,
    firstDay: (firstDay + start) % DAYS_IN_YEAR,
    days: end - start,
    weight: critical ? CRITICAL_WEIGHT : 1,
    critical,
    note: critical ? crop.criticalNote : '',
  });
  const stages = [
    window('Before the critical stage', 0, from, false),
    window(`Critical stage, BBCH ${range.from}-${range.to}`, from, to, true),
    window('After the critical stage', to, days, false),
  ];
  return { ...base, stages: stages.filter((stage) => stage.days > 0) };
}
