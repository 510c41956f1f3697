/** Design coefficients of past editions. */
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

const UBC97 = 'ubc-1997/base-shear/static';
/** The sheet holds I = 1.25; the record holds I = 1, so the printed numbers are divided by 1.25. */
const SHEET97 = { ca_g: 0.2, cv_g: 0.2, zone_floor: 0, reduction_r: 6.5 } as const;
const sheet97 = (id: string, period_s: number, printed: number): ReferenceCase => ({
  id,
  method: UBC97,
  inputs: { ...SHEET97, period_s },
  expected: printed / 1.25,
  tolerance: 0.0006 / 1.25,
  source: 'spreadsheet page, UBC-97 1630.2.1, C_a = C_v = 0.20, R 6.5, I 1.25',
  mark: 'restated',
  note: 'printed to three decimals, the 0.0275 rounded up',
});

const EARLY: readonly ReferenceCase[] = [
  ...(
    [
      ['firm', 0.075],
      ['soft', 0.1],
    ] as const
  ).map(([soil, expected]): ReferenceCase => ({
    id: `ubc-1927-${soil}`,
    method: 'ubc-1927/base-shear/static',
    inputs: {},
    edition: { id: 'ubc-1927', stated: { soil } },
    ...exactly(expected),
    source: 'data sheet 11.4: UBC 1927 appendix, 0.075 on firm and 0.10 on soft ground',
    mark: 'memory',
  })),
  {
    id: 'SD-57-5',
    method: 'ubc-1949/base-shear/static',
    inputs: { zone_share: 1, storeys: 5 },
    expected: 0.063,
    tolerance: half(3),
    source: '0.60/(N + 4.5) in zone 3, five storeys',
    mark: 'memory',
  },
  {
    id: 'ubc-1949-one',
    method: 'ubc-1949/base-shear/static',
    inputs: { zone_share: 0.25, storeys: 1.5 },
    ...exactly(0.025),
    source: 'zone 1, a quarter of 0.60/6',
    mark: 'own arithmetic',
  },
  {
    id: 'ubc-1949-ten',
    method: 'ubc-1949/base-shear/static',
    inputs: { zone_share: 0.5, storeys: 10.5 },
    ...exactly(0.02),
    source: 'zone 2, half of 0.60/15',
    mark: 'own arithmetic',
  },
  ...(
    [
      [0.1, 0.1],
      [0.5, 0.063],
      [1.2, 0.0471],
    ] as const
  ).map(([period_s, expected]): ReferenceCase => ({
    id: `SD-53-${String(period_s)}s`,
    method: 'ubc-1961/base-shear/static',
    inputs: { zone_factor: 1, structure_factor: 1, period_s },
    expected,
    tolerance: 0.0002,
    source: 'UBC 1961 to 1973, C = 0.05/T^(1/3) at most 0.10; form read, cap recalled',
    mark: 'own arithmetic',
    note: 'given with 0.0002',
  })),
  {
    id: 'la-1972',
    method: 'ubc-1961/base-shear/static',
    inputs: { zone_factor: 1, structure_factor: 1.33, period_s: 0.1 },
    expected: 0.133,
    tolerance: half(3),
    source: 'Los Angeles 1972: 0.133 for stiff bearing-wall buildings',
    mark: 'restated',
  },
  {
    id: 'la-1976',
    method: 'ubc-1976/base-shear/static',
    inputs: { zone_factor: 1, structure_factor: 1.33, site_factor: 1.5, period_s: 0.1 },
    expected: 0.186,
    tolerance: half(3),
    source: 'Los Angeles 1976: 0.186 for stiff bearing-wall buildings',
    mark: 'restated',
  },
  {
    id: 'ubc-1976-frame',
    method: 'ubc-1976/base-shear/static',
    inputs: { zone_factor: 1, structure_factor: 1, site_factor: 1.2, period_s: 0.5 },
    expected: 0.113,
    tolerance: half(3),
    source: '0.113 K at 0.5 s and S = 1.2',
    mark: 'memory',
  },
  {
    id: 'ubc-1976-least',
    method: 'ubc-1976/base-shear/static',
    inputs: { zone_factor: 1, structure_factor: 0.67, site_factor: 1.5, period_s: 0.2 },
    expected: 0.094,
    tolerance: half(3),
    source: '0.67 × 0.14: lower end of the highest zone',
    mark: 'restated',
  },
  {
    id: 'ubc-1976-cap',
    method: 'ubc-1976/base-shear/static',
    inputs: { zone_factor: 0.75, structure_factor: 1, site_factor: 1, period_s: 0.25 },
    ...exactly(0.09),
    source: 'zone 3: 0.75 × the cap 0.12',
    mark: 'own arithmetic',
  },
  ...(
    [
      [0.3, 0.0917],
      [0.5, 0.0794],
      [1.2, 0.0443],
      [4, 0.03],
    ] as const
  ).map(([period_s, expected]): ReferenceCase => ({
    id: `SD-55-${String(period_s)}s`,
    method: 'ubc-1988/base-shear/static',
    inputs: { zone_factor: 0.4, site_factor: 1.2, reduction_r: 12, period_s },
    expected,
    tolerance: half(4),
    source: 'UBC 1988 to 1994, Z 0.40, S 1.2, R_w 12',
    mark: 'own arithmetic',
  })),
  {
    id: 'ubc-1988-wall',
    method: 'ubc-1988/base-shear/static',
    inputs: { zone_factor: 0.4, site_factor: 1.2, reduction_r: 6, period_s: 0.3 },
    expected: 0.18,
    tolerance: half(2),
    source: 'data sheet 11.4: 0.18 in the highest zone at R_w 6',
    mark: 'memory',
  },
  {
    id: 'ubc-1988-frame',
    method: 'ubc-1988/base-shear/static',
    inputs: { zone_factor: 0.4, site_factor: 1.2, reduction_r: 8, period_s: 0.5 },
    expected: 0.119,
    tolerance: half(3),
    source: '0.40 × 2.38/8',
    mark: 'memory',
  },
];

