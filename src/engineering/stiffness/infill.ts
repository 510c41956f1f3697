/** Infill panels as diagonal struts. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { power } from '../numeric/power.js';
import { STOREY_HEIGHT, mechanics, plain, quantity } from './specs.js';
import type { None } from './specs.js';

const INFILL_HEIGHT = quantity('infill_height', 'm', 'clear height of the panel');
const INFILL_LENGTH = quantity('infill_length', 'm', 'clear length of the panel');
const INFILL_THICKNESS = quantity('infill_thickness', 'm', 'thickness of the panel');
const INFILL_MODULUS = quantity('infill_modulus', 'MPa', 'modulus of the masonry');
const FRAME_MODULUS = quantity('frame_modulus', 'MPa', 'modulus of the frame');
const COLUMN_SECOND_MOMENT = quantity('column_second_moment', 'm4', 'second moment of area of the column');

interface Panel {
  readonly infill_modulus_MPa: number;
  readonly infill_thickness_m: number;
  readonly infill_height_m: number;
  readonly infill_length_m: number;
  readonly frame_modulus_MPa: number;
}
/** sin 2θ of a panel: 2 l h/(l² + h²). */
const SIN_2_THETA = '2 * infill_length_m * infill_height_m / (infill_length_m ^ 2 + infill_height_m ^ 2)';
function sinTwoTheta({
  infill_length_m: l,
  infill_height_m: h,
}: Pick<Panel, 'infill_length_m' | 'infill_height_m'>): number {
  return (2 * l * h) / (l * l + h * h);
}

const strutParameter: Family<Panel & { readonly column_second_moment_m4: number }, None> = {
  id: 'stiffness/strut-parameter',
  yields: 'strut_parameter_per_m',
  unit: null,
  symbol: 'λ₁',
  inputs: [INFILL_MODULUS, INFILL_THICKNESS, INFILL_HEIGHT, INFILL_LENGTH, FRAME_MODULUS, COLUMN_SECOND_MOMENT],
  expression: `(infill_modulus_MPa * infill_thickness_m * ${SIN_2_THETA} / (4 * frame_modulus_MPa * column_second_moment_m4 * infill_height_m)) ^ 0.25`,
  evaluate: (input) =>
    Math.sqrt(
      Math.sqrt(
        (input.infill_modulus_MPa * input.infill_thickness_m * sinTwoTheta(input)) /
          (4 * input.frame_modulus_MPa * input.column_second_moment_m4 * input.infill_height_m),
      ),
    ),
};

interface Diagonal {
  readonly infill_height_m: number;
  readonly infill_length_m: number;
}
const strutWidth: Family<
  Diagonal & { readonly strut_parameter_per_m: number; readonly storey_height_m: number },
  { readonly coefficient: number; readonly exponent: number }
> = {
  id: 'stiffness/strut-width',
  yields: 'strut_width_m',
  unit: 'm',
  symbol: 'a',
  inputs: [
    plain('strut_parameter_per_m', 'λ₁, stiffness of panel over frame, 1/m'),
    STOREY_HEIGHT,
    INFILL_HEIGHT,
    INFILL_LENGTH,
  ],
  expression:
    'coefficient * (strut_parameter_per_m * storey_height_m) ^ exponent * sqrt(infill_height_m ^ 2 + infill_length_m ^ 2)',
  evaluate: (
    { strut_parameter_per_m, storey_height_m, infill_height_m: h, infill_length_m: l },
    { coefficient, exponent },
  ) => coefficient * power(strut_parameter_per_m * storey_height_m, exponent) * Math.sqrt(h * h + l * l),
};

const shareOfDiagonal: Family<Diagonal, { readonly share: number }> = {
  id: 'stiffness/strut-share',
  yields: 'strut_width_m',
  unit: 'm',
  symbol: 'a',
  inputs: [INFILL_HEIGHT, INFILL_LENGTH],
  expression: 'share * sqrt(infill_height_m ^ 2 + infill_length_m ^ 2)',
  evaluate: ({ infill_height_m: h, infill_length_m: l }, { share }) => share * Math.sqrt(h * h + l * l),
};

