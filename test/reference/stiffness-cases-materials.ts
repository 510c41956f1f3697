/** Moduli, cracking, timber panel wall. */
import { FT_M, IN_M, LBF_KN, exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

const own = 'own arithmetic';
const PSI_MPA = LBF_KN / (IN_M * IN_M) / 1000;

const CONCRETE: readonly ReferenceCase[] = [
  {
    id: 'SD-40-psi',
    method: 'aci318-19/modulus/concrete-psi',
    inputs: { concrete_strength_MPa: 4000 * PSI_MPA },
    expected: 3_604_997 * PSI_MPA,
    tolerance: 0.6 * PSI_MPA,
    source: 'ACI 318, 57,000 √4000 psi worked by hand',
    mark: own,
  },
  {
    id: 'SD-40-density',
    method: 'aci318-19/modulus/concrete-by-density',
    inputs: { concrete_strength_MPa: 25, density_kg_per_m3: 2400 },
    expected: 25_279,
    tolerance: 0.6,
    source: 'ACI 318, 0.043 × 2400^1.5 × 5 worked by hand',
    mark: own,
  },
  {
    id: 'SD-40-4700',
    method: 'aci318-19/modulus/concrete',
    inputs: { concrete_strength_MPa: 25 },
    ...exactly(23_500),
    source: 'ACI 318, 4700 × 5',
    mark: own,
  },
  ...(
    [
      [12, 27],
      [16, 29],
      [20, 30],
      [25, 31],
      [30, 33],
      [35, 34],
      [40, 35],
      [45, 36],
      [50, 37],
    ] as const
  ).map(([strength, gpa]): ReferenceCase => ({
    id: `SD-39-${String(strength)}`,
    method: 'en1992-1-1-2004/modulus/concrete',
    inputs: { concrete_strength_MPa: strength, aggregate_factor: 1 },
    expected: gpa * 1000,
    tolerance: 500,
    source: 'EN 1992-1-1 table 3.1, E_cm in whole GPa',
    mark: 'restated',
  })),
  {
    id: 'modulus-basalt',
    method: 'en1992-1-1-2004/modulus/concrete',
    inputs: { concrete_strength_MPa: 2, aggregate_factor: 1.2 },
    ...exactly(26_400),
    source: '1.2 × 22000 × 1',
    mark: own,
  },
  ...(
    [
      ['is456-2000/modulus/concrete', 25, 25_000, '5000 × 5'],
      ['ts500-2000/modulus/concrete', 25, 30_250, '3250 × 5 + 14,000'],
      ['nzs3101-2006/modulus/concrete', 25, 23_500, '3320 × 5 + 6900'],
    ] as const
  ).map(([method, concrete_strength_MPa, expected, source]): ReferenceCase => ({
    id: `modulus-${method.split('/')[0] ?? ''}`,
    method,
    inputs: { concrete_strength_MPa },
    ...exactly(expected),
    source: `${source}, formula from memory`,
    mark: own,
  })),
  {
    id: 'modulus-aij',
    method: 'aij-1999/modulus/concrete',
    inputs: { concrete_strength_MPa: 7.5, unit_weight_kN_per_m3: 12 },
    ...exactly(33_500 / 8),
    source: '33,500 × ¼ × ½, formula from memory',
    mark: own,
  },
];

const MASONRY: readonly ReferenceCase[] = [
  ...(
    [
      ['good', 8.07, 4.44, 1.77],
      ['fair', 5.38, 2.96, 1.18],
      ['poor', 2.69, 1.48, 0.59],
    ] as const
  ).flatMap(([masonry_condition, strength, modulus, shear]): ReferenceCase[] => {
    const common = { mark: 'restated', note: 'stated to 0.5 %' } as const;
    return [
      {
        ...common,
        id: `SD-41-strength-${masonry_condition}`,
        method: 'fema356/strength/unreinforced-masonry',
        inputs: { masonry_condition },
        expected: strength,
        tolerance: half(2),
        source: 'FEMA 356 default strengths 900, 600, 300 psi × 1.3',
      },
      {
        ...common,
        id: `SD-41-modulus-${masonry_condition}`,
        method: 'fema356/modulus/masonry',
        inputs: { masonry_strength_MPa: strength },
        expected: modulus * 1000,
        tolerance: 8,
        source: 'FEMA 356, 550 f_m',
        note: 'the strength is rounded',
      },
      {
        ...common,
        id: `SD-41-shear-${masonry_condition}`,
        method: 'mechanics/modulus/shear',
        inputs: { modulus_MPa: modulus * 1000 },
        expected: shear * 1000,
        tolerance: 6,
        source: 'FEMA 356, 0.4 E_m',
        note: 'rounded to 10 MPa',
      },
    ];
  }),
  ...(
    [
      ['tms402-2016/modulus/clay-masonry', 7000, 'restated'],
      ['tms402-2016/modulus/concrete-masonry', 9000, 'restated'],
      ['is1893-2016/modulus/infill-masonry', 5500, 'restated'],
      ['en1996-1-1-2005/modulus/masonry', 10_000, 'memory'],
      ['nzsee-2017/modulus/unreinforced-masonry', 3000, 'memory'],
    ] as const
  ).map(([method, expected, mark]): ReferenceCase => ({
    id: method.replaceAll('/', '-'),
    method,
    inputs: { masonry_strength_MPa: 10 },
    ...exactly(expected),
    source: 'the multiple of the strength that the document states, times 10 MPa',
    mark,
  })),
];

const constant = (method: string, expected: number, source: string, mark: ReferenceCase['mark']): ReferenceCase => ({
  id: method.replaceAll('/', '-'),
  method,
  inputs: {},
  ...exactly(expected),
  source,
  mark,
});
const ACI369 = 'ACI 369.1 table 3.1.2.1 as restated on a page of the standard';
const byForce = (
  method: string,
  axial_force_ratio: number,
  expected: number,
  source: string,
  mark: ReferenceCase['mark'],
): ReferenceCase => ({
  id: `${method.replaceAll('/', '-')}-${String(axial_force_ratio)}`,
  method,
  inputs: { axial_force_ratio },
  ...exactly(expected),
  source,
  mark,
});

const CRACKING: readonly ReferenceCase[] = [
  constant('en1998-1-2004/cracking/all', 0.5, 'EN 1998-1 4.3.1(7), one half', 'restated'),
  constant('fema356/cracking/beam', 0.5, 'FEMA 356 table 6-5', 'memory'),
  constant('fema356/cracking/wall-uncracked', 0.8, 'FEMA 356 table 6-5', 'memory'),
  constant('fema356/cracking/wall-cracked', 0.5, 'FEMA 356 table 6-5', 'memory'),
  constant('asce41-23/cracking/beam', 0.3, ACI369, 'restated'),
  constant('asce41-23/cracking/wall-cracked', 0.25, ACI369, 'restated'),
  constant('asce41-17/cracking/wall-cracked', 0.35, 'ASCE 41-17 table 10-5', 'memory'),
  constant('aci318-19/cracking/beam', 0.35, 'ACI 318-19 table 6.6.3.1.1(a)', 'restated'),
  constant('aci318-19/cracking/column', 0.7, 'ACI 318-19 table 6.6.3.1.1(a)', 'restated'),
  constant('aci318-19/cracking/wall-uncracked', 0.7, 'ACI 318-19 table 6.6.3.1.1(a)', 'restated'),
  constant('aci318-19/cracking/wall-cracked', 0.35, 'ACI 318-19 table 6.6.3.1.1(a)', 'restated'),
  constant('aci318-19/cracking/slab', 0.25, 'ACI 318-19 table 6.6.3.1.1(a)', 'restated'),
  constant('nzs3101-2006/cracking/beam-300', 0.4, 'NZS 3101 table C6.6', 'memory'),
  constant('nzs3101-2006/cracking/beam-500', 0.32, 'NZS 3101 table C6.6', 'memory'),
  constant('tbdy-2018/cracking/beam', 0.35, 'TBDY 2018 table 4.2', 'memory'),
  constant('tbdy-2018/cracking/column', 0.7, 'TBDY 2018 table 4.2', 'memory'),
  constant('tbdy-2018/cracking/wall', 0.5, 'TBDY 2018 table 4.2', 'memory'),
  constant('tbdy-2018/cracking/coupling-beam', 0.15, 'TBDY 2018 table 4.2', 'memory'),
  constant('csa-a23-3/cracking/beam', 0.4, 'CSA A23.3', 'memory'),
  byForce('asce41-23/cracking/column', 0, 0.3, ACI369, 'restated'),
  byForce('asce41-23/cracking/column', 0.3, 0.5, `${ACI369}; halfway between 0.3 and 0.7`, own),
  byForce('asce41-23/cracking/column', 0.6, 0.7, ACI369, 'restated'),
  byForce('asce41-23/cracking/wall-uncracked', 0.05, 0.5, ACI369, 'restated'),
  byForce('asce41-23/cracking/wall-uncracked', 0.175, 0.75, `${ACI369}; halfway between 0.5 and 1`, own),
  byForce('asce41-23/cracking/wall-uncracked', 0.4, 1, ACI369, 'restated'),
  byForce('fema356/cracking/column', 0.2, 0.5, 'FEMA 356 table 6-5', 'memory'),
  byForce('fema356/cracking/column', 0.4, 0.6, 'FEMA 356 table 6-5, halfway between 0.5 and 0.7', own),
  byForce('fema356/cracking/column', 0.5, 0.7, 'FEMA 356 table 6-5', 'memory'),
  byForce('csa-a23-3/cracking/column', 0.25, 0.65, '0.5 + 0.6 × 0.25, formula from memory', own),
  byForce('csa-a23-3/cracking/column', 0.9, 1, '0.5 + 0.54 is over 1', own),
  {
    id: 'cracked-modulus',
    method: 'mechanics/modulus/cracked',
    inputs: { modulus_MPa: 24_000, cracking_factor: 0.5 },
    ...exactly(12_000),
    source: '24,000 × 0.5',
    mark: own,
  },
];

/** The deflection as it is printed: plf, ft, psi, in², kip/in, in. */
function printedPanel(v: number, h: number, e: number, a: number, b: number, ga: number, slip: number): number {
  return (8 * v * h ** 3) / (e * a * b) + (v * h) / (1000 * ga) + (h * slip) / b;
}
const TIMBER: ReferenceCase = {
  id: 'panel-wall',
  method: 'sdpws-2015/drift/panel-wall',
  inputs: {
    shear_flow_kN_per_m: (350 * LBF_KN) / FT_M,
    wall_height_m: 9 * FT_M,
    wall_length_m: 8 * FT_M,
    modulus_MPa: 1.6e6 * PSI_MPA,
    chord_area_m2: 16.5 * IN_M * IN_M,
    apparent_stiffness_kN_per_m: (16_000 * LBF_KN) / IN_M,
    anchorage_slip_m: 0.1 * IN_M,
  },
  ...exactly(printedPanel(350, 9, 1.6e6, 16.5, 8, 16, 0.1) * IN_M),
  source: 'SDPWS eq. 4.3-1 as printed in feet, pounds and inches: 350 plf, 9 × 8 ft, G_a 16 kip/in, slip 0.1 in',
  mark: own,
};

export const MATERIAL_CASES: readonly ReferenceCase[] = [...CONCRETE, ...MASONRY, ...CRACKING, TIMBER];
