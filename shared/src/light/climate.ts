import { InputError, requireWithin } from '../errors.js';
import { monthOf, monthSpan } from '../crops/windows.js';
import { defaultAtmosphere } from './atmosphere.js';
import { atAltitude, prepareBandTable } from './band-table.js';
import { distanceFactor, extraterrestrialNormal, sunPosition } from './sun.js';
import type { HourlyYear } from './weather-year.js';

/** Place and clock of a year that is built rather than read. */
export interface YearFrame {
  latitude: number;
  longitude: number;
  elevationM: number;
  year: number;
  utcOffsetHours: number;
}

/** Twelve monthly means, January first. */
export interface MonthlyClimate extends YearFrame {
  /** Mean daily global radiation, MJ m-2 d-1. */
  monthlyMjM2: readonly number[];
  monthlyMinC: readonly number[];
  monthlyMaxC: readonly number[];
}

const HOURS = 8760;
const STEPS = 6;
const HOUR_MS = 3_600_000;
/** Hour of the day's highest temperature, local standard (common practice). */
const WARMEST_HOUR = 14.5;
/** Wind where no record is given, m s-1 (FAO-56: 2 m s-1 as a world mean). */
const WIND_MS = 2;

/** Sun altitudes of one hour, radians, six looks. */
function altitudesOf(frame: YearFrame, hour: number): number[] {
  const start = Date.UTC(frame.year, 0, 1) - frame.utcOffsetHours * HOUR_MS;
  return Array.from({ length: STEPS }, (_, step) => {
    const instant = start + (hour + (step + 0.5) / STEPS) * HOUR_MS;
    return sunPosition(instant, frame.latitude, frame.longitude).altitude;
  });
}

const emptyYear = (frame: YearFrame, celsius: (hour: number) => number): HourlyYear => ({
  year: frame.year,
  utcOffsetHours: frame.utcOffsetHours,
  intervalMinutes: 60,
  ghi: new Array<number>(HOURS).fill(0),
  dni: new Array<number>(HOURS).fill(0),
  dhi: new Array<number>(HOURS).fill(0),
  temperatureC: Array.from({ length: HOURS }, (_, hour) => celsius(hour)),
  windMs: new Array<number>(HOURS).fill(WIND_MS),
});

/**
 * A year without clouds: Bird-Riordan direct and diffuse at six suns an hour, 15 deg C, 2 m s-1.
 *
 * An upper bound of light; say so wherever it is used.
 */
export function clearSkyYear(frame: YearFrame): HourlyYear {
  const table = prepareBandTable(defaultAtmosphere(frame.elevationM, 0.2));
  const year = emptyYear(frame, () => 15);
  for (let hour = 0; hour < HOURS; hour += 1) {
    const distance = distanceFactor(Math.floor(hour / 24) + 1);
    let beam = 0;
    let sines = 0;
    for (const altitude of altitudesOf(frame, hour)) {
      if (altitude <= 0) continue;
      const direct = atAltitude(table.directWm2, altitude) * distance;
      beam += (direct * Math.sin(altitude)) / STEPS;
      sines += Math.sin(altitude) / STEPS;
      year.dhi[hour] += (atAltitude(table.diffuseWm2, altitude) * distance) / STEPS;
    }
    year.ghi[hour] = beam + year.dhi[hour];
    year.dni[hour] = sines > 0 ? beam / sines : 0;
  }
  return year;
}

/**
 * Shape of global light over a day: (a + b cos w) times the sine of the sun's altitude.
 *
 * Source: Collares-Pereira & Rabl 1979, Solar Energy 22:155.
 */
function hourlyShape(altitudes: number[], hourAngle: number, sunsetAngle: number): number {
  const turn = Math.sin(sunsetAngle - Math.PI / 3);
  const a = 0.409 + 0.5016 * turn;
  const b = 0.6609 - 0.4767 * turn;
  const sine = altitudes.reduce((sum, altitude) => sum + Math.max(Math.sin(altitude), 0), 0);
  return Math.max(a + b * Math.cos(hourAngle), 0) * sine;
}

/** Sunset angle between winter and other months in the monthly diffuse correlation, radians. */
const WINTER_SUNSET = (81.4 * Math.PI) / 180;

/**
 * Diffuse share of a month's mean day by its mean clearness.
 *
 * Source: Erbs, Klein & Duffie 1982, Solar Energy 28:293, monthly correlation (0.3 to 0.8). The
 * hourly one would call every hour of a mean day hazy: it knows no bright days.
 */
