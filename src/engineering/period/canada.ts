/** National Building Code of Canada, 4.1.8.11. Metres. Periods for drift are not capped the same way, clause (3)(d)(v). */
import type { AnyRecord, Limit } from '../formula.js';
import { heightLinear, heightPlusSpan, perStorey } from './families.js';
import { heightRow, period, periodLimit } from './publication.js';
import type { Publication } from './publication.js';
import { periodCap } from './sway-families.js';

const NBC: Publication = {
  id: 'nbc-2015',
  source: { standard: 'NBC', edition: '2015', clause: '4.1.8.11' },
  verified: 'restated',
  basis: 'design',
};
const ALONE = 'The frame resists the whole of the force and is not stiffened by more rigid parts.';
const ONE_STOREY: readonly Limit[] = [
  { input: 'storeys', to: 1, whose: 'publication', outside: 'reject', text: 'buildings of one storey' },
];

export const CANADA_PERIODS: readonly AnyRecord[] = [
  heightRow(NBC, 'steel-moment-frame', 'Period, steel moment frame', 0.085, 0.75, { note: ALONE }),
  heightRow(NBC, 'concrete-moment-frame', 'Period, concrete moment frame', 0.075, 0.75, { note: ALONE }),
  period(
    NBC,
    'moment-frame-by-storeys',
    'Period, other moment frames',
    perStorey,
    { coefficient: 0.1 },
    { note: ALONE },
  ),
  period(NBC, 'braced-frame', 'Period, braced frame', heightLinear, { coefficient: 0.025 }),
  heightRow(NBC, 'shear-walls', 'Period, shear walls', 0.05, 0.75),
  heightRow(NBC, 'other', 'Period, other structures', 0.05, 0.75),
  period(
    NBC,
    'one-storey-walls',
    'Period, one storey under a roof of steel deck or wood, walls',
    heightPlusSpan,
    { coefficient: 0.05, exponent: 0.75, span_coefficient: 0.004 },
    { verified: 'memory', limits: ONE_STOREY, note: '0.004 L is restated, 0.05 h^0.75 beside it recalled.' },
  ),
  period(
    NBC,
    'one-storey-steel-frames',
    'Period, one storey under a roof of steel deck or wood, steel frames or braces',
    heightPlusSpan,
    { coefficient: 0.035, exponent: 1, span_coefficient: 0.004 },
    { verified: 'memory', limits: ONE_STOREY },
  ),
  ...(
    [
      ['moment-frame', 'moment frames', 1.5, 'restated'],
      ['braced-frame', 'braced frames', 2, 'restated'],
      ['shear-walls', 'shear walls', 2, 'restated'],
      ['other', 'other structures', 1, 'restated'],
      ['one-storey-walls', 'one storey under a roof of steel deck or wood, walls', 1.5, 'restated'],
      ['one-storey-steel-frames', 'one storey under a roof of steel deck or wood, steel', 1.5, 'memory'],
    ] as const
  ).map(([which, what, factor, verified]) =>
    periodLimit(NBC, which, `Longest calculated period, ${what}`, periodCap, { factor }, { verified }),
  ),
];
