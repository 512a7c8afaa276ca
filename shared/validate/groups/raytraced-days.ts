import { join } from 'node:path';
import { toRadians } from '../../src/light/angles.js';
import { prepareEndlessRows } from '../../src/light/rows/endless.js';
import { ErrorTally, type Group } from '../quantity.js';
import {
  acrossPositions,
  readCases,
  rowGeometry,
  VARIANTS,
  type DailyReference,
  type RaytracedCase,
} from './raytraced-case.js';

const NAME = 'raytraced whole days';
const FILE = 'raytraced/days.json';

/** Day's light at each receiver, Wh m-2: the listed suns, an hour each, with the sun's disc. */
function dayTotals(
  reference: RaytracedCase,
  variant: 'black' | 'trans' | 'refl',
): { totals: Float64Array; open: number } {
  const rows = prepareEndlessRows({
    geometry: rowGeometry(reference),
    optics: VARIANTS[variant],
    receiverHeight: reference.geometry.receiver_height,
    positions: acrossPositions(reference),
  });
  const totals = new Float64Array(rows.sky.length);
  const shares = new Float64Array(rows.sky.length);
  let open = 0;
  for (const { sun } of reference.beam) {
    const altitude = toRadians(sun.elevation);
    const tangent = rows.tangent(toRadians(sun.azimuth), altitude);
    const beam = (sun.dni ?? NaN) * Math.sin(altitude);
    const diffuse = sun.dhi ?? NaN;
    rows.beam(tangent, altitude, shares);
    rows.addBeamReflected(tangent, 1, shares);
    for (let i = 0; i < totals.length; i += 1) {
      totals[i] += beam * shares[i] + diffuse * rows.sky[i];
    }
    open += beam + diffuse;
  }
  return { totals, open };
}

function requireDaily(reference: RaytracedCase): DailyReference {
  if (!reference.daily) throw new SyntaxError(`${reference.id} has no daily totals`);
  return reference.daily;
}

/** Whole days under endless rows against independent ray tracing. */
export const raytracedDays: Group = {
  name: NAME,
  files: [FILE],
  source: 'Radiance 6.1a ray tracing, exact profile sums and an independent path tracer',
  compare(folder) {
    const cases = readCases(join(folder, FILE));
    const open = new ErrorTally(NAME, 'open field total', '% of open field', 0.02);
    const tallies = (['black', 'trans', 'refl'] as const).map((variant) => {
      const tally = new ErrorTally(NAME, `daily sum, ${variant}`, '% of open field', 0.3);
      for (const reference of cases) {
        const daily = requireDaily(reference);
        const day = dayTotals(reference, variant);
        open.add((100 * (day.open - daily.unobstructed.total)) / daily.unobstructed.total);
        daily[variant].total_disc.forEach((want, i) =>
          tally.add((100 * (day.totals[i] - want)) / daily.unobstructed.total),
        );
      }
      return tally;
    });
    return [...tallies, open].map((tally) => tally.judge());
  },
};
