import type { ModuleSpec } from '../contract/layout.js';
import { DIFFUSE_MODIFIER, faimanTemperature, incidenceModifier } from './module.js';

/** Inverter efficiency, AC over DC (nominal, common practice). */
export const INVERTER_EFFICIENCY = 0.96;

/** Slant length of one bypassed string of cells, m: half-cut modules laid along the row (common practice). */
const STRING_DEPTH_M = 0.55;

/** What the electrical side must know of a layout. */
export interface PlantSpec {
  module: ModuleSpec;
  collectorWidthM: number;
  dcAcRatio: number;
  lossesPercent: number;
}

/** Light on the panel faces in one instant, W m-2, and the air around. */
export interface PanelInstant {
  /** Straight from sun and circumsolar on the lit face, unshaded, and whether that face is the front. */
  direct: number;
  directOnFront: boolean;
  cosIncidence: number;
  /** Share of the lit face that no other row shades. */
  litShare: number;
  /** Sky and reflected light on either face. */
  diffuseFront: number;
  diffuseRear: number;
  /** Current per joule relative to the reference spectrum, of direct and diffuse light. */
  spectralDirect: number;
  spectralDiffuse: number;
  airC: number;
  windMs: number;
}

/** Sums over a year, per kWp of rated power; hours of full sun (kWh per kWp). */
export interface EnergySums {
  ac: number;
  /** DC before each loss was taken, to tell the losses apart. */
  rear: number;
  rowShade: number;
  incidence: number;
  temperature: number;
  clipping: number;
  /** Potential without any of these. */
  ideal: number;
}

export const noEnergy = (): EnergySums => ({
  ac: 0,
  rear: 0,
  rowShade: 0,
  incidence: 0,
  temperature: 0,
  clipping: 0,
  ideal: 0,
});

/** Lit share that still yields current: strings lie along the row, one shaded cell stops its string. */
export function litStrings(litShare: number, collectorWidthM: number): number {
  const strings = Math.max(1, Math.round(collectorWidthM / STRING_DEPTH_M));
  return Math.floor(litShare * strings + 1e-9) / strings;
}

/**
 * AC power of one instant, per rated power, and the losses on the way added to `sums`.
 *
 * @param hours length of the instant, h
 * @returns AC power over rated DC power, 0 to 1 / dcAcRatio
 */
export function addInstant(
  plant: PlantSpec,
  instant: PanelInstant,
  hours: number,
  sums: EnergySums,
): number {
  const { module } = plant;
  const faceWeight = instant.directOnFront ? 1 : module.bifaciality;
  const direct = instant.direct * faceWeight * instant.spectralDirect;
  const front = instant.diffuseFront * instant.spectralDiffuse;
  const rear = instant.diffuseRear * module.bifaciality * instant.spectralDiffuse;
  const whole = direct + front + rear;
  if (whole <= 0) return 0;
  const strings = litStrings(instant.litShare, plant.collectorWidthM);
  const lit = direct * strings;
  const entering = lit * incidenceModifier(instant.cosIncidence);
  const enteringFront = front * DIFFUSE_MODIFIER;
  const enteringRear = rear * DIFFUSE_MODIFIER;
  const effective = entering + enteringFront + enteringRear;

  const onPlane = instant.direct * instant.litShare + instant.diffuseFront + instant.diffuseRear;
  const warm = faimanTemperature(onPlane, instant.airC, instant.windMs);
  const heat = 1 + (module.temperaturePercentPerK / 100) * (warm - 25);
  const system = (1 - plant.lossesPercent / 100) * INVERTER_EFFICIENCY;
  const perSun = 1 / 1000;
  const unlimited = Math.max(effective * perSun * heat * system, 0);
  const ac = Math.min(unlimited, 1 / plant.dcAcRatio);

  const rearDirect = instant.directOnFront ? 0 : entering;
  sums.ideal += whole * perSun * system * hours;
  sums.rowShade += (direct - lit) * perSun * system * hours;
  sums.incidence += (lit + front + rear - effective) * perSun * system * hours;
  sums.temperature += effective * perSun * system * (1 - heat) * hours;
  sums.clipping += (unlimited - ac) * hours;
  sums.rear += (ac * (enteringRear + rearDirect) * hours) / effective;
  sums.ac += ac * hours;
  return ac;
}
