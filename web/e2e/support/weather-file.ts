import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';

const root = path.resolve(import.meta.dirname, '../../..');
const reference = path.resolve(
  process.env.FURROWLIGHT_REFERENCE ?? path.join(root, '../shared/reference'),
);
const real = path.join(reference, 'weather/hourly_45N_8E.epw');

/** The demo's invented year in the EPW layout, for machines without the reference folder. */
function demoAsEpw(): string {
  const csv = readFileSync(
    path.join(root, 'demo-data/weather/lindental-typical-year.csv'),
    'utf8',
  ).trim();
  const head = [
    'LOCATION,Lindental,-,-,invented,0,48.62,12.93,1,350',
    'DESIGN CONDITIONS,0',
    'TYPICAL/EXTREME PERIODS,0',
    'GROUND TEMPERATURES,0',
    'HOLIDAYS/DAYLIGHT SAVING,No,0,0,0',
    'COMMENTS 1,invented for the demo',
    'COMMENTS 2,',
    'DATA PERIODS,1,1,Data,Wednesday, 1/ 1,12/31',
  ];
  const rows = csv
    .split('\n')
    .slice(2)
    .map((line, i) => {
      const [, , ghi, dni, dhi, celsius, wind, humidity] = line
        .trim()
        .replaceAll(',', '.')
        .split(';');
      const date = new Date(Date.UTC(2025, 0, 1) + i * 3_600_000);
      const cells = new Array<string>(35).fill('0');
      cells.splice(
        0,
        6,
        '2025',
        String(date.getUTCMonth() + 1),
        String(date.getUTCDate()),
        String(date.getUTCHours() + 1),
        '0',
        '?',
      );
      cells[6] = celsius;
      cells[8] = humidity;
      cells[13] = ghi;
      cells[14] = dni;
      cells[15] = dhi;
      cells[21] = wind;
      return cells.join(',');
    });
  return [...head, ...rows].join('\n');
}

/** A whole year in the EPW layout: a real one where the reference folder is there. */
export function epwFile(): { name: string; content: string; isReal: boolean } {
  return existsSync(real)
    ? { name: path.basename(real), content: readFileSync(real, 'utf8'), isReal: true }
    : { name: 'lindental.epw', content: demoAsEpw(), isReal: false };
}
