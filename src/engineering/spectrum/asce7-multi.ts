/** ASCE/SEI 7-22 multi-period spectrum, 11.4.5.1: 22 ordinates of the risk-targeted maximum considered shaking for the site's class. */
import { record } from '../formula.js';
import type { SpectrumCode } from './code.js';
import { ordinate } from './compiled.js';
import type { CompiledSpectrum, Segment } from './compiled.js';
import type { SpectrumFamily } from './family.js';
import { ORDINATES, PERIOD_INPUT, SHAKING_INPUT, TL_INPUT } from './family.js';
import { compileTable } from './table.js';

/** Periods of the 22 ordinates, s. */
export const MULTI_PERIODS_S: readonly number[] = [
  0, 0.01, 0.02, 0.03, 0.05, 0.075, 0.1, 0.15, 0.2, 0.25, 0.3, 0.4, 0.5, 0.75, 1, 1.5, 2, 3, 4, 5, 7.5, 10,
];

interface MultiInput {
  readonly ordinates_g: readonly number[];
  readonly tl_s: number;
  readonly shaking: string;
  readonly period_s: number;
}

function compileMulti({ ordinates_g, tl_s, shaking }: Omit<MultiInput, 'period_s'>): CompiledSpectrum {
  const share = shaking === 'maximum-considered' ? 1 : 2 / 3;
  const written = (place: number): string =>
    shaking === 'maximum-considered' ? String(ordinates_g[place]) : `2 / 3 * ${String(ordinates_g[place])}`;
  const table = compileTable(
    { periods_s: MULTI_PERIODS_S, ordinates_g: ordinates_g.map((value) => share * value) },
    false,
    (place) => `(${written(place)})`,
  );
  const at10 = share * (ordinates_g.at(-1) ?? 0);
  // Below 10 s the transition cannot be told from the ordinates: the last branch then falls with T² from 10 s on, without a step.
  const tl = Math.max(tl_s, 10);
  const end = written(MULTI_PERIODS_S.length - 1);
  const tail: Segment[] = [
    {
      from_s: 10,
      to_s: tl,
      terms: [{ coefficient: at10 * 10, exponent: -1 }],
      clause: '10 s < T ≤ TL',
      expression: `${end} * 10 / period_s`,
    },
    {
      from_s: tl,
      to_s: Infinity,
      terms: [{ coefficient: at10 * 10 * tl, exponent: -2 }],
      clause: 'T > TL',
      expression: `${end} * 10 * max(tl_s, 10) / period_s ^ 2`,
    },
  ];
  return {
    ...table,
    segments: [...table.segments.slice(0, -1), ...tail.filter(({ from_s, to_s }) => to_s > from_s)],
    valid_to_s: Infinity,
  };
}

const family: SpectrumFamily<MultiInput> = {
  id: 'spectrum/multi-period',
  yields: 'sa_g',
  unit: 'g',
  symbol: 'S_a',
  inputs: [
    {
      ...ORDINATES,
      least: 22,
      most: 22,
      meaning: `maximum considered ordinates for the site class at ${MULTI_PERIODS_S.join(', ')} s`,
    },
    TL_INPUT,
    SHAKING_INPUT,
    PERIOD_INPUT,
  ],
  expression: null,
  procedure:
    '2/3 of the ordinates (maximum considered: the ordinates), straight lines in T between them; S_a(10) 10/T from 10 s to TL and S_a(10) 10 TL/T² beyond [from memory], with T² from 10 s where TL is shorter [judgement]',
  compile: compileMulti,
  evaluate: (input) => ordinate(compileMulti(input), input.period_s),
};

export const ASCE7_MULTI_CODES: readonly SpectrumCode[] = [
  {
    code: 'asce7-22-multi-period',
    title: 'ASCE 7-22 multi-period spectrum',
    record: record({
      id: 'asce7-22/spectrum/multi-period',
      title: 'Multi-period spectrum',
      family,
      constants: {},
      source: { standard: 'ASCE/SEI 7', edition: '22', clause: '11.4.5.1' },
      verified: 'restated',
      limits: [],
      note: 'The branches beyond 10 s are from memory.',
    }),
  },
];
