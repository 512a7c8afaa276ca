import { panelEndsAbove, type RowGeometry } from './geometry.js';

/** Rows counted one by one: within this many heights, and at least as many rows to each side. */
const COUNTED = { full: { heights: 60, rows: 20 }, preview: { heights: 25, rows: 8 } } as const;

/** Steps in which rows beyond are taken as an even haze. */
const HAZE_STEPS = 8;

/**
 * Light from the part of the sky between two sines of the profile angle that comes through
 * `panels` panels, as a share of the sky's horizontal light.
 */
export type SkyPart = (panels: number, from: number, to: number) => number;

/** Sky seen by receivers at one height. */
export interface SkyView {
  /** Share of the sky's light that reaches the receiver at u, without reflections. */
  share(u: number): number;
}

/** Light from beyond the counted rows on one side: rows there shade like their mean over a pitch. */
function haze(
  sine: number,
  side: 1 | -1,
  depthAt: (tangent: number) => number,
  part: SkyPart,
): number {
  const lowest = Math.acos(Math.min(sine, 1));
  let light = 0;
  for (let step = 0; step < HAZE_STEPS; step += 1) {
    const high = Math.cos((lowest * step) / HAZE_STEPS);
    const low = Math.cos((lowest * (step + 1)) / HAZE_STEPS);
    const middle = (lowest * (step + 0.5)) / HAZE_STEPS;
    const depth = depthAt(side / Math.tan(middle));
    const full = Math.floor(depth);
    const from = side > 0 ? low : -high;
    const to = side > 0 ? high : -low;
    const more = depth - full;
    light += (1 - more) * part(full, from, to) + more * part(full + 1, from, to);
  }
  return light;
}

/**
 * Prepare the view of the sky under endless rows, without reflections.
 *
 * An even sky's light from profile angle a (from the vertical) is cos(a)/2 da, even in the sine.
 * Panels cover intervals of the profile; both interval ends grow with the row number, so the cover
 * is counted in one merge of two sorted lists. Rows far away are taken with their mean cover.
 * Source: unit-sphere (crossed-string) form of the two-dimensional view factor; Hottel & Sarofim 1967.
 *
 * @param z0 receiver height, m
 * @param part light through panels, see SkyPart
 * @returns shares, exact but for far rows (within 2e-5 full, 3e-4 preview)
 */
export function prepareSkyView(
  geometry: RowGeometry,
  z0: number,
  part: SkyPart,
  quality: 'full' | 'preview',
): SkyView {
  const ends = panelEndsAbove(geometry, z0);
  if (!ends.above || geometry.width === 0) {
    const whole = part(0, -1, 1);
    return { share: () => whole };
  }
  const { pitch } = geometry;
  const { u1, u2 } = ends;
  const up1 = ends.z1 - z0;
  const up2 = ends.z2 - z0;
  const { heights, rows } = COUNTED[quality];
  const count = Math.max(Math.ceil((heights * up1) / pitch), rows);
  const total = 2 * count + 1;
  const opens = new Float64Array(total);
  const closes = new Float64Array(total);
  const depthAt = (tangent: number) => Math.abs(u1 - u2 - (up1 - up2) * tangent) / pitch;

  const lookAt = (u: number): void => {
    const first = (Math.round(u / pitch) - count) * pitch - u;
    for (let k = 0; k < total; k += 1) {
      const x1 = first + k * pitch + u1;
      const x2 = first + k * pitch + u2;
      const s1 = x1 / Math.sqrt(x1 * x1 + up1 * up1);
      const s2 = up2 === 0 && x2 === 0 ? s1 : x2 / Math.sqrt(x2 * x2 + up2 * up2);
      opens[k] = s1 < s2 ? s1 : s2;
      closes[k] = s1 < s2 ? s2 : s1;
    }
  };

  const share = (u: number): number => {
    lookAt(u);
    // Up to where the first counted row closes, rows not counted may cover too.
    let from = closes[0];
    let closed = 1;
    let opened = 1;
    while (opened < total && opens[opened] <= from) opened += 1;
    let light = haze(-from, -1, depthAt, part);
    while (opened < total) {
      const next = Math.min(opens[opened], closes[closed]);
      if (next > from) {
        light += part(opened - closed, from, next);
        from = next;
      }
      if (opens[opened] <= closes[closed]) opened += 1;
      else closed += 1;
    }
    // The last rows' ends lie among rows not counted: from here on only the mean cover is known.
    return light + haze(from, 1, depthAt, part);
  };
  return { share };
}
