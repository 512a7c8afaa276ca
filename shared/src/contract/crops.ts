import { z } from 'zod';
import { MonthDay } from './common.js';

/** How far a value can be trusted: A read in the source, B from memory of it, C common practice, D weak, X computed here. */
export const Certainty = z.string();

export const ShadeClass = z.enum(['benefiting', 'tolerant', 'susceptible', 'unknown']);
export type ShadeClass = z.infer<typeof ShadeClass>;

/** A row of the crop table. Blank values are null, never zero. */
export const Crop = z.object({
  id: z.string(),
  name: z.string(),
  latin: z.string(),
  group: z.string(),
  shadeClass: ShadeClass,
  photosynthesis: z.string(),
  dliMinMol: z.number().nullable(),
  dliGoodLowMol: z.number().nullable(),
  dliGoodHighMol: z.number().nullable(),
  dliSource: z.string(),
  dliCertainty: Certainty,
  baseTemperatureC: z.number().nullable(),
  lightUseGPerMj: z.number().nullable(),
  extinction: z.number().nullable(),
  leafAreaMax: z.number().nullable(),
  parameterSource: z.string(),
  parameterCertainty: Certainty,
  cropCoefficientMid: z.number().nullable(),
  designHeightM: z.number().nullable(),
  sowFrom: MonthDay.nullable(),
  sowTo: MonthDay.nullable(),
  harvestFrom: MonthDay.nullable(),
  harvestTo: MonthDay.nullable(),
  seasonSource: z.string(),
  criticalBbch: z.string(),
  criticalNote: z.string(),
  criticalSource: z.string(),
  criticalCertainty: Certainty,
  trialPoints: z.string(),
  trialSource: z.string(),
  notes: z.string(),
});
export type Crop = z.infer<typeof Crop>;
export const CropList = z.object({ items: z.array(Crop) });
