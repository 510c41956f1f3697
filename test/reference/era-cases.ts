/** Design coefficients of the codes outside the United States. Those without a printed answer are the stated formula worked by hand. */
import type { CarriedId } from '../../src/engineering/capacity/families.js';
import type { Inputs } from '../../src/engineering/formula.js';
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

type Row = readonly [id: string, inputs: Inputs, expected: number, digits: number, source: string];

/** Rows of one record: `mark` is what the numbers of the row rest on. */
const rows = (method: string, mark: ReferenceCase['mark'], list: readonly Row[]): readonly ReferenceCase[] =>
  list.map(([id, inputs, expected, digits, source]) => ({
    id,
    method,
    inputs,
    expected,
    tolerance: half(digits),
    source,
    mark,
  }));

type Zone = readonly [id: string, edition: CarriedId, stated: unknown, expected: number, source: string];
/** Rows by what a study states of a place: the table of the edition gives the record its number. */
const byPlace = (method: string, list: readonly Zone[]): readonly ReferenceCase[] =>
  list.map(([id, edition, stated, expected, source]) => ({
    id,
    method,
    inputs: {},
    edition: { id: edition, stated },
    ...exactly(expected),
    source,
    mark: 'memory',
  }));

const JAPAN: readonly ReferenceCase[] = [
  {
    id: 'japan-1924',
    method: 'japan-1924/base-shear/static',
    inputs: {},
    ...exactly(0.1),
    source: 'published history of Japanese codes: seismic coefficient of 0.1 in 1924',
    mark: 'restated',
  },
  ...rows('japan-1950/base-shear/static', 'restated', [
    ['japan-1950-low', { zone_factor: 1, height_m: 12 }, 0.2, 9, 'published history: 0.2 in 1950, up to 16 m'],
  ]),
  ...rows('japan-1950/base-shear/static', 'own arithmetic', [
    ['japan-1950-31m', { zone_factor: 0.9, height_m: 31 }, 0.188165, 6, '0.9 (0.2 + 0.0025 × 15²/62)'],
  ]),
  ...rows(
    'japan-1981/shear-factor/rt',
    'own arithmetic',
    (
      [
        [0.5, 1],
        [0.9, 0.95],
        [1.2, 0.8],
        [2, 0.48],
      ] as const
    ).map(([period_s, rt]): Row => [
      `SD-59-${String(period_s)}s`,
      { corner_period_s: 0.6, period_s },
      rt,
      4,
      'R_t of the building standard law, T_c 0.6 s, formula from memory',
    ]),
  ),
  ...rows(
    'japan-1981/shear-factor/ai',
    'own arithmetic',
    (
      [
        [0.25, 1.6364],
        [0.5, 1.3324],
        [0.75, 1.1472],
        [1, 1],
      ] as const
    ).map(([weight_share, ai]): Row => [
      `SD-58-${String(weight_share)}`,
      { weight_share, period_s: 0.4 },
      ai,
      4,
      'A_i of the building standard law at 0.4 s, formula from memory',
    ]),
  ),
  ...rows('japan-1981/base-shear/static', 'restated', [
    [
      'japan-1981-ductile',
      { zone_factor: 1, rt: 1, structural_factor: 0.3 },
      0.3,
      9,
      'published: elastic demand of 1.0 at short periods, 0.30 for the most ductile concrete buildings',
    ],
  ]),
  ...rows('japan-1981/base-shear/static', 'own arithmetic', [
    ['japan-1981-moderate', { zone_factor: 0.8, rt: 0.5, structural_factor: 0.1 }, 0.08, 9, '0.8 × 0.5 × C_0 of 0.2'],
  ]),
];

