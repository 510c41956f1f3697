/** Every pair of neighbours of a run against the gap it needs, those that lack most first. */
import { buildingReader } from '../engineering/building-columns.js';
import { closenessOf, swayOf } from '../engineering/assess/neighbours.js';
import type { Sway } from '../engineering/assess/neighbours.js';
import type { AssessContext } from '../engineering/assess/context.js';
import type { GapPair, PageGaps } from '../engineering/page-contract.js';
import { Bug } from '../errors.js';
import { measureGaps } from '../inventory/gaps.js';
import type { Measured } from '../inventory/gaps.js';
import type { Database } from '../store/database.js';
import { REACH_M } from './neighbours.js';
import { readBuildings, readPools } from './read-buildings.js';
import type { RunOf } from './sites.js';

/** Outlines and given pairs up to which every building is worked; above, those of the list. */
const ALL_UP_TO = 20_000;
/** Places of the list worked of a large inventory. */
const LISTED_AT_MOST = 1000;
/** Outlines read around them; so many stand about a thousand places only where coordinates are heaped. */
const NEAR_AT_MOST = 100_000;
/** Some seconds of comparing walls; ordinary outlines need a tenth of it. */
const STEPS = 200_000_000;

export interface GapLimits {
  readonly allUpTo?: number;
  readonly listedAtMost?: number;
  readonly steps?: number;
}

interface Pair {
  readonly a: number;
  readonly b: number;
  readonly gap_m: number;
  readonly given: boolean;
  readonly floors_aligned: 'yes' | 'no' | null;
}

/** Short ones first, then by what is lacking of the gap for both to sway, then of that by height. */
function byLack(one: GapPair, other: GapPair): number {
  return (
    Number(isShort(other)) - Number(isShort(one)) ||
    other.needed_m - other.gap_m - (one.needed_m - one.gap_m) ||
    other.by_height_m - other.gap_m - (one.by_height_m - one.gap_m) ||
    (one.id_a < other.id_a ? -1 : one.id_a > other.id_a ? 1 : one.id_b < other.id_b ? -1 : 1)
  );
}

/** True where the gap is short by what both sway or by the height rule. */
export function isShort({ gap_m, needed_m, by_height_m }: GapPair): boolean {
  return gap_m < needed_m || gap_m < by_height_m;
}

/**
 * Weighs every pair of neighbours of run `run`: those of the table of neighbours and those whose outlines are within two metres. Null, and at no
 * cost, where the inventory has neither.
 */
export async function gapsOf(
  db: Database,
  run: RunOf,
  listSize: number,
  contextOf: () => AssessContext,
  { allUpTo = ALL_UP_TO, listedAtMost = LISTED_AT_MOST, steps = STEPS }: GapLimits = {},
): Promise<PageGaps | null> {
  const { run_id, inventory_id } = run;
  const number = await db.value('SELECT inventory_number FROM inventory WHERE inventory_id = ?', [inventory_id]);
  if (typeof number !== 'number') throw new Bug(`inventory ${inventory_id} is not in the database`);
  const outlines = Number(
    await db.value('SELECT count(*) FROM building_extra WHERE inventory_number = ? AND footprint IS NOT NULL', [
      number,
    ]),
  );
  const pairs = Number(await db.value('SELECT count(*) FROM neighbour WHERE inventory_id = ?', [inventory_id]));
  if (outlines < 2 && pairs === 0) return null;
  const all = outlines + pairs <= allUpTo;
  const listed = Math.min(listSize, listedAtMost);
  if (!all)
    await db.run(
      'CREATE OR REPLACE TEMP TABLE gap_listed AS SELECT building_index FROM result_ranked WHERE run_id = ? AND "rank" <= ?',
      [run_id, listed],
    );
  const measured = await measuredPairs(db, number, all, steps);
  const found = await withGiven(db, { number, inventory_id }, all, measured.pairs);
  const { rows, unknown } = await weighed(db, run, number, found, contextOf());
  if (!all) await db.run('DROP TABLE gap_listed');
  rows.sort(byLack);
  return {
    of: all ? 'all' : 'list',
    first: !all && listed < listSize ? listed : null,
    complete: measured.complete,
    alike: measured.alike,
    unknown,
    pairs: rows,
    short: rows.filter(isShort).length,
  };
}

