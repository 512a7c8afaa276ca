import { describe, expect, it } from 'vitest';
import type { ModuleSpec } from '../../src/contract/layout.js';
import { addInstant, litStrings, noEnergy, type PanelInstant } from '../../src/power/energy.js';
import { faimanTemperature, incidenceModifier } from '../../src/power/module.js';

const MODULE: ModuleSpec = {
  powerWm2: 210,
  lengthM: 1.1,
  transmittance: 0,
  frontReflectance: 0.06,
  rearReflectance: 0.1,
  bifaciality: 0.7,
  temperaturePercentPerK: -0.4,
};
const PLANT = { module: MODULE, collectorWidthM: 2.2, dcAcRatio: 0.5, lossesPercent: 0 };

/** Full sun square on the front, cells at 25 deg C. */
const FULL_SUN: PanelInstant = {
  direct: 1000,
  directOnFront: true,
  cosIncidence: 1,
  litShare: 1,
  diffuseFront: 0,
  diffuseRear: 0,
  spectralDirect: 1,
  spectralDiffuse: 1,
  airC: 25 - 1000 / 31.84,
  windMs: 1,
};
const INVERTER = 0.96;

const powerOf = (change: Partial<PanelInstant>, plant = PLANT) =>
  addInstant(plant, { ...FULL_SUN, ...change }, 1, noEnergy());

describe('module temperature (Faiman 2008)', () => {
  it('is 51.4 deg C at 1000 W/m2, 1 m/s, 20 deg C', () => {
    expect(faimanTemperature(1000, 20, 1)).toBeCloseTo(51.4, 1);
  });

  it('refuses wind below zero by name', () => {
    expect(() => faimanTemperature(500, 20, -1)).toThrow(/windMs/);
  });
});

describe('incidence modifier (De Soto, Klein & Beckman 2006)', () => {
  it('is 1 square on and 0 from behind', () => {
    expect(incidenceModifier(1)).toBeCloseTo(1, 9);
    expect(incidenceModifier(-0.1)).toBe(0);
  });

  it('follows Snell, Fresnel and Bouguer at 60 deg: 0.9334 transmitted part worked by hand', () => {
    // sin r = sin 60 / 1.526 -> r = 34.577 deg; mean of both polarisations reflects 0.09345;
    // path 0.002 m x 4 m-1 / cos r; square on: reflects 0.04336.
    const r = Math.asin(Math.sin(Math.PI / 3) / 1.526);
    const byHand = (Math.exp(-0.008 / Math.cos(r)) * (1 - 0.09345)) / (Math.exp(-0.008) * 0.95664);
    expect(incidenceModifier(0.5)).toBeCloseTo(byHand, 3);
  });

  it('falls all the way to grazing', () => {
    const angles = [0, 20, 40, 60, 70, 80, 85, 89];
    const values = angles.map((deg) => incidenceModifier(Math.cos((deg * Math.PI) / 180)));
    for (let i = 1; i < values.length; i += 1) expect(values[i]).toBeLessThan(values[i - 1]);
  });
});

describe('power of an instant', () => {
  it('is rated power times the inverter at rating conditions', () => {
    expect(powerOf({})).toBeCloseTo(INVERTER, 9);
  });

  it('loses 0.4 % a kelvin', () => {
    expect(powerOf({ airC: FULL_SUN.airC + 10 })).toBeCloseTo(INVERTER * 0.96, 9);
  });

  it('takes the rear at its bifaciality', () => {
    const front = powerOf({ airC: -20 });
    const rear = powerOf({ airC: -20, directOnFront: false });
    expect(rear / front).toBeCloseTo(0.7, 9);
  });

  it('stops at the inverter limit and counts what is cut', () => {
    const sums = noEnergy();
    const power = addInstant({ ...PLANT, dcAcRatio: 1.25 }, FULL_SUN, 2, sums);
    expect(power).toBeCloseTo(0.8, 12);
    expect(sums.clipping).toBeCloseTo(2 * (INVERTER - 0.8), 12);
  });

  it('accounts for all losses: ideal less losses is what is fed in', () => {
    const sums = noEnergy();
    const plant = { ...PLANT, dcAcRatio: 1.3, lossesPercent: 14.1 };
    addInstant(
      plant,
      {
        ...FULL_SUN,
        litShare: 0.6,
        cosIncidence: 0.4,
        diffuseFront: 120,
        diffuseRear: 60,
        airC: 31,
      },
      0.5,
      sums,
    );
    const rest = sums.ideal - sums.rowShade - sums.incidence - sums.temperature - sums.clipping;
    expect(rest).toBeCloseTo(sums.ac, 12);
  });

  it('loses a whole string to a shade that touches it', () => {
    // 2.2 m carry four strings of 0.55 m; a tenth in shade costs a quarter of the direct light.
    expect(litStrings(0.9, 2.2)).toBe(0.75);
    expect(litStrings(1, 2.2)).toBe(1);
    expect(powerOf({ litShare: 0.9, airC: -60 })).toBeLessThan(powerOf({ airC: -60 }) * 0.8);
  });

  it('gives nothing in the dark', () => {
    expect(powerOf({ direct: 0 })).toBe(0);
  });
});
