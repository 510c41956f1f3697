/** The ranking as a table: every building in rank order, those not ranked last. */
import { createReadStream, createWriteStream, rmSync } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import type { Display } from '../engineering/format.js';
import { shownUnit } from '../engineering/format.js';
import { RESULT_COLUMNS } from '../engineering/results.js';
import type { ResultColumn } from '../engineering/results.js';
import { findUnit } from '../engineering/units.js';
import { UserError } from '../errors.js';
import type { Database } from '../store/database.js';
import { FILLED_ATTRIBUTES, RANKED_COLUMNS } from '../store/schema.js';
import { quoteName, quoteText } from '../store/sql.js';
import { allDone } from './all-done.js';
import { CSV_OPTIONS, CSV_OPTIONS_BODY, firstColumn, guardedText } from './spreadsheet.js';

interface Taken {
  readonly name: string;
  readonly kind: 'number' | 'year' | 'text';
  readonly unit?: string;
}

/** What of the inventory stands beside the results, with where it comes from. */
const TAKEN: readonly Taken[] = [
  { name: 'storeys_above', kind: 'number' },
  { name: 'storeys_above_origin', kind: 'text' },
  { name: 'height_m', kind: 'number', unit: 'm' },
  { name: 'height_m_origin', kind: 'text' },
  { name: 'floor_area_m2', kind: 'number', unit: 'm2' },
  { name: 'floor_area_m2_origin', kind: 'text' },
  { name: 'year_built', kind: 'year' },
  { name: 'year_built_origin', kind: 'text' },
  { name: 'use', kind: 'text' },
  { name: 'use_origin', kind: 'text' },
  { name: 'system', kind: 'text' },
  { name: 'system_origin', kind: 'text' },
];

/** Results that repeat words of the study or the inventory; all others are words of ours and begin with a letter. */
const FREE_WORDS: ReadonlySet<string> = new Set(['spectrum', 'not_ranked']);

/** A name with the unit at its end replaced: `height_m_origin` in US display is `height_ft_origin`. */
function inUnit(name: string, unit: string, shown: string): string {
  return unit === shown ? name : name.replace(new RegExp(`_${unit}(?=_origin$|$)`), `_${shown}`);
}

/** The select list of ranking.csv. Numbers go out in single precision: some seven digits; the Parquet file holds them whole. */
function csvColumns(display: Display): string[] {
  const results = RESULT_COLUMNS.filter(({ name }) => name !== 'rank').map(({ name, kind }) => {
    const value =
      kind === 'number'
        ? `CAST(${quoteName(name)} AS FLOAT)`
        : FREE_WORDS.has(name)
          ? guardedText(quoteName(name))
          : quoteName(name);
    return `${value} AS ${quoteName(name)}`;
  });
  const taken = TAKEN.map(({ name, kind, unit }) => {
    const column = quoteName(name);
    const owner = TAKEN.find((other) => other.unit !== undefined && name === `${other.name}_origin`)?.unit ?? unit;
    const from = findUnit(owner ?? '');
    const to = findUnit(owner === undefined ? '' : shownUnit(owner, display));
    const shownName = from === undefined || to === undefined ? name : inUnit(name, from.id, to.id);
    if (kind === 'text') return `${column} AS ${quoteName(shownName)}`;
    if (kind === 'year') return `CAST(${column} AS INTEGER) AS ${quoteName(name)}`;
    const value =
      from === undefined || to === undefined || from === to
        ? column
        : `${column} * ${String(from.factor)} / ${String(to.factor)}`;
    return `CAST(${value} AS FLOAT) AS ${quoteName(shownName)}`;
  });
  return [
    `"rank" AS ${firstColumn('rank')}`,
    ...['id', 'name', 'group'].map((name) => `${guardedText(quoteName(name))} AS ${quoteName(name)}`),
    ...results,
    ...taken,
  ];
}

/** Rows from which on the CSV is written in two parts at once: the engine writes one file with one thread. */
const WORTH_PARTS = 50_000;

