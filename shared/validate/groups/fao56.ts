import { join } from 'node:path';
import { toRadians } from '../../src/light/angles.js';
import {
  clearSkyDaily,
  daylightHours,
  extraterrestrialDaily,
  netLongwave,
  netRadiation,
  netShortwave,
  orbit,
  pressureAt,
  psychrometric,
  radiationFromSunshine,
  referenceEvapotranspiration,
  saturationPressure,
  saturationSlope,
  sunsetAngle,
  vapourPressure,
  windAt2m,
  type DayWeather,
} from '../../src/crops/evapotranspiration.js';
import { ErrorTally, type Group } from '../quantity.js';
import { numberOf, readTable } from '../read-table.js';

const NAME = 'fao56';
const EXAMPLES = 'physics/fao56.csv';
const RA_TABLE = 'physics/fao56_annex2_ra.csv';

const BANGKOK: DayWeather = {
  latitudeDeg: 13 + 44 / 60,
  elevationM: 2,
  dayOfYear: 105,
  maxC: 34.8,
  minC: 25.6,
  vapourKpa: 2.85,
  wind2m: 2,
  solarMj: 22.65,
};

const UCCLE: DayWeather = {
  latitudeDeg: 50.8,
  elevationM: 100,
  dayOfYear: 187,
  maxC: 21.5,
  minC: 12.3,
  vapourKpa: vapourPressure(21.5, 12.3, 84, 63),
  wind2m: windAt2m(10 / 3.6, 10),
  solarMj: 22.07,
};

const LYON: DayWeather = {
  latitudeDeg: 45 + 43 / 60,
  elevationM: 200,
  dayOfYear: 196,
  maxC: 26.6,
  minC: 14.8,
  vapourKpa: null,
  wind2m: 2,
  solarMj: 22.3,
};

const RIO = { latitudeDeg: -22.9, day: 135 };

const meanSaturation = ({ maxC, minC }: DayWeather) =>
  (saturationPressure(maxC) + saturationPressure(minC)) / 2;
const raOf = ({ latitudeDeg, dayOfYear }: DayWeather) =>
  extraterrestrialDaily(latitudeDeg, dayOfYear);
const daylightOf = ({ latitudeDeg, dayOfYear }: DayWeather) =>
  daylightHours(latitudeDeg, dayOfYear);
const clearOf = (day: DayWeather) => clearSkyDaily(raOf(day), day.elevationM);
const longwaveOf = (day: DayWeather) =>
  netLongwave(day.maxC, day.minC, day.vapourKpa ?? 0, day.solarMj / clearOf(day));

/** Numbers of one worked day, as the examples name them. */
const dayNumbers = (example: number, day: DayWeather, sunshine: number, soilHeat: number) => ({
  [`${example} delta`]: () => saturationSlope((day.maxC + day.minC) / 2),
  [`${example} gamma`]: () => psychrometric(pressureAt(day.elevationM)),
  [`${example} es`]: () => meanSaturation(day),
  [`${example} Ra`]: () => raOf(day),
  [`${example} N`]: () => daylightOf(day),
  [`${example} Rs`]: () => radiationFromSunshine(raOf(day), sunshine, daylightOf(day)),
  [`${example} Rso`]: () => clearOf(day),
  [`${example} Rns`]: () => netShortwave(day.solarMj),
  [`${example} Rnl`]: () => longwaveOf(day),
  [`${example} Rn`]: () => netRadiation(day),
  [`${example} ETo`]: () => referenceEvapotranspiration(day, soilHeat),
});

/** The engine's answer to each worked example of whole days, by example number and quantity. */
const ANSWERS: Record<string, () => number> = {
  '2 P': () => pressureAt(1800),
  '2 gamma': () => psychrometric(pressureAt(1800)),
  '3 es': () => (saturationPressure(24.5) + saturationPressure(15)) / 2,
  '3 e0(Tmax)': () => saturationPressure(24.5),
  '3 e0(Tmin)': () => saturationPressure(15),
  '5 ea': () => vapourPressure(25, 18, 82, 54),
  '8 dr': () => orbit(246).distance,
  '8 declination': () => orbit(246).declination,
  '8 omega_s': () => sunsetAngle(toRadians(-20), orbit(246).declination),
  '8 Ra': () => extraterrestrialDaily(-20, 246),
  '9 N': () => daylightHours(-20, 246),
  '10 Ra': () => extraterrestrialDaily(RIO.latitudeDeg, RIO.day),
  '10 N': () => daylightHours(RIO.latitudeDeg, RIO.day),
  '10 Rs': () =>
    radiationFromSunshine(
      extraterrestrialDaily(RIO.latitudeDeg, RIO.day),
      220 / 31,
      daylightHours(RIO.latitudeDeg, RIO.day),
    ),
  '11 Rso': () => clearSkyDaily(extraterrestrialDaily(RIO.latitudeDeg, RIO.day), 0),
  '11 Rnl': () => netLongwave(25.1, 19.1, 2.1, 14.5 / 18.8),
  '12 Rns': () => netShortwave(14.5),
  '12 Rn': () => netShortwave(14.5) - netLongwave(25.1, 19.1, 2.1, 14.5 / 18.8),
  '14 u2': () => windAt2m(3.2, 10),
  '15 Ra': () => extraterrestrialDaily(45 + 43 / 60, 196),
  ...dayNumbers(17, BANGKOK, 8.5, 0.14),
  '17 delta': () => saturationSlope(30.2),
  ...dayNumbers(18, UCCLE, 9.25, 0),
  '18 u2': () => windAt2m(10 / 3.6, 10),
  '18 ea': () => vapourPressure(21.5, 12.3, 84, 63),
  '20 ea from Tmin': () => saturationPressure(14.8),
  '20 ETo (missing humidity/wind/radiation)': () => referenceEvapotranspiration(LYON),
};

const PAPER = 'Allen, Pereira, Raes & Smith 1998, FAO Irrigation and Drainage Paper 56';

/** Whole-day worked examples of FAO paper 56. */
export const fao56: Group = {
  name: NAME,
  files: [EXAMPLES],
  source: PAPER,
  compare(folder) {
    const worked = new ErrorTally(NAME, 'worked examples, whole days', 'relative', 0.01);
    for (const row of readTable(join(folder, EXAMPLES))) {
      const answer = ANSWERS[`${row.example} ${row.quantity}`];
      if (!answer) continue;
      const published = numberOf(row, 'published');
      worked.add((answer() - published) / published);
    }
    return [worked.judge()];
  },
};

/** Extraterrestrial radiation of FAO paper 56; its own group, since a folder may hold it alone. */
export const fao56Radiation: Group = {
  name: `${NAME} annex 2`,
  files: [RA_TABLE],
  source: `${PAPER}, table 2.6`,
  compare(folder) {
    const ra = new ErrorTally(`${NAME} annex 2`, 'Ra table', 'MJ m-2 d-1', 0.15);
    for (const row of readTable(join(folder, RA_TABLE))) {
      if (row.status !== 'ok') continue;
      const got = extraterrestrialDaily(numberOf(row, 'lat'), numberOf(row, 'J'));
      ra.add(got - numberOf(row, 'Ra_published'));
    }
    return [ra.judge()];
  },
};
