/** The order of visits of a survey: always the one that is worth most for its cost, given the visits planned before it. */
import type { Unknown } from './learnable.js';
import type { Worth } from './survey-value.js';
import { valueAt, worthAt } from './survey-value.js';

/** One kind of visit. */
export interface Visit {
  readonly name: string;
  readonly hours: number;
  /** In the currency of the study. */
  readonly money: number;
  /** Chance that it finds each unknown out; what is left out it does not ask. */
  readonly finds: Partial<Readonly<Record<Unknown, number>>>;
}

/** Unknowns that visits made already, by their names, could not find out. */
export type Failed = ReadonlyMap<string, ReadonlySet<Unknown>>;

export interface Candidate {
  readonly index: number;
  readonly worth: Worth;
  /** Such a visit is not counted on for them again; others may still find them out. */
  readonly failed?: Failed | undefined;
  /** What has been found out since the building was assessed: nobody asks for it, and visits are worth what they add to it. */
  readonly known?: ReadonlySet<Unknown> | undefined;
}

export interface Limits {
  /** Infinity: no limit. */
  readonly hours: number;
  readonly money: number;
}

/** What visits are weighed by; both: by the share of hours and of money they take, added up, in per cent. */
export type Cost = 'hours' | 'money' | 'both';

export interface PlannedVisit {
  readonly index: number;
  readonly visit: Visit;
  /** What it may find out that visits before it have not for certain. */
  readonly asks: readonly Unknown[];
  /** In units of S, beyond what earlier visits to the building are worth. */
  readonly value: number;
  /** Null where the visit costs none of what is weighed. */
  readonly valuePerCost: number | null;
  /** All visits to here. */
  readonly hours: number;
  readonly money: number;
  /** Chance that the building stands on the wrong side of the edge: before and after this visit. */
  readonly wrongBefore: number;
  readonly wrongAfter: number;
}

/** Values under this share of the largest are none. */
const NOTHING = 1e-6;

interface State {
  readonly candidate: Candidate;
  readonly taken: Set<string>;
  /** Chance that each unknown is found out by the visits planned; what is known is. */
  readonly found: Map<Unknown, number>;
  value: number;
  /** NaN before the first visit. */
  wrong: number;
  next: Step | null;
}

interface Step {
  readonly visit: Visit;
  readonly value: number;
  readonly ratio: number;
}

/**
 * The best of the plans there are within `limits`: weighed by what is limited; where both are, by either and by both, and the plan that is
 * worth most in all is taken, so that more hours never make it worth less than the money alone would buy.
 */
export function bestCampaign(
  candidates: readonly Candidate[],
  visits: readonly Visit[],
  limits: Limits,
): { readonly cost: Cost; readonly planned: readonly PlannedVisit[] } {
  const isLimited = (what: 'hours' | 'money'): boolean => limits[what] < Infinity;
  const costs: readonly Cost[] =
    isLimited('hours') && isLimited('money') ? ['hours', 'money', 'both'] : isLimited('money') ? ['money'] : ['hours'];
  const plans = costs.map((cost) => {
    const planned = planCampaign(candidates, visits, limits, cost);
    return { cost, planned, value: planned.reduce((sum, { value }) => sum + value, 0) };
  });
  return plans.reduce((best, plan) => (plan.value > best.value * (1 + 1e-9) ? plan : best));
}

/**
 * Plans visits until neither hours nor money allow another that is worth anything. Equal ratios go in the order of the candidates,
 * then of the visits. A visit that no longer fits is passed over for one that does.
 */
