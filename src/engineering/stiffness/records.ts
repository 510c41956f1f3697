/** Period from mass and storey stiffness. Masses in t and stiffness in kN/m give ω² in 1/s² without a factor. */
import { sinOfAcute } from '../numeric/elementary.js';
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { chainMode, chainProperties } from '../numeric/chain.js';

const MASS = { name: 'mass_t', kind: 'number', unit: 't', meaning: 'mass of a floor' } as const;
const STIFFNESS = {
  name: 'stiffness_kN_per_m',
  kind: 'number',
  unit: 'kN_per_m',
  meaning: 'lateral stiffness of a storey',
} as const;
const MASSES = { name: 'masses_t', kind: 'list', unit: 't', meaning: 'floor masses, bottom to top' } as const;
const STIFFNESSES = {
  name: 'storey_stiffness_kN_per_m',
  kind: 'list',
  unit: 'kN_per_m',
  meaning: 'storey stiffness, bottom to top',
} as const;

interface SingleMassInput {
  readonly mass_t: number;
  readonly stiffness_kN_per_m: number;
}
const singleMass: Family<SingleMassInput, Record<never, number>> = {
  id: 'stiffness/single-mass',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [MASS, STIFFNESS],
  expression: '2 * pi * sqrt(mass_t / stiffness_kN_per_m)',
  evaluate: ({ mass_t, stiffness_kN_per_m }) => 2 * Math.PI * Math.sqrt(mass_t / stiffness_kN_per_m),
};

const uniformChain: Family<SingleMassInput & { readonly storeys: number }, Record<never, number>> = {
  id: 'stiffness/uniform-chain',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [{ name: 'storeys', kind: 'number', meaning: 'number of equal storeys' }, MASS, STIFFNESS],
  expression: 'pi * sqrt(mass_t / stiffness_kN_per_m) / sin(pi / (2 * (2 * storeys + 1)))',
  evaluate: ({ storeys, mass_t, stiffness_kN_per_m }) =>
    (Math.PI * Math.sqrt(mass_t / stiffness_kN_per_m)) / sinOfAcute(Math.PI / (2 * (2 * storeys + 1))),
};

export interface ChainInput {
  readonly masses_t: readonly number[];
  readonly storey_stiffness_kN_per_m: readonly number[];
}
const generalChain: Family<ChainInput, Record<never, number>> = {
  id: 'stiffness/general-chain',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [MASSES, STIFFNESSES],
  expression: null,
  procedure:
    'T = 2π/ω, ω² the smallest root of det(K - ω² M) = 0; K tridiagonal with k(i) + k(i+1) on the diagonal and -k(i+1) beside it',
  evaluate: ({ masses_t, storey_stiffness_kN_per_m }) =>
    (2 * Math.PI) / Math.sqrt(chainMode(masses_t, storey_stiffness_kN_per_m).eigenvalue),
};

const firstStoreyShare: Family<ChainInput, Record<never, number>> = {
  id: 'stiffness/first-storey-share',
  yields: 'first_storey_share',
  unit: null,
  symbol: 'φ₁/φ_roof',
  inputs: [MASSES, STIFFNESSES],
  expression: null,
  procedure: 'first-mode displacement of the first floor over that of the roof',
  evaluate: ({ masses_t, storey_stiffness_kN_per_m }) =>
    chainProperties(masses_t, chainMode(masses_t, storey_stiffness_kN_per_m)).firstStoreyShare,
};

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

const weightOfArea: Family<
  { readonly floor_area_m2: number; readonly unit_weight_kN_per_m2: number },
  Record<never, number>
> = {
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

const mechanics = (clause: string) => ({ standard: 'structural dynamics', edition: '', clause });

export const SINGLE_MASS = record({
  id: 'mechanics/period/single-mass',
  title: 'One mass on one spring',
  family: singleMass,
  constants: {},
  source: mechanics('textbook; common practice, no source'),
  verified: 'mechanics',
  limits: [],
});
export const UNIFORM_CHAIN = record({
  id: 'mechanics/period/uniform-chain',
  title: 'Equal storeys and equal masses, closed form',
  family: uniformChain,
  constants: {},
  source: mechanics('Thomson, Theory of Vibration, 9.7'),
  verified: 'restated',
  limits: [{ input: 'storeys', from: 1, to: 120, whose: 'ours', outside: 'reject', text: '1 to 120 storeys' }],
});
export const GENERAL_CHAIN = record({
  id: 'mechanics/period/general-chain',
  title: 'Shear building with any storey pattern',
  family: generalChain,
  constants: {},
  source: mechanics('eigenproblem of the shear building'),
  verified: 'restated',
  limits: [],
});
export const FIRST_STOREY_SHARE = record({
  id: 'mechanics/drift/first-storey-share',
  title: "First storey's share of roof displacement",
  family: firstStoreyShare,
  constants: {},
  source: mechanics('first mode of the shear building'),
  verified: 'mechanics',
  limits: [],
});
export const FLOOR_MASS = record({
  id: 'mechanics/mass/of-a-floor',
  title: 'Mass of a floor from seismic weight',
  family: massOfFloor,
  constants: { gravity_mps2: 9.80665 },
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

export const STIFFNESS_RECORDS: readonly AnyRecord[] = [
  SINGLE_MASS,
  UNIFORM_CHAIN,
  GENERAL_CHAIN,
  FIRST_STOREY_SHARE,
  FLOOR_MASS,
  WEIGHT_OF_AREA,
  SOFT_FIRST_COLUMNS,
  SOFT_FIRST_WALLS,
];
