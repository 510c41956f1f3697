/** Buildings of an inventory out of the database, by column. */
import { BUILDING_NUMBERS, BUILDING_WORDS } from '../engineering/building-columns.js';
import type { BuildingColumns, YearPools } from '../engineering/building-columns.js';
import { quoteName } from '../store/sql.js';
import type { Database } from '../store/database.js';
import type { ColumnKind } from '../store/vectors.js';
import type { IndexRange } from '../store/chunks.js';

const SPEC: Readonly<Record<string, ColumnKind>> = {
  id: 'text',
  not_ranked: 'text',
  ...Object.fromEntries(BUILDING_NUMBERS.map((name) => [name, 'f64'] as const)),
  ...Object.fromEntries(BUILDING_WORDS.map((name) => [name, 'text'] as const)),
};

export interface BuildingBlock {
  readonly columns: BuildingColumns;
  /** Reason of the inventory why a building cannot be ranked, or null. */
  readonly notRanked: readonly (string | null)[];
  readonly rows: number;
}

/** The buildings of one range of indices; with `every` above 1 only those whose index it divides. */
export async function readBuildings(
  db: Database,
  inventoryId: string,
  { from, to }: IndexRange,
  every = 1,
): Promise<BuildingBlock> {
  const names = Object.keys(SPEC).map(quoteName).join(', ');
  const read = await db.columns(
    `SELECT ${names} FROM building WHERE inventory_id = ? AND building_index >= ? AND building_index < ?
     AND building_index % ? = 0 ORDER BY building_index`,
    SPEC,
    [inventoryId, from, to, every],
  );
  const arrays = read as unknown as Readonly<Record<string, unknown>>;
  const pick = (list: readonly string[]): Readonly<Record<string, unknown>> =>
    Object.fromEntries(list.map((name) => [name, arrays[name]]));
  return {
    columns: {
      id: arrays['id'] as readonly string[],
      numbers: pick(BUILDING_NUMBERS) as unknown as BuildingColumns['numbers'],
      words: pick(BUILDING_WORDS) as unknown as BuildingColumns['words'],
    },
    notRanked: arrays['not_ranked'] as readonly (string | null)[],
    rows: read.rowCount,
  };
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
