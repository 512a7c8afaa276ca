import { join } from 'node:path';
import { toRadians } from '../../src/light/angles.js';
import type { AlongRowGaps } from '../../src/light/rows/along-gaps.js';
import { prepareEndlessRows } from '../../src/light/rows/endless.js';
import { prepareGappedReceivers } from '../../src/light/rows/gapped-receivers.js';
import { ErrorTally, type Group } from '../quantity.js';
import {
  acrossPositions,
  frontSide,
  readCases,
  rowGeometry,
  VARIANTS,
  type RaytracedCase,
} from './raytraced-case.js';

const NAME = 'raytraced gaps';
const FILE = 'raytraced/gaps.json';

function gapsOf({ id, geometry }: RaytracedCase): AlongRowGaps {
  const { module_length: moduleLength, gap_length: gapLength, checkerboard } = geometry;
  if (moduleLength === undefined || gapLength === undefined || checkerboard === undefined) {
    throw new SyntaxError(`${id} has no gaps`);
  }
  return { moduleLength, gapLength, checkerboard };
}

/** Along the row from a module's beginning, towards the engine's side. */
function alongPositions(reference: RaytracedCase, gaps: AlongRowGaps): number[] {
  const { along } = reference.receivers;
  if (typeof along === 'number') throw new SyntaxError(`${reference.id} has one along only`);
  return along.map((value) => (frontSide(reference) > 0 ? value : gaps.moduleLength - value));
}

/** Values of single receivers averaged over those at the same place across. */
function meanAlong(values: number[], across: number): Float64Array {
  const mean = new Float64Array(across);
  values.forEach((value, i) => (mean[i % across] += (value * across) / values.length));
  return mean;
}

function tallies() {
  return {
    black: new ErrorTally(NAME, 'sky light, black modules', 'of open sky', 0.005),
    trans: new ErrorTally(NAME, 'sky light, transmitting modules', 'of open sky', 0.005),
    state: new ErrorTally(NAME, 'point sun, modules crossed', 'modules', 1e-9),
    meanSky: new ErrorTally(NAME, 'sky light, mean along the row', 'of open sky', 0.005),
    meanRefl: new ErrorTally(NAME, 'sky light, reflecting, mean along', 'of open sky', 0.005),
    reflected: new ErrorTally(NAME, 'beam, reflected part, mean along', '(15 % + 4 se)', 1),
  };
}

type Tallies = ReturnType<typeof tallies>;

function compareReceivers(tally: Tallies, reference: RaytracedCase): void {
  const gaps = gapsOf(reference);
  const across = acrossPositions(reference);
  const along = alongPositions(reference, gaps);
  const receiverHeight = reference.geometry.receiver_height;
  const geometry = rowGeometry(reference);
  for (const variant of ['black', 'trans'] as const) {
    const receivers = prepareGappedReceivers({
      geometry,
      optics: VARIANTS[variant],
      gaps,
      receiverHeight,
    });
    reference.sky[variant].ref.forEach((want, i) =>
      tally[variant].add(receivers.sky(across[i], along[i]) - want),
    );
    for (const { sun, panels_crossed: wanted, near_edge: nearEdge } of reference.beam) {
      const azimuth = toRadians(sun.azimuth);
      const altitude = toRadians(sun.elevation);
      wanted.forEach((want, i) => {
        if (nearEdge.includes(i)) return;
        tally.state.add(receivers.crossed(azimuth, altitude, across[i], along[i]) - want);
      });
    }
  }
}

/** The product's endless rows with gaps: means along the row. */
function compareMeans(tally: Tallies, reference: RaytracedCase, count: number): void {
  const gaps = gapsOf(reference);
  for (const variant of ['black', 'trans', 'refl', 'refl_alb0'] as const) {
    const rows = prepareEndlessRows({
      geometry: rowGeometry(reference),
      optics: VARIANTS[variant],
      gaps,
      receiverHeight: reference.geometry.receiver_height,
      positions: acrossPositions(reference).slice(0, count),
    });
    const into = variant === 'black' || variant === 'trans' ? tally.meanSky : tally.meanRefl;
    meanAlong(reference.sky[variant].ref, count).forEach((want, i) => into.add(rows.sky[i] - want));
    for (const sun of reference.beam) {
      const part = variant === 'refl' ? sun.reflected : sun.reflected_alb0;
      if (variant === 'black' || variant === 'trans' || !part) continue;
      const out = new Float64Array(count);
      rows.addBeamReflected(
        rows.tangent(toRadians(sun.sun.azimuth), toRadians(sun.sun.elevation)),
        1,
        out,
      );
      meanAlong(part.ref, count).forEach((want, i) =>
        tally.reflected.add((out[i] - want) / (0.15 * want + 4 * part.se)),
      );
    }
  }
}

/** Rows with gaps and checkerboards against independent ray tracing. */
export const raytracedGaps: Group = {
  name: NAME,
  files: [FILE],
  source: 'Radiance 6.1a ray tracing and an independent path tracer',
  compare(folder) {
    const tally = tallies();
    for (const reference of readCases(join(folder, FILE))) {
      compareReceivers(tally, reference);
      const count = new Set(reference.receivers.s).size;
      compareMeans(tally, reference, count);
    }
    return Object.values(tally).map((quantity) => quantity.judge());
  },
};