const NEW_ZEALAND: readonly ReferenceCase[] = [
  ...rows('nz-1935/base-shear/static', 'memory', [['nz-1935', {}, 0.08, 9, '1935: 0.08 W']]),
  ...rows('nz-1955/base-shear/static', 'memory', [['nz-1955', {}, 0.08, 9, '1955: similar to 1935']]),
  ...rows('nz-1965/base-shear/static', 'memory', [
    ['nz-1965-stiff', { zone_share: 1, period_s: 0.3 }, 0.12, 9, '1965: zone A 0.12'],
    ['nz-1965-half', { zone_share: 1, period_s: 1.2 }, 0.06, 9, '1965: half of it by 1.2 s'],
    ['nz-1965-b', { zone_share: 5 / 6, period_s: 0.45 }, 0.1, 9, '1965: zone B about 5/6'],
    ['nz-1965-c', { zone_share: 2 / 3, period_s: 3 }, 0.04, 9, '1965: zone C about 2/3, half of it'],
  ]),
  ...rows('nz-1965/base-shear/static', 'own arithmetic', [
    ['nz-1965-between', { zone_share: 1, period_s: 0.825 }, 0.09, 9, 'half way from 0.12 to 0.06'],
  ]),
  ...rows('nz-1976/base-shear/static', 'memory', [
    [
      'nz-1976-long',
      { zone_share: 1, structural_type_factor: 1, material_factor: 1, period_s: 1.5 },
      0.075,
      9,
      '1976: C 0.15 falling to 0.075 in zone A',
    ],
  ]),
  ...rows('nz-1976/base-shear/static', 'own arithmetic', [
    [
      'nz-1976-frame',
      { zone_share: 5 / 6, structural_type_factor: 0.8, material_factor: 0.8, period_s: 0.3 },
      0.08,
      9,
      '5/6 × 0.15 × 0.8 × 0.8',
    ],
  ]),
];

const ITALY: readonly ReferenceCase[] = [
  ...rows('italy-1909/base-shear/static', 'restated', [
    ['italy-1909-one', { storeys: 1 }, 1 / 12, 9, 'decree of 1909: 1/12 at the ground floor'],
  ]),
  ...rows('italy-1909/base-shear/static', 'own arithmetic', [
    ['italy-1909-four', { storeys: 4 }, 0.114583, 6, '(1/12 + 3/8)/4'],
  ]),
  ...byPlace('italy-1935/base-shear/static', [
    ['italy-1935-1', 'italy-1935', { category: 1 }, 0.1, 'data sheet 11.4: 0.10 in category I'],
    ['italy-1935-2', 'italy-1935', { category: 2 }, 0.07, 'data sheet 11.4: 0.07 in category II'],
  ]),
  ...rows('italy-1975/base-shear/static', 'restated', [
    ['italy-1975-1', { seismicity_degree: 12, period_s: 0.5 }, 0.1, 9, '(S − 2)/100: 0.10 in category 1'],
    ['italy-1975-2', { seismicity_degree: 9, period_s: 0.5 }, 0.07, 9, '(S − 2)/100: 0.07 in category 2'],
    [
      'italy-1975-3',
      { seismicity_degree: 6, period_s: 0.8 },
      0.04,
      9,
      '(S − 2)/100: 0.04 in category 3, R = 1 at 0.8 s',
    ],
  ]),
  ...rows('italy-1975/base-shear/static', 'own arithmetic', [
    ['italy-1975-long', { seismicity_degree: 12, period_s: 1.728 }, 0.059861, 6, '0.10 × 0.862/1.44'],
  ]),
  ...rows('en1998-1-2004/base-shear/static', 'own arithmetic', [
    [
      'en-plateau',
      { ag_g: 0.25, soil_factor: 1.2, tc_s: 0.5, reduction_r: 3.9, lambda: 0.85, period_s: 0.4 },
      0.163462,
      6,
      '0.85 × 2.5 × 0.25 × 1.2/3.9',
    ],
    [
      'en-fall',
      { ag_g: 0.25, soil_factor: 1.2, tc_s: 0.5, reduction_r: 3.9, lambda: 0.85, period_s: 1 },
      0.081731,
      6,
      'half of it at twice T_C',
    ],
    [
      'en-floor',
      { ag_g: 0.25, soil_factor: 1.2, tc_s: 0.5, reduction_r: 3.9, lambda: 1, period_s: 3 },
      0.05,
      9,
      '0.2 × 0.25',
    ],
  ]),
];

