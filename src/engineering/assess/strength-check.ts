/** Capacity from the areas of columns, walls or braces, where the row has them: the third way, before the code of the era. */
import type { Building, DirectionName, System } from '../building.js';
import {
  AVERAGE_SHEAR,
  BASIC_INDEX,
  BRACE_STRESS,
  BRACE_YIELD_MPA,
  CHECK_C,
  CHECK_EDITIONS,
  CONCRETE_FACTOR,
  CONCRETE_STRESS,
  MASONRY_STRESS_MPA,
  MEAN_STRESS,
  PRIORITY_INDEX,
  STRENGTH_INDEX,
} from '../capacity/strength-records.js';
import { formatNumber } from '../format.js';
import { apply } from '../formula.js';
import { ln } from '../numeric/elementary.js';
import { massOf, storeyHeights, storeysOf } from '../stiffness/route-mass.js';
import type { RouteContext } from '../stiffness/route-mass.js';
import type { Trace } from '../trace.js';
import { detailingOfCase, governingCase, massShare } from './capacity.js';
import type { CapacityAtHeight, Case } from './case-memory.js';
import { ductilityOf } from './code-history.js';
import type { AssessContext } from './context.js';

/** A strength check worked out; a text says why there is none; null where the row knows no structure, or the study wants none. */
export function strengthCheck(
  building: Building,
  which: Case,
  direction: DirectionName,
  height_m: number,
  context: AssessContext,
  trace?: Trace,
): CapacityAtHeight | string | null {
  const { strengthCheck: wanted, spreads } = context.settings;
  // most rows end here
  if (building.structure === null || wanted === undefined || wanted.method === 'none') return null;
  const system = direction === 'longitudinal' ? which.system : which.system_transverse;
  const areas = areasOf(building, direction);
  if (!(areas.columns_m2 > 0) && !(areas.walls_m2 > 0) && !(areas.braces_m2 > 0))
    return 'the row has no areas of columns, walls or braces';
  const route: RouteContext = { building, direction, system, spreads, height_m, assumed: 'usual', trace };
  const mass = massOf(route);
  if (mass === null) return 'neither seismic weight nor floor area is known';
  if (trace !== undefined) showIndices(building, system, areas, mass.weight_kN, trace);
  const work = { route, areas, weight_kN: mass.weight_kN, storeys: storeysOf(building) };
  if (wanted.method === 'japan-first-level') {
    const { codeHistory } = context.settings;
    const governs = governingCase(building, which, direction, height_m, context);
    const detailing = codeHistory === null ? 'none' : detailingOfCase(system, governs, codeHistory);
    const ductility = ductilityOf(system, detailing, context.assumed.ductility);
    trace?.choice({
      question: 'Detailing and ductility',
      taken: `μ = ${String(ductility)}`,
      because: `${system}, ${governs.edition === null ? 'no seismic design' : `designed to ${governs.edition}`}: detailing class "${detailing}" [judgement]`,
      others: [],
    });
    return firstLevel(work, wanted.timeIndex, ductility);
  }
  return averageStress(work, CHECK_EDITIONS[wanted.method]);
}

/** The capacity of a case comes from a strength check: no better way speaks for the building, and its row has what the check needs. */
export function isChecked(
  building: Building,
  which: Case,
  context: AssessContext,
  direction: DirectionName = 'longitudinal',
): boolean {
  if (building.capacity_sa_g > 0 || building.design_base_shear_coefficient > 0) return false;
  const check = strengthCheck(building, which, direction, building.height_m.value, context);
  return check !== null && typeof check !== 'string';
}

interface Areas {
  readonly columns_m2: number;
  readonly walls_m2: number;
  readonly braces_m2: number;
}

interface Work {
  readonly route: RouteContext;
  readonly areas: Areas;
  readonly weight_kN: number;
  readonly storeys: number;
}

function areasOf({ structure }: Building, direction: DirectionName): Areas {
  const { column_count, column_width_m, column_depth_m, wall_areas_m2, brace_area_m2 } = structure!;
  const walls = wall_areas_m2[direction];
  return {
    columns_m2: column_count * column_width_m * column_depth_m,
    walls_m2: walls === null ? NaN : walls.reduce((sum, area) => sum + area, 0),
    braces_m2: brace_area_m2[direction],
  };
}

