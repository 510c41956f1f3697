/**
 * One period per direction. A measured one governs; otherwise one estimate per kind of evidence counts: the first formula of the chosen
 * standard that the row can feed, and the best stiffness route it allows, combined in ln T.
 */
import type { Building, DirectionName, System } from '../building.js';
import { apply, applyAny } from '../formula.js';
import type { AnyRecord, Inputs } from '../formula.js';
import { exp, ln } from '../numeric/elementary.js';
import { inputNames, toStrongShaking } from '../period/choose.js';
import type { Trace } from '../trace.js';
import { entryOf, newMap } from './case-memory.js';
import { COMBINED_PERIOD } from './combine.js';
import type { AssessContext } from './context.js';
import { chosenFormula, measured, routePeriods, stiffnessPeriod, strongPeriod } from './evidence.js';
import type { MeasuredPeriod } from './evidence.js';
import type { PeriodModel } from './period-model.js';
import { formulaInputs } from './formula-inputs.js';

/** Why a building has no period. */
export const NO_PERIOD = 'no method gives a period: those the study leaves on need what is not on record';

export type { Evidence, PeriodBasis, PeriodModel } from './period-model.js';

const SWAY_FORMULA = 'en1998-1-2004/period/gravity-sway';

/** The evidence for the period of one direction. Null when nothing speaks: all methods switched off, or a formula that the row cannot feed. */
export function periodModel(
  building: Building,
  direction: DirectionName,
  system: System,
  context: AssessContext,
  trace?: Trace,
): PeriodModel | null {
  if (trace !== undefined || context.periodMemory === null)
    return newModel(building, direction, system, context, trace);
  const ofBuilding = entryOf(context.periodMemory, building, newMap<string, PeriodModel | null>);
  const key = `${direction} ${system}`;
  let found = ofBuilding.get(key);
  if (found === undefined) ofBuilding.set(key, (found = newModel(building, direction, system, context)));
  return found;
}

function newModel(
  building: Building,
  direction: DirectionName,
  system: System,
  context: AssessContext,
  trace?: Trace,
): PeriodModel | null {
  const known = measured(building, direction, system, context, trace);
  if (known !== null) return measuredModel(building, direction, system, context, known, trace);
  const stiffness = stiffnessPeriod(building, direction, system, context, trace);
  const found = chosenFormula(building, direction, system, context, trace);
  // one sway on record is one piece of evidence, whichever name it goes by
  const formula = stiffness !== null && found?.record.id === SWAY_FORMULA ? null : found;
  if (stiffness === null && formula === null) return null;
  if (stiffness !== null && formula !== null) {
    trace?.choice({
      question: 'Which evidence counts',
      taken: 'formula and stiffness, combined',
      because: 'two kinds of evidence; no measurement',
      others: [],
    });
  }
  return {
    evidence: stiffness === null ? 'formula' : formula === null ? 'stiffness' : 'formula and stiffness',
    basis: formula === null ? 'mechanics' : (formula.record.basis ?? 'design'),
    formula: formula === null ? null : formula.record,
    inputsAt: formula === null || formula.plain ? null : inputsOf(formula.record, building, direction, system),
    strengthened: formula?.record.basis === 'ambient' ? toStrongShaking(system) : null,
    period_s: stiffness?.period_s ?? NaN,
    stiffnessAt: stiffness === null ? null : atOtherHeights(building, direction, system, context),
    sigma: stiffness?.sigma ?? NaN,
    sharedSigma: stiffness?.massSigma ?? 0,
    measuredId: null,
    routeId: stiffness?.id ?? null,
    assumed: stiffness !== null && (stiffness.flags.length > 0 || stiffness.low_s !== stiffness.high_s),
    checks: routePeriods(building, direction, system, context),
  };
}

function measuredModel(
  building: Building,
  direction: DirectionName,
  system: System,
  context: AssessContext,
  known: MeasuredPeriod,
  trace?: Trace,
): PeriodModel {
  const formula = chosenFormula(building, direction, system, context);
  const stiffness = stiffnessPeriod(building, direction, system, context);
  trace?.choice({
    question: 'Which evidence counts',
    taken: 'the measured period',
    because: 'a measurement governs; the others are checks',
    others: [
      ...(formula === null ? [] : [{ what: formula.record.title, why: 'a formula knows less than a measurement' }]),
      ...(stiffness === null ? [] : [{ what: stiffness.title, why: 'a model knows less than a measurement' }]),
    ],
  });
  const checks = [...routePeriods(building, direction, system, context)];
  if (formula !== null) checks.push(formulaPeriod(formula.record, building, direction, system));
  if (stiffness !== null) checks.push(stiffness.period_s);
  return {
    evidence: 'measured',
    basis: 'measured',
    formula: null,
    inputsAt: null,
    strengthened: null,
    period_s: known.period_s,
    stiffnessAt: null,
    sigma: known.sigma,
    sharedSigma: 0,
    measuredId: known.id,
    routeId: null,
    assumed: false,
    checks,
  };
}

