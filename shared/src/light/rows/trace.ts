import type { RowGeometry } from './geometry.js';

/** Rows a ray may pass before what lies beyond counts as sky. */
const FARTHEST_ROW = 400;

/** How finely surfaces and directions are cut. */
export interface Cut {
  /** Ground strips across one pitch. */
  ground: number;
  /** Strips of each panel face along the slant. */
  face: number;
  /** Directions per hemisphere in the plane across. */
  directions: number;
}

/** Elements in one vector: ground strips, then front strips (upper to lower edge), then rear strips. */
export const elementCount = (cut: Cut): number => cut.ground + 2 * cut.face;

/** Ground strip below u, for a pitch that begins at u = 0. */
export function groundStrip(geometry: RowGeometry, cut: Cut, u: number): number {
  const place = u / geometry.pitch;
  return Math.min(Math.floor((place - Math.floor(place)) * cut.ground), cut.ground - 1);
}

/** Strip of a face at slant coordinate q (-w/2 upper edge, +w/2 lower edge). */
function faceStrip(geometry: RowGeometry, cut: Cut, q: number): number {
  const strip = Math.floor((q / geometry.width + 0.5) * cut.face);
  return Math.min(Math.max(strip, 0), cut.face - 1);
}

/**
 * Follow a ray in the plane across the rows and hand out its light.
 *
 * At each panel the share 1 - transmittance stays (reflected or absorbed there), the rest goes on.
 * What reaches the ground stays there. The return value is what leaves to the sky, so that the sum
 * of all shares is the weight given.
 *
 * @param u0 start across, m
 * @param z0 start height, m
 * @param dirU direction across, unit vector with dirZ
 * @param dirZ direction up
 * @param keep called with element index and the weight that stays
 * @returns weight that leaves to the sky
 */
export function followRay(
  geometry: RowGeometry,
  cut: Cut,
  transmittance: number,
  u0: number,
  z0: number,
  dirU: number,
  dirZ: number,
  weight: number,
  keep: (element: number, weight: number) => void,
): number {
  const { pitch, width, tilt, midHeight } = geometry;
  const half = width / 2;
  const c = Math.cos(tilt);
  const s = Math.sin(tilt);
  const across = dirU * s + dirZ * c;
  let left = weight;
  if (Math.abs(across) > 1e-12 && width > 0) {
    // Panel k is met where (u - k pitch) s + (z - mid) c = 0; distances rise or fall evenly with k.
    const distance = (k: number) => -((u0 - k * pitch) * s + (z0 - midHeight) * c) / across;
    const step = (pitch * s) / across;
    const slant = (k: number, t: number) =>
      (u0 + dirU * t - k * pitch) * c - (z0 + dirZ * t - midHeight) * s;
    const rowSpan = Math.abs(dirU) < 1e-12 ? 0 : FARTHEST_ROW;
    const near = Math.round(u0 / pitch);
    const consider = (k: number) => {
      const t = distance(k);
      if (t <= 1e-9) return;
      const q = slant(k, t);
      if (Math.abs(q) > half) return;
      // Light moving against the front normal (across < 0) lands on the front.
      const face = across < 0 ? 0 : 1;
      keep(cut.ground + face * cut.face + faceStrip(geometry, cut, q), left * (1 - transmittance));
      left *= transmittance;
    };
    const done = (k: number) => {
      const t = distance(k);
      const z = z0 + dirZ * t;
      return dirZ < 0 ? z < -1e-9 : z > midHeight + half + 1e-9;
    };
    if (s < 1e-9) {
      const k = Math.round((u0 + dirU * distance(0)) / pitch);
      consider(k);
    } else {
      // Walk the rows in order of distance, starting at the nearest one ahead.
      const up = step > 0 ? 1 : -1;
      const exact = near - distance(near) / step;
      let k = up > 0 ? Math.floor(exact) : Math.ceil(exact);
      for (let walked = 0; walked <= rowSpan + 2 && left > 1e-12; walked += 1) {
        if (distance(k) > 0 && done(k)) break;
        consider(k);
        k += up;
      }
    }
  }
  if (dirZ < 0 && left > 0) {
    keep(groundStrip(geometry, cut, u0 - (dirU * z0) / dirZ), left);
    return 0;
  }
  return left;
}
