/** The study's own table of chances: which lateral system a building has, given its use, storeys and year. */
import type { System, Use } from '../building.js';

/** Rows of the table that share use, storeys and years; null: any. Bounds are inclusive. */
export interface SystemPriorGroup {
  readonly use: Use | null;
  readonly storeysFrom: number | null;
  readonly storeysTo: number | null;
  readonly builtFrom: number | null;
  readonly builtTo: number | null;
  /** Chances in (0, 1], summing to 1, no system twice. */
  readonly chances: readonly { readonly system: System; readonly chance: number }[];
  /** The group in words, for instance `office, 1 to 3 storeys, built 1950 to 1979`. */
  readonly label: string;
}

/**
 * The first group, in file order, that holds the building, or null. Storeys and year are rounded to whole numbers first;
 * NaN (not known) fits only groups without that bound.
 */
export function matchPrior(
  groups: readonly SystemPriorGroup[],
  use: Use,
  storeys: number,
  year: number,
): SystemPriorGroup | null {
  const wholeStoreys = Math.round(storeys);
  const wholeYear = Math.round(year);
  return (
    groups.find(
      (group) =>
        (group.use === null || group.use === use) &&
        within(wholeStoreys, group.storeysFrom, group.storeysTo) &&
        within(wholeYear, group.builtFrom, group.builtTo),
    ) ?? null
  );
}

function within(value: number, from: number | null, to: number | null): boolean {
  return (from === null || value >= from) && (to === null || value <= to);
}

/** What of use and storeys a table tells apart: buildings of one class find the same groups. */
export interface PriorClasses {
  /** Uses that a group names. */
  readonly uses: ReadonlySet<Use>;
  /** Numbers of storeys at which a group begins or has ended. */
  readonly storeys: readonly number[];
}

/** The classes of a table; without one all buildings are alike. */
export function priorClasses(groups: readonly SystemPriorGroup[] | null): PriorClasses {
  const uses = new Set<Use>();
  const storeys = new Set<number>();
  for (const { use, storeysFrom, storeysTo } of groups ?? []) {
    if (use !== null) uses.add(use);
    if (storeysFrom !== null) storeys.add(Math.ceil(storeysFrom));
    if (storeysTo !== null) storeys.add(Math.floor(storeysTo) + 1);
  }
  return { uses, storeys: [...storeys] };
}

/** The class of a number of storeys: how many of the bounds it has reached. */
export function storeysClass({ storeys: bounds }: PriorClasses, storeys: number): number {
  const whole = Math.round(storeys);
  let reached = 0;
  for (const bound of bounds) if (whole >= bound) reached += 1;
  return reached;
}
