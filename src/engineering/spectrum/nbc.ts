/** Design spectra of the National Building Code of Canada, 4.1.8.4: 2010 (F_a, F_v), 2015 (F(T)), 2020 (ordinates of the site designation). */
import { apply, record } from '../formula.js';
import type { AnyRecord, InputSpec } from '../formula.js';
import type { Verified } from '../source.js';
import type { SpectrumCode } from './code.js';
import { ordinate } from './compiled.js';
import type { CompiledSpectrum } from './compiled.js';
import type { SpectrumFamily } from './family.js';
import { LARGEST_G, ORDINATES, PERIOD_INPUT } from './family.js';
import { NBC_2015_FACTORS, NBC_CLASSES, NBC_PERIODS_S } from './nbc-factors.js';
import { compileTable } from './table.js';

/** One control point: period, the value read there, its display formula. */
interface Point {
  readonly period_s: number;
  readonly value: number;
  readonly written: string;
}

/** Straight lines through control points, flat outside; the first point's value is the plateau from 0 s where it is the largest. */
function throughPoints(points: readonly Point[], logarithmic: boolean): CompiledSpectrum {
  const compiled = compileTable(
    { periods_s: points.map(({ period_s }) => period_s), ordinates_g: points.map(({ value }) => value) },
    logarithmic,
    (place) => `(${points[place]!.written})`,
  );
  const first = points[0]!;
  return compiled.plateau_from_s === first.period_s ? { ...compiled, plateau_from_s: 0 } : compiled;
}

const FACTOR = { kind: 'number', from: 0.4, to: 4 } as const;

interface Input2010 {
  readonly ordinates_g: readonly number[];
  readonly fa: number;
  readonly fv: number;
  readonly period_s: number;
}

function compile2010({ ordinates_g, fa, fv }: Omit<Input2010, 'period_s'>): CompiledSpectrum {
  const [s02, s05, s1, s2] = ordinates_g as readonly [number, number, number, number];
  const [n02, n05, n1, n2] = [s02, s05, s1, s2].map(String);
  const points: readonly Point[] = [
    { period_s: 0.2, value: fa * s02, written: `fa * ${n02!}` },
    { period_s: 0.5, value: Math.min(fv * s05, fa * s02), written: `min(fv * ${n05!}, fa * ${n02!})` },
    { period_s: 1, value: fv * s1, written: `fv * ${n1!}` },
    { period_s: 2, value: fv * s2, written: `fv * ${n2!}` },
    { period_s: 4, value: (fv * s2) / 2, written: `fv * ${n2!} / 2` },
  ];
  return { ...throughPoints(points, false), valid_to_s: Infinity };
}

interface Input2015 {
  readonly ordinates_g: readonly number[];
  readonly pga_g: number;
  readonly site_class: string;
  readonly period_s: number;
}

/** The larger of the points at 0.2 s and 0.5 s up to 0.2 s. */
function shortRule(points: readonly Point[]): readonly Point[] {
  const [first, second, ...rest] = points as readonly [Point, Point, ...Point[]];
  return [
    {
      period_s: first.period_s,
      value: Math.max(first.value, second.value),
      written: `max(${first.written}, ${second.written})`,
    },
    second,
    ...rest,
  ];
}

function compile2015({ ordinates_g, pga_g, site_class }: Omit<Input2015, 'period_s'>): CompiledSpectrum {
  const pga_ref_g = ordinates_g[0]! / pga_g < 2 ? 0.8 * pga_g : pga_g;
  const factors = NBC_2015_FACTORS.map((method) => apply(method, { site_class, pga_ref_g }));
  const names = NBC_PERIODS_S.map((period_s) => `f_${String(period_s).replace('.', 'p')}`);
  const points = NBC_PERIODS_S.map((period_s, i): Point => ({
    period_s,
    value: factors[i]! * ordinates_g[i]!,
    written: `${names[i]!} * ${String(ordinates_g[i])}`,
  }));
  const soft = site_class === 'D' || site_class === 'E';
  return {
    ...throughPoints(shortRule(points), false),
    valid_to_s: Infinity,
    quantities: { pga_ref_g, ...Object.fromEntries(names.map((name, i) => [name, factors[i]!])) },
    flags: soft ? ['long-site-factor-held'] : [],
  };
}

interface Input2020 {
  readonly ordinates_g: readonly number[];
  readonly period_s: number;
}

function compile2020({ ordinates_g }: Omit<Input2020, 'period_s'>, logarithmic: boolean): CompiledSpectrum {
  const points = NBC_PERIODS_S.map((period_s, i): Point => ({
    period_s,
    value: ordinates_g[i]!,
    written: String(ordinates_g[i]),
  }));
  return { ...throughPoints(shortRule(points), logarithmic), valid_to_s: Infinity };
}

