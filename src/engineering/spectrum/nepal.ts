/** Nepal: NBC 105:2020 with importance at 1. */
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import { level, rise, rowOf, spectrumFamily, stated } from './branches.js';
import type { SpectrumCode } from './code.js';
import type { CompiledSpectrum } from './compiled.js';
import { PERIOD_INPUT } from './family.js';

export interface Nbc105Input {
  readonly zone_factor: number;
  readonly ground: string;
  readonly period_s: number;
}

/** T_a, T_c (s), α, K. */
export const NBC105_SOILS: Readonly<Record<string, readonly [number, number, number, number]>> = {
  A: [0.1, 0.5, 2.5, 1.8],
  B: [0.1, 0.7, 2.5, 1.8],
  C: [0.1, 1, 2.5, 1.8],
  D: [0.5, 2, 2.25, 0.8],
};

function compileNbc105({ zone_factor, ground }: Omit<Nbc105Input, 'period_s'>): CompiledSpectrum {
  const [ta, tc, alpha, k] = rowOf(NBC105_SOILS, ground, 'ground');
  const plateau = stated(zone_factor * alpha, `zone_factor * ${String(alpha)}`);
  const x = `(${String(tc)} / period_s) ^ 2`;
  return {
    segments: [
      rise(
        { from_s: 0, to_s: ta, clause: '0 ≤ T < T_a' },
        plateau,
        stated(1 / alpha, `(1 / ${String(alpha)})`),
        stated(ta),
      ),
      level({ from_s: ta, to_s: tc, clause: 'T_a ≤ T < T_c' }, plateau),
      {
        from_s: tc,
        to_s: Infinity,
        terms: [
          { coefficient: plateau.value * k * tc * tc, exponent: -2 },
          { coefficient: plateau.value * (1 - k) * tc * tc * tc * tc, exponent: -4 },
        ],
        clause: 'T_c ≤ T ≤ 6 s',
        expression: `${plateau.text} * (${String(k)} + (1 - ${String(k)}) * ${x}) * ${x}`,
      },
    ],
    plateau_from_s: ta,
    plateau_to_s: tc,
    valid_to_s: 6,
  };
}

export const NBC105_2020: MethodRecord<Nbc105Input, Record<never, number>> = record({
  id: 'nbc105-2020/spectrum/elastic',
  title: 'Elastic site spectrum C_h Z',
  family: spectrumFamily<Nbc105Input>({
    id: 'spectrum/nbc105-2020',
    symbol: 'C',
    inputs: [
      { name: 'zone_factor', kind: 'number', meaning: 'seismic zoning factor Z', above: 0, to: 1 },
      { name: 'ground', kind: 'word', words: Object.keys(NBC105_SOILS), meaning: 'soil type, A stiff to D very soft' },
      PERIOD_INPUT,
    ],
    procedure: 'Z C_h; C_h = 1 + (α − 1) T/T_a below T_a, α to T_c, α [K + (1 − K)(T_c/T)²](T_c/T)² to 6 s',
    compile: compileNbc105,
  }),
  constants: {},
  source: { standard: 'NBC 105', edition: '2020', clause: 'spectral shape factor C_h(T)' },
  verified: 'restated',
  limits: [{ input: 'period_s', to: 6, whose: 'publication', outside: 'flag', text: 'periods up to 6 s' }],
});

export const NEPAL_CODES: readonly SpectrumCode[] = [
  { code: 'nbc105-2020', title: 'Nepal, NBC 105:2020 elastic spectrum', record: NBC105_2020 },
];
