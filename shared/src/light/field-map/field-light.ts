import { requireWithin } from '../../errors.js';
import { stripAt } from '../rows/elements.js';
import {
  planeFactor,
  requireRowOptics,
  type RowGeometry,
  type RowOptics,
} from '../rows/geometry.js';
import {
  meanThrough,
  panelsCrossed,
  prepareFiniteRows,
  sunBearing,
  type Bearing,
  type FiniteRows,
  type RowStretch,
} from './finite-rows.js';
import { cutPatches, eachPatch, patchAt, type Patches } from './patches.js';
import { alongShare, sweepView, type Sighting } from './profile-sweep.js';
import { followFans, type Fans } from './ray-fan.js';
import { prepareGroundSky } from './ground-sky.js';

/** A field's rows and the places at which light is counted, in the frame of the rows. */
export interface FieldLightInput {
  geometry: RowGeometry;
  optics: RowOptics;
  stretches: readonly RowStretch[];
  receiverHeight: number;
  /** Across and along, m, one each a receiver. */
  u: Float64Array;
  v: Float64Array;
}

/** Light over a field of finite rows. */
export interface FieldLight {
  /** Share of an even sky's horizontal light at each receiver, reflections included. */
  sky: Float64Array;
  /** The reflected part of `sky`. */
  skyReflected: Float64Array;
  /** Panels that a point sun's ray crosses on its way to a receiver. */
  crossed(sunAzimuth: number, sunAltitude: number, receiver: number): number;
  /** Share of the unobstructed horizontal beam of a point sun, without reflections. */
  beam(sunAzimuth: number, sunAltitude: number, out: Float64Array): void;
  /** Extra share of a sun's horizontal beam after one reflection or more. */
  beamReflected(sunAzimuth: number, sunAltitude: number, out: Float64Array): void;
}

/** Rounds of light between patches; each takes off a factor of the reflectance. */
const ROUNDS = 4;

/** Lines along a patch on which its beam is judged. */
const BEAM_LINES = 6;

/** What every receiver sees of the patches: entries of receiver r from start[r] to start[r + 1]. */
interface ReceiverViews {
  start: Int32Array;
  patch: number[];
  share: number[];
}

/** Share one sighting between along directions `from` and `to` out to the patches seen. */
function spreadOverPatches(
  rows: FiniteRows,
  patches: Patches,
  { stretch, front, slantFrom, slantTo, perAlong }: Sighting,
  v: number,
  from: number,
  to: number,
  give: (patch: number, share: number) => void,
): void {
  const { strips } = patches;
  const { from: begin, to: end } = rows.stretches[stretch];
  const length = (end - begin) / patches.blocks[stretch];
  const first = Math.floor((v + from * perAlong - begin) / length + 1e-9);
  const last = Math.ceil((v + to * perAlong - begin) / length - 1e-9) - 1;
  const top = slantFrom * strips;
  const bottom = Math.max(slantTo * strips, top + 1e-9);
  const topStrip = stripAt(slantFrom, strips);
  let below = alongShare(from);
  for (let block = first; block <= last; block += 1) {
    const edge = block === last ? to : (begin + (block + 1) * length - v) / perAlong;
    const above = alongShare(edge);
    for (let strip = topStrip; strip < strips && strip < bottom; strip += 1) {
      const part = Math.min(strip + 1, bottom) - Math.max(strip, top);
      const share = (part / (bottom - top)) * (above - below);
      if (part > 0) give(patchAt(patches, stretch, front, block, strip), share);
    }
    below = above;
  }
}

/** Sweep all receivers: their straight sky and their views of the patches. */
function sweepReceivers(input: FieldLightInput, rows: FiniteRows, patches: Patches) {
  const { u, v, optics, receiverHeight } = input;
  const count = u.length;
  const straight = new Float64Array(count);
  const views: ReceiverViews = { start: new Int32Array(count + 1), patch: [], share: [] };
  const gathered = new Map<number, number>();
  for (let r = 0; r < count; r += 1) {
    gathered.clear();
    sweepView(rows, optics.transmittance, u[r], v[r], receiverHeight, {
      sky: (share) => {
        straight[r] += share;
      },
      panel: (sighting, from, to, scale) => {
        spreadOverPatches(rows, patches, sighting, v[r], from, to, (patch, share) => {
          gathered.set(patch, (gathered.get(patch) ?? 0) + share * scale);
        });
      },
    });
    for (const [patch, share] of gathered) {
      views.patch.push(patch);
      views.share.push(share);
    }
    views.start[r + 1] = views.patch.length;
  }
  return { straight, views };
}

/** Let light go to and fro between patches; `first` is each patch's irradiance without other patches. */
function settle(first: Float64Array, reflectance: Float64Array, fans: Fans): Float64Array {
  let thrown = first.map((value, i) => value * reflectance[i]);
  for (let round = 0; round < ROUNDS; round += 1) {
    const next = new Float64Array(first.length);
    for (let i = 0; i < first.length; i += 1) {
      let light = first[i];
      for (let e = fans.seenStart[i]; e < fans.seenStart[i + 1]; e += 1) {
        light += fans.seenShare[e] * thrown[fans.seen[e]];
      }
      next[i] = light * reflectance[i];
    }
    thrown = next;
  }
  return thrown;
}

