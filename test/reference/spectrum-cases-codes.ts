/** Ordinates of the codes' spectra. */
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

type Rest = Pick<ReferenceCase, 'source' | 'mark'> & { readonly note?: string };

/** Ordinates of one spectrum: periods with value and tolerance. */
const curve = (
  id: string,
  method: string,
  parameters: ReferenceCase['inputs'],
  rest: Rest,
  points: readonly (readonly [period_s: number, expected: number, tolerance: number])[],
): readonly ReferenceCase[] =>
  points.map(([period_s, expected, tolerance]) => ({
    id: `${id}-${String(period_s)}s`,
    method,
    inputs: { ...parameters, period_s },
    expected,
    tolerance,
    ...rest,
  }));

const exact = (expected: number): number => exactly(expected).tolerance;
const own = (source: string): Rest => ({ source, mark: 'own arithmetic' });

const SANTA_ANA = 'Report filed with City of Santa Ana';
const BERKELEY = 'UC Berkeley CE 120, homework 7 of 2015, ASCE 7-10';
const D_2016 = { ss_g: 1.288, s1_g: 0.459, site_class: 'D', tl_s: 8, supplement_3: 'not-applied' } as const;
const C_2010 = { ss_g: 2.466, s1_g: 1.025, site_class: 'C', tl_s: 8 } as const;
const D_2005 = { ss_g: 1.39, s1_g: 0.5, site_class: 'D', tl_s: 8 } as const;
const C_2016 = { ss_g: 1.5, s1_g: 0.5, site_class: 'C', tl_s: 12, supplement_3: 'applied' } as const;

const MAPPED: readonly ReferenceCase[] = [
  ...curve(
    'SP-06-design',
    'asce7-16/spectrum/two-period',
    { ...D_2016, shaking: 'design' },
    { source: SANTA_ANA, mark: 'restated', note: 'S_DS printed truncated; S_D1 made from the rounded S_M1' },
    [
      [0.3, 0.858, 0.001],
      [1, 0.56333, 0.0001],
    ],
  ),
  ...curve(
    'SP-06-maximum',
    'asce7-16/spectrum/two-period',
    { ...D_2016, shaking: 'maximum-considered' },
    { source: SANTA_ANA, mark: 'restated' },
    [
      [0.3, 1.288, half(3)],
      [1, 0.845, half(3)],
    ],
  ),
  // 0.56333 × 1.5, Supplement 3
  ...curve(
    'supplement-3',
    'asce7-16/spectrum/two-period',
    { ...D_2016, supplement_3: 'applied', shaking: 'design' },
    own('ASCE 7-16 Supplement 3: S_D1 of SP-06 raised by half'),
    [[1.5, 0.56333, 0.0001]],
  ),
  ...curve(
    'SP-12-maximum',
    'asce7-05/spectrum/two-period',
    { ...D_2005, shaking: 'maximum-considered' },
    { source: SANTA_ANA, mark: 'restated', note: 'two decimals of values with hidden digits' },
    [
      [0.3, 1.39, half(2)],
      [1, 0.74, 0.011],
    ],
  ),
  ...curve(
    'SP-12-design',
    'asce7-05/spectrum/two-period',
    { ...D_2005, shaking: 'design' },
    { source: SANTA_ANA, mark: 'restated' },
    [
      [0.3, 0.93, half(2)],
      [1, 0.5, half(2)],
    ],
  ),
  ...curve(
    'SP-13-maximum',
    'asce7-10/spectrum/two-period',
    { ...C_2010, shaking: 'maximum-considered' },
    { source: BERKELEY, mark: 'restated' },
    [
      [0.3, 2.466, half(3)],
      [1, 1.33, half(2)],
    ],
  ),
  ...curve(
    'SP-13-design',
    'asce7-10/spectrum/two-period',
    { ...C_2010, shaking: 'design' },
    { source: BERKELEY, mark: 'restated', note: 'S_D1 printed as the USGS page had it, 0.887 for 0.8883' },
    [
      [0, 0.66, half(2)],
      [0.3, 1.644, half(3)],
      [1, 0.887, 0.002],
    ],
  ),
  ...curve(
    'SP-15-maximum',
    'asce7-16/spectrum/two-period',
    { ...C_2016, shaking: 'maximum-considered' },
    { source: 'Published ELF calculation example, ASCE 7-16', mark: 'restated' },
    [
      [0.3, 1.8, half(2)],
      [1, 0.75, half(2)],
    ],
  ),
];

