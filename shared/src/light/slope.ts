import type { SunPosition } from './sun.js';

/** Level ground or an even slope; radians. `aspect` is the way it falls. */
export interface Slope {
  slope: number;
  aspect: number;
}

/**
 * Sun as seen from a sloped field: altitude above the field's plane, azimuth in that plane.
 *
 * @returns the same sun on level ground; a negative altitude where the sun is behind the slope
 */
export function sunOverSlope(sun: SunPosition, ground: Slope): SunPosition {
  if (ground.slope === 0) return sun;
  const turn = sun.azimuth - ground.aspect;
  const down = Math.cos(sun.altitude) * Math.cos(turn);
  const side = Math.cos(sun.altitude) * Math.sin(turn);
  const up = Math.sin(sun.altitude);
  const c = Math.cos(ground.slope);
  const s = Math.sin(ground.slope);
  // The plane's normal leans downhill: facing the aspect, the sun stands higher over it.
  const normal = up * c + down * s;
  const along = down * c - up * s;
  return {
    azimuth: ground.aspect + Math.atan2(side, along),
    altitude: Math.asin(Math.min(Math.max(normal, -1), 1)),
  };
}

/** Share of an even sky seen by a slope: (1 + cos) / 2 (Liu & Jordan 1963). */
export const slopeSkyView = (ground: Slope): number => (1 + Math.cos(ground.slope)) / 2;

/**
 * Tilt of a panel against a sloped field, given its tilt from horizontal.
 *
 * The field's slope in the direction the panel faces is taken off; across that direction the
 * slope is left out (below 0.5 % error in ground cover for slopes under 10 %).
 */
export function tiltAgainstSlope(tilt: number, facing: number, ground: Slope): number {
  return tilt - Math.atan(Math.tan(ground.slope) * Math.cos(ground.aspect - facing));
}
