/**
 * Every estimate of a building's period side by side: the measured one, the stiffness routes, the formulas of the study's standard, those
 * of the other standards and the research regressions; which of them count, and why the others do not or do not apply.
 */
import type { Building, DirectionName, System } from '../building.js';
import { applyAny } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import { exp, ln } from '../numeric/elementary.js';
import {
  PERIOD_STANDARDS,
  candidates,
  formsBeside,
  regressionsFor,
  standardRead,
  toStrongShaking,
} from '../period/choose.js';
import type { Basis, PeriodStandard } from '../period/choose.js';
import { cite } from '../source.js';
import { stiffnessRoutes } from '../stiffness/routes.js';
import { PERIOD_LENGTHENING } from '../stiffness/soil.js';
import type { AssessContext } from './context.js';
import { forbiddenBy, formulaInputs, limitNotes } from './formula-inputs.js';
import { measuredRecord, onGround, strongPeriod } from './evidence.js';
import type { Estimate, EstimateKind } from './estimate.js';
import { NO_PERIOD, periodAt, periodModel } from './period.js';
import type { PeriodModel } from './period.js';

interface Where {
  readonly building: Building;
  readonly direction: DirectionName;
  readonly system: System;
  readonly context: AssessContext;
}

/**
 * All estimates of the period (s) of one direction, were the lateral system `system`. The first is the one used, combined from those
 * that count; then measured, stiffness, the study's standard, other standards, regressions.
 */
export function periodEstimates(
  building: Building,
  direction: DirectionName,
  system: System,
  context: AssessContext,
): readonly Estimate[] {
  const where: Where = { building, direction, system, context };
  const model = periodModel(building, direction, system, context);
  const counted = new Set(model === null ? [] : [model.measuredId, model.formula?.id, model.routeId]);
  return [
    used(where),
    measuredEstimate(where, counted),
    ...routeEstimates(where, counted),
    ...standardEstimates(where, counted),
    ...otherStandards(where),
    ...regressions(where),
  ];
}

function used({ building, direction, system, context }: Where): Estimate {
  const base = { kind: 'used', id: 'used', title: 'Period used', source: '', mark: '', basis: '' } as const;
  const model = periodModel(building, direction, system, context);
  if (model === null) return { ...base, outcome: { applies: false, reason: NO_PERIOD } };
  const { period_s, sigma, disagreement } = periodAt(model, building.height_m.value, context);
  const height = heightSigma(building, model, period_s, context);
  const spread = Math.sqrt(sigma * sigma + height * height);
  return {
    ...base,
    basis: model.basis,
    outcome: {
      applies: true,
      period_s,
      low_s: period_s * exp(-spread),
      high_s: period_s * exp(spread),
      counts: true,
      why:
        model.evidence === 'formula and stiffness'
          ? 'formula and stiffness, combined in ln T by inverse variance'
          : `from the ${WORDS[model.evidence]}`,
      notes: disagreement >= 2 ? ['two estimates are a factor of 2 or more apart'] : [],
    },
  };
}

const HEIGHT_STEP = 1.02;

/** Spread of ln T that an inferred height brings to the period used. */
function heightSigma({ height_m }: Building, model: PeriodModel, period_s: number, context: AssessContext): number {
  if (!(height_m.sigma > 0)) return 0;
  const other = periodAt(model, height_m.value * HEIGHT_STEP, context).period_s;
  return (Math.abs(ln(other / period_s)) / ln(HEIGHT_STEP)) * height_m.sigma;
}

const WORDS = {
  measured: 'measured period',
  formula: 'height formula',
  stiffness: 'stiffness',
  'formula and stiffness': '',
};

function measuredEstimate(
  { building, direction, system, context }: Where,
  counted: ReadonlySet<string | null | undefined>,
): Estimate {
  const record = measuredRecord(building, system);
  const base = {
    kind: 'measured',
    id: record.id,
    title: record.title,
    source: cite(record.source),
    mark: record.verified,
    basis: 'measured',
  } as const;
  const given = building.measured_period_s[direction];
  if (!(given > 0)) return { ...base, outcome: { applies: false, reason: 'no measured period in this direction' } };
  const period_s = strongPeriod(record, given);
  const { spreads } = context.settings;
  const sigma = Math.max(
    building.measured_amplitude === 'strong' ? spreads.measuredStrong : spreads.measuredSmall,
    spreads.leastMeasured,
  );
  const counts = counted.has(record.id);
  return {
    ...base,
    outcome: {
      applies: true,
      period_s,
      low_s: period_s * exp(-sigma),
      high_s: period_s * exp(sigma),
      counts,
      why: counts ? 'a measurement governs; the others are checks' : 'switched off by the study',
      notes: period_s === given ? [] : [`measured ${String(given)} s at small amplitude`],
    },
  };
}

