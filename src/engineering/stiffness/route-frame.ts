/** Period of a concrete frame from the sides of its columns and beams: D-values after Muto. */
import type { BaseFixity, Structure, System } from '../building.js';
import { apply } from '../formula.js';
import type { Trace } from '../trace.js';
import { BEAM_WITH_SLAB, COLUMNS_OF_STOREY, COLUMN_FIXED, COLUMN_PINNED, MEMBER, RECTANGLE } from './frames.js';
import {
  MUTO_D_VALUE,
  MUTO_FIXED_BASE,
  MUTO_PINNED_BASE,
  MUTO_RATIO_FIRST,
  MUTO_RATIO_UPPER,
  MUTO_UPPER,
} from './muto.js';
import { concreteModulus, crackedModulus } from './route-materials.js';
import { NO_MASS, chainPeriod, massOf, springsOf, storeyHeights, storeysOf } from './route-mass.js';
import type { RouteContext, Worked } from './route-mass.js';

const CONCRETE_FRAMES: ReadonlySet<System> = new Set<System>([
  'concrete-moment-frame',
  'concrete-infilled-frame',
  'concrete-wall-frame',
  'precast-concrete-frame',
]);
/** Bay where neither bay nor plan is known, m [judgement]. */
const USUAL_BAY_M = 6;
/** Beam width over its depth where only the depth is known [judgement]. */
const USUAL_BEAM_SHAPE = 0.5;

export interface Frame {
  /** Storey stiffness, bottom to top. */
  readonly springs: readonly number[];
  /** Second moment of area of a column, m⁴, and its side along the force. */
  readonly column_second_moment_m4: number;
  readonly column_side_m: number;
  readonly bay_length_m: number;
  /** NaN where not known. */
  readonly beam_depth_m: number;
  /** Modulus before cracking, MPa. */
  readonly modulus_MPa: number;
  readonly flags: readonly string[];
}

/** Period of the frame alone. */
export function fromSections(context: RouteContext): Worked | string {
  const { system, trace } = context;
  if (system === 'concrete-infilled-frame') return 'an infilled frame: see the route with infill';
  if (system === 'concrete-wall-frame') return 'walls carry with the frame: see the route of wall with frame';
  const frame = frameOf(context);
  if (typeof frame === 'string') return frame;
  const mass = massOf(context);
  if (mass === null) return NO_MASS;
  const flags = system === 'precast-concrete-frame' ? [...frame.flags, 'joints taken as cast in one'] : frame.flags;
  return { period_s: chainPeriod(mass.mass_t, frame.springs, trace), massSigma: mass.massSigma, flags };
}

/** Sides of a column: across the bending and along the force; one side known makes a square. */
function columnSides({ column_width_m, column_depth_m }: Structure, along: boolean): readonly [number, number] | null {
  const width = column_width_m > 0 ? column_width_m : column_depth_m;
  const depth = column_depth_m > 0 ? column_depth_m : column_width_m;
  if (!(width > 0) || !(depth > 0)) return null;
  return along ? [width, depth] : [depth, width];
}

/** The storey stiffness of a concrete frame, or why it cannot be told. */
export function frameOf(context: RouteContext): Frame | string {
  const { building, direction, system, trace } = context;
  if (!CONCRETE_FRAMES.has(system))
    return system.startsWith('steel-')
      ? 'the outer sides of a steel section do not tell its second moment of area'
      : 'not a concrete frame';
  const { structure } = building;
  if (structure === null) return 'no sections on record';
  const sides = columnSides(structure, direction === 'longitudinal');
  if (sides === null) return 'the size of the columns is not on record';
  if (!(structure.column_count > 0)) return 'the number of columns is not on record';
  const flags: string[] = [];
  if (!(structure.column_width_m > 0) || !(structure.column_depth_m > 0)) flags.push('columns taken as square');
  const [width_m, depth_m] = sides;
  const column_second_moment_m4 = apply(RECTANGLE, { width_m, depth_m }, trace);
  const modulus_MPa = concreteModulus(context);
  const modulus = crackedModulus(modulus_MPa, context);
  const base = structure.base_fixity ?? 'fixed';
  if (structure.base_fixity === null) flags.push('columns taken as fixed at the base');
  trace?.choice({
    question: 'Base of the columns',
    taken: base,
    because:
      structure.base_fixity === null
        ? 'not on record: footings with ties or a basement are usual [judgement]'
        : 'from the inventory',
    others: [],
  });
  const bay_length_m = bayOf(context, structure, flags);
  const storeys = storeysOf(building);
  const heights = storeyHeights(context);
  const storey = { column: column_second_moment_m4, modulus, base, structure, bay_length_m };
  const first = storeyStiffness({ ...storey, height: heights.first_m, first: true }, context, flags);
  const upper =
    storeys === 1 ? first : storeyStiffness({ ...storey, height: heights.upper_m, first: false }, context, flags);
  return {
    springs: springsOf(storeys, first, upper),
    column_second_moment_m4,
    column_side_m: depth_m,
    bay_length_m,
    beam_depth_m: structure.beam_depth_m,
    modulus_MPa,
    flags: [...new Set(flags)],
  };
}

