import { z } from 'zod';
import { Id, Instant, line, Version } from './common.js';

export const FarmInput = z.strictObject({
  name: line('Farm name'),
  /** Person who farms it, as written on letters. */
  holder: line('Holder'),
  farmNumber: z.string().trim().max(40).default(''),
  place: z.string().trim().max(120).default(''),
  /** Advisor in charge; null when nobody is yet. */
  advisorId: Id.nullable().default(null),
  notes: z.string().max(4000).default(''),
});
export type FarmInput = z.input<typeof FarmInput>;
export const FarmPatch = z.strictObject({
  name: FarmInput.shape.name.optional(),
  holder: FarmInput.shape.holder.optional(),
  farmNumber: z.string().trim().max(40).optional(),
  place: z.string().trim().max(120).optional(),
  advisorId: Id.nullable().optional(),
  notes: z.string().max(4000).optional(),
});
export type FarmPatch = z.infer<typeof FarmPatch>;

export const Farm = z.object({
  id: Id,
  version: Version,
  name: z.string(),
  holder: z.string(),
  farmNumber: z.string(),
  place: z.string(),
  advisorId: Id.nullable(),
  advisorName: z.string().nullable(),
  notes: z.string(),
  fieldCount: z.int(),
  areaM2: z.number(),
  updatedAt: Instant,
});
export type Farm = z.infer<typeof Farm>;
export const FarmList = z.object({ items: z.array(Farm) });
export type FarmList = z.infer<typeof FarmList>;
