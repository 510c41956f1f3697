/**
 * What surveys have brought back, as it is kept in `survey_answer`. A row without a cell says that the visit looked and could not find
 * out; one that was withdrawn stays for the record and counts no longer.
 */
import type { Failed } from '../engineering/priority/campaign.js';
import type { Unknown } from '../engineering/priority/learnable.js';
import { UNKNOWNS } from '../engineering/priority/learnable.js';
import { Bug } from '../errors.js';
import type { Database } from '../store/database.js';
import { quoteText } from '../store/sql.js';
import { ANSWERS } from './answers.js';
import type { Answer } from './answers.js';

/** One answer, or one question that a visit found no answer to. */
export interface HeldAnswer {
  /** In the order in which they were taken, from 1. */
  readonly answer: number;
  readonly id: string;
  readonly question: Unknown;
  /** Column of the inventory that it answers. */
  readonly column: string;
  /** As it was written down; null: looked for, not found. */
  readonly cell: string | null;
  readonly visit: string | null;
  readonly surveyor: string | null;
  readonly surveyed_on: string | null;
  readonly remark: string | null;
  /** When it was taken, and when it was withdrawn, if it was: ISO 8601, UTC. */
  readonly taken: string;
  readonly withdrawn: string | null;
  /** Neither withdrawn nor followed by an answer to the same column. */
  readonly counts: boolean;
}

/** Every row with whether it counts: answers until a later one, what was not found until an answer. A failure takes no answer away. */
const HELD = `(SELECT *, withdrawn IS NULL AND answer >= coalesce(
    max(CASE WHEN cell IS NOT NULL AND withdrawn IS NULL THEN answer END) OVER (PARTITION BY id, column_name), 0) AS counts
  FROM survey_answer)`;

/** Whether there is anything: a database of an earlier version, read without bringing it up to date, has no such table. */
async function holdsAny(db: Database): Promise<boolean> {
  if ((await db.value("SELECT count(*) FROM information_schema.tables WHERE table_name = 'survey_answer'")) === 0)
    return false;
  return (await db.value('SELECT count(*) FROM survey_answer')) !== 0;
}

/** The answers that count: of several to one question the last. */
export async function currentAnswers(db: Database): Promise<readonly Answer[]> {
  if (!(await holdsAny(db))) return [];
  return db.rows<Answer>(
    `SELECT id, column_name, cell, visit, surveyor, surveyed_on FROM ${HELD}
     WHERE counts AND cell IS NOT NULL ORDER BY id, column_name`,
  );
}

/** What visits could not find out and nobody has since, by the index of the building in the inventory. */
export async function failedVisits(db: Database, inventoryId: string): Promise<ReadonlyMap<number, Failed>> {
  const failed = new Map<number, Map<string, Set<Unknown>>>();
  if (!(await holdsAny(db))) return failed;
  const rows = await db.rows<{ index: number; visit: string; name: string }>(
    `SELECT DISTINCT b.building_index AS index, h.visit, h.column_name AS name FROM ${HELD} h
     JOIN building b ON b.id = h.id AND b.inventory_id = ?
     WHERE h.counts AND h.cell IS NULL AND h.visit IS NOT NULL ORDER BY ALL`,
    [inventoryId],
  );
  for (const { index, visit, name } of rows) {
    const visits = failed.get(index) ?? new Map<string, Set<Unknown>>();
    failed.set(index, visits.set(visit, (visits.get(visit) ?? new Set()).add(questionOf(name))));
  }
  return failed;
}

/** What has become of the answers since an inventory was taken in. */
export interface AnswersSince {
  /** Questions with an answer that the inventory does not hold, by the index of the building; none of its questions may be settled by it. */
  readonly answered: ReadonlyMap<number, ReadonlySet<Unknown>>;
  /** Buildings of which the inventory holds an answer that was withdrawn. */
  readonly withdrawn: number;
}

/** Says how the coefficient beside it is meant: alone it settles nothing, but where it says that there is none. */
const LEVEL = 'design_level';
const NONE = 'none';

/**
 * What has come in and what was withdrawn since inventory `inventoryId` was taken in. Its notes say which answers were laid over it: the
 * times of runs do not, as a refresh is made later from an inventory of before, and an answer taken twice is no news.
 */
export async function answersSince(db: Database, inventoryId: string): Promise<AnswersSince> {
  const answered = new Map<number, Set<Unknown>>();
  if (!(await holdsAny(db))) return { answered, withdrawn: 0 };
  // cells of findings are cut (inventory/findings.ts)
  const laid = `(SELECT id, column_name, value FROM finding WHERE inventory_id = ? AND code = 'survey-answer')`;
  const now = `(SELECT id, column_name, left(cell, 200) AS value FROM ${HELD} WHERE counts AND cell IS NOT NULL)`;
  const fresh = await db.rows<{ index: number; name: string; value: string }>(
    `SELECT b.building_index AS index, n.column_name AS name, n.value FROM ${now} n ANTI JOIN ${laid} l USING (id, column_name, value)
     JOIN building b ON b.id = n.id AND b.inventory_id = ? ORDER BY ALL`,
    [inventoryId, inventoryId],
  );
  for (const { index, name, value } of fresh) {
    const questions = answered.get(index) ?? new Set();
    const settlesNothing = name === LEVEL && value.trim().toLowerCase() !== NONE;
    answered.set(index, settlesNothing ? questions : questions.add(questionOf(name)));
  }
  const withdrawn = await db.value(`SELECT count(DISTINCT id) FROM ${laid} ANTI JOIN ${now} USING (id, column_name)`, [
    inventoryId,
  ]);
  return { answered, withdrawn: Number(withdrawn) };
}

/** All that was taken, building by building, withdrawn or not; of one building where `id` is given. */
export async function heldAnswers(db: Database, id?: string): Promise<readonly HeldAnswer[]> {
  const rows = await db.rows<Omit<HeldAnswer, 'question'>>(
    `SELECT answer, id, column_name AS "column", cell, visit, surveyor, surveyed_on, remark, taken, withdrawn, counts
     FROM ${HELD} ${id === undefined ? '' : 'WHERE id = ?'} ORDER BY id, answer`,
    id === undefined ? [] : [id],
  );
  return rows.map(({ answer, id: building, column, ...rest }) => ({
    answer,
    id: building,
    question: questionOf(column),
    column,
    ...rest,
  }));
}

/** Marks what is held of building `id` in `columns` as withdrawn at `when`; what had been withdrawn before keeps its time. */
export async function markWithdrawn(db: Database, id: string, columns: readonly string[], when: Date): Promise<void> {
  await db.run(
    `UPDATE survey_answer SET withdrawn = ? WHERE id = ? AND withdrawn IS NULL AND column_name IN (${columns.map(quoteText).join(', ')})`,
    [when.toISOString(), id],
  );
}

function questionOf(column: string): Unknown {
  const question = UNKNOWNS.find((one) => ANSWERS[one].includes(column));
  if (question === undefined) throw new Bug(`an answer to ${column}, which answers nothing`);
  return question;
}
