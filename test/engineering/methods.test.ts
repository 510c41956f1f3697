import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { applyAny } from '../../src/engineering/formula.js';
import type { AnyRecord } from '../../src/engineering/formula.js';
import { evaluateDisplayed, handSteps } from '../../src/engineering/hand.js';
import { METHODS, catalogueText, findMethod } from '../../src/engineering/methods.js';
import { Trace } from '../../src/engineering/trace.js';
import { findUnit } from '../../src/engineering/units.js';
import { inputsOf } from '../support/engineering-inputs.js';

const overLists = ({ family }: AnyRecord): boolean =>
  family.inputs.some(({ kind, name }) => kind === 'list' && name !== 'periods_s' && name !== 'ordinates_g');
const hasFormula = ({ family }: AnyRecord): boolean =>
  family.expression !== null || family.shownAt !== undefined || 'compile' in family;

// Contracts of the register: nothing outside the program to hold it against.
describe('METHODS', () => {
  it('have ids of their own, as edition/quantity/which', () => {
    const ids = METHODS.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const id of ids)
      expect(id).toMatch(/^[a-z0-9]+(?:-[a-z0-9]+)*\/[a-z]+(?:-[a-z]+)*\/[a-z0-9]+(?:-[a-z0-9]+)*$/);
  });

  it('are frozen, constants too', () => {
    for (const method of METHODS) {
      expect(Object.isFrozen(method), method.id).toBe(true);
      expect(Object.isFrozen(method.constants), method.id).toBe(true);
    }
  });

  it('say where they stand, and carry a title, known units and either a formula or a procedure', () => {
    for (const { id, title, source, family } of METHODS) {
      expect(source.standard, id).not.toBe('');
      expect(source.clause, id).not.toBe('');
      expect(title, id).not.toBe('');
      expect(family.expression !== null || (family.procedure ?? '') !== '', id).toBe(true);
      if (family.unit !== null) expect(findUnit(family.unit), id).toBeDefined();
      for (const { name, unit, meaning } of family.inputs) {
        expect(meaning, `${id} ${name}`).not.toBe('');
        if (unit !== undefined) expect(findUnit(unit)?.id, `${id} ${name}`).toBe(unit);
      }
    }
  });

  it('give limits with two ends in order', () => {
    for (const { id, limits } of METHODS) {
      for (const { from, to } of limits) {
        expect(from !== undefined || to !== undefined, id).toBe(true);
        if (from !== undefined && to !== undefined) expect(from, id).toBeLessThan(to);
      }
    }
  });

  it.each(METHODS.filter((method) => !overLists(method) && hasFormula(method)))(
    'show the formula they compute: $id',
    (method) => {
      fc.assert(
        fc.property(inputsOf(method), (inputs) => {
          const value = applyAny(method, inputs);
          const shown = evaluateDisplayed({ record: method, inputs });
          expect(Math.abs(shown! - value), JSON.stringify(inputs)).toBeLessThanOrEqual(
            1e-12 * Math.max(Math.abs(value), 1e-3),
          );
        }),
        { numRuns: 200, seed: 2 },
      );
    },
  );

  it('write each step with its value, clause and mark', () => {
    for (const method of METHODS.filter((one) => !overLists(one))) {
      const trace = new Trace();
      const [inputs] = fc.sample(inputsOf(method), { numRuns: 1, seed: 5 });
      const value = applyAny(method, inputs!, trace);
      const [step] = handSteps(trace, 'si');
      expect(step?.value, method.id).toBe(value);
      expect(step?.mark, method.id).toBe(method.verified);
      expect(step?.source, method.id).toContain(method.source.standard);
      expect(step?.substituted, method.id).not.toMatch(/undefined|NaN/);
    }
  });
});

describe('findMethod', () => {
  it('finds a record by id and nothing by another name', () => {
    expect(findMethod('asce7-22/period/other')?.constants).toEqual({
      coefficient: 0.02,
      exponent: 0.75,
      unit_m: 0.3048,
    });
    expect(findMethod('asce7-22/period/none')).toBeUndefined();
  });
});

describe('catalogueText', () => {
  it('holds a line for every record and one for the tables', () => {
    expect(catalogueText().split('\n')).toHaveLength(METHODS.length + 1);
  });
});
