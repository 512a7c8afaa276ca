import type { Layout } from '@furrowlight/shared/contract/layout';
import type { RowSlice } from '@furrowlight/shared/run/slice';

/** The drawing's own units: it is scaled to its place by the browser. */
export const SLICE = { width: 1000, ground: 312, curveTop: 344, curveHeight: 84, height: 452 };

/** Tallest figure that stands beside the rows, m: a tractor's cab. */
const TRACTOR_M = 3;
const SKY_M = 1.1;
/** Pitches wider than this are drawn one at a time, or nothing could be made out. */
const WIDE_PITCH_M = 22;

/** Scale and window of a cross-section; it does not move with the sun. */
export interface SliceFrame {
  /** Drawing units per metre, the same up and across. */
  perMetre: number;
  leftM: number;
  rightM: number;
  /** Centre lines of the rows in sight, m. */
  rows: number[];
}

/** A window over one or more pitches with a bay in its middle. */
export function frameOf(layout: Layout): SliceFrame {
  const worst =
    layout.kind === 'single-axis-tracker' ? (layout.tracker?.maxAngleDeg ?? 0) : layout.tiltDeg;
  const rise = layout.collectorWidthM * Math.sin((worst * Math.PI) / 180);
  const top = Math.max(layout.clearHeightM + rise, TRACTOR_M) + SKY_M;
  const { pitchM } = layout;
  const bays = pitchM > WIDE_PITCH_M ? 1.2 : 2;
  const perMetre = Math.min(SLICE.width / (bays * pitchM), (SLICE.ground - 16) / top);
  const width = SLICE.width / perMetre;
  const leftM = (pitchM - width) / 2;
  const rightM = leftM + width;
  const reach = Math.max(layout.collectorWidthM, pitchM / 2);
  const first = Math.ceil((leftM - reach) / pitchM);
  const last = Math.floor((rightM + reach) / pitchM);
  const rows = Array.from({ length: last - first + 1 }, (_, i) => (first + i) * pitchM);
  return { perMetre, leftM, rightM, rows };
}

export const xOf = (frame: SliceFrame, u: number): number => (u - frame.leftM) * frame.perMetre;
export const yOf = (frame: SliceFrame, z: number): number => SLICE.ground - z * frame.perMetre;

const fixed = (value: number) => value.toFixed(1);

/** Four corners of the air a panel shades, down to the canopy; null with the sun down. */
export function shadowBody(frame: SliceFrame, slice: RowSlice, row: number, canopyM: number) {
  if (slice.profileAngleDeg === null) return null;
  const tangent = Math.tan((slice.profileAngleDeg * Math.PI) / 180);
  const above = slice.edges.map(({ u, z }) => ({ u: u + row, z: Math.max(z, canopyM) }));
  const feet = above.map(({ u, z }) => ({ u: u - (z - canopyM) * tangent, z: canopyM }));
  return [above[0], above[1], feet[1], feet[0]]
    .map(({ u, z }) => `${fixed(xOf(frame, u))},${fixed(yOf(frame, z))}`)
    .join(' ');
}

/** Where the sun's disc is drawn: along its true direction, at the rim of the sky. */
export function sunSpot(slice: RowSlice): { x: number; y: number } | null {
  if (slice.profileAngleDeg === null) return null;
  const angle = (slice.profileAngleDeg * Math.PI) / 180;
  const across = Math.abs(Math.sin(angle));
  const up = Math.cos(angle);
  const reach = Math.min(
    across > 1e-6 ? (SLICE.width / 2 - 36) / across : Infinity,
    up > 1e-6 ? (SLICE.ground - 34) / up : Infinity,
  );
  return { x: SLICE.width / 2 + Math.sin(angle) * reach, y: SLICE.ground - up * reach };
}

/** Stretches of cropped ground between the uncropped strips, in drawing units. */
export function croppedStretches(
  frame: SliceFrame,
  layout: Layout,
): { x: number; width: number }[] {
  const half = layout.stripWidthM / 2;
  return [frame.rows[0] - layout.pitchM, ...frame.rows].map((row) => ({
    x: xOf(frame, row + half),
    width: (layout.pitchM - layout.stripWidthM) * frame.perMetre,
  }));
}

/** A strip of ground in sight, with its share of open field. */
export interface Strip {
  x: number;
  width: number;
  share: number;
  u: number;
}

/** The strips of one pitch repeated over the window. */
export function stripsOf(frame: SliceFrame, layout: Layout, slice: RowSlice): Strip[] {
  const { positionsM, ppfd, openPpfd } = slice;
  const widthM = layout.pitchM / positionsM.length;
  return frame.rows.flatMap((row) =>
    positionsM.flatMap((position, i) => {
      const u = row + position;
      if (u + widthM / 2 < frame.leftM || u - widthM / 2 > frame.rightM) return [];
      return [
        {
          u,
          x: xOf(frame, u - widthM / 2),
          width: widthM * frame.perMetre,
          share: openPpfd > 0 ? ppfd[i] / openPpfd : 0,
        },
      ];
    }),
  );
}

/** Height in the light curve of a share of open field. */
export const curveY = (share: number): number =>
  SLICE.curveTop + SLICE.curveHeight * (1 - Math.min(share, 1.15));

/** The light curve as a stepped line: one level a strip. */
export function curvePath(strips: readonly Strip[]): string {
  return strips
    .map(({ x, width, share }, i) => {
      const y = fixed(curveY(share));
      return `${i === 0 ? 'M' : 'L'}${fixed(x)} ${y}H${fixed(x + width)}`;
    })
    .join('');
}

/** Mean and darkest share of open field across the pitch at one moment; null at night. */
export function sliceShares(slice: RowSlice): { mean: number; darkest: number } | null {
  if (!(slice.openPpfd > 0)) return null;
  const mean = slice.ppfd.reduce((sum, value) => sum + value, 0) / slice.ppfd.length;
  return { mean: mean / slice.openPpfd, darkest: Math.min(...slice.ppfd) / slice.openPpfd };
}
