import type { Findings } from './findings.js';
import type { RawHour } from './raw-hour.js';

const HOURS = 8760;
const MONTH_STARTS = [0, 31, 59, 90, 120, 151, 181, 212, 243, 273, 304, 334];
/** Hours in a row that may be filled by a straight line. */
const LONGEST_FILLED_GAP = 3;

/** How a file's clock relates to hours of the year in local standard time. */
export interface Clock {
  stamp: 'beginning' | 'ending';
  clock: 'utc' | 'standard';
  utcOffsetHours: number;
}

/** Series of a year, NaN where the file has no value, with the line each hour came from (0 none). */
export interface HourSeries {
  year: number;
  line: Int32Array;
  ghi: Float64Array;
  dni: Float64Array;
  dhi: Float64Array;
  beamHorizontal: Float64Array;
  temperature: Float64Array;
  wind: Float64Array;
}

const NAMES = ['ghi', 'dni', 'dhi', 'beamHorizontal', 'temperature', 'wind'] as const;

/** Hour of a 365-day year in local standard time that a row stands for; null on 29 February. */
function hourOfYear(row: RawHour, clock: Clock): number | null {
  if (row.month === 2 && row.day === 29) return null;
  const stamped = (MONTH_STARTS[row.month - 1] + row.day - 1) * 24 + row.hour;
  // A stamp on the full hour that ends it names the hour before; within the hour, that very hour.
  const begins = clock.stamp === 'ending' && row.minute === 0 ? stamped - 1 : stamped;
  const shift = clock.clock === 'utc' ? clock.utcOffsetHours : 0;
  return (((begins + Math.floor(shift)) % HOURS) + HOURS) % HOURS;
}

/** The one calendar year to be used: all rows of a typical year, or the first whole year of several. */
function chooseYear(rows: RawHour[], findings: Findings): RawHour[] {
  const keys = new Set(rows.map((row) => `${row.month}-${row.day}-${row.hour}-${row.minute}`));
  if (keys.size >= rows.length * 0.98) return rows;
  const byYear = new Map<number, RawHour[]>();
  for (const row of rows) byYear.set(row.year, [...(byYear.get(row.year) ?? []), row]);
  const whole = [...byYear.entries()].find(([, list]) => list.length >= HOURS - 24);
  if (!whole) return rows;
  findings.add(
    'note',
    'several-years',
    `The file holds ${byYear.size} years; ${whole[0]} is used. Upload the others one by one.`,
  );
  return whole[1];
}

/** Refuse files whose rows are not an hour apart. */
function requireHourly(rows: RawHour[], findings: Findings): boolean {
  if (rows.length < 24) {
    findings.add('refuse', 'too-short', `Only ${rows.length} data rows: a year has 8760 hours.`);
    return false;
  }
  const minutes = (row: RawHour) => (row.day * 24 + row.hour) * 60 + row.minute;
  const steps = rows.slice(1, 200).map((row, i) => minutes(row) - minutes(rows[i]));
  const usual = steps.sort((a, b) => a - b)[Math.floor(steps.length / 2)];
  if (usual === 60) return true;
  findings.add(
    'refuse',
    'not-hourly',
    `Rows are ${usual} minutes apart. Average them to full hours and upload again.`,
    [rows[0].line, rows[1].line],
  );
  return false;
}

/**
 * Put rows in their places in the year.
 *
 * @returns series with NaN where nothing was given; null when the file cannot be used
 */
export function placeHours(all: RawHour[], clock: Clock, findings: Findings): HourSeries | null {
  if (!requireHourly(all, findings)) return null;
  const rows = chooseYear(all, findings);
  const empty = () => new Float64Array(HOURS).fill(NaN);
  const series: HourSeries = {
    year: rows[0].year,
    line: new Int32Array(HOURS),
    ghi: empty(),
    dni: empty(),
    dhi: empty(),
    beamHorizontal: empty(),
    temperature: empty(),
    wind: empty(),
  };
  const leap: number[] = [];
  const twice: number[] = [];
  for (const row of rows) {
    const hour = hourOfYear(row, clock);
    if (hour === null) {
      leap.push(row.line);
      continue;
    }
    if (series.line[hour] > 0) {
      twice.push(row.line);
      continue;
    }
    series.line[hour] = row.line;
    for (const name of NAMES) series[name][hour] = row[name];
  }
  if (leap.length > 0) {
    findings.add(
      'note',
      'leap-day',
      'Hours of 29 February are left out: a weather year has 365 days.',
      leap,
    );
  }
  if (twice.length > 0) {
    findings.add(
      'refuse',
      'duplicate-hours',
      'Hours appear twice. Remove the second ones, or check the time column.',
      twice,
    );
  }
  return series;
}

/** Runs of hours without a value, as [first, length]. */
export function gapsIn(values: Float64Array): [number, number][] {
  const gaps: [number, number][] = [];
  for (let hour = 0; hour < values.length; hour += 1) {
    if (!Number.isNaN(values[hour])) continue;
    const first = hour;
    while (hour < values.length && Number.isNaN(values[hour])) hour += 1;
    gaps.push([first, hour - first]);
  }
  return gaps;
}

function fill(values: Float64Array, first: number, length: number): void {
  const before = values[(first - 1 + HOURS) % HOURS];
  const after = values[(first + length) % HOURS];
  for (let i = 0; i < length; i += 1) {
    values[first + i] = before + ((after - before) * (i + 1)) / (length + 1);
  }
}

const hourName = (hour: number): string => {
  const day = Math.floor(hour / 24);
  const month = MONTH_STARTS.findLastIndex((start) => start <= day);
  const date = day - MONTH_STARTS[month] + 1;
  const two = (value: number) => String(value).padStart(2, '0');
  return `${two(month + 1)}-${two(date)} ${two(hour % 24)}:00`;
};

/** Fill short gaps by straight lines, saying so; refuse longer ones by name. */
export function fillShortGaps(
  series: HourSeries,
  name: 'ghi' | 'dni' | 'dhi' | 'temperature' | 'wind',
  what: string,
  findings: Findings,
): void {
  const values = series[name];
  for (const [first, length] of gapsIn(values)) {
    if (length <= LONGEST_FILLED_GAP) {
      fill(values, first, length);
      findings.add(
        'warn',
        `filled-${name}`,
        `Missing hours of ${what} were filled by a straight line (at most ${LONGEST_FILLED_GAP} in a row).`,
        [Math.max(series.line[first], series.line[(first - 1 + HOURS) % HOURS])],
      );
    } else {
      findings.add(
        'refuse',
        `gap-${name}`,
        `${what}: ${length} hours are missing from ${hourName(first)} on. Fill them in the file, or use another year.`,
        [Math.max(series.line[(first - 1 + HOURS) % HOURS], 1)],
      );
    }
  }
}
