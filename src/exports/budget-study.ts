/** The assessments that a sum of money buys out of a kept run of a study, as plain data and as a table for a spreadsheet. */
import { UserError } from '../errors.js';
import { chosenRun, withStudyDatabase } from '../runs/open.js';
import type { RunChoice } from '../runs/open.js';
import { budgetOfRun } from '../screening/budget-plan.js';
import type { BudgetBuilding, BudgetPlan } from '../screening/budget-plan.js';
import { csvText } from './csv-text.js';
import { loadStudyAlone } from '../study/load.js';
import { NamedFile } from './write-named.js';

export interface BudgetStudyOptions extends Pick<RunChoice, 'run'> {
  /** Write the choice there as CSV. */
  readonly csv?: string | undefined;
}

/**
 * Chooses the assessments that `money` buys out of a kept run of the study at `path`, the newest when none is named: the largest sum of
 * chance × priority within the money, by the costs, musts, must-nots and batches of the study's section `budget` as it stands now.
 * @param money a sum in the study's currency, over 0, at most 1e12; that of the study's budget when left out.
 * @returns plain data; `bound` is what no choice within the money exceeds, `gap` how far below it this one is at most.
 * @throws UserError for money that is no sum, a building on the study's lists that the run does not have, and musts that cost more than the money.
 * @example
 * const { chosen, spent, gap } = await budgetStudy('study.yaml', 180_000);
 */
export async function budgetStudy(path: string, money?: number, options: BudgetStudyOptions = {}): Promise<BudgetPlan> {
  const csv = await NamedFile.claimAny(options.csv, '--csv', { study: await loadStudyAlone(path) });
  const plan = await withStudyDatabase(path, async (db, loaded) => {
    const { run } = await chosenRun(db, loaded, options);
    const sum = money ?? loaded.study.budget?.money;
    if (sum === undefined)
      throw new UserError('no sum of money: give one with --money, or as money in the budget of the study');
    return budgetOfRun(db, loaded, run, sum);
  });
  await csv?.write(budgetCsv(plan));
  return plan;
}

const HEAD = ['id', 'name', 'group', 'decision', 'rank', 'chance', 'priority', 'worth', 'cost', 'cost_from'];

/** The chosen by rank, then those the study leaves out; reason and author where someone decided. */
function budgetCsv({ chosen, overrides }: BudgetPlan): string {
  const decided = new Map(overrides.map((entry) => [entry.id, entry]));
  const row = (one: BudgetBuilding, decision: string): (string | number | null)[] => {
    const override = decided.get(one.id);
    const { id, name, group, rank, chance, priority, value, cost, cost_from, not_ranked } = one;
    return [
      ...[id, name, group, decision, rank, chance, priority, value, cost, cost_from, not_ranked],
      override?.reason ?? null,
      override?.author ?? null,
    ];
  };
  return csvText(
    [...HEAD, 'not_ranked', 'reason', 'author'],
    [
      ...chosen.map((one) => row(one, decided.has(one.id) ? 'must include' : 'chosen')),
      ...overrides.filter(({ what }) => what === 'exclude').map((one) => row(one, 'must exclude')),
    ],
  );
}
