import { z } from 'zod';
import { Id, Instant } from './common.js';

/** One thing that wants the advisor's attention. */
export const DeskItem = z.object({
  kind: z.enum([
    'run-finished',
    'run-failed',
    'field-without-boundary',
    'field-without-crop',
    'season-starts',
    'review-opened',
    'review-expiring',
  ]),
  at: Instant,
  fieldId: Id,
  fieldName: z.string(),
  farmName: z.string(),
  scenarioId: Id.nullable(),
  text: z.string(),
});
export type DeskItem = z.infer<typeof DeskItem>;

export const Desk = z.object({
  counts: z.object({ farms: z.int(), fields: z.int(), scenarios: z.int(), openReviews: z.int() }),
  items: z.array(DeskItem),
});
export type Desk = z.infer<typeof Desk>;
