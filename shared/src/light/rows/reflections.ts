import { firstKept, type LitRange } from './deposit.js';
import { elementCount, type Cut } from './elements.js';
import { prepareExchange, type Exchange } from './exchange.js';
import type { RowGeometry, RowOptics } from './geometry.js';
import { prepareViewSweep } from './receiver-view.js';

export type Quality = 'full' | 'preview';

const CUTS = {
  full: { ground: 32, face: 24, directions: 180 },
  preview: { ground: 12, face: 16, directions: 60 },
} satisfies Record<Quality, Cut>;

/** Profile angles at which reflections are tabulated, per half turn. */
const ANGLES = { full: 540, preview: 180 } as const;

/** Where one unit of horizontal light over one pitch of land ends; parts sum to 1. */
export interface Balance {
  ground: number;
  panel: number;
  escaped: number;
  structure: number;
}

interface Tables {
  /** Per receiver and unit of horizontal beam x cos(profile angle): angles x receivers. */
  receivers: Float64Array;
  /** On the front and the rear of the panel, in the same measure: angles x 2. */
  faces: Float64Array;
  /**
   * Where a beam's light ends, in the same measure: ground (structure included), panels, sky, and
   * of these what the ground got straight: angles x 4.
   */
  ends: Float64Array;
}

/** Reflected light and light balance by profile angle of the beam that causes it. */
export interface Reflections extends Tables {
  angles: number;
  /** Shares that panel faces and ground throw back: front, rear, ground. */
  back: [number, number, number];
  /** Fill the row of an angle where that has not been done; to be called before reading it. */
  want(angle: number): void;
  /**
   * The same for an even sky, per unit of its horizontal light; and what front and rear keep
   * straight from it, per pitch.
   */
  sky: Tables & { straight: [number, number] };
}

/** What reflections are prepared from. */
export interface ReflectionsInput {
  geometry: RowGeometry;
  optics: RowOptics;
  positions: Float64Array;
  receiverHeight: number;
}

/** Row vector times matrix: what each element's first kept light comes to, weighed by `weights`. */
function weigh(weights: Float64Array, settled: Float64Array): Float64Array {
  const n = weights.length;
  const out = new Float64Array(n);
  for (let j = 0; j < n; j += 1) {
    const weight = weights[j];
    if (weight === 0) continue;
    for (let i = 0; i < n; i += 1) out[i] += weight * settled[j * n + i];
  }
  return out;
}

/** Sum over the ground strips and those face strips that a beam reaches. */
function dot(a: Float64Array, b: Float64Array, ground: number, lit: LitRange): number {
  let sum = 0;
  for (let i = 0; i < ground; i += 1) sum += a[i] * b[i];
  for (let i = lit.from; i < lit.to; i += 1) sum += a[i] * b[i];
  return sum;
}

/** For each receiver, the reflected light it gets per unit first kept by each element. */
function receiverWeights(input: ReflectionsInput, cut: Cut, exchange: Exchange, quality: Quality) {
  const { geometry, optics, positions, receiverHeight } = input;
  const { transmittance } = optics;
  const sweep = prepareViewSweep(geometry, transmittance, cut.face, receiverHeight, quality);
  const view = new Float64Array(2 * cut.face);
  const weights = new Float64Array(elementCount(cut));
  const stripWidth = geometry.width / cut.face;
  return Array.from(positions, (u) => {
    view.fill(0);
    sweep.add(u, view);
    for (let e = 0; e < view.length; e += 1) {
      const j = cut.ground + e;
      weights[j] =
        view[e] === 0 ? 0 : (view[e] * exchange.reflected[j] * geometry.pitch) / stripWidth;
    }
    return weigh(weights, exchange.settled);
  });
}

/** Weights of first kept light for irradiance of each face by reflection alone. */
function faceWeights(input: ReflectionsInput, cut: Cut, exchange: Exchange): Float64Array[] {
  const { geometry, optics } = input;
  // Elements hold light per pitch; per area of panel it is x pitch / width.
  const perArea = geometry.width > 0 ? geometry.pitch / geometry.width : 0;
  return [cut.ground, cut.ground + cut.face].map((start) => {
    const weights = new Float64Array(elementCount(cut));
    weights.fill(perArea / (1 - optics.transmittance), start, start + cut.face);
    const total = weigh(weights, exchange.settled);
    return total.map((value, i) => value - weights[i]);
  });
}

/** Weights of first kept light for what ends in ground and structure, panels and sky. */
function endWeights(cut: Cut, exchange: Exchange): Float64Array[] {
  const n = elementCount(cut);
  const ends = [new Float64Array(n), new Float64Array(n), new Float64Array(n)];
  for (let j = 0; j < n; j += 1) {
    const back = exchange.reflected[j];
    ends[j < cut.ground ? 0 : 1][j] = 1 - back;
    ends[2][j] = back * exchange.escaping[j];
  }
  return ends.map((weights) => weigh(weights, exchange.settled));
}

