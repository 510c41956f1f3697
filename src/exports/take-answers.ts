/** Answers of a survey, from the sheet that was filled in into the study's database. */
import { heldAnswers } from '../inventory/kept-answers.js';
import type { HeldAnswer } from '../inventory/kept-answers.js';
import { changeStudyDatabase, chosenRun } from '../runs/open.js';
import type { Database } from '../store/database.js';
import type { LoadedStudy } from '../study/load.js';
import { readText } from '../study/read-text.js';
import { readSheet } from './read-sheet.js';
import type { Given } from './read-sheet.js';

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
  /** Headings of columns that are none of a sheet of answers, nor close to one: their cells are left alone. */
  readonly not_read: readonly string[];
}

/**
 * Takes the answers of the sheet `file` into the database of the study at `path`; the next screening uses them, the owner's inventory stays as
 * it is. Columns are those of the sheet of `survey --csv`; blank cells and dashes say nothing, `?` or `not found` that the visit looked
 * and could not find out: plans then no longer count on that kind of visit for it. What a sheet taken before has said in the same words is
 * not taken twice. All or nothing.
 * @throws UserError with every cell that cannot be read, a row without an id or with one the newest run does not hold, a kind of visit that
 * the study does not know, something not found without any, a day or a year to come, two rows that contradict each other, a design coefficient where the drawings show no
 * design, a heading close to one of a sheet's columns, a column that stands twice.
 * @example
 * const { answers } = await takeAnswers('study.yaml', 'field.csv', new Date());
 */
export async function takeAnswers(path: string, file: string, taken: Date): Promise<TakenAnswers> {
  const text = await readText(file, 'the sheet of answers');
  return changeStudyDatabase(path, async (db, loaded) => {
    const { study } = loaded;
    const { given: sheet, notRead } = readSheet(text, { file, study, known: await idsOf(db, loaded), taken });
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
      not_read: notRead,
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

/** Answers for buildings that the newest run does not hold are a slip of the pen. */
async function idsOf(db: Database, loaded: LoadedStudy): Promise<ReadonlySet<string>> {
  const { fingerprints } = await chosenRun(db, loaded, {});
  const rows = await db.rows<{ id: string }>('SELECT id FROM building WHERE inventory_id = ?', [
    fingerprints.inventory,
  ]);
  return new Set(rows.map(({ id }) => id));
}
