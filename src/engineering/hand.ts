/** A trace as text: symbols, numbers put in, result with unit, clause. Shared by terminal, page and review sheet. */
import { evaluateExpression, parseExpression, writeExpression } from './expression.js';
import { formatCount, formatNumber, formatQuantity, shownUnit, unitLabel, textInDisplay } from './format.js';
import type { Display } from './format.js';
import type { Family, InputValue } from './formula.js';
import { cite } from './source.js';
import { segmentAt } from './spectrum/compiled.js';
import type { SpectrumFamily } from './spectrum/family.js';
import type { Inputs } from './formula.js';
import type { FormulaStep, Trace, ValueStep } from './trace.js';
import { findUnit } from './units.js';

export interface HandStep {
  readonly kind: 'heading' | 'value' | 'formula' | 'choice';
  readonly title: string;
  /** Formula in symbols, or the statement of a choice. */
  readonly symbolic: string;
  /** The same with its numbers. */
  readonly substituted: string;
  readonly result: string;
  readonly source: string;
  readonly mark: string;
  readonly details: readonly string[];
  /** The record behind a formula step. */
  readonly method: string | null;
  /** The value to full precision, formula steps only. */
  readonly value: number | null;
}

const SYMBOLS: Readonly<Record<string, string>> = {
  height_m: 'h',
  period_s: 'T',
  sa_g: 'S_a',
  sds_g: 'S_DS',
  sd1_g: 'S_D1',
  tl_s: 'T_L',
  ag_g: 'a_g',
  ss_g: 'S_S',
  s1_g: 'S_1',
  sxs_g: 'S_XS',
  sx1_g: 'S_X1',
  fa: 'F_a',
  fv: 'F_v',
  b1: 'B_1',
  eta: 'η',
  behaviour_factor: 'q',
  lower_bound_factor: 'β',
  return_factor: 'R',
  distance_km: 'D',
  performance_factor: 'S_p',
  pga_ref_g: 'PGA_ref',
  f_0p2: 'F(0.2)',
  f_0p5: 'F(0.5)',
  f_1: 'F(1)',
  f_2: 'F(2)',
  f_5: 'F(5)',
  f_10: 'F(10)',
  mass_t: 'm',
  stiffness_kN_per_m: 'k',
  storeys: 'N',
  weight_kN: 'W',
  floor_area_m2: 'A',
  unit_weight_kN_per_m2: 'w',
  capacity_sa_g: 'C',
  people_exposed: 'E',
  importance_factor: 'I',
  slope_k: 'k',
  zone_term: 'Z₀',
  ductility: 'μ',
  overstrength: 'Ω',
  reduction: 'R_μ',
  corner_period_s: 'T_c',
  level_factor: 'f_level',
  strength_coefficient: 'C_s',
  design_base_shear_coefficient: 'C_d',
  mass_share: 'α₁',
  code_reduction: 'R_code',
  retrofit_level: 'r',
  irregularity: 'ι',
  sd_m: 'S_d',
  participation: 'β₁',
  c1: 'C₁',
  c2: 'C₂',
  strength_ratio: 'μ_s',
  site_factor_a: 'a',
  yield_coefficient: 'c_y',
  roof_displacement_m: 'u_roof',
  drift_factor: 'β₂',
  drift_ratio: 'θ_max',
  base_shear_coefficient: 'V/W',
  displacement_1_m: 'u₁',
  displacement_2_m: 'u₂',
  correlation: 'ρ',
  damping_1: 'ζ₁',
  damping_2: 'ζ₂',
  gap_needed_m: 's',
  shorter_height_m: 'h',
  design_sa_g: 'S_d(T)',
  storey_factor: 'ι_s',
  torsion_factor: 'ι_t',
  torsion_chance: 'p_t',
  reentrant_factor: 'ι_r',
  reentrant_chance: 'p_r',
  setback_factor: 'ι_b',
  setback_chance: 'p_b',
  mass_factor: 'ι_m',
  mass_chance: 'p_m',
  usual_storey_height_m: 'h₂',
  zone_factor: 'Z',
  structure_factor: 'K',
  site_factor: 'S',
  reduction_r: 'R',
  coefficient: 'C_t',
  exponent: 'x',
  unit_m: 'unit',
  occupants_peak: 'P',
  occupied_hours_per_week: 'hours',
  people_per_m2: 'p',
  gravity_mps2: 'g',
  storey_height_m: 'h_s',
  first_storey_height_m: 'h₁',
  period_1_s: 'T₁',
  sigma_1: 'σ₁',
  period_2_s: 'T₂',
  sigma_2: 'σ₂',
  zone_share: 'z',
  east_share: 'x',
  north_share: 'y',
  place_deg: 'place',
  line_1_deg: 'line₁',
  line_2_deg: 'line₂',
  sa_sw_g: 'S_SW',
  sa_se_g: 'S_SE',
  sa_nw_g: 'S_NW',
  sa_ne_g: 'S_NE',
  zone_floor: '0.8 Z N_v',
  near_fault_s1_g: 'S₁',
  ca_g: 'C_a',
  cv_g: 'C_v',
  plan_dimension_m: 'D',
  floor_g: 'least',
  top_displacement_m: 'd',
  sa_1_g: 'S_a1',
  sa_2_g: 'S_a2',
  return_period_1_years: 'TR₁',
  return_period_2_years: 'TR₂',
  occupied_share: 'q',
  wall_areas_m2: 'A_i',
  wall_lengths_m: 'D_i',
  wall_heights_m: 'h_i',
  base_area_m2: 'A_B',
  diaphragm_length_m: 'L',
  wall_displacement_m: 'd_w',
  diaphragm_displacement_m: 'd_d',
  steel_or_wood_height_m: 'h_sw',
  wall_reduction: 'ψ_T',
  base_s: 'T₀',
  height_exponent: 'y',
  plan_coefficient: 'c_p',
  span_coefficient: 'c_L',
  wall_coefficient: 'c_w',
  diaphragm_coefficient: 'c_d',
  added_coefficient: 'c_α',
  masses_t: 'm_i',
  storey_stiffness_kN_per_m: 'k_i',
  modulus_MPa: 'E',
  shear_modulus_MPa: 'G',
  cracking_factor: 'c',
  second_moment_m4: 'I',
  width_m: 'b',
  depth_m: 'd',
  length_m: 'L',
  beam_stiffness_kN_m: 'Σk_b',
  column_stiffness_kN_m: 'k_c',
  beam_column_ratio: 'k̄',
  end_coefficient: 'a',
  top_0: 'p₀',
  top_1: 'p₁',
  bottom_0: 'q₀',
  bottom_1: 'q₁',
  offset_MPa: 'E₀',
  psi_MPa: 'psi',
  end_columns: 'n_end',
  end_stiffness_kN_per_m: 'D_end',
  inner_columns: 'n_in',
  inner_stiffness_kN_per_m: 'D_in',
  end_factor: 'β',
  shape_factor: 'κ',
  slab_factor: 'φ',
  thickness_m: 't',
  pier_length_m: 'l',
  pier_height_m: 'h',
  wall_area_m2: 'A_w',
  brace_area_m2: 'A_b',
  bay_length_m: 'L',
  infill_modulus_MPa: 'E_m',
  infill_thickness_m: 't',
  infill_height_m: 'h_inf',
  infill_length_m: 'l_inf',
  frame_modulus_MPa: 'E_f',
  column_second_moment_m4: 'I_c',
  beam_second_moment_m4: 'I_b',
  strut_parameter_per_m: 'λ₁',
  strut_width_m: 'a',
  panel_stiffness_kN_per_m: 'k_p',
  panels: 'n_p',
  mass_per_height_t_per_m: 'μ',
  flexural_rigidity_kN_m2: 'EI',
  shear_rigidity_kN: 'GA',
  stiffness_ratio: 'α',
  concrete_strength_MPa: 'f_c',
  masonry_strength_MPa: 'f_m',
  axial_force_ratio: 'ν',
  damping_ratio: 'ζ',
  vs30_mps: 'V_s',
  modulus_ratio: 'G/G₀',
  density_t_per_m3: 'ρ',
  poisson_ratio: 'ν',
  half_width_m: 'B',
  half_length_m: 'L',
  soil_shear_modulus_kN_per_m2: 'G',
  foundation_stiffness_kN_per_m: 'K',
  rocking_stiffness_kN_m: 'K_θ',
  effective_height_m: 'h̄',
  height_share: 'η',
  site_period_s: 'T_s',
  fs: 'F_S',
  f1: 'F_1',
  alpha_max_g: 'α_max',
  tg_s: 'T_g',
  f0: 'F₀',
  tc_star_s: 'T_C*',
  tp_s: 'T_P',
  standard_shear_coefficient: 'C₀',
};

