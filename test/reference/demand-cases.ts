/** Demand beyond S_a: base shear, displacement and drift, gaps between neighbours. */
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

const ASCE = { sds_g: 1, sd1_g: 0.6, tl_s: 8, near_fault_s1_g: 0, reduction_r: 6, importance_factor: 1 };
const asce = (
  id: string,
  changed: Partial<typeof ASCE>,
  period_s: number,
  expected: number,
  source: string,
): ReferenceCase => ({
  id: `asce7-16-cs-${id}`,
  method: 'asce7-16/base-shear/equivalent-lateral-force',
  inputs: { ...ASCE, ...changed, period_s },
  ...exactly(expected),
  source,
  mark: 'own arithmetic',
});

const SHEAR: readonly ReferenceCase[] = [
  asce('short', {}, 0.3, 1 / 6, 'S_DS/R below S_D1/S_DS = 0.6 s'),
  asce('falling', { importance_factor: 1.5 }, 1.2, 0.125, '0.6/(1.2 × 6/1.5)'),
  asce('least', {}, 3, 0.044, '0.6/(3 × 6) = 0.033 is under 0.044 S_DS'),
  asce('long', { sds_g: 0.2, tl_s: 4, reduction_r: 3 }, 8, 0.0125, '0.6 × 4/(8² × 3), over 0.044 × 0.2 = 0.0088'),
  asce('near-fault', { near_fault_s1_g: 0.75 }, 3, 0.0625, '0.5 × 0.75/6'),
  {
    id: 'en1998-lambda',
    method: 'en1998-1-2004/base-shear/lateral-force',
    inputs: { design_sa_g: 0.2, period_s: 0.5, corner_period_s: 0.4, storeys: 4 },
    ...exactly(0.17),
    source: '0.2 × 0.85: T under 2 T_C and more than two storeys',
    mark: 'own arithmetic',
  },
  ...(
    [
      [1, 4],
      [0.5, 2],
    ] as const
  ).map(([period_s, storeys]): ReferenceCase => ({
    id: `en1998-whole-${String(storeys)}`,
    method: 'en1998-1-2004/base-shear/lateral-force',
    inputs: { design_sa_g: 0.2, period_s, corner_period_s: 0.4, storeys },
    ...exactly(0.2),
    source: 'λ = 1 beyond 2 T_C, and for two storeys',
    mark: 'own arithmetic',
  })),
  {
    id: 'SP-27-importance',
    method: 'nbc-2005/base-shear/importance',
    inputs: { base_shear_coefficient: 0.09, importance_factor: 1.5 },
    ...exactly(0.135),
    source: 'base shear calculation sheet, IS 1893, 7-storey school: A_h 0.135 with I 1.5',
    mark: 'restated',
  },
  {
    id: 'elastic-shear',
    method: 'asce41-17/base-shear/elastic',
    inputs: { sa_g: 0.8, mass_share: 0.9 },
    ...exactly(0.72),
    source: '0.8 × 0.9, the mass share once',
    mark: 'own arithmetic',
  },
];

const c1 = (id: string, strength_ratio: number, period_s: number, expected: number, source: string): ReferenceCase => ({
  id,
  method: 'asce41-17/displacement/c1',
  inputs: { strength_ratio, site_factor_a: 60, period_s },
  expected,
  tolerance: half(4),
  source,
  mark: 'restated',
});
const DISPLACEMENT: readonly ReferenceCase[] = [
  {
    id: 'strength-ratio',
    method: 'asce41-17/displacement/strength-ratio',
    inputs: { sa_g: 1, mass_share: 0.9, yield_coefficient: 0.225 },
    ...exactly(4),
    source: '1 × 0.9 over 0.225',
    mark: 'own arithmetic',
  },
  {
    id: 'yield-coefficient',
    method: 'swaymark/displacement/yield-coefficient',
    inputs: { strength_coefficient: 0.14, overstrength: 2, irregularity: 0.7 },
    ...exactly(0.196),
    source: '0.14 × 2 × 0.7',
    mark: 'own arithmetic',
  },
  {
    id: 'yield-coefficient-of-check',
    method: 'swaymark/displacement/yield-coefficient-of-check',
    // two storeys: M_s 3.0, C 1.2; 2 m² of wall at 100 psi (0.6894757 MPa) under 6894.757 kN
    inputs: { strength_coefficient: (3 * 0.2) / 1.2, modification_c: 1.2, modifier_ms: 3, irregularity: 0.9 },
    ...exactly(0.18),
    source: '689.4757 × 2/6894.757 = 0.2, times 0.9',
    mark: 'own arithmetic',
  },
  c1('SD-49', 4, 0.6, 1.1389, 'public script, site class D: a = 60, T = 0.6 s, μ 4, C_m 1'),
  c1('c1-short', 4, 0.1, 2.25, 'not more than at 0.2 s: 1 + 3/(60 × 0.04)'),
  c1('c1-long', 4, 1.01, 1, 'beyond 1 s'),
  c1('c1-elastic', 0.5, 0.6, 1, 'elastic'),
  {
    id: 'c2',
    method: 'asce41-17/displacement/c2',
    inputs: { strength_ratio: 4, period_s: 0.5 },
    ...exactly(1.045),
    source: '1 + (3/0.5)²/800',
    mark: 'own arithmetic',
  },
  {
    id: 'c2-long',
    method: 'asce41-17/displacement/c2',
    inputs: { strength_ratio: 4, period_s: 0.71 },
    ...exactly(1),
    source: 'beyond 0.7 s',
    mark: 'own arithmetic',
  },
  ...(
    [
      [0.2, 2.5],
      [0.4, 1.375],
      [0.6, 1],
    ] as const
  ).map(([period_s, expected]): ReferenceCase => ({
    id: `SD-50-${String(period_s)}s`,
    method: 'ufc-3-310-03a/displacement/c1',
    inputs: { strength_ratio: 4, period_s, corner_period_s: 0.6 },
    ...exactly(expected),
    source: 'UFC 3-310-03A after eq. 5-5: R = 4, T_s = 0.6 s',
    mark: 'restated',
  })),
  {
    id: 'roof-displacement',
    method: 'miranda-1999/drift/roof',
    inputs: { sd_m: 0.1, participation: 1.25, c1: 1.1, c2: 1 },
    ...exactly(0.1375),
    source: '0.1 × 1.25 × 1.1',
    mark: 'own arithmetic',
  },
  {
    id: 'storey-drift',
    method: 'miranda-1999/drift/storey',
    inputs: { roof_displacement_m: 0.15, height_m: 15, drift_factor: 1.5 },
    ...exactly(0.015),
    source: '1.5 × 0.15 m over 15 m',
    mark: 'own arithmetic',
  },
];

