import type { Layout } from '../contract/layout.js';
import type { Site } from '../contract/run.js';
import { InputError } from '../errors.js';
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
export function midHeightM(layout: Layout): number {
  const worst =
    layout.kind === 'single-axis-tracker' ? (layout.tracker?.maxAngleDeg ?? 0) : layout.tiltDeg;
  return layout.clearHeightM + (layout.collectorWidthM / 2) * Math.sin(toRadians(worst));
}

/**
 * Share of the row's length that modules fill; gaps between modules let light through.
 * The endless-row form spreads them evenly along the row.
 */
export function filledShare(layout: Layout): number {
  return layout.gaps ? layout.module.lengthM / (layout.module.lengthM + layout.gaps.gapM) : 1;
}

/**
 * Endless rows of a layout on a site's own ground plane, at one canopy height.
 *
 * @throws InputError naming the part of the layout that cannot stand there
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
  if (against < 0) {
    throw new InputError(
      'layout.tiltDeg',
      'The ground falls more steeply than the panels tilt: raise the tilt or turn the rows.',
    );
  }
  const { module } = layout;
  const filled = filledShare(layout);
  const transmittance = 1 - filled * (1 - module.transmittance);
  return {
    geometry: {
      pitch: layout.pitchM,
      width: layout.collectorWidthM,
      tilt: Math.min(against, Math.PI / 2),
      midHeight: midHeightM(layout),
      surfaceAzimuth: facing,
    },
    optics: {
      transmittance,
      frontReflectance: module.frontReflectance * filled,
      rearReflectance: module.rearReflectance * filled,
      albedo: site.albedo,
      structureShade: layout.structureShade,
    },
    receiverHeight,
    positions,
  };
}
