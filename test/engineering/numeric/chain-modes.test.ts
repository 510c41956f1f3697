import fc from 'fast-check';
import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { chainMode } from '../../../src/engineering/numeric/chain.js';
import { chainModeOf, driftFactor, eigenvaluesBelow } from '../../../src/engineering/numeric/chain-modes.js';

/** M^-1/2 K M^-1/2 of a shear building: symmetric, with the eigenvalues ω². */
function symmetric(masses: readonly number[], springs: readonly number[]): Matrix {
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
  return a;
}

/** M^1/2 K^-1 M^1/2, whose largest eigenvalue is 1/ω1²: sums of positive terms, so a general solver loses nothing to it. */
function flexibility(masses: readonly number[], springs: readonly number[]): Matrix {
  const n = masses.length;
  const under: number[] = [];
  let sum = 0;
  for (const k of springs) under.push((sum += 1 / k));
  const a = Matrix.zeros(n, n);
  for (let i = 0; i < n; i += 1)
    for (let j = 0; j < n; j += 1) a.set(i, j, under[Math.min(i, j)]! * Math.sqrt(masses[i]! * masses[j]!));
  return a;
}

const eigenvalues = (a: Matrix): number[] =>
  [...new EigenvalueDecomposition(a, { assumeSymmetric: true }).realEigenvalues].sort((x, y) => x - y);

/** A seeded chain of `n` storeys whose stiffnesses spread over `contrast`, in ten-folds; masses within a factor of 2. */
function invented(random: () => number, n: number, contrast: number): [number[], number[]] {
  const masses = Array.from({ length: n }, () => 200 * (1 + random()));
  const springs = Array.from({ length: n }, () => 1e5 * contrast ** random());
  return [masses, springs];
}

