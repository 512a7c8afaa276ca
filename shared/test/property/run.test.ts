import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { benchWeather, OVERHEAD, SITE, TRACKER, yearInput } from '../../bench/inputs.js';
import type { Layout } from '../../src/contract/layout.js';
import type { RunResult } from '../../src/contract/result.js';
import type { RunInput, Site } from '../../src/contract/run.js';
import type { SplitSums } from '../../src/light/sun-split.js';
import { fillDaySuns } from '../../src/run/instants.js';
import { runScenario, RunStopped } from '../../src/run/run-scenario.js';
import { prepareRun, tableOf } from '../../src/run/state.js';
import { countSun } from '../../src/run/step.js';

const WEATHER = benchWeather();
const TABLE = tableOf(SITE);

const VERTICAL: Layout = {
  ...OVERHEAD,
  kind: 'vertical-bifacial',
  tiltDeg: 90,
  azimuthDeg: 90,
  collectorWidthM: 2,
  clearHeightM: 0.8,
};

const quick = (layout: Layout, change: Partial<RunInput> = {}): RunInput => ({
  ...yearInput(layout, WEATHER, 10, 30),
  ...change,
});

const layouts: fc.Arbitrary<Layout> = fc
  .record({
    base: fc.constantFrom(OVERHEAD, VERTICAL, TRACKER),
    pitchM: fc.double({ min: 4, max: 20, noNaN: true }),
    azimuthDeg: fc.double({ min: 0, max: 360, noNaN: true }),
    transmittance: fc.double({ min: 0, max: 0.6, noNaN: true }),
    rearReflectance: fc.double({ min: 0, max: 0.3, noNaN: true }),
    structureShade: fc.double({ min: 0, max: 0.2, noNaN: true }),
  })
  .map(({ base, transmittance, rearReflectance, ...rest }) => ({
    ...base,
    ...rest,
    module: { ...base.module, transmittance, rearReflectance },
  }));

const sites: fc.Arbitrary<Site> = fc
  .record({
    // The weather is that of 45 degrees north.
    latitude: fc.double({ min: 40, max: 50, noNaN: true }),
    slopePercent: fc.constantFrom(0, 0, 5, 12),
    aspectDeg: fc.double({ min: 0, max: 360, noNaN: true }),
    albedo: fc.double({ min: 0.05, max: 0.8, noNaN: true }),
  })
  .map((change) => ({ ...SITE, ...change }));

const kept = (sums: SplitSums) => sums.kept + sums.reflected + sums.cropPar + sums.cropOther;

describe('energy', () => {
  it('closes at every sun of a day to 1e-9 of what came in', () => {
    fc.assert(
      fc.property(layouts, sites, fc.integer({ min: 0, max: 364 }), (layout, site, day) => {
        const state = prepareRun(quick(layout, { site }), {
          quality: 'preview',
          table: TABLE,
          heightsM: [0.5],
        });
        fillDaySuns(WEATHER, state.ground, day, state.suns);
        let seen = { incoming: 0, kept: 0 };
        for (let i = 0; i < state.suns.count; i += 1) {
          countSun(state, day, i);
          const month = state.months.find(({ incoming }) => incoming > 0);
          if (!month) continue;
          const now = { incoming: month.incoming, kept: kept(month) };
          const step = now.incoming - seen.incoming;
          expect(Math.abs(now.kept - seen.kept - step)).toBeLessThanOrEqual(1e-9 * now.incoming);
          seen = now;
        }
        expect(seen.incoming).toBeGreaterThanOrEqual(0);
      }),
      { numRuns: 25, seed: 7 },
    );
  });

  it('splits every month and the year into parts that sum to 100', () => {
    for (const layout of [OVERHEAD, VERTICAL, TRACKER]) {
      const { sunSplit } = runScenario(quick(layout));
      for (const split of [sunSplit.year, ...sunSplit.months]) {
        const { electricity, panelHeat, reflected, cropPar, otherOnCrop } = split;
        const sum = electricity + panelHeat + reflected + cropPar + otherOnCrop;
        expect(Math.abs(sum - 100)).toBeLessThan(1e-7);
        expect(Math.min(electricity, panelHeat, reflected, cropPar, otherOnCrop)).toBeGreaterThan(
          0,
        );
      }
    }
  });

  it('keeps each hour of the weather file when it is spread over suns', () => {
    const state = prepareRun(quick(OVERHEAD));
    for (const day of [10, 100, 172, 300]) {
      fillDaySuns(WEATHER, state.ground, day, state.suns);
      const { suns } = state;
      const sums = new Map<number, number>();
      for (let i = 0; i < suns.count; i += 1) {
        const onGround = suns.dni[i] * Math.sin(suns.altitude[i]) + suns.dhi[i];
        const hour = suns.hour[i];
        sums.set(hour, (sums.get(hour) ?? 0) + onGround * suns.stepHours);
      }
      for (let hour = day * 24; hour < day * 24 + 24; hour += 1) {
        expect(sums.get(hour) ?? 0).toBeCloseTo(WEATHER.ghi[hour], 6);
      }
    }
  });
});

