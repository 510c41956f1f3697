/**
 * ASCE/SEI 41 and the FEMA documents before it, existing buildings. The coefficients of moment frames are the best fits of Goel and
 * Chopra, 1.25 and 1.125 times those of ASCE 7, which are lower bounds. No cap C_u T_a here.
 */
import type { AnyRecord } from '../formula.js';
import { FOOT_M, INCH_M, heightRow, period } from './publication.js';
import type { Publication } from './publication.js';
import { flexibleDiaphragm, flexibleDiaphragmAlone } from './sway-families.js';

const ASCE41_17: Publication = {
  id: 'asce41-17',
  source: { standard: 'ASCE/SEI 41', edition: '17', clause: '7.4.1.2.2' },
  verified: 'memory',
  basis: 'best-fit',
  unit_m: FOOT_M,
};
const FEMA_356: Publication = {
  ...ASCE41_17,
  id: 'fema356',
  source: { standard: 'FEMA 356', edition: '', clause: '3.3.1.2.2, Method 2' },
};
const FEMA_310: Publication = {
  ...ASCE41_17,
  id: 'fema310',
  source: { standard: 'FEMA 310', edition: '', clause: '4.2.2.1.1, equation 4-1' },
};
const ASCE31: Publication = {
  ...ASCE41_17,
  id: 'asce31-03',
  source: { standard: 'ASCE/SEI 31', edition: '03', clause: 'empirical period' },
};

const KNOWN_BIAS =
  'Measured wall buildings run shorter than this (coefficients 0.014 to 0.015 in later regressions): a known bias.';
const WOOD_TITLE = 'Empirical period, wood buildings';
const WOOD =
  'Three times the 0.020 that ASCE 7 gives wood as "all other". Believed dropped from ASCE 41; the study decides which it reads.';

const table = (of: Publication): readonly AnyRecord[] => [
  heightRow(of, 'steel-moment-frame', 'Empirical period, steel moment frame', 0.035, 0.8),
  heightRow(of, 'concrete-moment-frame', 'Empirical period, concrete moment frame', 0.018, 0.9),
  heightRow(of, 'steel-eccentric-braced', 'Empirical period, steel eccentrically braced frame', 0.03, 0.75),
  heightRow(of, 'other', 'Empirical period, all other systems', 0.02, 0.75, { note: KNOWN_BIAS }),
];

export const ASCE41_17_PERIODS: readonly AnyRecord[] = table(ASCE41_17);

const INCHES = { wall_coefficient: 0.1, diaphragm_coefficient: 0.078, unit_m: INCH_M };
const ONE_SPAN = 'One storey with a single-span flexible diaphragm.';
const SPAN_TITLE = 'Period of a one-storey building with a single-span flexible diaphragm';

const byMethod3 = (of: Publication, clause: string): readonly AnyRecord[] => [
  period(of, 'flexible-diaphragm', SPAN_TITLE, flexibleDiaphragm, INCHES, { clause, note: ONE_SPAN }),
  period(
    of,
    'flexible-diaphragm-by-span',
    'Period of one span of a one-storey building with a multi-span flexible diaphragm',
    flexibleDiaphragm,
    INCHES,
    { clause, note: 'The expression of the single span, span by span.' },
  ),
  period(
    of,
    'unreinforced-masonry-flexible-diaphragm',
    'Period of an unreinforced masonry building with single-span flexible diaphragms',
    flexibleDiaphragmAlone,
    { diaphragm_coefficient: 0.078, unit_m: INCH_M },
    {
      clause,
      limits: [
        { input: 'storeys', from: 1, to: 6, whose: 'publication', outside: 'reject', text: 'at most 6 storeys' },
      ],
    },
  ),
];

export const FEMA_PERIODS: readonly AnyRecord[] = [
  ...byMethod3(ASCE41_17, '7.4.1.2.3'),
  ...table(FEMA_356),
  heightRow(FEMA_356, 'wood', WOOD_TITLE, 0.06, 0.75, { note: WOOD }),
  ...byMethod3(FEMA_356, '3.3.1.2.3, Method 3'),
  heightRow(ASCE31, 'wood', WOOD_TITLE, 0.06, 0.75, { note: WOOD }),
  period(FEMA_310, 'flexible-diaphragm', SPAN_TITLE, flexibleDiaphragm, INCHES, {
    verified: 'restated',
    note: ONE_SPAN,
  }),
];
