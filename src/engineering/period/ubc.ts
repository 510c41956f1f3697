/** Uniform Building Code since 1988, Method A; the editions before stand in past-records.ts. Feet. */
import type { AnyRecord } from '../formula.js';
import { FOOT_M, heightRow, period, periodLimit, wallArea } from './publication.js';
import type { Publication } from './publication.js';
import { periodCap } from './sway-families.js';
import { squaredRatioArea, squaredRatioPeriod } from './wall-families.js';

const edition = (id: string, name: string, clause: string): Publication => ({
  id,
  source: { standard: 'UBC', edition: name, clause },
  verified: 'restated',
  basis: 'design',
  unit_m: FOOT_M,
});
const UBC_1988 = edition('ubc-1988', '88 to 94', 'static force procedure, Method A');
const UBC_1997 = edition('ubc-1997', '97', '1630.2.2, Method A');

const OLD = 'Quoted by the era tables only: the period the engineer of that time used.';

const table = (of: Publication, note?: string): readonly AnyRecord[] => {
  const row = note === undefined ? {} : { note };
  return [
    heightRow(of, 'steel-moment-frame', 'Method A period, steel moment frame', 0.035, 0.75, row),
    heightRow(
      of,
      'concrete-moment-frame-or-eccentric-braced',
      'Method A period, concrete moment frame or eccentrically braced frame',
      0.03,
      0.75,
      row,
    ),
    heightRow(of, 'other', 'Method A period, all other buildings', 0.02, 0.75, row),
  ];
};

/** Used for the design coefficient of the era. */
export const UBC_HEIGHT_PERIODS: readonly AnyRecord[] = table(UBC_1988, OLD);

const BRACKET = { bracket: 0.2, ratio_cap: 0.9 };

const walls = (of: Publication): readonly AnyRecord[] => [
  period(
    of,
    'concrete-or-masonry-walls',
    'Method A period, concrete or masonry shear walls, by wall area',
    squaredRatioPeriod,
    { coefficient: 0.1, exponent: 0.75, unit_m: FOOT_M, ...BRACKET },
    {
      verified: 'memory',
      note: 'The alternative value of C_t; in metres it is 0.0743/√A_c. Only the ratio is squared, 0.2 + (D/h)².',
    },
  ),
  wallArea(of, 'concrete-or-masonry-walls', 'Effective wall area A_c', squaredRatioArea, BRACKET, {
    verified: 'memory',
  }),
];

const METHOD_B = 'Method B is a calculation of the period from the structure.';

export const UBC_MORE_RECORDS: readonly AnyRecord[] = [
  ...table(UBC_1997),
  ...walls(UBC_1997),
  ...walls(UBC_1988),
  periodLimit(UBC_1997, 'zone-4', 'Longest Method B period, zone 4', periodCap, { factor: 1.3 }, { note: METHOD_B }),
  periodLimit(
    UBC_1997,
    'zones-1-to-3',
    'Longest Method B period, zones 1 to 3',
    periodCap,
    { factor: 1.4 },
    { note: METHOD_B },
  ),
];
