/** Records of this room that are no spectra: site, damping, return period and near-fault factors. */
import type { AnyRecord } from '../formula.js';
import { ASCE7_FACTOR_RECORDS } from './asce7-factors.js';
import { DAMPING_RECORDS } from './damping.js';
import { NBC_2015_FACTORS } from './nbc-factors.js';
import { NZS1170_FACTOR_RECORDS } from './nzs1170-factors.js';
import { TBDY_FACTOR_RECORDS } from './turkey.js';

export const SPECTRUM_FACTOR_RECORDS: readonly AnyRecord[] = [
  ...ASCE7_FACTOR_RECORDS,
  ...NZS1170_FACTOR_RECORDS,
  ...NBC_2015_FACTORS,
  ...TBDY_FACTOR_RECORDS,
  ...DAMPING_RECORDS,
];
