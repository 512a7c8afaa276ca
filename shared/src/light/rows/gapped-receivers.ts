import { requireWithin } from '../../errors.js';
import { filledShare, prepareSkyPassage, requireGaps, type AlongRowGaps } from './along-gaps.js';
import { lightThrough } from './beam.js';
import {
  panelEndsAbove,
  planeFactor,
  profileTangent,
  requireRowGeometry,
  requireRowOptics,
  type RowGeometry,
  type RowOptics,
} from './geometry.js';
import { prepareSkyView, type SkyPart } from './sky-view.js';

/** Single receivers under rows with gaps: what depends on the place along the row too. */
export interface GappedReceiversInput {
  geometry: RowGeometry;
  /** Of the modules. Reflections are not followed here, see prepareEndlessRows. */
  optics: RowOptics;
  gaps: AlongRowGaps;
  receiverHeight: number;
}

export interface GappedReceivers {
  /**
   * Modules that a point sun's ray crosses on its way to a receiver.
   *
   * @param u across, m, positive on the front side
   * @param along m, from the beginning of a module of the row at u = 0, towards surfaceAzimuth - 90
   */
  crossed(sunAzimuth: number, sunAltitude: number, u: number, along: number): number;
  /** Share of an even sky's horizontal light at a receiver, without reflections. */
  sky(u: number, along: number): number;
}

/** Widest step of the profile angle in which the pattern is taken at its middle, radians. */
const PROFILE_STEP = 1.5 * (Math.PI / 180);

/** Directions along the row steeper than this (over the profile's length) are taken in the mean. */
const FARTHEST_ALONG = 8;

/** More changes of the pattern than this along one profile direction: taken in the mean. */
const MOST_CHANGES = 400;

/** Share of a profile direction's light from below an angle along the row; squared cosine law. */
function alongShare(tangent: number): number {
  const angle = Math.atan(tangent);
  return 0.5 + (angle + Math.sin(angle) * Math.cos(angle)) / Math.PI;
}

/** Fractional place within a pattern that begins with a module. */
const isFilled = (place: number, filled: number): boolean => place - Math.floor(place) < filled;

/**
 * Light of one profile direction that comes through the patterns of the rows it crosses.
 *
 * Exact over the along direction up to FARTHEST_ALONG: between two changes of any pattern the
 * number of modules crossed is constant.
 *
 * @param first place of the receiver in each row's pattern, in periods
 * @param rates periods moved per unit of along direction over the profile's length, per row
 */
function patternLight(
  first: number[],
  rates: number[],
  filled: number,
  through: Float64Array,
  mean: number,
): number {
  const rows = first.length;
  const most = through.length - 1;
  const changes: number[] = [];
  for (let r = 0; r < rows; r += 1) {
    const from = Math.floor(first[r] - FARTHEST_ALONG * rates[r]);
    const to = Math.ceil(first[r] + FARTHEST_ALONG * rates[r]);
    for (let period = from; period <= to; period += 1) {
      changes.push((period - first[r]) / rates[r], (period + filled - first[r]) / rates[r]);
    }
  }
  const inside = changes.filter((x) => Math.abs(x) < FARTHEST_ALONG).sort((a, b) => a - b);
  inside.push(FARTHEST_ALONG);
  let from = -FARTHEST_ALONG;
  let below = alongShare(from);
  let light = below * mean;
  for (const to of inside) {
    const above = alongShare(to);
    const middle = (from + to) / 2;
    let crossed = 0;
    for (let r = 0; r < rows; r += 1) {
      if (isFilled(first[r] + middle * rates[r], filled)) crossed += 1;
    }
    light += (above - below) * through[Math.min(crossed, most)];
    from = to;
    below = above;
  }
  return light + (1 - below) * mean;
}

/**
 * Prepare single receivers under endless rows with gaps along them.
 *
 * @throws InputError naming the part of the input that is out of range
 */
