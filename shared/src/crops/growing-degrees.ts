import { requireWithin } from '../errors.js';
import type { HourlyYear } from '../light/weather-year.js';

/**
 * Growing degrees of a day: how far its mean temperature is above the crop's base.
 *
 * @param maxC highest air temperature, deg C
 * @param minC lowest air temperature, deg C
 * @param baseC temperature below which the crop does not grow, deg C
 * @returns K d, 0 and up
 * Source: McMaster & Wilhelm 1997, Agric. For. Meteorol. 87:291, method 1.
 */
export function growingDegrees(maxC: number, minC: number, baseC: number): number {
  requireWithin('maxC', maxC, -60, 60, 'deg C');
  requireWithin('minC', minC, -60, maxC, 'deg C');
  requireWithin('baseC', baseC, -10, 30, 'deg C');
  return Math.max((maxC + minC) / 2 - baseC, 0);
}

/** Growing degrees of a 0-based day of a weather year, K d. */
export function growingDegreesOfDay(weather: HourlyYear, day: number, baseC: number): number {
  const hours = weather.temperatureC.slice(day * 24, day * 24 + 24);
  return growingDegrees(Math.max(...hours), Math.min(...hours), baseC);
}

/**
 * Growing degrees gathered over a span of days that may run over New Year, day by day.
 *
 * @param firstDay 0-based day of the weather year
 * @param days length of the span
 * @returns running sums, K d, one a day
 */
export function heatSums(
  weather: HourlyYear,
  firstDay: number,
  days: number,
  baseC: number,
): number[] {
  const length = weather.temperatureC.length / 24;
  let sum = 0;
  return Array.from({ length: days }, (_, n) => {
    sum += growingDegreesOfDay(weather, (firstDay + n) % length, baseC);
    return sum;
  });
}

/**
 * Day on which a heat sum is reached, so that a stage's date can follow the weather year.
 *
 * @param firstDay 0-based day from which degrees are gathered (sowing)
 * @param wanted heat sum, K d, above 0
 * @returns days after firstDay (0 is that day itself); null where a year is not enough
 */
export function daysToHeatSum(
  weather: HourlyYear,
  firstDay: number,
  wanted: number,
  baseC: number,
): number | null {
  requireWithin('wanted', wanted, 1e-9, 20_000, 'K d');
  const length = weather.temperatureC.length / 24;
  const reached = heatSums(weather, firstDay, length, baseC).findIndex((sum) => sum >= wanted);
  return reached < 0 ? null : reached;
}
