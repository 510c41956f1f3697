/** Height formulas of further codes, in the order of the alphabet by country. Metres. */
import type { AnyRecord } from '../formula.js';
import {
  factoredHeightPower,
  heightDivided,
  heightOverRootPlan,
  lesserOfHeightAndPlan,
  perStorey,
  storeysDivided,
} from './families.js';
import { heightRow, period, periodLimit, wallArea } from './publication.js';
import type { Publication, Row } from './publication.js';
import { periodCap } from './sway-families.js';
import { ratioByWallHeight, ratioByWallHeightPeriod, squaredRatioArea, squaredRatioPeriod } from './wall-families.js';

const code = (
  id: string,
  standard: string,
  edition: string,
  clause: string,
  verified: Publication['verified'] = 'memory',
): Publication => ({ id, source: { standard, edition, clause }, verified, basis: 'design' });

/** which, title after "Approximate period, ", coefficient, exponent */
type Power = readonly [which: string, what: string, coefficient: number, exponent: number];
const powers = (of: Publication, rows: readonly Power[], row: Row = {}): readonly AnyRecord[] =>
  rows.map(([which, what, coefficient, exponent]) =>
    heightRow(of, which, `Approximate period, ${what}`, coefficient, exponent, row),
  );
const cap = (of: Publication, factor: number, row: Row = {}): AnyRecord =>
  periodLimit(of, 'calculated', 'Longest calculated period', periodCap, { factor }, row);

const RPA = code('rpa-99-2003', 'RPA 99', '2003', 'empirical period');
const SMALLER = 'The smaller of the two governs for infilled frames, walls and the rest.';
const ALGERIA: readonly AnyRecord[] = [
  ...powers(RPA, [
    ['concrete-moment-frame', 'concrete moment frame without infill', 0.075, 0.75],
    ['steel-moment-frame', 'steel moment frame without infill', 0.085, 0.75],
    ['other', 'all other buildings, by height alone', 0.05, 0.75],
  ]),
  period(
    RPA,
    'other-by-plan',
    'Approximate period, infilled frames, walls and all other buildings',
    lesserOfHeightAndPlan,
    { coefficient: 0.05, exponent: 0.75, plan_coefficient: 0.09 },
    { note: SMALLER },
  ),
];

const asceInMetres = (of: Publication): readonly AnyRecord[] =>
  powers(of, [
    ['concrete-moment-frame', 'concrete moment frame', 0.0466, 0.9],
    ['steel-moment-frame', 'steel moment frame', 0.0724, 0.8],
    ['steel-eccentric-or-buckling-restrained', 'steel eccentrically or buckling-restrained braced frame', 0.0731, 0.75],
    ['other', 'all other systems', 0.0488, 0.75],
  ]);
// Restated in a comment of a public program.
const BANGLADESH = asceInMetres(code('bnbc-2020', 'BNBC', '2020', 'approximate period', 'restated'));
const INDONESIA = asceInMetres(code('sni1726', 'SNI 1726', '', 'approximate period'));

const NSR = code('nsr-10', 'NSR-10', '', 'A.4.2');
const COLOMBIA = powers(NSR, [
  ['concrete-moment-frame', 'concrete moment frame', 0.047, 0.9],
  ['steel-moment-frame', 'steel moment frame', 0.072, 0.8],
  ['steel-eccentric-or-buckling-restrained', 'steel eccentrically or buckling-restrained braced frame', 0.073, 0.75],
  ['other', 'all other systems', 0.049, 0.75],
]);

const NEC = code('nec-se-ds', 'NEC-SE-DS', '', 'approximate period');
const ECUADOR = powers(NEC, [
  ['concrete-moment-frame', 'concrete frame without walls or braces', 0.055, 0.9],
  ['concrete-walls-or-braces', 'concrete with walls or braces', 0.055, 0.75],
  ['steel-moment-frame', 'steel frame without braces', 0.072, 0.8],
  ['steel-braced-frame', 'steel frame with braces', 0.073, 0.75],
]);

const IRAN_2800 = code('iran2800-4', 'Standard 2800', '4th edition', 'empirical period');
const OBSTRUCTED = 'Infill that obstructs the frame: 0.8 times the period of the bare frame.';
const infilled = (which: string, what: string, coefficient: number, exponent: number): AnyRecord =>
  period(
    IRAN_2800,
    which,
    `Approximate period, ${what} obstructed by infill`,
    factoredHeightPower,
    { factor: 0.8, coefficient, exponent, unit_m: 1 },
    { note: OBSTRUCTED },
  );
const IRAN: readonly AnyRecord[] = [
  ...powers(IRAN_2800, [
    ['steel-moment-or-eccentric-braced', 'steel moment frame or eccentrically braced frame', 0.08, 0.75],
    ['concrete-moment-frame', 'concrete moment frame', 0.05, 0.9],
    ['other', 'all other systems', 0.05, 0.75],
  ]),
  infilled('steel-moment-frame-infilled', 'steel moment frame', 0.08, 0.75),
  infilled('concrete-moment-frame-infilled', 'concrete moment frame', 0.05, 0.9),
  cap(IRAN_2800, 1.25),
];

