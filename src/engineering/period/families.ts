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

/** T = f C h^x, f the factor that the standard puts on its own approximate period. */
export const factoredHeightPower: Family<HeightInput, HeightPowerConstants & { readonly factor: number }> = {
  id: 'period/factored-height-power',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [HEIGHT],
  expression: 'factor * coefficient * (height_m / unit_m) ^ exponent',
  evaluate: ({ height_m }, { factor, coefficient, exponent, unit_m }) =>
    factor * coefficient * power(height_m / unit_m, exponent),
};

/** T = c h, metres. */
export const heightLinear: Family<HeightInput, { readonly coefficient: number }> = {
  id: 'period/height-linear',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [HEIGHT],
  expression: 'coefficient * height_m',
  evaluate: ({ height_m }, { coefficient }) => coefficient * height_m,
};

/** T = h / c, metres. */
export const heightDivided: Family<HeightInput, { readonly divisor: number }> = {
  id: 'period/height-divided',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [HEIGHT],
  expression: 'height_m / divisor',
  evaluate: ({ height_m }, { divisor }) => height_m / divisor,
};

const STOREYS = { name: 'storeys', kind: 'number', meaning: 'storeys above the base' } as const;

/** T = N / c. */
export const storeysDivided: Family<{ readonly storeys: number }, { readonly divisor: number }> = {
  id: 'period/storeys-divided',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [STOREYS],
  expression: 'storeys / divisor',
  evaluate: ({ storeys }, { divisor }) => storeys / divisor,
};

/** T = c N. */
export const perStorey: Family<{ readonly storeys: number }, { readonly coefficient: number }> = {
  id: 'period/per-storey',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [STOREYS],
  expression: 'coefficient * storeys',
  evaluate: ({ storeys }, { coefficient }) => coefficient * storeys,
};

const PLAN = {
  name: 'plan_dimension_m',
  kind: 'number',
  unit: 'm',
  meaning: 'plan dimension along the force',
} as const;

export interface HeightPlanInput extends HeightInput {
  readonly plan_dimension_m: number;
}

/** T = c h / √d, h and d in the printed unit. */
export const heightOverRootPlan: Family<HeightPlanInput, { readonly coefficient: number; readonly unit_m: number }> = {
  id: 'period/height-over-root-plan',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [HEIGHT, PLAN],
  expression: 'coefficient * (height_m / unit_m) / sqrt(plan_dimension_m / unit_m)',
  evaluate: ({ height_m, plan_dimension_m }, { coefficient, unit_m }) =>
    (coefficient * (height_m / unit_m)) / Math.sqrt(plan_dimension_m / unit_m),
};

/** The lesser of C h^x and c h / √d, metres. */
export const lesserOfHeightAndPlan: Family<
  HeightPlanInput,
  { readonly coefficient: number; readonly exponent: number; readonly plan_coefficient: number }
> = {
  id: 'period/lesser-of-height-and-plan',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [HEIGHT, PLAN],
  expression: 'min(coefficient * height_m ^ exponent, plan_coefficient * height_m / sqrt(plan_dimension_m))',
  evaluate: ({ height_m, plan_dimension_m }, { coefficient, exponent, plan_coefficient }) =>
    Math.min(coefficient * power(height_m, exponent), (plan_coefficient * height_m) / Math.sqrt(plan_dimension_m)),
};

/** T = T₀ + c h^y / ∛B, metres, B the plan dimension along the force. */
export const heightOverCubeRootPlan: Family<
  HeightPlanInput,
  { readonly base_s: number; readonly coefficient: number; readonly height_exponent: number }
> = {
  id: 'period/height-over-cube-root-plan',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [HEIGHT, PLAN],
  expression: 'base_s + coefficient * height_m ^ height_exponent / plan_dimension_m ^ (1 / 3)',
  evaluate: ({ height_m, plan_dimension_m }, { base_s, coefficient, height_exponent }) =>
    base_s + (coefficient * power(height_m, height_exponent)) / power(plan_dimension_m, 1 / 3),
};

/** T = C h^x + c L, metres: one storey under a flexible roof of span L. */
export const heightPlusSpan: Family<
  HeightInput & { readonly diaphragm_length_m: number },
  { readonly coefficient: number; readonly exponent: number; readonly span_coefficient: number }
> = {
  id: 'period/height-plus-span',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [
    HEIGHT,
    {
      name: 'diaphragm_length_m',
      kind: 'number',
      unit: 'm',
      meaning: 'shortest length of the roof diaphragm between adjacent vertical elements',
    },
  ],
  expression: 'coefficient * height_m ^ exponent + span_coefficient * diaphragm_length_m',
  evaluate: ({ height_m, diaphragm_length_m }, { coefficient, exponent, span_coefficient }) =>
    coefficient * power(height_m, exponent) + span_coefficient * diaphragm_length_m,
};

/** T = h (a + b α), α the share of the height whose columns and beams are mostly steel or wood. */
export const heightByMaterial: Family<
  HeightInput & { readonly steel_or_wood_height_m: number },
  { readonly coefficient: number; readonly added_coefficient: number }
> = {
  id: 'period/height-by-material',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [
    HEIGHT,
    {
      name: 'steel_or_wood_height_m',
      kind: 'number',
      unit: 'm',
      meaning: 'height of the storeys whose columns and beams are mostly steel or wood, basements left out',
    },
  ],
  expression: 'height_m * (coefficient + added_coefficient * (steel_or_wood_height_m / height_m))',
  evaluate: ({ height_m, steel_or_wood_height_m }, { coefficient, added_coefficient }) =>
    height_m * (coefficient + added_coefficient * (steel_or_wood_height_m / height_m)),
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
