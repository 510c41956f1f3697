import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { displacement_m, ordinate, segmentAt } from '../../../src/engineering/spectrum/compiled.js';
import type { CompiledSpectrum } from '../../../src/engineering/spectrum/compiled.js';
import { compileSpectrum } from '../../../src/engineering/spectrum/definition.js';
import type { SpectrumDefinition } from '../../../src/engineering/spectrum/definition.js';
import { SPECTRAL_DISPLACEMENT } from '../../../src/engineering/demand/records.js';
import { apply } from '../../../src/engineering/formula.js';

const between = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });
const TWO_PERIOD: fc.Arbitrary<SpectrumDefinition> = fc.record({
  code: fc.constant('asce7-22-two-period' as const),
  sds_g: between(0.05, 3),
  sd1_g: between(0.02, 2),
  tl_s: between(4, 16),
});
const EN: fc.Arbitrary<SpectrumDefinition> = fc.record({
  code: fc.constantFrom('en1998-1-2004-elastic-type-1' as const, 'en1998-1-2004-elastic-type-2' as const),
  ag_g: between(0.01, 1),
  ground: fc.constantFrom('A', 'B', 'C', 'D', 'E'),
});
/** From 0.02 s on, each period 1.15 to 2.5 times the one before, each ordinate within a factor of 3 of its neighbour. */
const TABLE: fc.Arbitrary<SpectrumDefinition> = fc
  .tuple(
    fc.constantFrom('linear' as const, 'log-log' as const),
    fc.array(fc.tuple(between(1.15, 2.5), between(1 / 3, 3)), { minLength: 2, maxLength: 12 }),
  )
  .map(([interpolation, rows]) => {
    let [period, ordinateNow] = [0.02, 0.4];
    return {
      code: 'table' as const,
      interpolation,
      periods_s: rows.map(([step]) => (period *= step)),
      ordinates_g: rows.map(([, ratio]) => (ordinateNow *= ratio)),
    };
  });
const ANY = fc.oneof(TWO_PERIOD, EN, TABLE);

/** 20,000 periods from 1 ms to 12 s. */
const PERIODS = Array.from({ length: 20_000 }, (_, i) => 0.001 + (i * 12) / 20_000);

function agree(compiled: CompiledSpectrum, direct: (period: number) => number): void {
  let worst = 0;
  for (const period of PERIODS) {
    const there = direct(period);
    worst = Math.max(worst, Math.abs(ordinate(compiled, period) - there) / there);
  }
  expect(worst).toBeLessThanOrEqual(1e-12);
}

