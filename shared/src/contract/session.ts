import { z } from 'zod';
import { Id } from './common.js';

export const Role = z.enum(['admin', 'advisor', 'farmer', 'reader']);
export type Role = z.infer<typeof Role>;

export const SignIn = z.strictObject({
  email: z.email('This is not an e-mail address.').max(254),
  password: z.string().min(1, 'Password is missing.').max(200),
});
export type SignIn = z.infer<typeof SignIn>;

/** Who is signed in, as the client may know it. */
export const Session = z.object({
  memberId: Id,
  name: z.string(),
  email: z.string(),
  role: Role,
  cooperative: z.object({ id: Id, name: z.string(), timeZone: z.string(), demo: z.boolean() }),
  expiresAt: z.iso.datetime(),
});
export type Session = z.infer<typeof Session>;
