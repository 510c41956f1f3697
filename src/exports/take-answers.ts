/** Answers of a survey, from the sheet that was filled in into the study's database. */
import { CsvError, parse } from 'csv-parse/sync';
import { findColumn } from '../engineering/columns.js';
import { UserError, showValue } from '../errors.js';
import type { Problem } from '../errors.js';
import { ANSWER_COLUMNS, readAnswer } from '../inventory/answers.js';
import { changeStudyDatabase, chosenRun } from '../runs/open.js';
import type { Database } from '../store/database.js';
import { readText } from '../study/read-text.js';
import type { Study } from '../study/schema.js';

/** What is written where nothing was asked or found out. */
const NOTHING = new Set(['', '-', '–', '—', '?']);
const MOST_ROWS = 1_000_000;

export interface TakenAnswers {
  readonly answers: number;
  readonly buildings: number;
  /** How many of each column. */
  readonly columns: Readonly<Record<string, number>>;
}

interface Given {
  readonly row: number;
  readonly id: string;
  readonly column: string;
  readonly cell: string;
  readonly visit: string | null;
  readonly surveyor: string | null;
  readonly surveyed_on: string | null;
  readonly remark: string | null;
}

/**
 * Takes the answers of the sheet `file` into the database of the study at `path`; the next screening uses them, the owner's inventory stays as
 * it is. Columns are those of the sheet of `survey --csv`; blank cells and dashes answer nothing. All or nothing.
 * @throws UserError with every cell that cannot be read, a row without an id or with one the newest run does not hold, an unknown column.
 * @example
 * const { answers } = await takeAnswers('study.yaml', 'field.csv', new Date());
 */
export async function takeAnswers(path: string, file: string, taken: Date): Promise<TakenAnswers> {
  const text = await readText(file, 'the sheet of answers');
  return changeStudyDatabase(path, async (db, { study }) => {
    const given = readSheet(text, file, study);
    await refuseStrangers(db, given, file);
    const first = Number(await db.value('SELECT coalesce(max(answer), 0) + 1 FROM survey_answer'));
    await db.transaction(async () => {
      await db.append('survey_answer', [
        Int32Array.from(given, (_, at) => first + at),
        given.map(({ id }) => id),
        given.map(({ column }) => column),
        given.map(({ cell }) => cell),
        given.map(({ visit }) => visit),
        given.map(({ surveyor }) => surveyor),
        given.map(({ surveyed_on }) => surveyed_on),
        given.map(({ remark }) => remark),
        given.map(() => taken.toISOString()),
      ]);
    });
    const columns: Record<string, number> = {};
    for (const { column } of given) columns[column] = (columns[column] ?? 0) + 1;
    return { answers: given.length, buildings: new Set(given.map(({ id }) => id)).size, columns };
  });
}

function readSheet(text: string, file: string, study: Study): readonly Given[] {
  const rows = recordsOf(text, file);
  const [head = []] = rows;
  const at = (name: string): number => head.indexOf(name);
  if (at('id') < 0)
    throw new UserError(
      `the sheet has no column id; its first row names the columns: ${head.map(showValue).join(', ')}`,
      { file, row: 1 },
    );
  const asked = ANSWER_COLUMNS.filter((name) => at(name) >= 0);
  if (asked.length === 0)
    throw new UserError(`the sheet has none of the columns that answer something: ${ANSWER_COLUMNS.join(', ')}`, {
      file,
      row: 1,
    });
  const problems: Problem[] = [];
  const given: Given[] = [];
  rows.slice(1).forEach((cells, i) => {
    const row = i + 2;
    const cellOf = (name: string): string | null => {
      // a cell that was guarded against formulas comes back with its apostrophe
      const cell = (cells[at(name)] ?? '').trim().replace(/^'(?=[=+@-])/, '');
      return at(name) < 0 || NOTHING.has(cell) ? null : cell;
    };
    const id = cellOf('id');
    for (const name of asked) {
      const cell = cellOf(name);
      if (cell === null) continue;
      const place = { file, row, columnName: name };
      if (id === null) {
        problems.push({ place: { file, row, columnName: 'id' }, message: 'an answer without the id of a building' });
        return;
      }
      const column = findColumn(name);
      const read = column === undefined ? { wrong: 'no such column' } : readAnswer(column, cell, study);
      if (typeof read === 'object') problems.push({ place, message: read.wrong });
      else
        given.push({
          row,
          id,
          column: name,
          cell,
          visit: cellOf('visit'),
          surveyor: cellOf('surveyor'),
          surveyed_on: cellOf('surveyed_on'),
          remark: cellOf('remark'),
        });
    }
  });
  if (problems.length > 0) throw UserError.of(problems);
  if (given.length === 0)
    throw new UserError('the sheet answers nothing: every cell is blank or holds a dash', { file });
  return given;
}

function recordsOf(text: string, file: string): readonly (readonly string[])[] {
  try {
    const records: string[][] = parse(text, {
      bom: true,
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

/** Answers for buildings that the newest run does not hold are a slip of the pen. */
async function refuseStrangers(db: Database, given: readonly Given[], file: string): Promise<void> {
  const { fingerprints } = await chosenRun(db, {});
  const known = new Set(
    (await db.rows<{ id: string }>('SELECT id FROM building WHERE inventory_id = ?', [fingerprints.inventory])).map(
      ({ id }) => id,
    ),
  );
  const problems = given
    .filter(({ id }) => !known.has(id))
    .map(({ row, id }) => ({
      place: { file, row, columnName: 'id' },
      message: `${showValue(id)} is no building of the newest run`,
    }));
  const once = [...new Map(problems.map((problem) => [problem.place.row, problem])).values()];
  if (once.length > 0) throw UserError.of(once);
}
