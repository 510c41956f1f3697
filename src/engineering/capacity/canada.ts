/** Canada: National Building Code of 1953, 1975, 1990 and 2005. */
import type { System } from '../building.js';
import { apply, applyAny } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import { power } from '../numeric/power.js';
import { CANADA_PERIODS } from '../period/canada.js';
import { UBC_1961_MOMENT_FRAME, UBC_1961_OTHER } from '../period/past-records.js';
import type { Trace } from '../trace.js';
import { PERIOD, bySystem, coefficientRecord, isMomentFrame, number, planDimension_m, recordOf } from './edition.js';
import type { DependsOn, DesignFacts } from './edition.js';
import { UBC_1949 } from './editions.js';
import { WORKING_TO_STRENGTH } from './records.js';
import type { EditionTable } from './stated.js';

const nbc = (edition: string, clause: string) => ({ standard: 'NBC', edition, clause });

export const CANADA_1975 = coefficientRecord(
  'nbc-1975/base-shear/static',
  'Base shear over weight A S K F, NBC 1975 to 1980',
  {
    id: 'base-shear/nbc-1975',
    inputs: [
      number('zone_g', 'zonal acceleration A: 0.02, 0.04, 0.08 in zones 1 to 3', 'g'),
      number('structure_factor', 'K of the system'),
      number('foundation_factor', 'foundation factor F, 1.0 to 1.5'),
      PERIOD,
    ],
    expression: 'zone_g * structure_factor * foundation_factor * min(1, 0.5 / period_s ^ (1 / 3))',
    evaluate: ({ zone_g, structure_factor, foundation_factor, period_s }) =>
      zone_g! * structure_factor! * foundation_factor! * Math.min(1, 0.5 / power(period_s!, 1 / 3)),
  },
  {
    source: nbc('1975', '4.1.9'),
    verified: 'memory',
    note: 'S = 0.5/T^(1/3), at most 1; importance 1. Level to be factored as working stress.',
  },
);

/** U of NBC 1990: what it takes off the elastic force besides R. */
export const NBC_CALIBRATION = 0.6;

export const CANADA_1990 = coefficientRecord(
  'nbc-1990/base-shear/static',
  'Base shear over weight U v S F/R, NBC 1990 and 1995',
  {
    id: 'base-shear/nbc-1990',
    inputs: [
      number('velocity_ratio', 'zonal velocity ratio v'),
      number(
        'plateau',
        'S up to 0.25 s: 4.2, 3.0, 2.1 where the acceleration zone is above, equal to, below the velocity zone',
      ),
      number('foundation_factor', 'foundation factor F, 1.0 to 2.0'),
      number('reduction_r', 'force modification factor R'),
      PERIOD,
    ],
    expression:
      'calibration * velocity_ratio * min(max(plateau, 3), foundation_factor * (plateau + (1.5 / sqrt(max(period_s, 0.5)) - plateau) * min(1, max(period_s - 0.25, 0) / 0.25))) / reduction_r',
    evaluate: ({ velocity_ratio, plateau, foundation_factor, reduction_r, period_s }, { calibration }) => {
      // level to 0.25 s, a straight line to 1.5/√0.5 at 0.5 s, 1.5/√T beyond
      const share = Math.min(1, Math.max(period_s! - 0.25, 0) / 0.25);
      const s = plateau! + (1.5 / Math.sqrt(Math.max(period_s!, 0.5)) - plateau!) * share;
      return (calibration! * velocity_ratio! * Math.min(Math.max(plateau!, 3), foundation_factor! * s)) / reduction_r!;
    },
  },
  {
    source: nbc('1990', '4.1.9.1'),
    verified: 'memory',
    note: 'U = 0.6; F S at most 3.0, or 4.2 where the acceleration zone is above the velocity zone; importance 1. Strength level.',
  },
  { calibration: NBC_CALIBRATION },
);

