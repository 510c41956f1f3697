/** From elastic to inelastic displacement: strength ratio, C1, C2, and the older C1, which are not to be mixed. */
import { record } from '../formula.js';
import type { AnyRecord, Family, InputSpec } from '../formula.js';

const RATIO: InputSpec = {
  name: 'strength_ratio',
  kind: 'number',
  above: 0,
  to: 1e6,
  meaning: 'elastic force over yield strength',
};
const PERIOD: InputSpec = { name: 'period_s', kind: 'number', unit: 's', above: 0, to: 100, meaning: 'period' };
const asce41 = (clause: string) => ({ standard: 'ASCE/SEI 41', edition: '17', clause });

const strength: Family<
  { readonly sa_g: number; readonly mass_share: number; readonly yield_coefficient: number },
  Record<never, number>
> = {
  id: 'demand/strength-ratio',
  yields: 'strength_ratio',
  unit: null,
  symbol: 'μ_s',
  inputs: [
    { name: 'sa_g', kind: 'number', unit: 'g', meaning: 'spectral acceleration' },
    { name: 'mass_share', kind: 'number', meaning: 'share of the mass in the first mode, applied once' },
    { name: 'yield_coefficient', kind: 'number', above: 0, to: 100, meaning: 'strength over weight' },
  ],
  expression: 'sa_g * mass_share / yield_coefficient',
  evaluate: ({ sa_g, mass_share, yield_coefficient }) => (sa_g * mass_share) / yield_coefficient,
};
export const STRENGTH_RATIO = record({
  id: 'asce41-17/displacement/strength-ratio',
  title: 'Elastic force over strength',
  family: strength,
  constants: {},
  source: asce41('eq. 7-31'),
  verified: 'memory',
  limits: [],
});

interface YieldInput {
  readonly strength_coefficient: number;
  readonly overstrength: number;
  readonly irregularity: number;
}
const IRREGULARITY: InputSpec = {
  name: 'irregularity',
  kind: 'number',
  meaning: 'product of the irregularity factors',
};
const yields: Family<YieldInput, Record<never, number>> = {
  id: 'demand/yield-coefficient',
  yields: 'yield_coefficient',
  unit: null,
  symbol: 'c_y',
  inputs: [
    { name: 'strength_coefficient', kind: 'number', meaning: 'strength coefficient of the capacity that ranks' },
    { name: 'overstrength', kind: 'number', meaning: 'overstrength' },
    IRREGULARITY,
  ],
  expression: 'strength_coefficient * overstrength * irregularity',
  evaluate: ({ strength_coefficient, overstrength, irregularity }) =>
    strength_coefficient * overstrength * irregularity,
};
export const YIELD_COEFFICIENT = record({
  id: 'swaymark/displacement/yield-coefficient',
  title: 'Strength over weight, of the capacity that ranks',
  family: yields,
  constants: {},
  source: { standard: 'Swaymark', edition: '', clause: 'the capacity without R_μ and mass share' },
  verified: 'judgement',
  limits: [],
});

interface CheckedInput {
  readonly strength_coefficient: number;
  readonly modification_c: number;
  readonly modifier_ms: number;
  readonly irregularity: number;
}
const checked: Family<CheckedInput, Record<never, number>> = {
  id: 'demand/yield-coefficient-checked',
  yields: 'yield_coefficient',
  unit: null,
  symbol: 'c_y',
  inputs: [
    { name: 'strength_coefficient', kind: 'number', meaning: 'S_a at which the strength check is met, in g' },
    { name: 'modification_c', kind: 'number', meaning: 'modification factor C of the base shear' },
    { name: 'modifier_ms', kind: 'number', above: 0, to: 100, meaning: 'system modification factor M_s' },
    IRREGULARITY,
  ],
  expression: 'strength_coefficient * modification_c / modifier_ms * irregularity',
  evaluate: ({ strength_coefficient, modification_c, modifier_ms, irregularity }) =>
    ((strength_coefficient * modification_c) / modifier_ms) * irregularity,
};
export const YIELD_OF_CHECK = record({
  id: 'swaymark/displacement/yield-coefficient-of-check',
  title: 'Strength over weight, of the strength check that ranks',
  family: checked,
  constants: {},
  source: {
    standard: 'Swaymark',
    edition: '',
    clause: 'average stress times area over weight: the check without M_s and C',
  },
  verified: 'judgement',
  limits: [],
});

