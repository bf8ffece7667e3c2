import { describe, expect, it } from 'vitest';

import { drawAfter, readDrawNumber } from './draw-navigation.ts';

const odd = `n = whole(1, 9)
require(n > 2)
require(n < 8)`;

describe('moving through the draws', () => {
  it('passes over draws that the script discards, in both directions and round the ends', () => {
    const random = (): number => 0;
    expect(drawAfter(odd, null, 'first', random)).toBe(3);
    expect(drawAfter(odd, 3, 'next', random)).toBe(4);
    expect(drawAfter(odd, 7, 'next', random)).toBe(3);
    expect(drawAfter(odd, 4, 'previous', random)).toBe(3);
    expect(drawAfter(odd, 3, 'previous', random)).toBe(7);
  });

  it('takes a kept draw by chance', () => {
    expect(drawAfter(odd, 3, 'random', () => 0.999)).toBe(3);
    expect(drawAfter(odd, 3, 'random', () => 0.5)).toBe(5);
  });

  it('gives nothing when the script has an error or keeps no draw', () => {
    expect(drawAfter('n = whole(1,', 1, 'next', () => 0)).toBeNull();
    expect(drawAfter('n = whole(1, 3)\nrequire(n > 5)', 1, 'previous', () => 0)).toBeNull();
  });
});

describe('a typed draw number', () => {
  it('may have spaces or commas between thousands', () => {
    expect(readDrawNumber('4,320', 5000, false)).toEqual({ ok: true, draw: 4320 });
    expect(readDrawNumber('4 320', 5000, false)).toEqual({ ok: true, draw: 4320 });
  });

  it('is refused with the reason', () => {
    expect(readDrawNumber('1.5', 10, false)).toMatchObject({ ok: false });
    expect(readDrawNumber('0', 10, false)).toMatchObject({ reason: 'Draws are numbered from 1.' });
    expect(readDrawNumber('11', 10, false)).toMatchObject({
      reason: 'This script has 10 draws; 11 is beyond the last.',
    });
    expect(readDrawNumber('11', 10, true)).toEqual({ ok: true, draw: 11 });
  });
});
