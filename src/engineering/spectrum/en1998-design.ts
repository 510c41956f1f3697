/** EN 1998-1:2004 design spectra for elastic analysis, 3.2.2.5: reduced by the behaviour factor, for base shear only. */
import { record } from '../formula.js';
import type { SpectrumCode } from './code.js';
import { ordinate } from './compiled.js';
import type { CompiledSpectrum, Segment } from './compiled.js';
import { GROUNDS, rowOf, TYPE_1, TYPE_2 } from './en1998.js';
import type { Ground, Row } from './en1998.js';
import type { SpectrumFamily } from './family.js';
import { AG_INPUT, PERIOD_INPUT } from './family.js';

interface DesignInput {
  readonly ag_g: number;
  readonly ground: string;
  readonly behaviour_factor: number;
  readonly lower_bound_factor: number;
  readonly period_s: number;
}

function compileDesign(
  table: Readonly<Record<Ground, Row>>,
  { ag_g, ground, behaviour_factor: q, lower_bound_factor: beta }: Omit<DesignInput, 'period_s'>,
): CompiledSpectrum {
  const [s, tb, tc, td] = rowOf(table, ground);
  const a = ag_g * s;
  const top = (a * 2.5) / q;
  if (top < beta * ag_g)
    throw new RangeError(
      `the plateau 2.5 S/q = ${((2.5 * s) / q).toPrecision(3)} a_g lies below its own lower bound β = ${String(beta)}: q or β is too large`,
    );
  // where the falling branches reach β a_g (the bound is on a_g, without S)
  const reached = (2.5 * s * tc) / (q * beta);
  const floor_s = reached <= td ? reached : Math.sqrt(reached * td);
  const [S, TB, TC, TD] = [s, tb, tc, td].map(String) as [string, string, string, string];
  const falling: readonly Segment[] = [
    {
      from_s: tc,
      to_s: Math.min(td, floor_s),
      terms: [{ coefficient: top * tc, exponent: -1 }],
      clause: '(3.15) TC ≤ T ≤ TD',
      expression: `ag_g * ${S} * 2.5 / behaviour_factor * ${TC} / period_s`,
    },
    {
      from_s: td,
      to_s: floor_s,
      terms: [{ coefficient: top * tc * td, exponent: -2 }],
      clause: '(3.16) TD ≤ T',
      expression: `ag_g * ${S} * 2.5 / behaviour_factor * ${TC} * ${TD} / period_s ^ 2`,
    },
    {
      from_s: floor_s,
      to_s: Infinity,
      terms: [{ coefficient: beta * ag_g, exponent: 0 }],
      clause: `${floor_s <= td ? '(3.15)' : '(3.16)'} lower bound β a_g`,
      expression: 'lower_bound_factor * ag_g',
    },
  ];
  return {
    segments: [
      {
        from_s: 0,
        to_s: tb,
        terms: [
          { coefficient: (a * 2) / 3, exponent: 0 },
          { coefficient: (a * (2.5 / q - 2 / 3)) / tb, exponent: 1 },
        ],
        clause: '(3.13) 0 ≤ T ≤ TB',
        expression: `ag_g * ${S} * (2 / 3 + period_s / ${TB} * (2.5 / behaviour_factor - 2 / 3))`,
      },
      {
        from_s: tb,
        to_s: tc,
        terms: [{ coefficient: top, exponent: 0 }],
        clause: '(3.14) TB ≤ T ≤ TC',
        expression: `ag_g * ${S} * 2.5 / behaviour_factor`,
      },
      ...falling.filter(({ from_s, to_s }) => to_s > from_s),
    ],
    plateau_from_s: tb,
    plateau_to_s: tc,
    valid_to_s: Infinity,
    flags: ['contains-reduction'],
  };
}

function designCode(type: '1' | '2', table: Readonly<Record<Ground, Row>>): SpectrumCode {
  const compile = (input: Omit<DesignInput, 'period_s'>): CompiledSpectrum => compileDesign(table, input);
  const family: SpectrumFamily<DesignInput> = {
    id: `spectrum/en1998-design-type-${type}`,
    yields: 'sa_g',
    unit: 'g',
    symbol: 'S_d',
    inputs: [
      AG_INPUT,
      { name: 'ground', kind: 'word', words: GROUNDS, meaning: 'ground type' },
      { name: 'behaviour_factor', kind: 'number', from: 1, to: 8, meaning: 'behaviour factor q' },
      {
        name: 'lower_bound_factor',
        kind: 'number',
        from: 0.05,
        to: 0.3,
        fallback: 0.2,
        meaning: 'lower bound factor β of the falling branches',
      },
      PERIOD_INPUT,
    ],
    expression: null,
    procedure:
      'a_g S [2/3 + T/TB (2.5/q - 2/3)] to TB, 2.5 a_g S/q to TC, then TC/T and TC TD/T² of it, not below β a_g',
    compile,
    evaluate: (input) => ordinate(compile(input), input.period_s),
  };
  return {
    code: `en1998-1-2004-design-type-${type}`,
    title: `EN 1998-1:2004 design spectrum, type ${type}, reduced by the behaviour factor`,
    reduced: true,
    record: record({
      id: `en1998-1-2004/spectrum/design-type-${type}`,
      title: `Design spectrum for elastic analysis, type ${type}`,
      family,
      constants: {},
      source: { standard: 'EN 1998-1', edition: '2004', clause: `3.2.2.5(4), table 3.${type === '1' ? '2' : '3'}` },
      verified: 'restated',
      limits: [],
      note: 'Recommended values; a national annex may change them. It contains q and serves base shear, not the ranking.',
    }),
  };
}

export const EN1998_DESIGN_CODES: readonly SpectrumCode[] = [designCode('1', TYPE_1), designCode('2', TYPE_2)];
