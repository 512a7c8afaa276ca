import type { Cut } from './elements.js';
import { planeFactor, type RowGeometry } from './geometry.js';

/**
 * Where a beam first stays: light kept by each element per pitch of unit horizontal light.
 *
 * Exact: along the slant from the upper edge, the n-th stretch of length pitch / |plane factor| lies
 * behind n other rows; on the ground, the part of a pitch under one more row than the rest is one
 * interval. The sum over all elements is 1.
 *
 * @param tangent profileTangent of the sun
 * @param kept filled, one value an element
 */
export function firstKept(
  geometry: RowGeometry,
  transmittance: number,
  cut: Cut,
  tangent: number,
  kept: Float64Array,
): void {
  kept.fill(0);
  const { pitch, width } = geometry;
  const factor = planeFactor(geometry, tangent);
  const depth = (width * Math.abs(factor)) / pitch;
  const full = Math.floor(depth);
  keepOnGround(kept, geometry, transmittance, cut, tangent, full, depth - full);
  if (depth === 0) return;

  const face = cut.ground + (factor > 0 ? 0 : cut.face);
  for (let strip = 0; strip < cut.face; strip += 1) {
    let from = (strip / cut.face) * depth;
    const end = ((strip + 1) / cut.face) * depth;
    while (from < end - 1e-15) {
      const layer = Math.floor(from + 1e-12);
      const to = Math.min(end, layer + 1);
      kept[face + strip] += (to - from) * Math.pow(transmittance, layer) * (1 - transmittance);
      from = to;
    }
  }
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
  for (let strip = 0; strip < cut.ground; strip += 1) {
    const from = strip / cut.ground;
    const to = (strip + 1) / cut.ground;
    let covered = 0;
    for (const shift of [0, -1]) {
      const a = Math.max(from, shadeFrom + shift);
      const b = Math.min(to, shadeFrom + shift + part);
      if (b > a) covered += b - a;
    }
    kept[strip] += (to - from) * outside - covered * loss;
  }
}
