/** One period per direction: measured, or the height formula and the storey stiffness combined. */
import { exp, ln } from '../numeric/elementary.js';
import type { Building, DirectionName, System } from '../building.js';
import { apply, applyAny } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import { MEASURED_SMALL, MEASURED_SMALL_BRITTLE, MEASURED_STRONG } from '../period/measured-records.js';
import { UNIT_WEIGHT_KN_PER_M2 } from '../prior/unit-weight.js';
import {
  FLOOR_MASS,
  GENERAL_CHAIN,
  SINGLE_MASS,
  SOFT_FIRST_COLUMNS,
  SOFT_FIRST_WALLS,
  UNIFORM_CHAIN,
  WEIGHT_OF_AREA,
} from '../stiffness/records.js';
import type { Trace } from '../trace.js';
import type { AssessContext } from './context.js';
import { COMBINED_PERIOD } from './combine.js';

export type Evidence = 'measured' | 'formula' | 'stiffness' | 'formula and stiffness';

/** What is known of the period before the height is fixed. */
export interface PeriodModel {
  readonly evidence: Evidence;
  readonly formula: AnyRecord | null;
  /** Measured or stiffness period, NaN when there is none. */
  readonly period_s: number;
  /** Spread of ln T of that period. */
  readonly sigma: number;
  /** Spread of ln T of the shared input (mass), added once after combining. */
  readonly sharedSigma: number;
}

const WALLS: ReadonlySet<System> = new Set<System>([
  'concrete-shear-wall',
  'reinforced-masonry-wall',
  'confined-masonry-wall',
  'unreinforced-masonry-wall',
  'precast-tilt-up-wall',
]);
const BRITTLE: ReadonlySet<System> = new Set<System>(['concrete-infilled-frame', 'unreinforced-masonry-wall']);

function measured(
  building: Building,
  direction: DirectionName,
  system: System,
  context: AssessContext,
  trace?: Trace,
): PeriodModel | null {
  const value = building.measured_period_s[direction];
  if (!(value > 0)) return null;
  const strong = building.measured_amplitude === 'strong';
  const method = strong ? MEASURED_STRONG : BRITTLE.has(system) ? MEASURED_SMALL_BRITTLE : MEASURED_SMALL;
  const off = context.settings.period.switchedOff;
  if (off.includes(method.id)) return null;
  const period_s = apply(method, { period_s: value }, trace);
  const { measuredStrong, measuredSmall, leastMeasured } = context.settings.spreads;
  return {
    evidence: 'measured',
    formula: null,
    period_s,
    sigma: Math.max(strong ? measuredStrong : measuredSmall, leastMeasured),
    sharedSigma: 0,
  };
}

interface StiffnessPeriod {
  readonly period_s: number;
  readonly massSigma: number;
}

