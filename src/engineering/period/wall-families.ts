/**
 * Families over the walls of one direction. Two brackets are in use and are not the same: (0.2 + l/h)² in EN 1998-1 and NZS 1170.5,
 * 0.2 + (l/h)² in UBC, IS 1893 and TBDY. Walls are given as lists, one entry a wall.
 */
import type { Family, InputSpec } from '../formula.js';
import { power } from '../numeric/power.js';

export interface WallsInput {
  readonly wall_areas_m2: readonly number[];
  readonly wall_lengths_m: readonly number[];
  readonly height_m: number;
}
export interface WallsOnBaseInput extends WallsInput {
  readonly base_area_m2: number;
}
export interface WallsByHeightInput extends WallsOnBaseInput {
  readonly wall_heights_m: readonly number[];
}

const AREAS = {
  name: 'wall_areas_m2',
  kind: 'list',
  unit: 'm2',
  meaning: 'cross-section in the first storey of each wall that acts in the direction',
} as const;
const LENGTHS = { name: 'wall_lengths_m', kind: 'list', unit: 'm', meaning: 'length of each wall in plan' } as const;
const HEIGHTS = {
  name: 'wall_heights_m',
  kind: 'list',
  unit: 'm',
  meaning: 'height of each wall; the height of the building for walls of full height',
} as const;
const HEIGHT = {
  name: 'height_m',
  kind: 'number',
  unit: 'm',
  meaning: 'height from the base to the highest level',
} as const;
const BASE = { name: 'base_area_m2', kind: 'number', unit: 'm2', meaning: 'area of the building at its base' } as const;

/** @throws RangeError where there is no wall or the lists differ in length. */
function checkLengths(wall_areas_m2: readonly number[], other: readonly number[], name: string): void {
  if (wall_areas_m2.length === 0) throw new RangeError('wall_areas_m2 is empty: give one entry a wall');
  if (wall_areas_m2.length !== other.length)
    throw new RangeError(
      `wall_areas_m2 has ${String(wall_areas_m2.length)} entries and ${name} ${String(other.length)}: give one entry a wall in each`,
    );
}

/** C_w = (100/A_B) Σ (h/h_i)² A_i / (1 + s (h_i/D_i)²), the walls of full height where no heights are given. */
function wallRatio(input: WallsOnBaseInput, slenderness: number, wall_heights_m?: readonly number[]): number {
  const { wall_areas_m2, wall_lengths_m, base_area_m2, height_m } = input;
  checkLengths(wall_areas_m2, wall_lengths_m, 'wall_lengths_m');
  if (wall_heights_m !== undefined) checkLengths(wall_areas_m2, wall_heights_m, 'wall_heights_m');
  let sum = 0;
  for (let i = 0; i < wall_areas_m2.length; i += 1) {
    const wall_height_m = wall_heights_m === undefined ? height_m : wall_heights_m[i]!;
    const share = height_m / wall_height_m;
    const slender = wall_height_m / wall_lengths_m[i]!;
    sum += (share * share * wall_areas_m2[i]!) / (1 + slenderness * slender * slender);
  }
  return (100 * sum) / base_area_m2;
}

export interface BracketConstants {
  readonly bracket: number;
  /** Largest l/h that counts; none printed where it is absent. */
  readonly ratio_cap?: number;
}

/** Σ A_i (b + l/h)² */
function sumSquaredBracket(input: WallsInput, { bracket, ratio_cap = Infinity }: BracketConstants): number {
  const { wall_areas_m2, wall_lengths_m, height_m } = input;
  checkLengths(wall_areas_m2, wall_lengths_m, 'wall_lengths_m');
  let sum = 0;
  for (let i = 0; i < wall_areas_m2.length; i += 1) {
    const term = bracket + Math.min(wall_lengths_m[i]! / height_m, ratio_cap);
    sum += wall_areas_m2[i]! * term * term;
  }
  return sum;
}

/** Σ A_i [b + (l/h)²] */
function sumSquaredRatio(input: WallsInput, { bracket, ratio_cap = Infinity }: BracketConstants): number {
  const { wall_areas_m2, wall_lengths_m, height_m } = input;
  checkLengths(wall_areas_m2, wall_lengths_m, 'wall_lengths_m');
  let sum = 0;
  for (let i = 0; i < wall_areas_m2.length; i += 1) {
    const ratio = Math.min(wall_lengths_m[i]! / height_m, ratio_cap);
    sum += wall_areas_m2[i]! * (bracket + ratio * ratio);
  }
  return sum;
}

const CW = 'C_w = (100/A_B) Σ A_i / [1 + s (h/D_i)²]';
const CW_HI = 'C_w = (100/A_B) Σ (h/h_i)² A_i / [1 + s (h_i/D_i)²]';
const SQUARED_BRACKET = 'A_c = Σ A_i (b + l_i/h)²';
const SQUARED_RATIO = 'A_c = Σ A_i [b + (l_i/h)²]';

function area<I>(
  id: string,
  symbol: string,
  inputs: readonly InputSpec[],
  procedure: string,
  evaluate: (input: I, constants: BracketConstants) => number,
): Family<I, BracketConstants> {
  return { id, yields: 'wall_area_m2', unit: 'm2', symbol, inputs, expression: null, procedure, evaluate };
}

