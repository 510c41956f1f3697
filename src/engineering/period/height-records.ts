/**
 * Height formulas. US records hold the foot coefficient as printed: the standards' metric column is rounded
 * (0.0724, 0.0466, 0.0731, 0.0488), so the foot value is the printed original.
 */
import { record } from '../formula.js';
import type { AnyRecord, Limit } from '../formula.js';
import type { Source, Verified } from '../source.js';
import { heightPower, gravitySway, perStorey } from './families.js';

const FOOT_M = 0.3048;

function heightRecord(
  id: string,
  title: string,
  coefficient: number,
  exponent: number,
  unit_m: number,
  source: Source,
  verified: Verified,
  basis: 'design' | 'best-fit',
  limits: readonly Limit[],
  note?: string,
): AnyRecord {
  return record({
    id,
    title,
    family: heightPower,
    constants: { coefficient, exponent, unit_m },
    source,
    verified,
    basis,
    limits,
    ...(note === undefined ? {} : { note }),
  });
}

const ASCE7_22: Source = { standard: 'ASCE/SEI 7', edition: '22', clause: '12.8.2.1, table 12.8-2' };
const ASCE41_17: Source = { standard: 'ASCE/SEI 41', edition: '17', clause: '7.4.1.2.2' };
const EN1998: Source = { standard: 'EN 1998-1', edition: '2004', clause: '4.3.3.2.2(3)' };

const NOT_STIFFENED = 'The frames resist the whole of the force and are not enclosed or adjoined by more rigid parts.';

const EN_HEIGHT: Limit = {
  input: 'height_m',
  to: 40,
  whose: 'publication',
  outside: 'flag',
  text: 'buildings up to 40 m',
};

export const ASCE7_22_PERIODS: readonly AnyRecord[] = [
  heightRecord(
    'asce7-22/period/steel-moment-frame',
    'Approximate period, steel moment frame',
    0.028,
    0.8,
    FOOT_M,
    ASCE7_22,
    'restated',
    'design',
    [],
    NOT_STIFFENED,
  ),
  heightRecord(
    'asce7-22/period/concrete-moment-frame',
    'Approximate period, concrete moment frame',
    0.016,
    0.9,
    FOOT_M,
    ASCE7_22,
    'memory',
    'design',
    [],
    NOT_STIFFENED,
  ),
  heightRecord(
    'asce7-22/period/steel-eccentric-or-buckling-restrained',
    'Approximate period, steel eccentrically braced or buckling-restrained braced frame',
    0.03,
    0.75,
    FOOT_M,
    ASCE7_22,
    'memory',
    'design',
    [],
  ),
  heightRecord(
    'asce7-22/period/other',
    'Approximate period, all other systems',
    0.02,
    0.75,
    FOOT_M,
    ASCE7_22,
    'memory',
    'design',
    [],
  ),
  record({
    id: 'asce7-22/period/moment-frame-by-storeys',
    title: 'Approximate period by number of storeys, moment frames',
    family: perStorey,
    constants: { coefficient: 0.1 },
    source: { standard: 'ASCE/SEI 7', edition: '22', clause: '12.8.2.1' },
    verified: 'memory',
    basis: 'design',
    limits: [
      { input: 'storeys', from: 1, to: 12, whose: 'publication', outside: 'reject', text: 'at most 12 storeys' },
      {
        input: 'mean_storey_height_m',
        from: 3,
        whose: 'publication',
        outside: 'reject',
        text: 'storeys of at least 3 m (10 ft) on average',
      },
    ],
    note: 'Concrete or steel moment frames throughout. Two public pages say "does not exceed 10 ft": they are wrong.',
  }),
];

export const ASCE41_17_PERIODS: readonly AnyRecord[] = [
  heightRecord(
    'asce41-17/period/steel-moment-frame',
    'Empirical period, steel moment frame',
    0.035,
    0.8,
    FOOT_M,
    ASCE41_17,
    'memory',
    'best-fit',
    [],
  ),
  heightRecord(
    'asce41-17/period/concrete-moment-frame',
    'Empirical period, concrete moment frame',
    0.018,
    0.9,
    FOOT_M,
    ASCE41_17,
    'memory',
    'best-fit',
    [],
  ),
  heightRecord(
    'asce41-17/period/steel-eccentric-braced',
    'Empirical period, steel eccentrically braced frame',
    0.03,
    0.75,
    FOOT_M,
    ASCE41_17,
    'memory',
    'best-fit',
    [],
  ),
  heightRecord(
    'asce41-17/period/other',
    'Empirical period, all other systems',
    0.02,
    0.75,
    FOOT_M,
    ASCE41_17,
    'memory',
    'best-fit',
    [],
    'Measured wall buildings run shorter than this (coefficients 0.014 to 0.015 in later regressions): a known bias.',
  ),
];

export const EN1998_PERIODS: readonly AnyRecord[] = [
  heightRecord(
    'en1998-1-2004/period/steel-moment-frame',
    'Approximate period, steel space moment frame',
    0.085,
    0.75,
    1,
    EN1998,
    'restated',
    'design',
    [EN_HEIGHT],
  ),
  heightRecord(
    'en1998-1-2004/period/concrete-moment-frame-or-eccentric-braced',
    'Approximate period, concrete space moment frame or eccentrically braced steel frame',
    0.075,
    0.75,
    1,
    EN1998,
    'restated',
    'design',
    [EN_HEIGHT],
  ),
  heightRecord(
    'en1998-1-2004/period/other',
    'Approximate period, all other structures',
    0.05,
    0.75,
    1,
    EN1998,
    'restated',
    'design',
    [EN_HEIGHT],
  ),
  record({
    id: 'en1998-1-2004/period/gravity-sway',
    title: 'Period from the sway of the top under gravity applied sideways',
    family: gravitySway,
    constants: { coefficient: 2 },
    source: { standard: 'EN 1998-1', edition: '2004', clause: '4.3.3.2.2(5)' },
    verified: 'restated',
    basis: 'design',
    limits: [],
  }),
];

const MEMORY_OLD = 'Quoted by the era tables only: the period the engineer of that time used.';
const UBC = (edition: string, clause: string): Source => ({ standard: 'UBC', edition, clause });

/** Design periods of past editions, used for the design coefficient of the era and nowhere else. */
export const UBC_HEIGHT_PERIODS: readonly AnyRecord[] = [
  heightRecord(
    'ubc-1988/period/steel-moment-frame',
    'Method A period, steel moment frame',
    0.035,
    0.75,
    FOOT_M,
    UBC('88 to 94', 'static force procedure, Method A'),
    'restated',
    'design',
    [],
    MEMORY_OLD,
  ),
  heightRecord(
    'ubc-1988/period/concrete-moment-frame-or-eccentric-braced',
    'Method A period, concrete moment frame or eccentrically braced frame',
    0.03,
    0.75,
    FOOT_M,
    UBC('88 to 94', 'static force procedure, Method A'),
    'restated',
    'design',
    [],
    MEMORY_OLD,
  ),
  heightRecord(
    'ubc-1988/period/other',
    'Method A period, all other buildings',
    0.02,
    0.75,
    FOOT_M,
    UBC('88 to 94', 'static force procedure, Method A'),
    'restated',
    'design',
    [],
    MEMORY_OLD,
  ),
];
