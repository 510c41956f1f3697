/** The two-period shape of ASCE/SEI 7 (7-05 11.4.5, 7-16 11.4.6, 7-22 11.4.5.2) and the 7-22 spectra given by S_DS and S_D1. */
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import type { SpectrumCode } from './code.js';
import { ordinate } from './compiled.js';
import type { CompiledSpectrum } from './compiled.js';
import type { SpectrumFamily } from './family.js';
import { LARGEST_G, PERIOD_INPUT, TL_INPUT } from './family.js';

export interface TwoPeriodInput {
  readonly sds_g: number;
  readonly sd1_g: number;
  readonly tl_s: number;
  readonly period_s: number;
}

/** How the two ordinates are written in display formulas. */
export interface TwoPeriodNames {
  readonly short: string;
  readonly one: string;
}

/** Segments of the two-period spectrum with plateau `sds_g` and `sd1_g` at 1 s: T0 = 0.2 Ts, Ts = S_D1/S_DS. */
export function compileTwoPeriod(
  { sds_g, sd1_g, tl_s }: Omit<TwoPeriodInput, 'period_s'>,
  { short, one }: TwoPeriodNames = { short: 'sds_g', one: 'sd1_g' },
): CompiledSpectrum {
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
        expression: `${short} * (0.4 + 0.6 * period_s / (0.2 * (${one}) / (${short})))`,
      },
      {
        from_s: t0,
        to_s: ts,
        terms: [{ coefficient: sds_g, exponent: 0 }],
        clause: 'T0 ≤ T ≤ Ts',
        expression: short,
      },
      {
        from_s: ts,
        to_s: tl,
        terms: [{ coefficient: sd1_g, exponent: -1 }],
        clause: 'Ts < T ≤ TL',
        expression: `${one} / period_s`,
      },
      {
        from_s: tl,
        to_s: Infinity,
        terms: [{ coefficient: sd1_g * tl, exponent: -2 }],
        clause: 'T > TL',
        // as computed: the long branch never starts below Ts
        expression: `${one} * max(tl_s, (${one}) / (${short})) / period_s ^ 2`,
      },
    ],
    plateau_from_s: t0,
    plateau_to_s: ts,
    valid_to_s: Infinity,
  };
}

/** `scale` 1: the design spectrum; 1.5: the risk-targeted maximum considered one. */
function twoPeriodFamily(id: string, scale: 1 | 1.5): SpectrumFamily<TwoPeriodInput> {
  const names = scale === 1 ? undefined : { short: '1.5 * sds_g', one: '1.5 * sd1_g' };
  const compile = ({ sds_g, sd1_g, tl_s }: Omit<TwoPeriodInput, 'period_s'>): CompiledSpectrum =>
    compileTwoPeriod({ sds_g: scale * sds_g, sd1_g: scale * sd1_g, tl_s }, names);
  const shape =
    'S_DS (0.4 + 0.6 T/T0) below T0, S_DS to Ts, S_D1/T to TL, S_D1 TL/T² beyond; T0 = 0.2 S_D1/S_DS, Ts = S_D1/S_DS';
  return {
    id,
    yields: 'sa_g',
    unit: 'g',
    symbol: 'S_a',
    inputs: [
      {
        name: 'sds_g',
        kind: 'number',
        unit: 'g',
        above: 0,
        to: LARGEST_G,
        meaning: 'design spectral acceleration at short periods S_DS',
      },
      {
        name: 'sd1_g',
        kind: 'number',
        unit: 'g',
        above: 0,
        to: LARGEST_G,
        meaning: 'design spectral acceleration at 1 s S_D1',
      },
      TL_INPUT,
      PERIOD_INPUT,
    ],
    expression: null,
    procedure: scale === 1 ? shape : `1.5 times the design spectrum: ${shape}`,
    compile,
    evaluate: (input) => ordinate(compile(input), input.period_s),
  };
}

const TL_LIMIT = {
  input: 'tl_s',
  from: 4,
  to: 16,
  whose: 'ours',
  outside: 'flag',
  text: 'mapped values run from 4 to 16 s',
} as const;

const DESIGN: MethodRecord<TwoPeriodInput, Record<never, number>> = record({
  id: 'asce7-22/spectrum/two-period',
  title: 'Two-period design spectrum',
  family: twoPeriodFamily('spectrum/two-period', 1),
  constants: {},
  source: { standard: 'ASCE/SEI 7', edition: '22', clause: '11.4.5.2' },
  verified: 'restated',
  limits: [TL_LIMIT],
});

const MAXIMUM: MethodRecord<TwoPeriodInput, Record<never, number>> = record({
  id: 'asce7-22/spectrum/two-period-maximum',
  title: 'Two-period spectrum of the risk-targeted maximum considered shaking',
  family: twoPeriodFamily('spectrum/two-period-maximum', 1.5),
  constants: {},
  source: { standard: 'ASCE/SEI 7', edition: '22', clause: '11.4.6' },
  verified: 'restated',
  limits: [TL_LIMIT],
});

export const ASCE7_CODES: readonly SpectrumCode[] = [
  { code: 'asce7-22-two-period', title: 'ASCE 7-22 two-period design spectrum', record: DESIGN },
  {
    code: 'asce7-22-two-period-maximum',
    title: 'ASCE 7-22 two-period spectrum of the risk-targeted maximum considered shaking',
    record: MAXIMUM,
  },
];
