/** Relations that turn a vibration record into damping. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { ln } from '../numeric/elementary.js';

type Peaks = { readonly first_peak: number; readonly later_peak: number; readonly cycles: number };

const PEAKS = [
  { name: 'first_peak', kind: 'number', meaning: 'amplitude of a peak of the free decay, in any unit' },
  { name: 'later_peak', kind: 'number', meaning: 'amplitude of a later peak of the same sign, in the same unit' },
  { name: 'cycles', kind: 'number', meaning: 'whole cycles between the two' },
] as const;

const decrement: Family<Peaks, Record<never, number>> = {
  id: 'vibration/logarithmic-decrement',
  yields: 'log_decrement',
  unit: null,
  symbol: 'δ',
  inputs: PEAKS,
  expression: 'ln(first_peak / later_peak) / cycles',
  evaluate: ({ first_peak, later_peak, cycles }) => ln(first_peak / later_peak) / cycles,
};

const fromDecrement: Family<{ readonly log_decrement: number }, Record<never, number>> = {
  id: 'vibration/damping-of-decrement',
  yields: 'damping_ratio',
  unit: null,
  symbol: 'ζ',
  inputs: [
    { name: 'log_decrement', kind: 'number', meaning: 'natural logarithm of the ratio of two peaks one cycle apart' },
  ],
  expression: 'log_decrement / sqrt(4 * pi ^ 2 + log_decrement ^ 2)',
  evaluate: ({ log_decrement }) => log_decrement / Math.sqrt(4 * Math.PI * Math.PI + log_decrement * log_decrement),
};

const lightDecay: Family<Peaks, Record<never, number>> = {
  id: 'vibration/light-damping-of-decay',
  yields: 'damping_ratio',
  unit: null,
  symbol: 'ζ',
  inputs: PEAKS,
  expression: '(first_peak - later_peak) / (2 * pi * cycles * later_peak)',
  evaluate: ({ first_peak, later_peak, cycles }) => (first_peak - later_peak) / (2 * Math.PI * cycles * later_peak),
};

const bandwidth: Family<
  { readonly lower_hz: number; readonly upper_hz: number; readonly peak_hz: number },
  Record<never, number>
> = {
  id: 'vibration/half-power',
  yields: 'damping_ratio',
  unit: null,
  symbol: 'ζ',
  inputs: [
    { name: 'lower_hz', kind: 'number', meaning: 'frequency below the peak where the power is half the peak' },
    { name: 'upper_hz', kind: 'number', meaning: 'frequency above the peak where the power is half the peak' },
    { name: 'peak_hz', kind: 'number', meaning: 'frequency of the peak' },
  ],
  expression: '(upper_hz - lower_hz) / (2 * peak_hz)',
  evaluate: ({ lower_hz, upper_hz, peak_hz }) => (upper_hz - lower_hz) / (2 * peak_hz),
};

export const LOG_DECREMENT = record({
  id: 'mechanics/decrement/peaks',
  title: 'Logarithmic decrement of a free decay from two peaks',
  family: decrement,
  constants: {},
  source: { standard: 'Clough and Penzien, Dynamics of Structures', edition: '', clause: 'eq. 2-58' },
  verified: 'restated',
  limits: [],
});

export const DAMPING_OF_DECREMENT = record({
  id: 'mechanics/damping/logarithmic-decrement',
  title: 'Damping ratio from the logarithmic decrement, exact',
  family: fromDecrement,
  constants: {},
  source: {
    standard: 'Clough and Penzien, Dynamics of Structures',
    edition: '',
    clause: 'eq. 2-58 solved for the damping',
  },
  verified: 'restated',
  limits: [],
});

const DAMPING_OF_LIGHT_DECAY = record({
  id: 'mechanics/damping/light-decay',
  title: 'Damping ratio from two peaks, light damping',
  family: lightDecay,
  constants: {},
  source: { standard: 'Clough and Penzien, Dynamics of Structures', edition: '', clause: 'eq. 2-59' },
  verified: 'restated',
  limits: [],
  note: 'For a hand check: it overestimates, by an eighth where a cycle loses a fifth of the amplitude. `measure` takes the exact form.',
});

export const HALF_POWER_DAMPING = record({
  id: 'mechanics/damping/half-power',
  title: 'Damping ratio from the half-power bandwidth',
  family: bandwidth,
  constants: {},
  source: {
    standard: 'structural dynamics',
    edition: '',
    clause: 'half-power bandwidth of a lightly damped resonance',
  },
  verified: 'memory',
  limits: [],
  note: 'A spectrum of short windows is wider than the resonance: the ratio is then an upper bound.',
});

export const VIBRATION_RECORDS: readonly AnyRecord[] = [
  LOG_DECREMENT,
  DAMPING_OF_DECREMENT,
  DAMPING_OF_LIGHT_DECAY,
  HALF_POWER_DAMPING,
];
