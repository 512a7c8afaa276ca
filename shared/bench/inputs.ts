import type { Layout } from '../src/contract/layout.js';
import type { RunInput, Site } from '../src/contract/run.js';
import { climateYear } from '../src/light/climate.js';
import type { HourlyYear } from '../src/light/weather-year.js';

/** Level field in a temperate plain. */
export const SITE: Site = {
  latitude: 45,
  longitude: 8,
  elevationM: 150,
  slopePercent: 0,
  aspectDeg: 180,
  albedo: 0.2,
};

/** A made-up temperate climate: every bench run counts the same suns. */
export const benchWeather = (): HourlyYear =>
  climateYear({
    latitude: SITE.latitude,
    longitude: SITE.longitude,
    elevationM: SITE.elevationM,
    year: 2025,
    utcOffsetHours: 1,
    monthlyMjM2: [4.8, 7.9, 12.4, 16.2, 19.6, 22.4, 23.3, 19.6, 14.4, 9.1, 5.3, 4],
    monthlyMinC: [-2, -1, 3, 7, 11, 15, 17, 17, 13, 8, 3, -1],
    monthlyMaxC: [6, 9, 14, 18, 22, 27, 29, 28, 24, 18, 11, 7],
  });

export const OVERHEAD: Layout = {
  kind: 'overhead-fixed',
  pitchM: 9.5,
  collectorWidthM: 3.4,
  tiltDeg: 20,
  azimuthDeg: 180,
  clearHeightM: 5,
  headlandM: 12,
  sideMarginM: 3,
  stripWidthM: 0.8,
  offsetM: 0,
  postSpacingM: 6,
  structureShade: 0.02,
  module: {
    powerWm2: 210,
    lengthM: 1.1,
    transmittance: 0.05,
    frontReflectance: 0.06,
    rearReflectance: 0.1,
    bifaciality: 0.75,
    temperaturePercentPerK: -0.35,
  },
  gaps: null,
  tracker: null,
  dcAcRatio: 1.2,
  lossesPercent: 14.1,
};

export const TRACKER: Layout = {
  ...OVERHEAD,
  kind: 'single-axis-tracker',
  tiltDeg: 0,
  azimuthDeg: 90,
  clearHeightM: 2.5,
  tracker: { maxAngleDeg: 55, programme: 'backtracking', cropFirst: [] },
};

/** A year's run of a layout with wheat below it. */
export const yearInput = (
  layout: Layout,
  weather: HourlyYear,
  positions: number,
  sunStepMinutes: 10 | 30,
): RunInput => ({
  site: SITE,
  layout,
  crops: [
    {
      seasonId: 'bench',
      cropId: 'wheat',
      cropName: 'Wheat',
      shadeClass: 'tolerant',
      canopyHeightM: 1,
      firstDay: 280,
      days: 285,
      stages: [],
    },
  ],
  options: { positions, sunStepMinutes, sky: 'hay-davies' },
  weather,
});

/** Candidate `n` of a layout search: pitch, tilt and height walk through their ranges. */
export const candidate = (n: number): Layout => ({
  ...OVERHEAD,
  pitchM: 6 + (n % 20) * 0.5,
  tiltDeg: 10 + (Math.floor(n / 20) % 10) * 3,
  clearHeightM: 2.5 + (Math.floor(n / 200) % 5) * 0.7,
});
