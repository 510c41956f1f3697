import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  MixtureBuilder,
  MixturePool,
  mixtureCdf,
  mixtureMoments,
  mixtureQuantile,
} from '../../../src/engineering/priority/mixture.js';
import { normalQuantile } from '../../../src/engineering/numeric/normal.js';
import { gathered, mixtureOf, normalOf } from '../../support/engineering-mixture.js';
import type { Part } from '../../support/engineering-mixture.js';

const between = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });

/** Parts of one spread, as the assessment adds them. */
const PARTS: fc.Arbitrary<readonly Part[]> = fc
  .tuple(between(0.3, 2), fc.array(fc.tuple(between(0.001, 1), between(-6, 6)), { minLength: 1, maxLength: 120 }))
  .map(([sd, rows]) => {
    const total = rows.reduce((sum, [weight]) => sum + weight, 0);
    return rows.map(([weight, mean]) => ({ weight: weight / total, mean, sd }));
  });

describe('MixtureBuilder', () => {
  it('keeps weight, mean and variance', () => {
    fc.assert(
      fc.property(PARTS, (parts) => {
        const before = mixtureMoments(mixtureOf(parts));
        const mixture = gathered(parts);
        const after = mixtureMoments(mixture);
        expect(mixtureCdf(mixture, 1e6)).toBeCloseTo(1, 12);
        expect(Math.abs(after.mean - before.mean)).toBeLessThanOrEqual(1e-12 * (1 + Math.abs(before.mean)));
        expect(Math.abs(after.sd ** 2 - before.sd ** 2)).toBeLessThanOrEqual(1e-12 * (1 + before.sd ** 2) * 4);
      }),
      { numRuns: 300, seed: 15 },
    );
  });

  it('changes no chance by more than 0.002', () => {
    fc.assert(
      fc.property(PARTS, (parts) => {
        let worst = 0;
        const before = mixtureOf(parts);
        const after = gathered(parts);
        for (let x = -10; x <= 10; x += 0.25)
          worst = Math.max(worst, Math.abs(mixtureCdf(before, x) - mixtureCdf(after, x)));
        expect(worst).toBeLessThan(0.002);
      }),
      { numRuns: 300, seed: 16 },
    );
  });

  it('does not move by more than a last bit when its parts do', () => {
    // equally spaced parts on the edges of bins: where a whole part could jump from one bin to the next
    for (const step of [0.2, 0.4, 0.8, 1]) {
      const parts = Array.from({ length: 9 }, (_, i) => ({ weight: 1 / 9, mean: i * step, sd: 0.5 }));
      const before = gathered(parts);
      const after = gathered(
        parts.map(({ weight, mean, sd }) => ({ weight, mean: mean * (1 + 4e-16), sd: sd * (1 - 4e-16) })),
      );
      for (const q of [0.05, 0.5, 0.95]) {
        expect(mixtureQuantile(after, q, normalQuantile(q))).toBeCloseTo(
          mixtureQuantile(before, q, normalQuantile(q)),
          10,
        );
      }
    }
  });

  it('gathers parts without spread to within 0.05 of ln S', () => {
    const mixture = gathered([
      { weight: 0.5, mean: 0, sd: 0 },
      { weight: 0.25, mean: 0.01, sd: 0 },
      { weight: 0.25, mean: 1, sd: 0 },
    ]);
    expect(mixture.to - mixture.from).toBeLessThanOrEqual(4);
    expect(mixtureMoments(mixture).mean).toBeCloseTo(0.2525, 12);
  });

  it('starts again after clear and has nothing to gather when empty', () => {
    const builder = new MixtureBuilder();
    builder.add(1, 3, 1);
    builder.clear();
    expect(() => builder.gather(new MixturePool())).toThrow('an empty mixture');
  });
});

describe('mixtureQuantile', () => {
  it('inverts mixtureCdf', () => {
    fc.assert(
      fc.property(PARTS, between(0.001, 0.999), (parts, q) => {
        const mixture = mixtureOf(parts);
        expect(Math.abs(mixtureCdf(mixture, mixtureQuantile(mixture, q, normalQuantile(q))) - q)).toBeLessThan(1e-10);
      }),
      { numRuns: 500, seed: 17 },
    );
  });

  it('of one normal is mean plus z times its spread', () => {
    expect(mixtureQuantile(normalOf(2, 0.5), 0.95, 1.6448536269514722)).toBeCloseTo(2.822426813475736, 14);
    expect(mixtureQuantile(normalOf(2, 0), 0.95, 1.6448536269514722)).toBe(2);
  });

  it('finds its place between steps', () => {
    const steps = mixtureOf([
      { weight: 0.3, mean: 0, sd: 0 },
      { weight: 0.7, mean: 1, sd: 0 },
    ]);
    expect(mixtureQuantile(steps, 0.2, -0.84)).toBeCloseTo(0, 9);
    expect(mixtureQuantile(steps, 0.5, 0)).toBeCloseTo(1, 9);
  });
});
