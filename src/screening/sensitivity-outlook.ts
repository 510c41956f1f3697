/** What the list hangs on, told with the run itself: one switch of every assumption. */
import type { SensitivityOutlook } from '../engineering/page-contract.js';
import type { Database } from '../store/database.js';
import { sensitivityOn } from './sensitivity.js';
import type { SensitivityBasis } from './sensitivity.js';
import type { WeightSpace } from './weights.js';
import type { Switch } from './switch.js';
import { switchesOf } from './switches.js';

/** Larger inventories are switched on demand (`sensitivity`). */
const MOST_BUILDINGS = 50_000;
/** Buildings ranked again: of larger inventories every second, third … */
const SAMPLE = 2_000;
/** Switches told with the run. */
const TOLD = 12;

/** One switch of every assumption, the largest effects first; null where no list is drawn up or the inventory is too large. */
export async function sensitivityOutlook(
  db: Database,
  basis: SensitivityBasis,
  ranked: number,
): Promise<SensitivityOutlook | null> {
  if (basis.buildings > MOST_BUILDINGS || ranked <= basis.listSize) return null;
  const all = switchesOf(basis.settings);
  const found = await sensitivityOn(db, basis, oneEach(all), { sample: SAMPLE });
  return {
    rankings: found.rankings,
    of_rankings: all.length,
    places: found.places,
    sample: found.sample === null ? null : { every: found.sample.every, buildings: found.sample.buildings },
    always: found.always.map(({ id }) => id),
    ...(found.weights === null ? {} : { weights: weightsTold(found.weights) }),
    switches: found.switches
      .slice(0, TOLD)
      .map(({ assumption, statement, from, to, mark, overlap, places_before: places, tau_b }) => ({
        ...{ assumption, statement, from, to, mark, overlap, places, tau_b },
      })),
  };
}

function weightsTold({
  draws,
  slope,
  safe,
  safe_share,
  places,
}: WeightSpace): NonNullable<SensitivityOutlook['weights']> {
  return { draws, slope: slope !== null, safe, safe_share, places };
}

/** The first switch of every assumption: what is ranked by is the study's question, not an assumption of the answer. */
function oneEach(switches: readonly Switch[]): readonly Switch[] {
  const seen = new Set(['rank-by']);
  return switches.filter(({ assumption }) => {
    if (seen.has(assumption)) return false;
    seen.add(assumption);
    return true;
  });
}
