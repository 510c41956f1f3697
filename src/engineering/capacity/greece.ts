/** Greece: royal decree of 1959, additional articles of 1985, the spectral codes of 1995, 2000 and 2003. */
import { apply } from '../formula.js';
import { power } from '../numeric/power.js';
import { GREECE_1995_PERIOD } from '../period/past-records.js';
import { PERIOD, bySystem, coefficientRecord, number, planDimension_m, tabledForm } from './edition.js';
import type { CodeEdition } from './edition.js';
import { WORKING_TO_STRENGTH } from './records.js';
import type { EditionTable, GreekGround, GreekSeismicity, StatedFor } from './stated.js';

export const GREECE_1959 = coefficientRecord(
  'greece-1959/base-shear/static',
  'Seismic coefficient ε by zone and ground, 1959 to 1995',
  tabledForm,
  {
    source: { standard: 'Royal Decree, Greece', edition: '1959', clause: 'table of ε' },
    verified: 'memory',
    note: 'Zone I 0.04, 0.06, 0.08; II 0.06, 0.08, 0.12; III 0.08, 0.12, 0.16 on firm, medium and soft ground. Working-stress level.',
  },
);

/** ε of the decree. */
export const GREEK_COEFFICIENTS: Readonly<Record<GreekSeismicity, Readonly<Record<GreekGround, number>>>> = {
  I: { firm: 0.04, medium: 0.06, soft: 0.08 },
  II: { firm: 0.06, medium: 0.08, soft: 0.12 },
  III: { firm: 0.08, medium: 0.12, soft: 0.16 },
};

export const GREECE_1995 = coefficientRecord(
  'greece-1995/base-shear/static',
  'Design spectrum over g, codes of 1995 to 2003',
  {
    id: 'base-shear/greece-1995',
    inputs: [
      number('zone_g', 'ground acceleration A of the zone', 'g'),
      number('corner_period_s', 'T_2 of the ground: 0.4, 0.6, 0.8, 1.2 s', 's'),
      number('reduction_r', 'behaviour factor q'),
      PERIOD,
    ],
    expression:
      'zone_g * max(amplification / reduction_r * min(1, (corner_period_s / period_s) ^ (2 / 3)), least_share)',
    evaluate: ({ zone_g, corner_period_s, reduction_r, period_s }, { amplification, least_share }) =>
      zone_g! *
      Math.max((amplification! / reduction_r!) * Math.min(1, power(corner_period_s! / period_s!, 2 / 3)), least_share!),
  },
  {
    source: { standard: 'NEAK and EAK, Greece', edition: '1995 to 2003', clause: 'design spectrum' },
    verified: 'memory',
    note: 'β₀ 2.5, at least 0.25 A; foundation and damping factors 1. Held to the plateau below T_1. Strength level. Zones of 0.16, 0.24, 0.36 g (2003) restated.',
  },
  { amplification: 2.5, least_share: 0.25 },
);

/** q by system, from memory. */
export const GREEK_Q = bySystem(1.5, {
  'steel-moment-frame': 4,
  'steel-concentric-braced-frame': 3,
  'steel-eccentric-braced-frame': 4,
  'steel-buckling-restrained-braced-frame': 3,
  'concrete-moment-frame': 3.5,
  'concrete-infilled-frame': 3.5,
  'concrete-shear-wall': 3,
  'concrete-wall-frame': 3,
  'precast-concrete-frame': 2,
  'reinforced-masonry-wall': 2.5,
  'confined-masonry-wall': 2,
  'timber-light-frame': 3,
});

const CORNERS_S = { A: 0.4, B: 0.6, C: 0.8, D: 1.2 } as const;

const byTable = (year: number, title: string, note: string): CodeEdition<StatedFor<'greece-1959'>> => ({
  year,
  title,
  source: GREECE_1959.source,
  verified: 'memory',
  note,
  dependsOn: () => 'nothing',
  design: (_facts, { zone, ground }, trace) => ({
    coefficient: apply(GREECE_1959, { coefficient: GREEK_COEFFICIENTS[zone][ground] }, trace),
    levelFactor: WORKING_TO_STRENGTH,
    reduction: Infinity,
  }),
});

export type GreekEdition = 'greece-1959' | 'greece-1985' | 'greece-1995';

export const GREEK_EDITIONS: EditionTable<GreekEdition> = {
  'greece-1959': byTable(1959, 'Royal decree of 1959', 'Uniform over the height.'),
  'greece-1985': byTable(1985, 'Additional articles of 1985', 'Coefficients as in 1959, detailing to be ductile.'),
  'greece-1995': {
    year: 1995,
    title: 'Spectral codes of 1995, 2000 and 2003',
    source: GREECE_1995.source,
    verified: 'memory',
    note: 'Period 0.09 H/√L, no walls.',
    dependsOn: () => 'more',
    design: (facts, { zone_g, ground }, trace) => {
      const plan_dimension_m = planDimension_m(facts);
      const period_s = apply(GREECE_1995_PERIOD, { height_m: facts.height_m, plan_dimension_m }, trace);
      const reduction = GREEK_Q[facts.system];
      const inputs = { zone_g, corner_period_s: CORNERS_S[ground], reduction_r: reduction, period_s };
      return { coefficient: apply(GREECE_1995, inputs, trace), levelFactor: 1, reduction };
    },
  },
};

export const GREECE_RECORDS = [GREECE_1959, GREECE_1995];
