import { z } from 'zod';

/** Opaque row id, made by the server. */
export const Id = z.string().regex(/^[A-Za-z0-9_-]{8,40}$/, 'This id is not one of ours.');

/** Calendar date, ISO 8601. */
export const IsoDate = z.iso.date('Give the date as year-month-day, for example 2026-10-05.');

/** Instant, ISO 8601 in UTC. */
export const Instant = z.iso.datetime();

/** Day of any year, `MM-DD`. */
export const MonthDay = z
  .string()
  .regex(/^(0[1-9]|1[0-2])-(0[1-9]|[12]\d|3[01])$/, 'Give month and day as MM-DD.');

/** One line of text a person typed: trimmed, never empty. */
export const line = (what: string, max = 120) =>
  z
    .string()
    .trim()
    .min(1, `${what} is missing.`)
    .max(max, `${what} may have at most ${max} characters.`);

/** A number within limits whose message names the quantity, limits and unit. */
export const within = (what: string, min: number, max: number, unit = '') => {
  const message = `${what} must be between ${min} and ${max}${unit ? ` ${unit}` : ''}.`;
  return z.number(message).min(min, message).max(max, message);
};

/** Row version for If-Match: a write must name the version it was made from. */
export const Version = z.int().min(1);

/** RFC 9457 problem details, as every error of the API looks. */
export const Problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  code: z.string(),
  detail: z.string(),
  requestId: z.string(),
  /** Per-field messages; `path` is the dotted path in the request body. */
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
});
export type Problem = z.infer<typeof Problem>;
