import { z } from 'zod';
import { Id, Instant, line, Version } from './common.js';
import { Layout } from './layout.js';
import { FrozenInput, Run } from './run.js';

export const ScenarioInput = z.strictObject({
  fieldId: Id,
  name: line('Scenario name'),
  weatherId: Id.nullable().default(null),
  layout: Layout,
  notes: z.string().max(4000).default(''),
});
export type ScenarioInput = z.input<typeof ScenarioInput>;

/** Layout and weather can change only while the scenario has no finished run; copy it after that. */
export const ScenarioPatch = z.strictObject({
  name: line('Scenario name').optional(),
  weatherId: Id.nullable().optional(),
  layout: Layout.optional(),
  notes: z.string().max(4000).optional(),
  archived: z.boolean().optional(),
});
export type ScenarioPatch = z.infer<typeof ScenarioPatch>;

export const ScenarioCopy = z.strictObject({ name: line('Scenario name') });
export type ScenarioCopy = z.infer<typeof ScenarioCopy>;

/** Figures of the rows as laid over the boundary; null without a boundary. */
export const LaidFigures = z.object({
  rowCount: z.int(),
  rowLengthM: z.number(),
  moduleAreaM2: z.number(),
  kwp: z.number(),
  posts: z.int(),
  fieldAreaM2: z.number(),
  groundCoverRatio: z.number(),
  /** Module area over field area. */
  coverageRatio: z.number(),
  /** Land kept out of cultivation over field area. */
  landLostShare: z.number(),
});
export type LaidFigures = z.infer<typeof LaidFigures>;

export const Scenario = z.object({
  id: Id,
  version: Version,
  fieldId: Id,
  name: z.string(),
  notes: z.string(),
  weatherId: Id.nullable(),
  weatherName: z.string().nullable(),
  layout: Layout,
  archived: z.boolean(),
  figures: LaidFigures.nullable(),
  /** Inputs as frozen at the last run; null before the first. */
  frozen: FrozenInput.nullable(),
  inputHash: z.string().nullable(),
  modelVersion: z.string().nullable(),
  latestRun: Run.nullable(),
  createdAt: Instant,
  updatedAt: Instant,
});
export type Scenario = z.infer<typeof Scenario>;
export const ScenarioList = z.object({ items: z.array(Scenario) });
export type ScenarioList = z.infer<typeof ScenarioList>;
