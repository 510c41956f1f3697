/** Period from the storey stiffness that the row gives, and from the sway that an analysis gives. */
import type { Building, System } from '../building.js';
import { apply, applyAny } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import { EN1998_PERIODS } from '../period/en1998.js';
import type { Trace } from '../trace.js';
import { NO_MASS, chainPeriod, massOf, storeysOf } from './route-mass.js';
import type { RouteContext, Worked } from './route-mass.js';
import { SOFT_FIRST_COLUMNS, SOFT_FIRST_WALLS } from './weight.js';

const WALLS: ReadonlySet<System> = new Set<System>([
  'concrete-shear-wall',
  'reinforced-masonry-wall',
  'confined-masonry-wall',
  'unreinforced-masonry-wall',
  'precast-tilt-up-wall',
]);

/** The shear chain of the given storey stiffness. */
export function fromStoreyStiffness(context: RouteContext): Worked | string {
  const { building, direction, system, trace } = context;
  const given = building.storey_stiffness_kN_per_m[direction];
  if (given === null) return 'no storey stiffness on record';
  const storeys = storeysOf(building);
  if (!(storeys >= 1) || (given.length > 1 && given.length !== storeys)) {
    const because = `${String(given.length)} storey stiffnesses for ${String(storeys)} storeys`;
    trace?.choice({ question: 'Period from storey stiffness', taken: 'not used', because, others: [] });
    return because;
  }
  const mass = massOf(context);
  if (mass === null) return NO_MASS;
  const springs = storeySprings(given, storeys, building, system, trace);
  return { period_s: chainPeriod(mass.mass_t, springs, trace), massSigma: mass.massSigma, flags: [] };
}

/** One stiffness per storey, the first softened by its own height when the row gives it. */
function storeySprings(
  given: readonly number[],
  storeys: number,
  building: Building,
  system: System,
  trace?: Trace,
): readonly number[] {
  if (given.length > 1) return given;
  const springs = new Array<number>(storeys).fill(given[0]!);
  const first = building.first_storey_height_m;
  const height = building.height_m.value;
  if (storeys < 2 || !(first > 0) || !(height > first)) return springs;
  const storey_height_m = (height - first) / (storeys - 1);
  if (Math.abs(first / storey_height_m - 1) < 0.01) return springs;
  const method = WALLS.has(system) ? SOFT_FIRST_WALLS : SOFT_FIRST_COLUMNS;
  springs[0] = apply(method, { stiffness_kN_per_m: given[0]!, first_storey_height_m: first, storey_height_m }, trace);
  return springs;
}

const SWAY_ID = 'en1998-1-2004/period/gravity-sway';
const SWAY = ((): AnyRecord => {
  const found = EN1998_PERIODS.find(({ id }) => id === SWAY_ID);
  if (found === undefined) throw new Error(`no record ${SWAY_ID}`);
  return found;
})();

/** T = 2√d. The mass lies in the analysis that gave the sway. */
export function fromSway({ building, direction, trace }: RouteContext): Worked | string {
  const top_displacement_m = building.structure?.top_displacement_m[direction] ?? NaN;
  if (!(top_displacement_m > 0)) return 'no sway under gravity applied sideways on record';
  return { period_s: applyAny(SWAY, { top_displacement_m }, trace), massSigma: 0, flags: [] };
}
