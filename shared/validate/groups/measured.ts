import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { defaultAtmosphere } from '../../src/light/atmosphere.js';
import {
  atAltitude,
  emptyBandSplit,
  parOf,
  PHOTONS,
  prepareBandTable,
  splitBands,
} from '../../src/light/band-table.js';
import { distanceFactor, sunPosition } from '../../src/light/sun.js';
import { ErrorTally, type Group, type Quantity } from '../quantity.js';
import { numberOf, readTable, type TableRow } from '../read-table.js';

const NAME = 'measured';
const SITES = 'measured/sites.json';

interface Site {
  file: string;
  kind: 'surfrad-day' | 'fluxnet-halfhour';
  latitude: number;
  longitude: number;
  elevation_m: number;
  utc_offset_h: number;
}

/** Measured and clear-sky PPFD of one day, umol m-2 s-1, by local standard hour. */
type DayCourse = { measured: number; clear: number; hour: number }[];

const ALBEDO = 0.2;
/** Sun altitude below which sensors' cosine errors rule, degrees. */
const LOW_SUN_DEG = 10;
const DAY_MS = 86_400_000;

const dayOfYear = (epochMs: number) =>
  Math.floor((epochMs - Date.UTC(new Date(epochMs).getUTCFullYear(), 0, 1)) / DAY_MS) + 1;

/** One-minute radiation with PAR in W m-2: PAR from global, direct and diffuse. */
function surfradDay(folder: string, site: Site): Quantity[] {
  const label = (what: string) => `${site.file}: ${what}`;
  const table = prepareBandTable(defaultAtmosphere(site.elevation_m, ALBEDO));
  const split = emptyBandSplit();
  const lines = readFileSync(join(folder, 'measured', site.file), 'utf8')
    .split('\n')
    .slice(2);
  let measured = 0;
  let modelled = 0;
  let squares = 0;
  let n = 0;
  for (const line of lines) {
    const c = line.trim().split(/\s+/).map(Number);
    if (c.length < 32) continue;
    // Global, direct and PAR, each with its flag; flag 0 is good.
    const [global, globalFlag, direct, directFlag, par, parFlag] = [8, 9, 12, 13, 30, 31].map(
      (i) => c[i],
    );
    const instant = Date.UTC(c[0], c[2] - 1, c[3], c[4], c[5]);
    const { altitude } = sunPosition(instant, site.latitude, site.longitude);
    if (altitude < (LOW_SUN_DEG * Math.PI) / 180 || !(global > 5)) continue;
    if (globalFlag !== 0 || directFlag !== 0 || parFlag !== 0) continue;
    const dni = Math.max(direct, 0);
    const beam = Math.min(dni * Math.sin(altitude), global);
    splitBands(table, altitude, dni, distanceFactor(c[1]), split);
    const dhi = global - beam;
    const ours = beam * parOf(split.direct, 0) + dhi * parOf(split.diffuse, 0);
    measured += par;
    modelled += ours;
    squares += (ours - par) ** 2;
    n += 1;
  }
  const day = new ErrorTally(NAME, label('PAR day sum'), '%', 5);
  day.add(100 * (modelled / measured - 1));
  const minutes = new ErrorTally(NAME, label('PAR minute rms'), '%', 12);
  minutes.add((100 * Math.sqrt(squares / n)) / (measured / n));
  return [day.judge(), minutes.judge()];
}

/** A half-hourly record: day by day the measured and clear-sky PPFD, umol m-2 s-1. */
function recordByDay(folder: string, site: Site) {
  const table = prepareBandTable(defaultAtmosphere(site.elevation_m, ALBEDO));
  const split = emptyBandSplit();
  const days = new Map<string, DayCourse>();
  for (const row of readTable(join(folder, 'measured', site.file))) {
    if (row.PPFD === undefined || row.PPFD.trim() === '' || Number(row.PPFD_qc ?? 0) !== 0)
      continue;
    const measured = Number(row.PPFD);
    if (!(measured > -50)) continue;
    const hour = numberOf(row, 'hour');
    const [date, instant] = stampOf(row, hour, site);
    const { altitude } = sunPosition(instant, site.latitude, site.longitude);
    let clear = 0;
    if (altitude > 0.02) {
      const distance = distanceFactor(dayOfYear(instant));
      const dni = atAltitude(table.directWm2, altitude) * distance;
      const dhi = atAltitude(table.diffuseWm2, altitude) * distance;
      splitBands(table, altitude, dni, distance, split);
      clear =
        dni * Math.sin(altitude) * parOf(split.direct, PHOTONS) +
        dhi * parOf(split.diffuse, PHOTONS);
    }
    days.set(date, [...(days.get(date) ?? []), { measured, clear, hour }]);
  }
  return days;
}

