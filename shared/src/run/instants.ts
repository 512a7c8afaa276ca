import { wrapPi } from '../light/angles.js';
import { sunOverSlope, type Slope } from '../light/slope.js';
import { distanceFactor, SOLAR_CONSTANT, sunPosition } from '../light/sun.js';
import type { HourlyYear } from '../light/weather-year.js';

/** Where and on what ground the sun is followed. */
export interface Ground extends Slope {
  latitude: number;
  longitude: number;
}

/** The suns of one day with the light each brings. Arrays are reused from day to day. */
export interface DaySuns {
  count: number;
  /** Hour of the year each belongs to. */
  hour: Int32Array;
  /** Above the horizon: for air mass and spectrum. */
  altitude: Float64Array;
  /** Over the field's own plane. */
  planeAltitude: Float64Array;
  planeAzimuth: Float64Array;
  /** Direct normal and diffuse horizontal, W m-2. */
  dni: Float64Array;
  dhi: Float64Array;
  /** Square of mean over actual sun distance. */
  distance: number;
  stepHours: number;
}

const HOUR_MS = 3_600_000;
/** A sun below this is taken as diffuse only: half its disc is under the horizon. */
const LOWEST_SUN = 0.005;

export function emptyDaySuns(stepMinutes: number): DaySuns {
  const size = (24 * 60) / stepMinutes;
  const column = () => new Float64Array(size);
  return {
    count: 0,
    hour: new Int32Array(size),
    altitude: column(),
    planeAltitude: column(),
    planeAzimuth: column(),
    dni: column(),
    dhi: column(),
    distance: 1,
    stepHours: stepMinutes / 60,
  };
}

/** First instant of the weather year in UTC, ms. */
export const yearStart = (weather: HourlyYear): number =>
  Date.UTC(weather.year, 0, 1) - weather.utcOffsetHours * HOUR_MS;

/**
 * Spread a day's hourly light over suns a few minutes apart.
 *
 * Within each hour the beam on the horizontal follows the sine of the sun's altitude and the
 * diffuse is even over the time the sun is up, so that the hour's global and diffuse energy is kept.
 * Beam beyond what can come through the air at a low sun is given to the diffuse. Light of an hour
 * without sun (twilight) comes as diffuse at the horizon.
 *
 * @param day 0-based day of the weather year
 * @param out filled
 */
export function fillDaySuns(weather: HourlyYear, ground: Ground, day: number, out: DaySuns): void {
  const perHour = Math.round(1 / out.stepHours);
  const start = yearStart(weather);
  out.count = 0;
  out.distance = distanceFactor(Math.min(day + 1, 365));
  const brightest = SOLAR_CONSTANT * out.distance;
  for (let h = 0; h < 24; h += 1) {
    const hour = day * 24 + h;
    const global = weather.ghi[hour];
    if (global <= 0) continue;
    const first = out.count;
    let sines = 0;
    for (let step = 0; step < perHour; step += 1) {
      const instant = start + hour * HOUR_MS + ((step + 0.5) / perHour) * HOUR_MS;
      const sun = sunPosition(instant, ground.latitude, ground.longitude);
      if (sun.altitude <= LOWEST_SUN) continue;
      const plane = sunOverSlope(sun, ground);
      const i = out.count;
      out.hour[i] = hour;
      out.altitude[i] = sun.altitude;
      out.planeAltitude[i] = plane.altitude;
      out.planeAzimuth[i] = wrapPi(plane.azimuth);
      sines += Math.sin(sun.altitude);
      out.count += 1;
    }
    const diffuse = Math.min(weather.dhi[hour], global);
    const up = out.count - first;
    if (up === 0) {
      const i = out.count;
      out.hour[i] = hour;
      out.altitude[i] = LOWEST_SUN;
      out.planeAltitude[i] = 0;
      out.planeAzimuth[i] = 0;
      out.dni[i] = 0;
      out.dhi[i] = global * perHour;
      out.count += 1;
      continue;
    }
    const dni = ((global - diffuse) * perHour) / sines;
    for (let i = first; i < out.count; i += 1) {
      const kept = Math.min(dni, brightest);
      out.dni[i] = kept;
      out.dhi[i] = (diffuse * perHour) / up + (dni - kept) * Math.sin(out.altitude[i]);
    }
  }
}
