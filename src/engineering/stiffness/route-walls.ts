/** Period from the walls of a direction: cantilevers over the height, piers between floors, or wall area alone. */
import type { System } from '../building.js';
import { apply } from '../formula.js';
import { CANTILEVER_WITH_FLOORS, LUMPED_FLOORS } from './continuum.js';
import { SHEAR_MODULUS } from './materials.js';
import { frameOf } from './route-frame.js';
import { concreteModulus, crackedModulus, masonryModulus, reinforcedMasonryModulus } from './route-materials.js';
import { NO_MASS, chainPeriod, massOf, springsOf, storeyHeights, storeysOf } from './route-mass.js';
import type { RouteContext, Worked } from './route-mass.js';
import { WALL_FRAME_PERIOD, WALL_FRAME_RATIO } from './wall-frame.js';
import {
  FLEXURAL_RIGIDITY,
  FRAME_SHEAR_RIGIDITY,
  MASS_PER_HEIGHT,
  PIERS_OF_STOREY,
  SHEAR_RIGIDITY,
  WALLS_AREA,
  WALLS_SECOND_MOMENT,
} from './wall-sums.js';
import { WALL_AREA_STOREY } from './walls.js';

/** Wall systems, thickness where it is not on record, m [judgement], and how the walls work. */
const WALL_SYSTEMS: Partial<Record<System, { readonly thickness_m: number; readonly acts: 'cantilever' | 'piers' }>> = {
  'concrete-shear-wall': { thickness_m: 0.2, acts: 'cantilever' },
  'concrete-wall-frame': { thickness_m: 0.25, acts: 'cantilever' },
  'reinforced-masonry-wall': { thickness_m: 0.2, acts: 'cantilever' },
  'confined-masonry-wall': { thickness_m: 0.15, acts: 'piers' },
  'unreinforced-masonry-wall': { thickness_m: 0.3, acts: 'piers' },
};

interface Walls {
  readonly areas: readonly number[];
  /** null: areas only. */
  readonly lengths: readonly number[] | null;
  readonly flags: readonly string[];
}

const total = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0);

function wallsOf({ building, direction, trace }: RouteContext, thickness_m: number): Walls | string {
  const areas = building.structure?.wall_areas_m2[direction] ?? null;
  const lengths = building.structure?.wall_lengths_m[direction] ?? null;
  if (lengths === null)
    return areas === null ? 'neither areas nor lengths of the walls are on record' : { areas, lengths, flags: [] };
  if (areas === null) {
    trace?.value('thickness_m', thickness_m, 'default', 'usual thickness of such walls [judgement]');
    return { areas: lengths.map((length) => length * thickness_m), lengths, flags: ['wall thickness assumed'] };
  }
  if (areas.length === lengths.length) return { areas, lengths, flags: [] };
  if (areas.length === 1) {
    const thickness = areas[0]! / total(lengths);
    return { areas: lengths.map((length) => length * thickness), lengths, flags: ['walls taken as equally thick'] };
  }
  return `${String(areas.length)} wall areas and ${String(lengths.length)} wall lengths: one length a wall is needed`;
}

function wallModulus(context: RouteContext): number {
  const gross = context.system.startsWith('concrete-')
    ? concreteModulus(context)
    : context.system === 'reinforced-masonry-wall'
      ? reinforcedMasonryModulus(context)
      : masonryModulus(context);
  return crackedModulus(gross, context);
}