/** The numeric recipe of a linear congruential generator. */
function draws(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

/** ‖Kφ - λMφ‖ over (‖K‖ + λ‖M‖) ‖φ‖, largest entries. */
function residual(masses: readonly number[], springs: readonly number[], lambda: number, shape: Float64Array): number {
  let worst = 0;
  let stiff = 0;
  let heavy = 0;
  let large = 0;
  for (let i = 0; i < masses.length; i += 1) {
    const above = springs[i + 1] ?? 0;
    const force =
      (springs[i]! + above) * shape[i]! -
      springs[i]! * (shape[i - 1] ?? 0) -
      above * (shape[i + 1] ?? 0) -
      lambda * masses[i]! * shape[i]!;
    worst = Math.max(worst, Math.abs(force));
    stiff = Math.max(stiff, 2 * (springs[i]! + above));
    heavy = Math.max(heavy, masses[i]!);
    large = Math.max(large, Math.abs(shape[i]!));
  }
  return worst / ((stiff + lambda * heavy) * large);
}

const RUNS = 500;

describe('chainMode against a general-purpose solver (ml-matrix)', () => {
  // 1 to 120 storeys, stiffness contrast to 100: the smallest eigenvalue to 1e-9 by stiffness, 1e-12 by flexibility
  it('finds the fundamental eigenvalue of 500 random chains', () => {
    const random = draws(41);
    for (let run = 0; run < RUNS; run += 1) {
      const n = run < 120 ? run + 1 : 1 + Math.floor(120 * random() ** 3);
      const [masses, springs] = invented(random, n, 100);
      const { eigenvalue } = chainMode(masses, springs);
      const byStiffness = eigenvalues(symmetric(masses, springs))[0]!;
      expect(Math.abs(eigenvalue - byStiffness), `run ${String(run)}, ${String(n)} storeys`).toBeLessThanOrEqual(
        1e-9 * byStiffness,
      );
      const byFlexibility = 1 / eigenvalues(flexibility(masses, springs)).at(-1)!;
      expect(Math.abs(eigenvalue - byFlexibility), `run ${String(run)}, ${String(n)} storeys`).toBeLessThanOrEqual(
        1e-12 * byFlexibility,
      );
      const again = chainModeOf(masses, springs, 1).eigenvalue;
      expect(Math.abs(eigenvalue - again)).toBeLessThanOrEqual(1e-13 * again);
    }
  }, 120_000);

  // contrast 1e2 to 1e6, where a general solver is no judge of the smallest eigenvalue: the equation itself
  it('leaves a residual of rounding alone beyond that contrast', () => {
    const random = draws(42);
    for (let run = 0; run < RUNS; run += 1) {
      const n = 1 + Math.floor(120 * random());
      const [masses, springs] = invented(random, n, 10 ** (2 + 4 * random()));
      const first = chainMode(masses, springs);
      expect(residual(masses, springs, first.eigenvalue, first.shape)).toBeLessThanOrEqual(1e-14);
      const which = 1 + Math.floor(n * random());
      const other = chainModeOf(masses, springs, which);
      expect(residual(masses, springs, other.eigenvalue, other.shape)).toBeLessThanOrEqual(1e-14);
    }
  });

  // Dunkerley ≤ exact ≤ Rayleigh with the self-weight sway, in frequencies (Thomson, 12.2)
  it('lies between Dunkerley and Rayleigh on 500 random chains of any contrast', () => {
    const random = draws(43);
    for (let run = 0; run < RUNS; run += 1) {
      const n = 1 + Math.floor(120 * random());
      const [masses, springs] = invented(random, n, 10 ** (6 * random()));
      const { eigenvalue } = chainMode(masses, springs);
      let under = 0;
      let trace = 0;
      let weight = masses.reduce((sum, mass) => sum + mass, 0);
      let sway = 0;
      let top = 0;
      let bottom = 0;
      for (let i = 0; i < n; i += 1) {
        under += 1 / springs[i]!;
        trace += masses[i]! * under;
        sway += weight / springs[i]!;
        weight -= masses[i]!;
        top += masses[i]! * sway;
        bottom += masses[i]! * sway * sway;
      }
      expect(eigenvalue * trace).toBeGreaterThanOrEqual(1 - 1e-12);
      expect(eigenvalue).toBeLessThanOrEqual((top / bottom) * (1 + 1e-12));
    }
  });
});

describe('chainModeOf', () => {
  it('finds every eigenvalue of random chains', () => {
    const random = draws(44);
    for (let run = 0; run < 60; run += 1) {
      const n = 1 + Math.floor(30 * random());
      const [masses, springs] = invented(random, n, 100);
      eigenvalues(symmetric(masses, springs)).forEach((there, i) => {
        const { eigenvalue } = chainModeOf(masses, springs, i + 1);
        expect(Math.abs(eigenvalue - there)).toBeLessThanOrEqual(1e-9 * there);
      });
    }
  });

  // closed forms: Thomson, Theory of Vibration, 9.7 and p. 291
  it('is the closed form of equal storeys in every mode, with and without half the mass at the roof', () => {
    for (const n of [1, 2, 7, 40, 120]) {
      const ones = new Array<number>(n).fill(1);
      const light = ones.map((_, i) => (i === n - 1 ? 0.5 : 1));
      for (let r = 1; r <= n; r += 1) {
        const even = 2 * Math.sin(((2 * r - 1) * Math.PI) / (2 * (2 * n + 1)));
        const half = 2 * Math.sin(((2 * r - 1) * Math.PI) / (4 * n));
        expect(Math.abs(Math.sqrt(chainModeOf(ones, ones, r).eigenvalue) - even)).toBeLessThanOrEqual(2e-14 * even);
        expect(Math.abs(Math.sqrt(chainModeOf(light, ones, r).eigenvalue) - half)).toBeLessThanOrEqual(2e-14 * half);
      }
    }
  });

  // shape of equal storeys: sin(j(2r-1)π/(2N+1))
  it('has the shape of the closed form', () => {
    const n = 9;
    const ones = new Array<number>(n).fill(1);
    for (let r = 1; r <= n; r += 1) {
      const { shape } = chainModeOf(ones, ones, r);
      const at = (j: number): number => Math.sin((j * (2 * r - 1) * Math.PI) / (2 * n + 1));
      shape.forEach((x, i) => expect(x).toBeCloseTo(at(i + 1) / at(n), 10));
    }
  });

  it('refuses lists of different length, entries that are not positive, and modes that are not there', () => {
    expect(() => chainModeOf([1, 2], [1], 1)).toThrow(RangeError);
    expect(() => chainModeOf([1, 0], [1, 1], 1)).toThrow(RangeError);
    expect(() => chainModeOf([1, 1], [1, 1], 3)).toThrow('mode 3 of a chain that has 2');
    expect(() => chainModeOf([1, 1], [1, 1], 1.5)).toThrow(RangeError);
  });
});

describe('eigenvaluesBelow', () => {
  it('counts the eigenvalues of a general solver', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 25 }),
        fc.nat(),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (n, seed, at) => {
          const [masses, springs] = invented(draws(seed), n, 100);
          const all = eigenvalues(symmetric(masses, springs));
          const lambda = all[0]! * (all.at(-1)! / all[0]!) ** at * 1.00001;
          expect(eigenvaluesBelow(masses, springs, lambda)).toBe(all.filter((value) => value < lambda).length);
        },
      ),
      { numRuns: 200, seed: 45 },
    );
  });
});

describe('driftFactor', () => {
  // mode 1 of the shear cantilever: π/2
  it('tends to π/2 as equal storeys grow in number', () => {
    const ones = new Array<number>(120).fill(1);
    expect(driftFactor(chainMode(ones, ones))).toBeCloseTo(Math.PI / 2, 1);
    expect(driftFactor(chainMode([1], [1]))).toBe(1);
  });
});
