import { stripAt } from '../rows/elements.js';
import { planeFactor } from '../rows/geometry.js';
import { firstAt, meetingHeight, type Bearing, type FiniteRows } from './finite-rows.js';
import { eachPatch, patchAt, type PatchPoint, type Patches } from './patches.js';

/** Rays from each patch: bands of equal cosine-weighted light times directions around. */
const BANDS = 16;
const AROUND = 12;

/** Steps of evenly spread sequences (golden ratio and its plane counterpart): no two fans are alike. */
const BAND_STEP = 0.618034;
const TURN_STEP = 0.754878;

/** Light through panels weaker than this is no longer followed. */
const FAINTEST = 0.01;

/** Shortest way between two panels, m. */
const TOUCH = 1e-6;

/** What each patch sees: panels, ground places and sky, cosine-weighted shares that sum to 1. */
export interface Fans {
  /** Sky seen straight (through panels) by each patch. */
  sky: Float64Array;
  /** Patches seen: entry e of patch i lies in seenStart[i] to seenStart[i + 1]. */
  seenStart: Int32Array;
  seen: number[];
  seenShare: number[];
  /** Ground places seen, in the same manner. */
  groundStart: Int32Array;
  groundU: number[];
  groundV: number[];
  groundShare: number[];
}

/** A panel met by a ray. */
interface Meeting {
  distance: number;
  patch: number;
}

/** Panels met by a ray from a point, nearest first. `rising` tells up from down. */
function meetings(
  rows: FiniteRows,
  patches: Patches,
  { u, v, z }: PatchPoint,
  { tangent, along }: Bearing,
  rising: 1 | -1,
): Meeting[] {
  const { geometry, places, stretches } = rows;
  const factor = planeFactor(geometry, tangent);
  if (Math.abs(factor) < 1e-9) return [];
  const middle = u + (geometry.midHeight - z) * tangent;
  const reach = (geometry.width / 2) * Math.abs(factor);
  const lean = geometry.tilt < 0 ? -1 : 1;
  const found: Meeting[] = [];
  for (let k = firstAt(places, middle - reach); k < places.length; k += 1) {
    if (places[k] > middle + reach) break;
    const up = meetingHeight(rows, places[k], u, z, factor);
    const at = v + up * along;
    const { from, to } = stretches[k];
    if (up * rising <= TOUCH || at < from || at >= to) continue;
    const slant = (((middle - places[k]) / factor) * lean) / geometry.width + 0.5;
    const block = Math.floor(((at - from) / (to - from)) * patches.blocks[k]);
    // Moving along the front normal, light lands on the rear.
    const front = factor * rising < 0;
    found.push({
      distance: up * rising,
      patch: patchAt(patches, k, front, block, stripAt(slant, patches.strips)),
    });
  }
  return found.sort((a, b) => a.distance - b.distance);
}

/** Unit vectors of a face: along its normal, along the row, and up the slant. */
function faceAxes(tilt: number, front: boolean) {
  const side = front ? 1 : -1;
  const s = Math.sin(tilt) * side;
  const c = Math.cos(tilt) * side;
  return { normal: [s, c] as const, slope: [c, -s] as const };
}

/**
 * Follow an even fan of rays from every patch.
 *
 * Each of the 192 rays stands for the same share of a diffuse surface's light (bands of equal squared
 * sine, evenly turned); bands and patches are shifted against each other.
 */
export function followFans(rows: FiniteRows, patches: Patches, transmittance: number): Fans {
  const fans: Fans = {
    sky: new Float64Array(patches.count),
    seenStart: new Int32Array(patches.count + 1),
    seen: [],
    seenShare: [],
    groundStart: new Int32Array(patches.count + 1),
    groundU: [],
    groundV: [],
    groundShare: [],
  };
  const share = 1 / (BANDS * AROUND);
  const follow = (patch: number, from: PatchPoint, du: number, dv: number, dz: number): void => {
    if (Math.abs(dz) < 1e-9) return;
    const bearing = { tangent: du / dz, along: dv / dz };
    let left = share;
    for (const meeting of meetings(rows, patches, from, bearing, dz > 0 ? 1 : -1)) {
      if (dz < 0 && meeting.distance > from.z) break;
      fans.seen.push(meeting.patch);
      fans.seenShare.push(left);
      left *= transmittance;
      if (left < FAINTEST * share) return;
    }
    if (dz > 0) {
      fans.sky[patch] += left;
      return;
    }
    fans.groundU.push(from.u - from.z * bearing.tangent);
    fans.groundV.push(from.v - from.z * bearing.along);
    fans.groundShare.push(left);
  };
  eachPatch(rows, patches, (patch, front, at) => {
    const { normal, slope } = faceAxes(rows.geometry.tilt, front);
    const from = at(0.5, 0.5);
    for (let band = 0; band < BANDS; band += 1) {
      const within = (patch * BAND_STEP) % 1;
      const sine = Math.sqrt((band + within) / BANDS);
      const cosine = Math.sqrt(1 - sine * sine);
      for (let turn = 0; turn < AROUND; turn += 1) {
        const shift = ((patch + 5 * band) * TURN_STEP) % 1;
        const angle = ((turn + shift) / AROUND) * 2 * Math.PI;
        const up = sine * Math.cos(angle);
        follow(
          patch,
          from,
          normal[0] * cosine + slope[0] * up,
          sine * Math.sin(angle),
          normal[1] * cosine + slope[1] * up,
        );
      }
    }
    fans.seenStart[patch + 1] = fans.seen.length;
    fans.groundStart[patch + 1] = fans.groundShare.length;
  });
  return fans;
}
