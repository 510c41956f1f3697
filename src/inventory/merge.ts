/**
 * Several rows, one building (condominium units, parts of an assessor's lot). How each column is merged is fixed here;
 * nothing depends on the order of rows.
 *
 * Storeys: the largest, because a row of an upper unit or a garage may count only its own. Year: the earliest known.
 * Floor area, people, weight and cost: the sum. Words: the one with the largest floor area, ties by alphabet; yes wins over no.
 * The name: see merge-names.ts.
 */
import { USES } from '../engineering/building.js';
import type { InventoryColumn } from '../engineering/columns.js';
import type { Database } from '../store/database.js';
import { quoteList, quoteName } from '../store/sql.js';
import { CHECKS, STOREYS_OF_UNITS } from './checks.js';
import type { Check } from './checks.js';
import { DECADE } from './cells.js';
import type { Mapping } from './header.js';
import { isUnitSql, nameBuildings } from './merge-names.js';

const SUMMED = new Set(['floor_area_m2', 'occupants_peak', 'seismic_weight_kN', 'assessment_cost']);
const SMALLEST = new Set([
  'year_built',
  'capacity_sa_g',
  'design_base_shear_coefficient',
  'wind_base_shear_coefficient',
  'retrofit_level',
  'vs30_mps',
]);
const MIDDLE = new Set([
  'lon',
  'lat',
  'measured_period_longitudinal_s',
  'measured_period_transverse_s',
  'site_period_s',
]);

function isLargestWord({ kind, vocabulary, name }: InventoryColumn): boolean {
  return (kind === 'word' || vocabulary !== undefined) && vocabulary !== 'yes_no' && name !== 'status';
}

function mergedSql(column: InventoryColumn): string {
  const name = quoteName(column.name);
  // Ordered: a sum in parallel differs in the last digits from run to run.
  if (SUMMED.has(column.name)) return `sum(${name} ORDER BY ${name})`;
  if (MIDDLE.has(column.name)) return `median(${name})`;
  if (column.name === 'status')
    return `CASE WHEN bool_or(${name} IS NULL OR ${name} = 'in-use') THEN 'in-use' ELSE CAST(min(${name}) AS VARCHAR) END`;
  if (column.kind === 'text' || column.kind === 'list' || SMALLEST.has(column.name)) return `min(${name})`;
  return `max(${name})`;
}

// A row for the whole building beside the rows of its units.
const LOOKS_WHOLE = `(count(floor_area_m2) >= 3 AND max(floor_area_m2) BETWEEN 0.75 * (sum(floor_area_m2) - max(floor_area_m2))
  AND 1.5 * (sum(floor_area_m2) - max(floor_area_m2)))`;

