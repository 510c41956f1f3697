/** Moduli of concrete and masonry by document, in MPa. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { power } from '../numeric/power.js';
import type { Source, Verified } from '../source.js';
import { plain, quantity } from './specs.js';
import type { None } from './specs.js';

interface Concrete {
  readonly concrete_strength_MPa: number;
}
const STRENGTH = quantity('concrete_strength', 'MPa', 'compressive strength, cylinder');

const byRoot: Family<Concrete, { readonly coefficient: number; readonly offset_MPa: number }> = {
  id: 'stiffness/modulus-by-root',
  yields: 'modulus_MPa',
  unit: 'MPa',
  symbol: 'E',
  inputs: [STRENGTH],
  expression: 'coefficient * sqrt(concrete_strength_MPa) + offset_MPa',
  evaluate: ({ concrete_strength_MPa }, { coefficient, offset_MPa }) =>
    coefficient * Math.sqrt(concrete_strength_MPa) + offset_MPa,
};

const byRootOfCube: typeof byRoot = {
  ...byRoot,
  id: 'stiffness/modulus-by-root-of-cube',
  inputs: [{ ...STRENGTH, meaning: 'characteristic compressive strength, cube' }],
};

const byRootInPsi: Family<Concrete, { readonly coefficient: number; readonly psi_MPa: number }> = {
  ...(byRoot as Omit<typeof byRoot, 'shownAt'>),
  id: 'stiffness/modulus-by-root-psi',
  expression: 'coefficient * sqrt(concrete_strength_MPa / psi_MPa) * psi_MPa',
  evaluate: ({ concrete_strength_MPa }, { coefficient, psi_MPa }) =>
    coefficient * Math.sqrt(concrete_strength_MPa / psi_MPa) * psi_MPa,
};

const byDensity: Family<Concrete & { readonly density_kg_per_m3: number }, { readonly coefficient: number }> = {
  ...byRoot,
  id: 'stiffness/modulus-by-density',
  inputs: [STRENGTH, plain('density_kg_per_m3', 'density of the concrete, kg/m³')],
  expression: 'coefficient * density_kg_per_m3 ^ 1.5 * sqrt(concrete_strength_MPa)',
  evaluate: ({ concrete_strength_MPa, density_kg_per_m3 }, { coefficient }) =>
    coefficient * density_kg_per_m3 * Math.sqrt(density_kg_per_m3) * Math.sqrt(concrete_strength_MPa),
};

const en1992: Family<Concrete & { readonly aggregate_factor: number }, None> = {
  ...byRoot,
  id: 'stiffness/modulus-en1992',
  inputs: [
    { ...STRENGTH, meaning: 'characteristic compressive strength f_ck, cylinder' },
    {
      name: 'aggregate_factor',
      kind: 'number',
      meaning: 'quartzite 1, limestone 0.9, sandstone 0.7, basalt 1.2',
      fallback: 1,
    },
  ],
  expression: 'aggregate_factor * 22000 * ((concrete_strength_MPa + 8) / 10) ^ 0.3',
  evaluate: ({ concrete_strength_MPa, aggregate_factor }) =>
    aggregate_factor * 22000 * power((concrete_strength_MPa + 8) / 10, 0.3),
};

const aij: Family<Concrete & { readonly unit_weight_kN_per_m3: number }, None> = {
  ...byRoot,
  id: 'stiffness/modulus-aij',
  inputs: [
    { ...STRENGTH, meaning: 'design strength F_c' },
    { name: 'unit_weight_kN_per_m3', kind: 'number', meaning: 'unit weight of the concrete, kN/m³', fallback: 24 },
  ],
  expression: '33500 * (unit_weight_kN_per_m3 / 24) ^ 2 * (concrete_strength_MPa / 60) ^ (1 / 3)',
  evaluate: ({ concrete_strength_MPa, unit_weight_kN_per_m3 }) => {
    const ratio = unit_weight_kN_per_m3 / 24;
    return 33500 * ratio * ratio * power(concrete_strength_MPa / 60, 1 / 3);
  },
};

const ofMasonry: Family<{ readonly masonry_strength_MPa: number }, { readonly coefficient: number }> = {
  id: 'stiffness/modulus-of-masonry',
  yields: 'modulus_MPa',
  unit: 'MPa',
  symbol: 'E',
  inputs: [quantity('masonry_strength', 'MPa', 'compressive strength of the masonry')],
  expression: 'coefficient * masonry_strength_MPa',
  evaluate: ({ masonry_strength_MPa }, { coefficient }) => coefficient * masonry_strength_MPa,
};

/** FEMA 356 lower-bound strengths of unreinforced masonry by condition, psi. */
const LOWER_BOUND_PSI: Readonly<Record<string, number>> = { good: 900, fair: 600, poor: 300 };
const masonryStrength: Family<
  { readonly masonry_condition: string },
  { readonly expected_over_lower: number; readonly psi_MPa: number }
