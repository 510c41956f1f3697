/** Capacity of one case in one direction: assessed, from the drawings' coefficient, or from the code of its era. */
import type { Building, DirectionName, System } from '../building.js';
import { NOT_DESIGNED } from '../capacity/edition.js';
import { DUCTILITY_KEPT, OVERSTRENGTH_KEPT, REDUCTION_BEFORE } from '../capacity/records.js';
import { apply } from '../formula.js';
import type { Trace } from '../trace.js';
import { detailingOf, ductilityOf, editionLabel, firstReduction } from './code-history.js';
import type { Detailing } from './code-history.js';
import { ln } from '../numeric/elementary.js';
import type { CapacityAtHeight, Case } from './case-memory.js';
import type { AssessContext } from './context.js';
import { rowOf } from './edition-rows.js';
import { eraDesign } from './era-design.js';
import type { CodeHistorySettings } from './settings.js';

/** What another building's capacity was found with holds here too, but for the coefficient of editions that know the plan. */
function againAtHeight(
  building: Building,
  which: Case,
  direction: DirectionName,
  height_m: number,
  { overstrength, ductility }: CapacityAtHeight,
  context: AssessContext,
): CapacityAtHeight {
  const system = direction === 'longitudinal' ? which.system : which.system_transverse;
  const detailing = detailingOf(system, which.edition, context.settings.codeHistory!);
  const ductile = detailing === 'after' || detailing === 'special';
  const facts = { building, direction, system, height_m, ductile };
  const { coefficient, levelFactor } = eraDesign(which.edition!, facts, context);
  const strength_coefficient = apply(context.strength, {
    design_base_shear_coefficient: coefficient,
    level_factor: levelFactor,
    retrofit_level: which.retrofit_level,
    wind_coefficient: 0,
  });
  return { strength_coefficient, overstrength, ductility, lnStrength: ln(strength_coefficient * overstrength) };
}

/** V/W of the wind it was designed for, 0 where it is not given. */
function windOf({ wind_base_shear_coefficient: wind }: Building): number {
  return wind > 0 ? wind : 0;
}

/** Heights kept of one design: a table in tenths of a metre has fewer. */
const MOST_KEPT = 4096;

/** `capacityAtHeight` for a building without a coefficient from the drawings and without a trace, out of the memory where it has it. */
export function keptCapacity(
  building: Building,
  which: Case,
  direction: DirectionName,
  height_m: number,
  context: AssessContext,
): CapacityAtHeight {
  // few are strengthened, and what they had before counts too, or have a wind of their own: nothing of theirs is kept
  if (which.strengthened || windOf(building) > 0)
    return capacityAtHeight(building, which, direction, height_m, null, context);
  const design = which.design[direction];
  const { dependsOn: needs, found } = design;
  if (needs === 'more') {
    design.last =
      design.last === null
        ? capacityOfCase(building, which, direction, height_m, null, context)
        : againAtHeight(building, which, direction, height_m, design.last, context);
    return atLeastUndesigned(design.last, building, which, direction, context);
  }
  const key = needs === 'height' ? height_m : needs === 'storeys' ? building.storeys.value : 0;
  let capacity = found.get(key);
  if (capacity === undefined) {
    capacity = capacityAtHeight(building, which, direction, height_m, null, context);
    if (found.size >= MOST_KEPT) found.clear();
    found.set(key, capacity);
  }
  return capacity;
}

/**
 * Strength and ductility of a case in a direction, at a height. `levelFactor` overrides the level of a drawings' coefficient. A retrofit takes
 * nothing away: where the code of its construction asked for more, that counts.
 * Not for buildings with an assessed capacity.
 */
export function capacityAtHeight(
  building: Building,
  which: Case,
  direction: DirectionName,
  height_m: number,
  drawingsLevel: number | null,
  context: AssessContext,
  trace?: Trace,
): CapacityAtHeight {
  const { builtTo } = which;
  const of = (one: Case, step?: Trace): CapacityAtHeight =>
    workedCase(building, one, direction, height_m, drawingsLevel, context, step);
  if (builtTo === null) return of(which, trace);
  const governs = governingCase(building, which, direction, height_m, context, drawingsLevel);
  if (trace === undefined) return of(governs);
  const isLess = governs !== which;
  const names = {
    own: `${builtTo.edition ?? 'no seismic design'} of its construction`,
    retrofit: `${which.edition ?? 'no seismic design'} of the retrofit`,
  };
  trace.choice({
    question: 'Construction or retrofit',
    taken: isLess ? names.own : names.retrofit,
    because:
      drawingsLevel === null
        ? 'the larger strength × ductility: a retrofit takes nothing away [judgement]'
        : "the larger ductility beside the drawings' coefficient: a retrofit takes nothing away [judgement]",
    others: [{ what: isLess ? names.retrofit : names.own, why: drawingsLevel === null ? 'asked for less' : 'less' }],
  });
  return of(governs, trace);
}

/** Of a strengthened building the case whose code gives its capacity: that of the retrofit, or that of its construction where it asked for more. */
export function governingCase(
  building: Building,
  which: Case,
  direction: DirectionName,
  height_m: number,
  context: AssessContext,
  drawingsLevel: number | null = null,
): Case {
  const { builtTo } = which;
  if (builtTo === null) return which;
  const before: Case = {
    ...which,
    edition: builtTo.edition,
    label: editionLabel(builtTo.edition),
    editionYear: builtTo.year,
    strengthened: false,
    retrofit_level: 1,
    builtTo: null,
  };
  const worth = (one: Case): number => elastic(workedCase(building, one, direction, height_m, drawingsLevel, context));
  return worth(which) < worth(before) ? before : which;
}

