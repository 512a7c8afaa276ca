import { panelEndsAbove, type RowGeometry } from './geometry.js';

/** Panels farther than this many heights fill under 1e-4 (preview) or 4e-6 (full) of the view. */
const REACH = { full: 350, preview: 70 } as const;

/**
 * How much of a receiver's upper view each strip of the panel faces fills.
 *
 * The view is swept from one horizon to the other by the sine of the profile angle, in which light
 * from an even source is evenly spread. Between two panel ends the same rows cover the view; the
 * nearest is seen whole, those behind through `transmittance` of each before them.
 *
 * @param faceStrips strips per face along the slant, from the upper edge
 * @param u receiver across the rows, m
 * @param z0 receiver height, m
 * @param out front strips then rear strips; shares of the view are added
 */
export function addReceiverView(
  geometry: RowGeometry,
  transmittance: number,
  faceStrips: number,
  u: number,
  z0: number,
  quality: 'full' | 'preview',
  out: Float64Array,
): void {
  const ends = panelEndsAbove(geometry, z0);
  if (!ends.above || geometry.width === 0) return;
  const { pitch, width, tilt, midHeight } = geometry;
  const c = Math.cos(tilt);
  const s = Math.sin(tilt);
  const rows = Math.min(Math.ceil(((ends.z1 - z0) * REACH[quality]) / pitch) + 2, 4000);
  const first = Math.round(u / pitch) - rows;
  const total = 2 * rows + 1;

  /** Sine of the profile angle of slant coordinate q of row k, clipped at the receiver's height. */
  const sineOf = (k: number, q: number): number => {
    const x = (first + k) * pitch + q * c - u;
    const z = Math.max(midHeight - q * s - z0, 0);
    const length = Math.sqrt(x * x + z * z);
    return length === 0 ? 0 : x / length;
  };
  const lowestQ =
    ends.z2 > z0 + 1e-12 ? width / 2 : Math.min(width / 2, (midHeight - z0) / (s || 1));
  const low = (k: number) => Math.min(sineOf(k, -width / 2), sineOf(k, lowestQ));
  const high = (k: number) => Math.max(sineOf(k, -width / 2), sineOf(k, lowestQ));

  /** Give the part [from, to] of the view to the strips of row k. */
  const give = (k: number, from: number, to: number, weight: number): void => {
    const middle = (from + to) / 2;
    const front = middle * s + Math.sqrt(1 - middle * middle) * c < 0;
    const base = front ? 0 : faceStrips;
    let edge = sineOf(k, -width / 2);
    for (let strip = 0; strip < faceStrips; strip += 1) {
      const q = Math.min(((strip + 1) / faceStrips - 0.5) * width, lowestQ);
      const next = sineOf(k, q);
      const a = Math.max(Math.min(edge, next), from);
      const b = Math.min(Math.max(edge, next), to);
      if (b > a) out[base + strip] += ((b - a) / 2) * weight;
      edge = next;
    }
  };

  let from = -1;
  let opened = 0;
  let closed = 0;
  let nextOpen = low(0);
  let nextClose = high(0);
  while (closed < total) {
    const opens = opened < total && nextOpen <= nextClose;
    const to = opens ? nextOpen : nextClose;
    if (to - from > 1e-15) {
      // Along a ray rows follow each other in order of k; which end is near depends on its lean.
      const middle = (from + to) / 2;
      const across = middle * s + Math.sqrt(1 - middle * middle) * c;
      const rising = across > 0 ? 1 : -1;
      let weight = 1;
      for (let n = 0; n < opened - closed && weight > 1e-9; n += 1) {
        give(rising > 0 ? closed + n : opened - 1 - n, from, to, weight);
        weight *= transmittance;
      }
    }
    from = Math.max(from, to);
    if (opens) {
      opened += 1;
      nextOpen = opened < total ? low(opened) : Infinity;
    } else {
      closed += 1;
      nextClose = closed < total ? high(closed) : Infinity;
    }
  }
}
