import type { ShadeClass } from '../contract/crops.js';
import { requireWithin } from '../errors.js';

/** Relative yield to be expected, as a range; nulls where evidence ends. */
export interface YieldResponse {
  low: number | null;
  high: number | null;
  basis: string;
}

/** Shade up to which the bands rest on trials, and up to which they are shown with a warning. */
export const EVIDENCE_SHADE = 0.3;
export const FLAGGED_SHADE = 0.5;

/** Lower and upper slope of relative yield against season shade, by class. */
const BANDS: Record<Exclude<ShadeClass, 'unknown'>, { low: number; high: number }> = {
  susceptible: { low: -1.5, high: -0.3 },
  tolerant: { low: -0.67, high: 0.37 },
  benefiting: { low: -0.67, high: 0 },
};

/**
 * Relative yield as a band, by how a crop's class bears shade.
 *
 * Our own bands drawn around published trials (Schulz 2018, Weselek 2021, a 2024 maize trial); they
 * are not a published curve and do not cover every trial. No gain is promised to benefiting crops.
 *
 * @param shadeClass response class of the crop
 * @param shade 1 - share of open-field PAR in the crop's own window, 0-1 (small negatives count as 0)
 * @returns relative yield 0 and up; nulls for unknown classes and above 0.5 shade
 */
export function yieldBand(shadeClass: ShadeClass, shade: number): YieldResponse {
  requireWithin('shade', shade, -0.5, 1);
  const s = Math.max(shade, 0);
  if (shadeClass === 'unknown') {
    return { low: null, high: null, basis: 'No published response class for this crop.' };
  }
  if (s > FLAGGED_SHADE) {
    return {
      low: null,
      high: null,
      basis: 'More shade than any trial we can rest on (above 50 %).',
    };
  }
  const { low, high } = BANDS[shadeClass];
  const flag = s > EVIDENCE_SHADE ? ' Beyond 30 % shade few trials exist: take it as a hint.' : '';
  return {
    low: Math.max(1 + low * s, 0),
    high: 1 + high * s,
    basis: `Our band for ${shadeClass} crops, drawn around published trials.${flag}`,
  };
}

/** A response curve the advisor typed in: 1 + a s + b s^2, with where it comes from. */
export interface UserCurve {
  a: number;
  b: number;
  source: string;
}

/** Relative yield from a user's curve; never below 0. */
export function yieldByCurve(curve: UserCurve, shade: number): number {
  requireWithin('shade', shade, 0, 1);
  return Math.max(1 + curve.a * shade + curve.b * shade * shade, 0);
}

/** Land equivalent ratio: relative yield plus relative energy of the same land (Mead & Willey 1980). */
export const landEquivalentRatio = (relativeYield: number, relativeEnergy: number): number =>
  relativeYield + relativeEnergy;
