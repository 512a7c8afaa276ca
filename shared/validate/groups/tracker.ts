import { join } from 'node:path';
import { toDegrees, toRadians } from '../../src/light/angles.js';
import type { Steering } from '../../src/run/state.js';
import { meterRotation } from '../../src/run/steering.js';
import { ErrorTally, type Group } from '../quantity.js';
import { numberOf, readTable, type TableRow } from '../read-table.js';

const NAME = 'tracker';
const FILE = 'physics/tracker.csv';
const LIMIT_DEG = 0.01;

const steeringOf = (row: TableRow): Steering => ({
  axis: {
    azimuth: toRadians(numberOf(row, 'axis_azimuth')),
    tilt: toRadians(numberOf(row, 'axis_tilt')),
    crossSlope: 0,
  },
  limit: toRadians(numberOf(row, 'max_angle')),
  groundCover: numberOf(row, 'gcr'),
});

/** Difference of two rotations, degrees, the short way round. */
function turn(a: number, b: number): number {
  const difference = Math.abs(a - b) % 360;
  return Math.min(difference, 360 - difference);
}

/** Single-axis rotation against an independent computation. */
export const tracker: Group = {
  name: NAME,
  files: [FILE],
  source: 'Anderson & Mikofski 2020 (NREL/TP-5K00-76626), recomputed independently',
  compare(folder) {
    const plain = new ErrorTally(NAME, 'rotation without backtracking', 'deg', LIMIT_DEG);
    const back = new ErrorTally(NAME, 'rotation with backtracking', 'deg', LIMIT_DEG);
    for (const row of readTable(join(folder, FILE))) {
      // Empty where the sun is below the horizon.
      if (row.true_tracker_theta === '') continue;
      const steering = steeringOf(row);
      const azimuth = toRadians(numberOf(row, 'sun_azimuth'));
      const altitude = toRadians(90 - numberOf(row, 'sun_zenith'));
      const rotation = (programme: 'true' | 'backtracking') =>
        toDegrees(meterRotation(steering, programme, azimuth, altitude));
      plain.add(turn(rotation('true'), numberOf(row, 'true_tracker_theta')));
      back.add(turn(rotation('backtracking'), numberOf(row, 'back_tracker_theta')));
    }
    return [plain.judge(), back.judge()];
  },
};
