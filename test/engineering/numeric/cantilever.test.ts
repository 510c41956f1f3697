import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { cantileverEigenvalue } from '../../../src/engineering/numeric/cantilever.js';

const period = (eigenvalue: number): number => (2 * Math.PI) / Math.sqrt(eigenvalue);

/** 1/ω² as the largest eigenvalue of M^1/2 F M^1/2, the flexibility from z²(3y - z)/(6EI) + z/(GA), z the lower floor. */
function byFlexibility(masses: readonly number[], storeys: readonly number[], bending: number, shear: number): number {
  const n = masses.length;
  const height = storeys.map((_, i) => storeys.slice(0, i + 1).reduce((sum, h) => sum + h, 0));
  const a = Matrix.zeros(n, n);
  for (let i = 0; i < n; i += 1)
    for (let j = 0; j < n; j += 1) {
      const [z, y] = [Math.min(height[i]!, height[j]!), Math.max(height[i]!, height[j]!)];
      a.set(i, j, ((z * z * (3 * y - z)) / (6 * bending) + z / shear) * Math.sqrt(masses[i]! * masses[j]!));
    }
  return 1 / Math.max(...new EigenvalueDecomposition(a, { assumeSymmetric: true }).realEigenvalues);
}

describe('cantileverEigenvalue', () => {
  // against ml-matrix on the flexibility by the textbook formula
  it.each([1, 2, 3, 7, 20, 60])('is that of a general solver, %i floors', (n) => {
    const masses = Array.from({ length: n }, (_, i) => 100 + 37 * ((i * 7) % 5));
    const storeys = Array.from({ length: n }, (_, i) => (i === 0 ? 4.5 : 3 + 0.1 * (i % 3)));
    for (const [bending, shear] of [
      [1e8, 1e15],
      [1e15, 1e6],
      [1e9, 3e6],
    ] as const) {
      const there = byFlexibility(masses, storeys, bending, shear);
      expect(Math.abs(cantileverEigenvalue(masses, storeys, bending, shear) - there)).toBeLessThanOrEqual(
        1e-11 * there,
      );
    }
  });

  // limits of many floors: 2π/3.5160 in bending (Steel Designers' Manual, table 12.2), 4 in shear
  it('tends to the cantilevers with their mass spread out', () => {
    const even = new Array<number>(2000).fill(1 / 2000);
    expect(period(cantileverEigenvalue(even, even, 1, Infinity)) / ((2 * Math.PI) / 3.51601527)).toBeCloseTo(1, 2);
    expect(period(cantileverEigenvalue(even, even, Infinity, 1)) / 4).toBeCloseTo(1, 3);
  });

  it('refuses lists of different length and entries that are not positive', () => {
    expect(() => cantileverEigenvalue([1, 1], [1], 1, 1)).toThrow(RangeError);
    expect(() => cantileverEigenvalue([1], [0], 1, 1)).toThrow(RangeError);
    expect(() => cantileverEigenvalue([1], [1], NaN, 1)).toThrow(RangeError);
  });
});
