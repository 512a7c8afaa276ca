import type { Layout } from '../contract/layout.js';
import type { LaidFigures } from '../contract/scenarios.js';
import {
  boundaryFigures,
  isInside,
  planeAt,
  ringsToPlane,
  sidesOf,
  toLonLat,
  type LonLatPoint,
  type LonLatRings,
  type PlanePoint,
  type PlaneRings,
} from './plane.js';

/** One row as it stands: ends of its centre line and what it carries. */
export interface LaidRow {
  start: PlanePoint;
  end: PlanePoint;
  lengthM: number;
  modules: number;
}

/** Rows over a boundary, in the plane of the field and on the map. */
export interface LaidRows {
  origin: LonLatPoint;
  rows: LaidRow[];
  /** Ground under each row's panels as a ring on the map. */
  outlines: LonLatPoint[][];
  figures: LaidFigures;
  /** Why no row stands; null when any does. */
  empty: string | null;
}

/** Rows shorter than this are not built, m (common practice: two posts and some modules). */
const SHORTEST_ROW_M = 4;
/** Most rows laid over one field; guards a typing error, not a design. */
const MOST_ROWS = 4000;

/** Width of the panels seen from above, m; trackers count flat. */
export function projectedWidthM(layout: Layout): number {
  if (layout.kind === 'single-axis-tracker') return layout.collectorWidthM;
  return layout.collectorWidthM * Math.cos((layout.tiltDeg * Math.PI) / 180);
}

/** Rings turned so that rows run along the first axis and the front faces the second. */
function turned(rings: PlaneRings, along: PlanePoint, across: PlanePoint): PlanePoint[][] {
  return rings.map((ring) =>
    ring.map(([x, y]): PlanePoint => [x * along[0] + y * along[1], x * across[0] + y * across[1]]),
  );
}

/**
 * Stretches along a row over which a band of the field is free of boundary.
 *
 * A place along the row is barred where any side of the boundary passes through the band there;
 * between barred places the band is whole inside or whole outside. Exact for any shape, cut-outs too.
 */
function freeStretches(rings: PlaneRings, middle: number, halfBand: number): [number, number][] {
  const barred: [number, number][] = [];
  for (const ring of rings) {
    for (const [a, b] of sidesOf(ring)) {
      const low = Math.min(a[1], b[1]);
      const high = Math.max(a[1], b[1]);
      if (high < middle - halfBand || low > middle + halfBand) continue;
      const at = (v: number) =>
        high === low ? null : a[0] + ((v - a[1]) / (b[1] - a[1])) * (b[0] - a[0]);
      const from = at(Math.max(low, middle - halfBand)) ?? a[0];
      const to = at(Math.min(high, middle + halfBand)) ?? b[0];
      barred.push([Math.min(from, to), Math.max(from, to)]);
    }
  }
  barred.sort((x, y) => x[0] - y[0]);
  const free: [number, number][] = [];
  let reached = -Infinity;
  for (const [from, to] of barred) {
    if (from > reached && reached > -Infinity) {
      if (isInside(rings, [(reached + from) / 2, middle])) free.push([reached, from]);
    }
    reached = Math.max(reached, to);
  }
  return free;
}

/** Whole modules in a stretch, and the length they take. */
function modulesIn(layout: Layout, stretchM: number): { modules: number; lengthM: number } {
  const gap = layout.gaps?.gapM ?? 0;
  const modules = Math.floor((stretchM + gap + 1e-9) / (layout.module.lengthM + gap));
  return { modules, lengthM: modules * layout.module.lengthM + Math.max(modules - 1, 0) * gap };
}

function figuresOf(layout: Layout, rows: LaidRow[], fieldAreaM2: number): LaidFigures {
  const rowLengthM = rows.reduce((sum, row) => sum + row.lengthM, 0);
  const modules = rows.reduce((sum, row) => sum + row.modules, 0);
  const moduleAreaM2 = modules * layout.module.lengthM * layout.collectorWidthM;
  const share = (area: number) => (fieldAreaM2 > 0 ? area / fieldAreaM2 : 0);
  return {
    rowCount: rows.length,
    rowLengthM,
    moduleAreaM2,
    kwp: (moduleAreaM2 * layout.module.powerWm2) / 1000,
    posts: rows.reduce((sum, row) => sum + Math.ceil(row.lengthM / layout.postSpacingM) + 1, 0),
    fieldAreaM2,
    groundCoverRatio: layout.collectorWidthM / layout.pitchM,
    coverageRatio: share((moduleAreaM2 * projectedWidthM(layout)) / layout.collectorWidthM),
    landLostShare: Math.min(share(rowLengthM * layout.stripWidthM), 1),
  };
}

/**
 * Lay rows over a field.
 *
 * Rows run at right angles to the facing azimuth, at multiples of the pitch from the field's origin
 * plus the offset. Panels keep the side margin to the boundary across the row and the headland at
 * both ends; only whole modules are built.
 *
 * @param rings boundary on the map: outer ring, then cut-outs (GeoJSON order)
 * @returns rows, outlines and figures; `empty` says why when nothing fits
 *
 * Ratios: ground cover = collector width / pitch; coverage = largest projected module area / field
 * area; land lost = uncropped strip x row length / field area (headlands stay farmed).
 */
export function layRows(layout: Layout, rings: LonLatRings): LaidRows {
  const origin = rings[0][0];
  const plane = planeAt(origin);
  const flat = ringsToPlane(plane, rings);
  const facing = (layout.azimuthDeg * Math.PI) / 180;
  const across: PlanePoint = [Math.sin(facing), Math.cos(facing)];
  const along: PlanePoint = [Math.cos(facing), -Math.sin(facing)];
  const aligned = turned(flat, along, across);
  const heights = aligned[0].map((point) => point[1]);
  const lowest = Math.min(...heights);
  const highest = Math.max(...heights);
  const halfWidth = projectedWidthM(layout) / 2;
  const rows: LaidRow[] = [];
  const outlines: LonLatPoint[][] = [];
  const backToPlane = (v: number, u: number): PlanePoint => [
    v * along[0] + u * across[0],
    v * along[1] + u * across[1],
  ];
  const first = Math.ceil((lowest - layout.offsetM) / layout.pitchM);
  const last = Math.min(Math.floor((highest - layout.offsetM) / layout.pitchM), first + MOST_ROWS);
  for (let k = first; k <= last; k += 1) {
    const middle = k * layout.pitchM + layout.offsetM;
    for (const [from, to] of freeStretches(aligned, middle, halfWidth + layout.sideMarginM)) {
      const { modules, lengthM } = modulesIn(layout, to - from - 2 * layout.headlandM);
      if (modules < 1 || lengthM < Math.min(SHORTEST_ROW_M, 2 * layout.module.lengthM)) continue;
      const begin = (from + to - lengthM) / 2;
      const end = begin + lengthM;
      rows.push({
        start: backToPlane(begin, middle),
        end: backToPlane(end, middle),
        lengthM,
        modules,
      });
      outlines.push(
        [
          [begin, middle - halfWidth],
          [end, middle - halfWidth],
          [end, middle + halfWidth],
          [begin, middle + halfWidth],
        ].map(([v, u]) => toLonLat(plane, backToPlane(v, u))),
      );
    }
  }
  const figures = figuresOf(layout, rows, boundaryFigures(flat).areaM2);
  const empty =
    rows.length > 0
      ? null
      : 'No row fits: the field is too narrow for this headland and side margin.';
  return { origin, rows, outlines, figures, empty };
}
