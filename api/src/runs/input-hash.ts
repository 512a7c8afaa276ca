import { createHash } from 'node:crypto';
import type { FrozenInput } from '@furrowlight/shared/contract/run';

/** JSON with the keys of every object in order, so that equal inputs read the same. */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (value !== null && typeof value === 'object') {
    const entries = Object.entries(value)
      .filter(([, part]) => part !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([key, part]) => `${JSON.stringify(key)}:${canonicalJson(part)}`);
    return `{${entries.join(',')}}`;
  }
  return JSON.stringify(value);
}

/**
 * SHA-256 of a frozen input and the model that reads it.
 *
 * Ids of seasons are left in: a result names the crops it was made for.
 */
export function inputHash(input: FrozenInput, modelVersion: string): string {
  return createHash('sha256').update(canonicalJson({ input, modelVersion })).digest('hex');
}
