/** Foundations on the ground, and the ground's own period. */
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

const own = 'own arithmetic';
const WORKED =
  'four storeys, 20 × 12 m, 11,520 kN, 12.8 m, 0.30 s, ν 0.35, G/G₀ 0.7, 1.8 t/m³, worked elsewhere from the same formulas';

/** A square base of half-side 1 with G/(a - ν) = 1: the bracket itself. */
const SQUARE = { half_width_m: 1, half_length_m: 1, poisson_ratio: 0.35 };

const FOUNDATION: readonly ReferenceCase[] = [
  {
    id: 'soil-shear-modulus',
    method: 'mechanics/modulus/soil-shear',
    inputs: { density_t_per_m3: 1.8, vs30_mps: 180, modulus_ratio: 0.7 },
    ...exactly(40_824),
    source: '0.7 × 1.8 × 32,400',
    mark: own,
  },
  ...(
    [
      ['sway-along', 1.65, 9.2],
      ['sway-across', 1.65, 9.2],
      ['vertical', 0.65, 4.7],
      ['rocking-across', 0.65, 4],
      ['rocking-along', 0.65, 4],
    ] as const
  ).map(([which, soil_shear_modulus_kN_per_m2, expected]): ReferenceCase => ({
    id: `footing-square-${which}`,
    method: `pais-kausel-1988/stiffness/${which}`,
    inputs: { ...SQUARE, soil_shear_modulus_kN_per_m2 },
    ...exactly(expected),
    source:
      'a square has no long side: both directions agree, and the coefficients of NIST GCR 12-917-21 (restated) add up',
    mark: own,
  })),
  {
    id: 'footing-long-along',
    method: 'pais-kausel-1988/stiffness/rocking-along',
    inputs: { soil_shear_modulus_kN_per_m2: 0.65, half_width_m: 1, half_length_m: 32, poisson_ratio: 0.35 },
    ...exactly(3.73 * 4096 + 0.27),
    source: '32^2.4 = 2^12',
    mark: own,
  },
  {
    id: 'footing-long-sway',
    method: 'pais-kausel-1988/stiffness/sway-along',
    inputs: { soil_shear_modulus_kN_per_m2: 1.65, half_width_m: 1, half_length_m: 2 ** 20, poisson_ratio: 0.35 },
    ...exactly(6.8 * 8192 + 2.4),
    source: '(2^20)^0.65 = 2^13',
    mark: own,
  },
  {
    id: 'footing-long-vertical',
    method: 'pais-kausel-1988/stiffness/vertical',
    inputs: { soil_shear_modulus_kN_per_m2: 0.65, half_width_m: 1, half_length_m: 16, poisson_ratio: 0.35 },
    ...exactly(3.1 * 8 + 1.6),
    source: '16^0.75 = 8',
    mark: own,
  },
  {
    id: 'SD-45-sway',
    method: 'pais-kausel-1988/stiffness/sway-across',
    inputs: { soil_shear_modulus_kN_per_m2: 40_824, half_width_m: 6, half_length_m: 10, poisson_ratio: 0.35 },
    expected: 1_842_000,
    tolerance: 600,
    source: WORKED,
    mark: own,
  },
  {
    id: 'SD-45-rocking',
    method: 'pais-kausel-1988/stiffness/rocking-across',
    inputs: { soil_shear_modulus_kN_per_m2: 40_824, half_width_m: 6, half_length_m: 10, poisson_ratio: 0.35 },
    expected: 83_200_000,
    tolerance: 60_000,
    source: WORKED,
    mark: own,
  },
  {
    id: 'SD-45-structure',
    method: 'asce7-05/stiffness/effective-structure',
    inputs: { weight_kN: 0.7 * 11_520, period_s: 0.3 },
    expected: 361_000,
    tolerance: 600,
    source: WORKED,
    mark: own,
  },
  ...(
    [
      [180, 1.24],
      [120, 1.49],
      [300, 1.09],
      [600, 1.02],
    ] as const
  ).map(([velocity, expected]): ReferenceCase => ({
    id: `SD-45-${String(velocity)}`,
    method: 'veletsos-meek-1974/ratio/period-lengthening',
    inputs: {
      stiffness_kN_per_m: 361_000,
      foundation_stiffness_kN_per_m: 1_842_000 * (velocity / 180) ** 2,
      rocking_stiffness_kN_m: 83_200_000 * (velocity / 180) ** 2,
      effective_height_m: 0.7 * 12.8,
    },
    expected,
    tolerance: half(2),
    source: WORKED,
    mark: own,
  })),
  ...(
    [
      [150.6, 0.1889],
      [251, 0.1133],
      [502, 0.0567],
    ] as const
  ).map(([vs30_mps, expected]): ReferenceCase => ({
    id: `SD-46-${String(vs30_mps)}`,
    method: 'nist-gcr-12-917-21/ratio/wave-parameter',
    inputs: { height_m: 12.8, vs30_mps, period_s: 0.3 },
    expected,
    tolerance: half(4),
    source: 'NIST GCR 12-917-21 criterion as coded, worked by hand',
    mark: own,
  })),
];

const FLEXIBLE: ReferenceCase = {
  id: 'on-flexible-ground',
  method: 'mechanics/period/on-flexible-ground',
  inputs: { period_ratio: 1.25, period_s: 0.4 },
  ...exactly(0.5),
  source: '1.25 × 0.4',
  mark: own,
};

const SITE: readonly ReferenceCase[] = [
  ...(
    [
      [30, 200, 0.6],
      [40, 80, 2],
    ] as const
  ).map(([layer_depth_m, layer_velocity_mps, expected]): ReferenceCase => ({
    id: `SD-67-${String(layer_depth_m)}`,
    method: 'mechanics/period/site-layer',
    inputs: { layer_depth_m, layer_velocity_mps },
    ...exactly(expected),
    source: '4H/V_s worked by hand',
    mark: own,
  })),
  {
    id: 'site-two-layers',
    method: 'mechanics/period/site-layers',
    inputs: { layer_depths_m: [10, 20], layer_velocities_mps: [200, 400] },
    ...exactly(0.4),
    source: '4 × (10/200 + 20/400)',
    mark: own,
  },
  {
    id: 'site-ratio',
    method: 'mechanics/ratio/building-over-site',
    inputs: { period_s: 0.6, site_period_s: 0.8 },
    ...exactly(0.75),
    source: '0.6/0.8',
    mark: own,
  },
  ...(
    [
      [0.25, 1.219],
      [0.5, 1.375],
      [0.75, 1.469],
      [1, 1.5],
      [1.25, 1.481],
      [1.5, 1.425],
      [2, 1.2],
      [2.5, 1],
    ] as const
  ).map(([ratio, expected]): ReferenceCase => ({
    id: `SD-68-${String(ratio)}`,
    method: 'ubc-1976/site/resonance',
    inputs: { period_s: 2 * ratio, site_period_s: 2 },
    expected,
    tolerance: half(3),
    source: 'UBC 1976 to 1982, S by T/T_s, formula from memory',
    mark: own,
  })),
  {
    id: 'SD-68-bounds',
    method: 'ubc-1976/site/resonance',
    inputs: { period_s: 0.1, site_period_s: 0.2 },
    ...exactly(1 + 0.6 - 0.5 * 0.36),
    source: 'T taken as 0.3 s and T_s as 0.5 s: r = 0.6, bounds from memory',
    mark: own,
  },
];

export const GROUND_CASES: readonly ReferenceCase[] = [...FOUNDATION, FLEXIBLE, ...SITE];
