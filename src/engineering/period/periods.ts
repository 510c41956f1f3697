/** Every period formula, limit on a calculated period and wall area of this folder, in one list. */
import type { AnyRecord } from '../formula.js';
import { ASCE41_17_PERIODS, FEMA_PERIODS } from './asce41.js';
import { ASCE7_22_PERIODS, ASCE7_EARLIER_PERIODS, ASCE7_WALL_AND_LIMIT_RECORDS } from './asce7.js';
import { CANADA_PERIODS } from './canada.js';
import { CHINA_PERIODS } from './china.js';
import { EN1998_MORE_RECORDS, EN1998_PERIODS } from './en1998.js';
import { INDIA_PERIODS } from './india.js';
import { JAPAN_PERIODS } from './japan.js';
import { OCEANIA_NEPAL_PERIODS } from './oceania-nepal.js';
import { OTHER_CODE_RECORDS } from './other-codes.js';
import { PAST_PERIODS, UBC_1961_MOMENT_FRAME, UBC_1961_OTHER } from './past-records.js';
import { GOEL_CHOPRA_LIMITS, REGRESSION_PERIODS } from './regressions.js';
import { UBC_HEIGHT_PERIODS, UBC_MORE_RECORDS } from './ubc.js';

export const PERIOD_RECORDS: readonly AnyRecord[] = [
  ...ASCE7_22_PERIODS,
  ...ASCE41_17_PERIODS,
  ...EN1998_PERIODS,
  ...UBC_HEIGHT_PERIODS,
  UBC_1961_MOMENT_FRAME,
  UBC_1961_OTHER,
  ...PAST_PERIODS,
  ...ASCE7_WALL_AND_LIMIT_RECORDS,
  ...ASCE7_EARLIER_PERIODS,
  ...FEMA_PERIODS,
  ...EN1998_MORE_RECORDS,
  ...UBC_MORE_RECORDS,
  ...OCEANIA_NEPAL_PERIODS,
  ...CANADA_PERIODS,
  ...INDIA_PERIODS,
  ...JAPAN_PERIODS,
  ...CHINA_PERIODS,
  ...OTHER_CODE_RECORDS,
  ...REGRESSION_PERIODS,
  ...GOEL_CHOPRA_LIMITS,
];
