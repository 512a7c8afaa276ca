import { describe, expect, it } from 'vitest';
import { toDegrees, toRadians } from '../../src/light/angles.js';
import {
  airMass,
  distanceFactor,
  extraterrestrialNormal,
  sunPosition,
  sunPositionInAir,
  sunTimes,
} from '../../src/light/sun.js';

describe('sun position', () => {
  it('gives the published worked example of NREL SPA', () => {
    // Reda & Andreas 2004, NREL/TP-560-34302: zenith 50.11162 deg, azimuth 194.34024 deg.
    const sun = sunPositionInAir(Date.UTC(2003, 9, 17, 19, 30, 30), 39.742476, -105.1786, 820, 11);
    expect(90 - toDegrees(sun.altitude)).toBeCloseTo(50.11162, 1);
    expect(Math.abs(90 - toDegrees(sun.altitude) - 50.11162)).toBeLessThan(0.02);
    expect(Math.abs(toDegrees(sun.azimuth) - 194.34024)).toBeLessThan(0.02);
  });

  it.each([
    // NREL SPA for 48 N 9 E, zone +1, 2025: apparent elevation and azimuth.
    ['2025-03-20T11:00:00Z', 41.57, 169.49],
    ['2025-06-21T08:00:00Z', 42.71, 102.47],
    ['2025-06-21T11:00:00Z', 64.91, 165.91],
    ['2025-12-21T11:00:00Z', 18.43, 174.64],
    ['2025-12-21T14:00:00Z', 10.36, 216.33],
  ])('agrees with SPA at %s', (instant, altitude, azimuth) => {
    const sun = sunPosition(Date.parse(instant), 48, 9);
    expect(Math.abs(toDegrees(sun.altitude) - altitude)).toBeLessThan(0.03);
    expect(Math.abs(toDegrees(sun.azimuth) - azimuth)).toBeLessThan(0.03);
  });

  it('gives sunrise, transit and sunset of the worked example of NREL SPA within 5 s', () => {
    // Reda & Andreas 2004, NREL/TP-560-34302: 06:12:43 and 17:20:19, zone -7; transit 11:46:05. SPA
    // works by UTC day, so its sunset of 17 October is the local evening of the 16th.
    const near = (instant: number | null, published: number) =>
      expect(Math.abs((instant ?? NaN) - published)).toBeLessThan(5000);
    const day = sunTimes(Date.UTC(2003, 9, 17), 39.742476, -105.1786);
    near(day.sunrise, Date.UTC(2003, 9, 17, 13, 12, 43));
    near(day.transit, Date.UTC(2003, 9, 17, 18, 46, 5));
    const dayBefore = sunTimes(Date.UTC(2003, 9, 16), 39.742476, -105.1786);
    near(dayBefore.sunset, Date.UTC(2003, 9, 17, 0, 20, 19));
  });

  it('has no sunrise in polar night and none missing at the equator', () => {
    expect(sunTimes(Date.UTC(2025, 11, 21), 75, 20).sunrise).toBeNull();
    const { sunrise, transit, sunset } = sunTimes(Date.UTC(2025, 2, 20), 0, 0);
    expect((sunset! - sunrise!) / 3_600_000).toBeCloseTo(12.1, 1);
    expect(transit).toBeGreaterThan(sunrise!);
  });

  it('refuses a latitude that is none, by name', () => {
    expect(() => sunPosition(0, 91, 0)).toThrow(/latitude/);
    expect(() => sunPosition(0, 0, Number.NaN)).toThrow(/longitude/);
  });
});

describe('above the air', () => {
  it('follows Spencer 1971 through the year', () => {
    // Spencer's series at its first day is the sum of its cosine terms: 1.03505.
    expect(distanceFactor(1)).toBeCloseTo(1.03505, 6);
    expect(extraterrestrialNormal(1)).toBeCloseTo(1408.703, 2);
    expect(distanceFactor(185)).toBeLessThan(0.968);
  });

  it('gives the air masses of Kasten & Young 1989', () => {
    // Table of the paper: 1.0 at the zenith, 37.92 at the horizon; 1.5 at 48.19 deg (ASTM G173).
    expect(airMass(0)).toBeCloseTo(1, 2);
    expect(airMass(toRadians(48.19))).toBeCloseTo(1.498, 3);
    expect(airMass(toRadians(90))).toBeCloseTo(37.92, 1);
  });
});