const LATE: readonly ReferenceCase[] = [
  sheet97('SD-52-30-4', 1.03, 0.037),
  sheet97('SD-52-30-5', 0.1, 0.096),
  sheet97('SD-52-30-6', 3, 0.028),
  {
    id: 'ubc-1997-stiff',
    method: UBC97,
    inputs: { ca_g: 0.44, cv_g: 0.64, zone_floor: 0.32, reduction_r: 8.5, period_s: 0.3 },
    expected: 0.13,
    tolerance: half(2),
    source: 'data sheet 11.4: about 0.13 in the highest zone at R 8.5',
    mark: 'memory',
  },
  {
    id: 'ubc-1997-zone-4',
    method: UBC97,
    inputs: { ca_g: 0.44, cv_g: 0.64, zone_floor: 0.32, reduction_r: 4, period_s: 5 },
    ...exactly(0.08),
    source: '0.8 × 0.40 × 1.0 / 4 rules over 0.11 × 0.44 = 0.0484',
    mark: 'own arithmetic',
  },
  {
    id: 'SP-15',
    method: 'asce7-2002/base-shear/static',
    inputs: { sds_g: 1.2, sd1_g: 0.5, near_fault_s1_g: 0, reduction_r: 3.25, period_s: 0.46311 },
    expected: 0.3322,
    tolerance: half(4),
    source: 'published equivalent-lateral-force example, ASCE 7-16, R 3.25',
    mark: 'restated',
  },
  {
    id: 'SP-15-short',
    method: 'asce7-2002/base-shear/static',
    inputs: { sds_g: 1.2, sd1_g: 0.5, near_fault_s1_g: 0, reduction_r: 3.25, period_s: 0.2 },
    expected: 0.3692,
    tolerance: half(4),
    source: 'the same, C_s without the cap',
    mark: 'restated',
  },
  {
    id: 'SP-16',
    method: 'asce7-2002/base-shear/static',
    inputs: { sds_g: 0.84, sd1_g: 0.35, near_fault_s1_g: 0, reduction_r: 5, period_s: 0.5 },
    expected: 0.14,
    tolerance: half(3),
    source: 'explanatory page on ASCE 7-05',
    mark: 'restated',
  },
  {
    id: 'cs-floor',
    method: 'asce7-2002/base-shear/static',
    inputs: { sds_g: 1, sd1_g: 0.5, near_fault_s1_g: 0, reduction_r: 8, period_s: 4 },
    ...exactly(0.044),
    source: '0.044 × 1 rules over 0.5/(4 × 8)',
    mark: 'own arithmetic',
  },
  {
    id: 'cs-least',
    method: 'asce7-2002/base-shear/static',
    inputs: { sds_g: 0.1, sd1_g: 0.05, near_fault_s1_g: 0, reduction_r: 8, period_s: 4 },
    ...exactly(0.01),
    source: 'never under 0.01',
    mark: 'own arithmetic',
  },
  {
    id: 'cs-near-fault',
    method: 'asce7-2002/base-shear/static',
    inputs: { sds_g: 1, sd1_g: 0.5, near_fault_s1_g: 0.8, reduction_r: 8, period_s: 4 },
    ...exactly(0.05),
    source: '0.5 × 0.8 / 8',
    mark: 'own arithmetic',
  },
];

export const BASE_SHEAR_CASES: readonly ReferenceCase[] = [...EARLY, ...LATE];
