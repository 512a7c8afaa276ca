import type { z } from 'zod';

/** The contract's messages for a value, one per dotted path; empty when the value fits. */
export function fieldMessages(schema: z.ZodType, value: unknown): Record<string, string> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return {};
  const found: Record<string, string> = {};
  for (const issue of parsed.error.issues) {
    found[issue.path.join('.')] ??= issue.message;
  }
  return found;
}
