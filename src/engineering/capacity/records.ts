/** From a design coefficient to a capacity in g on the elastic spectrum. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';

const judged = (clause: string) => ({ standard: 'Swaymark', edition: '', clause });

export const MIN_COEFFICIENT_G = 0.04;
export const WORKING_TO_STRENGTH = 1.4;
export const OVERSTRENGTH = 2;

export const REDUCTION_FAMILY: Family<
  { readonly ductility: number; readonly period_s: number; readonly corner_period_s: number },
  Record<never, number>
> = {
  id: 'capacity/reduction',
  yields: 'reduction',
  unit: null,
  symbol: 'R_μ',
  inputs: [
    { name: 'ductility', kind: 'number', meaning: 'displacement ductility of system and edition' },
    { name: 'period_s', kind: 'number', unit: 's', meaning: 'fundamental period' },
    { name: 'corner_period_s', kind: 'number', unit: 's', meaning: "end of the spectrum's plateau" },
  ],
  expression: 'min(ductility, 1 + (ductility - 1) * period_s / corner_period_s)',
  evaluate: ({ ductility, period_s, corner_period_s }) => reductionFactor(ductility, period_s, corner_period_s),
};

/** R_μ = μ beyond the corner period, 1 + (μ - 1) T/T_c below it. */
export function reductionFactor(ductility: number, period_s: number, corner_period_s: number): number {
  return Math.min(ductility, 1 + ((ductility - 1) * period_s) / corner_period_s);
}

export const REDUCTION = record({
  id: 'n2/capacity/reduction',
  title: 'Reduction of the elastic spectrum by ductility',
  family: REDUCTION_FAMILY,
  constants: {},
  source: { standard: 'N2 method', edition: '', clause: 'Vidic, Fajfar and Fischinger 1994; EN 1998-1 annex B' },
  verified: 'memory',
  limits: [],
});

interface StrengthInput {
  readonly design_base_shear_coefficient: number;
  readonly level_factor: number;
  readonly retrofit_level: number;
  readonly wind_coefficient: number;
}
const strengthFamily: Family<StrengthInput, { readonly floor_g: number }> = {
  id: 'capacity/strength',
  yields: 'strength_coefficient',
  unit: null,
  symbol: 'C_s',
  inputs: [
    { name: 'design_base_shear_coefficient', kind: 'number', meaning: 'V/W the design asked' },
    { name: 'level_factor', kind: 'number', meaning: '1.4 from working stress to strength, else 1' },
    {
      name: 'retrofit_level',
      kind: 'number',
      meaning: "share of its year's code a retrofit reached, else 1",
      fallback: 1,
    },
    {
      name: 'wind_coefficient',
      kind: 'number',
      meaning: 'V/W of the wind at strength level, where given',
      fallback: 0,
    },
  ],
  expression: 'max(design_base_shear_coefficient * level_factor * retrofit_level, wind_coefficient, floor_g)',
  evaluate: ({ design_base_shear_coefficient, level_factor, retrofit_level, wind_coefficient }, { floor_g }) =>
    Math.max(design_base_shear_coefficient * level_factor * retrofit_level, wind_coefficient, floor_g),
};

export const STRENGTH = record({
  id: 'swaymark/capacity/strength-coefficient',
  title: 'Strength coefficient, at least 0.04',
  family: strengthFamily,
  constants: { floor_g: MIN_COEFFICIENT_G },
  source: judged('floor of 0.04 W for wind and redundancy [judgement]'),
  verified: 'judgement',
  limits: [],
});

const ductilityFamily: Family<
  {
    readonly ductility: number;
    readonly code_reduction: number;
    readonly level_factor: number;
    readonly overstrength: number;
  },
  Record<never, number>
> = {
  id: 'capacity/ductility-kept',
  yields: 'ductility',
  unit: null,
  symbol: 'μ',
  inputs: [
    { name: 'ductility', kind: 'number', meaning: 'ductility of the detailing class' },
    { name: 'code_reduction', kind: 'number', meaning: "the edition's own reduction: R, R_w or 8/K" },
    { name: 'level_factor', kind: 'number', meaning: '1.4 from working stress to strength, else 1' },
    { name: 'overstrength', kind: 'number', meaning: 'overstrength' },
  ],
  expression: 'max(min(ductility, code_reduction / (level_factor * overstrength)), 1)',
  evaluate: ({ ductility, code_reduction, level_factor, overstrength }) =>
    Math.max(Math.min(ductility, code_reduction / (level_factor * overstrength)), 1),
};

