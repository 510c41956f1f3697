/** Italy: decree of 1909, rules of 1935, laws and decrees of 1975 to 1996, and the spectral codes from 2003 on. */
import { apply, applyAny } from '../formula.js';
import { power } from '../numeric/power.js';
import { EN1998_PERIODS } from '../period/en1998.js';
import { DM_1975_PERIOD } from '../period/past-records.js';
import {
  PERIOD,
  PERIOD_CLASSES,
  bySystem,
  coefficientRecord,
  number,
  planDimension_m,
  recordOf,
  tabledForm,
} from './edition.js';
import { WORKING_TO_STRENGTH } from './records.js';
import type { EditionTable } from './stated.js';

const decree = (standard: string, edition: string, clause: string) => ({ standard, edition, clause });

export const ITALY_1909 = coefficientRecord(
  'italy-1909/base-shear/static',
  'Horizontal force over weight, decree of 1909',
  {
    id: 'base-shear/italy-1909',
    inputs: [number('storeys', 'storeys above ground')],
    expression: '(first_share + (max(storeys, 1) - 1) * upper_share) / max(storeys, 1)',
    evaluate: ({ storeys }, { first_share, upper_share }) => {
      const count = Math.max(storeys!, 1);
      return (first_share! + (count - 1) * upper_share!) / count;
    },
  },
  {
    source: decree('Royal Decree 193', '1909', 'forces by floor'),
    verified: 'restated',
    note: '1/12 of the weight of the first floor, 1/8 of those above; floors of one weight [judgement]. Working-stress level.',
  },
  { first_share: 1 / 12, upper_share: 1 / 8 },
);

export const ITALY_1935 = coefficientRecord(
  'italy-1935/base-shear/static',
  'Horizontal force over weight, rules of 1935 to 1975',
  tabledForm,
  {
    source: decree('Royal Decree 640', '1935', 'forces by category'),
    verified: 'memory',
    note: '0.10 in category 1, 0.07 in category 2. Working-stress level.',
  },
);

export const ITALY_1975 = coefficientRecord(
  'italy-1975/base-shear/static',
  'Horizontal force over weight, decrees of 1975 to 1996',
  {
    id: 'base-shear/italy-1975',
    inputs: [number('seismicity_degree', 'degree of seismicity S: 12, 9, 6 for categories 1, 2, 3'), PERIOD],
    expression: '(seismicity_degree - 2) / 100 * min(1, fall / period_s ^ (2 / 3))',
    evaluate: ({ seismicity_degree, period_s }, { fall }) =>
      ((seismicity_degree! - 2) / 100) * Math.min(1, fall! / power(period_s!, 2 / 3)),
  },
  {
    source: decree('Ministerial Decrees', '1975 to 1996', 'C R'),
    verified: 'memory',
    note: 'C = (S − 2)/100 restated, R = 1 up to 0.8 s and 0.862/T^(2/3) beyond from memory; foundation and structure coefficients 1. Working-stress level.',
  },
  { fall: 0.862 },
);

export const EN_DESIGN = coefficientRecord(
  'en1998-1-2004/base-shear/static',
  'Base shear over weight by the lateral-force method',
  {
    id: 'base-shear/en1998',
    inputs: [
      number('ag_g', 'design ground acceleration on rock', 'g'),
      number('soil_factor', 'soil factor S'),
      number('tc_s', 'end of the plateau T_C', 's'),
      number('reduction_r', 'behaviour factor q'),
      number('lambda', 'λ: 0.85 above two storeys and up to 2 T_C, else 1'),
      PERIOD,
    ],
    expression: 'lambda * max(2.5 * ag_g * soil_factor / reduction_r * min(1, tc_s / period_s), beta * ag_g)',
    evaluate: ({ ag_g, soil_factor, tc_s, reduction_r, lambda, period_s }, { beta }) =>
      lambda! * Math.max(((2.5 * ag_g! * soil_factor!) / reduction_r!) * Math.min(1, tc_s! / period_s!), beta! * ag_g!),
  },
  {
    source: { standard: 'EN 1998-1', edition: '2004', clause: '3.2.2.5, 4.3.3.2.2' },
    verified: 'memory',
    note: 'Held to the plateau below T_B; the fall with T² beyond T_D is left out, the floor 0.2 a_g stays. Strength level.',
  },
  { beta: 0.2 },
);

