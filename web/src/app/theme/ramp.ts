/**
 * The light ramp: dusk through clay to straw, for a share of light from 0 to 1.
 *
 * Anchors are joined in OKLab (Ottosson 2020, "A perceptual color space for image processing"),
 * whose L is perceived lightness; anchors rise in L, so the ramp is monotone in lightness and stays
 * readable to colour-blind eyes and in grey print. The test measures that.
 */
export type Rgb = readonly [red: number, green: number, blue: number];

const ANCHORS: readonly { at: number; hex: string }[] = [
  { at: 0, hex: '#1E2747' },
  { at: 0.22, hex: '#3D4272' },
  { at: 0.5, hex: '#A35D52' },
  { at: 0.76, hex: '#DE9F52' },
  { at: 1, hex: '#FBE3A0' },
];

function toLinear(channel: number): number {
  const c = channel / 255;
  return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
}

function toChannel(linear: number): number {
  const c = linear <= 0.0031308 ? linear * 12.92 : 1.055 * linear ** (1 / 2.4) - 0.055;
  return Math.round(Math.min(1, Math.max(0, c)) * 255);
}

/** Red, green and blue, 0-255, of a `#rrggbb` colour. */
export function parseHex(hex: string): Rgb {
  const n = Number.parseInt(hex.slice(1), 16);
  return [(n >> 16) & 255, (n >> 8) & 255, n & 255];
}

/** OKLab coordinates of an sRGB colour. */
export function oklab([red, green, blue]: Rgb): [number, number, number] {
  const r = toLinear(red);
  const g = toLinear(green);
  const b = toLinear(blue);
  const l = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
  const m = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
  const s = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
  return [
    0.2104542553 * l + 0.793617785 * m - 0.0040720468 * s,
    1.9779984951 * l - 2.428592205 * m + 0.4505937099 * s,
    0.0259040371 * l + 0.7827717662 * m - 0.808675766 * s,
  ];
}

function fromOklab(lightness: number, a: number, b: number): Rgb {
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  return [
    toChannel(4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s),
    toChannel(-1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s),
    toChannel(-0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s),
  ];
}

const KNOTS = ANCHORS.map(({ at, hex }) => ({ at, lab: oklab(parseHex(hex)) }));

function blend(share: number): Rgb {
  const upper = Math.max(
    1,
    KNOTS.findIndex((knot) => knot.at >= share),
  );
  const low = KNOTS[upper - 1];
  const high = KNOTS[upper];
  const t = (share - low.at) / (high.at - low.at);
  const mix = (i: 0 | 1 | 2) => low.lab[i] + (high.lab[i] - low.lab[i]) * t;
  return fromOklab(mix(0), mix(1), mix(2));
}

const TABLE: readonly Rgb[] = Array.from({ length: 256 }, (_, i) => blend(i / 255));

/**
 * Colour of a share of light as red, green, blue 0-255, for canvases.
 *
 * @param share 0 (no light) to 1 (all of it); outside values take the nearer end
 */
export function lightRgb(share: number): Rgb {
  const index = Math.round(Math.min(1, Math.max(0, share)) * 255);
  return TABLE[Number.isNaN(index) ? 0 : index];
}

/** Colour of a share of light as CSS text. */
export function lightColour(share: number): string {
  const [r, g, b] = lightRgb(share);
  return `rgb(${r} ${g} ${b})`;
}

/** Black or white, whichever stands out more on the colour of that share (at least 4.5:1). */
export function lightInk(share: number): string {
  const [r, g, b] = lightRgb(share).map(toLinear);
  const luminance = 0.2126 * r + 0.7152 * g + 0.0722 * b;
  return luminance > 0.179 ? '#000000' : '#FFFFFF';
}

/** CSS custom properties `--fl-light-0` (dark) to `--fl-light-10` (bright) and the whole gradient. */
export function rampVariables(): Record<string, string> {
  const steps = Array.from({ length: 11 }, (_, i) => lightColour(i / 10));
  return {
    ...Object.fromEntries(steps.map((colour, i) => [`--fl-light-${i}`, colour])),
    '--fl-light-ramp': `linear-gradient(90deg, ${steps.join(', ')})`,
  };
}
