import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SPECTRAL_DISPLACEMENT } from '../../../src/engineering/demand/records.js';
import { apply, applyAny } from '../../../src/engineering/formula.js';
import type { AnyRecord, Inputs } from '../../../src/engineering/formula.js';
import { parametersOf } from '../../../src/engineering/spectrum/code.js';
import { displacement_m, ordinate } from '../../../src/engineering/spectrum/compiled.js';
import type { CompiledSpectrum, Segment } from '../../../src/engineering/spectrum/compiled.js';
import { compileSpectrum, SPECTRUM_RECORDS, SPECTRUM_REGISTER } from '../../../src/engineering/spectrum/definition.js';
import type { SpectrumFamily } from '../../../src/engineering/spectrum/family.js';
import { flagWords, SPECTRUM_FLAGS } from '../../../src/engineering/spectrum/flags.js';
import { inputsOf } from '../../support/engineering-inputs.js';

const compiledFrom = (method: AnyRecord, inputs: Inputs): CompiledSpectrum =>
  (method.family as SpectrumFamily<Inputs>).compile(inputs);

/** The value of one segment at any period, its neighbours left out. */
const valueOf = (segment: Segment, period_s: number): number =>
  ordinate(
    {
      segments: [{ ...segment, from_s: 0, to_s: Infinity }],
      plateau_from_s: 0,
      plateau_to_s: 0,
      valid_to_s: Infinity,
    },
    period_s,
  );

/** Records whose branches, as printed, do not meet: the largest step as a share of the value, and why. */
const STEPS: Readonly<Record<string, readonly [step: number, why: string]>> = {
  'nzs1170-5-2004/spectrum/modal': [
    0.005,
    'rounded coefficients: A/B 2.35 to 2.347 at 0.3 s, D 3.0 to 2.988 at 0.56 s',
  ],
  'nzs1170-5-2004/spectrum/equivalent-static': [0.005, 'rounded coefficients: D 3.0 to 2.988 at 0.56 s, C at 1.5 s'],
  'is1893-2016/spectrum/modal': [0.012, '1.36/0.55 = 2.473, 1.67/0.67 = 2.493 for 2.5; 1.67/4 = 0.4175 for 0.42'],
  'is1893-2016/spectrum/equivalent-static': [0.012, 'the same branches'],
};

describe('SPECTRUM_REGISTER', () => {
  it('names each code once, with parameters that differ and words that have records', () => {
    const codes = SPECTRUM_REGISTER.map(({ code }) => code);
    expect(new Set(codes).size).toBe(codes.length);
    for (const entry of SPECTRUM_REGISTER) {
      const names = parametersOf(entry).map(({ name }) => name);
      expect(new Set(names).size, entry.code).toBe(names.length);
      expect(names).not.toContain('return_period_years');
      expect('compile' in entry.record.family, entry.code).toBe(true);
      if (entry.choice === undefined) continue;
      expect(Object.values(entry.choice.records)).toContain(entry.record);
      for (const { family } of Object.values(entry.choice.records))
        expect(family.inputs.map(({ name }) => name)).toEqual(entry.record.family.inputs.map(({ name }) => name));
    }
  });

  it('states a range for every number and list, and words for every word', () => {
    for (const entry of SPECTRUM_REGISTER) {
      for (const { name, kind, words, from, above, to } of parametersOf(entry)) {
        if (kind === 'word') expect(words?.length, `${entry.code} ${name}`).toBeGreaterThan(1);
        else expect([from ?? above, to].includes(undefined), `${entry.code} ${name}`).toBe(false);
      }
    }
  });

  it('fills what a definition leaves out with the fallback', () => {
    const given = { site_class: 'C', zone_factor: 0.3, return_factor: 1, distance_km: 20 };
    const short = compileSpectrum({ code: 'nzs1170-5-2004', ...given });
    expect(short.record.id).toBe('nzs1170-5-2004/spectrum/modal');
    expect(short.inputs).toEqual({ ...given, site_period_s: 1.5 });
    expect(() => compileSpectrum({ code: 'asce7-22-two-period', sds_g: 1 })).toThrow('needs sd1_g');
    expect(() => compileSpectrum({ code: 'asce7-21' })).toThrow('unknown spectrum code "asce7-21"');
  });
});

