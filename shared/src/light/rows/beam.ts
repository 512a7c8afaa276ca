import { DEG } from '../angles.js';
import { panelEndsAbove, type RowGeometry } from './geometry.js';

/** Half the apparent diameter of the sun, radians (0.533 deg across). */
export const SUN_RADIUS = (0.533 / 2) * DEG;

/** Rows a low sun's disc can be covered by before the rest is called dark. */
const MOST_ROWS = 600;

/** Beam under endless rows at fixed receivers, for one geometry and height. */
export interface BeamShade {
  /**
   * Share of the unobstructed horizontal beam at each receiver, through panels included.
   *
   * @param tangent profileTangent of the sun
   * @param sunAltitude radians, above 0
   * @param out filled, one value a receiver
   */
  shares(tangent: number, sunAltitude: number, out: Float64Array): void;
  /** Panels a point sun's ray crosses on its way to receiver `index`. */
  crossings(tangent: number, index: number): number;
}

/** Share of a uniform disc (radius 1) below a chord at y, -1 to 1. */
function discBelow(y: number): number {
  if (y <= -1) return 0;
  if (y >= 1) return 1;
  return 0.5 + (y * Math.sqrt(1 - y * y) + Math.asin(y)) / Math.PI;
}

/**
 * Prepare beam shade for receivers.
 *
 * A panel throws a shadow interval on the receivers' height; how many intervals cover a receiver is
 * counted exactly. With a disc sun, receivers near an edge see part of the disc: the edge and the
 * receiver span a plane along the row, and the disc is cut by it at the sun's angle from that plane.
 *
 * @param positions receivers across the rows, m
 * @param z0 receiver height, m
 * @param discSun false for a point sun
 */
export function prepareBeamShade(
  geometry: RowGeometry,
  transmittance: number,
  positions: Float64Array,
  z0: number,
  discSun: boolean,
): BeamShade {
  const ends = panelEndsAbove(geometry, z0);
  const up1 = ends.z1 - z0;
  const up2 = ends.z2 - z0;
  const { pitch } = geometry;
  const count = positions.length;
  const dark = !ends.above || geometry.width === 0;

  const shadow = (tangent: number): [number, number] => {
    const s1 = ends.u1 - up1 * tangent;
    const s2 = ends.u2 - up2 * tangent;
    return s1 < s2 ? [s1, s2] : [s2, s1];
  };

  /** Exact share for a receiver that sees a panel edge within the disc. */
  const partial = (u: number, sunAngle: number, radius: number, first: number, last: number) => {
    let share = 0;
    let from = 0;
    let opened = first;
    let closed = first;
    const edge = (k: number, upper: boolean): number => {
      const a1 = Math.atan2(k * pitch + ends.u1 - u, up1);
      const a2 = Math.atan2(k * pitch + ends.u2 - u, up2);
      const angle = upper ? Math.max(a1, a2) : Math.min(a1, a2);
      return discBelow(Math.sin(angle - sunAngle) / radius);
    };
    while (closed <= last) {
      const open = opened <= last ? edge(opened, false) : 2;
      const close = edge(closed, true);
      const to = Math.min(open, close);
      share += (to - from) * Math.pow(transmittance, opened - closed);
      from = to;
      if (open <= close) opened += 1;
      else closed += 1;
    }
    return share + (1 - from);
  };

  const shares = (tangent: number, sunAltitude: number, out: Float64Array): void => {
    if (dark) {
      out.fill(1);
      return;
    }
    const sunAngle = Math.atan(tangent);
    // The sun's distance from the row direction shrinks its disc's width in the profile.
    const reach = Math.sin(sunAltitude) / Math.cos(sunAngle);
    const radius = SUN_RADIUS / reach;
    const spread = discSun ? Math.asin(Math.min(radius, 1)) : 0;
    const limit = Math.PI / 2 - 1e-6;
    const [a1, b1] = shadow(Math.tan(Math.max(sunAngle - spread, -limit)));
    const [a2, b2] = shadow(Math.tan(Math.min(sunAngle + spread, limit)));
    const perPitch = 1 / pitch;
    for (let i = 0; i < count; i += 1) {
      const u = positions[i];
      const opensEarly = Math.floor((u - a1) * perPitch);
      const opensLate = Math.floor((u - a2) * perPitch);
      const closesEarly = Math.floor((u - b1) * perPitch);
      const closesLate = Math.floor((u - b2) * perPitch);
      if (opensEarly === opensLate && closesEarly === closesLate) {
        const cover = opensEarly - closesEarly;
        out[i] = cover === 0 ? 1 : Math.pow(transmittance, cover);
      } else {
        const first = Math.min(closesEarly, closesLate);
        const last = Math.max(opensEarly, opensLate);
        out[i] =
          last - first > MOST_ROWS
            ? transmittance === 0
              ? 0
              : Math.pow(transmittance, Math.min(opensEarly - closesEarly, opensLate - closesLate))
            : partial(u, sunAngle, radius, first, last + 1);
      }
    }
  };

  const crossings = (tangent: number, index: number): number => {
    if (dark) return 0;
    const [a, b] = shadow(tangent);
    return Math.floor((positions[index] - a) / pitch) - Math.floor((positions[index] - b) / pitch);
  };

  return { shares, crossings };
}
