/** Chains beyond the fundamental period: other closed forms, higher modes, shapes, bounds. */
import { IN_M, LBF_KN, exactly, fromOmega, half } from './case.js';
import type { ReferenceCase } from './case.js';

const perInch = LBF_KN / IN_M;
const ones = (count: number): readonly number[] => new Array<number>(count).fill(1);

const THOMSON = 'Thomson, Theory of Vibration, 9.7';
const ILLAHI = 'M. Illahi, modal analysis, solved three-storey example, k1/k2 = 0.702';
const FIVE = 'worked five-storey example, textbook figure 18.8';
const TWO = 'matrix problem page, two-storey frame 2m, m on 2k, k';
const PURDUE = 'Purdue CE 573, six-storey shear frame, inputs printed, answer computed';
const TABLE = 'table of the uniform shear building by an eigen-solution made elsewhere';

const HALF_ROOF: readonly ReferenceCase[] = [
  {
    id: 'SD-14-closed',
    method: 'mechanics/period/half-roof-chain',
    inputs: { storeys: 4, mass_t: 1, stiffness_kN_per_m: 1 },
    ...fromOmega(0.39018, 5),
    source: `${THOMSON}, half mass at the roof`,
    mark: 'restated',
  },
  {
    id: 'half-roof-1',
    method: 'mechanics/period/half-roof-chain',
    inputs: { storeys: 1, mass_t: 2, stiffness_kN_per_m: 1 },
    ...exactly(2 * Math.PI),
    source: 'half of 2 t on 1 kN/m is one mass of 1 t: T = 2π',
    mark: 'own arithmetic',
  },
  {
    id: 'uniform-estimate-1',
    method: 'mechanics/period/uniform-chain-estimate',
    inputs: { storeys: 1, mass_t: 1, stiffness_kN_per_m: 1 },
    ...exactly(6),
    source: '4 × 1.5 = 6, 4.5 % under 2π',
    mark: 'own arithmetic',
  },
  {
    id: 'uniform-estimate-20',
    method: 'mechanics/period/uniform-chain-estimate',
    inputs: { storeys: 20, mass_t: 1, stiffness_kN_per_m: 1 },
    expected: 82.02,
    tolerance: 0.03,
    source: TABLE,
    mark: 'own arithmetic',
    note: 'the estimate is 82, the exact value 82.020',
  },
];

const mode = (
  id: string,
  masses_t: readonly number[],
  storey_stiffness_kN_per_m: readonly number[],
  which: number,
  omega: number,
  digits: number,
  source: string,
  mark: ReferenceCase['mark'] = 'restated',
): ReferenceCase => ({
  id: `${id}-mode-${String(which)}`,
  method: 'mechanics/period/mode-of-chain',
  inputs: { masses_t, storey_stiffness_kN_per_m, mode: which },
  ...fromOmega(omega, digits),
  source,
  mark,
});

const MODES: readonly ReferenceCase[] = [
  ...[10.332, 30.398, 45.811].map((omega, i) => ({
    ...mode(
      'SD-07',
      [2165.74, 2165.74, 2165.74].map((kip) => (kip / 386.09) * 1000 * perInch),
      [2621.89, 3733.13, 3733.13].map((k) => k * 1000 * perInch),
      i + 1,
      omega,
      3,
      ILLAHI,
    ),
    tolerance: (2 * Math.PI * 0.0002) / omega,
    note: 'k1 comes from printed K11 less k2; 0.02 %',
  })),
  ...[0.2439, 0.6689, 1.0, 1.286, 1.685].map((omega, i) =>
    mode('SD-08', [2, 2, 2, 1, 1], ones(5), i + 1, omega, i < 3 ? 4 : 3, FIVE),
  ),
  ...[0.7071, 1.4142].map((omega, i) => mode('SD-10', [2, 1], [2, 1], i + 1, omega, 4, TWO)),
  ...[17.114, 41.317].map((omega, i) =>
    mode(
      'SD-11',
      [70, 70],
      [70_000, 35_000],
      i + 1,
      omega,
      3,
      'Purdue CE 573, natural frequencies, matrices printed',
      'own arithmetic',
    ),
  ),
  ...[0.28463, 0.83083, 1.30972, 1.68251, 1.91899].map((omega, i) =>
    mode('SD-13', ones(5), ones(5), i + 1, omega, 5, `${THOMSON}, five equal storeys`),
  ),
  ...[0.39018, 1.11114, 1.66294, 1.96157].map((omega, i) =>
    mode('SD-14', [1, 1, 1, 0.5], ones(4), i + 1, omega, 5, `${THOMSON}, half mass at the roof`),
  ),
];

