/**
 * The numbers an assessment assumes besides its spreads: settings, so that a run keeps the ones it was made with and a sensitivity run can
 * switch each of them. The defaults are the only place where they stand.
 */
import type { Use } from '../building.js';
import { MIN_COEFFICIENT_G, OVERSTRENGTH } from '../capacity/records.js';
import { USE_VALUES } from '../prior/use.js';
import type { UseValues } from '../prior/use.js';

/** Displacement ductility by detailing class [judgement]. */
export interface Ductilities {
  /** Masonry where nothing was designed, and systems that no detailing made ductile. */
  readonly brittle: number;
  readonly none: number;
  readonly before: number;
  readonly after: number;
  readonly special: number;
}

export interface Assumed {
  /** Least strength coefficient, V/W [judgement]. */
  readonly leastCoefficient: number;
  /** Ω [judgement]. */
  readonly overstrength: number;
  readonly ductility: Ductilities;
  /** Share of its year's code that a retrofit reached where the row does not say [judgement]. */
  readonly retrofitLevel: number;
  readonly uses: Readonly<Record<Use, UseValues>>;
  /** Exponents of the people exposed and of the importance factor in the priority: 1 each. */
  readonly peopleWeight: number;
  readonly importanceWeight: number;
  /** Factor on the ordinates of a spectrum by its name; 1 where none stands. Only a sensitivity run has any. */
  readonly spectrumFactor: Readonly<Record<string, number>>;
}

export const ASSUMED: Assumed = {
  leastCoefficient: MIN_COEFFICIENT_G,
  overstrength: OVERSTRENGTH,
  ductility: { brittle: 1.5, none: 2, before: 2, after: 3, special: 4 },
  retrofitLevel: 0.75,
  uses: USE_VALUES,
  peopleWeight: 1,
  importanceWeight: 1,
  spectrumFactor: {},
};

/** What is assumed where only some of it is stated, as in the settings of a run made before a number became a setting. */
export function assumedWith(stated: Partial<Assumed> | undefined): Assumed {
  if (stated === undefined) return ASSUMED;
  return {
    ...ASSUMED,
    ...stated,
    ductility: { ...ASSUMED.ductility, ...stated.ductility },
    uses: { ...ASSUMED.uses, ...stated.uses },
  };
}
