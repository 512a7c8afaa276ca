import type { LonLat } from '@furrowlight/shared/contract/fields';
import { describe, expect, it } from 'vitest';
import { redo, startHistory, step, STEPS, undo } from './history';
import {
  addCorner,
  boundaryOf,
  closeRing,
  dropLastCorner,
  EMPTY,
  insertCorner,
  isComplete,
  moveCorner,
  removeCorner,
  shapeOf,
} from './shape';

const corners: LonLat[] = [
  [13, 52],
  [13.01, 52],
  [13.01, 52.01],
  [13, 52.01],
];
const square = closeRing(corners.reduce(addCorner, EMPTY));

describe('shape', () => {
  it('becomes a closed GeoJSON polygon only when finished', () => {
    const open = corners.slice(0, 2).reduce(addCorner, EMPTY);
    expect(boundaryOf(open)).toBeNull();
    expect(isComplete(closeRing(open))).toBe(false);
    expect(boundaryOf(square)?.coordinates[0]).toEqual([...corners, corners[0]]);
  });

  it('keeps cut-outs through a round trip', () => {
    const hole: LonLat[] = [
      [13.002, 52.002],
      [13.004, 52.002],
      [13.004, 52.004],
    ];
    const holed = closeRing(hole.reduce(addCorner, square));
    const boundary = boundaryOf(holed);
    expect(boundary?.coordinates).toHaveLength(2);
    expect(shapeOf(boundary)).toEqual(holed);
  });

  it('is incomplete while a cut-out is open', () => {
    expect(boundaryOf(addCorner(square, [13.002, 52.002]))).toBeNull();
  });

  it('moves, inserts and removes corners but never below three', () => {
    const moved = moveCorner(square, { ring: 0, corner: 2 }, [13.02, 52.02]);
    expect(moved.rings[0].corners[2]).toEqual([13.02, 52.02]);
    const five = insertCorner(square, { ring: 0, corner: 3 }, [12.99, 52.005]);
    expect(five.rings[0].corners).toHaveLength(5);
    expect(five.rings[0].corners[4]).toEqual([12.99, 52.005]);
    const three = removeCorner(square, { ring: 0, corner: 0 });
    expect(three.rings[0].corners).toHaveLength(3);
    expect(removeCorner(three, { ring: 0, corner: 0 })).toBe(three);
  });

  it('takes drawn corners back one by one', () => {
    const two = corners.slice(0, 2).reduce(addCorner, EMPTY);
    expect(dropLastCorner(two).rings[0].corners).toEqual([corners[0]]);
    expect(dropLastCorner(dropLastCorner(two))).toEqual(EMPTY);
  });
});

describe('history', () => {
  it('goes back and forth at least 50 steps and forgets undone steps on a new one', () => {
    let history = startHistory(0);
    for (let i = 1; i <= 60; i += 1) history = step(history, i);
    for (let i = 0; i < 50; i += 1) history = undo(history);
    expect(history.present).toBe(10);
    expect(redo(history).present).toBe(11);
    const branched = step(history, 99);
    expect(redo(branched)).toBe(branched);
    expect(undo(branched).present).toBe(10);
  });

  it('stays bounded', () => {
    let history = startHistory(0);
    for (let i = 1; i <= 3 * STEPS; i += 1) history = step(history, i);
    expect(history.past).toHaveLength(STEPS);
  });
});
