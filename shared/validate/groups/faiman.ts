import { join } from 'node:path';
import { faimanTemperature } from '../../src/power/module.js';
import { ErrorTally, type Group } from '../quantity.js';
import { numberOf, readTable } from '../read-table.js';

const NAME = 'faiman';
const FILE = 'physics/faiman.csv';
const LIMIT = 1e-3;

/** Module temperature against the published formula with two pairs of coefficients. */
export const faiman: Group = {
  name: NAME,
  files: [FILE],
  source: 'Faiman 2008, Prog. Photovolt. 16:307',
  compare(folder) {
    const open = new ErrorTally(NAME, 'module temperature, open rack', 'relative', LIMIT);
    const other = new ErrorTally(NAME, 'module temperature, U0 30, U1 5', 'relative', LIMIT);
    for (const row of readTable(join(folder, FILE))) {
      const air = numberOf(row, 'temp_air');
      const poa = numberOf(row, 'poa');
      const wind = numberOf(row, 'wind');
      // Relative to the warming over the air: degrees Celsius have no zero to be relative to.
      const compare = (tally: ErrorTally, warm: number, want: number) => {
        const warming = want - air;
        tally.add(warming === 0 ? warm - want : (warm - want) / warming);
      };
      compare(open, faimanTemperature(poa, air, wind), numberOf(row, 'faiman_cell'));
      compare(other, faimanTemperature(poa, air, wind, 30, 5), numberOf(row, 'faiman_u0_30_u1_5'));
    }
    return [open.judge(), other.judge()];
  },
};