type Kind = 'columns' | 'concrete walls' | 'reinforced masonry' | 'unreinforced masonry' | 'braces';
/** Which check a system takes; those that are not listed have none. */
const KINDS: Partial<Readonly<Record<System, Kind>>> = {
  'concrete-moment-frame': 'columns',
  'concrete-infilled-frame': 'columns',
  'precast-concrete-frame': 'columns',
  'concrete-shear-wall': 'concrete walls',
  'concrete-wall-frame': 'concrete walls',
  'precast-tilt-up-wall': 'concrete walls',
  'reinforced-masonry-wall': 'reinforced masonry',
  'confined-masonry-wall': 'unreinforced masonry',
  'unreinforced-masonry-wall': 'unreinforced masonry',
  'steel-concentric-braced-frame': 'braces',
  'steel-buckling-restrained-braced-frame': 'braces',
};

/** Checks that ASCE 41 has and this program does not make. */
const NOT_MADE: Partial<Readonly<Record<System, string>>> = {
  'timber-light-frame':
    'ASCE 41 checks timber walls by the force on a metre of their length, which goes with their sheathing; no column tells the sheathing, and this program does not make the check',
};
/** The one word of the column that is read. */
const FLEXIBLE = 'flexible';

function averageStress(
  { route, areas, weight_kN, storeys }: Work,
  ms: (typeof CHECK_EDITIONS)[keyof typeof CHECK_EDITIONS],
): CapacityAtHeight | string {
  const { building, system, trace } = route;
  const kind = KINDS[system];
  if (kind === undefined) return NOT_MADE[system] ?? `this program makes no average-stress check of ${system}`;
  const isFlexible = building.structure!.diaphragm?.trim().toLowerCase() === FLEXIBLE;
  if (isFlexible)
    trace?.value('diaphragm', FLEXIBLE, 'given', 'modification factor C of 1.0 whatever the system and the storeys');
  const cOf = (row: keyof typeof CHECK_C): number =>
    CHECK_C[isFlexible ? 'unreinforced' : row][Math.min(storeys, 4) - 1]!;
  const missing = `the row has no area of ${kind === 'columns' || kind === 'braces' ? kind : 'walls'} along the force`;
  if (kind === 'braces') {
    const bay_length_m = building.structure!.bay_length_m;
    if (!(areas.braces_m2 > 0)) return missing;
    if (!(bay_length_m > 0)) return 'the row has no bay length, so the slope of the braces is not known';
    trace?.value('yield_MPa', BRACE_YIELD_MPA, 'default', 'yield strength of structural steel [memory]');
    const { first_m } = storeyHeights(route);
    const factors = { modifier_ms: ms.braces, modification_c: cOf('wall') };
    const inputs = { yield_MPa: BRACE_YIELD_MPA, area_m2: areas.braces_m2, bay_length_m };
    const rest = { storey_height_m: first_m, weight_kN };
    return asItIs(apply(BRACE_STRESS, { ...factors, ...inputs, ...rest }, trace), factors, building);
  }
  const area_m2 = kind === 'columns' ? areas.columns_m2 : areas.walls_m2;
  if (!(area_m2 > 0)) return missing;
  const average_stress_MPa =
    kind === 'unreinforced masonry'
      ? MASONRY_STRESS_MPA.unreinforced
      : kind === 'reinforced masonry'
        ? MASONRY_STRESS_MPA.reinforced
        : apply(CONCRETE_STRESS, { concrete_strength_MPa: knownStrength(building, 0) }, trace);
  const modifier_ms = kind === 'columns' ? ms.columns : kind === 'unreinforced masonry' ? ms.unreinforced : ms.walls;
  const modification_c = cOf(kind === 'columns' ? 'frame' : kind === 'unreinforced masonry' ? 'unreinforced' : 'wall');
  const factors = { modifier_ms, modification_c };
  return asItIs(apply(AVERAGE_SHEAR, { ...factors, average_stress_MPa, area_m2, weight_kN }, trace), factors, building);
}

function knownStrength({ structure }: Building, otherwise: number): number {
  const given = structure!.concrete_strength_MPa;
  return given > 0 ? given : otherwise;
}

