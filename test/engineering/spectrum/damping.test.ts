import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { apply, applyAny } from '../../../src/engineering/formula.js';
import { ordinate } from '../../../src/engineering/spectrum/compiled.js';
import { B1, DAMPING_RECORDS, ETA } from '../../../src/engineering/spectrum/damping.js';
import { compileSpectrum } from '../../../src/engineering/spectrum/definition.js';

const ratio = fc.double({ min: 0.02, max: 0.3, noNaN: true });
const en = (damping_ratio: number) =>
  compileSpectrum({ code: 'en1998-1-2004-elastic-type-1', ag_g: 0.2, ground: 'C', damping_ratio }).compiled;
const asce = (damping_ratio: number) =>
  compileSpectrum({ code: 'asce41-17-general', sxs_g: 1, sx1_g: 0.6, tl_s: 8, damping_ratio }).compiled;

describe('DAMPING_RECORDS', () => {
  it.each(DAMPING_RECORDS.filter(({ id }) => id !== B1.id))('$id is 1 at 5 %', (method) => {
    expect(applyAny(method, { damping_ratio: 0.05 })).toBeCloseTo(1, 14);
  });

  it('fall or rise with damping throughout: factors that multiply fall, divisors rise', () => {
    for (const method of DAMPING_RECORDS) {
      const rises = /\/b/.test(method.id);
      fc.assert(
        fc.property(ratio, ratio, (a, b) => {
          const [low, high] = [Math.min(a, b), Math.max(a, b)].map((damping_ratio) =>
            applyAny(method, { damping_ratio }),
          ) as [number, number];
          expect(rises ? high - low : low - high, method.id).toBeGreaterThanOrEqual(0);
        }),
        { numRuns: 200, seed: 41 },
      );
    }
  });

  // EN 1998-1 3.2.2.2(3): the bound is met at 10/0.55² - 5 = 28.06 %
  it('hold η at 0.55 from 28.06 % on', () => {
    expect(apply(ETA, { damping_ratio: 0.2805 })).toBeGreaterThan(0.55);
    expect(apply(ETA, { damping_ratio: 0.2807 })).toBe(0.55);
  });
});

describe('damped spectra', () => {
  it('keep the ground acceleration, and scale from the plateau on by η or 1/B1', () => {
    fc.assert(
      fc.property(ratio, fc.double({ min: 0.25, max: 6, noNaN: true }), (damping_ratio, period_s) => {
        expect(ordinate(en(damping_ratio), 0)).toBe(ordinate(en(0.05), 0));
        expect(ordinate(asce(damping_ratio), 0)).toBe(ordinate(asce(0.05), 0));
        const eta = ordinate(en(damping_ratio), period_s) / ordinate(en(0.05), period_s);
        expect(Math.abs(eta / apply(ETA, { damping_ratio }) - 1)).toBeLessThan(1e-13);
        if (damping_ratio === 0.05) return;
        const b1 = ordinate(asce(0.05), period_s) / ordinate(asce(damping_ratio), period_s);
        expect(Math.abs(b1 / apply(B1, { damping_ratio }) - 1)).toBeLessThan(1e-13);
      }),
      { numRuns: 200, seed: 42 },
    );
  });

  // ASCE 41-17 (2-3): the printed B1 is 1.0024 at 5 %, the spectrum skips the division there and nowhere else
  it('leave the 5 % spectrum of ASCE 41 undivided', () => {
    expect(ordinate(asce(0.05), 0.3)).toBe(1);
    expect(ordinate(asce(0.0500001), 0.3)).toBeCloseTo(1 / 1.0024, 4);
  });
});
