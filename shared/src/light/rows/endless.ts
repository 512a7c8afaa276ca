import { InputError, requireWithin } from '../../errors.js';
import { prepareBeamShade } from './beam.js';
import { firstKept } from './deposit.js';
import { prepareExchange } from './exchange.js';
import {
  planeFactor,
  profileTangent,
  requireRowGeometry,
  requireRowOptics,
  type RowGeometry,
  type RowOptics,
} from './geometry.js';
import { addReceiverView } from './receiver-view.js';
import { skyShare } from './sky-view.js';
import { elementCount, type Cut } from './trace.js';

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
  quality?: 'full' | 'preview';
}

/** Where one unit of horizontal light over one pitch of land ends; parts sum to 1. */
export interface Balance {
  ground: number;
  panel: number;
  escaped: number;
  structure: number;
}

/** Irradiance of the panel faces per unit horizontal light. */
export interface PanelLight {
  front: number;
  rear: number;
  /** Of these, by reflection from ground and other panels. */
  frontReflected: number;
  rearReflected: number;
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

const CUTS = {
  full: { ground: 32, face: 24, directions: 120 },
  preview: { ground: 12, face: 8, directions: 36 },
} satisfies Record<'full' | 'preview', Cut>;

/** Profile angles at which reflections are tabulated, per half turn. */
const ANGLES = { full: 360, preview: 90 } as const;

/** Table values by profile angle: a row per angle, columns as named. */
interface ReflectionTable {
  angles: number;
  /** Reflected share at receivers, angles x receivers. */
  receivers: Float64Array;
  /** ground, panel, escaped; frontReflected, rearReflected (irradiance), angles x 5. */
  sums: Float64Array;
}

/** Share of each receiver's upper view that each face strip fills: receivers x strips of both faces. */
function receiverViews(
  input: EndlessRowsInput,
  cut: Cut,
  quality: 'full' | 'preview',
): Float64Array {
  const { geometry, optics, positions, receiverHeight } = input;
  const strips = 2 * cut.face;
  const views = new Float64Array(positions.length * strips);
  for (let i = 0; i < positions.length; i += 1) {
    const row = views.subarray(i * strips, (i + 1) * strips);
    const { transmittance } = optics;
    addReceiverView(geometry, transmittance, cut.face, positions[i], receiverHeight, quality, row);
  }
  return views;
}

function tabulate(input: EndlessRowsInput, quality: 'full' | 'preview'): ReflectionTable {
  const { geometry, optics, positions } = input;
  const cut = CUTS[quality];
  const n = elementCount(cut);
  const angles = ANGLES[quality];
  const exchange = prepareExchange(geometry, optics, cut);
  const views = receiverViews(input, cut, quality);
  const strips = 2 * cut.face;
  const stripArea = geometry.width / cut.face;
  const table: ReflectionTable = {
    angles,
    receivers: new Float64Array(angles * positions.length),
    sums: new Float64Array(angles * 5),
  };
  const settled = new Float64Array(n);
  for (let a = 0; a < angles; a += 1) {
    const angle = -Math.PI / 2 + ((a + 0.5) / angles) * Math.PI;
    // Held per unit of light along the profile ray: per unit of horizontal light it would grow
    // without limit towards the horizon and not bear interpolation.
    const scale = Math.cos(angle);
    const first = firstKept(geometry, optics.transmittance, cut, Math.tan(angle));
    settled.fill(0);
    for (let j = 0; j < n; j += 1) {
      for (let i = 0; i < n; i += 1) settled[j] += exchange.settled[j * n + i] * first[i];
    }
    let ground = 0;
    let panel = 0;
    let escaped = 0;
    let front = 0;
    let rear = 0;
    for (let j = 0; j < n; j += 1) {
      const absorbed = settled[j] * (1 - exchange.reflected[j]);
      escaped += settled[j] * exchange.reflected[j] * exchange.escaping[j];
      if (j < cut.ground) ground += absorbed;
      else panel += absorbed;
      const extra = (settled[j] - first[j]) / (1 - optics.transmittance);
      if (j >= cut.ground && j < cut.ground + cut.face) front += extra;
      else if (j >= cut.ground + cut.face) rear += extra;
    }
    // Elements hold light per pitch of unit light; per area of panel it is x pitch / width.
    const perArea = geometry.width > 0 ? geometry.pitch / geometry.width : 0;
    table.sums.set(
      [ground, panel, escaped, front * perArea, rear * perArea].map((value) => value * scale),
      a * 5,
    );
    for (let r = 0; r < positions.length; r += 1) {
      let sum = 0;
      for (let e = 0; e < strips; e += 1) {
        const j = cut.ground + e;
        sum += views[r * strips + e] * settled[j] * exchange.reflected[j];
      }
      table.receivers[a * positions.length + r] = (sum * geometry.pitch * scale) / stripArea;
    }
  }
  return table;
}

/** A tangent's two neighbouring table rows with their weights (per unit horizontal light). */
interface Place {
  row: number;
  next: number;
  low: number;
  high: number;
}

function place(table: ReflectionTable, tangent: number): Place {
  const angle = Math.atan(tangent);
  const at = (angle / Math.PI + 0.5) * table.angles - 0.5;
  const row = Math.min(Math.max(Math.floor(at), 0), table.angles - 1);
  const share = Math.min(Math.max(at - row, 0), 1);
  const perHorizontal = 1 / Math.cos(angle);
  return {
    row,
    next: Math.min(row + 1, table.angles - 1),
    low: (1 - share) * perHorizontal,
    high: share * perHorizontal,
  };
}

/** Light of the panel faces straight from a beam, averaged over the slant, per unit horizontal light. */
function directPanel(geometry: RowGeometry, transmittance: number, tangent: number): number {
  const depth = (geometry.width * Math.abs(planeFactor(geometry, tangent))) / geometry.pitch;
  if (depth <= 1) return Math.abs(planeFactor(geometry, tangent));
  const full = Math.floor(depth);
  const part = depth - full;
  const through =
    (1 - part) * Math.pow(transmittance, full) + part * Math.pow(transmittance, full + 1);
  return ((1 - through) / (1 - transmittance)) * (geometry.pitch / geometry.width);
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
  const table = tabulate(input, quality);
  const shade = prepareBeamShade(
    geometry,
    optics.transmittance,
    positions,
    receiverHeight,
    input.discSun ?? true,
  );

  const addBeamReflected = (tangent: number, weight: number, out: Float64Array): void => {
    const { row, next, low, high } = place(table, tangent);
    const a = weight * low * open;
    const b = weight * high * open;
    for (let i = 0; i < count; i += 1) {
      out[i] += a * table.receivers[row * count + i] + b * table.receivers[next * count + i];
    }
  };

  const beamPanel = (tangent: number, out: PanelLight): void => {
    const { row, next, low, high } = place(table, tangent);
    const { sums } = table;
    const direct = directPanel(geometry, optics.transmittance, tangent);
    const onFront = planeFactor(geometry, tangent) > 0;
    out.frontReflected = sums[row * 5 + 3] * low + sums[next * 5 + 3] * high;
    out.rearReflected = sums[row * 5 + 4] * low + sums[next * 5 + 4] * high;
    out.front = out.frontReflected + (onFront ? direct : 0);
    out.rear = out.rearReflected + (onFront ? 0 : direct);
  };

  const beamBalance = (tangent: number, out: Balance): void => {
    const { row, next, low, high } = place(table, tangent);
    const { sums } = table;
    const ground = sums[row * 5] * low + sums[next * 5] * high;
    out.ground = ground * open;
    out.structure = ground * optics.structureShade;
    out.panel = sums[row * 5 + 1] * low + sums[next * 5 + 1] * high;
    out.escaped = 1 - out.ground - out.structure - out.panel;
  };

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
    addBeamReflected,
    beamPanel,
    beamBalance,
    litShare: (tangent) => {
      const depth = (geometry.width * Math.abs(planeFactor(geometry, tangent))) / geometry.pitch;
      return depth <= 1 ? 1 : 1 / depth;
    },
  };
  addSky(rows, table.angles);
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
