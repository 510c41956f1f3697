/** The survey of a kept run: which building to visit next, for what, and what it does to the list. */
import { compileContext } from '../engineering/assess/context.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import { unknownsOf } from '../engineering/assess/unknowns.js';
import type { YearPools } from '../engineering/building-columns.js';
import { buildingReader } from '../engineering/building-columns.js';
import type { SurveyVisit } from '../engineering/page-contract.js';
import type { Candidate, Cost, Limits, PlannedVisit, Visit } from '../engineering/priority/campaign.js';
import { knownSet, bestCampaign, withinReach } from '../engineering/priority/campaign.js';
import type { Mixture } from '../engineering/priority/mixture.js';
import { commonTo, rankBasis } from '../engineering/priority/rank.js';
import type { RankBasis } from '../engineering/priority/rank.js';
import type { Unknown, Unknowns } from '../engineering/priority/learnable.js';
import type { Edge } from '../engineering/priority/survey-value.js';
import { shareOf } from '../engineering/priority/learnable.js';
import { KNOWN_CHANCE, edgeOf, mostWorth, worthOf } from '../engineering/priority/survey-value.js';
import { seenFromEdge } from '../engineering/priority/unknowns-from-edge.js';
import type { HazardGrids } from '../engineering/spectrum/grid.js';
import { UserError } from '../errors.js';
import { answersSince, failedVisits } from '../inventory/kept-answers.js';
import { indexRanges } from '../store/chunks.js';
import type { Database } from '../store/database.js';
import { assessAll } from './assess-all.js';
import type { Assessed } from './assess-all.js';
import type { Report } from './assess-inventory.js';
import { withAssessor } from './assess-inventory.js';
import { readGrids } from './kept-grids.js';
import { readRun } from './page-data.js';
import { readBuildings, readPools } from './read-buildings.js';

/** Buildings whose unknowns are weighed one by one; in larger inventories those that could be worth most. */
const MOST_CANDIDATES = 5_000;
/** Values under this share of the largest are none. */
const NOTHING = 1e-6;
const BLOCK = 65_536;

export interface SurveyWish {
  readonly visits: readonly Visit[];
  readonly limits: Limits;
}

/** One visit of the plan, with where its building stands and what it costs. */
export interface SurveyStep extends SurveyVisit {
  readonly lon: number | null;
  readonly lat: number | null;
  readonly hours: number;
  readonly money: number;
  readonly money_so_far: number;
}

export interface SurveyPlan {
  readonly run: number;
  readonly list_size: number;
  /** What its visits are weighed by. */
  readonly cost: Cost;
  readonly steps: readonly SurveyStep[];
  readonly buildings: number;
  readonly hours: number;
  readonly money: number;
  readonly expected_wrong_before: number;
  readonly expected_wrong_after: number;
  /** Were everything known of the weighed buildings that a visit can still find out. */
  readonly expected_wrong_least: number;
  /** Ranked buildings; those weighed one by one. */
  readonly ranked: number;
  readonly weighed: number;
  /** Only those that could be worth most were weighed. */
  readonly capped: boolean;
  /** Weighed buildings at which a visit failed to find something out: that kind of visit is not counted on for it again. */
  readonly failed_at: number;
  /** Buildings with answers that the run does not count yet: what they settle is not asked for. The next screening counts them. */
  readonly answered_at: number;
  /** Buildings of which the run counts answers that were withdrawn: the plan takes them as known still. */
  readonly withdrawn_at: number;
  /** Value of all that visits can still find out of every weighed building together, and how many buildings hold 80 % and 99 % of it. */
  readonly value_of_all: number;
  readonly buildings_of_80_percent: number;
  readonly buildings_of_99_percent: number;
}

/** What a plan stands on. */
export interface SurveyBasis {
  readonly runId: number;
  readonly inventoryId: string;
  readonly settings: AssessSettings;
  /** Grids of hazard that the settings name. */
  readonly grids: HazardGrids;
  readonly pools: YearPools;
  /** Buildings of the inventory. */
  readonly count: number;
  readonly listSize: number;
  readonly expectedWrong: number;
  readonly assessed: Assessed;
  /** How they rank: their mixtures as seen from the edge of the list. */
  readonly ranked: SurveyRanked;
}

export type SurveyRanked = Pick<RankBasis, 'order' | 'mixtures' | 'threshold' | 'draws'>;

