/**
 * The inventory's columns: one spelling from mapping file to database column to kernel to chart.
 * `limits` are the values taken at face value; outside them a cell is rejected (`outside-limits`), all of them ours [judgement].
 */
import type { Dimension } from './units.js';
import { AMPLITUDES, BASE_FIXITIES, DESIGN_LEVELS, STATUSES, SYSTEMS, USES } from './building.js';

export interface InventoryColumn {
  readonly name: string;
  /** text: kept as it is; word: one of `words`; number; whole; list: numbers bottom to top; year. */
  readonly kind: 'text' | 'word' | 'number' | 'whole' | 'list' | 'year';
  readonly title: string;
  readonly dimension?: Dimension;
  /** SI unit in which it is stored (unit id); none for pure numbers. */
  readonly unit?: string;
  readonly limits?: readonly [number, number];
  readonly words?: readonly string[];
  /** Which entry of the study's `words` translates it. */
  readonly vocabulary?:
    'system' | 'use' | 'status' | 'site_class' | 'yes_no' | 'amplitude' | 'design_level' | 'base_fixity';
}

const YES_NO = ['yes', 'no'] as const;

function text(name: string, title: string): InventoryColumn {
  return { name, kind: 'text', title };
}
function word(
  name: string,
  title: string,
  words: readonly string[],
  vocabulary: NonNullable<InventoryColumn['vocabulary']>,
): InventoryColumn {
  return { name, kind: 'word', title, words, vocabulary };
}
function measure(
  name: string,
  title: string,
  dimension: Dimension,
  unit: string,
  limits: readonly [number, number],
): InventoryColumn {
  return { name, kind: 'number', title, dimension, unit, limits };
}
function plain(
  name: string,
  kind: 'number' | 'whole' | 'year',
  title: string,
  limits: readonly [number, number],
): InventoryColumn {
  return { name, kind, title, limits };
}

function list(
  name: string,
  title: string,
  dimension: Dimension,
  unit: string,
  limits: readonly [number, number],
): InventoryColumn {
  return { name, kind: 'list', title, dimension, unit, limits };
}

