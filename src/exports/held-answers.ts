/** The answers of surveys that a study holds: listed, and taken back. */
import { UNKNOWNS } from '../engineering/priority/learnable.js';
import type { Unknown } from '../engineering/priority/learnable.js';
import { UserError, showValue } from '../errors.js';
import { ANSWERS, ANSWER_COLUMNS } from '../inventory/answers.js';
import { answersSince, heldAnswers, markWithdrawn } from '../inventory/kept-answers.js';
import type { HeldAnswer } from '../inventory/kept-answers.js';
import { isOwnRun, listRuns } from '../runs/history.js';
import { changeStudyDatabase, withStudyDatabase } from '../runs/open.js';
import { nearest, suggest } from '../study/nearest.js';

export interface WithdrawChoice {
  /** The building. */
  readonly id: string;
  /** A question as under `finds` in the study (`system`, `height`, …), or one column that answers it (`height_m`); all when left out. */
  readonly question?: string | undefined;
}

/**
 * All that surveys of the study at `path` have brought back, building by building: answers, what was not found, what was withdrawn.
 * @throws UserError for a study without a database.
 * @example
 * const counting = (await listAnswers('study.yaml')).filter(({ counts }) => counts);
 */
export async function listAnswers(path: string): Promise<readonly HeldAnswer[]> {
  return withStudyDatabase(path, (db) => heldAnswers(db));
}

/**
 * At how many buildings of the study at `path` answers have come in that its newest run does not count, and at how many it counts answers
 * that were withdrawn; null where no run is kept.
 * @throws UserError for a study without a database.
 */
export async function answersSinceRun(
  path: string,
): Promise<{ readonly run: number; readonly answered_at: number; readonly withdrawn_at: number } | null> {
  return withStudyDatabase(path, async (db, loaded) => {
    const newest = (await listRuns(db)).findLast((run) => isOwnRun(run, loaded));
    if (newest === undefined) return null;
    const { answered, withdrawn } = await answersSince(db, newest.fingerprints.inventory);
    return { run: newest.run, answered_at: answered.size, withdrawn_at: withdrawn };
  });
}

/**
 * Withdraws what surveys of the study at `path` have brought back on a building, or on one question of it: earlier answers too, so that
 * the next screening reads the cell of the owner's file again. Nothing is deleted; each is marked with `when`.
 * @returns what is withdrawn now. @throws UserError where nothing is held of the building or on the question, or it was withdrawn before.
 * @example
 * const withdrawn = await withdrawAnswers('study.yaml', { id: 'BH-012', question: 'system' }, new Date());
 */
export async function withdrawAnswers(
  path: string,
  { id, question }: WithdrawChoice,
  when: Date,
): Promise<readonly HeldAnswer[]> {
  const columns = question === undefined ? ANSWER_COLUMNS : columnsOf(question);
  return changeStudyDatabase(path, async (db) => {
    const held = await heldAnswers(db, id);
    if (held.length === 0) {
      const ids = [...new Set((await heldAnswers(db)).map((one) => one.id))];
      const meant = nearest(id, ids);
      throw new UserError(
        `no answers are held for ${showValue(id)}${meant === undefined ? '' : ` (did you mean ${showValue(meant)}?)`}; \`swaymark survey --answers\` lists those held`,
        { key: '--withdraw' },
      );
    }
    const asked = held.filter(({ column }) => columns.includes(column));
    if (asked.length === 0) {
      const others = [...new Set(held.map((one) => one.question))].join(', ');
      throw new UserError(
        `nothing is held on ${showValue(question)} for ${showValue(id)}; there is something on: ${others}`,
        { key: '--question' },
      );
    }
    const standing = asked.filter(({ withdrawn }) => withdrawn === null);
    if (standing.length === 0) {
      const last = asked.map(({ withdrawn }) => withdrawn ?? '').reduce((a, b) => (a > b ? a : b));
      const what = question === undefined ? 'all that is held' : `what is held on ${showValue(question)}`;
      throw new UserError(
        `${what} for ${showValue(id)} was withdrawn before, on ${last.slice(0, 10)}; there is nothing left to withdraw`,
        { key: '--withdraw' },
      );
    }
    await db.transaction(() => markWithdrawn(db, id, columns, when));
    const numbers = new Set(standing.map(({ answer }) => answer));
    return (await heldAnswers(db, id)).filter(({ answer }) => numbers.has(answer));
  });
}

/** Columns of a question, or the column named itself. @throws UserError for any other word. */
function columnsOf(question: string): readonly string[] {
  if (isUnknown(question)) return ANSWERS[question];
  if (ANSWER_COLUMNS.includes(question)) return [question];
  throw new UserError(
    `${showValue(question)} is nothing that surveys answer${suggest(question, [...new Set([...UNKNOWNS, ...ANSWER_COLUMNS])])}`,
    { key: '--question' },
  );
}

function isUnknown(word: string): word is Unknown {
  return (UNKNOWNS as readonly string[]).includes(word);
}
