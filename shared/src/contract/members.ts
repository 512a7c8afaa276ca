import { z } from 'zod';
import { Id } from './common.js';
import { Role } from './session.js';

/** A person of the cooperative as colleagues see them. */
export const Member = z.object({
  id: Id,
  name: z.string(),
  email: z.string(),
  role: Role,
  active: z.boolean(),
});
export type Member = z.infer<typeof Member>;
export const MemberList = z.object({ items: z.array(Member) });
