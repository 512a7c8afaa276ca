import { clearSky } from './groups/clear-sky.js';
import { faiman } from './groups/faiman.js';
import { fao56, fao56Radiation } from './groups/fao56.js';
import { g173 } from './groups/g173.js';
import { measured } from './groups/measured.js';
import { planck } from './groups/planck.js';
import { raytracedDays } from './groups/raytraced-days.js';
import { raytracedEndless } from './groups/raytraced-endless.js';
import { raytracedFinite } from './groups/raytraced-finite.js';
import { raytracedGaps } from './groups/raytraced-gaps.js';
import { rows2d } from './groups/rows2d.js';
import { sky } from './groups/sky.js';
import { sun } from './groups/sun.js';
import { tracker } from './groups/tracker.js';
import type { Group } from './quantity.js';

/** Every group of reference files the engine is compared with. */
export const GROUPS: readonly Group[] = [
  sun,
  planck,
  g173,
  clearSky,
  sky,
  rows2d,
  raytracedEndless,
  raytracedGaps,
  raytracedFinite,
  raytracedDays,
  tracker,
  faiman,
  fao56,
  fao56Radiation,
  measured,
];
