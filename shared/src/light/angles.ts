/** Radians in one degree. */
export const DEG = Math.PI / 180;

/** Degrees to radians. */
export const toRadians = (degrees: number): number => degrees * DEG;

/** Radians to degrees. */
export const toDegrees = (radians: number): number => radians / DEG;

/** Wrap an angle in radians to [0, 2 pi). */
export function wrapTwoPi(radians: number): number {
  const wrapped = radians % (2 * Math.PI);
  return wrapped < 0 ? wrapped + 2 * Math.PI : wrapped;
}

/** Wrap an angle in radians to [-pi, pi). */
export function wrapPi(radians: number): number {
  return wrapTwoPi(radians + Math.PI) - Math.PI;
}
