/** Answers of a survey, from the sheet that was filled in into the study's database. */
import { CsvError, parse } from 'csv-parse/sync';
import { findColumn } from '../engineering/columns.js';
import { UserError, showValue } from '../errors.js';
import type { Problem } from '../errors.js';
import { ANSWER_COLUMNS, readAnswer } from '../inventory/answers.js';
import { heldAnswers } from '../inventory/kept-answers.js';
import type { HeldAnswer } from '../inventory/kept-answers.js';
import { changeStudyDatabase, chosenRun } from '../runs/open.js';
import type { Database } from '../store/database.js';
import type { LoadedStudy } from '../study/load.js';
import { delimiterOf } from '../study/number-cells.js';
import { readText } from '../study/read-text.js';
import type { Study } from '../study/schema.js';
import { isCalendarDate } from './sheet-date.js';

/** What is written where nothing was asked or looked for. */
const NOTHING = new Set(['', '-', '–', '—']);
/** What is written where the visit looked and could not find out. */
const NOT_FOUND = /^(?:\?|not found)$/i;
/** The same, unless the study has a meaning for it. */
const UNKNOWN = 'unknown';
const MOST_ROWS = 1_000_000;

export interface TakenAnswers {
  readonly answers: number;
  /** With an answer, or with something not found. */
  readonly buildings: number;
  /** How many answers of each column. */
  readonly columns: Readonly<Record<string, number>>;
  /** How many cells of each column say that it was looked for and not found. */
  readonly not_found: Readonly<Record<string, number>>;
  /** Cells that stood in a sheet taken before, with the same visit, surveyor, date and remark: they are on record and not taken again. */
  readonly on_record: number;
  /** Those of them after which another answer came in, which counts in their place. */
  readonly answered_later: number;
}

interface Given extends Pick<HeldAnswer, 'id' | 'column' | 'cell' | 'visit' | 'surveyor' | 'surveyed_on' | 'remark'> {
  readonly row: number;
}

/**
 * Takes the answers of the sheet `file` into the database of the study at `path`; the next screening uses them, the owner's inventory stays as
 * it is. Columns are those of the sheet of `survey --csv`; blank cells and dashes say nothing, `?` or `not found` that the visit looked
 * and could not find out: plans then no longer count on that kind of visit for it. What a sheet taken before has said in the same words is
 * not taken twice. All or nothing.
 * @throws UserError with every cell that cannot be read, a row without an id or with one the newest run does not hold, a kind of visit that
 * the study does not know, something not found without any, a year to come, two rows that contradict each other, an unknown column.
 * @example
 * const { answers } = await takeAnswers('study.yaml', 'field.csv', new Date());
 */
export async function takeAnswers(path: string, file: string, taken: Date): Promise<TakenAnswers> {
  const text = await readText(file, 'the sheet of answers');
  return changeStudyDatabase(path, async (db, loaded) => {
    const { study } = loaded;
    const sheet = readSheet(text, { file, study, known: await idsOf(db, loaded), present: taken.getUTCFullYear() });
    const { fresh: given, known } = apart(sheet, await heldAnswers(db));
    if (given.length > 0) await keepAnswers(db, given, taken);
    const answers = given.filter(({ cell }) => cell !== null);
    return {
      answers: answers.length,
      buildings: new Set(given.map(({ id }) => id)).size,
      columns: countColumns(answers),
      not_found: countColumns(given.filter(({ cell }) => cell === null)),
      on_record: sheet.length - given.length,
      answered_later: known.filter(({ counts }) => !counts).length,
    };
  });
}

async function keepAnswers(db: Database, given: readonly Given[], taken: Date): Promise<void> {
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
      given.map(() => null),
    ]);
  });
}

/** What a sheet brings that is not on record, and what is; withdrawn answers may be brought again. */
function apart(
  sheet: readonly Given[],
  held: readonly HeldAnswer[],
): { readonly fresh: readonly Given[]; readonly known: readonly HeldAnswer[] } {
  const key = ({ id, column, cell, visit, surveyor, surveyed_on, remark }: Omit<Given, 'row'>): string =>
    JSON.stringify([id, column, cell, visit, surveyor, surveyed_on, remark]);
  const standing = new Map<string, HeldAnswer | null>();
  // a failure that an answer has taken the place of may come about again: it takes no answer away
  for (const one of held) if (one.counts || (one.withdrawn === null && one.cell !== null)) standing.set(key(one), one);
  const known: HeldAnswer[] = [];
  const fresh = sheet.filter((one) => {
    const found = standing.get(key(one));
    // null: the row stands twice in the sheet
    if (found === undefined) standing.set(key(one), null);
    else if (found !== null) known.push(found);
    return found === undefined;
  });
  return { fresh, known };
}

function countColumns(given: readonly Given[]): Readonly<Record<string, number>> {
  const columns: Record<string, number> = {};
  for (const { column } of given) columns[column] = (columns[column] ?? 0) + 1;
  return columns;
}

function readSheet(text: string, about: Omit<SheetRow, 'cellOf' | 'asked'>): readonly Given[] {
  const { file, study } = about;
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
    const found = readRow(i + 2, { ...about, cellOf: (name) => cells[at(name)] ?? '', asked });
    given.push(...found.given);
    problems.push(...found.problems);
  });
  problems.push(...contradictions(given, file, study));
  if (problems.length > 0) throw UserError.of(problems);
  if (given.length === 0)
    throw new UserError('the sheet answers nothing: every cell is blank or holds a dash', { file });
  return given;
}