const reductionBeforeFamily: Family<
  { readonly first_reduction: number; readonly ductility_share: number; readonly level_factor: number },
  Record<never, number>
> = {
  id: 'capacity/reduction-before',
  yields: 'code_reduction',
  unit: null,
  symbol: 'R_0',
  inputs: [
    {
      name: 'first_reduction',
      kind: 'number',
      meaning: 'reduction, at strength level, of the first edition of the family that knew one',
    },
    {
      name: 'ductility_share',
      kind: 'number',
      meaning: 'ductility of the detailing class over that of the detailing which this edition asked, 1 at most',
    },
    { name: 'level_factor', kind: 'number', meaning: '1.4 from working stress to strength, else 1' },
  ],
  expression: 'first_reduction * ductility_share * level_factor',
  evaluate: ({ first_reduction, ductility_share, level_factor }) => first_reduction * ductility_share * level_factor,
};

export const REDUCTION_BEFORE = record({
  id: 'swaymark/capacity/reduction-before',
  title: 'Reduction of an edition that knew none: that of the first which did, by the share of its ductility',
  family: reductionBeforeFamily,
  constants: {},
  source: judged('a reduction goes with the detailing that is asked for it [judgement]'),
  verified: 'judgement',
  limits: [],
});

export const DUCTILITY_KEPT = record({
  id: 'swaymark/capacity/ductility-kept',
  title: "Ductility, so that level, overstrength and ductility never exceed the edition's own reduction",
  family: ductilityFamily,
  constants: {},
  source: judged('f_level Ω μ at most R, R_w or 8/K'),
  verified: 'judgement',
  limits: [],
});

const overstrengthFamily: Family<
  { readonly overstrength: number; readonly code_reduction: number; readonly level_factor: number },
  Record<never, number>
> = {
  id: 'capacity/overstrength-kept',
  yields: 'overstrength',
  unit: null,
  symbol: 'Ω',
  inputs: [
    { name: 'overstrength', kind: 'number', meaning: 'overstrength' },
    { name: 'code_reduction', kind: 'number', meaning: "the edition's own reduction: R, R_w or 8/K" },
    { name: 'level_factor', kind: 'number', meaning: '1.4 from working stress to strength, else 1' },
  ],
  expression: 'max(min(overstrength, code_reduction / level_factor), 1)',
  evaluate: ({ overstrength, code_reduction, level_factor }) =>
    Math.max(Math.min(overstrength, code_reduction / level_factor), 1),
};

export const OVERSTRENGTH_KEPT = record({
  id: 'swaymark/capacity/overstrength-kept',
  title: "Overstrength, so that level and overstrength never exceed the edition's own reduction",
  family: overstrengthFamily,
  constants: {},
  source: judged('f_level Ω μ at most R, R_w or 8/K'),
  verified: 'judgement',
  limits: [],
});

interface ElasticInput {
  readonly strength_coefficient: number;
  readonly overstrength: number;
  readonly reduction: number;
  readonly irregularity: number;
  readonly mass_share: number;
}
const elasticFamily: Family<ElasticInput, Record<never, number>> = {
  id: 'capacity/elastic-equivalent',
  yields: 'capacity_sa_g',
  unit: 'g',
  symbol: 'C',
  inputs: [
    { name: 'strength_coefficient', kind: 'number', meaning: 'strength coefficient' },
    { name: 'overstrength', kind: 'number', meaning: 'overstrength' },
    { name: 'reduction', kind: 'number', meaning: 'reduction by ductility' },
    { name: 'irregularity', kind: 'number', meaning: 'product of the irregularity factors', fallback: 1 },
    {
      name: 'mass_share',
      kind: 'number',
      meaning: 'share of the mass in the first mode: 1 to two storeys, 0.85 above',
    },
  ],
  expression: 'strength_coefficient * overstrength * reduction * irregularity / mass_share',
  evaluate: ({ strength_coefficient, overstrength, reduction, irregularity, mass_share }) =>
    (strength_coefficient * overstrength * reduction * irregularity) / mass_share,
};

export const ELASTIC_EQUIVALENT = record({
  id: 'swaymark/capacity/elastic-equivalent',
  title: 'Capacity as spectral acceleration of the elastic spectrum',
  family: elasticFamily,
  constants: {},
  source: judged('strength × Ω × R_μ / α₁'),
  verified: 'judgement',
  limits: [],
});

export const CAPACITY_RECORDS: readonly AnyRecord[] = [
  STRENGTH,
  OVERSTRENGTH_KEPT,
  DUCTILITY_KEPT,
  REDUCTION_BEFORE,
  REDUCTION,
  ELASTIC_EQUIVALENT,
];
