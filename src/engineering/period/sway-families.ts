/** Families of periods from a displacement, and of the limits that standards set on calculated periods. */
import type { Family } from '../formula.js';
import { amplitudeFactor } from './families.js';

const TOP = {
  name: 'top_displacement_m',
  kind: 'number',
  unit: 'm',
  meaning: 'top displacement under the weight applied sideways',
} as const;

/** T = c √d, d the sway of the top under gravity applied sideways. */
export const gravitySway: Family<{ readonly top_displacement_m: number }, { readonly coefficient: number }> = {
  id: 'period/gravity-sway',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [TOP],
  expression: 'coefficient * sqrt(top_displacement_m)',
  evaluate: ({ top_displacement_m }, { coefficient }) => coefficient * Math.sqrt(top_displacement_m),
};

/** T = c ψ √d, ψ for the stiffness of non-structural walls. */
export const reducedSway: Family<
  { readonly top_displacement_m: number; readonly wall_reduction: number },
  { readonly coefficient: number }
> = {
  id: 'period/reduced-sway',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [TOP, { name: 'wall_reduction', kind: 'number', meaning: 'reduction for non-structural walls, ψ_T' }],
  expression: 'coefficient * wall_reduction * sqrt(top_displacement_m)',
  evaluate: ({ top_displacement_m, wall_reduction }, { coefficient }) =>
    coefficient * wall_reduction * Math.sqrt(top_displacement_m),
};

const DIAPHRAGM = {
  name: 'diaphragm_displacement_m',
  kind: 'number',
  unit: 'm',
  meaning: 'mid-span displacement of the diaphragm under a lateral force equal to the tributary weight',
} as const;

/** T = √(a d_w + b d_d), displacements in the printed unit. */
export const flexibleDiaphragm: Family<
  { readonly wall_displacement_m: number; readonly diaphragm_displacement_m: number },
  { readonly wall_coefficient: number; readonly diaphragm_coefficient: number; readonly unit_m: number }
> = {
  id: 'period/flexible-diaphragm',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [
    {
      name: 'wall_displacement_m',
      kind: 'number',
      unit: 'm',
      meaning: 'in-plane displacement of the wall under a lateral force equal to the tributary weight',
    },
    DIAPHRAGM,
  ],
  expression:
    'sqrt(wall_coefficient * (wall_displacement_m / unit_m) + diaphragm_coefficient * (diaphragm_displacement_m / unit_m))',
  evaluate: ({ wall_displacement_m, diaphragm_displacement_m }, { wall_coefficient, diaphragm_coefficient, unit_m }) =>
    Math.sqrt(
      wall_coefficient * (wall_displacement_m / unit_m) + diaphragm_coefficient * (diaphragm_displacement_m / unit_m),
    ),
};

/** T = √(b d_d), the displacement in the printed unit. */
export const flexibleDiaphragmAlone: Family<
  { readonly diaphragm_displacement_m: number },
  { readonly diaphragm_coefficient: number; readonly unit_m: number }
> = {
  id: 'period/flexible-diaphragm-alone',
  yields: 'period_s',
  unit: 's',
  symbol: 'T',
  inputs: [DIAPHRAGM],
  expression: 'sqrt(diaphragm_coefficient * (diaphragm_displacement_m / unit_m))',
  evaluate: ({ diaphragm_displacement_m }, { diaphragm_coefficient, unit_m }) =>
    Math.sqrt(diaphragm_coefficient * (diaphragm_displacement_m / unit_m)),
};

const APPROXIMATE = {
  name: 'period_s',
  kind: 'number',
  unit: 's',
  meaning: 'approximate period by the formula of the standard',
} as const;

/** The longest calculated period that may be used: a factor on the approximate one. */
export const periodCap: Family<{ readonly period_s: number }, { readonly factor: number }> = {
  ...amplitudeFactor,
  id: 'period/cap',
  symbol: 'T_max',
  inputs: [APPROXIMATE],
};

export interface CapBySpectrumConstants {
  readonly sd1_1_g: number;
  readonly sd1_2_g: number;
  readonly sd1_3_g: number;
  readonly sd1_4_g: number;
  readonly sd1_5_g: number;
  readonly cap_1: number;
  readonly cap_2: number;
  readonly cap_3: number;
  readonly cap_4: number;
  readonly cap_5: number;
}

function between(x: number, x0: number, x1: number, y0: number, y1: number): number {
  return y0 + ((y1 - y0) * (x - x0)) / (x1 - x0);
}

function capAt(sd1_g: number, c: CapBySpectrumConstants): number {
  if (sd1_g <= c.sd1_1_g) return c.cap_1;
  if (sd1_g <= c.sd1_2_g) return between(sd1_g, c.sd1_1_g, c.sd1_2_g, c.cap_1, c.cap_2);
  if (sd1_g <= c.sd1_3_g) return between(sd1_g, c.sd1_2_g, c.sd1_3_g, c.cap_2, c.cap_3);
  if (sd1_g <= c.sd1_4_g) return between(sd1_g, c.sd1_3_g, c.sd1_4_g, c.cap_3, c.cap_4);
  if (sd1_g <= c.sd1_5_g) return between(sd1_g, c.sd1_4_g, c.sd1_5_g, c.cap_4, c.cap_5);
  return c.cap_5;
}

/** T_max = C_u T_a, C_u by S_D1. */
export const capBySpectrum: Family<{ readonly period_s: number; readonly sd1_g: number }, CapBySpectrumConstants> = {
  id: 'period/cap-by-spectrum',
  yields: 'period_s',
  unit: 's',
  symbol: 'T_max',
  inputs: [
    APPROXIMATE,
    { name: 'sd1_g', kind: 'number', unit: 'g', meaning: 'design spectral acceleration at one second' },
  ],
  expression: null,
  procedure: 'T_max = C_u T_a; C_u by S_D1 from the table, straight lines between its rows, held beyond its ends',
  evaluate: ({ period_s, sd1_g }, constants) => capAt(sd1_g, constants) * period_s,
};

/** The longest period for which the lateral-force method may be used. */
export const lateralForceLimit: Family<
  { readonly corner_period_s: number },
  { readonly factor: number; readonly ceiling_s: number }
> = {
  id: 'period/lateral-force-limit',
  yields: 'period_s',
  unit: 's',
  symbol: 'T_max',
  inputs: [
    {
      name: 'corner_period_s',
      kind: 'number',
      unit: 's',
      meaning: 'period T_C at the upper end of the plateau of the spectrum',
    },
  ],
  expression: 'min(factor * corner_period_s, ceiling_s)',
  evaluate: ({ corner_period_s }, { factor, ceiling_s }) => Math.min(factor * corner_period_s, ceiling_s),
};
