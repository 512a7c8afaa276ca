import { InputError, requireWithin } from '../../errors.js';

/**
 * Endless parallel rows on level ground, in the plane across them.
 *
 * `u` runs across the rows, positive the way the front face looks; row centres stand at multiples
 * of the pitch. With a positive tilt the lower edge is on the +u side. Metres and radians.
 */
export interface RowGeometry {
  /** Distance between row centre lines, m. */
  pitch: number;
  /** Slant width of the panel, lower to upper edge, m. */
  width: number;
  /**
   * Tilt from the ground plane, radians. Positive: the edge on the front side is the lower one. On
   * falling ground a flat panel leans the other way (below 0) and a fence may overhang (above pi/2).
   */
  tilt: number;
  /** Height of the middle of the slant above ground, m. */
  midHeight: number;
  /** The way the front face looks, radians clockwise from north. */
  surfaceAzimuth: number;
}

/** What panels and ground do with light. Shares 0-1. */
export interface RowOptics {
  /** Light passing straight through the panel, the same at every angle. */
  transmittance: number;
  frontReflectance: number;
  rearReflectance: number;
  /** Diffuse reflectance of ground and crop. */
  albedo: number;
  /** Light below the panels taken by sub-frames, tubes and posts. */
  structureShade: number;
}

/** @throws InputError naming the part of the geometry that cannot stand. */
export function requireRowGeometry(geometry: RowGeometry): void {
  const { pitch, width, tilt, midHeight } = geometry;
  requireWithin('pitch', pitch, 0.1, 1000, 'm');
  requireWithin('width', width, 0, 100, 'm');
  requireWithin('tilt', tilt, -Math.PI / 2, Math.PI, 'rad');
  requireWithin('midHeight', midHeight, 0, 1000, 'm');
  requireWithin('surfaceAzimuth', geometry.surfaceAzimuth, -10, 10, 'rad');
  if (width * Math.abs(Math.cos(tilt)) > pitch + 1e-9) {
    throw new InputError('pitch', 'Rows collide: the pitch is smaller than the panel is wide.');
  }
  if (!(midHeight - (width / 2) * Math.abs(Math.sin(tilt)) >= -1e-9)) {
    throw new InputError('midHeight', 'The lower panel edge would stand in the ground.');
  }
}

/** @throws InputError naming the share that is out of range. */
export function requireRowOptics(optics: RowOptics): void {
  requireWithin('transmittance', optics.transmittance, 0, 0.99);
  requireWithin('frontReflectance', optics.frontReflectance, 0, 1);
  requireWithin('rearReflectance', optics.rearReflectance, 0, 1);
  requireWithin('albedo', optics.albedo, 0, 1);
  requireWithin('structureShade', optics.structureShade, 0, 0.5);
  const most = 1 - optics.transmittance;
  if (optics.frontReflectance > most || optics.rearReflectance > most) {
    throw new InputError('transmittance', 'Reflectance and transmittance together exceed 1.');
  }
}

/**
 * Tangent of the sun's angle from the vertical in the plane across the rows, positive on the
 * front side: tan(zenith) x cos(sun azimuth - surface azimuth). All beam light under endless rows
 * depends on the sun through it alone.
 */
export function profileTangent(
  geometry: RowGeometry,
  sunAzimuth: number,
  sunAltitude: number,
): number {
  return Math.cos(sunAzimuth - geometry.surfaceAzimuth) / Math.tan(sunAltitude);
}

/** Irradiance of the panel plane per horizontal beam irradiance; negative where the rear is lit. */
export function planeFactor(geometry: RowGeometry, tangent: number): number {
  return Math.cos(geometry.tilt) + Math.sin(geometry.tilt) * tangent;
}

/**
 * Share of level ground that lies in panel shade: min(1, w |cos b + sin b tan| / p).
 *
 * Exact for long rows without gaps (own derivation; Montpellier and Heggelbach cases in the tests).
 */
export function shadedShare(geometry: RowGeometry, tangent: number): number {
  return Math.min(1, (geometry.width * Math.abs(planeFactor(geometry, tangent))) / geometry.pitch);
}

/** A panel's two ends in the plane across, of the row at u = 0, clipped to what is above a height. */
export interface PanelEnds {
  u1: number;
  z1: number;
  u2: number;
  z2: number;
  /** False when nothing of the panel is above the height. */
  above: boolean;
}

/** +1 where the upper edge is on the -u side (tilt above 0), else -1. */
export const upperSide = (geometry: RowGeometry): 1 | -1 => (geometry.tilt < 0 ? -1 : 1);

/** A panel that rises less than this over the receivers lies on them and shades nothing, m. */
const TOUCHING = 1e-5;

/** Ends of the panel of row 0 above height `z0` (upper end first). */
export function panelEndsAbove(geometry: RowGeometry, z0: number): PanelEnds {
  const half = geometry.width / 2;
  const c = Math.cos(geometry.tilt) * upperSide(geometry);
  const s = Math.abs(Math.sin(geometry.tilt));
  const u1 = -half * c;
  const z1 = geometry.midHeight + half * s;
  let u2 = half * c;
  let z2 = geometry.midHeight - half * s;
  if (z1 <= z0 + TOUCHING) return { u1, z1, u2, z2, above: false };
  if (z2 < z0) {
    const share = (z1 - z0) / (z1 - z2);
    u2 = u1 + (u2 - u1) * share;
    z2 = z0;
  }
  return { u1, z1, u2, z2, above: true };
}