/** Invented: 1.5 at 0.5 s, 1.2 at 0.75 s, 0.06 at 10 s. */
const TWENTY_TWO = [
  0.6, 0.62, 0.65, 0.7, 0.85, 1.05, 1.2, 1.4, 1.5, 1.55, 1.6, 1.6, 1.5, 1.2, 1.0, 0.7, 0.5, 0.32, 0.22, 0.17, 0.1, 0.06,
];
const multi = (shaking: string, tl_s: number): ReferenceCase['inputs'] => ({ ordinates_g: TWENTY_TWO, tl_s, shaking });

const US: readonly ReferenceCase[] = [
  ...curve(
    'two-period-maximum',
    'asce7-22/spectrum/two-period-maximum',
    { sds_g: 1, sd1_g: 0.5, tl_s: 8 },
    own('1.5 times 0.7, 1, 0.5 and 0.5 × 8/10²'),
    [
      [0.05, 1.05, exact(1.05)],
      [0.3, 1.5, exact(1.5)],
      [1, 0.75, exact(0.75)],
      [10, 0.06, exact(0.06)],
    ],
  ),
  ...curve(
    'multi-period',
    'asce7-22/spectrum/multi-period',
    multi('design', 12),
    own('2/3 of 1.5 - 0.3 × 0.4; beyond 10 s 2/3 of 0.06 × 10/11 and of 0.06 × 10 × 12/20²'),
    [
      [0.6, 0.92, exact(0.92)],
      [0.4, 1.6 / 1.5, exact(1)],
      [11, 0.4 / 11, exact(0.03)],
      [20, 0.012, exact(0.012)],
    ],
  ),
  ...curve(
    'multi-period-maximum',
    'asce7-22/spectrum/multi-period',
    multi('maximum-considered', 8),
    own('1.5 - 0.3 × 0.4; with TL below 10 s 0.06 × (10/20)² [judgement]'),
    [
      [0.6, 1.38, exact(1.38)],
      [20, 0.015, exact(0.015)],
    ],
  ),
  ...curve(
    'general-5',
    'asce41-17/spectrum/general',
    { sxs_g: 1, sx1_g: 0.5, tl_s: 8, damping_ratio: 0.05 },
    own('B1 = 1: 0.4 + 0.3, 1, 0.5/1 and 0.5 × 8/10²'),
    [
      [0.05, 0.7, exact(0.7)],
      [0.2, 1, exact(1)],
      [1, 0.5, exact(0.5)],
      [10, 0.04, exact(0.04)],
    ],
  ),
  ...curve(
    'general-10',
    'asce41-17/spectrum/general',
    { sxs_g: 1, sx1_g: 0.5, tl_s: 8, damping_ratio: 0.1 },
    own('B1 = 1.2131: (5/B1 - 2) × 0.1 + 0.4, 1/B1, 0.5/B1'),
    [
      [0, 0.4, exact(0.4)],
      [0.05, 0.61217, 5e-5],
      [0.2, 0.82434, 5e-5],
      [1, 0.41217, 5e-5],
    ],
  ),
];

const DESIGN_B = { ag_g: 0.25, ground: 'B', behaviour_factor: 4, lower_bound_factor: 0.2 } as const;
const G = 9.80665;
const EN: readonly ReferenceCase[] = [
  ...curve(
    'SP-50',
    'en1998-1-2004/spectrum/design-type-1',
    DESIGN_B,
    own('EN 1998-1 (3.13) to (3.16), worked elsewhere'),
    [
      [0, 0.2, half(6)],
      [0.075, 0.19375, half(6)],
      [0.15, 0.1875, half(6)],
      [0.3, 0.1875, half(6)],
      [0.5, 0.1875, half(6)],
      [1, 0.09375, half(6)],
      [1.8, 0.052083, half(6)],
      [1.875, 0.05, half(6)],
      [2, 0.05, half(6)],
      [3, 0.05, half(6)],
    ],
  ),
  ...(
    [
      ['SP-30', 1.0, 1.67],
      ['SP-31', 0.528, 0.88],
    ] as const
  ).flatMap(([id, ag, plateau]) =>
    curve(
      id,
      'en1998-1-2004/spectrum/design-type-1',
      { ag_g: ag / G, ground: 'A', behaviour_factor: 1.5, lower_bound_factor: 0.2 },
      { source: 'Dynamic-analysis tutorial; q = 1.5 and ground A inferred', mark: 'restated' },
      [[0.3, plateau / G, half(2) / G]],
    ),
  ),
  // type 2, ground D: S 1.8, TC 0.3, TD 1.2: 2.5 × 1.8 × 0.1/3 = 0.15; T = 2: 0.15 × 0.3 × 1.2/4 = 0.0135, bound 0.02
  ...curve(
    'design-type-2',
    'en1998-1-2004/spectrum/design-type-2',
    { ag_g: 0.1, ground: 'D', behaviour_factor: 3, lower_bound_factor: 0.2 },
    own('EN 1998-1 (3.14) to (3.16) with table 3.3, ground D'),
    [
      [0.2, 0.15, exact(0.15)],
      [0.6, 0.075, exact(0.075)],
      [2, 0.02, exact(0.02)],
    ],
  ),
  ...(['1', '2'] as const).flatMap((type) =>
    curve(
      `elastic-10-${type}`,
      `en1998-1-2004/spectrum/elastic-type-${type}`,
      { ag_g: 0.1, ground: 'A', damping_ratio: 0.1 },
      own('2.5 η a_g with η = 0.8165 at 10 %'),
      [[0.2, 0.204125, 2.5e-5]],
    ),
  ),
];

