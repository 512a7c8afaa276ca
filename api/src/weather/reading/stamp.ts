/** Parts of a date and hour as written. */
export interface Stamp {
  year: number;
  month: number;
  day: number;
  hour: number;
  minute: number;
}

const CLOCK = /(?:[ T:]+(\d{1,2})(?::?(\d{2}))?(?::\d{2})?(?:\.\d+)?Z?)?$/.source;

const LAYOUTS: [RegExp, (m: number[]) => [number, number, number]][] = [
  // 2025-01-31, 2025/01/31
  [new RegExp(`^(\\d{4})[-/.](\\d{1,2})[-/.](\\d{1,2})${CLOCK}`), ([y, m, d]) => [y, m, d]],
  // 20250131:0010 and 20250131 00:10
  [new RegExp(`^(\\d{4})(\\d{2})(\\d{2})${CLOCK}`), ([y, m, d]) => [y, m, d]],
  // 31.01.2025
  [new RegExp(`^(\\d{1,2})\\.(\\d{1,2})\\.(\\d{4})${CLOCK}`), ([d, m, y]) => [y, m, d]],
  // 01/31/2025, or 31/01/2025 where the first number cannot be a month
  [
    new RegExp(`^(\\d{1,2})/(\\d{1,2})/(\\d{4})${CLOCK}`),
    ([a, b, y]) => (a > 12 ? [y, b, a] : [y, a, b]),
  ],
];

/** Read a date with an optional hour; null when it is not one. */
export function parseStamp(text: string): Stamp | null {
  for (const [pattern, order] of LAYOUTS) {
    const match = pattern.exec(text.trim());
    if (!match) continue;
    const [year, month, day] = order(match.slice(1, 4).map(Number));
    const hour = Number(match[4] ?? 0);
    const minute = Number(match[5] ?? 0);
    if (month < 1 || month > 12 || day < 1 || day > 31 || hour > 24 || minute > 59) return null;
    return { year, month, day, hour, minute };
  }
  return null;
}
