/** When a storey is soft, by the codes; what irregularities take off the capacity, and what not knowing them adds to its spread. */
import { record } from '../formula.js';
import type { AnyRecord, Family, MethodRecord } from '../formula.js';
import { ln } from '../numeric/elementary.js';
import { power } from '../numeric/power.js';
import type { Verified } from '../source.js';

interface StoreyInput {
  readonly storey_stiffness_kN_per_m: readonly number[];
}
export interface SoftLimits {
  /** Share of the stiffness of the storey above. */
  readonly share_of_above: number;
  /** Share of the mean stiffness of the three storeys above; 0: the code has no such rule. */
  readonly share_of_three: number;
}
export type SoftStoreyRecord = MethodRecord<StoreyInput, SoftLimits>;

const softStorey: Family<StoreyInput, SoftLimits> = {
  id: 'irregularity/soft-storey',
  yields: 'stiffness_over_limit',
  unit: null,
  symbol: 'k/k_lim',
  inputs: [
    {
      name: 'storey_stiffness_kN_per_m',
      kind: 'list',
      unit: 'kN_per_m',
      above: 0,
      to: 1e12,
      least: 2,
      most: 200,
      meaning: 'storey stiffness, bottom to top, one entry a storey',
    },
  ],
  expression: null,
  procedure:
    'Each storey over its limit: the stated share of the storey above, and where three stand above it the stated share of their mean. The least of all; below 1 a storey is soft.',
  evaluate: ({ storey_stiffness_kN_per_m: k }, { share_of_above, share_of_three }) => {
    let least = Infinity;
    for (let i = 0; i + 1 < k.length; i += 1) {
      least = Math.min(least, k[i]! / (share_of_above * k[i + 1]!));
      if (share_of_three > 0 && i + 3 < k.length)
        least = Math.min(least, k[i]! / ((share_of_three * (k[i + 1]! + k[i + 2]! + k[i + 3]!)) / 3));
    }
    return least;
  },
};

const soft = (
  id: string,
  standard: string,
  edition: string,
  clause: string,
  verified: Verified,
  share_of_above: number,
  share_of_three: number,
  extreme = false,
): SoftStoreyRecord =>
  record({
    id: `${id}/irregularity/${extreme ? 'extreme-soft-storey' : 'soft-storey'}`,
    title: `Storey stiffness over the limit of ${extreme ? 'an extreme' : 'a'} soft storey`,
    family: softStorey,
    constants: { share_of_above, share_of_three },
    source: { standard, edition, clause },
    verified,
    limits: [],
    note: 'The exception for drift ratios within 1.3 of each other is not applied.',
  });

export const SOFT_ASCE7_16 = soft('asce7-16', 'ASCE/SEI 7', '16', 'Table 12.3-2, 1a', 'restated', 0.7, 0.8);
const EXTREME_ASCE7_16 = soft('asce7-16', 'ASCE/SEI 7', '16', 'Table 12.3-2, 1b', 'restated', 0.6, 0.7, true);
export const SOFT_ASCE7_22 = soft('asce7-22', 'ASCE/SEI 7', '22', 'Table 12.3-2, 1a', 'restated', 0.7, 0.8);
export const SOFT_IS1893_2002 = soft('is1893-2002', 'IS 1893', '2002', 'Table 5', 'restated', 0.7, 0.8);
export const SOFT_IS1893_2016 = soft('is1893-2016', 'IS 1893', '2016', 'Table 6', 'restated', 1, 0);
export const SOFT_NZS1170 = soft('nzs1170-5-2004', 'NZS 1170.5', '2004', '4.5.1.2', 'memory', 0.7, 0.8);

interface HeightInput {
  readonly usual_storey_height_m: number;
  readonly first_storey_height_m: number;
}
const firstStorey: Family<HeightInput, { readonly height_exponent: number }> = {
  id: 'irregularity/first-storey-stiffness',
  yields: 'stiffness_ratio',
  unit: null,
  symbol: 'k₁/k₂',
  inputs: [
    { name: 'usual_storey_height_m', kind: 'number', unit: 'm', meaning: 'height of a storey above the first' },
    { name: 'first_storey_height_m', kind: 'number', unit: 'm', meaning: 'height of the first storey' },
  ],
  expression: '(usual_storey_height_m / first_storey_height_m) ^ height_exponent',
  evaluate: ({ usual_storey_height_m, first_storey_height_m }, { height_exponent }) =>
    power(usual_storey_height_m / first_storey_height_m, height_exponent),
};

