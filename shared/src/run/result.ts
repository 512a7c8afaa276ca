import type { Energy, Plane, RunResult } from '../contract/result.js';
import { dayOfMonthDay, isWithin, monthSpan } from '../crops/windows.js';
import {
  dailyStatistics,
  periodBudget,
  periodByPosition,
  type LightSums,
} from '../light/budget.js';
import { addSplit, noSplit, sunSplit } from '../light/sun-split.js';
import { noEnergy, type EnergySums } from '../power/energy.js';
import { cropBudget } from './crop-budget.js';
import { MODEL_VERSION } from './model-version.js';
import type { PlaneState, RunState } from './state.js';

export const MONTH_LABELS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];

/** Meteorological seasons by first month (0-11) and number of days. */
const SEASONS = [
  { label: 'Winter', month: 11, days: 90 },
  { label: 'Spring', month: 2, days: 92 },
  { label: 'Summer', month: 5, days: 92 },
  { label: 'Autumn', month: 8, days: 91 },
];

const WEEK = 7;

/** First day and length of the weeks of a year, counted from 1 January; the last is what remains. */
function weeksOf(days: number): { firstDay: number; days: number }[] {
  return Array.from({ length: Math.ceil(days / WEEK) }, (_, week) => ({
    firstDay: week * WEEK,
    days: Math.min(WEEK, days - week * WEEK),
  }));
}

const perDay = (sums: LightSums, firstDay: number, days: number): number[] =>
  Array.from(periodByPosition(sums, firstDay, days), (value) => value / days);

function planeResult({ heightM, sums }: PlaneState): Plane {
  const daily = dailyStatistics(sums);
  const weeks = weeksOf(sums.days);
  return {
    heightM,
    weekly: weeks.map(({ firstDay, days }) => perDay(sums, firstDay, days)),
    yearDli: perDay(sums, 0, sums.days),
    dailyMean: daily.mean,
    dailyDarkest: daily.darkest,
    dailyBrightest: daily.brightest,
    weeks: weeks.map(({ firstDay, days }, i) =>
      periodBudget(sums, `Week ${i + 1}`, firstDay, days),
    ),
    months: MONTH_LABELS.map((label, month) => {
      const { firstDay, days } = monthSpan(month);
      return periodBudget(sums, label, firstDay, days);
    }),
    seasons: SEASONS.map(({ label, month, days }) =>
      periodBudget(sums, label, monthSpan(month).firstDay, days),
    ),
    year: periodBudget(sums, 'Year', 0, sums.days),
  };
}

/** PAR gained by a crop-first programme on its days, % of the plain tracker's. */
function cropFirstGain(state: RunState): number | null {
  const windows = state.input.layout.tracker?.cropFirst ?? [];
  if (!state.plainTracker) return null;
  const { sums } = state.planes[0];
  let served = 0;
  let plain = 0;
  for (let day = 0; day < state.days; day += 1) {
    const inWindow = windows.some(({ from, to }) =>
      isWithin(Math.min(day, 364), dayOfMonthDay(from), dayOfMonthDay(to)),
    );
    if (!inWindow) continue;
    served += periodBudget(sums, '', day, 1).meanDli;
    plain += periodBudget(state.plainTracker.sums, '', day, 1).meanDli;
  }
  return plain > 0 ? 100 * (served / plain - 1) : 0;
}

function energyResult(state: RunState): Energy {
  const year = noEnergy();
  for (const month of state.energyByMonth) {
    for (const key of Object.keys(year) as (keyof EnergySums)[]) year[key] += month[key];
  }
  const percent = (part: number) => (year.ideal > 0 ? (100 * part) / year.ideal : 0);
  const plain = state.plainTracker?.energy.ac;
  return {
    kwhPerKwp: year.ac,
    kwhPerM2Land: (year.ac * state.powerPerLand) / 1000,
    monthly: state.energyByMonth.map(({ ac }, month) => ({ month: month + 1, kwhPerKwp: ac })),
    bifacialGainPercent: year.ac > year.rear ? (100 * year.rear) / (year.ac - year.rear) : 0,
    rowShadeLossPercent: percent(year.rowShade),
    temperatureLossPercent: percent(year.temperature),
    incidenceLossPercent: percent(year.incidence),
    clippingLossPercent: percent(year.clipping),
    cropFirstCostPercent: plain ? 100 * (1 - year.ac / plain) : null,
    cropFirstGainPercent: cropFirstGain(state),
  };
}

function notesOf(state: RunState): string[] {
  const { layout, site, options } = state.input;
  const notes = [
    `Light is modelled at canopy top under long rows, away from their ends, every ${options.sunStepMinutes} minutes.`,
    'Field edges, hedges and hills are not part of this run; they take light from open field and rows alike.',
    `Structure allowance: ${(layout.structureShade * 100).toFixed(0)} % of the light below the panels.`,
  ];
  if (site.slopePercent > 0) {
    notes.push(
      'Light is counted on the sloped field; the slope along the rows is left out of the tilt.',
    );
  }
  if (layout.gaps) {
    notes.push(
      'Light through the gaps between modules follows their pattern; values are means along the row, so single light spots are not told apart.',
    );
  }
  return notes;
}

/** Turn the sums of a finished run into its result. */
export function runResult(state: RunState): RunResult {
  const year = noSplit();
  for (const month of state.months) addSplit(year, month);
  const { sums } = state.planes[0];
  return {
    modelVersion: MODEL_VERSION,
    positionsM: Array.from(state.positions),
    pitchM: state.input.layout.pitchM,
    year: state.input.weather.year,
    openDaily: Array.from(sums.open),
    openWeekly: weeksOf(sums.days).map(
      ({ firstDay, days }) => periodBudget(sums, '', firstDay, days).openDli,
    ),
    planes: state.planes.map(planeResult),
    crops: state.input.crops.map((crop) => cropBudget(state, crop)),
    sunSplit: {
      year: sunSplit('Year', year),
      months: state.months.map((month, i) => sunSplit(MONTH_LABELS[i], month)),
    },
    energy: energyResult(state),
    notes: notesOf(state),
  };
}
