/** One measure of a reference case: the pass-or-fail test and the table of accuracies print the same numbers. */
import type { CodeEdition } from '../../src/engineering/capacity/edition.js';
import { EDITIONS } from '../../src/engineering/capacity/families.js';
import { applyAny } from '../../src/engineering/formula.js';
import type { Inputs } from '../../src/engineering/formula.js';
import { findMethod } from '../../src/engineering/methods.js';
import { Trace } from '../../src/engineering/trace.js';
import type { ReferenceCase } from '../reference/case.js';
import { building } from './engineering-building.js';

export interface Measurement {
  readonly id: string;
  readonly method: string;
  readonly expected: number;
  readonly value: number;
  readonly difference: number;
  /** Difference over the larger of the expected value and 1e-12. */
  readonly relative: number;
  readonly tolerance: number;
  readonly ok: boolean;
}

/** Inputs of the record in a case. @throws Error where the edition of the case does not read the record. */
export function caseInputs({ id, method, inputs, edition }: ReferenceCase): Inputs {
  if (edition === undefined) return inputs;
  const one = building();
  const facts = {
    building: one,
    direction: 'longitudinal',
    system: one.system!,
    height_m: 14,
    ductile: false,
  } as const;
  const trace = new Trace();
  (EDITIONS[edition.id] as CodeEdition).design(facts, edition.stated, trace);
  const step = trace.steps.find((found) => found.kind === 'formula' && found.record.id === method);
  if (step?.kind !== 'formula') throw new Error(`${edition.id} of ${id} does not read ${method}`);
  return step.inputs;
}

/** Evaluates the record at the case's inputs. @throws Error for a record that is not in the register. */
export function measure(reference: ReferenceCase): Measurement {
  const method = findMethod(reference.method);
  if (method === undefined) throw new Error(`no record ${reference.method}`);
  const value = applyAny(method, caseInputs(reference));
  const difference = value - reference.expected;
  return {
    id: reference.id,
    method: reference.method,
    expected: reference.expected,
    value,
    difference,
    relative: Math.abs(difference) / Math.max(Math.abs(reference.expected), 1e-12),
    tolerance: reference.tolerance,
    // a printed digit may lie exactly half a unit off, in decimals that binary cannot hold
    ok: Math.abs(difference) <= reference.tolerance * (1 + 1e-9) + 1e-15,
  };
}