const KDS = code('kds41-17-00', 'KDS 41 17 00', '', 'approximate period');
const KOREA: readonly AnyRecord[] = [
  ...asceInMetres(KDS),
  period(
    KDS,
    'moment-frame-by-storeys',
    'Approximate period by number of storeys, moment frames',
    perStorey,
    { coefficient: 0.1 },
    {
      verified: 'restated',
      limits: [
        { input: 'storeys', from: 1, to: 12, whose: 'publication', outside: 'reject', text: 'at most 12 storeys' },
        {
          input: 'mean_storey_height_m',
          from: 3,
          whose: 'publication',
          outside: 'reject',
          text: 'storeys of at least 3 m',
        },
      ],
    },
  ),
  period(
    KDS,
    'concrete-or-masonry-walls',
    'Approximate period, concrete or masonry shear walls, by wall area',
    ratioByWallHeightPeriod,
    { coefficient: 0.0062, slenderness: 0.83, unit_m: 1 },
    { note: 'That the formula exists is restated; 0.0062 and the form of C_w are recalled.' },
  ),
  wallArea(KDS, 'concrete-or-masonry-walls', 'Equivalent wall area in per cent of the base area', ratioByWallHeight, {
    slenderness: 0.83,
  }),
];

const E030 = code('e030', 'E.030', '', 'fundamental period');
const PERU: readonly AnyRecord[] = (
  [
    ['frames', 'frames without walls', 35, 'restated'],
    ['frames-with-core-walls-or-braced-steel', 'frames with lift or stair walls, braced steel', 45, 'memory'],
    ['masonry-walls-and-dual', 'masonry, walls and dual systems', 60, 'memory'],
  ] as const
).map(([which, what, divisor, verified]) =>
  period(E030, which, `Approximate period, ${what}`, heightDivided, { divisor }, { verified }),
);

const TAIWAN_CODE = code('taiwan', 'Taiwan, seismic design code', '', 'empirical period');
const TAIWAN: readonly AnyRecord[] = [
  ...powers(TAIWAN_CODE, [
    ['steel-moment-frame', 'steel moment frame', 0.085, 0.75],
    [
      'concrete-or-eccentric-braced',
      'concrete or composite moment frame, steel eccentrically braced frame',
      0.07,
      0.75,
    ],
    ['other', 'all other systems', 0.05, 0.75],
  ]),
  cap(TAIWAN_CODE, 1.4),
];

const TBDY = code('tbdy-2018', 'TBDY', '2018', '4.7.3.4');
const TURKEY: readonly AnyRecord[] = [
  ...powers(TBDY, [
    ['concrete-frames', 'concrete frames', 0.1, 0.75],
    ['steel-frames', 'steel frames', 0.08, 0.75],
    ['other', 'all other systems', 0.07, 0.75],
  ]),
  period(
    TBDY,
    'concrete-walls',
    'Approximate period, concrete walls alone, by wall area',
    squaredRatioPeriod,
    { coefficient: 0.075, coefficient_cap: 0.07, exponent: 0.75, unit_m: 1, bracket: 0.2 },
    { note: 'The symbols of A_t are restated, the values recalled. No cap on l/h was seen.' },
  ),
  wallArea(TBDY, 'concrete-walls', 'Effective wall area A_t', squaredRatioArea, { bracket: 0.2 }),
  cap(TBDY, 1.4, { verified: 'restated', note: 'On the Rayleigh period.' }),
];

const COVENIN = code('covenin-1756', 'COVENIN 1756', '', 'approximate period');
const VENEZUELA: readonly AnyRecord[] = [
  ...powers(COVENIN, [
    ['concrete-frames', 'concrete frames', 0.07, 0.75],
    ['steel-frames', 'steel frames', 0.08, 0.75],
    ['other', 'all other systems', 0.05, 0.75],
  ]),
  cap(COVENIN, 1.4),
];

const practice = (id: string, standard: string, edition: string, clause: string): Publication => ({
  ...code(id, standard, edition, clause),
  basis: 'ambient',
});
/** What wind engineers and designers reckon with. */
const PRACTICE: readonly AnyRecord[] = [
  period(
    practice('ellis-1980', 'Ellis', '1980', 'wind practice'),
    'tall-buildings',
    'Period for wind response by height',
    heightDivided,
    { divisor: 46 },
  ),
  period(
    practice('wind-practice', 'Wind practice', '', 'f = a √B/H with a about 11'),
    'by-height-and-width',
    'Period for wind response by height and width',
    heightOverRootPlan,
    { coefficient: 0.091, unit_m: 1 },
    { verified: 'restated', note: '0.091 is 1/11, a in √m/s.' },
  ),
  period(
    { ...practice('practice-taiwan', 'Rule of thumb, Taiwan', '', 'T = N/10'), basis: 'best-fit' },
    'by-storeys',
    'Period by number of storeys, any system',
    storeysDivided,
    { divisor: 10 },
    {
      verified: 'restated',
      limits: [{ input: 'storeys', to: 40, whose: 'publication', outside: 'flag', text: 'buildings up to 40 storeys' }],
    },
  ),
  period(
    { ...practice('practice-chile', 'Practice, Chile', '', 'wall buildings'), basis: 'best-fit' },
    'walls-by-storeys',
    'Period by number of storeys, concrete wall buildings',
    storeysDivided,
    { divisor: 20 },
    { note: 'NCh 433 itself has no height formula.' },
  ),
];

export const OTHER_CODE_RECORDS: readonly AnyRecord[] = [
  ...ALGERIA,
  ...BANGLADESH,
  ...COLOMBIA,
  ...ECUADOR,
  ...INDONESIA,
  ...IRAN,
  ...KOREA,
  ...PERU,
  ...TAIWAN,
  ...TURKEY,
  ...VENEZUELA,
  ...PRACTICE,
];
