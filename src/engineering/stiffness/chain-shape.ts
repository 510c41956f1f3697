/** What a mode of the shear building yields beside its period: participation, effective mass, drift. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { chainMode, chainProperties } from '../numeric/chain.js';
import { chainModeOf, driftFactor } from '../numeric/chain-modes.js';
import { MODE } from './chain.js';
import type { ChainInput, ModeInput } from './chain.js';
import { HEIGHTS, MASSES, STIFFNESSES, mechanics } from './specs.js';
import type { None } from './specs.js';

const firstStoreyShare: Family<ChainInput, None> = {
  id: 'stiffness/first-storey-share',
  yields: 'first_storey_share',
  unit: null,
  symbol: 'φ₁/φ_roof',
  inputs: [MASSES, STIFFNESSES],
  expression: null,
  procedure: 'φ₁/φ_roof = displacement of the first floor over that of the roof, first mode',
  evaluate: ({ masses_t, storey_stiffness_kN_per_m }) =>
    chainProperties(masses_t, chainMode(masses_t, storey_stiffness_kN_per_m)).firstStoreyShare,
};

const largestDrift: Family<ChainInput, None> = {
  id: 'stiffness/drift-factor',
  yields: 'drift_factor',
  unit: null,
  symbol: 'β₂',
  inputs: [MASSES, STIFFNESSES],
  expression: null,
  procedure: 'β₂ = largest storey drift of the first mode over the mean one, storeys of equal height',
  evaluate: ({ masses_t, storey_stiffness_kN_per_m }) => driftFactor(chainMode(masses_t, storey_stiffness_kN_per_m)),
};

interface HeightsInput extends ChainInput {
  readonly storey_heights_m: readonly number[];
}

const largestDriftOfHeights: Family<HeightsInput, None> = {
  ...largestDrift,
  id: 'stiffness/drift-factor-of-heights',
  inputs: [MASSES, STIFFNESSES, HEIGHTS],
  procedure: 'β₂ = largest (φᵢ - φᵢ₋₁)/hᵢ × Σh, φ the shape of the first mode, 1 at the roof',
  evaluate: ({ masses_t, storey_stiffness_kN_per_m, storey_heights_m: heights }) => {
    const { shape } = chainMode(masses_t, storey_stiffness_kN_per_m);
    if (heights.length !== shape.length)
      throw new RangeError(
        `as many storey heights as masses are needed, got ${String(heights.length)} and ${String(shape.length)}`,
      );
    let total = 0;
    let largest = 0;
    heights.forEach((height_m, i) => {
      total += height_m;
      largest = Math.max(largest, (shape[i]! - (i === 0 ? 0 : shape[i - 1]!)) / height_m);
    });
    return largest * total;
  },
};

const participation: Family<ModeInput, None> = {
  id: 'stiffness/participation',
  yields: 'participation',
  unit: null,
  symbol: 'Γ',
  inputs: [MASSES, STIFFNESSES, MODE],
  expression: null,
  procedure: 'Γ = Σmφ / Σmφ², φ the shape of the mode, 1 at the roof',
  evaluate: ({ masses_t, storey_stiffness_kN_per_m, mode }) =>
    chainProperties(masses_t, chainModeOf(masses_t, storey_stiffness_kN_per_m, mode)).participation,
};

const effectiveShare: Family<ModeInput, None> = {
  ...participation,
  id: 'stiffness/effective-mass-share',
  yields: 'effective_mass_share',
  symbol: 'M*/M',
  procedure: 'M*/M = (Σmφ)² / (Σmφ² Σm), φ the shape of the mode',
  evaluate: ({ masses_t, storey_stiffness_kN_per_m, mode }) =>
    chainProperties(masses_t, chainModeOf(masses_t, storey_stiffness_kN_per_m, mode)).effectiveMassShare,
};

export const FIRST_STOREY_SHARE = record({
  id: 'mechanics/drift/first-storey-share',
  title: "First storey's share of roof displacement",
  family: firstStoreyShare,
  constants: {},
  source: mechanics('first mode of the shear building'),
  verified: 'mechanics',
  limits: [],
});
export const DRIFT_FACTOR = record({
  id: 'mechanics/drift/largest-over-mean',
  title: 'Largest storey drift over the mean one',
  family: largestDrift,
  constants: {},
  source: mechanics('first mode of the shear building'),
  verified: 'mechanics',
  limits: [],
});
export const DRIFT_FACTOR_OF_HEIGHTS = record({
  id: 'mechanics/drift/largest-over-mean-of-heights',
  title: 'Largest storey drift over the mean one, storeys of their own heights',
  family: largestDriftOfHeights,
  constants: {},
  source: mechanics('first mode of the shear building'),
  verified: 'mechanics',
  limits: [],
});
export const PARTICIPATION = record({
  id: 'mechanics/participation/roof',
  title: 'Roof participation of a mode',
  family: participation,
  constants: {},
  source: mechanics('modal analysis, textbook'),
  verified: 'restated',
  limits: [],
});
const EFFECTIVE_SHARE = record({
  id: 'mechanics/mass/effective-share',
  title: 'Effective mass of a mode over the total',
  family: effectiveShare,
  constants: {},
  source: mechanics('modal analysis, textbook'),
  verified: 'restated',
  limits: [],
});

export const CHAIN_SHAPE_RECORDS: readonly AnyRecord[] = [
  FIRST_STOREY_SHARE,
  DRIFT_FACTOR,
  DRIFT_FACTOR_OF_HEIGHTS,
  PARTICIPATION,
  EFFECTIVE_SHARE,
];
