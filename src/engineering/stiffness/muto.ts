/** D-values after Muto: how much of a fixed column's stiffness the beams leave. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { STOREY_HEIGHT, plain, quantity } from './specs.js';
import type { None } from './specs.js';

interface Joint {
  readonly beam_stiffness_kN_m: number;
  readonly column_stiffness_kN_m: number;
}
const COLUMN_STIFFNESS = quantity('column_stiffness', 'kN_m', 'EI/h of the column');
const upperRatio: Family<Joint, None> = {
  id: 'stiffness/muto-ratio-upper',
  yields: 'beam_column_ratio',
  unit: null,
  symbol: 'k̄',
  inputs: [
    quantity('beam_stiffness', 'kN_m', 'sum of EI/L of the beams that meet the column at its two ends'),
    COLUMN_STIFFNESS,
  ],
  expression: 'beam_stiffness_kN_m / (2 * column_stiffness_kN_m)',
  evaluate: ({ beam_stiffness_kN_m, column_stiffness_kN_m }) => beam_stiffness_kN_m / (2 * column_stiffness_kN_m),
};
const firstRatio: Family<Joint, None> = {
  ...upperRatio,
  id: 'stiffness/muto-ratio-first',
  inputs: [
    quantity('beam_stiffness', 'kN_m', 'sum of EI/L of the beams that meet the column at its upper end'),
    COLUMN_STIFFNESS,
  ],
  expression: 'beam_stiffness_kN_m / column_stiffness_kN_m',
  evaluate: ({ beam_stiffness_kN_m, column_stiffness_kN_m }) => beam_stiffness_kN_m / column_stiffness_kN_m,
};

interface Ratio {
  readonly beam_column_ratio: number;
}
interface ShareConstants {
  readonly top_0: number;
  readonly top_1: number;
  readonly bottom_0: number;
  readonly bottom_1: number;
}
const coefficient: Family<Ratio, ShareConstants> = {
  id: 'stiffness/muto-coefficient',
  yields: 'end_coefficient',
  unit: null,
  symbol: 'a',
  inputs: [plain('beam_column_ratio', 'k̄, beams over column')],
  expression: '(top_0 + top_1 * beam_column_ratio) / (bottom_0 + bottom_1 * beam_column_ratio)',
  evaluate: ({ beam_column_ratio }, { top_0, top_1, bottom_0, bottom_1 }) =>
    (top_0 + top_1 * beam_column_ratio) / (bottom_0 + bottom_1 * beam_column_ratio),
};

const dValue: Family<
  { readonly end_coefficient: number; readonly column_stiffness_kN_m: number; readonly storey_height_m: number },
  None
> = {
  id: 'stiffness/muto-d-value',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'D',
  inputs: [plain('end_coefficient', 'a, by the beams'), COLUMN_STIFFNESS, STOREY_HEIGHT],
  expression: 'end_coefficient * 12 * column_stiffness_kN_m / storey_height_m ^ 2',
  evaluate: ({ end_coefficient, column_stiffness_kN_m, storey_height_m }) =>
    (end_coefficient * 12 * column_stiffness_kN_m) / (storey_height_m * storey_height_m),
};

const MUTO = (clause: string) => ({ standard: 'Muto', edition: '1974', clause });

export const MUTO_RATIO_UPPER = record({
  id: 'muto-1974/ratio/upper-storey',
  title: 'Beams over column, upper storey',
  family: upperRatio,
  constants: {},
  source: MUTO('k̄ = Σ beams / 2 k_c'),
  verified: 'restated',
  limits: [],
});
export const MUTO_RATIO_FIRST = record({
  id: 'muto-1974/ratio/first-storey',
  title: 'Beams over column, first storey',
  family: firstRatio,
  constants: {},
  source: MUTO('k̄ = Σ upper beams / k_c'),
  verified: 'restated',
  limits: [],
});
export const MUTO_UPPER = record({
  id: 'muto-1974/coefficient/upper-storey',
  title: 'Share of the fixed column that the beams leave, upper storey',
  family: coefficient,
  constants: { top_0: 0, top_1: 1, bottom_0: 2, bottom_1: 1 },
  source: MUTO('a = k̄/(2 + k̄)'),
  verified: 'restated',
  limits: [],
});
export const MUTO_FIXED_BASE = record({
  id: 'muto-1974/coefficient/fixed-base',
  title: 'Share of the fixed column that the beams leave, first storey on a fixed base',
  family: coefficient,
  constants: { top_0: 0.5, top_1: 1, bottom_0: 2, bottom_1: 1 },
  source: MUTO('a = (0.5 + k̄)/(2 + k̄)'),
  verified: 'restated',
  limits: [],
});
export const MUTO_PINNED_BASE = record({
  id: 'muto-1974/coefficient/pinned-base',
  title: 'Share of the fixed column that the beams leave, first storey on a pinned base',
  family: coefficient,
  constants: { top_0: 0, top_1: 0.5, bottom_0: 1, bottom_1: 2 },
  source: MUTO('a = 0.5 k̄/(1 + 2 k̄)'),
  verified: 'memory',
  limits: [],
});
export const MUTO_D_VALUE = record({
  id: 'muto-1974/stiffness/d-value',
  title: 'Lateral stiffness of a column, D-value',
  family: dValue,
  constants: {},
  source: MUTO('D = a 12 k_c/h²'),
  verified: 'restated',
  limits: [],
});

export const MUTO_RECORDS: readonly AnyRecord[] = [
  MUTO_RATIO_UPPER,
  MUTO_RATIO_FIRST,
  MUTO_UPPER,
  MUTO_FIXED_BASE,
  MUTO_PINNED_BASE,
  MUTO_D_VALUE,
];
