/** Damping from vibration records. */
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

const PULL_TEST =
  'Clough and Penzien, Dynamics of Structures, Example E2-1: pulled to 0.20 in, back at 0.16 in after a cycle; inputs as restated, answer computed';

export const VIBRATION_CASES: readonly ReferenceCase[] = [
  {
    id: 'SD-02-decrement',
    method: 'mechanics/decrement/peaks',
    inputs: { first_peak: 0.2, later_peak: 0.16, cycles: 1 },
    expected: 0.2231,
    tolerance: half(4),
    source: PULL_TEST,
    mark: 'restated',
  },
  {
    id: 'SD-02-exact',
    method: 'mechanics/damping/logarithmic-decrement',
    inputs: { log_decrement: 0.2231 },
    expected: 0.03549,
    tolerance: half(5),
    source: PULL_TEST,
    mark: 'restated',
  },
  {
    id: 'SD-02-light',
    method: 'mechanics/damping/light-decay',
    inputs: { first_peak: 0.2, later_peak: 0.16, cycles: 1 },
    expected: 0.0398,
    tolerance: half(4),
    source: `${PULL_TEST}; 0.04 / (2π 0.16)`,
    mark: 'restated',
  },
  {
    id: 'SD-03',
    method: 'mechanics/decrement/peaks',
    inputs: { first_peak: 2, later_peak: 1, cycles: 2.2 },
    expected: 0.3146,
    tolerance: 0.0008,
    source: 'half the amplitude is lost in 2.20 cycles at 5 %: δ = 2π 0.05 / √(1 - 0.05²) = 0.3146',
    mark: 'own arithmetic',
    note: 'the 2.20 is rounded: half of its last digit carried over is 0.0007',
  },
  {
    id: 'critical-half',
    method: 'mechanics/damping/logarithmic-decrement',
    inputs: { log_decrement: 2 * Math.PI },
    ...exactly(Math.SQRT1_2),
    source: 'δ = 2π makes the two terms under the root equal: 1/√2',
    mark: 'own arithmetic',
  },
  {
    id: 'SD-70',
    method: 'mechanics/damping/half-power',
    inputs: { lower_hz: 1.9, upper_hz: 2.1, peak_hz: 2 },
    ...exactly(0.05),
    source: 'ζ = (f2 - f1) / (2 f0) worked by hand, the formula from memory',
    mark: 'own arithmetic',
  },
];