/** Pairs of outlines within reach; where not `all`, those with a building of the table `gap_listed`. */
async function measuredPairs(
  db: Database,
  number: number,
  all: boolean,
  steps: number,
): Promise<Pick<Measured, 'complete' | 'alike'> & { readonly pairs: readonly Pair[] }> {
  if (!all) await layNear(db, number);
  const near = await db.columns(
    `SELECT e.building_index, e.footprint FROM building_extra e ${all ? '' : 'SEMI JOIN gap_near n ON n.building_index = e.building_index'}
     WHERE e.inventory_number = ? AND e.footprint IS NOT NULL ORDER BY e.building_index ${all ? '' : `LIMIT ${String(NEAR_AT_MOST + 1)}`}`,
    { building_index: 'i32', footprint: 'text' },
    [number],
  );
  const index = near.building_index;
  const wanted = new Uint8Array(near.rowCount).fill(all ? 1 : 0);
  if (!all) {
    const { at } = await db.columns('SELECT building_index AS at FROM gap_listed', { at: 'i32' });
    const isListed = new Set(at);
    index.forEach((one, i) => (wanted[i] = isListed.has(one) ? 1 : 0));
    await db.run('DROP TABLE gap_near');
  }
  const outlines = near.footprint.slice(0, all ? near.rowCount : NEAR_AT_MOST);
  const { gaps, complete, alike } = measureGaps(outlines, REACH_M, { wanted: (i) => wanted[i] === 1, steps });
  return {
    complete: complete && outlines.length === near.rowCount,
    alike,
    pairs: gaps.map(({ a, b, gap_m }) => ({ a: index[a]!, b: index[b]!, gap_m, given: false, floors_aligned: null })),
  };
}

/** Degrees of a strip of latitude, about 330 m: farther no two centres stand whose outlines meet. */
const STRIP = 0.003;

/**
 * Makes `gap_near`: buildings whose centre is so near that of a listed one that their outlines may meet, by their sides, with 30 m for a place that is
 * not the middle of its outline [judgement].
 */
async function layNear(db: Database, number: number): Promise<void> {
  const half = (of: string): string => `0.71 * coalesce(greatest(${of}.plan_length_m, ${of}.plan_width_m), 60)`;
  const reach = `least(${half('o')} + ${half('h')} + 30, 300) / 111000`;
  await db.run(
    `CREATE OR REPLACE TEMP TABLE gap_near AS SELECT DISTINCT o.building_index FROM
       (SELECT c.*, unnest([-1, 0, 1]) + CAST(floor(c.lat / ${String(STRIP)}) AS INTEGER) AS strip FROM building_core c
        SEMI JOIN gap_listed l ON l.building_index = c.building_index WHERE c.inventory_number = ? AND c.lat IS NOT NULL) h
     JOIN building_core o ON o.inventory_number = ? AND CAST(floor(o.lat / ${String(STRIP)}) AS INTEGER) = h.strip
     WHERE abs(o.lat - h.lat) <= ${reach} AND abs(o.lon - h.lon) * greatest(cos(radians(h.lat)), 0.01) <= ${reach}`,
    [number, number],
  );
}

