import { z } from 'zod';
import { Instant } from './common.js';

/** Who did what to which, when. */
export const AuditEntry = z.object({
  seq: z.int(),
  at: Instant,
  actorName: z.string(),
  action: z.string(),
  subjectKind: z.string(),
  subjectId: z.string(),
  subjectName: z.string(),
  /** SHA-256 over this entry and the hash of the one before. */
  hash: z.string(),
});
export type AuditEntry = z.infer<typeof AuditEntry>;

export const AuditQuery = z.strictObject({
  /** Entries older than this sequence number; absent for the newest. */
  before: z.coerce.number('Give a sequence number.').int().min(1).optional(),
  size: z.coerce.number('Give a page size.').int().min(1).max(200).default(50),
});
export type AuditQuery = z.infer<typeof AuditQuery>;

export const AuditPage = z.object({
  items: z.array(AuditEntry),
  /** What to ask `before` for the next page; null on the last. */
  next: z.int().nullable(),
  /** First entry that no longer fits the chain of hashes; null while all do. */
  brokenAt: z.int().nullable(),
});
export type AuditPage = z.infer<typeof AuditPage>;