const GREECE: readonly ReferenceCase[] = [
  ...byPlace(
    'greece-1959/base-shear/static',
    (
      [
        ['I', [0.04, 0.06, 0.08]],
        ['II', [0.06, 0.08, 0.12]],
        ['III', [0.08, 0.12, 0.16]],
      ] as const
    ).flatMap(([zone, row]) =>
      (['firm', 'medium', 'soft'] as const).map((ground, i): Zone => [
        `greece-1959-${zone}-${ground}`,
        'greece-1959',
        { zone, ground },
        row[i]!,
        'data sheet 11.4: ε by zone on firm, medium and soft ground',
      ]),
    ),
  ),
  ...rows('greece-1995/base-shear/static', 'own arithmetic', [
    [
      'greece-1995-plateau',
      { zone_g: 0.16, corner_period_s: 0.6, reduction_r: 3.5, period_s: 0.3 },
      0.114286,
      6,
      '0.16 × 2.5/3.5',
    ],
    [
      'greece-1995-fall',
      { zone_g: 0.24, corner_period_s: 0.6, reduction_r: 3.5, period_s: 1.2 },
      0.107993,
      6,
      '0.24 × 2.5/3.5 × (1/2)^(2/3)',
    ],
    [
      'greece-1995-least',
      { zone_g: 0.24, corner_period_s: 0.4, reduction_r: 3.5, period_s: 3 },
      0.06,
      9,
      '0.25 × 0.24 rules over 0.24 × 2.5/3.5 × 0.261',
    ],
  ]),
];

const TURKEY: readonly ReferenceCase[] = [
  ...byPlace(
    'turkey-1949/base-shear/static',
    [0.06, 0.04, 0.02].map((expected, i): Zone => {
      const zone = i + 1;
      return [`turkey-1968-${String(zone)}`, 'turkey-1968', { zone }, expected, 'data sheet 11.4: C_0 of 1968 by zone'];
    }),
  ),
  ...rows('turkey-1975/base-shear/static', 'own arithmetic', [
    [
      'turkey-1975-stiff',
      { zone_coefficient: 0.1, structure_factor: 0.8, ground_period_s: 0.8, period_s: 0.8 },
      0.08,
      9,
      'S = min(1, 1/0.8): 0.10 × 0.8',
    ],
    [
      'turkey-1975-long',
      { zone_coefficient: 0.1, structure_factor: 0.8, ground_period_s: 0.4, period_s: 1 },
      0.057143,
      6,
      '0.08/1.4',
    ],
    [
      'turkey-1975-resonant',
      { zone_coefficient: 0.1, structure_factor: 1, ground_period_s: 1.3, period_s: 0.5 },
      0.1,
      9,
      '0.8 + 0.5 − 1.3 = 0: S is held at 1',
    ],
  ]),
  ...rows('turkey-1998/base-shear/static', 'own arithmetic', [
    [
      'turkey-1998-fall',
      { zone_g: 0.4, ta_s: 0.15, tb_s: 0.4, reduction_r: 8, period_s: 0.5 },
      0.104564,
      6,
      '0.4 × 2.5 × 0.8^0.8/8',
    ],
    [
      'turkey-1998-rise',
      { zone_g: 0.4, ta_s: 0.15, tb_s: 0.4, reduction_r: 8, period_s: 0.05 },
      0.163636,
      6,
      '0.4 × 1.5/(1.5 + 6.5/3)',
    ],
    ['turkey-1998-least', { zone_g: 0.4, ta_s: 0.15, tb_s: 0.4, reduction_r: 8, period_s: 4 }, 0.04, 9, '0.10 × 0.4'],
  ]),
  ...rows('tbdy-2018/base-shear/static', 'own arithmetic', [
    ['tbdy-fall', { sds_g: 1, sd1_g: 0.4, reduction_r: 8, overstrength_d: 3, period_s: 1 }, 0.05, 9, '0.4/1/8'],
    [
      'tbdy-plateau',
      { sds_g: 1, sd1_g: 0.4, reduction_r: 8, overstrength_d: 3, period_s: 0.2 },
      0.181818,
      6,
      '1/(3 + 5/2): half way to T_B',
    ],
    [
      'tbdy-rise',
      { sds_g: 1, sd1_g: 0.4, reduction_r: 8, overstrength_d: 3, period_s: 0.04 },
      0.2,
      9,
      '(0.4 + 0.6/2)/(3 + 5/10)',
    ],
    ['tbdy-floor', { sds_g: 1, sd1_g: 0.4, reduction_r: 8, overstrength_d: 3, period_s: 3 }, 0.04, 9, '0.04 × 1'],
  ]),
];

