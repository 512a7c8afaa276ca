import { join } from 'node:path';
import { toRadians } from '../../src/light/angles.js';
import { prepareFieldLight, type FieldLight } from '../../src/light/field-map/field-light.js';
import { ErrorTally, type Group } from '../quantity.js';
import {
  acrossPositions,
  frontSide,
  readCases,
  rowGeometry,
  standardError,
  VARIANTS,
  type RaytracedCase,
} from './raytraced-case.js';

const NAME = 'raytraced finite';
const FILE = 'raytraced/finite.json';

/** A reflected part may differ by this share of itself, plus four standard errors. */
const PART_SHARE = 0.15;

function fieldOf(reference: RaytracedCase, variant: keyof typeof VARIANTS): FieldLight {
  const { n_rows: rows, row_length: length, pitch } = reference.geometry;
  if (typeof rows !== 'number' || typeof length !== 'number') {
    throw new SyntaxError(`${reference.id} has endless rows`);
  }
  const side = frontSide(reference);
  const { along } = reference.receivers;
  if (typeof along === 'number') throw new SyntaxError(`${reference.id} has one along only`);
  return prepareFieldLight({
    geometry: rowGeometry(reference),
    optics: VARIANTS[variant],
    stretches: Array.from({ length: rows }, (_, k) => ({
      u: (k - (rows - 1) / 2) * pitch,
      from: -length / 2,
      to: length / 2,
    })),
    receiverHeight: reference.geometry.receiver_height,
    u: acrossPositions(reference),
    v: Float64Array.from(along, (value) => value * side),
  });
}

function tallies() {
  return {
    black: new ErrorTally(NAME, 'sky light, black panels', 'of open sky', 0.005),
    trans: new ErrorTally(NAME, 'sky light, transmitting panels', 'of open sky', 0.005),
    refl: new ErrorTally(NAME, 'sky light, reflecting panels and ground', 'of open sky', 0.005),
    part: new ErrorTally(NAME, 'sky light, reflected part alone', '(15 % + 4 se)', 1),
    state: new ErrorTally(NAME, 'point sun, panels crossed', 'panels', 1e-9),
    beam: new ErrorTally(NAME, 'point sun, through panels', 'of beam', 1e-9),
    reflected: new ErrorTally(NAME, 'beam, reflected part', '(15 % + 4 se)', 1),
  };
}

type Tallies = ReturnType<typeof tallies>;

function compareBeams(tally: Tallies, reference: RaytracedCase, trans: FieldLight): void {
  for (const { sun, panels_crossed: wanted, near_edge: nearEdge } of reference.beam) {
    const azimuth = toRadians(sun.azimuth);
    const altitude = toRadians(sun.elevation);
    const shares = new Float64Array(wanted.length);
    trans.beam(azimuth, altitude, shares);
    wanted.forEach((want, i) => {
      if (nearEdge.includes(i)) return;
      tally.state.add(trans.crossed(azimuth, altitude, i) - want);
      tally.beam.add(shares[i] - 0.3 ** want);
    });
  }
}

function compareReflecting(
  tally: Tallies,
  reference: RaytracedCase,
  variant: 'refl' | 'refl_alb0',
): void {
  const field = fieldOf(reference, variant);
  const sky = reference.sky[variant];
  sky.ref.forEach((value, i) => {
    tally.refl.add(field.sky[i] - value);
    const want = value - reference.sky.black.ref[i];
    const noise = standardError(sky, i) + standardError(reference.sky.black, i);
    tally.part.add((field.skyReflected[i] - want) / (PART_SHARE * Math.abs(want) + 4 * noise));
  });
  for (const sun of reference.beam) {
    const part = variant === 'refl' ? sun.reflected : sun.reflected_alb0;
    if (!part) continue;
    const out = new Float64Array(part.ref.length);
    field.beamReflected(toRadians(sun.sun.azimuth), toRadians(sun.sun.elevation), out);
    part.ref.forEach((want, i) =>
      tally.reflected.add((out[i] - want) / (PART_SHARE * want + 4 * part.se)),
    );
  }
}

/** Fields of rows with ends against independent ray tracing. */
export const raytracedFinite: Group = {
  name: NAME,
  files: [FILE],
  source: 'Radiance 6.1a ray tracing and an independent path tracer',
  compare(folder) {
    const tally = tallies();
    for (const reference of readCases(join(folder, FILE))) {
      const black = fieldOf(reference, 'black');
      const trans = fieldOf(reference, 'trans');
      reference.sky.black.ref.forEach((want, i) => tally.black.add(black.sky[i] - want));
      reference.sky.trans.ref.forEach((want, i) => tally.trans.add(trans.sky[i] - want));
      compareBeams(tally, reference, trans);
      compareReflecting(tally, reference, 'refl');
      compareReflecting(tally, reference, 'refl_alb0');
    }
    return Object.values(tally).map((quantity) => quantity.judge());
  },
};
