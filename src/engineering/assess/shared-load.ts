/** How much of the error in the ln S of buildings is common to those of one edition, and to those of one zone. */
import type { Zone } from '../priority/shared-errors.js';
import type { AssessSettings } from './settings.js';

/** The buildings that read the spectrum `name`, in which the slope is `slope_k`. Ranked by demand alone nothing has a spread, and nothing a common one. */
export function zoneOf(name: string, slope_k: number, { rankBy, spreads }: AssessSettings): Zone {
  const k = rankBy === 'demand' ? 0 : slope_k;
  return { name, eraLoad: k * spreads.eraTable, siteLoad: k * spreads.siteClass };
}