export const squaredBracketArea = area(
  'wall-area/squared-bracket',
  'A_c',
  [AREAS, LENGTHS, HEIGHT],
  `${SQUARED_BRACKET}, l_i/h at most its cap`,
  sumSquaredBracket,
);
export const squaredRatioArea = area(
  'wall-area/squared-ratio',
  'A_c',
  [AREAS, LENGTHS, HEIGHT],
  `${SQUARED_RATIO}, l_i/h at most its cap where there is one`,
  sumSquaredRatio,
);

interface RatioConstants {
  readonly slenderness: number;
}

export const fullHeightRatio: Family<WallsOnBaseInput, RatioConstants> = {
  id: 'wall-area/full-height-ratio',
  yields: 'wall_ratio',
  unit: null,
  symbol: 'C_w',
  inputs: [AREAS, LENGTHS, BASE, HEIGHT],
  expression: null,
  procedure: CW,
  evaluate: (input, { slenderness }) => wallRatio(input, slenderness),
};

export const ratioByWallHeight: Family<WallsByHeightInput, RatioConstants> = {
  ...fullHeightRatio,
  id: 'wall-area/ratio-by-wall-height',
  inputs: [AREAS, LENGTHS, HEIGHTS, BASE, HEIGHT],
  procedure: CW_HI,
  evaluate: (input, { slenderness }) => wallRatio(input, slenderness, input.wall_heights_m),
};

interface RatioPeriodConstants extends RatioConstants {
  readonly coefficient: number;
  readonly unit_m: number;
}

/** T = C_q h / √C_w, h in the unit the coefficient was printed for. */
export const fullHeightRatioPeriod: Family<WallsOnBaseInput, RatioPeriodConstants> = {
  id: 'period/full-height-ratio',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: fullHeightRatio.inputs,
  expression: null,
  procedure: `T = (C_q/√C_w) h, h in the unit of C_q; ${CW}`,
  evaluate: (input, { coefficient, slenderness, unit_m }) =>
    (coefficient * (input.height_m / unit_m)) / Math.sqrt(wallRatio(input, slenderness)),
};

export const ratioByWallHeightPeriod: Family<WallsByHeightInput, RatioPeriodConstants> = {
  ...fullHeightRatioPeriod,
  id: 'period/ratio-by-wall-height',
  inputs: ratioByWallHeight.inputs,
  procedure: `T = (C_q/√C_w) h, h in the unit of C_q; ${CW_HI}`,
  evaluate: (input, { coefficient, slenderness, unit_m }) =>
    (coefficient * (input.height_m / unit_m)) / Math.sqrt(wallRatio(input, slenderness, input.wall_heights_m)),
};

export interface WallPeriodConstants extends BracketConstants {
  /** Factor of the standard on its own approximate period. */
  readonly factor?: number;
  readonly coefficient: number;
  /** Largest coefficient after the division by √A_c; none printed where it is absent. */
  readonly coefficient_cap?: number;
  readonly exponent: number;
  readonly unit_m: number;
}

function wallPeriod(height_m: number, area_m2: number, constants: WallPeriodConstants): number {
  const { factor = 1, coefficient, coefficient_cap = Infinity, exponent, unit_m } = constants;
  const ct = Math.min(coefficient / Math.sqrt(area_m2 / (unit_m * unit_m)), coefficient_cap);
  return factor * ct * power(height_m / unit_m, exponent);
}

const FROM_AREA = 'T = f C_t h^x, C_t = c/√A_c up to its cap, factor f 1 where none is given, lengths in the unit of c';

/** T = (c/√A_c) h^x with the squared bracket. */
export const squaredBracketPeriod: Family<WallsInput, WallPeriodConstants> = {
  id: 'period/squared-bracket',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [AREAS, LENGTHS, HEIGHT],
  expression: null,
  procedure: `${FROM_AREA}; ${SQUARED_BRACKET}, l_i/h at most its cap`,
  evaluate: (input, constants) => wallPeriod(input.height_m, sumSquaredBracket(input, constants), constants),
};

/** T = (c/√A_c) h^x with the squared ratio. */
export const squaredRatioPeriod: Family<WallsInput, WallPeriodConstants> = {
  ...squaredBracketPeriod,
  id: 'period/squared-ratio',
  procedure: `${FROM_AREA}; ${SQUARED_RATIO}, l_i/h at most its cap where there is one`,
  evaluate: (input, constants) => wallPeriod(input.height_m, sumSquaredRatio(input, constants), constants),
};

/** The same, not under c_d h / √d. */
export const squaredRatioPeriodWithFloor: Family<
  WallsInput & { readonly plan_dimension_m: number },
  WallPeriodConstants & { readonly plan_coefficient: number }
> = {
  ...squaredBracketPeriod,
  id: 'period/squared-ratio-with-floor',
  inputs: [
    ...squaredBracketPeriod.inputs,
    { name: 'plan_dimension_m', kind: 'number', unit: 'm', meaning: 'plan dimension along the force' },
  ],
  procedure: `the greater of c_d h/√d and ${FROM_AREA}; ${SQUARED_RATIO}, l_i/h at most its cap`,
  evaluate: (input, constants) =>
    Math.max(
      wallPeriod(input.height_m, sumSquaredRatio(input, constants), constants),
      (constants.plan_coefficient * input.height_m) / Math.sqrt(input.plan_dimension_m),
    ),
};
