import type { Layout } from '../contract/layout.js';
import { projectedWidthM } from './rows-over-field.js';

/** A machine that must pass. Widths and heights in m. */
export interface Implement {
  name: string;
  workingWidthM: number;
  workingHeightM: number;
  foldedWidthM: number;
  foldedHeightM: number;
}

/** How a machine goes through the rows, and what stands in its way. */
export interface MachinePass {
  implement: Implement;
  way: 'working' | 'folded' | 'blocked';
  /** Free width where it drives, m, and how it came about. */
  freeWidthM: number;
  route: 'under' | 'between';
  reason: string;
}

/** Room kept on each side of a machine and above it, m (common practice: 0.5-1.0 and 0.5). */
export const SIDE_ROOM_M = 0.5;
export const HEAD_ROOM_M = 0.5;

/** Clear width between the panels of neighbouring rows seen from above, m; trackers count flat. */
export const bayClearWidthM = (layout: Layout): number => layout.pitchM - projectedWidthM(layout);

function tryPass(layout: Layout, widthM: number, heightM: number) {
  const under = heightM + HEAD_ROOM_M <= layout.clearHeightM;
  // Under the panels only the posts and their strip stand in the way.
  const freeWidthM = under ? layout.pitchM - layout.stripWidthM : bayClearWidthM(layout);
  return {
    fits: widthM + 2 * SIDE_ROOM_M <= freeWidthM + 1e-9,
    freeWidthM,
    route: under ? ('under' as const) : ('between' as const),
  };
}

/** Check one machine against the cross-section, unfolded first. */
export function passOf(layout: Layout, implement: Implement): MachinePass {
  const working = tryPass(layout, implement.workingWidthM, implement.workingHeightM);
  const metres = (value: number) => `${value.toFixed(2)} m`;
  if (working.fits) {
    const { freeWidthM, route } = working;
    const reason = `${metres(implement.workingWidthM)} wide in ${metres(freeWidthM)} of room ${route === 'under' ? 'under the panels' : 'between the rows'}.`;
    return { implement, way: 'working', freeWidthM, route, reason };
  }
  const folded = tryPass(layout, implement.foldedWidthM, implement.foldedHeightM);
  const { freeWidthM, route } = folded;
  const collides = `Unfolded it needs ${metres(implement.workingWidthM + 2 * SIDE_ROOM_M)} and finds ${metres(working.freeWidthM)}`;
  if (folded.fits) {
    const reason = `${collides}; folded it passes.`;
    return { implement, way: 'folded', freeWidthM, route, reason };
  }
  const needs = metres(implement.foldedWidthM + 2 * SIDE_ROOM_M);
  const reason = `${collides}; folded it needs ${needs} and finds ${metres(freeWidthM)}.`;
  return { implement, way: 'blocked', freeWidthM, route, reason };
}

/**
 * Pitch that lets `bouts` passes of a working width through, m: n x width + 2 x side room + panel.
 *
 * @param bouts passes per bay, 1 and up
 */
export function pitchForBouts(layout: Layout, workingWidthM: number, bouts: number): number {
  return bouts * workingWidthM + 2 * SIDE_ROOM_M + projectedWidthM(layout);
}
