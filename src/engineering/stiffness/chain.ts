/** Periods of masses on springs. Masses in t and stiffness in kN/m give ω² in 1/s² without a factor. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { chainMode } from '../numeric/chain.js';
import { chainModeOf } from '../numeric/chain-modes.js';
import { sinOfAcute } from '../numeric/elementary.js';
import { MASS, MASSES, STIFFNESS, STIFFNESSES, STOREYS, mechanics } from './specs.js';
import type { None } from './specs.js';

interface SingleMassInput {
  readonly mass_t: number;
  readonly stiffness_kN_per_m: number;
}
type UniformInput = SingleMassInput & { readonly storeys: number };

const singleMass: Family<SingleMassInput, None> = {
  id: 'stiffness/single-mass',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [MASS, STIFFNESS],
  expression: '2 * pi * sqrt(mass_t / stiffness_kN_per_m)',
  evaluate: ({ mass_t, stiffness_kN_per_m }) => 2 * Math.PI * Math.sqrt(mass_t / stiffness_kN_per_m),
};

const uniformChain: Family<UniformInput, None> = {
  id: 'stiffness/uniform-chain',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [STOREYS, MASS, STIFFNESS],
  expression: 'pi * sqrt(mass_t / stiffness_kN_per_m) / sin(pi / (2 * (2 * storeys + 1)))',
  evaluate: ({ storeys, mass_t, stiffness_kN_per_m }) =>
    (Math.PI * Math.sqrt(mass_t / stiffness_kN_per_m)) / sinOfAcute(Math.PI / (2 * (2 * storeys + 1))),
};

const halfRoofChain: Family<UniformInput, None> = {
  ...uniformChain,
  id: 'stiffness/half-roof-chain',
  expression: 'pi * sqrt(mass_t / stiffness_kN_per_m) / sin(pi / (4 * storeys))',
  evaluate: ({ storeys, mass_t, stiffness_kN_per_m }) =>
    (Math.PI * Math.sqrt(mass_t / stiffness_kN_per_m)) / sinOfAcute(Math.PI / (4 * storeys)),
};

const uniformEstimate: Family<UniformInput, None> = {
  ...uniformChain,
  id: 'stiffness/uniform-estimate',
  expression: '4 * (storeys + 0.5) * sqrt(mass_t / stiffness_kN_per_m)',
  evaluate: ({ storeys, mass_t, stiffness_kN_per_m }) => 4 * (storeys + 0.5) * Math.sqrt(mass_t / stiffness_kN_per_m),
};

export interface ChainInput {
  readonly masses_t: readonly number[];
  readonly storey_stiffness_kN_per_m: readonly number[];
}
export type ModeInput = ChainInput & { readonly mode: number };
export const MODE = {
  name: 'mode',
  kind: 'number',
  meaning: '1 the fundamental, 2 the next',
  fallback: 1,
} as const;

const generalChain: Family<ChainInput, None> = {
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

const modeOfChain: Family<ModeInput, None> = {
  id: 'stiffness/mode-of-chain',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [MASSES, STIFFNESSES, MODE],
  expression: null,
  procedure:
    'T = 2π/ω, ω² the root of det(K - ω² M) = 0 that has the place of the mode, by the count of sign changes (Sturm)',
  evaluate: ({ masses_t, storey_stiffness_kN_per_m, mode }) =>
    (2 * Math.PI) / Math.sqrt(chainModeOf(masses_t, storey_stiffness_kN_per_m, mode).eigenvalue),
};

const STOREY_LIMIT = {
  input: 'storeys',
  from: 1,
  to: 120,
  whose: 'ours',
  outside: 'reject',
  text: '1 to 120 storeys',
} as const;

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
  limits: [STOREY_LIMIT],
});
const HALF_ROOF_CHAIN = record({
  id: 'mechanics/period/half-roof-chain',
  title: 'Equal storeys, half the mass at the roof, closed form',
  family: halfRoofChain,
  constants: {},
  source: mechanics('Thomson, Theory of Vibration, 9.7, p. 291'),
  verified: 'restated',
  limits: [STOREY_LIMIT],
});
const UNIFORM_ESTIMATE = record({
  id: 'mechanics/period/uniform-chain-estimate',
  title: 'Equal storeys and equal masses, rule of thumb',
  family: uniformEstimate,
  constants: {},
  source: mechanics('the closed form for many storeys'),
  verified: 'mechanics',
  limits: [STOREY_LIMIT],
  note: '4.5 % short at one storey, 0.8 % at three.',
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
const MODE_OF_CHAIN = record({
  id: 'mechanics/period/mode-of-chain',
  title: 'Shear building, any mode',
  family: modeOfChain,
  constants: {},
  source: mechanics('eigenproblem of the shear building'),
  verified: 'restated',
  limits: [],
});

export const CHAIN_RECORDS: readonly AnyRecord[] = [
  SINGLE_MASS,
  UNIFORM_CHAIN,
  HALF_ROOF_CHAIN,
  UNIFORM_ESTIMATE,
  GENERAL_CHAIN,
  MODE_OF_CHAIN,
];
