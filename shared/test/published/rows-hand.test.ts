import { describe, expect, it } from 'vitest';
import { DEG } from '../../src/light/angles.js';
import {
  prepareEndlessRows,
  type EndlessRows,
  type EndlessRowsInput,
} from '../../src/light/rows/endless.js';
import { planeFactor, shadedShare, type RowGeometry } from '../../src/light/rows/geometry.js';
import type { PanelLight } from '../../src/light/rows/panel-light.js';
import type { Balance } from '../../src/light/rows/reflections.js';

const BLACK = {
  transmittance: 0,
  frontReflectance: 0,
  rearReflectance: 0,
  albedo: 0,
  structureShade: 0,
};

/** Middles of strips across a pitch. */
const across = (pitch: number, count: number) =>
  Float64Array.from({ length: count }, (_, i) => ((i + 0.5) / count) * pitch);

const geometry = (
  pitch: number,
  width: number,
  tiltDeg: number,
  midHeight: number,
): RowGeometry => ({ pitch, width, tilt: tiltDeg * DEG, midHeight, surfaceAzimuth: Math.PI });

const rowsOf = (of: RowGeometry, more: Partial<EndlessRowsInput> = {}): EndlessRows =>
  prepareEndlessRows({
    geometry: of,
    optics: BLACK,
    receiverHeight: 0,
    positions: across(of.pitch, 400),
    ...more,
  });

const mean = (values: Float64Array) => values.reduce((sum, v) => sum + v, 0) / values.length;

// Mean view of the sky on the ground between endless fences of height h at pitch p by crossed
// strings (Hottel & Sarofim 1967): (sqrt(p^2 + h^2) - h) / p. Solved by hand.
describe('sky between endless vertical fences', () => {
  it.each([
    [2, 10, (Math.sqrt(104) - 2) / 10],
    [3, 10, 0.744],
    [1, 10, 0.905],
    [2, 20, 0.905],
  ])('h %d m, pitch %d m: mean %f', (h, p, want) => {
    const rows = rowsOf(geometry(p, h, 90, h / 2));
    expect(mean(rows.sky)).toBeCloseTo(want, 4);
  });

  it('is 0.9285 in the middle of the bay and 0.4903 at the fence for 2 m at 10 m', () => {
    const rows = rowsOf(geometry(10, 2, 90, 1), { positions: Float64Array.of(5, 1e-9) });
    // At mid-bay both fences stand at 5 m: 5 / sqrt(29). At the fence one side is gone and the
    // other fence stands at 10 m: half of 10 / sqrt(104).
    expect(rows.sky[0]).toBeCloseTo(5 / Math.sqrt(29), 5);
    expect(rows.sky[1]).toBeCloseTo(10 / Math.sqrt(104) / 2, 5);
    expect(rows.sky[0]).toBeCloseTo(0.9285, 4);
    expect(rows.sky[1]).toBeCloseTo(0.4903, 4);
  });
});

describe('sky under overhead rows', () => {
  it.each([2, 5.6])(
    'flat slats of 3.4 m at 9.5 m leave 1 - w/p at mid-height %f m',
    (midHeight) => {
      expect(mean(rowsOf(geometry(9.5, 3.4, 0, midHeight)).sky)).toBeCloseTo(1 - 3.4 / 9.5, 4);
    },
  );

  // Row spacings like those of the trials of Marrou et al. 2013 (Montpellier) and of Heggelbach;
  // numbers by crossed strings, own computation apart from this code.
  it.each([
    ['Montpellier-like, 1.6 m', geometry(1.6, 0.8, 25, 4), 0.528],
    ['Montpellier-like, 3.2 m', geometry(3.2, 0.8, 25, 4), 0.756],
    ['Heggelbach-like', geometry(9.5, 3.4, 20, 5.6), 0.651],
  ])('%s', (_name, of, want) => {
    expect(Math.abs(mean(rowsOf(of).sky) - want)).toBeLessThan(0.001);
  });

  it('ranges over the Heggelbach-like bay from 0.611 to 0.690', () => {
    const { sky } = rowsOf(geometry(9.5, 3.4, 20, 5.6));
    expect(Math.min(...sky)).toBeCloseTo(0.611, 2);
    expect(Math.max(...sky)).toBeCloseTo(0.69, 2);
  });
});

