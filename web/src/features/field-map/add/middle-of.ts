import type { Boundary, LonLat } from '@furrowlight/shared/contract/fields';

/** Mean of the outer corners: a place for the label and the pin. */
export function middleOf(boundary: Boundary): LonLat {
  const corners = boundary.coordinates[0].slice(0, -1);
  const mean = (axis: 0 | 1) =>
    Number((corners.reduce((sum, corner) => sum + corner[axis], 0) / corners.length).toFixed(7));
  return [mean(0), mean(1)];
}
