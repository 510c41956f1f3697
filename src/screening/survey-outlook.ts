/** What a survey would do to the list of a run, told with the run itself. */
import type { SurveyOutlook } from '../engineering/page-contract.js';
import type { Visit } from '../engineering/priority/campaign.js';
import type { Database } from '../store/database.js';
import type { Study } from '../study/schema.js';
import { planOn } from './survey.js';
import type { SurveyBasis } from './survey.js';

/** Larger inventories plan on demand (`survey`): weighing thousands of buildings takes longer than ranking them. */
const MOST_BUILDINGS = 50_000;
/** A week of visits [judgement]. */
const WEEK_H = 40;
/** How far the plan looks for the hours that halve the wrong places. */
const REACH_H = 200;
/** Visits told with the run. */
const TOLD = 15;

/** The visits of a study with what they cost in all. */
export function visitsOf({ survey }: Pick<Study, 'survey'>): readonly Visit[] {
  return Object.entries(survey.visits).map(([name, { hours, money, finds }]) => ({
    name,
    hours,
    money: money + hours * survey.money_per_hour,
    finds,
  }));
}

/** A week of visits planned, and the hours that would halve the wrong places; null where no list is drawn up or the inventory is too large. */
export async function surveyOutlook(
  db: Database,
  basis: SurveyBasis,
  study: Pick<Study, 'survey'>,
): Promise<SurveyOutlook | null> {
  if (basis.count > MOST_BUILDINGS || basis.assessed.id.length <= basis.listSize) return null;
  const limits = { hours: REACH_H, money: Infinity };
  const plan = await planOn(db, basis, { visits: visitsOf(study), limits });
  const half = 0.5 * plan.expected_wrong_before;
  const week = plan.steps.filter(({ hours_so_far }) => hours_so_far <= WEEK_H + 1e-9);
  return {
    hours: week.at(-1)?.hours_so_far ?? 0,
    visits: week.length,
    buildings: new Set(week.map(({ id }) => id)).size,
    expected_wrong_before: plan.expected_wrong_before,
    expected_wrong_after: week.at(-1)?.expected_wrong_places ?? plan.expected_wrong_before,
    halving_hours: plan.steps.find(({ expected_wrong_places }) => expected_wrong_places <= half)?.hours_so_far ?? null,
    reach_hours: plan.hours,
    reach_wrong: plan.expected_wrong_after,
    least_wrong: plan.expected_wrong_least,
    buildings_of_80_percent: plan.buildings_of_80_percent,
    // only a refresh stands on an inventory of before
    ...(plan.answered_at === 0 ? {} : { answered_at: plan.answered_at }),
    ...(plan.withdrawn_at === 0 ? {} : { withdrawn_at: plan.withdrawn_at }),
    buildings_of_99_percent: plan.buildings_of_99_percent,
    steps: week.slice(0, TOLD),
  };
}