// Shaded share of the ground: min(1, w |cos b + sin b / tan(profile angle)| / p). Solved by hand.
describe('shaded share of the ground', () => {
  const cot = (profileDeg: number) => 1 / Math.tan(profileDeg * DEG);

  it('is 0.2894 for 2 m panels at 25 deg and 10 m pitch under a profile angle of 38 deg', () => {
    expect(shadedShare(geometry(10, 2, 25, 2), cot(38))).toBeCloseTo(0.2894, 4);
  });

  it('is h/p for a fence at 45 deg and 1 from atan(h/p) down', () => {
    const fence = geometry(10, 2, 90, 1);
    expect(shadedShare(fence, cot(45))).toBeCloseTo(0.2, 10);
    expect(shadedShare(fence, cot(11.30993))).toBeCloseTo(1, 5);
    expect(shadedShare(fence, cot(5))).toBe(1);
  });

  it('is w/p for flat slats whatever the sun', () => {
    for (const tangent of [-6, -0.3, 0, 1, 20]) {
      expect(shadedShare(geometry(9.5, 3.4, 0, 4), tangent)).toBeCloseTo(0.3579, 4);
    }
  });

  it('is 0 for a north-south fence at solar noon', () => {
    const fence = { ...geometry(10, 2, 90, 1), surfaceAzimuth: Math.PI / 2 };
    const rows = rowsOf(fence);
    const noon = rows.tangent(Math.PI, 55 * DEG);
    expect(shadedShare(fence, noon)).toBeCloseTo(0, 12);
    const out = new Float64Array(400);
    rows.beam(noon, 55 * DEG, out);
    expect(mean(out)).toBeGreaterThan(0.997);
  });

  it('is what the receivers see of a point sun', () => {
    const of = geometry(10, 2, 25, 2);
    const rows = rowsOf(of, { discSun: false, positions: across(10, 10_000) });
    const out = new Float64Array(10_000);
    rows.beam(cot(38), 38 * DEG, out);
    expect(1 - mean(out)).toBeCloseTo(0.2894, 3);
  });
});

describe('panels', () => {
  it('sees the sky with (1 + cos b)/2 where rows stand far apart (Liu & Jordan 1963)', () => {
    const rows = rowsOf(geometry(900, 2, 30, 2));
    expect(rows.skyPanel.front).toBeCloseTo((1 + Math.cos(30 * DEG)) / 2, 3);
    expect(rows.skyPanel.rear).toBeCloseTo((1 - Math.cos(30 * DEG)) / 2, 3);
  });

  it('gets albedo x (1 -/+ cos b)/2 from lit ground where rows stand far apart', () => {
    // High up, so that the panel's own shade on the ground fills little of its view.
    const rows = rowsOf(geometry(900, 2, 30, 200), { optics: { ...BLACK, albedo: 0.25 } });
    expect(rows.skyPanel.frontReflected).toBeCloseTo((0.25 * (1 - Math.cos(30 * DEG))) / 2, 3);
    expect(rows.skyPanel.rearReflected).toBeCloseTo((0.25 * (1 + Math.cos(30 * DEG))) / 2, 2);
  });

  it('is lit down to 1 / shadow depth when rows shade each other', () => {
    // Fence 2 m at 10 m, profile angle 5 deg: shadows 2 cot 5 = 22.86 m long, upper 43.7 % is lit.
    const rows = rowsOf(geometry(10, 2, 90, 1));
    const tangent = 1 / Math.tan(5 * DEG);
    expect(rows.litShare(tangent)).toBeCloseTo(0.4374, 4);
    const panel: PanelLight = { front: 0, rear: 0, frontReflected: 0, rearReflected: 0 };
    rows.beamPanel(tangent, panel);
    expect(panel.front).toBeCloseTo(10 / 2, 10);
    expect(panel.rear).toBe(0);
  });
});

describe('light through panels', () => {
  it('is transmittance to the power of the panels crossed', () => {
    const of = geometry(10, 2, 90, 1);
    const optics = { ...BLACK, transmittance: 0.3 };
    const rows = rowsOf(of, { optics, discSun: false, positions: Float64Array.of(5) });
    const out = new Float64Array(1);
    // Fence feet at 10 and 20 m from the receiver's row are 5 and 15 m away: heights 5/T and 15/T.
    for (const [tangent, crossed] of [
      [2, 0],
      [3, 1],
      [8, 2],
      [13, 3],
    ]) {
      rows.beam(tangent, Math.atan(1 / tangent), out);
      expect(out[0]).toBeCloseTo(0.3 ** crossed, 12);
    }
  });
});

describe('reflection between flat sheets', () => {
  it('sums the bounces between ground and an unbroken ceiling', () => {
    // Closed flat rows of transmittance 0.4, rear reflectance 0.5 over albedo 0.6: the ground keeps
    // 0.4 / (1 - 0.5 x 0.6) of the light above, of which 0.4 comes straight and the rest by bounces.
    const of = geometry(3, 3, 0, 2);
    const optics = {
      transmittance: 0.4,
      frontReflectance: 0,
      rearReflectance: 0.5,
      albedo: 0.6,
      structureShade: 0,
    };
    const rows = rowsOf(of, { optics, positions: across(3, 12) });
    const want = 0.4 / (1 - 0.3);
    expect(mean(rows.sky)).toBeCloseTo(want, 3);
    const balance: Balance = { ground: 0, panel: 0, escaped: 0, structure: 0 };
    rows.beamBalance(0.7, balance);
    expect(balance.ground).toBeCloseTo(want * 0.4, 6);
    // Thrown back by the ground and let through by the ceiling.
    expect(balance.escaped).toBeCloseTo(want * 0.6 * 0.4, 6);
  });

  it('has a plane factor of cos b + sin b tan', () => {
    expect(planeFactor(geometry(10, 2, 60, 2), 2)).toBeCloseTo(0.5 + Math.sqrt(3), 12);
  });
});
