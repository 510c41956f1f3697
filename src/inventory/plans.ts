import { readFootprint } from './footprint.js';
import { TREATED_AS_UNKNOWN } from './cell.js';
import type { BuildingNotes } from './findings.js';
import type { Sizes } from './sizes.js';

export interface Plans {
  readonly length_m: Float64Array;
  readonly width_m: Float64Array;
  /** Of the footprint where there is one, else of the two sides. */
  readonly area_m2: Float64Array;
  readonly lon: Float64Array;
  readonly lat: Float64Array;
  readonly reentrant_projection: Float64Array;
  readonly reentrant_area_share: Float64Array;
  readonly footprint_area_m2: Float64Array;
  /** Some footprint could not be read. */
  readonly hasUnreadable: boolean;
}

/** Finding of a footprint that is none: it is not kept as one. */
export const UNREADABLE = {
  code: 'not-a-polygon',
  column: 'footprint',
  test: 'not a WKT POLYGON or MULTIPOLYGON in degrees',
  action: TREATED_AS_UNKNOWN,
};

/** Note of a building of several outlines. */
const SEVERAL = {
  code: 'several-outlines',
  column: 'footprint',
  test: 'a MULTIPOLYGON of more than one polygon',
  action: 'the area is the sum; plan sides and re-entrant corners are read from the row alone',
};

/** Plan sides, plan area and place: as given, else from the footprint. */
export function readPlans(sizes: Sizes, notes: BuildingNotes): Plans {
  const rows = sizes.rowCount;
  const take = (given: Float64Array | undefined): Float64Array => given?.slice() ?? new Float64Array(rows).fill(NaN);
  const plans = {
    length_m: take(sizes.plan_length_m),
    width_m: take(sizes.plan_width_m),
    area_m2: new Float64Array(rows),
    lon: take(sizes.lon),
    lat: take(sizes.lat),
    reentrant_projection: take(sizes.reentrant_projection),
    reentrant_area_share: take(sizes.reentrant_area_share),
    footprint_area_m2: take(sizes.footprint_area_m2),
    hasUnreadable: false,
  };
  const fill = (array: Float64Array, at: number, value: number): void => {
    if (Number.isNaN(array[at])) array[at] = value;
  };
  if (sizes.footprint === undefined) {
    for (let at = 0; at < rows; at += 1) plans.area_m2[at] = plans.length_m[at]! * plans.width_m[at]!;
    return plans;
  }
  for (let at = 0; at < rows; at += 1) {
    const text = sizes.footprint[at] ?? null;
    const found = text === null ? undefined : readFootprint(text);
    if (found !== undefined) {
      fill(plans.length_m, at, found.shape?.length_m ?? NaN);
      fill(plans.width_m, at, found.shape?.width_m ?? NaN);
      fill(plans.lon, at, found.lon);
      fill(plans.lat, at, found.lat);
      fill(plans.reentrant_projection, at, found.shape?.reentrant_projection ?? NaN);
      fill(plans.reentrant_area_share, at, found.shape?.reentrant_area_share ?? NaN);
      fill(plans.footprint_area_m2, at, found.area_m2);
      if (found.outlines > 1) {
        const message = `${String(found.outlines)} outlines: give the sides of the plan, or each building a row of its own`;
        notes.add(SEVERAL, sizes.first_row[at] ?? 0, text!.slice(0, 200), message);
      }
    } else if (text !== null) {
      plans.hasUnreadable = true;
      const message =
        'the footprint is no polygon of longitudes and latitudes: POLYGON ((lon lat, lon lat, …)) or MULTIPOLYGON (((lon lat, …)), …)';
      notes.add(UNREADABLE, sizes.first_row[at] ?? 0, text.slice(0, 200), message);
    }
    plans.area_m2[at] = found?.area_m2 ?? (plans.length_m[at] ?? NaN) * (plans.width_m[at] ?? NaN);
  }
  return plans;
}