/** Period of the shear chain from the storey stiffness the row gives; null with the reason noted when something is missing. */
function fromStiffness(
  building: Building,
  direction: DirectionName,
  system: System,
  context: AssessContext,
  trace?: Trace,
): StiffnessPeriod | null {
  const given = building.storey_stiffness_kN_per_m[direction];
  if (given === null) return null;
  const storeys = Math.max(1, Math.round(building.storeys.value));
  if (!(storeys >= 1) || (given.length > 1 && given.length !== storeys)) {
    trace?.choice({
      question: 'Period from storey stiffness',
      taken: 'not used',
      because: `${String(given.length)} storey stiffnesses for ${String(storeys)} storeys`,
      others: [],
    });
    return null;
  }
  const weighed = building.seismic_weight_kN > 0;
  const perArea = building.unit_weight_kN_per_m2 > 0 ? building.unit_weight_kN_per_m2 : UNIT_WEIGHT_KN_PER_M2[system];
  if (!weighed && !(building.floor_area_m2.value > 0)) return null;
  if (!weighed && !(building.unit_weight_kN_per_m2 > 0)) {
    trace?.value('unit_weight_kN_per_m2', perArea, 'default', `unit weight of ${system} [judgement]`);
  }
  const weight_kN = weighed
    ? building.seismic_weight_kN
    : apply(WEIGHT_OF_AREA, { floor_area_m2: building.floor_area_m2.value, unit_weight_kN_per_m2: perArea }, trace);
  const mass_t = apply(FLOOR_MASS, { weight_kN, storeys }, trace);
  // T goes with the square root of the mass; a stated weight owes nothing to the floor area
  const areaSigma = building.floor_area_m2.sigma;
  const unitSigma = building.unit_weight_kN_per_m2 > 0 ? 0 : context.settings.spreads.unitWeight;
  const massSigma = weighed ? 0 : 0.5 * Math.sqrt(unitSigma * unitSigma + areaSigma * areaSigma);
  const springs = storeySprings(given, storeys, building, system, trace);
  const alike = springs.every((value) => value === springs[0]);
  const stiffness_kN_per_m = springs[0]!;
  const period_s =
    storeys === 1
      ? apply(SINGLE_MASS, { mass_t, stiffness_kN_per_m }, trace)
      : alike
        ? apply(UNIFORM_CHAIN, { storeys, mass_t, stiffness_kN_per_m }, trace)
        : apply(GENERAL_CHAIN, { masses_t: springs.map(() => mass_t), storey_stiffness_kN_per_m: springs }, trace);
  return { period_s, massSigma };
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

/** The evidence for the period of one direction. Null when nothing speaks (all methods switched off). */
export function periodModel(
  building: Building,
  direction: DirectionName,
  system: System,
  context: AssessContext,
  trace?: Trace,
): PeriodModel | null {
  const known = measured(building, direction, system, context, trace);
  const formula = context.formulas[system];
  if (known !== null) {
    trace?.choice({
      question: 'Which evidence counts',
      taken: 'the measured period',
      because: 'a measurement governs; the others are checks',
      others: [{ what: formula.title, why: 'a height formula knows only the height' }],
    });
    return known;
  }
  const off = context.settings.period.switchedOff;
  const stiffness = off.includes('mechanics/period')
    ? null
    : fromStiffness(building, direction, system, context, trace);
  const formulaOn = !off.includes(formula.id);
  if (stiffness !== null && formulaOn) {
    trace?.choice({
      question: 'Which evidence counts',
      taken: 'height formula and storey stiffness, combined',
      because: 'two kinds of evidence; no measurement',
      others: [],
    });
  }
  if (stiffness === null && !formulaOn) return null;
  return {
    evidence: stiffness === null ? 'formula' : formulaOn ? 'formula and stiffness' : 'stiffness',
    formula: formulaOn ? formula : null,
    period_s: stiffness?.period_s ?? NaN,
    sigma: context.settings.spreads.storeyStiffness,
    sharedSigma: stiffness?.massSigma ?? 0,
  };
}

export interface PeriodEstimate {
  readonly period_s: number;
  /** Spread of ln T without the height's. */
  readonly sigma: number;
  /** Largest estimate over the smallest; 1 with a single one. */
  readonly disagreement: number;
}

/** The period at a given height. */
export function periodAt(model: PeriodModel, height_m: number, context: AssessContext, trace?: Trace): PeriodEstimate {
  const { spreads } = context.settings;
  if (model.evidence === 'measured') return { period_s: model.period_s, sigma: model.sigma, disagreement: 1 };
  if (model.formula === null) {
    const sigma = Math.max(model.sigma, spreads.leastPeriod);
    return {
      period_s: model.period_s,
      sigma: Math.sqrt(sigma * sigma + model.sharedSigma * model.sharedSigma),
      disagreement: 1,
    };
  }
  const byFormula = applyAny(model.formula, { height_m }, trace);
  if (Number.isNaN(model.period_s))
    return { period_s: byFormula, sigma: Math.max(spreads.heightFormula, spreads.leastPeriod), disagreement: 1 };
  const input = {
    period_1_s: byFormula,
    sigma_1: spreads.heightFormula,
    period_2_s: model.period_s,
    sigma_2: model.sigma,
  };
  const period_s = apply(COMBINED_PERIOD, input, trace);
  const w1 = 1 / (input.sigma_1 * input.sigma_1);
  const w2 = 1 / (input.sigma_2 * input.sigma_2);
  const gap = ln(byFormula / model.period_s);
  // two estimates: chi-square with one degree of freedom, the squared Birge ratio
  const chiSquare = ((w1 * w2) / (w1 + w2)) * gap * gap;
  const variance = Math.max(1, chiSquare) / (w1 + w2);
  const sigma = Math.max(Math.sqrt(variance), spreads.leastPeriod);
  const share = w2 / (w1 + w2);
  return {
    period_s,
    sigma: Math.sqrt(sigma * sigma + share * share * model.sharedSigma * model.sharedSigma),
    disagreement: exp(Math.abs(gap)),
  };
}
