/** Sheets that people fill in: their records, and what a cell of one says. */
import { CsvError, parse } from 'csv-parse/sync';
import { UserError } from '../errors.js';
import { delimiterOf } from '../study/number-cells.js';

/** What stands before the answers in a sheet for the field, and after them. */
export const SHEET_HEAD = [
  'place',
  'id',
  'name',
  'group',
  'lon',
  'lat',
  'rank',
  'visit',
  'find out',
  'because',
] as const;
export const SHEET_TAIL = ['surveyor', 'surveyed_on', 'remark'] as const;

/** What is written where nothing was asked or looked for. */
const NOTHING = new Set(['', '-', '–', '—']);
const MOST_ROWS = 1_000_000;

/** What a cell says; null where it is blank or holds a dash. */
export function writtenCell(text: string): string | null {
  // a cell that was guarded against formulas comes back with its apostrophe
  const cell = text.trim().replace(/^'(?=[=+@-])/, '');
  return NOTHING.has(cell) ? null : cell;
}

/** The records of a sheet, the headings first. @throws UserError when it is no table. */
export function recordsOf(text: string, file: string): readonly (readonly string[])[] {
  try {
    const records: string[][] = parse(text, {
      bom: true,
      delimiter: delimiterOf(text.split(/\r\n|\r|\n/, 1)[0] ?? ''),
      relax_column_count: true,
      skip_empty_lines: false,
      max_record_size: 1 << 20,
      to: MOST_ROWS,
    });
    return records;
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    throw new UserError(`the sheet is no table of cells: ${error.message}`, { file });
  }
}
