import { describe, expect, it } from 'vitest';
import { changesOf, collide } from './merge';

const base = { name: 'Long Acre', slope: 2, place: [13, 52] };

describe('merging two people’s changes', () => {
  it('sends only what was changed', () => {
    expect(changesOf(base, { ...base, place: [13, 52] })).toEqual({});
    expect(changesOf(base, { ...base, slope: 3 })).toEqual({ slope: 3 });
  });

  it('collides only where both changed the same thing', () => {
    const theirs = { ...base, name: 'Longacre' };
    expect(collide({ slope: 3 }, base, theirs)).toBe(false);
    expect(collide({ name: 'Acre' }, base, theirs)).toBe(true);
  });
});
