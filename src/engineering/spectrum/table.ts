/** A spectrum given by ordinates at periods, interpolated linearly or in log-log; flat outside the end periods. */
import { ln } from '../numeric/elementary.js';
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import { power } from '../numeric/power.js';
import type { SpectrumCode } from './code.js';
import { ordinate } from './compiled.js';
import type { CompiledSpectrum, Segment } from './compiled.js';
import type { SpectrumFamily } from './family.js';
import { LARGEST_G, PERIOD_INPUT } from './family.js';

export interface TableInput {
  readonly periods_s: readonly number[];
  readonly ordinates_g: readonly number[];
  readonly period_s: number;
}

function check({ periods_s, ordinates_g }: Omit<TableInput, 'period_s'>, positive: boolean): void {
  if (periods_s.length !== ordinates_g.length || periods_s.length < 2) {
    throw new RangeError(
      `as many ordinates as periods are needed, at least two, got ${String(ordinates_g.length)} and ${String(periods_s.length)}`,
    );
  }
  periods_s.forEach((period, i) => {
    if (!(period >= 0) || (i > 0 && period <= periods_s[i - 1]!))
      throw new RangeError(`periods must increase, got ${String(period)} at place ${String(i + 1)}`);
    if (!(ordinates_g[i]! > 0))
      throw new RangeError(`ordinates must be positive, got ${String(ordinates_g[i])} at place ${String(i + 1)}`);
  });
  if (positive && !(periods_s[0]! > 0)) throw new RangeError('log-log interpolation needs periods above 0 s');
}

/**
 * Segments of a table; `nameOf` says how the ordinate at a place is written in display formulas. The plateau starts where the largest ordinate stands and its corner is max(T S_a)/max S_a, which is where
 * the equal-velocity branch that envelopes the table leaves the largest ordinate.
 */
export function compileTable(
  input: Omit<TableInput, 'period_s'>,
  logarithmic: boolean,
  nameOf: (place: number) => string = (place) => String(input.ordinates_g[place]!),
): CompiledSpectrum {
  check(input, logarithmic);
  const { periods_s, ordinates_g } = input;
  const last = periods_s.length - 1;
  const segments: Segment[] = [];
  const flat = (from_s: number, to_s: number, place: number): Segment => ({
    from_s,
    to_s,
    terms: [{ coefficient: ordinates_g[place]!, exponent: 0 }],
    clause: 'outside the table: the end ordinate',
    expression: nameOf(place),
  });
  if (periods_s[0]! > 0) segments.push(flat(0, periods_s[0]!, 0));
  for (let i = 0; i < last; i += 1) {
    const [t1, t2, s1, s2] = [periods_s[i]!, periods_s[i + 1]!, ordinates_g[i]!, ordinates_g[i + 1]!];
    const [n1, n2] = [nameOf(i), nameOf(i + 1)];
    const clause = `between ${String(t1)} s and ${String(t2)} s`;
    if (logarithmic) {
      const exponent = ln(s2 / s1) / ln(t2 / t1);
      segments.push({
        from_s: t1,
        to_s: t2,
        terms: [{ coefficient: s1 / power(t1, exponent), exponent }],
        clause,
        expression: `${n1} * (period_s / ${String(t1)}) ^ (ln(${n2} / ${n1}) / ln(${String(t2)} / ${String(t1)}))`,
      });
    } else {
      const slope = (s2 - s1) / (t2 - t1);
      segments.push({
        from_s: t1,
        to_s: t2,
        terms: [
          { coefficient: s1 - slope * t1, exponent: 0 },
          { coefficient: slope, exponent: 1 },
        ],
        clause,
        expression: `${n1} + (${n2} - ${n1}) * (period_s - ${String(t1)}) / (${String(t2)} - ${String(t1)})`,
      });
    }
  }
  segments.push(flat(periods_s[last]!, Infinity, last));
  const largest = Math.max(...ordinates_g);
  const velocity = Math.max(...ordinates_g.map((value, i) => value * periods_s[i]!));
  const plateau_from_s = periods_s[ordinates_g.indexOf(largest)]!;
  return {
    segments,
    plateau_from_s,
    plateau_to_s: Math.max(velocity / largest, plateau_from_s),
    valid_to_s: periods_s[last]!,
  };
}

function tableRecord(which: 'linear' | 'log-log'): MethodRecord<TableInput, Record<never, number>> {
  const family: SpectrumFamily<TableInput> = {
    id: `spectrum/table-${which}`,
    yields: 'sa_g',
    unit: 'g',
    symbol: 'S_a',
    inputs: [
      { name: 'periods_s', kind: 'list', unit: 's', from: 0, to: 100, least: 2, meaning: 'periods, increasing' },
      {
        name: 'ordinates_g',
        kind: 'list',
        unit: 'g',
        above: 0,
        to: LARGEST_G,
        least: 2,
        meaning: '5 % elastic spectral accelerations at those periods',
      },
      PERIOD_INPUT,
    ],
    expression: null,
    procedure:
      which === 'linear'
        ? 'straight lines between the ordinates; flat outside'
        : 'straight lines in ln S_a over ln T between the ordinates; flat outside',
    compile: (input) => compileTable(input, which === 'log-log'),
    evaluate: (input) => ordinate(compileTable(input, which === 'log-log'), input.period_s),
  };
  return record({
    id: `table/spectrum/${which}`,
    title: `Tabulated spectrum, ${which === 'linear' ? 'linear' : 'log-log'} interpolation`,
    family,
    constants: {},
    source: { standard: 'interpolation of a table', edition: '', clause: which },
    verified: 'mechanics',
    limits: [],
  });
}

const LINEAR = tableRecord('linear');

export const TABLE_CODES: readonly SpectrumCode[] = [
  {
    code: 'table',
    title: 'A spectrum given by its ordinates',
    record: LINEAR,
    choice: {
      name: 'interpolation',
      meaning: 'between the periods: linear, or straight in logarithms',
      records: { linear: LINEAR, 'log-log': tableRecord('log-log') },
    },
  },
];