describe.each(SPECTRUM_RECORDS)('compile of $id', (method) => {
  const step = STEPS[method.id]?.[0] ?? 0;

  it('yields segments without gap from 0 to infinity, the first finite at 0, at most three terms each', () => {
    fc.assert(
      fc.property(inputsOf(method), (inputs) => {
        const { segments, plateau_from_s, plateau_to_s } = compiledFrom(method, inputs);
        expect(segments[0]!.from_s).toBe(0);
        expect(segments.at(-1)!.to_s).toBe(Infinity);
        segments.forEach((segment, i) => {
          if (i > 0) expect(segment.from_s).toBe(segments[i - 1]!.to_s);
          // empty where T_L is at the end of the plateau
          expect(segment.to_s).toBeGreaterThanOrEqual(segment.from_s);
          expect(segment.terms.length).toBeLessThanOrEqual(3);
        });
        for (const { exponent } of segments[0]!.terms) expect(exponent).toBeGreaterThanOrEqual(0);
        expect(plateau_to_s).toBeGreaterThanOrEqual(plateau_from_s);
      }),
      { numRuns: 150, seed: 21 },
    );
  });

  it(step === 0 ? 'is continuous at every corner' : `steps by at most ${String(100 * step)} % at its corners`, () => {
    let largest = 0;
    fc.assert(
      fc.property(inputsOf(method), (inputs) => {
        const { segments } = compiledFrom(method, inputs);
        segments.slice(1).forEach((segment, i) => {
          const [left, right] = [valueOf(segments[i]!, segment.from_s), valueOf(segment, segment.from_s)];
          largest = Math.max(largest, Math.abs(left - right) / right);
          expect(Math.abs(left - right), JSON.stringify(inputs)).toBeLessThanOrEqual(Math.max(step, 1e-11) * right);
        });
      }),
      { numRuns: 300, seed: 22 },
    );
    // a code that is listed as stepping does step
    if (step > 0) expect(largest).toBeGreaterThan(1e-3);
  });

  it('is positive and finite, and reads the same through the record', () => {
    fc.assert(
      fc.property(inputsOf(method), (inputs) => {
        const period_s = inputs['period_s'] as number;
        const value = ordinate(compiledFrom(method, inputs), period_s);
        expect(value).toBeGreaterThan(0);
        expect(Number.isFinite(value)).toBe(true);
        expect(applyAny(method, inputs)).toBe(value);
      }),
      { numRuns: 150, seed: 23 },
    );
  });

  it('has S_d = S_a g (T/2π)²', () => {
    fc.assert(
      fc.property(inputsOf(method), (inputs) => {
        const period_s = inputs['period_s'] as number;
        const compiled = compiledFrom(method, inputs);
        const sa_g = ordinate(compiled, period_s);
        const there = (sa_g * 9.80665 * period_s ** 2) / (4 * Math.PI ** 2);
        expect(Math.abs(displacement_m(compiled, period_s) - there)).toBeLessThanOrEqual(1e-13 * there);
        const byRecord = apply(SPECTRAL_DISPLACEMENT, { sa_g, period_s });
        expect(Math.abs(byRecord - there)).toBeLessThanOrEqual(1e-13 * there);
      }),
      { numRuns: 100, seed: 24 },
    );
  });

  it('carries flags that have words', () => {
    fc.assert(
      fc.property(inputsOf(method), (inputs) => {
        const compiled = compiledFrom(method, inputs);
        for (const flag of compiled.flags ?? []) expect(SPECTRUM_FLAGS[flag], flag).toBeDefined();
        expect(flagWords(compiled)).toHaveLength(compiled.flags?.length ?? 0);
      }),
      { numRuns: 100, seed: 25 },
    );
  });
});

/** Records whose ordinates are given freely have no order of their own. */
const FREE = /table|multi-period|nbc/;
/** Linear in the hazard; not so the site coefficients of ASCE 7-05 to 7-16 and the limit of Z R. */
const LINEAR = /^(?:asce7-22|asce41|en1998|is1893)/;
/** IS 1893 on soft soil steps up at 4 s, from 0.4175 to 0.42. */
const UP = 0.006;

describe.each(SPECTRUM_RECORDS.filter(({ id }) => !FREE.test(id)))('shape of $id', (method) => {
  it('never rises beyond its plateau', () => {
    fc.assert(
      fc.property(
        inputsOf(method),
        fc.double({ min: 0.3, max: 12, noNaN: true }),
        fc.double({ min: 1, max: 3, noNaN: true }),
        (inputs, first, ratio) => {
          const compiled = compiledFrom(method, inputs);
          // near a fault N(T, D) grows with T faster than C_h falls over short stretches, as printed
          if (method.id.startsWith('nzs') && (inputs['distance_km'] as number) < 20) return;
          const start = Math.max(first, compiled.plateau_to_s);
          expect(ordinate(compiled, start * ratio)).toBeLessThanOrEqual(ordinate(compiled, start) * (1 + UP));
        },
      ),
      { numRuns: 200, seed: 26 },
    );
  });
});

describe.each(SPECTRUM_RECORDS.filter(({ id }) => LINEAR.test(id) && !FREE.test(id)))('hazard of $id', (method) => {
  it('doubles with its parameters', () => {
    const scaled = ['sds_g', 'sd1_g', 'sxs_g', 'sx1_g', 'ag_g', 'zone_factor'];
    fc.assert(
      fc.property(inputsOf(method), (inputs) => {
        const twice = Object.fromEntries(
          Object.entries(inputs).map(([name, value]) => [name, scaled.includes(name) ? 2 * (value as number) : value]),
        );
        const one = applyAny(method, inputs);
        expect(Math.abs(applyAny(method, twice) - 2 * one)).toBeLessThanOrEqual(1e-12 * one);
      }),
      { numRuns: 200, seed: 27 },
    );
  });
});
