import { planeFactor, type RowOptics } from '../rows/geometry.js';
import { meanThrough, panelsCrossed, type Bearing, type FiniteRows } from './finite-rows.js';
import { prepareGroundSky } from './ground-sky.js';
import { eachPatch, type Patches } from './patches.js';
import { followFans, type Fans } from './ray-fan.js';

/** Rounds of light between patches; each takes off a factor of the reflectance. */
const ROUNDS = 4;

/** Lines along a patch on which its beam is judged. */
const BEAM_LINES = 6;

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

function patchReflectance(rows: FiniteRows, patches: Patches, optics: RowOptics): Float64Array {
  const out = new Float64Array(patches.count);
  eachPatch(rows, patches, (patch, front) => {
    out[patch] = front ? optics.frontReflectance : optics.rearReflectance;
  });
  return out;
}

/** Light that the patches throw, per unit of horizontal light of the sky or a sun. */
export interface Thrown {
  fromSky(): Float64Array;
  fromSun(bearing: Bearing): Float64Array;
}

/** Prepare what the panel faces of a field throw: straight light, light from the ground, exchange. */
export function prepareThrown(rows: FiniteRows, patches: Patches, optics: RowOptics): Thrown {
  const { albedo, transmittance, structureShade } = optics;
  const reflectance = patchReflectance(rows, patches, optics);
  const fans = followFans(rows, patches, transmittance);
  return {
    fromSky: () => {
      const ground = fromGround(fans, albedo, prepareGroundSky(rows, optics));
      return settle(
        ground.map((value, i) => value + fans.sky[i]),
        reflectance,
        fans,
      );
    },
    fromSun: (bearing) => {
      const straight = straightOnPatches(rows, patches, transmittance, bearing);
      const ground = fromGround(fans, albedo, (u, v) => {
        const crossed = panelsCrossed(rows, u, v, 0, bearing);
        return (1 - structureShade) * transmittance ** crossed;
      });
      return settle(
        straight.map((value, i) => value + ground[i]),
        reflectance,
        fans,
      );
    },
  };
}
