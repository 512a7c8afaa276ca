import { prepareTransfers } from './bundles.js';
import { elementCount, type Cut } from './elements.js';
import type { RowGeometry, RowOptics } from './geometry.js';

/** How light kept by the elements ends up after all reflections. */
export interface Exchange {
  /**
   * settled[j * n + i]: light kept by element j over all orders, per unit first kept by i (power
   * per pitch, per metre of row).
   */
  settled: Float64Array;
  /** Share of light thrown back by element i that leaves to the sky. */
  escaping: Float64Array;
  /** Share of kept light that each element throws back. */
  reflected: Float64Array;
}

/** Share of the light kept by an element that it throws back. */
function thrownBack(optics: RowOptics, cut: Cut): Float64Array {
  const kept = 1 - optics.transmittance;
  const shares = new Float64Array(elementCount(cut));
  // Posts and sub-frames take their share before the ground does.
  shares.fill(optics.albedo * (1 - optics.structureShade), 0, cut.ground);
  shares.fill(optics.frontReflectance / kept, cut.ground, cut.ground + cut.face);
  shares.fill(optics.rearReflectance / kept, cut.ground + cut.face);
  return shares;
}

/**
 * Invert in place by Gauss-Jordan without pivoting: the system is diagonally dominant, since no
 * element throws back more than it keeps.
 */
function invert(matrix: Float64Array, n: number): Float64Array {
  for (let column = 0; column < n; column += 1) {
    const pivotRow = matrix.subarray(column * n, (column + 1) * n);
    const inverse = 1 / pivotRow[column];
    pivotRow[column] = 1;
    for (let j = 0; j < n; j += 1) pivotRow[j] *= inverse;
    for (let row = 0; row < n; row += 1) {
      if (row === column) continue;
      const start = row * n;
      const factor = matrix[start + column];
      if (factor === 0) continue;
      matrix[start + column] = 0;
      for (let j = 0; j < n; j += 1) matrix[start + j] -= factor * pivotRow[j];
    }
  }
  return matrix;
}

/**
 * Diffuse exchange between ground and both panel faces, all orders of reflection, over endless rows.
 *
 * Source: radiosity method (Siegel & Howell, Thermal Radiation Heat Transfer) in the plane across
 * the rows. Columns of the exchange sum to 1, so light is conserved to rounding.
 */
export function prepareExchange(geometry: RowGeometry, optics: RowOptics, cut: Cut): Exchange {
  const n = elementCount(cut);
  const reflected = thrownBack(optics, cut);
  const { transfer, escaping } = prepareTransfers(geometry, optics.transmittance, cut);
  for (let j = 0; j < n; j += 1) {
    for (let i = 0; i < n; i += 1) {
      transfer[j * n + i] = (i === j ? 1 : 0) - transfer[j * n + i] * reflected[i];
    }
  }
  return { settled: invert(transfer, n), escaping, reflected };
}