> = {
  id: 'stiffness/masonry-strength',
  yields: 'masonry_strength_MPa',
  unit: 'MPa',
  symbol: 'f_m',
  inputs: [
    {
      name: 'masonry_condition',
      kind: 'word',
      words: Object.keys(LOWER_BOUND_PSI),
      meaning: 'condition of the masonry',
    },
  ],
  expression: null,
  procedure: 'expected strength = 1.3 × 900, 600, 300 psi for good, fair, poor',
  evaluate: ({ masonry_condition }, { expected_over_lower, psi_MPa }) =>
    expected_over_lower * (LOWER_BOUND_PSI[masonry_condition] ?? NaN) * psi_MPa,
};

const shearModulus: Family<{ readonly modulus_MPa: number }, { readonly coefficient: number }> = {
  id: 'stiffness/shear-modulus',
  yields: 'shear_modulus_MPa',
  unit: 'MPa',
  symbol: 'G',
  inputs: [quantity('modulus', 'MPa', 'modulus of elasticity')],
  expression: 'coefficient * modulus_MPa',
  evaluate: ({ modulus_MPa }, { coefficient }) => coefficient * modulus_MPa,
};

const PSI_MPA = 0.006894757293168361;
const root = (
  id: string,
  title: string,
  coefficient: number,
  offset_MPa: number,
  source: Source,
  verified: Verified,
): AnyRecord =>
  record({ id, title, family: byRoot, constants: { coefficient, offset_MPa }, source, verified, limits: [] });
const masonry = (id: string, title: string, coefficient: number, source: Source, verified: Verified): AnyRecord =>
  record({ id, title, family: ofMasonry, constants: { coefficient }, source, verified, limits: [] });

const ACI: Source = { standard: 'ACI', edition: '318-19', clause: '19.2.2.1' };

export const ACI_CONCRETE = record({
  id: 'aci318-19/modulus/concrete',
  title: 'Modulus of normal-weight concrete',
  family: byRoot,
  constants: { coefficient: 4700, offset_MPa: 0 },
  source: ACI,
  verified: 'memory',
  limits: [],
});
export const FEMA_MASONRY = record({
  id: 'fema356/modulus/masonry',
  title: 'Modulus of existing masonry',
  family: ofMasonry,
  constants: { coefficient: 550 },
  source: { standard: 'FEMA', edition: '356', clause: '7.3.2.2' },
  verified: 'restated',
  limits: [],
});
export const FEMA_MASONRY_STRENGTH = record({
  id: 'fema356/strength/unreinforced-masonry',
  title: 'Expected strength of masonry without tests',
  family: masonryStrength,
  constants: { expected_over_lower: 1.3, psi_MPa: PSI_MPA },
  source: { standard: 'FEMA', edition: '356', clause: 'chapter 7, default lower-bound strengths' },
  verified: 'restated',
  limits: [],
});
export const SHEAR_MODULUS = record({
  id: 'mechanics/modulus/shear',
  title: 'Shear modulus of concrete or masonry',
  family: shearModulus,
  constants: { coefficient: 0.4 },
  source: { standard: 'FEMA', edition: '356', clause: 'G = 0.4 E' },
  verified: 'restated',
  limits: [],
});

