import { describe, expect, it } from 'vitest';
import { gridLines, gridStep } from './grid-lines';

describe('metre grid', () => {
  it('keeps squares between 28 and 70 px in the 1-2-5 series', () => {
    for (const scale of [0.05, 0.13, 0.3, 1, 4.7, 38, 611]) {
      const step = gridStep(scale);
      expect(step / scale).toBeGreaterThanOrEqual(28);
      expect(step / scale).toBeLessThanOrEqual(70.001);
      expect([1, 2, 5, 10]).toContain(Math.round(step / 10 ** Math.floor(Math.log10(step) + 1e-9)));
    }
  });

  it('spaces meridians by the cosine of latitude and stays put when panned', () => {
    const view = { west: 13.4, east: 13.41, south: 59.996, north: 60.004 };
    const first = gridLines(view, 1);
    const lonStep = first.lons[1].at - first.lons[0].at;
    const latStep = first.lats[1].at - first.lats[0].at;
    // cos 60 degrees = 1/2: a metre spans twice the longitude that it spans of latitude
    expect(lonStep / latStep).toBeCloseTo(2, 6);
    expect(latStep * 111_195.08).toBeCloseTo(first.step, 3);
    const panned = gridLines({ ...view, west: 13.402, east: 13.412 }, 1);
    const shared = panned.lons.filter((line) => line.at < 13.41).map((line) => line.at.toFixed(9));
    expect(first.lons.map((line) => line.at.toFixed(9))).toEqual(expect.arrayContaining(shared));
  });
});