interface Parts<I> {
  readonly edition: string;
  readonly which: string;
  readonly title: string;
  readonly inputs: readonly InputSpec[];
  readonly procedure: string;
  readonly compile: (input: Omit<I, 'period_s'>) => CompiledSpectrum;
  readonly verified: Verified;
  readonly note: string;
}

function designRecord<I extends { readonly period_s: number }>(parts: Parts<I>): AnyRecord {
  const { edition, which, title, inputs, procedure, compile, verified, note } = parts;
  const family: SpectrumFamily<I> = {
    id: `spectrum/nbc-${edition}-${which}`,
    yields: 'sa_g',
    unit: 'g',
    symbol: 'S(T)',
    inputs: [...inputs, PERIOD_INPUT],
    expression: null,
    procedure,
    compile,
    evaluate: (input) => ordinate(compile(input), input.period_s),
  };
  return record({
    id: `nbc-${edition}/spectrum/${which}`,
    title,
    family,
    constants: {},
    source: { standard: 'NBC', edition, clause: '4.1.8.4' },
    verified,
    limits: [],
    note,
  });
}

const SIX = 'at 0.2, 0.5, 1, 2, 5 and 10 s';
const TO_10 =
  'the larger of the values at 0.2 s and 0.5 s up to 0.2 s, then the values at 0.5, 1, 2, 5 and 10 s, constant beyond';

const DESIGN_2010 = designRecord<Input2010>({
  edition: '2010',
  which: 'design',
  title: 'Design spectral acceleration',
  inputs: [
    { ...ORDINATES, least: 4, most: 4, meaning: 'ordinates for class C at 0.2, 0.5, 1 and 2 s' },
    { ...FACTOR, name: 'fa', meaning: 'acceleration-based site coefficient F_a' },
    { ...FACTOR, name: 'fv', meaning: 'velocity-based site coefficient F_v' },
  ],
  procedure:
    'F_a S_a(0.2) to 0.2 s; the smaller of F_v S_a(0.5) and F_a S_a(0.2) at 0.5 s; F_v S_a(1) at 1 s; F_v S_a(2) at 2 s; half of that from 4 s on; straight lines between',
  compile: compile2010,
  verified: 'restated',
  note: 'The tables of F_a and F_v are not in the program: state the two.',
});

const DESIGN_2015 = designRecord<Input2015>({
  edition: '2015',
  which: 'design',
  title: 'Design spectral acceleration',
  inputs: [
    { ...ORDINATES, least: 6, most: 6, meaning: `ordinates for class C ${SIX}, 2 % in 50 years` },
    {
      name: 'pga_g',
      kind: 'number',
      unit: 'g',
      above: 0,
      to: LARGEST_G,
      meaning: 'peak ground acceleration for class C',
    },
    { name: 'site_class', kind: 'word', words: NBC_CLASSES, meaning: 'site class' },
  ],
  procedure: `F(T) S_a(T): ${TO_10}; straight lines between`,
  compile: compile2015,
  verified: 'memory',
  note: 'The site factors F(T) and the list of control points are from memory.',
});

function design2020(logarithmic: boolean): AnyRecord {
  return designRecord<Input2020>({
    edition: '2020',
    which: logarithmic ? 'design-log-log' : 'design-linear',
    title: `Design spectral acceleration, ${logarithmic ? 'log-log' : 'linear'} interpolation`,
    inputs: [{ ...ORDINATES, least: 6, most: 6, meaning: `ordinates for the site designation ${SIX}` }],
    procedure: `S_a(T, X): ${TO_10}; straight lines ${logarithmic ? 'in ln S over ln T ' : ''}between`,
    compile: (input) => compile2020(input, logarithmic),
    verified: 'memory',
    note: 'That either interpolation may be used is from memory.',
  });
}

const LINEAR_2020 = design2020(false);

export const NBC_CODES: readonly SpectrumCode[] = [
  { code: 'nbc-2010', title: 'NBC 2010 (Canada) design spectrum', record: DESIGN_2010 },
  { code: 'nbc-2015', title: 'NBC 2015 (Canada) design spectrum', record: DESIGN_2015 },
  {
    code: 'nbc-2020',
    title: 'NBC 2020 (Canada) design spectrum',
    record: LINEAR_2020,
    choice: {
      name: 'interpolation',
      meaning: 'between the periods: linear, or straight in logarithms',
      fallback: 'linear',
      records: { linear: LINEAR_2020, 'log-log': design2020(true) },
    },
  },
];
