import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { kendallTauB } from '../../../src/engineering/numeric/kendall.js';

/** The definition, pair by pair: Kendall 1945, The treatment of ties in ranking problems [memory]. */
function byDefinition(x: readonly number[], y: readonly number[]): number {
  let [score, notTiedX, notTiedY] = [0, 0, 0];
  for (let i = 0; i < x.length; i += 1) {
    for (let j = 0; j < i; j += 1) {
      const a = Math.sign((x[i] ?? 0) - (x[j] ?? 0));
      const b = Math.sign((y[i] ?? 0) - (y[j] ?? 0));
      score += a * b;
      notTiedX += a * a;
      notTiedY += b * b;
    }
  }
  return score / Math.sqrt(notTiedX * notTiedY);
}

describe('kendallTauB', () => {
  it('agrees with the definition on small lists with ties', () => {
    const pairs = fc.array(fc.tuple(fc.integer({ min: 0, max: 6 }), fc.integer({ min: 0, max: 6 })), {
      minLength: 2,
      maxLength: 40,
    });
    fc.assert(
      fc.property(pairs, (list) => {
        const [x, y] = [list.map(([a]) => a), list.map(([, b]) => b)];
        const expected = byDefinition(x, y);
        if (Number.isNaN(expected)) expect(kendallTauB(x, y)).toBeNaN();
        else expect(kendallTauB(x, y)).toBeCloseTo(expected, 12);
      }),
      { seed: 4, numRuns: 300 },
    );
  });

  it('is 1 for the same order, -1 for the opposite, and not known for one value or none told apart', () => {
    expect(kendallTauB([1, 2, 3], [10, 20, 30])).toBe(1);
    expect(kendallTauB([1, 2, 3], [30, 20, 10])).toBe(-1);
    expect(kendallTauB([1], [2])).toBeNaN();
    expect(kendallTauB([1, 1], [1, 2])).toBeNaN();
  });

  it('orders a hundred thousand values in well under the time of the pairs', () => {
    const n = 100_000;
    const x = Float64Array.from({ length: n }, (_, i) => (i * 7919) % n);
    // one swap of neighbours makes one discordant pair: tau = 1 - 4/(n(n-1))
    const y = x.slice();
    const [low, high] = [x.indexOf(500), x.indexOf(501)];
    y[low] = 501;
    y[high] = 500;
    expect(kendallTauB(x, y)).toBeCloseTo(1 - 4 / (n * (n - 1)), 14);
  });
});
