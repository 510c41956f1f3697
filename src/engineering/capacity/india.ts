/** India: IS 1893 of 1970 to 1984, Part 1 of 2002 and of 2016. */
import type { System } from '../building.js';
import { apply, applyAny } from '../formula.js';
import type { AnyRecord } from '../formula.js';
import { power } from '../numeric/power.js';
import { INDIA_PERIODS } from '../period/india.js';
import { INDIA_1970_FRAME, INDIA_1970_OTHER } from '../period/past-records.js';
import type { Trace } from '../trace.js';
import { PERIOD, bySystem, coefficientRecord, isMomentFrame, number, planDimension_m, recordOf } from './edition.js';
import type { CodeEdition, DependsOn, DesignFacts } from './edition.js';
import { WORKING_TO_STRENGTH } from './records.js';
import type { EditionTable, StatedFor } from './stated.js';

export const INDIA_1970 = coefficientRecord(
  'is1893-1970/base-shear/static',
  'Base shear over weight K C α_h, IS 1893 of 1970 to 1984',
  {
    id: 'base-shear/is1893-1970',
    inputs: [
      number('basic_coefficient', 'α_0: 0.01, 0.02, 0.04, 0.05, 0.08 in zones I to V'),
      number('soil_factor', 'β of soil and foundation, 1.0 to 1.5'),
      number('performance_factor', 'performance factor K of the system'),
      PERIOD,
    ],
    expression: 'performance_factor * soil_factor * basic_coefficient * min(1, 0.5 / period_s ^ (1 / 3))',
    evaluate: ({ basic_coefficient, soil_factor, performance_factor, period_s }) =>
      performance_factor! * soil_factor! * basic_coefficient! * Math.min(1, 0.5 / power(period_s!, 1 / 3)),
  },
  {
    source: { standard: 'IS 1893', edition: '1970 to 1984', clause: '4.2' },
    verified: 'memory',
    note: 'C = 0.5/T^(1/3), at most 1; importance 1. Working-stress level.',
  },
);

export const INDIA_2002 = coefficientRecord(
  'is1893-2002/base-shear/static',
  'Design horizontal seismic coefficient A_h, IS 1893 Part 1 of 2002 and 2016',
  {
    id: 'base-shear/is1893-2002',
    inputs: [
      number('zone_factor', 'zone factor Z'),
      number('fall_s', 'S_a/g times T beyond the plateau: 1.00, 1.36, 1.67 on hard, medium, soft ground', 's'),
      number('reduction_r', 'response reduction factor R'),
      PERIOD,
    ],
    expression: 'zone_factor / 2 * min(2.5, fall_s / period_s) / reduction_r',
    evaluate: ({ zone_factor, fall_s, reduction_r, period_s }) =>
      ((zone_factor! / 2) * Math.min(2.5, fall_s! / period_s!)) / reduction_r!,
  },
  {
    source: { standard: 'IS 1893 Part 1', edition: '2002 and 2016', clause: '6.4.2' },
    verified: 'restated',
    note: 'I = 1. Held to the plateau at short periods. The force is factored by 1.5 in design.',
  },
);

/** K of 1984 by system, from memory: 1.0 for ductile frames, 1.6 for all others. */
export const INDIAN_K = bySystem(1.6, {
  'steel-moment-frame': 1,
  'concrete-moment-frame': 1,
  'concrete-wall-frame': 1,
});
/** R by system: 3 of ordinary and 5 of special concrete frames; the others from memory. */
export const INDIAN_R = bySystem(3, {
  'steel-moment-frame': 5,
  'steel-concentric-braced-frame': 4,
  'steel-eccentric-braced-frame': 5,
  'steel-buckling-restrained-braced-frame': 5,
  'concrete-moment-frame': 5,
  'concrete-shear-wall': 4,
  'concrete-wall-frame': 5,
  'confined-masonry-wall': 2.5,
  'unreinforced-masonry-wall': 1.5,
});

const BASIC = { I: 0.01, II: 0.02, III: 0.04, IV: 0.05, V: 0.08 } as const;
const FALLS_S = { hard: 1, medium: 1.36, soft: 1.67 } as const;

const byPlan = (system: System): DependsOn => (isMomentFrame(system) ? 'height' : 'more');

const period = (edition: string, which: string): AnyRecord =>
  recordOf(INDIA_PERIODS, `is1893-${edition}/period/${which}`);
const PERIODS = Object.fromEntries(
  ['2002', '2016'].map((edition) => [
    edition,
    {
      steel: period(edition, 'steel-moment-frame'),
      concrete: period(edition, 'concrete-moment-frame'),
      other: period(edition, 'other'),
    },
  ]),
) as Readonly<Record<'2002' | '2016', Readonly<Record<'steel' | 'concrete' | 'other', AnyRecord>>>>;

function periodOf_s(edition: '2002' | '2016', facts: DesignFacts, trace?: Trace): number {
  const { steel, concrete, other } = PERIODS[edition];
  const { system, height_m } = facts;
  if (!isMomentFrame(system)) return applyAny(other, { height_m, plan_dimension_m: planDimension_m(facts) }, trace);
  return applyAny(system === 'steel-moment-frame' ? steel : concrete, { height_m }, trace);
}

/** The limit-state combination multiplies the earthquake force by 1.5 [memory]. */
export const LOAD_FACTOR = 1.5;

const spectral = (edition: '2002' | '2016'): CodeEdition<StatedFor<'india-2002'>> => ({
  year: Number(edition),
  title: `IS 1893 Part 1 of ${edition}`,
  source: { ...INDIA_2002.source, edition },
  verified: 'memory',
  note: 'A_h and the periods restated; R of most systems and the load factor 1.5 from memory.',
  dependsOn: byPlan,
  design: (facts, { zone_factor, soil }, trace) => {
    const period_s = periodOf_s(edition, facts, trace);
    // without its ductile detailing a concrete frame is an ordinary one
    const reduction = !facts.ductile && facts.system === 'concrete-moment-frame' ? 3 : INDIAN_R[facts.system];
    const inputs = { zone_factor, fall_s: FALLS_S[soil], reduction_r: reduction, period_s };
    return { coefficient: apply(INDIA_2002, inputs, trace), levelFactor: LOAD_FACTOR, reduction };
  },
});

export type IndianEdition = 'india-1970' | 'india-2002' | 'india-2016';

export const INDIAN_EDITIONS: EditionTable<IndianEdition> = {
  'india-1970': {
    year: 1970,
    title: 'IS 1893 of 1970, 1975 and 1984',
    source: INDIA_1970.source,
    verified: 'memory',
    note: 'Period 0.1 n for frames, 0.09 H/√d for the others.',
    dependsOn: (system) => (isMomentFrame(system) ? 'storeys' : 'more'),
    design: (facts, { zone, soil_factor }, trace) => {
      const { system, building, height_m } = facts;
      const period_s = isMomentFrame(system)
        ? apply(INDIA_1970_FRAME, { storeys: building.storeys.value }, trace)
        : apply(INDIA_1970_OTHER, { height_m, plan_dimension_m: planDimension_m(facts) }, trace);
      const inputs = { basic_coefficient: BASIC[zone], soil_factor, performance_factor: INDIAN_K[system], period_s };
      return { coefficient: apply(INDIA_1970, inputs, trace), levelFactor: WORKING_TO_STRENGTH, reduction: Infinity };
    },
  },
  'india-2002': spectral('2002'),
  'india-2016': spectral('2016'),
};

export const INDIA_RECORDS = [INDIA_1970, INDIA_2002];