interface Row {
  readonly storeys: number;
  readonly gamma: number;
  readonly first: number;
  readonly second: number | null;
  readonly drift: number;
}
const UNIFORM: readonly Row[] = (
  [
    [1, 1.0, 1.0, null, 1.0],
    [2, 1.171, 0.947, 0.053, 1.24],
    [3, 1.22, 0.914, 0.075, 1.34],
    [4, 1.241, 0.893, 0.083, 1.39],
    [5, 1.252, 0.88, 0.087, 1.42],
    [6, 1.258, 0.87, 0.089, 1.45],
    [8, 1.264, 0.856, 0.091, 1.48],
    [10, 1.267, 0.848, 0.091, 1.5],
    [15, 1.271, 0.836, 0.092, 1.52],
    [20, 1.272, 0.83, 0.092, 1.53],
  ] as const
).map(([storeys, gamma, first, second, drift]) => ({ storeys, gamma, first, second, drift }));

const SHAPES: readonly ReferenceCase[] = UNIFORM.flatMap(({ storeys, gamma, first, second, drift }) => {
  const inputs = { masses_t: ones(storeys), storey_stiffness_kN_per_m: ones(storeys) };
  const common = { source: TABLE, mark: 'own arithmetic' } as const;
  const share = (which: number, expected: number): ReferenceCase => ({
    ...common,
    id: `uniform-mass-${String(storeys)}-${String(which)}`,
    method: 'mechanics/mass/effective-share',
    inputs: { ...inputs, mode: which },
    expected,
    tolerance: half(3),
  });
  return [
    {
      ...common,
      id: `uniform-participation-${String(storeys)}`,
      method: 'mechanics/participation/roof',
      inputs: { ...inputs, mode: 1 },
      expected: gamma,
      tolerance: half(3),
    },
    share(1, first),
    ...(second === null ? [] : [share(2, second)]),
    {
      ...common,
      id: `uniform-drift-${String(storeys)}`,
      method: 'mechanics/drift/largest-over-mean',
      inputs,
      expected: drift,
      tolerance: storeys === 10 ? 0.0055 : half(2),
      note: storeys === 10 ? 'the table prints 1.50 for 1.4946' : 'printed to two decimals',
    },
  ];
});

/** φ₁ of two equal masses on two equal springs is (√5 - 1)/2 (golden ratio; any textbook). */
const OF_HEIGHTS: readonly ReferenceCase[] = (
  [
    ['alike', [3, 3], 2 * 0.6180339887],
    ['tall-first', [4.5, 3], Math.max(0.6180339887 / 4.5, 0.3819660113 / 3) * 7.5],
    ['tall-top', [2.5, 10], (0.6180339887 / 2.5) * 12.5],
  ] as const
).map(([which, storey_heights_m, expected]) => ({
  id: `two-storeys-drift-${which}`,
  method: 'mechanics/drift/largest-over-mean-of-heights',
  inputs: { masses_t: ones(2), storey_stiffness_kN_per_m: ones(2), storey_heights_m },
  expected,
  tolerance: 1e-8,
  mark: 'own arithmetic',
  source: 'φ₁ = 0.6180 of two equal masses on equal springs (textbook), each drift over its own height',
}));

