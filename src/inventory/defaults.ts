/** What stands in when neither storeys, height nor area say how large a building is. All [judgement]. */
import type { Use } from '../engineering/building.js';

export interface SizeDefault {
  readonly storeys: number;
  /** Floor area of one storey. */
  readonly plate_m2: number;
}

export const SIZE_DEFAULTS: Readonly<Record<Use, SizeDefault>> = {
  residential: { storeys: 2, plate_m2: 200 },
  hotel: { storeys: 4, plate_m2: 800 },
  office: { storeys: 3, plate_m2: 700 },
  school: { storeys: 2, plate_m2: 1200 },
  hospital: { storeys: 3, plate_m2: 2500 },
  retail: { storeys: 1, plate_m2: 600 },
  assembly: { storeys: 1, plate_m2: 600 },
  laboratory: { storeys: 3, plate_m2: 1200 },
  industrial: { storeys: 1, plate_m2: 1500 },
  warehouse: { storeys: 1, plate_m2: 1500 },
  parking: { storeys: 3, plate_m2: 2000 },
  emergency: { storeys: 1, plate_m2: 500 },
  other: { storeys: 2, plate_m2: 400 },
  unknown: { storeys: 2, plate_m2: 400 },
};

/** Spreads of the natural logarithm. */
export const SPREAD = {
  /** Storeys by use alone. */
  defaultStoreys: 0.35,
  /** Storeys from floor area over plan area, and floor area from plan and storeys. */
  fromPlan: 0.2,
  /** Storeys from the total, basements not known. */
  fromTotal: 0.15,
  /** Storeys that may be those of a unit of the building. */
  ofUnits: 0.4,
  /** A height that the storeys contradict. */
  contradicted: 0.35,
  /** Floor area by use alone. */
  defaultArea: 0.8,
  /** A sum of parts of which some have no area. */
  partialArea: 0.2,
  /** A sum in which one part may be the whole building. */
  countedTwice: 0.35,
} as const;
