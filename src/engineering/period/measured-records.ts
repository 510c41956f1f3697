/** Measured periods, and the step from small to strong amplitude. */
import { record } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import { amplitudeFactor, reciprocal } from './families.js';

const judged = {
  standard: 'Swaymark',
  edition: '',
  clause: 'judgement within published ratios of 1.05 to 1.5',
} as const;

export const FREQUENCY_TO_PERIOD = record({
  id: 'mechanics/period/reciprocal-of-frequency',
  title: 'Period from frequency',
  family: reciprocal,
  constants: {},
  source: { standard: 'common practice', edition: '', clause: 'T = 1/f' },
  verified: 'mechanics',
  limits: [
    {
      input: 'frequency_hz',
      from: 0.01,
      to: 100,
      whose: 'ours',
      outside: 'reject',
      text: 'frequencies of 0.01 to 100 Hz',
    },
  ],
});

export const MEASURED_STRONG = record({
  id: 'swaymark/period/measured-strong',
  title: 'Period measured in strong shaking',
  family: amplitudeFactor,
  constants: { factor: 1 },
  source: { standard: 'Swaymark', edition: '', clause: 'taken as measured' },
  verified: 'judgement',
  limits: [],
});

export const MEASURED_SMALL = record({
  id: 'swaymark/period/measured-small',
  title: 'Period measured at small amplitude, lengthened for strong shaking',
  family: amplitudeFactor,
  constants: { factor: 1.3 },
  source: judged,
  verified: 'judgement',
  limits: [],
  note: 'Ambient and forced tests; published strong over small amplitude ratios run from 1.05 to 1.5.',
});

export const MEASURED_SMALL_BRITTLE = record({
  id: 'swaymark/period/measured-small-masonry',
  title: 'Period measured at small amplitude, infilled frame or unreinforced masonry',
  family: amplitudeFactor,
  constants: { factor: 1.5 },
  source: judged,
  verified: 'judgement',
  limits: [],
  note: 'Infill and masonry crack early and lengthen more.',
});

export const MEASURED_PERIODS: readonly AnyRecord[] = [
  FREQUENCY_TO_PERIOD,
  MEASURED_STRONG,
  MEASURED_SMALL,
  MEASURED_SMALL_BRITTLE,
];
