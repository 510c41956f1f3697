/** Sensible inputs for every name a record may ask for, drawn by fast-check: physical limits [judgement], else the record's own range. */
import fc from 'fast-check';
import type { AnyRecord, Inputs, InputSpec, InputValue } from '../../src/engineering/formula.js';

const between = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });
const whole = (min: number, max: number): fc.Arbitrary<number> => fc.integer({ min, max });

const RANGES: Readonly<Record<string, fc.Arbitrary<number>>> = {
  height_m: between(2, 300),
  storeys: whole(1, 60),
  plan_dimension_m: between(4, 200),
  top_displacement_m: between(0.001, 2),
  period_s: between(0.02, 10),
  period_1_s: between(0.02, 10),
  period_2_s: between(0.02, 10),
  sigma_1: between(0.05, 1),
  sigma_2: between(0.05, 1),
  frequency_hz: between(0.05, 50),
  base_area_m2: between(20, 20000),
  diaphragm_length_m: between(3, 60),
  wall_displacement_m: between(0.0005, 0.1),
  diaphragm_displacement_m: between(0.001, 0.5),
  steel_or_wood_height_m: between(0, 30),
  wall_reduction: between(0.6, 1),
  mass_t: between(1, 1e5),
  stiffness_kN_per_m: between(100, 1e8),
  weight_kN: between(10, 1e7),
  floor_area_m2: between(5, 1e6),
  unit_weight_kN_per_m2: between(0.5, 40),
  first_storey_height_m: between(2, 12),
  storey_height_m: between(2, 8),
  sd_m: between(0.001, 1),
  participation: between(1, 1.6),
  c1: between(1, 2),
  c2: between(1, 1.5),
  roof_displacement_m: between(0.001, 2),
  drift_factor: between(1, 3),
  yield_coefficient: between(0.02, 1),
  design_sa_g: between(0.01, 2),
  usual_storey_height_m: between(2, 8),
  sds_g: between(0.05, 3),
  sd1_g: between(0.02, 2),
  tl_s: between(2, 16),
  ag_g: between(0.01, 1),
  sa_g: between(0.01, 4),
  sa_1_g: between(0.05, 2),
  sa_2_g: between(0.05, 4),
  return_period_1_years: between(40, 500),
  return_period_2_years: between(501, 5000),
  coefficient: between(0.01, 0.2),
  zone_share: fc.constantFrom(0.25, 0.5, 1),
  zone_factor: between(0.05, 1),
  structure_factor: between(0.67, 3),
  site_factor: between(1, 2),
  reduction_r: between(1.5, 12),
  ca_g: between(0.06, 0.66),
  cv_g: between(0.06, 1.92),
  zone_floor: between(0, 0.64),
  structural_type_factor: between(0.8, 2),
  material_factor: between(0.8, 1.2),
  seismicity_degree: between(3, 12),
  soil_factor: between(1, 2),
  tc_s: between(0.1, 2),
  ta_s: between(0.1, 0.2),
  tb_s: between(0.3, 0.9),
  lambda: fc.constantFrom(0.85, 1),
  zone_g: between(0.02, 0.5),
  zone_coefficient: between(0.03, 0.1),
  ground_period_s: between(0.1, 2),
  overstrength_d: between(1.5, 3),
  basic_coefficient: between(0.01, 0.08),
  performance_factor: between(0.4, 1.6),
  fall_s: between(1, 1.67),
  foundation_factor: between(1, 2),
  velocity_ratio: between(0.05, 0.4),
  plateau: fc.constantFrom(2.1, 3, 4.2),
  s_0p2_g: between(0.2, 1.5),
  s_0p5_g: between(0.1, 1.2),
  s_1_g: between(0.05, 0.8),
  s_2_g: between(0.02, 0.4),
  rt: between(0.1, 1),
  structural_factor: between(0.1, 0.55),
  weight_share: between(0.05, 1),
  strength_today: between(0.04, 1),
  strength_then: between(0.04, 1),
  modifier_ms: between(1, 5),
  average_stress_MPa: between(0.1, 2),
  area_m2: between(0.1, 50),
  modification_c: between(1, 1.4),
  yield_MPa: between(200, 500),
  concrete_factor: between(0.5, 1.5),
  stress_MPa: between(0.7, 3),
  storey: whole(1, 3),
  wall_index: between(0, 2),
  column_index: between(0, 2),
  column_share: fc.constantFrom(0.7, 1),
  masonry_area_m2: between(0, 50),
  column_area_m2: between(0.1, 50),
  fall: between(0, 3),
  period_coefficient: between(0.01, 0.2),
  period_exponent: between(0.5, 1),
  near_fault_s1_g: fc.constantFrom(0, 0.6, 0.9, 1.2),
  ductility: between(1, 6),
  corner_period_s: between(0.1, 2),
  line_1_deg: between(-10, 13),
  place_deg: between(13.01, 14),
  line_2_deg: between(14.01, 20),
  sa_sw_g: between(0.01, 4),
  sa_se_g: between(0.01, 4),
  sa_nw_g: between(0.01, 4),
  sa_ne_g: between(0.01, 4),
  design_base_shear_coefficient: between(0, 0.5),
  base_shear_coefficient: between(0.01, 0.5),
  level_factor: fc.constantFrom(1, 1.4),
  overstrength: between(1, 4),
  code_reduction: between(1, 12),
  first_reduction: between(1, 8),
  ductility_share: between(0.4, 1),
  capacity_sa_g: between(0.02, 3),
  strength_coefficient: between(0.01, 1),
  reduction: between(1, 6),
  retrofit_level: between(0.3, 1.2),
  wind_coefficient: between(0, 0.2),
  irregularity: between(0.3, 1),
  mass_share: between(0.6, 1),
  occupants_peak: between(0, 1e5),
  occupied_hours_per_week: between(0, 168),
  people_per_m2: between(0.001, 2),
  people_exposed: between(0.1, 1e5),
  importance_factor: between(0.5, 2),
  zone_term: between(-3, 3),
  slope_k: between(1, 5),
  period_ratio: between(1, 2),
  gravity_mps2: between(9.7, 9.9),
  damping_ratio: between(0.01, 0.3),
  modulus_MPa: between(100, 2e5),
  shear_modulus_MPa: between(40, 8e4),
  cracking_factor: between(0.2, 1),
  second_moment_m4: between(1e-5, 10),
  width_m: between(0.1, 4),
  depth_m: between(0.1, 4),
  length_m: between(1, 20),
  beam_to_column_ratio: between(0, 10),
  column_sum_m3: between(1e-4, 1),
  beam_sum_m3: between(1e-4, 1),
  beam_stiffness_kN_m: between(1e3, 1e6),
  column_stiffness_kN_m: between(1e3, 1e6),
  beam_column_ratio: between(0.01, 20),
  end_coefficient: between(0.05, 1),
  end_columns: whole(1, 40),
  end_stiffness_kN_per_m: between(1e3, 1e6),
  inner_columns: whole(0, 40),
  inner_stiffness_kN_per_m: between(1e3, 1e6),
  thickness_m: between(0.1, 1),
  pier_length_m: between(0.5, 12),
  pier_height_m: between(0.5, 12),
  gross_stiffness_kN_per_m: between(1e4, 1e5),
  strip_stiffness_kN_per_m: between(2e5, 1e6),
  piers_stiffness_kN_per_m: between(1e5, 1e6),
  wall_area_m2: between(0.2, 50),
  wall_area_ratio: between(0.002, 0.1),
  brace_area_m2: between(0.0005, 0.1),
  bay_length_m: between(2, 12),
  infill_modulus_MPa: between(500, 9000),
  infill_thickness_m: between(0.06, 0.5),
  infill_height_m: between(1.5, 5),
  infill_length_m: between(1, 9),
  frame_modulus_MPa: between(1e4, 2.2e5),
  column_second_moment_m4: between(1e-4, 0.1),
  beam_second_moment_m4: between(1e-4, 0.1),
  strut_parameter_per_m: between(0.2, 3),
  strut_width_m: between(0.1, 2),
  column_contact_length_m: between(0.1, 3),
  beam_contact_length_m: between(0.1, 3),
  panels: between(0.5, 40),
  panel_stiffness_kN_per_m: between(1e3, 1e5),
  mass_per_height_t_per_m: between(1, 2000),
  flexural_rigidity_kN_m2: between(1e5, 1e11),
  shear_rigidity_kN: between(1e4, 1e9),
  stiffness_ratio: between(0, 30),
  mode: whole(1, 3),
  concrete_strength_MPa: between(8, 80),
  density_kg_per_m3: between(1500, 2500),
  aggregate_factor: between(0.7, 1.2),
  unit_weight_kN_per_m3: between(15, 25),
  masonry_strength_MPa: between(1, 20),
  axial_force_ratio: between(0, 1),
  density_t_per_m3: between(1.4, 2.3),
  vs30_mps: between(80, 1500),
  modulus_ratio: between(0.1, 1),
  soil_shear_modulus_kN_per_m2: between(1e4, 1e6),
  half_width_m: between(3, 20),
  half_length_m: between(20, 60),
  poisson_ratio: between(0.2, 0.45),
  foundation_stiffness_kN_per_m: between(1e5, 1e8),
  rocking_stiffness_kN_m: between(1e6, 1e10),
  effective_height_m: between(2, 200),
  layer_depth_m: between(2, 200),
  layer_velocity_mps: between(60, 800),
  site_period_s: between(0.1, 4),
  shear_flow_kN_per_m: between(0.5, 20),
  wall_height_m: between(2, 6),
  wall_length_m: between(0.6, 12),
  chord_area_m2: between(0.002, 0.05),
  apparent_stiffness_kN_per_m: between(1000, 8000),
  anchorage_slip_m: between(0, 0.02),
  first_peak: between(0.5, 10),
  later_peak: between(0.001, 0.4),
  cycles: between(1, 50),
  log_decrement: between(0.001, 3),
  lower_hz: between(0.5, 0.95),
  upper_hz: between(1.05, 1.5),
  peak_hz: between(0.96, 1.04),
};

