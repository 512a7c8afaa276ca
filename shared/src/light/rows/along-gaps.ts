import { requireWithin } from '../../errors.js';
import { lightThrough } from './beam.js';
import { planeFactor, type RowGeometry, type RowOptics } from './geometry.js';
import type { SkyPart } from './sky-view.js';

/** Modules and gaps in turn along every row. */
export interface AlongRowGaps {
  /** Length of a module along the row, m. */
  moduleLength: number;
  /** Free length between two modules, m. */
  gapLength: number;
  /** Every second row is shifted by half a module and half a gap. */
  checkerboard: boolean;
}

/** @throws InputError naming the length that is out of range. */
export function requireGaps(gaps: AlongRowGaps): void {
  requireWithin('moduleLength', gaps.moduleLength, 0.05, 100, 'm');
  requireWithin('gapLength', gaps.gapLength, 0, 100, 'm');
}

/** Share of the row's length under modules. */
export const filledShare = (gaps: AlongRowGaps): number =>
  gaps.moduleLength / (gaps.moduleLength + gaps.gapLength);

/** The row as a whole where only the mean along it counts: gaps pass all, modules as they are. */
export function meanRowOptics(optics: RowOptics, gaps: AlongRowGaps | undefined): RowOptics {
  if (!gaps) return optics;
  const filled = filledShare(gaps);
  return {
    ...optics,
    transmittance: 1 - filled * (1 - optics.transmittance),
    frontReflectance: optics.frontReflectance * filled,
    rearReflectance: optics.rearReflectance * filled,
  };
}

/** Rows crossed by a ray of which each is weighed by itself; more are taken like the last. */
const MOST_ROWS = 24;

/** Profile angles at which the sky's light through gapped rows is tabulated. */
const SKY_ANGLES = 180;

/** Directions along the row, of equal profile angle, that are averaged for the sky. */
const ALONG_DIRECTIONS = 24;

/** Share of the length in which two rows' modules lie one before the other, shifted by a share. */
function bothFilled(filled: number, shift: number): number {
  const place = shift - Math.floor(shift);
  return Math.max(filled - place, 0) + Math.max(filled + place - 1, 0);
}

/**
 * Light through 0, 1, 2 ... rows whose neighbours along the ray are shifted by the share `shift` of
 * a period against each other.
 *
 * One row passes its mean, two rows pass the mean product of their patterns: both exact. Each
 * further row is tied to the one before it only (first-order chain).
 */
function fillChain(filled: number, transmittance: number, shift: number, out: Float64Array): void {
  const kept = 1 - transmittance;
  const one = 1 - filled * kept;
  const two = 1 - 2 * filled * kept + kept * kept * bothFilled(filled, shift);
  out[0] = 1;
  out[1] = one;
  // Where the gaps of one row lie wholly before modules of the next, rounding may fall below 0.
  const ratio = one > 0 ? Math.max(two, 0) / one : 0;
  for (let n = 2; n < out.length; n += 1) out[n] = out[n - 1] * ratio;
}

/** Vertical distance between the meetings of a ray with one row and the next, m. */
const stepUp = (geometry: RowGeometry, tangent: number): number =>
  (geometry.pitch * Math.abs(Math.sin(geometry.tilt))) /
  Math.max(Math.abs(planeFactor(geometry, tangent)), 1e-9);

/** Sky light through n rows, angles x rows: means over the directions along the row. */
function skyTable(geometry: RowGeometry, transmittance: number, gaps: AlongRowGaps): Float64Array {
  const period = gaps.moduleLength + gaps.gapLength;
  const filled = filledShare(gaps);
  const table = new Float64Array(SKY_ANGLES * MOST_ROWS);
  const chain = new Float64Array(MOST_ROWS);
  for (let a = 0; a < SKY_ANGLES; a += 1) {
    const angle = ((a + 0.5) / SKY_ANGLES - 0.5) * Math.PI;
    const up = stepUp(geometry, Math.tan(angle)) / Math.cos(angle);
    let total = 0;
    for (let d = 0; d < ALONG_DIRECTIONS; d += 1) {
      // By symmetry one side is enough; light of a profile angle goes with the squared cosine.
      const along = ((d + 0.5) / ALONG_DIRECTIONS) * (Math.PI / 2);
      const weight = Math.cos(along) ** 2;
      const shift = (up * Math.tan(along)) / period + (gaps.checkerboard ? 0.5 : 0);
      fillChain(filled, transmittance, shift, chain);
      total += weight;
      for (let n = 0; n < MOST_ROWS; n += 1) table[a * MOST_ROWS + n] += weight * chain[n];
    }
    for (let n = 0; n < MOST_ROWS; n += 1) table[a * MOST_ROWS + n] /= total;
  }
  return table;
}

/** Light left of a sun's beam after 0, 1, 2 ... rows; the array may be reused by the next call. */
export type BeamPassage = (tangent: number, sunAltitude: number) => Float64Array;

/**
 * Beam that gets past rows, with gaps along them if given.
 *
 * Without gaps it is the transmittance to the power of the panels crossed. With gaps it is the mean
 * along the row: exact for one or two rows crossed, a first-order chain beyond.
 *
 * @param transmittance of the modules
 */
export function prepareBeamPassage(
  geometry: RowGeometry,
  transmittance: number,
  gaps: AlongRowGaps | undefined,
): BeamPassage {
  if (!gaps || gaps.gapLength === 0) {
    const through = lightThrough(transmittance);
    return () => through;
  }
  const period = gaps.moduleLength + gaps.gapLength;
  const filled = filledShare(gaps);
  const chain = new Float64Array(MOST_ROWS);
  return (tangent, sunAltitude) => {
    const cotangent = 1 / Math.tan(sunAltitude);
    const along = Math.sqrt(Math.max(cotangent * cotangent - tangent * tangent, 0));
    const shift = (stepUp(geometry, tangent) * along) / period + (gaps.checkerboard ? 0.5 : 0);
    fillChain(filled, transmittance, shift, chain);
    return chain;
  };
}

/**
 * Even sky that gets past rows, with gaps along them if given; exactness as for the beam.
 *
 * @param transmittance of the modules
 */
export function prepareSkyPassage(
  geometry: RowGeometry,
  transmittance: number,
  gaps: AlongRowGaps | undefined,
): SkyPart {
  if (!gaps || gaps.gapLength === 0) {
    const through = lightThrough(transmittance);
    const most = through.length - 1;
    return (rows, from, to) => (through[rows < most ? rows : most] * (to - from)) / 2;
  }
  const table = skyTable(geometry, transmittance, gaps);
  return (rows, from, to) => {
    const angle = Math.asin((from + to) / 2);
    const row = Math.min(Math.floor((angle / Math.PI + 0.5) * SKY_ANGLES), SKY_ANGLES - 1);
    return (table[row * MOST_ROWS + Math.min(rows, MOST_ROWS - 1)] * (to - from)) / 2;
  };
}
