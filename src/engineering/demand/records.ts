/** What is read off the spectrum besides S_a itself. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { BASE_SHEAR_RECORDS } from './base-shear.js';
import { DRIFT_RECORDS } from './drift.js';
import { INELASTIC_RECORDS } from './inelastic.js';
import { SEPARATION_RECORDS } from './separation.js';

const displacement: Family<{ readonly sa_g: number; readonly period_s: number }, { readonly gravity_mps2: number }> = {
  id: 'demand/spectral-displacement',
  yields: 'sd_m',
  unit: 'm',
  symbol: 'S_d',
  inputs: [
    { name: 'sa_g', kind: 'number', unit: 'g', meaning: 'spectral acceleration' },
    { name: 'period_s', kind: 'number', unit: 's', meaning: 'period' },
  ],
  expression: 'sa_g * gravity_mps2 * (period_s / (2 * pi)) ^ 2',
  evaluate: ({ sa_g, period_s }, { gravity_mps2 }) => {
    const t = period_s / (2 * Math.PI);
    return sa_g * gravity_mps2 * t * t;
  },
};

export const SPECTRAL_DISPLACEMENT = record({
  id: 'mechanics/demand/spectral-displacement',
  title: 'Spectral displacement from spectral acceleration',
  family: displacement,
  constants: { gravity_mps2: 9.80665 },
  source: { standard: 'structural dynamics', edition: '', clause: 'S_d = S_a g (T/2π)², pseudo-spectral' },
  verified: 'mechanics',
  limits: [],
});

export const DEMAND_RECORDS: readonly AnyRecord[] = [
  SPECTRAL_DISPLACEMENT,
  ...BASE_SHEAR_RECORDS,
  ...INELASTIC_RECORDS,
  ...DRIFT_RECORDS,
  ...SEPARATION_RECORDS,
];
