import { DEG } from '../angles.js';

/** Half the apparent diameter of the sun, radians (0.533 deg across). */
export const SUN_RADIUS = (0.533 / 2) * DEG;

const STEPS = 512;

/** Share of a uniform disc of radius 1 below chord y, and its lever arm, at y = -1 .. 1. */
const AREA = new Float64Array(STEPS + 2);
const LEVER = new Float64Array(STEPS + 2);

for (let i = 0; i <= STEPS + 1; i += 1) {
  const y = Math.min((2 * i) / STEPS - 1, 1);
  const half = Math.sqrt(Math.max(1 - y * y, 0));
  AREA[i] = 0.5 + (y * half + Math.asin(y)) / Math.PI;
  LEVER[i] = (-2 / (3 * Math.PI)) * half ** 3;
}

/**
 * Share of the sun's horizontal light that comes from the part of its disc below a chord.
 *
 * The disc shines evenly, but light from its upper half falls more steeply: across the disc the
 * horizontal share changes by `slope` per radius towards the chord's far side. Linear
 * interpolation in a table, within 2e-5.
 *
 * @param y chord from the centre, in radii of the disc
 * @param slope change of the weight per radius in the direction of y
 */
export function discBelow(y: number, slope: number): number {
  if (y <= -1) return 0;
  if (y >= 1) return 1;
  const at = (y + 1) * (STEPS / 2);
  const i = Math.floor(at);
  const part = at - i;
  const area = AREA[i] + part * (AREA[i + 1] - AREA[i]);
  return area + slope * (LEVER[i] + part * (LEVER[i + 1] - LEVER[i]));
}
