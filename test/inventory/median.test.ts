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
});
