import { FAR_RED_10NM, PHOTONS, parOf, RED_10NM, splitBands } from '../light/band-table.js';
import type { LightSums } from '../light/budget.js';
import type { RowLight } from '../light/row-light.js';
import { circumsolarShare } from '../light/sky.js';
import { slopeSkyView } from '../light/slope.js';
import { SOLAR_CONSTANT } from '../light/sun.js';
import type { SplitSums } from '../light/sun-split.js';
import { addInstant, type EnergySums } from '../power/energy.js';
import { siliconCurrent } from '../power/module.js';
import { monthOf } from '../crops/windows.js';
import type { RunState } from './state.js';
import { meterRotation, rotationAt } from './steering.js';

/** Lowest sine of the sun's altitude in the circumsolar projection. */
const LOWEST_SINE = 0.01745;

/** Light of one instant on the field's plane, W m-2. */
interface Incoming {
  /** Beam. */
  beam: number;
  /** Diffuse from around the sun; shaded with the beam. */
  circumsolar: number;
  /** Diffuse from the whole sky, and from the ground a slope looks at. */
  even: number;
}

function incomingOf(state: RunState, i: number): Incoming {
  const { suns, ground, input } = state;
  const dni = suns.dni[i];
  const dhi = suns.dhi[i];
  const overPlane = Math.max(Math.sin(suns.planeAltitude[i]), 0);
  const overGround = Math.max(Math.sin(suns.altitude[i]), LOWEST_SINE);
  const brightest = SOLAR_CONSTANT * suns.distance;
  const index = input.options.sky === 'hay-davies' ? circumsolarShare(dni, brightest) : 0;
  // What comes from around the sun and the beam together stay below the sun above the air.
  const around = Math.min((dhi * index) / overGround, Math.max(brightest - dni, 0));
  const view = slopeSkyView(ground);
  const thrown = input.site.albedo * (dni * overGround + dhi) * (1 - view);
  return {
    beam: dni * overPlane,
    circumsolar: around * overPlane,
    even: (dhi - around * overGround) * view + thrown,
  };
}

/** Add one instant's photons under the rows and in open field. */
function addLight(
  state: RunState,
  sums: LightSums,
  light: RowLight,
  day: number,
  incoming: Incoming,
): void {
  const { split } = state;
  const seconds = state.suns.stepHours * 3600;
  const scale = seconds * 1e-6;
  const beamPar =
    (incoming.beam * parOf(split.direct, PHOTONS) +
      incoming.circumsolar * parOf(split.diffuse, PHOTONS)) *
    scale;
  const evenPar = incoming.even * parOf(split.diffuse, PHOTONS) * scale;
  const row = day * sums.positions;
  let beamMean = 0;
  let skyMean = 0;
  const { beam, sky } = light;
  const { par } = sums;
  if (beamPar > 0) {
    for (let p = 0; p < sums.positions; p += 1) {
      par[row + p] += beamPar * beam[p] + evenPar * sky[p];
      beamMean += beam[p];
      skyMean += sky[p];
    }
  } else {
    for (let p = 0; p < sums.positions; p += 1) {
      par[row + p] += evenPar * sky[p];
      skyMean += sky[p];
    }
  }
  beamMean /= sums.positions;
  skyMean /= sums.positions;
  sums.open[day] += beamPar + evenPar;
  const colour = (index: number, under: Float64Array, open: Float64Array) => {
    const fromSun =
      (incoming.beam * split.direct[index] + incoming.circumsolar * split.diffuse[index]) * scale;
    const fromSky = incoming.even * split.diffuse[index] * scale;
    under[day] += fromSun * beamMean + fromSky * skyMean;
    open[day] += fromSun + fromSky;
  };
  colour(RED_10NM, sums.red, sums.redOpen);
  colour(FAR_RED_10NM, sums.farRed, sums.farRedOpen);
}

