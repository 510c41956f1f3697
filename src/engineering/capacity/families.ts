/** The families of codes whose histories are carried: their editions, and the dates from which detailing made systems ductile. */
import type { System } from '../building.js';
import type { AnyRecord } from '../formula.js';
import type { Verified } from '../source.js';
import { CANADA_RECORDS, CANADIAN_EDITIONS, NBC_CALIBRATION, NBC_K, NBC_R, NBC_RD_RO } from './canada.js';
import type { CodeEdition } from './edition.js';
import { EDITION_RECORDS } from './editions.js';
import { GREECE_RECORDS, GREEK_COEFFICIENTS, GREEK_EDITIONS, GREEK_Q } from './greece.js';
import { INDIAN_EDITIONS, INDIAN_K, INDIAN_R, INDIA_RECORDS, LOAD_FACTOR } from './india.js';
import { ITALIAN_EDITIONS, ITALY_RECORDS, MEDIUM_Q } from './italy.js';
import { JAPANESE_EDITIONS, JAPAN_DS, JAPAN_RECORDS } from './japan.js';
import { NEW_ZEALAND_EDITIONS, NEW_ZEALAND_RECORDS, NZ_DUCTILITY, NZ_M, NZ_S } from './new-zealand.js';
import { OWN_TABLE_RECORDS } from './own-table.js';
import type { OwnId } from './own-table.js';
import type { EditionInputs } from './stated.js';
import { WORKING_TO_STRENGTH } from './records.js';
import { SYSTEM_FACTORS } from './systems.js';
import { TURKEY_RECORDS, TURKISH_EDITIONS, TURKISH_K, TURKISH_R } from './turkey.js';
import { US_EDITIONS } from './us.js';

export type CarriedId = keyof EditionInputs;
export type EditionId = CarriedId | OwnId;

/** Edition years by which a structural type counts as weak; each says what it rests on. */
export interface WeakDates {
  /** Tilt-up walls by an edition before it lack the wall anchors. */
  readonly tilt_up_before: number;
  /** Precast frames by an edition before it. */
  readonly precast_before: number;
  /** Welded steel moment frames by an edition of these years; null: not known as a weak type there. */
  readonly welded_from: number | null;
  readonly welded_before: number | null;
  readonly source: string;
}

export interface CodeFamily {
  readonly title: string;
  readonly editions: Partial<Readonly<Record<CarriedId, CodeEdition<never>>>>;
  /** Year of the first edition by which concrete, steel and reinforced masonry were detailed to be ductile. */
  readonly detailingFrom: number;
  readonly detailingSource: string;
  readonly detailingVerified: Verified;
  /** Beside the detailing date, which concrete frames go by. */
  readonly weak: WeakDates;
  /** First edition year from which special systems of the family count as such [judgement]; null: the study cannot tell which they are. */
  readonly specialFrom: number | null;
  /** Systems to which an edition from that year on gives no row: such a building counts as not designed [judgement]. */
  readonly noRowFrom: Partial<Readonly<Record<System, number>>>;
  /**
   * The first edition that reduces the elastic force by a factor of its own, and that factor at the level of strength, for the detailing it
   * asked. Editions before it stated a coefficient alone: they are not credited with more [judgement]. null: none is known.
   */
  readonly firstReduction: { readonly year: number; readonly of: (system: System) => number } | null;
}

/**
 * What codes asked of unreinforced masonry tells of its wall areas, not that anybody worked them out: it counts as not designed, in every
 * edition [judgement].
 */
const NO_UNREINFORCED_MASONRY = { 'unreinforced-masonry-wall': -Infinity } as const;

/** Where nothing else is known tilt-up walls and precast frames go by the detailing date, and welded steel is not flagged [judgement]. */
const byDetailing = (year: number): WeakDates => ({
  tilt_up_before: year,
  precast_before: year,
  welded_from: null,
  welded_before: null,
  source: 'the detailing date stands for them [judgement]',
});

