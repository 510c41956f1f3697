import { describe, expect, it } from 'vitest';
import { METHODS } from '../../src/engineering/methods.js';
import { measure } from '../support/engineering-measure.js';
import { REFERENCE_CASES } from './cases.js';
import { NOT_RUN, SPECTRA_IDS } from './spectra-not-run.js';

describe('REFERENCE_CASES', () => {
  it.each(REFERENCE_CASES)('$id reproduces $expected ($method)', (reference) => {
    const measured = measure(reference);
    expect(
      measured.ok,
      `${String(measured.value)} for ${String(measured.expected)} ± ${String(measured.tolerance)}: ${reference.source}`,
    ).toBe(true);
  });

  it('hold every record at least once', () => {
    const covered = new Set(REFERENCE_CASES.map(({ method }) => method));
    expect(METHODS.map(({ id }) => id).filter((id) => !covered.has(id))).toEqual([]);
  });

  it('have ids of their own, a source, and say why a tolerance is wide', () => {
    expect(new Set(REFERENCE_CASES.map(({ id }) => id)).size).toBe(REFERENCE_CASES.length);
    for (const { id, source, tolerance, expected } of REFERENCE_CASES) {
      expect(source.length, id).toBeGreaterThan(5);
      expect(tolerance, id).toBeGreaterThanOrEqual(0);
      expect(tolerance / Math.max(Math.abs(expected), 1e-3), id).toBeLessThan(0.25);
    }
  });

  it('keep the misprinted metric coefficient out', () => {
    // W08: 0.055 in the metric column of ASCE 7-02 would give 0.41 s where the foot coefficient gives 0.36 s
    const value = measure(REFERENCE_CASES.find(({ id }) => id === 'W08')!).value;
    expect(Math.abs(value - 0.41)).toBeGreaterThan(0.04);
  });
});

describe('SPECTRA_IDS', () => {
  it('each have a reference case or a reason why not, never both', () => {
    const run = (id: string): boolean => REFERENCE_CASES.some((one) => one.id === id || one.id.startsWith(`${id}-`));
    expect(SPECTRA_IDS.filter((id) => run(id) === Object.hasOwn(NOT_RUN, id))).toEqual([]);
  });
});