export const CANADA_2005 = coefficientRecord(
  'nbc-2005/base-shear/static',
  'Base shear over weight S(T)/(R_d R_o), NBC from 2005',
  {
    id: 'base-shear/nbc-2005',
    inputs: [
      number('s_0p2_g', 'S(0.2)', 'g'),
      number('s_0p5_g', 'S(0.5)', 'g'),
      number('s_1_g', 'S(1.0)', 'g'),
      number('s_2_g', 'S(2.0)', 'g'),
      number('reduction_r', 'R_d R_o of the system'),
      PERIOD,
    ],
    // straight lines between the periods, each line added from where it begins
    expression:
      'max(min(s_0p2_g + (s_0p5_g - s_0p2_g) * min(max(period_s - 0.2, 0) / 0.3, 1) + (s_1_g - s_0p5_g) * min(max(period_s - 0.5, 0) / 0.5, 1) + (s_2_g - s_1_g) * min(max(period_s - 1, 0), 1), max(2 / 3 * s_0p2_g, s_0p5_g)), s_2_g) / reduction_r',
    evaluate: ({ s_0p2_g, s_0p5_g, s_1_g, s_2_g, reduction_r, period_s }) => {
      const s =
        s_0p2_g! +
        (s_0p5_g! - s_0p2_g!) * Math.min(Math.max(period_s! - 0.2, 0) / 0.3, 1) +
        (s_1_g! - s_0p5_g!) * Math.min(Math.max(period_s! - 0.5, 0) / 0.5, 1) +
        (s_2_g! - s_1_g!) * Math.min(Math.max(period_s! - 1, 0), 1);
      return Math.max(Math.min(s, Math.max((2 / 3) * s_0p2_g!, s_0p5_g!)), s_2_g!) / reduction_r!;
    },
  },
  {
    source: nbc('2005 to today', '4.1.8.11'),
    verified: 'restated',
    note: 'M_v and I_E are 1. At most the larger of 2/3 S(0.2) and S(0.5), at least S(2.0): the floor of frames, taken for walls too. S(T) with the site factors in it. Strength level.',
  },
);

/** K of 1975 by system, from memory: [not ductile, ductile]. */
export const NBC_K = bySystem<readonly [number, number]>([1.3, 1.3], {
  'steel-moment-frame': [1, 0.7],
  'concrete-moment-frame': [1.3, 0.7],
  'concrete-wall-frame': [1.3, 0.8],
  'concrete-shear-wall': [1.3, 1],
  'steel-concentric-braced-frame': [1, 1],
  'steel-eccentric-braced-frame': [1, 1],
  'steel-buckling-restrained-braced-frame': [1, 1],
  'unreinforced-masonry-wall': [2, 2],
});
/** R of 1990 by system, from memory. */
export const NBC_R = bySystem(1.5, {
  'steel-moment-frame': 4,
  'steel-concentric-braced-frame': 3,
  'steel-eccentric-braced-frame': 3.5,
  'steel-buckling-restrained-braced-frame': 3,
  'concrete-moment-frame': 4,
  'concrete-wall-frame': 4,
  'concrete-shear-wall': 3.5,
  'timber-light-frame': 3,
  'timber-post-and-beam': 2,
  'unreinforced-masonry-wall': 1,
});
/** R_d R_o of 2005 by system, from memory. */
export const NBC_RD_RO = bySystem(1.95, {
  'steel-moment-frame': 7.5,
  'steel-concentric-braced-frame': 3.9,
  'steel-eccentric-braced-frame': 6,
  'steel-buckling-restrained-braced-frame': 4.8,
  'concrete-moment-frame': 6.8,
  'concrete-wall-frame': 6.8,
  'concrete-shear-wall': 5.6,
  'reinforced-masonry-wall': 3,
  'confined-masonry-wall': 2.25,
  'timber-light-frame': 5.1,
  'timber-post-and-beam': 3,
  'unreinforced-masonry-wall': 1,
});

const ZONE_SHARES: Readonly<Record<number, number>> = { 1: 0.25, 2: 0.5, 3: 1 };
const PLATEAUS = { above: 4.2, equal: 3, below: 2.1 } as const;

const byPlan = (system: System): DependsOn => (isMomentFrame(system) ? 'storeys' : 'more');

