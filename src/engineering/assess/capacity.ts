/** Capacity of one case in one direction: assessed, from the drawings' coefficient, or from the code of its era. */
import type { Building, DirectionName, System } from '../building.js';
import { ASCE7_2002, UBC_1927, UBC_1949, UBC_1961, UBC_1976, UBC_1988, UBC_1997 } from '../capacity/editions.js';
import { DUCTILITY_KEPT, OVERSTRENGTH_KEPT, WORKING_TO_STRENGTH } from '../capacity/records.js';
import { SYSTEM_FACTORS } from '../capacity/systems.js';
import { apply, applyAny } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import { UBC_1961_MOMENT_FRAME, UBC_1961_OTHER } from '../period/past-records.js';
import { ASCE7_22_PERIODS } from '../period/asce7.js';
import { UBC_HEIGHT_PERIODS } from '../period/ubc.js';
import type { Trace } from '../trace.js';
import type { IrregularityFactors } from './assumed.js';
import { EDITION_YEARS, detailingOf, ductilityOf } from './code-history.js';
import type { EditionId } from './code-history.js';
import { ln } from '../numeric/elementary.js';
import { entryOf } from './case-memory.js';
import type { CapacityAtHeight, Case, Design } from './case-memory.js';
import type { AssessContext } from './context.js';

const find = (list: readonly AnyRecord[], id: string): AnyRecord => {
  const found = list.find((record) => record.id === id);
  if (found === undefined) throw new Error(`no record ${id}`);
  return found;
};

const PERIOD_1988 = {
  'steel-moment-frame': find(UBC_HEIGHT_PERIODS, 'ubc-1988/period/steel-moment-frame'),
  'concrete-moment-frame': find(UBC_HEIGHT_PERIODS, 'ubc-1988/period/concrete-moment-frame-or-eccentric-braced'),
  'eccentric-braced': find(UBC_HEIGHT_PERIODS, 'ubc-1988/period/concrete-moment-frame-or-eccentric-braced'),
  other: find(UBC_HEIGHT_PERIODS, 'ubc-1988/period/other'),
};
const PERIOD_2002 = {
  'steel-moment-frame': find(ASCE7_22_PERIODS, 'asce7-22/period/steel-moment-frame'),
  'concrete-moment-frame': find(ASCE7_22_PERIODS, 'asce7-22/period/concrete-moment-frame'),
  'eccentric-braced': find(ASCE7_22_PERIODS, 'asce7-22/period/steel-eccentric-or-buckling-restrained'),
  other: find(ASCE7_22_PERIODS, 'asce7-22/period/other'),
};

const ZONE_SHARES: Readonly<Record<number, number>> = { 1: 0.25, 2: 0.5, 3: 1 };

interface EraDesign {
  readonly coefficient: number;
  readonly levelFactor: number;
  /** The edition's own reduction of the elastic force. */
  readonly reduction: number;
}

const NOT_DESIGNED: EraDesign = { coefficient: 0, levelFactor: 1, reduction: Infinity };

/** Plan dimension along the force: the length for the longitudinal direction. Square root of the plate's area when not known. */
function planDimension_m(building: Building, direction: DirectionName): number {
  const side = direction === 'longitudinal' ? building.plan_length_m : building.plan_width_m;
  if (side > 0) return side;
  const plate = building.floor_area_m2.value / Math.max(1, building.storeys.value);
  return plate > 0 ? Math.sqrt(plate) : 15;
}

