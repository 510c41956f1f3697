/** Chile: NCh433 with DS61 (2011), elastic form: importance I and reduction R* at 1. */
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import { power } from '../numeric/power.js';
import { rowOf, spectrumFamily } from './branches.js';
import type { SpectrumCode } from './code.js';
import type { CompiledSpectrum } from './compiled.js';
import { PERIOD_INPUT } from './family.js';

export interface Nch433Input {
  readonly ag_g: number;
  readonly ground: string;
  readonly period_s: number;
}

interface Soil {
  readonly s: number;
  readonly to_s: number;
  readonly p: number;
  /** T/To of the largest α, and max(T α)/(To max α): no plateau is printed, so these stand for its start and end (computed). */
  readonly peak: number;
  readonly corner: number;
}

export const DS61_SOILS: Readonly<Record<string, Soil>> = {
  A: { s: 0.9, to_s: 0.15, p: 2, peak: 1.084851720048771, corner: 1.62991 },
  B: { s: 1, to_s: 0.3, p: 1.5, peak: 0.8633326993333329, corner: 1.133 },
  C: { s: 1.05, to_s: 0.4, p: 1.6, peak: 0.9009675454126307, corner: 1.19288 },
  D: { s: 1.2, to_s: 0.75, p: 1, peak: 0.6967162461339999, corner: 0.91178 },
  E: { s: 1.3, to_s: 1.2, p: 1, peak: 0.6967162461339999, corner: 0.91178 },
};

function compileNch433({ ag_g, ground }: Omit<Nch433Input, 'period_s'>): CompiledSpectrum {
  const { s, to_s, p, peak, corner } = rowOf(DS61_SOILS, ground, 'ground');
  const a = ag_g * s;
  const x = `(period_s / ${String(to_s)})`;
  return {
    segments: [
      {
        from_s: 0,
        to_s: Infinity,
        terms: [
          { coefficient: a, exponent: 0 },
          { coefficient: (4.5 * a) / power(to_s, p), exponent: p },
        ],
        over: [
          { coefficient: 1, exponent: 0 },
          { coefficient: 1 / power(to_s, 3), exponent: 3 },
        ],
        clause: 'one branch for all periods',
        expression: `ag_g * ${String(s)} * (1 + 4.5 * ${x} ^ ${String(p)}) / (1 + ${x} ^ 3)`,
      },
    ],
    plateau_from_s: peak * to_s,
    plateau_to_s: corner * to_s,
    valid_to_s: Infinity,
  };
}

export const NCH433_DS61: MethodRecord<Nch433Input, Record<never, number>> = record({
  id: 'nch433-ds61/spectrum/elastic',
  title: 'Elastic spectrum S A0 α',
  family: spectrumFamily<Nch433Input>({
    id: 'spectrum/nch433-ds61',
    symbol: 'S_a',
    inputs: [
      {
        name: 'ag_g',
        kind: 'number',
        unit: 'g',
        meaning: 'effective acceleration A0: 0.20, 0.30, 0.40 g in zones 1, 2, 3',
        above: 0,
        to: 1,
      },
      { name: 'ground', kind: 'word', words: Object.keys(DS61_SOILS), meaning: 'soil type, A rock to E soft' },
      PERIOD_INPUT,
    ],
    procedure: 'S A0 α; α = [1 + 4.5 (T/To)^p] / [1 + (T/To)³]; S, To, p by soil type',
    compile: compileNch433,
  }),
  constants: {},
  source: { standard: 'NCh433 and DS61', edition: '2011', clause: 'design spectrum, I = R* = 1' },
  verified: 'restated',
  limits: [],
  note: 'The curve has no plateau: below its peak the ranking holds the peak.',
});

export const CHILE_CODES: readonly SpectrumCode[] = [
  { code: 'nch433-ds61', title: 'Chile, NCh433 with DS61 (2011)', record: NCH433_DS61 },
];
