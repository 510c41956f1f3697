/** What the study's money buys, and what assessing the whole list would cost, told with the run itself. */
import type { BudgetOutlook } from '../engineering/page-contract.js';
import { UserError } from '../errors.js';
import type { Database } from '../store/database.js';
import type { LoadedStudy } from '../study/load.js';
import { budgetOfRun, costOfList } from './budget-plan.js';

/** Larger inventories are asked on demand (`budget`). */
const MOST_BUILDINGS = 50_000;
/** Assessments told with the run. */
const TOLD = 25;

/** The choice of run `run`, kept already, by the money of the study if it names any; null where the inventory is too large. */
export async function budgetOutlook(
  db: Database,
  loaded: LoadedStudy,
  run: number,
  buildings: number,
): Promise<BudgetOutlook | null> {
  if (buildings > MOST_BUILDINGS) return null;
  const { money } = loaded.study.budget ?? {};
  const list = await costOfList(db, loaded, run);
  if (money === undefined) return { ...list, plan: null, problem: null };
  try {
    const plan = await budgetOfRun(db, loaded, run, money);
    const { spent, left, gap, chosen, of_list, on_list, overrides, mobilisation } = plan;
    const decided = new Set(overrides.map(({ id }) => id));
    return {
      ...list,
      problem: null,
      plan: {
        ...{ money, spent, left, gap, of_list, on_list },
        count: chosen.length,
        mobilisation: mobilisation?.cost ?? 0,
        excluded: overrides.filter(({ what }) => what === 'exclude').length,
        chosen: chosen.slice(0, TOLD).map(({ id, name, group, rank, chance, cost }) => ({
          ...{ id, name, group, rank, chance, cost },
          must: decided.has(id),
        })),
      },
    };
  } catch (error) {
    // the ranking stands whatever is wrong with the budget
    if (error instanceof UserError) return { ...list, plan: null, problem: error.message };
    throw error;
  }
}
