/** Every reference case. */
import { BASE_SHEAR_CASES } from './base-shear-cases.js';
import { CAPACITY_CASES } from './capacity-cases.js';
import type { ReferenceCase } from './case.js';
import { ERA_CASES } from './era-cases.js';
import { GRID_CASES } from './grid-cases.js';
import { DEMAND_CASES } from './demand-cases.js';
import { IRREGULARITY_CASES } from './irregularity-cases.js';
import { MEASURED_CASES } from './measured-cases.js';
import { ANSWERED_CODE_CASES } from './period-cases-answers.js';
import { CODE_PERIOD_CASES } from './period-cases-codes.js';
import { EDITION_PERIOD_CASES } from './period-cases-editions.js';
import { PERIOD_LIMIT_CASES } from './period-cases-limits.js';
import { REGRESSION_PERIOD_CASES } from './period-cases-regressions.js';
import { US_PERIOD_CASES } from './period-cases-us.js';
import { WALL_PERIOD_CASES } from './period-cases-walls.js';
import { PERIOD_CASES } from './period-cases.js';
import { SPECTRUM_CODE_CASES } from './spectrum-cases-codes.js';
import { SPECTRUM_FACTOR_CASES } from './spectrum-cases-factors.js';
import { SPECTRUM_CASES } from './spectrum-cases.js';
import { WORLD_SPECTRUM_CASES } from './spectrum-cases-world.js';
import { STIFFNESS_CASES } from './stiffness-cases.js';
import { STRENGTH_CASES } from './strength-cases.js';
import { VIBRATION_CASES } from './vibration-cases.js';

export const REFERENCE_CASES: readonly ReferenceCase[] = [
  ...PERIOD_CASES,
  ...US_PERIOD_CASES,
  ...ANSWERED_CODE_CASES,
  ...REGRESSION_PERIOD_CASES,
  ...EDITION_PERIOD_CASES,
  ...CODE_PERIOD_CASES,
  ...WALL_PERIOD_CASES,
  ...PERIOD_LIMIT_CASES,
  ...MEASURED_CASES,
  ...STIFFNESS_CASES,
  ...SPECTRUM_CASES,
  ...SPECTRUM_CODE_CASES,
  ...SPECTRUM_FACTOR_CASES,
  ...WORLD_SPECTRUM_CASES,
  ...BASE_SHEAR_CASES,
  ...ERA_CASES,
  ...CAPACITY_CASES,
  ...STRENGTH_CASES,
  ...IRREGULARITY_CASES,
  ...DEMAND_CASES,
  ...VIBRATION_CASES,
  ...GRID_CASES,
];
