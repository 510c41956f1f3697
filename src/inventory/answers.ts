/**
 * What surveys have found out, laid over the inventory as it is taken in: the owner's file stays as it is, and its cell gives way to the
 * answer. Cells are kept as they were written down and read like those of the file.
 */
import { createHash } from 'node:crypto';
import { findColumn } from '../engineering/columns.js';
import type { InventoryColumn } from '../engineering/columns.js';
import { findUnit } from '../engineering/units.js';
import type { Unknown } from '../engineering/priority/learnable.js';
import { Bug } from '../errors.js';
import type { Database } from '../store/database.js';
import { quoteName, quoteText } from '../store/sql.js';
import { canonicalJson } from '../study/fingerprint.js';
import { readNumberCell, readWordCell } from './cell.js';
import { keySql, vocabularyOf } from './cells.js';
import type { MappedColumn, Mapping } from './header.js';
import type { IntakeStudy } from './intake-study.js';
import { isNumeric, oddName } from './read.js';

/** Inventory columns that answer each question. */
export const ANSWERS: Readonly<Record<Unknown, readonly string[]>> = {
  system: ['system'],
  year: ['year_built'],
  height: ['storeys_above', 'height_m'],
  irregularity: ['soft_storey', 'weak_storey', 'torsion', 'reentrant_corner', 'setback', 'mass_irregularity'],
  use: ['use'],
  occupants: ['occupants_peak'],
  drawings: ['design_base_shear_coefficient', 'design_level'],
};

/** Every column that answers something. */
export const ANSWER_COLUMNS: readonly string[] = Object.values(ANSWERS).flat();

/** One answer that counts, as it is kept. */
export interface Answer {
  readonly id: string;
  readonly column_name: string;
  readonly cell: string;
  readonly visit: string | null;
  readonly surveyor: string | null;
  readonly surveyed_on: string | null;
}

/** A cell of an answer as it will be read, or what is wrong with it. */
export function readAnswer(
  column: InventoryColumn,
  cell: string,
  study: IntakeStudy,
): number | string | { readonly wrong: string } {
  const mapped = answerColumn(column);
  if (isNumeric(mapped)) {
    const read = readNumberCell(cell, column, {
      decimal: study.inventory.decimal,
      unit: mapped.unit,
      stored: mapped.stored,
    });
    if (Number.isNaN(read.value)) return { wrong: read.note?.message ?? `${JSON.stringify(cell)} is no number` };
    return read.value;
  }
  const { word, note } = readWordCell(cell, column, vocabularyOf(study, column.vocabulary));
  return word === null ? { wrong: note?.message ?? `${JSON.stringify(cell)} is not a word of ${column.name}` } : word;
}

/** The column as a survey answers it: in its own unit, a decimal point or what the study says. */
function answerColumn(column: InventoryColumn): MappedColumn {
  const stored = column.unit === undefined ? undefined : findUnit(column.unit);
  return { column, theirs: 'survey', position: -1, unit: stored, stored };
}

/** Stands for the answers in the fingerprint of an inventory; null where there are none. */
export function answersFingerprint(answers: readonly Answer[]): string | null {
  if (answers.length === 0) return null;
  return createHash('sha256').update(canonicalJson(answers), 'utf8').digest('hex');
}

/**
 * Lays the answers over `intake_cell` and notes each; the mapping gains the columns that only a survey has. Where rows are merged, the
 * building's first row holds the answer and the others hold nothing, so that sums and largest values are the answer's.
 */