export const CODE_FAMILIES = {
  'us-ubc-asce7': {
    title: 'United States: UBC, then ASCE/SEI 7',
    editions: US_EDITIONS,
    detailingFrom: 1976,
    detailingSource: 'UBC 1976, ductile concrete',
    detailingVerified: 'restated',
    weak: {
      tilt_up_before: 1976,
      precast_before: 1997,
      welded_from: 1961,
      welded_before: 1997,
      source: 'from memory: wall anchors of UBC 1976, connection damage found in 1994; precast [judgement]',
    },
    specialFrom: 1997,
    noRowFrom: { 'unreinforced-masonry-wall': SYSTEM_FACTORS['unreinforced-masonry-wall'].noRowFrom ?? Infinity },
    firstReduction: { year: 1961, of: (system) => 8 / SYSTEM_FACTORS[system].k[0] / WORKING_TO_STRENGTH },
  },
  japan: {
    title: 'Japan',
    editions: JAPANESE_EDITIONS,
    detailingFrom: 1981,
    detailingSource: 'new seismic design of June 1981',
    detailingVerified: 'restated',
    weak: byDetailing(1981),
    specialFrom: null,
    noRowFrom: NO_UNREINFORCED_MASONRY,
    firstReduction: { year: 1981, of: (system) => 1 / JAPAN_DS[system] },
  },
  'new-zealand': {
    title: 'New Zealand',
    editions: NEW_ZEALAND_EDITIONS,
    detailingFrom: 1976,
    detailingSource: 'NZS 4203:1976 and the ductile detailing that came with it',
    detailingVerified: 'memory',
    weak: byDetailing(1976),
    // capacity design came with it
    specialFrom: 1976,
    noRowFrom: NO_UNREINFORCED_MASONRY,
    firstReduction: { year: 1976, of: (system) => 4 / (NZ_S[system] * NZ_M[system]) },
  },
  italy: {
    title: 'Italy',
    editions: ITALIAN_EDITIONS,
    detailingFrom: 2003,
    detailingSource: 'OPCM 3274 of 2003, capacity design',
    detailingVerified: 'memory',
    weak: byDetailing(2003),
    specialFrom: null,
    noRowFrom: NO_UNREINFORCED_MASONRY,
    firstReduction: { year: 2003, of: (system) => MEDIUM_Q[system] },
  },
  greece: {
    title: 'Greece',
    editions: GREEK_EDITIONS,
    detailingFrom: 1985,
    detailingSource: 'additional articles of 1985',
    detailingVerified: 'memory',
    weak: byDetailing(1985),
    specialFrom: null,
    noRowFrom: NO_UNREINFORCED_MASONRY,
    firstReduction: { year: 1995, of: (system) => GREEK_Q[system] },
  },
  turkey: {
    title: 'Türkiye',
    editions: TURKISH_EDITIONS,
    detailingFrom: 1998,
    detailingSource: 'code of 1998, capacity design',
    detailingVerified: 'memory',
    weak: byDetailing(1998),
    specialFrom: null,
    noRowFrom: NO_UNREINFORCED_MASONRY,
    firstReduction: { year: 1998, of: (system) => TURKISH_R[system] },
  },
  india: {
    title: 'India: IS 1893',
    editions: INDIAN_EDITIONS,
    detailingFrom: 1993,
    detailingSource: 'IS 13920 of 1993, ductile detailing',
    detailingVerified: 'memory',
    weak: byDetailing(1993),
    specialFrom: null,
    noRowFrom: NO_UNREINFORCED_MASONRY,
    firstReduction: { year: 2002, of: (system) => INDIAN_R[system] / LOAD_FACTOR },
  },
  canada: {
    title: 'Canada: National Building Code',
    editions: CANADIAN_EDITIONS,
    detailingFrom: 1975,
    detailingSource: 'NBC 1975 with the ductile detailing of CSA A23.3-73',
    detailingVerified: 'memory',
    weak: byDetailing(1975),
    specialFrom: null,
    noRowFrom: NO_UNREINFORCED_MASONRY,
    firstReduction: { year: 1990, of: (system) => NBC_R[system] / NBC_CALIBRATION },
  },
} as const satisfies Readonly<Record<string, CodeFamily>>;

export type CarriedFamily = keyof typeof CODE_FAMILIES;
export const FAMILY_IDS = Object.keys(CODE_FAMILIES) as readonly CarriedFamily[];
/** The study states its own table of eras. */
export const OWN_FAMILY_ID = 'own-table';
export type FamilyId = CarriedFamily | typeof OWN_FAMILY_ID;
/** Nothing is known of its detailing: the study says from when a system was ductile, if ever. */
export const OWN_FAMILY: CodeFamily = {
  title: "The study's own table",
  editions: {},
  detailingFrom: Infinity,
  detailingSource: 'none: detailing_from says it',
  detailingVerified: 'judgement',
  weak: byDetailing(Infinity),
  specialFrom: null,
  noRowFrom: {},
  firstReduction: null,
};
/** Read where settings kept with an earlier run name no family: there was one. */
export const FIRST_FAMILY: FamilyId = 'us-ubc-asce7';

/** Every edition of every family, family by family, oldest first. */
export const EDITIONS = Object.assign(
  {},
  ...Object.values(CODE_FAMILIES).map(({ editions }: CodeFamily) => editions),
) as Readonly<Record<CarriedId, CodeEdition<never>>>;

export const ERA_RECORDS: readonly AnyRecord[] = [
  ...EDITION_RECORDS,
  ...JAPAN_RECORDS,
  ...NEW_ZEALAND_RECORDS,
  ...ITALY_RECORDS,
  ...GREECE_RECORDS,
  ...TURKEY_RECORDS,
  ...INDIA_RECORDS,
  ...CANADA_RECORDS,
  ...OWN_TABLE_RECORDS,
];

/** What the editions gave each system: for a fingerprint, as records hold none of it. */
export const SYSTEM_TABLES = {
  JAPAN_DS,
  NZ_S,
  NZ_M,
  NZ_DUCTILITY,
  MEDIUM_Q,
  GREEK_COEFFICIENTS,
  GREEK_Q,
  TURKISH_K,
  TURKISH_R,
  INDIAN_K,
  INDIAN_R,
  NBC_K,
  NBC_R,
  NBC_RD_RO,
};
