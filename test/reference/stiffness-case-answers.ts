/**
 * The answers that the rows of the stiffness case file state, each with the reference case whose measured value must give it. The
 * numbers are those of the file; `within` is its own tolerance. Answers without a case are listed with the reason.
 */
import { FT_M, IN_M, LBF_KN } from './case.js';

/** The measured value in the terms of the file. */
type As = (value: number) => number;
type Answer = readonly [stated: number, id: string, as?: As];
export interface Row {
  /** Relative, or absolute where it says so. */
  readonly within: number;
  readonly absolute?: true;
  /** As the file names what it states. */
  readonly answers: Readonly<Record<string, readonly Answer[]>>;
}

const omega: As = (period_s) => (2 * Math.PI) / period_s;
const squared: As = (period_s) => omega(period_s) ** 2;
const kipPerIn: As = (kN_per_m) => (kN_per_m * IN_M) / (1000 * LBF_KN);
const lbPerIn: As = (kN_per_m) => (kN_per_m * IN_M) / LBF_KN;
const kip: As = (kN) => kN / (1000 * LBF_KN);
const feet: As = (m) => m / FT_M;
const psi: As = (MPa) => (MPa * 1000 * IN_M * IN_M) / LBF_KN;
const giga: As = (MPa) => MPa / 1000;
const inverse: As = (value) => 1 / value;

const rel = (within: number, answers: Row['answers']): Row => ({ within, answers });
const abs = (within: number, answers: Row['answers']): Row => ({ within, absolute: true, answers });

/** Stated numbers in order, each with the case of its own part of an id. */
const each = (stated: readonly number[], ids: readonly string[], as?: As): readonly Answer[] =>
  stated.map((value, i): Answer => (as === undefined ? [value, ids[i]!] : [value, ids[i]!, as]));
const numbered = (start: string, parts: readonly (string | number)[]): readonly string[] =>
  parts.map((part) => `${start}-${String(part)}`);
const modes = (id: string, count: number): readonly string[] => numbered(`${id}-mode`, [1, 2, 3, 4, 5].slice(0, count));

const SOFT = ['3-0.7', '3-0.5', '5-0.6', '5-0.3', '10-0.5'] as const;
/** Over the uniform building of as many storeys: T √(k/m) = π/sin(π/(4N + 2)). */
const overUniform =
  (storeys: number): As =>
  (period) =>
    (period * Math.sin(Math.PI / (4 * storeys + 2))) / Math.PI;
const ALPHAS = [1, 2, 3, 5, 8, 12.5, 20, 30] as const;
/** Period over that of the wall alone, from the root: 1.8751²/(γ √(γ² + α²)). */
const overFlexure =
  (alpha: number): As =>
  (root) =>
    1.8751041 ** 2 / (root * Math.sqrt(root * root + alpha * alpha));