/** Light first kept by the elements from an even sky: beams from all angles, worth cos(a)/2 da each. */
function firstKeptFromSky(
  geometry: RowGeometry,
  transmittance: number,
  cut: Cut,
  angles: number,
): Float64Array {
  const n = elementCount(cut);
  const kept = new Float64Array(n);
  const total = new Float64Array(n);
  for (let a = 0; a < angles; a += 1) {
    const from = (a / angles - 0.5) * Math.PI;
    const to = ((a + 1) / angles - 0.5) * Math.PI;
    const weight = (Math.sin(to) - Math.sin(from)) / 2;
    firstKept(geometry, transmittance, cut, Math.tan((from + to) / 2), kept);
    for (let i = 0; i < n; i += 1) total[i] += weight * kept[i];
  }
  return total;
}

/**
 * Follow reflections off both faces and the ground for beams from all profile angles.
 *
 * Values are held x cos(profile angle): per unit of horizontal light they grow without limit towards
 * the horizon and would not bear interpolation. Rows of the tables are filled when first wanted.
 */
export function prepareReflections(input: ReflectionsInput, quality: Quality): Reflections {
  const { geometry, optics, positions } = input;
  const cut = CUTS[quality];
  const angles = ANGLES[quality];
  const exchange = prepareExchange(geometry, optics, cut);
  const atReceivers = receiverWeights(input, cut, exchange, quality);
  const onFaces = faceWeights(input, cut, exchange);
  const direct = new Float64Array(elementCount(cut)).fill(1, 0, cut.ground);
  const ends = [...endWeights(cut, exchange), direct];
  const count = positions.length;
  const kept = new Float64Array(elementCount(cut));
  const done = new Uint8Array(angles);
  const { reflected } = exchange;
  const fill = (into: Tables, row: number, lit: LitRange, scale: number): void => {
    const open = scale * (1 - optics.structureShade);
    for (let r = 0; r < count; r += 1) {
      into.receivers[row * count + r] = dot(atReceivers[r], kept, cut.ground, lit) * open;
    }
    for (let f = 0; f < 2; f += 1) {
      into.faces[row * 2 + f] = dot(onFaces[f], kept, cut.ground, lit) * scale;
    }
    for (let e = 0; e < 4; e += 1) {
      into.ends[row * 4 + e] = dot(ends[e], kept, cut.ground, lit) * scale;
    }
  };
  const table = (rows: number): Tables => ({
    receivers: new Float64Array(rows * count),
    faces: new Float64Array(rows * 2),
    ends: new Float64Array(rows * 4),
  });
  const beams = table(angles);
  const straight = (face: number): number => {
    const start = cut.ground + face * cut.face;
    return kept.subarray(start, start + cut.face).reduce((sum, value) => sum + value, 0);
  };
  kept.set(firstKeptFromSky(geometry, optics.transmittance, cut, angles));
  const sky = { ...table(1), straight: [straight(0), straight(1)] as [number, number] };
  fill(sky, 0, { from: cut.ground, to: kept.length }, 1);
  const want = (row: number): void => {
    if (done[row] === 1) return;
    done[row] = 1;
    const angle = ((row + 0.5) / angles - 0.5) * Math.PI;
    const lit = firstKept(geometry, optics.transmittance, cut, Math.tan(angle), kept);
    fill(beams, row, lit, Math.cos(angle));
  };
  return {
    ...beams,
    angles,
    back: [reflected[cut.ground], reflected[cut.ground + cut.face], reflected[0]],
    want,
    sky,
  };
}

/** A tangent's two neighbours in the table, with weights per unit of horizontal light. */
export interface Neighbours {
  row: number;
  next: number;
  low: number;
  high: number;
}

export function neighbours(reflections: Reflections, tangent: number): Neighbours {
  const { angles } = reflections;
  const angle = Math.atan(tangent);
  const at = (angle / Math.PI + 0.5) * angles - 0.5;
  const row = Math.min(Math.max(Math.floor(at), 0), angles - 1);
  const share = Math.min(Math.max(at - row, 0), 1);
  const next = Math.min(row + 1, angles - 1);
  reflections.want(row);
  reflections.want(next);
  const cosine = (index: number) => Math.sin(((index + 0.5) / angles) * Math.PI);
  const perHorizontal = 1 / ((1 - share) * cosine(row) + share * cosine(next));
  return { row, next, low: (1 - share) * perHorizontal, high: share * perHorizontal };
}
