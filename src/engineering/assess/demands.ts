/**
 * What the shaking asks of a building beside S_a: base shear, roof displacement, storey drift. Worked for the leading case at its
 * central values when a person looks at a building; no part of the priority and of the pass over all buildings.
 */
import type { Building, DirectionName, PerDirection, System } from '../building.js';
import { BASE_SHEAR_ELASTIC, massFactorOf } from '../demand/base-shear.js';
import { MARK_NAMES, ROOF_DISPLACEMENT, STOREY_DRIFT, driftMark } from '../demand/drift.js';
import { C1, C2, STRENGTH_RATIO, YIELD_COEFFICIENT, YIELD_OF_CHECK } from '../demand/inelastic.js';
import { SPECTRAL_DISPLACEMENT } from '../demand/records.js';
import { DIRECTIONS } from '../direction.js';
import { formatShare } from '../format.js';
import { apply, applyAny } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import { chainMode } from '../numeric/chain.js';
import type { ChainInput } from '../stiffness/chain.js';
import { DRIFT_FACTOR, DRIFT_FACTOR_OF_HEIGHTS, FIRST_STOREY_SHARE, PARTICIPATION } from '../stiffness/chain-shape.js';
import { WALL_FRAME_RECORDS } from '../stiffness/wall-frame.js';
import type { Trace } from '../trace.js';
import type { Case, Cases } from './case-memory.js';
import type { SpectrumChoice } from './choose-spectrum.js';
import { codeShear } from './code-shear.js';
import type { AssessContext } from './context.js';
import { centralFactor, softFirstStorey } from './irregularity.js';
import type { LeadingCase } from './leading.js';
import { strengthOf } from './leading-capacity.js';

export interface DirectionDemand {
  readonly period_s: number;
  readonly roof_displacement_m: number;
  /** Largest storey drift over its height. */
  readonly drift_ratio: number;
  /** The last published mark the drift passes; null: none. */
  readonly passed: string | null;
  /** How the sway grows with the height; null: evenly [judgement]. */
  readonly profile: SwayProfile | null;
}

/** Floors, bottom to top: their heights and their shares of the roof's displacement. */
export interface SwayProfile {
  readonly floors_m: readonly number[];
  readonly shares: readonly number[];
}

const findShape = (id: string): AnyRecord => {
  const found = WALL_FRAME_RECORDS.find((one) => one.id === id);
  if (found === undefined) throw new Error(`no record ${id}`);
  return found;
};
const WALL_PARTICIPATION = findShape('miranda-taghavi-2005/participation/roof');
const WALL_DRIFT = findShape('miranda-taghavi-2005/drift/largest-over-mean');

/** α of walls, and of walls with frames and braced bays (guide: under 1.5 walls, 1.5 to 5 dual, 1.5 to 6 braced; from memory). */
const ALPHA: Partial<Readonly<Record<System, number>>> = {
  'concrete-shear-wall': 1,
  'reinforced-masonry-wall': 1,
  'confined-masonry-wall': 1,
  'unreinforced-masonry-wall': 1,
  'precast-tilt-up-wall': 1,
  'concrete-wall-frame': 3,
  'steel-concentric-braced-frame': 3,
  'steel-eccentric-braced-frame': 3,
  'steel-buckling-restrained-braced-frame': 3,
};
/** Up to this many storeys walls give way in shear more than they bend, and the shear building serves them too [judgement]. */
const SQUAT_STOREYS = 3;
const MOST_STOREYS = 100;

/** Demands of the leading case in both directions. */
export function demandsOf(
  building: Building,
  cases: Cases,
  choice: SpectrumChoice,
  leading: LeadingCase,
  context: AssessContext,
  trace?: Trace,
): PerDirection<DirectionDemand> {
  const found = {} as Record<DirectionName, DirectionDemand>;
  for (const direction of DIRECTIONS) {
    const isSame = direction === 'transverse' && leading.directions.transverse === leading.directions.longitudinal;
    if (isSame) {
      found.transverse = found.longitudinal;
      continue;
    }
    trace?.heading(`Base shear and drift, ${direction} (no part of the priority)`);
    found[direction] = demandOf(building, cases, choice, leading, direction, context, trace);
  }
  return found;
}

