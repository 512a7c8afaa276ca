import type { RowOptics } from '../rows/geometry.js';
import type { FiniteRows } from './finite-rows.js';
import { sweepView } from './profile-sweep.js';

/** Ground beyond the rows by this many top heights is taken as open. */
const MARGIN_HEIGHTS = 4;

/** Most cells to a side of the grid. */
const MOST_CELLS = 48;

/**
 * Sky light on the ground between and around the rows, without reflections, read from a grid.
 *
 * @returns share of open ground at a place across and along; 1 outside the grid
 */
export function prepareGroundSky(
  rows: FiniteRows,
  optics: RowOptics,
): (u: number, v: number) => number {
  const { geometry, stretches, places } = rows;
  if (stretches.length === 0) return () => 1;
  const top = geometry.midHeight + (geometry.width / 2) * Math.abs(Math.sin(geometry.tilt));
  const margin = MARGIN_HEIGHTS * top;
  const u0 = places[0] - margin;
  const v0 = Math.min(...stretches.map(({ from }) => from)) - margin;
  const spanU = places[places.length - 1] + margin - u0;
  const spanV = Math.max(...stretches.map(({ to }) => to)) + margin - v0;
  const cells = (span: number) => Math.min(Math.max(Math.ceil(span / (top / 2)), 4), MOST_CELLS);
  const countU = cells(spanU);
  const countV = cells(spanV);
  const grid = new Float64Array(countU * countV);
  const open = 1 - optics.structureShade;
  for (let j = 0; j < countV; j += 1) {
    for (let i = 0; i < countU; i += 1) {
      const u = u0 + ((i + 0.5) / countU) * spanU;
      const v = v0 + ((j + 0.5) / countV) * spanV;
      sweepView(rows, optics.transmittance, u, v, 0, {
        sky: (share) => {
          grid[j * countU + i] += share * open;
        },
      });
    }
  }
  return (u, v) => {
    const i = Math.floor(((u - u0) / spanU) * countU);
    const j = Math.floor(((v - v0) / spanV) * countV);
    if (i < 0 || j < 0 || i >= countU || j >= countV) return 1;
    return grid[j * countU + i];
  };
}
