import { describe, expect, it } from 'vitest';
import { toDegrees, toRadians } from '../../src/light/angles.js';
import {
  axisOnSlope,
  backtrackedRotation,
  leastShadeRotation,
  trueRotation,
  withinStops,
  type TrackerAxis,
} from '../../src/light/tracker.js';

const LEVEL_SOUTH: TrackerAxis = { azimuth: Math.PI, tilt: 0, crossSlope: 0 };

// Anderson & Mikofski 2020, NREL/TP-5K00-76626: a field falling 10 deg to the south, axis azimuth
// 195 deg, ground cover 0.5, stops at 90 deg; 1 January, suns as elevation and azimuth.
const SLOPE = { slope: toRadians(10), aspect: Math.PI, axisAzimuth: toRadians(195) };
const SLOPE_CASES = [
  { elevation: 11.263, azimuth: 133.289, ideal: -72.604, back: -25.747 },
  { elevation: 18.734, azimuth: 145.286, ideal: -59.861, back: -59.861 },
  { elevation: 26.811, azimuth: 173.932, ideal: -28.764, back: -28.764 },
  { elevation: 9.462, azimuth: 229.102, ideal: 61.587, back: 32.339 },
];

describe('a tracker on a slope (Anderson & Mikofski 2020)', () => {
  const axis = axisOnSlope(SLOPE.axisAzimuth, SLOPE.slope, SLOPE.aspect);

  it('has the published axis tilt 9.666 and cross-axis slope -2.576 deg', () => {
    expect(toDegrees(axis.tilt)).toBeCloseTo(9.666, 3);
    expect(toDegrees(axis.crossSlope)).toBeCloseTo(-2.576, 3);
  });

  it.each(SLOPE_CASES)(
    'turns to $ideal and back to $back deg',
    ({ elevation, azimuth, ideal, back }) => {
      const rotation = trueRotation(axis, toRadians(azimuth), toRadians(elevation));
      // The published suns are rounded to 0.001 deg.
      expect(Math.abs(toDegrees(rotation) - ideal)).toBeLessThan(0.005);
      const turned = withinStops(backtrackedRotation(axis, rotation, 0.5), Math.PI / 2);
      expect(Math.abs(toDegrees(turned) - back)).toBeLessThan(0.01);
    },
  );
});

describe('a level tracker', () => {
  it('lies flat under a sun in the plane of its axis', () => {
    expect(trueRotation(LEVEL_SOUTH, Math.PI, 0.7)).toBeCloseTo(0, 12);
  });

  it('faces west with a positive rotation when its axis points south', () => {
    expect(toDegrees(trueRotation(LEVEL_SOUTH, toRadians(270), toRadians(30)))).toBeCloseTo(60, 9);
  });

  it('faces east with a positive rotation when its axis points north', () => {
    const north = { ...LEVEL_SOUTH, azimuth: 0 };
    expect(toDegrees(trueRotation(north, toRadians(90), toRadians(30)))).toBeCloseTo(60, 9);
  });

  it('turns back so that neighbours just do not shade: cos(true) = 0.25, cover 0.5', () => {
    // Eq. 14: correction arccos(|cos t| / cover) = arccos(0.5) = 60 deg.
    const ideal = Math.acos(0.25);
    const back = backtrackedRotation(LEVEL_SOUTH, ideal, 0.5);
    expect(toDegrees(back)).toBeCloseTo(toDegrees(ideal) - 60, 9);
  });

  it('does not turn back where rows stand wide enough', () => {
    expect(backtrackedRotation(LEVEL_SOUTH, toRadians(45), 0.5)).toBe(toRadians(45));
  });

  it('refuses a ground cover above 1 by name', () => {
    expect(() => backtrackedRotation(LEVEL_SOUTH, 0.3, 1.2)).toThrow(/groundCover/);
  });
});

describe('least shade', () => {
  it('stands edge-on to a low sun within the stops', () => {
    // Sun at 60 deg across: edge-on is -30 deg, which stops at 55 deg allow.
    expect(toDegrees(leastShadeRotation(toRadians(60), toRadians(55)))).toBeCloseTo(-30, 9);
  });

  it('goes to a stop where edge-on is out of reach', () => {
    // Sun overhead: edge-on would be 90 deg; 55 deg shades least.
    const rotation = toDegrees(leastShadeRotation(toRadians(1), toRadians(55)));
    expect(rotation).toBeCloseTo(-55, 9);
  });
});
