/** The last step: the buildings with everything inferred, written in the order of their ids. */
import { COLUMNS, findColumn } from '../engineering/columns.js';
import { Bug } from '../errors.js';
import type { Database } from '../store/database.js';
import { CORE_COLUMNS, EXTRA_COLUMNS, FILLED_ATTRIBUTES, ORIGIN_TYPE, columnType } from '../store/schema.js';
import { quoteName, quoteText } from '../store/sql.js';
import { keySql } from './cells.js';
import type { Readings } from './cells.js';
import { undesignedSql } from './contradictions.js';
import type { Contradictions } from './contradictions.js';
import type { Inferred } from './infer.js';
import type { Mapping } from './header.js';
import { UNREADABLE } from './plans.js';
import type { Plans } from './plans.js';
import type { Sizes } from './sizes.js';

const PLANNED = [
  'plan_length_m',
  'plan_width_m',
  'lon',
  'lat',
  'reentrant_projection',
  'reentrant_area_share',
  'footprint_area_m2',
] as const;

/** Why a building cannot be ranked for what the inventory says of it. */
export const SIZELESS = 'no-size: neither storeys, height, floor area, plan nor use is known';

export interface BuildingParts {
  readonly readings: Readings;
  readonly sizes: Sizes;
  readonly plans: Plans;
  readonly inferred: Inferred;
  readonly doubts: Contradictions;
}

/** Writes all buildings, beginning the transaction as late as it can; `intake_building`, `intake_year` and `intake_finding` must be complete. */
export async function storeBuildings(
  db: Database,
  number: number,
  mapping: Mapping,
  parts: BuildingParts,
  begin: () => Promise<void>,
): Promise<void> {
  const planned = plannedColumns(mapping, parts);
  const inOrder = await appendFilled(db, parts, planned);
  const { from, given, id, key, rows } = sourceOf(mapping, parts.readings);
  const orElse = (name: string, word: string): string =>
    `coalesce(${given(name)}, CAST(${quoteText(word)} AS ${typeOf(name)}))`;
  const value = (name: string): string => {
    if (FILLED_ATTRIBUTES.some((filled) => filled === name) || planned.has(name)) return `f.${name}`;
    if (name === 'id') return id;
    if (name === 'status') return orElse('status', 'in-use');
    if (name === 'use') return orElse('use', 'unknown');
    if (name === 'footprint' && parts.plans.hasUnreadable) return readableFootprint(given(name), key);
    return given(name);
  };
  const typed = COLUMNS.map((column) => ({ ...column, sql: `CAST(${value(column.name)} AS ${columnType(column)})` }));
  const isExtra = (name: string): boolean => EXTRA_COLUMNS.some((extra) => extra.name === name);
  // Constants of the type itself: text would be looked up again for every building.
  const [isGiven, isInferred, isUnknown] = ['given', 'inferred', 'unknown'].map(
    (word) => `CAST('${word}' AS ${ORIGIN_TYPE})`,
  );
  const wordOrigin = (name: string): string =>
    `CASE WHEN ${orElse(name, 'unknown')} = CAST('unknown' AS ${typeOf(name)}) THEN ${isUnknown} ELSE ${isGiven} END`;
  const yearOrigin = `CASE WHEN ${given('year_built')} IS NOT NULL THEN ${isGiven} WHEN y.pool IS NOT NULL THEN ${isInferred} ELSE ${isUnknown} END`;
  const hasNotes =
    (await db.value('SELECT count(*) FROM (SELECT 1 FROM intake_finding WHERE id IS NOT NULL LIMIT 1)')) !== 0;
  const notes = `LEFT JOIN (SELECT id, CAST(count(*) AS INTEGER) AS findings FROM intake_finding WHERE id IS NOT NULL GROUP BY id) n ON n.id = ${id}`;
  // Staged: inserting straight from the joins takes twice as long as both steps together.
  await db.run(
    `CREATE OR REPLACE TEMP TABLE intake_staged AS
     SELECT ${number} AS inventory_number, f.building_index, ${typed
       .filter(({ name }) => !isExtra(name))
       .map(({ sql }) => sql)
       .join(', ')},
       ${FILLED_ATTRIBUTES.map((name) => `f.${name}_fill`).join(', ')},
       ${yearOrigin}, y.pool, ${wordOrigin('use')}, ${wordOrigin('system')},
       ${rows}, ${key}, ${hasNotes ? 'coalesce(n.findings, 0)' : '0'}, CASE WHEN f.sizeless = 1 THEN ${quoteText(SIZELESS)} END
     FROM ${from} JOIN intake_filled f ON f.first_row = ${key}
     LEFT JOIN intake_year y ON y.first_row = ${key} ${hasNotes ? notes : ''}
     ${inOrder ? '' : 'ORDER BY f.building_index'}`,
  );
  await begin();
  const { fills } = parts.inferred;
  await db.append('fill', [
    new Int32Array(fills.length).fill(number),
    Int32Array.from(fills, (_, fill) => fill),
    fills.map(({ origin }) => origin),
    Float64Array.from(fills, ({ sigma }) => sigma),
    fills.map(({ rule }) => rule),
  ]);
  // By name: a column added by a migration stands last.
  const core = [
    'inventory_number',
    'building_index',
    ...CORE_COLUMNS.map(({ name }) => name),
    ...FILLED_ATTRIBUTES.map((name) => `${name}_fill`),
    ...['year_built_origin', 'year_pool', 'use_origin', 'system_origin', 'rows', 'first_row', 'findings', 'not_ranked'],
  ];
  await db.run(`INSERT INTO building_core (${core.map(quoteName).join(', ')}) SELECT * FROM intake_staged`);
  await db.run('DROP TABLE intake_staged');
  const stored = await db.value('SELECT count(*) FROM building_core WHERE inventory_number = ?', [number]);
  if (stored !== parts.sizes.rowCount) throw new Bug(`stored ${String(stored)} of ${parts.sizes.rowCount} buildings`);

  const extra = mapping.columns.map(({ column }) => column.name).filter(isExtra);
  if (extra.length === 0) return;
  // A year of retrofit before the building's own is unknown.
  const impossible = Int32Array.from(parts.sizes.first_row.filter((_, at) => parts.doubts.retrofitDoubted[at] === 1));
  await db.run('CREATE OR REPLACE TEMP TABLE intake_impossible (first_row INTEGER)');
  await db.append('intake_impossible', [impossible]);
  const cell = ({ name, sql }: { name: string; sql: string }): string =>
    name === 'year_retrofitted'
      ? `CASE WHEN ${key} NOT IN (SELECT first_row FROM intake_impossible) THEN ${sql} END`
      : name === 'design_level'
        ? `CASE WHEN ${undesignedSql(given)} THEN NULL ELSE ${sql} END`
        : sql;
  await db.run(
    `INSERT INTO building_extra (inventory_number, building_index, ${EXTRA_COLUMNS.map(({ name }) => quoteName(name)).join(', ')})
     SELECT ${number}, f.building_index, ${typed
       .filter(({ name }) => isExtra(name))
       .map(cell)
       .join(', ')}
     FROM ${from} JOIN intake_filled f ON f.first_row = ${key}
     WHERE ${extra.map((name) => `${given(name)} IS NOT NULL`).join(' OR ')}
     ORDER BY f.building_index`,
  );
}

