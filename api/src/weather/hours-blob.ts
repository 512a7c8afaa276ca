import { createHash } from 'node:crypto';
import { gunzipSync, gzipSync } from 'node:zlib';
import type { HourlyYear } from '@furrowlight/shared/light/weather-year';

/** A weather year as it is kept in the database. */
export const packYear = (year: HourlyYear): Buffer => gzipSync(JSON.stringify(year));

export const unpackYear = (blob: Buffer): HourlyYear =>
  JSON.parse(gunzipSync(blob).toString('utf8')) as HourlyYear;

/** SHA-256 over the hours and the place they are for. */
export function hashYear(year: HourlyYear, latitude: number, longitude: number): string {
  return createHash('sha256')
    .update(JSON.stringify([latitude, longitude, year]))
    .digest('hex');
}