/** Day label and mid-interval instant of a row; the half-hour starts at `hour`, local standard time. */
function stampOf(row: TableRow, hour: number, site: Site): [string, number] {
  const midnight = Date.UTC(numberOf(row, 'year'), 0, numberOf(row, 'doy'));
  const label = `${row.year}-${row.doy}`;
  return [label, midnight + (hour + 0.25 - site.utc_offset_h) * 3_600_000];
}

/** Correlation of a day with the clear-sky course above which it counts as clear. */
const CLEAR_CORRELATION = 0.99;
/**
 * Unevenness of the midday ratio measured / clear below which no cloud crossed the sun; the wider
 * ones are asked only of a record without a day that even.
 */
const CLEAR_SPREADS = [0.04, 0.07, 0.1];
/** Least midday ratio of a clear day, far below any honest clear-sky error. */
const CLEAR_LEAST = 0.75;

/** Mean of the midday ratio measured / clear and its relative unevenness. */
function middayRatio(day: DayCourse): { mean: number; spread: number } | null {
  const midday = day.filter(({ hour }) => hour >= 9 && hour < 15);
  if (midday.length < 10) return null;
  const ratios = midday.map(({ measured, clear }) => measured / clear);
  const mean = ratios.reduce((sum, value) => sum + value, 0) / ratios.length;
  const square = ratios.reduce((sum, value) => sum + (value - mean) ** 2, 0) / ratios.length;
  return { mean, spread: Math.sqrt(square) / mean };
}

/** Correlation about nought of a day with its clear-sky course. */
function likeness(day: DayCourse): number {
  const bright = day.filter(({ clear }) => clear > 50);
  let dot = 0;
  let a = 0;
  let b = 0;
  for (const { measured, clear } of bright) {
    dot += measured * clear;
    a += measured ** 2;
    b += clear ** 2;
  }
  return dot / Math.sqrt(a * b);
}

/**
 * Clear days by their shape alone, so that a model that is too bright or dark is not excused: the
 * day follows the clear-sky course and the ratio is even over the six hours about noon.
 */
function clearDays(days: DayCourse[]): DayCourse[] {
  for (const limit of CLEAR_SPREADS) {
    const clear = days.filter((day) => {
      const ratio = middayRatio(day);
      if (!ratio || ratio.spread >= limit || ratio.mean <= CLEAR_LEAST) return false;
      return likeness(day) > CLEAR_CORRELATION;
    });
    if (clear.length > 0) return clear;
  }
  return [];
}

/** Noon PPFD on clear days against the clear-sky envelope. */
function clearNoons(folder: string, site: Site): Quantity[] {
  const noon = new ErrorTally(NAME, `${site.file}: PPFD at noon on clear days`, '%', 8);
  for (const day of clearDays([...recordByDay(folder, site).values()])) {
    const about = day.filter(({ hour }) => hour >= 11 && hour < 13);
    const sum = (pick: 'measured' | 'clear') => about.reduce((total, at) => total + at[pick], 0);
    noon.add(100 * (sum('clear') / sum('measured') - 1));
  }
  return [noon.judge()];
}

/** Measured records named by sites.json. */
export const measured: Group = {
  name: NAME,
  files: [SITES],
  source: 'NOAA SURFRAD (public domain) and FLUXNET2015 (CC BY 4.0) records',
  compare(folder) {
    const sites = JSON.parse(readFileSync(join(folder, SITES), 'utf8')) as Site[];
    return sites.flatMap((site) =>
      site.kind === 'surfrad-day' ? surfradDay(folder, site) : clearNoons(folder, site),
    );
  },
};