const MODAL: readonly ReferenceCase[] = [
  ...[0.8795, 0.0872, 0.0242, 0.0075, 0.0016].map((expected, i): ReferenceCase => ({
    id: `SD-13-mass-${String(i + 1)}`,
    method: 'mechanics/mass/effective-share',
    inputs: { masses_t: ones(5), storey_stiffness_kN_per_m: ones(5), mode: i + 1 },
    expected,
    tolerance: 1e-4,
    source: `${THOMSON}, five equal storeys; the shares computed`,
    mark: 'own arithmetic',
    note: 'stated to 1e-4',
  })),
  {
    id: 'SD-13-participation',
    method: 'mechanics/participation/roof',
    inputs: { masses_t: ones(5), storey_stiffness_kN_per_m: ones(5), mode: 1 },
    expected: 1.2517,
    tolerance: half(4),
    source: `${THOMSON}, five equal storeys; the participation computed`,
    mark: 'own arithmetic',
  },
  ...[
    [0.8889, 1.3333],
    [0.1111, -0.3333],
  ].flatMap(([share, participation], i): ReferenceCase[] => {
    const inputs = { masses_t: [2, 1], storey_stiffness_kN_per_m: [2, 1], mode: i + 1 };
    return [
      {
        id: `SD-10-mass-${String(i + 1)}`,
        method: 'mechanics/mass/effective-share',
        inputs,
        expected: share ?? NaN,
        tolerance: half(4),
        source: TWO,
        mark: 'restated',
      },
      {
        id: `SD-10-participation-${String(i + 1)}`,
        method: 'mechanics/participation/roof',
        inputs,
        expected: participation ?? NaN,
        tolerance: half(4),
        source: TWO,
        mark: 'restated',
      },
    ];
  }),
];

const SIX = {
  masses_t: new Array<number>(6).fill(66 * perInch),
  storey_stiffness_kN_per_m: new Array<number>(6).fill(108_890 * perInch),
};
const THREE = { masses_t: ones(3), storey_stiffness_kN_per_m: ones(3) };
const BRACKET = 'three equal storeys, flexibility matrix and trace rule printed in Thomson 12.2, bounds computed';