const INDIA: readonly ReferenceCase[] = [
  ...rows('is1893-1970/base-shear/static', 'own arithmetic', [
    [
      'is1893-1970-stiff',
      { basic_coefficient: 0.08, soil_factor: 1.2, performance_factor: 1.6, period_s: 0.064 },
      0.1536,
      9,
      '1.6 × 1.2 × 0.08, C held at 1',
    ],
    [
      'is1893-1970-1s',
      { basic_coefficient: 0.08, soil_factor: 1.2, performance_factor: 1.6, period_s: 1 },
      0.0768,
      9,
      'half of it at 1 s',
    ],
  ]),
  ...rows('is1893-2002/base-shear/static', 'restated', [
    [
      'SP-27-ah',
      { zone_factor: 0.36, fall_s: 1.36, reduction_r: 5, period_s: 0.48 },
      0.09,
      4,
      'base shear calculation sheet, 7-storey school: A_h 0.135 with I 1.5, here with I 1',
    ],
    [
      'SP-28-ah',
      { zone_factor: 0.36, fall_s: 1.36, reduction_r: 5, period_s: 0.298 },
      0.09,
      4,
      'base shear calculation sheet, low building: A_h 0.135 with I 1.5, here with I 1',
    ],
  ]),
  ...rows('is1893-2002/base-shear/static', 'own arithmetic', [
    ['is1893-2002-1s', { zone_factor: 0.36, fall_s: 1.36, reduction_r: 3, period_s: 1 }, 0.0816, 9, '0.18 × 1.36/3'],
  ]),
];

const CANADA: readonly ReferenceCase[] = [
  ...rows('nbc-1975/base-shear/static', 'own arithmetic', [
    [
      'nbc-1975-1s',
      { zone_g: 0.08, structure_factor: 1.3, foundation_factor: 1.5, period_s: 1 },
      0.078,
      9,
      '0.08 × 1.3 × 1.5 × 0.5',
    ],
    [
      'nbc-1975-stiff',
      { zone_g: 0.08, structure_factor: 0.7, foundation_factor: 1, period_s: 0.1 },
      0.056,
      9,
      '0.08 × 0.7, S held at 1',
    ],
  ]),
  ...rows('nbc-1990/base-shear/static', 'own arithmetic', [
    [
      'nbc-1990-plateau',
      { velocity_ratio: 0.2, plateau: 3, foundation_factor: 1, reduction_r: 4, period_s: 0.2 },
      0.09,
      9,
      '0.6 × 0.2 × 3/4',
    ],
    [
      'nbc-1990-soft',
      { velocity_ratio: 0.2, plateau: 3, foundation_factor: 1.5, reduction_r: 4, period_s: 0.375 },
      0.09,
      9,
      'F S = 1.5 × 2.56 is held at 3.0',
    ],
    [
      'nbc-1990-long',
      { velocity_ratio: 0.2, plateau: 4.2, foundation_factor: 1, reduction_r: 4, period_s: 2.25 },
      0.03,
      9,
      '0.6 × 0.2 × 1.5/1.5/4',
    ],
  ]),
  ...rows('nbc-2005/base-shear/static', 'own arithmetic', [
    [
      'nbc-2005-between',
      { s_0p2_g: 0.9, s_0p5_g: 0.6, s_1_g: 0.3, s_2_g: 0.15, reduction_r: 6.8, period_s: 0.7 },
      0.070588,
      6,
      '(0.6 − 0.4 × 0.3)/6.8',
    ],
    [
      'nbc-2005-cap',
      { s_0p2_g: 0.9, s_0p5_g: 0.6, s_1_g: 0.3, s_2_g: 0.15, reduction_r: 6.8, period_s: 0.1 },
      0.088235,
      6,
      '2/3 × 0.9/6.8',
    ],
    [
      'nbc-2005-floor',
      { s_0p2_g: 0.9, s_0p5_g: 0.6, s_1_g: 0.3, s_2_g: 0.15, reduction_r: 6.8, period_s: 5 },
      0.022059,
      6,
      '0.15/6.8',
    ],
  ]),
];

