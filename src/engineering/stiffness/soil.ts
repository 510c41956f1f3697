/** A foundation on springs: static stiffness of a rigid rectangle on the ground, and how far it lengthens the period. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { power } from '../numeric/power.js';
import { plain, quantity } from './specs.js';
import type { None } from './specs.js';

const soilShear: Family<
  { readonly density_t_per_m3: number; readonly vs30_mps: number; readonly modulus_ratio: number },
  None
> = {
  id: 'stiffness/soil-shear-modulus',
  yields: 'soil_shear_modulus_kN_per_m2',
  unit: 'kN_per_m2',
  symbol: 'G',
  inputs: [
    plain('density_t_per_m3', 'density of the ground, t/m³'),
    quantity('vs30', 'mps', 'shear-wave velocity'),
    plain('modulus_ratio', 'G/G₀ at the strain of the shaking'),
  ],
  expression: 'modulus_ratio * density_t_per_m3 * vs30_mps ^ 2',
  evaluate: ({ density_t_per_m3, vs30_mps, modulus_ratio }) => modulus_ratio * density_t_per_m3 * vs30_mps * vs30_mps,
};

interface Base {
  readonly soil_shear_modulus_kN_per_m2: number;
  readonly half_width_m: number;
  readonly half_length_m: number;
  readonly poisson_ratio: number;
}
interface Terms {
  readonly coefficient: number;
  readonly exponent: number;
  readonly linear: number;
  readonly constant: number;
  /** The ν in (a - ν): 2 for sliding, 1 for vertical and rocking. */
  readonly from: number;
}
const BASE_INPUTS = [
  quantity('soil_shear_modulus', 'kN_per_m2', 'shear modulus of the ground at the strain of the shaking'),
  quantity('half_width', 'm', 'half of the short side B'),
  quantity('half_length', 'm', 'half of the long side L'),
  plain('poisson_ratio', "Poisson's ratio of the ground"),
];
const RATIO = 'half_length_m / half_width_m';
const BRACKET = `(coefficient * (${RATIO}) ^ exponent + linear * ${RATIO} + constant)`;

function bracket({ half_width_m, half_length_m }: Base, { coefficient, exponent, linear, constant }: Terms): number {
  const ratio = half_length_m / half_width_m;
  return coefficient * power(ratio, exponent) + linear * ratio + constant;
}
const sway: Family<Base, Terms> = {
  id: 'stiffness/footing-sway',
  yields: 'foundation_stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'K',
  inputs: BASE_INPUTS,
  expression: `soil_shear_modulus_kN_per_m2 * half_width_m / (from - poisson_ratio) * ${BRACKET}`,
  evaluate: (input, terms) =>
    ((input.soil_shear_modulus_kN_per_m2 * input.half_width_m) / (terms.from - input.poisson_ratio)) *
    bracket(input, terms),
};
const rocking: Family<Base, Terms> = {
  ...sway,
  id: 'stiffness/footing-rocking',
  yields: 'rocking_stiffness_kN_m',
  unit: 'kN_m',
  symbol: 'K_θ',
  expression: `soil_shear_modulus_kN_per_m2 * half_width_m ^ 3 / (from - poisson_ratio) * ${BRACKET}`,
  evaluate: (input, terms) =>
    ((input.soil_shear_modulus_kN_per_m2 * input.half_width_m * input.half_width_m * input.half_width_m) /
      (terms.from - input.poisson_ratio)) *
    bracket(input, terms),
};

const structure: Family<{ readonly weight_kN: number; readonly period_s: number }, { readonly gravity_mps2: number }> =
  {
    id: 'stiffness/effective-structure',
    yields: 'stiffness_kN_per_m',
    unit: 'kN_per_m',
    symbol: 'k',
    inputs: [
      quantity('weight', 'kN', 'effective weight: 0.7 of the whole, all of it for one storey'),
      quantity('period', 's', 'period on a fixed base'),
    ],
    expression: '4 * pi ^ 2 * weight_kN / (gravity_mps2 * period_s ^ 2)',
    evaluate: ({ weight_kN, period_s }, { gravity_mps2 }) =>
      (4 * Math.PI * Math.PI * weight_kN) / (gravity_mps2 * period_s * period_s),
  };

const lengthening: Family<
  {
    readonly stiffness_kN_per_m: number;
    readonly foundation_stiffness_kN_per_m: number;
    readonly rocking_stiffness_kN_m: number;
    readonly effective_height_m: number;
  },
  None
