import { requireWithin } from '../errors.js';

/** Axis of a single-axis tracker. Radians. */
export interface TrackerAxis {
  /** Direction the axis points to, clockwise from north. */
  azimuth: number;
  /** Tilt of the axis from horizontal, positive where it falls towards its azimuth. */
  tilt: number;
  /** Slope of the ground across the axis (crossAxisSlope); 0 on level ground. */
  crossSlope: number;
}

/**
 * Rotation that faces the sun best: right-handed about the axis direction, 0 flat.
 *
 * @param axis tracker axis
 * @param sunAzimuth radians
 * @param sunAltitude radians
 * @returns radians, -pi to pi; with an axis to the north, positive faces east
 * Source: Anderson & Mikofski 2020, NREL/TP-5K00-76626, eq. 5 and 7.
 */
export function trueRotation(axis: TrackerAxis, sunAzimuth: number, sunAltitude: number): number {
  const x = Math.cos(sunAltitude) * Math.sin(sunAzimuth);
  const y = Math.cos(sunAltitude) * Math.cos(sunAzimuth);
  const z = Math.sin(sunAltitude);
  const sinA = Math.sin(axis.azimuth);
  const cosA = Math.cos(axis.azimuth);
  const across = x * cosA - y * sinA;
  const up = (x * sinA + y * cosA) * Math.sin(axis.tilt) + z * Math.cos(axis.tilt);
  return Math.atan2(across, up);
}

/**
 * Rotation turned back from the sun just so far that rows do not shade each other.
 *
 * @param ideal true rotation, radians
 * @param groundCover collector width over pitch, 0-1
 * Source: Anderson & Mikofski 2020, eq. 14-16.
 */
export function backtrackedRotation(axis: TrackerAxis, ideal: number, groundCover: number): number {
  requireWithin('groundCover', groundCover, 0, 1);
  const spacing = 1 / (groundCover * Math.cos(axis.crossSlope));
  const reach = Math.abs(spacing * Math.cos(ideal - axis.crossSlope));
  return reach < 1 ? ideal - Math.sign(ideal) * Math.acos(reach) : ideal;
}

/**
 * Rotation in which the panel throws the least shade: edge-on to the sun, or as near to it as the
 * stops let it turn.
 *
 * @param ideal true rotation, radians
 * @param limit largest rotation, radians
 */
export function leastShadeRotation(ideal: number, limit: number): number {
  const candidates = [limit, -limit, ideal + Math.PI / 2, ideal - Math.PI / 2];
  let best = limit;
  for (const candidate of candidates) {
    if (Math.abs(candidate) > limit + 1e-12) continue;
    if (Math.abs(Math.cos(candidate - ideal)) < Math.abs(Math.cos(best - ideal)) - 1e-12) {
      best = candidate;
    }
  }
  return best;
}

/** Hold a rotation within the stops. */
export const withinStops = (rotation: number, limit: number): number =>
  Math.min(Math.max(rotation, -limit), limit);

/**
 * Axis of a tracker that follows a slope.
 *
 * @param axisAzimuth direction of the axis, radians
 * @param slope of the ground, radians
 * @param aspect way the ground falls, radians clockwise from north
 * Source: Anderson & Mikofski 2020, eq. 18-20 (axis in the ground plane).
 */
export function axisOnSlope(axisAzimuth: number, slope: number, aspect: number): TrackerAxis {
  requireWithin('slope', slope, 0, 1, 'rad');
  const turn = axisAzimuth - aspect;
  const tilt = Math.atan(Math.tan(slope) * Math.cos(turn));
  // Across the axis the ground's normal leans by its share towards azimuth + 90 degrees.
  const lean = Math.sin(slope) * Math.cos(aspect - axisAzimuth - Math.PI / 2);
  const upright = Math.sqrt(Math.max(1 - lean * lean, 0));
  return { azimuth: axisAzimuth, tilt, crossSlope: Math.atan2(lean, upright) };
}
