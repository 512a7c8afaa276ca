import type { RowGeometry, RowOptics } from './geometry.js';
import { elementCount, followRay, type Cut } from './trace.js';

/** Points per strip from which its view is taken. */
const POINTS = 3;

/**
 * How light kept by one element ends up after all reflections.
 *
 * `settled[j * n + i]`: total light kept by element j, all orders, per unit first kept by element i
 * (power per pitch, per metre of row). `escaping[i]`: share that leaves to the sky of light
 * thrown back by element i.
 */
export interface Exchange {
  settled: Float64Array;
  escaping: Float64Array;
  /** Share of kept light that each element throws back. */
  reflected: Float64Array;
}

/** Share of the light kept by an element that it throws back. */
function thrownBack(optics: RowOptics, cut: Cut): Float64Array {
  const kept = 1 - optics.transmittance;
  const shares = new Float64Array(elementCount(cut));
  shares.fill(optics.albedo, 0, cut.ground);
  shares.fill(optics.frontReflectance / kept, cut.ground, cut.ground + cut.face);
  shares.fill(optics.rearReflectance / kept, cut.ground + cut.face);
  return shares;
}

/** Middle and outward normal of a point on an element. */
function pointOn(geometry: RowGeometry, cut: Cut, element: number, share: number) {
  if (element < cut.ground) {
    return { u: ((element + share) / cut.ground) * geometry.pitch, z: 0, normal: [0, 1] as const };
  }
  const face = element - cut.ground;
  const rear = face >= cut.face;
  const strip = rear ? face - cut.face : face;
  const q = ((strip + share) / cut.face - 0.5) * geometry.width;
  const c = Math.cos(geometry.tilt);
  const s = Math.sin(geometry.tilt);
  const sign = rear ? -1 : 1;
  return { u: q * c, z: geometry.midHeight - q * s, normal: [sign * s, sign * c] as const };
}

/**
 * View of every element: transfer[j * n + i] is the share of light thrown back by i (diffuse) that
 * j keeps. Directions are spaced evenly in the sine, so that each carries the same light; columns
 * and the escaping share sum to 1.
 */
function transfers(geometry: RowGeometry, cut: Cut, transmittance: number) {
  const n = elementCount(cut);
  const transfer = new Float64Array(n * n);
  const escaping = new Float64Array(n);
  const weight = 1 / (POINTS * cut.directions);
  for (let i = 0; i < n; i += 1) {
    const add = (j: number, share: number) => {
      transfer[j * n + i] += share;
    };
    for (let point = 0; point < POINTS; point += 1) {
      const { u, z, normal } = pointOn(geometry, cut, i, (point + 0.5) / POINTS);
      for (let d = 0; d < cut.directions; d += 1) {
        const sine = -1 + (2 * (d + 0.5)) / cut.directions;
        const cosine = Math.sqrt(1 - sine * sine);
        const dirU = normal[0] * cosine + normal[1] * sine;
        const dirZ = normal[1] * cosine - normal[0] * sine;
        escaping[i] += followRay(geometry, cut, transmittance, u, z, dirU, dirZ, weight, add);
      }
    }
  }
  return { transfer, escaping };
}

/** Solve (I - transfer x reflected) x = unit vectors by Gauss-Jordan; well conditioned, shares below 1. */
function invert(matrix: Float64Array, n: number): Float64Array {
  const inverse = new Float64Array(n * n);
  for (let i = 0; i < n; i += 1) inverse[i * n + i] = 1;
  for (let column = 0; column < n; column += 1) {
    const pivot = matrix[column * n + column];
    for (let j = 0; j < n; j += 1) {
      matrix[column * n + j] /= pivot;
      inverse[column * n + j] /= pivot;
    }
    for (let row = 0; row < n; row += 1) {
      const factor = matrix[row * n + column];
      if (row === column || factor === 0) continue;
      for (let j = 0; j < n; j += 1) {
        matrix[row * n + j] -= factor * matrix[column * n + j];
        inverse[row * n + j] -= factor * inverse[column * n + j];
      }
    }
  }
  return inverse;
}

/**
 * Diffuse exchange between ground and both panel faces, all orders of reflection, over endless rows.
 *
 * Source: radiosity method (Siegel & Howell, Thermal Radiation Heat Transfer) in the plane across
 * the rows; views by evenly weighted directions, so light is conserved to rounding.
 */
export function prepareExchange(geometry: RowGeometry, optics: RowOptics, cut: Cut): Exchange {
  const n = elementCount(cut);
  const reflected = thrownBack(optics, cut);
  const { transfer, escaping } = transfers(geometry, cut, optics.transmittance);
  const system = new Float64Array(n * n);
  for (let j = 0; j < n; j += 1) {
    for (let i = 0; i < n; i += 1) {
      system[j * n + i] = (i === j ? 1 : 0) - transfer[j * n + i] * reflected[i];
    }
  }
  return { settled: invert(system, n), escaping, reflected };
}