> = {
  id: 'stiffness/period-lengthening',
  yields: 'period_ratio',
  unit: null,
  symbol: 'T̃/T',
  inputs: [
    quantity('stiffness', 'kN_per_m', 'effective stiffness of the structure on a fixed base'),
    quantity('foundation_stiffness', 'kN_per_m', 'of the foundation, sliding'),
    quantity('rocking_stiffness', 'kN_m', 'of the foundation, per radian'),
    quantity('effective_height', 'm', '0.7 of the height, all of it for one storey'),
  ],
  expression:
    'sqrt(1 + stiffness_kN_per_m / foundation_stiffness_kN_per_m + stiffness_kN_per_m * effective_height_m ^ 2 / rocking_stiffness_kN_m)',
  evaluate: ({ stiffness_kN_per_m: k, foundation_stiffness_kN_per_m, rocking_stiffness_kN_m, effective_height_m: h }) =>
    Math.sqrt(1 + k / foundation_stiffness_kN_per_m + (k * h * h) / rocking_stiffness_kN_m),
};

const waveParameter: Family<
  { readonly height_m: number; readonly vs30_mps: number; readonly period_s: number },
  { readonly height_share: number }
> = {
  id: 'stiffness/wave-parameter',
  yields: 'wave_parameter',
  unit: null,
  symbol: 'h/(V_s T)',
  inputs: [
    quantity('height', 'm', 'height of the building'),
    quantity('vs30', 'mps', 'shear-wave velocity'),
    quantity('period', 's', 'period on a fixed base'),
  ],
  expression: 'height_share * height_m / (vs30_mps * period_s)',
  evaluate: ({ height_m, vs30_mps, period_s }, { height_share }) => (height_share * height_m) / (vs30_mps * period_s),
};

const PAIS_KAUSEL = (clause: string) => ({ standard: 'Pais and Kausel', edition: '1988', clause });
const NIST = 'table 2-2 of NIST GCR 12-917-21, rigid rectangle on the surface';

function footing(
  id: string,
  title: string,
  family: Family<Base, Terms>,
  terms: Terms,
  symbol: string,
): ReturnType<typeof record<Base, Terms>> {
  return record({
    id: `pais-kausel-1988/stiffness/${id}`,
    title,
    family,
    constants: terms,
    source: PAIS_KAUSEL(`${symbol}; ${NIST}`),
    verified: 'restated',
    limits: [],
  });
}

export const SWAY_LONG = footing(
  'sway-along',
  'Foundation sliding along its length',
  sway,
  { coefficient: 6.8, exponent: 0.65, linear: 0, constant: 2.4, from: 2 },
  'K_x',
);
export const SWAY_SHORT = footing(
  'sway-across',
  'Foundation sliding across its length',
  sway,
  { coefficient: 6.8, exponent: 0.65, linear: 0.8, constant: 1.6, from: 2 },
  'K_y',
);
export const ROCK_SHORT = footing(
  'rocking-across',
  'Foundation rocking about its long axis',
  rocking,
  { coefficient: 0, exponent: 1, linear: 3.2, constant: 0.8, from: 1 },
  'K_xx',
);
export const ROCK_LONG = footing(
  'rocking-along',
  'Foundation rocking about its short axis',
  rocking,
  { coefficient: 3.73, exponent: 2.4, linear: 0, constant: 0.27, from: 1 },
  'K_yy',
);
export const SOIL_SHEAR_MODULUS = record({
  id: 'mechanics/modulus/soil-shear',
  title: 'Shear modulus of the ground',
  family: soilShear,
  constants: {},
  source: { standard: 'soil dynamics', edition: '', clause: 'G₀ = ρ V_s²' },
  verified: 'mechanics',
  limits: [],
});
export const EFFECTIVE_STRUCTURE = record({
  id: 'asce7-05/stiffness/effective-structure',
  title: 'Effective stiffness of a structure on a fixed base',
  family: structure,
  constants: { gravity_mps2: 9.80665 },
  source: { standard: 'ASCE/SEI 7', edition: '05', clause: 'eq. 19.2-2' },
  verified: 'memory',
  limits: [],
});
export const PERIOD_LENGTHENING = record({
  id: 'veletsos-meek-1974/ratio/period-lengthening',
  title: 'Period on flexible ground over that on a fixed base',
  family: lengthening,
  constants: {},
  source: { standard: 'Veletsos and Meek', edition: '1974', clause: 'ASCE/SEI 7-05 eq. 19.2-3' },
  verified: 'memory',
  limits: [],
});
export const WAVE_PARAMETER = record({
  id: 'nist-gcr-12-917-21/ratio/wave-parameter',
  title: 'Is the flexibility of the ground worth counting',
  family: waveParameter,
  constants: { height_share: 2 / 3 },
  source: { standard: 'NIST GCR', edition: '12-917-21', clause: 'effects matter above 0.1' },
  verified: 'restated',
  limits: [],
});

export const SOIL_RECORDS: readonly AnyRecord[] = [
  SOIL_SHEAR_MODULUS,
  SWAY_LONG,
  SWAY_SHORT,
  footing(
    'vertical',
    'Foundation settling',
    sway,
    { coefficient: 3.1, exponent: 0.75, linear: 0, constant: 1.6, from: 1 },
    'K_z',
  ),
  ROCK_SHORT,
  ROCK_LONG,
  EFFECTIVE_STRUCTURE,
  PERIOD_LENGTHENING,
  WAVE_PARAMETER,
];
