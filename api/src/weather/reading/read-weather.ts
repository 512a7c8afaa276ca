import type {
  WeatherMapping,
  WeatherPreview,
  WeatherSummary,
} from '@furrowlight/shared/contract/weather';
import type { HourlyYear } from '@furrowlight/shared/light/weather-year';
import { completeYear } from './complete.js';
import { cellsOf, guessMapping, headersOf, readCsv } from './csv.js';
import { isEpw, readEpw, statedOffsetHours } from './epw.js';
import { Findings } from './findings.js';
import { placeHours, type Clock } from './hours.js';
import { NO_PLACE, type FilePlace, type RawHour } from './raw-hour.js';
import { sunTable } from './sun-table.js';
import { isTmy3, readTmy3 } from './tmy3.js';

const SAMPLE_ROWS = 6;
const DAYS = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

/** A place given by the person uploading; nulls where the file is to say it. */
export interface GivenPlace {
  latitude: number | null;
  longitude: number | null;
}

/** What was read: the preview to show, and the year when it can be used. */
export interface WeatherReading {
  preview: WeatherPreview;
  year: HourlyYear | null;
}

interface Parsed {
  format: WeatherPreview['format'];
  hours: RawHour[];
  broken: number[];
  place: FilePlace;
  clock: Clock;
  mapping: WeatherMapping | null;
  headers: string[];
  sample: string[][];
}

function parseFile(
  lines: string[],
  mapping: WeatherMapping | null,
  longitude: number | null,
): Parsed {
  const ending = { stamp: 'ending', clock: 'standard' } as const;
  if (isEpw(lines) || isTmy3(lines)) {
    const format = isEpw(lines) ? 'epw' : 'tmy3';
    const { hours, place, broken } = format === 'epw' ? readEpw(lines) : readTmy3(lines);
    const first = format === 'epw' ? 8 : 2;
    return {
      format,
      hours,
      broken,
      place,
      clock: { ...ending, utcOffsetHours: place.utcOffsetHours ?? 0 },
      mapping: null,
      headers: format === 'tmy3' ? lines[1].split(',') : [],
      sample: lines.slice(first, first + SAMPLE_ROWS).map((line) => line.split(',')),
    };
  }
  const used = mapping ?? guessMapping(lines, Math.round((longitude ?? 0) / 15));
  const { hours, broken } = readCsv(lines, used);
  const top = cellsOf(lines.slice(0, used.headerLines + SAMPLE_ROWS).join('\n'), used.delimiter);
  return {
    format: 'csv',
    hours,
    broken,
    place: { ...NO_PLACE, utcOffsetHours: used.utcOffsetHours },
    clock: used,
    mapping: used,
    headers: headersOf(top, used.headerLines, used.columns.length),
    sample: top.slice(used.headerLines),
  };
}

/** Yearly and monthly sums a person can check at a glance. */
export function summarise(year: HourlyYear): WeatherSummary {
  const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
  let hour = 0;
  const monthlyMjM2 = DAYS.map((days) => {
    const part = sum(year.ghi.slice(hour, hour + days * 24));
    hour += days * 24;
    return (part * 0.0036) / days;
  });
  const global = sum(year.ghi);
  return {
    hours: year.ghi.length,
    year: year.year,
    ghiKwhM2: global / 1000,
    diffuseShare: global > 0 ? sum(year.dhi) / global : 0,
    meanTemperatureC: sum(year.temperatureC) / year.temperatureC.length,
    monthlyMjM2,
  };
}

/**
 * Read a weather file as far as it goes.
 *
 * @param content text of the file
 * @param mapping how to read a general CSV; null guesses
 * @param given place typed by the person; a file that states its own place is held against it
 */
export function readWeather(
  content: string,
  mapping: WeatherMapping | null,
  given: GivenPlace,
): WeatherReading {
  const lines = content.replace(/^\uFEFF/, '').split(/\r\n|\n|\r/);
  const findings = new Findings();
  const parsed = parseFile(lines, mapping, given.longitude);
  if (parsed.broken.length > 0) {
    const some = parsed.broken.length > parsed.hours.length * 0.01;
    findings.add(
      some ? 'refuse' : 'warn',
      'unreadable-rows',
      some
        ? 'Rows could not be read: the file may be cut off, or the mapping is wrong.'
        : 'Some rows could not be read and were left out.',
      parsed.broken,
    );
  }
  const latitude = given.latitude ?? parsed.place.latitude;
  const longitude = given.longitude ?? parsed.place.longitude;
  comparePlaces(parsed.place, given, findings);
  const stated = parsed.format === 'epw' ? statedOffsetHours(lines) : null;
  if (stated !== null && Math.abs(stated) >= 0.25) {
    findings.add(
      'note',
      'stated-offset',
      `The file's maker states that its radiation is offset by ${stated} hours from the hour's own sun.`,
    );
  }
  let year: HourlyYear | null = null;
  if (latitude === null || longitude === null) {
    findings.add(
      'refuse',
      'no-place',
      'The file does not say where it is from: type latitude and longitude.',
    );
  } else {
    const series = placeHours(parsed.hours, parsed.clock, findings);
    const { utcOffsetHours } = parsed.clock;
    if (series && !findings.refused) {
      const sun = sunTable(series.year, latitude, longitude, utcOffsetHours);
      year = completeYear(series, { latitude, longitude, utcOffsetHours }, sun, findings);
    }
  }
  const refused = findings.refused;
  return {
    preview: {
      format: parsed.format,
      mapping: parsed.mapping,
      headers: parsed.headers,
      sample: parsed.sample,
      latitude,
      longitude,
      elevationM: parsed.place.elevationM,
      utcOffsetHours: parsed.clock.utcOffsetHours,
      findings: findings.list(),
      summary: year && !refused ? summarise(year) : null,
    },
    year: refused ? null : year,
  };
}

/** Degrees between the file's place and the typed one above which a mistake is likely (about 55 km). */
const FAR_DEGREES = 0.5;

function comparePlaces(file: FilePlace, given: GivenPlace, findings: Findings): void {
  if (file.latitude === null || file.longitude === null) return;
  if (given.latitude === null || given.longitude === null) return;
  const apart = Math.max(
    Math.abs(file.latitude - given.latitude),
    Math.abs(file.longitude - given.longitude),
  );
  if (apart < FAR_DEGREES) return;
  findings.add(
    'warn',
    'other-place',
    `The file is from ${file.latitude.toFixed(2)} N, ${file.longitude.toFixed(2)} E, not from the place you gave.`,
  );
}
