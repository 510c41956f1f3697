/** The code history of a place as intervals of the year of construction, and the chance of each edition for a building. */
import type { System } from '../building.js';
import { SYSTEM_FACTORS } from '../capacity/systems.js';
import { ASSUMED } from './assumed.js';
import type { Ductilities } from './assumed.js';
import type { CodeHistorySettings, EditionInputs } from './settings.js';

export type EditionId = keyof EditionInputs;

/** Year in print of each edition. */
export const EDITION_YEARS: Readonly<Record<EditionId, number>> = {
  'ubc-1927': 1927,
  'ubc-1935': 1935,
  'ubc-1949': 1949,
  'ubc-1961': 1961,
  'ubc-1976': 1976,
  'ubc-1988': 1988,
  'ubc-1997': 1997,
  'asce7-2002': 2000,
};

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
  const starts = (Object.keys(EDITION_YEARS) as EditionId[])
    .filter((edition) => history.editions[edition] !== undefined)
    .map((edition) => ({ edition, start: EDITION_YEARS[edition] + history.adoption_lag_years }))
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
  if (edition === null) return 'none';
  const factors = SYSTEM_FACTORS[system];
  const from = history.detailing_from?.[system] ?? factors.detailingFrom;
  const year = EDITION_YEARS[edition];
  if (from === null || year < from) return 'before';
  return factors.special && year >= 1997 ? 'special' : 'after';
}

/** Displacement ductility of a detailing class [judgement]. */
export function ductilityOf(
  system: System,
  detailing: Detailing,
  ductilities: Ductilities = ASSUMED.ductility,
): number {
  const factors = SYSTEM_FACTORS[system];
  if (factors.detailingFrom === null || (detailing === 'none' && factors.brittle)) return ductilities.brittle;
  return ductilities[detailing];
}