export const STATED: Readonly<Record<string, Row>> = {
  'SD-01': rel(0.001, { omega_rad_per_s: [[23.52, 'SD-01', omega]], period_s: [[0.267, 'SD-01']] }),
  'SD-02': rel(0.003, {
    effective_weight_kip: [[1916.4, 'SD-02-weight', kip]],
    log_decrement: [[0.2231, 'SD-02-decrement']],
    damping_ratio_exact: [[0.03549, 'SD-02-exact']],
  }),
  'SD-04': abs(5e-5, {
    damped_period_s: each([1.0002, 1.00125, 1.00504, 1.02062], numbered('SD-04', [0.02, 0.05, 0.1, 0.2])),
  }),
  'SD-05': abs(0.001, { T_en1998_s: [[0.6, 'SD-05']], T_sdof_2pi_sqrt_d_over_g_s: [[0.6018, 'SD-05-one-mass']] }),
  'SD-07': rel(0.0012, {
    omega_rad_per_s: each([10.332, 30.398, 45.811], modes('SD-07', 3), omega),
    // printed to three decimals
    period_s: each([0.608, 0.207, 0.137], modes('SD-07', 3), (t) => Number(t.toFixed(3))),
    eigenvalue_per_s2: each([106.752, 924.024, 2098.666], modes('SD-07', 3), squared),
    // of the roof: the first floor's share of it
    mode1_bottom_to_top: [[0.5445, 'SD-07-shape']],
  }),
  'SD-08': rel(0.001, { omega_rad_per_s: each([0.2439, 0.6689, 1, 1.286, 1.685], modes('SD-08', 5), omega) }),
  'SD-10': rel(0.001, {
    omega_over_sqrt_k_over_m: each([0.7071, 1.4142], modes('SD-10', 2), omega),
    effective_mass_fraction: each([0.8889, 0.1111], numbered('SD-10-mass', [1, 2])),
    participation_roof: each([1.3333, -0.3333], numbered('SD-10-participation', [1, 2])),
  }),
  'SD-11': rel(0.001, {
    omega_rad_per_s: each([17.114, 41.317], modes('SD-11', 2), omega),
    period_s: each([0.3671, 0.1521], modes('SD-11', 2)),
  }),
  'SD-13': abs(1e-4, {
    omega_over_sqrt_k_over_m: each([0.28463, 0.83083, 1.30972, 1.68251, 1.91899], modes('SD-13', 5), omega),
    effective_mass_fraction: each([0.8795, 0.0872, 0.0242, 0.0075, 0.0016], numbered('SD-13-mass', [1, 2, 3, 4, 5])),
    participation_roof_mode1: [[1.2517, 'SD-13-participation']],
  }),
  'SD-14': abs(1e-4, {
    omega_over_sqrt_k_over_m: [
      [0.39018, 'SD-14-closed', omega],
      ...each([0.39018, 1.11114, 1.66294, 1.96157], modes('SD-14', 4), omega),
    ],
  }),
  'SD-16': abs(0.001, { period_s: each([0.755, 0.261, 0.179], numbered('SD-16', [69.3, 579, 1231])) }),
  'SD-17': abs(0.002, {
    T1_over_T1_uniform: each([1.112, 1.25, 1.116, 1.374, 1.093], numbered('SD-17', SOFT)).map(
      ([stated, id]): Answer => [stated, id, overUniform(Number(id.split('-')[2]))],
    ),
    first_storey_share_of_roof_displacement: each([0.545, 0.636, 0.411, 0.598, 0.268], numbered('SD-17-share', SOFT)),
  }),
  'SD-19': rel(0.001, {
    // two columns a storey
    storey_stiffness_check_lb_per_in: [[108889, 'SD-19-column', (k) => 2 * lbPerIn(k)]],
    omega1_linear_shape_rad_per_s: [[10.43, 'SD-19-linear', omega]],
    omega1_gravity_shape_rad_per_s: [[9.851, 'SD-19-gravity-shape', omega]],
    omega1_exact_rad_per_s: [[9.792, 'SD-19', omega]],
    T1_exact_s: [[0.6417, 'SD-19']],
  }),
  'SD-20': abs(1e-4, {
    omega1_dunkerley_lower: [[0.4082, 'SD-20-dunkerley', omega]],
    omega1_rayleigh_linear_upper: [[0.4629, 'SD-20-linear', omega]],
    omega1_rayleigh_gravity_upper: [[0.4472, 'SD-20-gravity', omega]],
    omega1_exact: [[0.44504, 'SD-20', omega]],
  }),
  'SD-22': rel(0.001, {
    rigidity_kip_per_in: [[9418, 'SD-22', kipPerIn]],
    // over E t
    relative_rigidity: [[0.686, 'SD-22', (k) => kipPerIn(k) / (1800 * 7.625)]],
  }),
  'SD-23': rel(0.001, {
    rigidity_kip_per_in: [[7892, 'SD-23', kipPerIn]],
    relative_rigidity: [[0.575, 'SD-23', (k) => kipPerIn(k) / (1800 * 7.625)]],
  }),
  'SD-25': rel(0.001, {
    net_in_per_kip: [[0.000163699, 'SD-25', inverse]],
    wall_rigidity_kip_per_in: [[6109, 'SD-25']],
  }),
  'SD-26': rel(0.001, {
    x_R_ft: [[49.5, 'SD-26-centre', feet]],
    // the case takes it as positive
    eccentricity_ft: [[-4.5, 'SD-26-eccentricity', (m) => -feet(m)]],
    J_ft2: [[27248, 'SD-26-torsion']],
  }),
  'SD-28': abs(0.003, { alpha: [[0.698, 'SD-28']] }),
  'SD-29': rel(0.001, {
    i_beam_kNm: [[21701, 'SD-29-beam']],
    i_col_upper_kNm: [[52083, 'SD-29-column-upper']],
    i_col_first_kNm: [[39063, 'SD-29-column-first']],
    K_upper: [[0.4167, 'SD-29-ratio-upper']],
    alpha_upper: [[0.1724, 'SD-29-upper']],
    D_upper_kN_per_m: [[11973, 'SD-29-D-upper']],
    K_first: [[0.5556, 'SD-29-ratio-first']],
    alpha_first: [[0.413, 'SD-29-first']],
    D_first_kN_per_m: [[12101, 'SD-29-D-first']],
  }),
  'SD-31': abs(0.001, {
    k_times_h3_over_EIc: each([6, 13.714, 19.5, 24], numbered('SD-31', [0, 0.25, 1, 1e12])),
  }),
  'SD-32': rel(0.001, { k_kN_per_m: [[64448, 'SD-32']] }),
  'SD-34': rel(0.001, {
    lambda1_per_m: [[0.93745, 'SD-34-parameter']],
    lambda1_hcol: [[2.812, 'SD-34-parameter', (lambda) => 3 * lambda]],
    strut_width_m: [[0.6115, 'SD-34-width']],
    width_over_diagonal: [[0.1157, 'SD-34-width', (width) => width / Math.hypot(2.6, 4.6)]],
    lateral_stiffness_kN_per_m: [[43850, 'SD-34-stiffness']],
  }),
  'SD-35': rel(0.002, {
    T1_coefficient_of_H2_sqrt_mu_over_EI: [[1.787, 'SD-35-flexural-cantilever']],
    // of the coefficient above
    T1_over_T2: [[6.27, 'SD-35-flexural-cantilever-second', (t) => 1.787 / t]],
    T1_over_T3: [[17.55, 'SD-35-flexural-cantilever-third', (t) => 1.787 / t]],
  }),
  'SD-37': rel(0.001, {
    T_flexural_s: [[0.394, 'SD-37-flexural']],
    T_shear_s: [[0.4648, 'SD-37-shear']],
    alpha: [[1.897, 'SD-37-alpha']],
    T_series_sum_squares_s: [[0.6093, 'SD-37-series']],
    T_parallel_southwell_s: [[0.3005, 'SD-37-parallel']],
  }),
  'SD-38': abs(5e-4, {
    gamma1: each([1.908, 1.9437, 1.9378, 1.8667, 1.7739, 1.7025, 1.6524, 1.6247], numbered('SD-38-root', ALPHAS)),
    T1_over_T1_pure_flexure: [0.8554, 0.6486, 0.5081, 0.3529, 0.2419, 0.1637, 0.106, 0.072].map((stated, i): Answer => [
      stated,
      `SD-38-root-${String(ALPHAS[i])}`,
      overFlexure(ALPHAS[i]!),
    ]),
    participation_roof_uniform_mass: each(
      [1.552, 1.516, 1.471, 1.394, 1.334, 1.301, 1.285, 1.278],
      numbered('SD-38-participation', ALPHAS),
    ),
    max_slope_over_mean_slope_mode1: each(
      [1.317, 1.249, 1.262, 1.365, 1.47, 1.531, 1.562, 1.573],
      numbered('SD-38-drift', ALPHAS),
    ),
  }),
  'SD-40': rel(0.001, {
    Ec_psi: [[3604997, 'SD-40-psi', psi]],
    Ec_MPa_0p043: [[25279, 'SD-40-density']],
    Ec_MPa_4700: [[23500, 'SD-40-4700']],
  }),
  'SD-41': rel(0.005, {
    fme_MPa: each([8.07, 5.38, 2.69], numbered('SD-41-strength', ['good', 'fair', 'poor'])),
    Em_GPa: each([4.44, 2.96, 1.48], numbered('SD-41-modulus', ['good', 'fair', 'poor']), giga),
    Gm_GPa_0p4: each([1.77, 1.18, 0.59], numbered('SD-41-shear', ['good', 'fair', 'poor']), giga),
  }),
  'SD-43': rel(0.001, {
    // of 240 m²
    typical_floor_kN_per_m2: [[15.74, 'SD-43', (kN) => kN / 240]],
    roof_kN_per_m2: [[12.93, 'SD-43-roof', (kN) => kN / 240]],
  }),
  'SD-44': rel(1e-9, { column_axial_kN: [[2047.5, 'SD-44']] }),
  'SD-46': abs(5e-4, { h_over_VsT: each([0.1889, 0.1133, 0.0567], numbered('SD-46', [150.6, 251, 502])) }),
  'SD-47': rel(0.001, { Sd_m: [[0.0974, 'SD-47']] }),
  'SD-49': abs(1e-4, { C1: [[1.1389, 'SD-49']] }),
  'SD-50': rel(1e-9, { C1_formula: each([2.5, 1.375, 1], ['SD-50-0.2s', 'SD-50-0.4s', 'SD-50-0.6s']) }),
  // the file has I 1.25, the record 1
  'SD-52': abs(6e-4, {
    V_over_W_30_4: [[0.037, 'SD-52-30-4', (v) => 1.25 * v]],
    cap_30_5: [[0.096, 'SD-52-30-5', (v) => 1.25 * v]],
    floor_30_6: [[0.028, 'SD-52-30-6', (v) => 1.25 * v]],
    governing: [[0.037, 'SD-52-30-4', (v) => 1.25 * v]],
    allowable_stress_level: [[0.027, 'SD-52-30-4', (v) => (1.25 * v) / 1.4]],
  }),
  'SD-53': abs(2e-4, { V_over_W: each([0.1, 0.063, 0.0471], ['SD-53-0.1s', 'SD-53-0.5s', 'SD-53-1.2s']) }),
  'SD-55': abs(3e-4, {
    V_over_W: each([0.0917, 0.0794, 0.0443, 0.03], ['SD-55-0.3s', 'SD-55-0.5s', 'SD-55-1.2s', 'SD-55-4s']),
  }),
  'SD-56': abs(0.006, {
    T_s: each([0.19, 0.32, 0.43, 0.73, 0.9], ['SD-56-20ft', 'SD-56-40ft', 'SD-56-60ft', 'SD-56-120ft', 'SD-56-160ft']),
  }),
  'SD-58': abs(2e-4, { Ai: each([1.6364, 1.3324, 1.1472, 1], numbered('SD-58', [0.25, 0.5, 0.75, 1])) }),
  'SD-59': abs(1e-4, { Rt: each([1, 0.95, 0.8, 0.48], ['SD-59-0.5s', 'SD-59-0.9s', 'SD-59-1.2s', 'SD-59-2s']) }),
  'SD-61': abs(0.001, {
    beta_c: [[0.9, 'SD-61-beta']],
    Cw: [[0.35, 'SD-61-cw']],
    Cc: [[0.3333, 'SD-61-cc']],
    E0: [[0.5833, 'SD-61-e0']],
    // S_D 0.9, T 0.95
    Is: [[0.499, 'SD-61-e0', (e0) => e0 * 0.9 * 0.95]],
  }),
  'SD-62': rel(0.002, { limit_MPa_max_of_0p69_and_0p166_sqrt_fc: [[0.743, 'SD-62-limit']] }),
  'SD-64': rel(1e-9, {
    srss_m: [[0.15, 'SD-64-srss']],
    absolute_sum_m: [[0.21, 'SD-64-sum']],
    en1998_aligned_floors_0p7_m: [[0.105, 'SD-64-aligned']],
  }),
  'SD-65': abs(5e-4, {
    rho: each([1, 0.1656, 0.0185], numbered('SD-65-rho', [1, 0.8, 0.5])),
    gap_m: each([0.03, 0.1376, 0.1487], numbered('SD-65-gap', [1, 0.8, 0.5])),
  }),
  'SD-67': rel(1e-9, { Ts_s: each([0.6, 2], numbered('SD-67', [30, 40])) }),
  'SD-68': abs(0.001, {
    S: each(
      [1.219, 1.375, 1.469, 1.5, 1.481, 1.425, 1.2, 1],
      numbered('SD-68', [0.25, 0.5, 0.75, 1, 1.25, 1.5, 2, 2.5]),
    ),
  }),
  'SD-70': rel(1e-9, { damping_ratio: [[0.05, 'SD-70']] }),
  'SD-72': abs(0.001, { rho: [[0.178, 'SD-72']] }),
};