function demandOf(
  building: Building,
  cases: Cases,
  choice: SpectrumChoice,
  leading: LeadingCase,
  direction: DirectionName,
  context: AssessContext,
  trace?: Trace,
): DirectionDemand {
  const which = cases.list[0]!;
  const system = direction === 'longitudinal' ? which.system : which.system_transverse;
  const { period_s, sa_g } = leading.directions[direction];
  const height_m = building.height_m.value;
  const storeys = Math.min(MOST_STOREYS, Math.max(1, Math.round(building.storeys.value)));
  const mass_share = massFactorOf(system, storeys, period_s);
  apply(BASE_SHEAR_ELASTIC, { sa_g, mass_share }, trace);
  if (trace !== undefined)
    codeShear({ building, system, storeys, spectrum: choice.spectrum, period_s, context, trace });
  const sd_m = apply(SPECTRAL_DISPLACEMENT, { sa_g, period_s }, trace);
  let c1 = 1;
  let c2 = 1;
  if (building.capacity_sa_g > 0)
    trace?.choice({
      question: 'Inelastic displacement',
      taken: 'as the elastic one',
      because: 'a finished assessment gives one capacity, which cannot be split into strength and ductility',
      others: [],
    });
  else {
    const yield_coefficient = yieldCoefficient(building, which, direction, context, trace);
    const strength_ratio = apply(STRENGTH_RATIO, { sa_g, mass_share, yield_coefficient }, trace);
    c1 = apply(C1, { strength_ratio, site_factor_a: siteFactor(building, trace), period_s }, trace);
    c2 = apply(C2, { strength_ratio, period_s }, trace);
  }
  const { participation, drift_factor, profile } = shapeOf(building, system, direction, storeys, context, trace);
  const roof_displacement_m = apply(ROOF_DISPLACEMENT, { sd_m, participation, c1, c2 }, trace);
  const drift_ratio = apply(STOREY_DRIFT, { roof_displacement_m, height_m, drift_factor }, trace);
  const { passed, marks } = driftMark(system, drift_ratio);
  trace?.value(
    'drift mark',
    passed === null ? `within ${MARK_NAMES[0]}` : `past ${passed}`,
    'computed',
    `published marks ${marks.map((mark) => formatDrift(mark)).join(', ')} for immediate occupancy, life safety, collapse prevention (FEMA 356 Table C1-3, from memory); a screening value, not a finding`,
  );
  return { period_s, roof_displacement_m, drift_ratio, passed, profile };
}

/** c_y of the capacity that ranks, by whichever way that was come by. */
function yieldCoefficient(
  building: Building,
  which: Case,
  direction: DirectionName,
  context: AssessContext,
  trace?: Trace,
): number {
  const { at, way } = strengthOf(building, which, direction, context);
  trace?.choice({
    question: 'Strength behind the inelastic displacement',
    taken: way,
    because: 'the capacity of the hand calculation above, before ductility and mass share',
    others: [],
  });
  const irregularity = centralFactor(building, which, context);
  const { strength_coefficient, overstrength, checkFactors } = at;
  if (checkFactors !== undefined)
    return apply(YIELD_OF_CHECK, { strength_coefficient, ...checkFactors, irregularity }, trace);
  return apply(YIELD_COEFFICIENT, { strength_coefficient, overstrength, irregularity }, trace);
}

const formatDrift = (ratio: number): string => `${String(Number((ratio * 100).toFixed(2)))} %`;

/** a of C1 by site class: 130 (A, B), 90 (C), 60 (D and softer, and where it is not known: the larger displacement). */
function siteFactor({ site_class }: Building, trace?: Trace): number {
  const letter = site_class?.trim().toUpperCase() ?? '';
  const a = letter === 'A' || letter === 'B' ? 130 : letter === 'C' ? 90 : 60;
  trace?.value(
    'site_factor_a',
    a,
    'computed',
    `site class ${letter === '' ? 'not known' : letter}; ASCE/SEI 41-17 7.4.1.3.1`,
  );
  return a;
}

