/** Braced bays. */
import { record } from '../formula.js';
import type { Family } from '../formula.js';
import { MODULUS, STOREY_HEIGHT, mechanics, quantity } from './specs.js';
import type { None } from './specs.js';

const brace: Family<
  {
    readonly modulus_MPa: number;
    readonly brace_area_m2: number;
    readonly bay_length_m: number;
    readonly storey_height_m: number;
  },
  None
> = {
  id: 'stiffness/brace',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [
    MODULUS,
    quantity('brace_area', 'm2', 'area of the active diagonals'),
    quantity('bay_length', 'm', 'length of the bay that a diagonal crosses'),
    STOREY_HEIGHT,
  ],
  expression: '1000 * modulus_MPa * brace_area_m2 * bay_length_m ^ 2 / (bay_length_m ^ 2 + storey_height_m ^ 2) ^ 1.5',
  evaluate: ({ modulus_MPa, brace_area_m2, bay_length_m: b, storey_height_m: h }) => {
    const square = b * b + h * h;
    return (1000 * modulus_MPa * brace_area_m2 * b * b) / (square * Math.sqrt(square));
  },
};

export const BRACE = record({
  id: 'mechanics/stiffness/brace',
  title: 'Braced bay',
  family: brace,
  constants: {},
  source: mechanics('(A E/L) cos²θ for each active diagonal, textbook'),
  verified: 'memory',
  limits: [],
  note: 'The columns taken as rigid along their axis, which misleads above some five storeys.',
});
