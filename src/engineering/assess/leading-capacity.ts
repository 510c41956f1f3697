/** Capacity of the leading case: by the best of the four ways that the row allows. */
import type { Building, DirectionName } from '../building.js';
import { ELASTIC_EQUIVALENT, REDUCTION } from '../capacity/records.js';
import { apply } from '../formula.js';
import type { Trace } from '../trace.js';
import { capacityAtHeight, keptCapacity, massShare } from './capacity.js';
import type { CapacityAtHeight, Case } from './case-memory.js';
import { codeRatio } from './code-ratio.js';
import type { AssessContext, ContextSpectrum } from './context.js';
import { strengthCheck } from './strength-check.js';
import { drawingsLevels } from './terms.js';

/** Capacity of the case at a period; the likelier level where the drawings do not say (working stress). */
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
    trace?.value('capacity_sa_g', building.capacity_sa_g, 'given', 'capacity from a finished assessment');
    return building.capacity_sa_g * context.capacityFactor;
  }
  const { level } = drawingsLevels(building)[0]!;
  const height_m = building.height_m.value;
  const check = level === null ? strengthCheck(building, which, direction, height_m, context, trace) : null;
  if (trace !== undefined) showWay(level !== null, check, trace);
  const at =
    check !== null && typeof check !== 'string'
      ? check
      : trace === undefined && level === null
        ? keptCapacity(building, which, direction, height_m, context)
        : capacityAtHeight(building, which, direction, height_m, level, context, trace);
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

/** Shown beside, counted nowhere. */
function showCodeRatio(
  building: Building,
  which: Case,
  direction: DirectionName,
  context: AssessContext,
  trace: Trace,
): void {
  if (Number.isNaN(codeRatio(building, which, direction, context))) return;
  trace.choice({
    question: 'Plain code ratio',
    taken: 'shown beside the capacity, not counted',
    because: 'it leaves out the period of the building, its ductility and today’s spectrum',
    others: [],
  });
  codeRatio(building, which, direction, context, trace);
}

/** Which of the ways to a capacity was taken, and why not those before it. */
function showWay(byDrawings: boolean, check: CapacityAtHeight | string | null, trace: Trace): void {
  const assessment = { what: 'finished assessment', why: 'no assessed capacity on record' };
  const drawings = { what: "drawings' coefficient", why: 'no design coefficient on record' };
  const checkWhy = check === null ? 'nothing of the structure on record, or no check wanted by the study' : '';
  const era = { what: 'code of the era', why: 'a better way comes first' };
  const byCheck = check !== null && typeof check !== 'string';
  trace.choice({
    question: 'Way to the capacity',
    taken: byDrawings ? "drawings' coefficient" : byCheck ? 'strength check of the first storey' : 'code of the era',
    because: 'the best of the four ways for which the row has what it takes',
    others: byDrawings
      ? [assessment, { what: 'strength check', why: 'a better way comes first' }, era]
      : byCheck
        ? [assessment, drawings, era]
        : [assessment, drawings, { what: 'strength check', why: typeof check === 'string' ? check : checkWhy }],
  });
}
