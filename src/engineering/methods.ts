/** The register of methods: every record, one array. Ids never change meaning. */
import { EDITION_YEARS } from './assess/code-history.js';
import { IRREGULARITY, SPREADS } from './assess/settings.js';
import { MIN_COEFFICIENT_G, OVERSTRENGTH, WORKING_TO_STRENGTH } from './capacity/records.js';
import {
  BRACE_YIELD_MPA,
  CHECK_C,
  CHECK_EDITIONS,
  MASONRY_STRESS_MPA,
  STRENGTH_RECORDS,
} from './capacity/strength-records.js';
import { SYSTEM_FACTORS } from './capacity/systems.js';
import { STOREY_HEIGHTS } from './prior/storey-height.js';
import { UNIT_WEIGHT_KN_PER_M2 } from './prior/unit-weight.js';
import { USE_VALUES } from './prior/use.js';
import { TYPE_1, TYPE_2 } from './spectrum/en1998.js';
import { COMBINED_PERIOD, FLEXIBLE_BASE } from './assess/combine.js';
import { CODE_RATIO } from './capacity/code-ratio.js';
import { CODE_FAMILIES, ERA_RECORDS, SYSTEM_TABLES } from './capacity/families.js';
import { CAPACITY_RECORDS } from './capacity/records.js';
import { MASS_FACTOR_TABLE } from './demand/base-shear.js';
import { DRIFT_MARKS } from './demand/drift.js';
import { DEMAND_RECORDS } from './demand/records.js';
import type { AnyRecord } from './formula.js';
import { IRREGULARITY_EDITIONS, ONE_SIDED_SHARE, USABLE_SHARE } from './irregularity/editions.js';
import { IRREGULARITY_RECORDS } from './irregularity/records.js';
import { MEASURED_PERIODS } from './period/measured-records.js';
import { PERIOD_RECORDS } from './period/periods.js';
import { PRIORITY_RECORDS } from './priority/records.js';
import { VS30_TABLES } from './site/vs30.js';
import { ASCE7_SITE_TABLES } from './spectrum/asce7-factors.js';
import { DAMPING_TABLES } from './spectrum/damping.js';
import { SPECTRUM_RECORDS } from './spectrum/definition.js';
import { GRID_RECORDS } from './spectrum/grid-records.js';
import { SITE_RECORDS } from './site/records.js';
import { CRACKING } from './stiffness/cracking.js';
import { SPECTRUM_FACTOR_RECORDS } from './spectrum/factor-records.js';
import { IS1893_SOILS } from './spectrum/is1893.js';
import { NBC_2015_TABLES } from './spectrum/nbc-factors.js';
import { NZS1170_RETURN_FACTORS } from './spectrum/nzs1170-factors.js';
import { SHAPES, TABLE_ROWS } from './spectrum/nzs1170-shapes.js';
import { WORLD_TABLES } from './spectrum/world.js';
import { STIFFNESS_RECORDS } from './stiffness/records.js';
import { ASSUMED_MATERIALS } from './stiffness/route-materials.js';
import { VIBRATION_RECORDS } from './vibration/records.js';

export const METHODS: readonly AnyRecord[] = [
  ...PERIOD_RECORDS,
  ...MEASURED_PERIODS,
  ...VIBRATION_RECORDS,
  COMBINED_PERIOD,
  FLEXIBLE_BASE,
  ...STIFFNESS_RECORDS,
  ...SITE_RECORDS,
  ...SPECTRUM_RECORDS,
  ...SPECTRUM_FACTOR_RECORDS,
  ...GRID_RECORDS,
  ...DEMAND_RECORDS,
  ...ERA_RECORDS,
  ...CAPACITY_RECORDS,
  ...STRENGTH_RECORDS,
  CODE_RATIO,
  ...IRREGULARITY_RECORDS,
  ...PRIORITY_RECORDS,
];

const BY_ID: ReadonlyMap<string, AnyRecord> = new Map(METHODS.map((method) => [method.id, method]));

/** The record called `id`, or undefined. */
export function findMethod(id: string): AnyRecord | undefined {
  return BY_ID.get(id);
}

/** Tables that records read besides their own constants. */
const TABLES = {
  TYPE_1,
  TYPE_2,
  ASCE7_SITE_TABLES,
  NZS1170: { SHAPES, TABLE_ROWS, NZS1170_RETURN_FACTORS },
  NBC_2015_TABLES,
  IS1893_SOILS,
  DAMPING_TABLES,
  VS30_TABLES,
  ...WORLD_TABLES,
  SYSTEM_FACTORS,
  EDITION_YEARS,
  CODE_FAMILIES,
  SYSTEM_TABLES,
  checks: { CHECK_EDITIONS, CHECK_C, MASONRY_STRESS_MPA, BRACE_YIELD_MPA },
  UNIT_WEIGHT_KN_PER_M2,
  USE_VALUES,
  STOREY_HEIGHTS,
  SPREADS,
  IRREGULARITY,
  MASS_FACTOR_TABLE,
  DRIFT_MARKS,
  IRREGULARITY_EDITIONS,
  CRACKING,
  ASSUMED_MATERIALS,
  factors: [MIN_COEFFICIENT_G, WORKING_TO_STRENGTH, OVERSTRENGTH, ONE_SIDED_SHARE, USABLE_SHARE],
};

/** What the numbers of the catalogue are, for a fingerprint: the records (id, constants, limits, expression) and the tables. */
export function catalogueText(): string {
  const records = METHODS.map(({ id, constants, limits, family, source, verified }) =>
    JSON.stringify([id, constants as unknown, limits, family.expression ?? family.procedure, source, verified]),
  );
  return [...records, JSON.stringify(TABLES)].join('\n');
}