export function planCampaign(
  candidates: readonly Candidate[],
  visits: readonly Visit[],
  limits: Limits,
  cost: Cost,
): readonly PlannedVisit[] {
  const left = { ...limits };
  const states: State[] = candidates.map((candidate) => ({
    candidate,
    taken: new Set(),
    found: new Map([...(candidate.known ?? [])].map((unknown) => [unknown, 1])),
    value: candidate.worth.value[knownSet(candidate)]!,
    wrong: NaN,
    next: null,
  }));
  let largest = 0;
  for (const state of states) {
    const all = state.candidate.worth.value.at(-1)!;
    if (all > largest) largest = all;
  }
  const take = (state: State): Step | null =>
    bestStep(state, visits, left, (visit) => costOf(visit, limits, cost), NOTHING * largest);
  for (const state of states) state.next = take(state);
  const planned: PlannedVisit[] = [];
  for (;;) {
    let best: State | null = null;
    for (const state of states) {
      if (state.next !== null && !fits(state.next.visit, left)) state.next = take(state);
      if (state.next !== null && (best?.next == null || state.next.ratio > best.next.ratio)) best = state;
    }
    if (best?.next == null) return planned;
    const { visit, value, ratio } = best.next;
    const state = best;
    const { wrong } = worthAt(state.candidate.worth, (unknown) => foundWith(state, visit, unknown));
    left.hours -= visit.hours;
    left.money -= visit.money;
    planned.push({
      index: best.candidate.index,
      visit,
      asks: asked(best, visit),
      value: value - best.value,
      valuePerCost: costOf(visit, limits, cost) > 0 ? ratio : null,
      hours: limits.hours === Infinity ? sum(planned, 'hours') + visit.hours : limits.hours - left.hours,
      money: limits.money === Infinity ? sum(planned, 'money') + visit.money : limits.money - left.money,
      wrongBefore: Number.isNaN(best.wrong) ? best.candidate.worth.wrongOf(knownSet(best.candidate)) : best.wrong,
      wrongAfter: wrong,
    });
    for (const unknown of asked(best, visit)) best.found.set(unknown, foundWith(best, visit, unknown));
    best.taken.add(visit.name);
    best.value = value;
    best.wrong = wrong;
    best.next = take(best);
  }
}

function sum(planned: readonly PlannedVisit[], what: 'hours' | 'money'): number {
  return planned.at(-1)?.[what] ?? 0;
}

/** Whether one visit fits into what is left. */
export function fits({ hours, money }: Visit, left: Limits): boolean {
  // a sum of visits that fills the limit exactly must not fail by its last digit
  const most = (limit: number): number => limit + 1e-9 * (1 + Math.abs(limit));
  return hours <= most(left.hours) && money <= most(left.money);
}

/** Which of its unknowns are known by now, as a set of its worth. */
export function knownSet({ worth, known }: Candidate): number {
  return setOf(worth, (unknown) => known?.has(unknown) === true);
}

/** Which of its unknowns are known by now, or some visit may find out, as a set of its worth. */
export function withinReach(candidate: Candidate, visits: readonly Visit[]): number {
  const found = (unknown: Unknown): boolean => visits.some((visit) => chanceOf(candidate, visit, unknown) > 0);
  return knownSet(candidate) | setOf(candidate.worth, found);
}

function setOf({ unknowns }: Worth, has: (unknown: Unknown) => boolean): number {
  return unknowns.reduce((set, unknown, bit) => (has(unknown) ? set | (1 << bit) : set), 0);
}

function chanceOf({ failed }: Candidate, { name, finds }: Visit, unknown: Unknown): number {
  return failed?.get(name)?.has(unknown) ? 0 : (finds[unknown] ?? 0);
}

function asked({ candidate, found }: State, visit: Visit): readonly Unknown[] {
  return candidate.worth.unknowns.filter(
    (unknown) => chanceOf(candidate, visit, unknown) > 0 && (found.get(unknown) ?? 0) < 1,
  );
}

function foundWith({ candidate, found }: State, visit: Visit, unknown: Unknown): number {
  return 1 - (1 - (found.get(unknown) ?? 0)) * (1 - chanceOf(candidate, visit, unknown));
}

/** What of it counts as the cost of a visit. */
function costOf({ hours, money }: Visit, limits: Limits, cost: Cost): number {
  if (cost !== 'both') return cost === 'hours' ? hours : money;
  const share = (what: number, limit: number): number => (limit > 0 ? what / limit : what > 0 ? Infinity : 0);
  return 100 * (share(hours, limits.hours) + share(money, limits.money));
}

function bestStep(
  state: State,
  visits: readonly Visit[],
  left: Limits,
  costOfVisit: (visit: Visit) => number,
  least: number,
): Step | null {
  let best: Step | null = null;
  for (const visit of visits) {
    if (state.taken.has(visit.name) || !fits(visit, left) || asked(state, visit).length === 0) continue;
    const value = valueAt(state.candidate.worth, (unknown) => foundWith(state, visit, unknown));
    const gain = value - state.value;
    if (!(gain > least)) continue;
    const ratio = gain / Math.max(costOfVisit(visit), 1e-9);
    if (best === null || ratio > best.ratio) best = { visit, value, ratio };
  }
  return best;
}