function pastPeriod_s(facts: DesignFacts, trace?: Trace): number {
  if (isMomentFrame(facts.system))
    return apply(UBC_1961_MOMENT_FRAME, { storeys: facts.building.storeys.value }, trace);
  return apply(UBC_1961_OTHER, { height_m: facts.height_m, plan_dimension_m: planDimension_m(facts) }, trace);
}

const row = (which: string): AnyRecord => recordOf(CANADA_PERIODS, `nbc-2015/period/${which}`);
const ROWS = bySystem(row('other'), {
  'steel-moment-frame': row('steel-moment-frame'),
  'concrete-moment-frame': row('concrete-moment-frame'),
  'concrete-shear-wall': row('shear-walls'),
  'steel-concentric-braced-frame': row('braced-frame'),
  'steel-eccentric-braced-frame': row('braced-frame'),
  'steel-buckling-restrained-braced-frame': row('braced-frame'),
});

export type CanadianEdition = 'canada-1953' | 'canada-1975' | 'canada-1990' | 'canada-2005';

const AS_US = 'Period 0.1 N for frames, 0.05 h/√D in feet for the others, as in the US codes of the time [memory].';

export const CANADIAN_EDITIONS: EditionTable<CanadianEdition> = {
  'canada-1953': {
    year: 1953,
    title: 'NBC 1953, coefficient by number of storeys',
    source: nbc('1953', 'lateral force by N + 4.5'),
    verified: 'memory',
    note: 'The form N + 4.5 is recalled; the constants are taken to be those of UBC 1949.',
    dependsOn: () => 'storeys',
    design: ({ building }, { zone }, trace) => ({
      coefficient: apply(UBC_1949, { zone_share: ZONE_SHARES[zone]!, storeys: building.storeys.value }, trace),
      levelFactor: WORKING_TO_STRENGTH,
      reduction: Infinity,
    }),
  },
  'canada-1975': {
    year: 1975,
    title: CANADA_1975.title,
    source: CANADA_1975.source,
    verified: 'memory',
    note: AS_US,
    dependsOn: byPlan,
    design: (facts, { zone, foundation_factor }, trace) => {
      const structure_factor = NBC_K[facts.system][facts.ductile ? 1 : 0];
      const zone_g = 0.08 * ZONE_SHARES[zone]!;
      const inputs = { zone_g, structure_factor, foundation_factor, period_s: pastPeriod_s(facts, trace) };
      return { coefficient: apply(CANADA_1975, inputs, trace), levelFactor: WORKING_TO_STRENGTH, reduction: Infinity };
    },
  },
  'canada-1990': {
    year: 1990,
    title: CANADA_1990.title,
    source: CANADA_1990.source,
    verified: 'memory',
    note: AS_US,
    dependsOn: byPlan,
    design: (facts, { velocity_ratio, acceleration_zone, foundation_factor }, trace) => {
      const reduction_r = NBC_R[facts.system];
      const period_s = pastPeriod_s(facts, trace);
      const plateau = PLATEAUS[acceleration_zone];
      const inputs = { velocity_ratio, plateau, foundation_factor, reduction_r, period_s };
      // V = U V_e/R: the force is V_e divided by R/U
      return {
        coefficient: apply(CANADA_1990, inputs, trace),
        levelFactor: 1,
        reduction: reduction_r / NBC_CALIBRATION,
      };
    },
  },
  'canada-2005': {
    year: 2005,
    title: CANADA_2005.title,
    source: CANADA_2005.source,
    verified: 'memory',
    note: 'V and its bounds restated; R_d R_o by system from memory, the ductile class where there are several.',
    dependsOn: () => 'height',
    design: ({ system, height_m }, stated, trace) => {
      const period_s = applyAny(ROWS[system], { height_m }, trace);
      const reduction = NBC_RD_RO[system];
      const inputs = { ...stated, reduction_r: reduction, period_s };
      return { coefficient: apply(CANADA_2005, inputs, trace), levelFactor: 1, reduction };
    },
  },
};

export const CANADA_RECORDS = [CANADA_1975, CANADA_1990, CANADA_2005];
