/** Buildings by column: how the database hands them over, and how the page carries them. One reader turns a row into a Building. */
import type { Building, Filled, Origin, System, Use, YesNo } from './building.js';

type Numbers = ArrayLike<number>;
type Words = readonly (string | null)[];

/** Column names read from the `building` table: numbers (NaN unknown) and words (null unknown). */
export const BUILDING_NUMBERS = [
  'storeys_above',
  'storeys_above_sigma',
  'height_m',
  'height_m_sigma',
  'first_storey_height_m',
  'plan_length_m',
  'plan_width_m',
  'floor_area_m2',
  'floor_area_m2_sigma',
  'year_built',
  'year_pool',
  'year_retrofitted',
  'retrofit_level',
  'occupants_peak',
  'occupied_hours_per_week',
  'importance_factor',
  'seismic_weight_kN',
  'unit_weight_kN_per_m2',
  'measured_period_longitudinal_s',
  'measured_period_transverse_s',
  'design_base_shear_coefficient',
  'capacity_sa_g',
] as const;

export const BUILDING_WORDS = [
  'status',
  'storeys_above_origin',
  'storeys_above_rule',
  'height_m_origin',
  'height_m_rule',
  'floor_area_m2_origin',
  'floor_area_m2_rule',
  'year_built_origin',
  'system',
  'system_transverse',
  'use',
  'measured_amplitude',
  'soft_storey',
  'weak_storey',
  'torsion',
  'reentrant_corner',
  'setback',
  'mass_irregularity',
  'site_class',
  'hazard_zone',
  'design_level',
  'storey_stiffness_longitudinal_kN_per_m',
  'storey_stiffness_transverse_kN_per_m',
] as const;

export interface BuildingColumns {
  readonly id: readonly string[];
  readonly numbers: Readonly<Record<(typeof BUILDING_NUMBERS)[number], Numbers>>;
  readonly words: Readonly<Record<(typeof BUILDING_WORDS)[number], Words>>;
}

/** Equally likely years by pool number. */
export type YearPools = Readonly<Record<number, readonly number[]>>;

function stiffness(text: string | null): readonly number[] | null {
  return text === null ? null : text.split(';').map(Number);
}

function filled(value: number, sigma: number, origin: string | null, rule: string | null): Filled {
  return { value, sigma: sigma > 0 ? sigma : 0, origin: (origin ?? 'unknown') as Origin, rule: rule ?? '' };
}

function systemOf(word: string | null): System | null {
  return word === null || word === 'unknown' ? null : (word as System);
}

/** Row `i` of the columns as a Building. */
export function buildingAt(columns: BuildingColumns, i: number, pools: YearPools): Building {
  const { numbers: n, words: w } = columns;
  const year = n.year_built[i]!;
  const pool = n.year_pool[i]!;
  const years = year > 0 ? [year] : pool >= 0 ? (pools[pool] ?? []) : [];
  return {
    id: columns.id[i]!,
    status: (w.status[i] ?? 'in-use') as Building['status'],
    storeys: filled(
      n.storeys_above[i]!,
      n.storeys_above_sigma[i]!,
      w.storeys_above_origin[i]!,
      w.storeys_above_rule[i]!,
    ),
    height_m: filled(n.height_m[i]!, n.height_m_sigma[i]!, w.height_m_origin[i]!, w.height_m_rule[i]!),
    first_storey_height_m: n.first_storey_height_m[i]!,
    plan_length_m: n.plan_length_m[i]!,
    plan_width_m: n.plan_width_m[i]!,
    floor_area_m2: filled(
      n.floor_area_m2[i]!,
      n.floor_area_m2_sigma[i]!,
      w.floor_area_m2_origin[i]!,
      w.floor_area_m2_rule[i]!,
    ),
    years,
    yearOrigin: (w.year_built_origin[i] ?? 'unknown') as Origin,
    year_retrofitted: n.year_retrofitted[i]!,
    retrofit_level: n.retrofit_level[i]!,
    system: systemOf(w.system[i]!),
    system_transverse: systemOf(w.system_transverse[i]!),
    use: (w.use[i] ?? 'unknown') as Use,
    occupants_peak: n.occupants_peak[i]!,
    occupied_hours_per_week: n.occupied_hours_per_week[i]!,
    importance_factor: n.importance_factor[i]!,
    seismic_weight_kN: n.seismic_weight_kN[i]!,
    unit_weight_kN_per_m2: n.unit_weight_kN_per_m2[i]!,
    storey_stiffness_kN_per_m: {
      longitudinal: stiffness(w.storey_stiffness_longitudinal_kN_per_m[i]!),
      transverse: stiffness(w.storey_stiffness_transverse_kN_per_m[i]!),
    },
    measured_period_s: {
      longitudinal: n.measured_period_longitudinal_s[i]!,
      transverse: n.measured_period_transverse_s[i]!,
    },
    measured_amplitude: w.measured_amplitude[i] as Building['measured_amplitude'],
    soft_storey: w.soft_storey[i] as YesNo | null,
    weak_storey: w.weak_storey[i] as YesNo | null,
    torsion: w.torsion[i] as YesNo | null,
    reentrant_corner: w.reentrant_corner[i] as YesNo | null,
    setback: w.setback[i] as YesNo | null,
    mass_irregularity: w.mass_irregularity[i] as YesNo | null,
    site_class: w.site_class[i]!,
    hazard_zone: w.hazard_zone[i]!,
    design_base_shear_coefficient: n.design_base_shear_coefficient[i]!,
    design_level: w.design_level[i] as Building['design_level'],
    capacity_sa_g: n.capacity_sa_g[i]!,
  };
}
