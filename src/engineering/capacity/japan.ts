/** Japan: urban building law of 1924, building standard law of 1950 and its new seismic design of June 1981. */
import type { System } from '../building.js';
import { apply, applyAny } from '../formula.js';
import { JAPAN_PERIODS } from '../period/japan.js';
import { RT_CORNERS_S } from '../spectrum/japan.js';
import { PERIOD, bySystem, coefficientRecord, fixedForm, number, recordOf } from './edition.js';
import type { EditionTable } from './stated.js';

const bsl = (edition: string, clause: string) => ({ standard: 'Building Standard Law, Japan', edition, clause });

export const JAPAN_1924 = coefficientRecord(
  'japan-1924/base-shear/static',
  'Horizontal seismic coefficient of 1924',
  fixedForm,
  {
    source: { standard: 'Urban Building Law, Japan', edition: '1924', clause: 'seismic coefficient' },
    verified: 'restated',
    note: 'k = 0.1 at allowable stresses of that time, half of those of 1950.',
  },
  { coefficient: 0.1 },
);

export const JAPAN_1950 = coefficientRecord(
  'japan-1950/base-shear/static',
  'Horizontal seismic coefficient of 1950',
  {
    id: 'base-shear/japan-1950',
    inputs: [number('zone_factor', 'seismic zone coefficient Z of the place'), number('height_m', 'height', 'm')],
    expression: 'zone_factor * (coefficient + rise_per_m * max(height_m - from_m, 0) ^ 2 / (2 * height_m))',
    evaluate: ({ zone_factor, height_m }, { coefficient, rise_per_m, from_m }) => {
      const above_m = Math.max(height_m! - from_m!, 0);
      return zone_factor! * (coefficient! + (rise_per_m! * (above_m * above_m)) / (2 * height_m!));
    },
  },
  {
    source: bsl('1950', 'Enforcement Order, seismic coefficient'),
    verified: 'memory',
    note: 'k = 0.2, restated; 0.01 more for every 4 m above 16 m, from memory, taken as the mean over the height [judgement].',
  },
  { coefficient: 0.2, rise_per_m: 0.0025, from_m: 16 },
);

export const JAPAN_RT_FACTOR = coefficientRecord(
  'japan-1981/shear-factor/rt',
  'Vibration characteristic R_t',
  {
    id: 'base-shear/japan-rt',
    inputs: [number('corner_period_s', 'T_c of the ground: 0.4, 0.6, 0.8 s', 's'), PERIOD],
    yields: 'rt',
    symbol: 'R_t',
    expression:
      '(1 - 0.2 * (min(max(period_s / corner_period_s, 1), 2) - 1) ^ 2) * min(1, 2 * corner_period_s / period_s)',
    evaluate: ({ corner_period_s, period_s }) => {
      const past = Math.min(Math.max(period_s! / corner_period_s!, 1), 2) - 1;
      return (1 - 0.2 * (past * past)) * Math.min(1, (2 * corner_period_s!) / period_s!);
    },
  },
  {
    source: { standard: 'Notification 1793, Japan', edition: '1980', clause: 'R_t' },
    verified: 'memory',
    note: '1 below T_c, 1 − 0.2 (T/T_c − 1)² to 2 T_c, 1.6 T_c/T beyond.',
  },
);

export const JAPAN_AI_FACTOR = coefficientRecord(
  'japan-1981/shear-factor/ai',
  'Distribution of the storey shear coefficient A_i',
  {
    id: 'base-shear/japan-ai',
    inputs: [number('weight_share', 'weight above the storey over that of the building, α_i'), PERIOD],
    yields: 'ai',
    symbol: 'A_i',
    expression: '1 + (1 / sqrt(weight_share) - weight_share) * 2 * period_s / (1 + 3 * period_s)',
    evaluate: ({ weight_share, period_s }) =>
      1 + ((1 / Math.sqrt(weight_share!) - weight_share!) * 2 * period_s!) / (1 + 3 * period_s!),
  },
  {
    source: { standard: 'Notification 1793, Japan', edition: '1980', clause: 'A_i' },
    verified: 'memory',
    note: '1 at the first storey, which is what the base shear needs.',
  },
);

