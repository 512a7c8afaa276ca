import { InputError } from '../errors.js';

const MONTH_STARTS = [0, 31, 59, 90, 120, 151, 181, 212, 243, 273, 304, 334];
const DAYS_IN_YEAR = 365;

/**
 * Day of a 365-day year, from 0, of a month and day. 29 February counts as 28 February: weather
 * years rarely have it.
 *
 * @param monthDay `MM-DD`
 * @throws InputError naming monthDay
 */
export function dayOfMonthDay(monthDay: string): number {
  const match = /^(\d\d)-(\d\d)$/.exec(monthDay);
  const month = Number(match?.[1]);
  const day = Number(match?.[2]);
  const lengths = MONTH_STARTS.map((start, i) => (MONTH_STARTS[i + 1] ?? DAYS_IN_YEAR) - start);
  const longest = month === 2 ? 29 : lengths[month - 1];
  if (!match || !(longest >= day) || day < 1) {
    throw new InputError('monthDay', `"${monthDay}" is not a month and day (MM-DD).`);
  }
  return MONTH_STARTS[month - 1] + Math.min(day, lengths[month - 1]) - 1;
}

/** Month 0-11 of a 0-based day of a 365-day year (day 365 of a leap year counts as December). */
export function monthOf(day: number): number {
  let month = 11;
  while (day < MONTH_STARTS[month]) month -= 1;
  return month;
}

/** First day (0-based) and length of a month 0-11. */
export function monthSpan(month: number): { firstDay: number; days: number } {
  const firstDay = MONTH_STARTS[month];
  return { firstDay, days: (MONTH_STARTS[month + 1] ?? DAYS_IN_YEAR) - firstDay };
}

/** Is a day within a span of days that may run over New Year? Both ends count. */
export function isWithin(day: number, from: number, to: number): boolean {
  return from <= to ? day >= from && day <= to : day >= from || day <= to;
}

/**
 * Length of a span of days that may run over New Year, both ends counted.
 *
 * @param from 0-based first day
 * @param to 0-based last day; before `from` means next year
 */
export function spanDays(from: number, to: number): number {
  return ((to - from + DAYS_IN_YEAR) % DAYS_IN_YEAR) + 1;
}
