import { InputError } from '../errors.js';

/** [longitude, latitude], degrees, WGS 84. */
export type LonLatPoint = readonly [number, number];
/** [east, north] of an origin, m. */
export type PlanePoint = readonly [number, number];

/** Outer ring, then cut-outs. Rings may be open or closed. */
export type LonLatRings = readonly (readonly LonLatPoint[])[];
export type PlaneRings = readonly (readonly PlanePoint[])[];

/** A flat map of a field: metres east and north of its origin. */
export interface LocalPlane {
  origin: LonLatPoint;
  metresPerLonDegree: number;
  metresPerLatDegree: number;
}

const EQUATOR_RADIUS = 6_378_137;
const ECCENTRICITY_SQUARED = 6.69437999014e-3;

/**
 * Plane touching the WGS 84 ellipsoid at a place.
 *
 * Lengths are right to 1e-5 within 2 km of the origin (radii of curvature of the ellipsoid; Snyder
 * 1987, USGS Professional Paper 1395).
 *
 * @throws InputError naming origin
 */
export function planeAt(origin: LonLatPoint): LocalPlane {
  const [longitude, latitude] = origin;
  if (!(Math.abs(latitude) <= 85) || !(Math.abs(longitude) <= 180)) {
    throw new InputError('origin', `No plane at longitude ${longitude}, latitude ${latitude}.`);
  }
  const phi = (latitude * Math.PI) / 180;
  const w = 1 - ECCENTRICITY_SQUARED * Math.sin(phi) ** 2;
  const north = (EQUATOR_RADIUS * (1 - ECCENTRICITY_SQUARED)) / Math.pow(w, 1.5);
  const east = (EQUATOR_RADIUS / Math.sqrt(w)) * Math.cos(phi);
  const degree = Math.PI / 180;
  return { origin, metresPerLonDegree: east * degree, metresPerLatDegree: north * degree };
}

export const toPlane = (plane: LocalPlane, [lon, lat]: LonLatPoint): PlanePoint => [
  (lon - plane.origin[0]) * plane.metresPerLonDegree,
  (lat - plane.origin[1]) * plane.metresPerLatDegree,
];

export const toLonLat = (plane: LocalPlane, [east, north]: PlanePoint): LonLatPoint => [
  plane.origin[0] + east / plane.metresPerLonDegree,
  plane.origin[1] + north / plane.metresPerLatDegree,
];

/** Rings in the plane, without the repeated closing corner. */
export function ringsToPlane(plane: LocalPlane, rings: LonLatRings): PlanePoint[][] {
  return rings.map((ring) => openRing(ring).map((point) => toPlane(plane, point)));
}

/** A ring without its closing corner. */
export function openRing<P extends readonly [number, number]>(ring: readonly P[]): P[] {
  const [first] = ring;
  const last = ring[ring.length - 1];
  const closed = ring.length > 1 && first[0] === last[0] && first[1] === last[1];
  return closed ? ring.slice(0, -1) : [...ring];
}

/** Signed area of an open ring, m2; positive counter-clockwise. */
export function ringArea(ring: readonly PlanePoint[]): number {
  let twice = 0;
  ring.forEach(([x, y], i) => {
    const [nextX, nextY] = ring[(i + 1) % ring.length];
    twice += x * nextY - nextX * y;
  });
  return twice / 2;
}

/** Sides of an open ring as pairs of points, the closing side included. */
export function sidesOf<P>(ring: readonly P[]): [P, P][] {
  return ring.map((point, i) => [point, ring[(i + 1) % ring.length]]);
}

/** Figures of a boundary. */
export interface BoundaryFigures {
  /** Outer ring less cut-outs, m2. */
  areaM2: number;
  /** Length of the outer ring, m. */
  perimeterM: number;
  longestSideM: number;
  /** Direction of the longest side, degrees clockwise from north, 0-180. */
  longestSideBearingDeg: number;
}

/** Area, perimeter and longest side of rings in the plane. */
export function boundaryFigures(rings: PlaneRings): BoundaryFigures {
  const [outer, ...holes] = rings;
  let perimeterM = 0;
  let longestSideM = 0;
  let longestSideBearingDeg = 0;
  for (const [a, b] of sidesOf(outer)) {
    const east = b[0] - a[0];
    const north = b[1] - a[1];
    const length = Math.hypot(east, north);
    perimeterM += length;
    if (length > longestSideM) {
      longestSideM = length;
      longestSideBearingDeg = ((Math.atan2(east, north) * 180) / Math.PI + 360) % 180;
    }
  }
  const cut = holes.reduce((sum, hole) => sum + Math.abs(ringArea(hole)), 0);
  return {
    areaM2: Math.abs(ringArea(outer)) - cut,
    perimeterM,
    longestSideM,
    longestSideBearingDeg,
  };
}

/** Is a point inside the outer ring and outside every cut-out (even-odd rule)? */
export function isInside(rings: PlaneRings, [x, y]: PlanePoint): boolean {
  let inside = false;
  for (const ring of rings) {
    for (const [a, b] of sidesOf(ring)) {
      if (a[1] > y === b[1] > y) continue;
      if (x < a[0] + ((y - a[1]) / (b[1] - a[1])) * (b[0] - a[0])) inside = !inside;
    }
  }
  return inside;
}

/** Where two sides cross, strictly inside both; null where they do not. */
function crossingOf([a, b]: [PlanePoint, PlanePoint], [c, d]: [PlanePoint, PlanePoint]) {
  const r = [b[0] - a[0], b[1] - a[1]];
  const s = [d[0] - c[0], d[1] - c[1]];
  const cross = r[0] * s[1] - r[1] * s[0];
  if (Math.abs(cross) < 1e-12) return null;
  const t = ((c[0] - a[0]) * s[1] - (c[1] - a[1]) * s[0]) / cross;
  const u = ((c[0] - a[0]) * r[1] - (c[1] - a[1]) * r[0]) / cross;
  const touching = 1e-9;
  if (t <= touching || t >= 1 - touching || u <= touching || u >= 1 - touching) return null;
  return [a[0] + r[0] * t, a[1] + r[1] * t] as PlanePoint;
}

/** First point at which sides of any rings cross each other; null for a sound boundary. */
export function selfCrossing(rings: PlaneRings): PlanePoint | null {
  const sides = rings.flatMap((ring) => sidesOf(ring));
  for (let i = 0; i < sides.length; i += 1) {
    for (let j = i + 1; j < sides.length; j += 1) {
      const point = crossingOf(sides[i], sides[j]);
      if (point) return point;
    }
  }
  return null;
}