/** Irradiance of each patch straight from a sun, per unit of horizontal beam. */
function straightOnPatches(
  rows: FiniteRows,
  patches: Patches,
  transmittance: number,
  bearing: Bearing,
): Float64Array {
  const out = new Float64Array(patches.count);
  const factor = planeFactor(rows.geometry, bearing.tangent);
  eachPatch(rows, patches, (patch, front, at) => {
    if (front !== factor > 0) return;
    for (let i = 0; i < BEAM_LINES; i += 1) {
      const slant = (i + 0.5) / BEAM_LINES;
      const { u, v, z } = at(slant, 0);
      const ends = [v, at(slant, 1).v] as const;
      const light = meanThrough(rows, transmittance, u, ends, z, bearing);
      out[patch] += (Math.abs(factor) / BEAM_LINES) * light;
    }
  });
  return out;
}

/** Irradiance of each patch from ground lit with `light(u, v)`. */
function fromGround(fans: Fans, albedo: number, light: (u: number, v: number) => number) {
  const out = new Float64Array(fans.sky.length);
  if (albedo === 0) return out;
  for (let i = 0; i < out.length; i += 1) {
    for (let e = fans.groundStart[i]; e < fans.groundStart[i + 1]; e += 1) {
      out[i] += fans.groundShare[e] * albedo * light(fans.groundU[e], fans.groundV[e]);
    }
  }
  return out;
}

/** What receivers get of light thrown by patches, times `open`. */
function gather(views: ReceiverViews, thrown: Float64Array, open: number, out: Float64Array): void {
  for (let r = 0; r < out.length; r += 1) {
    let sum = 0;
    for (let e = views.start[r]; e < views.start[r + 1]; e += 1) {
      sum += views.share[e] * thrown[views.patch[e]];
    }
    out[r] = sum * open;
  }
}

function patchReflectance(rows: FiniteRows, patches: Patches, optics: RowOptics): Float64Array {
  const out = new Float64Array(patches.count);
  eachPatch(rows, patches, (patch, front) => {
    out[patch] = front ? optics.frontReflectance : optics.rearReflectance;
  });
  return out;
}

/**
 * Prepare the light over a field of rows with ends.
 *
 * Shadows of a point sun are exact. Sky light is exact along the rows and summed over the profile
 * angle. Reflections go by patches on the panel faces: beam on 6 lines of each, 192 rays from
 * each to ground, sky and other panels, light of second and higher orders on the ground left out.
 *
 * @throws InputError naming the part of the input that is out of range
 * Validity: level ground, panels without thickness; receivers face up and block nothing.
 */
export function prepareFieldLight(input: FieldLightInput): FieldLight {
  const { geometry, optics, stretches, receiverHeight, u, v } = input;
  requireRowOptics(optics);
  requireWithin('receiverHeight', receiverHeight, 0, 1000, 'm');
  requireWithin('v', v.length, u.length, u.length, 'places, as many as in u');
  const rows = prepareFiniteRows(geometry, stretches);
  const patches = cutPatches(rows);
  const open = 1 - optics.structureShade;
  const { straight, views } = sweepReceivers(input, rows, patches);
  const reflectance = patchReflectance(rows, patches, optics);
  const throws = reflectance.some((value) => value > 0);
  const fans = throws ? followFans(rows, patches, optics.transmittance) : null;
  const skyReflected = new Float64Array(u.length);
  if (fans) {
    const groundSky = prepareGroundSky(rows, optics);
    const first = fromGround(fans, optics.albedo, groundSky).map((value, i) => value + fans.sky[i]);
    gather(views, settle(first, reflectance, fans), open, skyReflected);
  }
  const share = (r: number, bearing: Bearing) =>
    optics.transmittance ** panelsCrossed(rows, u[r], v[r], receiverHeight, bearing);
  return {
    sky: straight.map((value, r) => value * open + skyReflected[r]),
    skyReflected,
    crossed: (sunAzimuth, sunAltitude, r) => {
      const bearing = sunBearing(geometry.surfaceAzimuth, sunAzimuth, sunAltitude);
      return panelsCrossed(rows, u[r], v[r], receiverHeight, bearing);
    },
    beam: (sunAzimuth, sunAltitude, out) => {
      const bearing = sunBearing(geometry.surfaceAzimuth, sunAzimuth, sunAltitude);
      for (let r = 0; r < out.length; r += 1) out[r] = share(r, bearing) * open;
    },
    beamReflected: (sunAzimuth, sunAltitude, out) => {
      out.fill(0);
      if (!fans) return;
      const bearing = sunBearing(geometry.surfaceAzimuth, sunAzimuth, sunAltitude);
      const first = straightOnPatches(rows, patches, optics.transmittance, bearing);
      const ground = fromGround(fans, optics.albedo, (gu, gv) => {
        return open * optics.transmittance ** panelsCrossed(rows, gu, gv, 0, bearing);
      });
      const total = first.map((value, i) => value + ground[i]);
      gather(views, settle(total, reflectance, fans), open, out);
    },
  };
}
