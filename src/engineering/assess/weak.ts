/**
 * Structural types known to be weak, flagged whatever the rank. Dates are those of the family of codes (capacity/families.ts), or of the study.
 */
import type { Case, Cases } from './case-memory.js';
import { familyOf } from './code-history.js';
import type { CodeHistorySettings } from './settings.js';

export interface WeakType {
  readonly name: string;
  readonly title: string;
  readonly source: string;
}

export const WEAK_TYPES: readonly WeakType[] = [
  { name: 'unreinforced-masonry', title: 'Unreinforced masonry', source: 'common practice, no source' },
  {
    name: 'concrete-frame-before-detailing',
    title: 'Concrete frame before ductile detailing',
    source: 'detailing date of the family of codes',
  },
  {
    name: 'welded-steel-frame',
    title: 'Welded steel moment frame of the years whose connections broke',
    source: 'from memory: connection damage found in 1994',
  },
  {
    name: 'open-front-timber',
    title: 'Timber building with an open or soft first storey',
    source: 'common practice, no source',
  },
  {
    name: 'tilt-up-before-wall-anchors',
    title: 'Tilt-up walls before the wall-anchor rules',
    source: 'from memory',
  },
  { name: 'precast-frame', title: 'Precast concrete frame of the early rules', source: 'judgement' },
];

/** The study's date, else that of the family; without a code history every building is older than any. */
function dateOf(name: 'tilt_up_before' | 'precast_before', history: CodeHistorySettings | null): number {
  return history === null ? Infinity : (history.weak_types?.[name] ?? familyOf(history).weak[name]);
}

function isWelded(year: number, history: CodeHistorySettings | null): boolean {
  if (history === null) return false;
  const { weak_types: own } = history;
  const { weak } = familyOf(history);
  return (
    year >= (own?.welded_from ?? weak.welded_from ?? Infinity) &&
    year < (own?.welded_before ?? weak.welded_before ?? -Infinity)
  );
}

/** The weak type of a case, or null; `isSoft`: the first storey is soft, by a flag of the row or by its numbers. */
export function weakTypeOf(which: Case, isSoft: boolean, history: CodeHistorySettings | null): string | null {
  // a retrofit to less than its year's code leaves the building of its type
  const year =
    which.strengthened && which.retrofit_level < 1 && which.builtTo !== null ? which.builtTo.year : which.editionYear;
  switch (which.system) {
    case 'unreinforced-masonry-wall':
      return 'unreinforced-masonry';
    case 'concrete-moment-frame':
    case 'concrete-infilled-frame': {
      const from =
        history?.detailing_from?.[which.system] ?? (history === null ? Infinity : familyOf(history).detailingFrom);
      return year < from ? 'concrete-frame-before-detailing' : null;
    }
    case 'steel-moment-frame':
      return isWelded(year, history) ? 'welded-steel-frame' : null;
    case 'timber-light-frame':
    case 'timber-post-and-beam':
      return isSoft ? 'open-front-timber' : null;
    case 'precast-tilt-up-wall':
      return year < dateOf('tilt_up_before', history) ? 'tilt-up-before-wall-anchors' : null;
    case 'precast-concrete-frame':
      return year < dateOf('precast_before', history) ? 'precast-frame' : null;
    default:
      return null;
  }
}

/** The most likely weak type over the cases, and the chance of any. */
export function weakOf(
  cases: Cases,
  isSoft: boolean,
  history: CodeHistorySettings | null,
): { readonly name: string | null; readonly chance: number } {
  if (cases.list.length === 1) {
    const only = weakTypeOf(cases.list[0]!, isSoft, history);
    return { name: only, chance: only === null ? 0 : 1 };
  }
  const chances = new Map<string, number>();
  let chance = 0;
  for (const which of cases.list) {
    const name = weakTypeOf(which, isSoft, history);
    if (name === null) continue;
    chance += which.chance;
    chances.set(name, (chances.get(name) ?? 0) + which.chance);
  }
  const [name] = [...chances.entries()].sort(([ka, a], [kb, b]) => b - a || (ka < kb ? -1 : 1))[0] ?? [null];
  return { name, chance: Math.min(chance, 1) };
}
