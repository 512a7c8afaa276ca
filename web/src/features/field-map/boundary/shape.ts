import type { Boundary, LonLat } from '@furrowlight/shared/contract/fields';

/** One ring while it is worked on: corners in order, the first not repeated at the end. */
export interface DraftRing {
  corners: LonLat[];
  closed: boolean;
}

/** A boundary while it is worked on: the outer ring first, then cut-outs. */
export interface Shape {
  rings: DraftRing[];
}

export interface CornerRef {
  ring: number;
  corner: number;
}

export const EMPTY: Shape = { rings: [] };

/** The ring that is being drawn, or -1 when all are closed. */
export function openRing(shape: Shape): number {
  return shape.rings.findIndex((ring) => !ring.closed);
}

export function isComplete(shape: Shape): boolean {
  return (
    shape.rings.length > 0 && shape.rings.every((ring) => ring.closed && ring.corners.length >= 3)
  );
}

export function shapeOf(boundary: Boundary | null): Shape {
  if (!boundary) return EMPTY;
  return {
    rings: boundary.coordinates.map((ring) => ({ corners: ring.slice(0, -1), closed: true })),
  };
}

/** The shape as the contract's polygon; null while something is still open. */
export function boundaryOf(shape: Shape): Boundary | null {
  if (!isComplete(shape)) return null;
  return {
    type: 'Polygon',
    coordinates: shape.rings.map(({ corners }) => [...corners, corners[0]]),
  };
}

function withRing(shape: Shape, index: number, ring: DraftRing): Shape {
  return { rings: shape.rings.map((old, i) => (i === index ? ring : old)) };
}

/** Add a corner to the ring being drawn, starting one when none is. */
export function addCorner(shape: Shape, at: LonLat): Shape {
  const index = openRing(shape);
  if (index < 0) return { rings: [...shape.rings, { corners: [at], closed: false }] };
  const ring = shape.rings[index];
  return withRing(shape, index, { ...ring, corners: [...ring.corners, at] });
}

export function closeRing(shape: Shape): Shape {
  const index = openRing(shape);
  if (index < 0 || shape.rings[index].corners.length < 3) return shape;
  return withRing(shape, index, { ...shape.rings[index], closed: true });
}

/** Take back the last corner of the ring being drawn. */
export function dropLastCorner(shape: Shape): Shape {
  const index = openRing(shape);
  if (index < 0) return shape;
  const corners = shape.rings[index].corners.slice(0, -1);
  if (corners.length === 0) return { rings: shape.rings.filter((_, i) => i !== index) };
  return withRing(shape, index, { corners, closed: false });
}

export function moveCorner(shape: Shape, { ring, corner }: CornerRef, to: LonLat): Shape {
  const old = shape.rings[ring];
  return withRing(shape, ring, {
    ...old,
    corners: old.corners.map((at, i) => (i === corner ? to : at)),
  });
}

/** Put a corner after the one named. */
export function insertCorner(shape: Shape, { ring, corner }: CornerRef, at: LonLat): Shape {
  const old = shape.rings[ring];
  const corners = [...old.corners.slice(0, corner + 1), at, ...old.corners.slice(corner + 1)];
  return withRing(shape, ring, { ...old, corners });
}

/** Take a corner away; a closed ring keeps at least three. */
export function removeCorner(shape: Shape, { ring, corner }: CornerRef): Shape {
  const old = shape.rings[ring];
  if (old.closed && old.corners.length <= 3) return shape;
  const corners = old.corners.filter((_, i) => i !== corner);
  if (corners.length === 0) return { rings: shape.rings.filter((_, i) => i !== ring) };
  return withRing(shape, ring, { ...old, corners });
}

/** Take a cut-out away; the outer ring stays. */
export function removeRing(shape: Shape, index: number): Shape {
  return index === 0 ? EMPTY : { rings: shape.rings.filter((_, i) => i !== index) };
}
