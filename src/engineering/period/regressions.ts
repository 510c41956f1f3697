/**
 * Published regressions on measured and calculated periods. Those of basis `ambient` speak of small amplitude: they take the same
 * factor as a measured ambient period before they read a spectrum (`toStrongShaking`).
 */
import type { AnyRecord } from '../formula.js';
import { heightLinear, perStorey, storeysDivided } from './families.js';
import { FOOT_M, heightRow, period, periodLimit } from './publication.js';
import type { Publication, Row } from './publication.js';
import { periodCap } from './sway-families.js';
import { fullHeightRatioPeriod } from './wall-families.js';

const paper = (
  id: string,
  authors: string,
  year: string,
  clause: string,
  basis: Publication['basis'],
  more: Partial<Publication> = {},
): Publication => ({ id, source: { standard: authors, edition: year, clause }, verified: 'memory', basis, ...more });

const FEET = { unit_m: FOOT_M };

const GC97 = paper('goel-chopra-1997', 'Goel and Chopra', '1997', 'periods in strong shaking', 'best-fit', FEET);
const GC98 = paper('goel-chopra-1998', 'Goel and Chopra', '1998', 'walls, periods in strong shaking', 'best-fit', FEET);
const BOUNDS = ['lower', 'best', 'upper'] as const;
const BOUND_TITLE = { lower: 'lower bound', best: 'best fit', upper: 'upper bound' } as const;

const GOEL_CHOPRA: readonly AnyRecord[] = [
  ...BOUNDS.map((which, i) =>
    heightRow(
      GC97,
      `concrete-moment-frame-${which}`,
      `Measured periods of concrete moment frames, ${BOUND_TITLE[which]}`,
      [0.016, 0.018, 0.023][i]!,
      0.9,
      { note: '27 buildings.' },
    ),
  ),
  ...BOUNDS.map((which, i) =>
    heightRow(
      GC97,
      `steel-moment-frame-${which}`,
      `Measured periods of steel moment frames, ${BOUND_TITLE[which]}`,
      [0.028, 0.035, 0.045][i]!,
      0.8,
    ),
  ),
  ...BOUNDS.map((which, i) =>
    period(
      GC98,
      `concrete-walls-${which}`,
      `Measured periods of concrete wall buildings by wall area, ${BOUND_TITLE[which]}`,
      fullHeightRatioPeriod,
      { coefficient: [0.0019, 0.0023, 0.0026][i]!, slenderness: 0.83, unit_m: FOOT_M },
      {
        note: 'T = C H/√A_e, A_e in per cent of the base area, formed as C_w of ASCE 7 with full-height walls (recalled). 20 wall buildings.',
      },
    ),
  ),
];

export const GOEL_CHOPRA_LIMITS: readonly AnyRecord[] = (
  [
    [GC97, 'concrete-moment-frame', 'concrete moment frame', 1.4],
    [GC97, 'steel-moment-frame', 'steel moment frame', 1.6],
    [GC98, 'concrete-walls', 'concrete walls', 1.4],
  ] as const
).map(([of, which, what, factor]) =>
  periodLimit(of, which, `Longest calculated period, ${what}`, periodCap, { factor }),
);

const restated: Row = { verified: 'restated' };
const linear = (of: Publication, which: string, title: string, coefficient: number, row: Row = {}): AnyRecord =>
  period(of, which, title, heightLinear, { coefficient }, row);