export const COLUMNS: readonly InventoryColumn[] = [
  text('id', 'Identifier'),
  text('name', 'Name'),
  text('group', 'Block or zone'),
  text('part_of', 'Part of'),
  plain('lon', 'number', 'Longitude', [-180, 180]),
  plain('lat', 'number', 'Latitude', [-90, 90]),
  text('footprint', 'Footprint'),
  plain('count', 'whole', 'Buildings in the row', [1, 10000]),
  plain('storeys_above', 'number', 'Storeys above ground', [1, 60]),
  plain('storeys_below', 'number', 'Storeys below ground', [0, 12]),
  plain('storeys_total', 'number', 'Storeys in all', [1, 72]),
  measure('height_m', 'Height', 'length', 'm', [2, 320]),
  measure('first_storey_height_m', 'First storey height', 'length', 'm', [2, 20]),
  measure('plan_length_m', 'Plan length', 'length', 'm', [2, 1000]),
  measure('plan_width_m', 'Plan width', 'length', 'm', [2, 1000]),
  measure('floor_area_m2', 'Floor area', 'area', 'm2', [5, 2000000]),
  plain('year_built', 'year', 'Year built', [1100, 2100]),
  plain('year_retrofitted', 'year', 'Year of seismic retrofit', [1900, 2100]),
  plain('retrofit_level', 'number', 'Retrofit level', [0.1, 1.5]),
  word('status', 'Status', STATUSES, 'status'),
  word('system', 'Lateral system', [...SYSTEMS, 'unknown'], 'system'),
  word('system_transverse', 'Lateral system across', [...SYSTEMS, 'unknown'], 'system'),
  text('diaphragm', 'Diaphragm'),
  word('use', 'Use', USES, 'use'),
  plain('occupants_peak', 'number', 'People at peak', [0, 200000]),
  plain('occupied_hours_per_week', 'number', 'Occupied hours a week', [0, 168]),
  plain('importance_factor', 'number', 'Importance factor', [0.5, 3]),
  word('heritage', 'Heritage', YES_NO, 'yes_no'),
  measure('seismic_weight_kN', 'Seismic weight', 'force', 'kN', [10, 1e8]),
  measure('unit_weight_kN_per_m2', 'Unit weight', 'pressure', 'kN_per_m2', [0.5, 40]),
  list('storey_stiffness_longitudinal_kN_per_m', 'Storey stiffness, longitudinal', 'stiffness', 'kN_per_m', [100, 1e9]),
  list('storey_stiffness_transverse_kN_per_m', 'Storey stiffness, transverse', 'stiffness', 'kN_per_m', [100, 1e9]),
  list('wall_areas_longitudinal_m2', 'Wall areas, longitudinal', 'area', 'm2', [0.01, 500]),
  list('wall_areas_transverse_m2', 'Wall areas, transverse', 'area', 'm2', [0.01, 500]),
  list('wall_lengths_longitudinal_m', 'Wall lengths, longitudinal', 'length', 'm', [0.2, 500]),
  list('wall_lengths_transverse_m', 'Wall lengths, transverse', 'length', 'm', [0.2, 500]),
  plain('column_count', 'whole', 'Columns of the first storey', [1, 5000]),
  measure('column_width_m', 'Column width, across', 'length', 'm', [0.1, 4]),
  measure('column_depth_m', 'Column depth, along', 'length', 'm', [0.1, 4]),
  measure('beam_width_m', 'Beam width', 'length', 'm', [0.1, 4]),
  measure('beam_depth_m', 'Beam depth', 'length', 'm', [0.1, 4]),
  measure('bay_length_m', 'Bay length', 'length', 'm', [1.5, 30]),
  word('base_fixity', 'Base of the columns', BASE_FIXITIES, 'base_fixity'),
  measure('top_displacement_longitudinal_m', 'Sway under gravity sideways, longitudinal', 'length', 'm', [0.0005, 20]),
  measure('top_displacement_transverse_m', 'Sway under gravity sideways, transverse', 'length', 'm', [0.0005, 20]),
  measure('brace_area_longitudinal_m2', 'Active braces of a storey, longitudinal', 'area', 'm2', [0.0001, 5]),
  measure('brace_area_transverse_m2', 'Active braces of a storey, transverse', 'area', 'm2', [0.0001, 5]),
  measure('infill_thickness_m', 'Infill thickness', 'length', 'm', [0.04, 1]),
  measure('infill_length_longitudinal_m', 'Solid infill of the first storey, longitudinal', 'length', 'm', [0.5, 2000]),
  measure('infill_length_transverse_m', 'Solid infill of the first storey, transverse', 'length', 'm', [0.5, 2000]),
  measure('concrete_strength_MPa', 'Concrete strength', 'pressure', 'MPa', [3, 120]),
  plain('steel_height_share', 'number', 'Share of the height in steel or timber', [0, 1]),
  measure('measured_period_longitudinal_s', 'Measured period, longitudinal', 'time', 's', [0.02, 20]),
  measure('measured_period_transverse_s', 'Measured period, transverse', 'time', 's', [0.02, 20]),
  word('measured_amplitude', 'Amplitude of the measurement', AMPLITUDES, 'amplitude'),
  word('soft_storey', 'Soft storey', YES_NO, 'yes_no'),
  word('weak_storey', 'Weak storey', YES_NO, 'yes_no'),
  word('torsion', 'Torsion', YES_NO, 'yes_no'),
  word('reentrant_corner', 'Re-entrant corner', YES_NO, 'yes_no'),
  word('setback', 'Setback', YES_NO, 'yes_no'),
  word('mass_irregularity', 'Mass irregularity', YES_NO, 'yes_no'),
  plain('reentrant_projection', 'number', 'Projection beyond a re-entrant corner, share of the plan', [0, 1]),
  plain('reentrant_area_share', 'number', 'Area between outline and hull, share of the floor', [0, 10]),
  measure('footprint_area_m2', 'Footprint area', 'area', 'm2', [2, 1e6]),
  text('condition', 'Condition'),
  { name: 'site_class', kind: 'text', title: 'Site class', vocabulary: 'site_class' },
  measure('vs30_mps', 'Shear-wave velocity, upper 30 m', 'speed', 'mps', [50, 3000]),
  measure('site_period_s', 'Site period', 'time', 's', [0.01, 10]),
  text('hazard_zone', 'Hazard zone'),
  text('spectrum', 'Spectrum of the study'),
  plain('design_base_shear_coefficient', 'number', 'Design base shear coefficient', [0.005, 1]),
  plain(
    'wind_base_shear_coefficient',
    'number',
    'Base shear coefficient of the wind it was designed for, strength level',
    [0.001, 1],
  ),
  word('design_level', 'Level of the design coefficient', DESIGN_LEVELS, 'design_level'),
  measure('capacity_sa_g', 'Capacity from an assessment', 'acceleration', 'g', [0.005, 5]),
  plain('assessment_cost', 'number', 'Cost of an assessment', [0, 1e9]),
];

const BY_NAME: ReadonlyMap<string, InventoryColumn> = new Map(COLUMNS.map((column) => [column.name, column]));

/** The inventory column called `name`, or undefined. */
export function findColumn(name: string): InventoryColumn | undefined {
  return BY_NAME.get(name);
}
