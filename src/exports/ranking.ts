/** The ranking as a table: every building in rank order, those not ranked last. */
import type { Display } from '../engineering/format.js';
import { shownUnit } from '../engineering/format.js';
import { RESULT_COLUMNS } from '../engineering/results.js';
import { findUnit } from '../engineering/units.js';
import { UserError } from '../errors.js';
import type { Database } from '../store/database.js';
import { quoteName, quoteText } from '../store/sql.js';
import { CSV_OPTIONS, firstColumn, guardedText } from './spreadsheet.js';

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
  const result = (name: string): string => `r.${quoteName(name)}`;
  const results = RESULT_COLUMNS.filter(({ name }) => name !== 'rank').map(({ name, kind }) => {
    const value =
      kind === 'number'
        ? `CAST(${result(name)} AS FLOAT)`
        : FREE_WORDS.has(name)
          ? guardedText(result(name))
          : result(name);
    return `${value} AS ${quoteName(name)}`;
  });
  const taken = TAKEN.map(({ name, kind, unit }) => {
    const column = `b.${quoteName(name)}`;
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
    `r."rank" AS ${firstColumn('rank')}`,
    ...['id', 'name', 'group'].map((name) => `${guardedText(`b.${quoteName(name)}`)} AS ${quoteName(name)}`),
    ...results,
    ...taken,
  ];
}

function parquetColumns(): string[] {
  return [
    'r."rank"',
    ...['id', 'name', 'group'].map((name) => `b.${quoteName(name)}`),
    ...RESULT_COLUMNS.filter(({ name }) => name !== 'rank').map(({ name }) => `r.${quoteName(name)}`),
    ...TAKEN.map(({ name }) => `b.${quoteName(name)}`),
  ];
}

async function select(db: Database, runId: number, columns: readonly string[]): Promise<string> {
  const inventoryId = await db.value('SELECT inventory_id FROM run WHERE run_id = ?', [runId]);
  if (typeof inventoryId !== 'string')
    throw new UserError(`there is no run ${String(runId)}; \`swaymark runs\` lists them`);
  return `SELECT ${columns.join(', ')} FROM result r
    JOIN building b ON b.inventory_id = ${quoteText(inventoryId)} AND b.building_index = r.building_index
    WHERE r.run_id = ${String(Math.trunc(runId))} ORDER BY r."rank" NULLS LAST, b.id`;
}

/** Writes run `runId` to `path` as CSV for spreadsheets: UTF-8 with byte order mark, CRLF, formulas made harmless. The folder must be open to `db`. */
export async function writeRankingCsv(
  db: Database,
  runId: number,
  path: string,
  display: Display = 'si',
): Promise<void> {
  await db.run(`COPY (${await select(db, runId, csvColumns(display))}) TO ${quoteText(path)} ${CSV_OPTIONS}`);
}

/** Writes run `runId` to `path` as Parquet: the same rows and columns in SI units, numbers in full. The folder must be open to `db`. */
export async function writeRankingParquet(db: Database, runId: number, path: string): Promise<void> {
  await db.run(
    `COPY (${await select(db, runId, parquetColumns())}) TO ${quoteText(path)} (FORMAT parquet, COMPRESSION zstd)`,
  );
}
