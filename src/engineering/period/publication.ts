/** How the files of this folder write down the rows of a publication. */
import { record } from '../formula.js';
import type { Family, Limit, MethodRecord } from '../formula.js';
import type { Source, Verified } from '../source.js';
import { heightPower } from './families.js';
import type { HeightInput, HeightPowerConstants } from './families.js';

export const FOOT_M = 0.3048;
export const INCH_M = 0.0254;

/** What the records of one clause share. */
export interface Publication {
  /** First part of the ids. */
  readonly id: string;
  readonly source: Source;
  /** How its numbers were come by, for the rows that do not say otherwise. */
  readonly verified: Verified;
  readonly basis: 'design' | 'best-fit' | 'ambient';
  readonly limits?: readonly Limit[];
  /** Length of the unit of its coefficients, for the rows of the form C h^x. */
  readonly unit_m?: number;
}

/** What one row says for itself. */
export interface Row {
  readonly clause?: string;
  readonly verified?: Verified;
  readonly basis?: 'design' | 'best-fit' | 'ambient';
  readonly limits?: readonly Limit[];
  readonly note?: string;
}

/** Ours: none of the buildings these laws are known to rest on is taller [judgement]. */
const TALL: Limit = {
  input: 'height_m',
  to: 240,
  whose: 'ours',
  outside: 'flag',
  text: 'buildings up to 240 m: we know of no record behind such a law from a taller one [judgement]',
};

/** The limits of a row: its own, else those of the publication, with ours on the height where theirs say nothing of it. */
function limitsOf<I, C>(publication: Publication, row: Row, family: Family<I, C>): readonly Limit[] {
  const own = row.limits ?? publication.limits ?? [];
  const ofHeight = family.inputs.some(({ name }) => name === 'height_m');
  return ofHeight && !own.some(({ input }) => input === 'height_m') ? [...own, TALL] : own;
}

function make<I, C>(
  quantity: string,
  publication: Publication,
  which: string,
  title: string,
  family: Family<I, C>,
  constants: C,
  row: Row,
): MethodRecord<I, C> {
  const { id, source, verified } = publication;
  return record({
    id: `${id}/${quantity}/${which}`,
    title,
    family,
    constants,
    source: row.clause === undefined ? source : { ...source, clause: row.clause },
    verified: row.verified ?? verified,
    limits: quantity === 'period' ? limitsOf(publication, row, family) : (row.limits ?? []),
    ...(row.note === undefined ? {} : { note: row.note }),
    ...(quantity === 'period' ? { basis: row.basis ?? publication.basis } : {}),
  });
}

/** A period formula. */
export function period<I, C>(
  publication: Publication,
  which: string,
  title: string,
  family: Family<I, C>,
  constants: C,
  row: Row = {},
): MethodRecord<I, C> {
  return make('period', publication, which, title, family, constants, row);
}

/** A period formula of the form C h^x. */
export function heightRow(
  publication: Publication,
  which: string,
  title: string,
  coefficient: number,
  exponent: number,
  row: Row = {},
): MethodRecord<HeightInput, HeightPowerConstants> {
  const constants = { coefficient, exponent, unit_m: publication.unit_m ?? 1 };
  return period(publication, which, title, heightPower, constants, row);
}

/** A limit that the standard sets on a calculated period. */
export function periodLimit<I, C>(
  publication: Publication,
  which: string,
  title: string,
  family: Family<I, C>,
  constants: C,
  row: Row = {},
): MethodRecord<I, C> {
  return make('period-limit', publication, which, title, family, constants, row);
}

/** The area or ratio of walls that a period formula stands on. */
export function wallArea<I, C>(
  publication: Publication,
  which: string,
  title: string,
  family: Family<I, C>,
  constants: C,
  row: Row = {},
): MethodRecord<I, C> {
  return make('wall-area', publication, which, title, family, constants, row);
}

/** A limit on the height that the publication states, in metres. */
export const heightUpTo = (to: number, text: string, outside: 'reject' | 'flag' = 'flag'): Limit => ({
  input: 'height_m',
  to,
  whose: 'publication',
  outside,
  text,
});
