/** A test a measured or filed radiation value did not pass. */
export type QualityCode =
  | 'ghi-impossible'
  | 'dhi-impossible'
  | 'dni-impossible'
  | 'ghi-rare'
  | 'dhi-rare'
  | 'dni-rare'
  | 'closure'
  | 'diffuse-above-global';

/** One mean of the three radiation components with the sun that made them. */
export interface RadiationSample {
  /** W m-2. */
  ghi: number;
  dni: number;
  dhi: number;
  /** Cosine of the sun's zenith; 0 or below at night. */
  cosZenith: number;
  /** Normal irradiance above the air, W m-2. */
  extraterrestrial: number;
}

interface Limit {
  code: QualityCode;
  of: 'ghi' | 'dni' | 'dhi';
  low: number;
  high: (sa: number, mu: number) => number;
}

/** Long & Dutton (BSRN recommended tests, v2.0); Long & Shi 2008, Open Atmos. Sci. J. 2:23. */
const IMPOSSIBLE: Limit[] = [
  { code: 'ghi-impossible', of: 'ghi', low: -4, high: (sa, mu) => 1.5 * sa * mu ** 1.2 + 100 },
  { code: 'dhi-impossible', of: 'dhi', low: -4, high: (sa, mu) => 0.95 * sa * mu ** 1.2 + 50 },
  { code: 'dni-impossible', of: 'dni', low: -4, high: (sa) => sa },
];

const RARE: Limit[] = [
  { code: 'ghi-rare', of: 'ghi', low: -2, high: (sa, mu) => 1.2 * sa * mu ** 1.2 + 50 },
  { code: 'dhi-rare', of: 'dhi', low: -2, high: (sa, mu) => 0.75 * sa * mu ** 1.2 + 30 },
  { code: 'dni-rare', of: 'dni', low: -2, high: (sa, mu) => 0.95 * sa * mu ** 0.2 + 10 },
];

/** Closure bands are from memory of Long & Shi 2008: 8 % with the sun above 15 deg, else 15 %. */
const HIGH_SUN = Math.cos((75 * Math.PI) / 180);
const LEAST_GLOBAL = 50;

function closes({ ghi, dni, dhi, cosZenith }: RadiationSample): boolean {
  const sum = dhi + Math.max(cosZenith, 0) * dni;
  if (sum <= LEAST_GLOBAL || cosZenith <= 0) return true;
  return Math.abs(ghi / sum - 1) <= (cosZenith > HIGH_SUN ? 0.08 : 0.15);
}

/**
 * Test one sample against what is possible and what is extremely rare, and for closure.
 *
 * @returns codes of the tests not passed; a value that is impossible is not also called rare
 */
export function testRadiation(sample: RadiationSample): QualityCode[] {
  const mu = Math.max(sample.cosZenith, 0);
  const sa = sample.extraterrestrial;
  const broken = (limit: Limit) =>
    sample[limit.of] < limit.low || sample[limit.of] > limit.high(sa, mu);
  const impossible = IMPOSSIBLE.filter(broken);
  const rare = RARE.filter(
    (limit) => broken(limit) && !impossible.some((other) => other.of === limit.of),
  );
  const codes = [...impossible, ...rare].map((limit) => limit.code);
  if (!closes(sample)) codes.push('closure');
  const most = mu > HIGH_SUN ? 1.05 : 1.1;
  if (sample.ghi > LEAST_GLOBAL && sample.dhi / sample.ghi > most)
    codes.push('diffuse-above-global');
  return codes;
}
