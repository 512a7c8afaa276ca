import type { WeatherMapping, WeatherQuantity } from '@furrowlight/shared/contract/weather';
import { CsvError, parse } from 'csv-parse/sync';
import { invalid } from '../../common/domain-error.js';
import { parseStamp } from './stamp.js';
import { numberOf, type RawHour } from './raw-hour.js';
import { toOwnUnit, unitInHeader } from './units.js';

const DELIMITERS = [';', '\t', ',', '|'] as const;
/** Lines looked at to guess the layout. */
const LOOK = 60;

/** Fewest and most columns a table of hours has. */
const COLUMNS = { least: 2, most: 120 };

const noTable = () =>
  invalid({
    path: 'content',
    message:
      'This does not look like a table of hours. Give an EPW file, or a CSV with a time column and one line an hour.',
  });

/** @throws DomainError invalid-input naming the content, where the text is no table at all */
export function cellsOf(text: string, delimiter: string): string[][] {
  try {
    return parse(text, {
      delimiter,
      relax_column_count: true,
      relax_quotes: true,
      skip_empty_lines: false,
      trim: true,
      bom: true,
    });
  } catch (error) {
    if (error instanceof CsvError) throw noTable();
    throw error;
  }
}

const isNumeric = (cell: string) => /^[-+]?\d+([.,]\d+)?([eE][-+]?\d+)?$/.test(cell);

/** The delimiter that cuts most lines into the same, largest number of cells. */
function guessDelimiter(lines: string[]): WeatherMapping['delimiter'] {
  const scores = DELIMITERS.map((delimiter) => {
    const counts = lines.slice(-LOOK / 2).map((line) => line.split(delimiter).length);
    const usual = counts.sort((a, b) => a - b)[Math.floor(counts.length / 2)] ?? 1;
    return { delimiter, usual };
  });
  return scores.reduce((best, next) => (next.usual > best.usual ? next : best)).delimiter;
}

const NAMES: [WeatherQuantity, RegExp][] = [
  ['dni', /direct.?normal|\bdni\b|gb\(n\)|beam.?normal|normal.?direct/i],
  ['dhi', /diffuse|\bdhi\b|gd\(h\)|diffus/i],
  ['beamHorizontal', /direct.?(radiation|horizontal)|\bbhi\b|\bebh\b|gb\(h\)|beam.?horizontal/i],
  ['ghi', /global|\bghi\b|g\(h\)|shortwave|short.?wave|solar|globalstrahlung|rayonnement/i],
  ['temperature', /temp|t2m|dry.?bulb|lufttemp|tair|\bta\b/i],
  ['wind', /wind.?(speed|geschw)|\bws|wspd|^wind(?!.*dir)/i],
  ['humidity', /humid|\brh|feuchte/i],
  ['pressure', /press|\bsp\b|druck/i],
  ['date', /^date|^datum|^day$/i],
  ['time', /^time|^zeit|^uhrzeit|hour|timestamp|date.?time/i],
];

function quantityOf(header: string, sample: string): WeatherQuantity {
  const named = NAMES.find(([, pattern]) => pattern.test(header))?.[0];
  if (named === 'date' || named === 'time') {
    // A column called "date" that also holds the hour is the whole stamp.
    return /\d[ T:]\d{1,2}[:.]?\d{2}/.test(sample) && /\d{4}|\d{2}\.\d{2}/.test(sample)
      ? 'time'
      : named;
  }
  return named ?? 'ignore';
}

/** First line whose cells are mostly numbers or stamps. */
function guessHeaderLines(rows: string[][]): number {
  const index = rows.findIndex((row) => {
    const filled = row.filter((cell) => cell !== '');
    const numbers = filled.filter(isNumeric).length;
    return filled.length >= 2 && numbers >= Math.max(1, filled.length - 2);
  });
  return Math.max(index, 0);
}

/**
 * Best guess of how a general hourly CSV is to be read. The caller shows it for correction.
 *
 * @param utcOffsetHours standard time of the place, hours east of UTC
 * @throws DomainError invalid-input naming the content, where there are no columns to guess
 */
export function guessMapping(lines: string[], utcOffsetHours: number): WeatherMapping {
  const delimiter = guessDelimiter(lines.slice(0, LOOK));
  const rows = cellsOf(lines.slice(0, LOOK).join('\n'), delimiter);
  const headerLines = guessHeaderLines(rows);
  const width = rows[headerLines]?.length ?? 0;
  if (width < COLUMNS.least || width > COLUMNS.most) throw noTable();
  const names = headersOf(rows, headerLines, width);
  const sample = rows[headerLines] ?? [];
  const decimal =
    delimiter !== ',' &&
    rows.slice(headerLines).some((row) => row.some((cell) => /^-?\d+,\d+$/.test(cell)))
      ? ','
      : '.';
  const columns = names.map((name, i) => {
    const quantity = quantityOf(name, sample[i] ?? '');
    return { quantity, unit: unitInHeader(quantity, name) };
  });
  const heading = lines.slice(0, headerLines).join(' ');
  const stamp = /hour.?ending|period.?end|preceding/i.test(heading) ? 'ending' : 'beginning';
  const clock = /\butc\b(?![+-]?\d)|gmt/i.test(names.join(' ')) ? 'utc' : 'standard';
  return { delimiter, decimal, headerLines, columns, stamp, clock, utcOffsetHours };
}

/** Names of the columns: the last full header line, or none. */
export function headersOf(rows: string[][], headerLines: number, width: number): string[] {
  const heading = rows
    .slice(0, headerLines)
    .reverse()
    .find((row) => row.filter((cell) => cell !== '').length >= Math.max(2, width - 1));
  return Array.from({ length: width }, (_, i) => heading?.[i] ?? '');
}

/** Read a general CSV by its mapping. Rows without a stamp are reported by line. */
export function readCsv(lines: string[], mapping: WeatherMapping) {
  const rows = cellsOf(lines.join('\n'), mapping.delimiter);
  const at = (quantity: WeatherQuantity) =>
    mapping.columns.findIndex((column) => column.quantity === quantity);
  const timeColumn = at('time');
  const dateColumn = at('date');
  const hours: RawHour[] = [];
  const broken: number[] = [];
  for (let i = mapping.headerLines; i < rows.length; i += 1) {
    const row = rows[i];
    if (row.every((cell) => cell === '')) continue;
    const text = [dateColumn >= 0 ? row[dateColumn] : '', timeColumn >= 0 ? row[timeColumn] : '']
      .join(' ')
      .trim();
    const stamp = parseStamp(text);
    if (!stamp) {
      broken.push(i + 1);
      continue;
    }
    const value = (quantity: WeatherQuantity) => {
      const column = at(quantity);
      if (column < 0) return NaN;
      const number = numberOf(row[column], mapping.decimal);
      return number <= -999 || number >= 99_990
        ? NaN
        : toOwnUnit(quantity, mapping.columns[column].unit, number);
    };
    hours.push({
      line: i + 1,
      ...stamp,
      ghi: value('ghi'),
      dni: value('dni'),
      dhi: value('dhi'),
      beamHorizontal: value('beamHorizontal'),
      temperature: value('temperature'),
      wind: value('wind'),
    });
  }
  return { hours, broken, rows };
}