/** Up to six increasing periods with ordinates. */
const TABLE: fc.Arbitrary<{ readonly periods_s: readonly number[]; readonly ordinates_g: readonly number[] }> = fc
  .array(fc.tuple(between(0.05, 1.5), between(0.02, 2)), { minLength: 2, maxLength: 6 })
  .map((rows) => {
    let period = 0;
    return {
      periods_s: rows.map(([step]) => (period += step)),
      ordinates_g: rows.map(([, ordinate]) => ordinate),
    };
  });

/** Values within the range that the record itself states. */
function stated(spec: InputSpec): fc.Arbitrary<InputValue> | null {
  if (spec.words !== undefined) return fc.constantFrom(...spec.words);
  if (spec.to === undefined) return null;
  const number = between(Math.max(spec.from ?? spec.above ?? 0, spec.to / 500), spec.to);
  if (spec.kind === 'number') return spec.from === 0 ? fc.oneof(fc.constant(0), number) : number;
  return fc.array(number, { minLength: spec.least ?? 1, maxLength: spec.most ?? (spec.least ?? 1) + 4 });
}

/** Whether the record has a value for `inputs`: a code may refuse parameters that do not go together. */
function accepts({ family, constants }: AnyRecord, inputs: Inputs): boolean {
  try {
    family.evaluate(inputs, constants);
    return true;
  } catch (error) {
    if (error instanceof RangeError) return false;
    throw error;
  }
}

/** Inputs of `method`; none for procedures over lists of storeys. @throws Error for a name without a range. */
export function inputsOf(method: AnyRecord): fc.Arbitrary<Inputs> {
  const { id, family } = method;
  const specs = family.inputs;
  const table = specs.some(({ name }) => name === 'periods_s');
  const plain = specs.filter(({ name }) => !(table && (name === 'periods_s' || name === 'ordinates_g')));
  const fields: Record<string, fc.Arbitrary<InputValue>> = {};
  for (const spec of plain) {
    const range = RANGES[spec.name] ?? stated(spec);
    if (range === null) throw new Error(`no range for ${spec.name} of ${id}`);
    fields[spec.name] = range;
  }
  const all = table ? fc.tuple(TABLE, fc.record(fields)).map(([a, b]) => ({ ...a, ...b })) : fc.record(fields);
  return 'compile' in family || family.shownAt !== undefined ? all.filter((inputs) => accepts(method, inputs)) : all;
}
