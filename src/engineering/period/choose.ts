/** Which height formula speaks for a system under the study's standard and basis. */
import type { System } from '../building.js';
import type { AnyRecord } from '../formula.js';
import { ASCE41_17_PERIODS, ASCE7_22_PERIODS, EN1998_PERIODS } from './height-records.js';

export const PERIOD_STANDARDS = ['asce7-22', 'asce41-17', 'en1998-1-2004'] as const;
export type PeriodStandard = (typeof PERIOD_STANDARDS)[number];
export const BASES = ['best-fit', 'design'] as const;
export type Basis = (typeof BASES)[number];

type SystemClass =
  'steel-moment-frame' | 'concrete-moment-frame' | 'eccentric-braced' | 'buckling-restrained' | 'other';

/** Precast frames count as concrete moment frames [judgement]; infilled frames are stiffened by rigid parts and count as other. */
const CLASS_OF: Partial<Record<System, SystemClass>> = {
  'steel-moment-frame': 'steel-moment-frame',
  'concrete-moment-frame': 'concrete-moment-frame',
  'precast-concrete-frame': 'concrete-moment-frame',
  'steel-eccentric-braced-frame': 'eccentric-braced',
  'steel-buckling-restrained-braced-frame': 'buckling-restrained',
};

function byId(list: readonly AnyRecord[], id: string): AnyRecord {
  const found = list.find((record) => record.id === id);
  if (found === undefined) throw new Error(`no record ${id}`);
  return found;
}

const asce7 = (name: string): AnyRecord => byId(ASCE7_22_PERIODS, `asce7-22/period/${name}`);
const asce41 = (name: string): AnyRecord => byId(ASCE41_17_PERIODS, `asce41-17/period/${name}`);
const en1998 = (name: string): AnyRecord => byId(EN1998_PERIODS, `en1998-1-2004/period/${name}`);

const FORMULAS: Record<PeriodStandard, Record<SystemClass, AnyRecord>> = {
  'asce7-22': {
    'steel-moment-frame': asce7('steel-moment-frame'),
    'concrete-moment-frame': asce7('concrete-moment-frame'),
    'eccentric-braced': asce7('steel-eccentric-or-buckling-restrained'),
    'buckling-restrained': asce7('steel-eccentric-or-buckling-restrained'),
    other: asce7('other'),
  },
  'asce41-17': {
    'steel-moment-frame': asce41('steel-moment-frame'),
    'concrete-moment-frame': asce41('concrete-moment-frame'),
    'eccentric-braced': asce41('steel-eccentric-braced'),
    'buckling-restrained': asce41('other'),
    other: asce41('other'),
  },
  'en1998-1-2004': {
    'steel-moment-frame': en1998('steel-moment-frame'),
    'concrete-moment-frame': en1998('concrete-moment-frame-or-eccentric-braced'),
    'eccentric-braced': en1998('concrete-moment-frame-or-eccentric-braced'),
    'buckling-restrained': en1998('other'),
    other: en1998('other'),
  },
};

/** The standard whose formulas are read: ASCE 7 has no best-fit set, ASCE 41 stands in; EN 1998-1 has one set only. */
export function standardRead(standard: PeriodStandard, basis: Basis): PeriodStandard {
  if (standard === 'asce7-22' && basis === 'best-fit') return 'asce41-17';
  if (standard === 'asce41-17' && basis === 'design') return 'asce7-22';
  return standard;
}

/** The height formula of `system` under the study's standard and basis. */
export function heightFormula(system: System, standard: PeriodStandard, basis: Basis): AnyRecord {
  return FORMULAS[standardRead(standard, basis)][CLASS_OF[system] ?? 'other'];
}

/** All height formulas of the standard read, one per class of system, for charts. */
export function formulasOf(standard: PeriodStandard, basis: Basis): readonly AnyRecord[] {
  return [...new Set(Object.values(FORMULAS[standardRead(standard, basis)]))];
}
