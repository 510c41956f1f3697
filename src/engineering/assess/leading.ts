/** The most likely case worked out at its central values: what the hand calculation shows. */
import { governingCase } from './capacity.js';
import type { Building, DirectionName, PerDirection, System } from '../building.js';
import { DIRECTIONS } from '../direction.js';
import { apply } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import { ln } from '../numeric/elementary.js';
import { LOG_SCORE } from '../priority/records.js';
import { siteCloseness } from '../site/closeness.js';
import { cite } from '../source.js';
import { flagWords } from '../spectrum/flags.js';
import { power } from '../numeric/power.js';
import type { Trace } from '../trace.js';
import { directionsAlike, drawingsLevels, importanceOf } from './terms.js';
import type { Case, Cases } from './case-memory.js';
import type { EditionId } from './code-history.js';
import { chooseSpectrum } from './choose-spectrum.js';
import type { SpectrumChoice } from './choose-spectrum.js';
import { readAt } from './context.js';
import type { AssessContext, ContextSpectrum } from './context.js';
import { centralFactor } from './irregularity.js';
import { peopleOf } from './people.js';
import { capacityOf } from './leading-capacity.js';
import { NO_PERIOD, alikeAcross, periodAt, periodModel } from './period.js';
import type { Evidence, PeriodBasis, PeriodModel } from './period.js';
import { SiteSpectrum, traceOrdinates, tracePlace } from './site-spectrum.js';

export interface LeadingDirection {
  readonly period_s: number;
  readonly sa_g: number;
  readonly capacity_g: number;
}

export interface LeadingCase {
  readonly system: System;
  readonly edition: EditionId | null;
  readonly chance: number;
  readonly governing: DirectionName;
  readonly directions: PerDirection<LeadingDirection>;
  /** Of the governing direction: what its period rests on. */
  readonly evidence: Evidence;
  readonly basis: PeriodBasis;
  /** The formula that counts there, or null. */
  readonly formula: AnyRecord | null;
  /** The stiffness that counts there rests on assumed values. */
  readonly stiffnessAssumed: boolean;
  readonly sa_g: number;
  readonly capacity_g: number;
  readonly demand_over_capacity: number;
  /** S_a of the second level at the governing period; NaN with one level. */
  readonly sa_level_2_g: number;
}

/** The leading case of `building`; `found` are its period models where the caller has them already. */
export function leadingCase(
  building: Building,
  cases: Cases,
  choice: SpectrumChoice,
  slope_k: number,
  context: AssessContext,
  trace?: Trace,
  found?: PerDirection<PeriodModel>,
): LeadingCase | string {
  const which = cases.list[0]!;
  const byEra = !(building.capacity_sa_g > 0) && drawingsLevels(building)[0]!.level === null;
  const codeOf = (direction: DirectionName): Case =>
    byEra ? governingCase(building, which, direction, building.height_m.value, context) : which;
  if (trace !== undefined) openTrace(building, which, codeOf('longitudinal'), choice, trace);
  const byCapacity = context.settings.rankBy !== 'demand' && !(building.capacity_sa_g > 0);
  if (byCapacity) trace?.heading('Irregularities');
  const irregularity = byCapacity ? centralFactor(building, which, context, trace) : 1;
  const worked = {} as Record<DirectionName, LeadingDirection>;
  const models = {} as Record<DirectionName, PeriodModel>;
  for (const direction of DIRECTIONS) {
    if (
      direction === 'transverse' &&
      directionsAlike(building, which) &&
      alikeAcross(building, models.longitudinal, which.system, context)
    ) {
      worked.transverse = worked.longitudinal;
      models.transverse = models.longitudinal;
      trace?.heading('Transverse direction');
      trace?.choice({
        question: 'Transverse direction',
        taken: 'as the longitudinal',
        because: 'nothing on record tells the two apart',
        others: [],
      });
      continue;
    }
    trace?.heading(direction === 'longitudinal' ? 'Longitudinal direction' : 'Transverse direction');
    const system = direction === 'longitudinal' ? which.system : which.system_transverse;
    // written out step by step they are found once more
    const model =
      trace === undefined && found !== undefined
        ? found[direction]
        : periodModel(building, direction, system, context, trace);
    if (model === null) return NO_PERIOD;
    models[direction] = model;
    const { period_s } = periodAt(model, building.height_m.value, context, trace);
    if (trace !== undefined) siteCloseness(period_s, building.structure?.site_period_s ?? NaN, trace);
    const sa_g = readOrdinate(choice.spectrum, period_s, trace);
    const capacity_g =
      context.settings.rankBy === 'demand'
        ? NaN
        : capacityOf(building, which, direction, period_s, irregularity, choice.spectrum, context, trace);
    worked[direction] = { period_s, sa_g, capacity_g };
  }
  const load = (d: LeadingDirection): number => (Number.isNaN(d.capacity_g) ? d.sa_g : d.sa_g / d.capacity_g);
  const governing = load(worked.transverse) > load(worked.longitudinal) ? 'transverse' : 'longitudinal';
  const { sa_g, capacity_g, period_s } = worked[governing];
  trace?.heading('Priority of the leading case');
  trace?.choice({
    question: 'Governing direction',
    taken: governing,
    because: context.settings.rankBy === 'demand' ? 'the larger demand' : 'the larger demand over capacity',
    others: [],
  });
  if (trace !== undefined) scoreOf(building, sa_g, capacity_g, slope_k, choice.spectrum, context, trace);
  return {
    system: which.system,
    edition: codeOf(governing).edition,
    chance: which.chance,
    governing,
    directions: worked,
    evidence: models[governing].evidence,
    basis: models[governing].basis,
    formula: models[governing].formula,
    stiffnessAssumed: models[governing].assumed,
    sa_g,
    capacity_g,
    demand_over_capacity: sa_g / capacity_g,
    sa_level_2_g: secondLevel(building, period_s, context),
  };
}