/** q of medium ductility by system, from memory. */
export const MEDIUM_Q = bySystem(1.5, {
  'steel-moment-frame': 4,
  'steel-concentric-braced-frame': 4,
  'steel-eccentric-braced-frame': 4,
  'steel-buckling-restrained-braced-frame': 4,
  'concrete-moment-frame': 3.9,
  'concrete-infilled-frame': 3.9,
  'concrete-shear-wall': 3,
  'concrete-wall-frame': 3.6,
  'precast-concrete-frame': 3,
  'precast-tilt-up-wall': 2,
  'reinforced-masonry-wall': 2.5,
  'confined-masonry-wall': 2,
  'timber-light-frame': 3,
});

const EN_PERIODS = {
  'steel-moment-frame': recordOf(EN1998_PERIODS, 'en1998-1-2004/period/steel-moment-frame'),
  'concrete-moment-frame': recordOf(EN1998_PERIODS, 'en1998-1-2004/period/concrete-moment-frame-or-eccentric-braced'),
  'eccentric-braced': recordOf(EN1998_PERIODS, 'en1998-1-2004/period/concrete-moment-frame-or-eccentric-braced'),
  other: recordOf(EN1998_PERIODS, 'en1998-1-2004/period/other'),
};

const DEGREES: Readonly<Record<number, number>> = { 1: 12, 2: 9, 3: 6 };
const UNLISTED =
  'A municipality that was not listed had no seismic design: leave the edition out and state the year it was.';

export type ItalianEdition = 'italy-1909' | 'italy-1935' | 'italy-1975' | 'italy-2003';

export const ITALIAN_EDITIONS: EditionTable<ItalianEdition> = {
  'italy-1909': {
    year: 1909,
    title: ITALY_1909.title,
    source: ITALY_1909.source,
    verified: 'restated',
    note: UNLISTED,
    dependsOn: () => 'storeys',
    design: ({ building }, _stated, trace) => ({
      coefficient: apply(ITALY_1909, { storeys: building.storeys.value }, trace),
      levelFactor: WORKING_TO_STRENGTH,
      reduction: Infinity,
    }),
  },
  'italy-1935': {
    year: 1935,
    title: ITALY_1935.title,
    source: ITALY_1935.source,
    verified: 'memory',
    note: UNLISTED,
    dependsOn: () => 'nothing',
    design: (_facts, { category }, trace) => ({
      coefficient: apply(ITALY_1935, { coefficient: category === 1 ? 0.1 : 0.07 }, trace),
      levelFactor: WORKING_TO_STRENGTH,
      reduction: Infinity,
    }),
  },
  'italy-1975': {
    year: 1975,
    title: ITALY_1975.title,
    source: ITALY_1975.source,
    verified: 'memory',
    note: `${UNLISTED} Period 0.1 H/√B.`,
    dependsOn: () => 'more',
    design: (facts, { category }, trace) => {
      const plan_dimension_m = planDimension_m(facts);
      const period_s = apply(DM_1975_PERIOD, { height_m: facts.height_m, plan_dimension_m }, trace);
      return {
        coefficient: apply(ITALY_1975, { seismicity_degree: DEGREES[category]!, period_s }, trace),
        levelFactor: WORKING_TO_STRENGTH,
        reduction: Infinity,
      };
    },
  },
  'italy-2003': {
    year: 2003,
    title: 'Spectral codes from OPCM 3274 on (NTC 2008, NTC 2018), medium ductility',
    source: { standard: 'OPCM 3274 and NTC', edition: '2003 to today', clause: 'of the form of EN 1998-1' },
    verified: 'memory',
    note: 'q of the medium ductility class by system, from memory.',
    // λ goes by the storeys and the period by the height
    dependsOn: () => 'more',
    design: ({ building, system, height_m }, { ag_g, soil_factor, tc_s }, trace) => {
      const period_s = applyAny(EN_PERIODS[PERIOD_CLASSES[system]], { height_m }, trace);
      const lambda = building.storeys.value > 2 && period_s <= 2 * tc_s ? 0.85 : 1;
      const reduction = MEDIUM_Q[system];
      const inputs = { ag_g, soil_factor, tc_s, reduction_r: reduction, lambda, period_s };
      return { coefficient: apply(EN_DESIGN, inputs, trace), levelFactor: 1, reduction };
    },
  },
};

export const ITALY_RECORDS = [ITALY_1909, ITALY_1935, ITALY_1975, EN_DESIGN];