const everyNumber = (value: unknown): number[] => {
  if (typeof value === 'number') return [value];
  if (value === null || typeof value !== 'object') return [];
  return Object.values(value).flatMap(everyNumber);
};

describe('a run', () => {
  it('holds no NaN and no infinity for any valid layout and site', () => {
    fc.assert(
      fc.property(layouts, sites, (layout, site) => {
        fc.pre(site.slopePercent === 0 || layout.kind === 'single-axis-tracker');
        const numbers = everyNumber(runScenario(quick(layout, { site })));
        expect(numbers.every(Number.isFinite)).toBe(true);
      }),
      { numRuns: 6, seed: 11 },
    );
  });

  it('gives the same result to the last bit', () => {
    expect(runScenario(quick(TRACKER))).toEqual(runScenario(quick(TRACKER)));
  });

  it('tells vertical rows looking east from the same rows looking west only by the order', () => {
    const module = { ...VERTICAL.module, frontReflectance: 0.1, bifaciality: 1 };
    const east = runScenario(quick({ ...VERTICAL, module }));
    const west = runScenario(quick({ ...VERTICAL, module, azimuthDeg: 270 }));
    const order = (result: RunResult) => result.planes[0].yearDli;
    order(east).forEach((value, i) => {
      expect(order(west)[9 - i]).toBeCloseTo(value, 6);
    });
    expect(west.energy.kwhPerKwp).toBeCloseTo(east.energy.kwhPerKwp, 6);
  });

  it('never darkens with more transmittance', () => {
    const light = [0, 0.2, 0.5].map(
      (transmittance) =>
        runScenario(quick({ ...OVERHEAD, module: { ...OVERHEAD.module, transmittance } })).planes[0]
          .yearDli,
    );
    for (let i = 1; i < light.length; i += 1) {
      light[i].forEach((value, p) => expect(value).toBeGreaterThan(light[i - 1][p]));
    }
  });

  it('does not change when all lengths double', () => {
    const double = { ...OVERHEAD };
    for (const key of ['pitchM', 'collectorWidthM', 'clearHeightM'] as const) double[key] *= 2;
    const crops = quick(OVERHEAD).crops;
    const grown = crops.map((crop) => ({ ...crop, canopyHeightM: 2 * crop.canopyHeightM }));
    const once = runScenario(quick(OVERHEAD)).planes[0].yearDli;
    const twice = runScenario(quick(double, { crops: grown })).planes[0].yearDli;
    once.forEach((value, p) => expect(twice[p]).toBeCloseTo(value, 9));
  });

  it('under an overcast year gives every strip its sky view, all year', () => {
    const weather = { ...WEATHER, dhi: WEATHER.ghi, dni: WEATHER.ghi.map(() => 0) };
    const input = quick(OVERHEAD, { weather });
    const { light } = prepareRun(input).planes[0];
    const result = runScenario(input).planes[0];
    result.yearDli.forEach((value, p) => {
      expect(value / result.year.openDli).toBeCloseTo(light.sky[p], 9);
    });
  });

  it('tends to open field as panels shrink', () => {
    const thin = { ...OVERHEAD, collectorWidthM: 0.3, pitchM: 60, structureShade: 0 };
    expect(runScenario(quick(thin)).planes[0].year.meanShare).toBeGreaterThan(0.99);
  });
});