export function monthlyDiffuseShare(clearness: number, sunsetAngle: number): number {
  const k = Math.min(Math.max(clearness, 0.3), 0.8);
  return sunsetAngle <= WINTER_SUNSET
    ? 1.391 + k * (-3.56 + k * (4.189 - 2.137 * k))
    : 1.311 + k * (-3.022 + k * (3.427 - 1.821 * k));
}

function requireMonths(name: string, values: readonly number[], min: number, max: number): void {
  if (values.length !== 12) throw new InputError(name, `${name} needs twelve monthly values.`);
  values.forEach((value, month) => requireWithin(`${name}.${month}`, value, min, max));
}

/**
 * A year of hours from monthly means. Every day of a month has the same clearness, so cloudy and
 * bright days are not told apart; each month's mean daily radiation is kept to rounding.
 *
 * @throws InputError naming the month that is out of range or brighter than the sky above the air
 */
export function climateYear(climate: MonthlyClimate): HourlyYear {
  requireMonths('monthlyMjM2', climate.monthlyMjM2, 0, 45);
  requireMonths('monthlyMinC', climate.monthlyMinC, -60, 60);
  requireMonths('monthlyMaxC', climate.monthlyMaxC, -60, 60);
  const year = emptyYear(climate, (hour) => {
    const month = monthOf(Math.floor(hour / 24));
    const low = climate.monthlyMinC[month];
    const high = climate.monthlyMaxC[month];
    const turn = Math.cos((2 * Math.PI * ((hour % 24) + 0.5 - WARMEST_HOUR)) / 24);
    return (low + high) / 2 + ((high - low) / 2) * turn;
  });
  for (let month = 0; month < 12; month += 1) fillMonth(climate, month, year);
  return year;
}

function fillMonth(climate: MonthlyClimate, month: number, year: HourlyYear): void {
  const { firstDay, days } = monthSpan(month);
  const sines = new Float64Array(days * 24);
  const shape = new Float64Array(days * 24);
  let aboveAir = 0;
  let midSunset = 0;
  for (let day = 0; day < days; day += 1) {
    const hours = Array.from({ length: 24 }, (_, h) =>
      altitudesOf(climate, (firstDay + day) * 24 + h),
    );
    const looks = hours.flat().filter((altitude) => altitude > 0).length;
    const sunsetAngle = (looks / STEPS / 24) * Math.PI;
    midSunset += sunsetAngle / days;
    const normal = extraterrestrialNormal(firstDay + day + 1);
    const solarNoon = 12 + climate.utcOffsetHours - climate.longitude / 15;
    let daySum = 0;
    let dayAbove = 0;
    for (let h = 0; h < 24; h += 1) {
      const i = day * 24 + h;
      sines[i] = hours[h].reduce((sum, alt) => sum + Math.max(Math.sin(alt), 0), 0) / STEPS;
      shape[i] = hourlyShape(hours[h], ((h + 0.5 - solarNoon) * Math.PI) / 12, sunsetAngle);
      daySum += shape[i];
      dayAbove += sines[i] * normal;
    }
    // Each day gets its share of the month by what arrives above the air that day.
    for (let h = 0; h < 24; h += 1) {
      shape[day * 24 + h] *= daySum > 0 ? dayAbove / daySum : 0;
    }
    aboveAir += dayAbove;
  }
  const wanted = (climate.monthlyMjM2[month] * days) / 0.0036;
  if (wanted > aboveAir * 0.85) {
    throw new InputError(
      `monthlyMjM2.${month}`,
      `More light than can come through the air here in this month (at most ${((aboveAir * 0.85 * 0.0036) / days).toFixed(1)} MJ m-2 d-1).`,
    );
  }
  const clearness = aboveAir > 0 ? wanted / aboveAir : 0;
  const diffuse = monthlyDiffuseShare(clearness, midSunset);
  for (let i = 0; i < days * 24; i += 1) {
    const hour = firstDay * 24 + i;
    const normal = extraterrestrialNormal(Math.floor(hour / 24) + 1);
    const ghi = shape[i] * clearness;
    // Diffuse follows the sine of the altitude (Liu & Jordan 1960), global is peaked about noon.
    const dhi = Math.min(sines[i] * normal * clearness * diffuse, ghi);
    year.ghi[hour] = ghi;
    year.dhi[hour] = dhi;
    year.dni[hour] = sines[i] > 0.01 ? (ghi - dhi) / sines[i] : 0;
  }
}
