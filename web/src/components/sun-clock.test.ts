import { describe, expect, it } from 'vitest';
import { dayName, hourName, moved } from './sun-clock';

describe('sun clock', () => {
  it('names days and hours', () => {
    expect(dayName(0)).toBe('1 Jan');
    expect(dayName(364)).toBe('31 Dec');
    expect(hourName(9.25)).toBe('09:15');
    expect(hourName(11.999)).toBe('12:00');
  });

  it('plays a day in twelve seconds and starts again at midnight', () => {
    expect(moved({ day: 10, hour: 6 }, 'day', 3)).toEqual({ day: 10, hour: 12 });
    expect(moved({ day: 10, hour: 23 }, 'day', 1).hour).toBeCloseTo(1, 12);
  });

  it('plays a year at one hour of the day', () => {
    const later = moved({ day: 360, hour: 8 }, 'year', 1);
    expect(later.hour).toBe(8);
    expect(later.day).toBeCloseTo(360 + 365 / 12 - 365, 9);
  });
});
