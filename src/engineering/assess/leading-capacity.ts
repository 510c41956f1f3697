/** Capacity of the leading case: by the best of the four ways that the row allows. */
import type { Building, DirectionName } from '../building.js';
import { ELASTIC_EQUIVALENT, REDUCTION, WORKING_TO_STRENGTH } from '../capacity/records.js';
import { apply } from '../formula.js';
import type { Trace } from '../trace.js';
import { capacityAtHeight, keptCapacity, massShare } from './capacity.js';
import type { CapacityAtHeight, Case } from './case-memory.js';
import { codeRatio } from './code-ratio.js';
import type { AssessContext, ContextSpectrum } from './context.js';
import { strengthCheck } from './strength-check.js';
import { drawingsLevels, levelNotStated } from './terms.js';

/** Capacity of the case at a period; at working stress where the drawings do not say: the other level is as likely (close-trace.ts). */
export function capacityOf(
  building: Building,
  which: Case,
  direction: DirectionName,
  period_s: number,
  irregularity: number,
  spectrum: ContextSpectrum,
  context: AssessContext,
  trace?: Trace,
): number {
  if (building.capacity_sa_g > 0) {
    if (trace !== undefined) showAssessed(trace);
    trace?.value('capacity_sa_g', building.capacity_sa_g, 'given', 'capacity from a finished assessment');
    if (trace !== undefined) showCodeRatio(building, which, direction, context, trace);
    return building.capacity_sa_g * context.capacityFactor;
  }
  const { at } = strengthOf(building, which, direction, context, trace);
  if (trace !== undefined) showCodeRatio(building, which, direction, context, trace);
  const reduction = apply(REDUCTION, { ductility: at.ductility, period_s, corner_period_s: spectrum.corner_s }, trace);
  return (
    apply(
      ELASTIC_EQUIVALENT,
      {
        strength_coefficient: at.strength_coefficient,
        overstrength: at.overstrength,
        reduction,
        irregularity,
        mass_share: at.checked === 'as it is' ? 1 : massShare(building),
      },
      trace,
    ) * context.capacityFactor
  );
}

/** The drawings give a coefficient and do not say at which level it is. */
function showLevel(trace: Trace): void {
  trace.choice({
    question: "Level of the drawings' coefficient",
    taken: `working stress, ${String(WORKING_TO_STRENGTH)} to strength, in this hand calculation`,
    because: 'the drawings do not say; either level has a chance of 50 %, and the distribution of ln S counts both',
    others: [{ what: 'strength level, factor 1', why: 'the other half of the distribution: a case of its own below' }],
  });
}

const WAYS = {
  drawings: "drawings' coefficient",
  check: 'strength check of the first storey',
  era: 'code of the era',
} as const;

/** Strength and ductility of a case by the best way that the row allows, and that way. Not for buildings with an assessed capacity. */
export function strengthOf(
  building: Building,
  which: Case,
  direction: DirectionName,
  context: AssessContext,
  trace?: Trace,
): { readonly at: CapacityAtHeight; readonly way: (typeof WAYS)[keyof typeof WAYS] } {
  const { level } = drawingsLevels(building)[0]!;
  const height_m = building.height_m.value;
  const check = level === null ? strengthCheck(building, which, direction, height_m, context, trace) : null;
  const wanted = context.settings.strengthCheck?.method ?? 'none';
  if (trace !== undefined) showWay(level !== null, check, wanted !== 'none', trace);
  if (trace !== undefined && levelNotStated(building)) showLevel(trace);
  if (check !== null && typeof check !== 'string') return { at: check, way: WAYS.check };
  if (level !== null)
    return { at: capacityAtHeight(building, which, direction, height_m, level, context, trace), way: WAYS.drawings };
  const at =
    trace === undefined
      ? keptCapacity(building, which, direction, height_m, context)
      : capacityAtHeight(building, which, direction, height_m, null, context, trace);
  return { at, way: WAYS.era };
}

/** Shown beside, counted nowhere. */
function showCodeRatio(
  building: Building,
  which: Case,
  direction: DirectionName,
  context: AssessContext,
  trace: Trace,
): void {
  if (context.settings.codeHistory === null) return;
  const ratio = codeRatio(building, which, direction, context);
  if (typeof ratio === 'string') {
    trace.choice({ question: 'Plain code ratio', taken: 'none', because: ratio, others: [] });
    return;
  }
  trace.choice({
    question: 'Plain code ratio',
    taken: 'shown beside the capacity, not counted',
    because: 'it leaves out the period of the building, its ductility and today’s spectrum',
    others: [],
  });
  codeRatio(building, which, direction, context, trace);
}

function showAssessed(trace: Trace): void {
  trace.choice({
    question: 'Way to the capacity',
    taken: 'finished assessment',
    because: 'the best of the four ways for which the row has what it takes',
    others: [],
  });
}

/** Which of the ways to a capacity was taken, and why not those before it. */
function showWay(
  byDrawings: boolean,
  check: CapacityAtHeight | string | null,
  checksWanted: boolean,
  trace: Trace,
): void {
  const assessment = { what: 'finished assessment', why: 'no assessed capacity on record' };
  const drawings = { what: WAYS.drawings, why: 'no design coefficient on record' };
  const checkWhy = checksWanted ? 'nothing of the structure on record' : 'the study wants no check';
  const era = { what: WAYS.era, why: 'a better way comes first' };
  const byCheck = check !== null && typeof check !== 'string';
  trace.choice({
    question: 'Way to the capacity',
    taken: byDrawings ? WAYS.drawings : byCheck ? WAYS.check : WAYS.era,
    because: 'the best of the four ways for which the row has what it takes',
    others: byDrawings
      ? [assessment, { what: 'strength check', why: 'a better way comes first' }, era]
      : byCheck
        ? [assessment, drawings, era]
        : [assessment, drawings, { what: 'strength check', why: typeof check === 'string' ? check : checkWhy }],
  });
}
