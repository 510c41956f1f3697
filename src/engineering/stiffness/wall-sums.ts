/** Walls of one direction taken together. Lists have one entry a wall. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { MODULUS, list, mechanics, quantity } from './specs.js';
import type { None } from './specs.js';

const AREAS = list('wall_areas', 'm2', 'areas in plan of the walls along the force');
const LENGTHS = list('wall_lengths', 'm', 'lengths in plan of the walls along the force');
const SHEAR_MODULUS = quantity('shear_modulus', 'MPa', 'shear modulus');

interface Walls {
  readonly wall_areas_m2: readonly number[];
  readonly wall_lengths_m: readonly number[];
}

function alike({ wall_areas_m2, wall_lengths_m }: Walls): void {
  if (wall_areas_m2.length === 0 || wall_areas_m2.length !== wall_lengths_m.length)
    throw new RangeError(
      `as many wall lengths as wall areas are needed, got ${String(wall_lengths_m.length)} and ${String(wall_areas_m2.length)}`,
    );
}

const area: Family<Pick<Walls, 'wall_areas_m2'>, None> = {
  id: 'stiffness/walls-area',
  yields: 'wall_area_m2',
  unit: 'm2',
  symbol: 'A',
  inputs: [AREAS],
  expression: null,
  procedure: 'A = Σ A(i)',
  evaluate: ({ wall_areas_m2 }) => wall_areas_m2.reduce((sum, value) => sum + value, 0),
};

const secondMoment: Family<Walls, None> = {
  id: 'stiffness/walls-second-moment',
  yields: 'second_moment_m4',
  unit: 'm4',
  symbol: 'I',
  inputs: [AREAS, LENGTHS],
  expression: null,
  procedure: 'I = Σ A(i) l(i)²/12, each wall bending for itself',
  evaluate: (walls) => {
    alike(walls);
    return walls.wall_areas_m2.reduce((sum, value, i) => {
      const length = walls.wall_lengths_m[i]!;
      return sum + (value * length * length) / 12;
    }, 0);
  },
};

const piers: Family<
  Walls & { readonly modulus_MPa: number; readonly shear_modulus_MPa: number; readonly pier_height_m: number },
  { readonly shape_factor: number }
> = {
  id: 'stiffness/piers-of-a-storey',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [MODULUS, SHEAR_MODULUS, AREAS, LENGTHS, quantity('pier_height', 'm', 'height of the piers')],
  expression: null,
  procedure: 'k = Σ 1/(h³/(12 E I(i)) + 1.2 h/(G A(i))), I(i) = A(i) l(i)²/12',
  evaluate: (input, { shape_factor }) => {
    alike(input);
    const { modulus_MPa, shear_modulus_MPa, pier_height_m: h } = input;
    return input.wall_areas_m2.reduce((sum, value, i) => {
      const length = input.wall_lengths_m[i]!;
      return (
        sum +
        1000 /
          ((h * h * h) / (modulus_MPa * value * length * length) + (shape_factor * h) / (shear_modulus_MPa * value))
      );
    }, 0);
  },
};

const bending: Family<{ readonly modulus_MPa: number; readonly second_moment_m4: number }, None> = {
  id: 'stiffness/flexural-rigidity',
  yields: 'flexural_rigidity_kN_m2',
  unit: 'kN_m2',
  symbol: 'EI',
  inputs: [MODULUS, quantity('second_moment', 'm4', 'second moment of area of all walls')],
  expression: '1000 * modulus_MPa * second_moment_m4',
  evaluate: ({ modulus_MPa, second_moment_m4 }) => 1000 * modulus_MPa * second_moment_m4,
};

const shear: Family<
  { readonly shear_modulus_MPa: number; readonly wall_area_m2: number },
  { readonly shape_factor: number }
> = {
  id: 'stiffness/shear-rigidity',
  yields: 'shear_rigidity_kN',
  unit: 'kN',
  symbol: 'GA/κ',
  inputs: [SHEAR_MODULUS, quantity('wall_area', 'm2', 'area in plan of all walls along the force')],
  expression: '1000 * shear_modulus_MPa * wall_area_m2 / shape_factor',
  evaluate: ({ shear_modulus_MPa, wall_area_m2 }, { shape_factor }) =>
    (1000 * shear_modulus_MPa * wall_area_m2) / shape_factor,
};

const frameShear: Family<{ readonly storey_stiffness_kN_per_m: readonly number[]; readonly height_m: number }, None> = {
  id: 'stiffness/frame-shear-rigidity',
  yields: 'shear_rigidity_kN',
  unit: 'kN',
  symbol: 'GA',
  inputs: [list('storey_stiffness', 'kN_per_m', 'storey stiffness of the frame'), quantity('height', 'm', 'height')],
  expression: null,
  procedure: 'GA = H / Σ(1/k): the even shear cantilever that sways as far under a force at its top',
  evaluate: ({ storey_stiffness_kN_per_m, height_m }) =>
    height_m / storey_stiffness_kN_per_m.reduce((sum, k) => sum + 1 / k, 0),
};

const massPerHeight: Family<
  { readonly weight_kN: number; readonly height_m: number },
  { readonly gravity_mps2: number }
> = {
  id: 'stiffness/mass-per-height',
  yields: 'mass_per_height_t_per_m',
  unit: 't_per_m',
  symbol: 'μ',
  inputs: [quantity('weight', 'kN', 'seismic weight'), quantity('height', 'm', 'height')],
  expression: 'weight_kN / (gravity_mps2 * height_m)',
  evaluate: ({ weight_kN, height_m }, { gravity_mps2 }) => weight_kN / (gravity_mps2 * height_m),
};

const common = { constants: {}, limits: [], verified: 'mechanics' } as const;

export const WALLS_AREA = record({
  ...common,
  id: 'mechanics/section/walls-area',
  title: 'Area of the walls along the force',
  family: area,
  source: mechanics('sum'),
});
export const WALLS_SECOND_MOMENT = record({
  ...common,
  id: 'mechanics/section/walls-second-moment',
  title: 'Second moment of area of the walls along the force',
  family: secondMoment,
  source: mechanics('walls side by side without coupling: sum'),
});
export const PIERS_OF_STOREY = record({
  ...common,
  id: 'mechanics/stiffness/piers-of-a-storey',
  title: 'Storey stiffness, the sum of its wall piers',
  family: piers,
  constants: { shape_factor: 1.2 },
  source: mechanics('1/(h³/(12EI) + 1.2 h/(GA)), rigid floors'),
});
export const FLEXURAL_RIGIDITY = record({
  ...common,
  id: 'mechanics/rigidity/bending',
  title: 'Flexural rigidity of the walls',
  family: bending,
  source: mechanics('E times I'),
});
export const SHEAR_RIGIDITY = record({
  ...common,
  id: 'mechanics/rigidity/shear',
  title: 'Shear rigidity of the walls',
  family: shear,
  constants: { shape_factor: 1.2 },
  source: mechanics('G times A over 1.2 for rectangles'),
});
export const FRAME_SHEAR_RIGIDITY = record({
  ...common,
  id: 'mechanics/rigidity/frame-shear',
  title: 'Frame as a shear cantilever',
  family: frameShear,
  source: mechanics('GA = storey stiffness × storey height, storeys in series'),
});
export const MASS_PER_HEIGHT = record({
  ...common,
  id: 'mechanics/mass/per-height',
  title: 'Mass over the height',
  family: massPerHeight,
  constants: { gravity_mps2: 9.80665 },
  source: mechanics('W/(g H)'),
});

export const WALL_SUM_RECORDS: readonly AnyRecord[] = [
  WALLS_AREA,
  WALLS_SECOND_MOMENT,
  PIERS_OF_STOREY,
  FLEXURAL_RIGIDITY,
  SHEAR_RIGIDITY,
  FRAME_SHEAR_RIGIDITY,
  MASS_PER_HEIGHT,
];
