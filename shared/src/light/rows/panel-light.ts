import { planeFactor, type RowGeometry, type RowOptics } from './geometry.js';
import { neighbours, type Balance, type Reflections } from './reflections.js';

/** Irradiance of the panel faces per unit horizontal light. */
export interface PanelLight {
  front: number;
  rear: number;
  /** Of these, by reflection from ground and other panels. */
  frontReflected: number;
  rearReflected: number;
}

/** Pitches shaded by one row: 1 where shadows just meet. */
const shadowDepth = (geometry: RowGeometry, tangent: number): number =>
  (geometry.width * Math.abs(planeFactor(geometry, tangent))) / geometry.pitch;

/** Share of the lit face that no other row shades, 0-1. */
export function litShare(geometry: RowGeometry, tangent: number): number {
  const depth = shadowDepth(geometry, tangent);
  return depth <= 1 ? 1 : 1 / depth;
}

/** Share of a beam that reaches the ground straight, mean over a pitch. */
function straightToGround(geometry: RowGeometry, transmittance: number, tangent: number): number {
  const depth = shadowDepth(geometry, tangent);
  if (depth <= 1) return 1 - depth * (1 - transmittance);
  const full = Math.floor(depth);
  return Math.pow(transmittance, full) * (1 - (depth - full) * (1 - transmittance));
}

/**
 * Light of both faces from a beam, mean over the slant.
 *
 * @param transmittance of a row, gaps counted as open
 */
export function fillPanelLight(
  reflections: Reflections,
  geometry: RowGeometry,
  transmittance: number,
  tangent: number,
  out: PanelLight,
): void {
  const { row, next, low, high } = neighbours(reflections, tangent);
  const { faces } = reflections;
  const factor = planeFactor(geometry, tangent);
  const depth = shadowDepth(geometry, tangent);
  const direct =
    depth <= 1
      ? Math.abs(factor)
      : ((1 - straightToGround(geometry, transmittance, tangent)) * geometry.pitch) /
        ((1 - transmittance) * geometry.width);
  out.frontReflected = faces[row * 2] * low + faces[next * 2] * high;
  out.rearReflected = faces[row * 2 + 1] * low + faces[next * 2 + 1] * high;
  out.front = out.frontReflected + (factor > 0 ? direct : 0);
  out.rear = out.rearReflected + (factor > 0 ? 0 : direct);
}

/**
 * Where a beam's light ends. What is interpolated between profile angles is put right by the exact
 * share that goes straight to the ground; the sum is 1 to rounding.
 */
export function fillBalance(
  reflections: Reflections,
  geometry: RowGeometry,
  optics: RowOptics,
  tangent: number,
  out: Balance,
): void {
  const { row, next, low, high } = neighbours(reflections, tangent);
  const { ends, back } = reflections;
  const mix = (column: number) => ends[row * 4 + column] * low + ends[next * 4 + column] * high;
  const missed = straightToGround(geometry, optics.transmittance, tangent) - mix(3);
  const onPanel = planeFactor(geometry, tangent) > 0 ? back[0] : back[1];
  out.panel = mix(1) - missed * (1 - onPanel);
  out.escaped = mix(2) + missed * (back[2] - onPanel);
  shareBelow(optics, mix(0) + missed * (1 - back[2]), out);
}

/** Of what ends below the panels, structure takes its share first and the ground what it absorbs. */
function shareBelow(optics: RowOptics, below: number, out: Balance): void {
  const absorbed = (1 - optics.structureShade) * (1 - optics.albedo);
  const taken = absorbed + optics.structureShade;
  out.ground = taken > 0 ? (below * absorbed) / taken : 0;
  out.structure = below - out.ground;
}

/** Light of both faces from an even sky. */
export function skyPanelLight(
  { sky }: Reflections,
  geometry: RowGeometry,
  optics: RowOptics,
): PanelLight {
  const perArea = geometry.width > 0 ? geometry.pitch / geometry.width : 0;
  const scale = perArea / (1 - optics.transmittance);
  const [frontReflected, rearReflected] = sky.faces;
  return {
    front: sky.straight[0] * scale + frontReflected,
    rear: sky.straight[1] * scale + rearReflected,
    frontReflected,
    rearReflected,
  };
}

/** Where an even sky's light ends. */
export function skyBalance({ sky }: Reflections, optics: RowOptics): Balance {
  const out = { ground: 0, panel: sky.ends[1], escaped: sky.ends[2], structure: 0 };
  shareBelow(optics, sky.ends[0], out);
  return out;
}
