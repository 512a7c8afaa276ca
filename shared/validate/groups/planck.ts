import { join } from 'node:path';
import { blackbodyShareBelow } from '../../src/light/spectrum.js';
import { ErrorTally, type Group } from '../quantity.js';
import { numberOf, readTable } from '../read-table.js';

const NAME = 'blackbody';
const FILE = 'physics/planck_table.csv';

/** Blackbody fractions in energy and photons. */
export const planck: Group = {
  name: NAME,
  files: [FILE],
  source: 'series of Siegel & Howell and Chang & Rhee 1984, checked by quadrature',
  compare(folder) {
    const energy = new ErrorTally(NAME, 'energy below lambda T', 'share', 1e-6);
    const photons = new ErrorTally(NAME, 'photons below lambda T', 'share', 1e-6);
    for (const row of readTable(join(folder, FILE))) {
      const product = numberOf(row, 'lambdaT_um_K');
      energy.add(blackbodyShareBelow(product, 'energy') - numberOf(row, 'F_energy'));
      photons.add(blackbodyShareBelow(product, 'photons') - numberOf(row, 'F_photon'));
    }
    return [energy.judge(), photons.judge()];
  },
};
