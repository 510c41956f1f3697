/** Site coefficients of ASCE/SEI 7, tables 11.4-1 and 11.4-2, and the design values made with them. */
import { record } from '../formula.js';
import type { AnyRecord, Family, MethodRecord } from '../formula.js';
import { factorFamily } from './factor-table.js';
import type { FactorInput, FactorTable } from './factor-table.js';

const same = (value: number, count: number): readonly number[] => Array<number>(count).fill(value);

/** 7-05 and 7-10; the same numbers stand in IBC 2012 table 1613.3.3. Default: class D, 11.4.2. */
const SHORT_2005: FactorTable = {
  columns: [0.25, 0.5, 0.75, 1.0, 1.25],
  rows: {
    A: same(0.8, 5),
    B: same(1.0, 5),
    C: [1.2, 1.2, 1.1, 1.0, 1.0],
    D: [1.6, 1.4, 1.2, 1.1, 1.0],
    E: [2.5, 1.7, 1.2, 0.9, 0.9],
    default: [1.6, 1.4, 1.2, 1.1, 1.0],
  },
};
const LONG_2005: FactorTable = {
  columns: [0.1, 0.2, 0.3, 0.4, 0.5],
  rows: {
    A: same(0.8, 5),
    B: same(1.0, 5),
    C: [1.7, 1.6, 1.5, 1.4, 1.3],
    D: [2.4, 2.0, 1.8, 1.6, 1.5],
    E: [3.5, 3.2, 2.8, 2.4, 2.4],
    default: [2.4, 2.0, 1.8, 1.6, 1.5],
  },
};

/**
 * 7-16 with Supplement 1. B-unmeasured: rock judged B without a measured velocity (11.4.3). Default: class D with F_a at least 1.2
 * (11.4.4); its row is the larger of the two, column by column, since the row of D falls through 1.2 at a column.
 */
const SHORT_2016: FactorTable = {
  columns: [0.25, 0.5, 0.75, 1.0, 1.25, 1.5],
  rows: {
    A: same(0.8, 6),
    B: same(0.9, 6),
    'B-unmeasured': same(1.0, 6),
    C: [1.3, 1.3, 1.2, 1.2, 1.2, 1.2],
    D: [1.6, 1.4, 1.2, 1.1, 1.0, 1.0],
    E: [2.4, 1.7, 1.3, null, null, null],
    default: [1.6, 1.4, 1.2, 1.2, 1.2, 1.2],
  },
  where:
    'ASCE/SEI 7-16 table 11.4-1 refers to 11.4.8, a site-specific study is needed (its exception 1, from memory: the factor of class C)',
};
/** Cells of D and E from S1 = 0.2 g on are starred: see 11.4.8. */
const LONG_2016: FactorTable = {
  columns: [0.1, 0.2, 0.3, 0.4, 0.5, 0.6],
  rows: {
    A: same(0.8, 6),
    B: same(0.8, 6),
    'B-unmeasured': same(1.0, 6),
    C: [1.5, 1.5, 1.5, 1.5, 1.5, 1.4],
    D: [2.4, 2.2, 2.0, 1.9, 1.8, 1.7],
    E: [4.2, 3.3, 2.8, 2.4, 2.2, 2.0],
    default: [2.4, 2.2, 2.0, 1.9, 1.8, 1.7],
  },
};

export const SS_ARGUMENT = {
  name: 'ss_g',
  unit: 'g',
  meaning: 'mapped spectral acceleration at short periods S_S',
  from: 0.01,
  to: 5,
} as const;
export const S1_ARGUMENT = {
  name: 's1_g',
  unit: 'g',
  meaning: 'mapped spectral acceleration at 1 s S_1',
  from: 0.01,
  to: 3,
} as const;

export type Edition = '05' | '10' | '16';
type FactorRecord<A extends string> = MethodRecord<FactorInput<A>, Record<never, number>>;