const CONCRETE_FRAMES: readonly AnyRecord[] = [
  heightRow(
    paper('goel-conference', 'Goel', '', 'conference paper: 0.030 raised to 0.035', 'best-fit', FEET),
    'concrete-moment-frame',
    'Measured periods of concrete moment frames, raised coefficient',
    0.035,
    0.75,
    restated,
  ),
  linear(
    paper('crowley-pinho-2004', 'Crowley and Pinho', '2004', 'yield period', 'best-fit'),
    'concrete-moment-frame',
    'Calculated yield period, bare concrete frames, cracked',
    0.1,
    { note: 'From models, not from measurements.' },
  ),
  heightRow(
    paper('hong-hwang-2000', 'Hong and Hwang', '2000', 'Taiwan', 'best-fit'),
    'concrete-moment-frame',
    'Measured periods of concrete moment frames in Taiwan',
    0.0294,
    0.804,
  ),
];
const INFILLED: readonly AnyRecord[] = [
  linear(
    paper('crowley-pinho-2006', 'Crowley and Pinho', '2006', 'yield period', 'best-fit'),
    'concrete-infilled-frame',
    'Calculated yield period, infilled concrete frames, cracked',
    0.055,
    { note: 'From models, not from measurements.' },
  ),
  heightRow(
    paper('guler-2008', 'Guler et al.', '2008', 'Turkey', 'ambient'),
    'concrete-infilled-frame',
    'Ambient periods of infilled concrete frames in Turkey',
    0.026,
    0.9,
  ),
];
const CONCRETE: readonly AnyRecord[] = [
  linear(
    paper('gallipoli-2010', 'Gallipoli, Mucciarelli et al.', '2010', 'four countries', 'ambient'),
    'concrete',
    'Ambient periods of concrete buildings',
    0.016,
    { note: '244 buildings; no variable but the height was significant.' },
  ),
  linear(
    paper('ditommaso-2013', 'Ditommaso et al.', '2013', "L'Aquila", 'best-fit'),
    'concrete',
    "Periods of undamaged concrete buildings under shaking, L'Aquila",
    0.026,
    { note: 'The number is recalled with low confidence; longer when damaged.' },
  ),
  period(
    paper('navarro', 'Navarro et al.', '', 'Granada', 'ambient'),
    'concrete-by-storeys',
    'Ambient periods of concrete buildings in Granada',
    perStorey,
    { coefficient: 0.049 },
  ),
  ...(
    [
      ['rock', 'rock', 23],
      ['soft-soil', 'soft soil', 18],
    ] as const
  ).map(([which, ground, divisor]) =>
    period(
      paper('salameh-2016', 'Salameh et al.', '2016', 'Beirut', 'ambient'),
      `concrete-on-${which}`,
      `Ambient periods of buildings on ${ground} in Beirut`,
      storeysDivided,
      { divisor },
      {
        verified: 'restated',
        limits: [
          {
            input: 'storeys',
            from: 2,
            to: 33,
            whose: 'publication',
            outside: 'flag',
            text: 'buildings of 2 to 33 storeys, mostly of concrete',
          },
        ],
        note: '303 buildings; the plan mattered little.',
      },
    ),
  ),
];
const CONCRETE_WALLS: readonly AnyRecord[] = [
  linear(
    paper('michel-2010', 'Michel et al.', '2010', 'Grenoble', 'ambient'),
    'concrete-walls',
    'Ambient periods of concrete wall buildings in Grenoble',
    0.013,
    { note: '60 buildings; only type and height mattered.' },
  ),
];
const WALLS: readonly AnyRecord[] = [
  heightRow(
    paper('abo-el-saad-salama-2015', 'Abo El-saad and Salama', '2015', '0.020 lowered to 0.014', 'best-fit', FEET),
    'walls',
    'Measured periods of wall buildings, lowered coefficient',
    0.014,
    0.75,
    { verified: 'restated', note: 'Read in the abstract; the exponent 0.75 is taken to stay.' },
  ),
];
const WALLS_AND_OTHER: readonly AnyRecord[] = [
  heightRow(
    paper('kwon-kim-2010', 'Kwon and Kim', '2010', '0.015 for walls and other', 'best-fit', FEET),
    'walls-and-other',
    'Measured periods of walls and other types, lowered coefficient',
    0.015,
    0.75,
    {
      verified: 'restated',
      note: 'Over 800 periods at 191 stations in 67 earthquakes. Essential buildings ran about 40 % shorter.',
    },
  ),
];
const WOOD: readonly AnyRecord[] = [
  heightRow(
    paper('camelo-2002', 'Camelo, Beck and Hall', '2002', 'California wood frame', 'best-fit', FEET),
    'timber-light-frame',
    'Measured periods of wood-frame buildings in California',
    0.032,
    0.55,
  ),
];

/** The regressions by what they speak of. */
export const REGRESSIONS = {
  concreteFrames: [...GOEL_CHOPRA.slice(0, 3), ...CONCRETE_FRAMES],
  steelFrames: GOEL_CHOPRA.slice(3, 6),
  wallsByArea: GOEL_CHOPRA.slice(6, 9),
  infilled: INFILLED,
  concrete: CONCRETE,
  concreteWalls: CONCRETE_WALLS,
  walls: WALLS,
  wallsAndOther: WALLS_AND_OTHER,
  wood: WOOD,
} as const satisfies Readonly<Record<string, readonly AnyRecord[]>>;

export const REGRESSION_PERIODS: readonly AnyRecord[] = Object.values(REGRESSIONS).flat();
