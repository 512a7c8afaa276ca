import { panelEndsAbove, type PanelEnds, type RowGeometry } from './geometry.js';
import {
  discView,
  shadowFrom,
  shadowTo,
  softShare,
  type DiscView,
  type Ends,
  type HalfShadow,
} from './half-shadow.js';

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

/** First index of a sorted array whose value is at least x. */
function firstFrom(sorted: Float64Array, x: number): number {
  let low = 0;
  let high = sorted.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (sorted[middle] < x) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Receivers across rows of one pitch, sorted by their place within it. */
export interface Receivers {
  /** Places in pitches, 0 to 1, rising. */
  places: Float64Array;
  /** Index among the caller's receivers. */
  order: Int32Array;
}

/**
 * Sort receivers once for all shades of rows with this pitch.
 *
 * @param positions receivers across the rows, m
 * @param pitch distance between rows, m
 */
export function sortReceivers(positions: Float64Array, pitch: number): Receivers {
  const within = positions.map((u) => u / pitch - Math.floor(u / pitch));
  const order = Int32Array.from(within, (_, i) => i).sort((a, b) => within[a] - within[b]);
  return { places: Float64Array.from(order, (i) => within[i]), order };
}

/** Counts of full shadow: rows that cover a receiver, changing only at two places in a pitch. */
function fillPoint(
  { places, order }: Receivers,
  a: number,
  b: number,
  through: Float64Array,
  out: Float64Array,
): void {
  const most = through.length - 1;
  const opens = a - Math.floor(a) || 1;
  const closes = b - Math.floor(b) || 1;
  const firstOpen = firstFrom(places, opens);
  const firstClose = firstFrom(places, closes);
  const base = Math.floor(-a) - Math.floor(-b);
  const between = base + (firstOpen < firstClose ? 1 : -1);
  const low = Math.min(firstOpen, firstClose);
  const high = Math.max(firstOpen, firstClose);
  const outside = through[Math.min(base, most)];
  for (let i = 0; i < low; i += 1) out[order[i]] = outside;
  if (high > low) {
    const inside = through[Math.min(Math.max(between, 0), most)];
    for (let i = low; i < high; i += 1) out[order[i]] = inside;
  }
  for (let i = high; i < places.length; i += 1) out[order[i]] = outside;
}

/** Soften the receivers between the places `from` and `to` (in pitches, under a pitch apart). */
function soften(
  { places, order }: Receivers,
  ends: Ends,
  disc: DiscView,
  shadow: HalfShadow,
  from: number,
  to: number,
  through: Float64Array,
  out: Float64Array,
): void {
  const count = places.length;
  const whole = Math.floor(from);
  const start = firstFrom(places, from - whole);
  const reach = to - whole;
  for (let n = 0; n < count; n += 1) {
    const wraps = start + n >= count;
    const i = wraps ? start + n - count : start + n;
    const place = places[i];
    if ((wraps ? place + 1 : place) > reach) break;
    out[order[i]] = softShare(ends, place, disc, shadow, through);
  }
}

/**
 * Prepare beam shade for receivers.
 *
 * A panel throws a shadow interval on the receivers' height; how many intervals cover a receiver is
 * counted exactly. With a disc sun, receivers near an edge see part of the disc: the edge and the
 * receiver span a plane along the row, and the disc is cut by it at the sun's angle from that plane.
 * Source: own derivation from the plane geometry.
 *
 * @param receivers sortReceivers of the same pitch
 * @param z0 receiver height, m
 * @param discSun false for a point sun
 */
export function prepareBeamShade(
  geometry: RowGeometry,
  transmittance: number,
  receivers: Receivers,
  z0: number,
  discSun: boolean,
): BeamShade {
  const above = panelEndsAbove(geometry, z0);
  if (!above.above || geometry.width === 0) {
    return { shares: (_tangent, _altitude, out) => out.fill(1) };
  }
  const ends = inPitches(above, geometry.pitch, z0);
  const powers = lightThrough(transmittance);
  const shares = (
    tangent: number,
    sunAltitude: number,
    out: Float64Array,
    through = powers,
  ): void => {
    const disc = discView(tangent, sunAltitude, discSun);
    const shadow = {
      a1: shadowFrom(ends, disc.early),
      a2: shadowFrom(ends, disc.late),
      b1: shadowTo(ends, disc.early),
      b2: shadowTo(ends, disc.late),
    };
    const a = shadowFrom(ends, tangent);
    const b = shadowTo(ends, tangent);
    const aFrom = Math.min(shadow.a1, shadow.a2, a);
    const aTo = Math.max(shadow.a1, shadow.a2, a);
    const bFrom = Math.min(shadow.b1, shadow.b2, b);
    const bTo = Math.max(shadow.b1, shadow.b2, b);
    const widest = Math.max(aTo - aFrom, bTo - bFrom);
    if (widest > WIDEST_PITCHES) {
      out.fill(meanShare(b - a, through));
    } else if (widest >= 1) {
      soften(receivers, ends, disc, shadow, 0, 1, through, out);
    } else {
      fillPoint(receivers, a, b, through, out);
      if (!discSun) return;
      soften(receivers, ends, disc, shadow, aFrom, aTo, through, out);
      soften(receivers, ends, disc, shadow, bFrom, bTo, through, out);
    }
  };
  return { shares };
}

function inPitches({ u1, z1, u2, z2 }: PanelEnds, pitch: number, z0: number): Ends {
  return { u1: u1 / pitch, up1: (z1 - z0) / pitch, u2: u2 / pitch, up2: (z2 - z0) / pitch };
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
