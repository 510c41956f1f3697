/** Quick strength checks of the first storey: average stress of ASCE 31 and 41, the Japanese first-level index, area indices. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import type { Source, Verified } from '../source.js';
import { number } from './edition.js';

type None = Record<never, number>;
const PSI_MPA = 0.006894757293168361;

interface Facts {
  readonly source: Source;
  readonly verified: Verified;
  readonly note?: string;
}

const make = <I, C>(id: string, title: string, family: Family<I, C>, constants: C, facts: Facts) =>
  record({ id, title, family, constants, limits: [], ...facts });

const asce = (clause: string): Source => ({ standard: 'ASCE/SEI 41', edition: '13 and 17', clause });
const index = (clause: string): Source => ({
  standard: 'Standard for seismic evaluation of existing reinforced concrete buildings, Japan',
  edition: '2001',
  clause,
});

const concreteStress: Family<{ readonly concrete_strength_MPa: number }, { readonly psi_MPa: number }> = {
  id: 'strength-check/concrete-stress',
  yields: 'average_stress_MPa',
  unit: 'MPa',
  symbol: 'τ',
  inputs: [number('concrete_strength_MPa', 'concrete strength, cylinder; 0 where it is not on record', 'MPa')],
  expression: 'psi_MPa * max(100, 2 * sqrt(concrete_strength_MPa / psi_MPa))',
  evaluate: ({ concrete_strength_MPa }, { psi_MPa }) =>
    psi_MPa * Math.max(100, 2 * Math.sqrt(concrete_strength_MPa / psi_MPa)),
};
export const CONCRETE_STRESS = make(
  'asce41/strength-check/concrete-stress',
  'Average shear stress allowed in concrete columns and walls',
  concreteStress,
  { psi_MPa: PSI_MPA },
  {
    source: asce('4.4.3.2, 4.4.3.3, quick checks'),
    verified: 'memory',
    note: '100 psi, or 2 √f_c in psi where that is more.',
  },
);

interface ShearInput {
  readonly modifier_ms: number;
  readonly average_stress_MPa: number;
  readonly area_m2: number;
  readonly modification_c: number;
  readonly weight_kN: number;
}
const WEIGHT = number('weight_kN', 'seismic weight', 'kN');
const MODIFIERS = [
  number('modifier_ms', 'system modification factor M_s of the edition, life safety'),
  number('modification_c', 'modification factor C of the base shear, by storeys'),
] as const;
const averageShear: Family<ShearInput, None> = {
  id: 'strength-check/average-shear',
  yields: 'capacity_sa_g',
  unit: 'g',
  symbol: 'C',
  inputs: [
    MODIFIERS[0],
    number('average_stress_MPa', 'average stress allowed', 'MPa'),
    number('area_m2', 'area of columns or walls along the force, first storey', 'm2'),
    MODIFIERS[1],
    WEIGHT,
  ],
  expression: 'modifier_ms * average_stress_MPa * 1000 * area_m2 / (modification_c * weight_kN)',
  evaluate: ({ modifier_ms, average_stress_MPa, area_m2, modification_c, weight_kN }) =>
    (modifier_ms * average_stress_MPa * 1000 * area_m2) / (modification_c * weight_kN),
};
export const AVERAGE_SHEAR = make(
  'asce41/strength-check/average-shear',
  'Spectral acceleration at which the average shear stress is reached',
  averageShear,
  {},
  {
    source: asce('4.4.3.2, 4.4.3.3 solved for S_a'),
    verified: 'memory',
    note: 'No overstrength, no ductility, no share of mass is applied; irregularities multiply it as they do every capacity, below. The factor n_c/(n_c − n_f) of columns is left out.',
  },
);

interface BraceInput {
  readonly modifier_ms: number;
  readonly yield_MPa: number;
  readonly area_m2: number;
  readonly bay_length_m: number;
  readonly storey_height_m: number;
  readonly modification_c: number;
  readonly weight_kN: number;
}
const braces: Family<BraceInput, None> = {
  id: 'strength-check/brace-stress',
  yields: 'capacity_sa_g',
  unit: 'g',
  symbol: 'C',
  inputs: [
    MODIFIERS[0],
    number('yield_MPa', 'yield strength of the braces', 'MPa'),
    number('area_m2', 'active braces of the storey together', 'm2'),
    number('bay_length_m', 'bay of a brace', 'm'),
    number('storey_height_m', 'height of the storey', 'm'),
    MODIFIERS[1],
    WEIGHT,
  ],
  expression:
    'modifier_ms * 0.5 * yield_MPa * 1000 * area_m2 * bay_length_m / sqrt(bay_length_m ^ 2 + storey_height_m ^ 2) / (modification_c * weight_kN)',
  evaluate: ({ modifier_ms, yield_MPa, area_m2, bay_length_m, storey_height_m, modification_c, weight_kN }) =>
    (modifier_ms * 0.5 * yield_MPa * 1000 * area_m2 * bay_length_m) /
    Math.sqrt(bay_length_m * bay_length_m + storey_height_m * storey_height_m) /
    (modification_c * weight_kN),
};
export const BRACE_STRESS = make(
  'asce41/strength-check/brace-stress',
  'Spectral acceleration at which braces reach half their yield stress times M_s',
  braces,
  {},
  { source: asce('4.4.3.4 solved for S_a'), verified: 'memory' },
);

const beta: Family<{ readonly concrete_strength_MPa: number }, None> = {
  id: 'japan-index/concrete-factor',
  yields: 'concrete_factor',
  unit: null,
  symbol: 'β_c',
  inputs: [number('concrete_strength_MPa', 'concrete strength', 'MPa')],
  expression: 'min(concrete_strength_MPa / 20, sqrt(concrete_strength_MPa / 20))',
  evaluate: ({ concrete_strength_MPa }) => Math.min(concrete_strength_MPa / 20, Math.sqrt(concrete_strength_MPa / 20)),
};
export const CONCRETE_FACTOR = make(
  'jbdpa-2001/index/concrete-factor',
  'Factor of the concrete strength',
  beta,
  {},
  { source: index('3.2.2, first level'), verified: 'memory', note: 'F_c/20 up to 20 MPa, √(F_c/20) above.' },
);

interface StrengthIndexInput {
  readonly area_m2: number;
  readonly stress_MPa: number;
  readonly concrete_factor: number;
  readonly weight_kN: number;
}
const strengthIndex: Family<StrengthIndexInput, None> = {
  id: 'japan-index/strength',
  yields: 'strength_index',
  unit: null,
  symbol: 'C',
  inputs: [
    number('area_m2', 'area of walls or columns of the storey', 'm2'),
    number('stress_MPa', 'walls 3.0, 2.0, 1.0 with two, one, no boundary columns; columns 1.0, slender 0.7', 'MPa'),
    number('concrete_factor', 'factor of the concrete strength β_c'),
    WEIGHT,
  ],
  expression: 'stress_MPa * 1000 * area_m2 * concrete_factor / weight_kN',
  evaluate: ({ area_m2, stress_MPa, concrete_factor, weight_kN }) =>
    (stress_MPa * 1000 * area_m2 * concrete_factor) / weight_kN,
};
export const STRENGTH_INDEX = make(
  'jbdpa-2001/index/strength',
  'Strength index of walls (C_w) or columns (C_c)',
  strengthIndex,
  {},
  { source: index('3.2.2, first level'), verified: 'memory' },
);

interface BasicInput {
  readonly storeys: number;
  readonly storey: number;
  readonly wall_index: number;
  readonly column_index: number;
  readonly column_share: number;
}
const basic: Family<BasicInput, None> = {
  id: 'japan-index/basic',
  yields: 'basic_index',
  unit: null,
  symbol: 'E₀',
  inputs: [
    number('storeys', 'storeys above ground n'),
    number('storey', 'storey looked at i'),
    number('wall_index', 'strength index of walls C_w'),
    number('column_index', 'strength index of columns C_c'),
    number('column_share', 'α_1: 0.7, or 1.0 without walls'),
  ],
  expression: '(storeys + 1) / (storeys + storey) * (wall_index + column_share * column_index)',
  evaluate: ({ storeys, storey, wall_index, column_index, column_share }) =>
    ((storeys + 1) / (storeys + storey)) * (wall_index + column_share * column_index),
};
export const BASIC_INDEX = make(
  'jbdpa-2001/index/basic',
  'Basic index of the first level, ductility index 1.0',
  basic,
  {},
  {
    source: index('3.2.1, first level'),
    verified: 'memory',
    note: 'Times irregularity S_D and time index T it is the seismic index I_s; here S_D is the product of irregularity factors.',
  },
);

interface AreaInput {
  readonly wall_area_m2: number;
  readonly masonry_area_m2: number;
  readonly column_area_m2: number;
  readonly floor_area_m2: number;
}
const WALL_AREA = number('wall_area_m2', 'concrete walls along the force, first storey', 'm2');
const COLUMN_AREA = number('column_area_m2', 'columns of the first storey', 'm2');
const hassanSozen: Family<AreaInput, None> = {
  id: 'area-index/priority',
  yields: 'priority_index_percent',
  unit: null,
  symbol: 'PI',
  inputs: [
    WALL_AREA,
    number('masonry_area_m2', 'masonry walls along the force, first storey', 'm2'),
    COLUMN_AREA,
    number('floor_area_m2', 'floor area above the base', 'm2'),
  ],
  expression: '100 * (wall_area_m2 + masonry_area_m2 / 10 + column_area_m2 / 2) / floor_area_m2',
  evaluate: ({ wall_area_m2, masonry_area_m2, column_area_m2, floor_area_m2 }) =>
    (100 * (wall_area_m2 + masonry_area_m2 / 10 + column_area_m2 / 2)) / floor_area_m2,
};
export const PRIORITY_INDEX = make(
  'hassan-sozen-1997/index/priority',
  'Wall index plus column index, per cent',
  hassanSozen,
  {},
  {
    source: { standard: 'Hassan and Sozen', edition: '1997', clause: 'ACI Structural Journal 94' },
    verified: 'memory',
  },
);

interface ShigaInput {
  readonly weight_kN: number;
  readonly wall_area_m2: number;
  readonly column_area_m2: number;
}
const shiga: Family<ShigaInput, None> = {
  id: 'area-index/mean-stress',
  yields: 'mean_stress_MPa',
  unit: 'MPa',
  symbol: 'W/ΣA',
  inputs: [WEIGHT, WALL_AREA, COLUMN_AREA],
  expression: 'weight_kN / (1000 * (wall_area_m2 + column_area_m2))',
  evaluate: ({ weight_kN, wall_area_m2, column_area_m2 }) => weight_kN / (1000 * (wall_area_m2 + column_area_m2)),
};
export const MEAN_STRESS = make(
  'shiga-1968/index/mean-stress',
  'Weight over the area of walls and columns',
  shiga,
  {},
  {
    source: { standard: 'Shiga', edition: '1968', clause: 'map of wall area and mean stress' },
    verified: 'memory',
    note: 'Damage was seen above 1.2 MPa where walls had less than 30 cm² for a square metre of floor.',
  },
);

/** M_s for life safety by edition: walls of concrete, precast and reinforced masonry; unreinforced masonry; columns; braces. */
export const CHECK_EDITIONS = {
  'asce41-17': { walls: 3, unreinforced: 1.25, columns: 2, braces: 3 },
  'asce41-13': { walls: 4, unreinforced: 1.5, columns: 2, braces: 3 },
} as const;
/** C of the base shear by storeys, 1 to 4 and more; the last row holds for flexible diaphragms too, whatever the system. */
export const CHECK_C = {
  frame: [1.3, 1.1, 1, 1],
  wall: [1.4, 1.2, 1.1, 1],
  unreinforced: [1, 1, 1, 1],
} as const;
/** Average stress allowed in masonry, MPa: 70 and 30 psi. */
export const MASONRY_STRESS_MPA = { reinforced: 70 * PSI_MPA, unreinforced: 30 * PSI_MPA } as const;
/** Structural steel of a brace, MPa, where nothing is on record: 36 ksi [memory]. */
export const BRACE_YIELD_MPA = 248;

export const STRENGTH_RECORDS: readonly AnyRecord[] = [
  CONCRETE_STRESS,
  AVERAGE_SHEAR,
  BRACE_STRESS,
  CONCRETE_FACTOR,
  STRENGTH_INDEX,
  BASIC_INDEX,
  PRIORITY_INDEX,
  MEAN_STRESS,
];
