import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { power } from '../../../src/engineering/numeric/power.js';

describe('power', () => {
  it('agrees with Math.pow to 1e-14', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-3, max: 1e4, noNaN: true }),
        fc.double({ min: -3, max: 3, noNaN: true }),
        (x, p) => {
          const there = Math.pow(x, p);
          expect(Math.abs(power(x, p) - there)).toBeLessThanOrEqual(1e-14 * there);
        },
      ),
      { numRuns: 5000, seed: 4 },
    );
  });

  it('is exact for the exponents 0 and 1 and at 0', () => {
    expect(power(7.3, 0)).toBe(1);
    expect(power(7.3, 1)).toBe(7.3);
    expect(power(0, 0.75)).toBe(0);
  });
});
