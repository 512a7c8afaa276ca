/**
 * An input outside what a function can honestly answer for.
 *
 * `field` is the name of the offending input as the caller knows it; `message` says what is wrong
 * and what would be right, with units.
 */
export class InputError extends Error {
  override readonly name = 'InputError';

  constructor(
    readonly field: string,
    message: string,
  ) {
    super(message);
  }
}

/**
 * Return `value` if it is a finite number within [min, max].
 *
 * @throws InputError naming `field`, the limits and `unit` otherwise
 */
export function requireWithin(
  field: string,
  value: number,
  min: number,
  max: number,
  unit = '',
): number {
  if (typeof value !== 'number' || !Number.isFinite(value) || value < min || value > max) {
    const suffix = unit ? ` ${unit}` : '';
    throw new InputError(
      field,
      `${field} must be between ${min} and ${max}${suffix}, got ${value}`,
    );
  }
  return value;
}
