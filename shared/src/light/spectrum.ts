import { requireWithin } from '../errors.js';
import { SOLAR_CONSTANT } from './sun.js';

/** Effective temperature of the sun, K (IAU 2015 resolution B3, nominal). */
export const SUN_TEMPERATURE = 5772;

/** Planck constant J s, speed of light m s-1, Boltzmann J K-1, Avogadro mol-1: exact in the SI. */
const PLANCK = 6.62607015e-34;
const LIGHT = 299_792_458;
const BOLTZMANN = 1.380649e-23;
const AVOGADRO = 6.02214076e23;

/** Stefan-Boltzmann constant, W m-2 K-4 (CODATA 2018). */
export const STEFAN_BOLTZMANN = 5.670374419e-8;

/** Second radiation constant h c / k, m K. */
const C2 = (PLANCK * LIGHT) / BOLTZMANN;

/** Names of the seven bands, in order of wavelength. */
export const BAND_NAMES = ['uv', 'blue', 'green', 'red', 'farRed', 'nir', 'ir'] as const;

/** Band edges, nm: UV 280-400, blue, green, red to 700, far-red to 750, near infrared to 1100, above to 4000. */
export const BAND_EDGES_NM = [280, 400, 500, 600, 700, 750, 1100, 4000] as const;

export const BAND_COUNT = BAND_NAMES.length;

/** Index range [from, to) of the bands that make PAR (400-700 nm). */
export const PAR_BANDS = { from: 1, to: 4 } as const;

/**
 * Photons in light of one wavelength.
 *
 * @param wavelengthNm wavelength, nm, above 0
 * @returns umol of photons per joule: lambda / (h c N_A) x 1e6
 */
export function micromolPerJoule(wavelengthNm: number): number {
  return (wavelengthNm * 1e-9 * 1e6) / (PLANCK * LIGHT * AVOGADRO);
}

/**
 * Planck's law: hemispherical emission of a black surface per wavelength.
 *
 * @param wavelengthNm nm, 1 to 1e6
 * @param temperatureK K, 1 to 1e5
 * @returns W m-2 nm-1
 */
export function planckExitance(wavelengthNm: number, temperatureK: number): number {
  requireWithin('wavelengthNm', wavelengthNm, 1, 1e6, 'nm');
  requireWithin('temperatureK', temperatureK, 1, 1e5, 'K');
  const metres = wavelengthNm * 1e-9;
  const numerator = 2 * Math.PI * PLANCK * LIGHT * LIGHT * 1e-9;
  return numerator / (Math.pow(metres, 5) * Math.expm1(C2 / (metres * temperatureK)));
}

/**
 * Plain blackbody sun above the air: Planck at 5772 K scaled so that all wavelengths sum to
 * 1361 W m-2. It is 5.9 % low in PAR and 29 % high in UV against the measured sun; results use
 * the corrected spectrum of atmosphere-data instead.
 *
 * @param wavelengthNm nm
 * @returns W m-2 nm-1 at mean distance, on a plane facing the sun
 */
export function blackbodySun(wavelengthNm: number): number {
  const scale = SOLAR_CONSTANT / (STEFAN_BOLTZMANN * Math.pow(SUN_TEMPERATURE, 4));
  return planckExitance(wavelengthNm, SUN_TEMPERATURE) * scale;
}

/** Below this x = c2 / (lambda T) the Laurent series converges faster than the sum of exponentials. */
const SERIES_SWITCH = 0.35;

/** Coefficients of the expansions of x^2/(e^x - 1) and x^3/(e^x - 1): Bernoulli numbers over k!. */
const BERNOULLI = [1, -1 / 2, 1 / 12, 0, -1 / 720, 0, 1 / 30240, 0, -1 / 1209600, 0, 1 / 47900160];

/** Integral from x to infinity of u^p / (e^u - 1) du for p = 2 or 3. */
function boseTail(x: number, p: 2 | 3): number {
  let sum = 0;
  for (let n = 1; n < 400; n += 1) {
    const decay = Math.exp(-n * x);
    const polynomial =
      p === 3
        ? x * x * x + (3 * x * x) / n + (6 * x) / (n * n) + 6 / (n * n * n)
        : x * x + (2 * x) / n + 2 / (n * n);
    const term = (decay * polynomial) / n;
    sum += term;
    if (term < 1e-16 * sum) break;
  }
  return sum;
}

/** Integral from 0 to x of u^p / (e^u - 1) du for small x. */
function boseHead(x: number, p: 2 | 3): number {
  let sum = 0;
  for (let k = 0; k < BERNOULLI.length; k += 1) {
    const power = k + p;
    sum += (BERNOULLI[k] * Math.pow(x, power)) / power;
  }
  return sum;
}

/** Integral over all u of u^3/(e^u-1), and of u^2/(e^u-1) (twice zeta(3)). */
const ALL_ENERGY = Math.pow(Math.PI, 4) / 15;
const ALL_PHOTONS = 2 * 1.2020569031595942;

/**
 * Share of a blackbody's energy or photons below a wavelength.
 *
 * @param wavelengthUmTimesK lambda T, um K, above 0
 * @param kind `energy` or `photons`
 * @returns 0-1, within 1e-9 of the series of Chang & Rhee 1984 (Int. Comm. Heat Mass Transfer 11:451)
 * @throws InputError naming wavelengthUmTimesK
 */
export function blackbodyShareBelow(
  wavelengthUmTimesK: number,
  kind: 'energy' | 'photons',
): number {
  requireWithin('wavelengthUmTimesK', wavelengthUmTimesK, 1e-6, 1e9, 'um K');
  const x = (C2 * 1e6) / wavelengthUmTimesK;
  const power = kind === 'energy' ? 3 : 2;
  const all = kind === 'energy' ? ALL_ENERGY : ALL_PHOTONS;
  return x < SERIES_SWITCH ? 1 - boseHead(x, power) / all : boseTail(x, power) / all;
}

/**
 * Integrate a spectrum given at `wavelengths` over [from, to] by trapezoids, with linear
 * interpolation at the edges. Wavelengths ascend; outside their range the spectrum counts as 0.
 *
 * @param weight value the spectrum is multiplied with before integration, by wavelength in nm
 * @returns integral in the spectrum's unit times nm
 */
export function integrateSpectrum(
  wavelengths: ArrayLike<number>,
  values: ArrayLike<number>,
  fromNm: number,
  toNm: number,
  weight: (wavelengthNm: number) => number = () => 1,
): number {
  let sum = 0;
  for (let i = 0; i + 1 < wavelengths.length; i += 1) {
    const left = Math.max(wavelengths[i], fromNm);
    const right = Math.min(wavelengths[i + 1], toNm);
    if (right <= left) continue;
    const span = wavelengths[i + 1] - wavelengths[i];
    const slope = (values[i + 1] - values[i]) / span;
    const atLeft = values[i] + slope * (left - wavelengths[i]);
    const atRight = values[i] + slope * (right - wavelengths[i]);
    sum += ((atLeft * weight(left) + atRight * weight(right)) / 2) * (right - left);
  }
  return sum;
}
