/** Which row of an edition a case reads, if any. */
import type { System } from '../building.js';
import type { Case } from './case-memory.js';
import { editionOf, familyOf } from './code-history.js';
import type { EditionId } from './code-history.js';
import type { AssessContext } from './context.js';
import type { CodeHistorySettings } from './settings.js';

/** True where the edition knows no such system, so that it counts as not designed. */
export function hasNoRow(system: System, edition: EditionId | null, history: CodeHistorySettings | null): boolean {
  if (edition === null || history === null) return false;
  const { year, hasRow } = editionOf(edition, history);
  return year >= (familyOf(history).noRowFrom[system] ?? Infinity) || hasRow?.(system) === false;
}

/** What a retrofit of masonry is designed as where the code gives its system no row: new walls or layers that are reinforced [judgement]. */
const STRENGTHENED_AS: Partial<Readonly<Record<System, System>>> = {
  'unreinforced-masonry-wall': 'reinforced-masonry-wall',
};

/** The row of the edition that a case reads; null where it gives none, so that the case counts as not designed. */
export function rowOf(
  system: System,
  { edition, strengthened }: Pick<Case, 'edition' | 'strengthened'>,
  history: CodeHistorySettings | null,
): System | null {
  if (!hasNoRow(system, edition, history)) return system;
  const other = strengthened ? STRENGTHENED_AS[system] : undefined;
  return other === undefined || hasNoRow(other, edition, history) ? null : other;
}

/** True where the case was designed for earthquakes in a direction at least, so that its drawings can state a coefficient. */
export function isDesigned(
  which: Pick<Case, 'system' | 'system_transverse' | 'edition' | 'strengthened'>,
  { settings: { codeHistory } }: AssessContext,
): boolean {
  if (which.edition === null) return false;
  return [which.system, which.system_transverse].some((one) => rowOf(one, which, codeHistory) !== null);
}