/** Distance of the columns: given, else from the plate each column carries, else the usual one. */
function bayOf({ building, trace }: RouteContext, { bay_length_m, column_count }: Structure, flags: string[]): number {
  if (bay_length_m > 0) return bay_length_m;
  const plate = building.plan_length_m * building.plan_width_m;
  const bay = plate > 0 ? Math.sqrt(plate / column_count) : USUAL_BAY_M;
  const why = plate > 0 ? 'square root of the plan per column [judgement]' : 'usual bay [judgement]';
  trace?.value('bay_length_m', bay, 'default', why);
  flags.push('bay length assumed');
  return bay;
}

interface StoreyOfColumns {
  readonly column: number;
  readonly modulus: number;
  readonly base: BaseFixity;
  readonly structure: Structure;
  readonly bay_length_m: number;
  readonly height: number;
  readonly first: boolean;
}

function storeyStiffness(storey: StoreyOfColumns, context: RouteContext, flags: string[]): number {
  const { structure, height: storey_height_m, modulus: modulus_MPa } = storey;
  const { trace } = context;
  const { end_columns, inner_columns } = columnLines(storey, context, flags);
  if (!(structure.beam_depth_m > 0)) {
    flags.push('beams not on record: taken as rigid, which makes the period short by up to 1.5 to 2.4 times');
    const method = storey.first && storey.base === 'pinned' ? COLUMN_PINNED : COLUMN_FIXED;
    const one = apply(method, { modulus_MPa, second_moment_m4: storey.column, storey_height_m }, trace);
    return apply(
      COLUMNS_OF_STOREY,
      { end_columns, end_stiffness_kN_per_m: one, inner_columns, inner_stiffness_kN_per_m: one },
      trace,
    );
  }
  const beam = beamStiffness(storey, context, flags);
  const column_stiffness_kN_m = apply(
    MEMBER,
    { modulus_MPa, second_moment_m4: storey.column, length_m: storey_height_m },
    trace,
  );
  // a column between two beams, or at the end of its line with one; in an upper storey the beams of both ends count
  const dOf = (beams: number): number =>
    dValue(storey, beams * (storey.first ? 1 : 2) * beam, column_stiffness_kN_m, trace);
  const end_stiffness_kN_per_m = dOf(1);
  const inner_stiffness_kN_per_m = inner_columns > 0 ? dOf(2) : 0;
  return apply(
    COLUMNS_OF_STOREY,
    { end_columns, end_stiffness_kN_per_m, inner_columns, inner_stiffness_kN_per_m },
    trace,
  );
}

function dValue(
  { first, base, height: storey_height_m }: StoreyOfColumns,
  beam_stiffness_kN_m: number,
  column_stiffness_kN_m: number,
  trace: Trace | undefined,
): number {
  const ratio = first ? MUTO_RATIO_FIRST : MUTO_RATIO_UPPER;
  const coefficient = first ? (base === 'pinned' ? MUTO_PINNED_BASE : MUTO_FIXED_BASE) : MUTO_UPPER;
  const beam_column_ratio = apply(ratio, { beam_stiffness_kN_m, column_stiffness_kN_m }, trace);
  const end_coefficient = apply(coefficient, { beam_column_ratio }, trace);
  return apply(MUTO_D_VALUE, { end_coefficient, column_stiffness_kN_m, storey_height_m }, trace);
}

function beamStiffness(
  { structure, bay_length_m, modulus: modulus_MPa }: StoreyOfColumns,
  { system, trace }: RouteContext,
  flags: string[],
): number {
  const depth_m = structure.beam_depth_m;
  const known = structure.beam_width_m > 0;
  const width_m = known ? structure.beam_width_m : USUAL_BEAM_SHAPE * depth_m;
  if (!known) {
    flags.push('beam width taken as half its depth');
    trace?.value('beam_width_m', width_m, 'default', 'half of the depth [judgement]');
  }
  const bare = apply(RECTANGLE, { width_m, depth_m }, trace);
  const second_moment_m4 =
    system === 'precast-concrete-frame' ? bare : apply(BEAM_WITH_SLAB, { second_moment_m4: bare }, trace);
  return apply(MEMBER, { modulus_MPa, second_moment_m4, length_m: bay_length_m }, trace);
}

/** Columns at the ends of their lines and between: by the plan where it is known, else a square grid. */
function columnLines(
  { structure, bay_length_m }: StoreyOfColumns,
  { building, direction }: RouteContext,
  flags: string[],
): { readonly end_columns: number; readonly inner_columns: number } {
  const { column_count } = structure;
  const side = direction === 'longitudinal' ? building.plan_length_m : building.plan_width_m;
  if (!(side > 0)) flags.push('columns taken as a square grid');
  const bays = Math.max(1, Math.round(side > 0 ? side / bay_length_m : Math.sqrt(column_count) - 1));
  const inLine = Math.min(column_count, bays + 1);
  const inner_columns = inLine < 3 ? 0 : column_count - (2 * column_count) / inLine;
  return { end_columns: column_count - inner_columns, inner_columns };
}
