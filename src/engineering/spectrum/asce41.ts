/** ASCE/SEI 41-17 general horizontal response spectrum with damping. */
import { apply, record } from '../formula.js';
import type { SpectrumCode } from './code.js';
import { ordinate } from './compiled.js';
import type { CompiledSpectrum } from './compiled.js';
import { B1 } from './damping.js';
import type { SpectrumFamily } from './family.js';
import { DAMPING_INPUT, LARGEST_G, PERIOD_INPUT, TL_INPUT } from './family.js';

interface GeneralInput {
  readonly sxs_g: number;
  readonly sx1_g: number;
  readonly tl_s: number;
  readonly damping_ratio: number;
  readonly period_s: number;
}

function compileGeneral({ sxs_g, sx1_g, tl_s, damping_ratio }: Omit<GeneralInput, 'period_s'>): CompiledSpectrum {
  // The printed formula is 1.0024 at 5 %, for which the spectrum is drawn: no division there.
  const b1 = damping_ratio === 0.05 ? 1 : apply(B1, { damping_ratio });
  const ts = sx1_g / sxs_g;
  const t0 = 0.2 * ts;
  const tl = Math.max(tl_s, ts);
  return {
    segments: [
      {
        from_s: 0,
        to_s: t0,
        terms: [
          { coefficient: 0.4 * sxs_g, exponent: 0 },
          { coefficient: (sxs_g * (5 / b1 - 2)) / ts, exponent: 1 },
        ],
        clause: 'T < T0',
        expression: 'sxs_g * ((5 / b1 - 2) * period_s / (sx1_g / sxs_g) + 0.4)',
      },
      {
        from_s: t0,
        to_s: ts,
        terms: [{ coefficient: sxs_g / b1, exponent: 0 }],
        clause: 'T0 ≤ T ≤ Ts',
        expression: 'sxs_g / b1',
      },
      {
        from_s: ts,
        to_s: tl,
        terms: [{ coefficient: sx1_g / b1, exponent: -1 }],
        clause: 'Ts < T ≤ TL',
        expression: 'sx1_g / (b1 * period_s)',
      },
      {
        from_s: tl,
        to_s: Infinity,
        terms: [{ coefficient: (sx1_g * tl) / b1, exponent: -2 }],
        clause: 'T > TL',
        expression: 'sx1_g * max(tl_s, sx1_g / sxs_g) / (b1 * period_s ^ 2)',
      },
    ],
    plateau_from_s: t0,
    plateau_to_s: ts,
    valid_to_s: Infinity,
    quantities: { b1 },
  };
}

const VALUE = { kind: 'number', unit: 'g', above: 0, to: LARGEST_G } as const;

const family: SpectrumFamily<GeneralInput> = {
  id: 'spectrum/asce41-general',
  yields: 'sa_g',
  unit: 'g',
  symbol: 'S_a',
  inputs: [
    { ...VALUE, name: 'sxs_g', meaning: 'spectral acceleration at short periods for the hazard level and site S_XS' },
    { ...VALUE, name: 'sx1_g', meaning: 'spectral acceleration at 1 s for the hazard level and site S_X1' },
    TL_INPUT,
    DAMPING_INPUT,
    PERIOD_INPUT,
  ],
  expression: null,
  procedure:
    'S_XS [(5/B1 - 2) T/Ts + 0.4] below T0 = 0.2 Ts, S_XS/B1 to Ts = S_X1/S_XS, S_X1/(B1 T) to TL, S_X1 TL/(B1 T²) beyond; B1 = 1 at 5 %',
  compile: compileGeneral,
  evaluate: (input) => ordinate(compileGeneral(input), input.period_s),
};

export const ASCE41_CODES: readonly SpectrumCode[] = [
  {
    code: 'asce41-17-general',
    title: 'ASCE 41-17 general horizontal response spectrum',
    record: record({
      id: 'asce41-17/spectrum/general',
      title: 'General horizontal response spectrum',
      family,
      constants: {},
      source: { standard: 'ASCE/SEI 41', edition: '17', clause: '2.4.1.7' },
      verified: 'memory',
      limits: [],
    }),
  },
];
