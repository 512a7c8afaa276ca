import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { benchWeather, OVERHEAD, SITE, TRACKER, yearInput } from '../../bench/inputs.js';
import { Layout } from '../../src/contract/layout.js';
import { preparePreview, previewLayout } from '../../src/run/preview.js';
import { runScenario } from '../../src/run/run-scenario.js';
import { sliceAt } from '../../src/run/slice.js';

const WEATHER = benchWeather();
const PLACE = preparePreview(SITE, WEATHER);
const SEASON = { firstDay: 280, days: 285 };
const VERTICAL: Layout = {
  ...OVERHEAD,
  kind: 'vertical-bifacial',
  tiltDeg: 90,
  azimuthDeg: 90,
  collectorWidthM: 2,
  clearHeightM: 0.8,
};

describe('a preview', () => {
  it.each([
    ['overhead rows', OVERHEAD],
    ['vertical rows', VERTICAL],
    ['a tracker', TRACKER],
  ])('of %s is within 0.02 of the full run in light and 3 % in energy', (_name, layout) => {
    const preview = previewLayout(PLACE, layout, 1, SEASON);
    const run = runScenario(yearInput(layout, WEATHER, 40, 10));
    const { season } = run.crops[0];
    expect(Math.abs(preview.meanShare - season.meanShare)).toBeLessThan(0.02);
    expect(Math.abs(preview.darkestShare - season.darkestShare)).toBeLessThan(0.02);
    expect(Math.abs(preview.brightestShare - season.brightestShare)).toBeLessThan(0.02);
    expect(Math.abs(preview.openDli / season.openDli - 1)).toBeLessThan(0.02);
    expect(Math.abs(preview.kwhPerKwp / run.energy.kwhPerKwp - 1)).toBeLessThan(0.03);
  });

  it('refuses a season without days by name', () => {
    expect(() => previewLayout(PLACE, OVERHEAD, 1, { firstDay: 3, days: 0 })).toThrow(
      /season.days/,
    );
  });
});

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

/** Layouts over the whole range of the contract; what it refuses is left out. */
const anyLayout: fc.Arbitrary<Layout> = fc
  .record({
    base: fc.constantFrom(OVERHEAD, VERTICAL, TRACKER),
    pitchM: between(1, 60),
    collectorWidthM: between(0.3, 12),
    tiltDeg: between(0, 90),
    azimuthDeg: between(0, 360),
    clearHeightM: between(0, 12),
    structureShade: between(0, 0.2),
    dcAcRatio: between(0.5, 3),
    gaps: fc.option(fc.record({ gapM: between(0.05, 20), checkerboard: fc.boolean() })),
    transmittance: between(0, 0.9),
    reflectance: between(0, 0.5),
    maxAngleDeg: between(10, 90),
  })
  .map(({ base, transmittance, reflectance, maxAngleDeg, ...rest }) => ({
    ...base,
    ...rest,
    module: { ...base.module, transmittance, frontReflectance: reflectance },
    tracker: base.tracker && { ...base.tracker, maxAngleDeg },
  }))
  .filter((layout) => Layout.safeParse(layout).success);

describe('any layout that the contract lets through', () => {
  it('gives finite numbers and shares between 0 and little over 1, canopy above panels included', () => {
    fc.assert(
      fc.property(anyLayout, between(0, 8), (layout, canopyHeightM) => {
        const preview = previewLayout(PLACE, layout, canopyHeightM, SEASON, 10);
        const { share, kwhPerKwp, evenness } = preview;
        expect([...share, kwhPerKwp, evenness, preview.kwhPerM2Land].every(Number.isFinite)).toBe(
          true,
        );
        expect(Math.min(...share)).toBeGreaterThanOrEqual(0);
        expect(Math.max(...share)).toBeLessThan(1.3);
        expect(kwhPerKwp).toBeGreaterThan(0);
        const moment = { year: 2025, day: 100, hour: 9, utcOffsetHours: 1 };
        expect(sliceAt(PLACE, layout, canopyHeightM, moment, 10).ppfd.every(Number.isFinite)).toBe(
          true,
        );
      }),
      { numRuns: 60, seed: 13 },
    );
  });
});

describe('a slice', () => {
  const noon = { year: 2025, day: 171, hour: 12.45, utcOffsetHours: 1 };

  it('has the shadow that plane geometry gives and darkness in it', () => {
    const slice = sliceAt(PLACE, OVERHEAD, 1, noon, 200);
    const [shadow] = slice.shadows;
    const angle = ((slice.profileAngleDeg ?? 0) * Math.PI) / 180;
    const tilt = (OVERHEAD.tiltDeg * Math.PI) / 180;
    // Shaded share = w |cos b + sin b tan a| / p (brief of the domain, exact for long rows).
    const width = OVERHEAD.collectorWidthM * (Math.cos(tilt) + Math.sin(tilt) * Math.tan(angle));
    expect(shadow.to - shadow.from).toBeCloseTo(width, 9);
    slice.positionsM.forEach((u, i) => {
      const inside = u > shadow.from + 0.1 && u < shadow.to - 0.1;
      const outside = u < shadow.from - 0.1 || u > shadow.to + 0.1;
      if (inside) expect(slice.ppfd[i]).toBeLessThan(0.3 * slice.openPpfd);
      if (outside) expect(slice.ppfd[i]).toBeGreaterThan(0.9 * slice.openPpfd);
    });
  });

  it('mirrors a tracker between morning and afternoon', () => {
    const at = (hour: number) => sliceAt(PLACE, TRACKER, 1, { ...noon, hour }, 20);
    const morning = at(9);
    expect(morning.tiltDeg).toBeGreaterThan(0);
    expect(at(16).tiltDeg).toBeLessThan(0);
    // A tracker that follows the sun squarely has its profile angle as tilt.
    expect(morning.tiltDeg).toBeCloseTo(morning.profileAngleDeg ?? 0, 6);
    expect(morning.edges[0].z).toBeGreaterThan(morning.edges[1].z);
  });

  it('is dark at night', () => {
    const night = sliceAt(PLACE, OVERHEAD, 1, { ...noon, hour: 1 }, 10);
    expect(night.profileAngleDeg).toBeNull();
    expect(night.shadows).toEqual([]);
    expect(Math.max(...night.ppfd, night.openPpfd)).toBe(0);
  });
});