/** Makes `intake_building` of the rows that share their key, and notes where they disagree. */
export async function mergeRows(db: Database, mapping: Mapping, rowsSql: string): Promise<void> {
  await db.run(
    `CREATE OR REPLACE TEMP TABLE intake_row AS SELECT r.* FROM (${rowsSql}) r ANTI JOIN intake_fate f ON f."row" = r."row"`,
  );
  const parts = mapping.noBuilding === undefined ? 'intake_row' : '(SELECT * FROM intake_row WHERE NOT "site only")';
  const columns = mapping.columns.map(({ column }) => column).filter(({ name }) => name !== 'id');
  const hasArea = columns.some(({ name }) => name === 'floor_area_m2');
  const hasName = columns.some(({ name }) => name === 'name');
  if (hasName) await nameBuildings(db, parts, hasArea);
  const weight = hasArea ? 'coalesce(sum(floor_area_m2 ORDER BY floor_area_m2), 0)' : 'count(*)';
  const selected: string[] = [];
  const joins: string[] = [];
  for (const column of columns) {
    const name = quoteName(column.name);
    if (column.name === 'name') {
      selected.push('m.name');
      continue;
    }
    if (!isLargestWord(column)) {
      selected.push(`b.${name}`);
      continue;
    }
    const alias = `w${joins.length}`;
    joins.push(`LEFT JOIN (SELECT key, first(word ORDER BY weight DESC, word) AS word FROM
      (SELECT key, ${name} AS word, ${weight} AS weight FROM ${parts} WHERE ${name} IS NOT NULL GROUP BY key, ${name})
      GROUP BY key) ${alias} ON ${alias}.key = b.key`);
    selected.push(`${alias}.word AS ${name}`);
  }
  const use = selected.findIndex((text) => text.endsWith(' AS "use"'));
  const useNumber =
    use < 0
      ? 'CAST(NULL AS INTEGER)'
      : `CAST(list_position(${quoteList(USES)}, ${(selected[use] ?? '').replace(' AS "use"', '')}) - 1 AS INTEGER)`;
  const grouped = columns
    .filter((column) => !isLargestWord(column) && column.name !== 'name')
    .map((column) => `${mergedSql(column)} AS ${quoteName(column.name)}`);
  const partial = hasArea ? 'count(floor_area_m2) > 0 AND count(floor_area_m2) < count(*)' : 'false';
  const whole = hasArea ? LOOKS_WHOLE : 'false';
  await db.run(`CREATE OR REPLACE TEMP TABLE intake_building AS
    SELECT n.first_row, b.key AS id, n.rows, ${[...selected, ''].join(', ')}
      b.${DECADE}, ${useNumber} AS "use number", b."partial area", b."merged storeys"
    FROM (SELECT key, ${[...grouped, ''].join(', ')} min(${DECADE}) AS ${DECADE}, CASE WHEN ${whole} THEN 2 WHEN ${partial} THEN 1 ELSE 0 END AS "partial area",
      ${mergedStoreys(columns, hasName)} AS "merged storeys" FROM ${parts} GROUP BY key) b
    JOIN (SELECT key, CAST(count(*) AS INTEGER) AS rows, min("row") AS first_row FROM intake_row GROUP BY key) n ON n.key = b.key
    ${hasName ? 'LEFT JOIN intake_name m ON m.key = b.key' : ''} ${joins.join(' ')}`);
  for (const column of columns) {
    const name = quoteName(column.name);
    if (column.name === 'storeys_above') await noteSpread(db, CHECKS.storeysDisagree, name, parts);
    if (column.name === 'year_built') await noteSpread(db, CHECKS.yearsDisagree, name, parts);
    if (isLargestWord(column)) await noteWords(db, column.name, parts);
  }
  if (!hasArea) return;
  const twice = CHECKS.partLooksWhole;
  await db.run(
    `INSERT INTO intake_finding SELECT min("row"), key, ?, CAST(max(floor_area_m2) AS VARCHAR), ?,
       'one of ' || count(*) || ' rows gives ' || round(max(floor_area_m2)) || ' m², the others together ' ||
       round(sum(floor_area_m2 ORDER BY floor_area_m2) - max(floor_area_m2)) || ' m²', ?, 'note'
     FROM ${parts} GROUP BY key HAVING ${LOOKS_WHOLE}`,
    [twice.column, twice.code, twice.action],
  );
  const check = CHECKS.partsWithoutArea;
  await db.run(
    `INSERT INTO intake_finding SELECT min("row"), key, ?, CAST(count(floor_area_m2) AS VARCHAR), ?,
       count(floor_area_m2) || ' of ' || count(*) || ' rows give an area', ?, 'note'
     FROM ${parts} GROUP BY key HAVING ${partial}`,
    [check.column, check.code, check.action],
  );
}

// 1: of several rows; 2: of a building of many units, all of whose storeys are given by units and are few.
function mergedStoreys(columns: readonly InventoryColumn[], hasName: boolean): string {
  if (!columns.some(({ name }) => name === 'storeys_above')) return '0';
  const isUnit = hasName ? `coalesce(${isUnitSql('name')}, true)` : 'true';
  const { units, storeys } = STOREYS_OF_UNITS;
  return `CASE WHEN count(*) FILTER (WHERE ${isUnit}) >= ${units} AND max(storeys_above) <= ${storeys}
      AND count(storeys_above) FILTER (WHERE NOT ${isUnit}) = 0 THEN 2 WHEN count(*) > 1 THEN 1 ELSE 0 END`;
}

// A double as text without the idle decimal: 2, not 2.0.
function textOf(sql: string): string {
  return `regexp_replace(CAST(${sql} AS VARCHAR), '[.]0$', '')`;
}

async function noteSpread(db: Database, check: Check, name: string, parts: string): Promise<void> {
  await db.run(
    `INSERT INTO intake_finding SELECT min("row"), key, ?, ${textOf(`max(${name})`)}, ?,
       count(*) || ' rows give ' || ${textOf(`min(${name})`)} || ' to ' || ${textOf(`max(${name})`)}, ?, 'note'
     FROM ${parts} GROUP BY key HAVING min(${name}) <> max(${name})`,
    [check.column, check.code, check.action],
  );
}

async function noteWords(db: Database, column: string, parts: string): Promise<void> {
  const name = quoteName(column);
  const check = CHECKS.wordsDisagree;
  await db.run(
    `INSERT INTO intake_finding SELECT min("row"), key, ?, min(${name}), ?,
       count(*) || ' rows give ' || array_to_string(list_sort(list(DISTINCT ${name})), ', '), ?, 'note'
     FROM ${parts} GROUP BY key HAVING min(${name}) <> max(${name})`,
    [column, check.code, check.action],
  );
}
