/** Stiffness of columns and beams. E in MPa, I in m⁴: the factor 1000 makes kN of MN. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { MODULUS, STOREY_HEIGHT, mechanics, plain, quantity } from './specs.js';
import type { None } from './specs.js';

const SECOND_MOMENT = quantity('second_moment', 'm4', 'second moment of area of the section');
interface Section {
  readonly modulus_MPa: number;
  readonly second_moment_m4: number;
}

const rectangle: Family<{ readonly width_m: number; readonly depth_m: number }, None> = {
  id: 'stiffness/rectangle',
  yields: 'second_moment_m4',
  unit: 'm4',
  symbol: 'I',
  inputs: [quantity('width', 'm', 'side across the bending'), quantity('depth', 'm', 'side along the force')],
  expression: 'width_m * depth_m ^ 3 / 12',
  evaluate: ({ width_m, depth_m }) => (width_m * depth_m * depth_m * depth_m) / 12,
};

const column: Family<Section & { readonly storey_height_m: number }, { readonly end_factor: number }> = {
  id: 'stiffness/column',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [MODULUS, SECOND_MOMENT, STOREY_HEIGHT],
  expression: 'end_factor * 1000 * modulus_MPa * second_moment_m4 / storey_height_m ^ 3',
  evaluate: ({ modulus_MPa, second_moment_m4, storey_height_m: h }, { end_factor }) =>
    (end_factor * 1000 * modulus_MPa * second_moment_m4) / (h * h * h),
};

const portal: Family<Section & { readonly storey_height_m: number; readonly beam_to_column_ratio: number }, None> = {
  id: 'stiffness/portal',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [
    MODULUS,
    { ...SECOND_MOMENT, meaning: 'second moment of area of one column' },
    STOREY_HEIGHT,
    plain('beam_to_column_ratio', 'ρ = I_b / (4 I_c), the span being twice the height'),
  ],
  expression:
    '24 * 1000 * modulus_MPa * second_moment_m4 / storey_height_m ^ 3 * (12 * beam_to_column_ratio + 1) / (12 * beam_to_column_ratio + 4)',
  evaluate: ({ modulus_MPa, second_moment_m4, storey_height_m: h, beam_to_column_ratio: rho }) =>
    (((24 * 1000 * modulus_MPa * second_moment_m4) / (h * h * h)) * (12 * rho + 1)) / (12 * rho + 4),
};

const racking: Family<
  {
    readonly modulus_MPa: number;
    readonly storey_height_m: number;
    readonly column_sum_m3: number;
    readonly beam_sum_m3: number;
  },
  None
> = {
  id: 'stiffness/racking',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [
    MODULUS,
    STOREY_HEIGHT,
    quantity('column_sum', 'm3', 'sum of I/h over the columns of the storey'),
    quantity('beam_sum', 'm3', 'sum of I/L over the beams of a floor'),
  ],
  expression: '12 * 1000 * modulus_MPa / (storey_height_m ^ 2 * (1 / column_sum_m3 + 1 / beam_sum_m3))',
  evaluate: ({ modulus_MPa, storey_height_m, column_sum_m3, beam_sum_m3 }) =>
    (12 * 1000 * modulus_MPa) / (storey_height_m * storey_height_m * (1 / column_sum_m3 + 1 / beam_sum_m3)),
};

const member: Family<Section & { readonly length_m: number }, None> = {
  id: 'stiffness/member',
  yields: 'member_stiffness_kN_m',
  unit: 'kN_m',
  symbol: 'EI/L',
  inputs: [MODULUS, SECOND_MOMENT, quantity('length', 'm', 'length of the member')],
  expression: '1000 * modulus_MPa * second_moment_m4 / length_m',
  evaluate: ({ modulus_MPa, second_moment_m4, length_m }) => (1000 * modulus_MPa * second_moment_m4) / length_m,
};

const withSlab: Family<{ readonly second_moment_m4: number }, { readonly slab_factor: number }> = {
  id: 'stiffness/beam-with-slab',
  yields: 'second_moment_m4',
  unit: 'm4',
  symbol: 'I_b',
  inputs: [{ ...SECOND_MOMENT, meaning: 'second moment of area of the bare beam' }],
  expression: 'slab_factor * second_moment_m4',
  evaluate: ({ second_moment_m4 }, { slab_factor }) => slab_factor * second_moment_m4,
};

const groups: Family<
  {
    readonly end_columns: number;
    readonly end_stiffness_kN_per_m: number;
    readonly inner_columns: number;
    readonly inner_stiffness_kN_per_m: number;
  },
  None
> = {
  id: 'stiffness/columns-of-a-storey',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [
    plain('end_columns', 'columns at the ends of their lines'),
    quantity('end_stiffness', 'kN_per_m', 'of one of them'),
    plain('inner_columns', 'columns between'),
    quantity('inner_stiffness', 'kN_per_m', 'of one of them'),
  ],
  expression: 'end_columns * end_stiffness_kN_per_m + inner_columns * inner_stiffness_kN_per_m',
  evaluate: ({ end_columns, end_stiffness_kN_per_m, inner_columns, inner_stiffness_kN_per_m }) =>
    end_columns * end_stiffness_kN_per_m + inner_columns * inner_stiffness_kN_per_m,
};

export const RECTANGLE = record({
  id: 'mechanics/section/rectangle',
  title: 'Second moment of area of a rectangle',
  family: rectangle,
  constants: {},
  source: mechanics('textbook'),
  verified: 'mechanics',
  limits: [],
});
export const COLUMN_FIXED = record({
  id: 'mechanics/stiffness/column-fixed',
  title: 'Column fixed at both ends',
  family: column,
  constants: { end_factor: 12 },
  source: mechanics('12EI/h³, textbook'),
  verified: 'restated',
  limits: [],
  note: 'Beams taken as rigid.',
});
export const COLUMN_PINNED = record({
  id: 'mechanics/stiffness/column-pinned',
  title: 'Column pinned at one end',
  family: column,
  constants: { end_factor: 3 },
  source: mechanics('3EI/h³, textbook'),
  verified: 'restated',
  limits: [],
  note: 'Beams taken as rigid.',
});
export const MEMBER = record({
  id: 'mechanics/stiffness/member',
  title: 'Stiffness of a member, EI/L',
  family: member,
  constants: {},
  source: mechanics('textbook'),
  verified: 'mechanics',
  limits: [],
});
export const BEAM_WITH_SLAB = record({
  id: 'swaymark/section/beam-with-slab',
  title: 'Concrete beam with the slab that is cast with it',
  family: withSlab,
  constants: { slab_factor: 1.5 },
  source: { standard: 'Swaymark', edition: '', clause: 'slab on one side 1.5, on both 2: common practice, no source' },
  verified: 'judgement',
  limits: [],
});
export const COLUMNS_OF_STOREY = record({
  id: 'mechanics/stiffness/columns-of-a-storey',
  title: 'Storey stiffness, the sum of its columns',
  family: groups,
  constants: {},
  source: mechanics('rigid floors: stiffnesses side by side add'),
  verified: 'mechanics',
  limits: [],
});

export const FRAME_RECORDS: readonly AnyRecord[] = [
  RECTANGLE,
  COLUMN_FIXED,
  COLUMN_PINNED,
  record({
    id: 'mechanics/stiffness/portal',
    title: 'Portal of one bay, span twice the height, fixed bases',
    family: portal,
    constants: {},
    source: mechanics('Chopra, Dynamics of Structures, 1.3'),
    verified: 'memory',
    limits: [],
  }),
  record({
    id: 'mechanics/stiffness/storey-racking',
    title: 'Racking stiffness of a storey of a regular frame',
    family: racking,
    constants: {},
    source: mechanics('Heidebrecht and Stafford Smith 1973; Stafford Smith and Coull'),
    verified: 'memory',
    limits: [],
    note: "Inflection at mid-height; the same as the sum of Muto's D-values of an upper storey.",
  }),
  MEMBER,
  BEAM_WITH_SLAB,
  COLUMNS_OF_STOREY,
];