const symbol = (name: string): string => SYMBOLS[name] ?? name;

/** C_t is the trade's symbol for the coefficient of a period formula; any other coefficient is a plain c. */
const symbolIn =
  (familyId: string) =>
  (name: string): string =>
    name === 'coefficient' && !familyId.startsWith('period/') ? 'c' : symbol(name);

/** Quantities that count things: whole ones print without decimals. */
const COUNTS: ReadonlySet<string> = new Set(['storeys', 'occupants_peak', 'occupied_hours_per_week']);

function showNumber(name: string, value: number): string {
  if (COUNTS.has(name) && Number.isInteger(value)) return formatCount(value);
  // a metre is the fifth decimal of a degree
  return formatNumber(value, name.endsWith('_deg') ? 8 : 4);
}

/** A number as the formula takes it, in the unit of its record; the unit is named where the display shows the quantity in another. */
function showInput(name: string, value: InputValue, display: Display): string {
  if (typeof value === 'string') return value;
  const unit = unitOfName(name);
  const named = unit === null || shownUnit(unit, display) === unit ? '' : ` ${unitLabel(unit, 'si')}`;
  if (typeof value === 'number') return `${showNumber(name, value)}${named}`;
  return `[${value.map((entry) => formatNumber(entry, 4)).join('; ')}]${named}`;
}

