/** What a building offers the inputs of a period formula, by their names; and whether the formula's limits let it be used. */
import type { Building, DirectionName, System } from '../building.js';
import type { AnyRecord, Inputs } from '../formula.js';

export interface FormulaInputs {
  readonly inputs: Inputs;
  /** What stands in for a fact that is not on record, in words. */
  readonly assumed: readonly string[];
}

const STEEL_OR_TIMBER = /^(?:steel|timber)-/;

const WORDS: Readonly<Record<string, string>> = {
  wall_areas_m2: 'areas of the walls in this direction',
  wall_lengths_m: 'lengths of the walls in this direction',
  wall_heights_m: 'heights of the walls in this direction',
  base_area_m2: 'plan dimensions or floor area',
  plan_dimension_m: 'plan dimensions or floor area',
  top_displacement_m: 'sway of the top under gravity applied sideways',
  diaphragm_length_m: 'span of the roof diaphragm',
  diaphragm_displacement_m: 'displacement of the roof diaphragm',
  wall_displacement_m: 'displacement of the walls',
  storeys: 'storeys',
  height_m: 'height',
};

/** Area of a floor plate: from the plan dimensions, else the floor area over the storeys; NaN when neither is known. */
function plateArea_m2(building: Building): number {
  const { plan_length_m, plan_width_m, floor_area_m2, storeys } = building;
  if (plan_length_m > 0 && plan_width_m > 0) return plan_length_m * plan_width_m;
  return floor_area_m2.value > 0 ? floor_area_m2.value / Math.max(1, storeys.value) : NaN;
}

/** Plan dimension along the force, with what stands in for it. */
function planDimension_m(
  building: Building,
  direction: DirectionName,
): { readonly value: number; readonly assumed: string | null } {
  const side = direction === 'longitudinal' ? building.plan_length_m : building.plan_width_m;
  if (side > 0) return { value: side, assumed: null };
  const plate = plateArea_m2(building);
  return { value: Math.sqrt(plate), assumed: 'plan dimension from the square root of the floor plate' };
}

function fact(
  name: string,
  building: Building,
  system: System,
  direction: DirectionName,
  height_m: number,
): { readonly value: number | readonly number[] | null; readonly assumed?: string | null } {
  const { structure } = building;
  switch (name) {
    case 'height_m':
      return { value: height_m };
    case 'storeys':
      return { value: building.storeys.value };
    case 'mean_storey_height_m':
      return { value: height_m / building.storeys.value };
    case 'plan_dimension_m':
      return planDimension_m(building, direction);
    case 'base_area_m2':
      return { value: plateArea_m2(building) };
    case 'wall_areas_m2':
      return { value: structure?.wall_areas_m2[direction] ?? null };
    case 'wall_lengths_m':
      return { value: structure?.wall_lengths_m[direction] ?? null };
    case 'wall_heights_m': {
      const walls = structure?.wall_areas_m2[direction] ?? null;
      return { value: walls?.map(() => height_m) ?? null, assumed: 'walls of full height' };
    }
    case 'steel_or_wood_height_m': {
      const share = structure?.steel_height_share ?? NaN;
      if (share >= 0) return { value: share * height_m };
      return { value: STEEL_OR_TIMBER.test(system) ? height_m : 0, assumed: 'one material over the whole height' };
    }
    case 'top_displacement_m':
      return { value: structure?.top_displacement_m[direction] ?? null };
    default:
      return { value: null };
  }
}

/** The inputs of `record` for a building whose height is `height_m`, or why it cannot be evaluated. */
export function formulaInputs(
  record: AnyRecord,
  building: Building,
  system: System,
  direction: DirectionName,
  height_m: number,
): FormulaInputs | string {
  const inputs: Record<string, number | readonly number[] | string> = {};
  const assumed: string[] = [];
  for (const spec of record.family.inputs) {
    const found = fact(spec.name, building, system, direction, height_m);
    const known = Array.isArray(found.value)
      ? found.value.length > 0
      : typeof found.value === 'number' && !Number.isNaN(found.value);
    if (!known || found.value === null) {
      if (spec.fallback === undefined) return `not on record: ${WORDS[spec.name] ?? spec.meaning}`;
      inputs[spec.name] = spec.fallback;
      continue;
    }
    inputs[spec.name] = found.value;
    if (typeof found.assumed === 'string') assumed.push(found.assumed);
  }
  const { wall_areas_m2: areas, wall_lengths_m: lengths } = inputs;
  if (Array.isArray(areas) && Array.isArray(lengths) && areas.length !== lengths.length)
    return `${String(areas.length)} wall areas and ${String(lengths.length)} wall lengths: one length a wall is needed`;
  return { inputs, assumed };
}

/** The limit that forbids the formula for this building, or null. */
export function forbiddenBy(
  record: AnyRecord,
  building: Building,
  system: System,
  direction: DirectionName,
  height_m: number,
): string | null {
  return broken(record, building, system, direction, height_m, 'reject')[0] ?? null;
}

/** The limits that the building is outside of and that do not forbid the formula. */
export function limitNotes(
  record: AnyRecord,
  building: Building,
  system: System,
  direction: DirectionName,
  height_m: number,
): readonly string[] {
  return broken(record, building, system, direction, height_m, 'flag');
}

function broken(
  record: AnyRecord,
  building: Building,
  system: System,
  direction: DirectionName,
  height_m: number,
  outside: 'reject' | 'flag',
): readonly string[] {
  return record.limits.flatMap((limit) => {
    if (limit.outside !== outside) return [];
    const { value } = fact(limit.input, building, system, direction, height_m);
    const values = value === null ? [] : [value].flat();
    const out = values.some((entry) => entry < (limit.from ?? -Infinity) || entry > (limit.to ?? Infinity));
    return out ? [`outside ${limit.whose === 'publication' ? 'its published limit' : 'our limit'}: ${limit.text}`] : [];
  });
}
