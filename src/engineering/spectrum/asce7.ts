/** ASCE/SEI 7-22 two-period design spectrum, 11.4.5.2. */
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import { ordinate } from './compiled.js';
import type { CompiledSpectrum } from './compiled.js';
import type { SpectrumFamily } from './family.js';
import { PERIOD_INPUT } from './family.js';

export interface TwoPeriodInput {
  readonly sds_g: number;
  readonly sd1_g: number;
  readonly tl_s: number;
  readonly period_s: number;
}

/** Segments of the two-period spectrum: T0 = 0.2 SD1/SDS, Ts = SD1/SDS. */
export function compileTwoPeriod({ sds_g, sd1_g, tl_s }: Omit<TwoPeriodInput, 'period_s'>): CompiledSpectrum {
  const ts = sd1_g / sds_g;
  const t0 = 0.2 * ts;
  const tl = Math.max(tl_s, ts);
  return {
    segments: [
      {
        from_s: 0,
        to_s: t0,
        terms: [
          { coefficient: 0.4 * sds_g, exponent: 0 },
          { coefficient: (0.6 * sds_g) / t0, exponent: 1 },
        ],
        clause: 'T < T0',
        expression: 'sds_g * (0.4 + 0.6 * period_s / (0.2 * sd1_g / sds_g))',
      },
      {
        from_s: t0,
        to_s: ts,
        terms: [{ coefficient: sds_g, exponent: 0 }],
        clause: 'T0 ≤ T ≤ Ts',
        expression: 'sds_g',
      },
      {
        from_s: ts,
        to_s: tl,
        terms: [{ coefficient: sd1_g, exponent: -1 }],
        clause: 'Ts < T ≤ TL',
        expression: 'sd1_g / period_s',
      },
      {
        from_s: tl,
        to_s: Infinity,
        terms: [{ coefficient: sd1_g * tl, exponent: -2 }],
        clause: 'T > TL',
        // as computed: the long branch never starts below Ts
        expression: 'sd1_g * max(tl_s, sd1_g / sds_g) / period_s ^ 2',
      },
    ],
    plateau_from_s: t0,
    plateau_to_s: ts,
    valid_to_s: Infinity,
  };
}

const family: SpectrumFamily<TwoPeriodInput> = {
  id: 'spectrum/two-period',
  yields: 'sa_g',
  unit: 'g',
  symbol: 'S_a',
  inputs: [
    { name: 'sds_g', kind: 'number', unit: 'g', meaning: 'design spectral acceleration at short periods' },
    { name: 'sd1_g', kind: 'number', unit: 'g', meaning: 'design spectral acceleration at 1 s' },
    { name: 'tl_s', kind: 'number', unit: 's', meaning: 'long-period transition', fallback: 8 },
    PERIOD_INPUT,
  ],
  expression: null,
  procedure:
    'S_DS (0.4 + 0.6 T/T0) below T0, S_DS to Ts, S_D1/T to TL, S_D1 TL/T² beyond; T0 = 0.2 S_D1/S_DS, Ts = S_D1/S_DS',
  compile: compileTwoPeriod,
  evaluate: (input) => ordinate(compileTwoPeriod(input), input.period_s),
};

export const ASCE7_22_TWO_PERIOD: MethodRecord<TwoPeriodInput, Record<never, number>> = record({
  id: 'asce7-22/spectrum/two-period',
  title: 'Two-period design spectrum',
  family,
  constants: {},
  source: { standard: 'ASCE/SEI 7', edition: '22', clause: '11.4.5.2' },
  verified: 'restated',
  limits: [
    { input: 'sds_g', from: 0.01, to: 4, whose: 'ours', outside: 'reject', text: '0.01 to 4 g' },
    { input: 'sd1_g', from: 0.005, to: 3, whose: 'ours', outside: 'reject', text: '0.005 to 3 g' },
    { input: 'tl_s', from: 1, to: 20, whose: 'ours', outside: 'reject', text: 'mapped values run from 4 to 16 s' },
  ],
});
