/**
 * Which rows of a standard speak for which lateral system, best first: by wall area, then those that need the plan or the storeys,
 * then height alone. Precast frames count as concrete moment frames [judgement]; infilled frames are stiffened by rigid parts and
 * count as "other" unless the standard names them; a system that the standard does not name takes its "other".
 */
import { SYSTEMS } from '../building.js';
import type { System } from '../building.js';

/** Ids are the first part of the record ids. */
export const PERIOD_STANDARDS = [
  'asce7-22',
  'asce41-17',
  'en1998-1-2004',
  'asce7-16',
  'asce7-10',
  'asce7-05',
  'asce7-02',
  'fema356',
  'ubc-1997',
  'ntc-2008',
  'nzs1170-5-2004',
  'as1170-4-2007',
  'nbc105-2020',
  'nbc-2015',
  'is1893-2002',
  'is1893-2016',
  'japan-1793',
  'gb50009-2012',
  'tbdy-2018',
  'taiwan',
  'kds41-17-00',
  'iran2800-4',
  'e030',
  'nsr-10',
  'nec-se-ds',
  'covenin-1756',
  'rpa-99-2003',
  'bnbc-2020',
  'sni1726',
] as const;
export type PeriodStandard = (typeof PERIOD_STANDARDS)[number];

type Names = readonly string[];

export interface StandardForms {
  /** By system: names of records, best first. */
  readonly systems: Readonly<Partial<Record<System, Names>>>;
  /** For every system not named. */
  readonly otherwise: Names;
  /** Forms of the same standard that are allowed beside these, for showing only. */
  readonly beside?: Readonly<Partial<Record<System, Names>>>;
  /** What an engineer should know before reading demand by it. */
  readonly note?: string;
}

const on = (systems: readonly System[], ...names: string[]): Partial<Record<System, Names>> =>
  Object.fromEntries(systems.map((system) => [system, names]));

const STEEL_FRAME: readonly System[] = ['steel-moment-frame'];
const CONCRETE_FRAME: readonly System[] = ['concrete-moment-frame', 'precast-concrete-frame'];
const ECCENTRIC: readonly System[] = ['steel-eccentric-braced-frame'];
const ECCENTRIC_OR_RESTRAINED: readonly System[] = [...ECCENTRIC, 'steel-buckling-restrained-braced-frame'];
const BRACED: readonly System[] = [...ECCENTRIC_OR_RESTRAINED, 'steel-concentric-braced-frame'];
const STEEL: readonly System[] = [...STEEL_FRAME, ...BRACED, 'steel-light-frame'];
const TIMBER: readonly System[] = ['timber-light-frame', 'timber-post-and-beam'];
const CONCRETE_WALL: readonly System[] = ['concrete-shear-wall', 'precast-tilt-up-wall'];
const MASONRY: readonly System[] = ['reinforced-masonry-wall', 'confined-masonry-wall', 'unreinforced-masonry-wall'];
const WALL: readonly System[] = [...CONCRETE_WALL, ...MASONRY];
const FRAMES: readonly System[] = [...STEEL_FRAME, ...CONCRETE_FRAME];

const AREA = 'concrete-or-masonry-walls';
const OTHER: Names = ['other'];

const frames = (steel: string, concrete: string): Partial<Record<System, Names>> => ({
  ...on(STEEL_FRAME, steel),
  ...on(CONCRETE_FRAME, concrete),
});
const ASCE_ROWS = {
  ...frames('steel-moment-frame', 'concrete-moment-frame'),
  ...on(ECCENTRIC_OR_RESTRAINED, 'steel-eccentric-or-buckling-restrained'),
};
const ASCE7: StandardForms = {
  systems: { ...ASCE_ROWS, ...on(WALL, AREA, 'other') },
  otherwise: OTHER,
  beside: on(FRAMES, 'moment-frame-by-storeys'),
};
const FLEXIBLE = ['flexible-diaphragm', 'flexible-diaphragm-by-span'] as const;
const EXISTING: StandardForms = {
  systems: {
    ...frames('steel-moment-frame', 'concrete-moment-frame'),
    ...on(ECCENTRIC, 'steel-eccentric-braced'),
  },
  otherwise: OTHER,
  beside: {
    ...on(WALL, ...FLEXIBLE),
    ...on(['unreinforced-masonry-wall'], ...FLEXIBLE, 'unreinforced-masonry-flexible-diaphragm'),
  },
};
const EN_ROWS = {
  ...frames('steel-moment-frame', 'concrete-moment-frame-or-eccentric-braced'),
  ...on(ECCENTRIC, 'concrete-moment-frame-or-eccentric-braced'),
};
const ULTIMATE =
  'The ultimate-limit-state form with its factor 1.25 is read for demand, since the spectrum is that of strong shaking; the form without the factor is for serviceability.';
const ONE_STOREY: Partial<Record<System, Names>> = {
  ...on(WALL, 'one-storey-walls'),
  ...on(STEEL, 'one-storey-steel-frames'),
};

