/** Türkiye: regulations of 1949, 1968 and 1975, the codes of 1998 and 2007, TBDY 2018. */
import { apply, applyAny } from '../formula.js';
import { power } from '../numeric/power.js';
import { OTHER_CODE_RECORDS } from '../period/other-codes.js';
import { TURKEY_1975_PERIOD, TURKEY_1998_PERIODS } from '../period/past-records.js';
import { PERIOD, bySystem, coefficientRecord, number, planDimension_m, recordOf, tabledForm } from './edition.js';
import { WORKING_TO_STRENGTH } from './records.js';
import type { EditionTable } from './stated.js';

const regulation = (edition: string, clause: string) => ({
  standard: 'Regulation for structures in disaster areas, Türkiye',
  edition,
  clause,
});

export const TURKEY_1949 = coefficientRecord(
  'turkey-1949/base-shear/static',
  'Seismic coefficient of the regulations of 1949 and 1968',
  tabledForm,
  {
    source: regulation('1949 and 1968', 'coefficient by zone'),
    verified: 'memory',
    note: '1949: 0.02 to 0.04. 1968: C_0 0.06, 0.04, 0.02 in zones 1 to 3, ground and dynamic factors 1. Working-stress level.',
  },
);

export const TURKEY_1975 = coefficientRecord(
  'turkey-1975/base-shear/static',
  'Seismic coefficient C_0 K S of 1975',
  {
    id: 'base-shear/turkey-1975',
    inputs: [
      number('zone_coefficient', 'C_0: 0.10, 0.08, 0.06, 0.03 in zones 1 to 4'),
      number('structure_factor', 'structure type factor K'),
      number('ground_period_s', 'ground period T_0', 's'),
      PERIOD,
    ],
    // |x| written as max(x, -x); where it is 0 the spectrum is at its top, 1
    expression:
      'zone_coefficient * structure_factor / max(1, max(0.8 + period_s - ground_period_s, ground_period_s - 0.8 - period_s))',
    evaluate: ({ zone_coefficient, structure_factor, ground_period_s, period_s }) => {
      const x = 0.8 + period_s! - ground_period_s!;
      return (zone_coefficient! * structure_factor!) / Math.max(1, Math.max(x, -x));
    },
  },
  {
    source: regulation('1975', 'C = C_0 K S I'),
    verified: 'memory',
    note: 'S = 1/|0.8 + T − T_0|, at most 1; I = 1. Working-stress level. K by system from memory.',
  },
);

export const TURKEY_1998 = coefficientRecord(
  'turkey-1998/base-shear/static',
  'Base shear over weight A_0 S(T)/R_a(T), codes of 1998 and 2007',
  {
    id: 'base-shear/turkey-1998',
    inputs: [
      number('zone_g', 'effective ground acceleration A_0: 0.4, 0.3, 0.2, 0.1 in zones 1 to 4', 'g'),
      number('ta_s', 'T_A of the ground', 's'),
      number('tb_s', 'T_B of the ground', 's'),
      number('reduction_r', 'behaviour factor R'),
      PERIOD,
    ],
    expression:
      'zone_g * max(min(1 + 1.5 * period_s / ta_s, 2.5 * min(1, tb_s / period_s) ^ 0.8) / (1.5 + (reduction_r - 1.5) * min(1, period_s / ta_s)), least_share)',
    evaluate: ({ zone_g, ta_s, tb_s, reduction_r, period_s }, { least_share }) => {
      const share = period_s! / ta_s!;
      const spectrum = Math.min(1 + (1.5 * period_s!) / ta_s!, 2.5 * power(Math.min(1, tb_s! / period_s!), 0.8));
      return zone_g! * Math.max(spectrum / (1.5 + (reduction_r! - 1.5) * Math.min(1, share)), least_share!);
    },
  },
  {
    source: regulation('1998 and 2007', '6.4, 6.7'),
    verified: 'memory',
    note: 'At least 0.10 A_0; I = 1. Strength level.',
  },
  { least_share: 0.1 },
);

export const TURKEY_2018 = coefficientRecord(
  'tbdy-2018/base-shear/static',
  'Base shear over weight S_ae/R_a, TBDY 2018',
  {
    id: 'base-shear/tbdy-2018',
    inputs: [
      number('sds_g', 'S_DS', 'g'),
      number('sd1_g', 'S_D1', 'g'),
      number('reduction_r', 'behaviour factor R'),
      number('overstrength_d', 'overstrength factor D of the code'),
      PERIOD,
    ],
    expression:
      'max(min(sds_g * (0.4 + 3 * sds_g * period_s / sd1_g), min(sds_g, sd1_g / period_s)) / (overstrength_d + (reduction_r - overstrength_d) * min(1, period_s * sds_g / sd1_g)), 0.04 * sds_g)',
    evaluate: ({ sds_g, sd1_g, reduction_r, overstrength_d, period_s }) => {
      const spectrum = Math.min(
        sds_g! * (0.4 + (3 * sds_g! * period_s!) / sd1_g!),
        Math.min(sds_g!, sd1_g! / period_s!),
      );
      const share = Math.min(1, (period_s! * sds_g!) / sd1_g!);
      return Math.max(spectrum / (overstrength_d! + (reduction_r! - overstrength_d!) * share), 0.04 * sds_g!);
    },
  },
  {
    source: { standard: 'TBDY', edition: '2018', clause: '2.3, 4.2, 4.7' },
    verified: 'memory',
    note: 'Spectrum restated, R_a and the floor 0.04 S_DS from memory; the fall beyond T_L is left out; I = 1. Strength level.',
  },
);

