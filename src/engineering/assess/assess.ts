/**
 * One building -> one result: the only place that composes the methods.
 *
 * ln S is a mixture: over the cases (system, era) with their chances, over nodes of the height where it is inferred, over nodes of
 * the period's error (one draw for both directions: same material, same mass, same storeys), each node a normal with the spread of
 * strength, era and people. At every node the worse direction counts.
 */
import type { Building, PerDirection } from '../building.js';
import { ln } from '../numeric/elementary.js';
import { mixtureMoments, mixtureQuantile } from '../priority/mixture.js';
import type { Mixture } from '../priority/mixture.js';
import type { Trace } from '../trace.js';
import { casesOf } from './cases.js';
import { chooseSpectrum } from './choose-spectrum.js';
import { readAt, slopeFor } from './context.js';
import type { AssessContext } from './context.js';
import { demandsOf } from './demands.js';
import { flagsOf } from './flags.js';
import { irregularitiesRead } from './irregularity.js';
import { integrate } from './integrate.js';
import type { PeriodBand } from './integrate.js';
import { closeTrace } from './close-trace.js';
import { leadingCase } from './leading.js';
import type { LeadingCase } from './leading.js';
import { peopleOf } from './people.js';
import { newScratch } from './scratch.js';
import type { Scratch } from './scratch.js';
import { weakOf } from './weak.js';

export type { PeriodBand };

export interface Assessment {
  readonly id: string;
  /** Distribution of ln S; median, mean and standard deviation beside it. */
  readonly mixture: Mixture;
  readonly lnPriority: number;
  readonly lnPriorityMean: number;
  readonly lnPrioritySd: number;
  readonly period: PerDirection<PeriodBand>;
  /** The larger S_a (g) of the two directions at their median periods: the plain demand ranking. */
  readonly demand_g: number;
  readonly leading: LeadingCase;
  readonly people_exposed: number;
  readonly slope_k: number;
  readonly spectrum: string;
  readonly weakType: string | null;
  readonly weakChance: number;
  readonly flags: readonly string[];
}

/** Why a building is not ranked. */
export interface NotRanked {
  readonly id: string;
  readonly reason: string;
}

export function isRanked(result: Assessment | NotRanked): result is Assessment {
  return !('reason' in result);
}

const shared = newScratch();
/** The result of one building; with a trace the leading case is written out as a hand calculation. */
export function assess(
  building: Building,
  context: AssessContext,
  trace?: Trace,
  scratch: Scratch = shared,
): Assessment | NotRanked {
  const { id } = building;
  if (building.status === 'assessed') return { id, reason: 'already assessed' };
  if (building.status === 'to-be-demolished') return { id, reason: 'to be demolished' };
  if (!(building.height_m.value > 0) || !(building.storeys.value > 0))
    return { id, reason: 'neither height nor storeys are known' };
  const choice = chooseSpectrum(context, building, 0);
  if (typeof choice === 'string') return { id, reason: choice };
  const cases = casesOf(building, context);
  if (typeof cases === 'string') return { id, reason: cases };
  const byPeople = context.settings.rankBy === 'people';
  const people = byPeople ? peopleOf(building, context) : { people_exposed: 1, sigma: 0 };
  if (typeof people === 'string') return { id, reason: people };
  const { spectrum } = choice;
  const slope_k = slopeFor(context, spectrum.name);
  scratch.score.clear();
  const pass = integrate(building, cases, people, spectrum, slope_k, context, scratch);
  if (typeof pass === 'string') return { id, reason: pass };
  const mixture = scratch.score.gather(scratch.pool);
  const moments = mixtureMoments(mixture);
  const demand_g = Math.max(
    readAt(spectrum, pass.period.longitudinal.p50_s),
    readAt(spectrum, pass.period.transverse.p50_s),
  );
  const lnPriority = context.settings.rankBy === 'demand' ? ln(demand_g) : mixtureQuantile(mixture, 0.5, 0);
  const leading = leadingCase(building, cases, choice, slope_k, context, trace, pass.models);
  if (typeof leading === 'string') return { id, reason: leading };
  const read = irregularitiesRead(building, context);
  const isSoft = building.soft_storey === 'yes' || read.includes('soft_storey');
  const weak = weakOf(cases, isSoft, context.settings.codeHistory);
  if (trace !== undefined) {
    demandsOf(building, cases, choice, leading, context, trace);
    closeTrace(trace, { building, cases, choice, slope_k, context, mixture, lnPriority, sd: moments.sd });
  }
  return {
    id,
    mixture,
    lnPriority,
    lnPriorityMean: moments.mean,
    lnPrioritySd: moments.sd,
    period: pass.period,
    demand_g,
    leading,
    people_exposed: byPeople ? people.people_exposed : NaN,
    slope_k,
    spectrum: spectrum.name,
    weakType: weak.name,
    weakChance: weak.chance,
    flags: flagsOf(building, cases, choice, leading, pass.disagreement, read, context),
  };
}
