import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { normalCdf, normalDensity, normalQuantile, tabledCdf } from '../../../src/engineering/numeric/normal.js';

describe('normalCdf', () => {
  // Abramowitz and Stegun, table 26.1, P(x) to 15 decimals, from memory
  it.each([
    [0, 0.5],
    [0.5, 0.691462461274013],
    [1, 0.841344746068543],
    [1.5, 0.933192798731142],
    [2, 0.977249868051821],
    [3, 0.99865010196837],
    [4, 0.999968328758167],
  ])('gives the table value at %f', (z, p) => {
    expect(Math.abs(normalCdf(z) - p)).toBeLessThan(2e-15);
    expect(Math.abs(normalCdf(-z) - (1 - p))).toBeLessThan(2e-15);
  });

  // Q(5) and Q(6) of the same tables, from memory, to the digits printed
  it('keeps its digits in the tail, to 1e-8 of the value', () => {
    expect(normalCdf(-5) / 2.866515718791939e-7).toBeCloseTo(1, 8);
    expect(normalCdf(-6) / 9.86587645037698e-10).toBeCloseTo(1, 8);
    expect(normalCdf(-10) / 7.61985302416053e-24).toBeCloseTo(1, 7);
    expect(normalCdf(40)).toBe(1);
    expect(normalCdf(-40)).toBe(0);
  });

  it('has the density as its slope', () => {
    for (let z = -4; z <= 4; z += 0.37) {
      const slope = (normalCdf(z + 1e-4) - normalCdf(z - 1e-4)) / 2e-4;
      expect(Math.abs(slope - normalDensity(z))).toBeLessThan(1e-8);
    }
  });
});

describe('normalQuantile', () => {
  it('gives the percentage points in use', () => {
    // Abramowitz and Stegun, table 26.5, from memory
    expect(normalQuantile(0.95)).toBeCloseTo(1.6448536269514722, 12);
    expect(normalQuantile(0.975)).toBeCloseTo(1.959963984540054, 12);
    expect(normalQuantile(0.84)).toBeCloseTo(0.994457883209753, 12);
  });

  it('is undone by normalCdf', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-12, max: 1 - 1e-12, noNaN: true }), (p) => {
        const back = normalCdf(normalQuantile(p));
        expect(Math.abs(back - p)).toBeLessThanOrEqual(1e-14 + 1e-12 * Math.min(p, 1 - p));
      }),
      { numRuns: 2000, seed: 3 },
    );
  });

  it('wants a chance between 0 and 1', () => {
    for (const p of [0, 1, -1, NaN]) expect(() => normalQuantile(p)).toThrow(RangeError);
  });
});

describe('tabledCdf', () => {
  it('is Φ to 2e-10, at and between its nodes, in the tails and beyond', () => {
    let worst = 0;
    for (let i = -90_000; i <= 90_000; i += 1) {
      const z = i / 10_007;
      worst = Math.max(worst, Math.abs(tabledCdf(z) - normalCdf(z)));
    }
    expect(worst).toBeLessThan(2e-10);
    expect(worst).toBeGreaterThan(0);
    expect([tabledCdf(-Infinity), tabledCdf(0), tabledCdf(Infinity)]).toEqual([0, 0.5, 1]);
  });
});
