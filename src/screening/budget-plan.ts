/** The assessments that a sum of money buys, out of a kept run: which, at what cost, and how far from the best possible at most. */
import { chooseWithin, costOfMusts } from '../engineering/priority/budget.js';
import type { BudgetChoice, BudgetItems } from '../engineering/priority/budget.js';
import { Bug, UserError } from '../errors.js';
import type { Database } from '../store/database.js';
import { COST_DEFAULTS } from '../study/budget-schema.js';
import type { BudgetStudy } from '../study/budget-schema.js';
import type { LoadedStudy } from '../study/load.js';
import { COINS, coins, itemsOf, readBudgetColumns, readOverrides } from './budget-inputs.js';
import type { BudgetColumns, CostFrom } from './budget-inputs.js';

/** Sums of hundredths up to it are exact. */
const MOST_MONEY = 1e12;

/** Below this chance of belonging to the list an assessment buys little [judgement]; said, not acted on. */
export const UNLIKELY = 0.05;

export interface BudgetBuilding {
  readonly id: string;
  readonly name: string | null;
  readonly group: string | null;
  /** Null where it is not ranked. */
  readonly rank: number | null;
  readonly chance: number | null;
  readonly priority: number | null;
  /** Chance × priority, 0 where not ranked. */
  readonly value: number;
  readonly cost: number;
  readonly cost_from: CostFrom;
  /** Why it is not ranked, or null. */
  readonly not_ranked: string | null;
}

/** A building that the study puts in or leaves out, with the reason. */
export interface BudgetOverride extends BudgetBuilding {
  readonly what: 'include' | 'exclude';
  readonly reason: string;
  readonly author: string | null;
}

export interface BudgetBatch {
  /** Null: a building without a block. */
  readonly group: string | null;
  readonly buildings: number;
  readonly value: number;
  /** Assessments and mobilisation. */
  readonly cost: number;
}

export interface BudgetPlan {
  readonly run: number;
  readonly list_size: number;
  readonly ranked: number;
  readonly currency: string | null;
  readonly money: number;
  readonly spent: number;
  readonly left: number;
  readonly cost_model: {
    readonly fixed: number;
    readonly per_m2: number;
    readonly least: number;
    readonly source: 'study' | 'judgement';
  };
  readonly mobilisation: { readonly cost: number; readonly least_chance: number } | null;
  /** Sum of chance × priority of the chosen, and what no choice within the money exceeds. */
  readonly value: number;
  readonly bound: number;
  /** The choice is at most this share below the best possible: (bound - value) / bound. */
  readonly gap: number;
  readonly start: BudgetChoice['start'];
  /** By rank, those not ranked last. */
  readonly chosen: readonly BudgetBuilding[];
  readonly overrides: readonly BudgetOverride[];
  /** By falling value; none without mobilisation. */
  readonly batches: readonly BudgetBatch[];
  /** Chosen buildings that stand on the list, and how many do in all. */
  readonly of_list: number;
  readonly on_list: number;
  /** Chosen with a chance of belonging below 0.05, the musts left out. */
  readonly unlikely: number;
  /** What the cheapest assessment beyond the musts costs, mobilisation included; null where none is left to choose. */
  readonly cheapest: number | null;
}

/**
 * Chooses the assessments that `money` buys in run `run` by the budget of the study.
 * @throws UserError for money that is no sum, unknown buildings on the study's lists, and musts that cost more than the money.
 */
export async function budgetOfRun(db: Database, loaded: LoadedStudy, run: number, money: number): Promise<BudgetPlan> {
  if (!(money > 0 && money <= MOST_MONEY))
    throw new UserError(`expected a sum over 0, at most ${String(MOST_MONEY)}; got ${String(money)}`, { key: 'money' });
  const about = await aboutRun(db, run);
  const inventory = Number(
    await db.value('SELECT inventory_number FROM inventory WHERE inventory_id = ?', [about.inventory_id]),
  );
  const budget: Partial<BudgetStudy> = loaded.study.budget ?? {};
  const model = budget.cost ?? COST_DEFAULTS;
  const columns = await readBudgetColumns(db, run, inventory, about.buildings, model);
  const named = await readOverrides(db, loaded, run, inventory, about.buildings);
  const { batches } = budget;
  const mobilisation = coins(batches?.mobilisation ?? 0);
  const items = itemsOf(columns, named, batches?.least_chance ?? 0);
  const needed = costOfMusts(items, mobilisation);
  if (needed > coins(money)) throw tooLittle(loaded, budget, needed, money);
  const choice = chooseWithin(items, coins(money), mobilisation);
  const chosen = [...choice.chosen].sort((a, b) => place(columns.rank[a]!) - place(columns.rank[b]!) || a - b);
  const shown = await buildingsAt(db, run, inventory, columns, [...chosen, ...named.map(({ at }) => at)]);
  const must = (at: number): boolean => items.must[at]! > 0;
  return {
    run,
    list_size: about.list_size,
    ranked: about.ranked,
    currency: budget.currency ?? null,
    money,
    spent: choice.cost / COINS,
    left: (coins(money) - choice.cost) / COINS,
    cost_model: { ...model, source: budget.cost === undefined ? 'judgement' : 'study' },
    mobilisation: batches === undefined ? null : { cost: batches.mobilisation, least_chance: batches.least_chance },
    value: choice.value,
    bound: choice.bound,
    gap: choice.bound > 0 ? (choice.bound - choice.value) / choice.bound : 0,
    start: choice.start,
    chosen: chosen.map((at) => shown(at)),
    overrides: named.map(({ at, what, reason, author }) => ({ ...shown(at), what, reason, author })),
    batches: batches === undefined ? [] : batchesOf(chosen, columns, items, batches.mobilisation),
    of_list: chosen.filter((at) => place(columns.rank[at]!) <= about.list_size).length,
    on_list: Math.min(about.list_size, about.ranked),
    unlikely: chosen.filter((at) => !must(at) && columns.chance[at]! < UNLIKELY).length,
    cheapest: cheapestOf(items, mobilisation),
  };
}

