/** Cantilevers with their mass spread over the height, or in the floors. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { cantileverEigenvalue } from '../numeric/cantilever.js';
import { HEIGHT, MASSES, STOREYS, list, mechanics, quantity } from './specs.js';
import type { None } from './specs.js';

const MASS_PER_HEIGHT = quantity('mass_per_height', 't_per_m', 'mass over height');
const BENDING = quantity('flexural_rigidity', 'kN_m2', 'EI of all walls along the force');
const SHEAR = quantity(
  'shear_rigidity',
  'kN',
  'GA over the shape factor; for a frame, storey stiffness × storey height',
);

const flexural: Family<
  { readonly height_m: number; readonly mass_per_height_t_per_m: number; readonly flexural_rigidity_kN_m2: number },
  { readonly root: number }
> = {
  id: 'stiffness/flexural-cantilever',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [HEIGHT, MASS_PER_HEIGHT, BENDING],
  expression: '2 * pi / root * height_m * height_m * sqrt(mass_per_height_t_per_m / flexural_rigidity_kN_m2)',
  evaluate: ({ height_m, mass_per_height_t_per_m, flexural_rigidity_kN_m2 }, { root }) =>
    ((2 * Math.PI) / root) * height_m * height_m * Math.sqrt(mass_per_height_t_per_m / flexural_rigidity_kN_m2),
};

const shear: Family<
  { readonly height_m: number; readonly mass_per_height_t_per_m: number; readonly shear_rigidity_kN: number },
  { readonly coefficient: number }
> = {
  id: 'stiffness/shear-cantilever',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [HEIGHT, MASS_PER_HEIGHT, SHEAR],
  expression: 'coefficient * height_m * sqrt(mass_per_height_t_per_m / shear_rigidity_kN)',
  evaluate: ({ height_m, mass_per_height_t_per_m, shear_rigidity_kN }, { coefficient }) =>
    coefficient * height_m * Math.sqrt(mass_per_height_t_per_m / shear_rigidity_kN),
};

const floors: Family<
  {
    readonly masses_t: readonly number[];
    readonly storey_heights_m: readonly number[];
    readonly flexural_rigidity_kN_m2: number;
    readonly shear_rigidity_kN: number;
  },
  None
> = {
  id: 'stiffness/cantilever-with-floors',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [MASSES, list('storey_heights', 'm', 'storey heights, bottom to top'), BENDING, SHEAR],
  expression: null,
  procedure:
    'T = 2π/ω by matrix iteration (Stodola): floor masses × shape load the cantilever, whose deflection in bending and shear is the next shape',
  evaluate: ({ masses_t, storey_heights_m, flexural_rigidity_kN_m2, shear_rigidity_kN }) =>
    (2 * Math.PI) /
    Math.sqrt(cantileverEigenvalue(masses_t, storey_heights_m, flexural_rigidity_kN_m2, shear_rigidity_kN)),
};

const lumped: Family<{ readonly period_s: number; readonly storeys: number }, None> = {
  id: 'stiffness/lumped-floors',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [quantity('period', 's', 'with the mass spread over the height'), STOREYS],
  expression: 'period_s * (2 * storeys + 1) / (2 * storeys)',
  evaluate: ({ period_s, storeys }) => (period_s * (2 * storeys + 1)) / (2 * storeys),
};

export const CANTILEVER_WITH_FLOORS = record({
  id: 'mechanics/period/cantilever-with-floors',
  title: 'Wall cantilever with the mass in the floors, bending and shear',
  family: floors,
  constants: {},
  source: mechanics('matrix iteration (Stodola); Thomson, Theory of Vibration'),
  verified: 'restated',
  limits: [],
});
export const LUMPED_FLOORS = record({
  id: 'mechanics/period/lumped-floors',
  title: 'Mass in the floors instead of spread over the height',
  family: lumped,
  constants: {},
  source: mechanics('4(N + ½)√(m/k) of the uniform chain over 4N√(m/k) of the shear cantilever'),
  verified: 'mechanics',
  limits: [],
  note: 'Right for a shear cantilever; a wall in bending lengthens about twice as much.',
});

const STEEL_MANUAL = { standard: "Steel Designers' Manual", edition: '', clause: 'table 12.2' };

export const CONTINUUM_RECORDS: readonly AnyRecord[] = [
  record({
    id: 'mechanics/period/flexural-cantilever',
    title: 'Cantilever in bending, first mode',
    family: flexural,
    constants: { root: 3.5160152685 },
    source: STEEL_MANUAL,
    verified: 'restated',
    limits: [],
  }),
  record({
    id: 'mechanics/period/flexural-cantilever-second',
    title: 'Cantilever in bending, second mode',
    family: flexural,
    constants: { root: 22.0344915647 },
    source: STEEL_MANUAL,
    verified: 'restated',
    limits: [],
  }),
  record({
    id: 'mechanics/period/flexural-cantilever-third',
    title: 'Cantilever in bending, third mode',
    family: flexural,
    constants: { root: 61.6972144136 },
    source: STEEL_MANUAL,
    verified: 'restated',
    limits: [],
  }),
  record({
    id: 'mechanics/period/shear-cantilever',
    title: 'Cantilever in shear, first mode',
    family: shear,
    constants: { coefficient: 4 },
    source: mechanics('4H √(μ/GA), textbook'),
    verified: 'memory',
    limits: [],
  }),
  CANTILEVER_WITH_FLOORS,
  LUMPED_FLOORS,
];
