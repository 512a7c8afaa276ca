import { InputError, requireWithin } from '../../errors.js';
import { prepareBeamShade } from './beam.js';
import {
  profileTangent,
  requireRowGeometry,
  requireRowOptics,
  type RowGeometry,
  type RowOptics,
} from './geometry.js';
import { fillBalance, fillPanelLight, litShare, type PanelLight } from './panel-light.js';
import {
  neighbours,
  prepareReflections,
  type Balance,
  type Quality,
  type Reflections,
} from './reflections.js';
import { skyShare } from './sky-view.js';

/** What endless rows are prepared from. */
export interface EndlessRowsInput {
  geometry: RowGeometry;
  optics: RowOptics;
  /** Height of the canopy top at which light is counted, m. */
  receiverHeight: number;
  /** Receivers across the rows from a row's centre line, positive on the front side, m. */
  positions: Float64Array;
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
  { angles, receivers }: Reflections,
  tangent: number,
  weight: number,
  out: Float64Array,
): void {
  const { row, next, low, high } = neighbours(angles, tangent);
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
 * @throws InputError naming the part of the input that is out of range
 * Validity: long rows (away from their ends), level ground, panels without thickness, diffuse
 * reflection. The receiver itself blocks nothing.
 */
export function prepareEndlessRows(input: EndlessRowsInput): EndlessRows {
  const { geometry, optics, positions, receiverHeight } = input;
  requireRowGeometry(geometry);
  requireRowOptics(optics);
  requireWithin('receiverHeight', receiverHeight, 0, 1e6, 'm');
  if (positions.length === 0) throw new InputError('positions', 'At least one position is needed.');
  const quality = input.quality ?? 'full';
  const count = positions.length;
  const open = 1 - optics.structureShade;
  const reflections = prepareReflections(input, quality);
  const shade = prepareBeamShade(
    geometry,
    optics.transmittance,
    positions,
    receiverHeight,
    input.discSun ?? true,
  );

  const rows: EndlessRows = {
    sky: Float64Array.from(
      positions,
      (u) => skyShare(geometry, optics.transmittance, u, receiverHeight, quality) * open,
    ),
    skyReflected: new Float64Array(count),
    skyPanel: { front: 0, rear: 0, frontReflected: 0, rearReflected: 0 },
    skyBalance: { ground: 0, panel: 0, escaped: 0, structure: 0 },
    tangent: (sunAzimuth, sunAltitude) => profileTangent(geometry, sunAzimuth, sunAltitude),
    beam: (tangent, sunAltitude, out) => {
      shade.shares(tangent, sunAltitude, out);
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
  addSky(rows, reflections.angles);
  return rows;
}

/** An even sky is the sum of beams from all profile angles, each worth cos(a)/2 da. */
function addSky(rows: EndlessRows, angles: number): void {
  const panel: PanelLight = { front: 0, rear: 0, frontReflected: 0, rearReflected: 0 };
  const balance: Balance = { ground: 0, panel: 0, escaped: 0, structure: 0 };
  for (let a = 0; a < angles; a += 1) {
    const from = -Math.PI / 2 + (a / angles) * Math.PI;
    const middle = from + (0.5 / angles) * Math.PI;
    const weight = (Math.sin(from + Math.PI / angles) - Math.sin(from)) / 2;
    const tangent = Math.tan(middle);
    rows.addBeamReflected(tangent, weight, rows.skyReflected);
    rows.beamPanel(tangent, panel);
    rows.beamBalance(tangent, balance);
    rows.skyPanel.front += weight * panel.front;
    rows.skyPanel.rear += weight * panel.rear;
    rows.skyPanel.frontReflected += weight * panel.frontReflected;
    rows.skyPanel.rearReflected += weight * panel.rearReflected;
    rows.skyBalance.ground += weight * balance.ground;
    rows.skyBalance.panel += weight * balance.panel;
    rows.skyBalance.escaped += weight * balance.escaped;
    rows.skyBalance.structure += weight * balance.structure;
  }
  for (let i = 0; i < rows.sky.length; i += 1) rows.sky[i] += rows.skyReflected[i];
}