/** What assessing every building on the list of run `run` costs by the costs of the study; mobilisations are left out. */
export async function costOfList(
  db: Database,
  { study }: LoadedStudy,
  run: number,
): Promise<{
  readonly list_cost: number;
  readonly currency: string | null;
  readonly cost_source: 'study' | 'judgement';
}> {
  const { inventory_id, buildings, list_size } = await aboutRun(db, run);
  const inventory = Number(
    await db.value('SELECT inventory_number FROM inventory WHERE inventory_id = ?', [inventory_id]),
  );
  const { cost, currency }: Partial<BudgetStudy> = study.budget ?? {};
  const columns = await readBudgetColumns(db, run, inventory, buildings, cost ?? COST_DEFAULTS);
  let sum = 0;
  for (let at = 0; at < columns.count; at += 1)
    if (place(columns.rank[at]!) <= list_size) sum += coins(columns.cost[at]!);
  return {
    list_cost: sum / COINS,
    currency: currency ?? null,
    cost_source: cost === undefined ? 'judgement' : 'study',
  };
}

async function aboutRun(db: Database, run: number) {
  const [about] = await db.rows<{ inventory_id: string; buildings: number; ranked: number; list_size: number }>(
    'SELECT inventory_id, buildings, ranked, list_size FROM run WHERE run_id = ?',
    [run],
  );
  if (about === undefined) throw new UserError(`there is no run ${String(run)}; swaymark runs lists them`);
  return about;
}

/** The rank, behind all others where there is none. */
function place(rank: number): number {
  return rank > 0 ? rank : Infinity;
}

function tooLittle(loaded: LoadedStudy, budget: Partial<BudgetStudy>, needed: number, money: number): UserError {
  const count = budget.include?.length ?? 0;
  const word = budget.currency === undefined ? '' : ` ${budget.currency}`;
  const what =
    count === 1
      ? 'the building that must be included costs'
      : `the ${String(count)} buildings that must be included cost`;
  return new UserError(
    `${what} ${String(needed / COINS)}${word}${budget.batches === undefined ? '' : ', mobilisation included'}; the money is ${String(money)}: raise it or shorten the list`,
    loaded.placeOf(['budget', 'include']),
  );
}

function cheapestOf({ cost, must, value }: BudgetItems, mobilisation: number): number | null {
  let least = Infinity;
  for (let i = 0; i < cost.length; i += 1)
    if (must[i] === 0 && value[i]! > 0) least = Math.min(least, cost[i]! + mobilisation);
  return least === Infinity ? null : least / COINS;
}

function batchesOf(
  chosen: readonly number[],
  { group, cost }: BudgetColumns,
  { value }: BudgetItems,
  mobilisation: number,
): readonly BudgetBatch[] {
  const found = new Map<string | number, BudgetBatch>();
  for (const at of chosen) {
    const key = group[at] ?? at;
    const before = found.get(key) ?? { group: group[at]!, buildings: 0, value: 0, cost: mobilisation };
    found.set(key, {
      ...before,
      buildings: before.buildings + 1,
      value: before.value + value[at]!,
      cost: before.cost + cost[at]!,
    });
  }
  return [...found.values()].sort((a, b) => b.value - a.value);
}

/** Buildings asked for in one statement. */
const ASKED = 1000;

/** Reads the words about some buildings. @returns how to show each of them. */
async function buildingsAt(
  db: Database,
  run: number,
  inventory: number,
  { chance, priority, rank, cost, costFrom, group }: BudgetColumns,
  indices: readonly number[],
): Promise<(at: number) => BudgetBuilding> {
  const words = new Map<
    number,
    { readonly id: string; readonly name: string | null; readonly not_ranked: string | null }
  >();
  for (let from = 0; from < indices.length; from += ASKED) {
    const some = indices.slice(from, from + ASKED).join(', ');
    const rows = await db.rows<{ at: number; id: string; name: string | null; not_ranked: string | null }>(
      `SELECT b.building_index AS at, b.id, b.name, r.not_ranked FROM building_core b
       LEFT JOIN result r ON r.building_index = b.building_index AND r.run_id = ?
       WHERE b.inventory_number = ? AND b.building_index IN (${some})`,
      [run, inventory],
    );
    for (const { at, ...row } of rows) words.set(at, row);
  }
  const known = (value: number): number | null => (Number.isNaN(value) ? null : value);
  return (at) => {
    const found = words.get(at);
    if (found === undefined) throw new Bug(`building ${String(at)} of the choice was not read`);
    const worth = chance[at]! * priority[at]!;
    return {
      ...found,
      group: group[at]!,
      rank: rank[at]! > 0 ? rank[at]! : null,
      chance: known(chance[at]!),
      priority: known(priority[at]!),
      value: worth > 0 ? worth : 0,
      cost: cost[at]!,
      cost_from: costFrom[at]!,
    };
  };
}
