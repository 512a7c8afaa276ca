import { requireWithin } from '../errors.js';

/** Global horizontal light told apart into its beam and diffuse parts. */
export interface BeamAndDiffuse {
  /** Direct normal, W m-2. */
  dni: number;
  /** Diffuse horizontal, W m-2. */
  dhi: number;
}

/** Below this cosine of the zenith the beam of a known global is not resolved (sun within 3.7 deg). */
const LOWEST_COS_ZENITH = 0.065;

/**
 * Diffuse share of global light by clearness, for hourly means.
 *
 * @param clearness global over extraterrestrial horizontal, 0 and up
 * @returns 0-1
 * Source: Erbs, Klein & Duffie 1982, Solar Energy 28:293.
 */
export function erbsDiffuseShare(clearness: number): number {
  requireWithin('clearness', clearness, 0, 2);
  if (clearness <= 0.22) return 1 - 0.09 * clearness;
  if (clearness > 0.8) return 0.165;
  return (
    0.9511 +
    clearness * (-0.1604 + clearness * (4.388 + clearness * (-16.638 + clearness * 12.336)))
  );
}

/**
 * Split hourly global light after Erbs.
 *
 * @param ghi global horizontal, W m-2
 * @param cosZenith cosine of the sun's zenith at mid-interval
 * @param extraterrestrial normal irradiance above the air, W m-2
 */
export function splitGlobal(
  ghi: number,
  cosZenith: number,
  extraterrestrial: number,
): BeamAndDiffuse {
  requireWithin('ghi', ghi, 0, 2000, 'W m-2');
  if (cosZenith < LOWEST_COS_ZENITH) return { dni: 0, dhi: ghi };
  const clearness = Math.min(ghi / (extraterrestrial * cosZenith), 1);
  const dhi = ghi * erbsDiffuseShare(clearness);
  return { dni: (ghi - dhi) / cosZenith, dhi };
}

/** Air mass for DISC: Kasten 1966, times pressure. */
function kastenMass(zenithDeg: number, pressureHpa: number): number {
  const mass =
    1 / (Math.cos((zenithDeg * Math.PI) / 180) + 0.15 * Math.pow(93.885 - zenithDeg, -1.253));
  return (mass * pressureHpa) / 1013.25;
}

/**
 * Direct normal light from global, better than Erbs below one hour because it knows the air mass.
 *
 * @param ghi global horizontal, W m-2
 * @param zenithDeg sun zenith, degrees
 * @param dayOfYear 1-366
 * @param pressureHpa surface pressure, hPa
 * @returns direct normal, W m-2; 0 with the sun within 3 deg of the horizon
 * Source: Maxwell 1987, SERI/TR-215-3087 (DISC); solar constant 1370 as there.
 */
export function discDirectNormal(
  ghi: number,
  zenithDeg: number,
  dayOfYear: number,
  pressureHpa: number,
): number {
  requireWithin('ghi', ghi, 0, 2000, 'W m-2');
  if (zenithDeg > 87) return 0;
  const angle = (2 * Math.PI * (dayOfYear - 1)) / 365;
  const distance =
    1.00011 +
    0.034221 * Math.cos(angle) +
    0.00128 * Math.sin(angle) +
    0.000719 * Math.cos(2 * angle) +
    0.000077 * Math.sin(2 * angle);
  const above = 1370 * distance;
  const cosZenith = Math.max(Math.cos((zenithDeg * Math.PI) / 180), LOWEST_COS_ZENITH);
  const kt = Math.min(Math.max(ghi / (above * cosZenith), 0), 1);
  const mass = Math.min(kastenMass(zenithDeg, pressureHpa), 12);
  const clear = kt <= 0.6;
  const a = clear
    ? 0.512 + kt * (-1.56 + kt * (2.286 - 2.222 * kt))
    : -5.743 + kt * (21.77 + kt * (-27.49 + 11.56 * kt));
  const b = clear ? 0.37 + 0.962 * kt : 41.4 + kt * (-118.5 + kt * (66.05 + 31.9 * kt));
  const c = clear
    ? -0.28 + kt * (0.932 - 2.048 * kt)
    : -47.01 + kt * (184.2 + kt * (-222 + 73.81 * kt));
  const drop = a + b * Math.exp(c * mass);
  const clearSky = 0.866 + mass * (-0.122 + mass * (0.0121 + mass * (-0.000653 + 1.4e-5 * mass)));
  return ghi > 0 ? Math.max(above * (clearSky - drop), 0) : 0;
}