const strut: Family<
  Diagonal & {
    readonly infill_modulus_MPa: number;
    readonly infill_thickness_m: number;
    readonly strut_width_m: number;
  },
  None
> = {
  id: 'stiffness/infill-strut',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [
    INFILL_MODULUS,
    INFILL_THICKNESS,
    quantity('strut_width', 'm', 'width of the strut'),
    INFILL_HEIGHT,
    INFILL_LENGTH,
  ],
  expression:
    '1000 * infill_modulus_MPa * infill_thickness_m * strut_width_m * infill_length_m ^ 2 / (infill_length_m ^ 2 + infill_height_m ^ 2) ^ 1.5',
  evaluate: ({ infill_modulus_MPa, infill_thickness_m, strut_width_m, infill_height_m: h, infill_length_m: l }) => {
    const square = l * l + h * h;
    return (1000 * infill_modulus_MPa * infill_thickness_m * strut_width_m * l * l) / (square * Math.sqrt(square));
  },
};

type ColumnContact = Panel & { readonly column_second_moment_m4: number };
const contactColumn: Family<ColumnContact, None> = {
  id: 'stiffness/contact-column',
  yields: 'contact_length_m',
  unit: 'm',
  symbol: 'α_h',
  inputs: strutParameter.inputs,
  expression: `pi / 2 * (frame_modulus_MPa * column_second_moment_m4 * infill_height_m / (2 * infill_modulus_MPa * infill_thickness_m * ${SIN_2_THETA})) ^ 0.25`,
  evaluate: (input) =>
    (Math.PI / 2) *
    Math.sqrt(
      Math.sqrt(
        (input.frame_modulus_MPa * input.column_second_moment_m4 * input.infill_height_m) /
          (2 * input.infill_modulus_MPa * input.infill_thickness_m * sinTwoTheta(input)),
      ),
    ),
};
const contactBeam: Family<Panel & { readonly beam_second_moment_m4: number }, None> = {
  id: 'stiffness/contact-beam',
  yields: 'contact_length_m',
  unit: 'm',
  symbol: 'α_L',
  inputs: [
    INFILL_MODULUS,
    INFILL_THICKNESS,
    INFILL_HEIGHT,
    INFILL_LENGTH,
    FRAME_MODULUS,
    quantity('beam_second_moment', 'm4', 'second moment of area of the beam'),
  ],
  expression: `pi * (frame_modulus_MPa * beam_second_moment_m4 * infill_length_m / (2 * infill_modulus_MPa * infill_thickness_m * ${SIN_2_THETA})) ^ 0.25`,
  evaluate: (input) =>
    Math.PI *
    Math.sqrt(
      Math.sqrt(
        (input.frame_modulus_MPa * input.beam_second_moment_m4 * input.infill_length_m) /
          (2 * input.infill_modulus_MPa * input.infill_thickness_m * sinTwoTheta(input)),
      ),
    ),
};
const contactWidth: Family<{ readonly column_contact_length_m: number; readonly beam_contact_length_m: number }, None> =
  {
    id: 'stiffness/contact-width',
    yields: 'strut_width_m',
    unit: 'm',
    symbol: 'a',
    inputs: [
      quantity('column_contact_length', 'm', 'contact of panel and column'),
      quantity('beam_contact_length', 'm', 'contact of panel and beam'),
    ],
    expression: '0.5 * sqrt(column_contact_length_m ^ 2 + beam_contact_length_m ^ 2)',
    evaluate: ({ column_contact_length_m: c, beam_contact_length_m: b }) => 0.5 * Math.sqrt(c * c + b * b),
  };

const withPanels: Family<
  { readonly stiffness_kN_per_m: number; readonly panels: number; readonly panel_stiffness_kN_per_m: number },
  None
