import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { toRadians } from '../../src/light/angles.js';
import { clearSkySpectrum, WAVELENGTHS_NM } from '../../src/light/atmosphere.js';
import { integrateSpectrum, micromolPerJoule } from '../../src/light/spectrum.js';
import { ErrorTally, type Group } from '../quantity.js';

const NAME = 'clear-sky spectra';
const FILE = 'physics/spectrl2.json';

interface Bands {
  uv_300_400: number;
  par_400_700: number;
  nir_700_1100: number;
  gt_1100_4000: number;
  ppfd_umol: number;
}

interface Case {
  zenith_deg: number;
  pressure_hPa: number;
  precipitable_water_cm: number;
  ozone_atm_cm: number;
  aod500: number;
  albedo: number;
  distance_factor: number;
  bands_dni: Bands;
  bands_dhi: Bands;
}

const over = (values: ArrayLike<number>, from: number, to: number) =>
  integrateSpectrum(WAVELENGTHS_NM, values, from, to);

/** Bird-Riordan spectra, direct and diffuse, by band. */
export const clearSky: Group = {
  name: NAME,
  files: [FILE],
  source: 'Bird & Riordan 1986, J. Climate Appl. Meteorol. 25:87, computed independently',
  compare(folder) {
    const { cases } = JSON.parse(readFileSync(join(folder, FILE), 'utf8')) as { cases: Case[] };
    const par = new ErrorTally(NAME, 'PAR and its photons', '%', 2);
    const other = new ErrorTally(NAME, 'other bands', '%', 8);
    for (const item of cases) {
      const spectrum = clearSkySpectrum(
        toRadians(item.zenith_deg),
        {
          pressureHpa: item.pressure_hPa,
          waterCm: item.precipitable_water_cm,
          ozoneAtmCm: item.ozone_atm_cm,
          aerosol500: item.aod500,
          albedo: item.albedo,
        },
        item.distance_factor,
      );
      for (const [values, bands] of [
        [spectrum.direct, item.bands_dni],
        [spectrum.diffuse, item.bands_dhi],
      ] as const) {
        const percent = (ours: number, reference: number) => 100 * (ours / reference - 1);
        par.add(percent(over(values, 400, 700), bands.par_400_700));
        const photons = integrateSpectrum(WAVELENGTHS_NM, values, 400, 700, micromolPerJoule);
        par.add(percent(photons, bands.ppfd_umol));
        other.add(percent(over(values, 300, 400), bands.uv_300_400));
        other.add(percent(over(values, 700, 1100), bands.nir_700_1100));
        other.add(percent(over(values, 1100, 4000), bands.gt_1100_4000));
      }
    }
    return [par.judge(), other.judge()];
  },
};
