/** An invented building for tests of the engineering: everything not known but what the test states. */
import type { Building, Filled } from '../../src/engineering/building.js';

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
  site_class: 'C',
  hazard_zone: null,
  design_base_shear_coefficient: NaN,
  design_level: null,
  capacity_sa_g: NaN,
};

/** The invented building with `fields` changed. */
export const building = (fields: Partial<Building> = {}): Building => ({ ...BLANK, ...fields });
