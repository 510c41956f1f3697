/** People present on average, and how well they are known. */
import type { Building } from '../building.js';
import { apply } from '../formula.js';
import { PEOPLE_AT_PEAK, PEOPLE_EXPOSED } from '../priority/records.js';
import type { Trace } from '../trace.js';
import type { AssessContext } from './context.js';

export interface People {
  readonly people_exposed: number;
  /** Spread of its natural logarithm. */
  readonly sigma: number;
}

/** Counted people where the row gives them, else floor area times the density of the use; hours from the row or the use. */
export function peopleOf(building: Building, context: AssessContext, trace?: Trace): People | string {
  const { spreads } = context.settings;
  const values = context.assumed.uses[building.use];
  const counted = building.occupants_peak >= 0;
  const area = building.floor_area_m2;
  if (!counted && !(area.value > 0)) return 'neither people nor floor area is known';
  if (counted) trace?.value('occupants_peak', building.occupants_peak, 'given', 'from the inventory');
  else {
    trace?.value('floor_area_m2', area.value, area.origin, area.rule === '' ? 'from the inventory' : area.rule);
    trace?.value(
      'people_per_m2',
      values.people_per_m2,
      'default',
      `density of use "${building.use}" [${values.verified}]`,
    );
  }
  const occupants_peak = counted
    ? building.occupants_peak
    : apply(PEOPLE_AT_PEAK, { floor_area_m2: area.value, people_per_m2: values.people_per_m2 }, trace);
  const stated = building.occupied_hours_per_week >= 0;
  const occupied_hours_per_week = stated ? building.occupied_hours_per_week : values.hours_per_week;
  if (!stated)
    trace?.value(
      'occupied_hours_per_week',
      occupied_hours_per_week,
      'default',
      `hours of use "${building.use}" [judgement]`,
    );
  const people_exposed = apply(PEOPLE_EXPOSED, { occupants_peak, occupied_hours_per_week }, trace);
  // counted people leave the hours in doubt: little where they are stated or the use is known, more otherwise [judgement]
  const own = counted
    ? stated || building.use !== 'unknown'
      ? spreads.peopleCounted
      : spreads.peopleKnownUse
    : building.use === 'unknown'
      ? spreads.peopleUnknownUse
      : spreads.peopleKnownUse;
  const sigma = counted ? own : Math.sqrt(own * own + area.sigma * area.sigma);
  return { people_exposed, sigma };
}
