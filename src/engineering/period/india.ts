/** IS 1893 Part 1. Metres. Printed Indian answers cut their last digit, they do not round it. */
import type { AnyRecord } from '../formula.js';
import { heightOverRootPlan } from './families.js';
import { heightRow, period, wallArea } from './publication.js';
import type { Publication } from './publication.js';
import { squaredRatioArea, squaredRatioPeriodWithFloor } from './wall-families.js';

const edition = (year: string, clause: string): Publication => ({
  id: `is1893-${year}`,
  source: { standard: 'IS 1893 Part 1', edition: year, clause },
  verified: 'restated',
  basis: 'design',
});
const IS_2002 = edition('2002', '7.6.1');
const IS_2016 = edition('2016', '7.6.2(a)');

const HEIGHT = 'Basement storeys whose walls are tied to the ground floor do not count in h (recalled).';
const PLAN = { coefficient: 0.09, unit_m: 1 };
const BRACKET = { bracket: 0.2, ratio_cap: 0.9 };
const WALL_NOTE =
  'The floor 0.09 h/√d and the limit on L/h are recalled. A public page prints the bracket of EN 1998-1 instead, (0.2 + L/h)².';

export const INDIA_PERIODS: readonly AnyRecord[] = [
  heightRow(IS_2002, 'concrete-moment-frame', 'Approximate period, bare concrete moment frame', 0.075, 0.75),
  heightRow(IS_2002, 'steel-moment-frame', 'Approximate period, bare steel moment frame', 0.085, 0.75),
  period(
    IS_2002,
    'other',
    'Approximate period, all other buildings, infilled frames among them',
    heightOverRootPlan,
    PLAN,
    { clause: '7.6.2', note: HEIGHT },
  ),
  heightRow(IS_2016, 'concrete-moment-frame', 'Approximate period, bare concrete moment frame', 0.075, 0.75),
  heightRow(IS_2016, 'composite-moment-frame', 'Approximate period, bare composite moment frame', 0.08, 0.75, {
    verified: 'memory',
  }),
  heightRow(IS_2016, 'steel-moment-frame', 'Approximate period, bare steel moment frame', 0.085, 0.75),
  period(
    IS_2016,
    'concrete-walls',
    'Approximate period, concrete structural walls, by wall area',
    squaredRatioPeriodWithFloor,
    { coefficient: 0.075, exponent: 0.75, unit_m: 1, plan_coefficient: 0.09, ...BRACKET },
    { clause: '7.6.2(b)', verified: 'memory', note: WALL_NOTE },
  ),
  wallArea(IS_2016, 'concrete-walls', 'Effective wall area A_w', squaredRatioArea, BRACKET, {
    clause: '7.6.2(b)',
    verified: 'memory',
  }),
  period(IS_2016, 'other', 'Approximate period, all other buildings', heightOverRootPlan, PLAN, {
    clause: '7.6.2(c)',
    note: HEIGHT,
  }),
];
