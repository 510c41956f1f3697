/** Base shear over weight by today's codes, each with its own limits; λ or C_m enters once. */
import type { System } from '../building.js';
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';

interface AsceInput {
  readonly sds_g: number;
  readonly sd1_g: number;
  readonly tl_s: number;
  readonly near_fault_s1_g: number;
  readonly reduction_r: number;
  readonly importance_factor: number;
  readonly period_s: number;
}
const asce: Family<AsceInput, { readonly share: number; readonly least: number }> = {
  id: 'demand/base-shear-asce7',
  yields: 'base_shear_coefficient',
  unit: null,
  // the standard calls it C_s, which on a sheet is the strength coefficient of the capacity
  symbol: 'V/W',
  inputs: [
    { name: 'sds_g', kind: 'number', unit: 'g', meaning: 'S_DS' },
    { name: 'sd1_g', kind: 'number', unit: 'g', meaning: 'S_D1' },
    { name: 'tl_s', kind: 'number', unit: 's', above: 0, to: 100, meaning: 'long-period transition' },
    {
      name: 'near_fault_s1_g',
      kind: 'number',
      unit: 'g',
      meaning: 'S1 where it is at least 0.6 g, else 0',
      fallback: 0,
    },
    { name: 'reduction_r', kind: 'number', above: 0, to: 20, meaning: 'R of the system' },
    { name: 'importance_factor', kind: 'number', above: 0, to: 3, meaning: 'I_e', fallback: 1 },
    { name: 'period_s', kind: 'number', unit: 's', above: 0, to: 100, meaning: 'period' },
  ],
  expression:
    'max(min(sds_g, sd1_g / period_s * min(1, tl_s / period_s)) * importance_factor / reduction_r, share * sds_g * importance_factor, least, 0.5 * near_fault_s1_g * importance_factor / reduction_r)',
  // a floor that is not evaluated, or does not apply, is not shown as if it were
  shownAt: ({ near_fault_s1_g }) => ({
    expression: `max(min(sds_g, sd1_g / period_s * min(1, tl_s / period_s)) * importance_factor / reduction_r, share * sds_g * importance_factor, least${near_fault_s1_g > 0 ? ', 0.5 * near_fault_s1_g * importance_factor / reduction_r' : ''})`,
    clause: near_fault_s1_g > 0 ? 'with the floor near faults' : 'without the floor near faults',
  }),
  evaluate: ({ sds_g, sd1_g, tl_s, near_fault_s1_g, reduction_r, importance_factor, period_s }, { share, least }) =>
    Math.max(
      (Math.min(sds_g, (sd1_g / period_s) * Math.min(1, tl_s / period_s)) * importance_factor) / reduction_r,
      share * sds_g * importance_factor,
      least,
      (0.5 * near_fault_s1_g * importance_factor) / reduction_r,
    ),
};
export const BASE_SHEAR_ASCE7 = record({
  id: 'asce7-16/base-shear/equivalent-lateral-force',
  title: 'Design base shear over weight, equivalent lateral force',
  family: asce,
  constants: { share: 0.044, least: 0.01 },
  source: { standard: 'ASCE/SEI 7', edition: '16', clause: '12.8.1.1' },
  verified: 'restated',
  limits: [],
  note: 'No mass share: the whole weight, once.',
});

interface EnInput {
  readonly design_sa_g: number;
  readonly period_s: number;
  readonly corner_period_s: number;
  readonly storeys: number;
}
const en: Family<EnInput, { readonly lambda: number }> = {
  id: 'demand/base-shear-en1998',
  yields: 'base_shear_coefficient',
  unit: null,
  symbol: 'F_b/W',
  inputs: [
    { name: 'design_sa_g', kind: 'number', unit: 'g', meaning: 'S_d(T) of the design spectrum, with q' },
    { name: 'period_s', kind: 'number', unit: 's', above: 0, to: 100, meaning: 'period' },
    { name: 'corner_period_s', kind: 'number', unit: 's', above: 0, to: 100, meaning: 'T_C' },
    { name: 'storeys', kind: 'number', from: 1, to: 200, meaning: 'storeys' },
  ],
  expression: null,
  procedure: 'F_b/W = S_d(T) λ; λ = 0.85 where T ≤ 2 T_C and there are more than two storeys, else 1',
  shownAt: (input, { lambda }) => ({
    expression: hasLambda(input) ? 'design_sa_g * lambda' : 'design_sa_g',
    clause: hasLambda(input) ? `λ = ${String(lambda)}` : 'λ = 1',
  }),
  evaluate: (input, { lambda }) => input.design_sa_g * (hasLambda(input) ? lambda : 1),
};
function hasLambda({ period_s, corner_period_s, storeys }: EnInput): boolean {
  return storeys > 2 && period_s <= 2 * corner_period_s;
}
export const BASE_SHEAR_EN1998 = record({
  id: 'en1998-1-2004/base-shear/lateral-force',
  title: 'Base shear over weight, lateral force method',
  family: en,
  constants: { lambda: 0.85 },
  source: { standard: 'EN 1998-1', edition: '2004', clause: '4.3.3.2.2' },
  verified: 'memory',
  limits: [],
});