const C_STATIC = {
  site_class: 'D',
  zone_factor: 0.4,
  return_factor: 1.8,
  distance_km: 2,
  site_period_s: 0.87,
} as const;
const TABLE_3_1: readonly (readonly [string, string, readonly number[], Rest['mark']])[] = [
  [
    'SP-54',
    'A',
    [1.89, 1.89, 1.89, 1.89, 1.89, 1.6, 1.4, 1.24, 1.12, 1.03, 0.95, 0.7, 0.53, 0.42, 0.35, 0.26, 0.2, 0.16],
    'memory',
  ],
  [
    'table-3-1-c',
    'C',
    [2.36, 2.36, 2.36, 2.36, 2.36, 2.0, 1.74, 1.55, 1.41, 1.29, 1.19, 0.88, 0.66, 0.53, 0.44, 0.32, 0.25, 0.2],
    'restated',
  ],
  ['SP-55', 'D', [3, 3, 3, 3, 3, 3, 2.84, 2.53, 2.29, 2.09, 1.93, 1.43, 1.07, 0.86, 0.71, 0.52, 0.4, 0.32], 'memory'],
  ['SP-56', 'E', [3, 3, 3, 3, 3, 3, 3, 3, 3, 3, 3, 2.21, 1.66, 1.33, 1.11, 0.81, 0.62, 0.49], 'memory'],
];
const TABLE_PERIODS = [0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1, 1.5, 2, 2.5, 3, 3.5, 4, 4.5];
const half_z = (site_class: string): ReferenceCase['inputs'] => ({
  site_class,
  zone_factor: 0.5,
  return_factor: 1,
  distance_km: 50,
  site_period_s: 1.5,
});

const NZ: readonly ReferenceCase[] = [
  // C(T) = C_d k_μ/S_p of the case: k_μ 1.5714 at 0.4 s, 2 beyond 0.7 s, S_p 0.7
  ...curve(
    'SP-53-c',
    'nzs1170-5-2004/spectrum/equivalent-static',
    C_STATIC,
    own('the C_d of the case times k_μ/S_p'),
    (
      [
        [0.4, 0.93545, 1.1 / 0.7],
        [1, 0.38168, 2],
        [2, 0.23725, 2],
        [3.5, 0.15355, 2],
      ] as const
    ).map(([period_s, cd, kMu]) => [period_s, (cd * kMu) / 0.7, (half(5) * kMu) / 0.7] as const),
  ),
  ...TABLE_3_1.flatMap(([id, site_class, row, mark]) =>
    (['table-3-1', 'equivalent-static'] as const).flatMap((form) =>
      curve(
        `${id}-${form}`,
        `nzs1170-5-2004/spectrum/${form}`,
        half_z(site_class),
        { source: 'NZS 1170.5 table 3.1, equivalent static column, times Z = 0.5', mark },
        TABLE_PERIODS.map(
          (period_s, i) => [period_s, row[i]! / 2, form === 'table-3-1' ? exact(row[i]!) : half(2) / 2] as const,
        ),
      ),
    ),
  ),
  ...curve(
    'modal-c',
    'nzs1170-5-2004/spectrum/modal',
    half_z('C'),
    {
      source: 'NZS 1170.5 commentary, class C: 1.33 + 1.60 (T/0.1), 2.93, 1.32/T and 3.96/T², times 0.5',
      mark: 'restated',
    },
    [
      [0, 0.665, exact(0.665)],
      [0.05, 1.065, exact(1.065)],
      [0.2, 1.465, exact(1.465)],
      [2, 0.33, exact(0.33)],
      [4, 0.12375, exact(0.12375)],
    ],
  ),
];

