/**
 * Storey heights by use: the prior that turns storeys into a height and back.
 * [judgement] Medians of residential, hotel and office agree with a small public sample of heights and storeys
 * (17 tall buildings of one city: 3.07-3.26 m, 3.4-3.6 m, 3.7-4.6 m); the rest and every spread are judgement.
 */
import type { Use } from '../building.js';

export interface StoreyHeight {
  readonly height_m: number;
  /** Spread of the natural logarithm. */
  readonly sigma: number;
}

interface Entry extends StoreyHeight {
  /** Where a single storey is a hall, the height of that one storey. */
  readonly single?: StoreyHeight;
}

const OTHER: Entry = { height_m: 3.5, sigma: 0.2 };
const OFFICE: Entry = { height_m: 4.0, sigma: 0.12 };
const HALL: Entry = { height_m: 4.5, sigma: 0.2, single: { height_m: 7.0, sigma: 0.3 } };

export const STOREY_HEIGHTS: Readonly<Record<Use, Entry>> = {
  residential: { height_m: 3.1, sigma: 0.1 },
  hotel: { height_m: 3.4, sigma: 0.1 },
  office: OFFICE,
  laboratory: OFFICE,
  school: { height_m: 4.0, sigma: 0.15 },
  hospital: { height_m: 4.5, sigma: 0.12 },
  retail: { height_m: 4.8, sigma: 0.2 },
  warehouse: HALL,
  industrial: HALL,
  assembly: { height_m: 4.0, sigma: 0.2, single: { height_m: 6.0, sigma: 0.3 } },
  parking: { height_m: 3.0, sigma: 0.1 },
  emergency: OTHER,
  other: OTHER,
  unknown: OTHER,
};

/** The storey height of a building of `use` with `storeys` storeys, in m, with the spread of its logarithm. [judgement] */
export function storeyHeight(use: Use, storeys: number): StoreyHeight {
  const entry = STOREY_HEIGHTS[use];
  return storeys <= 1 && entry.single !== undefined ? entry.single : entry;
}

/** Storeys of a building of `use` that is `height_m` high, at least 1, with the storey height they rest on. [judgement] */
export function storeysFromHeight(use: Use, height_m: number): { readonly storeys: number; readonly sigma: number } {
  const entry = STOREY_HEIGHTS[use];
  // A hall: one storey up to one and a half of its usual height.
  if (entry.single !== undefined && height_m <= 1.5 * entry.single.height_m)
    return { storeys: 1, sigma: entry.single.sigma };
  return { storeys: Math.max(1, Math.round(height_m / entry.height_m)), sigma: entry.sigma };
}
