import type { Layout } from '@furrowlight/shared/contract/layout';
import type { Site } from '@furrowlight/shared/contract/run';
import { sliceAt, type RowSlice, type SliceTime } from '@furrowlight/shared/run/slice';
import { tableOf } from '@furrowlight/shared/run/state';
import { useMemo } from 'react';

/** Strips across the pitch; enough for a curve, few enough to move with a slider. */
const STRIPS = 60;

/**
 * Cross-section of a layout at one moment, worked out by the engine on the spot (about 2 ms).
 *
 * @returns null where the rows cannot stand on this ground
 */
export function useRowSlice(
  site: Site,
  layout: Layout,
  canopyHeightM: number,
  { year, day, hour, utcOffsetHours }: SliceTime,
): RowSlice | null {
  const place = useMemo(() => ({ site, table: tableOf(site) }), [site]);
  return useMemo(() => {
    try {
      const time = { year, day, hour, utcOffsetHours };
      return sliceAt(place, layout, canopyHeightM, time, STRIPS);
    } catch {
      return null;
    }
  }, [place, layout, canopyHeightM, year, day, hour, utcOffsetHours]);
}
