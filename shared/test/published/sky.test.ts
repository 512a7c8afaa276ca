import { describe, expect, it } from 'vitest';
import { climateYear, clearSkyYear } from '../../src/light/climate.js';
import { discDirectNormal, erbsDiffuseShare, splitGlobal } from '../../src/light/decomposition.js';
import { testRadiation } from '../../src/light/quality.js';
import { hayDavies, perez } from '../../src/light/sky.js';
import { requireWeatherYear } from '../../src/light/weather-year.js';

describe('beam and diffuse', () => {
  it('follows Erbs 1982: 0.659 at clearness 0.5', () => {
    expect(erbsDiffuseShare(0.5)).toBeCloseTo(0.659, 3);
    expect(erbsDiffuseShare(0.1)).toBeCloseTo(0.991, 12);
    expect(erbsDiffuseShare(0.9)).toBe(0.165);
  });

  it('keeps the global light it splits', () => {
    const { dni, dhi } = splitGlobal(600, 0.8, 1361);
    expect(dni * 0.8 + dhi).toBeCloseTo(600, 9);
  });

  it('gives DISC as recomputed independently (Maxwell 1987)', () => {
    // Zenith 29.594 deg, day 276, 358.763 W m-2, 1013.25 hPa: 25.6187934 W m-2.
    expect(discDirectNormal(358.763, 29.594, 276, 1013.25)).toBeCloseTo(25.61879, 4);
  });
});

describe('tilted planes', () => {
  // Independent recomputation: tilt 32, zenith 30.621, dni 556.334, dhi 161.31, extra 1318.13962.
  const zenith = (30.621 * Math.PI) / 180;
  const tilt = (32 * Math.PI) / 180;
  it('gives Hay & Davies 1980', () => {
    const sky = hayDavies(
      161.31,
      556.334,
      1318.13962,
      0.8773884434,
      Math.cos(zenith),
      Math.cos(tilt),
    );
    expect(sky.circumsolar + sky.isotropic).toBeCloseTo(155.5586916, 5);
  });
  it('gives Perez 1990', () => {
    const sky = perez(161.31, 556.334, 1318.13962, 1.161311744, 0.8773884434, zenith, tilt);
    expect(sky.circumsolar + sky.isotropic + sky.horizon).toBeCloseTo(177.5757966, 5);
  });
});

describe('quality tests (Long & Dutton, BSRN)', () => {
  const good = { ghi: 700, dni: 750, dhi: 145, cosZenith: 0.74, extraterrestrial: 1361 };
  it('passes what closes', () => {
    expect(testRadiation(good)).toEqual([]);
  });
  it('names what is impossible and what does not close', () => {
    expect(testRadiation({ ...good, dni: 1500 })).toContain('dni-impossible');
    expect(testRadiation({ ...good, ghi: 500 })).toContain('closure');
    expect(testRadiation({ ...good, dhi: 900 })).toContain('diffuse-above-global');
  });
});

describe('years built without a file', () => {
  const frame = { latitude: 50, longitude: 10, elevationM: 200, year: 2025, utcOffsetHours: 1 };
  const monthly = [2.5, 4.7, 8.6, 13.6, 17.4, 18.9, 18.4, 15.7, 11, 6.4, 3.1, 2];
  const year = climateYear({
    ...frame,
    monthlyMjM2: monthly,
    monthlyMinC: monthly.map(() => 3),
    monthlyMaxC: monthly.map(() => 13),
  });

  it('keeps each month’s mean to 0.1 %', () => {
    const january = year.ghi.slice(0, 31 * 24).reduce((sum, value) => sum + value, 0) * 0.0036;
    expect(january / 31 / 2.5).toBeCloseTo(1, 3);
    const june = year.ghi.slice(151 * 24, 181 * 24).reduce((sum, value) => sum + value, 0) * 0.0036;
    expect(june / 30 / 18.9).toBeCloseTo(1, 3);
  });

  it('passes its own examination and refuses more light than the sky holds', () => {
    expect(() => requireWeatherYear(year)).not.toThrow();
    expect(() => requireWeatherYear(clearSkyYear(frame))).not.toThrow();
    const tooBright = {
      ...frame,
      monthlyMjM2: monthly.map(() => 40),
      monthlyMinC: monthly,
      monthlyMaxC: monthly,
    };
    expect(() => climateYear(tooBright)).toThrow(
      expect.objectContaining({ field: 'monthlyMjM2.0' }),
    );
  });

  it('names the hour of a weather year that is wrong', () => {
    const broken = { ...year, dhi: year.dhi.map((value, i) => (i === 100 ? Number.NaN : value)) };
    expect(() => requireWeatherYear(broken)).toThrow(/weather.dhi is NaN at hour 100/);
    expect(() => requireWeatherYear({ ...year, ghi: [1] })).toThrow(/8760/);
  });
});
