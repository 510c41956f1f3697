/** Buildings of an inventory out of the database, by column. */
import { BUILDING_NUMBERS, BUILDING_WORDS } from '../engineering/building-columns.js';
import type { BuildingColumns, YearPools } from '../engineering/building-columns.js';
import { STRUCTURE_KNOWN_BY, STRUCTURE_NUMBERS, STRUCTURE_WORDS } from '../engineering/structure-columns.js';
import { Bug } from '../errors.js';
import { EXTRA_COLUMNS, FILLED_ATTRIBUTES } from '../store/schema.js';
import { quoteName } from '../store/sql.js';
import type { Database } from '../store/database.js';
import type { ColumnKind } from '../store/vectors.js';
import type { IndexRange } from '../store/chunks.js';

type Numbers = Float64Array;
type Words = readonly (string | null)[];
type Arrays = Readonly<Record<string, Float64Array | Int32Array | Words>>;

const FILLED: ReadonlySet<string> = new Set(
  FILLED_ATTRIBUTES.flatMap((name) => [`${name}_origin`, `${name}_sigma`, `${name}_rule`]),
);
const EXTRA: ReadonlySet<string> = new Set(EXTRA_COLUMNS.map(({ name }) => name));
const isCore = (name: string): boolean => !EXTRA.has(name) && !FILLED.has(name);
const kinds = (names: readonly string[], kind: ColumnKind): readonly (readonly [string, ColumnKind])[] =>
  names.map((name) => [name, kind] as const);

const CORE_SPEC: Readonly<Record<string, ColumnKind>> = Object.fromEntries([
  ...kinds(BUILDING_NUMBERS.filter(isCore), 'f64'),
  ...kinds(BUILDING_WORDS.filter(isCore), 'text'),
  ...kinds(['building_index', ...FILLED_ATTRIBUTES.map((name) => `${name}_fill`)], 'i32'),
  ...kinds(['not_ranked'], 'text'),
]);
const EXTRA_SPEC: Readonly<Record<string, ColumnKind>> = Object.fromEntries([
  ['building_index', 'i32'] as const,
  ...kinds(
    BUILDING_NUMBERS.filter((name) => EXTRA.has(name)),
    'f64',
  ),
  ...kinds(
    BUILDING_WORDS.filter((name) => EXTRA.has(name)),
    'text',
  ),
]);

/** Columns of the structure, read only where some building of the inventory knows any of it. */
export const STRUCTURE_SPEC: Readonly<Record<string, ColumnKind>> = Object.fromEntries([
  ...kinds(STRUCTURE_NUMBERS, 'f64'),
  ...kinds(STRUCTURE_WORDS, 'text'),
]);

/** True where some building of the inventory knows anything of its structure: told from the counts made at intake. */
export async function knowsStructure(db: Database, inventoryId: string): Promise<boolean> {
  const text = await db.value('SELECT attributes FROM inventory WHERE inventory_id = ?', [inventoryId]);
  if (typeof text !== 'string') return false;
  const counts = JSON.parse(text) as Readonly<Record<string, { readonly given: number }>>;
  return STRUCTURE_KNOWN_BY.some((name) => (counts[name]?.given ?? 0) > 0);
}

export interface BuildingBlock {
  readonly columns: BuildingColumns;
  /** Reason of the inventory why a building cannot be ranked, or null. */
  readonly notRanked: readonly (string | null)[];
  readonly rows: number;
}

export interface ReadOptions {
  /** Above 1: only the buildings whose index it divides. */
  readonly every?: number;
  /** Read the ids too; without them they are blank. */
  readonly ids?: boolean;
  /** Read where they stand too. */
  readonly places?: boolean;
  /** Only the buildings whose index stands in this temporary table of one column `building_index`. */
  readonly among?: string;
}

/** The buildings of one range of indices, in their order. */
export async function readBuildings(
  db: Database,
  inventoryId: string,
  { from, to }: IndexRange,
  { every = 1, ids = true, places = false, among }: ReadOptions = {},
): Promise<BuildingBlock> {
  const number = await db.value('SELECT inventory_number FROM inventory WHERE inventory_id = ?', [inventoryId]);
  if (typeof number !== 'number') throw new Bug(`inventory ${inventoryId} is not in the database`);
  const where = `WHERE inventory_number = ? AND building_index >= ? AND building_index < ? ${every > 1 ? `AND building_index % ${String(Math.trunc(every))} = 0` : ''} ${among === undefined ? '' : `AND building_index IN (SELECT building_index FROM ${quoteName(among)})`}`;
  const spec: Readonly<Record<string, ColumnKind>> = {
    ...CORE_SPEC,
    ...(ids ? { id: 'text' } : {}),
    ...(places ? { lon: 'f64', lat: 'f64' } : {}),
  };
  const query = `SELECT ${Object.keys(spec).map(quoteName).join(', ')} FROM building_core ${where}`;
  const params = [number, from, to];
  // They are stored in their order; sorting them again would cost as much as reading them.
  let core = (await db.columns(query, spec, params)) as unknown as Arrays & { readonly rowCount: number };
  if (!isIncreasing(core['building_index'] as Int32Array))
    core = await db.columns(`${query} ORDER BY building_index`, spec, params);
  const rows = core.rowCount;
  const arrays: Record<string, Float64Array | Int32Array | Words> = { ...core };
  await fillIn(db, number, arrays, rows);
  const structured = await knowsStructure(db, inventoryId);
  const extra = structured ? { ...EXTRA_SPEC, ...STRUCTURE_SPEC } : EXTRA_SPEC;
  await addExtra(db, extra, where, params, arrays, rows);
  const pick = (list: readonly string[]): Readonly<Record<string, unknown>> =>
    Object.fromEntries(list.map((name) => [name, arrays[name]]));
  return {
    columns: {
      id: (arrays['id'] ?? blanks(rows)) as readonly string[],
      numbers: pick(BUILDING_NUMBERS) as unknown as BuildingColumns['numbers'],
      words: pick(BUILDING_WORDS) as unknown as BuildingColumns['words'],
      structure: structured
        ? ({
            numbers: pick(STRUCTURE_NUMBERS),
            words: pick(STRUCTURE_WORDS),
          } as unknown as BuildingColumns['structure'])
        : undefined,
      place: places ? { lon: arrays['lon'] as Numbers, lat: arrays['lat'] as Numbers } : undefined,
    },
    notRanked: arrays['not_ranked'] as Words,
    rows,
  };
}

