/** Sheets of ours that somebody has filled in: hours of work that no new sheet may take the place of unasked. */
import { existsSync, statSync } from 'node:fs';
import { UserError } from '../errors.js';
import { ANSWER_COLUMNS } from '../inventory/answers.js';
import { heldAnswers } from '../inventory/kept-answers.js';
import { inspectSource, readUtf8 } from '../inventory/source.js';
import { databasePath, openStudyDatabase } from '../screening/screen.js';
import type { LoadedStudy } from '../study/load.js';
import { readSheet } from './read-sheet.js';
import type { Given } from './read-sheet.js';
import { recordsOf, writtenCell } from './sheet-cells.js';

/** No sheet is as large. */
const LARGEST_BYTES = 1 << 26;
/** Columns of the review sheet that are for whoever checks. */
export const CHECKED_COLUMNS = ['independent value', 'difference', 'checked by', 'date'] as const;

interface Sheet {
  readonly text: string;
  readonly head: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

/** The table at `path`, null where there is none that could be a sheet. */
function sheetAt(path: string): Sheet | null {
  try {
    const found = statSync(path);
    if (!found.isFile() || found.size > LARGEST_BYTES) return null;
  } catch {
    // what cannot be reached holds nothing that writing could destroy
    return null;
  }
  try {
    const text = Buffer.concat([...readUtf8(inspectSource(path, 'auto'))].map((part) => Buffer.from(part))).toString(
      'utf8',
    );
    const [head = [], ...rows] = recordsOf(text, path);
    return { text, head, rows };
  } catch (error) {
    if (error instanceof UserError) return null;
    throw error;
  }
}

/** The first row, as a spreadsheet counts them, with something written in one of `columns`; null where there is none. */
function firstFilled({ head, rows }: Sheet, columns: readonly string[], butIn: readonly string[] = []): number | null {
  const isFilled = (cells: readonly string[], names: readonly string[]): boolean =>
    names.some((name) => head.includes(name) && writtenCell(cells[head.indexOf(name)] ?? '') !== null);
  const at = rows.findIndex((cells) => isFilled(cells, columns) && !isFilled(cells, butIn));
  return at < 0 ? null : at + 2;
}

/**
 * Refuses `path`, which stood after `option`, where a sheet of answers lies with answers that `loaded` does not have on record, or with a
 * remark beside no answer, which is kept nowhere else.
 * @throws UserError naming the option, the file, the row and what to do.
 */
export async function spareAnswers(path: string, option: string, loaded: LoadedStudy | null): Promise<void> {
  const sheet = sheetAt(path);
  if (sheet === null || !['id', 'visit'].every((name) => sheet.head.includes(name))) return;
  const asked = ANSWER_COLUMNS.filter((name) => sheet.head.includes(name));
  if (asked.length === 0) return;
  const [answered, remarked] = [firstFilled(sheet, asked), firstFilled(sheet, ['remark'], asked)];
  const over = `${option} would be written over a sheet that a survey has filled in`;
  if (answered !== null && (loaded === null || !(await isOnRecord(sheet.text, path, loaded))))
    throw new UserError(
      `${over}, with answers that the study does not have; bring them in first with \`swaymark survey --take\`, or name another file`,
      { file: path, row: answered },
    );
  if (remarked !== null)
    throw new UserError(`${over}, with a remark that is kept nowhere else; name another file`, {
      file: path,
      row: remarked,
    });
}

/** Whether every answer of the sheet has come in, withdrawn since or not. */
async function isOnRecord(text: string, file: string, loaded: LoadedStudy): Promise<boolean> {
  if (!existsSync(databasePath(loaded))) return false;
  const key = ({ id, column, cell, visit, surveyor, surveyed_on, remark }: Omit<Given, 'row'>): string =>
    JSON.stringify([id, column, cell, visit, surveyor, surveyed_on, remark]);
  const db = await openStudyDatabase(loaded, true);
  try {
    const held = await heldAnswers(db);
    const [kept, known] = [new Set(held.map(key)), new Set(held.map(({ id }) => id))];
    const { given } = readSheet(text, { file, study: loaded.study, known, taken: new Date(8.64e15) });
    return given.every((one) => kept.has(key(one)));
  } catch (error) {
    // what cannot be read has not been taken
    if (error instanceof UserError) return false;
    throw error;
  } finally {
    db.close();
  }
}

/** Refuses `path` where a review sheet lies in which somebody has written. @throws UserError naming the file, the row and what to do. */
export function spareReview(path: string): void {
  const sheet = sheetAt(path);
  if (sheet === null || !CHECKED_COLUMNS.every((name) => sheet.head.includes(name))) return;
  const row = firstFilled(sheet, CHECKED_COLUMNS);
  if (row !== null)
    throw new UserError(
      'the review sheet would be written over one in which somebody has checked steps; give that file another name, or name another folder with --output',
      { file: path, row },
    );
}
