import { z } from 'zod';
import { Id, Instant, within } from './common.js';
import { Boundary, LonLat } from './fields.js';
import { Layout } from './layout.js';
import { RunResult } from './result.js';
import { LaidFigures } from './scenarios.js';

export const ReviewInput = z.strictObject({
  fieldId: Id,
  scenarioIds: z.array(Id).min(1, 'Choose at least one scenario.').max(4),
  /** Greeting to the farmer, shown on top of the page. */
  message: z.string().trim().max(1000).default(''),
  expiresInDays: within('Days until expiry', 1, 180, 'days').int().default(30),
});
export type ReviewInput = z.input<typeof ReviewInput>;

/** A review link as the advisor sees it. The token itself is shown once, at creation. */
export const Review = z.object({
  id: Id,
  fieldId: Id,
  scenarioIds: z.array(Id),
  message: z.string(),
  createdAt: Instant,
  createdByName: z.string(),
  expiresAt: Instant,
  revokedAt: Instant.nullable(),
  lastOpenedAt: Instant.nullable(),
  views: z.int(),
  state: z.enum(['open', 'expired', 'revoked']),
});
export type Review = z.infer<typeof Review>;
export const ReviewList = z.object({ items: z.array(Review) });

/** Answer to creation: the only time the address with its token leaves the server. */
export const ReviewCreated = z.object({ review: Review, url: z.string() });
export type ReviewCreated = z.infer<typeof ReviewCreated>;

/** A visitor swaps the token from the link for a cookie. */
export const ReviewEntry = z.strictObject({ token: z.string().min(20).max(100) });
export type ReviewEntry = z.infer<typeof ReviewEntry>;

/** All the farmer's page shows; nothing of other fields or farms. */
export const ReviewPage = z.object({
  fieldName: z.string(),
  farmName: z.string(),
  cooperativeName: z.string(),
  advisorName: z.string(),
  message: z.string(),
  expiresAt: Instant,
  timeZone: z.string(),
  pin: LonLat,
  boundary: Boundary.nullable(),
  slopePercent: z.number(),
  site: z.object({ latitude: z.number(), longitude: z.number() }),
  scenarios: z.array(
    z.object({
      id: Id,
      name: z.string(),
      layout: Layout,
      figures: LaidFigures.nullable(),
      inputHash: z.string(),
      modelVersion: z.string(),
      weatherName: z.string(),
      utcOffsetHours: z.number(),
      result: RunResult,
    }),
  ),
});
export type ReviewPage = z.infer<typeof ReviewPage>;
