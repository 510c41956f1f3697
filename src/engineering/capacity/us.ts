/** The US family: Uniform Building Code, then ASCE/SEI 7. Records and what they are from: editions.ts; K, R_w and R: systems.ts. */
import type { System } from '../building.js';
import { apply, applyAny } from '../formula.js';
import { ASCE7_22_PERIODS } from '../period/asce7.js';
import { UBC_1961_MOMENT_FRAME, UBC_1961_OTHER } from '../period/past-records.js';
import { UBC_HEIGHT_PERIODS } from '../period/ubc.js';
import type { Trace } from '../trace.js';
import { planDimension_m, recordOf } from './edition.js';
import type { CodeEdition, DependsOn, DesignFacts, EraDesign } from './edition.js';
import { ASCE7_2002, UBC_1927, UBC_1949, UBC_1961, UBC_1976, UBC_1988, UBC_1997 } from './editions.js';
import { WORKING_TO_STRENGTH } from './records.js';
import type { EditionTable } from './stated.js';
import { SYSTEM_FACTORS } from './systems.js';

const PERIOD_1988 = {
  'steel-moment-frame': recordOf(UBC_HEIGHT_PERIODS, 'ubc-1988/period/steel-moment-frame'),
  'concrete-moment-frame': recordOf(UBC_HEIGHT_PERIODS, 'ubc-1988/period/concrete-moment-frame-or-eccentric-braced'),
  'eccentric-braced': recordOf(UBC_HEIGHT_PERIODS, 'ubc-1988/period/concrete-moment-frame-or-eccentric-braced'),
  other: recordOf(UBC_HEIGHT_PERIODS, 'ubc-1988/period/other'),
};
const PERIOD_2002 = {
  'steel-moment-frame': recordOf(ASCE7_22_PERIODS, 'asce7-22/period/steel-moment-frame'),
  'concrete-moment-frame': recordOf(ASCE7_22_PERIODS, 'asce7-22/period/concrete-moment-frame'),
  'eccentric-braced': recordOf(ASCE7_22_PERIODS, 'asce7-22/period/steel-eccentric-or-buckling-restrained'),
  other: recordOf(ASCE7_22_PERIODS, 'asce7-22/period/other'),
};

const ZONE_SHARES: Readonly<Record<number, number>> = { 1: 0.25, 2: 0.5, 3: 1 };

const isFrame = (system: System): boolean => {
  const { periodClass } = SYSTEM_FACTORS[system];
  return periodClass === 'steel-moment-frame' || periodClass === 'concrete-moment-frame';
};

const working = (coefficient: number, reduction: number): EraDesign => ({
  coefficient,
  levelFactor: WORKING_TO_STRENGTH,
  reduction,
});

function pastPeriod_s(facts: DesignFacts, trace?: Trace): number {
  if (isFrame(facts.system)) return apply(UBC_1961_MOMENT_FRAME, { storeys: facts.building.storeys.value }, trace);
  return apply(UBC_1961_OTHER, { height_m: facts.height_m, plan_dimension_m: planDimension_m(facts) }, trace);
}

const structureFactor = ({ system, ductile }: DesignFacts): number => SYSTEM_FACTORS[system].k[ductile ? 1 : 0];

const nothing = (): DependsOn => 'nothing';
const storeys = (): DependsOn => 'storeys';
const height = (): DependsOn => 'height';
const byPlan = (system: System): DependsOn => (isFrame(system) ? 'storeys' : 'more');

/** Year, title and reading of an edition; source and mark are those of its record. */
const row = <Stated>(
  year: number,
  { title, source, verified }: Pick<CodeEdition, 'title' | 'source' | 'verified'>,
  dependsOn: CodeEdition['dependsOn'],
  design: CodeEdition<Stated>['design'],
): CodeEdition<Stated> => ({ year, title, source, verified, dependsOn, design });

/** The same of an edition that tells systems apart. */
const bySystems = <Stated>(...given: Parameters<typeof row<Stated>>): CodeEdition<Stated> => ({
  ...row(...given),
  verified: 'memory',
  note: 'Formula restated; what it gave each system (K, R_w, R) is from memory.',
});

export type UsEdition =
  'ubc-1927' | 'ubc-1935' | 'ubc-1949' | 'ubc-1961' | 'ubc-1976' | 'ubc-1988' | 'ubc-1997' | 'asce7-2002';

export const US_EDITIONS: EditionTable<UsEdition> = {
  'ubc-1927': row(1927, UBC_1927, nothing, (_facts, { soil }, trace) =>
    working(apply(UBC_1927, { coefficient: soil === 'firm' ? 0.075 : 0.1 }, trace), Infinity),
  ),
  'ubc-1935': row(1935, UBC_1927, nothing, (_facts, { coefficient }, trace) =>
    working(apply(UBC_1927, { coefficient }, trace), Infinity),
  ),
  'ubc-1949': row(1949, UBC_1949, storeys, ({ building }, { zone }, trace) => {
    const zone_share = ZONE_SHARES[zone] ?? 0;
    return working(apply(UBC_1949, { zone_share, storeys: building.storeys.value }, trace), Infinity);
  }),
  'ubc-1961': bySystems(1961, UBC_1961, byPlan, (facts, { zone_factor }, trace) => {
    const structure_factor = structureFactor(facts);
    const period_s = pastPeriod_s(facts, trace);
    return working(apply(UBC_1961, { zone_factor, structure_factor, period_s }, trace), 8 / structure_factor);
  }),
  'ubc-1976': bySystems(1976, UBC_1976, byPlan, (facts, { zone_factor, site_factor }, trace) => {
    const structure_factor = structureFactor(facts);
    const period_s = pastPeriod_s(facts, trace);
    const coefficient = apply(UBC_1976, { zone_factor, structure_factor, site_factor, period_s }, trace);
    return working(coefficient, 8 / structure_factor);
  }),
  'ubc-1988': bySystems(1988, UBC_1988, height, ({ system, height_m }, { zone_factor, site_factor }, trace) => {
    const { periodClass, rw } = SYSTEM_FACTORS[system];
    const period_s = applyAny(PERIOD_1988[periodClass], { height_m }, trace);
    return working(apply(UBC_1988, { zone_factor, site_factor, reduction_r: rw, period_s }, trace), rw);
  }),
  'ubc-1997': bySystems(1997, UBC_1997, height, ({ system, height_m }, { ca_g, cv_g, zone_factor, nv }, trace) => {
    const { periodClass, r1997 } = SYSTEM_FACTORS[system];
    const period_s = applyAny(PERIOD_1988[periodClass], { height_m }, trace);
    const zone_floor = zone_factor >= 0.4 ? 0.8 * zone_factor * nv : 0;
    const coefficient = apply(UBC_1997, { ca_g, cv_g, zone_floor, reduction_r: r1997, period_s }, trace);
    return { coefficient, levelFactor: 1, reduction: r1997 };
  }),
  // In print in 2000 as the International Building Code, which names it.
  'asce7-2002': bySystems(2000, ASCE7_2002, height, ({ system, height_m }, { sds_g, sd1_g, s1_g }, trace) => {
    const { periodClass, r2002 } = SYSTEM_FACTORS[system];
    const period_s = applyAny(PERIOD_2002[periodClass], { height_m }, trace);
    const near_fault_s1_g = s1_g >= 0.6 ? s1_g : 0;
    const coefficient = apply(ASCE7_2002, { sds_g, sd1_g, near_fault_s1_g, reduction_r: r2002, period_s }, trace);
    return { coefficient, levelFactor: 1, reduction: r2002 };
  }),
};