interface C1Input {
  readonly strength_ratio: number;
  readonly site_factor_a: number;
  readonly period_s: number;
}
interface C1Constants {
  readonly least_s: number;
  readonly none_above_s: number;
}
const c1: Family<C1Input, C1Constants> = {
  id: 'demand/c1',
  yields: 'c1',
  unit: null,
  symbol: 'C₁',
  inputs: [
    RATIO,
    {
      name: 'site_factor_a',
      kind: 'number',
      above: 0,
      to: 1000,
      meaning: 'a of the site class: 130 (A, B), 90 (C), 60',
    },
    PERIOD,
  ],
  expression: null,
  procedure: '1 + (μ_s - 1)/(a T²), T not under 0.2 s; 1 beyond 1 s, and where the building stays elastic',
  shownAt: ({ period_s }, { none_above_s }) =>
    period_s > none_above_s
      ? { expression: '1', clause: 'beyond 1 s' }
      : {
          expression:
            '1 + (max(strength_ratio, 1) - 1) / (site_factor_a * max(period_s, least_s) * max(period_s, least_s))',
          clause: 'up to 1 s',
        },
  evaluate: ({ strength_ratio, site_factor_a, period_s }, { least_s, none_above_s }) => {
    if (period_s > none_above_s) return 1;
    const t = Math.max(period_s, least_s);
    return 1 + (Math.max(strength_ratio, 1) - 1) / (site_factor_a * t * t);
  },
};
export const C1 = record({
  id: 'asce41-17/displacement/c1',
  title: 'Inelastic over elastic displacement, C₁',
  family: c1,
  constants: { least_s: 0.2, none_above_s: 1 },
  source: asce41('eq. 7-29'),
  verified: 'restated',
  limits: [],
  note: 'Form and a = 60 restated; the other a and the bounds on T from memory. Strength ratios above about 8 are beyond what it was fitted to [judgement]: there the displacement says little more than that it is large.',
});

interface C2Input {
  readonly strength_ratio: number;
  readonly period_s: number;
}
const c2: Family<C2Input, { readonly divisor: number; readonly least_s: number; readonly none_above_s: number }> = {
  id: 'demand/c2',
  yields: 'c2',
  unit: null,
  symbol: 'C₂',
  inputs: [RATIO, PERIOD],
  expression: null,
  procedure: '1 + ((μ_s - 1)/T)²/800, T not under 0.2 s; 1 beyond 0.7 s, and where the building stays elastic',
  shownAt: ({ period_s }, { none_above_s }) =>
    period_s > none_above_s
      ? { expression: '1', clause: 'beyond 0.7 s' }
      : {
          expression:
            '1 + ((max(strength_ratio, 1) - 1) / max(period_s, least_s)) * ((max(strength_ratio, 1) - 1) / max(period_s, least_s)) / divisor',
          clause: 'up to 0.7 s',
        },
  evaluate: ({ strength_ratio, period_s }, { divisor, least_s, none_above_s }) => {
    if (period_s > none_above_s) return 1;
    const x = (Math.max(strength_ratio, 1) - 1) / Math.max(period_s, least_s);
    return 1 + (x * x) / divisor;
  },
};
export const C2 = record({
  id: 'asce41-17/displacement/c2',
  title: 'Displacement by loss of stiffness and strength, C₂',
  family: c2,
  constants: { divisor: 800, least_s: 0.2, none_above_s: 0.7 },
  source: asce41('eq. 7-30'),
  verified: 'memory',
  limits: [],
  note: 'The bound of 0.2 s on T is that of C₁ [judgement].',
});

interface OldInput {
  readonly strength_ratio: number;
  readonly period_s: number;
  readonly corner_period_s: number;
}
const old: Family<OldInput, Record<never, number>> = {
  id: 'demand/c1-earlier',
  yields: 'c1',
  unit: null,
  symbol: 'C₁',
  inputs: [
    { ...RATIO, from: 1 },
    PERIOD,
    { name: 'corner_period_s', kind: 'number', unit: 's', above: 0, to: 100, meaning: "end of the spectrum's plateau" },
  ],
  expression: 'max(1, (1 + (strength_ratio - 1) * corner_period_s / period_s) / strength_ratio)',
  evaluate: ({ strength_ratio, period_s, corner_period_s }) =>
    Math.max(1, (1 + ((strength_ratio - 1) * corner_period_s) / period_s) / strength_ratio),
};
const C1_EARLIER = record({
  id: 'ufc-3-310-03a/displacement/c1',
  title: 'Inelastic over elastic displacement, the earlier C₁',
  family: old,
  constants: {},
  source: { standard: 'UFC 3-310-03A', edition: '', clause: 'after eq. 5-5 (FEMA 273 and 356)' },
  verified: 'restated',
  limits: [],
  note: 'Not to be mixed with the C₁ of ASCE/SEI 41-17. The optional cap of 1.5 is not applied.',
});

export const INELASTIC_RECORDS: readonly AnyRecord[] = [
  STRENGTH_RATIO,
  YIELD_COEFFICIENT,
  YIELD_OF_CHECK,
  C1,
  C2,
  C1_EARLIER,
];
