/**
 * ASCE/SEI 7, approximate fundamental period. The foot coefficient is held as printed: the metric column is rounded in the later
 * editions (0.0724, 0.0466, 0.0731, 0.0488) and misprinted in 7-02 (0.055 for "other" where 0.0488 is right). The metric value of
 * C_q, printed as 0.00058 m, is off by the square of a foot: with h in metres it is 0.0019/0.3048 = 0.00623.
 * Equation numbers moved between the editions; the clause is 12.8.2 throughout since 7-05.
 */
import type { AnyRecord, Limit } from '../formula.js';
import { perStorey } from './families.js';
import { FOOT_M, heightRow, heightUpTo, period, periodLimit, wallArea } from './publication.js';
import type { Publication } from './publication.js';
import { capBySpectrum } from './sway-families.js';
import type { CapBySpectrumConstants } from './sway-families.js';
import { fullHeightRatio, fullHeightRatioPeriod, ratioByWallHeight, ratioByWallHeightPeriod } from './wall-families.js';

const edition = (year: string, clause: string, verified: Publication['verified']): Publication => ({
  id: `asce7-${year}`,
  source: { standard: 'ASCE/SEI 7', edition: year, clause },
  verified,
  basis: 'design',
  unit_m: FOOT_M,
});

const TABLE = '12.8.2.1, table 12.8-2';
const ASCE7_22 = edition('22', TABLE, 'memory');
const ASCE7_16 = edition('16', TABLE, 'memory');
const ASCE7_10 = edition('10', TABLE, 'memory');
const ASCE7_05 = edition('05', TABLE, 'restated');
const ASCE7_02 = edition('02', '9.5.5.3.2, table 9.5.5.3.2', 'memory');
const ASCE7_95 = edition('95', 'approximate period', 'memory');

const NOT_STIFFENED = 'The frames resist the whole of the force and are not enclosed or adjoined by more rigid parts.';

const storeyLimits: readonly Limit[] = [
  { input: 'storeys', from: 1, to: 12, whose: 'publication', outside: 'reject', text: 'at most 12 storeys' },
  {
    input: 'mean_storey_height_m',
    from: 3,
    whose: 'publication',
    outside: 'reject',
    text: 'storeys of at least 3 m (10 ft) on average',
  },
];

const byStoreys = (of: Publication, clause: string): AnyRecord =>
  period(
    of,
    'moment-frame-by-storeys',
    'Approximate period by number of storeys, moment frames',
    perStorey,
    { coefficient: 0.1 },
    {
      clause,
      verified: 'memory',
      limits: storeyLimits,
      note: 'Concrete or steel moment frames throughout. Two public pages say "does not exceed 10 ft": they are wrong.',
    },
  );

const STEEL_TITLE = 'Approximate period, steel moment frame';
const CONCRETE_TITLE = 'Approximate period, concrete moment frame';
const BRACED_TITLE = 'Approximate period, steel eccentrically braced or buckling-restrained braced frame';
const OTHER_TITLE = 'Approximate period, all other systems';

/** The four rows of the table, alike in every edition since 7-05. */
function table(of: Publication, steel: Publication['verified'], braced?: string): readonly AnyRecord[] {
  return [
    heightRow(of, 'steel-moment-frame', STEEL_TITLE, 0.028, 0.8, { verified: steel, note: NOT_STIFFENED }),
    heightRow(of, 'concrete-moment-frame', CONCRETE_TITLE, 0.016, 0.9, { note: NOT_STIFFENED }),
    heightRow(
      of,
      'steel-eccentric-or-buckling-restrained',
      BRACED_TITLE,
      0.03,
      0.75,
      braced === undefined ? {} : { note: braced },
    ),
    heightRow(of, 'other', OTHER_TITLE, 0.02, 0.75),
    byStoreys(of, '12.8.2.1'),
  ];
}

const WALL_TITLE = 'Approximate period, concrete or masonry shear walls, by wall area';
const WALL = { coefficient: 0.0019, slenderness: 0.83, unit_m: FOOT_M };
const RATIO = { slenderness: 0.83 };
const RATIO_TITLE = 'Equivalent wall area in per cent of the base area';
const METRIC =
  'The metric constant printed beside it, 0.00058, is not 0.0019 ft in metres: with heights in metres it is 0.00623.';

