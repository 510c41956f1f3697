/** `inventory`, `neighbours` and `words`: where the table is, how it is written, what its columns and words mean. */
import { z } from 'zod';
import { AMPLITUDES, BASE_FIXITIES, DESIGN_LEVELS, STATUSES, SYSTEMS, USES } from '../engineering/building.js';
import { COLUMNS } from '../engineering/columns.js';
import type { InventoryColumn } from '../engineering/columns.js';
import { findUnit, unitsOf } from '../engineering/units.js';
import { showValue } from '../errors.js';
import { expected, list, mapping, number, strict, text, word } from './fields.js';

function unit({ name, dimension }: InventoryColumn) {
  if (dimension === undefined) {
    const error = `${name} has no unit; write only the column`;
    return z.never({ error }).exactOptional().describe('This column has no unit.');
  }
  const allowed = unitsOf(dimension)
    .map(({ id }) => id)
    .join(', ');
  const error = (issue: { readonly input: unknown }): string => {
    const found = typeof issue.input === 'string' ? findUnit(issue.input) : undefined;
    if (found !== undefined)
      return `${found.id} is a unit of ${found.dimension}, ${name} takes one of ${dimension}: ${allowed}`;
    return typeof issue.input === 'string'
      ? `unknown unit ${showValue(issue.input)}; known for ${dimension}: ${allowed}`
      : `expected a unit of ${dimension}, got ${showValue(issue.input)}; known: ${allowed}`;
  };
  return z
    .string({ error })
    .refine((spelling) => findUnit(spelling)?.dimension === dimension, { error })
    .exactOptional()
    .describe(`Unit of numbers that carry none: ${allowed}.`);
}

/** Their column for ours, with the unit of its bare numbers. */
export interface ColumnSource {
  readonly column: string;
  readonly unit?: string;
}

function source(column: InventoryColumn) {
  const theirs = text('the name of a column of the inventory');
  const withUnit = strict({ column: theirs.describe('Name of the column in the inventory.'), unit: unit(column) });
  return z
    .union([theirs, withUnit], { error: expected('the name of a column, or {column: name, unit: unit}') })
    .transform((value): ColumnSource => (typeof value === 'string' ? { column: value } : value));
}

/** Our columns that the inventory has, by our name. */
export type ColumnSources = { readonly id: ColumnSource } & Readonly<Record<string, ColumnSource>>;

// Typed by hand: a shape made from the register of columns has no literal keys to infer.
const columns: z.ZodType<ColumnSources> = strict(
  Object.fromEntries(
    COLUMNS.map((column) => {
      const title = column.name === 'id' ? `${column.title}; the only column needed.` : `${column.title}.`;
      const schema = source(column);
      return [column.name, (column.name === 'id' ? schema : schema.exactOptional()).describe(title)];
    }),
  ),
) as unknown as z.ZodType<ColumnSources>;

/** What a blank cell holds where the study does not say. */
export const BLANK: readonly string[] = ['', '-', 'n/a', 'NULL', '?'];

export const InventorySchema = strict({
  file: text('the path of a file').describe('The inventory, relative to this file.'),
  encoding: word(['auto', 'utf-8', 'windows-1252', 'latin-1', 'utf-16le', 'utf-16be'])
    .default('auto')
    .describe('How the characters are stored.'),
  delimiter: word(['auto', ',', ';', 'tab', '|']).default('auto').describe('What stands between cells.'),
  decimal: word(['.', ',']).default('.').describe('Decimal sign of the numbers.'),
  blank: list(z.string({ error: expected('text in quotes') }), 'a list of texts')
    .default([...BLANK])
    .describe('Cells that mean that nothing is known.'),
  columns: columns.describe('Our columns and theirs: name, or {column: name, unit: unit}.'),
  merge_rows_by: text('the name of a column of the inventory')
    .exactOptional()
    .describe('Their column; rows that share its value are parts of one building.'),
  no_building: strict({
    column: text('the name of a column of the inventory').describe('Their column that tells.'),
    values: list(text('text'), 'a list of at least one text', 1).describe('Its values that mean: no building here.'),
  })
    .exactOptional()
    .describe('Rows of sites without a building.'),
  rejects_limit: number({ from: 0, to: 1 })
    .default(0.05)
    .describe('Share of rows rejected above which the program exits 1.'),
});

export const NeighboursSchema = strict({
  file: text('the path of a file').describe('Table with columns id_a, id_b, gap_m, floors_aligned (yes, no).'),
}).describe('Gaps between neighbouring buildings.');

const theirs = z.string();
function dictionary<const T extends readonly string[]>(title: string, words: T) {
  return mapping(theirs, word(words), 'their words and ours')
    .default({})
    .describe(`Their words for ${title} and ours: ${words.join(', ')}.`);
}

export const WordsSchema = strict({
  system: dictionary('lateral systems', [...SYSTEMS, 'unknown']),
  use: dictionary('uses', USES),
  status: dictionary('status', STATUSES),
  site_class: mapping(theirs, text(), 'their words and ours')
    .default({})
    .describe('Their words for site classes and the ones the levels use.'),
  yes_no: dictionary('yes and no', ['yes', 'no']),
  amplitude: dictionary('the amplitude of a measurement', AMPLITUDES),
  design_level: dictionary('the level of a design coefficient', DESIGN_LEVELS),
  base_fixity: dictionary('the base of the columns', BASE_FIXITIES),
});
