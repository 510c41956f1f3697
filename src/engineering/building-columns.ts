/** Buildings by column: how the database hands them over, and how the page carries them. One reader turns a row into a Building. */
import type { Building, Filled, Origin, System, Use, YesNo } from './building.js';
import { numbersOf, structureReader } from './structure-columns.js';
import type { StructureColumns } from './structure-columns.js';

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
  'wind_base_shear_coefficient',
  'capacity_sa_g',
  'reentrant_projection',
  'reentrant_area_share',
  'footprint_area_m2',
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
  'spectrum',
  'design_level',
  'storey_stiffness_longitudinal_kN_per_m',
  'storey_stiffness_transverse_kN_per_m',
] as const;

export interface BuildingColumns {
  readonly id: readonly string[];
  readonly numbers: Readonly<Record<(typeof BUILDING_NUMBERS)[number], Numbers>>;
  readonly words: Readonly<Record<(typeof BUILDING_WORDS)[number], Words>>;
  /** Handed over only where some building of the inventory knows any of it. */
  readonly structure?: StructureColumns | undefined;
  /** Coordinates, degrees: handed over only where a spectrum hangs on the place. */
  readonly place?: { readonly lon: Numbers; readonly lat: Numbers } | undefined;
}

/** Equally likely years by pool number. */
export type YearPools = Readonly<Record<number, readonly number[]>>;

function filled(value: number, sigma: number, origin: string | null, rule: string | null): Filled {
  return { value, sigma: sigma > 0 ? sigma : 0, origin: (origin ?? 'unknown') as Origin, rule: rule ?? '' };
}

function systemOf(word: string | null): System | null {
  return word === null || word === 'unknown' ? null : (word as System);
}

/** Reads rows of the columns as Buildings; the arrays are looked up once, because a million rows pay for every look-up. */
export function buildingReader(columns: BuildingColumns, pools: YearPools): (i: number) => Building {
  const {
    year_built,
    year_pool,
    storeys_above,
    storeys_above_sigma,
    height_m,
    height_m_sigma,
    first_storey_height_m,
    plan_length_m,
    plan_width_m,
    floor_area_m2,
    floor_area_m2_sigma,
    year_retrofitted,
    retrofit_level,
    occupants_peak,
    occupied_hours_per_week,
    importance_factor,
    seismic_weight_kN,
    unit_weight_kN_per_m2,
    measured_period_longitudinal_s,
    measured_period_transverse_s,
    design_base_shear_coefficient,
    wind_base_shear_coefficient,
    capacity_sa_g,
    reentrant_projection,
    reentrant_area_share,
    footprint_area_m2,
  } = columns.numbers;
  const {
    status,
    storeys_above_origin,
    storeys_above_rule,
    height_m_origin,
    height_m_rule,
    floor_area_m2_origin,
    floor_area_m2_rule,
    year_built_origin,
    system,
    system_transverse,
    use,
    storey_stiffness_longitudinal_kN_per_m,
    storey_stiffness_transverse_kN_per_m,
    measured_amplitude,
    soft_storey,
    weak_storey,
    torsion,
    reentrant_corner,
    setback,
    mass_irregularity,
    site_class,
    hazard_zone,
    spectrum,
    design_level,
  } = columns.words;
  const { place } = columns;
  const structureAt = columns.structure === undefined ? null : structureReader(columns.structure);
  return (i) => {
    const year = year_built[i]!;
    const pool = year_pool[i]!;
    const years = year > 0 ? [year] : pool >= 0 ? (pools[pool] ?? []) : [];
    return {
      id: columns.id[i]!,
      status: (status[i] ?? 'in-use') as Building['status'],
      storeys: filled(storeys_above[i]!, storeys_above_sigma[i]!, storeys_above_origin[i]!, storeys_above_rule[i]!),
      height_m: filled(height_m[i]!, height_m_sigma[i]!, height_m_origin[i]!, height_m_rule[i]!),
      first_storey_height_m: first_storey_height_m[i]!,
      plan_length_m: plan_length_m[i]!,
      plan_width_m: plan_width_m[i]!,
      floor_area_m2: filled(
        floor_area_m2[i]!,
        floor_area_m2_sigma[i]!,
        floor_area_m2_origin[i]!,
        floor_area_m2_rule[i]!,
      ),
      years,
      yearOrigin: (year_built_origin[i] ?? 'unknown') as Origin,
      year_retrofitted: year_retrofitted[i]!,
      retrofit_level: retrofit_level[i]!,
      system: systemOf(system[i]!),
      system_transverse: systemOf(system_transverse[i]!),
      use: (use[i] ?? 'unknown') as Use,
      occupants_peak: occupants_peak[i]!,
      occupied_hours_per_week: occupied_hours_per_week[i]!,
      importance_factor: importance_factor[i]!,
      seismic_weight_kN: seismic_weight_kN[i]!,
      unit_weight_kN_per_m2: unit_weight_kN_per_m2[i]!,
      storey_stiffness_kN_per_m: {
        longitudinal: numbersOf(storey_stiffness_longitudinal_kN_per_m[i]!),
        transverse: numbersOf(storey_stiffness_transverse_kN_per_m[i]!),
      },
      measured_period_s: {
        longitudinal: measured_period_longitudinal_s[i]!,
        transverse: measured_period_transverse_s[i]!,
      },
      measured_amplitude: measured_amplitude[i] as Building['measured_amplitude'],
      soft_storey: soft_storey[i] as YesNo | null,
      weak_storey: weak_storey[i] as YesNo | null,
      torsion: torsion[i] as YesNo | null,
      reentrant_corner: reentrant_corner[i] as YesNo | null,
      setback: setback[i] as YesNo | null,
      mass_irregularity: mass_irregularity[i] as YesNo | null,
      reentrant_projection: reentrant_projection[i]!,
      reentrant_area_share: reentrant_area_share[i]!,
      footprint_area_m2: footprint_area_m2[i]!,
      site_class: site_class[i]!,
      hazard_zone: hazard_zone[i]!,
      lon: place === undefined ? NaN : place.lon[i]!,
      lat: place === undefined ? NaN : place.lat[i]!,
      spectrum: spectrum[i]!,
      design_base_shear_coefficient: design_base_shear_coefficient[i]!,
      wind_base_shear_coefficient: wind_base_shear_coefficient[i]!,
      design_level: design_level[i] as Building['design_level'],
      capacity_sa_g: capacity_sa_g[i]!,
      structure: structureAt === null ? null : structureAt(i),
    };
  };
}

/** Row `i` of the columns as a Building. */
export function buildingAt(columns: BuildingColumns, i: number, pools: YearPools): Building {
  return buildingReader(columns, pools)(i);
}
