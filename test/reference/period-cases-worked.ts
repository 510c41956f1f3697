/** How the cases of period formulas are written down. */
import type { Inputs } from '../../src/engineering/formula.js';
import { FT_M, half } from './case.js';
import type { ReferenceCase } from './case.js';

/**
 * The formula as it stands in the publication of `method` (coefficients as our data sheet holds them), worked in Python: foot forms
 * by their metric coefficient, h^0.75 by two square roots, decimals cut at the seventh significant one.
 */
export const worked = (
  id: string,
  method: string,
  inputs: Inputs,
  expected: number,
  how: string,
  relative = 1e-6,
  note?: string,
): ReferenceCase => ({
  id: `worked-${id}`,
  method,
  inputs,
  expected,
  tolerance: relative * expected,
  source: `the stated formula: ${how}`,
  mark: 'own arithmetic',
  ...(note === undefined ? {} : { note }),
});

type Mark = ReferenceCase['mark'];

/** A stated answer, good to half its last digit. */
export const answer = (
  id: string,
  method: string,
  inputs: ReferenceCase['inputs'],
  expected: number,
  digits: number,
  source: string,
  mark: Mark,
  note?: string,
): ReferenceCase => ({
  id,
  method,
  inputs,
  expected,
  tolerance: half(digits),
  source,
  mark,
  ...(note === undefined ? {} : { note }),
});

export const feet = (height: number): { readonly height_m: number } => ({ height_m: height * FT_M });
