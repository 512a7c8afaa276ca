import type { PeriodBudget } from '../contract/result.js';

/** Light of a year by day and receiver, as it is summed up sun by sun. Photons in mol m-2. */
export interface LightSums {
  days: number;
  positions: number;
  /** PAR photons, days x positions. */
  par: Float64Array;
  /** PAR photons in open field, by day. */
  open: Float64Array;
  /** Red (655-665 nm) and far-red (725-735 nm) photons by day, mean under the rows and in open field. */
  red: Float64Array;
  farRed: Float64Array;
  redOpen: Float64Array;
  farRedOpen: Float64Array;
}

export function emptyLightSums(days: number, positions: number): LightSums {
  const perDay = () => new Float64Array(days);
  return {
    days,
    positions,
    par: new Float64Array(days * positions),
    open: perDay(),
    red: perDay(),
    farRed: perDay(),
    redOpen: perDay(),
    farRedOpen: perDay(),
  };
}

/** Days of a period that may run over New Year. */
function* daysOf(sums: LightSums, firstDay: number, days: number): Generator<number> {
  for (let i = 0; i < days; i += 1) yield (firstDay + i) % sums.days;
}

/** PAR photons of a period by receiver, mol m-2. */
export function periodByPosition(sums: LightSums, firstDay: number, days: number): Float64Array {
  const total = new Float64Array(sums.positions);
  for (const day of daysOf(sums, firstDay, days)) {
    const row = day * sums.positions;
    for (let i = 0; i < sums.positions; i += 1) total[i] += sums.par[row + i];
  }
  return total;
}

function meanOf(values: Float64Array, from: number, to: number): number {
  let sum = 0;
  for (let i = from; i < to; i += 1) sum += values[i];
  return sum / (to - from);
}

const sumOver = (values: Float64Array, sums: LightSums, firstDay: number, days: number): number => {
  let sum = 0;
  for (const day of daysOf(sums, firstDay, days)) sum += values[day];
  return sum;
};

const ratio = (a: number, b: number): number => (b > 0 ? a / b : 0);

/**
 * Light budget of a period.
 *
 * @param label name of the period
 * @param firstDay 0-based day of year
 * @param days number of days, may run over New Year
 * @returns DLI means in mol m-2 d-1, shares of open field. Darkest and brightest are means of the
 *   tenth of the receivers with the least and the most light in this period; evenness is the darkest
 *   receiver over the mean.
 */
export function periodBudget(
  sums: LightSums,
  label: string,
  firstDay: number,
  days: number,
): PeriodBudget {
  const ranked = periodByPosition(sums, firstDay, days).sort();
  const tenth = Math.max(1, Math.round(sums.positions / 10));
  const open = sumOver(sums.open, sums, firstDay, days);
  const mean = meanOf(ranked, 0, ranked.length);
  const darkest = meanOf(ranked, 0, tenth);
  const brightest = meanOf(ranked, ranked.length - tenth, ranked.length);
  return {
    label,
    firstDay,
    days,
    openDli: open / days,
    meanDli: mean / days,
    darkestDli: darkest / days,
    brightestDli: brightest / days,
    meanShare: ratio(mean, open),
    darkestShare: ratio(darkest, open),
    brightestShare: ratio(brightest, open),
    evenness: ratio(ranked[0], mean),
    redFarRed: ratio(
      sumOver(sums.red, sums, firstDay, days),
      sumOver(sums.farRed, sums, firstDay, days),
    ),
    redFarRedOpen: ratio(
      sumOver(sums.redOpen, sums, firstDay, days),
      sumOver(sums.farRedOpen, sums, firstDay, days),
    ),
  };
}

/** Mean, darkest tenth and brightest tenth of each day, mol m-2 d-1. */
export function dailyStatistics(sums: LightSums) {
  const mean: number[] = [];
  const darkest: number[] = [];
  const brightest: number[] = [];
  for (let day = 0; day < sums.days; day += 1) {
    const budget = periodBudget(sums, '', day, 1);
    mean.push(budget.meanDli);
    darkest.push(budget.darkestDli);
    brightest.push(budget.brightestDli);
  }
  return { mean, darkest, brightest };
}
