/** An invented building for tests of the engineering: everything not known but what the test states. */
import type { Building, Filled, Structure } from '../../src/engineering/building.js';

/** A given value. */
export const given = (value: number): Filled => ({ value, sigma: 0, origin: 'given', rule: '' });

/** An inferred value with the spread of its natural logarithm. */
export const inferred = (value: number, sigma: number): Filled => ({
  value,
  sigma,
  origin: 'inferred',
  rule: 'invented for a test',
});

const BLANK: Building = {
  id: 'T-1',
  status: 'in-use',
  storeys: given(4),
  height_m: given(14),
  first_storey_height_m: NaN,
  plan_length_m: 30,
  plan_width_m: 15,
  floor_area_m2: given(1800),
  years: [1965],
  yearOrigin: 'given',
  year_retrofitted: NaN,
  retrofit_level: NaN,
  system: 'concrete-moment-frame',
  system_transverse: null,
  use: 'office',
  occupants_peak: NaN,
  occupied_hours_per_week: NaN,
  importance_factor: NaN,
  seismic_weight_kN: NaN,
  unit_weight_kN_per_m2: NaN,
  storey_stiffness_kN_per_m: { longitudinal: null, transverse: null },
  measured_period_s: { longitudinal: NaN, transverse: NaN },
  measured_amplitude: null,
  soft_storey: null,
  weak_storey: null,
  torsion: null,
  reentrant_corner: null,
  setback: null,
  mass_irregularity: null,
  reentrant_projection: NaN,
  reentrant_area_share: NaN,
  footprint_area_m2: NaN,
  site_class: 'C',
  hazard_zone: null,
  lon: NaN,
  lat: NaN,
  spectrum: null,
  design_base_shear_coefficient: NaN,
  wind_base_shear_coefficient: NaN,
  design_level: null,
  capacity_sa_g: NaN,
  structure: null,
};

/** The invented building with `fields` changed. */
export const building = (fields: Partial<Building> = {}): Building => ({ ...BLANK, ...fields });

/** Flags of a building that is irregular in no way, all on record. */
export const NO_IRREGULARITY = {
  soft_storey: 'no',
  weak_storey: 'no',
  torsion: 'no',
  reentrant_corner: 'no',
  setback: 'no',
  mass_irregularity: 'no',
} as const satisfies Partial<Building>;

/** What is known of a structure: nothing but `fields`. */
export const structure = (fields: Partial<Structure>): Structure => ({
  column_count: NaN,
  column_width_m: NaN,
  column_depth_m: NaN,
  beam_width_m: NaN,
  beam_depth_m: NaN,
  bay_length_m: NaN,
  base_fixity: null,
  wall_areas_m2: { longitudinal: null, transverse: null },
  wall_lengths_m: { longitudinal: null, transverse: null },
  top_displacement_m: { longitudinal: NaN, transverse: NaN },
  brace_area_m2: { longitudinal: NaN, transverse: NaN },
  infill_thickness_m: NaN,
  infill_length_m: { longitudinal: NaN, transverse: NaN },
  diaphragm: null,
  concrete_strength_MPa: NaN,
  steel_height_share: NaN,
  vs30_mps: NaN,
  site_period_s: NaN,
  ...fields,
});
