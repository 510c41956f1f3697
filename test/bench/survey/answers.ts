/** A building as the program sees it once answers of visits are in. */
import { NAMES } from '../../../src/engineering/assess/irregularity-found.js';
import type { Building, Filled } from '../../../src/engineering/building.js';
import type { Visit } from '../../../src/engineering/priority/campaign.js';
import { UNKNOWNS } from '../../../src/engineering/priority/learnable.js';
import type { Unknown } from '../../../src/engineering/priority/learnable.js';
import { drawsOf } from './draws.js';
import type { Truth } from './truth.js';
import type { World } from './world.js';

/** A set of unknowns as bits in the order of UNKNOWNS. */
export type Found = number;
export const EVERYTHING: Found = (1 << UNKNOWNS.length) - 1;

export function hasFound(found: Found, unknown: Unknown): boolean {
  return ((found >> UNKNOWNS.indexOf(unknown)) & 1) === 1;
}

/** What a visit to the building `id` finds out in `world`: the same whenever it is made. */
export function foundBy({ name, finds }: Visit, id: string, { seed, number }: World): Found {
  const { uniform } = drawsOf(seed, number, id);
  let found = 0;
  UNKNOWNS.forEach((unknown, bit) => {
    const chance = finds[unknown] ?? 0;
    if (chance > 0 && uniform(`${name} finds ${unknown}`) < chance) found |= 1 << bit;
  });
  return found;
}

const given = (value: number): Filled => ({ value, sigma: 0, origin: 'given', rule: '' });

/** `building` with the answers to `found` laid over it; what was on record stays. */
export function laid(building: Building, truth: Truth, found: Found): Building {
  const made = { ...building } as { -readonly [K in keyof Building]: Building[K] };
  if (hasFound(found, 'system')) made.system = building.system ?? truth.system;
  if (hasFound(found, 'year') && building.years.length !== 1 && truth.built > 0) made.years = [truth.built];
  if (hasFound(found, 'height') && building.height_m.sigma > 0) {
    made.storeys = given(truth.storeys);
    made.height_m = given(truth.height_m);
    made.floor_area_m2 = areaWith(building, truth.storeys);
  }
  if (hasFound(found, 'irregularity')) for (const name of NAMES) made[name] = building[name] ?? truth.flags[name];
  if (hasFound(found, 'use') && building.use === 'unknown') {
    // a world without uses: a word of the same people and hours, the people by the area
    made.use = truth.use === 'unknown' ? 'other' : truth.use;
    made.floor_area_m2 = { ...made.floor_area_m2, value: made.floor_area_m2.value * truth.useFactor };
    if (truth.use === 'unknown') made.occupied_hours_per_week = truth.hours;
  }
  if (hasFound(found, 'occupants') && !(building.occupants_peak >= 0) && truth.occupants_peak > 0)
    made.occupants_peak = Math.max(1, Math.round(truth.occupants_peak));
  const drawn = building.capacity_sa_g > 0 || building.design_base_shear_coefficient > 0;
  if (hasFound(found, 'drawings') && !drawn) {
    made.design_base_shear_coefficient = truth.coefficient?.value ?? NaN;
    made.design_level = truth.coefficient?.level ?? 'none';
  }
  return made;
}

/** An area that was inferred from storeys follows them. */
function areaWith({ storeys, floor_area_m2: area }: Building, count: number): Filled {
  if (area.origin === 'given' || !(storeys.sigma > 0)) return area;
  const sigma = Math.sqrt(Math.max(area.sigma * area.sigma - storeys.sigma * storeys.sigma, 0));
  return { ...area, value: (area.value * count) / storeys.value, sigma };
}
