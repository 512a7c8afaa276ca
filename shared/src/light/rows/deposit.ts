import type { Cut } from './elements.js';
import { planeFactor, type RowGeometry } from './geometry.js';

/** Face elements that a beam reaches straight: from (included) to (left out). */
export interface LitRange {
  from: number;
  to: number;
}

/**
 * Where a beam first stays: light kept by each element per pitch of unit horizontal light.
 *
 * Exact: along the slant from the upper edge, the n-th stretch of length pitch / |plane factor| lies
 * behind n other rows; on the ground, the part of a pitch under one more row than the rest is one
 * interval. The sum over all elements is 1.
 *
 * @param tangent profileTangent of the sun
 * @param kept filled, one value an element
 * @returns face elements that get any of it; ground elements all may
 */
export function firstKept(
  geometry: RowGeometry,
  transmittance: number,
  cut: Cut,
  tangent: number,
  kept: Float64Array,
): LitRange {
  kept.fill(0);
  const { pitch, width } = geometry;
  const factor = planeFactor(geometry, tangent);
  const depth = (width * Math.abs(factor)) / pitch;
  const full = Math.floor(depth);
  keepOnGround(kept, geometry, transmittance, cut, tangent, full, depth - full);
  const face = cut.ground + (factor > 0 ? 0 : cut.face);
  if (depth === 0) return { from: face, to: face };

  const reached = transmittance === 0 && depth > 1 ? Math.ceil(cut.face / depth) : cut.face;
  for (let strip = 0; strip < reached; strip += 1) {
    let from = (strip / cut.face) * depth;
    const end = ((strip + 1) / cut.face) * depth;
    while (from < end - 1e-15) {
      const layer = Math.floor(from + 1e-12);
      const to = Math.min(end, layer + 1);
      const before = layer === 0 ? 1 : Math.pow(transmittance, layer);
      kept[face + strip] += (to - from) * before * (1 - transmittance);
      from = to;
    }
  }
  return { from: face, to: face + reached };
}

/** Ground under `full` rows everywhere and under one more over the share `part` of a pitch. */
function keepOnGround(
  kept: Float64Array,
  geometry: RowGeometry,
  transmittance: number,
  cut: Cut,
  tangent: number,
  full: number,
  part: number,
): void {
  const { pitch, width, tilt, midHeight } = geometry;
  const half = width / 2;
  const upper = -half * Math.cos(tilt) - (midHeight + half * Math.sin(tilt)) * tangent;
  const lower = half * Math.cos(tilt) - (midHeight - half * Math.sin(tilt)) * tangent;
  const start = Math.min(upper, lower) / pitch;
  const shadeFrom = start - Math.floor(start);
  const outside = Math.pow(transmittance, full);
  const loss = outside * (1 - transmittance);
  const perStrip = outside / cut.ground;
  for (let strip = 0; strip < cut.ground; strip += 1) kept[strip] = perStrip;
  if (loss === 0 || part === 0) return;
  // Place of the shade in strips; it may run over the end of the pitch.
  const begin = shadeFrom * cut.ground;
  const finish = (shadeFrom + part) * cut.ground;
  for (let strip = Math.floor(begin); strip < finish; strip += 1) {
    const covered = Math.min(strip + 1, finish) - Math.max(strip, begin);
    kept[strip % cut.ground] -= (covered / cut.ground) * loss;
  }
}
