/** What two inventories say of the same buildings: which stored inputs went from what to what, with their origins. */
import { COLUMNS } from '../engineering/columns.js';
import type { Database } from '../store/database.js';
import { quoteName } from '../store/sql.js';

/** One side of an inventory, read from its database. */
export interface InventorySide {
  readonly db: Database;
  readonly inventoryId: string;
  /** Identifier -> index of the building. */
  readonly indexOf: ReadonlyMap<string, number>;
  readonly buildings: number;
}

type Value = number | string | null;

/** One input of one building; the origin (given, inferred, …) where the inventory keeps one. */
export interface InputChange {
  readonly field: string;
  readonly title: string;
  readonly before: Value;
  readonly origin_before: string | null;
  readonly after: Value;
  readonly origin: string | null;
}

export interface FieldCount {
  readonly field: string;
  readonly title: string;
  /** Buildings in both inventories of which it differs, and of which both values were given. */
  readonly buildings: number;
  readonly given_both: number;
}

export interface InputChanges {
  /** By identifier, of the buildings in both inventories that changed. */
  readonly byId: ReadonlyMap<string, readonly InputChange[]>;
  readonly fields: readonly FieldCount[];
}

const WITH_ORIGIN: ReadonlySet<string> = new Set([
  'storeys_above',
  'height_m',
  'floor_area_m2',
  'year_built',
  'use',
  'system',
]);
/** Columns read in one statement: all at once would hold a large inventory twice in memory. */
const AT_ONCE = 8;

/** Every stored input that differs between two inventories; a change of origin alone counts, as it changes the spread. */
export async function inputChanges(before: InventorySide, after: InventorySide): Promise<InputChanges> {
  const byId = new Map<string, InputChange[]>();
  const fields: FieldCount[] = [];
  if (before.db === after.db && before.inventoryId === after.inventoryId) return { byId, fields };
  const pairs = [...after.indexOf].flatMap(([id, now]) => {
    const was = before.indexOf.get(id);
    return was === undefined ? [] : [{ id, was, now }];
  });
  const columns = COLUMNS.filter(({ name }) => name !== 'id');
  for (let from = 0; from < columns.length; from += AT_ONCE) {
    const group = columns.slice(from, from + AT_ONCE);
    const names = group.flatMap(({ name }) => (WITH_ORIGIN.has(name) ? [name, `${name}_origin`] : [name]));
    const [old, recent] = [await readValues(before, names), await readValues(after, names)];
    for (const { name, title } of group) {
      const [a, b] = [old.get(name)!, recent.get(name)!];
      const [aOrigin, bOrigin] = [old.get(`${name}_origin`), recent.get(`${name}_origin`)];
      let buildings = 0;
      let givenBoth = 0;
      for (const { id, was, now } of pairs) {
        const [x, y] = [a[was] ?? null, b[now] ?? null];
        const [xOrigin, yOrigin] = [aOrigin?.[was] ?? null, bOrigin?.[now] ?? null];
        if (x === y && xOrigin === yOrigin) continue;
        buildings += 1;
        if (x !== null && y !== null && (xOrigin ?? 'given') === 'given' && (yOrigin ?? 'given') === 'given')
          givenBoth += 1;
        note(byId, id, {
          field: name,
          title,
          before: x,
          origin_before: xOrigin as string | null,
          after: y,
          origin: yOrigin as string | null,
        });
      }
      if (buildings > 0) fields.push({ field: name, title, buildings, given_both: givenBoth });
    }
  }
  await comparePools(before, after, pairs, byId, fields);
  fields.sort((a, b) => b.buildings - a.buildings || (a.field < b.field ? -1 : 1));
  return { byId, fields };
}

function note(byId: Map<string, InputChange[]>, id: string, change: InputChange): void {
  const known = byId.get(id);
  if (known === undefined) byId.set(id, [change]);
  else known.push(change);
}

const POOL = { field: 'year_pool', title: 'Years of like buildings' } as const;

/** Where the year is not known its building may be of any year of like ones: those change with the other buildings. */
async function comparePools(
  before: InventorySide,
  after: InventorySide,
  pairs: readonly { readonly id: string; readonly was: number; readonly now: number }[],
  byId: Map<string, InputChange[]>,
  fields: FieldCount[],
): Promise<void> {
  const [old, recent] = [await readPoolTexts(before), await readPoolTexts(after)];
  let buildings = 0;
  for (const { id, was, now } of pairs) {
    const [x, y] = [old.get(was) ?? null, recent.get(now) ?? null];
    // from a pool to a known year, or back, is a change of the year
    if (x === null || y === null || x.years === y.years) continue;
    buildings += 1;
    note(byId, id, { ...POOL, before: x.text, origin_before: null, after: y.text, origin: null });
  }
  if (buildings > 0) fields.push({ ...POOL, buildings, given_both: 0 });
}

interface PoolText {
  readonly years: string;
  readonly text: string;
}

/** By index of the building, those that read a pool of years. */
async function readPoolTexts({ db, inventoryId }: InventorySide): Promise<ReadonlyMap<number, PoolText>> {
  const pools = new Map<number, { readonly label: string; readonly years: number[] }>();
  const rows = await db.rows<{ pool: number; label: string; year: number }>(
    'SELECT pool, label, year FROM year_pool WHERE inventory_id = ? ORDER BY pool, position',
    [inventoryId],
  );
  for (const { pool, label, year } of rows) {
    const known = pools.get(pool);
    if (known === undefined) pools.set(pool, { label, years: [year] });
    else known.years.push(year);
  }
  const texts = new Map(
    [...pools].map(([pool, { label, years }]) => [
      pool,
      {
        years: years.join(' '),
        text: `${label}: ${String(years.length)} years, ${String(Math.min(...years))} to ${String(Math.max(...years))}`,
      },
    ]),
  );
  const { at, pool } = await db.columns(
    'SELECT building_index AS at, year_pool AS pool FROM building WHERE inventory_id = ? AND year_pool IS NOT NULL',
    { at: 'i32', pool: 'i32' },
    [inventoryId],
  );
  const read = new Map<number, PoolText>();
  at.forEach((index, i) => {
    const text = texts.get(pool[i]!);
    if (text !== undefined) read.set(index, text);
  });
  return read;
}

const NUMBER_KINDS: ReadonlySet<string> = new Set(['number', 'whole', 'year']);
const KIND_OF = new Map(COLUMNS.map(({ name, kind }) => [name, NUMBER_KINDS.has(kind) ? 'f64' : 'text'] as const));

/** Values by column, at the index of the building. */
async function readValues(
  { db, inventoryId, buildings }: InventorySide,
  names: readonly string[],
): Promise<ReadonlyMap<string, readonly Value[]>> {
  const spec = Object.fromEntries(names.map((name) => [name, KIND_OF.get(name) ?? 'text'] as const));
  const read = (await db.columns(
    `SELECT building_index, ${names.map(quoteName).join(', ')} FROM building WHERE inventory_id = ?`,
    { building_index: 'i32', ...spec },
    [inventoryId],
  )) as unknown as Readonly<Record<string, ArrayLike<number> | readonly (string | null)[]>>;
  const at = read['building_index'] as ArrayLike<number>;
  return new Map(
    names.map((name) => {
      const values = read[name]!;
      const placed = new Array<Value>(buildings).fill(null);
      for (let i = 0; i < at.length; i += 1) {
        const value = values[i] ?? null;
        placed[at[i]!] = typeof value === 'number' && Number.isNaN(value) ? null : value;
      }
      return [name, placed];
    }),
  );
}
