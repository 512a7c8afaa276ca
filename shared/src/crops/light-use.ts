import { InputError, requireWithin } from '../errors.js';

/** PAR photons in a megajoule of PAR, mol MJ-1 (daylight, Thimijan & Heins 1983; from memory). */
const MOL_PER_MJ = 4.57;

/** Shares of a season in which the canopy closes, and at whose end it begins to ripen (common practice). */
const CLOSED_AT = 0.4;
const RIPE_FROM = 0.8;

/** Leaves left at harvest, share of the largest leaf area (common practice). */
const LEAVES_AT_HARVEST = 0.3;

/** What the light-use equation needs of a crop. */
export interface LightUse {
  /** Biomass per intercepted PAR, g MJ-1. */
  lightUseGPerMj: number;
  /** Extinction coefficient of the canopy. */
  extinction: number;
  /** Largest leaf area per ground area. */
  leafAreaMax: number;
}

/**
 * Share of light a canopy catches: 1 - exp(-k LAI).
 *
 * @param extinction k, 0-2
 * @param leafArea m2 of leaves per m2 of ground, 0-15
 * Source: Monsi & Saeki 1953 (Japanese J. Bot. 14:22).
 */
export function interceptedShare(extinction: number, leafArea: number): number {
  requireWithin('extinction', extinction, 0, 2);
  requireWithin('leafArea', leafArea, 0, 15);
  return 1 - Math.exp(-extinction * leafArea);
}

/**
 * Leaf area through a season, share of its largest: rises evenly, stands, falls while ripening.
 *
 * @param progress share of the season passed, 0-1
 */
export function leafAreaCourse(progress: number): number {
  requireWithin('progress', progress, 0, 1);
  if (progress < CLOSED_AT) return progress / CLOSED_AT;
  if (progress <= RIPE_FROM) return 1;
  return 1 - ((1 - LEAVES_AT_HARVEST) * (progress - RIPE_FROM)) / (1 - RIPE_FROM);
}

/** Biomass of a season in open field and under the rows, g m-2 dry matter, and their ratio. */
export interface Biomass {
  openGM2: number;
  underGM2: number;
  relative: number;
}

/**
 * Biomass by light use, a second opinion beside the class bands: same canopy and light use in both
 * places, so only the light differs. Careful for crops that spread their leaves in shade: it is too
 * low for them.
 *
 * @param crop light use, extinction and leaf area
 * @param openDli PAR in open field, mol m-2 d-1, one a day of the season
 * @param underDli the same under the rows
 * @throws InputError where the two series differ in length or are empty
 * Source: Monteith 1977, Phil. Trans. R. Soc. B 281:277.
 */
export function seasonBiomass(
  crop: LightUse,
  openDli: ArrayLike<number>,
  underDli: ArrayLike<number>,
): Biomass {
  requireWithin('lightUseGPerMj', crop.lightUseGPerMj, 0.1, 15, 'g/MJ');
  const days = openDli.length;
  if (days === 0 || underDli.length !== days) {
    throw new InputError('underDli', 'Light in open field and under the rows must cover the days.');
  }
  let open = 0;
  let under = 0;
  for (let day = 0; day < days; day += 1) {
    const leaves = crop.leafAreaMax * leafAreaCourse((day + 0.5) / days);
    const gain = (crop.lightUseGPerMj * interceptedShare(crop.extinction, leaves)) / MOL_PER_MJ;
    open += gain * openDli[day];
    under += gain * underDli[day];
  }
  return { openGM2: open, underGM2: under, relative: open > 0 ? under / open : 1 };
}
