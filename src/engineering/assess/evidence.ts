/** The three kinds of evidence for a period, one by one: measured, the formula of the standard, the best stiffness route. */
import type { Building, DirectionName, System } from '../building.js';
import { formatNumber } from '../format.js';
import { apply, applyAny } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import { toStrongShaking } from '../period/choose.js';
import { MEASURED_STRONG } from '../period/measured-records.js';
import { foundationFactor } from '../stiffness/foundation.js';
import { massOf } from '../stiffness/route-mass.js';
import { bestStiffnessRoute, stiffnessRoutes } from '../stiffness/routes.js';
import type { RouteSpreads, StiffnessRoute } from '../stiffness/routes.js';
import { PERIOD_LENGTHENING } from '../stiffness/soil.js';
import type { Trace } from '../trace.js';
import { FLEXIBLE_BASE } from './combine.js';
import type { AssessContext, Candidate } from './context.js';
import { forbiddenBy, formulaInputs } from './formula-inputs.js';

/** The record that brings a measured period to strong shaking. */
export function measuredRecord(
  { measured_amplitude }: Pick<Building, 'measured_amplitude'>,
  system: System,
): AnyRecord {
  return measured_amplitude === 'strong' ? MEASURED_STRONG : toStrongShaking(system);
}

/** A period of small amplitude (s) brought to strong shaking by `record`. */
export function strongPeriod(record: AnyRecord, period_s: number, trace?: Trace): number {
  return applyAny(record, { period_s }, trace);
}

export interface MeasuredPeriod {
  /** Of the record that brought it to strong shaking. */
  readonly id: string;
  readonly period_s: number;
  /** Spread of ln T. */
  readonly sigma: number;
}

/** The measured period (s) of a direction brought to strong shaking, with the spread of its logarithm. */
export function measured(
  building: Building,
  direction: DirectionName,
  system: System,
  context: AssessContext,
  trace?: Trace,
): MeasuredPeriod | null {
  const value = building.measured_period_s[direction];
  if (!(value > 0)) return null;
  const method = measuredRecord(building, system);
  if (context.settings.period.switchedOff.includes(method.id)) return null;
  const { measuredStrong, measuredSmall, leastMeasured } = context.settings.spreads;
  const strong = building.measured_amplitude === 'strong';
  return {
    id: method.id,
    period_s: strongPeriod(method, value, trace),
    sigma: Math.max(strong ? measuredStrong : measuredSmall, leastMeasured),
  };
}

/** The first candidate that is not switched off, not forbidden by a limit and fed by the row, with those passed over. */
export function chosenFormula(
  building: Building,
  direction: DirectionName,
  system: System,
  context: AssessContext,
  trace?: Trace,
): Candidate | null {
  const passed: { what: string; why: string }[] = [];
  for (const candidate of context.formulas[system]) {
    if (context.settings.period.switchedOff.includes(candidate.record.id)) {
      if (trace !== undefined) passed.push({ what: candidate.record.title, why: 'switched off by the study' });
      continue;
    }
    if (candidate.plain) {
      if (passed.length > 0) noteFormula(candidate.record, passed, trace);
      return candidate;
    }
    const { record } = candidate;
    const height_m = building.height_m.value;
    const forbidden = forbiddenBy(record, building, system, direction, height_m);
    const fed = forbidden ?? formulaInputs(record, building, system, direction, height_m);
    if (typeof fed === 'string') {
      if (trace !== undefined) passed.push({ what: record.title, why: fed });
      continue;
    }
    noteFormula(record, passed, trace, fed.assumed);
    return candidate;
  }
  if (passed.length > 0) {
    trace?.choice({
      question: 'Which formula',
      taken: 'none',
      because: 'none of the standard can be used',
      others: passed,
    });
  }
  return null;
}

function noteFormula(
  record: AnyRecord,
  others: readonly { what: string; why: string }[],
  trace?: Trace,
  assumed: readonly string[] = [],
): void {
  const because = ['the first of the chosen standard that the row can feed', ...assumed].join('; ');
  trace?.choice({ question: 'Which formula', taken: record.title, because, others });
}

/** The best stiffness route that the row allows and the study does not switch off, on the ground it stands on. */
export function stiffnessPeriod(
  building: Building,
  direction: DirectionName,
  system: System,
  { settings }: AssessContext,
  trace?: Trace,
): StiffnessRoute | null {
  // most rows know nothing of it: a million of them should not pay for more
  if (building.structure === null && building.storey_stiffness_kN_per_m[direction] === null) return null;
  const { spreads, period } = settings;
  const route = bestStiffnessRoute(building, direction, system, spreads, period.switchedOff, trace);
  if (route === null) return null;
  if (trace !== undefined) noteRoute(building, direction, system, route, spreads, trace);
  if (period.switchedOff.includes(PERIOD_LENGTHENING.id)) return route;
  return onGround(building, direction, system, route, spreads, trace);
}

function noteRoute(
  building: Building,
  direction: DirectionName,
  system: System,
  route: StiffnessRoute,
  spreads: RouteSpreads,
  trace: Trace,
): void {
  const others = stiffnessRoutes(building, direction, system, spreads).flatMap((other) =>
    'reason' in other || other.id === route.id
      ? []
      : [{ what: `${other.title}, ${formatNumber(other.period_s)} s`, why: 'a better model of the row counts' }],
  );
  const because = route.flags.length === 0 ? 'the best stiffness model that the row allows' : route.flags.join('; ');
  trace.choice({ question: 'Which stiffness model', taken: route.title, because, others });
}

const NONE: readonly number[] = [];

/** Periods (s) of all stiffness routes that apply: what the one that counts is checked against. */
export function routePeriods(
  building: Building,
  direction: DirectionName,
  system: System,
  { settings }: AssessContext,
): readonly number[] {
  if (building.structure === null) return NONE;
  return stiffnessRoutes(building, direction, system, settings.spreads).flatMap((route) =>
    'reason' in route ? [] : [route.period_s],
  );
}

/** A route's period on the ground of record: longer where the ground is soft against the building. */
export function onGround(
  building: Building,
  direction: DirectionName,
  system: System,
  route: StiffnessRoute,
  spreads: RouteSpreads,
  trace?: Trace,
): StiffnessRoute {
  const context = {
    building,
    direction,
    system,
    spreads,
    height_m: building.height_m.value,
    assumed: 'usual',
    trace: undefined,
  } as const;
  const weight_kN = massOf(context)?.weight_kN ?? NaN;
  const found = foundationFactor(building, direction, route.period_s, weight_kN);
  if (typeof found === 'string' || !found.worthCounting) {
    const because =
      typeof found === 'string' ? found : 'the ground is stiff against the building: h/(Vs T) of 0.1 or less';
    trace?.choice({ question: 'Foundation flexibility', taken: 'not counted', because, others: [] });
    return route;
  }
  // once more, so that its steps are written only where they count
  if (trace !== undefined) foundationFactor(building, direction, route.period_s, weight_kN, trace);
  const { factor: period_ratio } = found;
  return {
    ...route,
    period_s: apply(FLEXIBLE_BASE, { period_ratio, period_s: route.period_s }, trace),
    low_s: apply(FLEXIBLE_BASE, { period_ratio, period_s: route.low_s }),
    high_s: apply(FLEXIBLE_BASE, { period_ratio, period_s: route.high_s }),
    flags: [...route.flags, ...found.flags],
  };
}
