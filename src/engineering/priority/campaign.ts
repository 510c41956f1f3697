/** The order of visits of a survey: always the one that is worth most for its cost, given the visits planned before it. */
import type { Unknown, Worth } from './survey-value.js';
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

/** What visits are weighed by. */
export type Cost = 'hours' | 'money';

export interface PlannedVisit {
  readonly index: number;
  readonly visit: Visit;
  /** What it may find out that visits before it have not for certain. */
  readonly asks: readonly Unknown[];
  /** In units of S, beyond what earlier visits to the building are worth. */
  readonly value: number;
  readonly valuePerCost: number;
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
  for (const state of states) state.next = bestStep(state, visits, left, cost, NOTHING * largest);
  const planned: PlannedVisit[] = [];
  for (;;) {
    let best: State | null = null;
    for (const state of states) {
      if (state.next !== null && !fits(state.next.visit, left))
        state.next = bestStep(state, visits, left, cost, NOTHING * largest);
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
      valuePerCost: ratio,
      hours: limits.hours === Infinity ? sum(planned, 'hours') + visit.hours : limits.hours - left.hours,
      money: limits.money === Infinity ? sum(planned, 'money') + visit.money : limits.money - left.money,
      wrongBefore: Number.isNaN(best.wrong) ? best.candidate.worth.wrongOf(knownSet(best.candidate)) : best.wrong,
      wrongAfter: wrong,
    });
    for (const unknown of asked(best, visit)) best.found.set(unknown, foundWith(best, visit, unknown));
    best.taken.add(visit.name);
    best.value = value;
    best.wrong = wrong;
    best.next = bestStep(best, visits, left, cost, NOTHING * largest);
  }
}

function sum(planned: readonly PlannedVisit[], what: Cost): number {
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

function bestStep(state: State, visits: readonly Visit[], left: Limits, cost: Cost, least: number): Step | null {
  let best: Step | null = null;
  for (const visit of visits) {
    if (state.taken.has(visit.name) || !fits(visit, left) || asked(state, visit).length === 0) continue;
    const value = valueAt(state.candidate.worth, (unknown) => foundWith(state, visit, unknown));
    const gain = value - state.value;
    if (!(gain > least)) continue;
    const ratio = gain / Math.max(visit[cost], 1e-9);
    if (best === null || ratio > best.ratio) best = { visit, value, ratio };
  }
  return best;
}
