import { z } from 'zod';
import { Id, Instant, line, within } from './common.js';

/** What a column of an hourly file holds. */
export const WeatherQuantity = z.enum([
  'time',
  'date',
  'ghi',
  'dni',
  'dhi',
  'beamHorizontal',
  'temperature',
  'wind',
  'humidity',
  'pressure',
  'ignore',
]);
export type WeatherQuantity = z.infer<typeof WeatherQuantity>;

/** How the columns, units and clock of an hourly CSV are to be read. */
export const WeatherMapping = z.strictObject({
  delimiter: z.enum([',', ';', '\t', '|']),
  decimal: z.enum(['.', ',']),
  /** Lines above the first data row. */
  headerLines: z.int().min(0).max(100),
  columns: z
    .array(z.strictObject({ quantity: WeatherQuantity, unit: z.string().max(20) }))
    .min(2)
    .max(120),
  /** Does a stamp name the beginning or the end of its hour? */
  stamp: z.enum(['beginning', 'ending']),
  clock: z.enum(['utc', 'standard']),
  /** Hours east of UTC of local standard time. */
  utcOffsetHours: within('UTC offset', -12, 14, 'h'),
});
export type WeatherMapping = z.infer<typeof WeatherMapping>;

const place = {
  latitude: within('Latitude', -66, 66, 'degrees'),
  longitude: within('Longitude', -180, 180, 'degrees'),
  elevationM: within('Elevation', -430, 5000, 'm'),
};

const content = z
  .string()
  .min(1, 'The file is empty.')
  .max(12_000_000, 'The file is larger than 12 MB: give one year of hourly values.');

/** Ask how a file would be read; nothing is stored. */
export const WeatherPreviewRequest = z.strictObject({
  fileName: line('File name', 200),
  content,
  mapping: WeatherMapping.nullable().default(null),
  latitude: place.latitude.nullable().default(null),
  longitude: place.longitude.nullable().default(null),
});
export type WeatherPreviewRequest = z.input<typeof WeatherPreviewRequest>;

export const WeatherFinding = z.object({
  severity: z.enum(['refuse', 'warn', 'note']),
  code: z.string(),
  message: z.string(),
  /** Line numbers in the file (first ones), 1-based. */
  rows: z.array(z.int()),
  count: z.int(),
});
export type WeatherFinding = z.infer<typeof WeatherFinding>;

export const WeatherSummary = z.object({
  hours: z.int(),
  year: z.int(),
  ghiKwhM2: z.number(),
  diffuseShare: z.number(),
  meanTemperatureC: z.number().nullable(),
  /** Mean daily global radiation by month, MJ m-2 d-1. */
  monthlyMjM2: z.array(z.number()).length(12),
});
export type WeatherSummary = z.infer<typeof WeatherSummary>;

export const WeatherPreview = z.object({
  format: z.enum(['epw', 'tmy3', 'csv']),
  /** Needed for the csv format; the reader's best guess when none was given. */
  mapping: WeatherMapping.nullable(),
  headers: z.array(z.string()),
  /** First data rows as text. */
  sample: z.array(z.array(z.string())),
  latitude: z.number().nullable(),
  longitude: z.number().nullable(),
  elevationM: z.number().nullable(),
  utcOffsetHours: z.number().nullable(),
  findings: z.array(WeatherFinding),
  /** Null while the file cannot be read completely. */
  summary: WeatherSummary.nullable(),
});
export type WeatherPreview = z.infer<typeof WeatherPreview>;

/** Store a file as a weather year. */
export const WeatherUpload = z.strictObject({
  kind: z.literal('file'),
  name: line('Name'),
  fileName: line('File name', 200),
  content,
  mapping: WeatherMapping.nullable().default(null),
  ...place,
});

/** Build a year from twelve monthly means when there is no file. */
export const WeatherFromClimate = z.strictObject({
  kind: z.literal('climate'),
  name: line('Name'),
  ...place,
  utcOffsetHours: within('UTC offset', -12, 14, 'h'),
  /** Mean daily global radiation by month, MJ m-2 d-1. */
  monthlyMjM2: z.array(within('Monthly radiation', 0.2, 40, 'MJ m-2 d-1')).length(12),
  monthlyMinC: z.array(within('Mean minimum temperature', -50, 45, '°C')).length(12),
  monthlyMaxC: z.array(within('Mean maximum temperature', -45, 55, '°C')).length(12),
  source: line('Source', 300),
});

/** Cloudless sky all year: an upper bound, said so wherever it is used. */
export const WeatherClearSky = z.strictObject({
  kind: z.literal('clear-sky'),
  name: line('Name'),
  ...place,
  utcOffsetHours: within('UTC offset', -12, 14, 'h'),
});

export const WeatherInput = z.discriminatedUnion('kind', [
  WeatherUpload,
  WeatherFromClimate,
  WeatherClearSky,
]);
export type WeatherInput = z.input<typeof WeatherInput>;

/** A stored weather year. */
export const Weather = z.object({
  id: Id,
  kind: z.enum(['file', 'climate', 'clear-sky']),
  name: z.string(),
  ...place,
  utcOffsetHours: z.number(),
  source: z.string(),
  fileName: z.string().nullable(),
  findings: z.array(WeatherFinding),
  summary: WeatherSummary,
  createdAt: Instant,
});
export type Weather = z.infer<typeof Weather>;
export const WeatherList = z.object({ items: z.array(Weather) });
export type WeatherList = z.infer<typeof WeatherList>;

/** The hours of a stored year, as the engine reads them (light/weather-year). */
export const HourlyYearAnswer = z.object({
  year: z.int(),
  utcOffsetHours: z.number(),
  intervalMinutes: z.literal(60),
  ghi: z.array(z.number()),
  dni: z.array(z.number()),
  dhi: z.array(z.number()),
  temperatureC: z.array(z.number()),
  windMs: z.array(z.number()),
});
