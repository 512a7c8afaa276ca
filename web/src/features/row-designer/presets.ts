import type { Layout, LayoutKind } from '@furrowlight/shared/contract/layout';
import { usualAzimuth } from './design';

/** Plain two-sided silicon modules (common practice, 2026). */
const MODULE: Layout['module'] = {
  powerWm2: 215,
  lengthM: 1.13,
  transmittance: 0,
  frontReflectance: 0.06,
  rearReflectance: 0.1,
  bifaciality: 0.75,
  temperaturePercentPerK: -0.34,
};

const COMMON = {
  headlandM: 14,
  sideMarginM: 4,
  offsetM: 0,
  postSpacingM: 6,
  structureShade: 0.02,
  module: MODULE,
  gaps: null,
  tracker: null,
  dcAcRatio: 1.15,
  lossesPercent: 12,
};

type Rows = Pick<
  Layout,
  'pitchM' | 'collectorWidthM' | 'tiltDeg' | 'clearHeightM' | 'stripWidthM' | 'tracker'
>;

/** Where a design of each kind starts (common practice); everything can be changed. */
const ROWS: Record<LayoutKind, Rows> = {
  'overhead-fixed': {
    pitchM: 11,
    collectorWidthM: 3.4,
    tiltDeg: 20,
    clearHeightM: 4.6,
    stripWidthM: 0.8,
    tracker: null,
  },
  'between-fixed': {
    pitchM: 16,
    collectorWidthM: 4.2,
    tiltDeg: 25,
    clearHeightM: 0.9,
    stripWidthM: 4.4,
    tracker: null,
  },
  'vertical-bifacial': {
    pitchM: 12,
    collectorWidthM: 2.2,
    tiltDeg: 90,
    clearHeightM: 0.9,
    stripWidthM: 0.9,
    tracker: null,
  },
  'single-axis-tracker': {
    pitchM: 12,
    collectorWidthM: 2.4,
    tiltDeg: 0,
    clearHeightM: 2.2,
    stripWidthM: 1,
    tracker: { maxAngleDeg: 55, programme: 'backtracking', cropFirst: [] },
  },
};

/** Rows of a kind to begin with on a field of that latitude. */
export const presetOf = (kind: LayoutKind, latitude: number): Layout => ({
  ...COMMON,
  kind,
  azimuthDeg: usualAzimuth(kind, latitude),
  ...ROWS[kind],
});
