/** Families of period formulas: the code of each form stands here once. */
import type { Family } from '../formula.js';
import { power } from '../numeric/power.js';

export interface HeightInput {
  readonly height_m: number;
}
export interface HeightPowerConstants {
  readonly coefficient: number;
  readonly exponent: number;
  /** Length of the unit the coefficient was printed for: 0.3048 for feet, 1 for metres. */
  readonly unit_m: number;
}

const HEIGHT = {
  name: 'height_m',
  kind: 'number',
  unit: 'm',
  meaning: 'height from the base to the highest level',
} as const;

/** T = C h^x, h in the unit the coefficient was printed for. */
export const heightPower: Family<HeightInput, HeightPowerConstants> = {
  id: 'period/height-power',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [HEIGHT],
  expression: 'coefficient * (height_m / unit_m) ^ exponent',
  evaluate: ({ height_m }, { coefficient, exponent, unit_m }) => coefficient * power(height_m / unit_m, exponent),
};

/** T = c N. */
export const perStorey: Family<{ readonly storeys: number }, { readonly coefficient: number }> = {
  id: 'period/per-storey',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [{ name: 'storeys', kind: 'number', meaning: 'storeys above the base' }],
  expression: 'coefficient * storeys',
  evaluate: ({ storeys }, { coefficient }) => coefficient * storeys,
};

/** T = c h / √d, h and d in the printed unit. */
export const heightOverRootPlan: Family<
  { readonly height_m: number; readonly plan_dimension_m: number },
  { readonly coefficient: number; readonly unit_m: number }
> = {
  id: 'period/height-over-root-plan',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [HEIGHT, { name: 'plan_dimension_m', kind: 'number', unit: 'm', meaning: 'plan dimension along the force' }],
  expression: 'coefficient * (height_m / unit_m) / sqrt(plan_dimension_m / unit_m)',
  evaluate: ({ height_m, plan_dimension_m }, { coefficient, unit_m }) =>
    (coefficient * (height_m / unit_m)) / Math.sqrt(plan_dimension_m / unit_m),
};

/** T = c √d, d the sway of the top under gravity applied sideways. */
export const gravitySway: Family<{ readonly top_displacement_m: number }, { readonly coefficient: number }> = {
  id: 'period/gravity-sway',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [
    {
      name: 'top_displacement_m',
      kind: 'number',
      unit: 'm',
      meaning: 'top displacement under the weight applied sideways',
    },
  ],
  expression: 'coefficient * sqrt(top_displacement_m)',
  evaluate: ({ top_displacement_m }, { coefficient }) => coefficient * Math.sqrt(top_displacement_m),
};

/** A measured period brought to the amplitude of strong shaking. */
export const amplitudeFactor: Family<{ readonly period_s: number }, { readonly factor: number }> = {
  id: 'period/amplitude-factor',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [{ name: 'period_s', kind: 'number', unit: 's', meaning: 'measured period' }],
  expression: 'factor * period_s',
  evaluate: ({ period_s }, { factor }) => factor * period_s,
};

/** T = 1/f. */
export const reciprocal: Family<{ readonly frequency_hz: number }, Record<never, number>> = {
  id: 'period/reciprocal',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [{ name: 'frequency_hz', kind: 'number', meaning: 'frequency in cycles a second' }],
  expression: '1 / frequency_hz',
  evaluate: ({ frequency_hz }) => 1 / frequency_hz,
};
