import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  clearSkySpectrum,
  defaultAtmosphere,
  type Atmosphere,
} from '../../src/light/atmosphere.js';
import {
  emptyBandSplit,
  parOf,
  PHOTONS,
  prepareBandTable,
  splitBands,
} from '../../src/light/band-table.js';
import { clearSkyYear } from '../../src/light/climate.js';
import { splitGlobal } from '../../src/light/decomposition.js';
import { testRadiation } from '../../src/light/quality.js';
import { hayDavies, perez } from '../../src/light/sky.js';
import { BAND_COUNT, micromolPerJoule } from '../../src/light/spectrum.js';
import { airMass, extraterrestrialNormal, sunPosition, sunTimes } from '../../src/light/sun.js';
import { requireWeatherYear, type HourlyYear } from '../../src/light/weather-year.js';

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const SEED = { seed: 20261201, numRuns: 300 };

const instants = fc.integer({ min: Date.UTC(1990, 0, 1), max: Date.UTC(2060, 0, 1) });
const latitudes = number(-90, 90);
const longitudes = number(-180, 180);

describe('sun', () => {
  it('stands somewhere in the sky at every instant and place', () => {
    fc.assert(
      fc.property(instants, latitudes, longitudes, (instant, latitude, longitude) => {
        const { azimuth, altitude } = sunPosition(instant, latitude, longitude);
        expect(Math.abs(altitude)).toBeLessThanOrEqual(Math.PI / 2);
        expect(azimuth).toBeGreaterThanOrEqual(0);
        expect(azimuth).toBeLessThanOrEqual(2 * Math.PI);
      }),
      SEED,
    );
  });

  it('rises before it culminates and sets after', () => {
    const days = fc.integer({ min: 0, max: 20_000 });
    fc.assert(
      fc.property(days, number(-60, 60), longitudes, (day, latitude, longitude) => {
        const { sunrise, transit, sunset } = sunTimes(day * 86_400_000, latitude, longitude);
        expect(sunrise).not.toBeNull();
        expect(sunset).not.toBeNull();
        expect(sunrise! < transit && transit < sunset!).toBe(true);
      }),
      { ...SEED, numRuns: 100 },
    );
  });
});

describe('light by band', () => {
  const table = prepareBandTable(defaultAtmosphere(300, 0.2));
  const split = emptyBandSplit();

  it('keeps the energy of beam and diffuse at every sun and cloud', () => {
    fc.assert(
      fc.property(number(-0.1, Math.PI / 2), number(0, 1400), (altitude, dni) => {
        splitBands(table, altitude, dni, 1, split);
        for (const makeup of [split.direct, split.diffuse]) {
          const energy = makeup.slice(0, BAND_COUNT);
          expect(Math.abs(energy.reduce((sum, share) => sum + share, 0) - 1)).toBeLessThan(1e-9);
          expect(makeup.every((value) => Number.isFinite(value) && value >= 0)).toBe(true);
          // A joule of PAR holds between its photons all at 400 nm and all at 700 nm.
          const perJoule = parOf(makeup, PHOTONS) / parOf(makeup, 0);
          expect(perJoule).toBeGreaterThan(micromolPerJoule(400));
          expect(perJoule).toBeLessThan(micromolPerJoule(700));
        }
      }),
      SEED,
    );
  });

  it('raises the PAR share of diffuse light no further than a clear sky has it', () => {
    fc.assert(
      fc.property(number(0.1, 1.5), number(0, 600), (altitude, dni) => {
        splitBands(table, altitude, dni, 1, split);
        const share = parOf(split.diffuse, 0);
        splitBands(table, altitude, dni + 100, 1, split);
        expect(parOf(split.diffuse, 0)).toBeGreaterThanOrEqual(share - 1e-12);
      }),
      SEED,
    );
  });
});