/** Power of the panels at one instant over rated power, with losses added to `energy`. */
function addPower(
  state: RunState,
  light: RowLight,
  incoming: Incoming,
  i: number,
  energy: EnergySums,
): number {
  const { suns, split, input } = state;
  const hour = suns.hour[i];
  const fromSun = incoming.beam + incoming.circumsolar;
  const factor = light.planeFactor;
  const cosIncidence = Math.min(Math.abs(factor) * Math.max(Math.sin(suns.planeAltitude[i]), 0), 1);
  return addInstant(
    input.layout,
    {
      direct: fromSun * Math.abs(factor),
      directOnFront: factor >= 0,
      cosIncidence,
      litShare: light.litShare,
      diffuseFront: incoming.even * light.skyPanel.front + fromSun * light.beamPanel.frontReflected,
      diffuseRear: incoming.even * light.skyPanel.rear + fromSun * light.beamPanel.rearReflected,
      spectralDirect: siliconCurrent(split.direct) / state.referenceCurrent,
      spectralDiffuse: siliconCurrent(split.diffuse) / state.referenceCurrent,
      airC: input.weather.temperatureC[hour],
      windMs: input.weather.windMs[hour],
    },
    suns.stepHours,
    energy,
  );
}

/** Follow one instant's sunlight to where it stays. */
function addToSplit(
  state: RunState,
  light: RowLight,
  incoming: Incoming,
  power: number,
  sums: SplitSums,
): void {
  const { split, suns } = state;
  const seconds = suns.stepHours * 3600;
  const fromSun = incoming.beam + incoming.circumsolar;
  const { beamBalance, skyBalance } = light;
  const groundSun = fromSun * beamBalance.ground;
  const groundSky = incoming.even * skyBalance.ground;
  const sunPar =
    fromSun > 0
      ? (incoming.beam * parOf(split.direct, 0) + incoming.circumsolar * parOf(split.diffuse, 0)) /
        fromSun
      : 0;
  const par = groundSun * sunPar + groundSky * parOf(split.diffuse, 0);
  sums.incoming += (fromSun + incoming.even) * seconds;
  sums.kept +=
    (fromSun * (beamBalance.panel + beamBalance.structure) +
      incoming.even * (skyBalance.panel + skyBalance.structure)) *
    seconds;
  sums.reflected += (fromSun * beamBalance.escaped + incoming.even * skyBalance.escaped) * seconds;
  sums.cropPar += par * seconds;
  sums.cropOther += (groundSun + groundSky - par) * seconds;
  sums.electricity += power * state.powerPerLand * seconds;
}

/** Photons of an instant in open field, umol m-2 s-1. */
const openPpfd = (state: RunState, incoming: Incoming): number =>
  incoming.beam * parOf(state.split.direct, PHOTONS) +
  (incoming.circumsolar + incoming.even) * parOf(state.split.diffuse, PHOTONS);

/**
 * Count one sun: light at every receiver and height, power, and the split of the sunlight.
 *
 * @param day 0-based day of the weather year
 * @param i index of the sun in the day's suns
 */
export function countSun(state: RunState, day: number, i: number): void {
  const { suns, steering, input, planes } = state;
  const incoming = incomingOf(state, i);
  splitBands(state.table, suns.altitude[i], suns.dni[i], suns.distance, state.split);
  const fromSun = incoming.beam + incoming.circumsolar;
  // Behind the slope there is no beam; any sun above the plane serves to set the sky's part.
  const altitude = Math.max(suns.planeAltitude[i], 0.002);
  const azimuth = suns.planeAzimuth[i];
  const hourOfDay = suns.hour[i] % 24;
  const month = monthOf(Math.min(day, 364));
  const rotation =
    steering && fromSun + incoming.even > 0
      ? rotationAt(
          steering,
          input.layout,
          azimuth,
          altitude,
          Math.min(day, 364),
          hourOfDay,
          openPpfd(state, incoming),
        )
      : 0;
  for (const plane of planes) {
    plane.light.set(azimuth, altitude, rotation);
    addLight(state, plane.sums, plane.light, day, incoming);
  }
  const { light } = planes[0];
  const power = addPower(state, light, incoming, i, state.energyByMonth[month]);
  addToSplit(state, light, incoming, power, state.months[month]);
  state.openEnergy[day] += (fromSun + incoming.even) * suns.stepHours * 3600;
  if (state.plainTracker && steering) {
    const meter = meterRotation(steering, 'backtracking', azimuth, altitude);
    state.plainTracker.light.set(azimuth, altitude, meter);
    addPower(state, state.plainTracker.light, incoming, i, state.plainTracker.energy);
    addLight(state, state.plainTracker.sums, state.plainTracker.light, day, incoming);
  }
}
