import { readFileSync } from 'node:fs';
import path from 'node:path';

const DEMO = path.resolve(
  import.meta.dirname,
  '../../../demo-data/weather/lindental-typical-year.csv',
);

export const PLACE = { latitude: 48.62, longitude: 12.93, elevationM: 350 };

/** The demo's weather file: semicolons, decimal commas, hour-ending, UTC+1. Line 3 is the first hour. */
export const demoLines = (): string[] => readFileSync(DEMO, 'utf8').trimEnd().split(/\r?\n/);

/** The demo file with each data line changed. */
export function changed(change: (cells: string[], hour: number) => string[] | null): string {
  const [title, head, ...rows] = demoLines();
  const kept = rows.flatMap((row, hour) => {
    const cells = change(row.split(';'), hour);
    return cells ? [cells.join(';')] : [];
  });
  return [title, head, ...kept].join('\n');
}

const decimal = (text: string) => Number(text.replace(',', '.'));

/** The demo's hours in the open EPW layout (35 columns). */
export function asEpw(): string {
  const { latitude, longitude, elevationM } = PLACE;
  const head = [
    `LOCATION,Lindental,-,-,made up,0,${latitude},${longitude},1.0,${elevationM}`,
    ...Array<string>(7).fill('-'),
  ];
  const rows = demoLines()
    .slice(2)
    .map((line) => {
      const [date, time, ghi, dni, dhi, temperature, wind, humidity] = line.split(';');
      const [day, month, year] = date.split('.').map(Number);
      const hour = Number(time.split(':')[0]) || 24;
      const cells = Array<string | number>(35).fill(0);
      const fields = { 0: year, 1: month, 2: day, 3: hour, 4: 0, 5: 'C', 6: decimal(temperature) };
      Object.assign(cells, fields, { 8: humidity, 9: 97000, 13: ghi, 14: dni, 15: dhi });
      cells[21] = decimal(wind);
      return cells.join(',');
    });
  return [...head, ...rows].join('\r\n');
}
