import { describe, expect, it } from 'vitest';
import { parseNumber } from './parse-number';

describe('parseNumber', () => {
  it.each([
    ['3,5', 3.5],
    ['3.5', 3.5],
    ['-0,25', -0.25],
    ['\u22124', -4],
    ['1 234,5', 1234.5],
    ['1\u202f234', 1234],
    ['1.234,5', 1234.5],
    ['1,234.5', 1234.5],
    ['1.234', 1.234],
    ['12.', 12],
    ['.5', 0.5],
  ])('reads %s', (text, value) => {
    expect(parseNumber(text)).toBe(value);
  });

  it.each(['', '  ', 'abc', '1,2,3', '4 m', '--1', '1e5'])('refuses %j', (text) => {
    expect(parseNumber(text)).toBeNull();
  });
});