/** Answers that are not compared, by row. */
export const NOT_COMPARED: Readonly<Record<string, Readonly<Record<string, string>>>> = {
  'SD-02': {
    frequency_hz: 'the given period the other way up',
    omega_rad_per_s: 'the given period the other way up',
    damping_ratio_small: 'δ/2π, which no record is',
    amplitude_after_6_cycles_in: 'the given ratio to the sixth power',
  },
  'SD-07': {
    mode1_printed_unit_norm: 'scaled to length 1; no record gives shapes',
    k1_over_k2: 'a quotient of inputs',
  },
  'SD-08': { mode1_mass_normalised: 'no record gives shapes' },
  'SD-10': { mode1_bottom_to_top: 'no record gives shapes', mode2_bottom_to_top: 'no record gives shapes' },
  'SD-11': { mode1_bottom_to_top: 'no record gives shapes' },
  'SD-16': {
    mode1_bottom_to_top: 'no masses are given',
    mode2: 'no masses are given',
    mode3: 'no masses are given',
  },
  'SD-20': { flexibility_matrix: 'an input of the bounds' },
  'SD-25': { piers_2_and_3_in_per_kip: 'a step within the record' },
  'SD-26': { y_R_ft: 'by symmetry half of the width' },
  'SD-32': { brace_length_m: 'a step within the record', cos2_theta: 'a step within the record' },
  'SD-34': { diagonal_m: 'a step within the record' },
  'SD-38': { T1_over_T2: 'no record gives the second period of a wall with a frame' },
  'SD-43': {
    slab_kN: 'parts of the weight, which no record adds up',
    finish_kN: 'parts of the weight, which no record adds up',
    walls_kN: 'parts of the weight, which no record adds up',
    beams_kN: 'parts of the weight, which no record adds up',
    columns_kN: 'parts of the weight, which no record adds up',
  },
  'SD-46': { ssi_expected: 'true where the ratio exceeds 0.1' },
  'SD-50': { optional_cap_interpolated: 'the optional cap is not applied' },
  'SD-61': { Is0: 'a demand of the standard, not carried', satisfied: 'follows from it' },
  'SD-62': {
    v_MPa: 'with the factor n_c/(n_c − n_f), which is left out',
    pass: 'follows from it',
  },
  'SD-70': { period_s: 'the given frequency the other way up' },
};
