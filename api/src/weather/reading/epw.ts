import { NO_PLACE, numberOf, type FilePlace, type RawHour } from './raw-hour.js';

/** Lines above the data, and columns, of the EnergyPlus weather layout (open format). */
const HEADER_LINES = 8;
const COLUMNS = 35;

/** Column (from 0) and the code at or above which a value is missing. */
const FIELDS = {
  temperature: { column: 6, missing: 99.9 },
  ghi: { column: 13, missing: 9999 },
  dni: { column: 14, missing: 9999 },
  dhi: { column: 15, missing: 9999 },
  wind: { column: 21, missing: 999 },
} as const;

export const isEpw = (lines: string[]): boolean => lines[0]?.toUpperCase().startsWith('LOCATION,');

/** Offset the maker states for its radiation, hours, from the comment lines; null where none is. */
export function statedOffsetHours(lines: string[]): number | null {
  const match = /irradiance time offset \(h\)\s*:\s*(-?\d+(?:\.\d+)?)/i.exec(
    lines.slice(0, HEADER_LINES).join('\n'),
  );
  return match ? Number(match[1]) : null;
}

/**
 * Read an EPW file: hour-ending local standard time, one line an hour.
 *
 * @returns rows, place, and the lines that do not have 35 columns
 */
export function readEpw(lines: string[]): { hours: RawHour[]; place: FilePlace; broken: number[] } {
  const location = lines[0].split(',');
  const place: FilePlace = {
    ...NO_PLACE,
    latitude: nullable(numberOf(location[6])),
    longitude: nullable(numberOf(location[7])),
    utcOffsetHours: nullable(numberOf(location[8])),
    elevationM: nullable(numberOf(location[9])),
  };
  const hours: RawHour[] = [];
  const broken: number[] = [];
  for (let i = HEADER_LINES; i < lines.length; i += 1) {
    if (lines[i].trim() === '') continue;
    const cells = lines[i].split(',');
    if (cells.length < COLUMNS) {
      broken.push(i + 1);
      continue;
    }
    const value = ({ column, missing }: { column: number; missing: number }) => {
      const number = numberOf(cells[column]);
      return number >= missing ? NaN : number;
    };
    hours.push({
      line: i + 1,
      year: numberOf(cells[0]),
      month: numberOf(cells[1]),
      day: numberOf(cells[2]),
      hour: numberOf(cells[3]),
      minute: 0,
      ghi: value(FIELDS.ghi),
      dni: value(FIELDS.dni),
      dhi: value(FIELDS.dhi),
      beamHorizontal: NaN,
      temperature: value(FIELDS.temperature),
      wind: value(FIELDS.wind),
    });
  }
  return { hours, place, broken };
}

const nullable = (value: number): number | null => (Number.isNaN(value) ? null : value);
