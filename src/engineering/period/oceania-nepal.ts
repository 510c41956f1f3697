/** New Zealand, Australia and Nepal: 1.25 k_t h^0.75 at the ultimate limit state. Metres. */
import type { AnyRecord } from '../formula.js';
import { factoredHeightPower } from './families.js';
import { heightRow, period, wallArea } from './publication.js';
import type { Publication, Row } from './publication.js';
import { squaredBracketArea, squaredBracketPeriod } from './wall-families.js';

const NZS: Publication = {
  id: 'nzs1170-5-2004',
  source: { standard: 'NZS 1170.5 Supplement 1', edition: '2004', clause: 'C4.1.2' },
  verified: 'memory',
  basis: 'design',
};
const AS: Publication = {
  id: 'as1170-4-2007',
  source: { standard: 'AS 1170.4', edition: '2007', clause: '6.2.3' },
  verified: 'memory',
  basis: 'design',
};
const NEPAL: Publication = {
  id: 'nbc105-2020',
  source: { standard: 'NBC 105', edition: '2020', clause: '5.1.2, 5.1.3' },
  verified: 'restated',
  basis: 'design',
};

/** Ultimate limit state. */
const amplified = (of: Publication, which: string, what: string, coefficient: number, row: Row = {}): AnyRecord =>
  period(
    of,
    which,
    `Approximate period at the ultimate limit state, ${what}`,
    factoredHeightPower,
    { factor: 1.25, coefficient, exponent: 0.75, unit_m: 1 },
    row,
  );

const NZS_ROWS = [
  ['steel-moment-frame', 'steel moment frame', 0.11],
  ['concrete-moment-frame', 'concrete moment frame', 0.075],
  ['steel-eccentric-braced', 'steel eccentrically braced frame', 0.06],
  ['other', 'all other structures', 0.05],
] as const;

const CHECK_CLAUSE =
  'Clause recalled, not seen; 0.11 for steel moment frames stands against 0.085 in EN 1998-1: check before use.';
const BRACKET = { bracket: 0.2, ratio_cap: 0.9 };

const NEPAL_ROWS = [
  ['steel-moment-frame', 'steel moment frame', 0.085],
  ['concrete-moment-frame', 'concrete moment frame', 0.075],
  ['steel-eccentric-braced', 'steel eccentrically braced frame', 0.075],
  ['walls-and-other', 'walls and other structures', 0.05],
] as const;

const WALL_TITLE = 'walls, by wall area';
const WALLS = { coefficient: 0.075, exponent: 0.75, unit_m: 1, ...BRACKET };

export const OCEANIA_NEPAL_PERIODS: readonly AnyRecord[] = [
  ...NZS_ROWS.map(([which, what, kt]) => amplified(NZS, which, what, kt, { note: CHECK_CLAUSE })),
  ...NZS_ROWS.map(([which, what, kt]) =>
    heightRow(
      NZS,
      `${which}-serviceability`,
      `Approximate period at the serviceability limit state, ${what}`,
      kt,
      0.75,
    ),
  ),
  period(NZS, 'walls', `Approximate period at the ultimate limit state, ${WALL_TITLE}`, squaredBracketPeriod, {
    factor: 1.25,
    ...WALLS,
  }),
  period(
    NZS,
    'walls-serviceability',
    `Approximate period at the serviceability limit state, ${WALL_TITLE}`,
    squaredBracketPeriod,
    WALLS,
  ),
  wallArea(NZS, 'walls', 'Effective wall area A_c', squaredBracketArea, BRACKET),
  ...NZS_ROWS.map(([which, what, kt]) => amplified(AS, which, what, kt)),
  ...NEPAL_ROWS.map(([which, what, kt]) => amplified(NEPAL, which, what, kt)),
  ...NEPAL_ROWS.map(([which, what, kt]) =>
    heightRow(NEPAL, `${which}-before-amplification`, `Approximate period before the factor 1.25, ${what}`, kt, 0.75, {
      clause: '5.1.2',
    }),
  ),
];
