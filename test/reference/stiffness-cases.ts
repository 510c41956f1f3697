/** Periods from mass and stiffness, masses, and what a first storey's height does. */
import { IN_M, LBF_KN, exactly, fromOmega, half } from './case.js';
import type { ReferenceCase } from './case.js';
import { CHAIN_CASES } from './stiffness-cases-chains.js';
import { CONTINUUM_CASES } from './stiffness-cases-continuum.js';
import { GROUND_CASES } from './stiffness-cases-ground.js';
import { MATERIAL_CASES } from './stiffness-cases-materials.js';
import { MEMBER_CASES } from './stiffness-cases-members.js';

/** lbf/in in kN/m, and lbf s²/in in t. */
const perInch = LBF_KN / IN_M;

const ones = (count: number): readonly number[] => new Array<number>(count).fill(1);
const softened = (count: number, beta: number): readonly number[] => [beta, ...ones(count - 1)];

const SINGLE: readonly ReferenceCase[] = [
  {
    id: 'SD-01',
    method: 'mechanics/period/single-mass',
    inputs: { mass_t: (3000 / 386) * perInch, stiffness_kN_per_m: 4300 * perInch },
    ...fromOmega(23.52, 2),
    source: 'Paz, Structural Dynamics, problem 1.2: 23.52 rad/s for 4300 lb/in and 3000 lb, g = 386 in/s²',
    mark: 'restated',
  },
  ...(
    [
      [69.3, 0.755],
      [579, 0.261],
      [1231, 0.179],
    ] as const
  ).map(([eigenvalue, expected]): ReferenceCase => ({
    id: `SD-16-${String(eigenvalue)}`,
    method: 'mechanics/period/single-mass',
    inputs: { mass_t: 1, stiffness_kN_per_m: eigenvalue },
    expected,
    tolerance: 0.001,
    source: 'Dynamic Loading and Design of Structures, table 2.2, p. 55: eigenvalue and period of a mode',
    mark: 'restated',
    note: 'the eigenvalues are printed to three digits',
  })),
];

const UNIFORM: readonly ReferenceCase[] = [
  {
    id: 'SD-13',
    method: 'mechanics/period/uniform-chain',
    inputs: { storeys: 5, mass_t: 1, stiffness_kN_per_m: 1 },
    ...fromOmega(0.28463, 5),
    source: 'Thomson, Theory of Vibration, 9.7, five equal storeys',
    mark: 'restated',
  },
  {
    id: 'SD-19',
    method: 'mechanics/period/uniform-chain',
    inputs: { storeys: 6, mass_t: 66 * perInch, stiffness_kN_per_m: 108_890 * perInch },
    expected: 0.6417,
    tolerance: half(4),
    source: 'Purdue CE 573, six-storey shear frame, inputs printed',
    mark: 'own arithmetic',
  },
  ...(
    [
      [1, 6.283],
      [2, 10.166],
      [3, 14.118],
      [4, 18.092],
      [5, 22.075],
      [6, 26.063],
      [8, 34.048],
      [10, 42.039],
      [15, 62.027],
      [20, 82.02],
    ] as const
  ).map(([storeys, expected]): ReferenceCase => ({
    id: `uniform-${String(storeys)}`,
    method: 'mechanics/period/uniform-chain',
    inputs: { storeys, mass_t: 1, stiffness_kN_per_m: 1 },
    expected,
    tolerance: half(3),
    source: 'table of the uniform shear building by an eigen-solution made elsewhere',
    mark: 'own arithmetic',
  })),
];

const CHAIN = 'mechanics/period/general-chain';
const GENERAL: readonly ReferenceCase[] = [
  {
    id: 'SD-07',
    method: CHAIN,
    inputs: {
      masses_t: [2165.74, 2165.74, 2165.74].map((kip) => (kip / 386.09) * 1000 * perInch),
      storey_stiffness_kN_per_m: [2621.89, 3733.13, 3733.13].map((k) => k * 1000 * perInch),
    },
    expected: 0.608,
    tolerance: half(3),
    source: 'M. Illahi, modal analysis, solved three-storey example, k1/k2 = 0.702',
    mark: 'restated',
  },
  {
    id: 'SD-08',
    method: CHAIN,
    inputs: { masses_t: [2, 2, 2, 1, 1], storey_stiffness_kN_per_m: ones(5) },
    ...fromOmega(0.2439, 4),
    source: 'worked five-storey example, textbook figure 18.8',
    mark: 'restated',
    note: 'the page says "same mass", its matrix holds 2, 2, 2, 1, 1',
  },
  {
    id: 'SD-10',
    method: CHAIN,
    inputs: { masses_t: [2, 1], storey_stiffness_kN_per_m: [2, 1] },
    ...fromOmega(0.707, 3),
    source: 'matrix problem page, two-storey frame 2m, m on 2k, k',
    mark: 'restated',
  },
  {
    id: 'SD-11',
    method: CHAIN,
    inputs: { masses_t: [70, 70], storey_stiffness_kN_per_m: [70_000, 35_000] },
    ...fromOmega(17.114, 3),
    source: 'Purdue CE 573, natural frequencies and modes, matrices printed',
    mark: 'own arithmetic',
  },
  {
    id: 'SD-14',
    method: CHAIN,
    inputs: { masses_t: [1, 1, 1, 0.5], storey_stiffness_kN_per_m: ones(4) },
    ...fromOmega(0.39018, 5),
    source: 'Thomson 9.7, half mass at the roof: 2 sin(π/16)',
    mark: 'restated',
  },
  {
    id: 'SD-20',
    method: CHAIN,
    inputs: { masses_t: ones(3), storey_stiffness_kN_per_m: ones(3) },
    ...fromOmega(0.44504, 5),
    source: 'three equal storeys, flexibility matrix printed in Thomson 12.2',
    mark: 'own arithmetic',
  },
  ...(
    [
      [3, 0.7, 1.112],
      [3, 0.5, 1.25],
      [5, 0.6, 1.116],
      [5, 0.3, 1.374],
      [10, 0.5, 1.093],
    ] as const
  ).map(([storeys, beta, ratio]): ReferenceCase => ({
    id: `SD-17-${String(storeys)}-${String(beta)}`,
    method: CHAIN,
    inputs: { masses_t: ones(storeys), storey_stiffness_kN_per_m: softened(storeys, beta) },
    expected: (ratio * Math.PI) / Math.sin(Math.PI / (4 * storeys + 2)),
    tolerance: 0.0011 * 4 * storeys,
    source: 'exact eigen-solution of a softened first storey made elsewhere; ratio to the uniform building',
    mark: 'own arithmetic',
    note: 'ratios carried to three decimals, 0.1 %',
  })),
];

