/** What is left of a gross stiffness once concrete has cracked, by document. The documents disagree: cite the edition. */
import { record } from '../formula.js';
import type { AnyRecord, Family } from '../formula.js';
import type { Source, Verified } from '../source.js';
import { MODULUS, plain } from './specs.js';
import type { None } from './specs.js';

const constant: Family<None, { readonly factor: number }> = {
  id: 'stiffness/cracking-constant',
  yields: 'cracking_factor',
  unit: null,
  symbol: 'c',
  inputs: [],
  expression: 'factor',
  evaluate: (_, { factor }) => factor,
};

const byAxialForce: Family<
  { readonly axial_force_ratio: number },
  { readonly from_ratio: number; readonly to_ratio: number; readonly least: number; readonly most: number }
> = {
  id: 'stiffness/cracking-by-axial-force',
  yields: 'cracking_factor',
  unit: null,
  symbol: 'c',
  inputs: [plain('axial_force_ratio', 'N/(A_g f_c), compression; 0 in tension')],
  expression:
    'min(most, max(least, least + (most - least) * (axial_force_ratio - from_ratio) / (to_ratio - from_ratio)))',
  evaluate: ({ axial_force_ratio }, { from_ratio, to_ratio, least, most }) =>
    Math.min(
      most,
      Math.max(least, least + ((most - least) * (axial_force_ratio - from_ratio)) / (to_ratio - from_ratio)),
    ),
};

const cracked: Family<{ readonly modulus_MPa: number; readonly cracking_factor: number }, None> = {
  id: 'stiffness/cracked-modulus',
  yields: 'modulus_MPa',
  unit: 'MPa',
  symbol: 'E_eff',
  inputs: [MODULUS, plain('cracking_factor', 'share of the gross stiffness that is left')],
  expression: 'modulus_MPa * cracking_factor',
  evaluate: ({ modulus_MPa, cracking_factor }) => modulus_MPa * cracking_factor,
};

const rows: readonly (readonly [id: string, title: string, factor: number, source: Source, verified: Verified])[] = [
  [
    'en1998-1-2004/cracking/all',
    'Cracked stiffness, all members, bending and shear',
    0.5,
    { standard: 'EN 1998-1', edition: '2004', clause: '4.3.1(7)' },
    'restated',
  ],
  ['fema356/cracking/beam', 'Cracked stiffness, beam', 0.5, fema(), 'memory'],
  ['fema356/cracking/wall-uncracked', 'Stiffness of a wall before cracking', 0.8, fema(), 'memory'],
  ['fema356/cracking/wall-cracked', 'Cracked stiffness, wall', 0.5, fema(), 'memory'],
  ['asce41-23/cracking/beam', 'Cracked stiffness, beam not prestressed', 0.3, aci369(), 'restated'],
  ['asce41-23/cracking/wall-cracked', 'Cracked stiffness, wall', 0.25, aci369(), 'restated'],
  [
    'asce41-17/cracking/wall-cracked',
    'Cracked stiffness, wall',
    0.35,
    { standard: 'ASCE/SEI 41', edition: '17', clause: 'table 10-5; another page says 0.5' },
    'memory',
  ],
  ['aci318-19/cracking/beam', 'Cracked stiffness, beam', 0.35, aci318(), 'restated'],
  ['aci318-19/cracking/column', 'Cracked stiffness, column', 0.7, aci318(), 'restated'],
  ['aci318-19/cracking/wall-uncracked', 'Stiffness of a wall before cracking', 0.7, aci318(), 'restated'],
  ['aci318-19/cracking/wall-cracked', 'Cracked stiffness, wall', 0.35, aci318(), 'restated'],
  ['aci318-19/cracking/slab', 'Cracked stiffness, flat slab', 0.25, aci318(), 'restated'],
  ['nzs3101-2006/cracking/beam-300', 'Cracked stiffness, rectangular beam, fy 300', 0.4, nzs(), 'memory'],
  ['nzs3101-2006/cracking/beam-500', 'Cracked stiffness, rectangular beam, fy 500', 0.32, nzs(), 'memory'],
  ['tbdy-2018/cracking/beam', 'Cracked stiffness, beam', 0.35, tbdy(), 'memory'],
  ['tbdy-2018/cracking/column', 'Cracked stiffness, column', 0.7, tbdy(), 'memory'],
  ['tbdy-2018/cracking/wall', 'Cracked stiffness, wall in its plane', 0.5, tbdy(), 'memory'],
  ['tbdy-2018/cracking/coupling-beam', 'Cracked stiffness, coupling beam', 0.15, tbdy(), 'memory'],
  [
    'csa-a23-3/cracking/beam',
    'Cracked stiffness, beam',
    0.4,
    { standard: 'CSA A23.3', edition: '', clause: '21.2.5.2' },
    'memory',
  ],
];

function fema(): Source {
  return { standard: 'FEMA', edition: '356', clause: 'table 6-5' };
}
function aci369(): Source {
  return { standard: 'ASCE/SEI 41', edition: '23', clause: 'ACI 369.1 table 3.1.2.1' };
}
function aci318(): Source {
  return { standard: 'ACI', edition: '318-19', clause: 'table 6.6.3.1.1(a)' };
}
function nzs(): Source {
  return { standard: 'NZS 3101', edition: '2006', clause: 'table C6.6, ultimate limit state' };
}
function tbdy(): Source {
  return { standard: 'TBDY', edition: '2018', clause: 'table 4.2' };
}

const byForce = (
  id: string,
  title: string,
  from_ratio: number,
  to_ratio: number,
  least: number,
  most: number,
  source: Source,
  verified: Verified,
): AnyRecord =>
  record({
    id,
    title,
    family: byAxialForce,
    constants: { from_ratio, to_ratio, least, most },
    source,
    verified,
    limits: [],
  });

export const CRACKED_MODULUS = record({
  id: 'mechanics/modulus/cracked',
  title: 'Modulus of a cracked member',
  family: cracked,
  constants: {},
  source: { standard: 'EN 1998-1', edition: '2004', clause: '4.3.1(6) and (7): bending and shear alike' },
  verified: 'restated',
  limits: [],
});

export const CRACKING_RECORDS: readonly AnyRecord[] = [
  CRACKED_MODULUS,
  ...rows.map(([id, title, factor, source, verified]) =>
    record({ id, title, family: constant, constants: { factor }, source, verified, limits: [] }),
  ),
  byForce('fema356/cracking/column', 'Cracked stiffness, column', 0.3, 0.5, 0.5, 0.7, fema(), 'memory'),
  byForce('asce41-23/cracking/column', 'Cracked stiffness, column', 0.1, 0.5, 0.3, 0.7, aci369(), 'restated'),
  byForce(
    'asce41-23/cracking/wall-uncracked',
    'Stiffness of a wall before cracking',
    0.05,
    0.3,
    0.5,
    1,
    aci369(),
    'restated',
  ),
  // 0.5 + 0.6 N/(A f_c), at most 1: the line from 0.5 at no force to 1 at a ratio of 5/6
  byForce(
    'csa-a23-3/cracking/column',
    'Cracked stiffness, column or wall',
    0,
    5 / 6,
    0.5,
    1,
    { standard: 'CSA A23.3', edition: '', clause: '21.2.5.2' },
    'memory',
  ),
];

/** Screening default and the ends of its band: half of the gross stiffness, 0.3 to 0.7 over the documents above [judgement]. */
export const CRACKING = { default: 0.5, least: 0.3, most: 0.7 } as const;
