/** What changed between two rankings: the parts of a change of ln S, the parts of a move in rank, the lists. */
import { ln } from '../numeric/elementary.js';
import { roundedMedian } from './rank.js';

/** What the ln S of a building was made of in one run. */
export interface ScoreTerms {
  /** Median ln S. */
  readonly ln_priority: number;
  /** Slope of the hazard curve; 1 where demand alone ranks. */
  readonly slope_k: number;
  /** Of the leading case in its governing direction, g. */
  readonly sa_g: number;
  /** NaN where no capacity counts. */
  readonly capacity_g: number;
  /** NaN where people do not count. */
  readonly people_exposed: number;
  readonly importance_factor: number;
  readonly zone_term: number;
}

/** Parts of a change of ln S: they add to it. */
export interface ChangeParts {
  /** k̄ Δ ln D, with k midway between the two runs. */
  readonly demand: number;
  /** -k̄ Δ ln C. */
  readonly capacity: number;
  /** Δ ln E. */
  readonly people: number;
  /** Δ ln I. */
  readonly importance: number;
  /** Δk times ln(D/C) midway between the two runs. */
  readonly slope: number;
  /** Change of the zone's term: return period and slope against those of the first spectrum. */
  readonly zone: number;
  /** What is left of the change of the median: spread, the other cases of system and era, the other direction. */
  readonly spread_and_cases: number;
}

/** The parts with their titles, in the order in which they are shown. @public */
export const CHANGE_PARTS: readonly (readonly [keyof ChangeParts, string])[] = [
  ['demand', 'spectral demand'],
  ['capacity', 'capacity'],
  ['people', 'people'],
  ['importance', 'importance'],
  ['slope', 'slope k'],
  ['zone', 'zone term'],
  ['spread_and_cases', 'spread and cases'],
];

const lnOrZero = (value: number): number => (value > 0 ? ln(value) : 0);

/** ln S of the leading case at its central values. */
function leadingScore({ slope_k, sa_g, capacity_g, people_exposed, importance_factor, zone_term }: ScoreTerms): number {
  return (
    slope_k * (lnOrZero(sa_g) - lnOrZero(capacity_g)) +
    lnOrZero(people_exposed) +
    lnOrZero(importance_factor) +
    zone_term
  );
}

/** The change of ln S in parts that add to it within 1e-12, whatever changed in what order: products are split at the midpoint. */
export function changeParts(before: ScoreTerms, after: ScoreTerms): ChangeParts {
  const k = (before.slope_k + after.slope_k) / 2;
  const demand = [lnOrZero(before.sa_g), lnOrZero(after.sa_g)] as const;
  const capacity = [lnOrZero(before.capacity_g), lnOrZero(after.capacity_g)] as const;
  const ratio = (demand[0] - capacity[0] + (demand[1] - capacity[1])) / 2;
  return {
    demand: k * (demand[1] - demand[0]),
    // subtracted from zero, so that no change is 0 and not -0
    capacity: 0 - k * (capacity[1] - capacity[0]),
    people: lnOrZero(after.people_exposed) - lnOrZero(before.people_exposed),
    importance: lnOrZero(after.importance_factor) - lnOrZero(before.importance_factor),
    slope: (after.slope_k - before.slope_k) * ratio,
    zone: after.zone_term - before.zone_term,
    spread_and_cases: after.ln_priority - leadingScore(after) - (before.ln_priority - leadingScore(before)),
  };
}

/** One ranking: its buildings in the order of their ranks. */
export interface Ladder {
  readonly id: readonly string[];
  readonly lnPriority: ArrayLike<number>;
  /** Orders equal medians, the larger first; NaN counts as 0. */
  readonly people: ArrayLike<number>;
}

/** A building's move in rank; positive is downward. own + others + came_and_left = rank - rank_before. */
export interface RankMove {
  readonly rank_before: number;
  readonly rank: number;
  /** From the change of its own ln S beyond the change common to all, among the others as they were. */
  readonly own: number;
  /** From the changes of the other buildings that are in both rankings. */
  readonly others: number;
  /** From buildings that are in one ranking only. */
  readonly came_and_left: number;
}

export interface Moves {
  /** Change of ln S of the median building of those in both rankings: it moves nobody. NaN where there is none. */
  readonly common: number;
  /** By id, of the buildings in both rankings, in the order of the later. */
  readonly moves: ReadonlyMap<string, RankMove>;
}

/** Values as the ranking compares them. */
interface Rungs {
  readonly at: readonly number[];
  readonly ladder: Ladder;
}

/** How every building in both rankings moved, and by whose change. */
export function rankMoves(before: Ladder, after: Ladder): Moves {
  const placeBefore = new Map(before.id.map((id, at) => [id, at]));
  const inAfter = new Set(after.id);
  const bothAfter = after.id.flatMap((id, at) => (placeBefore.has(id) ? [at] : []));
  const bothBefore = before.id.flatMap((id, at) => (inAfter.has(id) ? [at] : []));
  const positionBefore = new Map(bothBefore.map((at, position) => [at, position]));
  const changes = Float64Array.from(
    bothAfter,
    (at) => after.lnPriority[at]! - before.lnPriority[placeBefore.get(after.id[at]!)!]!,
  ).sort();
  const common = changes[(changes.length - 1) >> 1] ?? NaN;
  const all: Rungs = { at: before.id.map((_, at) => at), ladder: before };
  const both: Rungs = { at: bothBefore, ladder: before };
  const moves = new Map<string, RankMove>();
  bothAfter.forEach((at, position) => {
    const id = after.id[at]!;
    const was = placeBefore.get(id)!;
    const value = after.lnPriority[at]! - common;
    const people = after.people[at]!;
    const unmoved = Math.abs(value - before.lnPriority[was]!) < SAME && (people || 0) === (before.people[was]! || 0);
    // places from 1: among all of the earlier ranking, and among those of it that are in both
    const amongAll = unmoved ? was + 1 : placeAmong(all, value, people, id, was);
    const amongBoth = unmoved ? positionBefore.get(was)! + 1 : placeAmong(both, value, people, id, was);
    moves.set(id, {
      rank_before: was + 1,
      rank: at + 1,
      own: amongAll - (was + 1),
      others: position + 1 - amongBoth,
      came_and_left: amongBoth - amongAll + (at - position),
    });
  });
  return { common, moves };
}

/** Values closer than this are equal: the ranking rounds to 1e-9. */
const SAME = 1e-9;

/** The place, from 1, that a building would take among `rungs` without its own rung `self`. */
function placeAmong({ at, ladder }: Rungs, value: number, people: number, id: string, self: number): number {
  const rounded = roundedMedian(value);
  const ahead = (rung: number): boolean => {
    const other = roundedMedian(ladder.lnPriority[rung]!);
    if (other !== rounded) return other > rounded;
    const [theirs, mine] = [ladder.people[rung]! || 0, people || 0];
    return theirs === mine ? ladder.id[rung]! < id : theirs > mine;
  };
  let low = 0;
  let high = at.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (ahead(at[middle]!)) low = middle + 1;
    else high = middle;
  }
  // its own rung, where it stands ahead, is not another building's
  const counted = low > 0 && self <= at[low - 1]! ? low - 1 : low;
  return counted + 1;
}