const TWO = { displacement_1_m: 0.12, displacement_2_m: 0.09 };
const gap = (
  id: string,
  method: string,
  expected: number,
  source: string,
  mark: ReferenceCase['mark'],
): ReferenceCase => ({
  id,
  method,
  inputs: TWO,
  ...exactly(expected),
  source,
  mark,
});
const RHO = [
  [1, 1, 0.03],
  [0.8, 0.1656, 0.1376],
  [0.5, 0.0185, 0.1487],
] as const;
const SEPARATION: readonly ReferenceCase[] = [
  gap('SD-64-srss', 'asce7-16/separation/srss', 0.15, 'IBC eq. 16-64: root of 0.12² + 0.09²', 'restated'),
  gap('SD-64-sum', 'asce7-02/separation/sum', 0.21, 'the sum of 0.12 and 0.09 m', 'restated'),
  gap('SD-64-aligned', 'en1998-1-2004/separation/floors-aligned', 0.105, '0.7 × 0.15, EN 1998-1 4.4.2.7(3)', 'memory'),
  ...RHO.flatMap(([period_2_s, rho, expected]): readonly ReferenceCase[] => [
    {
      id: `SD-65-rho-${String(period_2_s)}`,
      method: 'jeng-kasai-maison-1992/separation/correlation',
      inputs: { damping_1: 0.05, damping_2: 0.05, period_1_s: 1, period_2_s },
      expected: rho,
      tolerance: 5e-4,
      source: 'Jeng, Kasai and Maison 1992, the correlation of CQC for equal damping',
      mark: 'memory',
      note: 'stated to 5e-4',
    },
    {
      id: `SD-65-gap-${String(period_2_s)}`,
      method: 'jeng-kasai-maison-1992/separation/double-difference',
      inputs: { ...TWO, correlation: rho },
      expected,
      tolerance: 5e-4,
      source: 'Jeng, Kasai and Maison 1992: 0.12 and 0.09 m',
      mark: 'memory',
      note: 'stated to 5e-4',
    },
  ]),
  {
    id: 'SD-72',
    method: 'jeng-kasai-maison-1992/separation/correlation',
    inputs: { damping_1: 0.02, damping_2: 0.1, period_1_s: 1, period_2_s: 0.8 },
    expected: 0.178,
    tolerance: 1e-3,
    source: 'two oscillators under white noise, integrated numerically: where the damping terms stand',
    mark: 'own arithmetic',
    note: 'stated to 1e-3',
  },
  ...(
    [
      ['low', 0.025],
      ['moderate', 0.05],
      ['high', 0.15],
    ] as const
  ).map(([which, expected]): ReferenceCase => ({
    id: `gap-by-height-${which}`,
    method: `asce41-17/separation/by-height-${which}`,
    inputs: { shorter_height_m: 10 },
    ...exactly(expected),
    source: 'ASCE 41-17 Table 17-2: 0.25, 0.5, 1.5 % of the shorter height',
    mark: 'memory',
  })),
];

export const DEMAND_CASES: readonly ReferenceCase[] = [...SHEAR, ...DISPLACEMENT, ...SEPARATION];
