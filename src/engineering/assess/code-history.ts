/** The code history of a place as intervals of the year of construction, and the chance of each edition for a building. */
import type { System } from '../building.js';
import type { CodeEdition } from '../capacity/edition.js';
import { CODE_FAMILIES, EDITIONS, FIRST_FAMILY, OWN_FAMILY, OWN_FAMILY_ID } from '../capacity/families.js';
import { OWN_IDS, ownEditions } from '../capacity/own-table.js';
import type { CarriedId, CodeFamily, EditionId } from '../capacity/families.js';
import { SYSTEM_FACTORS } from '../capacity/systems.js';
import { ASSUMED } from './assumed.js';
import type { Ductilities } from './assumed.js';
import type { CodeHistorySettings } from './settings.js';

export type { EditionId };

/** Year in print of each edition that is carried. */
export const EDITION_YEARS = Object.fromEntries(
  Object.entries(EDITIONS).map(([edition, { year }]) => [edition, year]),
) as Readonly<Record<CarriedId, number>>;

/** All editions by label: no seismic design first. */
export const EDITION_LABELS: readonly string[] = ['no seismic design', ...Object.keys(EDITION_YEARS), ...OWN_IDS];

const LABELS: ReadonlyMap<string, number> = new Map(EDITION_LABELS.map((edition, label) => [edition, label]));

export function editionLabel(edition: EditionId | null): number {
  return edition === null ? 0 : LABELS.get(edition)!;
}

/** The family of codes of a history. */
export function familyOf(history: CodeHistorySettings): CodeFamily {
  const { family = FIRST_FAMILY } = history;
  return family === OWN_FAMILY_ID ? OWN_FAMILY : CODE_FAMILIES[family];
}

const own = new WeakMap<CodeHistorySettings, Readonly<Record<string, CodeEdition<never>>>>();
/** The rows of the study's own table as editions, made once for each history. */
function ownOf(history: CodeHistorySettings): Readonly<Record<string, CodeEdition<never>>> {
  let made = own.get(history);
  if (made === undefined) own.set(history, (made = ownEditions(history.table ?? [])));
  return made;
}

/** An edition of a history. */
export function editionOf(edition: EditionId, history: CodeHistorySettings): CodeEdition<never> {
  return history.family === OWN_FAMILY_ID ? ownOf(history)[edition]! : EDITIONS[edition as CarriedId];
}

/** Ids of the editions a history uses. */
function idsOf(history: CodeHistorySettings): readonly EditionId[] {
  if (history.family === OWN_FAMILY_ID) return Object.keys(ownOf(history)) as EditionId[];
  return (Object.keys(familyOf(history).editions) as CarriedId[]).filter((id) => history.editions[id] !== undefined);
}

export interface Era {
  /** null: no seismic design. */
  readonly edition: EditionId | null;
  readonly from: number;
  readonly to: number;
}

/**
 * Eras by year of construction: an edition begins its year in print plus the adoption lag, never before seismic design was
 * enforced; the latest edition in force when enforcement begins is the first era.
 */
export function eras(history: CodeHistorySettings): readonly Era[] {
  const enforced = history.seismic_design_enforced_from;
  const starts = idsOf(history)
    .map((edition) => ({ edition, start: editionOf(edition, history).year + history.adoption_lag_years }))
    .sort((a, b) => a.start - b.start);
  const before = starts.filter(({ start }) => start <= enforced).at(-1);
  const after = starts.filter(({ start }) => start > enforced);
  const list: { edition: EditionId | null; from: number }[] = [{ edition: null, from: -Infinity }];
  if (before !== undefined) list.push({ edition: before.edition, from: enforced });
  for (const { edition, start } of after) list.push({ edition, from: start });
  return list.map((era, i) => ({ ...era, to: list[i + 1]?.from ?? Infinity }));
}

/** Chance of each era for a building of `year`: its share of the years within `change_years` either side. */
export function eraChances(
  list: readonly Era[],
  year: number,
  change_years: number,
): readonly { readonly era: Era; readonly chance: number }[] {
  if (change_years <= 0)
    return list.filter(({ from, to }) => year >= from && year < to).map((era) => ({ era, chance: 1 }));
  const low = year - change_years;
  const high = year + change_years;
  return list
    .map((era) => ({ era, chance: Math.max(0, Math.min(high, era.to) - Math.max(low, era.from)) / (2 * change_years) }))
    .filter(({ chance }) => chance > 0);
}

export type Detailing = 'none' | 'before' | 'after' | 'special';

/** Detailing class of a system designed to an edition (null: no seismic design). */
export function detailingOf(system: System, edition: EditionId | null, history: CodeHistorySettings): Detailing {
  return edition === null ? 'none' : detailingIn(editionOf(edition, history).year, system, history);
}

function detailingIn(year: number, system: System, history: CodeHistorySettings): Detailing {
  const { detailingFrom, specialFrom } = familyOf(history);
  const factors = SYSTEM_FACTORS[system];
  const from = history.detailing_from?.[system] ?? (factors.neverDuctile ? Infinity : detailingFrom);
  if (year < from) return 'before';
  return factors.special && year >= (specialFrom ?? Infinity) ? 'special' : 'after';
}

/**
 * The reduction at strength level of the first edition of the family that knew one, and which share of the ductility it counted on a
 * detailing class has, 1 at most; null where none is known.
 */
export function firstReduction(
  system: System,
  detailing: Detailing,
  history: CodeHistorySettings,
  ductilities: Ductilities = ASSUMED.ductility,
): { readonly first_reduction: number; readonly ductility_share: number } | null {
  const first = familyOf(history).firstReduction;
  if (first === null) return null;
  const counted = ductilityOf(system, detailingIn(first.year, system, history), ductilities);
  return {
    first_reduction: first.of(system),
    ductility_share: Math.min(1, ductilityOf(system, detailing, ductilities) / counted),
  };
}

/** Displacement ductility of a detailing class [judgement]. */
export function ductilityOf(
  system: System,
  detailing: Detailing,
  ductilities: Ductilities = ASSUMED.ductility,
): number {
  const factors = SYSTEM_FACTORS[system];
  if (factors.neverDuctile || (detailing === 'none' && factors.brittle)) return ductilities.brittle;
  return ductilities[detailing];
}
