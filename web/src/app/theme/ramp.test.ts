import { describe, expect, it } from 'vitest';
import { lightColour, lightInk, lightRgb, oklab, rampVariables, type Rgb } from './ramp';
import { dark, light, type Palette } from './palette';

function luminance([r, g, b]: Rgb): number {
  const part = (v: number) =>
    v / 255 <= 0.04045 ? v / 255 / 12.92 : ((v / 255 + 0.055) / 1.055) ** 2.4;
  return 0.2126 * part(r) + 0.7152 * part(g) + 0.0722 * part(b);
}

function rgbOf(hex: string): Rgb {
  const n = Number.parseInt(hex.slice(1), 16);
  return [n >> 16, (n >> 8) & 255, n & 255];
}

/** Contrast ratio, WCAG 2.2 "contrast ratio" definition. */
function contrast(a: Rgb, b: Rgb): number {
  const [hi, lo] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (hi + 0.05) / (lo + 0.05);
}

describe('light ramp', () => {
  it('rises in perceived lightness and in grey print, without a flat or backward step', () => {
    for (let i = 1; i <= 50; i += 1) {
      const before = lightRgb((i - 1) / 50);
      const after = lightRgb(i / 50);
      expect(oklab(after)[0]).toBeGreaterThan(oklab(before)[0]);
      expect(luminance(after)).toBeGreaterThan(luminance(before));
    }
  });

  it('starts in dusk, ends in straw and holds outside values at its ends', () => {
    expect(lightColour(0)).toBe('rgb(30 39 71)');
    expect(lightColour(1)).toBe('rgb(251 227 160)');
    expect(lightColour(-1)).toBe(lightColour(0));
    expect(lightColour(1.4)).toBe(lightColour(1));
  });

  it('offers ink with at least 4.5:1 on every step', () => {
    for (let i = 0; i <= 100; i += 1) {
      const share = i / 100;
      expect(contrast(rgbOf(lightInk(share)), lightRgb(share))).toBeGreaterThanOrEqual(4.5);
    }
  });

  it('gives eleven steps and a gradient to the stylesheet', () => {
    const variables = rampVariables();
    expect(variables['--fl-light-0']).toBe(lightColour(0));
    expect(variables['--fl-light-10']).toBe(lightColour(1));
    expect(variables['--fl-light-ramp']).toMatch(/^linear-gradient/);
  });
});

describe.each<[string, Palette]>([
  ['light', light],
  ['dark', dark],
])('%s palette', (_name, palette) => {
  const grounds = [palette.paper, palette.sheet, palette.sunk].map(rgbOf);

  it.each(['ink', 'inkSoft', 'leaf', 'soil', 'dusk', 'danger', 'warn'] as const)(
    '%s reads at 4.5:1 on every ground (WCAG 1.4.3)',
    (name) => {
      for (const ground of grounds) {
        expect(contrast(rgbOf(palette[name]), ground)).toBeGreaterThanOrEqual(4.5);
      }
    },
  );

  it('draws control edges at 3:1 (WCAG 1.4.11) and text on leaf at 4.5:1', () => {
    for (const ground of grounds) {
      expect(contrast(rgbOf(palette.edge), ground)).toBeGreaterThanOrEqual(3);
    }
    expect(contrast(rgbOf(palette.onLeaf), rgbOf(palette.leaf))).toBeGreaterThanOrEqual(4.5);
  });
});