const SHARE = 'mechanics/drift/first-storey-share';
const SHARES: readonly ReferenceCase[] = (
  [
    [3, 0.7, 0.545],
    [3, 0.5, 0.636],
    [5, 0.6, 0.411],
    [5, 0.3, 0.598],
    [10, 0.5, 0.268],
    [3, 1, 0.445],
    [5, 1, 0.285],
    [10, 1, 0.149],
  ] as const
).map(([storeys, beta, expected]): ReferenceCase => ({
  id: `SD-17-share-${String(storeys)}-${String(beta)}`,
  method: SHARE,
  inputs: { masses_t: ones(storeys), storey_stiffness_kN_per_m: softened(storeys, beta) },
  expected,
  tolerance: half(3),
  source: 'exact eigen-solution of a softened first storey made elsewhere',
  mark: 'own arithmetic',
}));

const MASS: readonly ReferenceCase[] = [
  {
    id: 'SD-07-shape',
    method: SHARE,
    inputs: { masses_t: ones(3), storey_stiffness_kN_per_m: [2621.89, 3733.13, 3733.13] },
    expected: 0.385 / 0.707,
    tolerance: 0.0012,
    source: 'M. Illahi, mode shape printed 0.385, 0.593, 0.707',
    mark: 'restated',
    note: 'quotient of two numbers printed to three decimals',
  },
  {
    id: 'floor-mass',
    method: 'mechanics/mass/of-a-floor',
    inputs: { weight_kN: 980.665, storeys: 4 },
    ...exactly(25),
    source: '980.665 kN / 9.80665 m/s² = 100 t on four floors',
    mark: 'own arithmetic',
  },
  {
    id: 'SD-43',
    method: 'mechanics/weight/of-area',
    inputs: { floor_area_m2: 240, unit_weight_kN_per_m2: 15.74 },
    expected: 3776.46,
    tolerance: 240 * half(2),
    source: 'load calculation of a concrete frame of 12 m × 20 m: floor of 3776.46 kN',
    mark: 'restated',
    note: 'the weight per area is rounded to two decimals',
  },
  {
    id: 'soft-columns',
    method: 'mechanics/stiffness/first-storey-columns',
    inputs: { stiffness_kN_per_m: 1, first_storey_height_m: 4.5, storey_height_m: 3 },
    expected: 0.3,
    tolerance: half(2),
    source: '(3.0/4.5)³ = 0.30, columns of 12EI/h³',
    mark: 'own arithmetic',
  },
  {
    id: 'soft-columns-textbook',
    method: 'mechanics/stiffness/first-storey-columns',
    inputs: { stiffness_kN_per_m: 27, first_storey_height_m: 6, storey_height_m: 2 },
    ...exactly(1),
    source: '27 × (2/6)³',
    mark: 'own arithmetic',
  },
  {
    id: 'soft-walls',
    method: 'mechanics/stiffness/first-storey-walls',
    inputs: { stiffness_kN_per_m: 9, first_storey_height_m: 4.5, storey_height_m: 3 },
    ...exactly(6),
    source: '9 × 3.0/4.5, walls of GA/h',
    mark: 'own arithmetic',
  },
];

export const STIFFNESS_CASES: readonly ReferenceCase[] = [
  ...SINGLE,
  ...UNIFORM,
  ...GENERAL,
  ...SHARES,
  ...MASS,
  ...CHAIN_CASES,
  ...MEMBER_CASES,
  ...CONTINUUM_CASES,
  ...MATERIAL_CASES,
  ...GROUND_CASES,
];
