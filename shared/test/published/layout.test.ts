import { describe, expect, it } from 'vitest';
import { Layout } from '../../src/contract/layout.js';
import { passOf, pitchForBouts } from '../../src/layout/machine-passes.js';
import {
  boundaryFigures,
  isInside,
  planeAt,
  ringsToPlane,
  selfCrossing,
  toLonLat,
  type PlanePoint,
} from '../../src/layout/plane.js';
import { layRows } from '../../src/layout/rows-over-field.js';

const layout = Layout.parse({
  kind: 'overhead-fixed',
  pitchM: 10,
  collectorWidthM: 4,
  tiltDeg: 0,
  azimuthDeg: 180,
  clearHeightM: 4.6,
  headlandM: 10,
  sideMarginM: 3,
  stripWidthM: 1,
  offsetM: 0,
  postSpacingM: 10,
  structureShade: 0,
  module: {
    powerWm2: 200,
    lengthM: 1,
    transmittance: 0,
    frontReflectance: 0.05,
    rearReflectance: 0.05,
    bifaciality: 0,
    temperaturePercentPerK: -0.4,
  },
  gaps: null,
  tracker: null,
  dcAcRatio: 1,
  lossesPercent: 10,
});

/** A shape in metres as a boundary on the map, at 48 N 9 E. */
const onMap = (shape: PlanePoint[]) => {
  const plane = planeAt([9, 48]);
  const ring = shape.map((point) => toLonLat(plane, point));
  return [[...ring, ring[0]]];
};

const square: PlanePoint[] = [
  [0, 0],
  [100, 0],
  [100, 100],
  [0, 100],
];

describe('figures of a boundary', () => {
  it('measures a hundred-metre square at 48 N to 0.1 %', () => {
    const rings = onMap(square);
    const figures = boundaryFigures(ringsToPlane(planeAt(rings[0][0]), rings));
    expect(figures.areaM2).toBeCloseTo(10_000, 0);
    expect(figures.perimeterM).toBeCloseTo(400, 2);
  });

  it('has a degree of latitude of 111.2 km at 48 N (WGS 84)', () => {
    expect(planeAt([9, 48]).metresPerLatDegree / 1000).toBeCloseTo(111.2, 1);
    expect(planeAt([9, 48]).metresPerLonDegree / 1000).toBeCloseTo(74.63, 1);
  });

  it('takes cut-outs off and knows inside from outside', () => {
    const hole: PlanePoint[] = [
      [40, 40],
      [60, 40],
      [60, 60],
      [40, 60],
    ];
    expect(boundaryFigures([square, hole]).areaM2).toBe(9600);
    expect(isInside([square, hole], [50, 50])).toBe(false);
    expect(isInside([square, hole], [10, 50])).toBe(true);
  });

  it('finds where a boundary crosses itself', () => {
    const bow: PlanePoint[] = [
      [0, 0],
      [100, 100],
      [100, 0],
      [0, 100],
    ];
    expect(selfCrossing([bow])).toEqual([50, 50]);
    expect(selfCrossing([square])).toBeNull();
  });
});

describe('rows over a square, solved by hand', () => {
  const laid = layRows(layout, onMap(square));

  it('lays the rows that keep the margin, 80 modules long', () => {
    // Rows at multiples of 10 m from the first corner; 5 m of panel and margin each side: 10 to 90.
    expect(laid.figures.rowCount).toBe(9);
    expect(laid.rows.every(({ modules }) => modules === 79 || modules === 80)).toBe(true);
  });

  it('counts area, power, posts and ratios by their own denominators', () => {
    const { figures } = laid;
    const modules = laid.rows.reduce((sum, row) => sum + row.modules, 0);
    expect(figures.moduleAreaM2).toBeCloseTo(modules * 4, 9);
    expect(figures.kwp).toBeCloseTo(modules * 4 * 0.2, 9);
    expect(figures.groundCoverRatio).toBeCloseTo(0.4, 12);
    expect(figures.coverageRatio).toBeCloseTo((modules * 4) / figures.fieldAreaM2, 9);
    expect(figures.landLostShare).toBeCloseTo(figures.rowLengthM / figures.fieldAreaM2, 9);
  });

  it('turns with the azimuth and keeps the count', () => {
    expect(layRows({ ...layout, azimuthDeg: 90 }, onMap(square)).figures.rowCount).toBe(9);
  });

  it('parts a row at a notch', () => {
    const notched: PlanePoint[] = [
      [0, 0],
      [100, 0],
      [100, 100],
      [60, 100],
      [60, 40],
      [40, 40],
      [40, 100],
      [0, 100],
    ];
    const middle = layRows({ ...layout, headlandM: 2 }, onMap(notched));
    const parted = middle.rows.filter(({ lengthM }) => lengthM < 40);
    expect(parted.length).toBeGreaterThan(8);
    expect(middle.rows.some(({ lengthM }) => lengthM > 90)).toBe(true);
  });

  it('says why nothing stands on a field that is too narrow', () => {
    const narrow: PlanePoint[] = [
      [0, 0],
      [100, 0],
      [100, 6],
      [0, 6],
    ];
    const none = layRows(layout, onMap(narrow));
    expect(none.figures.rowCount).toBe(0);
    expect(none.empty).toMatch(/too narrow/);
  });
});

describe('machines', () => {
  const combine = {
    name: 'Combine',
    workingWidthM: 6,
    workingHeightM: 4.2,
    foldedWidthM: 3.5,
    foldedHeightM: 4,
  };

  it('lets a combine under panels that are high enough, and folds or stops it otherwise', () => {
    expect(passOf({ ...layout, clearHeightM: 4.7 }, combine)).toMatchObject({
      way: 'working',
      route: 'under',
      freeWidthM: 9,
    });
    // Between the rows 6 m are free: 6 + 2 x 0.5 does not fit, 3.5 + 1 does.
    expect(passOf({ ...layout, clearHeightM: 2 }, combine).way).toBe('folded');
    expect(passOf({ ...layout, clearHeightM: 2, pitchM: 8 }, combine).way).toBe('blocked');
  });

  it('advises the pitch: n x width + 2 x side room + panel', () => {
    expect(pitchForBouts(layout, 9, 2)).toBeCloseTo(18 + 1 + 4, 12);
  });
});