/** β₁ and β₂: of the shear building, whose first storey may be soft, or of walls with what frames stand beside them. */
function shapeOf(
  building: Building,
  system: System,
  direction: DirectionName,
  storeys: number,
  context: AssessContext,
  trace?: Trace,
): { readonly participation: number; readonly drift_factor: number; readonly profile: SwayProfile | null } {
  const given = building.storey_stiffness_kN_per_m[direction];
  const soft = softFirstStorey(building, system, context);
  const alpha = ALPHA[system];
  const byList = given !== null && given.length === storeys && storeys > 1;
  if (alpha !== undefined && storeys > SQUAT_STOREYS && !byList && soft === null) {
    const ratio = { stiffness_ratio: alpha };
    trace?.value(
      'stiffness_ratio',
      alpha,
      'assumed',
      `frame over wall, α, of ${system} [judgement within published ranges]`,
    );
    return {
      participation: applyAny(WALL_PARTICIPATION, ratio, trace),
      drift_factor: applyAny(WALL_DRIFT, ratio, trace),
      profile: null,
    };
  }
  const stiffness = byList
    ? [...given]
    : Array.from({ length: storeys }, (_, i) => (i === 0 && soft !== null ? soft.share : 1));
  const chain = { masses_t: stiffness.map(() => 1), storey_stiffness_kN_per_m: stiffness };
  trace?.choice({
    question: 'Shape of the sway',
    taken: byList
      ? 'shear building of the storey stiffness given'
      : soft === null
        ? 'shear building, storeys alike'
        : `shear building, first storey ${formatShare(soft.share)} as stiff as the others`,
    because: byList
      ? 'from the inventory; floors of equal mass'
      : soft === null
        ? 'nothing tells the storeys apart'
        : soft.why,
    others: [],
  });
  const heights_m = storeyHeightsOf(building, storeys);
  const alike = heights_m.every((height) => height === heights_m[0]);
  if (storeys > 1) apply(FIRST_STOREY_SHARE, chain, trace);
  return {
    participation: apply(PARTICIPATION, { ...chain, mode: 1 }, trace),
    drift_factor: alike
      ? apply(DRIFT_FACTOR, chain, trace)
      : apply(DRIFT_FACTOR_OF_HEIGHTS, { ...chain, storey_heights_m: heights_m }, trace),
    profile: profileOf(heights_m, chain),
  };
}

/** Storey heights, bottom to top: alike but for the first where the row has it. */
function storeyHeightsOf(
  { height_m: { value: height_m }, first_storey_height_m: first_m }: Building,
  storeys: number,
): number[] {
  const known = storeys > 1 && first_m > 0 && first_m < height_m;
  const upper_m = known ? (height_m - first_m) / (storeys - 1) : height_m / storeys;
  return Array.from({ length: storeys }, (_, i) => (known && i === 0 ? first_m : upper_m));
}

function profileOf(
  heights_m: readonly number[],
  { masses_t, storey_stiffness_kN_per_m }: ChainInput,
): SwayProfile | null {
  if (heights_m.length < 2) return null;
  let floor_m = 0;
  const floors_m = heights_m.map((height) => (floor_m += height));
  return { floors_m, shares: [...chainMode(masses_t, storey_stiffness_kN_per_m).shape] };
}

/** Share of the roof's displacement at a height, straight from floor to floor. */
export function swayShareAt(profile: SwayProfile | null, roof_m: number, height_m: number): number {
  if (height_m >= roof_m) return 1;
  if (profile === null) return height_m / roof_m;
  const { floors_m, shares } = profile;
  const above = floors_m.findIndex((floor) => floor >= height_m);
  if (above < 0) return 1;
  const [low_m, low] = above === 0 ? [0, 0] : [floors_m[above - 1]!, shares[above - 1]!];
  return low + ((height_m - low_m) / (floors_m[above]! - low_m)) * (shares[above]! - low);
}
