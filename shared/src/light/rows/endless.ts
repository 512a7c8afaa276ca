import { InputError, requireWithin } from '../../errors.js';
import {
  meanRowOptics,
  prepareBeamPassage,
  prepareSkyPassage,
  requireGaps,
  type AlongRowGaps,
} from './along-gaps.js';
import { prepareBeamShade, sortReceivers } from './beam.js';
import {
  profileTangent,
  requireRowGeometry,
  requireRowOptics,
  type RowGeometry,
  type RowOptics,
} from './geometry.js';
import {
  fillBalance,
  fillPanelLight,
  litShare,
  skyBalance,
  skyPanelLight,
  type PanelLight,
} from './panel-light.js';
import {
  neighbours,
  prepareReflections,
  type Balance,
  type Quality,
  type Reflections,
} from './reflections.js';
import { prepareSkyView } from './sky-view.js';

/** What endless rows are prepared from. */
export interface EndlessRowsInput {
  geometry: RowGeometry;
  optics: RowOptics;
  /** Height of the canopy top at which light is counted, m. */
  receiverHeight: number;
  /** Receivers across the rows from a row's centre line, positive on the front side, m. */
  positions: Float64Array;
  /** Gaps between modules along the rows; light is then the mean along the row. */
  gaps?: AlongRowGaps;
  /** Soften shadow edges by the sun's disc; default true. */
  discSun?: boolean;
  /** `preview` cuts surfaces and directions more coarsely; default `full`. */
  quality?: Quality;
}

/** Light under endless rows of one geometry, ready to be asked for any sun. */
export interface EndlessRows {
  /** Share of an even sky's horizontal light at each receiver, reflections included. */
  sky: Float64Array;
  /** The reflected part of `sky`. */
  skyReflected: Float64Array;
  skyPanel: PanelLight;
  skyBalance: Balance;
  tangent(sunAzimuth: number, sunAltitude: number): number;
  /** Share of the unobstructed horizontal beam at each receiver, without reflections. */
  beam(tangent: number, sunAltitude: number, out: Float64Array): void;
  /** Adds the reflected part of the beam, times `weight`, to `out`. */
  addBeamReflected(tangent: number, weight: number, out: Float64Array): void;
  beamPanel(tangent: number, out: PanelLight): void;
  beamBalance(tangent: number, out: Balance): void;
  /** Share of the lit face that no other row shades, 0-1. */
  litShare(tangent: number): number;
}

/** Add the reflected beam at all receivers, times `weight`. */
function addReflected(
  reflections: Reflections,
  tangent: number,
  weight: number,
  out: Float64Array,
): void {
  const { row, next, low, high } = neighbours(reflections, tangent);
  const { receivers } = reflections;
  const count = out.length;
  for (let i = 0; i < count; i += 1) {
    out[i] += weight * (low * receivers[row * count + i] + high * receivers[next * count + i]);
  }
}

/**
 * Prepare the light under endless parallel rows.
 *
 * Beam shadows are exact (softened by the sun's disc), the sky's light is exact over all rows, and
 * reflections of both faces and the ground are followed through all orders on strips.
 *
 * With gaps along the row, values are means along it; reflections then take each row as evenly
 * filled.
 *
 * @throws InputError naming the part of the input that is out of range
 * Validity: long rows (away from their ends), level ground, panels without thickness, diffuse
 * reflection. The receiver itself blocks nothing.
 */
export function prepareEndlessRows(input: EndlessRowsInput): EndlessRows {
  const { geometry, positions, receiverHeight, gaps } = input;
  requireRowGeometry(geometry);
  requireRowOptics(input.optics);
  if (gaps) requireGaps(gaps);
  requireWithin('receiverHeight', receiverHeight, 0, 1e6, 'm');
  if (positions.length === 0) throw new InputError('positions', 'At least one position is needed.');
  const quality = input.quality ?? 'full';
  const count = positions.length;
  const open = 1 - input.optics.structureShade;
  const optics = meanRowOptics(input.optics, gaps);
  const reflections = prepareReflections({ ...input, optics }, quality);
  const { transmittance } = input.optics;
  const passage = prepareBeamPassage(geometry, transmittance, gaps);
  const shade = prepareBeamShade(
    geometry,
    optics.transmittance,
    sortReceivers(positions, geometry.pitch),
    receiverHeight,
    input.discSun ?? true,
  );

  const skyPassage = prepareSkyPassage(geometry, transmittance, gaps);
  const skyView = prepareSkyView(geometry, receiverHeight, skyPassage, quality);
  const skyReflected = reflections.sky.receivers;
  const rows: EndlessRows = {
    sky: positions.map((u, i) => skyView.share(u) * open + skyReflected[i]),
    skyReflected,
    skyPanel: skyPanelLight(reflections, geometry, optics),
    skyBalance: skyBalance(reflections, optics),
    tangent: (sunAzimuth, sunAltitude) => profileTangent(geometry, sunAzimuth, sunAltitude),
    beam: (tangent, sunAltitude, out) => {
      shade.shares(tangent, sunAltitude, out, passage(tangent, sunAltitude));
      if (open < 1) for (let i = 0; i < count; i += 1) out[i] *= open;
    },
    addBeamReflected: (tangent, weight, out) => {
      addReflected(reflections, tangent, weight, out);
    },
    beamPanel: (tangent, out) => {
      fillPanelLight(reflections, geometry, optics.transmittance, tangent, out);
    },
    beamBalance: (tangent, out) => {
      fillBalance(reflections, geometry, optics, tangent, out);
    },
    litShare: (tangent) => litShare(geometry, tangent),
  };
  return rows;
}
