import { describe, expect, it } from 'vitest';
import { toRadians } from '../../src/light/angles.js';
import {
  clearSkySpectrum,
  defaultAtmosphere,
  SOLAR_CORRECTION,
  WAVELENGTHS_NM,
} from '../../src/light/atmosphere.js';
import {
  emptyBandSplit,
  parOf,
  PHOTONS,
  prepareBandTable,
  splitBands,
} from '../../src/light/band-table.js';
import {
  BAND_COUNT,
  blackbodySun,
  integrateSpectrum,
  micromolPerJoule,
} from '../../src/light/spectrum.js';

const above = WAVELENGTHS_NM.map((nm, i) => blackbodySun(nm) * SOLAR_CORRECTION[i]);
const share = (values: ArrayLike<number>, from: number, to: number) =>
  integrateSpectrum(WAVELENGTHS_NM, values, from, to) /
  integrateSpectrum(WAVELENGTHS_NM, values, 300, 4000);

describe('above the air', () => {
  it('splits about 9, 44 and 47 % (common practice: visible to about 760 nm, within 2 points)', () => {
    expect(Math.abs(share(above, 300, 400) - 0.09)).toBeLessThan(0.025);
    expect(Math.abs(share(above, 400, 760) - 0.44)).toBeLessThan(0.02);
    expect(Math.abs(share(above, 760, 4000) - 0.47)).toBeLessThan(0.02);
  });

  it('has the PAR of the measured sun: 530 W m-2 (ASTM G173-03 extraterrestrial column)', () => {
    const par = integrateSpectrum(WAVELENGTHS_NM, above, 400, 700);
    expect(Math.abs(par / 529.96 - 1)).toBeLessThan(0.01);
  });

  it('says how far a plain blackbody is off: PAR 6 % low', () => {
    const plain = WAVELENGTHS_NM.map((nm) => blackbodySun(nm));
    const par = integrateSpectrum(WAVELENGTHS_NM, plain, 400, 700);
    expect(par / 529.96).toBeCloseTo(0.941, 2);
  });
});

describe('AM1.5 direct normal', () => {
  // ASTM G173-03 direct column, integrated: PAR 374.8, 700-1100 nm 305.1 W m-2, 1735 umol m-2 s-1.
  const { direct } = clearSkySpectrum(toRadians(48.19), {
    pressureHpa: 1013.25,
    waterCm: 1.42,
    ozoneAtmCm: 0.34,
    aerosol500: 0.084,
    albedo: 0.2,
  });
  it.each([
    [400, 700, 374.815],
    [700, 1100, 305.075],
  ])('keeps the band %d-%d nm within 3 %%', (from, to, reference) => {
    const band = integrateSpectrum(WAVELENGTHS_NM, direct, from, to);
    expect(Math.abs(band / reference - 1)).toBeLessThan(0.03);
  });

  it('keeps the PAR photons within 3 %', () => {
    const photons = integrateSpectrum(WAVELENGTHS_NM, direct, 400, 700, micromolPerJoule);
    expect(Math.abs(photons / 1735.2 - 1)).toBeLessThan(0.03);
  });
});

describe('make-up of light by sky', () => {
  const table = prepareBandTable(defaultAtmosphere(300, 0.2));
  const split = emptyBandSplit();

  it('moves the PAR share from clear to overcast as measured', () => {
    // Jacovides et al. 2003, Theor. Appl. Climatol. 74: hourly 0.46 to 0.50; clear beam 0.40-0.43.
    splitBands(table, toRadians(50), 900, 1, split);
    expect(parOf(split.direct, 0)).toBeGreaterThan(0.39);
    expect(parOf(split.direct, 0)).toBeLessThan(0.44);
    splitBands(table, toRadians(50), 0, 1, split);
    expect(parOf(split.diffuse, 0)).toBeGreaterThan(0.46);
    expect(parOf(split.diffuse, 0)).toBeLessThan(0.51);
  });

  it('has 4.57 umol per joule of daylight PAR (Thimijan & Heins 1983) within 2 %', () => {
    splitBands(table, toRadians(50), 900, 1, split);
    const perJoule = parOf(split.direct, PHOTONS) / parOf(split.direct, 0);
    expect(Math.abs(perJoule / 4.57 - 1)).toBeLessThan(0.02);
  });

  it('keeps the energy: shares of the seven bands sum to 1 for beam and diffuse', () => {
    for (const dni of [0, 200, 900]) {
      splitBands(table, toRadians(23), dni, 1, split);
      for (const makeup of [split.direct, split.diffuse]) {
        const sum = makeup.slice(0, BAND_COUNT).reduce((total, value) => total + value, 0);
        expect(sum).toBeCloseTo(1, 12);
      }
    }
  });

  it('refuses an atmosphere out of range by name', () => {
    expect(() => clearSkySpectrum(0.5, { ...defaultAtmosphere(0, 0.2), ozoneAtmCm: 3 })).toThrow(
      /ozoneAtmCm/,
    );
    expect(() => clearSkySpectrum(2, defaultAtmosphere(0, 0.2))).toThrow(/apparentZenith/);
  });
});
