import { join } from 'node:path';
import { toRadians } from '../../src/light/angles.js';
import { discDirectNormal, erbsDiffuseShare } from '../../src/light/decomposition.js';
import { hayDavies, perez } from '../../src/light/sky.js';
import { airMass, extraterrestrialNormal } from '../../src/light/sun.js';
import { ErrorTally, type Group } from '../quantity.js';
import { numberOf, readTable } from '../read-table.js';

const NAME = 'sky';
const SPLIT = 'physics/decomposition.csv';
const TILTED = 'physics/transposition.csv';
const MASS = 'physics/airmass.csv';
const ABOVE = 'physics/extraterrestrial.csv';
const LIMIT = 1e-3;

/** Relative error, or absolute over a floor where the reference is near zero. */
const relative = (ours: number, reference: number, floor: number) =>
  (ours - reference) / Math.max(Math.abs(reference), floor);

/** Beam and diffuse split, tilted-plane diffuse, air mass, sun distance. */
export const sky: Group = {
  name: NAME,
  files: [SPLIT, TILTED, MASS, ABOVE],
  source:
    'Erbs 1982, Maxwell 1987, Hay & Davies 1980, Perez 1990, Kasten & Young 1989, Spencer 1971',
  compare(folder) {
    const erbs = new ErrorTally(NAME, 'Erbs diffuse', 'relative', LIMIT);
    const disc = new ErrorTally(NAME, 'DISC direct normal', 'relative', LIMIT);
    for (const row of readTable(join(folder, SPLIT))) {
      const ghi = numberOf(row, 'ghi');
      const share = erbsDiffuseShare(Math.min(numberOf(row, 'erbs_kt'), 1));
      erbs.add(relative(ghi * share, numberOf(row, 'erbs_dhi'), 1));
      const direct = discDirectNormal(
        ghi,
        numberOf(row, 'zenith'),
        numberOf(row, 'doy'),
        numberOf(row, 'pressure_Pa') / 100,
      );
      disc.add(relative(direct, numberOf(row, 'disc_dni'), 1));
    }
    const hd = new ErrorTally(NAME, 'Hay-Davies on a tilted plane', 'relative', LIMIT);
    const pz = new ErrorTally(NAME, 'Perez on a tilted plane', 'relative', LIMIT);
    for (const row of readTable(join(folder, TILTED))) {
      const [dhi, dni, above, cosIncidence, mass] = [
        'dhi',
        'dni',
        'dni_extra',
        'cos_aoi',
        'airmass_rel_ky',
      ].map((name) => numberOf(row, name));
      const zenith = toRadians(numberOf(row, 'zenith'));
      const tilt = toRadians(numberOf(row, 'surface_tilt'));
      const a = hayDavies(dhi, dni, above, cosIncidence, Math.cos(zenith), Math.cos(tilt));
      hd.add(relative(a.circumsolar + a.isotropic, numberOf(row, 'sky_haydavies'), 1));
      const b = perez(dhi, dni, above, mass, cosIncidence, zenith, tilt);
      pz.add(relative(b.circumsolar + b.isotropic + b.horizon, numberOf(row, 'sky_perez1990'), 1));
    }
    const mass = new ErrorTally(NAME, 'air mass', 'relative', LIMIT);
    for (const row of readTable(join(folder, MASS))) {
      const zenith = toRadians(numberOf(row, 'zenith_apparent'));
      mass.add(relative(airMass(zenith), numberOf(row, 'am_kastenyoung1989'), 1));
    }
    const above = new ErrorTally(NAME, 'light above the air (Spencer)', 'relative', LIMIT);
    for (const row of readTable(join(folder, ABOVE))) {
      const reference = numberOf(row, 'dni_extra_spencer_1361');
      above.add(relative(extraterrestrialNormal(numberOf(row, 'doy')), reference, 1));
    }
    return [erbs, disc, hd, pz, mass, above].map((tally) => tally.judge());
  },
};
