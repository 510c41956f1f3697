/** One measure of a reference case: the pass-or-fail test and the table of accuracies print the same numbers. */
import { applyAny } from '../../src/engineering/formula.js';
import { findMethod } from '../../src/engineering/methods.js';
import type { ReferenceCase } from '../reference/case.js';

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

/** Evaluates the record at the case's inputs. @throws Error for a record that is not in the register. */
export function measure(reference: ReferenceCase): Measurement {
  const method = findMethod(reference.method);
  if (method === undefined) throw new Error(`no record ${reference.method}`);
  const value = applyAny(method, reference.inputs);
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