export async function layAnswers(
  db: Database,
  mapping: Mapping,
  study: IntakeStudy,
  answers: readonly Answer[],
): Promise<Mapping> {
  if (answers.length === 0) return mapping;
  const names = [...new Set(answers.map(({ column_name }) => column_name))];
  const answered = names.map((name) => {
    const column = findColumn(name);
    if (column === undefined) throw new Bug(`an answer to ${name}, which is no column`);
    return { column, mapped: mapping.columns.find((one) => one.column.name === name) };
  });
  const ids = [...new Set(answers.map(({ id }) => id))];
  const place = new Map(ids.map((id, at) => [id, at]));
  const columns = answered.map(({ column }) => {
    const numeric = isNumeric(answerColumn(column));
    const values: Float64Array | (string | null)[] = numeric
      ? new Float64Array(ids.length).fill(NaN)
      : ids.map(() => null);
    for (const { id, column_name, cell } of answers) {
      if (column_name !== column.name) continue;
      const read = readAnswer(column, cell, study);
      // a word of the study that its words no longer know
      if (typeof read === 'object') continue;
      values[place.get(id)!] = numeric ? read : cell;
    }
    return values;
  });
  await db.run(
    `CREATE OR REPLACE TEMP TABLE intake_answer (id VARCHAR, ${answered
      .map(({ column }) => `${quoteName(column.name)} ${isNumeric(answerColumn(column)) ? 'DOUBLE' : 'VARCHAR'}`)
      .join(', ')})`,
  );
  await db.append('intake_answer', [ids, ...columns]);
  const key = keySql(mapping);
  const first = mapping.mergeBy === undefined ? 'true' : `row_number() OVER (PARTITION BY ${key} ORDER BY c."row") = 1`;
  const given = answered.map(({ column, mapped }) => {
    const name = quoteName(column.name);
    const old = mapped === undefined ? 'NULL' : `c.${name}`;
    const type = isNumeric(answerColumn(column)) ? 'DOUBLE' : 'VARCHAR';
    return `CAST(CASE WHEN a.${name} IS NULL THEN ${old} WHEN ${first} THEN a.${name} END AS ${type}) AS ${name}`;
  });
  const odd = answered.flatMap(({ column, mapped }) => {
    const name = oddName(answerColumn(column));
    if (!isNumeric(answerColumn(column))) return [];
    const old =
      mapped === undefined
        ? 'CAST(NULL AS VARCHAR)'
        : `CASE WHEN a.${quoteName(column.name)} IS NULL THEN c.${name} END`;
    return [`${old} AS ${name}`];
  });
  const replaced = answered.flatMap(({ column, mapped }) =>
    mapped === undefined ? [] : [quoteName(column.name), ...(isNumeric(mapped) ? [oddName(mapped)] : [])],
  );
  await db.run(
    `CREATE OR REPLACE TEMP TABLE intake_laid AS SELECT c.* ${replaced.length === 0 ? '' : `EXCLUDE (${replaced.join(', ')})`}, ${[...given, ...odd].join(', ')}
     FROM intake_cell c LEFT JOIN intake_answer a ON a.id = ${key} ORDER BY c."row"`,
  );
  const kind = await db.value("SELECT count(*) FROM duckdb_views() WHERE temporary AND view_name = 'intake_cell'");
  await db.run(`DROP ${kind === 0 ? 'TABLE' : 'VIEW'} intake_cell`);
  await db.run('CREATE TEMP VIEW intake_cell AS SELECT * FROM intake_laid');
  await noteAnswers(db, mapping, answers);
  const added = answered.flatMap(({ column, mapped }) => (mapped === undefined ? [answerColumn(column)] : []));
  return { ...mapping, columns: [...mapping.columns, ...added] };
}

/** A note for every answer, and one for those whose building the inventory no longer holds. */
async function noteAnswers(db: Database, mapping: Mapping, answers: readonly Answer[]): Promise<void> {
  const words = answers.map(({ visit, surveyed_on, surveyor }) =>
    [
      visit === null ? 'survey' : `${visit} visit`,
      surveyed_on === null ? '' : `of ${surveyed_on}`,
      surveyor === null ? '' : `by ${surveyor}`,
    ]
      .filter((word) => word !== '')
      .join(' '),
  );
  await db.run(
    'CREATE OR REPLACE TEMP TABLE intake_answer_note (id VARCHAR, column_name VARCHAR, cell VARCHAR, words VARCHAR)',
  );
  await db.append('intake_answer_note', [
    answers.map(({ id }) => id),
    answers.map(({ column_name }) => column_name),
    answers.map(({ cell }) => cell),
    words,
  ]);
  await db.run(
    `INSERT INTO intake_finding
     SELECT f."row", CASE WHEN f.id IS NOT NULL THEN n.id END, n.column_name, n.cell, CASE WHEN f.id IS NULL THEN 'answer-without-building' ELSE 'survey-answer' END,
       CASE WHEN f.id IS NULL THEN 'an answer for ' || n.id || ' (' || n.words || '), which the inventory does not hold' ELSE n.words || ': ' || n.cell END,
       ${quoteText('the answer stands in place of the cell of the file')}, 'note'
     FROM intake_answer_note n LEFT JOIN (SELECT ${keySql(mapping)} AS id, min(c."row") AS "row" FROM intake_cell c GROUP BY 1) f ON f.id = n.id`,
  );
}