function inputsOf(
  record: AnyRecord,
  building: Building,
  direction: DirectionName,
  system: System,
): (height_m: number) => Inputs {
  return (height_m) => {
    const fed = formulaInputs(record, building, system, direction, height_m);
    if (typeof fed === 'string') throw new Error(`${record.id}: ${fed}`);
    return fed.inputs;
  };
}

/** The period (s) of a formula at the height of record, lengthened for strong shaking where it is a law of small amplitude. */
function formulaPeriod(record: AnyRecord, building: Building, direction: DirectionName, system: System): number {
  const period_s = applyAny(record, inputsOf(record, building, direction, system)(building.height_m.value));
  return record.basis === 'ambient' ? strongPeriod(toStrongShaking(system), period_s) : period_s;
}

/**
 * True where the transverse period of a building of one system is the longitudinal one, whose `model` this is: a formula that reads
 * nothing of a direction, and nothing on record that would make another one count across.
 */
export function alikeAcross(building: Building, model: PeriodModel, system: System, context: AssessContext): boolean {
  if (model.evidence !== 'formula' || building.structure !== null) return false;
  if (building.measured_period_s.transverse > 0 || building.storey_stiffness_kN_per_m.transverse !== null) return false;
  const [first] = context.formulas[system];
  if (first?.plain === true && first.record === model.formula) return true;
  // without a structure on record the plan is all that tells the directions apart
  return (
    Object.is(building.plan_length_m, building.plan_width_m) ||
    !context.formulas[system].some(({ record }) => inputNames(record).includes('plan_dimension_m'))
  );
}

/** The stiffness period at the nodes of an inferred height; null where the height is known. */
function atOtherHeights(
  building: Building,
  direction: DirectionName,
  system: System,
  context: AssessContext,
): ((height_m: number) => number) | null {
  if (!(building.height_m.sigma > 0)) return null;
  // given storey stiffness depends on the height only where the first storey has a height of its own
  if (building.structure === null && !(building.first_storey_height_m > 0)) return null;
  return (value) =>
    stiffnessPeriod({ ...building, height_m: { ...building.height_m, value } }, direction, system, context)?.period_s ??
    NaN;
}

export interface PeriodEstimate {
  readonly period_s: number;
  /** Spread of ln T without the height's. */
  readonly sigma: number;
  /** Largest estimate over the smallest; 1 with a single one. */
  readonly disagreement: number;
}

/** Largest over smallest of the checks and an estimate (s). */
function apart(checks: readonly number[], period_s: number): number {
  let low = period_s;
  let high = period_s;
  for (const check of checks) {
    if (check < low) low = check;
    if (check > high) high = check;
  }
  return high / low;
}

/** The period at a given height. */
export function periodAt(model: PeriodModel, height_m: number, context: AssessContext, trace?: Trace): PeriodEstimate {
  const { spreads } = context.settings;
  if (model.evidence === 'measured')
    return { period_s: model.period_s, sigma: model.sigma, disagreement: apart(model.checks, model.period_s) };
  const byStiffness = model.stiffnessAt === null ? model.period_s : model.stiffnessAt(height_m);
  if (model.formula === null) {
    const sigma = Math.max(model.sigma, spreads.leastPeriod);
    return {
      period_s: byStiffness,
      sigma: Math.sqrt(sigma * sigma + model.sharedSigma * model.sharedSigma),
      disagreement: apart(model.checks, byStiffness),
    };
  }
  const printed = applyAny(model.formula, model.inputsAt === null ? { height_m } : model.inputsAt(height_m), trace);
  const byFormula = model.strengthened === null ? printed : strongPeriod(model.strengthened, printed, trace);
  if (Number.isNaN(byStiffness))
    return { period_s: byFormula, sigma: Math.max(spreads.heightFormula, spreads.leastPeriod), disagreement: 1 };
  const input = {
    period_1_s: byFormula,
    sigma_1: spreads.heightFormula,
    period_2_s: byStiffness,
    sigma_2: model.sigma,
  };
  const period_s = apply(COMBINED_PERIOD, input, trace);
  const w1 = 1 / (input.sigma_1 * input.sigma_1);
  const w2 = 1 / (input.sigma_2 * input.sigma_2);
  const gap = ln(byFormula / byStiffness);
  // two estimates: chi-square with one degree of freedom, the squared Birge ratio
  const chiSquare = ((w1 * w2) / (w1 + w2)) * gap * gap;
  const variance = Math.max(1, chiSquare) / (w1 + w2);
  const sigma = Math.max(Math.sqrt(variance), spreads.leastPeriod);
  const share = w2 / (w1 + w2);
  return {
    period_s,
    sigma: Math.sqrt(sigma * sigma + share * share * model.sharedSigma * model.sharedSigma),
    disagreement: Math.max(exp(Math.abs(gap)), apart(model.checks, byFormula)),
  };
}