/** The cell, but where a finding says that it is no polygon. */
function readableFootprint(cell: string, key: string): string {
  return `CASE WHEN ${key} NOT IN (SELECT "row" FROM intake_finding WHERE code = ${quoteText(UNREADABLE.code)} AND "row" IS NOT NULL) THEN ${cell} END`;
}

function typeOf(name: string): string {
  const column = findColumn(name);
  if (column === undefined) throw new Bug(`no column ${name}`);
  return columnType(column);
}

/** Where the cells of a building stand: in `intake_building` where rows are merged, else in the rows themselves. */
function sourceOf(mapping: Mapping, readings: Readings) {
  const mapped = new Set(mapping.columns.map(({ column }) => column.name));
  if (mapping.mergeBy !== undefined) {
    const given = (name: string): string => (mapped.has(name) ? `c.${quoteName(name)}` : 'NULL');
    return { from: 'intake_building c', given, id: 'c.id', key: 'c.first_row', rows: 'c.rows' };
  }
  const given = (name: string): string => readings.cells[name] ?? 'NULL';
  return { from: `intake_cell c ${readings.joins}`, given, id: keySql(mapping), key: 'c."row"', rows: '1' };
}

/** Plan sides and coordinates where they are not simply those of the file: read from footprints, or left off the map. */
function plannedColumns(mapping: Mapping, { plans, sizes }: BuildingParts): ReadonlyMap<string, Float64Array> {
  const { length_m, width_m, area_m2: _, hasUnreadable: __, ...rest } = plans;
  const values = { plan_length_m: length_m, plan_width_m: width_m, ...rest };
  const planned = new Map<string, Float64Array>();
  for (const name of PLANNED) {
    const given = sizes[name];
    const changed =
      given === undefined
        ? mapping.columns.some(({ column }) => column.name === 'footprint')
        : !isSame(given, values[name]);
    if (changed) planned.set(name, values[name]);
  }
  return planned;
}

function isSame(a: Float64Array, b: Float64Array): boolean {
  for (let at = 0; at < a.length; at += 1) {
    const value = a[at]!;
    const other = b[at]!;
    if (value !== other && (value === value || other === other)) return false;
  }
  return true;
}

/**
 * Makes `intake_filled`: what inference adds to every building, with its place in the order of ids. True when the rows
 * of the file are in that order already; sorting wide rows costs as much as writing them.
 */
async function appendFilled(
  db: Database,
  parts: BuildingParts,
  planned: ReadonlyMap<string, Float64Array>,
): Promise<boolean> {
  const { sizes, inferred } = parts;
  const sorted = (await db.columns('SELECT first_row AS r FROM intake_building ORDER BY id', { r: 'i32' })).r;
  const index = placesOf(sorted, sizes.first_row);
  await db.run(`CREATE OR REPLACE TEMP TABLE intake_filled (first_row INTEGER, building_index INTEGER,
    ${FILLED_ATTRIBUTES.map((name) => `${name} DOUBLE, ${name}_fill INTEGER`).join(', ')}, sizeless INTEGER
    ${[...planned.keys()].map((name) => `, ${name} DOUBLE`).join('')})`);
  await db.append('intake_filled', [
    sizes.first_row,
    index,
    ...FILLED_ATTRIBUTES.flatMap((name) => [inferred[name].value, inferred[name].fill]),
    Int32Array.from(inferred.sizeless),
    ...planned.values(),
  ]);
  return sorted.every((row, at) => at === 0 || row > (sorted[at - 1] as number));
}

/** For each of `rows`, its position in `sorted`, which holds the same rows in another order. */
function placesOf(sorted: Int32Array, rows: Int32Array): Int32Array {
  let last = 0;
  for (let at = 0; at < rows.length; at += 1) if (rows[at]! > last) last = rows[at]!;
  const placeOfRow = new Int32Array(last + 1).fill(-1);
  for (let place = 0; place < sorted.length; place += 1) placeOfRow[sorted[place] as number] = place;
  const places = new Int32Array(rows.length);
  for (let at = 0; at < rows.length; at += 1) places[at] = placeOfRow[rows[at]!]!;
  return places;
}