interface SheetRow {
  readonly cellOf: (name: string) => string;
  /** Columns of the sheet that answer something. */
  readonly asked: readonly string[];
  readonly file: string;
  readonly study: Study;
  /** Ids of the buildings of the newest run. */
  readonly known: ReadonlySet<string>;
  /** The year in which the sheet is taken. */
  readonly present: number;
}

/** Two rows that answer one question of a building differently: which of them holds is for whoever was there to say. */
function contradictions(given: readonly Given[], file: string, study: Study): readonly Problem[] {
  const first = new Map<string, Given>();
  return given.flatMap((one) => {
    const { row, id, column, cell } = one;
    if (cell === null) return [];
    const key = JSON.stringify([id, column]);
    const other = first.get(key);
    if (other?.cell == null) {
      first.set(key, one);
      return [];
    }
    if (readFound(column, cell, study) === readFound(column, other.cell, study)) return [];
    return [
      {
        place: { file, row, columnName: column },
        message: `${showValue(cell)} for ${showValue(id)}, of which row ${String(other.row)} says ${showValue(other.cell)}; keep the one that holds`,
      },
    ];
  });
}

function readRow(
  row: number,
  { cellOf, asked, file, study, known, present }: SheetRow,
): { readonly given: readonly Given[]; readonly problems: readonly Problem[] } {
  const written = (name: string): string | null => {
    // a cell that was guarded against formulas comes back with its apostrophe
    const cell = cellOf(name)
      .trim()
      .replace(/^'(?=[=+@-])/, '');
    return NOTHING.has(cell) ? null : cell;
  };
  const about = (name: string): string | null => (written(name) === '?' ? null : written(name));
  const answered = asked.flatMap((column) => {
    const cell = written(column);
    return cell === null ? [] : [{ column, cell }];
  });
  if (answered.length === 0) return { given: [], problems: [] };
  const id = about('id');
  if (id === null)
    return {
      given: [],
      problems: [{ place: { file, row, columnName: 'id' }, message: 'an answer without the id of a building' }],
    };
  const visit = visitCalled(about('visit'), study);
  const rest = { surveyor: about('surveyor'), surveyed_on: about('surveyed_on'), remark: about('remark') };
  const given: Given[] = [];
  const problems: Problem[] = [];
  if (!known.has(id))
    problems.push({
      place: { file, row, columnName: 'id' },
      message: `${showValue(id)} is no building of the newest run`,
    });
  const kinds = Object.keys(study.survey.visits).join(', ');
  const named = about('visit');
  if (rest.surveyed_on !== null && !isCalendarDate(rest.surveyed_on))
    problems.push({
      place: { file, row, columnName: 'surveyed_on' },
      message: `${showValue(rest.surveyed_on)} is no day of the calendar; write it like 2026-12-03, or leave the cell blank`,
    });
  for (const { column, cell } of answered) {
    const read = readFound(column, cell, study);
    if (typeof read === 'object' && read !== null) {
      problems.push({ place: { file, row, columnName: column }, message: read.wrong });
      continue;
    }
    const latest = Math.min(present, Number(/^\d{4}(?=[-/.])/.exec(rest.surveyed_on ?? '')?.[0] ?? present));
    if (column === 'year_built' && typeof read === 'number' && read > latest)
      problems.push({
        place: { file, row, columnName: column },
        message: `${showValue(cell)} lies after ${String(latest)}, when it was looked at; write the year in which it was built, or leave the cell blank`,
      });
    given.push({ row, id, column, cell: read === null ? null : cell, visit: visit ?? named, ...rest });
  }
  const missing = given.find((one) => one.cell === null);
  if (missing !== undefined && visit === undefined)
    problems.push({
      place: { file, row, columnName: 'visit' },
      message: `${missing.column} is ${showValue(written(missing.column))}, looked for and not found, and ${missing.visit === null ? 'no kind of visit is named' : `${showValue(missing.visit)} is no kind of visit of the study`}: name the one that looked (${kinds}), or leave cells blank where nobody looked`,
    });
  else if (named !== null && visit === undefined)
    problems.push({
      place: { file, row, columnName: 'visit' },
      message: `${showValue(named)} is no kind of visit of the study; write one of ${kinds}, or leave the cell blank`,
    });
  return { given, problems };
}

/** A cell as it will be read; null where it says that it could not be found out. */
function readFound(name: string, cell: string, study: Study): ReturnType<typeof readAnswer> | null {
  if (NOT_FOUND.test(cell.replace(/\s+/g, ' '))) return null;
  const column = findColumn(name);
  const read = column === undefined ? { wrong: 'no such column' } : readAnswer(column, cell, study);
  // a word for what is not known: it must not take the place of what the owner wrote
  return read === UNKNOWN || (typeof read === 'object' && cell.toLowerCase() === UNKNOWN) ? null : read;
}

/** The study's name of a kind of visit, whichever case it is written in. */
function visitCalled(written: string | null, { survey }: Study): string | undefined {
  const names = Object.keys(survey.visits);
  return names.find((name) => name === written) ?? names.find((name) => name.toLowerCase() === written?.toLowerCase());
}

function recordsOf(text: string, file: string): readonly (readonly string[])[] {
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

/** Answers for buildings that the newest run does not hold are a slip of the pen. */
async function idsOf(db: Database, loaded: LoadedStudy): Promise<ReadonlySet<string>> {
  const { fingerprints } = await chosenRun(db, loaded, {});
  const rows = await db.rows<{ id: string }>('SELECT id FROM building WHERE inventory_id = ?', [
    fingerprints.inventory,
  ]);
  return new Set(rows.map(({ id }) => id));
}