/** The measured pairs with those of the table, which stand before what outlines say; of rows that disagree the least gap, and `no` before `yes`. */
async function withGiven(
  db: Database,
  { number, inventory_id }: { readonly number: number; readonly inventory_id: string },
  all: boolean,
  measured: readonly Pair[],
): Promise<readonly Pair[]> {
  const listed = 'IN (SELECT building_index FROM gap_listed)';
  const given = await db.columns(
    `SELECT least(x.building_index, y.building_index) AS a, greatest(x.building_index, y.building_index) AS b, min(n.gap_m) AS gap_m,
       min(n.floors_aligned) AS floors_aligned
     FROM neighbour n JOIN building_core x ON x.inventory_number = ? AND x.id = n.id_a
     JOIN building_core y ON y.inventory_number = ? AND y.id = n.id_b WHERE n.inventory_id = ?
     ${all ? '' : `AND (x.building_index ${listed} OR y.building_index ${listed})`} GROUP BY 1, 2 ORDER BY 1, 2`,
    { a: 'i32', b: 'i32', gap_m: 'f64', floors_aligned: 'text' },
    [number, number, inventory_id],
  );
  const key = (a: number, b: number): string => `${String(a)} ${String(b)}`;
  const pairs = new Map(measured.map((pair) => [key(pair.a, pair.b), pair]));
  for (let i = 0; i < given.rowCount; i += 1) {
    const [a, b, gap_m] = [given.a[i]!, given.b[i]!, given.gap_m[i]!];
    const floors_aligned = given.floors_aligned[i] as Pair['floors_aligned'];
    const other = pairs.get(key(a, b));
    if (!Number.isNaN(gap_m)) pairs.set(key(a, b), { a, b, gap_m, given: true, floors_aligned });
    else if (other !== undefined) pairs.set(key(a, b), { ...other, floors_aligned });
  }
  return [...pairs.values()];
}

/** What both buildings of every pair need; pairs with one that cannot be assessed are counted. */
async function weighed(
  db: Database,
  { run_id, inventory_id }: RunOf,
  number: number,
  pairs: readonly Pair[],
  context: AssessContext,
): Promise<{ readonly rows: GapPair[]; readonly unknown: number }> {
  await db.run('CREATE OR REPLACE TEMP TABLE gap_building (building_index INTEGER)');
  await db.appendTemporary('gap_building', [Int32Array.from(new Set(pairs.flatMap(({ a, b }) => [a, b])))]);
  const { columns, rows: count } = await readBuildings(
    db,
    inventory_id,
    { from: 0, to: 2 ** 31 - 1 },
    { places: true, among: 'gap_building' },
  );
  const told = await db.columns(
    `SELECT c.building_index, c.name, k."rank" FROM building_core c SEMI JOIN gap_building g ON g.building_index = c.building_index
     JOIN result_ranked k ON k.run_id = ? AND k.building_index = c.building_index WHERE c.inventory_number = ? ORDER BY c.building_index`,
    { building_index: 'i32', name: 'text', rank: 'f64' },
    [run_id, number],
  );
  await db.run('DROP TABLE gap_building');
  if (told.rowCount !== count) throw new Bug(`read ${String(count)} of ${String(told.rowCount)} neighbours`);
  const read = buildingReader(columns, await readPools(db, inventory_id));
  const placeOf = new Map<number, number>();
  told.building_index.forEach((index, i) => placeOf.set(index, i));
  const sways = new Map<number, Sway | null>();
  const swayAt = (i: number): Sway | null => {
    let sway = sways.get(i);
    if (sway === undefined) {
      sway = swayOf(read(i), context);
      sways.set(i, sway);
    }
    return sway;
  };
  const rankAt = (i: number): number | null => (Number.isNaN(told.rank[i]!) ? null : told.rank[i]!);
  const rows: GapPair[] = [];
  let unknown = 0;
  for (const { a, b, gap_m, given, floors_aligned } of pairs) {
    const [i, j] = [placeOf.get(a)!, placeOf.get(b)!];
    const [one, other] = [swayAt(i), swayAt(j)];
    if (one === null || other === null) {
      unknown += 1;
      continue;
    }
    const closeness = closenessOf(one, other, { gap_m, how: given ? 'given' : 'measured', floors_aligned });
    rows.push({
      id_a: one.id,
      id_b: other.id,
      name_a: told.name[i] ?? null,
      name_b: told.name[j] ?? null,
      rank_a: rankAt(i),
      rank_b: rankAt(j),
      gap_m,
      gap_from: given ? 'given' : 'measured',
      floors_aligned,
      needed_m: closeness.needed_m,
      double_difference_m: closeness.double_difference_m,
      by_height_m: closeness.by_height_m,
      much_taller: closeness.muchTaller,
    });
  }
  return { rows, unknown };
}
