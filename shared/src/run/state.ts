import type { Layout } from '../contract/layout.js';
import type { RunInput, Site } from '../contract/run.js';
import { toRadians } from '../light/angles.js';
import { defaultAtmosphere } from '../light/atmosphere.js';
import {
  emptyBandSplit,
  prepareBandTable,
  type BandSplit,
  type BandTable,
} from '../light/band-table.js';
import { emptyLightSums, type LightSums } from '../light/budget.js';
import { fixedRowLight, turningRowLight, type RowLight } from '../light/row-light.js';
import type { Quality } from '../light/rows/reflections.js';
import { noSplit, type SplitSums } from '../light/sun-split.js';
import type { TrackerAxis } from '../light/tracker.js';
import { daysIn } from '../light/weather-year.js';
import { noEnergy, type EnergySums } from '../power/energy.js';
import { siliconCurrent } from '../power/module.js';
import { emptyDaySuns, type DaySuns, type Ground } from './instants.js';
import { filledShare, groundOf, rowsOfLayout, stripMiddles } from './layout-geometry.js';

/** One canopy height at which light is summed. */
export interface PlaneState {
  heightM: number;
  light: RowLight;
  sums: LightSums;
}

/** How a tracker is steered. */
export interface Steering {
  axis: TrackerAxis;
  limit: number;
  groundCover: number;
}

/** Everything a run carries from sun to sun. */
export interface RunState {
  input: RunInput;
  ground: Ground;
  positions: Float64Array;
  days: number;
  suns: DaySuns;
  table: BandTable;
  split: BandSplit;
  planes: PlaneState[];
  steering: Steering | null;
  /** Current per joule of the reference spectrum, for the spectral factor. */
  referenceCurrent: number;
  /** Rated power per land area, W m-2. */
  powerPerLand: number;
  months: SplitSums[];
  energyByMonth: EnergySums[];
  /** The same tracker without its crop-first programme; null where it has none. */
  plainTracker: { light: RowLight; energy: EnergySums; sums: LightSums } | null;
  /** Open-field broadband light by day on the field's plane, J m-2. */
  openEnergy: Float64Array;
}

/** Sun altitude at air mass 1.5, where modules are rated, radians. */
const RATING_ALTITUDE_DEG = 42;

/** What a caller that runs again and again may hold ready. */
export interface Preparation {
  quality: Quality;
  table: BandTable;
  /** Canopy heights to be counted, m. */
  heightsM: number[];
}

const fullPreparation = (input: RunInput): Preparation => ({
  quality: 'full',
  table: tableOf(input.site),
  heightsM: heightsOf(input),
});

function lightOf(
  input: RunInput,
  heightM: number,
  positions: Float64Array,
  quality: Quality,
): RowLight {
  const rows = { ...rowsOfLayout(input.layout, input.site, heightM, positions), quality };
  const { tracker, kind } = input.layout;
  return kind === 'single-axis-tracker' && tracker
    ? turningRowLight(rows, toRadians(tracker.maxAngleDeg))
    : fixedRowLight(rows);
}

/** Make-up of light over a site under cloudless air of its height. */
export const tableOf = (site: Site): BandTable =>
  prepareBandTable(defaultAtmosphere(site.elevationM, site.albedo));

/** Axis and stops of a layout's tracker, in the field's own plane; null for rows that stand still. */
export function steeringOf(layout: Layout): Steering | null {
  if (layout.kind !== 'single-axis-tracker' || !layout.tracker) return null;
  return {
    // The axis lies across the facing; positive rotation turns the front towards the facing.
    axis: { azimuth: toRadians(layout.azimuthDeg) - Math.PI / 2, tilt: 0, crossSlope: 0 },
    limit: toRadians(layout.tracker.maxAngleDeg),
    groundCover: layout.collectorWidthM / layout.pitchM,
  };
}

/** Canopy heights to be counted, each once; bare ground when no crop is given. */
function heightsOf(input: RunInput): number[] {
  const heights = input.crops.map((crop) => crop.canopyHeightM);
  return [...new Set(heights.length > 0 ? heights : [0])].sort((a, b) => a - b);
}

/**
 * Prepare a run: rows at every canopy height, the make-up of light, empty sums.
 *
 * @throws InputError naming what cannot be run
 */
export function prepareRun(
  input: RunInput,
  { quality, table, heightsM }: Preparation = fullPreparation(input),
): RunState {
  const { site, layout, options, weather } = input;
  const positions = stripMiddles(layout.pitchM, options.positions);
  const days = daysIn(weather);
  const cropFirst = layout.tracker?.programme === 'crop-first';
  const ratingRow = table.direct.length / table.directWm2.length;
  const rated = table.direct.subarray(
    RATING_ALTITUDE_DEG * ratingRow,
    (RATING_ALTITUDE_DEG + 1) * ratingRow,
  );
  return {
    input,
    ground: { latitude: site.latitude, longitude: site.longitude, ...groundOf(site) },
    positions,
    days,
    suns: emptyDaySuns(options.sunStepMinutes),
    table,
    split: emptyBandSplit(),
    planes: heightsM.map((heightM) => ({
      heightM,
      light: lightOf(input, heightM, positions, quality),
      sums: emptyLightSums(days, options.positions),
    })),
    steering: steeringOf(layout),
    referenceCurrent: siliconCurrent(rated),
    powerPerLand:
      (layout.module.powerWm2 * filledShare(layout) * layout.collectorWidthM) / layout.pitchM,
    months: Array.from({ length: 12 }, noSplit),
    energyByMonth: Array.from({ length: 12 }, noEnergy),
    plainTracker: cropFirst
      ? {
          light: lightOf(input, heightsM[0], positions, quality),
          energy: noEnergy(),
          sums: emptyLightSums(days, options.positions),
        }
      : null,
    openEnergy: new Float64Array(days),
  };
}
