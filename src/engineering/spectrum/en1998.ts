/** EN 1998-1:2004 elastic spectra, 3.2.2.2, with the recommended values of tables 3.2 and 3.3; national annexes change them. */
import { apply, record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import type { SpectrumCode } from './code.js';
import { ordinate } from './compiled.js';
import type { CompiledSpectrum } from './compiled.js';
import type { SpectrumFamily } from './family.js';
import { ETA } from './damping.js';
import { AG_INPUT, DAMPING_INPUT, PERIOD_INPUT } from './family.js';

export const GROUNDS = ['A', 'B', 'C', 'D', 'E'] as const;
export type Ground = (typeof GROUNDS)[number];

export interface ElasticInput {
  readonly ag_g: number;
  readonly ground: string;
  /** 0.05 when left out. */
  readonly damping_ratio?: number;
  readonly period_s: number;
}

/** S, TB, TC, TD. */
export type Row = readonly [number, number, number, number];

export const TYPE_1: Readonly<Record<Ground, Row>> = {
  A: [1.0, 0.15, 0.4, 2.0],
  B: [1.2, 0.15, 0.5, 2.0],
  C: [1.15, 0.2, 0.6, 2.0],
  D: [1.35, 0.2, 0.8, 2.0],
  E: [1.4, 0.15, 0.5, 2.0],
};

export const TYPE_2: Readonly<Record<Ground, Row>> = {
  A: [1.0, 0.05, 0.25, 1.2],
  B: [1.35, 0.05, 0.25, 1.2],
  C: [1.5, 0.1, 0.25, 1.2],
  D: [1.8, 0.1, 0.3, 1.2],
  E: [1.6, 0.05, 0.25, 1.2],
};

/** The row of a ground. @throws RangeError for a ground the table does not know. */
export function rowOf(table: Readonly<Record<Ground, Row>>, ground: string): Row {
  const row = (table as Readonly<Record<string, Row | undefined>>)[ground];
  if (row === undefined) throw new RangeError(`unknown ground "${ground}"; known: ${GROUNDS.join(', ')}`);
  return row;
}

function compileElastic(
  table: Readonly<Record<Ground, Row>>,
  { ag_g, ground, damping_ratio }: Omit<ElasticInput, 'period_s'>,
): CompiledSpectrum {
  const [s, tb, tc, td] = rowOf(table, ground);
  const a = ag_g * s;
  const eta = apply(ETA, { damping_ratio: damping_ratio ?? 0.05 });
  // at 5 % η is 1 and is not written
  const [ramp, plateau] = eta === 1 ? ['1.5', '2.5'] : ['(2.5 * eta - 1)', '2.5 * eta'];
  const text = (value: number): string => String(value);
  return {
    segments: [
      {
        from_s: 0,
        to_s: tb,
        terms: [
          { coefficient: a, exponent: 0 },
          { coefficient: ((2.5 * eta - 1) * a) / tb, exponent: 1 },
        ],
        clause: '(3.2) 0 ≤ T ≤ TB',
        expression: `ag_g * ${text(s)} * (1 + period_s / ${text(tb)} * ${ramp})`,
      },
      {
        from_s: tb,
        to_s: tc,
        terms: [{ coefficient: 2.5 * eta * a, exponent: 0 }],
        clause: '(3.3) TB ≤ T ≤ TC',
        expression: `ag_g * ${text(s)} * ${plateau}`,
      },
      {
        from_s: tc,
        to_s: td,
        terms: [{ coefficient: 2.5 * eta * a * tc, exponent: -1 }],
        clause: '(3.4) TC ≤ T ≤ TD',
        expression: `ag_g * ${text(s)} * ${plateau} * ${text(tc)} / period_s`,
      },
      {
        from_s: td,
        to_s: Infinity,
        terms: [{ coefficient: 2.5 * eta * a * tc * td, exponent: -2 }],
        clause: '(3.5) TD ≤ T ≤ 4 s',
        expression: `ag_g * ${text(s)} * ${plateau} * ${text(tc)} * ${text(td)} / period_s ^ 2`,
      },
    ],
    plateau_from_s: tb,
    plateau_to_s: tc,
    valid_to_s: 4,
    quantities: { eta },
  };
}

function elasticRecord(
  type: '1' | '2',
  table: Readonly<Record<Ground, Row>>,
): MethodRecord<ElasticInput, Record<never, number>> {
  const family: SpectrumFamily<ElasticInput> = {
    id: `spectrum/en1998-elastic-type-${type}`,
    yields: 'sa_g',
    unit: 'g',
    symbol: 'S_e',
    inputs: [
      AG_INPUT,
      { name: 'ground', kind: 'word', words: GROUNDS, meaning: 'ground type' },
      DAMPING_INPUT,
      PERIOD_INPUT,
    ],
    expression: null,
    procedure:
      'a_g S [1 + (2.5 η - 1) T/TB] to TB, 2.5 η a_g S to TC, 2.5 η a_g S TC/T to TD, 2.5 η a_g S TC TD/T² to 4 s; η = 1 at 5 % damping',
    compile: (input) => compileElastic(table, input),
    evaluate: (input) => ordinate(compileElastic(table, input), input.period_s),
  };
  return record({
    id: `en1998-1-2004/spectrum/elastic-type-${type}`,
    title: `Horizontal elastic spectrum, type ${type}`,
    family,
    constants: {},
    source: { standard: 'EN 1998-1', edition: '2004', clause: `3.2.2.2(1), table 3.${type === '1' ? '2' : '3'}` },
    verified: 'restated',
    limits: [{ input: 'period_s', to: 4, whose: 'publication', outside: 'flag', text: 'periods up to 4 s' }],
    note: 'Recommended values; a national annex may change them.',
  });
}

export const EN1998_CODES: readonly SpectrumCode[] = [
  {
    code: 'en1998-1-2004-elastic-type-1',
    title: 'EN 1998-1:2004 elastic spectrum, type 1',
    record: elasticRecord('1', TYPE_1),
  },
  {
    code: 'en1998-1-2004-elastic-type-2',
    title: 'EN 1998-1:2004 elastic spectrum, type 2',
    record: elasticRecord('2', TYPE_2),
  },
];
