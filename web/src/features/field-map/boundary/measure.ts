import type { LonLat } from '@furrowlight/shared/contract/fields';
import type { DraftRing, Shape } from './shape';

/** Mean radius of the earth, m (IUGG 1980). */
const RADIUS_M = 6_371_008.8;
const RAD = Math.PI / 180;

type Point = [eastM: number, northM: number];

/** Metres east and north of a place; a flat plane that is true to a metre over a farm. */
function toPlane([lon, lat]: LonLat, origin: LonLat): Point {
  return [
    (lon - origin[0]) * RAD * RADIUS_M * Math.cos(origin[1] * RAD),
    (lat - origin[1]) * RAD * RADIUS_M,
  ];
}

/** The place so many metres east and north of another. */
export function shifted([lon, lat]: LonLat, eastM: number, northM: number): LonLat {
  return [
    Number((lon + eastM / (RAD * RADIUS_M * Math.cos(lat * RAD))).toFixed(7)),
    Number((lat + northM / (RAD * RADIUS_M)).toFixed(7)),
  ];
}

export interface Side {
  lengthM: number;
  /** Clockwise from north, 0-360. */
  bearingDeg: number;
}

export function sideBetween(from: LonLat, to: LonLat): Side {
  const [east, north] = toPlane(to, from);
  return {
    lengthM: Math.hypot(east, north),
    bearingDeg: (Math.atan2(east, north) / RAD + 360) % 360,
  };
}

/** The end of a side that starts at `from`. */
export function endOfSide(from: LonLat, { lengthM, bearingDeg }: Side): LonLat {
  return shifted(from, lengthM * Math.sin(bearingDeg * RAD), lengthM * Math.cos(bearingDeg * RAD));
}

function ringArea({ corners }: DraftRing): number {
  const points = corners.map((corner) => toPlane(corner, corners[0]));
  let twice = 0;
  points.forEach(([x, y], i) => {
    const [nextX, nextY] = points[(i + 1) % points.length];
    twice += x * nextY - nextX * y;
  });
  return Math.abs(twice) / 2;
}

function ringLength({ corners }: DraftRing): number {
  return corners.reduce(
    (sum, corner, i) => sum + sideBetween(corner, corners[(i + 1) % corners.length]).lengthM,
    0,
  );
}

export interface ShapeFigures {
  areaM2: number;
  perimeterM: number;
}

/** Area less cut-outs and outer perimeter, as if an open ring were closed; null below three corners. */
export function figuresOf(shape: Shape): ShapeFigures | null {
  const [outer, ...holes] = shape.rings.filter((ring) => ring.corners.length >= 3);
  if (!outer) return null;
  return {
    areaM2: ringArea(outer) - holes.reduce((sum, hole) => sum + ringArea(hole), 0),
    perimeterM: ringLength(outer),
  };
}

const turn = (a: Point, b: Point, c: Point) =>
  Math.sign((b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]));

function cross(a: Point, b: Point, c: Point, d: Point): boolean {
  return turn(a, b, c) * turn(a, b, d) < 0 && turn(c, d, a) * turn(c, d, b) < 0;
}

/** Number (from 1) of two sides of the shape that cross, or null. Skipped above 400 corners. */
export function crossingSides(shape: Shape): [number, number] | null {
  const origin = shape.rings[0]?.corners[0];
  if (!origin) return null;
  const sides = shape.rings.flatMap(({ corners, closed }) => {
    const points = corners.map((corner) => toPlane(corner, origin));
    const count = closed ? points.length : points.length - 1;
    return points.slice(0, count).map((p, i) => [p, points[(i + 1) % points.length]] as const);
  });
  if (sides.length > 400) return null;
  for (let i = 0; i < sides.length; i += 1) {
    for (let j = i + 1; j < sides.length; j += 1) {
      if (cross(sides[i][0], sides[i][1], sides[j][0], sides[j][1])) return [i + 1, j + 1];
    }
  }
  return null;
}