export const STANDARD_FORMS: Readonly<Record<PeriodStandard, StandardForms>> = {
  'asce7-22': ASCE7,
  'asce7-16': ASCE7,
  'asce7-10': ASCE7,
  'asce7-05': ASCE7,
  'asce7-02': {
    systems: {
      ...frames('steel-moment-frame', 'concrete-moment-frame'),
      ...on(ECCENTRIC, 'steel-eccentric-braced'),
    },
    otherwise: OTHER,
    beside: on(FRAMES, 'moment-frame-by-storeys'),
  },
  'asce41-17': EXISTING,
  fema356: {
    ...EXISTING,
    systems: { ...EXISTING.systems, ...on(TIMBER, 'wood') },
    note: 'Wood buildings take 0.060 h^0.75 (feet), three times the period that ASCE 7 and ASCE 41-17 give them.',
  },
  'en1998-1-2004': {
    systems: { ...EN_ROWS, ...on(WALL, AREA, 'other') },
    otherwise: OTHER,
    beside: on(SYSTEMS, 'gravity-sway'),
  },
  'ubc-1997': { systems: { ...EN_ROWS, ...on(WALL, AREA, 'other') }, otherwise: OTHER },
  'ntc-2008': { systems: frames('steel-frame', 'concrete-frame'), otherwise: OTHER },
  'nzs1170-5-2004': {
    systems: { ...EXISTING.systems, ...on(WALL, 'walls', 'other') },
    otherwise: OTHER,
    note: ULTIMATE,
  },
  'as1170-4-2007': { systems: EXISTING.systems, otherwise: OTHER, note: 'Its one form holds the factor 1.25.' },
  'nbc105-2020': { systems: EXISTING.systems, otherwise: ['walls-and-other'], note: ULTIMATE },
  'nbc-2015': {
    systems: {
      ...frames('steel-moment-frame', 'concrete-moment-frame'),
      ...on(BRACED, 'braced-frame'),
      ...on(WALL, 'shear-walls'),
    },
    otherwise: OTHER,
    beside: { ...ONE_STOREY, ...on(['precast-concrete-frame'], 'moment-frame-by-storeys') },
  },
  'is1893-2002': {
    systems: frames('steel-moment-frame', 'concrete-moment-frame'),
    otherwise: OTHER,
    note: 'All but bare frames take 0.09 h/√d and need the plan dimension; there is no form by height alone.',
  },
  'is1893-2016': {
    systems: {
      ...frames('steel-moment-frame', 'concrete-moment-frame'),
      ...on(CONCRETE_WALL, 'concrete-walls', 'other'),
    },
    otherwise: OTHER,
    note: 'All but bare frames and concrete walls take 0.09 h/√d and need the plan dimension; there is no form by height alone.',
  },
  'japan-1793': {
    systems: on([...STEEL, ...TIMBER], 'mixed', 'steel-or-wood'),
    otherwise: ['mixed', 'concrete'],
  },
  'gb50009-2012': {
    systems: {
      ...on(STEEL, 'steel-by-storeys-lower'),
      ...on(CONCRETE_FRAME, 'concrete-frame-or-frame-wall', 'concrete-by-storeys-upper'),
      ...on(['concrete-wall-frame'], 'concrete-frame-or-frame-wall', 'concrete-by-storeys-lower'),
      ...on(CONCRETE_WALL, 'concrete-walls', 'concrete-by-storeys-lower'),
    },
    otherwise: ['concrete-by-storeys-lower'],
    beside: {
      ...on(STEEL, 'steel-by-storeys-upper'),
      ...on([...CONCRETE_FRAME, ...CONCRETE_WALL, 'concrete-wall-frame'], 'concrete-by-storeys-upper'),
    },
    note: 'The rows by storeys are ranges. Read are the lower end for steel and walls, the upper end for bare concrete frames; masonry and timber, which the annex does not treat, take the lower end for concrete [judgement].',
  },
  'tbdy-2018': {
    systems: {
      ...frames('steel-frames', 'concrete-frames'),
      ...on(BRACED, 'steel-frames'),
      ...on(CONCRETE_WALL, 'concrete-walls', 'other'),
    },
    otherwise: OTHER,
    note: 'Braced steel frames are read as steel frames [from memory].',
  },
  taiwan: {
    systems: {
      ...frames('steel-moment-frame', 'concrete-or-eccentric-braced'),
      ...on(ECCENTRIC, 'concrete-or-eccentric-braced'),
    },
    otherwise: OTHER,
  },
  'kds41-17-00': ASCE7,
  'iran2800-4': {
    systems: {
      ...frames('steel-moment-or-eccentric-braced', 'concrete-moment-frame'),
      ...on(ECCENTRIC, 'steel-moment-or-eccentric-braced'),
      ...on(['concrete-infilled-frame'], 'concrete-moment-frame-infilled'),
    },
    otherwise: OTHER,
  },
  e030: {
    systems: { ...frames('frames', 'frames'), ...on(BRACED, 'frames-with-core-walls-or-braced-steel') },
    otherwise: ['masonry-walls-and-dual'],
    note: 'Timber and infilled frames are read with masonry, walls and dual systems [judgement].',
  },
  'nsr-10': { systems: ASCE_ROWS, otherwise: OTHER },
  'nec-se-ds': {
    systems: { ...frames('steel-moment-frame', 'concrete-moment-frame'), ...on(BRACED, 'steel-braced-frame') },
    otherwise: ['concrete-walls-or-braces'],
    note: 'Masonry, timber, light steel and infilled frames are read as concrete with walls [judgement].',
  },
  'covenin-1756': { systems: frames('steel-frames', 'concrete-frames'), otherwise: OTHER },
  'rpa-99-2003': {
    systems: frames('steel-moment-frame', 'concrete-moment-frame'),
    otherwise: ['other-by-plan', 'other'],
    note: 'For infilled frames and walls the smaller of two forms governs where the plan dimension is known.',
  },
  'bnbc-2020': { systems: ASCE_ROWS, otherwise: OTHER },
  sni1726: { systems: ASCE_ROWS, otherwise: OTHER },
};
