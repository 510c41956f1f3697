/** Masses, weights, and a first storey softened by its height. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { STIFFNESS, mechanics, quantity } from './specs.js';
import type { None } from './specs.js';

const GRAVITY_MPS2 = 9.80665;

const massOfFloor: Family<{ readonly weight_kN: number; readonly storeys: number }, { readonly gravity_mps2: number }> =
  {
    id: 'stiffness/floor-mass',
    yields: 'mass_t',
    unit: 't',
    symbol: 'm',
    inputs: [
      { name: 'weight_kN', kind: 'number', unit: 'kN', meaning: 'seismic weight of the building' },
      { name: 'storeys', kind: 'number', meaning: 'storeys above ground' },
    ],
    expression: 'weight_kN / (gravity_mps2 * storeys)',
    evaluate: ({ weight_kN, storeys }, { gravity_mps2 }) => weight_kN / (gravity_mps2 * storeys),
  };

const weightOfArea: Family<{ readonly floor_area_m2: number; readonly unit_weight_kN_per_m2: number }, None> = {
  id: 'stiffness/weight-of-area',
  yields: 'weight_kN',
  unit: 'kN',
  symbol: 'W',
  inputs: [
    { name: 'floor_area_m2', kind: 'number', unit: 'm2', meaning: 'floor area above ground' },
    { name: 'unit_weight_kN_per_m2', kind: 'number', unit: 'kN_per_m2', meaning: 'seismic weight per floor area' },
  ],
  expression: 'floor_area_m2 * unit_weight_kN_per_m2',
  evaluate: ({ floor_area_m2, unit_weight_kN_per_m2 }) => floor_area_m2 * unit_weight_kN_per_m2,
};

const weightOfPull: Family<
  { readonly stiffness_kN_per_m: number; readonly period_s: number },
  { readonly gravity_mps2: number }
> = {
  id: 'stiffness/weight-of-pull',
  yields: 'weight_kN',
  unit: 'kN',
  symbol: 'W',
  inputs: [STIFFNESS, quantity('period', 's', 'period of the free vibration')],
  expression: 'gravity_mps2 * stiffness_kN_per_m * (period_s / (2 * pi)) ^ 2',
  evaluate: ({ stiffness_kN_per_m, period_s }, { gravity_mps2 }) => {
    const perRadian = period_s / (2 * Math.PI);
    return gravity_mps2 * stiffness_kN_per_m * perRadian * perRadian;
  },
};

const softFirst: Family<
  { readonly stiffness_kN_per_m: number; readonly first_storey_height_m: number; readonly storey_height_m: number },
  { readonly exponent: number }
> = {
  id: 'stiffness/soft-first-storey',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k₁',
  inputs: [
    STIFFNESS,
    { name: 'first_storey_height_m', kind: 'number', unit: 'm', meaning: 'height of the first storey' },
    { name: 'storey_height_m', kind: 'number', unit: 'm', meaning: 'height of the storeys above' },
  ],
  expression: 'stiffness_kN_per_m * (storey_height_m / first_storey_height_m) ^ exponent',
  evaluate: ({ stiffness_kN_per_m, first_storey_height_m, storey_height_m }, { exponent }) => {
    const ratio = storey_height_m / first_storey_height_m;
    return exponent === 1 ? stiffness_kN_per_m * ratio : stiffness_kN_per_m * ratio * ratio * ratio;
  },
};

export const FLOOR_MASS = record({
  id: 'mechanics/mass/of-a-floor',
  title: 'Mass of a floor from seismic weight',
  family: massOfFloor,
  constants: { gravity_mps2: GRAVITY_MPS2 },
  source: mechanics('m = W/g'),
  verified: 'mechanics',
  limits: [],
});
export const WEIGHT_OF_AREA = record({
  id: 'mechanics/weight/of-area',
  title: 'Seismic weight from floor area',
  family: weightOfArea,
  constants: {},
  source: mechanics('weight per area times area'),
  verified: 'mechanics',
  limits: [],
});
const WEIGHT_OF_PULL = record({
  id: 'mechanics/weight/of-free-vibration',
  title: 'Weight of one mass from stiffness and period',
  family: weightOfPull,
  constants: { gravity_mps2: GRAVITY_MPS2 },
  source: mechanics('Clough and Penzien, Dynamics of Structures, example E2-1'),
  verified: 'restated',
  limits: [],
});
export const SOFT_FIRST_COLUMNS = record({
  id: 'mechanics/stiffness/first-storey-columns',
  title: 'First storey stiffness from its height, columns',
  family: softFirst,
  constants: { exponent: 3 },
  source: mechanics('12EI/h³: the height ratio cubed'),
  verified: 'mechanics',
  limits: [],
});
export const SOFT_FIRST_WALLS = record({
  id: 'mechanics/stiffness/first-storey-walls',
  title: 'First storey stiffness from its height, walls in shear',
  family: softFirst,
  constants: { exponent: 1 },
  source: mechanics('GA/h: the height ratio'),
  verified: 'mechanics',
  limits: [],
});

export const WEIGHT_RECORDS: readonly AnyRecord[] = [
  FLOOR_MASS,
  WEIGHT_OF_AREA,
  WEIGHT_OF_PULL,
  SOFT_FIRST_COLUMNS,
  SOFT_FIRST_WALLS,
];