const twentyMetres = { height_m: 20, plan_dimension_m: 16 };
const PERIODS: readonly ReferenceCase[] = [
  ...rows('italy-1975/period/other', 'own arithmetic', [['italy-1975-t', twentyMetres, 0.5, 9, '0.1 × 20/√16']]),
  ...rows('greece-1995/period/other', 'own arithmetic', [['greece-1995-t', twentyMetres, 0.45, 9, '0.09 × 20/√16']]),
  ...rows('turkey-1975/period/other', 'own arithmetic', [['turkey-1975-t', twentyMetres, 0.45, 9, '0.09 × 20/√16']]),
  ...rows('is1893-1970/period/other', 'own arithmetic', [['is1893-1970-t', twentyMetres, 0.45, 9, '0.09 × 20/√16']]),
  ...rows('is1893-1970/period/moment-frame', 'own arithmetic', [
    ['is1893-1970-frame-t', { storeys: 8 }, 0.8, 9, '0.1 × 8'],
  ]),
  ...(
    [
      ['concrete-frames', 0.662019],
      ['steel-frames', 0.756593],
      ['other', 0.472871],
    ] as const
  ).flatMap(([which, expected]) =>
    rows(`turkey-1998/period/${which}`, 'own arithmetic', [
      [`turkey-1998-t-${which}`, { height_m: 20 }, expected, 6, 'C_t × 9.457416 (20^0.75), C_t 0.07, 0.08, 0.05'],
    ]),
  ),
];

const OWN: readonly ReferenceCase[] = [
  ...rows('swaymark/base-shear/own-table', 'own arithmetic', [
    ['own-table', { coefficient: 0.07 }, 0.07, 9, 'the number of the row'],
  ]),
  ...rows('swaymark/base-shear/own-table-falling', 'own arithmetic', [
    [
      'own-table-level',
      { coefficient: 0.12, corner_period_s: 0.5, fall: 1, period_s: 0.4 },
      0.12,
      9,
      'level up to the corner',
    ],
    [
      'own-table-falling',
      { coefficient: 0.12, corner_period_s: 0.5, fall: 2 / 3, period_s: 4 },
      0.03,
      9,
      '0.12 × (1/8)^(2/3) = 0.12/4',
    ],
  ]),
  ...rows('swaymark/design-period/own-table', 'own arithmetic', [
    [
      'own-table-period',
      { height_m: 16, period_coefficient: 0.05, period_exponent: 0.75 },
      0.4,
      9,
      '0.05 × 16^(3/4) = 0.05 × 8',
    ],
  ]),
];

export const ERA_CASES: readonly ReferenceCase[] = [
  ...JAPAN,
  ...NEW_ZEALAND,
  ...ITALY,
  ...GREECE,
  ...TURKEY,
  ...INDIA,
  ...CANADA,
  ...PERIODS,
  ...OWN,
];
