/** Capacity of one case in one direction: assessed, from the drawings' coefficient, or from the code of its era. */
import type { Building, DirectionName, System } from '../building.js';
import { NOT_DESIGNED } from '../capacity/edition.js';
import type { CodeEdition, DesignFacts, EraDesign } from '../capacity/edition.js';
import type { CarriedId } from '../capacity/families.js';
import { DUCTILITY_KEPT, OVERSTRENGTH_KEPT } from '../capacity/records.js';
import { apply } from '../formula.js';
import { cite } from '../source.js';
import type { Verified } from '../source.js';
import type { Trace } from '../trace.js';
import { detailingOf, ductilityOf, editionOf, familyOf } from './code-history.js';
import type { EditionId } from './code-history.js';
import { ln } from '../numeric/elementary.js';
import { entryOf } from './case-memory.js';
import type { CapacityAtHeight, Case, Design } from './case-memory.js';
import type { AssessContext } from './context.js';
import type { CodeHistorySettings } from './settings.js';

const MARKS: Readonly<Record<Verified, string>> = {
  printed: 'read in print',
  restated: 'restated',
  memory: 'from memory',
  judgement: 'as the study states it',
  mechanics: 'mechanics',
};

/** What the edition asked of the system, with the edition's own period and the place's own inputs. */
function eraDesign(edition: EditionId, facts: DesignFacts, context: AssessContext, trace?: Trace): EraDesign {
  const history = context.settings.codeHistory!;
  const row = editionOf(edition, history);
  const { title, source, verified, note } = row;
  trace?.choice({
    question: 'Code of the era',
    taken: title,
    because: `${cite(source)}, ${MARKS[verified]}${note === undefined ? '' : `; ${note}`}`,
    others: [],
  });
  const stated: unknown = history.editions[edition as CarriedId];
  // an era exists only where something is stated for its edition, and that is of the type it reads
  return (row as CodeEdition).design(facts, stated, trace);
}

/** True where the edition knows no such system, so that it counts as not designed. */
function hasNoRow(
  system: System,
  edition: EditionId | null,
  strengthened: boolean,
  history: CodeHistorySettings | null,
): boolean {
  if (edition === null || strengthened || history === null) return false;
  const { year, hasRow } = editionOf(edition, history);
  return year >= (familyOf(history).noRowFrom[system] ?? Infinity) || hasRow?.(system) === false;
}

/** True where the case was designed for earthquakes in a direction at least, so that its drawings can state a coefficient. */
export function isDesigned(
  {
    system,
    system_transverse,
    edition,
    strengthened,
  }: Pick<Case, 'system' | 'system_transverse' | 'edition' | 'strengthened'>,
  { settings: { codeHistory } }: AssessContext,
): boolean {
  if (edition === null) return false;
  return [system, system_transverse].some((one) => !hasNoRow(one, edition, strengthened, codeHistory));
}

/** The memory of capacities that all cases of a system, an edition and a level of retrofit share. */
export function designOf(
  system: System,
  edition: EditionId | null,
  retrofit_level: number,
  strengthened: boolean,
  { caseMemory, settings }: AssessContext,
): Design {
  const key = `${system}|${String(edition)}|${String(retrofit_level)}|${String(strengthened)}`;
  return entryOf(caseMemory.designs, key, () => ({
    dependsOn:
      edition === null || hasNoRow(system, edition, strengthened, settings.codeHistory)
        ? 'nothing'
        : editionOf(edition, settings.codeHistory!).dependsOn(system),
    found: new Map(),
    last: null,
  }));
}

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
  });
  return { strength_coefficient, overstrength, ductility, lnStrength: ln(strength_coefficient * overstrength) };
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
  const design = which.design[direction];
  const { dependsOn: needs, found } = design;
  if (needs === 'more') {
    design.last =
      design.last === null
        ? capacityAtHeight(building, which, direction, height_m, null, context)
        : againAtHeight(building, which, direction, height_m, design.last, context);
    return design.last;
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
 * Strength and ductility of a case in a direction, at a height. `levelFactor` overrides the level of a drawings' coefficient.
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
  const system = direction === 'longitudinal' ? which.system : which.system_transverse;
  const history = context.settings.codeHistory;
  const detailing = history === null ? 'none' : detailingOf(system, which.edition, history);
  const ductility = ductilityOf(system, detailing, context.assumed.ductility);
  trace?.choice({
    question: 'Detailing and ductility',
    taken: `μ = ${String(ductility)}`,
    because: `${system}, ${which.edition === null ? 'no seismic design' : `designed to ${which.edition}`}: detailing class "${detailing}" [judgement]`,
    others: [],
  });
  const noRow = hasNoRow(system, which.edition, which.strengthened, history);
  if (noRow) {
    trace?.choice({
      question: 'Design coefficient of the era',
      taken: 'none: counts as not designed',
      because: `${String(which.edition)} gives ${system} no row of its own [judgement]`,
      others: [],
    });
  }
  let design =
    which.edition === null || noRow
      ? NOT_DESIGNED
      : eraDesign(
          which.edition,
          { building, direction, system, height_m, ductile: detailing === 'after' || detailing === 'special' },
          context,
          trace,
        );
  if (drawingsLevel !== null) {
    trace?.value('design_base_shear_coefficient', building.design_base_shear_coefficient, 'given', 'from the drawings');
    design = {
      coefficient: building.design_base_shear_coefficient,
      levelFactor: drawingsLevel,
      reduction: design.reduction,
    };
  }
  const strength_coefficient = apply(
    context.strength,
    {
      design_base_shear_coefficient: design.coefficient,
      level_factor: design.levelFactor,
      retrofit_level: which.retrofit_level,
    },
    trace,
  );
  const { overstrength: assumedOverstrength } = context.assumed;
  if (!Number.isFinite(design.reduction))
    return {
      strength_coefficient,
      overstrength: assumedOverstrength,
      ductility,
      lnStrength: ln(strength_coefficient * assumedOverstrength),
    };
  const bounds = { code_reduction: design.reduction, level_factor: design.levelFactor };
  const overstrength = apply(OVERSTRENGTH_KEPT, { overstrength: assumedOverstrength, ...bounds }, trace);
  return {
    strength_coefficient,
    overstrength,
    lnStrength: ln(strength_coefficient * overstrength),
    ductility: apply(DUCTILITY_KEPT, { ductility, overstrength, ...bounds }, trace),
  };
}

/** Share of the mass in the first mode: 1 up to two storeys, 0.85 above (EN 1998-1 4.3.3.2.2 λ). */
export function massShare(building: Building): number {
  return building.storeys.value > 2 ? 0.85 : 1;
}