const ENERGY: readonly ReferenceCase[] = [
  {
    id: 'SD-19-linear',
    method: 'mechanics/period/rayleigh-shape',
    inputs: { ...SIX, shape: [1, 2, 3, 4, 5, 6] },
    ...fromOmega(10.43, 2),
    source: PURDUE,
    mark: 'restated',
  },
  {
    id: 'SD-19-gravity-shape',
    method: 'mechanics/period/rayleigh-shape',
    inputs: { ...SIX, shape: [6, 11, 15, 18, 20, 21] },
    ...fromOmega(9.851, 3),
    source: PURDUE,
    mark: 'restated',
  },
  {
    id: 'SD-20-linear',
    method: 'mechanics/period/rayleigh-shape',
    inputs: { ...THREE, shape: [1, 2, 3] },
    ...fromOmega(0.4629, 4),
    source: BRACKET,
    mark: 'restated',
  },
  {
    id: 'SD-20-gravity',
    method: 'mechanics/period/rayleigh-gravity',
    inputs: { masses_t: ones(3), displacements_m: [3, 5, 6].map((u) => u * 9.80665) },
    ...fromOmega(0.4472, 4),
    source: BRACKET,
    mark: 'restated',
  },
  {
    id: 'SD-20-dunkerley',
    method: 'mechanics/period/dunkerley',
    inputs: THREE,
    ...fromOmega(0.4082, 4),
    source: BRACKET,
    mark: 'restated',
  },
  {
    id: 'SD-18',
    method: 'asce7-22/period/rayleigh-forces',
    inputs: { masses_t: [146.8], forces_kN: [845.31], displacements_m: [1] },
    expected: 2.618,
    tolerance: half(3),
    source: 'ten-storey worked example of eq. 15.4-6: sums ΣmΔ² = 146.80 and ΣfΔ = 845.31 printed, T cut off at "2.6"',
    mark: 'restated',
  },
  {
    id: 'rayleigh-forces-two',
    method: 'asce7-22/period/rayleigh-forces',
    inputs: { masses_t: [1, 2], forces_kN: [3, 4], displacements_m: [1, 2] },
    ...exactly(2 * Math.PI * Math.sqrt(9 / 11)),
    source: '(1 + 8)/(3 + 8)',
    mark: 'own arithmetic',
  },
  {
    id: 'SD-37-series',
    method: 'mechanics/period/series',
    inputs: { period_1_s: 0.394, period_2_s: 0.4648 },
    expected: 0.6093,
    tolerance: half(4),
    source: 'root of the sum of squares worked by hand, the rule quoted after Rutenberg',
    mark: 'own arithmetic',
  },
  {
    id: 'SD-37-parallel',
    method: 'mechanics/period/parallel',
    inputs: { period_1_s: 0.394, period_2_s: 0.4648 },
    expected: 0.3005,
    tolerance: half(4),
    source: 'Southwell worked by hand',
    mark: 'own arithmetic',
  },
  {
    id: 'SD-05-one-mass',
    method: 'mechanics/period/gravity-sway',
    inputs: { top_displacement_m: 0.09 },
    expected: 0.6018,
    tolerance: 0.00015,
    source: '2π √(0.09/9.81)',
    mark: 'own arithmetic',
    note: 'worked with 9.81 m/s²: 0.03 % more',
  },
  ...(
    [
      [0.02, 1.0002],
      [0.05, 1.00125],
      [0.1, 1.00504],
      [0.2, 1.02062],
    ] as const
  ).map(([damping_ratio, expected]): ReferenceCase => ({
    id: `SD-04-${String(damping_ratio)}`,
    method: 'mechanics/period/damped',
    inputs: { period_s: 1, damping_ratio },
    expected,
    tolerance: damping_ratio === 0.02 ? half(4) : half(5),
    source: '1/√(1 - ζ²) worked by hand, the formula from memory',
    mark: 'own arithmetic',
  })),
  {
    id: 'SD-02-weight',
    method: 'mechanics/weight/of-free-vibration',
    inputs: { stiffness_kN_per_m: (20 / 0.2) * 1000 * perInch, period_s: 1.4 },
    expected: 1916.4 * 1000 * LBF_KN,
    tolerance: 1916.4 * 1000 * LBF_KN * 5e-4,
    source: 'Clough and Penzien, Dynamics of Structures, Example E2-1: 20 kip for 0.20 in, 1.40 s; inputs restated',
    mark: 'own arithmetic',
    note: 'worked with g = 386 in/s², 0.02 % less',
  },
  {
    id: 'SD-43-roof',
    method: 'mechanics/weight/of-area',
    inputs: { floor_area_m2: 240, unit_weight_kN_per_m2: 12.93 },
    expected: 3103.48,
    tolerance: 240 * half(2),
    source: 'load calculation of a concrete frame of 12 m × 20 m: roof of 3103.48 kN',
    mark: 'restated',
    note: 'the weight per area is rounded to two decimals',
  },
  {
    id: 'SD-44',
    method: 'mechanics/weight/of-area',
    inputs: { floor_area_m2: 22.5 * 5 * 1.3, unit_weight_kN_per_m2: 14 },
    ...exactly(2047.5),
    source: 'column-sizing note: 7.5 m × 3 m, five floors, edge factor 1.3, 14 kN/m²',
    mark: 'restated',
  },
];

export const CHAIN_CASES: readonly ReferenceCase[] = [
  ...HALF_ROOF,
  ...MODES,
  ...SHAPES,
  ...OF_HEIGHTS,
  ...MODAL,
  ...ENERGY,
];