> = {
  id: 'stiffness/frame-with-panels',
  yields: 'stiffness_kN_per_m',
  unit: 'kN_per_m',
  symbol: 'k',
  inputs: [
    quantity('stiffness', 'kN_per_m', 'of the frame, one storey'),
    plain('panels', 'solid panels in the storey'),
    quantity('panel_stiffness', 'kN_per_m', 'of one panel'),
  ],
  expression: 'stiffness_kN_per_m + panels * panel_stiffness_kN_per_m',
  evaluate: ({ stiffness_kN_per_m, panels, panel_stiffness_kN_per_m }) =>
    stiffness_kN_per_m + panels * panel_stiffness_kN_per_m,
};

const FEMA = { standard: 'FEMA', edition: '356', clause: '7.5.2.1, eq. 7-14 (after Mainstone 1974)' };

export const STRUT_PARAMETER = record({
  id: 'fema356/infill/strut-parameter',
  title: 'Infill strut: stiffness of the panel against the frame',
  family: strutParameter,
  constants: {},
  source: FEMA,
  verified: 'memory',
  limits: [],
});
export const STRUT_WIDTH = record({
  id: 'fema356/infill/strut-width',
  title: 'Infill strut: width',
  family: strutWidth,
  constants: { coefficient: 0.175, exponent: -0.4 },
  source: FEMA,
  verified: 'memory',
  limits: [],
  note: 'Solid panels. Also ASCE 41-06 and IS 1893:2016 7.9.2.2; from ASCE 41-13 on a composite cantilever takes its place.',
});
export const INFILL_STRUT = record({
  id: 'mechanics/stiffness/infill-strut',
  title: 'Lateral stiffness of an infill strut',
  family: strut,
  constants: {},
  source: mechanics('(a t E/r) cos²θ, a diagonal in compression'),
  verified: 'memory',
  limits: [],
});

export const WITH_PANELS = record({
  id: 'mechanics/stiffness/frame-with-panels',
  title: 'Storey stiffness of a frame with its infill panels',
  family: withPanels,
  constants: {},
  source: mechanics('rigid floors: stiffnesses side by side add'),
  verified: 'mechanics',
  limits: [],
});

export const INFILL_RECORDS: readonly AnyRecord[] = [
  WITH_PANELS,
  STRUT_PARAMETER,
  STRUT_WIDTH,
  INFILL_STRUT,
  record({
    id: 'holmes-1961/infill/strut-width',
    title: 'Infill strut: a third of the diagonal',
    family: shareOfDiagonal,
    constants: { share: 1 / 3 },
    source: { standard: 'Holmes', edition: '1961', clause: 'w = d/3' },
    verified: 'memory',
    limits: [],
  }),
  record({
    id: 'paulay-priestley-1992/infill/strut-width',
    title: 'Infill strut: a quarter of the diagonal',
    family: shareOfDiagonal,
    constants: { share: 0.25 },
    source: { standard: 'Paulay and Priestley', edition: '1992', clause: 'w = d/4' },
    verified: 'memory',
    limits: [],
  }),
  record({
    id: 'stafford-smith-1966/infill/contact-with-column',
    title: 'Infill: contact length with the column',
    family: contactColumn,
    constants: {},
    source: { standard: 'Stafford Smith', edition: '1966', clause: 'α_h' },
    verified: 'restated',
    limits: [],
  }),
  record({
    id: 'stafford-smith-1966/infill/contact-with-beam',
    title: 'Infill: contact length with the beam',
    family: contactBeam,
    constants: {},
    source: { standard: 'Stafford Smith', edition: '1966', clause: 'α_L' },
    verified: 'restated',
    limits: [],
  }),
  record({
    id: 'hendry-1998/infill/strut-width',
    title: 'Infill strut: width from the contact lengths',
    family: contactWidth,
    constants: {},
    source: { standard: 'Hendry', edition: '1998', clause: '½ √(α_h² + α_L²)' },
    verified: 'restated',
    limits: [],
  }),
];
