/** Sensible inputs for every name a record may ask for: physical limits [judgement], drawn by fast-check. */
import fc from 'fast-check';
import type { AnyRecord, Inputs } from '../../src/engineering/formula.js';

const between = (min: number, max: number): fc.Arbitrary<number> => fc.double({ min, max, noNaN: true });
const whole = (min: number, max: number): fc.Arbitrary<number> => fc.integer({ min, max });

const RANGES: Readonly<Record<string, fc.Arbitrary<number | string>>> = {
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
  mass_t: between(1, 1e5),
  stiffness_kN_per_m: between(100, 1e8),
  weight_kN: between(10, 1e7),
  floor_area_m2: between(5, 1e6),
  unit_weight_kN_per_m2: between(0.5, 40),
  first_storey_height_m: between(2, 12),
  storey_height_m: between(2, 8),
  sds_g: between(0.05, 3),
  sd1_g: between(0.02, 2),
  tl_s: between(2, 16),
  ag_g: between(0.01, 1),
  ground: fc.constantFrom('A', 'B', 'C', 'D', 'E'),
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
  near_fault_s1_g: fc.constantFrom(0, 0.6, 0.9, 1.2),
  ductility: between(1, 6),
  corner_period_s: between(0.1, 2),
  design_base_shear_coefficient: between(0, 0.5),
  level_factor: fc.constantFrom(1, 1.4),
  overstrength: between(1, 4),
  code_reduction: between(1, 12),
  capacity_sa_g: between(0.02, 3),
  strength_coefficient: between(0.01, 1),
  reduction: between(1, 6),
  retrofit_level: between(0.3, 1.2),
  irregularity: between(0.3, 1),
  mass_share: between(0.6, 1),
  occupants_peak: between(0, 1e5),
  occupied_hours_per_week: between(0, 168),
  people_per_m2: between(0.001, 2),
  people_exposed: between(0.1, 1e5),
  importance_factor: between(0.5, 2),
  zone_term: between(-3, 3),
  slope_k: between(1, 5),
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

/** Inputs of `method`; none for procedures over lists of storeys. @throws Error for a name without a range. */
export function inputsOf({ id, family }: AnyRecord): fc.Arbitrary<Inputs> {
  const table = family.inputs.some(({ name }) => name === 'periods_s');
  const plain = family.inputs.filter(({ name }) => !(table && (name === 'periods_s' || name === 'ordinates_g')));
  const fields: Record<string, fc.Arbitrary<number | string>> = {};
  for (const { name } of plain) {
    const range = RANGES[name];
    if (range === undefined) throw new Error(`no range for ${name} of ${id}`);
    fields[name] = range;
  }
  return table ? fc.tuple(TABLE, fc.record(fields)).map(([a, b]) => ({ ...a, ...b })) : fc.record(fields);
}
