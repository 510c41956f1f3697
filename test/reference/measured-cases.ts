/** Periods measured, and two estimates made one. */
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

export const MEASURED_CASES: readonly ReferenceCase[] = [
  {
    id: 'M01-ew',
    method: 'mechanics/period/reciprocal-of-frequency',
    inputs: { frequency_hz: 1.14 },
    expected: 0.877,
    tolerance: half(3),
    source: 'report EERL 2004-03, forced vibration of a nine-storey library, 1.14 Hz',
    mark: 'restated',
  },
  {
    id: 'M01-ns',
    method: 'mechanics/period/reciprocal-of-frequency',
    inputs: { frequency_hz: 1.67 },
    expected: 0.599,
    tolerance: half(3),
    source: 'the same report, 1.67 Hz',
    mark: 'restated',
  },
  {
    id: 'mains',
    method: 'mechanics/period/reciprocal-of-frequency',
    inputs: { frequency_hz: 50 },
    ...exactly(0.02),
    source: '50 Hz is 50 cycles a second: common practice, no source',
    mark: 'own arithmetic',
  },
  {
    id: 'strong-as-measured',
    method: 'swaymark/period/measured-strong',
    inputs: { period_s: 0.8 },
    ...exactly(0.8),
    source: 'taken as measured',
    mark: 'own arithmetic',
  },
  {
    id: 'ambient-frame',
    method: 'swaymark/period/measured-small',
    inputs: { period_s: 0.6 },
    ...exactly(0.78),
    source: '1.3 × 0.6; a nine-storey steel building of Pasadena lengthened 1.30 times in 1971 (restated)',
    mark: 'own arithmetic',
  },
  {
    id: 'ambient-masonry',
    method: 'swaymark/period/measured-small-masonry',
    inputs: { period_s: 0.2 },
    ...exactly(0.3),
    source: '1.5 × 0.2',
    mark: 'own arithmetic',
  },
  {
    id: 'two-estimates',
    method: 'statistics/period/inverse-variance',
    inputs: { period_1_s: 1, sigma_1: 0.3, period_2_s: 0.8, sigma_2: 0.2 },
    expected: 0.856857,
    tolerance: half(6),
    source: 'weights 1/0.09 and 1/0.04 stand as 4 to 9: 0.8^(9/13)',
    mark: 'own arithmetic',
  },
  {
    id: 'two-alike',
    method: 'statistics/period/inverse-variance',
    inputs: { period_1_s: 0.5, sigma_1: 0.2, period_2_s: 0.72, sigma_2: 0.2 },
    ...exactly(0.6),
    source: 'equal weights: the geometric mean √(0.5 × 0.72)',
    mark: 'own arithmetic',
  },
];
