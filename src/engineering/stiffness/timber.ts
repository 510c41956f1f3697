/** Deflection of a timber panel wall. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import { quantity } from './specs.js';
import type { None } from './specs.js';

const panelWall: Family<
  {
    readonly shear_flow_kN_per_m: number;
    readonly wall_height_m: number;
    readonly wall_length_m: number;
    readonly modulus_MPa: number;
    readonly chord_area_m2: number;
    readonly apparent_stiffness_kN_per_m: number;
    readonly anchorage_slip_m: number;
  },
  None
> = {
  id: 'stiffness/panel-wall',
  yields: 'displacement_m',
  unit: 'm',
  symbol: 'δ',
  inputs: [
    quantity('shear_flow', 'kN_per_m', 'shear force over wall length'),
    quantity('wall_height', 'm', 'height of the wall'),
    quantity('wall_length', 'm', 'length of the wall'),
    quantity('modulus', 'MPa', 'modulus of the end posts'),
    quantity('chord_area', 'm2', 'area of an end post'),
    quantity('apparent_stiffness', 'kN_per_m', 'apparent shear stiffness G_a, nails and panel together'),
    quantity('anchorage_slip', 'm', 'uplift of the tie-down'),
  ],
  expression:
    '2 * shear_flow_kN_per_m * wall_height_m ^ 3 / (3 * 1000 * modulus_MPa * chord_area_m2 * wall_length_m) + shear_flow_kN_per_m * wall_height_m / apparent_stiffness_kN_per_m + wall_height_m * anchorage_slip_m / wall_length_m',
  evaluate: ({
    shear_flow_kN_per_m: v,
    wall_height_m: h,
    wall_length_m: b,
    modulus_MPa,
    chord_area_m2,
    apparent_stiffness_kN_per_m,
    anchorage_slip_m,
  }) =>
    (2 * v * h * h * h) / (3 * 1000 * modulus_MPa * chord_area_m2 * b) +
    (v * h) / apparent_stiffness_kN_per_m +
    (h * anchorage_slip_m) / b,
};

export const TIMBER_RECORDS: readonly AnyRecord[] = [
  record({
    id: 'sdpws-2015/drift/panel-wall',
    title: 'Deflection of a timber panel wall',
    family: panelWall,
    constants: {},
    source: { standard: 'SDPWS', edition: '2015', clause: 'eq. 4.3-1' },
    verified: 'restated',
    limits: [],
    note: 'Printed in inches and feet as 8vh³/(EAb) + vh/(1000 G_a) + hΔ/b; here in one set of units, where 8 becomes 2/3.',
  }),
];
