import { z } from 'zod';
import type { HourlyYear } from '../light/weather-year.js';
import { Id, Instant, within } from './common.js';
import { ShadeClass } from './crops.js';
import { Layout } from './layout.js';

/** The place as the engine needs it. Degrees and metres. */
export const Site = z.strictObject({
  latitude: within('Latitude', -66, 66, 'degrees'),
  longitude: within('Longitude', -180, 180, 'degrees'),
  elevationM: within('Elevation', -430, 5000, 'm'),
  slopePercent: within('Slope', 0, 60, '%'),
  aspectDeg: within('Aspect', 0, 360, 'degrees'),
  albedo: within('Albedo', 0.05, 0.9),
});
export type Site = z.infer<typeof Site>;

/** A weighted light window of a crop; dates are days of the run's own year and may cross New Year. */
export const CropStage = z.strictObject({
  label: z.string(),
  /** 0-based day of year of the first day, and number of days. */
  firstDay: z.int().min(0).max(365),
  days: z.int().min(1).max(366),
  weight: z.number().min(0),
  critical: z.boolean(),
  note: z.string(),
});

/** What the light-use equation needs: g MJ-1 of PAR, extinction coefficient, largest leaf area. */
export const CropLightUse = z.strictObject({
  lightUseGPerMj: within('Light use', 0.1, 15, 'g/MJ'),
  extinction: within('Extinction coefficient', 0.05, 2),
  leafAreaMax: within('Largest leaf area', 0.1, 15),
});

export const RunCrop = z.strictObject({
  seasonId: z.string(),
  cropId: z.string(),
  cropName: z.string(),
  shadeClass: ShadeClass,
  canopyHeightM: within('Canopy height', 0, 8, 'm'),
  firstDay: z.int().min(0).max(365),
  days: z.int().min(1).max(366),
  stages: z.array(CropStage).max(20),
  /** Left out where the crop table has no such values. */
  lightUse: CropLightUse.optional(),
});
export type RunCrop = z.infer<typeof RunCrop>;

export const RunOptions = z.strictObject({
  /** Strips of ground across one pitch. */
  positions: z.int().min(10).max(400),
  sunStepMinutes: z.union([z.literal(5), z.literal(10), z.literal(15), z.literal(30)]),
  sky: z.enum(['isotropic', 'hay-davies']),
});
export type RunOptions = z.infer<typeof RunOptions>;

/** Everything but the weather's hours; this is what a scenario freezes. */
export const FrozenInput = z.strictObject({
  site: Site,
  layout: Layout,
  crops: z.array(RunCrop).max(12),
  options: RunOptions,
  /** SHA-256 of the stored weather year. */
  weatherHash: z.string(),
});
export type FrozenInput = z.infer<typeof FrozenInput>;

/** Input of the conductor. */
export type RunInput = Omit<FrozenInput, 'weatherHash'> & { weather: HourlyYear };

export const RunStatus = z.enum(['queued', 'running', 'done', 'failed', 'cancelled']);
export type RunStatus = z.infer<typeof RunStatus>;

/** One run of a scenario, as the client follows it. */
export const Run = z.object({
  id: Id,
  scenarioId: Id,
  status: RunStatus,
  /** 0-1. */
  progress: z.number(),
  /** What failed and what to do, in one sentence; null unless failed. */
  problem: z.string().nullable(),
  modelVersion: z.string(),
  inputHash: z.string(),
  createdAt: Instant,
  startedAt: Instant.nullable(),
  finishedAt: Instant.nullable(),
});
export type Run = z.infer<typeof Run>;
