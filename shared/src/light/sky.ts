/** Sky diffuse on a tilted plane, in parts, W m-2. */
export interface SkyParts {
  /** Comes from around the sun and is shaded with the beam. */
  circumsolar: number;
  /** Comes evenly from the dome, already times the plane's view of it. */
  isotropic: number;
  /** Comes from near the horizon (Perez only). */
  horizon: number;
}

/** Lowest cosine of the zenith in the circumsolar projection (zenith 89 deg). */
const LOWEST_COS_ZENITH = 0.01745;

/**
 * Share of diffuse light that comes from around the sun.
 *
 * @param dni direct normal, W m-2
 * @param extraterrestrial normal irradiance above the air, W m-2
 * @returns anisotropy index 0-1
 * Source: Hay & Davies 1980 (Proc. First Canadian Solar Radiation Data Workshop).
 */
export function circumsolarShare(dni: number, extraterrestrial: number): number {
  return Math.min(Math.max(dni / extraterrestrial, 0), 1);
}

/**
 * Sky diffuse on a tilted plane after Hay & Davies 1980.
 *
 * @param cosIncidence cosine of the sun's incidence on the plane
 * @param cosZenith cosine of the sun's zenith
 * @param cosTilt cosine of the plane's tilt
 */
export function hayDavies(
  dhi: number,
  dni: number,
  extraterrestrial: number,
  cosIncidence: number,
  cosZenith: number,
  cosTilt: number,
): SkyParts {
  const index = circumsolarShare(dni, extraterrestrial);
  const projection = Math.max(cosIncidence, 0) / Math.max(cosZenith, LOWEST_COS_ZENITH);
  return {
    circumsolar: dhi * index * projection,
    isotropic: (dhi * (1 - index) * (1 + cosTilt)) / 2,
    horizon: 0,
  };
}

/** Upper edges of the clearness bins of Perez et al. 1990. */
const CLEARNESS_EDGES = [1.065, 1.23, 1.5, 1.95, 2.8, 4.5, 6.2];

/** F11, F12, F13, F21, F22, F23 by bin: all-sites composite of Perez et al. 1990, table 6. */
const PEREZ = [
  [-0.008, 0.588, -0.062, -0.06, 0.072, -0.022],
  [0.13, 0.683, -0.151, -0.019, 0.066, -0.029],
  [0.33, 0.487, -0.221, 0.055, -0.064, -0.026],
  [0.568, 0.187, -0.295, 0.109, -0.152, -0.014],
  [0.873, -0.392, -0.362, 0.226, -0.462, 0.001],
  [1.132, -1.237, -0.412, 0.288, -0.823, 0.056],
  [1.06, -1.6, -0.359, 0.264, -1.127, 0.131],
  [0.678, -0.327, -0.25, 0.156, -1.377, 0.251],
];

/** Constant of the clearness, per cubed radian of zenith. */
const KAPPA = 1.041;

/**
 * Sky diffuse on a tilted plane after Perez et al. 1990, Solar Energy 44:271.
 *
 * @param mass relative optical air mass
 * @param zenith radians
 * @param tilt of the plane, radians
 * @returns parts, of which the sum is not below 0
 */
export function perez(
  dhi: number,
  dni: number,
  extraterrestrial: number,
  mass: number,
  cosIncidence: number,
  zenith: number,
  tilt: number,
): SkyParts {
  if (dhi <= 0) return { circumsolar: 0, isotropic: 0, horizon: 0 };
  const bend = KAPPA * zenith ** 3;
  const clearness = ((dhi + dni) / dhi + bend) / (1 + bend);
  const bin = CLEARNESS_EDGES.findIndex((edge) => clearness < edge);
  const [f11, f12, f13, f21, f22, f23] = PEREZ[bin === -1 ? 7 : bin];
  const brightness = (dhi * mass) / extraterrestrial;
  const f1 = Math.max(f11 + f12 * brightness + f13 * zenith, 0);
  const f2 = f21 + f22 * brightness + f23 * zenith;
  const projection =
    Math.max(cosIncidence, 0) / Math.max(Math.cos(zenith), Math.cos((85 * Math.PI) / 180));
  const parts = {
    circumsolar: dhi * f1 * projection,
    isotropic: (dhi * (1 - f1) * (1 + Math.cos(tilt))) / 2,
    horizon: dhi * f2 * Math.sin(tilt),
  };
  const sum = parts.circumsolar + parts.isotropic + parts.horizon;
  return sum >= 0 ? parts : { circumsolar: 0, isotropic: 0, horizon: 0 };
}
