/** Every reference case. */
import { BASE_SHEAR_CASES } from './base-shear-cases.js';
import { CAPACITY_CASES } from './capacity-cases.js';
import type { ReferenceCase } from './case.js';
import { MEASURED_CASES } from './measured-cases.js';
import { PERIOD_CASES } from './period-cases.js';
import { SPECTRUM_CASES } from './spectrum-cases.js';
import { STIFFNESS_CASES } from './stiffness-cases.js';

export const REFERENCE_CASES: readonly ReferenceCase[] = [
  ...PERIOD_CASES,
  ...MEASURED_CASES,
  ...STIFFNESS_CASES,
  ...SPECTRUM_CASES,
  ...BASE_SHEAR_CASES,
  ...CAPACITY_CASES,
];
