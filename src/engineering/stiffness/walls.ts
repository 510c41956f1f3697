/** Walls: piers, openings, centre of rigidity, wall area. Lengths in m, moduli in MPa, stiffness in kN/m. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { MODULUS, list, mechanics, quantity } from './specs.js';
import type { None } from './specs.js';

interface Pier {
  readonly modulus_MPa: number;
  readonly thickness_m: number;
  readonly pier_length_m: number;
  readonly pier_height_m: number;
}
const THICKNESS = quantity('thickness', 'm', 'thickness of the wall');
const PIER_LENGTH = quantity('pier_length', 'm', 'length of the pier in plan');
const PIER_HEIGHT = quantity('pier_height', 'm', 'height of the pier');

const pierByRatio: Family<Pier, { readonly bending: number }> = {
  id: 'stiffness/pier-by-ratio',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [MODULUS, THICKNESS, PIER_LENGTH, PIER_HEIGHT],
  expression:
    '1000 * modulus_MPa * thickness_m / (bending * (pier_height_m / pier_length_m) ^ 3 + 3 * pier_height_m / pier_length_m)',
  evaluate: ({ modulus_MPa, thickness_m, pier_length_m, pier_height_m }, { bending }) => {
    const ratio = pier_height_m / pier_length_m;
    return (1000 * modulus_MPa * thickness_m) / (bending * ratio * ratio * ratio + 3 * ratio);
  },
};

const pier: Family<
  Pier & { readonly shear_modulus_MPa: number },
  { readonly end_factor: number; readonly shape_factor: number }
> = {
  id: 'stiffness/pier',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [MODULUS, quantity('shear_modulus', 'MPa', 'shear modulus'), THICKNESS, PIER_LENGTH, PIER_HEIGHT],
  expression:
    '1000 / (12 * pier_height_m ^ 3 / (end_factor * modulus_MPa * thickness_m * pier_length_m ^ 3) + shape_factor * pier_height_m / (shear_modulus_MPa * thickness_m * pier_length_m))',
  evaluate: (
    { modulus_MPa, shear_modulus_MPa, thickness_m: t, pier_length_m: l, pier_height_m: h },
    { end_factor, shape_factor },
  ) =>
    1000 /
    ((12 * h * h * h) / (end_factor * modulus_MPa * t * l * l * l) + (shape_factor * h) / (shear_modulus_MPa * t * l)),
};

interface Perforated {
  readonly gross_stiffness_kN_per_m: number;
  readonly strip_stiffness_kN_per_m: number;
  readonly piers_stiffness_kN_per_m: number;
}
const perforated: Family<Perforated, None> = {
  id: 'stiffness/perforated-wall',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [
    quantity('gross_stiffness', 'kN_per_m', 'the wall without its openings'),
    quantity('strip_stiffness', 'kN_per_m', 'the strip as high as the openings, without them'),
    quantity('piers_stiffness', 'kN_per_m', 'the piers between the openings together'),
  ],
  expression: '1 / (1 / gross_stiffness_kN_per_m - 1 / strip_stiffness_kN_per_m + 1 / piers_stiffness_kN_per_m)',
  evaluate: ({ gross_stiffness_kN_per_m, strip_stiffness_kN_per_m, piers_stiffness_kN_per_m }) =>
    1 / (1 / gross_stiffness_kN_per_m - 1 / strip_stiffness_kN_per_m + 1 / piers_stiffness_kN_per_m),
};

interface Rigidities {
  readonly rigidities: readonly number[];
  readonly distances_m: readonly number[];
}
const RIGIDITIES = { name: 'rigidities', kind: 'list', meaning: 'rigidities of the walls, any one unit' } as const;
const centre: Family<Rigidities, None> = {
  id: 'stiffness/centre-of-rigidity',
  yields: 'centre_of_rigidity_m',
  unit: 'm',
  symbol: 'x_R',
  inputs: [RIGIDITIES, list('distances', 'm', 'distances of the walls from one side')],
  expression: null,
  procedure: 'x_R = Σ R x / Σ R',
  evaluate: ({ rigidities, distances_m }) => {
    checkPairs(rigidities, distances_m);
    let moment = 0;
    let sum = 0;
    rigidities.forEach((value, i) => {
      moment += value * distances_m[i]!;
      sum += value;
    });
    return moment / sum;
  },
};
const polar: Family<Rigidities, None> = {
  id: 'stiffness/torsional-rigidity',
  yields: 'torsional_rigidity',
  unit: null,
  symbol: 'J',
  inputs: [RIGIDITIES, list('distances', 'm', 'distances of the walls from the centre of rigidity')],
  expression: null,
  procedure: 'J = Σ R d²',
  evaluate: ({ rigidities, distances_m }) => {
    checkPairs(rigidities, distances_m);
    return rigidities.reduce((sum, value, i) => sum + value * distances_m[i]! * distances_m[i]!, 0);
  },
};

function checkPairs(a: readonly number[], b: readonly number[]): void {
  if (a.length === 0 || a.length !== b.length)
    throw new RangeError(`as many rigidities as distances are needed, got ${String(a.length)} and ${String(b.length)}`);
}

const wallStorey: Family<
  { readonly shear_modulus_MPa: number; readonly wall_area_m2: number; readonly storey_height_m: number },
  { readonly shape_factor: number }
> = {
  id: 'stiffness/wall-area-storey',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [
    quantity('shear_modulus', 'MPa', 'shear modulus'),
    quantity('wall_area', 'm2', 'area in plan of the walls along the force'),
    quantity('storey_height', 'm', 'storey height'),
  ],
  expression: '1000 * shear_modulus_MPa * wall_area_m2 / (shape_factor * storey_height_m)',
  evaluate: ({ shear_modulus_MPa, wall_area_m2, storey_height_m }, { shape_factor }) =>
    (1000 * shear_modulus_MPa * wall_area_m2) / (shape_factor * storey_height_m),
};

const wallAreaPeriod: Family<
  {
    readonly height_m: number;
    readonly storey_height_m: number;
    readonly unit_weight_kN_per_m2: number;
    readonly shear_modulus_MPa: number;
    readonly wall_area_ratio: number;
  },
  { readonly gravity_mps2: number }
> = {
  id: 'stiffness/wall-area-period',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [
    quantity('height', 'm', 'height above the base'),
    quantity('storey_height', 'm', 'storey height'),
    quantity('unit_weight', 'kN_per_m2', 'seismic weight per floor area'),
    quantity('shear_modulus', 'MPa', 'effective shear modulus: shape factor and cracking in it'),
    { name: 'wall_area_ratio', kind: 'number', meaning: 'wall area along the force over the area of a floor' },
  ],
  expression:
    '4 * height_m * sqrt(unit_weight_kN_per_m2 / (gravity_mps2 * storey_height_m * 1000 * shear_modulus_MPa * wall_area_ratio))',
  evaluate: (
    { height_m, storey_height_m, unit_weight_kN_per_m2, shear_modulus_MPa, wall_area_ratio },
    { gravity_mps2 },
  ) =>
    4 *
    height_m *
    Math.sqrt(unit_weight_kN_per_m2 / (gravity_mps2 * storey_height_m * 1000 * shear_modulus_MPa * wall_area_ratio)),
};

const MASONRY_BOOK = (clause: string) => ({ standard: 'Design of Reinforced Masonry Structures', edition: '', clause });

const PIER_FIXED = record({
  id: 'mechanics/stiffness/pier-fixed',
  title: 'Wall pier fixed at top and bottom, G = 0.4 E',
  family: pierByRatio,
  constants: { bending: 1 },
  source: MASONRY_BOOK('eq. 7.12 to 7.16, p. 7.17'),
  verified: 'restated',
  limits: [],
});
const PIER_CANTILEVER = record({
  id: 'mechanics/stiffness/pier-cantilever',
  title: 'Wall pier as a cantilever, G = 0.4 E',
  family: pierByRatio,
  constants: { bending: 4 },
  source: MASONRY_BOOK('eq. 7.7 and 7.8, p. 7.12'),
  verified: 'restated',
  limits: [],
});
export const PIER_FIXED_ANY_G = record({
  id: 'mechanics/stiffness/pier-fixed-any-shear-modulus',
  title: 'Wall pier fixed at top and bottom, bending and shear',
  family: pier,
  constants: { end_factor: 12, shape_factor: 1.2 },
  source: mechanics('1/(h³/(12EI) + 1.2 h/(GA)), textbook'),
  verified: 'restated',
  limits: [],
});
export const PIER_CANTILEVER_ANY_G = record({
  id: 'mechanics/stiffness/pier-cantilever-any-shear-modulus',
  title: 'Wall pier as a cantilever, bending and shear',
  family: pier,
  constants: { end_factor: 3, shape_factor: 1.2 },
  source: mechanics('1/(h³/(3EI) + 1.2 h/(GA)), textbook'),
  verified: 'restated',
  limits: [],
});
export const WALL_AREA_STOREY = record({
  id: 'mechanics/stiffness/wall-area-storey',
  title: 'Storey stiffness from wall area, shear alone',
  family: wallStorey,
  constants: { shape_factor: 1.2 },
  source: mechanics('GA/(1.2 h), the shear term of a wall pier'),
  verified: 'mechanics',
  limits: [],
});

export const WALL_RECORDS: readonly AnyRecord[] = [
  PIER_FIXED,
  PIER_CANTILEVER,
  PIER_FIXED_ANY_G,
  PIER_CANTILEVER_ANY_G,
  record({
    id: 'mechanics/stiffness/perforated-wall',
    title: 'Wall with openings: gross less strip plus piers',
    family: perforated,
    constants: {},
    source: MASONRY_BOOK('method B, p. 7.26'),
    verified: 'restated',
    limits: [],
  }),
  record({
    id: 'mechanics/rigidity/centre',
    title: 'Centre of rigidity',
    family: centre,
    constants: {},
    source: MASONRY_BOOK('p. 7.71'),
    verified: 'restated',
    limits: [],
  }),
  record({
    id: 'mechanics/rigidity/torsional',
    title: 'Torsional rigidity of the walls',
    family: polar,
    constants: {},
    source: MASONRY_BOOK('p. 7.71'),
    verified: 'restated',
    limits: [],
  }),
  WALL_AREA_STOREY,
  record({
    id: 'mechanics/period/wall-area',
    title: 'Period from the share of wall area, shear alone',
    family: wallAreaPeriod,
    constants: { gravity_mps2: 9.80665 },
    source: mechanics('shear cantilever of stiffness G A/h: derived, not a code formula'),
    verified: 'mechanics',
    limits: [],
  }),
];
