import { requireWithin } from '../errors.js';
import { BIRD_RIORDAN } from './atmosphere-data.js';
import { blackbodySun } from './spectrum.js';
import { airMass } from './sun.js';

/** State of a cloudless atmosphere. */
export interface Atmosphere {
  /** Surface pressure, hPa. */
  pressureHpa: number;
  /** Precipitable water, cm. */
  waterCm: number;
  /** Ozone column, atm-cm. */
  ozoneAtmCm: number;
  /** Aerosol optical depth at 500 nm. */
  aerosol500: number;
  /** Ground reflectance seen by the sky, 0-1: one number, or by wavelength in nm. */
  albedo: number | ((wavelengthNm: number) => number);
}

/** A mid-latitude default (common practice): clean rural air. */
export function defaultAtmosphere(elevationM: number, albedo: number): Atmosphere {
  requireWithin('elevationM', elevationM, -430, 5000, 'm');
  requireWithin('albedo', albedo, 0, 1);
  // Barometric formula of the ICAO standard atmosphere.
  const pressureHpa = 1013.25 * Math.pow(1 - 2.25577e-5 * elevationM, 5.25588);
  return { pressureHpa, waterCm: 1.5, ozoneAtmCm: 0.33, aerosol500: 0.1, albedo };
}

/** Wavelengths of every spectrum here, nm. */
export const WAVELENGTHS_NM: readonly number[] = BIRD_RIORDAN.map((row) => row[0]);

/**
 * Correction from the blackbody sun to the measured one, by wavelength: published extraterrestrial
 * irradiance over Planck at 5772 K scaled to 1361 W m-2. 0.5-0.9 in the ultraviolet, about 1.06 in
 * PAR, 1.1 beyond 1100 nm.
 */
export const SOLAR_CORRECTION: readonly number[] = BIRD_RIORDAN.map(
  ([wavelength, measured]) => measured / blackbodySun(wavelength),
);

/** Which sun stands above the air. */
export type SunSpectrum = 'corrected' | 'blackbody';

/** Direct normal and diffuse horizontal spectra, W m-2 nm-1, at the 122 wavelengths. */
export interface ClearSkySpectrum {
  direct: Float64Array;
  diffuse: Float64Array;
}

const AEROSOL_EXPONENT = 1.14;
const SCATTERING_400 = 0.945;
const SCATTERING_SLOPE = 0.095;
const ASYMMETRY = 0.65;
/** Air mass of light thrown back by the ground. */
const BACK_PATH = 1.8;

function rayleigh(um: number, mass: number): number {
  return Math.exp(-mass / (um ** 4 * (115.6406 - 1.3366 / um ** 2)));
}

function water(coefficient: number, waterCm: number, mass: number): number {
  const path = coefficient * waterCm * mass;
  return Math.exp((-0.2385 * path) / Math.pow(1 + 20.07 * path, 0.45));
}

function mixedGas(coefficient: number, mass: number): number {
  const path = coefficient * mass;
  return Math.exp((-1.41 * path) / Math.pow(1 + 118.3 * path, 0.45));
}

/** Share of aerosol-scattered light that goes down, for a sun at cos(zenith). */
function forwardShare(cosZenith: number): number {
  const log = Math.log(1 - ASYMMETRY);
  const a = log * (1.459 + log * (0.1595 + log * 0.4129));
  const b = log * (0.0783 + log * (-0.3824 - log * 0.5874));
  return 1 - 0.5 * Math.exp((a + b * cosZenith) * cosZenith);
}

/** Ozone air mass: a layer at 22 km. */
function ozoneMass(cosZenith: number): number {
  return (1 + 22 / 6370) / Math.sqrt(cosZenith * cosZenith + (2 * 22) / 6370);
}

/** What does not depend on the sun's place, by wavelength; made once for many suns. */
export interface Air {
  atmosphere: Atmosphere;
  /** Aerosol optical depth, and the share of it that scatters. */
  depth: Float64Array;
  scattering: Float64Array;
  /** Share of light thrown up by the ground that the sky throws back. */
  skyReflectance: Float64Array;
  ground: Float64Array;
}

/** Sun above the air at mean distance, W m-2 nm-1. */
const ABOVE: Record<SunSpectrum, Float64Array> = {
  corrected: Float64Array.from(BIRD_RIORDAN, ([nm], i) => blackbodySun(nm) * SOLAR_CORRECTION[i]),
  blackbody: Float64Array.from(BIRD_RIORDAN, ([nm]) => blackbodySun(nm)),
};

function requireAtmosphere(atmosphere: Atmosphere): void {
  requireWithin('pressureHpa', atmosphere.pressureHpa, 300, 1100, 'hPa');
  requireWithin('waterCm', atmosphere.waterCm, 0, 10, 'cm');
  requireWithin('ozoneAtmCm', atmosphere.ozoneAtmCm, 0, 1, 'atm-cm');
  requireWithin('aerosol500', atmosphere.aerosol500, 0, 3);
}

/**
 * Prepare the air for spectra at many suns.
 *
 * @throws InputError naming a part of the atmosphere
 */
