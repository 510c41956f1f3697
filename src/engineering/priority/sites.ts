/** What the chances of several buildings say of the site they make up together. */

export interface SiteFigures {
  /** Members that are ranked. */
  readonly ranked: number;
  /** The first of their ranks; NaN where none is ranked. */
  readonly bestRank: number;
  /** Chance that at least one of them belongs to the list; NaN where none is ranked. */
  readonly chance: number;
  /** How many of them are expected to belong to it; NaN where none is ranked. */
  readonly expected: number;
  /** People present on average in those of which it is known; NaN where it is known of none. */
  readonly people: number;
}

/**
 * Chance that at least one of several buildings belongs to the list, 1 − Π(1 − p), from the chance p of each.
 *
 * What is not known of the members is taken as independent. Where they share it (one code history, one kind of ground) they rise and fall
 * together, and the chance is lower: not below the largest p, which is what it would be if they shared all of it. That many other
 * buildings compete for the places couples the members by about one place in the length of the list, which is left out.
 * @param chances each 0 to 1. @param from the first that counts. @param to one behind the last.
 * @returns 0 to 1; 0 for no building.
 * @example
 * atLeastOne([0.5, 0.5]); // 0.75
 */
export function atLeastOne(chances: ArrayLike<number>, from = 0, to = chances.length): number {
  let some = 0;
  // one by one what is left: 1 − Π(1 − p) itself loses chances below 1e-16
  for (let i = from; i < to; i += 1) some += chances[i]! * (1 - some);
  return Math.min(1, some);
}

/**
 * The figures of a site from those of its members, `from` to before `to`: ranks (NaN: not ranked), chances and people (NaN: not known).
 * Ranked members come first.
 */
export function siteFigures(
  { rank, chance, people }: Readonly<Record<'rank' | 'chance' | 'people', ArrayLike<number>>>,
  from: number,
  to: number,
): SiteFigures {
  let end = from;
  let bestRank = NaN;
  let expected = 0;
  while (end < to && rank[end]! > 0) {
    if (!(rank[end]! >= bestRank)) bestRank = rank[end]!;
    expected += chance[end]!;
    end += 1;
  }
  let present = NaN;
  for (let i = from; i < to; i += 1)
    if (!Number.isNaN(people[i]!)) present = (Number.isNaN(present) ? 0 : present) + people[i]!;
  const ranked = end - from;
  return {
    ranked,
    bestRank,
    chance: ranked === 0 ? NaN : atLeastOne(chance, from, end),
    expected: ranked === 0 ? NaN : expected,
    people: present,
  };
}
