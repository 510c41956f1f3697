/** EN 1998-1:2004 and the Italian code of the same form. Metres. */
import type { AnyRecord } from '../formula.js';
import { heightRow, heightUpTo, period, periodLimit, wallArea } from './publication.js';
import type { Publication } from './publication.js';
import { gravitySway, lateralForceLimit } from './sway-families.js';
import { squaredBracketArea, squaredBracketPeriod } from './wall-families.js';

const UP_TO_40 = [heightUpTo(40, 'buildings up to 40 m')];
const EN1998: Publication = {
  id: 'en1998-1-2004',
  source: { standard: 'EN 1998-1', edition: '2004', clause: '4.3.3.2.2(3)' },
  verified: 'restated',
  basis: 'design',
  limits: UP_TO_40,
};
const NTC: Publication = {
  id: 'ntc-2008',
  source: { standard: 'NTC', edition: '2008', clause: '7.3.5' },
  verified: 'memory',
  basis: 'design',
  limits: UP_TO_40,
};
const AS_EN = 'The form is restated; the values, and the limit, are recalled to be those of EN 1998-1.';

export const EN1998_PERIODS: readonly AnyRecord[] = [
  heightRow(EN1998, 'steel-moment-frame', 'Approximate period, steel space moment frame', 0.085, 0.75),
  heightRow(
    EN1998,
    'concrete-moment-frame-or-eccentric-braced',
    'Approximate period, concrete space moment frame or eccentrically braced steel frame',
    0.075,
    0.75,
  ),
  heightRow(EN1998, 'other', 'Approximate period, all other structures', 0.05, 0.75),
  period(
    EN1998,
    'gravity-sway',
    'Period from the sway of the top under gravity applied sideways',
    gravitySway,
    { coefficient: 2 },
    { clause: '4.3.3.2.2(5)', limits: [] },
  ),
];

const BRACKET = { bracket: 0.2, ratio_cap: 0.9 };

export const EN1998_MORE_RECORDS: readonly AnyRecord[] = [
  period(
    EN1998,
    'concrete-or-masonry-walls',
    'Approximate period, concrete or masonry shear walls, by wall area',
    squaredBracketPeriod,
    { coefficient: 0.075, exponent: 0.75, unit_m: 1, ...BRACKET },
    {
      clause: '4.3.3.2.2(4)',
      verified: 'memory',
      note: 'Here the whole bracket is squared, (0.2 + l/H)²; UBC, IS 1893 and TBDY square the ratio only.',
    },
  ),
  wallArea(EN1998, 'concrete-or-masonry-walls', 'Effective wall area A_c', squaredBracketArea, BRACKET, {
    clause: '4.3.3.2.2(4)',
    verified: 'memory',
  }),
  periodLimit(
    EN1998,
    'lateral-force-method',
    'Longest period for which the lateral-force method is allowed',
    lateralForceLimit,
    { factor: 4, ceiling_s: 2 },
    { clause: '4.3.3.2.1(2)', verified: 'memory' },
  ),
  heightRow(NTC, 'steel-frame', 'Approximate period, steel frame', 0.085, 0.75, { note: AS_EN }),
  heightRow(NTC, 'concrete-frame', 'Approximate period, concrete frame', 0.075, 0.75, { note: AS_EN }),
  heightRow(NTC, 'other', 'Approximate period, all other structures', 0.05, 0.75, { note: AS_EN }),
];