function openTrace(building: Building, which: Case, code: Case, choice: SpectrumChoice, trace: Trace): void {
  trace.heading('What is known');
  const { height_m, storeys } = building;
  trace.value('storeys', storeys.value, storeys.origin, storeys.rule === '' ? 'from the inventory' : storeys.rule);
  trace.value('height_m', height_m.value, height_m.origin, height_m.rule === '' ? 'from the inventory' : height_m.rule);
  trace.value(
    'system',
    which.system,
    building.system === null ? 'prior' : 'given',
    building.system === null
      ? `most likely case, chance ${String(Math.round(which.chance * 100))} %`
      : 'from the inventory',
  );
  trace.value(
    'code edition',
    code.edition ?? 'no seismic design',
    building.years.length === 1 ? building.yearOrigin : 'inferred',
    eraWords(building, which, code),
  );
  const { name, compiled, record } = choice.spectrum;
  trace.choice({ question: 'Spectrum', taken: name, because: choice.because, others: [] });
  if (choice.spectrum instanceof SiteSpectrum) tracePlace(choice.spectrum, trace);
  for (const words of flagWords(compiled)) {
    const because = `of the parameters the study gives it, by ${cite(record.source)}`;
    trace.choice({ question: `About ${name}`, taken: words, because, others: [] });
  }
}

function eraWords(building: Building, which: Case, code: Case): string {
  if (which.strengthened) {
    const level = building.retrofit_level > 0 ? '' : ', the default where the row does not say [judgement]';
    const retrofit = `seismic retrofit of ${String(building.year_retrofitted)}, level ${String(which.retrofit_level)} of that code${level}`;
    return code === which ? retrofit : `the code of its construction asked for more than the ${retrofit}`;
  }
  return building.years.length === 1 ? `year ${String(building.years[0])}` : 'year not known, from like buildings';
}

/** S_a with the plateau held; the trace shows the branch read. */
function readOrdinate(spectrum: ContextSpectrum, period_s: number, trace?: Trace): number {
  const read_s = Math.max(period_s, spectrum.hold_from_s);
  if (read_s > period_s) {
    trace?.choice({
      question: 'Below the start of the plateau',
      taken: `S_a held at the plateau (read at ${String(spectrum.hold_from_s)} s)`,
      because:
        'the ramp would demote the stiffest and most brittle buildings; several codes bar it for the fundamental mode',
      others: [],
    });
  }
  const sa_g = readAt(spectrum, period_s);
  if (trace !== undefined) {
    if (spectrum instanceof SiteSpectrum) traceOrdinates(spectrum, read_s, trace);
    trace.formula(spectrum.record, { ...spectrum.inputs, period_s: read_s }, sa_g);
  }
  return sa_g;
}

/** A factor of the priority with its weight as exponent. */
function weighed(factor: number, weight: number): number {
  return weight === 1 ? factor : power(factor, weight);
}

/** ln S at a demand and a capacity. */
export function scoreOf(
  building: Building,
  sa_g: number,
  capacity_g: number,
  slope_k: number,
  spectrum: ContextSpectrum,
  context: AssessContext,
  trace?: Trace,
): number {
  const { rankBy } = context.settings;
  const { peopleWeight, importanceWeight } = context.assumed;
  if (rankBy === 'demand') {
    trace?.value('ln_priority', ln(sa_g), 'computed', 'ranked by demand alone: ln S is ln S_a');
    return ln(sa_g);
  }
  const people = rankBy === 'people' ? peopleOf(building, context, trace) : { people_exposed: 1 };
  const zone_term = context.zoneTerms[spectrum.name] ?? 0;
  if (zone_term !== 0) {
    trace?.value(
      'zone_term',
      zone_term,
      'computed',
      `-ln ${String(spectrum.return_period_years)} + k² 0.4²/2 for this spectrum, less the same for the first: return period and slope differ between zones`,
    );
  }
  return apply(
    LOG_SCORE,
    {
      slope_k,
      sa_g,
      capacity_sa_g: capacity_g,
      people_exposed: typeof people === 'string' ? 1 : weighed(people.people_exposed, peopleWeight),
      importance_factor: rankBy === 'people' ? weighed(importanceOf(building), importanceWeight) : 1,
      zone_term,
    },
    trace,
  );
}

function secondLevel(building: Building, period_s: number, context: AssessContext): number {
  if (context.settings.levels.length < 2) return NaN;
  const choice = chooseSpectrum(context, building, 1);
  return typeof choice === 'string' ? NaN : readAt(choice.spectrum, period_s);
}
