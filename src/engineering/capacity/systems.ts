/**
 * What an edition gave a system: its K, R_w and R, from memory of the editions' tables (bearing-wall rows for wall systems);
 * the ductility classes are judgement. None of it is read in the printed tables: check before it decides anything.
 */
import type { System } from '../building.js';

export interface SystemFactors {
  /** K of UBC 1961 to 1985: [before the detailing year, from it on]. */
  readonly k: readonly [number, number];
  /** R_w of UBC 1988 to 1994. */
  readonly rw: number;
  /** R of UBC 1997. */
  readonly r1997: number;
  /** R of ASCE 7 from 2002. */
  readonly r2002: number;
  /** Of masonry where nothing was designed: the lower ductility. */
  readonly brittle: boolean;
  /** Belongs to the special systems of current editions. */
  readonly special: boolean;
  /** No detailing makes it ductile. */
  readonly neverDuctile: boolean;
  /** First edition year from which the family gave the system no row: such a building counts as not designed [judgement]. */
  readonly noRowFrom: number | null;
  /** Which design period formula the editions gave it. */
  readonly periodClass: 'steel-moment-frame' | 'concrete-moment-frame' | 'eccentric-braced' | 'other';
}

function factors(
  k: readonly [number, number],
  rw: number,
  r1997: number,
  r2002: number,
  more: Partial<Pick<SystemFactors, 'brittle' | 'special' | 'neverDuctile' | 'noRowFrom' | 'periodClass'>> = {},
): SystemFactors {
  return {
    k,
    rw,
    r1997,
    r2002,
    brittle: false,
    special: false,
    neverDuctile: false,
    noRowFrom: null,
    periodClass: 'other',
    ...more,
  };
}

export const SYSTEM_FACTORS: Readonly<Record<System, SystemFactors>> = {
  'steel-moment-frame': factors([0.67, 0.67], 12, 8.5, 8, { special: true, periodClass: 'steel-moment-frame' }),
  'steel-concentric-braced-frame': factors([1, 1], 8, 5.6, 6, { special: true }),
  'steel-eccentric-braced-frame': factors([1, 1], 10, 7, 8, { special: true, periodClass: 'eccentric-braced' }),
  'steel-buckling-restrained-braced-frame': factors([1, 1], 8, 6.4, 8, {
    special: true,
    periodClass: 'eccentric-braced',
  }),
  'steel-light-frame': factors([1, 1], 6, 4.5, 3.5),
  'concrete-moment-frame': factors([1, 0.67], 12, 8.5, 8, { special: true, periodClass: 'concrete-moment-frame' }),
  'concrete-infilled-frame': factors([1, 1], 5, 3.5, 3),
  'concrete-shear-wall': factors([1.33, 1.33], 6, 4.5, 5, { special: true }),
  'concrete-wall-frame': factors([1, 0.8], 12, 8.5, 7, { special: true }),
  'precast-concrete-frame': factors([1, 1], 5, 3.5, 3, { periodClass: 'concrete-moment-frame' }),
  'precast-tilt-up-wall': factors([1.33, 1.33], 6, 4.5, 4),
  'reinforced-masonry-wall': factors([1.33, 1.33], 6, 4.5, 5, { brittle: true }),
  'confined-masonry-wall': factors([1.33, 1.33], 5, 3, 2.5, { brittle: true }),
  'unreinforced-masonry-wall': factors([1.33, 1.33], 1.5, 1.5, 1.5, {
    brittle: true,
    neverDuctile: true,
    noRowFrom: 1961,
  }),
  'timber-light-frame': factors([1.33, 1], 8, 5.5, 6.5, { special: true }),
  'timber-post-and-beam': factors([1, 1], 5, 3.5, 2.5),
};