/** Of one case by itself: what the drawings state stands as it is, and what a code asked is worth no less than no design. */
function workedCase(
  building: Building,
  which: Case,
  direction: DirectionName,
  height_m: number,
  drawingsLevel: number | null,
  context: AssessContext,
  trace?: Trace,
): CapacityAtHeight {
  const found = capacityOfCase(building, which, direction, height_m, drawingsLevel, context, trace);
  return drawingsLevel === null ? atLeastUndesigned(found, building, which, direction, context, trace) : found;
}

/** What tells two capacities of one system apart, whatever its period. */
function elastic({ lnStrength, ductility }: CapacityAtHeight): number {
  return lnStrength + ln(ductility);
}

/** `found`, its ductility no less than gives what the system has with no design for earthquakes: a design takes nothing away [judgement]. */
function atLeastUndesigned(
  found: CapacityAtHeight,
  building: Building,
  which: Case,
  direction: DirectionName,
  { assumed, strength }: AssessContext,
  trace?: Trace,
): CapacityAtHeight {
  const { edition, strengthened } = which;
  if (edition === null || strengthened) return found;
  const system = direction === 'longitudinal' ? which.system : which.system_transverse;
  const least = Math.max(strength.constants.floor_g, windOf(building));
  const none = least * assumed.overstrength * ductilityOf(system, 'none', assumed.ductility);
  const ductility = none / (found.strength_coefficient * found.overstrength);
  if (ductility <= found.ductility) return found;
  trace?.choice({
    question: 'Less than without a design',
    taken: `μ = ${String(ductility)}`,
    because: 'a design takes nothing away: as much as if nothing had been designed [judgement]',
    others: [],
  });
  return { ...found, ductility };
}

function capacityOfCase(
  building: Building,
  which: Case,
  direction: DirectionName,
  height_m: number,
  drawingsLevel: number | null,
  context: AssessContext,
  trace?: Trace,
): CapacityAtHeight {
  const system = direction === 'longitudinal' ? which.system : which.system_transverse;
  const history = context.settings.codeHistory;
  const detailing = history === null ? 'none' : detailingOfCase(system, which, history);
  const ofClass = ductilityOf(system, detailing, context.assumed.ductility);
  trace?.choice({
    question: 'Detailing and ductility',
    taken: `μ = ${String(ofClass)}`,
    because: `${system}, ${which.edition === null ? 'no seismic design' : `designed to ${which.edition}`}: detailing class "${detailing}" [judgement]`,
    others: [],
  });
  const row = rowOf(system, which, history);
  if (row !== system) {
    trace?.choice({
      question: 'Design coefficient of the era',
      taken: row === null ? 'none: counts as not designed' : `that of ${row}`,
      because: `${String(which.edition)} gives ${system} no row of its own${row === null ? '' : '; what strengthens it is reinforced'} [judgement]`,
      others: [],
    });
  }
  let design =
    which.edition === null || row === null
      ? NOT_DESIGNED
      : eraDesign(
          which.edition,
          { building, direction, system: row, height_m, ductile: detailing === 'after' || detailing === 'special' },
          context,
          trace,
        );
  const designed = design;
  if (drawingsLevel !== null) {
    trace?.value('design_base_shear_coefficient', building.design_base_shear_coefficient, 'given', 'from the drawings');
    design = {
      coefficient: building.design_base_shear_coefficient,
      levelFactor: drawingsLevel,
      reduction: design.reduction,
    };
  }
  if (windOf(building) > 0)
    trace?.value('wind_coefficient', windOf(building), 'given', 'design for wind, from the inventory');
  const strength_coefficient = apply(
    context.strength,
    {
      design_base_shear_coefficient: design.coefficient,
      level_factor: design.levelFactor,
      // the share that a retrofit reached is of its year's code, not of what the drawings state
      retrofit_level: drawingsLevel === null ? which.retrofit_level : 1,
      wind_coefficient: windOf(building),
    },
    trace,
  );
  const { overstrength: assumedOverstrength } = context.assumed;
  if (!Number.isFinite(design.reduction)) {
    const first =
      designed === NOT_DESIGNED || history === null
        ? null
        : firstReduction(system, detailing, history, context.assumed.ductility);
    return {
      strength_coefficient,
      overstrength: assumedOverstrength,
      lnStrength: ln(strength_coefficient * assumedOverstrength),
      ductility:
        first === null
          ? ofClass
          : apply(
              DUCTILITY_KEPT,
              {
                ductility: ofClass,
                overstrength: assumedOverstrength,
                code_reduction: apply(REDUCTION_BEFORE, { ...first, level_factor: design.levelFactor }, trace),
                level_factor: design.levelFactor,
              },
              trace,
            ),
    };
  }
  const bounds = { code_reduction: design.reduction, level_factor: design.levelFactor };
  const overstrength = apply(OVERSTRENGTH_KEPT, { overstrength: assumedOverstrength, ...bounds }, trace);
  return {
    strength_coefficient,
    overstrength,
    lnStrength: ln(strength_coefficient * overstrength),
    ductility: apply(DUCTILITY_KEPT, { ductility: ofClass, overstrength, ...bounds }, trace),
  };
}

/** Detailing class of a case: a retrofit makes no building one of the special systems. */
export function detailingOfCase(
  system: System,
  { edition, strengthened }: Case,
  history: CodeHistorySettings,
): Detailing {
  const detailing = detailingOf(system, edition, history);
  return strengthened && detailing === 'special' ? 'after' : detailing;
}

/** Share of the mass in the first mode: 1 up to two storeys, 0.85 above (EN 1998-1 4.3.3.2.2 λ). */
export function massShare(building: Building): number {
  return building.storeys.value > 2 ? 0.85 : 1;
}
