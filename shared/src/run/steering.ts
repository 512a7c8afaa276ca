import type { CropFirstWindow, Layout } from '../contract/layout.js';
import { dayOfMonthDay, isWithin } from '../crops/windows.js';
import {
  backtrackedRotation,
  leastShadeRotation,
  trueRotation,
  withinStops,
} from '../light/tracker.js';
import type { Steering } from './state.js';

/** Is a crop-first window in force at this day, local standard hour and open-field PPFD? */
function inForce(window: CropFirstWindow, day: number, hour: number, ppfd: number): boolean {
  return (
    isWithin(day, dayOfMonthDay(window.from), dayOfMonthDay(window.to)) &&
    hour >= window.startHour &&
    hour < window.endHour &&
    (window.belowPpfd === null || ppfd < window.belowPpfd)
  );
}

/** Rotation for the meter: follow the sun, turned back from shading neighbours unless told not to. */
export function meterRotation(
  steering: Steering,
  programme: 'true' | 'backtracking' | 'crop-first',
  azimuth: number,
  altitude: number,
): number {
  const ideal = trueRotation(steering.axis, azimuth, altitude);
  const wanted =
    programme === 'true' ? ideal : backtrackedRotation(steering.axis, ideal, steering.groundCover);
  return withinStops(wanted, steering.limit);
}

/**
 * Rotation of a tracker at one instant, radians.
 *
 * @param day 0-based day of year
 * @param hour local standard hour, 0-24
 * @param ppfd open-field PPFD, umol m-2 s-1
 */
export function rotationAt(
  steering: Steering,
  layout: Layout,
  azimuth: number,
  altitude: number,
  day: number,
  hour: number,
  ppfd: number,
): number {
  const tracker = layout.tracker;
  if (!tracker) return 0;
  const serving =
    tracker.programme === 'crop-first' &&
    tracker.cropFirst.some((window) => inForce(window, day, hour, ppfd));
  if (serving) {
    return leastShadeRotation(trueRotation(steering.axis, azimuth, altitude), steering.limit);
  }
  return meterRotation(steering, tracker.programme, azimuth, altitude);
}
