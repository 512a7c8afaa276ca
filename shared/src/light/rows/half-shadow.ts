import { discBelow, SUN_RADIUS } from './disc.js';

/** The sun's disc against the profile: how an angle from its centre counts on the disc. */
export interface DiscView {
  tangent: number;
  /** Tangents at both sides of the disc. */
  early: number;
  late: number;
  /** Radii of the disc per sine of the angle between edge and centre, both in the profile. */
  scale: number;
  /** Change of the disc's weight per radius, see discBelow. */
  slope: number;
}

export function discView(tangent: number, sunAltitude: number, discSun: boolean): DiscView {
  const cosine = 1 / Math.sqrt(1 + tangent * tangent);
  const sinAltitude = Math.sin(sunAltitude);
  // The sun's distance from the row direction shrinks its disc's width in the profile.
  const radius = SUN_RADIUS * Math.min(cosine / sinAltitude, 1e6);
  const slope = (-SUN_RADIUS * tangent * cosine) / sinAltitude;
  const scale = cosine / radius;
  if (!discSun) return { tangent, early: tangent, late: tangent, scale, slope };
  const spread = Math.asin(Math.min(radius, 1));
  const limit = Math.PI / 2 - 1e-6;
  const angle = Math.atan(tangent);
  const early = Math.tan(Math.max(angle - spread, -limit));
  const late = Math.tan(Math.min(angle + spread, limit));
  return { tangent, early, late, scale, slope };
}

/** Both ends of a panel, in pitches, seen from the receivers' height. */
export interface Ends {
  u1: number;
  up1: number;
  u2: number;
  up2: number;
}

/** Chord of the disc, in radii, that an end at x across and `up` above the receiver cuts. */
function chord(x: number, up: number, disc: DiscView): number {
  const length = Math.sqrt(x * x + up * up);
  return length === 0 ? 0 : ((x - up * disc.tangent) / length) * disc.scale;
}

/** Chord of the end of row k that begins (or finishes) its cover of the disc. */
function endChord(ends: Ends, x: number, finishes: boolean, disc: DiscView): number {
  const y1 = chord(x + ends.u1, ends.up1, disc);
  const y2 = chord(x + ends.u2, ends.up2, disc);
  return finishes === y1 > y2 ? y1 : y2;
}

/** Share for a receiver that sees ends of opaque rows first to last within the disc. */
function partialOpaque(
  ends: Ends,
  place: number,
  disc: DiscView,
  first: number,
  last: number,
): number {
  let share = 0;
  let reached = -1;
  let below = 0;
  for (let k = first; k <= last && reached < 1; k += 1) {
    const y1 = chord(k - place + ends.u1, ends.up1, disc);
    const y2 = chord(k - place + ends.u2, ends.up2, disc);
    const low = y1 < y2 ? y1 : y2;
    const high = y1 < y2 ? y2 : y1;
    if (low > reached) share += discBelow(low, disc.slope) - below;
    if (high > reached) {
      reached = high;
      below = discBelow(high, disc.slope);
    }
  }
  return share + 1 - below;
}

/** Share for a receiver that sees ends of rows first to last within the disc. */
function partial(
  ends: Ends,
  place: number,
  disc: DiscView,
  first: number,
  last: number,
  through: Float64Array,
): number {
  const most = through.length - 1;
  if (through[1] === 0) return partialOpaque(ends, place, disc, first, last);
  let share = 0;
  let from = 0;
  let opened = first;
  let closed = first;
  let nextOpen = endChord(ends, first - place, false, disc);
  let nextClose = endChord(ends, first - place, true, disc);
  while (closed <= last && from < 1) {
    const opens = opened <= last && nextOpen <= nextClose;
    const to = discBelow(opens ? nextOpen : nextClose, disc.slope);
    share += (to - from) * through[Math.min(opened - closed, most)];
    from = to;
    if (opens) {
      opened += 1;
      if (opened <= last) nextOpen = endChord(ends, opened - place, false, disc);
    } else {
      closed += 1;
      if (closed <= last) nextClose = endChord(ends, closed - place, true, disc);
    }
  }
  return share + (1 - from);
}

/** Shadow of row 0 on the receivers' height, in pitches: where it begins and where it ends. */
export function shadowFrom(ends: Ends, tangent: number): number {
  return Math.min(ends.u1 - ends.up1 * tangent, ends.u2 - ends.up2 * tangent);
}
export function shadowTo(ends: Ends, tangent: number): number {
  return Math.max(ends.u1 - ends.up1 * tangent, ends.u2 - ends.up2 * tangent);
}

/** Share for a receiver where one end alone, that of row `k`, may cut the disc. */
function oneEdge(
  ends: Ends,
  x: number,
  finishes: boolean,
  disc: DiscView,
  before: number,
  after: number,
): number {
  const below = discBelow(endChord(ends, x, finishes, disc), disc.slope);
  return after + below * (before - after);
}

/** Shadow places of row 0 for both sides of the disc: where shadow begins (a) and ends (b). */
export interface HalfShadow {
  a1: number;
  a2: number;
  b1: number;
  b2: number;
}

/** Share for one receiver near a shadow edge; counts which ends cut the disc there. */
export function softShare(
  ends: Ends,
  place: number,
  disc: DiscView,
  shadow: HalfShadow,
  through: Float64Array,
): number {
  const most = through.length - 1;
  const opens1 = Math.floor(place - shadow.a1);
  const opens2 = Math.floor(place - shadow.a2);
  const closes1 = Math.floor(place - shadow.b1);
  const closes2 = Math.floor(place - shadow.b2);
  const before = through[Math.min(Math.max(opens1 - closes1, 0), most)];
  const after = through[Math.min(Math.max(opens2 - closes2, 0), most)];
  if (opens2 === opens1 + 1 && closes1 === closes2) {
    return oneEdge(ends, opens2 - place, false, disc, before, after);
  }
  if (closes2 === closes1 + 1 && opens1 === opens2) {
    return oneEdge(ends, closes2 - place, true, disc, before, after);
  }
  if (opens1 === opens2 && closes1 === closes2) return before;
  const first = Math.min(closes1, closes2);
  const last = Math.max(opens1, opens2);
  return partial(ends, place, disc, first, last + 1, through);
}