/** The result in the unit that its formula yields, since the numbers put in are in such units; then in the display's unit. */
function showResult(value: number, unit: string | null, display: Display): string {
  const own = formatQuantity(value, unit, 'si', 4);
  if (unit === null || Number.isNaN(value) || shownUnit(unit, display) === unit) return own;
  return `${own} (${formatQuantity(value, unit, display, 4)})`;
}

/** "height_m" -> "height": the unit stands with the value. */
export function nameWithoutUnit(name: string, unit: string | null = unitOfName(name)): string {
  return (unit === null ? name : name.slice(0, -unit.length - 1)).replaceAll('_', ' ');
}

function showValueStep({ name, value, origin }: ValueStep, display: Display): Pick<HandStep, 'title' | 'result'> {
  const unit = unitOfName(name);
  const title = nameWithoutUnit(name, unit);
  // Lists come as text, in the unit of their name.
  if (typeof value === 'string') return { title, result: unit === null ? value : `${value} ${unitLabel(unit, 'si')}` };
  if (unit === null) return { title, result: showNumber(name, value) };
  // The conversion that stands beside it yields the unit of the record, whatever is displayed.
  return { title, result: formatQuantity(value, unit, origin === 'converted' ? 'si' : display, 4) };
}

/** The display formula of a step: the family's own, or the branch of the spectrum that was read. */
export function expressionOf(step: Pick<FormulaStep, 'record' | 'inputs'>): {
  readonly text: string | null;
  readonly branch: string;
  /** Numbers that the formula names besides inputs and constants. */
  readonly quantities: Readonly<Record<string, number>>;
} {
  const family = step.record.family as Family<Inputs, unknown> & Partial<Pick<SpectrumFamily<Inputs>, 'compile'>>;
  if (family.compile !== undefined && typeof step.inputs['period_s'] === 'number') {
    const compiled = family.compile(step.inputs);
    const segment = segmentAt(compiled, step.inputs['period_s']);
    return { text: segment.expression, branch: segment.clause, quantities: compiled.quantities ?? {} };
  }
  const shown = family.shownAt?.(step.inputs, step.record.constants);
  return { text: shown?.expression ?? family.expression, branch: shown?.clause ?? '', quantities: {} };
}

