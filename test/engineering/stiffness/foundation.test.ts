import { describe, expect, it } from 'vitest';
import { foundationFactor } from '../../../src/engineering/stiffness/foundation.js';
import type { FoundationFactor } from '../../../src/engineering/stiffness/foundation.js';
import { building, given, structure } from '../../support/engineering-building.js';

const onGround = (vs30_mps: number, length = 20, width = 12, storeys = 4) =>
  building({
    storeys: given(storeys),
    height_m: given(12.8),
    plan_length_m: length,
    plan_width_m: width,
    structure: structure({ vs30_mps }),
  });
const factor = (found: FoundationFactor | string): number => (typeof found === 'string' ? NaN : found.factor);

describe('foundationFactor', () => {
  // worked elsewhere from the same formulas (SD-45): 20 × 12 m, 11,520 kN, 0.30 s, across the building
  it.each([
    [180, 1.24],
    [120, 1.49],
    [300, 1.09],
    [600, 1.02],
  ])('lengthens the worked building on ground of %d m/s by %d', (velocity, expected) => {
    expect(factor(foundationFactor(onGround(velocity), 'transverse', 0.3, 11_520))).toBeCloseTo(expected, 2);
  });

  it('rocks less along the building, and alike in a square whichever way', () => {
    const along = factor(foundationFactor(onGround(180), 'longitudinal', 0.3, 11_520));
    const across = factor(foundationFactor(onGround(180), 'transverse', 0.3, 11_520));
    expect(along).toBeLessThan(across);
    // a width larger than the length turns the two about
    expect(factor(foundationFactor(onGround(180, 12, 20), 'transverse', 0.3, 11_520))).toBe(along);
    const square = onGround(180, 15, 15);
    expect(factor(foundationFactor(square, 'longitudinal', 0.3, 11_520))).toBeCloseTo(
      factor(foundationFactor(square, 'transverse', 0.3, 11_520)),
      12,
    );
  });

  // NIST GCR 12-917-21 criterion as coded (SD-46)
  it('is worth counting above a wave parameter of 0.1', () => {
    const worth = (velocity: number): boolean | string => {
      const found = foundationFactor(onGround(velocity), 'transverse', 0.3, 11_520);
      return typeof found === 'string' ? found : found.worthCounting;
    };
    expect([150.6, 251, 502].map(worth)).toEqual([true, true, false]);
  });

  it('says what is missing', () => {
    expect(foundationFactor(building(), 'longitudinal', 0.3, 1000)).toContain('velocity');
    expect(foundationFactor(onGround(180, NaN), 'longitudinal', 0.3, 1000)).toContain('plan');
    expect(foundationFactor(onGround(180), 'longitudinal', 0.3, NaN)).toContain('weight');
  });
});
