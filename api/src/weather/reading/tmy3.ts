import { NO_PLACE, numberOf, type FilePlace, type RawHour } from './raw-hour.js';

/** Header names of the typical-year CSV of the 1991-2005 US archive (public layout, TMY3). */
const NAMES = {
  ghi: 'GHI (W/m^2)',
  dni: 'DNI (W/m^2)',
  dhi: 'DHI (W/m^2)',
  temperature: 'Dry-bulb (C)',
  wind: 'Wspd (m/s)',
} as const;

const MISSING = -9900;

export const isTmy3 = (lines: string[]): boolean =>
  (lines[1] ?? '').startsWith('Date (MM/DD/YYYY),Time (HH:MM)');

/** Read a TMY3-layout file: two header lines, hour-ending local standard time (01:00 to 24:00). */
export function readTmy3(lines: string[]): {
  hours: RawHour[];
  place: FilePlace;
  broken: number[];
} {
  const station =
    lines[0].match(/("[^"]*"|[^,]*)(,|$)/g)?.map((cell) => cell.replace(/,$/, '')) ?? [];
  const place: FilePlace = {
    ...NO_PLACE,
    utcOffsetHours: numberOf(station[3]),
    latitude: numberOf(station[4]),
    longitude: numberOf(station[5]),
    elevationM: numberOf(station[6]),
  };
  const header = lines[1].split(',').map((name) => name.trim());
  const column = (name: string) => header.indexOf(name);
  const hours: RawHour[] = [];
  const broken: number[] = [];
  for (let i = 2; i < lines.length; i += 1) {
    if (lines[i].trim() === '') continue;
    const cells = lines[i].split(',');
    const date = /^(\d{1,2})\/(\d{1,2})\/(\d{4})$/.exec(cells[0]);
    const time = /^(\d{1,2}):(\d{2})$/.exec(cells[1] ?? '');
    if (!date || !time || cells.length < header.length) {
      broken.push(i + 1);
      continue;
    }
    const value = (name: string) => {
      const number = numberOf(cells[column(name)]);
      return number <= MISSING ? NaN : number;
    };
    hours.push({
      line: i + 1,
      month: Number(date[1]),
      day: Number(date[2]),
      year: Number(date[3]),
      hour: Number(time[1]),
      minute: Number(time[2]),
      ghi: value(NAMES.ghi),
      dni: value(NAMES.dni),
      dhi: value(NAMES.dhi),
      beamHorizontal: NaN,
      temperature: value(NAMES.temperature),
      wind: value(NAMES.wind),
    });
  }
  return { hours, place, broken };
}