/** C_m of ASCE/SEI 41-17 Table 7-4 for three storeys and more, from memory; 1 for fewer storeys and beyond 1 s. */
export const MASS_FACTOR_TABLE: Partial<Readonly<Record<System, number>>> = {
  'concrete-moment-frame': 0.9,
  'concrete-infilled-frame': 0.9,
  'concrete-shear-wall': 0.8,
  'concrete-wall-frame': 0.8,
  'steel-moment-frame': 0.9,
  'steel-concentric-braced-frame': 0.9,
  'steel-eccentric-braced-frame': 0.9,
  'steel-buckling-restrained-braced-frame': 0.9,
};
/** C_m: the share of the mass that the first mode moves, as the code counts it. */
export function massFactorOf(system: System, storeys: number, period_s: number): number {
  return storeys < 3 || period_s > 1 ? 1 : (MASS_FACTOR_TABLE[system] ?? 1);
}

interface ElasticInput {
  readonly sa_g: number;
  readonly mass_share: number;
}
const elastic: Family<ElasticInput, Record<never, number>> = {
  id: 'demand/base-shear-elastic',
  yields: 'base_shear_coefficient',
  unit: null,
  symbol: 'V/W',
  inputs: [
    { name: 'sa_g', kind: 'number', unit: 'g', meaning: 'spectral acceleration' },
    { name: 'mass_share', kind: 'number', above: 0, to: 1, meaning: 'C_m' },
  ],
  expression: 'sa_g * mass_share',
  evaluate: ({ sa_g, mass_share }) => sa_g * mass_share,
};
export const BASE_SHEAR_ELASTIC = record({
  id: 'asce41-17/base-shear/elastic',
  title: 'Elastic base shear over weight',
  family: elastic,
  constants: {},
  source: { standard: 'ASCE/SEI 41', edition: '17', clause: 'S_a C_m; C_m of Table 7-4' },
  verified: 'memory',
  limits: [],
});

interface ImportantInput {
  readonly base_shear_coefficient: number;
  readonly importance_factor: number;
}
const important: Family<ImportantInput, Record<never, number>> = {
  id: 'demand/base-shear-importance',
  yields: 'base_shear_coefficient',
  unit: null,
  symbol: 'V/W',
  inputs: [
    { name: 'base_shear_coefficient', kind: 'number', meaning: 'base shear over weight with an importance of 1' },
    { name: 'importance_factor', kind: 'number', above: 0, to: 3, meaning: 'importance factor of the building' },
  ],
  expression: 'base_shear_coefficient * importance_factor',
  evaluate: ({ base_shear_coefficient, importance_factor }) => base_shear_coefficient * importance_factor,
};
export const BASE_SHEAR_IMPORTANCE = record({
  id: 'nbc-2005/base-shear/importance',
  title: 'Base shear over weight with the importance of the building',
  family: important,
  constants: {},
  source: {
    standard: 'NBC and IS 1893',
    edition: 'from 2005 and 2002',
    clause: '4.1.8.11, 6.4.2: I multiplies force and bounds alike',
  },
  verified: 'memory',
  limits: [],
});

export const BASE_SHEAR_RECORDS: readonly AnyRecord[] = [
  BASE_SHEAR_ASCE7,
  BASE_SHEAR_EN1998,
  BASE_SHEAR_ELASTIC,
  BASE_SHEAR_IMPORTANCE,
];
