/**
 * Where the codes draw the line, as far as a row of an inventory can show it. Marks: S restated, M from memory (data sheet of
 * stiffness and demand, section 12). Mass (ASCE 7-16 and NZS 150 %, IS 1893 200 then 150 %; ASCE 7-22 has none), weak storeys by
 * strength and torsion by drifts need what no row has: there flags and chances speak.
 */
import { SOFT_ASCE7_16, SOFT_ASCE7_22, SOFT_IS1893_2002, SOFT_IS1893_2016, SOFT_NZS1170 } from './records.js';
import type { SoftStoreyRecord } from './records.js';

export interface IrregularityRules {
  readonly title: string;
  /** null: the code tells a soft storey by drifts or in words. */
  readonly soft: SoftStoreyRecord | null;
  /** Both projections beyond a re-entrant corner above this share of the plan dimension. */
  readonly projection: number | null;
  /** Area between outline and hull, each, above this share of the floor. */
  readonly hullShare: number | null;
  /** Plan dimension over that of the storey above it, above this. */
  readonly setback: number | null;
}

export const IRREGULARITY_EDITIONS = {
  // S: Tables 12.3-1 and 12.3-2
  'asce7-16': { title: 'ASCE/SEI 7-16', soft: SOFT_ASCE7_16, projection: 0.15, hullShare: null, setback: 1.3 },
  // S, but the projection M
  'asce7-22': { title: 'ASCE/SEI 7-22', soft: SOFT_ASCE7_22, projection: 0.2, hullShare: null, setback: 1.3 },
  // S: 4.2.3.2 (5 % of the floor), 4.2.3.3 (a step of 20 % of the lower plan: 1/0.8)
  'en1998-1-2004': { title: 'EN 1998-1:2004', soft: null, projection: null, hullShare: 0.05, setback: 1.25 },
  // S, M
  'is1893-2002': { title: 'IS 1893:2002', soft: SOFT_IS1893_2002, projection: 0.15, hullShare: null, setback: 1.5 },
  'is1893-2016': { title: 'IS 1893:2016', soft: SOFT_IS1893_2016, projection: 0.15, hullShare: null, setback: 1.25 },
  // M
  'nzs1170-5-2004': { title: 'NZS 1170.5:2004', soft: SOFT_NZS1170, projection: null, hullShare: null, setback: null },
  // S for the projection; a soft storey is told by drifts there
  'tbdy-2018': { title: 'TBDY 2018', soft: null, projection: 0.2, hullShare: null, setback: null },
} as const satisfies Readonly<Record<string, IrregularityRules>>;

export type IrregularityEdition = keyof typeof IRREGULARITY_EDITIONS;
export const IRREGULARITY_EDITION_IDS = Object.keys(IRREGULARITY_EDITIONS) as readonly IrregularityEdition[];

/** Floor area on record over built area: usable area is less than what is built [judgement]. */
export const USABLE_SHARE = 0.8;
/** One wall with more than this share of a direction's wall area: the strength stands on one side (ASCE 7-22, from memory). */
export const ONE_SIDED_SHARE = 0.75;