export function prepareGappedReceivers(input: GappedReceiversInput): GappedReceivers {
  const { geometry, optics, gaps, receiverHeight } = input;
  requireRowGeometry(geometry);
  requireRowOptics(optics);
  requireGaps(gaps);
  requireWithin('receiverHeight', receiverHeight, 0, 1e6, 'm');
  const period = gaps.moduleLength + gaps.gapLength;
  const filled = filledShare(gaps);
  const { pitch } = geometry;
  const ends = panelEndsAbove(geometry, receiverHeight);

  /** Rows that a ray of the profile crosses: first to last. */
  const rowsCrossed = (u: number, tangent: number): [number, number] => {
    const a = ends.u1 - (ends.z1 - receiverHeight) * tangent;
    const b = ends.u2 - (ends.z2 - receiverHeight) * tangent;
    const last = Math.floor((u - Math.min(a, b)) / pitch);
    const first = Math.floor((u - Math.max(a, b)) / pitch) + 1;
    return ends.above ? [first, last] : [0, -1];
  };
  /** Height above the receiver at which a ray meets row k. */
  const meeting = (u: number, tangent: number, k: number): number =>
    ((k * pitch - u) * Math.sin(geometry.tilt) +
      (geometry.midHeight - receiverHeight) * Math.cos(geometry.tilt)) /
    planeFactor(geometry, tangent);
  const place = (along: number, k: number): number =>
    along / period - (gaps.checkerboard && Math.abs(k % 2) === 1 ? 0.5 : 0);

  const crossed = (sunAzimuth: number, sunAltitude: number, u: number, along: number): number => {
    const tangent = profileTangent(geometry, sunAzimuth, sunAltitude);
    const perHeight =
      Math.cos(sunAzimuth - geometry.surfaceAzimuth + Math.PI / 2) / Math.tan(sunAltitude);
    const [first, last] = rowsCrossed(u, tangent);
    let count = 0;
    for (let k = first; k <= last; k += 1) {
      const moved = (meeting(u, tangent, k) * perHeight) / period;
      if (isFilled(place(along, k) + moved, filled)) count += 1;
    }
    return count;
  };

  const through = lightThrough(optics.transmittance);
  const passage = prepareSkyPassage(geometry, optics.transmittance, gaps);
  const open = 1 - optics.structureShade;
  let u0 = 0;
  let along0 = 0;

  /** Light of the profile direction at `angle` through the rows it crosses. */
  const profileLight = (angle: number, rows: number, mean: number): number => {
    const tangent = Math.tan(angle);
    const [first, last] = rowsCrossed(u0, tangent);
    const starts: number[] = [];
    const rates: number[] = [];
    let changes = 0;
    for (let k = first; k <= last; k += 1) {
      const rate = meeting(u0, tangent, k) / Math.cos(angle) / period;
      changes += 4 * FARTHEST_ALONG * rate;
      if (rate < 1e-9 || changes > MOST_CHANGES) return mean;
      starts.push(place(along0, k));
      rates.push(rate);
    }
    return starts.length === rows ? patternLight(starts, rates, filled, through, mean) : mean;
  };
  const part: SkyPart = (rows, from, to) => {
    const mean = passage(rows, from, to);
    if (rows === 0 || gaps.gapLength === 0) return mean;
    const low = Math.asin(from);
    const high = Math.asin(to);
    const steps = Math.ceil((high - low) / PROFILE_STEP);
    let light = 0;
    for (let step = 0; step < steps; step += 1) {
      const a = low + ((high - low) * step) / steps;
      const b = low + ((high - low) * (step + 1)) / steps;
      const share = (Math.sin(b) - Math.sin(a)) / 2;
      light += share * profileLight((a + b) / 2, rows, mean / ((to - from) / 2));
    }
    return light;
  };
  const view = prepareSkyView(geometry, receiverHeight, part, 'full');
  const sky = (u: number, along: number): number => {
    u0 = u;
    along0 = along;
    return view.share(u) * open;
  };
  return { crossed, sky };
}
