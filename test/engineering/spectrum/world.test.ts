import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { AnyRecord, Inputs } from '../../../src/engineering/formula.js';
import { displacement_m, ordinate } from '../../../src/engineering/spectrum/compiled.js';
import type { SpectrumFamily } from '../../../src/engineering/spectrum/family.js';
import { WORLD_CODES, WORLD_RECORDS } from '../../../src/engineering/spectrum/world.js';
import { inputsOf } from '../../support/engineering-inputs.js';
import { WORLD_CLAUSES } from './world-clauses.js';

const RECORDS: readonly AnyRecord[] = [...WORLD_CODES.map(({ record }) => record), ...WORLD_RECORDS];
const compile = (record: AnyRecord): SpectrumFamily<Inputs>['compile'] =>
  (record.family as SpectrumFamily<Inputs>).compile;
const called = (id: string): AnyRecord => RECORDS.find((record) => record.id === id)!;

/** 20,000 periods from 1 ms to 12 s. */
const PERIODS = Array.from({ length: 20_000 }, (_, i) => 0.001 + (i * 12) / 20_000);

describe('spectra of the world', () => {
  it('have a clause written out by hand each', () => {
    expect(WORLD_CLAUSES.map(({ method }) => method).sort()).toEqual(RECORDS.map(({ id }) => id).sort());
  });

  it.each(RECORDS)('have segments without gap from 0 to infinity, finite at 0, at most three terms: $id', (record) => {
    fc.assert(
      fc.property(inputsOf(record), (inputs) => {
        const { segments, plateau_from_s, plateau_to_s, valid_to_s } = compile(record)(inputs);
        expect(segments[0]!.from_s).toBe(0);
        expect(segments.at(-1)!.to_s).toBe(Infinity);
        segments.forEach((segment, i) => {
          if (i > 0) expect(segment.from_s).toBe(segments[i - 1]!.to_s);
          expect(segment.to_s).toBeGreaterThanOrEqual(segment.from_s);
          expect(segment.terms.length).toBeLessThanOrEqual(3);
        });
        for (const { exponent } of segments[0]!.terms) expect(exponent).toBeGreaterThanOrEqual(0);
        expect(plateau_from_s).toBeLessThanOrEqual(plateau_to_s);
        expect(plateau_to_s).toBeLessThanOrEqual(valid_to_s);
      }),
      { numRuns: 200, seed: 21 },
    );
  });

  // None of these codes steps: every branch meets the next.
  it.each(RECORDS)('are continuous at every corner over random parameters: $id', (record) => {
    fc.assert(
      fc.property(inputsOf(record), (inputs) => {
        const compiled = compile(record)(inputs);
        compiled.segments.slice(1).forEach((segment, i) => {
          const before = compiled.segments[i]!;
          const left = ordinate({ ...compiled, segments: [{ ...before, from_s: 0 }] }, segment.from_s);
          const right = ordinate(compiled, segment.from_s);
          expect(Math.abs(left - right), `${segment.clause} ${JSON.stringify(inputs)}`).toBeLessThanOrEqual(
            1e-11 * right,
          );
        });
      }),
      { numRuns: 300, seed: 22 },
    );
  });

  it.each(RECORDS)('are positive everywhere and nowhere above the plateau: $id', (record) => {
    fc.assert(
      fc.property(inputsOf(record), fc.double({ min: 0, max: 30, noNaN: true }), (inputs, period_s) => {
        const compiled = compile(record)(inputs);
        const value = ordinate(compiled, period_s);
        expect(value).toBeGreaterThan(0);
        expect(value).toBeLessThanOrEqual(ordinate(compiled, compiled.plateau_from_s) * (1 + 1e-12));
      }),
      { numRuns: 500, seed: 23 },
    );
  });

  it.each(WORLD_CLAUSES)('agree with the clause at 20,000 periods: $method', ({ method, sets, direct }) => {
    for (const inputs of sets) {
      const compiled = compile(called(method))(inputs);
      let worst = 0;
      for (const period of PERIODS) {
        const there = direct(inputs, period);
        worst = Math.max(worst, Math.abs(ordinate(compiled, period) - there) / there);
      }
      expect(worst, JSON.stringify(inputs)).toBeLessThanOrEqual(1e-12);
    }
  });

  // S_d = S_a g (T/2π)² (spectra.md 10)
  it.each(RECORDS)('turn into displacements: $id', (record) => {
    fc.assert(
      fc.property(inputsOf(record), fc.double({ min: 0.02, max: 10, noNaN: true }), (inputs, period_s) => {
        const compiled = compile(record)(inputs);
        const there = (ordinate(compiled, period_s) * 9.80665 * period_s ** 2) / (4 * Math.PI ** 2);
        expect(Math.abs(displacement_m(compiled, period_s) - there)).toBeLessThanOrEqual(1e-13 * there);
      }),
      { numRuns: 100, seed: 24 },
    );
  });

  it('refuse words that are not of the code', () => {
    expect(() =>
      compile(called('japan-rt/spectrum/elastic'))({ zone_factor: 1, ground: '2', standard_shear_coefficient: 1 }),
    ).toThrow('unknown ground "2"; known: type-1, type-2, type-3');
    expect(() => compile(called('tbdy-2018/spectrum/elastic'))({ ss_g: 1, s1_g: 0.3, site_class: 'ZF' })).toThrow(
      'unknown class "ZF"',
    );
    expect(() =>
      compile(called('e030-2018/spectrum/stated-factors'))({ zone_factor: 0.4, site_factor: 1, tp_s: 1.2, tl_s: 1 }),
    ).toThrow('must lie beyond');
  });
});

describe('NCH433_DS61', () => {
  // spectra.md 13.8: α(0) = 1 and a peak of 2.77 to 3.09 near 0.7 to 1.1 To
  it('peaks where the sheet says, and keeps its peak and its corner', () => {
    const record = called('nch433-ds61/spectrum/elastic');
    for (const [ground, s, to] of [
      ['A', 0.9, 0.15],
      ['B', 1, 0.3],
      ['C', 1.05, 0.4],
      ['D', 1.2, 0.75],
      ['E', 1.3, 1.2],
    ] as const) {
      const compiled = compile(record)({ ag_g: 1, ground });
      const values = Array.from({ length: 120_000 }, (_, i) => ordinate(compiled, (i * to) / 10_000));
      const peak = Math.max(...values.slice(0, 20_000));
      expect(values[0]! / s).toBeCloseTo(1, 12);
      expect(peak / s).toBeGreaterThan(2.76);
      expect(peak / s).toBeLessThan(3.1);
      expect(ordinate(compiled, compiled.plateau_from_s)).toBeGreaterThanOrEqual(peak);
      expect(compiled.plateau_from_s / to).toBeGreaterThan(0.69);
      expect(compiled.plateau_from_s / to).toBeLessThan(1.1);
      const velocity = values.reduce((most, value, i) => Math.max(most, (value * i * to) / 10_000), 0);
      expect(compiled.plateau_to_s).toBeCloseTo(velocity / peak, 4);
    }
  });
});
