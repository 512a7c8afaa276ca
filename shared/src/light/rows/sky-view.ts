import { panelEndsAbove, type RowGeometry } from './geometry.js';

/** Sky left out beyond the last row counted, as a share of the sky's horizontal light. */
const TAIL = { full: 2e-6, preview: 1e-4 } as const;

/** Rows to count on each side so that what lies beyond covers no more than the tail. */
function rowsToCount(geometry: RowGeometry, height: number, quality: 'full' | 'preview'): number {
  const reach = height / Math.sqrt(2 * TAIL[quality]);
  return Math.min(Math.ceil(reach / geometry.pitch) + 2, 20_000);
}

/**
 * Share of an even sky's light on a horizontal receiver under endless rows, without reflections.
 *
 * The sky's light from profile angle a (from the vertical) is cos(a)/2 da. Panels cover intervals
 * of the profile; both interval ends grow with the row number, so the cover is counted in one
 * merge of two sorted lists and light through k panels is multiplied by transmittance^k.
 *
 * @param geometry rows
 * @param transmittance of a panel, 0-1
 * @param u receiver across the rows, m
 * @param z0 receiver height, m
 * @returns 0-1; exact but for rows so far away that they cover under 2e-6
 */
export function skyShare(
  geometry: RowGeometry,
  transmittance: number,
  u: number,
  z0: number,
  quality: 'full' | 'preview' = 'full',
): number {
  const ends = panelEndsAbove(geometry, z0);
  if (!ends.above || geometry.width === 0) return 1;
  const count = rowsToCount(geometry, ends.z1 - z0, quality);
  const { pitch } = geometry;
  const centre = Math.round(u / pitch);
  const first = centre - count;
  const total = 2 * count + 1;
  const up1 = ends.z1 - z0;
  const up2 = ends.z2 - z0;
  /** Sine of the profile angle of the lower (side -1) or upper (side 1) end of a row's interval. */
  const sine = (k: number, side: number): number => {
    const offset = (first + k) * pitch - u;
    const x1 = offset + ends.u1;
    const x2 = offset + ends.u2;
    const s1 = x1 / Math.sqrt(x1 * x1 + up1 * up1);
    const s2 = up2 === 0 && x2 === 0 ? s1 : x2 / Math.sqrt(x2 * x2 + up2 * up2);
    return side < 0 === s1 < s2 ? s1 : s2;
  };
  let share = 0;
  let from = -1;
  let opened = 0;
  let closed = 0;
  let nextOpen = sine(0, -1);
  let nextClose = sine(0, 1);
  while (closed < total) {
    const opens = opened < total && nextOpen <= nextClose;
    const to = opens ? nextOpen : nextClose;
    const cover = opened - closed;
    share += (to - from) * (cover === 0 ? 1 : Math.pow(transmittance, cover));
    from = to;
    if (opens) {
      opened += 1;
      nextOpen = opened < total ? sine(opened, -1) : Infinity;
    } else {
      closed += 1;
      nextClose = closed < total ? sine(closed, 1) : Infinity;
    }
  }
  return (share + (1 - from)) / 2;
}
