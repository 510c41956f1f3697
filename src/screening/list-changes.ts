/** How the list of one run differs from that of another over the same buildings: who entered, who left. */
import type { Database } from '../store/database.js';

/** Ranks by building of an inventory, 0 or less where not ranked, and how many places the list has. */
export interface Ranks {
  readonly rank: Int32Array;
  readonly listSize: number;
}

/** A building that is on one list only. */
export interface ListMove {
  readonly id: string;
  readonly name: string | null;
  /** Its rank before and now; null where it was not ranked. */
  readonly rank_before: number | null;
  readonly rank: number | null;
}

export interface ListChange {
  /** Buildings on both lists. */
  readonly overlap: number;
  readonly places_before: number;
  readonly places: number;
  /** In the order of their ranks now, and in that of their ranks before. */
  readonly entered: readonly ListMove[];
  readonly left: readonly ListMove[];
}

/** The ranks of a kept run. */
export async function ranksOfRun(db: Database, runId: number, buildings: number, listSize: number): Promise<Ranks> {
  const { at, rank } = await db.columns(
    'SELECT building_index AS at, "rank" FROM result_ranked WHERE run_id = ?',
    { at: 'i32', rank: 'i32' },
    [runId],
  );
  const ranks = new Int32Array(buildings);
  for (let i = 0; i < at.length; i += 1) ranks[at[i]!] = rank[i]!;
  return { rank: ranks, listSize };
}

/** The change from `before` to `now`, two rankings of the inventory `inventoryId`. */
export async function listChange(db: Database, inventoryId: string, before: Ranks, now: Ranks): Promise<ListChange> {
  const onList = ({ rank, listSize }: Ranks, at: number): boolean => rank[at]! > 0 && rank[at]! <= listSize;
  const entered: number[] = [];
  const left: number[] = [];
  let overlap = 0;
  for (let at = 0; at < now.rank.length; at += 1) {
    const was = onList(before, at);
    if (onList(now, at)) {
      if (was) overlap += 1;
      else entered.push(at);
    } else if (was) left.push(at);
  }
  entered.sort((a, b) => now.rank[a]! - now.rank[b]!);
  left.sort((a, b) => before.rank[a]! - before.rank[b]!);
  const names = await namesOf(db, inventoryId, [...entered, ...left]);
  const ranked = (rank: number): number | null => (rank > 0 ? rank : null);
  const move = (at: number): ListMove => ({
    id: names.get(at)?.id ?? '',
    name: names.get(at)?.name ?? null,
    rank_before: ranked(before.rank[at]!),
    rank: ranked(now.rank[at]!),
  });
  return {
    overlap,
    places_before: overlap + left.length,
    places: overlap + entered.length,
    entered: entered.map(move),
    left: left.map(move),
  };
}

/** Buildings asked for in one statement. */
const ASKED = 1000;

async function namesOf(
  db: Database,
  inventoryId: string,
  indices: readonly number[],
): Promise<ReadonlyMap<number, { readonly id: string; readonly name: string | null }>> {
  const names = new Map<number, { readonly id: string; readonly name: string | null }>();
  for (let from = 0; from < indices.length; from += ASKED) {
    const rows = await db.rows<{ at: number; id: string; name: string | null }>(
      `SELECT building_index AS at, id, name FROM building_core
       WHERE inventory_number = (SELECT inventory_number FROM inventory WHERE inventory_id = ?)
         AND building_index IN (${indices.slice(from, from + ASKED).join(', ')})`,
      [inventoryId],
    );
    for (const { at, id, name } of rows) names.set(at, { id, name });
  }
  return names;
}
