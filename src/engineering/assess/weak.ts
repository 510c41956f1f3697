/**
 * Structural types known to be weak, flagged whatever the rank. Dates are of the US family; each is marked with what it rests on.
 */
import type { Building } from '../building.js';
import { SYSTEM_FACTORS } from '../capacity/systems.js';
import type { Case, Cases } from './case-memory.js';
import { EDITION_YEARS } from './code-history.js';
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
    title: 'Concrete frame before ductile detailing (UBC 1976)',
    source: 'date restated',
  },
  {
    name: 'welded-steel-frame',
    title: 'Welded steel moment frame of 1961 to 1994 (UBC 1961 to 1988 editions)',
    source: 'from memory: connection damage found in 1994',
  },
  {
    name: 'open-front-timber',
    title: 'Timber building with an open or soft first storey',
    source: 'common practice, no source',
  },
  {
    name: 'tilt-up-before-wall-anchors',
    title: 'Tilt-up walls before the wall-anchor rules (UBC 1976)',
    source: 'from memory',
  },
  { name: 'precast-frame', title: 'Precast concrete frame before UBC 1997', source: 'judgement' },
];

/** The weak type of a case, or null. */
export function weakTypeOf(building: Building, which: Case, history: CodeHistorySettings | null): string | null {
  const year = which.edition === null ? 0 : EDITION_YEARS[which.edition];
  switch (which.system) {
    case 'unreinforced-masonry-wall':
      return 'unreinforced-masonry';
    case 'concrete-moment-frame':
    case 'concrete-infilled-frame': {
      const from = history?.detailing_from?.[which.system] ?? SYSTEM_FACTORS[which.system].detailingFrom ?? 1976;
      return year < from ? 'concrete-frame-before-detailing' : null;
    }
    case 'steel-moment-frame':
      return year >= 1961 && year < 1997 ? 'welded-steel-frame' : null;
    case 'timber-light-frame':
    case 'timber-post-and-beam':
      return building.soft_storey === 'yes' ? 'open-front-timber' : null;
    case 'precast-tilt-up-wall':
      return year < 1976 ? 'tilt-up-before-wall-anchors' : null;
    case 'precast-concrete-frame':
      return year < 1997 ? 'precast-frame' : null;
    default:
      return null;
  }
}

/** The most likely weak type over the cases, and the chance of any. */
export function weakOf(
  building: Building,
  cases: Cases,
  history: CodeHistorySettings | null,
): { readonly name: string | null; readonly chance: number } {
  if (cases.list.length === 1) {
    const only = weakTypeOf(building, cases.list[0]!, history);
    return { name: only, chance: only === null ? 0 : 1 };
  }
  const chances = new Map<string, number>();
  let chance = 0;
  for (const which of cases.list) {
    const name = weakTypeOf(building, which, history);
    if (name === null) continue;
    chance += which.chance;
    chances.set(name, (chances.get(name) ?? 0) + which.chance);
  }
  const [name] = [...chances.entries()].sort(([ka, a], [kb, b]) => b - a || (ka < kb ? -1 : 1))[0] ?? [null];
  return { name, chance: Math.min(chance, 1) };
}
