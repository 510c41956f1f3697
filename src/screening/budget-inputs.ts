/** What the choice within a budget stands on: worth and cost of every building of a run, and whom the study puts in or leaves out. */
import type { BudgetItems } from '../engineering/priority/budget.js';
import { UserError, showValue } from '../errors.js';
import type { Database } from '../store/database.js';
import type { LoadedStudy } from '../study/load.js';
import { nearestFew } from '../study/nearest.js';

/** Amounts are counted in hundredths, so that sums are exact. */
export const COINS = 100;

/** Where the cost of an assessment comes from. */
export type CostFrom = 'inventory' | 'floor area' | 'median floor area';

/** By building of the inventory; NaN, and a rank of 0 or less, where it is not ranked. */
export interface BudgetColumns {
  readonly count: number;
  readonly chance: Float64Array;
  readonly priority: Float64Array;
  readonly rank: Int32Array;
  readonly cost: Float64Array;
  readonly costFrom: readonly CostFrom[];
  readonly group: readonly (string | null)[];
}

/** An amount in coins. */
export function coins(amount: number): number {
  return Math.round(amount * COINS);
}

/** Worth and cost of all buildings of a run; the cost is the inventory's where it has one, else that of the model. */
export async function readBudgetColumns(
  db: Database,
  run: number,
  inventory: number,
  count: number,
  { fixed, per_m2, least }: { readonly fixed: number; readonly per_m2: number; readonly least: number },
): Promise<BudgetColumns> {
  const ranks = await db.columns(
    'SELECT building_index AS at, "rank", chance, priority FROM result_ranked WHERE run_id = ?',
    { at: 'i32', rank: 'i32', chance: 'f64', priority: 'f64' },
    [run],
  );
  const core = await db.columns(
    'SELECT building_index AS at, floor_area_m2 AS area, "group" FROM building_core WHERE inventory_number = ?',
    { at: 'i32', area: 'f64', group: 'text' },
    [inventory],
  );
  const given = await db.columns(
    'SELECT building_index AS at, assessment_cost AS cost FROM building_extra WHERE inventory_number = ? AND assessment_cost IS NOT NULL',
    { at: 'i32', cost: 'f64' },
    [inventory],
  );
  const area = new Float64Array(count).fill(NaN);
  const group = new Array<string | null>(count).fill(null);
  core.at.forEach((at, i) => {
    area[at] = core.area[i]!;
    group[at] = core.group[i]!;
  });
  const known = area.filter((value) => value > 0).sort();
  const median = known.length === 0 ? 0 : known[Math.floor((known.length - 1) / 2)]!;
  const cost = new Float64Array(count);
  const costFrom = new Array<CostFrom>(count).fill('floor area');
  for (let at = 0; at < count; at += 1) {
    // an unknown size is no small one
    if (!(area[at]! > 0)) costFrom[at] = 'median floor area';
    // in whole units: a model does not know more
    cost[at] = Math.max(least, Math.round(fixed + per_m2 * (area[at]! > 0 ? area[at]! : median)));
  }
  given.at.forEach((at, i) => {
    cost[at] = given.cost[i]!;
    costFrom[at] = 'inventory';
  });
  const chance = new Float64Array(count).fill(NaN);
  const priority = new Float64Array(count).fill(NaN);
  const rank = new Int32Array(count);
  ranks.at.forEach((at, i) => {
    chance[at] = ranks.chance[i]!;
    priority[at] = ranks.priority[i]!;
    rank[at] = ranks.rank[i]!;
  });
  return { count, chance, priority, rank, cost: cost.map((one) => coins(one) / COINS), costFrom, group };
}

/** A building that the study puts in or leaves out. */
export interface Override {
  readonly at: number;
  readonly what: 'include' | 'exclude';
  readonly reason: string;
  readonly author: string | null;
}

/** Ids read for a guess at what an unknown one was meant to be. */
const GUESSED_AMONG = 20_000;

/** Whom the study puts in or leaves out. @throws UserError for every building that the run does not have. */
export async function readOverrides(
  db: Database,
  { study: { budget }, placeOf }: LoadedStudy,
  run: number,
  inventory: number,
  buildings: number,
): Promise<readonly Override[]> {
  const asked = (['include', 'exclude'] as const).flatMap((what) =>
    (budget?.[what] ?? []).map((entry, i) => ({ what, ...entry, path: ['budget', what, i, 'id'] as const })),
  );
  if (asked.length === 0) return [];
  const found = new Map<string, number>();
  for (const { id } of asked) {
    const at = await db.value('SELECT building_index FROM building_core WHERE inventory_number = ? AND id = ?', [
      inventory,
      id,
    ]);
    if (typeof at === 'number') found.set(id, at);
  }
  const unknown = asked.filter(({ id }) => !found.has(id));
  if (unknown.length > 0) {
    const ids =
      buildings > GUESSED_AMONG
        ? []
        : (await db.columns('SELECT id FROM building_core WHERE inventory_number = ?', { id: 'text' }, [inventory])).id;
    const known = ids.filter((id) => id !== null);
    throw UserError.of(
      unknown.map(({ id, path }) => {
        const [guess] = nearestFew(id, known, 1);
        const hint = guess === undefined ? 'ids are those of ranking.csv' : `did you mean ${showValue(guess)}?`;
        return { place: placeOf(path), message: `run ${String(run)} has no building ${showValue(id)}; ${hint}` };
      }),
    );
  }
  return asked.map(({ id, what, reason, author }) => ({ at: found.get(id)!, what, reason, author: author ?? null }));
}

/** The items of the choice; who is less likely than `leastChance` is left out, unless it must be in. */
export function itemsOf(columns: BudgetColumns, named: readonly Override[], leastChance: number): BudgetItems {
  const { count, chance, priority, cost, group } = columns;
  const value = new Float64Array(count);
  const must = new Int8Array(count);
  const batch = new Int32Array(count);
  const numbers = new Map<string, number>();
  for (let at = 0; at < count; at += 1) {
    const worth = chance[at]! * priority[at]!;
    value[at] = worth > 0 ? worth : 0;
    // nobody is taken along for convenience alone
    if (!(chance[at]! >= leastChance)) must[at] = -1;
    const name = group[at]!;
    if (name === null) batch[at] = -1;
    else {
      let number = numbers.get(name);
      if (number === undefined) numbers.set(name, (number = numbers.size));
      batch[at] = number;
    }
  }
  for (const { at, what } of named) must[at] = what === 'include' ? 1 : -1;
  return { value, cost: cost.map(coins), batch, must };
}