describe('clear air', () => {
  const good = defaultAtmosphere(300, 0.2);

  it('gives finite spectra that no haze brightens in the beam', () => {
    fc.assert(
      fc.property(number(0, 1.55), number(0, 1.5), number(0, 5), (zenith, haze, waterCm) => {
        const clean = clearSkySpectrum(zenith, { ...good, waterCm, aerosol500: haze });
        const hazy = clearSkySpectrum(zenith, { ...good, waterCm, aerosol500: haze + 0.1 });
        clean.direct.forEach((beam, i) => {
          expect(Number.isFinite(clean.diffuse[i]) && clean.diffuse[i] >= 0).toBe(true);
          expect(hazy.direct[i]).toBeLessThanOrEqual(beam);
        });
      }),
      { ...SEED, numRuns: 50 },
    );
  });

  it('names the part of the air that is out of range', () => {
    const wrong: [keyof Atmosphere, number][] = [
      ['pressureHpa', 200],
      ['waterCm', -1],
      ['ozoneAtmCm', 2],
      ['aerosol500', Number.NaN],
    ];
    for (const [name, value] of wrong) {
      expect(() => clearSkySpectrum(0.5, { ...good, [name]: value })).toThrow(new RegExp(name));
    }
  });
});

describe('sky', () => {
  it('keeps global light when it is split', () => {
    fc.assert(
      fc.property(number(0, 1300), number(-0.2, 1), (ghi, cosZenith) => {
        const { dni, dhi } = splitGlobal(ghi, cosZenith, 1361);
        expect(dni).toBeGreaterThanOrEqual(0);
        expect(dhi).toBeLessThanOrEqual(ghi);
        expect(Math.abs(dhi + dni * cosZenith - ghi)).toBeLessThan(1e-9);
      }),
      SEED,
    );
  });

  it('gives a level plane the diffuse light itself, after Hay & Davies and Perez', () => {
    fc.assert(
      fc.property(number(0, 600), number(0, 1000), number(0, 1.48), (dhi, dni, zenith) => {
        const cosine = Math.cos(zenith);
        const plain = hayDavies(dhi, dni, 1361, cosine, cosine, 1);
        expect(plain.circumsolar + plain.isotropic).toBeCloseTo(dhi, 9);
        const parts = perez(dhi, dni, 1361, airMass(zenith), cosine, zenith, 0);
        expect(parts.circumsolar + parts.isotropic + parts.horizon).toBeCloseTo(dhi, 9);
      }),
      SEED,
    );
  });
});

describe('weather years', () => {
  const frame = { latitude: 45, longitude: 8, elevationM: 100, year: 2025, utcOffsetHours: 1 };
  const year = clearSkyYear(frame);

  it('builds a clear sky that the quality tests find possible', () => {
    for (let hour = 0; hour < year.ghi.length; hour += 1) {
      const sample = {
        ghi: year.ghi[hour],
        dni: year.dni[hour],
        dhi: year.dhi[hour],
        cosZenith: year.dni[hour] > 0 ? (year.ghi[hour] - year.dhi[hour]) / year.dni[hour] : 0,
        extraterrestrial: extraterrestrialNormal(Math.floor(hour / 24) + 1),
      };
      const codes = testRadiation(sample).filter((code) => code.endsWith('impossible'));
      expect(codes, `hour ${hour}`).toEqual([]);
    }
  });

  it('names the series of any single bad hour', () => {
    const series = fc.constantFrom('ghi', 'dni', 'dhi', 'temperatureC', 'windMs');
    const bad = fc.constantFrom(Number.NaN, Infinity, -Infinity);
    fc.assert(
      fc.property(series, fc.integer({ min: 0, max: 8759 }), bad, (name, hour, value) => {
        const broken: HourlyYear = { ...year, [name]: [...year[name]] };
        broken[name][hour] = value;
        expect(() => requireWeatherYear(broken)).toThrow(new RegExp(`weather.${name}.*${hour}`));
      }),
      { ...SEED, numRuns: 30 },
    );
  });
});