describe('compileSpectrum', () => {
  it('yields segments without gap from 0 to infinity, the first of them finite at 0', () => {
    fc.assert(
      fc.property(ANY, (definition) => {
        const { segments } = compileSpectrum(definition).compiled;
        expect(segments[0]!.from_s).toBe(0);
        expect(segments.at(-1)!.to_s).toBe(Infinity);
        segments.forEach((segment, i) => {
          if (i > 0) expect(segment.from_s).toBe(segments[i - 1]!.to_s);
        });
        for (const { exponent } of segments[0]!.terms) expect(exponent).toBeGreaterThanOrEqual(0);
      }),
      { numRuns: 300, seed: 8 },
    );
  });

  // None of the shapes of this file steps (EN 1998-1 and ASCE 7 print their branches with ≤ on both sides).
  it('is continuous at every corner', () => {
    fc.assert(
      fc.property(ANY, (definition) => {
        const { compiled } = compileSpectrum(definition);
        compiled.segments.slice(1).forEach((segment, i) => {
          const before = compiled.segments[i]!;
          const left = ordinate({ ...compiled, segments: [{ ...before, from_s: 0 }] }, segment.from_s);
          const right = ordinate(compiled, segment.from_s);
          expect(Math.abs(left - right)).toBeLessThanOrEqual(1e-11 * right);
        });
      }),
      { numRuns: 300, seed: 9 },
    );
  });

  // ASCE/SEI 7-22 11.4.5.2 written out by hand
  it('agrees with the clause of ASCE 7-22 at 20,000 periods', () => {
    for (const [sds_g, sd1_g, tl_s] of [
      [1, 0.6, 8],
      [0.858, 0.56333, 6],
      [1.644, 0.887, 12],
      [0.2, 0.3, 4],
    ] as const) {
      const corner = sd1_g / sds_g;
      agree(compileSpectrum({ code: 'asce7-22-two-period', sds_g, sd1_g, tl_s }).compiled, (t) => {
        if (t < 0.2 * corner) return sds_g * (0.4 + (0.6 * t) / (0.2 * corner));
        if (t <= corner) return sds_g;
        return t <= tl_s ? sd1_g / t : (sd1_g * tl_s) / t ** 2;
      });
    }
  });

  // EN 1998-1 (3.2) to (3.5) with tables 3.2 and 3.3 typed again from the sheet
  it('agrees with the clauses of EN 1998-1 at 20,000 periods', () => {
    const rows = {
      'en1998-1-2004-elastic-type-1': {
        A: [1, 0.15, 0.4],
        B: [1.2, 0.15, 0.5],
        C: [1.15, 0.2, 0.6],
        D: [1.35, 0.2, 0.8],
        E: [1.4, 0.15, 0.5],
      },
      'en1998-1-2004-elastic-type-2': {
        A: [1, 0.05, 0.25],
        B: [1.35, 0.05, 0.25],
        C: [1.5, 0.1, 0.25],
        D: [1.8, 0.1, 0.3],
        E: [1.6, 0.05, 0.25],
      },
    } as const;
    for (const code of ['en1998-1-2004-elastic-type-1', 'en1998-1-2004-elastic-type-2'] as const) {
      const td = code.endsWith('1') ? 2 : 1.2;
      for (const [ground, [s, tb, tc]] of Object.entries(rows[code])) {
        agree(compileSpectrum({ code, ag_g: 0.25, ground }).compiled, (t) => {
          if (t < tb) return 0.25 * s * (1 + (t / tb) * (2.5 - 1));
          if (t < tc) return 0.25 * s * 2.5;
          return t < td ? (0.25 * s * 2.5 * tc) / t : (0.25 * s * 2.5 * tc * td) / t / t;
        });
      }
    }
  });

  it('agrees with interpolation by hand at 20,000 periods', () => {
    const periods_s = [0.05, 0.2, 0.5, 1, 2, 5, 10];
    const ordinates_g = [0.4, 0.9, 0.8, 0.45, 0.2, 0.06, 0.02];
    for (const interpolation of ['linear', 'log-log'] as const) {
      const map = interpolation === 'linear' ? (x: number): number => x : Math.log;
      agree(compileSpectrum({ code: 'table', interpolation, periods_s, ordinates_g }).compiled, (t) => {
        if (t <= periods_s[0]!) return ordinates_g[0]!;
        const i = periods_s.findIndex((period) => period > t);
        if (i < 0) return ordinates_g.at(-1)!;
        const share = (map(t) - map(periods_s[i - 1]!)) / (map(periods_s[i]!) - map(periods_s[i - 1]!));
        const value = map(ordinates_g[i - 1]!) * (1 - share) + map(ordinates_g[i]!) * share;
        return interpolation === 'linear' ? value : Math.exp(value);
      });
    }
  });

  it('finds the corners', () => {
    // SP-10: fire station sheet, ASCE 7-16, S_DS 1.09 g and S_D1 0.792 g: T0 = 0.15 s, Ts = 0.73 s (restated; given with 0.006)
    const { compiled } = compileSpectrum({ code: 'asce7-22-two-period', sds_g: 1.09, sd1_g: 0.792, tl_s: 8 });
    expect(Math.abs(compiled.plateau_from_s - 0.15)).toBeLessThan(0.006);
    expect(Math.abs(compiled.plateau_to_s - 0.73)).toBeLessThan(0.006);
    // a table that samples a two-period curve: max(T S_a)/max S_a is its corner (own arithmetic: 0.6/1)
    const table = compileSpectrum({
      code: 'table',
      interpolation: 'log-log',
      periods_s: [0.05, 0.12, 0.6, 1, 3],
      ordinates_g: [0.65, 1, 1, 0.6, 0.2],
    });
    expect(table.compiled.plateau_from_s).toBe(0.12);
    expect(table.compiled.plateau_to_s).toBeCloseTo(0.6, 12);
    expect(table.compiled.valid_to_s).toBe(3);
  });

  it('refuses tables that are no spectrum and grounds that are not of the code', () => {
    const table =
      (periods_s: number[], ordinates_g: number[], interpolation: 'linear' | 'log-log' = 'linear') =>
      (): unknown =>
        compileSpectrum({ code: 'table', periods_s, ordinates_g, interpolation });
    expect(table([0, 1], [1])).toThrow(RangeError);
    expect(table([0, 0], [1, 1])).toThrow('periods must increase');
    expect(table([0, 1], [1, 0])).toThrow('ordinates must be positive');
    expect(table([0, 1], [1, 1], 'log-log')).toThrow('above 0 s');
    expect(() => compileSpectrum({ code: 'en1998-1-2004-elastic-type-1', ag_g: 0.2, ground: 'F' })).toThrow(
      'unknown ground "F"',
    );
  });
});

describe('segmentAt', () => {
  it('gives a corner to the segment that starts there', () => {
    const { compiled } = compileSpectrum({ code: 'en1998-1-2004-elastic-type-1', ag_g: 0.2, ground: 'A' });
    expect(segmentAt(compiled, 0.4).clause).toContain('(3.4)');
    expect(segmentAt(compiled, 0.39999).clause).toContain('(3.3)');
    expect(() => segmentAt(compiled, -0.1)).toThrow(RangeError);
    expect(() => segmentAt(compiled, NaN)).toThrow(RangeError);
  });
});

describe('displacement_m', () => {
  it('is S_a g (T/2π)², and equals its record', () => {
    fc.assert(
      fc.property(ANY, between(0.02, 10), (definition, period_s) => {
        const { compiled } = compileSpectrum(definition);
        const sa_g = ordinate(compiled, period_s);
        const there = (sa_g * 9.80665 * period_s ** 2) / (4 * Math.PI ** 2);
        expect(Math.abs(displacement_m(compiled, period_s) - there)).toBeLessThanOrEqual(1e-13 * there);
        expect(apply(SPECTRAL_DISPLACEMENT, { sa_g, period_s })).toBeCloseTo(displacement_m(compiled, period_s), 12);
      }),
      { numRuns: 200, seed: 10 },
    );
  });

  // EN 1998-1 annex A: the displacement plateau 0.025 a_g S TC TD (there rounded from 2.5/4π² g)
  it('is constant beyond TD', () => {
    const { compiled } = compileSpectrum({ code: 'en1998-1-2004-elastic-type-1', ag_g: 0.3, ground: 'B' });
    const at = displacement_m(compiled, 2.5);
    expect(displacement_m(compiled, 3.9)).toBeCloseTo(at, 12);
    expect(at / (0.025 * 0.3 * 9.80665 * 1.2 * 0.5 * 2 * 2.533)).toBeCloseTo(1, 3);
  });
});
