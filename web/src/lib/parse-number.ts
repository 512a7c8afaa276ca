/**
 * Read a number a person typed, with comma or point as the decimal mark.
 *
 * Spaces of every width group thousands. With both marks present the last one is the decimal mark;
 * a single mark always is ("1.234" is one and a bit, never a thousand: nothing is guessed upwards).
 *
 * @returns the number, or null when the text is empty or no number
 */
export function parseNumber(text: string): number | null {
  let plain = text.replaceAll(/[\s\u00a0\u2009\u202f']/g, '').replace('\u2212', '-');
  if (plain === '') return null;
  const lastComma = plain.lastIndexOf(',');
  const lastPoint = plain.lastIndexOf('.');
  if (lastComma >= 0 && lastPoint >= 0) {
    const grouping = lastComma > lastPoint ? '.' : ',';
    plain = plain.replaceAll(grouping, '');
  }
  plain = plain.replace(',', '.');
  return /^[+-]?(\d+\.?\d*|\.\d+)$/.test(plain) ? Number(plain) : null;
}
