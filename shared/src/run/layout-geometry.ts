import type { Layout } from '../contract/layout.js';
import type { Site } from '../contract/run.js';
import { toRadians } from '../light/angles.js';
import type { EndlessRowsInput } from '../light/rows/endless.js';
import { tiltAgainstSlope, type Slope } from '../light/slope.js';

/** The ground of a site: slope and aspect in radians. */
export const groundOf = (site: Site): Slope => ({
  slope: Math.atan(site.slopePercent / 100),
  aspect: toRadians(site.aspectDeg),
});

/** Middles of `count` strips across one pitch, symmetric about a row's centre line, m. */
export function stripMiddles(pitchM: number, count: number): Float64Array {
  return Float64Array.from({ length: count }, (_, i) => ((i + 0.5) / count - 0.5) * pitchM);
}

/** Height of the middle of the slant, m: the clear height is that of the lowest edge at its worst. */
function midHeightM(layout: Layout, tilt: number): number {
  const worst =
    layout.kind === 'single-axis-tracker' ? toRadians(layout.tracker?.maxAngleDeg ?? 0) : tilt;
  return layout.clearHeightM + (layout.collectorWidthM / 2) * Math.abs(Math.sin(worst));
}

/** Share of the row's length that modules fill; gaps between modules let light through. */
export function filledShare(layout: Layout): number {
  return layout.gaps ? layout.module.lengthM / (layout.module.lengthM + layout.gaps.gapM) : 1;
}

/**
 * Endless rows of a layout on a site's own ground plane, at one canopy height.
 */
export function rowsOfLayout(
  layout: Layout,
  site: Site,
  receiverHeight: number,
  positions: Float64Array,
): EndlessRowsInput {
  const facing = toRadians(layout.azimuthDeg);
  const fixed = layout.kind !== 'single-axis-tracker';
  const against = fixed ? tiltAgainstSlope(toRadians(layout.tiltDeg), facing, groundOf(site)) : 0;
  const { module, gaps } = layout;
  return {
    geometry: {
      pitch: layout.pitchM,
      width: layout.collectorWidthM,
      tilt: against,
      midHeight: midHeightM(layout, against),
      surfaceAzimuth: facing,
    },
    optics: {
      transmittance: module.transmittance,
      frontReflectance: module.frontReflectance,
      rearReflectance: module.rearReflectance,
      albedo: site.albedo,
      structureShade: layout.structureShade,
    },
    receiverHeight,
    positions,
    gaps: gaps
      ? { moduleLength: module.lengthM, gapLength: gaps.gapM, checkerboard: gaps.checkerboard }
      : undefined,
  };
}