function formulaStep(step: FormulaStep, display: Display): HandStep {
  const { record, inputs, value } = step;
  const { text, branch, quantities } = expressionOf(step);
  const constants: Readonly<Record<string, number>> = {
    ...(record.constants as Readonly<Record<string, number>>),
    ...quantities,
  };
  let symbolic = record.family.procedure ?? '';
  let substituted = Object.entries(inputs)
    .map(([name, input]) => `${symbol(name)} = ${showInput(name, input, display)}`)
    .join(', ');
  if (text !== null) {
    const node = parseExpression(text);
    symbolic = writeExpression(node, symbolIn(record.family.id));
    substituted = writeExpression(node, (name) => showInput(name, inputs[name] ?? constants[name] ?? name, display));
  }
  return {
    kind: 'formula',
    title: record.title,
    symbolic: text === null ? symbolic : `${record.family.symbol} = ${symbolic}`,
    substituted: text === null ? substituted : `= ${substituted}`,
    result: `= ${showResult(value, record.family.unit, display)}`,
    source: branch === '' ? cite(record.source) : `${cite(record.source)}, ${branch}`,
    mark: record.verified,
    details: record.note === undefined ? [] : [record.note],
    method: record.id,
    value,
  };
}

/** The steps of a trace as text. */
export function handSteps(trace: Trace, display: Display): readonly HandStep[] {
  return trace.steps.map((step): HandStep => {
    const blank = {
      symbolic: '',
      substituted: '',
      result: '',
      source: '',
      mark: '',
      details: [],
      method: null,
      value: null,
    };
    switch (step.kind) {
      case 'heading':
        return { ...blank, kind: 'heading', title: step.text };
      case 'value':
        return {
          ...blank,
          kind: 'value',
          ...showValueStep(step, display),
          source: textInDisplay(step.why, display),
          mark: step.origin,
        };
      case 'choice':
        return {
          ...blank,
          kind: 'choice',
          title: step.question,
          symbolic: step.taken,
          source: step.because,
          details: step.others.map(({ what, why }) => `not ${what}: ${why}`),
        };
      case 'formula':
        return formulaStep(step, display);
    }
  });
}

/** Unit id at the end of a quantity's name: `height_m` -> m, `storey_stiffness_kN_per_m` -> kN_per_m; null for pure numbers. */
export function unitOfName(name: string): string | null {
  if (name.startsWith('people_per_')) return null;
  const parts = name.split('_');
  for (let from = 1; from < parts.length; from += 1) {
    const tail = parts.slice(from).join('_');
    const unit = findUnit(tail);
    if (unit !== undefined && unit.id === tail) return unit.id;
  }
  return null;
}

/** The display formula evaluated on its own: what the tests hold against the code. Null when the method is a procedure. */
export function evaluateDisplayed(step: Pick<FormulaStep, 'record' | 'inputs'>): number | null {
  const { text, quantities } = expressionOf(step);
  if (text === null) return null;
  const constants = step.record.constants as Readonly<Record<string, number>>;
  return evaluateExpression(parseExpression(text), {
    ...constants,
    ...quantities,
    ...(step.inputs as Readonly<Record<string, number>>),
  });
}
