import type { Boundary, LonLat } from '@furrowlight/shared/contract/fields';
import {
  boundaryFigures,
  type BoundaryFigures,
  isInside,
  openRing,
  planeAt,
  ringArea,
  ringsToPlane,
  selfCrossing,
  sidesOf,
  toLonLat,
  toPlane,
  type LocalPlane,
  type PlanePoint,
} from '@furrowlight/shared/layout/plane';
import { invalid, type FieldMessage } from '../common/domain-error.js';

const MIN_AREA_M2 = 100;
const MAX_AREA_M2 = 5_000_000;
/** The light engine answers between the polar circles. */
const MAX_LATITUDE = 66;
/** Corners closer than this are one corner set twice, m. */
const SAME_CORNER_M = 0.05;
/** A corner this near to a foreign side lies on it, m. */
const ON_SIDE_M = 0.01;

const at = (message: string): FieldMessage => ({ path: 'boundary', message });

const place = (plane: LocalPlane, point: PlanePoint): string => {
  const [longitude, latitude] = toLonLat(plane, point);
  return `latitude ${latitude.toFixed(5)}, longitude ${longitude.toFixed(5)}`;
};

function requireClosed(boundary: Boundary): void {
  boundary.coordinates.forEach((ring, i) => {
    const [first, last] = [ring[0], ring[ring.length - 1]];
    if (first[0] !== last[0] || first[1] !== last[1]) {
      const which = i === 0 ? 'The boundary' : `Cut-out ${i}`;
      throw invalid(at(`${which} is not closed: its last corner must repeat its first.`));
    }
  });
}

function requireDistinctCorners(plane: LocalPlane, rings: PlanePoint[][]): void {
  for (const ring of rings) {
    for (let i = 0; i < ring.length; i += 1) {
      for (let j = i + 1; j < ring.length; j += 1) {
        const apart = Math.hypot(ring[i][0] - ring[j][0], ring[i][1] - ring[j][1]);
        if (apart < SAME_CORNER_M) {
          throw invalid(at(`Two corners lie on one spot at ${place(plane, ring[i])}: remove one.`));
        }
      }
    }
  }
}

function distanceToSide([x, y]: PlanePoint, [a, b]: [PlanePoint, PlanePoint]): number {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]];
  const along = ((x - a[0]) * dx + (y - a[1]) * dy) / (dx * dx + dy * dy);
  const t = Math.min(1, Math.max(0, along));
  return Math.hypot(x - a[0] - t * dx, y - a[1] - t * dy);
}

/** A corner on a side that is not its own: the outline touches itself or doubles back. */
function touchingCorner(rings: PlanePoint[][]): PlanePoint | null {
  const sides = rings.flatMap((ring) => sidesOf(ring));
  for (const corner of rings.flat()) {
    const touched = sides.some(
      (side) =>
        side[0] !== corner && side[1] !== corner && distanceToSide(corner, side) < ON_SIDE_M,
    );
    if (touched) return corner;
  }
  return null;
}

function requireSimple(plane: LocalPlane, rings: PlanePoint[][]): void {
  const crossing = selfCrossing(rings);
  if (crossing) {
    throw invalid(at(`The boundary crosses itself at ${place(plane, crossing)}: move a corner.`));
  }
  const touching = touchingCorner(rings);
  if (touching) {
    throw invalid(at(`The boundary touches itself at ${place(plane, touching)}: move a corner.`));
  }
}

function requireCutOutsInside(rings: PlanePoint[][]): void {
  const [outer, ...holes] = rings;
  holes.forEach((hole, i) => {
    const stray = hole.some((corner) => !isInside([outer], corner));
    const nested = holes.some((other, j) => j !== i && isInside([other], hole[0]));
    if (stray) throw invalid(at(`Cut-out ${i + 1} reaches outside the field.`));
    if (nested) throw invalid(at(`Cut-out ${i + 1} lies inside another cut-out.`));
  });
}

function requireSensibleArea(areaM2: number): void {
  const hectares = (areaM2 / 10_000).toFixed(areaM2 < MIN_AREA_M2 ? 4 : 0);
  if (areaM2 < MIN_AREA_M2) {
    throw invalid(at(`The boundary encloses ${hectares} ha; a field has at least 0.01 ha.`));
  }
  if (areaM2 > MAX_AREA_M2) {
    throw invalid(at(`The boundary encloses ${hectares} ha; a field has at most 500 ha.`));
  }
}

/** @throws DomainError invalid-input where the light engine has no answer */
export function requireLatitude([, latitude]: LonLat, path: 'pin' | 'boundary'): void {
  if (Math.abs(latitude) > MAX_LATITUDE) {
    throw invalid({
      path,
      message: `Latitude ${latitude.toFixed(2)} is beyond ±${MAX_LATITUDE} degrees, where the light model ends.`,
    });
  }
}

/** Middle of the outer ring's corners. */
export function middleOf(boundary: Boundary): LonLat {
  const ring = openRing(boundary.coordinates[0]);
  const sum = ring.reduce(([x, y], [lon, lat]) => [x + lon, y + lat], [0, 0]);
  return [sum[0] / ring.length, sum[1] / ring.length];
}

/**
 * Figures of a boundary that can be a field.
 *
 * @throws DomainError invalid-input naming the first thing that is wrong and where
 */
export function measureBoundary(boundary: Boundary): BoundaryFigures {
  requireClosed(boundary);
  const middle = middleOf(boundary);
  boundary.coordinates[0].forEach((corner) => requireLatitude(corner, 'boundary'));
  const plane = planeAt(middle);
  const rings = ringsToPlane(plane, boundary.coordinates);
  const outerArea = Math.abs(ringArea(rings[0]));
  // Size first: an outline across a continent has no meaningful crossing.
  if (outerArea > MAX_AREA_M2) requireSensibleArea(outerArea);
  requireDistinctCorners(plane, rings);
  requireSimple(plane, rings);
  requireCutOutsInside(rings);
  const figures = boundaryFigures(rings);
  requireSensibleArea(figures.areaM2);
  return figures;
}

/** A pin within the boundary: the given one, else the middle, else a corner of a bent field. */
export function pinWithin(boundary: Boundary, pin: LonLat): LonLat {
  const middle = middleOf(boundary);
  const plane = planeAt(middle);
  const rings = ringsToPlane(plane, boundary.coordinates);
  if (isInside(rings, toPlane(plane, pin))) return pin;
  return isInside(rings, toPlane(plane, middle)) ? middle : boundary.coordinates[0][0];
}