function routeEstimates(
  { building, direction, system, context }: Where,
  counted: ReadonlySet<string | null | undefined>,
): readonly Estimate[] {
  const { spreads, period } = context.settings;
  const grounded = !period.switchedOff.includes(PERIOD_LENGTHENING.id);
  return stiffnessRoutes(building, direction, system, spreads).map((fixed): Estimate => {
    const base = {
      kind: 'stiffness',
      id: fixed.id,
      title: fixed.title,
      source: 'mass and stiffness',
      mark: 'mechanics',
      basis: 'mechanics',
    } as const;
    if ('reason' in fixed) return { ...base, outcome: { applies: false, reason: fixed.reason } };
    const route = grounded ? onGround(building, direction, system, fixed, spreads) : fixed;
    const spread = Math.sqrt(
      route.sigma * route.sigma + route.massSigma * route.massSigma + route.heightSigma * route.heightSigma,
    );
    const counts = counted.has(route.id);
    return {
      ...base,
      outcome: {
        applies: true,
        period_s: route.period_s,
        low_s: Math.min(route.low_s, route.period_s * exp(-spread)),
        high_s: Math.max(route.high_s, route.period_s * exp(spread)),
        counts,
        why: counts ? 'the best stiffness route that the row allows' : whyNot(counted, route.id, context),
        notes: route.flags,
      },
    };
  });
}

function whyNot(counted: ReadonlySet<string | null | undefined>, id: string, { settings }: AssessContext): string {
  if (settings.period.switchedOff.includes(id)) return 'switched off by the study';
  return [...counted].some((each) => each?.includes('/measured-') === true)
    ? 'a check: a measurement governs'
    : 'one of its kind counts, and a better one does';
}

function standardEstimates(where: Where, counted: ReadonlySet<string | null | undefined>): readonly Estimate[] {
  const { system, context } = where;
  const { standard, basis } = context.settings.period;
  const asked = context.formulas[system].map(({ record }) =>
    formulaEstimate('standard', record, where, counted.has(record.id), whyNot(counted, record.id, context)),
  );
  const beside = formsBeside(system, standard, basis)
    .filter(({ id }) => !asked.some((each) => each.id === id))
    .map((record) =>
      formulaEstimate('standard', record, where, false, 'the standard allows it beside the form that counts'),
    );
  return [...asked, ...beside];
}

function otherStandards(where: Where): readonly Estimate[] {
  const { context, system } = where;
  const { standard, basis } = context.settings.period;
  const own = standardRead(standard, basis);
  const shown = new Set([
    ...context.formulas[system].map(({ record }) => record.id),
    ...formsBeside(system, standard, basis).map(({ id }) => id),
  ]);
  // asked for the basis that each standard has: its own set, never a substitute
  return PERIOD_STANDARDS.filter((each) => each !== own).flatMap((each) =>
    [...candidates(system, each, ownBasis(each)), ...formsBeside(system, each, ownBasis(each))].flatMap((record) => {
      if (shown.has(record.id)) return [];
      shown.add(record.id);
      return [
        formulaEstimate(
          'other standard',
          record,
          where,
          false,
          'shown for comparison: the study reads another standard',
        ),
      ];
    }),
  );
}

const ownBasis = (standard: PeriodStandard): Basis =>
  standardRead(standard, 'design') === standard ? 'design' : 'best-fit';

/** Those that the study asks for stand among its candidates. */
function regressions(where: Where): readonly Estimate[] {
  const { context, system } = where;
  const asked = new Set(context.formulas[system].map(({ record }) => record.id));
  return regressionsFor(system)
    .filter(({ id }) => !asked.has(id))
    .map((record) =>
      formulaEstimate(
        'regression',
        record,
        where,
        false,
        'shown for comparison: a regression is not asked for by the study',
      ),
    );
}

function formulaEstimate(
  kind: EstimateKind,
  record: AnyRecord,
  where: Where,
  counts: boolean,
  otherwise: string,
): Estimate {
  const { building, direction, system, context } = where;
  const height_m = building.height_m.value;
  const base = {
    kind,
    id: record.id,
    title: record.title,
    source: cite(record.source),
    mark: record.verified,
    basis: record.basis ?? '',
  };
  const forbidden = forbiddenBy(record, building, system, direction, height_m);
  if (forbidden !== null) return { ...base, outcome: { applies: false, reason: forbidden } };
  const found = formulaInputs(record, building, system, direction, height_m);
  if (typeof found === 'string') return { ...base, outcome: { applies: false, reason: found } };
  const printed = applyAny(record, found.inputs);
  const period_s = record.basis === 'ambient' ? strongPeriod(toStrongShaking(system), printed) : printed;
  const sigma = Math.max(context.settings.spreads.heightFormula, context.settings.spreads.leastPeriod);
  return {
    ...base,
    outcome: {
      applies: true,
      period_s,
      low_s: period_s * exp(-sigma),
      high_s: period_s * exp(sigma),
      counts,
      why: counts ? 'the formula of the chosen standard' : otherwise,
      notes: [
        ...(printed === period_s ? [] : ['a law of small amplitude, lengthened for strong shaking']),
        ...found.assumed,
        ...limitNotes(record, building, system, direction, height_m),
      ],
    },
  };
}