/** Period of the walls alone. */
export function fromWalls(context: RouteContext): Worked | string {
  const { building, system, trace } = context;
  const kind = WALL_SYSTEMS[system];
  if (kind === undefined)
    return system === 'precast-tilt-up-wall'
      ? 'the roof between the walls governs, not the walls'
      : 'the system is not one of concrete or masonry walls';
  if (system === 'concrete-wall-frame' && (building.structure?.column_count ?? NaN) > 0)
    return 'the frame carries with the walls: see the route of wall with frame';
  const walls = wallsOf(context, kind.thickness_m);
  if (typeof walls === 'string') return walls;
  const storeys = storeysOf(building);
  // shear alone would be several times too stiff for slender walls
  if (walls.lengths === null && kind.acts === 'cantilever' && storeys > 1)
    return 'the lengths of the walls are not on record, and walls over several storeys bend';
  const mass = massOf(context);
  if (mass === null) return NO_MASS;
  const flags = [...walls.flags];
  if (system === 'concrete-wall-frame') flags.push('the frame is not on record and left out');
  const { first_m, upper_m } = storeyHeights(context);
  const modulus_MPa = wallModulus(context);
  const shear_modulus_MPa = apply(SHEAR_MODULUS, { modulus_MPa }, trace);
  const { areas: wall_areas_m2, lengths: wall_lengths_m } = walls;
  const { massSigma } = mass;
  if (wall_lengths_m === null) {
    const wall_area_m2 = apply(WALLS_AREA, { wall_areas_m2 }, trace);
    const at = (storey_height_m: number): number =>
      apply(WALL_AREA_STOREY, { shear_modulus_MPa, wall_area_m2, storey_height_m }, trace);
    const first = at(first_m);
    const springs = springsOf(storeys, first, upper_m === first_m ? first : at(upper_m));
    flags.push('wall lengths not on record: bending left out, which makes the period short');
    return { period_s: chainPeriod(mass.mass_t, springs, trace), massSigma, flags };
  }
  if (kind.acts === 'piers') {
    const at = (pier_height_m: number): number =>
      apply(PIERS_OF_STOREY, { modulus_MPa, shear_modulus_MPa, wall_areas_m2, wall_lengths_m, pier_height_m }, trace);
    const first = at(first_m);
    const springs = springsOf(storeys, first, upper_m === first_m ? first : at(upper_m));
    return { period_s: chainPeriod(mass.mass_t, springs, trace), massSigma, flags };
  }
  const second_moment_m4 = apply(WALLS_SECOND_MOMENT, { wall_areas_m2, wall_lengths_m }, trace);
  const flexural_rigidity_kN_m2 = apply(FLEXURAL_RIGIDITY, { modulus_MPa, second_moment_m4 }, trace);
  const wall_area_m2 = apply(WALLS_AREA, { wall_areas_m2 }, trace);
  const shear_rigidity_kN = apply(SHEAR_RIGIDITY, { shear_modulus_MPa, wall_area_m2 }, trace);
  const input = {
    masses_t: springsOf(storeys, mass.mass_t, mass.mass_t),
    storey_heights_m: springsOf(storeys, first_m, upper_m),
    flexural_rigidity_kN_m2,
    shear_rigidity_kN,
  };
  return { period_s: apply(CANTILEVER_WITH_FLOORS, input, trace), massSigma, flags };
}

/** Period of walls and frame tied together. */
export function fromWallFrame(context: RouteContext): Worked | string {
  const { building, system, trace, height_m } = context;
  const kind = WALL_SYSTEMS[system];
  if (system !== 'concrete-wall-frame' || kind === undefined) return 'the system is not one of walls with a frame';
  if (!((building.structure?.column_count ?? NaN) > 0)) return 'the frame is not on record';
  const walls = wallsOf(context, kind.thickness_m);
  if (typeof walls === 'string') return walls;
  if (walls.lengths === null) return 'the lengths of the walls are not on record';
  const frame = frameOf(context);
  if (typeof frame === 'string') return frame;
  const mass = massOf(context);
  if (mass === null) return NO_MASS;
  const modulus_MPa = crackedModulus(frame.modulus_MPa, context);
  const second_moment_m4 = apply(
    WALLS_SECOND_MOMENT,
    { wall_areas_m2: walls.areas, wall_lengths_m: walls.lengths },
    trace,
  );
  const flexural_rigidity_kN_m2 = apply(FLEXURAL_RIGIDITY, { modulus_MPa, second_moment_m4 }, trace);
  const shear_rigidity_kN = apply(FRAME_SHEAR_RIGIDITY, { storey_stiffness_kN_per_m: frame.springs, height_m }, trace);
  const stiffness_ratio = apply(WALL_FRAME_RATIO, { height_m, shear_rigidity_kN, flexural_rigidity_kN_m2 }, trace);
  const mass_per_height_t_per_m = apply(MASS_PER_HEIGHT, { weight_kN: mass.weight_kN, height_m }, trace);
  const spread = apply(
    WALL_FRAME_PERIOD,
    { height_m, mass_per_height_t_per_m, flexural_rigidity_kN_m2, stiffness_ratio },
    trace,
  );
  const period_s = apply(LUMPED_FLOORS, { period_s: spread, storeys: storeysOf(building) }, trace);
  return { period_s, massSigma: mass.massSigma, flags: [...walls.flags, ...frame.flags] };
}