/** Vancouver, NBC 2015 table C-3, from memory; only the interpolation is checked. */
const SIX = [0.848, 0.751, 0.425, 0.257, 0.08, 0.029];
const CANADA: readonly ReferenceCase[] = [
  ...curve(
    'SP-57-nbc-2015',
    'nbc-2015/spectrum/design',
    { ordinates_g: SIX, pga_g: 0.37, site_class: 'C' },
    own('linear interpolation of the six values, worked elsewhere'),
    [
      [0.1, 0.848, half(6)],
      [0.3, 0.815667, half(6)],
      [0.75, 0.588, half(6)],
      [1.5, 0.341, half(6)],
      [3, 0.198, half(6)],
      [7, 0.0596, half(6)],
      [12, 0.029, half(6)],
    ],
  ),
  // PGA 0.5 with S_a(0.2)/PGA = 1.6 < 2: PGA_ref 0.4; class D: 0.94 × 0.8 = 0.752 and 1.14 × 0.7 = 0.798 is the larger
  ...curve(
    'nbc-2015-d',
    'nbc-2015/spectrum/design',
    { ordinates_g: [0.8, 0.7, 0.4, 0.2, 0.06, 0.02], pga_g: 0.5, site_class: 'D' },
    own('PGA_ref = 0.4: F 0.94, 1.14, 1.25, 1.31, 1.37 times the ordinates'),
    [
      [0.1, 0.798, exact(0.798)],
      [0.5, 0.798, exact(0.798)],
      [1, 0.5, exact(0.5)],
      [2, 0.262, exact(0.262)],
      [5, 0.0822, exact(0.0822)],
    ],
  ),
  ...curve(
    'SP-57-nbc-2020',
    'nbc-2020/spectrum/design-linear',
    { ordinates_g: SIX },
    own('linear interpolation of the six values, worked elsewhere'),
    [
      [0.3, 0.815667, half(6)],
      [7, 0.0596, half(6)],
    ],
  ),
  ...curve(
    'SP-58-nbc-2020',
    'nbc-2020/spectrum/design-log-log',
    { ordinates_g: SIX },
    own('log-log interpolation of the six values, worked elsewhere'),
    [
      [0.1, 0.848, half(6)],
      [0.3, 0.80362, half(6)],
      [0.75, 0.538279, half(6)],
      [1.5, 0.316665, half(6)],
      [3, 0.153339, half(6)],
      [7, 0.048884, half(6)],
      [12, 0.029, half(6)],
    ],
  ),
  ...curve(
    'nbc-2010',
    'nbc-2010/spectrum/design',
    { ordinates_g: [0.9, 0.6, 0.3, 0.15], fa: 1.2, fv: 1.4 },
    own('1.2 × 0.9; min(1.4 × 0.6, 1.08); 1.4 × 0.3; 1.4 × 0.15; half of it from 4 s on'),
    [
      [0.1, 1.08, exact(1.08)],
      [0.5, 0.84, exact(0.84)],
      [1, 0.42, exact(0.42)],
      [2, 0.21, exact(0.21)],
      [3, 0.1575, exact(0.1575)],
      [10, 0.105, exact(0.105)],
    ],
  ),
];

const INDIA: readonly ReferenceCase[] = [
  // A_h = (Z/2)(I/R)(S_a/g) = 0.135 with I/R = 0.3
  ...(['modal', 'equivalent-static'] as const).flatMap((form) => [
    ...curve(
      `SP-27-${form}`,
      `is1893-2016/spectrum/${form}`,
      { zone_factor: 0.36, soil: 'medium', shaking: 'design' },
      { source: 'Base shear calculation sheet, IS 1893: A_h = 0.135 times R/I = 5/1.5', mark: 'restated' },
      [
        [0.48, 0.45, (half(3) * 5) / 1.5],
        [0.53, 0.45, (half(3) * 5) / 1.5],
      ],
    ),
    ...curve(
      `SP-28-${form}`,
      `is1893-2016/spectrum/${form}`,
      { zone_factor: 0.36, soil: 'medium', shaking: 'design' },
      { source: 'Second base shear calculation sheet, IS 1893: A_h = 0.135 times R/I = 5/1.5', mark: 'restated' },
      [[0.298, 0.45, (half(3) * 5) / 1.5]],
    ),
  ]),
  ...curve(
    'is1893-soft',
    'is1893-2016/spectrum/modal',
    { zone_factor: 0.36, soil: 'soft', shaking: 'design' },
    own('0.18 × (1, 1.75, 1.67/2, 0.42)'),
    [
      [0, 0.18, exact(0.18)],
      [0.05, 0.315, exact(0.315)],
      [2, 0.1503, exact(0.1503)],
      [5, 0.0756, exact(0.0756)],
    ],
  ),
  ...curve(
    'is1893-static',
    'is1893-2016/spectrum/equivalent-static',
    { zone_factor: 0.24, soil: 'rock', shaking: 'maximum-considered' },
    own('0.24 × (2.5, 1.00/2)'),
    [
      [0, 0.6, exact(0.6)],
      [2, 0.12, exact(0.12)],
    ],
  ),
];

export const SPECTRUM_CODE_CASES: readonly ReferenceCase[] = [...MAPPED, ...US, ...EN, ...NZ, ...CANADA, ...INDIA];