describe('a crop under rows', () => {
  it('has a second opinion from light use close to its share of light', () => {
    const [crop] = quick(OVERHEAD).crops;
    const lightUse = { lightUseGPerMj: 3, extinction: 0.65, leafAreaMax: 4 };
    const [plain] = runScenario(quick(OVERHEAD)).crops;
    const [grown] = runScenario(quick(OVERHEAD, { crops: [{ ...crop, lightUse }] })).crops;
    expect(plain.relativeBiomass).toBeNull();
    const dim = Math.min(...runScenario(quick(OVERHEAD)).planes[0].months.map((m) => m.meanShare));
    expect(grown.relativeBiomass).toBeGreaterThan(dim);
    expect(grown.relativeBiomass).toBeLessThan(1);
    expect(Math.abs((grown.relativeBiomass ?? 0) - grown.season.meanShare)).toBeLessThan(0.05);
  });
});

describe('a crop-first programme', () => {
  const programme = (from: string, to: string): Layout => ({
    ...TRACKER,
    tracker: {
      maxAngleDeg: 55,
      programme: 'crop-first',
      cropFirst: [{ from, to, startHour: 0, endHour: 24, belowPpfd: null }],
    },
  });

  it('gives the crop light in its window and tells what it costs', () => {
    const plain = runScenario(quick(TRACKER));
    const serving = runScenario(quick(programme('05-01', '06-30')));
    const months = (result: RunResult) => result.planes[0].months.map(({ meanShare }) => meanShare);
    expect(months(serving)[4]).toBeGreaterThan(months(plain)[4] + 0.05);
    expect(months(serving)[7]).toBeCloseTo(months(plain)[7], 12);
    const cost = 100 * (1 - serving.energy.kwhPerKwp / plain.energy.kwhPerKwp);
    expect(serving.energy.cropFirstCostPercent).toBeCloseTo(cost, 6);
    expect(cost).toBeGreaterThan(5);
    expect(plain.energy.cropFirstCostPercent).toBeNull();
    const sumOf = (result: RunResult) =>
      result.planes[0].months
        .slice(4, 6)
        .reduce((sum, { meanDli, days }) => sum + meanDli * days, 0);
    const gain = 100 * (sumOf(serving) / sumOf(plain) - 1);
    expect(serving.energy.cropFirstGainPercent).toBeCloseTo(gain, 6);
    expect(plain.energy.cropFirstGainPercent).toBeNull();
  });

  it('may run over New Year', () => {
    const serving = runScenario(quick(programme('12-01', '01-31')));
    const plain = runScenario(quick(TRACKER));
    const share = (result: RunResult, month: number) => result.planes[0].months[month].meanShare;
    expect(share(serving, 0)).toBeGreaterThan(share(plain, 0));
    expect(share(serving, 11)).toBeGreaterThan(share(plain, 11));
    expect(share(serving, 5)).toBeCloseTo(share(plain, 5), 12);
  });
});

describe('a caller', () => {
  it('can stop a run and follow it', () => {
    let asked = 0;
    const stop = () => runScenario(quick(OVERHEAD), { shouldStop: () => (asked += 1) > 5 });
    expect(stop).toThrow(RunStopped);
    const shares: number[] = [];
    runScenario(quick(OVERHEAD), { onProgress: (share) => shares.push(share) });
    expect(shares).toHaveLength(365);
    expect(shares.at(-1)).toBe(1);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
  });

  it.each<[string, RegExp, () => RunInput]>([
    ['rows that collide', /pitch/i, () => quick({ ...OVERHEAD, pitchM: 2 })],
    ['a tilt beyond 90', /tilt/i, () => quick({ ...OVERHEAD, tiltDeg: 95 })],
    [
      'a year with a missing day',
      /8760/,
      () => quick(OVERHEAD, { weather: { ...WEATHER, ghi: WEATHER.ghi.slice(24) } }),
    ],
    [
      'a module that gives back more light than it gets',
      /more light than falls on it/,
      () =>
        quick({
          ...OVERHEAD,
          module: { ...OVERHEAD.module, transmittance: 0.9, rearReflectance: 0.2 },
        }),
    ],
    [
      'a clock that is half a day off',
      /weather.ghi.*|check the clock/,
      () => quick(OVERHEAD, { weather: { ...WEATHER, utcOffsetHours: -8 } }),
    ],
    [
      'a gap in the temperature',
      /temperatureC/,
      () =>
        quick(OVERHEAD, {
          weather: { ...WEATHER, temperatureC: WEATHER.temperatureC.map((t, i) => (i ? t : NaN)) },
        }),
    ],
  ])('is refused %s by name', (_what, name, input) => {
    expect(() => runScenario(input())).toThrow(name);
  });
});