/** What the edition asked of the system, with the edition's own period and the place's own inputs. */
function eraDesign(
  building: Building,
  edition: EditionId,
  system: System,
  direction: DirectionName,
  height_m: number,
  ductile: boolean,
  context: AssessContext,
  trace?: Trace,
): EraDesign {
  const inputs = context.settings.codeHistory!.editions;
  const factors = SYSTEM_FACTORS[system];
  const storeys = building.storeys.value;
  const structure_factor = factors.k[ductile ? 1 : 0];
  const pastPeriod = (): number =>
    factors.periodClass === 'steel-moment-frame' || factors.periodClass === 'concrete-moment-frame'
      ? apply(UBC_1961_MOMENT_FRAME, { storeys }, trace)
      : apply(UBC_1961_OTHER, { height_m, plan_dimension_m: planDimension_m(building, direction) }, trace);
  const working = (coefficient: number, reduction: number): EraDesign => ({
    coefficient,
    levelFactor: WORKING_TO_STRENGTH,
    reduction,
  });
  switch (edition) {
    case 'ubc-1927': {
      const coefficient = inputs['ubc-1927']!.soil === 'firm' ? 0.075 : 0.1;
      return working(apply(UBC_1927, { coefficient }, trace), Infinity);
    }
    case 'ubc-1935':
      return working(apply(UBC_1927, { coefficient: inputs['ubc-1935']!.coefficient }, trace), Infinity);
    case 'ubc-1949': {
      const zone_share = ZONE_SHARES[inputs['ubc-1949']!.zone] ?? 0;
      return working(apply(UBC_1949, { zone_share, storeys }, trace), Infinity);
    }
    case 'ubc-1961': {
      const { zone_factor } = inputs['ubc-1961']!;
      return working(
        apply(UBC_1961, { zone_factor, structure_factor, period_s: pastPeriod() }, trace),
        8 / structure_factor,
      );
    }
    case 'ubc-1976': {
      const { zone_factor, site_factor } = inputs['ubc-1976']!;
      return working(
        apply(UBC_1976, { zone_factor, structure_factor, site_factor, period_s: pastPeriod() }, trace),
        8 / structure_factor,
      );
    }
    case 'ubc-1988': {
      const { zone_factor, site_factor } = inputs['ubc-1988']!;
      const period_s = applyAny(PERIOD_1988[factors.periodClass], { height_m }, trace);
      return working(
        apply(UBC_1988, { zone_factor, site_factor, reduction_r: factors.rw, period_s }, trace),
        factors.rw,
      );
    }
    case 'ubc-1997': {
      const { ca_g, cv_g, zone_factor, nv } = inputs['ubc-1997']!;
      const period_s = applyAny(PERIOD_1988[factors.periodClass], { height_m }, trace);
      const zone_floor = zone_factor >= 0.4 ? 0.8 * zone_factor * nv : 0;
      const coefficient = apply(UBC_1997, { ca_g, cv_g, zone_floor, reduction_r: factors.r1997, period_s }, trace);
      return { coefficient, levelFactor: 1, reduction: factors.r1997 };
    }
    case 'asce7-2002': {
      const { sds_g, sd1_g, s1_g } = inputs['asce7-2002']!;
      const period_s = applyAny(PERIOD_2002[factors.periodClass], { height_m }, trace);
      const near_fault_s1_g = s1_g >= 0.6 ? s1_g : 0;
      const coefficient = apply(
        ASCE7_2002,
        { sds_g, sd1_g, near_fault_s1_g, reduction_r: factors.r2002, period_s },
        trace,
      );
      return { coefficient, levelFactor: 1, reduction: factors.r2002 };
    }
  }
}

/** What of a building the coefficient of an edition depends on, `eraDesign` below told in short. */
function dependsOn(system: System, edition: EditionId | null): Design['dependsOn'] {
  const { periodClass } = SYSTEM_FACTORS[system];
  const isMomentFrame = periodClass === 'steel-moment-frame' || periodClass === 'concrete-moment-frame';
  switch (edition) {
    case null:
    case 'ubc-1927':
    case 'ubc-1935':
      return 'nothing';
    case 'ubc-1949':
      return 'storeys';
    case 'ubc-1961':
    case 'ubc-1976':
      return isMomentFrame ? 'storeys' : 'more';
    case 'ubc-1988':
    case 'ubc-1997':
    case 'asce7-2002':
      return 'height';
  }
}

/** True where the edition knows no such system, so that it counts as not designed. */
function hasNoRow(system: System, edition: EditionId | null, strengthened: boolean): boolean {
  return edition !== null && !strengthened && EDITION_YEARS[edition] >= (SYSTEM_FACTORS[system].noRowFrom ?? Infinity);
}

/** The memory of capacities that all cases of a system, an edition and a level of retrofit share. */
export function designOf(
  system: System,
  edition: EditionId | null,
  retrofit_level: number,
  strengthened: boolean,
  { caseMemory }: AssessContext,
): Design {
  const key = `${system}|${String(edition)}|${String(retrofit_level)}|${String(strengthened)}`;
  return entryOf(caseMemory.designs, key, () => ({
    dependsOn: hasNoRow(system, edition, strengthened) ? 'nothing' : dependsOn(system, edition),
    found: new Map(),
    last: null,
  }));
}

/** What another building's capacity was found with holds here too, but for the coefficient of the two editions that know the plan. */
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
  const isDuctile = detailing === 'after' || detailing === 'special';
  const { coefficient, levelFactor } = eraDesign(
    building,
    which.edition!,
    system,
    direction,
    height_m,
    isDuctile,
    context,
  );
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
  const noRow = hasNoRow(system, which.edition, which.strengthened);
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
          building,
          which.edition,
          system,
          direction,
          height_m,
          detailing === 'after' || detailing === 'special',
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

/** Product of the irregularity factors of the flags given as "yes". */
export function irregularityFactor(building: Building, { storey, torsion, other }: IrregularityFactors): number {
  let factor = 1;
  if (building.soft_storey === 'yes' || building.weak_storey === 'yes') factor *= storey;
  if (building.torsion === 'yes') factor *= torsion;
  for (const flag of [building.reentrant_corner, building.setback, building.mass_irregularity])
    if (flag === 'yes') factor *= other;
  return factor;
}
