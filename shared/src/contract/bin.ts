import { z } from 'zod';
import { Id, Instant } from './common.js';

/** Something removed that can still be brought back. */
export const BinItem = z.object({
  kind: z.enum(['farm', 'field']),
  id: Id,
  name: z.string(),
  farmName: z.string(),
  deletedAt: Instant,
  /** After this it is gone for good. */
  keptUntil: Instant,
});
export type BinItem = z.infer<typeof BinItem>;
export const BinList = z.object({ items: z.array(BinItem) });
