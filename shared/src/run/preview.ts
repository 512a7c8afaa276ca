import type { Layout } from '../contract/layout.js';
import type { RunInput, Site } from '../contract/run.js';
import { requireWithin } from '../errors.js';
import type { BandTable } from '../light/band-table.js';
import { periodBudget, periodByPosition } from '../light/budget.js';
import { daysIn, requireWeatherYear, type HourlyYear } from '../light/weather-year.js';
import { emptyDaySuns, fillDaySuns, type DaySuns } from './instants.js';
import { groundOf } from './layout-geometry.js';
import { prepareRun, tableOf, type RunState } from './state.js';
import { countSun } from './step.js';

/** Days that stand for a year: the middles of this many equal parts. */
const PARTS = 24;

/** Minutes between a preview's suns. */
const STEP_MINUTES = 30;

/** What stays the same while the sliders of one field move. */
export interface PreviewPlace {
  site: Site;
  /** Mean hours of each part of the year, on the day in its middle. */
  weather: HourlyYear;
  /** 0-based middle day of each part, its suns, and its first day and length. */
  parts: { day: number; suns: DaySuns; firstDay: number; days: number }[];
  table: BandTable;
}

/** Season light and yearly power of a layout, as it is shown while a slider moves. */
export interface Preview {
  /** Distance from a row's centre line, m, at the middle of each strip of ground. */
  positionsM: number[];
  /** Season PAR by strip, share of open field. */
  share: number[];
  /** Share of open field by part of the year (24 equal parts from 1 January) and strip. */
  weave: number[][];
  openDli: number;
  meanDli: number;
  darkestDli: number;
  brightestDli: number;
  meanShare: number;
  darkestShare: number;
  brightestShare: number;
  /** Darkest strip over the mean. */
  evenness: number;
  kwhPerKwp: number;
  kwhPerM2Land: number;
}

/** Copy of the weather in which each part's middle day holds the part's mean hours. */
function meanDays(weather: HourlyYear, parts: { firstDay: number; days: number; day: number }[]) {
  const blank = () => new Array<number>(weather.ghi.length).fill(0);
  const series = ['ghi', 'dni', 'dhi', 'temperatureC', 'windMs'] as const;
  const mean: HourlyYear = {
    ...weather,
    ghi: blank(),
    dni: blank(),
    dhi: blank(),
    temperatureC: blank(),
    windMs: blank(),
  };
  for (const name of series) {
    for (const { firstDay, days, day } of parts) {
      for (let n = 0; n < days * 24; n += 1) {
        mean[name][day * 24 + (n % 24)] += weather[name][firstDay * 24 + n] / days;
      }
    }
  }
  return mean;
}

/**
 * Hold ready what a preview needs of a field and its weather.
 *
 * @throws InputError naming the part of the weather year that is wrong
 */
export function preparePreview(site: Site, weather: HourlyYear): PreviewPlace {
  requireWeatherYear(weather);
  const days = daysIn(weather);
  const edges = Array.from({ length: PARTS + 1 }, (_, i) => Math.round((i * days) / PARTS));
  const spans = Array.from({ length: PARTS }, (_, i) => ({
    firstDay: edges[i],
    days: edges[i + 1] - edges[i],
    day: Math.floor((edges[i] + edges[i + 1]) / 2),
  }));
  const mean = meanDays(weather, spans);
  const ground = { latitude: site.latitude, longitude: site.longitude, ...groundOf(site) };
  const parts = spans.map((span) => {
    const suns = emptyDaySuns(STEP_MINUTES);
    fillDaySuns(mean, ground, span.day, suns);
    return { ...span, suns };
  });
  return { site, weather: mean, parts, table: tableOf(site) };
}

/** A part's middle day stands for as many days as the part shares with the season. */
function spreadOverSeason(
  state: RunState,
  place: PreviewPlace,
  firstDay: number,
  days: number,
): void {
  const { sums } = state.planes[0];
  for (const part of place.parts) {
    let shared = 0;
    for (let day = part.firstDay; day < part.firstDay + part.days; day += 1) {
      if ((day - firstDay + state.days) % state.days < days) shared += 1;
    }
    for (let p = 0; p < sums.positions; p += 1) sums.par[part.day * sums.positions + p] *= shared;
    for (const byDay of [sums.open, sums.red, sums.farRed, sums.redOpen, sums.farRedOpen]) {
      byDay[part.day] *= shared;
    }
  }
}

/**
 * Season light and yearly power of a layout, quickly: 24 mean days with suns half an hour apart,
 * through the same modules as a full run. Season shares are within about 0.02 of the full run's.
 *
 * @param place from preparePreview
 * @param layout checked layout
 * @param canopyHeightM height at which light is counted, m
 * @param season first day (0-based) and length in days, may run over New Year
 * @param positions strips across a pitch
 * @throws InputError naming what cannot be run
 */
export function previewLayout(
  place: PreviewPlace,
  layout: Layout,
  canopyHeightM: number,
  season: { firstDay: number; days: number },
  positions = 40,
): Preview {
  requireWithin('season.days', season.days, 1, 366, 'days');
  requireWithin('canopyHeightM', canopyHeightM, 0, 8, 'm');
  const input: RunInput = {
    site: place.site,
    layout,
    crops: [],
    options: { positions, sunStepMinutes: STEP_MINUTES, sky: 'hay-davies' },
    weather: place.weather,
  };
  const state = prepareRun(input, {
    quality: 'preview',
    table: place.table,
    heightsM: [canopyHeightM],
  });
  for (const part of place.parts) {
    state.suns = part.suns;
    for (let i = 0; i < part.suns.count; i += 1) countSun(state, part.day, i);
  }
  const { sums } = state.planes[0];
  const weave = place.parts.map(({ day }) =>
    Array.from(sums.par.subarray(day * positions, (day + 1) * positions), (par) =>
      sums.open[day] > 0 ? par / sums.open[day] : 1,
    ),
  );
  spreadOverSeason(state, place, season.firstDay, season.days);
  const budget = periodBudget(sums, 'Season', 0, sums.days);
  const perDay = sums.days / season.days;
  const open = budget.openDli * sums.days;
  const ac = state.energyByMonth.reduce((sum, month) => sum + month.ac, 0);
  const kwhPerKwp = (ac * sums.days) / PARTS;
  return {
    positionsM: Array.from(state.positions),
    share: Array.from(periodByPosition(sums, 0, sums.days), (value) =>
      open > 0 ? value / open : 1,
    ),
    weave,
    openDli: budget.openDli * perDay,
    meanDli: budget.meanDli * perDay,
    darkestDli: budget.darkestDli * perDay,
    brightestDli: budget.brightestDli * perDay,
    meanShare: budget.meanShare,
    darkestShare: budget.darkestShare,
    brightestShare: budget.brightestShare,
    evenness: budget.evenness,
    kwhPerKwp,
    kwhPerM2Land: (kwhPerKwp * state.powerPerLand) / 1000,
  };
}