export const MATERIAL_RECORDS: readonly AnyRecord[] = [
  ACI_CONCRETE,
  record({
    id: 'aci318-19/modulus/concrete-psi',
    title: 'Modulus of normal-weight concrete, as printed in psi',
    family: byRootInPsi,
    constants: { coefficient: 57000, psi_MPa: PSI_MPA },
    source: ACI,
    verified: 'restated',
    limits: [],
  }),
  record({
    id: 'aci318-19/modulus/concrete-by-density',
    title: 'Modulus of concrete by its density',
    family: byDensity,
    constants: { coefficient: 0.043 },
    source: ACI,
    verified: 'restated',
    limits: [
      {
        input: 'density_kg_per_m3',
        from: 1440,
        to: 2560,
        whose: 'publication',
        outside: 'flag',
        text: '1440 to 2560 kg/m³ (from memory)',
      },
    ],
  }),
  record({
    id: 'en1992-1-1-2004/modulus/concrete',
    title: 'Mean secant modulus of concrete',
    family: en1992,
    constants: {},
    source: { standard: 'EN 1992-1-1', edition: '2004', clause: '3.1.3, table 3.1' },
    verified: 'restated',
    limits: [],
  }),
  record({
    id: 'is456-2000/modulus/concrete',
    title: 'Modulus of concrete, from cube strength',
    family: byRootOfCube,
    constants: { coefficient: 5000, offset_MPa: 0 },
    source: { standard: 'IS 456', edition: '2000', clause: '6.2.3.1' },
    verified: 'memory',
    limits: [],
  }),
  root(
    'ts500-2000/modulus/concrete',
    'Modulus of concrete',
    3250,
    14000,
    { standard: 'TS 500', edition: '2000', clause: '3.3.3' },
    'memory',
  ),
  root(
    'nzs3101-2006/modulus/concrete',
    'Modulus of concrete',
    3320,
    6900,
    { standard: 'NZS 3101', edition: '2006', clause: '5.2.3' },
    'memory',
  ),
  record({
    id: 'aij-1999/modulus/concrete',
    title: 'Modulus of concrete',
    family: aij,
    constants: {},
    source: { standard: 'AIJ reinforced concrete standard', edition: '1999', clause: 'modulus of concrete' },
    verified: 'memory',
    limits: [],
  }),
  FEMA_MASONRY,
  masonry(
    'tms402-2016/modulus/clay-masonry',
    'Modulus of new clay masonry',
    700,
    { standard: 'TMS 402', edition: '2016', clause: '4.2.2' },
    'restated',
  ),
  masonry(
    'tms402-2016/modulus/concrete-masonry',
    'Modulus of new concrete masonry',
    900,
    { standard: 'TMS 402', edition: '2016', clause: '4.2.2' },
    'restated',
  ),
  masonry(
    'is1893-2016/modulus/infill-masonry',
    'Modulus of infill masonry',
    550,
    { standard: 'IS 1893', edition: '2016', clause: '7.9.2.1' },
    'restated',
  ),
  masonry(
    'en1996-1-1-2005/modulus/masonry',
    'Modulus of masonry, short term',
    1000,
    { standard: 'EN 1996-1-1', edition: '2005', clause: '3.7.2' },
    'memory',
  ),
  masonry(
    'nzsee-2017/modulus/unreinforced-masonry',
    'Modulus of existing unreinforced masonry',
    300,
    { standard: 'New Zealand assessment guidelines', edition: '2017', clause: 'C8' },
    'memory',
  ),
  FEMA_MASONRY_STRENGTH,
  SHEAR_MODULUS,
];
