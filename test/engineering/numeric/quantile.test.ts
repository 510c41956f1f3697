import { describe, expect, it } from 'vitest';
import { quantileOfSorted } from '../../../src/engineering/numeric/quantile.js';

describe('quantileOfSorted', () => {
  // Hyndman and Fan 1996, definition 7, by hand: the place is p (n - 1) from the first, between two places by proportion
  it.each([
    [0, 1],
    [0.1, 1.4],
    [0.25, 2],
    [0.5, 4],
    [0.9, 13.6],
    [1, 16],
  ])('takes the %d quantile of 1, 2, 4, 10, 16 as %d', (p, expected) => {
    expect(quantileOfSorted(Float64Array.of(1, 2, 4, 10, 16), p)).toBeCloseTo(expected, 12);
  });

  it('is the value itself where there is one, and nothing of nothing', () => {
    expect(quantileOfSorted(Float64Array.of(0.7), 0.9)).toBe(0.7);
    expect(quantileOfSorted(new Float64Array(0), 0.5)).toBeNaN();
  });
});
