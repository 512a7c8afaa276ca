import { describe, expect, it } from 'vitest';
import {
  blackbodyShareBelow,
  blackbodySun,
  micromolPerJoule,
  planckExitance,
  STEFAN_BOLTZMANN,
} from '../../src/light/spectrum.js';

describe('blackbody', () => {
  it.each([
    // Incropera & DeWitt, Table 12.1 (from memory); share of energy below lambda T, um K.
    [1000, 0.000321],
    [2000, 0.066728],
    [2898, 0.250108],
    [4000, 0.480877],
    [6000, 0.737818],
    [10_000, 0.914199],
  ])('keeps the textbook share below %d um K', (product, share) => {
    expect(Math.abs(blackbodyShareBelow(product, 'energy') - share)).toBeLessThan(5e-5);
  });

  it('splits 5772 K as integrated independently', () => {
    // Below 400 nm 12.2 %, 400-700 nm 36.6 %, above 51.2 % (Planck's law, independent integration).
    const below = (nm: number) => blackbodyShareBelow((nm / 1000) * 5772, 'energy');
    expect(below(400)).toBeCloseTo(0.122, 3);
    expect(below(700) - below(400)).toBeCloseTo(0.366, 3);
  });

  it('is continuous where the series changes over', () => {
    const at = 14387.76877 / 0.35;
    const step =
      blackbodyShareBelow(at * 1.0001, 'photons') - blackbodyShareBelow(at * 0.9999, 'photons');
    expect(step).toBeGreaterThan(0);
    expect(step).toBeLessThan(1e-5);
  });

  it('integrates to sigma T^4 and peaks where Wien says', () => {
    let sum = 0;
    let peak = 0;
    for (let nm = 100; nm < 40_000; nm += 1) {
      const value = planckExitance(nm, 5772);
      sum += value;
      if (value > planckExitance(peak || 100, 5772)) peak = nm;
    }
    expect(sum / (STEFAN_BOLTZMANN * 5772 ** 4)).toBeCloseTo(1, 3);
    expect(peak).toBe(502); // 2897.77 um K / 5772 K
  });
});

describe('common practice of the trade', () => {
  const peakOf = (kelvin: number) => 2897.771955 / kelvin;

  it('sees light from 400 to 700 nm and the sun peak in it, near 5800 K', () => {
    expect(peakOf(5800) * 1000).toBeGreaterThan(400);
    expect(peakOf(5800) * 1000).toBeLessThan(700);
  });

  it('has the earth peak close to 10 um', () => {
    expect(peakOf(288)).toBeGreaterThan(9.5);
    expect(peakOf(288)).toBeLessThan(10.5);
  });

  it('lets a body begin to glow above about 500 deg C', () => {
    // Share of energy in visible light: still tiny at 500 deg C, thousands of times less at 200.
    const visible = (kelvin: number) =>
      blackbodyShareBelow(0.7 * kelvin, 'energy') * STEFAN_BOLTZMANN * kelvin ** 4;
    expect(visible(773) / visible(473)).toBeGreaterThan(1e4);
  });

  it('counts a photon as h c / wavelength', () => {
    // 1 J at 550 nm is 4.598 umol; at 400-700 nm between 3.34 and 5.85.
    expect(micromolPerJoule(550)).toBeCloseTo(4.598, 3);
    expect(micromolPerJoule(700) / micromolPerJoule(350)).toBeCloseTo(2, 12);
  });

  it('keeps the blackbody sun at 1361 W m-2', () => {
    let sum = 0;
    for (let nm = 50; nm < 100_000; nm += 5) sum += blackbodySun(nm) * 5;
    expect(sum).toBeCloseTo(1361, -1);
  });
});
