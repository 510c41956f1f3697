/** A table of eras that the study itself states: the code of a place whose history is not carried. */
import type { System } from '../building.js';
import { apply, record } from '../formula.js';
import type { Family } from '../formula.js';
import { power } from '../numeric/power.js';
import { PERIOD, coefficientRecord, NOT_DESIGNED, number, tabledForm } from './edition.js';
import type { CodeEdition } from './edition.js';
import { WORKING_TO_STRENGTH } from './records.js';

/** One row of the table. */
export interface OwnEra {
  /** Year of the edition; the adoption lag is added to it. */
  readonly from_year: number;
  readonly level: 'working' | 'strength';
  /** V/W of every system that `by_system` does not list; left out, such a system counts as not designed. */
  readonly coefficient?: number;
  readonly by_system?: Partial<Readonly<Record<System, number>>>;
  /** The edition's own reduction of the elastic force. */
  readonly reduction?: number;
  /** T = coefficient × h^exponent; the coefficient above falls with (corner_s/T)^fall beyond the corner. */
  readonly period?: {
    readonly coefficient: number;
    readonly exponent: number;
    readonly corner_s: number;
    readonly fall: number;
  };
  readonly source?: string;
}

/** More rows than this are a slip; the database has a word for each. */
export const MOST_OWN_ERAS = 24;
export type OwnId = `own-${number}`;
export const OWN_IDS: readonly OwnId[] = Array.from({ length: MOST_OWN_ERAS }, (_, i) => `own-${i + 1}` as const);

const source = { standard: 'The study', edition: '', clause: 'code_history.table' };

export const OWN_LEVEL = coefficientRecord(
  'swaymark/base-shear/own-table',
  "Coefficient of the study's own table",
  tabledForm,
  {
    source,
    verified: 'judgement',
    note: 'As the study states it, whatever the period.',
  },
);

export const OWN_FALLING = coefficientRecord(
  'swaymark/base-shear/own-table-falling',
  "Coefficient of the study's own table, falling with the period",
  {
    id: 'base-shear/own-table-falling',
    inputs: [
      number('coefficient', 'coefficient of the row up to the corner'),
      number('corner_period_s', 'corner of the row', 's'),
      number('fall', 'exponent of the fall beyond it'),
      PERIOD,
    ],
    expression: 'coefficient * min(1, corner_period_s / period_s) ^ fall',
    evaluate: ({ coefficient, corner_period_s, fall, period_s }) =>
      coefficient! * power(Math.min(1, corner_period_s! / period_s!), fall!),
  },
  { source, verified: 'judgement', note: 'As the study states it.' },
);

interface PeriodInput {
  readonly height_m: number;
  readonly period_coefficient: number;
  readonly period_exponent: number;
}
const ownPeriod: Family<PeriodInput, Record<never, number>> = {
  id: 'design-period/own-table',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [
    number('height_m', 'height', 'm'),
    number('period_coefficient', 'coefficient of the row, metres'),
    number('period_exponent', 'exponent of the row'),
  ],
  expression: 'period_coefficient * height_m ^ period_exponent',
  evaluate: ({ height_m, period_coefficient, period_exponent }) =>
    period_coefficient * power(height_m, period_exponent),
};
export const OWN_PERIOD = record({
  id: 'swaymark/design-period/own-table',
  title: "Design period of the study's own table",
  family: ownPeriod,
  constants: {},
  source,
  verified: 'judgement',
  limits: [],
});

/** The rows as editions. */
export function ownEditions(table: readonly OwnEra[]): Readonly<Record<OwnId, CodeEdition<never>>> {
  return Object.fromEntries(table.map((era, i) => [OWN_IDS[i], ownEdition(era, i)])) as Record<
    OwnId,
    CodeEdition<never>
  >;
}

function ownEdition(era: OwnEra, i: number): CodeEdition<never> {
  const { from_year, level, coefficient: ofAll, by_system, reduction = Infinity, period } = era;
  const levelFactor = level === 'working' ? WORKING_TO_STRENGTH : 1;
  const coefficientOf = (system: System): number | undefined => by_system?.[system] ?? ofAll;
  return {
    year: from_year,
    title: `row ${String(i + 1)} of the study's own table, from ${String(from_year)}`,
    source: { ...source, clause: era.source ?? source.clause },
    verified: 'judgement',
    hasRow: (system) => coefficientOf(system) !== undefined,
    dependsOn: () => (period === undefined ? 'nothing' : 'height'),
    design: ({ system, height_m }, _stated, trace) => {
      const coefficient = coefficientOf(system);
      if (coefficient === undefined) return NOT_DESIGNED;
      if (period === undefined)
        return { coefficient: apply(OWN_LEVEL, { coefficient }, trace), levelFactor, reduction };
      const { coefficient: period_coefficient, exponent: period_exponent, corner_s: corner_period_s, fall } = period;
      const period_s = apply(OWN_PERIOD, { height_m, period_coefficient, period_exponent }, trace);
      return {
        coefficient: apply(OWN_FALLING, { coefficient, corner_period_s, fall, period_s }, trace),
        levelFactor,
        reduction,
      };
    },
  };
}

export const OWN_TABLE_RECORDS = [OWN_LEVEL, OWN_FALLING, OWN_PERIOD];
