import { describe, expect, it } from 'vitest';
import { aLayout } from '../testing/scenario-factory';
import {
  croppedStretches,
  curvePath,
  frameOf,
  shadowBody,
  SLICE,
  sliceShares,
  stripsOf,
  sunSpot,
  xOf,
  yOf,
} from './row-slice-geometry';

const layout = aLayout({
  pitchM: 10,
  collectorWidthM: 4,
  tiltDeg: 0,
  clearHeightM: 3,
  stripWidthM: 1,
});

/** A flat panel 4 m wide at 3 m; the sun stands 45 degrees on the front side. */
const slice = {
  sunAzimuthDeg: 180,
  sunAltitudeDeg: 45,
  profileAngleDeg: 45,
  tiltDeg: 0,
  edges: [
    { u: -2, z: 3 },
    { u: 2, z: 3 },
  ] as [{ u: number; z: number }, { u: number; z: number }],
  shadows: [{ from: -5, to: -1 }],
  positionsM: [-3.75, -1.25, 1.25, 3.75],
  ppfd: [200, 400, 1000, 1000],
  openPpfd: 1000,
};

describe('frame of the row slice', () => {
  it('holds the same scale up and across, and its bay in the middle', () => {
    const frame = frameOf(layout);
    expect(xOf(frame, 5)).toBeCloseTo(SLICE.width / 2, 6);
    expect(xOf(frame, 6) - xOf(frame, 5)).toBeCloseTo(yOf(frame, 0) - yOf(frame, 1), 6);
    expect(frame.rows).toContain(0);
    expect(frame.rows).toContain(10);
  });

  it('keeps the highest panel edge in sight, also of a tracker on end', () => {
    const tracker = aLayout({
      kind: 'single-axis-tracker',
      pitchM: 9,
      collectorWidthM: 5,
      clearHeightM: 2,
      tracker: { maxAngleDeg: 90, programme: 'true', cropFirst: [] },
    });
    expect(yOf(frameOf(tracker), 7)).toBeGreaterThan(0);
  });

  it('shows at least one whole pitch of very wide rows', () => {
    const frame = frameOf(aLayout({ pitchM: 40 }));
    expect(frame.rightM - frame.leftM).toBeGreaterThan(40);
  });
});

describe('what is drawn', () => {
  const frame = frameOf(layout);

  it('throws the shade away from the sun: 45 degrees move it by the height above the canopy', () => {
    const body = shadowBody(frame, slice, 0, 1) ?? '';
    const corners = body.split(' ').map((pair) => pair.split(',').map(Number));
    expect(corners[0][0]).toBeCloseTo(xOf(frame, -2), 0);
    expect(corners[3][0]).toBeCloseTo(xOf(frame, -4), 0);
    expect(corners[3][1]).toBeCloseTo(yOf(frame, 1), 0);
    expect(shadowBody(frame, { ...slice, profileAngleDeg: null }, 0, 1)).toBeNull();
  });

  it('stands the sun on its own side, and nowhere at night', () => {
    expect(sunSpot(slice)?.x).toBeGreaterThan(SLICE.width / 2);
    expect(sunSpot({ ...slice, profileAngleDeg: -45 })?.x).toBeLessThan(SLICE.width / 2);
    expect(sunSpot({ ...slice, profileAngleDeg: null })).toBeNull();
  });

  it('covers the window with strips that carry their share of open field', () => {
    const strips = stripsOf(frame, layout, slice);
    expect(strips[0].x).toBeLessThanOrEqual(0);
    const last = strips[strips.length - 1];
    expect(last.x + last.width).toBeGreaterThanOrEqual(SLICE.width);
    expect(strips.find(({ u }) => u === -3.75)?.share).toBeCloseTo(0.2, 12);
    expect(curvePath(strips)).not.toContain('NaN');
  });

  it('leaves the uncropped strip bare', () => {
    const stretch = croppedStretches(frame, layout).find(({ x }) => x > xOf(frame, 0));
    expect(stretch?.x).toBeCloseTo(xOf(frame, 0.5), 6);
    expect(stretch?.width).toBeCloseTo(9 * frame.perMetre, 6);
  });

  it('reads mean and darkest as shares, and nothing at night', () => {
    expect(sliceShares(slice)).toEqual({ mean: 0.65, darkest: 0.2 });
    expect(sliceShares({ ...slice, openPpfd: 0 })).toBeNull();
  });
});
