import { getPosition } from 'suncalc';
import { requireWithin } from '../errors.js';
import { DEG, toRadians } from './angles.js';

/** Total solar irradiance at one astronomical unit, W m-2 (IAU 2015 resolution B3). */
export const SOLAR_CONSTANT = 1361;

const DAY_MS = 86_400_000;

/** Where the sun stands. Radians; azimuth clockwise from north; altitude apparent (refracted). */
export interface SunPosition {
  azimuth: number;
  altitude: number;
}

/**
 * Sun's place in the sky.
 *
 * @param epochMs instant, milliseconds since 1970-01-01 UTC
 * @param latitudeDeg degrees, north positive, -90 to 90
 * @param longitudeDeg degrees, east positive, -180 to 180
 * @returns azimuth and apparent altitude for a standard atmosphere, radians
 * @throws InputError naming latitude or longitude
 *
 * Source: suncalc 2 (Meeus, Astronomical Algorithms, ch. 16, 22, 25). Within 0.01 deg of NREL SPA
 * for 2000-2040 above 10 deg altitude; refraction there is for 1010 hPa and 10 deg C.
 */
export function sunPosition(
  epochMs: number,
  latitudeDeg: number,
  longitudeDeg: number,
): SunPosition {
  requireWithin('latitude', latitudeDeg, -90, 90, 'degrees');
  requireWithin('longitude', longitudeDeg, -180, 180, 'degrees');
  const { azimuth, altitude } = getPosition(new Date(epochMs), latitudeDeg, longitudeDeg);
  return { azimuth: azimuth * DEG, altitude: altitude * DEG };
}

/** The refraction suncalc adds (Meeus 16.4), radians, for a geometric altitude in radians. */
function builtInRefraction(geometric: number): number {
  const h = Math.max(geometric, 0);
  return 0.0002967 / Math.tan(h + 0.00312536 / (h + 0.08901179));
}

/** Altitude without refraction, radians, from suncalc's apparent one. */
function geometricAltitude(apparent: number): number {
  let geometric = apparent;
  for (let i = 0; i < 6; i += 1) geometric = apparent - builtInRefraction(geometric);
  return geometric;
}

/** Horizontal parallax of the sun at mean distance, radians (8.794 arc seconds). */
const PARALLAX = (8.794 / 3600) * DEG;

/**
 * Sun position for a stated air pressure and temperature.
 *
 * @param epochMs instant, milliseconds UTC
 * @param latitudeDeg degrees
 * @param longitudeDeg degrees
 * @param pressureHpa 300-1100 hPa
 * @param temperatureC -60 to 60 deg C
 * @returns azimuth, geometric (topocentric) and apparent altitude, radians
 *
 * Refraction after Bennett as written in NREL SPA (Reda & Andreas 2004, eq. 42), applied where the
 * upper limb can be seen.
 */
export function sunPositionInAir(
  epochMs: number,
  latitudeDeg: number,
  longitudeDeg: number,
  pressureHpa: number,
  temperatureC: number,
): SunPosition & { geometricAltitude: number } {
  requireWithin('pressureHpa', pressureHpa, 300, 1100, 'hPa');
  requireWithin('temperatureC', temperatureC, -60, 60, 'deg C');
  const seen = sunPosition(epochMs, latitudeDeg, longitudeDeg);
  const centred = geometricAltitude(seen.altitude);
  const geometric = centred - PARALLAX * Math.cos(centred);
  const degrees = geometric / DEG;
  const visible = degrees >= -(0.26667 + 0.5667);
  const bend = visible
    ? ((pressureHpa / 1010) * (283 / (273 + temperatureC)) * 1.02) /
      (60 * Math.tan(toRadians(degrees + 10.3 / (degrees + 5.11))))
    : 0;
  return {
    azimuth: seen.azimuth,
    altitude: geometric + bend * DEG,
    geometricAltitude: geometric,
  };
}

/** Centre of the sun at rise and set: 34' refraction and 16' semidiameter, degrees. */
const RISE_SET_ALTITUDE = -0.8333 * DEG;

/** Sunrise, upper transit and sunset, milliseconds UTC; rise and set are null in polar day or night. */
export interface SunTimes {
  sunrise: number | null;
  transit: number;
  sunset: number | null;
}

function geometricAt(epochMs: number, latitudeDeg: number, longitudeDeg: number): number {
  const centred = geometricAltitude(sunPosition(epochMs, latitudeDeg, longitudeDeg).altitude);
  return centred - PARALLAX * Math.cos(centred);
}

/** Instant between `low` and `high` at which `f` changes sign, to 1 ms; f(low) and f(high) differ in sign. */
function crossing(f: (t: number) => number, low: number, high: number): number {
  const rising = f(high) > f(low);
  let a = low;
  let b = high;
  while (b - a > 1) {
    const middle = (a + b) / 2;
    if (f(middle) > 0 === rising) b = middle;
    else a = middle;
  }
  return (a + b) / 2;
}

/**
 * Sunrise, transit and sunset around local mean solar noon of a UTC calendar day.
 *
 * @param dayStartMs 00:00 UTC of the calendar date, ms
 * @returns instants in ms UTC; within 60 s of NREL SPA below latitude 60
 */
export function sunTimes(dayStartMs: number, latitudeDeg: number, longitudeDeg: number): SunTimes {
  const meanNoon = dayStartMs + DAY_MS / 2 - (longitudeDeg / 360) * DAY_MS;
  const hourAngle = (t: number) => {
    const { azimuth } = sunPosition(t, latitudeDeg, longitudeDeg);
    // East of the meridian negative; near the zenith the azimuth turns fast, its sine does not lie.
    return -Math.sin(azimuth);
  };
  const transit = crossing(hourAngle, meanNoon - 1_800_000, meanNoon + 1_800_000);
  const above = (t: number) => geometricAt(t, latitudeDeg, longitudeDeg) - RISE_SET_ALTITUDE;
  const half = DAY_MS / 2;
  if (above(transit) < 0) return { sunrise: null, transit, sunset: null };
  const sunrise = above(transit - half) < 0 ? crossing(above, transit - half, transit) : null;
  const sunset = above(transit + half) < 0 ? crossing(above, transit, transit + half) : null;
  return { sunrise, transit, sunset };
}

/**
 * Square of mean over actual sun-earth distance.
 *
 * @param dayOfYear 1-366
 * Source: Spencer 1971, Search 2(5):172.
 */
export function distanceFactor(dayOfYear: number): number {
  requireWithin('dayOfYear', dayOfYear, 1, 366);
  const b = (2 * Math.PI * (dayOfYear - 1)) / 365;
  return (
    1.00011 +
    0.034221 * Math.cos(b) +
    0.00128 * Math.sin(b) +
    0.000719 * Math.cos(2 * b) +
    0.000077 * Math.sin(2 * b)
  );
}

/** Extraterrestrial irradiance on a plane facing the sun, W m-2, by day of year (1-366). */
export function extraterrestrialNormal(dayOfYear: number): number {
  return SOLAR_CONSTANT * distanceFactor(dayOfYear);
}

/**
 * Relative optical air mass.
 *
 * @param apparentZenith radians, below pi/2 + 0.01
 * Source: Kasten & Young 1989, Appl. Opt. 28:4735.
 */
export function airMass(apparentZenith: number): number {
  const degrees = apparentZenith / DEG;
  return 1 / (Math.cos(apparentZenith) + 0.50572 * Math.pow(96.07995 - degrees, -1.6364));
}
