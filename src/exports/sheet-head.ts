/** The headings of a sheet of answers: which columns are read, and what is wrong with them. */
import { findColumn } from '../engineering/columns.js';
import { UserError, showValue } from '../errors.js';
import type { Problem } from '../errors.js';
import { ANSWER_COLUMNS } from '../inventory/answers.js';
import { nearest } from '../study/nearest.js';
import { SHEET_HEAD, SHEET_TAIL, writtenCell } from './sheet-cells.js';

export interface SheetHead {
  /** Columns of the sheet that answer something. */
  readonly asked: readonly string[];
  /** Headings that are none of ours, and unlike ours: their cells are not read. */
  readonly notRead: readonly string[];
  /** Where a column stands; -1 where it does not. */
  readonly at: (name: string) => number;
}

/** Columns whose cells are read. */
const READ: readonly string[] = ['id', 'visit', ...ANSWER_COLUMNS, ...SHEET_TAIL];
const OURS: readonly string[] = [...SHEET_HEAD, ...ANSWER_COLUMNS, ...SHEET_TAIL];

/**
 * Reads the first of the records of a sheet.
 * @throws UserError for a heading that is close to one of ours which is missing, a column that stands twice, and a sheet without ids or answers.
 */
export function readHead([first = [], ...rows]: readonly (readonly string[])[], file: string): SheetHead {
  const head = first.map((heading) => heading.trim());
  const place = { file, row: 1 };
  const problems: Problem[] = [];
  for (const name of READ) {
    const places = head.flatMap((heading, at) => (heading === name ? [String(at + 1)] : []));
    if (places.length > 1)
      problems.push({
        place,
        message: `${showValue(name)} stands at the head of columns ${places.join(' and ')}; keep the one that holds, or name the other otherwise`,
      });
  }
  const missing = READ.filter((name) => !head.includes(name));
  const notRead: string[] = [];
  head.forEach((heading, at) => {
    if (OURS.includes(heading)) return;
    if (heading === '') {
      if (rows.some((cells) => writtenCell(cells[at] ?? '') !== null)) notRead.push(`column ${String(at + 1)}`);
      return;
    }
    const meant = meantBy(heading, missing);
    if (meant === undefined) notRead.push(heading);
    else
      problems.push({
        place,
        message: `${showValue(heading)}, column ${String(at + 1)}, is no column of a sheet of answers (did you mean ${showValue(meant)}?); write it so, or name it otherwise where something else is meant`,
      });
  });
  if (problems.length > 0) throw UserError.of(problems);
  if (!head.includes('id'))
    throw new UserError(
      `the sheet has no column id; its first row names the columns: ${head.map(showValue).join(', ')}`,
      place,
    );
  const asked = ANSWER_COLUMNS.filter((name) => head.includes(name));
  if (asked.length === 0)
    throw new UserError(`the sheet has none of the columns that answer something: ${ANSWER_COLUMNS.join(', ')}`, place);
  return { asked, notRead, at: (name) => head.indexOf(name) };
}

/** The one of `missing` that a heading stands for by a slip, or by its beginning alone (`storeys`); columns of an inventory mean themselves. */
function meantBy(heading: string, missing: readonly string[]): string | undefined {
  if (findColumn(heading) !== undefined) return undefined;
  const begins = `${heading.toLowerCase().replaceAll(/[\s-]+/g, '_')}_`;
  return nearest(heading, missing) ?? missing.find((name) => name.startsWith(begins));
}
