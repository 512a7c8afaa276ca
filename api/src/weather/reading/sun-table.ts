import { extraterrestrialNormal, SOLAR_CONSTANT, sunPosition } from '@furrowlight/shared/light/sun';

const HOURS = 8760;
const STEPS = 6;
const HOUR_MS = 3_600_000;

/** Mean sine of the sun's altitude over each hour of a year, 0 at night; and light above the air. */
export interface SunTable {
  meanSine: Float64Array;
  extraterrestrial: Float64Array;
}

/** Sun over a place for a 365-day year in local standard time, six looks an hour. */
export function sunTable(
  year: number,
  latitude: number,
  longitude: number,
  utcOffsetHours: number,
): SunTable {
  const meanSine = new Float64Array(HOURS);
  const extraterrestrial = new Float64Array(HOURS);
  const start = Date.UTC(year, 0, 1) - utcOffsetHours * HOUR_MS;
  for (let hour = 0; hour < HOURS; hour += 1) {
    let sum = 0;
    for (let step = 0; step < STEPS; step += 1) {
      const instant = start + (hour + (step + 0.5) / STEPS) * HOUR_MS;
      sum += Math.max(Math.sin(sunPosition(instant, latitude, longitude).altitude), 0);
    }
    meanSine[hour] = sum / STEPS;
    extraterrestrial[hour] = extraterrestrialNormal(Math.floor(hour / 24) + 1);
  }
  return { meanSine, extraterrestrial };
}

/** Offsets tried, minutes. */
const SHIFTS = Array.from({ length: 37 }, (_, i) => (i - 18) * 10);

/**
 * Minutes by which a file's radiation comes later than the sun: the shift at which global light
 * follows the sine of the sun's altitude best, over every third day.
 */
export function lateMinutes(
  ghi: Float64Array,
  year: number,
  latitude: number,
  longitude: number,
  utcOffsetHours: number,
): number {
  const start = Date.UTC(year, 0, 1) - utcOffsetHours * HOUR_MS;
  const mismatch = SHIFTS.map((shift) => {
    let error = 0;
    for (let day = 0; day < 365; day += 3) {
      let dot = 0;
      let sun = 0;
      let light = 0;
      for (let h = 0; h < 24; h += 1) {
        const hour = day * 24 + h;
        const instant = start + (hour + 0.5) * HOUR_MS - shift * 60_000;
        const sine = Math.max(Math.sin(sunPosition(instant, latitude, longitude).altitude), 0);
        dot += sine * ghi[hour];
        sun += sine * sine;
        light += ghi[hour] * ghi[hour];
      }
      if (light > 0) error += 1 - (dot * dot) / (sun * light);
    }
    return error;
  });
  return SHIFTS[mismatch.indexOf(Math.min(...mismatch))];
}

/** Horizontal light above the air over the year, kWh m-2. */
export function extraterrestrialKwh(table: SunTable): number {
  let sum = 0;
  for (let hour = 0; hour < HOURS; hour += 1) sum += table.meanSine[hour] * SOLAR_CONSTANT;
  return sum / 1000;
}
