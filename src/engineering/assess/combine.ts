/** Two estimates of one period made one. */
import { exp, ln } from '../numeric/elementary.js';
import { record } from '../formula.js';
import type { Family } from '../formula.js';

interface Two {
  readonly period_1_s: number;
  readonly sigma_1: number;
  readonly period_2_s: number;
  readonly sigma_2: number;
}

const combined: Family<Two, Record<never, number>> = {
  id: 'period/inverse-variance',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [
    { name: 'period_1_s', kind: 'number', unit: 's', meaning: 'first estimate' },
    { name: 'sigma_1', kind: 'number', meaning: 'its method error, σ of ln T' },
    { name: 'period_2_s', kind: 'number', unit: 's', meaning: 'second estimate' },
    { name: 'sigma_2', kind: 'number', meaning: 'its method error, σ of ln T' },
  ],
  expression:
    'exp((ln(period_1_s) / sigma_1 ^ 2 + ln(period_2_s) / sigma_2 ^ 2) / (1 / sigma_1 ^ 2 + 1 / sigma_2 ^ 2))',
  evaluate: ({ period_1_s, sigma_1, period_2_s, sigma_2 }) => {
    const w1 = 1 / (sigma_1 * sigma_1);
    const w2 = 1 / (sigma_2 * sigma_2);
    return exp((w1 * ln(period_1_s) + w2 * ln(period_2_s)) / (w1 + w2));
  },
};

export const COMBINED_PERIOD = record({
  id: 'statistics/period/inverse-variance',
  title: 'Two estimates combined in ln T by inverse variance',
  family: combined,
  constants: {},
  source: { standard: 'Birge', edition: '1932', clause: 'weighted mean; variance × max(1, χ²/(n-1))' },
  verified: 'memory',
  limits: [],
});

const flexibleBase: Family<{ readonly period_ratio: number; readonly period_s: number }, Record<never, number>> = {
  id: 'period/flexible-base',
  yields: 'period_s',
  unit: 's',
  symbol: 'T̃',
  inputs: [
    { name: 'period_ratio', kind: 'number', meaning: 'period on flexible ground over that on a fixed base' },
    { name: 'period_s', kind: 'number', unit: 's', meaning: 'period on a fixed base' },
  ],
  expression: 'period_ratio * period_s',
  evaluate: ({ period_ratio, period_s }) => period_ratio * period_s,
};

export const FLEXIBLE_BASE = record({
  id: 'mechanics/period/on-flexible-ground',
  title: 'Period on the ground of record',
  family: flexibleBase,
  constants: {},
  source: { standard: 'Veletsos and Meek', edition: '1974', clause: 'T̃ = (T̃/T) T' },
  verified: 'memory',
  limits: [],
});
