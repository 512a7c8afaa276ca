import { join } from 'node:path';
import { toRadians } from '../../src/light/angles.js';
import { prepareEndlessRows, type EndlessRows } from '../../src/light/rows/endless.js';
import { ErrorTally, type Group, type Quantity } from '../quantity.js';
import {
  acrossPositions,
  readCases,
  rowGeometry,
  standardError,
  VARIANTS,
  type RaytracedCase,
  type SunReference,
} from './raytraced-case.js';

const NAME = 'raytraced endless';
const FILE = 'raytraced/infinite.json';

/** A reflected part may differ by this share of itself, plus four standard errors. */
const PART_SHARE = 0.05;

/** The sky's errors are guessed from 16 runs each, value by value: six of them leave room for a thousand. */
const SKY_ERRORS = 6;

function rowsOf(
  reference: RaytracedCase,
  variant: keyof typeof VARIANTS,
  discSun: boolean,
): EndlessRows {
  return prepareEndlessRows({
    geometry: rowGeometry(reference),
    optics: VARIANTS[variant],
    receiverHeight: reference.geometry.receiver_height,
    positions: acrossPositions(reference),
    discSun,
  });
}

function compareSky(cases: RaytracedCase[]): Quantity[] {
  const black = new ErrorTally(NAME, 'sky light, black panels', 'of open sky', 0.002);
  const trans = new ErrorTally(NAME, 'sky light, transmitting panels', 'of open sky', 0.002);
  const refl = new ErrorTally(
    NAME,
    'sky light, reflecting panels and ground',
    'of open sky',
    0.004,
  );
  const part = new ErrorTally(NAME, 'sky light, reflected part alone', '(5 % + 6 se)', 1);
  const tallies = { black, trans, refl, refl_alb0: refl };
  for (const reference of cases) {
    for (const variant of ['black', 'trans', 'refl', 'refl_alb0'] as const) {
      const rows = rowsOf(reference, variant, true);
      const { ref } = reference.sky[variant];
      ref.forEach((value, i) => {
        tallies[variant].add(rows.sky[i] - value);
        if (variant === 'black' || variant === 'trans') return;
        const want = value - reference.sky.black.ref[i];
        const room =
          PART_SHARE * Math.abs(want) + SKY_ERRORS * standardError(reference.sky[variant], i);
        part.add((rows.skyReflected[i] - want) / room);
      });
    }
  }
  return [black, trans, refl, part].map((tally) => tally.judge());
}

interface BeamTallies {
  state: ErrorTally;
  disc: ErrorTally;
  reflected: ErrorTally;
}

function compareSun(
  tallies: BeamTallies,
  rows: Record<'pointBlack' | 'pointTrans' | 'discBlack' | 'discTrans', EndlessRows>,
  reference: SunReference,
): void {
  const altitude = toRadians(reference.sun.elevation);
  const tangent = rows.pointBlack.tangent(toRadians(reference.sun.azimuth), altitude);
  const count = reference.panels_crossed.length;
  const share = (of: EndlessRows) => {
    const out = new Float64Array(count);
    of.beam(tangent, altitude, out);
    return out;
  };
  const pointBlack = share(rows.pointBlack);
  const pointTrans = share(rows.pointTrans);
  const discBlack = share(rows.discBlack);
  const discTrans = share(rows.discTrans);
  reference.panels_crossed.forEach((crossed, i) => {
    tallies.disc.add(discBlack[i] - reference.disc_black[i]);
    tallies.disc.add(discTrans[i] - reference.disc_trans[i]);
    if (reference.near_edge.includes(i)) return;
    tallies.state.add(pointBlack[i] - (crossed === 0 ? 1 : 0));
    tallies.state.add(pointTrans[i] - 0.3 ** crossed);
  });
}

function compareReflected(
  tally: ErrorTally,
  rows: EndlessRows,
  sun: SunReference,
  reference: { ref: number[]; se: number },
): void {
  const tangent = rows.tangent(toRadians(sun.sun.azimuth), toRadians(sun.sun.elevation));
  const out = new Float64Array(reference.ref.length);
  rows.addBeamReflected(tangent, 1, out);
  reference.ref.forEach((value, i) =>
    tally.add((out[i] - value) / (PART_SHARE * value + 4 * reference.se)),
  );
}

function compareBeam(cases: RaytracedCase[]): Quantity[] {
  const tallies: BeamTallies = {
    state: new ErrorTally(NAME, 'point sun, lit or shaded', 'of beam', 1e-9),
    disc: new ErrorTally(NAME, 'disc sun', 'of beam', 0.004),
    reflected: new ErrorTally(NAME, 'beam, reflected part', '(5 % + 4 se)', 1),
  };
  for (const reference of cases) {
    const rows = {
      pointBlack: rowsOf(reference, 'black', false),
      pointTrans: rowsOf(reference, 'trans', false),
      discBlack: rowsOf(reference, 'black', true),
      discTrans: rowsOf(reference, 'trans', true),
    };
    const refl = rowsOf(reference, 'refl', true);
    const withoutAlbedo = rowsOf(reference, 'refl_alb0', true);
    for (const sun of reference.beam) {
      compareSun(tallies, rows, sun);
      compareReflected(tallies.reflected, refl, sun, sun.reflected);
      if (sun.reflected_alb0)
        compareReflected(tallies.reflected, withoutAlbedo, sun, sun.reflected_alb0);
    }
  }
  return [tallies.state, tallies.disc, tallies.reflected].map((tally) => tally.judge());
}

/** Endless rows against independent ray tracing (Radiance and an own path tracer agree there). */
export const raytracedEndless: Group = {
  name: NAME,
  files: [FILE],
  source: 'Radiance 6.1a ray tracing, exact profile sums and an independent path tracer',
  compare(folder) {
    const cases = readCases(join(folder, FILE));
    return [...compareSky(cases), ...compareBeam(cases)];
  },
};
