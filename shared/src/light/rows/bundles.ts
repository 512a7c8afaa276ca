import { elementCount, stripAt, type Cut } from './elements.js';
import { planeFactor, upperSide, type RowGeometry } from './geometry.js';

/** Light weaker than this share of what set out is no longer followed. */
const FAINTEST = 1e-15;

/** Diffuse exchange between elements: who keeps the light that each throws back. */
export interface Transfers {
  /** transfer[j * n + i]: share of light thrown back by i that j keeps. */
  transfer: Float64Array;
  /** Share of light thrown back by i that leaves to the sky; with column i it sums to 1. */
  escaping: Float64Array;
}

/** One profile direction: where its parallel lines meet panels and ground. */
interface Direction {
  /** Horizontal width of all shadows of one panel, in pitches. */
  depth: number;
  /** Ground place (in pitches, from u = 0) of the line through a panel's upper edge. */
  edge: number;
  /** +1 where going down the slant moves the line's foot to +u. */
  side: number;
  /** The lines come from the front side of the panel. */
  onFront: boolean;
}

function directionAt(geometry: RowGeometry, tangent: number): Direction {
  const { width, tilt, midHeight, pitch } = geometry;
  const factor = planeFactor(geometry, tangent);
  const turn = upperSide(geometry);
  const upperHeight = midHeight + (width / 2) * Math.abs(Math.sin(tilt));
  const upper = (-turn * width * Math.cos(tilt)) / 2 - upperHeight * tangent;
  return {
    depth: (width * Math.abs(factor)) / pitch,
    edge: upper / pitch,
    side: factor >= 0 ? turn : -turn,
    onFront: factor >= 0,
  };
}

/** Places between 0 and 1 where the set of elements met by a line changes, sorted. */
function breaks(cut: Cut, direction: Direction, into: Float64Array): Float64Array {
  const { depth, edge, side } = direction;
  let count = 0;
  into[count++] = 0;
  into[count++] = 1;
  for (let j = 0; j < cut.ground; j += 1) {
    const place = side * (j / cut.ground - edge);
    into[count++] = place - Math.floor(place);
  }
  for (let j = 0; j <= cut.face; j += 1) {
    const place = (j / cut.face) * depth;
    into[count++] = place - Math.floor(place);
  }
  return into.subarray(0, count).sort();
}

/**
 * Share one bundle of lines among the surfaces it meets, both ways along the lines.
 *
 * @param met elements met from the sky down: pairs (upper side, lower side) of each panel, then the
 *   ground
 */
function shareBundle(
  sums: Transfers,
  n: number,
  met: Int32Array,
  panels: number,
  transmittance: number,
  weight: number,
): void {
  const { transfer, escaping } = sums;
  const kept = 1 - transmittance;
  const ground = met[2 * panels];
  // Upwards from the lower of two surfaces, and back down the same lines.
  for (let a = 0; a <= panels; a += 1) {
    const from = a === panels ? ground : met[2 * a];
    let left = weight;
    for (let b = a - 1; b >= 0 && left > FAINTEST * weight; b -= 1) {
      const under = met[2 * b + 1];
      transfer[under * n + from] += left * kept;
      transfer[from * n + under] += left * (a === panels ? 1 : kept);
      left *= transmittance;
    }
    escaping[from] += left;
  }
}

/** Divide each column by its sum, so that every element hands on exactly what it throws back. */
function normalise({ transfer, escaping }: Transfers, n: number): void {
  for (let i = 0; i < n; i += 1) {
    let sum = escaping[i];
    for (let j = 0; j < n; j += 1) sum += transfer[j * n + i];
    if (sum === 0) continue;
    escaping[i] /= sum;
    for (let j = 0; j < n; j += 1) transfer[j * n + i] /= sum;
  }
}

/**
 * Diffuse exchange between the ground and both faces of endless rows.
 *
 * Space is filled with parallel lines of each profile direction. Between two neighbouring breaks
 * all lines meet the same elements, so the bundle's width is exact for that direction, light through
 * panels is attenuated, and what goes from i to j is what goes from j to i (reciprocity). Only
 * the profile angle is summed numerically.
 *
 * Source: bundle form of the view factor integral in two dimensions (Siegel & Howell, Thermal
 * Radiation Heat Transfer, ch. on two-dimensional enclosures).
 */
export function prepareTransfers(
  geometry: RowGeometry,
  transmittance: number,
  cut: Cut,
): Transfers {
  const n = elementCount(cut);
  const sums = { transfer: new Float64Array(n * n), escaping: new Float64Array(n) };
  const scratch = new Float64Array(cut.ground + cut.face + 3);
  let met = new Int32Array(64);
  const step = Math.PI / cut.directions;
  for (let d = 0; d < cut.directions; d += 1) {
    const from = -Math.PI / 2 + d * step;
    const weight = (Math.sin(from + step) - Math.sin(from)) / 2;
    const direction = directionAt(geometry, Math.tan(from + step / 2));
    const { depth, edge, side, onFront } = direction;
    const most = Math.floor(depth) + 2;
    if (2 * most + 1 > met.length) met = new Int32Array(4 * most);
    const upperFace = cut.ground + (onFront ? 0 : cut.face);
    const lowerFace = cut.ground + (onFront ? cut.face : 0);
    const places = breaks(cut, direction, scratch);
    for (let b = 1; b < places.length; b += 1) {
      const width = places[b] - places[b - 1];
      if (width < 1e-14) continue;
      const middle = (places[b] + places[b - 1]) / 2;
      let panels = 0;
      for (let place = middle; place < depth; place += 1) {
        const strip = stripAt(place / depth, cut.face);
        met[2 * panels] = upperFace + strip;
        met[2 * panels + 1] = lowerFace + strip;
        panels += 1;
      }
      const foot = edge + side * middle;
      met[2 * panels] = stripAt(foot - Math.floor(foot), cut.ground);
      shareBundle(sums, n, met, panels, transmittance, width * weight);
    }
  }
  normalise(sums, n);
  return sums;
}