/** The select of run `runId` in rank order, past the views, whose other columns cost as much again. The index is in the order of ids. */
async function rankedRows(db: Database, runId: number): Promise<string> {
  const run = String(Math.trunc(runId));
  const inventory = await db.value(
    'SELECT inventory_number FROM run JOIN inventory USING (inventory_id) WHERE run_id = ?',
    [runId],
  );
  if (typeof inventory !== 'number') throw new UserError(`there is no run ${run}; \`swaymark runs\` lists them`);
  const result = (column: ResultColumn): string =>
    `${RANKED_COLUMNS.includes(column) ? 'k' : 'a'}.${quoteName(column.name)}`;
  const results = RESULT_COLUMNS.filter(({ name }) => name !== 'rank').map(result);
  const taken = TAKEN.map((column) => {
    const filled = FILLED_ATTRIBUTES.find((attribute) => column.name === `${attribute}_origin`);
    return filled === undefined ? `c.${quoteName(column.name)}` : `${filled}_of.origin AS ${quoteName(column.name)}`;
  });
  const fills = FILLED_ATTRIBUTES.map(
    (attribute) =>
      `JOIN fill ${attribute}_of ON ${attribute}_of.inventory_number = ${String(inventory)} AND ${attribute}_of.fill = c.${attribute}_fill`,
  );
  return `SELECT ${['k."rank"', 'c.id', 'c.name', 'c."group"', ...results, ...taken].join(', ')} FROM result_assessed a
    JOIN result_ranked k ON k.run_id = ${run} AND k.building_index = a.building_index
    JOIN building_core c ON c.inventory_number = ${String(inventory)} AND c.building_index = a.building_index ${fills.join(' ')}
    WHERE a.run_id = ${run} ORDER BY k."rank" NULLS LAST, a.building_index`;
}

/** Writes run `runId` to `path` as Parquet: every building in rank order in SI units, numbers in full. The folder must be open to `db`. */
export async function writeRankingParquet(db: Database, runId: number, path: string): Promise<void> {
  await db.run(
    `COPY (${await rankedRows(db, runId)}) TO ${quoteText(path)} (FORMAT parquet, COMPRESSION zstd, COMPRESSION_LEVEL 1, PRESERVE_ORDER true)`,
  );
}

/**
 * Writes the ranking in the file `ranking`, of `writeRankingParquet`, to `path` as CSV for spreadsheets: UTF-8 with byte order mark, CRLF,
 * formulas made harmless. Both folders must be open to `db`. The file has the rows joined and sorted: reading them back costs a tenth of
 * doing it again, or of a table beside it in memory. From `worthParts` rows on two connections write half each, and the second half is
 * put behind the first.
 */
export async function writeRankingCsv(
  db: Database,
  ranking: string,
  path: string,
  display: Display = 'si',
  worthParts = WORTH_PARTS,
): Promise<void> {
  const from = `read_parquet(${quoteText(ranking)})`;
  const rows = Number(await db.value(`SELECT count(*) FROM ${from}`));
  const copy = (to: string, where: string, options: string): string =>
    `COPY (SELECT ${csvColumns(display).join(', ')} FROM ${from} ${where}) TO ${quoteText(to)} ${options}`;
  if (rows < worthParts) {
    await db.run(copy(path, '', CSV_OPTIONS));
    return;
  }
  const half = Math.floor(rows / 2);
  const rest = `${path}.rest.part`;
  try {
    await allDone([
      db.beside((other) => other.run(copy(path, `WHERE "rank" <= ${String(half)}`, CSV_OPTIONS))),
      db.beside((other) => other.run(copy(rest, `WHERE "rank" > ${String(half)} OR "rank" IS NULL`, CSV_OPTIONS_BODY))),
    ]);
    await pipeline(createReadStream(rest, { highWaterMark: 1 << 22 }), createWriteStream(path, { flags: 'a' }));
  } finally {
    rmSync(rest, { force: true });
  }
}