/** Plans the survey of run `runId`. @throws UserError for an unknown run, or a list that holds every building. */
export async function planSurvey(
  db: Database,
  runId: number,
  wish: SurveyWish,
  report: Report = () => undefined,
): Promise<SurveyPlan> {
  const run = await readRun(db, runId);
  const { list_size: listSize, ranked: all, buildings: count, expected_wrong_places: expectedWrong } = run.summary;
  if (all <= listSize)
    throw new UserError(
      `the list of run ${String(runId)} holds all ${String(all)} ranked buildings: nothing a survey finds out changes it; set ranking.list_size lower`,
    );
  const { inventory_id: inventoryId, settings } = run;
  const pools = await readPools(db, inventoryId);
  const grids = await readGrids(db, settings);
  report('assessing', 0);
  const assessed = await withAssessor(count, async (assessor) => {
    assessor.begin(settings, pools, grids);
    return assessAll(db, inventoryId, null, count, assessor, grids.size > 0, settings, (done) => {
      report('assessing', done / count);
    });
  });
  const ranked = rankBasis(assessed, listSize, run.seed);
  const basis = { runId, inventoryId, settings, grids, pools, count, listSize, expectedWrong, assessed, ranked };
  return planOn(db, basis, wish, report);
}

/** Plans a survey for buildings assessed already. */
export async function planOn(
  db: Database,
  { runId, inventoryId, settings, grids, pools, count, listSize, expectedWrong, assessed, ranked }: SurveyBasis,
  { visits, limits }: SurveyWish,
  report: Report = () => undefined,
): Promise<SurveyPlan> {
  report('weighing', 0);
  const { order, mixtures } = ranked;
  const common = commonTo(assessed, ranked);
  const edge = edgeOf(ranked, { median: assessed.median, mixtures }, listSize);
  const { chosen, capped } = mostPromising(assessed.index, mixtures, edge);
  const placeOf = new Map(Array.from(assessed.index, (index, at) => [index, at] as const));
  const context = compileContext(settings, grids);
  const failed = await failedVisits(db, inventoryId);
  const { answered, withdrawn } = await answersSince(db, inventoryId);
  const candidates: Candidate[] = [];
  const unknownsAt = new Map<number, Unknowns>();
  for (const range of indexRanges(count, BLOCK)) {
    const wanted = chosen.filter((index) => index >= range.from && index < range.to);
    if (wanted.length === 0) continue;
    const { columns } = await readBuildings(db, inventoryId, range, { places: grids.size > 0 });
    const read = buildingReader(columns, pools);
    for (const index of wanted) {
      const found = unknownsOf(read(index - range.from), context);
      if (found === null || found.learnable.length === 0) continue;
      const unknowns = common === undefined ? found : seenFromEdge(found, common, placeOf.get(index)!);
      candidates.push({ index, worth: worthOf(unknowns, edge), failed: failed.get(index), known: answered.get(index) });
      unknownsAt.set(index, found);
    }
    report('weighing', range.to / count);
  }
  report('planning');
  // the best ranked first: equal values go in the order of the list
  const rankOf = new Int32Array(count);
  order.forEach((at, place) => (rankOf[assessed.index[at]!] = place + 1));
  candidates.sort((a, b) => rankOf[a.index]! - rankOf[b.index]!);
  const { cost, planned } = bestCampaign(candidates, visits, limits);
  const all = candidates.map((one) => valueLeft(one, visits)).sort((a, b) => b - a);
  const valueOfAll = all.reduce((sum, value) => sum + value, 0);
  let wrong = expectedWrong;
  const named = await namesOf(db, inventoryId, [...new Set(planned.map(({ index }) => index))]);
  // of the building alone, as the list tells them
  const sharesOf = (index: number): ReadonlyMap<Unknown, number> => {
    const found = unknownsAt.get(index)!;
    return new Map(found.learnable.map((one) => [one.unknown, shareOf(found, one)]));
  };
  const steps = planned.map((one, i): SurveyStep => {
    // a building wrongly in and one wrongly out are one wrong place
    wrong -= 0.5 * (one.wrongBefore - one.wrongAfter);
    const building = { ...named.get(one.index)!, rank: rankOf[one.index]! };
    return stepOf(one, i, planned.slice(0, i), building, sharesOf(one.index), Math.max(wrong, 0));
  });
  return {
    run: runId,
    list_size: listSize,
    cost,
    steps,
    buildings: new Set(planned.map(({ index }) => index)).size,
    hours: planned.at(-1)?.hours ?? 0,
    money: planned.at(-1)?.money ?? 0,
    expected_wrong_before: expectedWrong,
    expected_wrong_after: steps.at(-1)?.expected_wrong_places ?? expectedWrong,
    expected_wrong_least: leastWrong(candidates, visits, expectedWrong),
    ranked: assessed.id.length,
    weighed: candidates.length,
    capped,
    failed_at: candidates.filter((one) => one.failed !== undefined).length,
    answered_at: answered.size,
    withdrawn_at: withdrawn,
    value_of_all: valueOfAll,
    buildings_of_80_percent: holding(all, 0.8 * valueOfAll),
    buildings_of_99_percent: holding(all, 0.99 * valueOfAll),
  };
}

