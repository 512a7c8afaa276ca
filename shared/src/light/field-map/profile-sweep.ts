import { panelEndsAbove, planeFactor, upperSide } from '../rows/geometry.js';
import { meetingHeight, type FiniteRows } from './finite-rows.js';

/** Widest step of the profile angle between two panel edges, radians. */
const WIDEST_STEP = 2.5 * (Math.PI / 180);

/** Light through panels weaker than this is left out. */
const FAINTEST = 1e-4;

/** A stretch seen from a receiver along one profile direction. */
export interface Sighting {
  stretch: number;
  /** True where the front is seen (from above), false for the rear. */
  front: boolean;
  /** Stretch of the slant seen, 0 upper edge to 1 lower edge, rising. */
  slantFrom: number;
  slantTo: number;
  /** Metres along per unit of the along direction (tangent over the profile's length). */
  perAlong: number;
}

/** What a sweep hands out. */
export interface SweepSink {
  /** Share of the view in which the sky is seen through panels; sums with all sightings to 1. */
  sky(share: number): void;
  /**
   * A stretch is seen between two along directions, through others in front of it.
   *
   * @param scale share of the view per share of the along directions
   */
  panel?(sighting: Sighting, from: number, to: number, scale: number): void;
}

/** Share of a profile direction's light from below an along direction; squared cosine law. */
export function alongShare(direction: number): number {
  const angle = Math.atan(direction);
  return 0.5 + (angle + Math.sin(angle) * Math.cos(angle)) / Math.PI;
}

/** A stretch's extent in along directions within one profile direction. */
interface Span extends Sighting {
  low: number;
  high: number;
}

/** Hand out one profile direction: `spans` nearest first. */
function handOut(spans: Span[], transmittance: number, share: number, sink: SweepSink): void {
  const edges = spans.flatMap(({ low, high }) => [low, high]).sort((a, b) => a - b);
  let covered = 0;
  for (let e = 1; e < edges.length; e += 1) {
    const from = edges[e - 1];
    const to = edges[e];
    if (to - from < 1e-12) continue;
    const middle = (from + to) / 2;
    let through = 1;
    for (const span of spans) {
      if (span.low > middle || span.high < middle || through < FAINTEST) continue;
      sink.panel?.(span, from, to, share * through);
      through *= transmittance;
    }
    covered += (alongShare(to) - alongShare(from)) * (1 - through);
  }
  sink.sky(share * (1 - covered));
}

/**
 * Sweep the upper view of a receiver under finite rows, weighted for a horizontal surface.
 *
 * By the sine of the profile angle the view is split at all panel edges, exactly; in between, at
 * small steps, each stretch covers one interval of directions along the row, whose light is
 * known in closed form. Nearer panels come before farther ones.
 *
 * @param u across, m; @param v along, m; @param z0 height, m
 */
export function sweepView(
  rows: FiniteRows,
  transmittance: number,
  u: number,
  v: number,
  z0: number,
  sink: SweepSink,
): void {
  const { geometry, places, stretches } = rows;
  const ends = panelEndsAbove(geometry, z0);
  const total = ends.above && geometry.width > 0 ? places.length : 0;
  const opens = new Float64Array(total + 1).fill(1);
  const closes = new Float64Array(total + 1).fill(1);
  const up1 = ends.z1 - z0;
  const up2 = ends.z2 - z0;
  for (let k = 0; k < total; k += 1) {
    const x1 = places[k] - u + ends.u1;
    const x2 = places[k] - u + ends.u2;
    const s1 = x1 / Math.hypot(x1, up1);
    const s2 = up2 === 0 && x2 === 0 ? s1 : x2 / Math.hypot(x2, up2);
    opens[k] = Math.min(s1, s2);
    closes[k] = Math.max(s1, s2);
  }

  /** Place on the slant of row k at which a profile direction meets it. */
  const slantAt = (k: number, tangent: number): number => {
    const q =
      (u - places[k] + (geometry.midHeight - z0) * tangent) / planeFactor(geometry, tangent);
    const slant = (q * upperSide(geometry)) / geometry.width + 0.5;
    return Number.isNaN(slant) ? 0.5 : Math.min(Math.max(slant, 0), 1);
  };

  const spanOf = (k: number, low: number, high: number): Span => {
    const angle = (low + high) / 2;
    const factor = planeFactor(geometry, Math.tan(angle));
    const up = meetingHeight(rows, places[k], u, z0, factor);
    const perAlong = Math.max(up, 1e-9) / Math.cos(angle);
    const atLow = slantAt(k, Math.tan(low));
    const atHigh = slantAt(k, Math.tan(high));
    return {
      stretch: k,
      front: factor < 0,
      slantFrom: Math.min(atLow, atHigh),
      slantTo: Math.max(atLow, atHigh),
      perAlong,
      low: (stretches[k].from - v) / perAlong,
      high: (stretches[k].to - v) / perAlong,
    };
  };

  const sweepPart = (from: number, to: number, first: number, last: number): void => {
    if (first > last) {
      sink.sky((to - from) / 2);
      return;
    }
    const low = Math.asin(from);
    const high = Math.asin(to);
    const steps = Math.ceil((high - low) / WIDEST_STEP);
    for (let step = 0; step < steps; step += 1) {
      const a = low + ((high - low) * step) / steps;
      const b = low + ((high - low) * (step + 1)) / steps;
      const spans: Span[] = [];
      for (let k = first; k <= last; k += 1) spans.push(spanOf(k, a, b));
      spans.sort((x, y) => x.perAlong - y.perAlong);
      handOut(spans, transmittance, (Math.sin(b) - Math.sin(a)) / 2, sink);
    }
  };

  let from = -1;
  let opened = 0;
  let closed = 0;
  while (from < 1) {
    const next = Math.min(opens[opened], closes[closed]);
    if (next > from) {
      sweepPart(from, next, closed, opened - 1);
      from = next;
    }
    if (opened < total && opens[opened] <= closes[closed]) opened += 1;
    else if (closed < total) closed += 1;
    else break;
  }
}