export const JAPAN_1981 = coefficientRecord(
  'japan-1981/base-shear/static',
  'Required lateral strength of the first storey, 1981',
  {
    id: 'base-shear/japan-1981',
    inputs: [
      number('zone_factor', 'seismic zone coefficient Z of the place'),
      number('rt', 'vibration characteristic R_t'),
      number('structural_factor', 'structural characteristic factor D_s'),
    ],
    expression: 'zone_factor * rt * max(structural_factor * severe_coefficient, moderate_coefficient)',
    evaluate: ({ zone_factor, rt, structural_factor }, { severe_coefficient, moderate_coefficient }) =>
      zone_factor! * rt! * Math.max(structural_factor! * severe_coefficient!, moderate_coefficient!),
  },
  {
    source: bsl('1981', 'Enforcement Order art. 82-3 and 88'),
    verified: 'memory',
    note: 'C_0 of 0.2 and 1.0 restated; D_s from memory. The weight above the first storey stands for all (A_i = 1); shape factor F_es 1.',
  },
  { severe_coefficient: 1, moderate_coefficient: 0.2 },
);

/** D_s, 0.25 to 0.55: from memory, the middle of each row. */
export const JAPAN_DS = bySystem(0.4, {
  'steel-moment-frame': 0.25,
  'steel-eccentric-braced-frame': 0.3,
  'steel-buckling-restrained-braced-frame': 0.3,
  'steel-concentric-braced-frame': 0.35,
  'concrete-moment-frame': 0.3,
  'concrete-wall-frame': 0.4,
  'concrete-shear-wall': 0.45,
  'precast-tilt-up-wall': 0.5,
  'reinforced-masonry-wall': 0.5,
  'confined-masonry-wall': 0.55,
  'unreinforced-masonry-wall': 0.55,
});

const CONCRETE = recordOf(JAPAN_PERIODS, 'japan-1793/period/concrete');
const STEEL_OR_WOOD = recordOf(JAPAN_PERIODS, 'japan-1793/period/steel-or-wood');
const periodOf = (system: System) =>
  system.startsWith('steel') || system.startsWith('timber') ? STEEL_OR_WOOD : CONCRETE;

export type JapaneseEdition = 'japan-1924' | 'japan-1950' | 'japan-1981';

export const JAPANESE_EDITIONS: EditionTable<JapaneseEdition> = {
  'japan-1924': {
    year: 1924,
    title: 'Urban building law, seismic coefficient 0.1',
    source: JAPAN_1924.source,
    verified: 'restated',
    note: 'Allowable stresses were half of the strength: level factor 2 [judgement], so that 1924 and 1950 come to the same strength, as is reported.',
    dependsOn: () => 'nothing',
    design: (_facts, _stated, trace) => ({
      coefficient: apply(JAPAN_1924, {}, trace),
      levelFactor: 2,
      reduction: Infinity,
    }),
  },
  'japan-1950': {
    year: 1950,
    title: 'Building standard law, seismic coefficient 0.2',
    source: JAPAN_1950.source,
    verified: 'memory',
    note: 'Allowable stresses for short-term loads are the strength: level factor 1 [judgement].',
    dependsOn: () => 'height',
    design: ({ height_m }, { zone_factor }, trace) => ({
      coefficient: apply(JAPAN_1950, { zone_factor, height_m }, trace),
      levelFactor: 1,
      reduction: Infinity,
    }),
  },
  'japan-1981': {
    year: 1981,
    title: 'New seismic design of June 1981',
    source: JAPAN_1981.source,
    verified: 'memory',
    dependsOn: () => 'height',
    design: ({ system, height_m }, { zone_factor, ground }, trace) => {
      const period_s = applyAny(periodOf(system), { height_m }, trace);
      const rt = apply(JAPAN_RT_FACTOR, { corner_period_s: RT_CORNERS_S[ground]!, period_s }, trace);
      const structural_factor = JAPAN_DS[system];
      return {
        coefficient: apply(JAPAN_1981, { zone_factor, rt, structural_factor }, trace),
        levelFactor: 1,
        reduction: 1 / structural_factor,
      };
    },
  },
};

export const JAPAN_RECORDS = [JAPAN_1924, JAPAN_1950, JAPAN_RT_FACTOR, JAPAN_AI_FACTOR, JAPAN_1981];