function shortRecord(edition: Edition): FactorRecord<'ss_g'> {
  const table = edition === '16' ? SHORT_2016 : SHORT_2005;
  return record({
    id: `asce7-${edition}/site-factor/short-period`,
    title: 'Site coefficient F_a',
    family: factorFamily(`site-factor/asce7-${edition}-short`, 'fa', 'F_a', table, SS_ARGUMENT),
    constants: {},
    source: { standard: 'ASCE/SEI 7', edition, clause: 'table 11.4-1' },
    verified: 'restated',
    limits: [],
  });
}

function longRecord(edition: Edition): FactorRecord<'s1_g'> {
  const table = edition === '16' ? LONG_2016 : LONG_2005;
  return record({
    id: `asce7-${edition}/site-factor/one-second`,
    title: 'Site coefficient F_v',
    family: factorFamily(`site-factor/asce7-${edition}-long`, 'fv', 'F_v', table, S1_ARGUMENT),
    constants: {},
    source: { standard: 'ASCE/SEI 7', edition, clause: 'table 11.4-2' },
    verified: 'restated',
    limits: [],
    ...(edition === '16'
      ? { note: 'Classes D and E with S_1 of 0.2 g or more: the table value is starred, see 11.4.8.' }
      : {}),
  });
}

export const SHORT_FACTOR: Readonly<Record<Edition, FactorRecord<'ss_g'>>> = {
  '05': shortRecord('05'),
  '10': shortRecord('10'),
  '16': shortRecord('16'),
};
export const LONG_FACTOR: Readonly<Record<Edition, FactorRecord<'s1_g'>>> = {
  '05': longRecord('05'),
  '10': longRecord('10'),
  '16': longRecord('16'),
};

/** Classes an edition's tables know, in their order. */
export const classesOf = (edition: Edition): readonly string[] =>
  Object.keys((edition === '16' ? SHORT_2016 : SHORT_2005).rows);

const FACTOR = { kind: 'number', from: 0.5, to: 5 } as const;

const shortValue: Family<{ readonly ss_g: number; readonly fa: number }, Record<never, number>> = {
  id: 'design-value/short-period',
  yields: 'sds_g',
  unit: 'g',
  symbol: 'S_DS',
  inputs: [
    { ...SS_ARGUMENT, kind: 'number' },
    { ...FACTOR, name: 'fa', meaning: 'site coefficient F_a' },
  ],
  expression: '2 / 3 * fa * ss_g',
  evaluate: ({ ss_g, fa }) => (2 / 3) * (fa * ss_g),
};

const oneSecondValue: Family<{ readonly s1_g: number; readonly fv: number }, Record<never, number>> = {
  id: 'design-value/one-second',
  yields: 'sd1_g',
  unit: 'g',
  symbol: 'S_D1',
  inputs: [
    { ...S1_ARGUMENT, kind: 'number' },
    { ...FACTOR, name: 'fv', meaning: 'site coefficient F_v' },
  ],
  expression: '2 / 3 * fv * s1_g',
  evaluate: ({ s1_g, fv }) => (2 / 3) * (fv * s1_g),
};

const DESIGN_VALUES: readonly AnyRecord[] = [
  record({
    id: 'asce7-16/design-value/short-period',
    title: 'Design spectral acceleration at short periods',
    family: shortValue,
    constants: {},
    source: { standard: 'ASCE/SEI 7', edition: '16', clause: '11.4.4 and 11.4.5' },
    verified: 'restated',
    limits: [],
  }),
  record({
    id: 'asce7-16/design-value/one-second',
    title: 'Design spectral acceleration at 1 s',
    family: oneSecondValue,
    constants: {},
    source: { standard: 'ASCE/SEI 7', edition: '16', clause: '11.4.4 and 11.4.5' },
    verified: 'restated',
    limits: [],
  }),
];

export const ASCE7_FACTOR_RECORDS: readonly AnyRecord[] = [
  ...Object.values(SHORT_FACTOR),
  ...Object.values(LONG_FACTOR),
  ...DESIGN_VALUES,
];

/** For the catalogue. */
export const ASCE7_SITE_TABLES = { SHORT_2005, LONG_2005, SHORT_2016, LONG_2016 };
