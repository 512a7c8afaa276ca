import { join } from 'node:path';
import { toRadians } from '../../src/light/angles.js';
import { clearSkySpectrum, WAVELENGTHS_NM } from '../../src/light/atmosphere.js';
import { hayDavies } from '../../src/light/sky.js';
import { blackbodySun, integrateSpectrum, micromolPerJoule } from '../../src/light/spectrum.js';
import { SOLAR_CORRECTION } from '../../src/light/atmosphere.js';
import { ErrorTally, type Group } from '../quantity.js';
import { numberOf, readTable } from '../read-table.js';

const NAME = 'AM1.5';
const FILE = 'physics/g173.csv';

/** Light sandy soil of the standard, rising with wavelength (nm, reflectance); from memory. */
const SOIL: [number, number][] = [
  [300, 0.06],
  [400, 0.1],
  [500, 0.15],
  [600, 0.2],
  [700, 0.25],
  [1100, 0.33],
  [4000, 0.35],
];

function soil(nm: number): number {
  const next = SOIL.findIndex(([edge]) => edge >= nm);
  if (next <= 0) return SOIL[next === 0 ? 0 : SOIL.length - 1][1];
  const [a, low] = SOIL[next - 1];
  const [b, high] = SOIL[next];
  return low + ((high - low) * (nm - a)) / (b - a);
}

const ZENITH = toRadians(48.19);
const TILT = toRadians(37);
const INCIDENCE = toRadians(11.19);

/** The standard's own conditions: direct normal, and global on 37 deg. */
function modelled(): { direct: Float64Array; global: Float64Array } {
  const { direct, diffuse } = clearSkySpectrum(ZENITH, {
    pressureHpa: 1013.25,
    waterCm: 1.42,
    ozoneAtmCm: 0.34,
    aerosol500: 0.084,
    albedo: soil,
  });
  const global = direct.map((beam, i) => {
    const above = blackbodySun(WAVELENGTHS_NM[i]) * SOLAR_CORRECTION[i];
    const sky = hayDavies(
      diffuse[i],
      beam,
      above,
      Math.cos(INCIDENCE),
      Math.cos(ZENITH),
      Math.cos(TILT),
    );
    const onGround = beam * Math.cos(ZENITH) + diffuse[i];
    const ground = (onGround * soil(WAVELENGTHS_NM[i]) * (1 - Math.cos(TILT))) / 2;
    return beam * Math.cos(INCIDENCE) + sky.circumsolar + sky.isotropic + ground;
  });
  return { direct, global };
}

interface Bands {
  uv: number;
  par: number;
  nir: number;
  ir: number;
  photons: number;
  share: number;
}

function bandsOf(wavelengths: ArrayLike<number>, values: ArrayLike<number>): Bands {
  const over = (from: number, to: number) => integrateSpectrum(wavelengths, values, from, to);
  const par = over(400, 700);
  return {
    uv: over(300, 400),
    par,
    nir: over(700, 1100),
    ir: over(1100, 4000),
    photons: integrateSpectrum(wavelengths, values, 400, 700, micromolPerJoule),
    share: par / over(300, 4000),
  };
}

/** Clear-sky spectrum against the AM1.5 reference spectra. */
export const g173: Group = {
  name: NAME,
  files: [FILE],
  source: 'ASTM G173-03',
  compare(folder) {
    const rows = readTable(join(folder, FILE));
    const column = (name: string) => rows.map((row) => numberOf(row, name));
    const [wavelengthName] = Object.keys(rows[0]);
    const wavelengths = column(wavelengthName);
    const ours = modelled();
    const tallies: ErrorTally[] = [];
    for (const [plane, spectrum, limit] of [
      ['direct', ours.direct, 3],
      ['global', ours.global, 4],
    ] as const) {
      const reference = bandsOf(wavelengths, column(plane));
      const bands = bandsOf(WAVELENGTHS_NM, spectrum);
      const percent = (band: keyof Bands) => 100 * (bands[band] / reference[band] - 1);
      const tally = (name: string, most: number, values: number[], unit = '%') => {
        const next = new ErrorTally(NAME, `${plane}: ${name}`, unit, most);
        values.forEach((value) => next.add(value));
        tallies.push(next);
      };
      tally('PAR, near infrared, PAR photons', limit, [
        percent('par'),
        percent('nir'),
        percent('photons'),
      ]);
      tally('ultraviolet, above 1100 nm', 8, [percent('uv'), percent('ir')]);
      tally('PAR share', 0.015, [bands.share - reference.share], 'share');
    }
    return tallies.map((next) => next.judge());
  },
};