export function prepareAir(atmosphere: Atmosphere): Air {
  requireAtmosphere(atmosphere);
  const column = () => new Float64Array(BIRD_RIORDAN.length);
  const air: Air = {
    atmosphere,
    depth: column(),
    scattering: column(),
    skyReflectance: column(),
    ground: column(),
  };
  const downBack = forwardShare(1 / BACK_PATH);
  for (let i = 0; i < BIRD_RIORDAN.length; i += 1) {
    const [nm, , waterCoefficient, , gasCoefficient] = BIRD_RIORDAN[i];
    const um = nm / 1000;
    const depth = atmosphere.aerosol500 * Math.pow(um / 0.5, -AEROSOL_EXPONENT);
    const scattering = SCATTERING_400 * Math.exp(-SCATTERING_SLOPE * Math.log(um / 0.4) ** 2);
    const molecules = rayleigh(um, BACK_PATH);
    const scattered = Math.exp(-scattering * depth * BACK_PATH);
    air.depth[i] = depth;
    air.scattering[i] = scattering;
    air.skyReflectance[i] =
      mixedGas(gasCoefficient, BACK_PATH) *
      water(waterCoefficient, atmosphere.waterCm, BACK_PATH) *
      Math.exp(-(1 - scattering) * depth * BACK_PATH) *
      (0.5 * (1 - molecules) + (1 - downBack) * molecules * (1 - scattered));
    air.ground[i] =
      typeof atmosphere.albedo === 'number' ? atmosphere.albedo : atmosphere.albedo(nm);
  }
  return air;
}

/**
 * Clear-sky spectra at the ground.
 *
 * @param apparentZenith radians, 0 to below pi/2
 * @param atmosphere state of the air
 * @param distance square of mean over actual sun distance (about 0.967-1.035)
 * @param sun `corrected` (default) or the plain `blackbody`
 * @returns direct normal (beam only, no circumsolar) and diffuse horizontal, W m-2 nm-1
 * @throws InputError naming apparentZenith or a part of the atmosphere
 *
 * Source: Bird & Riordan 1986, with 1.3366 in the Rayleigh and 118.3 in the mixed gas term, aerosol
 * exponent 1.14, single scattering albedo 0.945 at 400 nm, asymmetry 0.65; air mass after Kasten &
 * Young 1989. Departure: the extraterrestrial spectrum is Planck times SOLAR_CORRECTION.
 */
export const clearSkySpectrum = (
  apparentZenith: number,
  atmosphere: Atmosphere,
  distance = 1,
  sun: SunSpectrum = 'corrected',
): ClearSkySpectrum => spectrumThrough(prepareAir(atmosphere), apparentZenith, distance, sun);

/** Clear-sky spectra through prepared air; see clearSkySpectrum. */
export function spectrumThrough(
  air: Air,
  apparentZenith: number,
  distance = 1,
  sun: SunSpectrum = 'corrected',
): ClearSkySpectrum {
  requireWithin('apparentZenith', apparentZenith, 0, 1.5707, 'rad');
  const { atmosphere } = air;
  const cosZenith = Math.cos(apparentZenith);
  const mass = airMass(apparentZenith);
  const pressureMass = (mass * atmosphere.pressureHpa) / 1013;
  const down = forwardShare(cosZenith);
  const ozonePath = atmosphere.ozoneAtmCm * ozoneMass(cosZenith);
  const direct = new Float64Array(BIRD_RIORDAN.length);
  const diffuse = new Float64Array(BIRD_RIORDAN.length);
  for (let i = 0; i < BIRD_RIORDAN.length; i += 1) {
    const [nm, , waterCoefficient, ozoneCoefficient, gasCoefficient] = BIRD_RIORDAN[i];
    const um = nm / 1000;
    const above = ABOVE[sun][i] * distance;
    const depth = air.depth[i];
    const scattering = air.scattering[i];
    const molecules = rayleigh(um, pressureMass);
    const gases =
      water(waterCoefficient, atmosphere.waterCm, mass) *
      Math.exp(-ozoneCoefficient * ozonePath) *
      mixedGas(gasCoefficient, pressureMass);
    direct[i] = above * molecules * Math.exp(-depth * mass) * gases;

    const absorbed = Math.exp(-(1 - scattering) * depth * mass);
    const scattered = Math.exp(-scattering * depth * mass);
    const entering = above * cosZenith * gases * absorbed;
    const fromMolecules = entering * (1 - Math.pow(molecules, 0.95)) * 0.5;
    const fromAerosol = entering * Math.pow(molecules, 1.5) * (1 - scattered) * down;
    const sent = (direct[i] * cosZenith + fromMolecules + fromAerosol) * air.ground[i];
    const bounced = (sent * air.skyReflectance[i]) / (1 - air.skyReflectance[i] * air.ground[i]);
    const blueBoost = um <= 0.45 ? Math.pow(um + 0.55, 1.8) : 1;
    diffuse[i] = (fromMolecules + fromAerosol + bounced) * blueBoost;
  }
  return { direct, diffuse };
}