function isIncreasing(index: Int32Array): boolean {
  for (let i = 1; i < index.length; i += 1) if (index[i]! <= index[i - 1]!) return false;
  return true;
}

/** Origin, spread and rule of what was filled, from the number of the fill. */
async function fillIn(
  db: Database,
  inventory: number,
  arrays: Record<string, Float64Array | Int32Array | Words>,
  rows: number,
): Promise<void> {
  const fills = await db.rows<{ fill: number; origin: string; sigma: number; rule: string }>(
    'SELECT fill, origin, sigma, rule FROM fill WHERE inventory_number = ?',
    [inventory],
  );
  const entries = new Array<(typeof fills)[number]>(fills.length);
  for (const entry of fills) entries[entry.fill] = entry;
  for (const name of FILLED_ATTRIBUTES) {
    const fill = arrays[`${name}_fill`] as Int32Array;
    const sigma = new Float64Array(rows);
    const origin = new Array<string>(rows);
    const rule = new Array<string>(rows);
    for (let i = 0; i < rows; i += 1) {
      const entry = entries[fill[i]!]!;
      sigma[i] = entry.sigma;
      origin[i] = entry.origin;
      rule[i] = entry.rule;
    }
    arrays[`${name}_sigma`] = sigma;
    arrays[`${name}_origin`] = origin;
    arrays[`${name}_rule`] = rule;
  }
}

/** The columns few inventories have; where no building of the range has any they are one array of nothing each. */
async function addExtra(
  db: Database,
  spec: Readonly<Record<string, ColumnKind>>,
  where: string,
  params: readonly number[],
  arrays: Record<string, Float64Array | Int32Array | Words>,
  rows: number,
): Promise<void> {
  const names = Object.keys(spec);
  const extra = (await db.columns(
    `SELECT ${names.map(quoteName).join(', ')} FROM building_extra ${where}`,
    spec,
    params,
  )) as unknown as Arrays & { readonly rowCount: number };
  const place = placesOf(extra['building_index'] as Int32Array, arrays['building_index'] as Int32Array);
  for (const [name, kind] of Object.entries(spec)) {
    if (name === 'building_index') continue;
    const values = extra[name]!;
    if (kind === 'f64') {
      const out = extra.rowCount === 0 ? nothing(rows).numbers : new Float64Array(rows).fill(NaN);
      for (let i = 0; i < place.length; i += 1) out[place[i]!] = (values as Numbers)[i]!;
      arrays[name] = out;
    } else {
      const out = extra.rowCount === 0 ? nothing(rows).words : new Array<string | null>(rows).fill(null);
      for (let i = 0; i < place.length; i += 1) out[place[i]!] = (values as Words)[i]!;
      arrays[name] = out;
    }
  }
}

/** Where each of `some` stands in `all`, which increases and holds them. */
function placesOf(some: Int32Array, all: Int32Array): Int32Array {
  return some.map((index) => {
    let low = 0;
    let high = all.length - 1;
    while (low < high) {
      const middle = (low + high) >> 1;
      if (all[middle]! < index) low = middle + 1;
      else high = middle;
    }
    return low;
  });
}

let kept = { rows: -1, numbers: new Float64Array(0), words: [] as (string | null)[], texts: [] as string[] };

/** Arrays of `rows` entries that say nothing, one for all columns and blocks. */
function nothing(rows: number): typeof kept {
  if (kept.rows !== rows)
    kept = {
      rows,
      numbers: new Float64Array(rows).fill(NaN),
      words: new Array<string | null>(rows).fill(null),
      texts: new Array<string>(rows).fill(''),
    };
  return kept;
}

function blanks(rows: number): readonly string[] {
  return nothing(rows).texts;
}

/** The ids of the buildings with these indices. */
export async function readIds(db: Database, inventoryId: string, indices: Int32Array): Promise<readonly string[]> {
  const { at, id } = await db.columns(
    `SELECT building_index AS at, id FROM building_core
     WHERE inventory_number = (SELECT inventory_number FROM inventory WHERE inventory_id = ?)`,
    { at: 'i32', id: 'text' },
    [inventoryId],
  );
  const idOf = new Map<number, string | null>();
  at.forEach((index, i) => idOf.set(index, id[i]!));
  return Array.from(indices, (index) => idOf.get(index)!);
}

/** The year pools of an inventory. */
export async function readPools(db: Database, inventoryId: string): Promise<YearPools> {
  const rows = await db.rows<{ pool: number; year: number }>(
    'SELECT pool, year FROM year_pool WHERE inventory_id = ? ORDER BY pool, position',
    [inventoryId],
  );
  const pools: Record<number, number[]> = {};
  for (const { pool, year } of rows) (pools[pool] ??= []).push(year);
  return pools;
}
