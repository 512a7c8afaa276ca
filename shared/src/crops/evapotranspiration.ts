import { requireWithin } from '../errors.js';

// FAO Irrigation and Drainage Paper 56 (Allen, Pereira, Raes & Smith 1998). Equation numbers are its own.

const SOLAR_CONSTANT_MJ = 0.082;
const STEFAN_BOLTZMANN_MJ = 4.903e-9;

/** Atmospheric pressure, kPa, at an elevation in m (eq. 7). */
export const pressureAt = (elevationM: number): number =>
  101.3 * Math.pow((293 - 0.0065 * elevationM) / 293, 5.26);

/** Psychrometric constant, kPa per K (eq. 8). */
export const psychrometric = (pressureKpa: number): number => 0.000665 * pressureKpa;

/** Saturation vapour pressure, kPa, at deg C (eq. 11). */
export const saturationPressure = (celsius: number): number =>
  0.6108 * Math.exp((17.27 * celsius) / (celsius + 237.3));

/** Slope of the saturation curve, kPa per K (eq. 13). */
export const saturationSlope = (celsius: number): number =>
  (4098 * saturationPressure(celsius)) / (celsius + 237.3) ** 2;

/**
 * Actual vapour pressure from a day's extremes, kPa (eq. 17).
 *
 * @param humidMax largest relative humidity, %, taken at the lowest temperature
 * @param humidMin smallest relative humidity, %, taken at the highest temperature
 * @throws InputError naming the humidity out of range
 */
export function vapourPressure(
  maxC: number,
  minC: number,
  humidMax: number,
  humidMin: number,
): number {
  requireWithin('humidMax', humidMax, 0, 100, '%');
  requireWithin('humidMin', humidMin, 0, humidMax, '%');
  return (saturationPressure(minC) * humidMax + saturationPressure(maxC) * humidMin) / 200;
}

/** Inverse relative distance and declination by day of year (eq. 23, 24). */
export function orbit(dayOfYear: number): { distance: number; declination: number } {
  const angle = (2 * Math.PI * dayOfYear) / 365;
  return { distance: 1 + 0.033 * Math.cos(angle), declination: 0.409 * Math.sin(angle - 1.39) };
}

/** Sunset hour angle, radians (eq. 25); pi in polar day, 0 in polar night. */
export function sunsetAngle(latitude: number, declination: number): number {
  return Math.acos(Math.min(Math.max(-Math.tan(latitude) * Math.tan(declination), -1), 1));
}

/**
 * Daily extraterrestrial radiation.
 *
 * @param latitudeDeg -90 to 90
 * @param dayOfYear 1-366
 * @returns MJ m-2 d-1 (eq. 21)
 */
export function extraterrestrialDaily(latitudeDeg: number, dayOfYear: number): number {
  requireWithin('latitude', latitudeDeg, -90, 90, 'degrees');
  requireWithin('dayOfYear', dayOfYear, 1, 366);
  const latitude = (latitudeDeg * Math.PI) / 180;
  const { distance, declination } = orbit(dayOfYear);
  const sunset = sunsetAngle(latitude, declination);
  const turning =
    sunset * Math.sin(latitude) * Math.sin(declination) +
    Math.cos(latitude) * Math.cos(declination) * Math.sin(sunset);
  return Math.max(((24 * 60) / Math.PI) * SOLAR_CONSTANT_MJ * distance * turning, 0);
}

/** Daylight hours (eq. 34). */
export function daylightHours(latitudeDeg: number, dayOfYear: number): number {
  const { declination } = orbit(dayOfYear);
  return (24 / Math.PI) * sunsetAngle((latitudeDeg * Math.PI) / 180, declination);
}

/** Solar radiation, MJ m-2 d-1, from sunshine hours (eq. 35, Angstrom with a 0.25, b 0.50). */
export const radiationFromSunshine = (ra: number, sunshine: number, daylight: number): number =>
  (0.25 + (0.5 * sunshine) / daylight) * ra;

/** Wind at 2 m from wind at another height above grass (eq. 47), m s-1. */
export const windAt2m = (windMs: number, heightM: number): number =>
  (windMs * 4.87) / Math.log(67.8 * heightM - 5.42);

