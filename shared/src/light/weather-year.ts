import { InputError } from '../errors.js';

/**
 * One year of hourly weather at one place.
 *
 * Interval data in local standard time: value `i` is the mean over the hour that begins `i` hours
 * after 1 January 00:00. The sun is taken within the interval, never at its end. 8760 values, or
 * 8784 in a leap year.
 */
export interface HourlyYear {
  year: number;
  /** Hours east of UTC of local standard time. */
  utcOffsetHours: number;
  intervalMinutes: 60;
  /** Global horizontal irradiance, W m-2. */
  ghi: number[];
  /** Direct normal irradiance, W m-2. */
  dni: number[];
  /** Diffuse horizontal irradiance, W m-2. */
  dhi: number[];
  /** Air temperature, deg C. */
  temperatureC: number[];
  /** Wind speed, m s-1. */
  windMs: number[];
}

const SERIES = ['ghi', 'dni', 'dhi', 'temperatureC', 'windMs'] as const;

/** Days in a weather year: 365, or 366 when it has 8784 hours. */
export const daysIn = (weather: HourlyYear): number => weather.ghi.length / 24;

/**
 * Check that a weather year is complete and finite.
 *
 * @throws InputError naming the series and the hour that is wrong
 */
export function requireWeatherYear(weather: HourlyYear): void {
  const hours = weather.ghi.length;
  if (hours !== 8760 && hours !== 8784) {
    throw new InputError('weather.ghi', `A weather year has 8760 or 8784 hours, not ${hours}.`);
  }
  for (const name of SERIES) {
    const values = weather[name];
    if (values.length !== hours) {
      throw new InputError(
        `weather.${name}`,
        `weather.${name} has ${values.length} hours, not ${hours}.`,
      );
    }
    const radiation = name === 'ghi' || name === 'dni' || name === 'dhi';
    for (let hour = 0; hour < hours; hour += 1) {
      const value = values[hour];
      if (!Number.isFinite(value) || (radiation && (value < 0 || value > 2000))) {
        throw new InputError(
          `weather.${name}`,
          `weather.${name} is ${value} at hour ${hour} of the year.`,
        );
      }
    }
  }
}
