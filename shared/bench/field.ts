import { toRadians } from '../src/light/angles.js';
import { prepareFieldLight } from '../src/light/field-map/field-light.js';
import type { HourlyYear } from '../src/light/weather-year.js';
import { emptyDaySuns, fillDaySuns } from '../src/run/instants.js';
import { groundOf, rowsOfLayout } from '../src/run/layout-geometry.js';
import { OVERHEAD, SITE } from './inputs.js';

/** Receivers along each side of a square field, and the field's side, m. */
const SIDE = 100;
const FIELD_M = 150;

/** Weeks of the season, counted from the first day, 0-based. */
const WEEKS = 22;
const FIRST_DAY = 90;

/**
 * Season map by week over a square field: one day a week stands for it, suns half an hour apart.
 *
 * @returns light of the brightest receiver, W h m-2, so that nothing is optimised away
 */
export function fieldSeason(weather: HourlyYear): number {
  const count = SIDE * SIDE;
  const place = (i: number) => ((i + 0.5) / SIDE - 0.5) * FIELD_M;
  const u = Float64Array.from({ length: count }, (_, i) => place(i % SIDE));
  const v = Float64Array.from({ length: count }, (_, i) => place(Math.floor(i / SIDE)));
  const { geometry, optics } = rowsOfLayout(OVERHEAD, SITE, 1, u);
  const rows = Math.floor(FIELD_M / geometry.pitch);
  const stretches = Array.from({ length: rows }, (_, row) => ({
    u: (row - (rows - 1) / 2) * geometry.pitch,
    from: -FIELD_M / 2 + 12,
    to: FIELD_M / 2 - 12,
  }));
  const light = prepareFieldLight({ geometry, optics, stretches, receiverHeight: 1, u, v });
  const ground = { latitude: SITE.latitude, longitude: SITE.longitude, ...groundOf(SITE) };
  const suns = emptyDaySuns(30);
  const beam = new Float64Array(count);
  const weekly = Array.from({ length: WEEKS }, () => new Float64Array(count));
  weekly.forEach((sums, week) => {
    fillDaySuns(weather, ground, FIRST_DAY + week * 7 + 3, suns);
    for (let i = 0; i < suns.count; i += 1) {
      light.beam(suns.planeAzimuth[i], Math.max(suns.planeAltitude[i], toRadians(0.3)), beam);
      const direct = suns.dni[i] * Math.sin(suns.altitude[i]) * suns.stepHours;
      const even = suns.dhi[i] * suns.stepHours;
      for (let r = 0; r < count; r += 1) sums[r] += direct * beam[r] + even * light.sky[r];
    }
  });
  return Math.max(...weekly.map((sums) => sums.reduce((most, value) => Math.max(most, value), 0)));
}