const taller = (which: string, title: string, clause: string, height_exponent: number) =>
  record({
    id: `mechanics/irregularity/first-storey-${which}`,
    title,
    family: firstStorey,
    constants: { height_exponent },
    source: { standard: 'structural mechanics', edition: '', clause },
    verified: 'mechanics',
    limits: [],
    note: 'Stands in for stiffness that is not on record: the same columns or walls in both storeys.',
  });

export const FIRST_STOREY_COLUMNS = taller(
  'columns',
  'First storey over the next by their heights: columns',
  'equal columns, 12 EI/h³',
  3,
);
export const FIRST_STOREY_WALLS = taller(
  'walls',
  'First storey over the next by their heights: walls in shear',
  'equal walls, GA/h',
  1,
);

export interface FactorInput {
  readonly storey_factor: number;
  readonly torsion_factor: number;
  readonly torsion_chance: number;
  readonly reentrant_factor: number;
  readonly reentrant_chance: number;
  readonly setback_factor: number;
  readonly setback_chance: number;
  readonly mass_factor: number;
  readonly mass_chance: number;
}
const PARTS = [
  ['torsion', 'torsion'],
  ['reentrant', 're-entrant corner'],
  ['setback', 'setback'],
  ['mass', 'mass irregularity'],
] as const;
const partInputs = PARTS.flatMap(([name, words]) => [
  { name: `${name}_factor`, kind: 'number', above: 0, to: 1, meaning: `factor of the capacity: ${words}` } as const,
  {
    name: `${name}_chance`,
    kind: 'number',
    from: 0,
    to: 1,
    meaning: `chance of it: ${words}; 1 where there is one, 0 where there is none`,
  } as const,
]);

const factor: Family<FactorInput, Record<never, number>> = {
  id: 'irregularity/factor',
  yields: 'irregularity',
  unit: null,
  symbol: 'ι',
  inputs: [
    {
      name: 'storey_factor',
      kind: 'number',
      above: 0,
      to: 1,
      meaning: 'factor of a soft or weak storey, 1 without one',
    },
    ...partInputs,
  ],
  expression:
    'storey_factor * torsion_factor ^ torsion_chance * reentrant_factor ^ reentrant_chance * setback_factor ^ setback_chance * mass_factor ^ mass_chance',
  evaluate: (input) =>
    input.storey_factor *
    power(input.torsion_factor, input.torsion_chance) *
    power(input.reentrant_factor, input.reentrant_chance) *
    power(input.setback_factor, input.setback_chance) *
    power(input.mass_factor, input.mass_chance),
};

const judged = (clause: string) => ({ standard: 'Swaymark', edition: '', clause });

export const IRREGULARITY_FACTOR = record({
  id: 'swaymark/irregularity/factor',
  title: 'Capacity kept by an irregular building; what is not known counts by its chance (geometric mean)',
  family: factor,
  constants: {},
  source: judged('factors and chances [judgement], the study sets them'),
  verified: 'judgement',
  limits: [],
});

const spread: Family<FactorInput, Record<never, number>> = {
  id: 'irregularity/spread',
  yields: 'sigma',
  unit: null,
  symbol: 'σ_ι',
  inputs: partInputs,
  expression: `sqrt(${PARTS.map(([name]) => `${name}_chance * (1 - ${name}_chance) * ln(${name}_factor) * ln(${name}_factor)`).join(' + ')})`,
  evaluate: (input) =>
    Math.sqrt(
      apart(input.torsion_chance, input.torsion_factor) +
        apart(input.reentrant_chance, input.reentrant_factor) +
        apart(input.setback_chance, input.setback_factor) +
        apart(input.mass_chance, input.mass_factor),
    ),
};

/** Variance of ln of a factor that is there with a chance. */
function apart(chance: number, by: number): number {
  const step = ln(by);
  return chance * (1 - chance) * step * step;
}

export const IRREGULARITY_SPREAD = record({
  id: 'swaymark/irregularity/spread',
  title: 'Spread of ln C from irregularities of plan, setback and mass that are not known',
  family: spread,
  constants: {},
  source: judged('independent of each other [judgement]: the variance of p and 1 - p'),
  verified: 'mechanics',
  limits: [],
});

export const IRREGULARITY_RECORDS: readonly AnyRecord[] = [
  SOFT_ASCE7_16,
  EXTREME_ASCE7_16,
  SOFT_ASCE7_22,
  SOFT_IS1893_2002,
  SOFT_IS1893_2016,
  SOFT_NZS1170,
  FIRST_STOREY_COLUMNS,
  FIRST_STOREY_WALLS,
  IRREGULARITY_FACTOR,
  IRREGULARITY_SPREAD,
];