/** Value of all that visits can still find out of a building. */
function valueLeft(one: Candidate, visits: readonly Visit[]): number {
  const { value } = one.worth;
  // rounding alone may take it below
  return Math.max(0, value[withinReach(one, visits)]! - value[knownSet(one)]!);
}

/** Wrong places with everything known of the candidates that a visit can still find out: the list then ends at its threshold. */
function leastWrong(candidates: readonly Candidate[], visits: readonly Visit[], today: number): number {
  const mended = sumOf(
    candidates,
    (one) => one.worth.wrongOf(knownSet(one), KNOWN_CHANCE) - one.worth.wrongOf(withinReach(one, visits), KNOWN_CHANCE),
  );
  return Math.max(0, today - 0.5 * mended);
}

/** Indices of the buildings whose S is worth knowing at all, the most promising where there are too many to weigh. */
function mostPromising(
  index: Int32Array,
  mixtures: readonly Mixture[],
  edge: Edge,
): { readonly chosen: readonly number[]; readonly capped: boolean } {
  const most = Float64Array.from(mixtures, (mixture) => mostWorth(mixture, edge));
  const largest = most.reduce((a, b) => Math.max(a, b), 0);
  const promising = Array.from(most.keys()).filter((i) => most[i]! > NOTHING * largest);
  const chosen = promising
    .sort((a, b) => most[b]! - most[a]! || a - b)
    .slice(0, MOST_CANDIDATES)
    .map((i) => index[i]!)
    .sort((a, b) => a - b);
  // the bound is loose: what a survey of these is worth is told only once they are weighed
  return { chosen, capped: promising.length > chosen.length };
}

function sumOf<T>(list: readonly T[], of: (one: T) => number): number {
  return list.reduce((sum, one) => sum + of(one), 0);
}

/** How many of the falling `values` it takes to reach `sum`. */
function holding(values: readonly number[], sum: number): number {
  let left = sum;
  let taken = 0;
  while (taken < values.length && left > 0) {
    left -= values[taken]!;
    taken += 1;
  }
  return taken;
}

type Named = Pick<SurveyStep, 'id' | 'name' | 'group' | 'lon' | 'lat'>;

async function namesOf(
  db: Database,
  inventoryId: string,
  indices: readonly number[],
): Promise<ReadonlyMap<number, Named>> {
  const rows = await db.rows<Named & { at: number }>(
    `SELECT building_index AS at, id, name, "group", lon, lat FROM building
     WHERE inventory_id = ? AND building_index IN (SELECT unnest(CAST(? AS INTEGER[])))`,
    [inventoryId, `[${indices.join(',')}]`],
  );
  return new Map(rows.map(({ at, ...named }) => [at, named]));
}

function stepOf(
  { index, visit, asks, value, valuePerCost, hours, money }: PlannedVisit,
  i: number,
  before: readonly PlannedVisit[],
  named: Named & Pick<SurveyStep, 'rank'>,
  shares: ReadonlyMap<Unknown, number>,
  wrong: number,
): SurveyStep {
  const largest = Math.max(...asks.map((unknown) => shares.get(unknown)!));
  const reason = asks.find((unknown) => shares.get(unknown) === largest)!;
  const isAgain = before.some((one) => one.index === index && one.asks.includes(reason));
  return {
    place: i + 1,
    ...named,
    visit: visit.name,
    asks,
    shares: asks.map((unknown) => shares.get(unknown)!),
    ...(isAgain ? { again: true } : {}),
    value,
    value_per_cost: valuePerCost,
    hours: visit.hours,
    money: visit.money,
    hours_so_far: hours,
    money_so_far: money,
    expected_wrong_places: wrong,
  };
}
