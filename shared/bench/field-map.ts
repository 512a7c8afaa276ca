import { DEG } from '../src/light/angles.js';
import { prepareFieldLight } from '../src/light/field-map/field-light.js';

const WEEKS = 21;
const FIRST_DAY = 63;
const SIDE = 100;
const LATITUDE = 48 * DEG;

/** Suns of the middle day of each week at half-hour steps, by week: azimuth and altitude. */
function weeklySuns(): [number, number][][] {
  return Array.from({ length: WEEKS }, (_, week) => {
    const day = FIRST_DAY + 7 * week;
    // Cooper 1969; good enough to time by.
    const declination = -23.44 * DEG * Math.cos((2 * Math.PI * (day + 10)) / 365);
    return Array.from({ length: 48 }, (_step, step): [number, number] => {
      const hour = (step / 2 + 0.25 - 12) * 15 * DEG;
      const up =
        Math.sin(LATITUDE) * Math.sin(declination) +
        Math.cos(LATITUDE) * Math.cos(declination) * Math.cos(hour);
      const east = Math.sin(hour);
      const north =
        Math.cos(hour) * Math.sin(LATITUDE) - Math.tan(declination) * Math.cos(LATITUDE);
      return [Math.PI + Math.atan2(east, north), Math.asin(up)];
    }).filter(([, altitude]) => altitude > 0.02);
  });
}

/**
 * Light of a season by week at 10,000 places of a hectare with 11 rows of 100 m: sky and beam through
 * black panels, half-hour suns of each week's middle day.
 */
export function seasonOverField(): Float64Array[] {
  const count = SIDE * SIDE;
  const place = (i: number) => (i - (SIDE - 1) / 2) * 1.4;
  const field = prepareFieldLight({
    geometry: {
      pitch: 9.5,
      width: 3.4,
      tilt: 20 * DEG,
      midHeight: 5,
      surfaceAzimuth: Math.PI,
    },
    optics: {
      transmittance: 0,
      frontReflectance: 0,
      rearReflectance: 0,
      albedo: 0.2,
      structureShade: 0.02,
    },
    stretches: Array.from({ length: 11 }, (_, k) => ({ u: (k - 5) * 9.5, from: -50, to: 50 })),
    receiverHeight: 0.5,
    u: Float64Array.from({ length: count }, (_, i) => place(i % SIDE)),
    v: Float64Array.from({ length: count }, (_, i) => place(Math.floor(i / SIDE))),
  });
  const beam = new Float64Array(count);
  return weeklySuns().map((suns) => {
    const week = field.sky.slice();
    for (const [azimuth, altitude] of suns) {
      field.beam(azimuth, altitude, beam);
      const weight = Math.sin(altitude);
      for (let i = 0; i < count; i += 1) week[i] += weight * beam[i];
    }
    return week;
  });
}
