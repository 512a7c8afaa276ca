import { panelEndsAbove, upperSide, type RowGeometry } from './geometry.js';

/** Rows farther than this many heights fill under 2e-3 (preview) or 2e-4 (full) of the view. */
const REACH = { full: 60, preview: 18 } as const;

/** A row seen whole below this (cosine from the vertical) is far: heights along it run evenly. */
const LOW = 0.15;

/** Light through panels weaker than this is left out of the view. */
const FAINTEST = 1e-4;

/** View of one receiver, swept row by row; reused for all receivers of a geometry and height. */
export interface ViewSweep {
  /**
   * Add how much of the upper view of the receiver at `u` each strip of the panel faces fills.
   *
   * @param out front strips then rear strips, from the upper edge; shares of the view
   */
  add(u: number, out: Float64Array): void;
}

/** Sine of the profile angle of a point at x across and z above the receiver. */
function sine(x: number, z: number): number {
  const length = Math.sqrt(x * x + z * z);
  return length === 0 ? 0 : x / length;
}

/**
 * Prepare the view of receivers at one height.
 *
 * The view is swept from one horizon to the other by the sine of the profile angle, in which light
 * from an even source is evenly spread. Between two panel ends the same rows cover the view; the
 * nearest is seen whole, those behind through `transmittance` of each before them.
 *
 * @param strips per face along the slant
 * @param z0 receiver height, m
 */
export function prepareViewSweep(
  geometry: RowGeometry,
  transmittance: number,
  strips: number,
  z0: number,
  quality: 'full' | 'preview',
): ViewSweep {
  const ends = panelEndsAbove(geometry, z0);
  if (!ends.above || geometry.width === 0) return { add: () => undefined };
  const { pitch } = geometry;
  const up1 = ends.z1 - z0;
  const up2 = ends.z2 - z0;
  const c = Math.cos(geometry.tilt);
  const s = Math.sin(geometry.tilt);
  const turn = upperSide(geometry);
  const rows = Math.ceil((up1 * REACH[quality]) / pitch) + 2;
  const total = 2 * rows + 1;
  const upper = new Float64Array(total);
  const lower = new Float64Array(total);
  const upperCosine = new Float64Array(total);
  const lowerCosine = new Float64Array(total);
  // Part of the slant above the receiver, in strips from the upper edge.
  const seen = (strips * Math.hypot(ends.u2 - ends.u1, ends.z1 - ends.z2)) / geometry.width;
  let offset = 0;

  const atStrip = (k: number, q: number): number => {
    const share = Math.min(q, seen) / strips;
    const down = share * geometry.width;
    const x = offset + k * pitch + ends.u1 + turn * down * c;
    return sine(x, Math.max(up1 - turn * down * s, 0));
  };

  /**
   * Spread [from, to] over the strips of a far row. Along it the cosine runs evenly, and near the
   * horizon the sine falls with half its square.
   */
  const spread = (
    k: number,
    from: number,
    to: number,
    scale: number,
    base: number,
    out: Float64Array,
  ): void => {
    const perStrip = (lowerCosine[k] - upperCosine[k]) / seen;
    if (perStrip === 0) return;
    const c1 = Math.sqrt(1 - from * from);
    const c2 = Math.sqrt(1 - to * to);
    const squares = Math.abs(c1 * c1 - c2 * c2);
    if (squares === 0) return;
    const q1 = (c1 - upperCosine[k]) / perStrip;
    const q2 = (c2 - upperCosine[k]) / perStrip;
    const first = Math.max(Math.min(q1, q2), 0);
    const last = Math.min(Math.max(q1, q2), seen);
    const perSquare = ((to - from) * scale) / squares;
    let edge = upperCosine[k] + perStrip * first;
    for (let strip = Math.floor(first); strip < last; strip += 1) {
      const next = upperCosine[k] + perStrip * Math.min(strip + 1, last);
      out[base + strip] += Math.abs(edge * edge - next * next) * perSquare;
      edge = next;
    }
  };

  /** Give the part [from, to] of the view to the strips of row k. */
  const give = (
    k: number,
    from: number,
    to: number,
    scale: number,
    base: number,
    out: Float64Array,
  ) => {
    const length = lower[k] - upper[k];
    if (Math.max(upperCosine[k], lowerCosine[k]) < LOW && upper[k] * lower[k] > 0) {
      spread(k, from, to, scale, base, out);
      return;
    }
    let edge = upper[k];
    for (let strip = 0; strip < seen; strip += 1) {
      const next = atStrip(k, strip + 1);
      const a = Math.max(Math.min(edge, next), from);
      const b = Math.min(Math.max(edge, next), to);
      if (b > a) out[base + strip] += (b - a) * scale;
      if (length > 0 ? next >= to : next <= from) break;
      edge = next;
    }
  };

  /** Share the view [from, to], covered by rows first to last, among them. */
  const cover = (from: number, to: number, first: number, last: number, out: Float64Array) => {
    const middle = (from + to) / 2;
    // Light that reaches the receiver moves against the front normal where this is positive.
    const across = middle * s + Math.sqrt(1 - middle * middle) * c;
    const base = across > 0 ? strips : 0;
    const count = last - first + 1;
    let scale = 0.5;
    for (let n = 0; n < count && scale > FAINTEST; n += 1) {
      give(across * turn > 0 ? first + n : last - n, from, to, scale, base, out);
      scale *= transmittance;
    }
  };

  const add = (u: number, out: Float64Array): void => {
    offset = (Math.round(u / pitch) - rows) * pitch - u;
    for (let k = 0; k < total; k += 1) {
      const x = offset + k * pitch;
      const x1 = x + ends.u1;
      const x2 = x + ends.u2;
      const length1 = Math.sqrt(x1 * x1 + up1 * up1);
      const length2 = Math.sqrt(x2 * x2 + up2 * up2);
      upper[k] = x1 / length1;
      upperCosine[k] = up1 / length1;
      // An end at the very receiver is seen the way the panel leans.
      lower[k] = length2 === 0 ? upper[k] : x2 / length2;
      lowerCosine[k] = length2 === 0 ? upperCosine[k] : up2 / length2;
    }
    let from = -1;
    let opened = 0;
    let closed = 0;
    while (closed < total) {
      const nextOpen = opened < total ? Math.min(upper[opened], lower[opened]) : 2;
      const nextClose = Math.max(upper[closed], lower[closed]);
      const to = Math.min(nextOpen, nextClose);
      if (to > from && opened > closed) cover(from, to, closed, opened - 1, out);
      from = Math.max(from, to);
      if (nextOpen <= nextClose) opened += 1;
      else closed += 1;
    }
  };
  return { add };
}
