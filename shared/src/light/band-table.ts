import { DEG } from './angles.js';
import { prepareAir, spectrumThrough, WAVELENGTHS_NM, type Atmosphere } from './atmosphere.js';
import { BAND_COUNT, BAND_EDGES_NM, integrateSpectrum, micromolPerJoule } from './spectrum.js';

/**
 * What a kind of light is made of, per joule of it: energy shares of the seven bands (sum 1), then
 * photons by band (umol J-1), then photons at 655-665 and 725-735 nm (umol J-1) for red : far-red.
 */
export const RED_10NM = 2 * BAND_COUNT;
export const FAR_RED_10NM = 2 * BAND_COUNT + 1;
export const MAKEUP_LENGTH = 2 * BAND_COUNT + 2;

/** First entry of the photons in a makeup. */
export const PHOTONS = BAND_COUNT;

/** Rows by sun altitude 0-90 degrees in whole degrees; each row is a makeup. */
export interface BandTable {
  direct: Float64Array;
  clearDiffuse: Float64Array;
  cloudDiffuse: Float64Array;
  /** Broadband clear-sky direct normal and diffuse horizontal at mean sun distance, W m-2. */
  directWm2: Float64Array;
  diffuseWm2: Float64Array;
}

const ALTITUDES = 91;
/** Below this the air mass formulas end; the table is held constant, degrees. */
const LOWEST_ALTITUDE_DEG = 1;

/**
 * How an overcast passes the bands, relative to PAR: cloud water and longer vapour paths take near
 * infrared. Chosen so that the PAR share of overcast light is 0.49-0.50, the upper end of hourly
 * values of Jacovides et al. 2003 (Theor. Appl. Climatol. 74); form after Siegel et al. 1999
 * (J. Climate 12), where the loss of near infrared grows with cloud index.
 */
const CLOUD_PASS = [1.0, 1.0, 1.0, 1.0, 0.97, 0.87, 0.66] as const;

/** Trapezoid weights of each spectral value in an integral over [from, to]. */
function integralWeights(from: number, to: number, weight?: (nm: number) => number): Float64Array {
  const unit = new Float64Array(WAVELENGTHS_NM.length);
  return Float64Array.from(WAVELENGTHS_NM, (_, i) => {
    unit[i] = 1;
    const share = integrateSpectrum(WAVELENGTHS_NM, unit, from, to, weight);
    unit[i] = 0;
    return share;
  });
}

/** What each entry of a makeup sums up of a spectrum; integrals are linear, so this is done once. */
const ENTRY_WEIGHTS: readonly Float64Array[] = [
  ...Array.from({ length: BAND_COUNT }, (_, band) =>
    integralWeights(BAND_EDGES_NM[band], BAND_EDGES_NM[band + 1]),
  ),
  ...Array.from({ length: BAND_COUNT }, (_, band) =>
    integralWeights(BAND_EDGES_NM[band], BAND_EDGES_NM[band + 1], micromolPerJoule),
  ),
  integralWeights(655, 665, micromolPerJoule),
  integralWeights(725, 735, micromolPerJoule),
];

function makeupOf(spectrum: Float64Array, target: Float64Array, offset: number): number {
  let total = 0;
  for (let entry = 0; entry < MAKEUP_LENGTH; entry += 1) {
    const weights = ENTRY_WEIGHTS[entry];
    let sum = 0;
    for (let i = 0; i < spectrum.length; i += 1) sum += weights[i] * spectrum[i];
    target[offset + entry] = sum;
    if (entry < BAND_COUNT) total += sum;
  }
  for (let i = 0; i < MAKEUP_LENGTH; i += 1) target[offset + i] /= total;
  return total;
}

/** Turn the makeup of clear global light into that of light through cloud. */
function throughCloud(makeup: Float64Array, offset: number): void {
  let total = 0;
  for (let band = 0; band < BAND_COUNT; band += 1) {
    makeup[offset + band] *= CLOUD_PASS[band];
    makeup[offset + PHOTONS + band] *= CLOUD_PASS[band];
    total += makeup[offset + band];
  }
  makeup[offset + FAR_RED_10NM] *= CLOUD_PASS[4];
  for (let i = 0; i < MAKEUP_LENGTH; i += 1) makeup[offset + i] /= total;
}