/** One day's weather at a place. */
export interface DayWeather {
  latitudeDeg: number;
  elevationM: number;
  dayOfYear: number;
  maxC: number;
  minC: number;
  /** Actual vapour pressure, kPa; null takes the night's minimum as dew point (eq. 48). */
  vapourKpa: number | null;
  /** Wind at 2 m, m s-1. */
  wind2m: number;
  /** Solar radiation, MJ m-2 d-1. */
  solarMj: number;
}

/**
 * Radiation of a cloudless day, MJ m-2 d-1 (eq. 37).
 *
 * @param ra extraterrestrial radiation, MJ m-2 d-1
 * @param elevationM m
 */
export const clearSkyDaily = (ra: number, elevationM: number): number =>
  (0.75 + 2e-5 * elevationM) * ra;

/** Solar over clear-sky radiation of a day, at most 1; 0.5 in polar night. */
export function clearnessOf(
  day: Pick<DayWeather, 'latitudeDeg' | 'elevationM' | 'dayOfYear' | 'solarMj'>,
): number {
  const ra = extraterrestrialDaily(day.latitudeDeg, day.dayOfYear);
  const clear = clearSkyDaily(ra, day.elevationM);
  return clear > 0 ? Math.min(day.solarMj / clear, 1) : 0.5;
}

/**
 * Net heat radiation lost to the sky, MJ m-2 d-1 (eq. 39).
 *
 * @param clearness solar over clear-sky radiation, 0-1
 */
export function netLongwave(
  maxC: number,
  minC: number,
  vapourKpa: number,
  clearness: number,
): number {
  const hot = Math.pow(maxC + 273.16, 4);
  const cold = Math.pow(minC + 273.16, 4);
  const humid = 0.34 - 0.14 * Math.sqrt(vapourKpa);
  return STEFAN_BOLTZMANN_MJ * ((hot + cold) / 2) * humid * (1.35 * clearness - 0.35);
}

/** Solar radiation kept by the reference grass, albedo 0.23, MJ m-2 d-1 (eq. 38). */
export const netShortwave = (solarMj: number): number => 0.77 * solarMj;

/**
 * Net radiation over the reference grass, MJ m-2 d-1 (eq. 37-40).
 *
 * @param clearness solar over clear-sky radiation to be used for the sky's heat; null takes the day's
 *   own. A shaded crop keeps the open field's clearness: panels hide sun, they do not clear the sky.
 */
export function netRadiation(day: DayWeather, clearness: number | null = null): number {
  const ratio = Math.min(clearness ?? clearnessOf(day), 1);
  const vapour = day.vapourKpa ?? saturationPressure(day.minC);
  return netShortwave(day.solarMj) - netLongwave(day.maxC, day.minC, vapour, ratio);
}

/**
 * Reference evapotranspiration of short grass, mm d-1 (eq. 6, Penman-Monteith, daily, G = 0).
 *
 * @param day weather of the day
 * @param soilHeat soil heat flux, MJ m-2 d-1; 0 for days
 * @throws InputError naming the value out of range
 */
export function referenceEvapotranspiration(
  day: DayWeather,
  soilHeat = 0,
  clearness: number | null = null,
): number {
  requireWithin('maxC', day.maxC, -60, 60, 'deg C');
  requireWithin('minC', day.minC, -60, day.maxC, 'deg C');
  requireWithin('wind2m', day.wind2m, 0, 60, 'm s-1');
  requireWithin('solarMj', day.solarMj, 0, 60, 'MJ m-2 d-1');
  const mean = (day.maxC + day.minC) / 2;
  const gamma = psychrometric(pressureAt(day.elevationM));
  const slope = saturationSlope(mean);
  const saturated = (saturationPressure(day.maxC) + saturationPressure(day.minC)) / 2;
  const vapour = day.vapourKpa ?? saturationPressure(day.minC);
  const energy = 0.408 * slope * (netRadiation(day, clearness) - soilHeat);
  const drying = ((gamma * 900) / (mean + 273)) * day.wind2m * (saturated - vapour);
  return Math.max((energy + drying) / (slope + gamma * (1 + 0.34 * day.wind2m)), 0);
}
