import { DEG } from './angles.js';
import { prepareBeamPassage } from './rows/along-gaps.js';
import { prepareBeamShade, sortReceivers } from './rows/beam.js';
import { prepareEndlessRows, type EndlessRows, type EndlessRowsInput } from './rows/endless.js';
import { planeFactor, type RowGeometry } from './rows/geometry.js';
import type { PanelLight } from './rows/panel-light.js';
import type { Balance } from './rows/reflections.js';

/** Light under rows that stand still or turn, at one canopy height, for one sun after another. */
export interface RowLight {
  /** Share of an even sky at each receiver for the current rotation. */
  sky: Float64Array;
  /** Share of the horizontal beam at each receiver, reflections included, for the current sun. */
  beam: Float64Array;
  skyPanel: PanelLight;
  beamPanel: PanelLight;
  skyBalance: Balance;
  beamBalance: Balance;
  /** Irradiance of the panel plane per horizontal beam; negative where the rear is lit. */
  planeFactor: number;
  /** Share of the lit face that no other row shades. */
  litShare: number;
  /** Move to a sun and (for trackers) a rotation, radians; positive turns to the front azimuth. */
  set(sunAzimuth: number, sunAltitude: number, rotation: number): void;
}

const noPanel = (): PanelLight => ({ front: 0, rear: 0, frontReflected: 0, rearReflected: 0 });
const noBalance = (): Balance => ({ ground: 0, panel: 0, escaped: 0, structure: 0 });

/** Rows that stand still. */
export function fixedRowLight(input: EndlessRowsInput): RowLight {
  const rows = prepareEndlessRows(input);
  const beam = new Float64Array(input.positions.length);
  const light: RowLight = {
    sky: rows.sky,
    beam,
    skyPanel: rows.skyPanel,
    beamPanel: noPanel(),
    skyBalance: rows.skyBalance,
    beamBalance: noBalance(),
    planeFactor: 1,
    litShare: 1,
    set(sunAzimuth, sunAltitude) {
      const tangent = rows.tangent(sunAzimuth, sunAltitude);
      rows.beam(tangent, sunAltitude, beam);
      rows.addBeamReflected(tangent, 1, beam);
      rows.beamPanel(tangent, light.beamPanel);
      rows.beamBalance(tangent, light.beamBalance);
      light.planeFactor = planeFactor(input.geometry, tangent);
      light.litShare = rows.litShare(tangent);
    },
  };
  return light;
}

/** Step of the rotations at which a tracker's sky and reflections are prepared, radians. */
const ROTATION_STEP = { full: 3 * DEG, preview: 12 * DEG } as const;

function mixPanel(a: PanelLight, b: PanelLight, share: number, out: PanelLight): void {
  out.front = a.front * (1 - share) + b.front * share;
  out.rear = a.rear * (1 - share) + b.rear * share;
  out.frontReflected = a.frontReflected * (1 - share) + b.frontReflected * share;
  out.rearReflected = a.rearReflected * (1 - share) + b.rearReflected * share;
}

function mixBalance(a: Balance, b: Balance, share: number, out: Balance): void {
  out.ground = a.ground * (1 - share) + b.ground * share;
  out.panel = a.panel * (1 - share) + b.panel * share;
  out.escaped = a.escaped * (1 - share) + b.escaped * share;
  out.structure = a.structure * (1 - share) + b.structure * share;
}

/**
 * Rows that turn about their middle. Receivers must lie symmetric about a row's centre line, so
 * that a turn to the other side is the mirrored row.
 *
 * Beam shadows are exact for every rotation; the sky's light and reflections are interpolated
 * between rotations 3 degrees apart (error below 0.001 of open field; a preview takes 12 degrees).
 *
 * @param input rows at rotation 0: tilt is ignored, surfaceAzimuth is where positive turns face
 * @param maxRotation largest rotation, radians
 */
export function turningRowLight(input: EndlessRowsInput, maxRotation: number): RowLight {
  const steps = Math.max(1, Math.ceil(maxRotation / ROTATION_STEP[input.quality ?? 'full'] - 1e-9));
  const grid: EndlessRows[] = [];
  const geometryAt = (rotation: number): RowGeometry => ({ ...input.geometry, tilt: rotation });
  for (let i = 0; i <= steps; i += 1) {
    grid.push(
      prepareEndlessRows({
        ...input,
        geometry: geometryAt((maxRotation * i) / steps),
        quality: 'preview',
      }),
    );
  }
  const count = input.positions.length;
  const receivers = sortReceivers(input.positions, input.geometry.pitch);
  const direct = new Float64Array(count);
  const reflected = new Float64Array(count);
  const panels = [noPanel(), noPanel()];
  const balances = [noBalance(), noBalance()];
  const open = 1 - input.optics.structureShade;
  const light: RowLight = {
    sky: new Float64Array(count),
    beam: new Float64Array(count),
    skyPanel: noPanel(),
    beamPanel: noPanel(),
    skyBalance: noBalance(),
    beamBalance: noBalance(),
    planeFactor: 1,
    litShare: 1,
    set(sunAzimuth, sunAltitude, rotation) {
      const turned = rotation < 0;
      const facing = turned ? sunAzimuth + Math.PI : sunAzimuth;
      const place = Math.min((Math.abs(rotation) / maxRotation) * steps, steps);
      const low = Math.min(Math.floor(place), steps - 1);
      const share = place - low;
      const a = grid[low];
      const b = grid[low + 1];
      const tangent = a.tangent(facing, sunAltitude);
      const geometry = geometryAt(Math.abs(rotation));
      const shade = prepareBeamShade(
        geometry,
        input.optics.transmittance,
        receivers,
        input.receiverHeight,
        input.discSun ?? true,
      );
      const through = input.gaps
        ? prepareBeamPassage(geometry, input.optics.transmittance, input.gaps)
        : undefined;
      shade.shares(tangent, sunAltitude, direct, through?.(tangent, sunAltitude));
      reflected.fill(0);
      a.addBeamReflected(tangent, 1 - share, reflected);
      b.addBeamReflected(tangent, share, reflected);
      for (let i = 0; i < count; i += 1) {
        const from = turned ? count - 1 - i : i;
        light.beam[i] = direct[from] * open + reflected[from];
        light.sky[i] = a.sky[from] * (1 - share) + b.sky[from] * share;
      }
      mixPanel(a.skyPanel, b.skyPanel, share, light.skyPanel);
      mixBalance(a.skyBalance, b.skyBalance, share, light.skyBalance);
      a.beamPanel(tangent, panels[0]);
      b.beamPanel(tangent, panels[1]);
      mixPanel(panels[0], panels[1], share, light.beamPanel);
      a.beamBalance(tangent, balances[0]);
      b.beamBalance(tangent, balances[1]);
      mixBalance(balances[0], balances[1], share, light.beamBalance);
      light.planeFactor = planeFactor(geometry, tangent);
      const depth = (geometry.width * Math.abs(light.planeFactor)) / geometry.pitch;
      light.litShare = depth <= 1 ? 1 : 1 / depth;
    },
  };
  return light;
}
