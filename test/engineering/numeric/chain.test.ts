import fc from 'fast-check';
import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { chainMode, chainProperties } from '../../../src/engineering/numeric/chain.js';

/** M^-1/2 K M^-1/2 of a shear building: symmetric, with the eigenvalues ω². */
function smallestEigenvalue(masses: readonly number[], springs: readonly number[]): number {
  const n = masses.length;
  const a = Matrix.zeros(n, n);
  for (let i = 0; i < n; i += 1) {
    a.set(i, i, (springs[i]! + (springs[i + 1] ?? 0)) / masses[i]!);
    if (i + 1 < n) {
      const off = -springs[i + 1]! / Math.sqrt(masses[i]! * masses[i + 1]!);
      a.set(i, i + 1, off);
      a.set(i + 1, i, off);
    }
  }
  return Math.min(...new EigenvalueDecomposition(a, { assumeSymmetric: true }).realEigenvalues);
}

const chains = fc
  .integer({ min: 1, max: 40 })
  .chain((n) =>
    fc.tuple(
      fc.array(fc.double({ min: 20, max: 2000, noNaN: true }), { minLength: n, maxLength: n }),
      fc.array(fc.double({ min: 1e4, max: 1e6, noNaN: true }), { minLength: n, maxLength: n }),
    ),
  );

describe('chainMode', () => {
  // against a general eigen-solver (ml-matrix)
  it('finds the smallest eigenvalue of 200 random chains', () => {
    fc.assert(
      fc.property(chains, ([masses, springs]) => {
        const there = smallestEigenvalue(masses, springs);
        expect(Math.abs(chainMode(masses, springs).eigenvalue - there)).toBeLessThanOrEqual(1e-9 * there);
      }),
      { numRuns: 200, seed: 6 },
    );
  });

  // Dunkerley, and Rayleigh with the sway under the storeys' own weight: bounds of the frequency (Thomson, 12.2)
  it('lies between Dunkerley and Rayleigh, with a shape that rises without a node', () => {
    fc.assert(
      fc.property(chains, ([masses, springs]) => {
        const { eigenvalue, shape } = chainMode(masses, springs);
        let flexibility = 0;
        let trace = 0;
        let sway = 0;
        let top = 0;
        let bottom = 0;
        masses.forEach((mass, i) => {
          flexibility += 1 / springs[i]!;
          trace += flexibility * mass;
          sway += masses.slice(i).reduce((a, b) => a + b, 0) / springs[i]!;
          top += mass * sway;
          bottom += mass * sway * sway;
          expect(shape[i]).toBeGreaterThan(shape[i - 1] ?? 0);
        });
        expect(eigenvalue).toBeGreaterThanOrEqual((1 - 1e-9) / trace);
        expect(eigenvalue).toBeLessThanOrEqual((1 + 1e-9) * (top / bottom));
      }),
      { numRuns: 200, seed: 7 },
    );
  });

  it('refuses lists of different length and entries that are not positive', () => {
    expect(() => chainMode([1, 2], [1])).toThrow(RangeError);
    expect(() => chainMode([], [])).toThrow(RangeError);
    expect(() => chainMode([1, 0], [1, 1])).toThrow(RangeError);
    expect(() => chainMode([1, 1], [1, -1])).toThrow(RangeError);
  });
});

describe('chainProperties', () => {
  // uniform shear building, eigen-solutions made elsewhere: participation, effective mass, first storey's share
  it.each([
    [1, 1, 1, 1],
    [2, 1.171, 0.947, 0.618],
    [3, 1.22, 0.914, 0.445],
    [5, 1.252, 0.88, 0.285],
    [10, 1.267, 0.848, 0.149],
    [20, 1.272, 0.83, 0.0766],
  ])('of %i equal storeys', (n, participation, share, first) => {
    const masses = new Array<number>(n).fill(1);
    const found = chainProperties(masses, chainMode(masses, masses));
    expect(found.participation).toBeCloseTo(participation, 3);
    expect(found.effectiveMassShare).toBeCloseTo(share, 3);
    expect(found.firstStoreyShare).toBeCloseTo(first, 3);
  });

  // SD-10: participation 4/3 and effective mass 8/9 of the frame 2m, m on 2k, k (matrix problem page, restated)
  it('of the two-storey frame with the lower half doubled', () => {
    const found = chainProperties([2, 1], chainMode([2, 1], [2, 1]));
    expect(found.participation).toBeCloseTo(4 / 3, 10);
    expect(found.effectiveMassShare).toBeCloseTo(8 / 9, 10);
    expect(found.firstStoreyShare).toBeCloseTo(0.5, 10);
  });
});