/**
 * Make the table that year runs look light's make-up up in: Bird-Riordan spectra at every whole
 * degree of sun altitude, integrated once.
 *
 * @param atmosphere state of the cloudless air over the place
 */
export function prepareBandTable(atmosphere: Atmosphere): BandTable {
  const length = ALTITUDES * MAKEUP_LENGTH;
  const table: BandTable = {
    direct: new Float64Array(length),
    clearDiffuse: new Float64Array(length),
    cloudDiffuse: new Float64Array(length),
    directWm2: new Float64Array(ALTITUDES),
    diffuseWm2: new Float64Array(ALTITUDES),
  };
  const air = prepareAir(atmosphere);
  const global = new Float64Array(WAVELENGTHS_NM.length);
  for (let altitude = 0; altitude < ALTITUDES; altitude += 1) {
    const zenith = (90 - Math.max(altitude, LOWEST_ALTITUDE_DEG)) * DEG;
    const { direct, diffuse } = spectrumThrough(air, zenith);
    const offset = altitude * MAKEUP_LENGTH;
    table.directWm2[altitude] = makeupOf(direct, table.direct, offset);
    table.diffuseWm2[altitude] = makeupOf(diffuse, table.clearDiffuse, offset);
    for (let i = 0; i < global.length; i += 1)
      global[i] = direct[i] * Math.cos(zenith) + diffuse[i];
    makeupOf(global, table.cloudDiffuse, offset);
    throughCloud(table.cloudDiffuse, offset);
  }
  return table;
}

/** Value of a per-degree column at an altitude in radians, linear between degrees. */
export function atAltitude(column: Float64Array, altitude: number): number {
  const degrees = Math.min(Math.max(altitude / DEG, 0), ALTITUDES - 1);
  const low = Math.min(Math.floor(degrees), ALTITUDES - 2);
  const share = degrees - low;
  return column[low] * (1 - share) + column[low + 1] * share;
}

/** Light of one instant by band: make-ups of the beam and the diffuse actually given. */
export interface BandSplit {
  /** Per joule of direct light. */
  direct: Float64Array;
  /** Per joule of diffuse light. */
  diffuse: Float64Array;
}

/** A split to be filled again and again, so that year runs allocate nothing. */
export const emptyBandSplit = (): BandSplit => ({
  direct: new Float64Array(MAKEUP_LENGTH),
  diffuse: new Float64Array(MAKEUP_LENGTH),
});

/**
 * Make-up of the beam and diffuse light of an instant.
 *
 * The direct spectrum is the clear-sky one at this sun altitude, scaled to the given beam. The
 * diffuse one moves from the clear-sky diffuse to that of light through cloud in step with the
 * share of the clear-sky beam that clouds have taken.
 *
 * @param table from prepareBandTable
 * @param altitude apparent sun altitude, radians
 * @param dni direct normal irradiance, W m-2
 * @param distance sun distance factor (distanceFactor)
 * @param out filled: shares and photons per joule of direct and of diffuse light
 */
export function splitBands(
  table: BandTable,
  altitude: number,
  dni: number,
  distance: number,
  out: BandSplit,
): void {
  const degrees = Math.min(Math.max(altitude / DEG, 0), ALTITUDES - 1);
  const low = Math.min(Math.floor(degrees), ALTITUDES - 2);
  const high = degrees - low;
  const clearBeam = atAltitude(table.directWm2, altitude) * distance;
  const cloud = clearBeam > 0 ? Math.min(Math.max(1 - dni / clearBeam, 0), 1) : 1;
  const a = low * MAKEUP_LENGTH;
  const b = a + MAKEUP_LENGTH;
  for (let i = 0; i < MAKEUP_LENGTH; i += 1) {
    out.direct[i] = table.direct[a + i] * (1 - high) + table.direct[b + i] * high;
    const clear = table.clearDiffuse[a + i] * (1 - high) + table.clearDiffuse[b + i] * high;
    const overcast = table.cloudDiffuse[a + i] * (1 - high) + table.cloudDiffuse[b + i] * high;
    out.diffuse[i] = clear * (1 - cloud) + overcast * cloud;
  }
}

/** Sum of the three PAR bands of a makeup, energy (start 0) or photons (start PHOTONS). */
export function parOf(makeup: Float64Array, start: number): number {
  return makeup[start + 1] + makeup[start + 2] + makeup[start + 3];
}
