import type { LonLat } from '@furrowlight/shared/contract/fields';
import { describe, expect, it } from 'vitest';
import { crossingOf, endOfSide, figuresOf, shifted, sideBetween } from './measure';
import { addCorner, closeRing, EMPTY } from './shape';

const start: LonLat = [13.4, 52.5];
const walk = (...sides: [lengthM: number, bearingDeg: number][]) =>
  sides.reduce<LonLat[]>(
    (corners, [lengthM, bearingDeg]) => [
      ...corners,
      endOfSide(corners[corners.length - 1], { lengthM, bearingDeg }),
    ],
    [start],
  );

describe('measuring a shape', () => {
  it('finds the area and perimeter of a rectangle walked by length and bearing', () => {
    const shape = walk([200, 90], [150, 0], [200, 270]).reduce(addCorner, EMPTY);
    const figures = figuresOf(shape);
    // 200 m x 150 m; positions are kept to a centimetre
    expect(figures?.areaM2).toBeCloseTo(30_000, -1);
    expect(figures?.perimeterM).toBeCloseTo(700, 1);
  });

  it('gives back the side that was walked', () => {
    const side = sideBetween(start, endOfSide(start, { lengthM: 123.4, bearingDeg: 217 }));
    expect(side.lengthM).toBeCloseTo(123.4, 1);
    expect(side.bearingDeg).toBeCloseTo(217, 1);
    expect(sideBetween(start, shifted(start, 0, 10)).bearingDeg).toBeCloseTo(0, 6);
  });

  it('marks the place where a bow-tie crosses, but lets an unfinished line be', () => {
    const bow: LonLat[] = [
      start,
      shifted(start, 100, 100),
      shifted(start, 100, 0),
      shifted(start, 0, 100),
    ];
    const open = bow.reduce(addCorner, EMPTY);
    expect(crossingOf(open)).toBeNull();
    const crossing = crossingOf(closeRing(open));
    const middle = shifted(start, 50, 50);
    expect(crossing?.[0]).toBeCloseTo(middle[0], 5);
    expect(crossing?.[1]).toBeCloseTo(middle[1], 5);
  });
});