/** A capacity to which neither overstrength nor ductility nor mass share is applied, irregularities alone: the share of mass that the integration divides by is put back. */
function asItIs(
  capacity_sa_g: number,
  checkFactors: NonNullable<CapacityAtHeight['checkFactors']>,
  building: Building,
): CapacityAtHeight {
  return {
    strength_coefficient: capacity_sa_g,
    overstrength: 1,
    ductility: 1,
    lnStrength: ln(capacity_sa_g * massShare(building)),
    checked: 'as it is',
    checkFactors,
  };
}

/** Concrete strength where none is on record: the lowest the standard allows to assume for sound concrete [from memory]. */
const ASSUMED_STRENGTH_MPA = 13.5;
/** Columns taller than this many depths count 0.7. */
const SLENDER = 6;

function firstLevel({ route, areas, weight_kN, storeys }: Work, timeIndex: number, ductility: number) {
  const { building, system, trace } = route;
  if (!system.startsWith('concrete')) return 'the first-level index is for concrete buildings';
  if (!(areas.columns_m2 > 0) && !(areas.walls_m2 > 0)) return 'the row has no area of columns or walls';
  const concrete_factor = apply(
    CONCRETE_FACTOR,
    { concrete_strength_MPa: knownStrength(building, ASSUMED_STRENGTH_MPA) },
    trace,
  );
  const indexOf = (area_m2: number, stress_MPa: number): number =>
    area_m2 > 0 ? apply(STRENGTH_INDEX, { area_m2, stress_MPa, concrete_factor, weight_kN }, trace) : 0;
  // whether walls end in columns is not on record: the least of the three stresses
  const wall_index = indexOf(areas.walls_m2, 1);
  const { column_width_m, column_depth_m, beam_depth_m } = building.structure!;
  const { first_m } = storeyHeights(route);
  const clear_m = first_m - (beam_depth_m > 0 ? beam_depth_m : 0);
  const depth_m = route.direction === 'longitudinal' ? column_depth_m : column_width_m;
  const slender = clear_m / depth_m > SLENDER;
  if (areas.columns_m2 > 0)
    trace?.choice({
      question: 'Stress of the columns',
      taken: slender ? '0.7 MPa' : '1.0 MPa',
      because: `clear height ${formatNumber(clear_m, 3)} m over depth ${formatNumber(depth_m, 3)} m is ${formatNumber(clear_m / depth_m, 3)}, ${slender ? 'above' : 'not above'} ${String(SLENDER)}; ${beam_depth_m > 0 ? 'the storey less its beam' : 'no beam is on record: the whole storey'}`,
      others: [],
    });
  const column_index = indexOf(areas.columns_m2, slender ? 0.7 : 1);
  const basic_index = apply(
    BASIC_INDEX,
    { storeys, storey: 1, wall_index, column_index, column_share: wall_index > 0 ? 0.7 : 1 },
    trace,
  );
  trace?.value('time_index', timeIndex, 'setting', 'time index T of the study; irregularity stands for S_D below');
  const strength_coefficient = basic_index * timeIndex;
  return {
    strength_coefficient,
    overstrength: 1,
    ductility,
    lnStrength: ln(strength_coefficient),
    checked: 'with ductility',
  } as const;
}

/** Wall and column indices: shown beside the capacity, counted nowhere. */
function showIndices(building: Building, system: System, areas: Areas, weight_kN: number, trace: Trace): void {
  const column_area_m2 = areas.columns_m2 > 0 ? areas.columns_m2 : 0;
  const walls = areas.walls_m2 > 0 ? areas.walls_m2 : 0;
  if (column_area_m2 + walls === 0) return;
  const masonry = system.includes('masonry');
  const wall_area_m2 = masonry ? 0 : walls;
  const floor_area_m2 = building.floor_area_m2.value;
  trace.value(
    'area indices',
    'shown, not counted',
    'computed',
    'walls and columns of the first storey over floor area',
  );
  if (floor_area_m2 > 0)
    apply(PRIORITY_INDEX, { wall_area_m2, masonry_area_m2: masonry ? walls : 0, column_area_m2, floor_area_m2 }, trace);
  if (wall_area_m2 + column_area_m2 > 0) apply(MEAN_STRESS, { weight_kN, wall_area_m2, column_area_m2 }, trace);
}
