import { describe, expect, it } from 'vitest';
import { aCrop } from '../../../testing/factories';
import { daysBetween, usualDates } from './season-dates';

describe('usualDates', () => {
  const winter = aCrop({ sowFrom: '10-01', harvestFrom: '07-20' });

  it('takes the next sowing and lets a winter crop cross New Year', () => {
    expect(usualDates(winter, '2026-09-01')).toEqual({
      sowing: '2026-10-01',
      harvest: '2027-07-20',
    });
    expect(usualDates(winter, '2026-12-01')).toEqual({
      sowing: '2027-10-01',
      harvest: '2028-07-20',
    });
  });

  it('keeps a summer crop within its year and knows no dates without a source', () => {
    const summer = aCrop({ sowFrom: '03-15', harvestFrom: '08-10' });
    expect(usualDates(summer, '2026-12-01')).toEqual({
      sowing: '2027-03-15',
      harvest: '2027-08-10',
    });
    expect(usualDates(aCrop({ sowFrom: null }), '2026-12-01')).toBeNull();
  });

  it('counts whole days over summer time and leap days', () => {
    expect(daysBetween('2026-03-28', '2026-03-30')).toBe(2);
    expect(daysBetween('2028-02-28', '2028-03-01')).toBe(2);
  });
});
