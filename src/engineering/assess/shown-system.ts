/** The lateral system that a building's estimates are shown for. */
import type { Building, System } from '../building.js';
import { casesOf } from './cases.js';
import type { AssessContext } from './context.js';

/** Which lateral system the estimates of a building are shown for. */
export interface ShownSystem {
  readonly along: System;
  readonly across: System;
  /** Chance of the two; 1 when on record. */
  readonly chance: number;
  readonly onRecord: boolean;
}

/** The system on record, else the likeliest; or why no period can be estimated. */
export function shownSystem(building: Building, context: AssessContext): ShownSystem | string {
  if (!(building.height_m.value > 0) || !(building.storeys.value > 0)) return 'neither height nor storeys are known';
  const cases = casesOf(building, context);
  if (typeof cases === 'string') return cases;
  // over all eras: the likeliest case may be of another system, whose eras are fewer
  const shown = cases.list.map(({ system: along, system_transverse: across }) => ({
    along,
    across,
    chance: cases.list
      .filter(({ system, system_transverse }) => system === along && system_transverse === across)
      .reduce((sum, { chance }) => sum + chance, 0),
  }));
  const likeliest = shown.reduce((best, each) => (each.chance > best.chance ? each : best));
  return { ...likeliest, onRecord: cases.systemKnown };
}