const wallsToTop = (of: Publication): readonly AnyRecord[] => [
  period(of, 'concrete-or-masonry-walls', WALL_TITLE, fullHeightRatioPeriod, WALL, {
    clause: '12.8.2.1',
    verified: 'memory',
    limits: [heightUpTo(120 * FOOT_M, 'buildings up to 120 ft (36.6 m)', 'reject')],
    note: METRIC,
  }),
  wallArea(of, 'concrete-or-masonry-walls', RATIO_TITLE, fullHeightRatio, RATIO, {
    clause: '12.8.2.1',
    verified: 'memory',
  }),
];
const wallsByHeight = (of: Publication): readonly AnyRecord[] => [
  period(of, 'concrete-or-masonry-walls', WALL_TITLE, ratioByWallHeightPeriod, WALL, {
    clause: '12.8.2.1',
    verified: 'memory',
    note: `The form of C_w is restated, 0.0019 recalled. ${METRIC}`,
  }),
  wallArea(of, 'concrete-or-masonry-walls', RATIO_TITLE, ratioByWallHeight, RATIO, { clause: '12.8.2.1' }),
];

/** C_u of table 12.8-1, the same since 7-05. */
const CU: CapBySpectrumConstants = {
  sd1_1_g: 0.1,
  sd1_2_g: 0.15,
  sd1_3_g: 0.2,
  sd1_4_g: 0.3,
  sd1_5_g: 0.4,
  cap_1: 1.7,
  cap_2: 1.6,
  cap_3: 1.5,
  cap_4: 1.4,
  cap_5: 1.4,
};
const CU_TITLE = 'Longest calculated period for strength design, C_u T_a';
const upperLimit = (of: Publication): AnyRecord =>
  periodLimit(of, 'calculated', CU_TITLE, capBySpectrum, CU, {
    clause: '12.8.2, table 12.8-1',
    verified: 'restated',
    note: 'Not applied here: it bounds a design force, not the best estimate of a period.',
  });

export const ASCE7_22_PERIODS: readonly AnyRecord[] = table(ASCE7_22, 'restated');

export const ASCE7_WALL_AND_LIMIT_RECORDS: readonly AnyRecord[] = [
  ...wallsToTop(ASCE7_22),
  ...wallsToTop(ASCE7_16),
  ...wallsByHeight(ASCE7_10),
  ...wallsByHeight(ASCE7_05),
  upperLimit(ASCE7_22),
  upperLimit(ASCE7_16),
  upperLimit(ASCE7_10),
  upperLimit(ASCE7_05),
  periodLimit(
    { ...ASCE7_05, id: 'nehrp-1997', source: { standard: 'NEHRP provisions', edition: '1997', clause: '5.3.3' } },
    'calculated',
    CU_TITLE,
    capBySpectrum,
    { ...CU, cap_1: 1.7, cap_2: 1.5, cap_3: 1.4, cap_4: 1.3, cap_5: 1.2 },
    {
      verified: 'restated',
      note: 'FEMA 302. Some pages print it as bands; between the rows it is a straight line here.',
    },
  ),
];

export const ASCE7_EARLIER_PERIODS: readonly AnyRecord[] = [
  ...table(ASCE7_16, 'memory'),
  ...table(ASCE7_10, 'memory'),
  ...table(
    ASCE7_05,
    'restated',
    'Buckling-restrained frames are recalled in this row of the table from 2010 on; for 2005 it is uncertain.',
  ),
  heightRow(ASCE7_02, 'steel-moment-frame', STEEL_TITLE, 0.028, 0.8, { note: NOT_STIFFENED }),
  heightRow(ASCE7_02, 'concrete-moment-frame', CONCRETE_TITLE, 0.016, 0.9, { note: NOT_STIFFENED }),
  heightRow(ASCE7_02, 'steel-eccentric-braced', 'Approximate period, steel eccentrically braced frame', 0.03, 0.75),
  heightRow(ASCE7_02, 'other', OTHER_TITLE, 0.02, 0.75, {
    verified: 'restated',
    note: 'The metric column of this edition prints 0.055, a bad conversion: 0.0488 is right.',
  }),
  byStoreys(ASCE7_02, '9.5.5.3.2'),
  heightRow(ASCE7_95, 'steel-moment-frame', STEEL_TITLE, 0.035, 0.75),
  heightRow(
    ASCE7_95,
    'concrete-moment-frame-or-eccentric-braced',
    'Approximate period, concrete moment frame or steel eccentrically braced frame',
    0.03,
    0.75,
  ),
  heightRow(ASCE7_95, 'other', OTHER_TITLE, 0.02, 0.75),
  heightRow(
    {
      id: 'cold-formed-steel',
      source: { standard: 'Design guidance for cold-formed steel', edition: '', clause: 'strap-braced panels' },
      verified: 'restated',
      basis: 'design',
      unit_m: FOOT_M,
    },
    'strap-braced-panels',
    'Approximate period, panels of cold-formed steel braced by straps',
    0.03,
    0.75,
  ),
];
