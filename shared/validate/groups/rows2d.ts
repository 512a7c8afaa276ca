import { join } from 'node:path';
import { toRadians } from '../../src/light/angles.js';
import { prepareEndlessRows, type EndlessRows } from '../../src/light/rows/endless.js';
import { shadedShare, type RowGeometry } from '../../src/light/rows/geometry.js';
import type { PanelLight } from '../../src/light/rows/panel-light.js';
import { ErrorTally, type Group } from '../quantity.js';
import { numberOf, readTable, type TableRow } from '../read-table.js';

const NAME = 'rows2d';
const POINTS = 'physics/rows2d_points.csv';
const GEOMETRIES = 'physics/rows2d_geoms.csv';

/** Receivers closer to a shadow edge than this may fall either way by rounding, m. */
const EDGE = 1e-6;

const geometryOf = (row: TableRow): RowGeometry => ({
  pitch: numberOf(row, 'pitch_m'),
  width: numberOf(row, 'collector_width_m'),
  tilt: toRadians(numberOf(row, 'tilt')),
  midHeight: numberOf(row, 'hub_height_m'),
  surfaceAzimuth: toRadians(numberOf(row, 'surface_azimuth')),
});

const BLACK = {
  transmittance: 0,
  frontReflectance: 0,
  rearReflectance: 0,
  albedo: 0,
  structureShade: 0,
};

/** Sun of the geometry's line: altitude and the tangent that the rows see it under. */
function sunOf(row: TableRow, rows: EndlessRows): { altitude: number; tangent: number } {
  const altitude = toRadians(90 - numberOf(row, 'sun_zenith'));
  return { altitude, tangent: rows.tangent(toRadians(numberOf(row, 'sun_azimuth')), altitude) };
}

function tallies() {
  return {
    sky: new ErrorTally(NAME, 'sky view', 'of open sky', 0.001),
    state: new ErrorTally(NAME, 'lit or shaded', 'of beam', 1e-9),
    tangent: new ErrorTally(NAME, 'profile tangent', 'relative', 1e-6),
    shaded: new ErrorTally(NAME, 'shaded share of the ground', '', 1e-6),
    lit: new ErrorTally(NAME, 'lit share of the panel', '', 1e-6),
    faces: new ErrorTally(NAME, 'sky view of the panel faces', '', 0.001),
    beam: new ErrorTally(NAME, 'beam on the panel faces', 'relative', 1e-4),
  };
}

function compareGeometry(
  tally: ReturnType<typeof tallies>,
  row: TableRow,
  points: TableRow[],
): void {
  const geometry = geometryOf(row);
  const rows = prepareEndlessRows({
    geometry,
    optics: BLACK,
    receiverHeight: 0,
    positions: Float64Array.from(points, (point) => numberOf(point, 'u_m')),
    discSun: false,
  });
  const { altitude, tangent } = sunOf(row, rows);
  const shares = new Float64Array(points.length);
  rows.beam(tangent, altitude, shares);
  points.forEach((point, i) => {
    tally.sky.add(rows.sky[i] - numberOf(point, 'svf_exact'));
    if (numberOf(point, 'dist_to_shadow_edge_m') < EDGE) return;
    tally.state.add(shares[i] - numberOf(point, 'sunlit'));
  });
  const wantTangent = numberOf(row, 'tan_proj_zenith_toward_az');
  tally.tangent.add((tangent - wantTangent) / Math.max(1, Math.abs(wantTangent)));
  tally.shaded.add(shadedShare(geometry, tangent) - (1 - numberOf(row, 'unshaded_fraction_own')));
  tally.lit.add(rows.litShare(tangent) - (1 - numberOf(row, 'row_shaded_fraction_own')));
  tally.faces.add(rows.skyPanel.front - numberOf(row, 'row_front_sky_vf_mean'));
  tally.faces.add(rows.skyPanel.rear - numberOf(row, 'row_back_sky_vf_mean'));
  const panel: PanelLight = { front: 0, rear: 0, frontReflected: 0, rearReflected: 0 };
  rows.beamPanel(tangent, panel);
  const beam = numberOf(row, 'dni') * Math.sin(altitude) * (panel.front + panel.rear);
  const want = numberOf(row, 'row_beam_both_sides_W_m2');
  tally.beam.add((beam - want) / want);
}

/** Endless rows against an independent two-dimensional computation. */
export const rows2d: Group = {
  name: NAME,
  files: [POINTS, GEOMETRIES],
  source: 'independent 2D view factors and shadow geometry (two programs)',
  compare(folder) {
    const points = readTable(join(folder, POINTS));
    const tally = tallies();
    for (const row of readTable(join(folder, GEOMETRIES))) {
      compareGeometry(
        tally,
        row,
        points.filter((point) => point.geom === row.geom),
      );
    }
    return Object.values(tally).map((quantity) => quantity.judge());
  },
};
