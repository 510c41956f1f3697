/** Answers that the case file states (W worked examples, D computed vectors), US standards. */
import { FT_M, IN_M } from './case.js';
import type { ReferenceCase } from './case.js';
import { answer, feet } from './period-cases-worked.js';

const NOTEBOOK = 'public teaching notebook on diaphragm forces (ASCE 7-22)';
const SAME = 'the table of this edition is recalled to be the same';

const WALLS_D01: ReferenceCase['inputs'] = {
  wall_areas_m2: Array<number>(4).fill(20 * FT_M * FT_M),
  wall_lengths_m: Array<number>(4).fill(20 * FT_M),
  base_area_m2: 6000 * FT_M * FT_M,
  height_m: 60 * FT_M,
};

/** Printed for one edition, and the same row stands in the others. */
export const US_PERIOD_CASES: readonly ReferenceCase[] = [
  answer(
    'W01-limit',
    'asce7-22/period-limit/calculated',
    { period_s: 1.0518, sd1_g: 0.79 },
    1.473,
    3,
    `${NOTEBOOK}: C_u T_a, C_u 1.4 at S_D1 0.79`,
    'restated',
  ),
  answer(
    'W04-asce7-16',
    'asce7-16/period/other',
    feet(66),
    0.463,
    3,
    'ASCE 7-16 equivalent-lateral-force sheet, ordinary concentrically braced frame',
    'restated',
  ),
  answer(
    'W06-asce7-05',
    'asce7-05/period/other',
    feet(60),
    0.43,
    2,
    'Design of Reinforced Masonry Structures, p. 7.49 (ASCE 7-05)',
    'restated',
  ),
  answer(
    'W08-asce7-02',
    'asce7-02/period/other',
    feet(47.88),
    0.36,
    2,
    "structural engineers' mail archive 2006 on ASCE 7-02 table 9.5.5.3.2",
    'restated',
    'the misprinted metric coefficient 0.055 would give 0.41',
  ),
  ...(['16', '10', '05'] as const).flatMap((year) => [
    answer(
      `W01-asce7-${year}`,
      `asce7-${year}/period/steel-moment-frame`,
      feet(93),
      1.052,
      3,
      NOTEBOOK,
      'memory',
      SAME,
    ),
    answer(
      `W03-asce7-${year}`,
      `asce7-${year}/period/steel-eccentric-or-buckling-restrained`,
      feet(180),
      1.47,
      2,
      'textbook chapter 5 solutions, edition of ASCE 7 not seen',
      'memory',
      SAME,
    ),
    answer(
      `W30-asce7-${year}`,
      `asce7-${year}/period/other`,
      feet(102.3),
      0.64,
      2,
      'NEHRP design examples, seven-storey office, concentrically braced',
      'memory',
      SAME,
    ),
  ]),
  ...(['22', '16'] as const).flatMap((year) => [
    answer(
      `D01-asce7-${year}`,
      `asce7-${year}/period/concrete-or-masonry-walls`,
      WALLS_D01,
      0.2873,
      4,
      'four walls of 20 ft² and 20 ft, base 6000 ft², 60 ft high: (0.0019/√0.15742) × 60',
      'own arithmetic',
    ),
    answer(
      `D01-ratio-${year}`,
      `asce7-${year}/wall-area/concrete-or-masonry-walls`,
      WALLS_D01,
      0.15742,
      5,
      '(100/6000) × 80/(1 + 0.83 × 9)',
      'own arithmetic',
    ),
  ]),
  ...(['10', '05'] as const).map((year) =>
    answer(
      `D01-asce7-${year}`,
      `asce7-${year}/period/concrete-or-masonry-walls`,
      { ...WALLS_D01, wall_heights_m: Array<number>(4).fill(60 * FT_M) },
      0.2873,
      4,
      'the same four walls, each 60 ft high: equal to the form without wall heights',
      'own arithmetic',
    ),
  ),
  answer(
    'D01-kds41',
    'kds41-17-00/period/concrete-or-masonry-walls',
    { ...WALLS_D01, wall_heights_m: Array<number>(4).fill(60 * FT_M) },
    0.2873 * (0.0062 / 0.00623),
    3,
    'the consistent metric constant is 0.00623; the Korean 0.0062 is rounded',
    'own arithmetic',
  ),
  answer(
    'W09-97',
    'ubc-1997/period/steel-moment-frame',
    feet(125.5),
    1.312,
    3,
    'handbook application 9.3, UBC-91 static force worksheet; UBC-97 keeps 0.035',
    'restated',
  ),
  answer(
    'W09-asce7-95',
    'asce7-95/period/steel-moment-frame',
    feet(125.5),
    1.312,
    3,
    'the same worksheet; ASCE 7-95 prints the same 0.035',
    'memory',
    'the coefficient of that edition is recalled',
  ),
  answer(
    'R02-old',
    'ubc-1997/period/concrete-moment-frame-or-eccentric-braced',
    feet(100),
    0.9487,
    4,
    'Goel: the coefficient 0.030 at 100 ft',
    'own arithmetic',
  ),
  ...(['asce7-22', 'asce7-16', 'asce41-17'] as const).map((edition) =>
    answer(
      `R04-old-${edition}`,
      `${edition}/period/other`,
      feet(100),
      0.6325,
      4,
      'Kwon and Kim: the coefficient 0.020 at 100 ft',
      'own arithmetic',
    ),
  ),
  ...(['asce41-17', 'fema356', 'fema310'] as const).flatMap((edition) => [
    answer(
      `D05-${edition}`,
      `${edition}/period/flexible-diaphragm`,
      { wall_displacement_m: 0.2 * IN_M, diaphragm_displacement_m: 3 * IN_M },
      0.504,
      3,
      '√(0.1 × 0.2 + 0.078 × 3), inches',
      'own arithmetic',
    ),
  ]),
];
