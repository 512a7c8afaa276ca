import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  dailyStatistics,
  emptyLightSums,
  periodBudget,
  periodByPosition,
  type LightSums,
} from '../../src/light/budget.js';

const POSITIONS = 20;
const DAYS = 365;

/** A year of made-up light: positions differ, days differ. */
function sumsFrom(scale: number, phase: number): LightSums {
  const sums = emptyLightSums(DAYS, POSITIONS);
  for (let day = 0; day < DAYS; day += 1) {
    sums.open[day] = scale * (1.2 + Math.cos((2 * Math.PI * (day + phase)) / DAYS));
    sums.red[day] = sums.redOpen[day] = 1.1 * sums.open[day];
    sums.farRed[day] = sums.farRedOpen[day] = sums.open[day];
    for (let p = 0; p < POSITIONS; p += 1) {
      sums.par[day * POSITIONS + p] =
        sums.open[day] * (0.3 + (0.6 * ((p * 7) % POSITIONS)) / POSITIONS);
    }
  }
  return sums;
}

const years = fc
  .tuple(fc.double({ min: 1, max: 40, noNaN: true }), fc.integer({ min: 0, max: 364 }))
  .map(([scale, phase]) => sumsFrom(scale, phase));

describe('a light budget', () => {
  it('of a period is the sum of its parts', () => {
    fc.assert(
      fc.property(
        years,
        fc.integer({ min: 0, max: 364 }),
        fc.integer({ min: 1, max: 180 }),
        fc.integer({ min: 1, max: 180 }),
        (sums, first, a, b) => {
          const whole = periodByPosition(sums, first, a + b);
          const left = periodByPosition(sums, first, a);
          const right = periodByPosition(sums, (first + a) % DAYS, b);
          whole.forEach((value, p) => expect(left[p] + right[p]).toBeCloseTo(value, 6));
        },
      ),
      { numRuns: 50, seed: 3 },
    );
  });

  it('ranks darkest, mean and brightest, and evenness is at most 1', () => {
    fc.assert(
      fc.property(years, fc.integer({ min: 0, max: 364 }), (sums, first) => {
        const budget = periodBudget(sums, 'any', first, 30);
        expect(budget.darkestDli).toBeLessThanOrEqual(budget.meanDli);
        expect(budget.meanDli).toBeLessThanOrEqual(budget.brightestDli);
        expect(budget.evenness).toBeLessThanOrEqual(1);
        expect(budget.meanShare).toBeCloseTo(budget.meanDli / budget.openDli, 12);
        expect(budget.redFarRed).toBeCloseTo(1.1, 12);
      }),
      { numRuns: 30, seed: 5 },
    );
  });

  it('takes the mean of the darkest and brightest tenth: two of twenty strips', () => {
    const sums = sumsFrom(10, 0);
    const budget = periodBudget(sums, 'year', 0, DAYS);
    // Shares run 0.30, 0.33 ... 0.87 in some order.
    expect(budget.darkestShare).toBeCloseTo(0.315, 12);
    expect(budget.brightestShare).toBeCloseTo(0.855, 12);
    expect(budget.evenness).toBeCloseTo(0.3 / 0.585, 12);
  });

  it('of single days sums to the year', () => {
    const sums = sumsFrom(25, 40);
    const daily = dailyStatistics(sums).mean.reduce((sum, value) => sum + value, 0);
    expect(daily).toBeCloseTo(periodBudget(sums, 'year', 0, DAYS).meanDli * DAYS, 6);
  });
});
