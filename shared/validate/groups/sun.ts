import { join } from 'node:path';
import { toDegrees } from '../../src/light/angles.js';
import { sunPositionInAir, sunTimes } from '../../src/light/sun.js';
import { ErrorTally, type Group } from '../quantity.js';
import { numberOf, readTable } from '../read-table.js';

const NAME = 'sun';
const POSITIONS = 'physics/sunpos.csv';
const TIMES = 'physics/sunrise.csv';

/** Sun position and sunrise against NREL SPA. */
export const sun: Group = {
  name: NAME,
  files: [POSITIONS, TIMES],
  source: 'NREL SPA, Reda & Andreas 2004, Solar Energy 76:577',
  compare(folder) {
    const azimuth = new ErrorTally(NAME, 'azimuth x sin(zenith)', 'deg', 0.02);
    const high = new ErrorTally(NAME, 'apparent altitude above 10 deg', 'deg', 0.02);
    const low = new ErrorTally(NAME, 'apparent altitude 3-10 deg', 'deg', 0.1);
    for (const row of readTable(join(folder, POSITIONS))) {
      const seen = sunPositionInAir(
        Date.parse(row.time_utc),
        numberOf(row, 'lat'),
        numberOf(row, 'lon'),
        numberOf(row, 'pressure_hPa'),
        numberOf(row, 'temp_C'),
      );
      const zenith = numberOf(row, 'zenith_apparent');
      const turn = ((toDegrees(seen.azimuth) - numberOf(row, 'azimuth') + 540) % 360) - 180;
      azimuth.add(turn * Math.sin((zenith * Math.PI) / 180));
      const off = 90 - zenith - toDegrees(seen.altitude);
      if (zenith < 80) high.add(off);
      else if (zenith < 87) low.add(off);
    }
    const rise = new ErrorTally(NAME, 'sunrise and sunset, latitude below 60', 's', 60);
    for (const row of readTable(join(folder, TIMES))) {
      const latitude = numberOf(row, 'lat');
      if (row.kind !== 'normal' || Math.abs(latitude) >= 60) continue;
      const day = Date.parse(`${row.date_local_solar}T00:00:00Z`);
      const { sunrise, sunset } = sunTimes(day, latitude, numberOf(row, 'lon'));
      rise.add(((sunrise ?? NaN) - Date.parse(row.sunrise_utc)) / 1000);
      rise.add(((sunset ?? NaN) - Date.parse(row.sunset_utc)) / 1000);
    }
    return [azimuth, high, low, rise].map((tally) => tally.judge());
  },
};
