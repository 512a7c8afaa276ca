import { upperSide } from '../rows/geometry.js';
import type { FiniteRows } from './finite-rows.js';

/** Panel faces cut into patches: strips along the slant times blocks along the row. */
export interface Patches {
  strips: number;
  /** First patch of each stretch's front, counted in faces x blocks x strips. */
  starts: Int32Array;
  /** Blocks of each stretch. */
  blocks: Int32Array;
  count: number;
}

/** Most patches of a field; longer blocks are taken beyond. */
const MOST_PATCHES = 3000;
const STRIPS = 10;
const SHORTEST_BLOCK_M = 0.5;

/** Cut all faces of a field's rows. */
export function cutPatches({ stretches }: FiniteRows): Patches {
  const total = stretches.reduce((sum, { from, to }) => sum + to - from, 0);
  const block = Math.max(SHORTEST_BLOCK_M, (total * STRIPS * 2) / MOST_PATCHES);
  const starts = new Int32Array(stretches.length);
  const blocks = new Int32Array(stretches.length);
  let count = 0;
  stretches.forEach(({ from, to }, k) => {
    starts[k] = count;
    blocks[k] = Math.max(1, Math.round((to - from) / block));
    count += 2 * blocks[k] * STRIPS;
  });
  return { strips: STRIPS, starts, blocks, count };
}

/** Patch on a stretch's face, by block along and strip from the upper edge. */
export function patchAt(
  patches: Patches,
  stretch: number,
  front: boolean,
  block: number,
  strip: number,
): number {
  const { strips, starts, blocks } = patches;
  const within = Math.min(Math.max(block, 0), blocks[stretch] - 1);
  return starts[stretch] + ((front ? 0 : blocks[stretch]) + within) * strips + strip;
}

/** Point on a patch. */
export interface PatchPoint {
  u: number;
  v: number;
  z: number;
}

/** Walk all patches in order. */
export function eachPatch(
  rows: FiniteRows,
  patches: Patches,
  visit: (patch: number, front: boolean, at: (slant: number, along: number) => PatchPoint) => void,
): void {
  const { geometry, stretches } = rows;
  const c = Math.cos(geometry.tilt);
  const s = Math.sin(geometry.tilt);
  const lean = upperSide(geometry);
  let patch = 0;
  stretches.forEach(({ u, from, to }, k) => {
    for (const front of [true, false]) {
      for (let block = 0; block < patches.blocks[k]; block += 1) {
        for (let strip = 0; strip < patches.strips; strip += 1) {
          visit(patch, front, (slant, along) => {
            const q = ((strip + slant) / patches.strips - 0.5) * geometry.width * lean;
            return {
              u: u + q * c,
              v: from + ((block + along) / patches.blocks[k]) * (to - from),
              z: geometry.midHeight - q * s,
            };
          });
          patch += 1;
        }
      }
    }
  });
}
