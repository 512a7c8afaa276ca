import { requireWithin } from '../errors.js';
import { PHOTONS } from '../light/band-table.js';
import { BAND_COUNT } from '../light/spectrum.js';

/** Refraction, extinction (m-1) and thickness (m) of module glass (De Soto 2006). */
const GLASS = { index: 1.526, extinction: 4, thickness: 0.002 };

function transmitted(cosIncidence: number): number {
  const incidence = Math.acos(Math.min(Math.max(cosIncidence, 1e-6), 1));
  const refracted = Math.asin(Math.sin(incidence) / GLASS.index);
  const path = Math.exp((-GLASS.extinction * GLASS.thickness) / Math.cos(refracted));
  if (incidence < 1e-5) return path * (1 - ((GLASS.index - 1) / (GLASS.index + 1)) ** 2);
  const minus = refracted - incidence;
  const plus = refracted + incidence;
  const loss = (Math.sin(minus) / Math.sin(plus)) ** 2 + (Math.tan(minus) / Math.tan(plus)) ** 2;
  return path * (1 - loss / 2);
}

const AT_NORMAL = transmitted(1);

/**
 * Light entering the glass at an angle, relative to normal incidence.
 *
 * @param cosIncidence cosine of the angle of incidence, 0-1
 * @returns 0-1
 * Source: De Soto, Klein & Beckman 2006, Solar Energy 80:78 (Snell, Fresnel, Bouguer).
 */
export function incidenceModifier(cosIncidence: number): number {
  return cosIncidence <= 0 ? 0 : Math.max(transmitted(cosIncidence) / AT_NORMAL, 0);
}

/** The same for diffuse light: effective incidence of about 58 deg (Brandemuehl & Beckman 1980). */
export const DIFFUSE_MODIFIER = incidenceModifier(Math.cos((58 * Math.PI) / 180));

/**
 * Module temperature.
 *
 * @param irradiance on the module plane, W m-2
 * @param airC air temperature, deg C
 * @param windMs wind at module height, m s-1
 * @returns deg C
 * Source: Faiman 2008, Prog. Photovolt. 16:307; open rack U0 25 W m-2 K-1, U1 6.84 W s m-3 K-1.
 */
export function faimanTemperature(
  irradiance: number,
  airC: number,
  windMs: number,
  u0 = 25,
  u1 = 6.84,
): number {
  requireWithin('irradiance', irradiance, 0, 3000, 'W m-2');
  requireWithin('windMs', windMs, 0, 100, 'm s-1');
  return airC + irradiance / (u0 + u1 * windMs);
}

/** Share of photons that crystalline silicon turns into current, by band (common practice). */
const SILICON_RESPONSE = [0.45, 0.82, 0.95, 0.97, 0.97, 0.86, 0.03] as const;

/**
 * Current per joule of light, arbitrary unit: photons by band times the response of silicon.
 *
 * @param makeup band make-up of the light (light/band-table)
 */
export function siliconCurrent(makeup: Float64Array): number {
  let current = 0;
  for (let band = 0; band < BAND_COUNT; band += 1) {
    current += makeup[PHOTONS + band] * SILICON_RESPONSE[band];
  }
  return current;
}
