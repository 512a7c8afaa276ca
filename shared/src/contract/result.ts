import { z } from 'zod';
import { Id } from './common.js';

/**
 * Light of one period at canopy top. DLI in mol m-2 d-1 (mean over the period's days), shares of
 * open field 0-1. Darkest and brightest are the mean of the darkest and brightest tenth of the
 * positions across the pitch, ranked by the period's own sum.
 */
export const PeriodBudget = z.object({
  label: z.string(),
  /** Day of year, 0-based, of the first day; `days` may run over New Year. */
  firstDay: z.int(),
  days: z.int(),
  openDli: z.number(),
  meanDli: z.number(),
  darkestDli: z.number(),
  brightestDli: z.number(),
  meanShare: z.number(),
  darkestShare: z.number(),
  brightestShare: z.number(),
  /** Darkest position over mean, 0-1. */
  evenness: z.number(),
  /** Red to far-red photon ratio, mean under the rows and in open field. */
  redFarRed: z.number(),
  redFarRedOpen: z.number(),
});
export type PeriodBudget = z.infer<typeof PeriodBudget>;

/** Where 100 units of sunlight on the land go. The five parts sum to 100. */
export const SunSplit = z.object({
  label: z.string(),
  /** Sunlight on one square metre of land, MJ m-2 over the period. */
  incomingMjM2: z.number(),
  electricity: z.number(),
  panelHeat: z.number(),
  reflected: z.number(),
  cropPar: z.number(),
  otherOnCrop: z.number(),
});
export type SunSplit = z.infer<typeof SunSplit>;

export const MonthEnergy = z.object({
  month: z.int().min(1).max(12),
  kwhPerKwp: z.number(),
});

export const Energy = z.object({
  /** AC energy per rated DC power, kWh per kWp and year. */
  kwhPerKwp: z.number(),
  /** AC energy per land area of the endless array, kWh m-2 and year. */
  kwhPerM2Land: z.number(),
  monthly: z.array(MonthEnergy).length(12),
  /** Share of energy owed to the rear face, %. */
  bifacialGainPercent: z.number(),
  /** Energy lost to row-to-row shade, temperature, incidence angle, inverter limit, %. */
  rowShadeLossPercent: z.number(),
  temperatureLossPercent: z.number(),
  incidenceLossPercent: z.number(),
  clippingLossPercent: z.number(),
  /** Against the same tracker without its crop-first programme, %; null where it has none. */
  cropFirstCostPercent: z.number().nullable(),
  /** PAR gained at the lowest canopy on the programme's days, % of that tracker's; null without one. */
  cropFirstGainPercent: z.number().nullable().default(null),
});
export type Energy = z.infer<typeof Energy>;

/** Light at one canopy height. */
export const Plane = z.object({
  heightM: z.number(),
  /** DLI by week (rows, 7 days from 1 January, last week shorter) and position, mol m-2 d-1. */
  weekly: z.array(z.array(z.number())),
  /** Whole-year DLI mean by position, mol m-2 d-1. */
  yearDli: z.array(z.number()),
  /** By day of year, mol m-2 d-1. */
  dailyMean: z.array(z.number()),
  dailyDarkest: z.array(z.number()),
  dailyBrightest: z.array(z.number()),
  weeks: z.array(PeriodBudget),
  months: z.array(PeriodBudget).length(12),
  /** Meteorological seasons: winter, spring, summer, autumn. */
  seasons: z.array(PeriodBudget).length(4),
  year: PeriodBudget,
});
export type Plane = z.infer<typeof Plane>;

/** Relative yield as a range; null with a reason where evidence ends. */
export const YieldRange = z.object({
  low: z.number().nullable(),
  high: z.number().nullable(),
  /** Shade taken, 1 - share of open field in the crop's own window. */
  shade: z.number(),
  basis: z.string(),
});

/** One crop's light between sowing and harvest. */
export const CropBudget = z.object({
  seasonId: z.string(),
  cropId: z.string(),
  cropName: z.string(),
  planeIndex: z.int(),
  season: PeriodBudget,
  stages: z.array(
    z.object({ budget: PeriodBudget, weight: z.number(), critical: z.boolean(), note: z.string() }),
  ),
  yield: YieldRange,
  /** Biomass by light use over that in open field, a second opinion; null without crop values. */
  relativeBiomass: z.number().nullable().default(null),
  /** Reference evapotranspiration (FAO-56) over the season, mm; null without temperature. */
  et0OpenMm: z.number().nullable(),
  et0ShadedMm: z.number().nullable(),
});
export type CropBudget = z.infer<typeof CropBudget>;

/** What a run found. All values modelled. */
export const RunResult = z.object({
  modelVersion: z.string(),
  /** Distance from a row's centre line, m, at the middle of each strip of ground. */
  positionsM: z.array(z.number()),
  pitchM: z.number(),
  /** First calendar day of the weather year, for labels. */
  year: z.int(),
  openDaily: z.array(z.number()),
  openWeekly: z.array(z.number()),
  planes: z.array(Plane).min(1),
  crops: z.array(CropBudget),
  sunSplit: z.object({ year: SunSplit, months: z.array(SunSplit).length(12) }),
  energy: Energy,
  /** Plain sentences on what was assumed and where the numbers end. */
  notes: z.array(z.string()),
});
export type RunResult = z.infer<typeof RunResult>;

/** A finished result with the stamps that let anyone make it again. */
export const ScenarioResult = z.object({
  scenarioId: Id,
  runId: Id,
  inputHash: z.string(),
  finishedAt: z.iso.datetime(),
  durationMs: z.number(),
  result: RunResult,
});
export type ScenarioResult = z.infer<typeof ScenarioResult>;
