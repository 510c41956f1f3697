import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { medianOf } from '../../src/inventory/median.js';

describe('medianOf', () => {
  it('is the lower middle of the sorted known values', () => {
    fc.assert(
      fc.property(
        fc.array(fc.oneof(fc.constant(NaN), fc.integer({ min: -5, max: 5 }), fc.double({ noNaN: true })), {
          maxLength: 60,
        }),
        (values) => {
          const known = values.filter((value) => !Number.isNaN(value)).sort((a, b) => a - b);
          const expected = known.length === 0 ? NaN : known[(known.length - 1) >> 1]!;
          expect(medianOf(Float64Array.from(values)) + 0).toBe(expected + 0);
        },
      ),
      { seed: 7 },
    );
  });

  it('is so of many values too, where a sample brackets the middle, or misses it', () => {
    let state = 9;
    const random = (): number => (state = (state * 16_807) % 2_147_483_647) / 2_147_483_647;
    const count = 40_961;
    // of the last: every value that is sampled is small
    const sampled = new Set(Array.from({ length: 2048 }, (_, i) => Math.floor((i * count) / 2048)));
    const kinds: readonly ((i: number) => number)[] = [
      random,
      (i) => i,
      (i) => -i,
      (i) => i % 3,
      () => 4,
      (i) => (i % 5 === 0 ? NaN : random() ** 4),
      (i) => (sampled.has(i) ? -random() : random()),
    ];
    for (const value of kinds) {
      const values = Float64Array.from({ length: count }, (_, i) => value(i));
      const known = values.filter((one) => !Number.isNaN(one)).sort();
      expect(medianOf(values)).toBe(known[(known.length - 1) >> 1]);
    }
  });
});
