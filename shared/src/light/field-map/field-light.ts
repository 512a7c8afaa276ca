import { requireWithin } from '../../errors.js';
import { stripAt } from '../rows/elements.js';
import { requireRowOptics, type RowGeometry, type RowOptics } from '../rows/geometry.js';
import {
  panelsCrossed,
  prepareFiniteRows,
  sunBearing,
  type Bearing,
  type FiniteRows,
  type RowStretch,
} from './finite-rows.js';
import { cutPatches, patchAt, type Patches } from './patches.js';
import { alongShare, sweepView, type Sighting } from './profile-sweep.js';
import { prepareThrown } from './thrown.js';

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
  scale: number,
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
      const share = (part / (bottom - top)) * (above - below) * scale;
      if (part > 0) give(patchAt(patches, stretch, front, block, strip), share);
    }
    below = above;
  }
}

/**
 * Sweep all receivers: their straight sky and, where panels throw light, their views of the patches.
 */
function sweepReceivers(input: FieldLightInput, rows: FiniteRows, patches: Patches | null) {
  const { u, v, optics, receiverHeight } = input;
  const count = u.length;
  const straight = new Float64Array(count);
  const views: ReceiverViews = { start: new Int32Array(count + 1), patch: [], share: [] };
  const gathered = new Float64Array(patches?.count ?? 0);
  const touched: number[] = [];
  const give = (patch: number, share: number): void => {
    if (gathered[patch] === 0) touched.push(patch);
    gathered[patch] += share;
  };
  for (let r = 0; r < count; r += 1) {
    sweepView(rows, optics.transmittance, u[r], v[r], receiverHeight, {
      sky: (share) => {
        straight[r] += share;
      },
      panel: patches
        ? (sighting, from, to, scale) => {
            spreadOverPatches(rows, patches, sighting, v[r], from, to, scale, give);
          }
        : undefined,
    });
    for (const patch of touched) {
      views.patch.push(patch);
      views.share.push(gathered[patch]);
      gathered[patch] = 0;
    }
    touched.length = 0;
    views.start[r + 1] = views.patch.length;
  }
  return { straight, views };
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
  const open = 1 - optics.structureShade;
  const throws = optics.frontReflectance > 0 || optics.rearReflectance > 0;
  const patches = throws ? cutPatches(rows) : null;
  const { straight, views } = sweepReceivers(input, rows, patches);
  const thrown = patches ? prepareThrown(rows, patches, optics) : null;
  const skyReflected = new Float64Array(u.length);
  if (thrown) gather(views, thrown.fromSky(), open, skyReflected);
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
      if (!thrown) return;
      const bearing = sunBearing(geometry.surfaceAzimuth, sunAzimuth, sunAltitude);
      gather(views, thrown.fromSun(bearing), open, out);
    },
  };
}
