import { discBelow, SUN_RADIUS } from './disc.js';
import { panelEndsAbove, type RowGeometry } from './geometry.js';

/** Where a half shadow is wider than this many pitches, receivers get the mean over a pitch. */
const WIDEST_PITCHES = 25;

/** Beam under endless rows at fixed receivers, for one geometry and height. */
export interface BeamShade {
  /**
   * Share of the unobstructed horizontal beam at each receiver, through panels included.
   *
   * @param tangent profileTangent of the sun
   * @param sunAltitude radians, above 0
   * @param out filled, one value a receiver
   * @param through light left after 0, 1, 2 ... panels, the last value for all beyond; by default
   *   the powers of the transmittance
   */
  shares(tangent: number, sunAltitude: number, out: Float64Array, through?: Float64Array): void;
}

/** The sun's disc against the profile: how an angle from its centre counts on the disc. */
interface DiscView {
  tangent: number;
  /** Radii of the disc per sine of the angle between edge and centre, both in the profile. */
  scale: number;
  /** Change of the disc's weight per radius, see discBelow. */
  slope: number;
}

/**
 * Prepare beam shade for receivers.
 *
 * A panel throws a shadow interval on the receivers' height; how many intervals cover a receiver is
 * counted exactly. With a disc sun, receivers near an edge see part of the disc: the edge and the
 * receiver span a plane along the row, and the disc is cut by it at the sun's angle from that plane.
 * Source: own derivation from the plane geometry.
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
  const { pitch } = geometry;
  if (!ends.above || geometry.width === 0)
    return { shares: (_tangent, _altitude, out) => out.fill(1) };
  const u1 = ends.u1 / pitch;
  const u2 = ends.u2 / pitch;
  const up1 = (ends.z1 - z0) / pitch;
  const up2 = (ends.z2 - z0) / pitch;
  const count = positions.length;
  const places = positions.map((u) => u / pitch);

  /** Chord of the disc, in radii, that an end at x across and `up` above the receiver cuts. */
  const chord = (x: number, up: number, disc: DiscView): number => {
    const length = Math.sqrt(x * x + up * up);
    return length === 0 ? 0 : ((x - up * disc.tangent) / length) * disc.scale;
  };

  /** Share for a receiver that sees ends of rows first to last within the disc. */
  const partial = (
    place: number,
    disc: DiscView,
    first: number,
    last: number,
    through: Float64Array,
  ): number => {
    const most = through.length - 1;
    const end = (k: number, upper: boolean): number => {
      const y1 = chord(k + u1 - place, up1, disc);
      const y2 = chord(k + u2 - place, up2, disc);
      return upper === y1 > y2 ? y1 : y2;
    };
    let share = 0;
    let from = 0;
    let opened = first;
    let closed = first;
    let nextOpen = end(first, false);
    let nextClose = end(first, true);
    while (closed <= last && from < 1) {
      const opens = opened <= last && nextOpen <= nextClose;
      const to = discBelow(opens ? nextOpen : nextClose, disc.slope);
      share += (to - from) * through[Math.min(opened - closed, most)];
      from = to;
      if (opens) {
        opened += 1;
        if (opened <= last) nextOpen = end(opened, false);
      } else {
        closed += 1;
        if (closed <= last) nextClose = end(closed, true);
      }
    }
    return share + (1 - from);
  };

  const powers = lightThrough(transmittance);

  const shares = (
    tangent: number,
    sunAltitude: number,
    out: Float64Array,
    through = powers,
  ): void => {
    const most = through.length - 1;
    const cosine = 1 / Math.sqrt(1 + tangent * tangent);
    const sinAltitude = Math.sin(sunAltitude);
    // The sun's distance from the row direction shrinks its disc's width in the profile.
    const radius = SUN_RADIUS * Math.min(cosine / sinAltitude, 1e6);
    const spread = discSun ? Math.asin(Math.min(radius, 1)) : 0;
    const limit = Math.PI / 2 - 1e-6;
    const angle = Math.atan(tangent);
    const early = spread === 0 ? tangent : Math.tan(Math.max(angle - spread, -limit));
    const late = spread === 0 ? tangent : Math.tan(Math.min(angle + spread, limit));
    // Shadow ends of row 0 for both sides of the disc.
    const a1 = Math.min(u1 - up1 * early, u2 - up2 * early);
    const b1 = Math.max(u1 - up1 * early, u2 - up2 * early);
    const a2 = Math.min(u1 - up1 * late, u2 - up2 * late);
    const b2 = Math.max(u1 - up1 * late, u2 - up2 * late);
    if (Math.max(Math.abs(a1 - a2), Math.abs(b1 - b2)) > WIDEST_PITCHES) {
      out.fill(meanShare(Math.abs(u1 - u2 - (up1 - up2) * tangent), through));
      return;
    }
    const slope = (-SUN_RADIUS * tangent * cosine) / sinAltitude;
    const disc = { tangent, scale: cosine / radius, slope };
    for (let i = 0; i < count; i += 1) {
      const place = places[i];
      const opensEarly = Math.floor(place - a1);
      const opensLate = Math.floor(place - a2);
      const closesEarly = Math.floor(place - b1);
      const closesLate = Math.floor(place - b2);
      if (opensEarly === opensLate && closesEarly === closesLate) {
        out[i] = through[Math.min(opensEarly - closesEarly, most)];
      } else {
        const first = Math.min(closesEarly, closesLate);
        const last = Math.max(opensEarly, opensLate);
        out[i] = partial(place, disc, first, last + 1, through);
      }
    }
  };
  return { shares };
}

/** Mean over a pitch where each row shades `depth` pitches. */
function meanShare(depth: number, through: Float64Array): number {
  const full = Math.floor(depth);
  const most = through.length - 1;
  const more = through[Math.min(full + 1, most)];
  return through[Math.min(full, most)] + (depth - full) * (more - through[Math.min(full, most)]);
}

/** Light left after 0, 1, 2 ... panels, until nothing to speak of is left. */
export function lightThrough(transmittance: number): Float64Array {
  const values = [1];
  while (values[values.length - 1] > 1e-9 && values.length < 400) {
    values.push(values[values.length - 1] * transmittance);
  }
  return Float64Array.from(values);
}
