import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { apply } from '../../../src/engineering/formula.js';
import { FREQUENCY_TO_PERIOD } from '../../../src/engineering/period/measured-records.js';
import { FIRST_STOREY_SHARE } from '../../../src/engineering/stiffness/chain-shape.js';
import { GENERAL_CHAIN, SINGLE_MASS, UNIFORM_CHAIN } from '../../../src/engineering/stiffness/chain.js';

const mass = fc.double({ min: 10, max: 5000, noNaN: true });
const spring = fc.double({ min: 1e3, max: 1e7, noNaN: true });
const close = (a: number, b: number, relative = 1e-12): void => {
  expect(Math.abs(a - b)).toBeLessThanOrEqual(relative * Math.abs(b));
};
const ones = (n: number): readonly number[] => new Array<number>(n).fill(1);

describe('GENERAL_CHAIN', () => {
  it('of one storey is the single mass', () => {
    fc.assert(
      fc.property(mass, spring, (mass_t, stiffness_kN_per_m) => {
        const one = apply(SINGLE_MASS, { mass_t, stiffness_kN_per_m });
        close(apply(GENERAL_CHAIN, { masses_t: [mass_t], storey_stiffness_kN_per_m: [stiffness_kN_per_m] }), one);
        close(apply(UNIFORM_CHAIN, { storeys: 1, mass_t, stiffness_kN_per_m }), one);
      }),
      { seed: 11 },
    );
  });

  // closed form of equal storeys: Thomson, Theory of Vibration, 9.7
  it('of equal storeys is the closed form, for 1 to 120 storeys', () => {
    for (let n = 1; n <= 120; n += 1) {
      close(
        apply(GENERAL_CHAIN, { masses_t: ones(n), storey_stiffness_kN_per_m: ones(n) }),
        apply(UNIFORM_CHAIN, { storeys: n, mass_t: 1, stiffness_kN_per_m: 1 }),
      );
    }
  });

  const chains = fc
    .integer({ min: 1, max: 20 })
    .chain((n) =>
      fc.tuple(
        fc.array(mass, { minLength: n, maxLength: n }),
        fc.array(spring, { minLength: n, maxLength: n }),
        fc.integer({ min: 0, max: n - 1 }),
      ),
    );

  it('lengthens by the square root of two when every mass doubles, and shortens likewise when every spring does', () => {
    fc.assert(
      fc.property(chains, ([masses_t, storey_stiffness_kN_per_m]) => {
        const period = apply(GENERAL_CHAIN, { masses_t, storey_stiffness_kN_per_m });
        close(
          apply(GENERAL_CHAIN, { masses_t: masses_t.map((m) => 2 * m), storey_stiffness_kN_per_m }),
          period * Math.SQRT2,
        );
        close(
          apply(GENERAL_CHAIN, { masses_t, storey_stiffness_kN_per_m: storey_stiffness_kN_per_m.map((k) => 2 * k) }),
          period / Math.SQRT2,
        );
      }),
      { seed: 12 },
    );
  });

  // Rayleigh's theorem: more stiffness raises no period, more mass lowers none
  it('is never longer with a stiffer storey, never shorter with a heavier floor', () => {
    fc.assert(
      fc.property(chains, ([masses_t, storey_stiffness_kN_per_m, at]) => {
        const period = apply(GENERAL_CHAIN, { masses_t, storey_stiffness_kN_per_m });
        const more = (list: readonly number[]): readonly number[] =>
          list.map((value, i) => (i === at ? 1.5 * value : value));
        expect(
          apply(GENERAL_CHAIN, { masses_t, storey_stiffness_kN_per_m: more(storey_stiffness_kN_per_m) }),
        ).toBeLessThanOrEqual(period * (1 + 1e-12));
        expect(apply(GENERAL_CHAIN, { masses_t: more(masses_t), storey_stiffness_kN_per_m })).toBeGreaterThanOrEqual(
          period * (1 - 1e-12),
        );
      }),
      { seed: 13 },
    );
  });

  // exact eigen-solutions of a softened first storey made elsewhere: period ratio / first storey's share of the roof displacement
  it.each([
    [2, [1, 1.09, 1.15, 1.22, 1.32, 1.66, 2.8], [0.62, 0.68, 0.71, 0.74, 0.78, 0.86, 0.95]],
    [3, [1, 1.07, 1.11, 1.17, 1.25, 1.53, 2.51], [0.45, 0.51, 0.55, 0.59, 0.64, 0.75, 0.91]],
    [5, [1, 1.04, 1.07, 1.12, 1.17, 1.37, 2.14], [0.28, 0.34, 0.37, 0.41, 0.46, 0.6, 0.83]],
    [10, [1, 1.02, 1.04, 1.06, 1.09, 1.21, 1.71], [0.15, 0.18, 0.2, 0.23, 0.27, 0.39, 0.67]],
  ])('with a soft first storey, %i storeys', (n, ratios, shares) => {
    const uniform = apply(UNIFORM_CHAIN, { storeys: n, mass_t: 1, stiffness_kN_per_m: 1 });
    [1, 0.8, 0.7, 0.6, 0.5, 0.3, 0.1].forEach((beta, i) => {
      const input = { masses_t: ones(n), storey_stiffness_kN_per_m: [beta, ...ones(n - 1)] };
      expect(Math.abs(apply(GENERAL_CHAIN, input) / uniform - ratios[i]!)).toBeLessThanOrEqual(0.0055);
      expect(Math.abs(apply(FIRST_STOREY_SHARE, input) - shares[i]!)).toBeLessThanOrEqual(0.0055);
    });
  });
});

describe('FREQUENCY_TO_PERIOD', () => {
  // 50 Hz is 50 cycles a second: common practice, no source
  it('is the reciprocal, both ways', () => {
    expect(apply(FREQUENCY_TO_PERIOD, { frequency_hz: 50 })).toBe(0.02);
    fc.assert(
      fc.property(fc.double({ min: 0.05, max: 50, noNaN: true }), (frequency_hz) => {
        close(apply(FREQUENCY_TO_PERIOD, { frequency_hz: apply(FREQUENCY_TO_PERIOD, { frequency_hz }) }), frequency_hz);
      }),
      { seed: 14 },
    );
  });
});
