/** What a run tells of a survey, of the money and of its assumptions. */
import type { Unknown } from './priority/learnable.js';

/** One visit of a survey. */
export interface SurveyVisit {
  readonly place: number;
  readonly id: string;
  readonly name: string | null;
  readonly group: string | null;
  readonly rank: number;
  readonly visit: string;
  readonly asks: readonly Unknown[];
  /** Share of the building's spread (variance of ln S) that each unknown it asks for stands for. */
  readonly shares: readonly number[];
  /** A visit planned before this one asks the building for it too: it is for what that one does not find. */
  readonly again?: boolean;
  /** In units of the priority of the median building. */
  readonly value: number;
  /** For an hour, or for money; null where the visit costs none of what is weighed. */
  readonly value_per_cost: number | null;
  readonly hours_so_far: number;
  /** Expected wrong places of the list once all visits to here are made. */
  readonly expected_wrong_places: number;
}

/** What a week of visits would do to the list. */
export interface SurveyOutlook {
  readonly hours: number;
  readonly visits: number;
  readonly buildings: number;
  readonly expected_wrong_before: number;
  readonly expected_wrong_after: number;
  /** Hours of visits that would halve the expected wrong places; null: more than were planned. */
  readonly halving_hours: number | null;
  /** How many hours of visits were planned to find them, and the wrong places then. */
  readonly reach_hours: number;
  readonly reach_wrong: number;
  /** Wrong places were everything found out that a visit can. */
  readonly least_wrong: number;
  /** How many buildings hold 80 % and 99 % of the value of all that visits can find out. */
  readonly buildings_of_80_percent: number;
  /** Buildings with answers that the run does not count, and such of which it counts answers that were withdrawn; left out where there are none. */
  readonly answered_at?: number;
  readonly withdrawn_at?: number;
  readonly buildings_of_99_percent: number;
  /** The first visits. */
  readonly steps: readonly SurveyVisit[];
}

/** One assumption switched, and what is left of the list. */
export interface SwitchTold {
  readonly assumption: string;
  readonly statement: string;
  readonly from: string;
  readonly to: string;
  /** How the value was come by, in a word. */
  readonly mark: string;
  /** Buildings on the list before and after the switch, and places of the list. */
  readonly overlap: number;
  readonly places: number;
  readonly tau_b: number | null;
}

/** What the list hangs on. */
export interface SensitivityOutlook {
  readonly rankings: number;
  /** Switches that there are in all. */
  readonly of_rankings: number;
  readonly places: number;
  /** Only every manyth building was ranked again; null: all were. */
  readonly sample: { readonly every: number; readonly buildings: number } | null;
  /** Ids that stay on the list whichever of these is switched, by rank. */
  readonly always: readonly string[];
  /** How many of the places are safe from other weights of people, importance and slope; left out where people do not count. */
  readonly weights?: {
    /** False where the slope stays as read from two levels. */
    readonly slope?: boolean;
    readonly draws: number;
    readonly safe: number;
    readonly safe_share: number;
    readonly places: number;
  };
  /** The largest effects first. */
  readonly switches: readonly SwitchTold[];
}

/** An assessment that the money of a study buys. */
export interface AssessmentBought {
  readonly id: string;
  readonly name: string | null;
  readonly group: string | null;
  readonly rank: number | null;
  readonly chance: number | null;
  readonly cost: number;
  /** The study says it must be among them. */
  readonly must: boolean;
}

/** What the money of a study buys. */
export interface BudgetOutlook {
  /** What assessing every building on the list costs. */
  readonly list_cost: number;
  readonly currency: string | null;
  readonly cost_source: 'study' | 'judgement';
  /** Why the choice could not be made, or null. */
  readonly problem: string | null;
  /** Null where the study names no money. */
  readonly plan: {
    readonly money: number;
    readonly spent: number;
    readonly left: number;
    /** Share of the best possible worth that is missed at most. */
    readonly gap: number;
    readonly count: number;
    readonly of_list: number;
    readonly on_list: number;
    readonly mobilisation: number;
    readonly excluded: number;
    /** The first by rank. */
    readonly chosen: readonly AssessmentBought[];
  } | null;
}
