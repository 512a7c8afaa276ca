import { describe, expect, it } from 'vitest';
import { InputError } from '../../src/errors.js';
import { DEG } from '../../src/light/angles.js';
import { prepareFieldLight, type FieldLightInput } from '../../src/light/field-map/field-light.js';
import { toRowFrame, type RowStretch } from '../../src/light/field-map/finite-rows.js';
import { prepareEndlessRows } from '../../src/light/rows/endless.js';

const geometry = {
  pitch: 6,
  width: 2.4,
  tilt: 30 * DEG,
  midHeight: 2.5,
  surfaceAzimuth: 170 * DEG,
};
const optics = {
  transmittance: 0.2,
  frontReflectance: 0.1,
  rearReflectance: 0.15,
  albedo: 0.25,
  structureShade: 0,
};

const rowsOf = (count: number, length: number): RowStretch[] =>
  Array.from({ length: count }, (_, k) => ({
    u: (k - (count - 1) / 2) * geometry.pitch,
    from: -length / 2,
    to: length / 2,
  }));

const places = [-2.7, -1.5, -0.3, 0.9, 2.1];

const input = (change: Partial<FieldLightInput> = {}): FieldLightInput => ({
  geometry,
  optics,
  stretches: rowsOf(5, 40),
  receiverHeight: 0.4,
  u: Float64Array.from(places),
  v: new Float64Array(places.length),
  ...change,
});

describe('a field of rows with ends', () => {
  it('tends to endless rows when rows grow long and many', () => {
    const field = prepareFieldLight(input({ stretches: rowsOf(41, 800) }));
    const endless = prepareEndlessRows({
      geometry,
      optics,
      receiverHeight: 0.4,
      positions: Float64Array.from(places),
      discSun: false,
    });
    endless.sky.forEach((want, i) => expect(Math.abs(field.sky[i] - want)).toBeLessThan(0.004));
    for (const [azimuth, altitude] of [
      [150, 50],
      [240, 25],
      [20, 12],
    ]) {
      const beam = new Float64Array(places.length);
      const want = new Float64Array(places.length);
      field.beam(azimuth * DEG, altitude * DEG, beam);
      endless.beam(endless.tangent(azimuth * DEG, altitude * DEG), altitude * DEG, want);
      want.forEach((value, i) => expect(beam[i]).toBeCloseTo(value, 12));
      const part = new Float64Array(places.length);
      const wantPart = new Float64Array(places.length);
      field.beamReflected(azimuth * DEG, altitude * DEG, part);
      endless.addBeamReflected(endless.tangent(azimuth * DEG, altitude * DEG), 1, wantPart);
      wantPart.forEach((value, i) => expect(Math.abs(part[i] - value)).toBeLessThan(0.1 * value));
    }
  });

  it('is open field without rows, and far away from them', () => {
    const none = prepareFieldLight(input({ stretches: [] }));
    const far = prepareFieldLight(input({ v: Float64Array.from(places, () => 3000) }));
    for (const field of [none, far]) {
      const beam = new Float64Array(places.length);
      field.beam(2, 0.5, beam);
      field.sky.forEach((value) => expect(value).toBeCloseTo(1, 4));
      beam.forEach((value) => expect(value).toBe(1));
    }
  });

  it('gets lighter towards the ends of the rows', () => {
    const v = Float64Array.of(0, 15, 19, 22, 30);
    const { sky } = prepareFieldLight(input({ u: new Float64Array(5), v }));
    for (let i = 1; i < 5; i += 1) expect(sky[i]).toBeGreaterThan(sky[i - 1]);
  });

  it('does not mind a row cut into touching stretches', () => {
    const whole = prepareFieldLight(input());
    const cut = rowsOf(5, 40).flatMap(({ u, from, to }) => [
      { u, from, to: 3 },
      { u, from: 3, to },
    ]);
    const parts = prepareFieldLight(input({ stretches: cut }));
    const a = new Float64Array(places.length);
    const b = new Float64Array(places.length);
    whole.beam(1, 0.4, a);
    parts.beam(1, 0.4, b);
    a.forEach((value, i) => expect(b[i]).toBe(value));
    whole.sky.forEach((value, i) => expect(Math.abs(parts.sky[i] - value)).toBeLessThan(5e-4));
  });

  it('mirrors its light when field and sun are mirrored along the rows', () => {
    const v = Float64Array.of(0, 5, 12, 19, 24);
    const one = prepareFieldLight(input({ v }));
    const two = prepareFieldLight(input({ v: v.map((x) => -x) }));
    const a = new Float64Array(5);
    const b = new Float64Array(5);
    one.beamReflected(geometry.surfaceAzimuth + 0.7, 0.5, a);
    two.beamReflected(geometry.surfaceAzimuth - 0.7, 0.5, b);
    a.forEach((value, i) => expect(Math.abs(b[i] - value)).toBeLessThan(0.05 * value + 1e-5));
    one.sky.forEach((value, i) => expect(two.sky[i]).toBeCloseTo(value, 3));
  });

  it('names rows that end before they begin and places that do not pair', () => {
    const field = (change: Partial<FieldLightInput>) => () => prepareFieldLight(input(change));
    expect(field({ stretches: [{ u: 0, from: 2, to: 2 }] })).toThrow(InputError);
    expect(field({ v: new Float64Array(2) })).toThrow(/v must be/);
    expect(field({ receiverHeight: -1 })).toThrow(/receiverHeight/);
  });
});

describe('the frame of the rows', () => {
  it('has u the way the front looks and v 90 degrees to its left', () => {
    const [u, v] = toRowFrame(180 * DEG, 3, -4);
    expect(u).toBeCloseTo(4, 12);
    expect(v).toBeCloseTo(3, 12);
  });
});
