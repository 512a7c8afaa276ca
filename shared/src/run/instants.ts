import { InputError } from '../errors.js';
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

/** Most light of an hour without sun, W m-2: global limit of BSRN's physically possible values. */
const BRIGHTEST_TWILIGHT = 100;

const misplaced = (hour: number, global: number): InputError =>
  new InputError(
    'weather.ghi',
    `Hour ${hour} of the weather year has more light (${global} W m-2) than so low a sun can bring: check the clock and the coordinates.`,
  );

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

/** Append the suns of one hour that stand above the horizon; returns the sum of their sines. */
function placeSuns(weather: HourlyYear, ground: Ground, hour: number, out: DaySuns): number {
  const perHour = Math.round(1 / out.stepHours);
  const start = yearStart(weather) + hour * HOUR_MS;
  let sines = 0;
  for (let step = 0; step < perHour; step += 1) {
    const instant = start + ((step + 0.5) / perHour) * HOUR_MS;
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
  return sines;
}

/** Append the light of an hour without sun: diffuse, with a sun at the horizon for its colour. */
function addTwilight(hour: number, global: number, out: DaySuns): void {
  if (global > BRIGHTEST_TWILIGHT) throw misplaced(hour, global);
  const i = out.count;
  out.hour[i] = hour;
  out.altitude[i] = LOWEST_SUN;
  out.planeAltitude[i] = 0;
  out.planeAzimuth[i] = 0;
  out.dni[i] = 0;
  out.dhi[i] = global / out.stepHours;
  out.count += 1;
}

/**
 * Spread a day's hourly light over suns a few minutes apart.
 *
 * Within each hour the beam on the horizontal (global less diffuse) follows the sine of the sun's
 * altitude and the diffuse is even over the time the sun is up, so that the hour's global and
 * diffuse energy is kept. Beam beyond what can come through the air at a low sun is given to the
 * diffuse. Light of an hour without sun (twilight) comes as diffuse at the horizon.
 *
 * @param day 0-based day of the weather year
 * @param out filled
 * @throws InputError naming weather.ghi where the light does not fit the sun's place at all
 */
export function fillDaySuns(weather: HourlyYear, ground: Ground, day: number, out: DaySuns): void {
  out.count = 0;
  out.distance = distanceFactor(Math.min(day + 1, 365));
  const brightest = SOLAR_CONSTANT * out.distance;
  for (let hour = day * 24; hour < day * 24 + 24; hour += 1) {
    const global = weather.ghi[hour];
    if (global <= 0) continue;
    const first = out.count;
    const sines = placeSuns(weather, ground, hour, out);
    const up = out.count - first;
    if (up === 0) {
      addTwilight(hour, global, out);
      continue;
    }
    const diffuse = Math.min(weather.dhi[hour], global);
    const dni = (global - diffuse) / (out.stepHours * sines);
    const kept = Math.min(dni, brightest);
    for (let i = first; i < out.count; i += 1) {
      out.dni[i] = kept;
      out.dhi[i] = diffuse / (out.stepHours * up) + (dni - kept) * Math.sin(out.altitude[i]);
      if (out.dhi[i] > brightest) throw misplaced(hour, global);
    }
  }
}
