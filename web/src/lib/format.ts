const NBSP = '\u00a0';

const numberFormats = new Map<number, Intl.NumberFormat>();

/** A number with a fixed count of decimals, grouped by thin spaces as the trade writes it. */
export function formatNumber(value: number, decimals = 0): string {
  let format = numberFormats.get(decimals);
  if (!format) {
    format = new Intl.NumberFormat('en-GB', {
      minimumFractionDigits: decimals,
      maximumFractionDigits: decimals,
    });
    numberFormats.set(decimals, format);
  }
  return format.format(value).replaceAll(',', '\u202f').replace('-', '\u2212');
}

/** A number and its unit, kept on one line. */
export function withUnit(value: number, unit: string, decimals = 0): string {
  return `${formatNumber(value, decimals)}${NBSP}${unit}`;
}

/** Square metres written as hectares; small plots get a third decimal. */
export function hectares(areaM2: number): string {
  const ha = areaM2 / 10_000;
  return withUnit(ha, 'ha', ha < 1 ? 3 : 2);
}

/** A share of 0-1 as per cent. */
export function percent(share: number, decimals = 0): string {
  return withUnit(share * 100, '%', decimals);
}

/** An angle clockwise from north with its compass point. */
export function bearing(degrees: number): string {
  return `${formatNumber(degrees)}° ${compassPoint(degrees)}`;
}

/** The nearest of the eight compass points. */
export function compassPoint(degrees: number): string {
  const points = ['N', 'NE', 'E', 'SE', 'S', 'SW', 'W', 'NW'];
  return points[Math.round((((degrees % 360) + 360) % 360) / 45) % 8];
}

/** A calendar date such as `5 Oct 2026`. */
export function calendarDate(isoDate: string): string {
  return new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    timeZone: 'UTC',
  }).format(new Date(`${isoDate}T00:00:00Z`));
}

/** An instant in a place's own clock. */
export function instantIn(instant: string, timeZone: string): string {
  return new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    timeZone,
  }).format(new Date(instant));
}

/** How long ago an instant lies, in the coarsest honest unit. */
export function ago(instant: string, now: Date): string {
  const minutes = Math.max(0, (now.getTime() - new Date(instant).getTime()) / 60_000);
  if (minutes < 1) return 'just now';
  const relative = new Intl.RelativeTimeFormat('en-GB', { numeric: 'auto' });
  if (minutes < 60) return relative.format(-Math.round(minutes), 'minute');
  if (minutes < 24 * 60) return relative.format(-Math.round(minutes / 60), 'hour');
  return relative.format(-Math.round(minutes / 1440), 'day');
}

/** A count with its noun, such as `1 season` or `3 seasons`. */
export function countOf(count: number, noun: string): string {
  return `${formatNumber(count)} ${noun}${count === 1 ? '' : 's'}`;
}