/** K of 1975 by system, from memory. */
export const TURKISH_K = bySystem(1, {
  'steel-moment-frame': 0.6,
  'concrete-moment-frame': 0.8,
  'concrete-wall-frame': 0.8,
  'concrete-shear-wall': 1.33,
  'precast-tilt-up-wall': 1.33,
  'reinforced-masonry-wall': 1.5,
  'confined-masonry-wall': 1.5,
  'unreinforced-masonry-wall': 1.5,
});
/** R of 1998 to today by system, high ductility where the code has it, from memory. */
export const TURKISH_R = bySystem(2.5, {
  'steel-moment-frame': 8,
  'steel-concentric-braced-frame': 5,
  'steel-eccentric-braced-frame': 8,
  'steel-buckling-restrained-braced-frame': 8,
  'steel-light-frame': 4,
  'concrete-moment-frame': 8,
  'concrete-infilled-frame': 8,
  'concrete-shear-wall': 6,
  'concrete-wall-frame': 7,
  'precast-concrete-frame': 3,
  'reinforced-masonry-wall': 4,
  'timber-light-frame': 4,
});
/** D of 2018, from memory: 3 where R is 7 or more, 2.5 at 5 and 6, 2 to 1.5 below. */
export const overstrengthOf = (reduction: number): number => (reduction >= 7 ? 3 : reduction >= 5 ? 2.5 : 1.5);

const CONSTANTS: Readonly<Record<number, readonly [number, number]>> = {
  1: [0.1, 0.4],
  2: [0.08, 0.3],
  3: [0.06, 0.2],
  4: [0.03, 0.1],
};
const CORNERS = { Z1: [0.1, 0.3], Z2: [0.15, 0.4], Z3: [0.15, 0.6], Z4: [0.2, 0.9] } as const;

const material = (system: string): 'concrete-frames' | 'steel-frames' | 'other' =>
  system === 'concrete-moment-frame' || system === 'concrete-infilled-frame' || system === 'precast-concrete-frame'
    ? 'concrete-frames'
    : system === 'steel-moment-frame'
      ? 'steel-frames'
      : 'other';

export type TurkishEdition = 'turkey-1949' | 'turkey-1968' | 'turkey-1975' | 'turkey-1998' | 'turkey-2018';

const HIGH =
  'R of the high ductility class, where the code has one: the lower force is the cautious reading [judgement].';

export const TURKISH_EDITIONS: EditionTable<TurkishEdition> = {
  'turkey-1949': {
    year: 1949,
    title: 'Regulation of 1949',
    source: TURKEY_1949.source,
    verified: 'memory',
    dependsOn: () => 'nothing',
    design: (_facts, { coefficient }, trace) => ({
      coefficient: apply(TURKEY_1949, { coefficient }, trace),
      levelFactor: WORKING_TO_STRENGTH,
      reduction: Infinity,
    }),
  },
  'turkey-1968': {
    year: 1968,
    title: 'Regulation of 1968',
    source: TURKEY_1949.source,
    verified: 'memory',
    dependsOn: () => 'nothing',
    design: (_facts, { zone }, trace) => ({
      coefficient: apply(TURKEY_1949, { coefficient: (8 - 2 * zone) / 100 }, trace),
      levelFactor: WORKING_TO_STRENGTH,
      reduction: Infinity,
    }),
  },
  'turkey-1975': {
    year: 1975,
    title: TURKEY_1975.title,
    source: TURKEY_1975.source,
    verified: 'memory',
    note: 'Period 0.09 H/√D.',
    dependsOn: () => 'more',
    design: (facts, { zone, ground_period_s }, trace) => {
      const plan_dimension_m = planDimension_m(facts);
      const period_s = apply(TURKEY_1975_PERIOD, { height_m: facts.height_m, plan_dimension_m }, trace);
      const structure_factor = TURKISH_K[facts.system];
      const inputs = { zone_coefficient: CONSTANTS[zone]![0], structure_factor, ground_period_s, period_s };
      return {
        coefficient: apply(TURKEY_1975, inputs, trace),
        levelFactor: WORKING_TO_STRENGTH,
        reduction: Infinity,
      };
    },
  },
  'turkey-1998': {
    year: 1998,
    title: TURKEY_1998.title,
    source: TURKEY_1998.source,
    verified: 'memory',
    note: HIGH,
    dependsOn: () => 'height',
    design: ({ system, height_m }, { zone, ground }, trace) => {
      const period_s = apply(TURKEY_1998_PERIODS[material(system)], { height_m }, trace);
      const [ta_s, tb_s] = CORNERS[ground];
      const reduction = TURKISH_R[system];
      const inputs = { zone_g: CONSTANTS[zone]![1], ta_s, tb_s, reduction_r: reduction, period_s };
      return { coefficient: apply(TURKEY_1998, inputs, trace), levelFactor: 1, reduction };
    },
  },
  'turkey-2018': {
    year: 2018,
    title: TURKEY_2018.title,
    source: TURKEY_2018.source,
    verified: 'memory',
    note: HIGH,
    dependsOn: () => 'height',
    design: ({ system, height_m }, { sds_g, sd1_g }, trace) => {
      const row = recordOf(OTHER_CODE_RECORDS, `tbdy-2018/period/${material(system)}`);
      const period_s = applyAny(row, { height_m }, trace);
      const reduction = TURKISH_R[system];
      const inputs = { sds_g, sd1_g, reduction_r: reduction, overstrength_d: overstrengthOf(reduction), period_s };
      return { coefficient: apply(TURKEY_2018, inputs, trace), levelFactor: 1, reduction };
    },
  },
};

export const TURKEY_RECORDS = [TURKEY_1949, TURKEY_1975, TURKEY_1998, TURKEY_2018];
