/** Strength checks of the first storey. */
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

const SD61 =
  'first-level index of a three-storey concrete building, F_c 18 MPa, 900 m² of 12 kN/m², formulas from memory';
const SD62 = 'column shear of ASCE 41 tier 1: 24 columns in 8 frames, 4.0 m², V 6480 kN, formula from memory';

export const STRENGTH_CASES: readonly ReferenceCase[] = [
  {
    id: 'SD-62-limit',
    method: 'asce41/strength-check/concrete-stress',
    inputs: { concrete_strength_MPa: 20 },
    expected: 0.743,
    tolerance: half(3),
    source: SD62,
    mark: 'own arithmetic',
  },
  {
    id: 'concrete-stress-least',
    method: 'asce41/strength-check/concrete-stress',
    inputs: { concrete_strength_MPa: 0 },
    expected: 0.69,
    tolerance: half(2),
    source: 'ASCE 41 tier 1: 100 psi is 0.69 MPa',
    mark: 'memory',
  },
  {
    id: 'SD-62-shear',
    method: 'asce41/strength-check/average-shear',
    // (n_c − n_f)/n_c = 16/24 of the columns count there; V/W is 1 where W is V
    inputs: {
      modifier_ms: 2,
      average_stress_MPa: 1.215,
      area_m2: (4 * 16) / 24,
      modification_c: 1,
      weight_kN: 6480,
    },
    ...exactly(1),
    source: SD62,
    mark: 'own arithmetic',
  },
  {
    id: 'average-shear-walls',
    method: 'asce41/strength-check/average-shear',
    inputs: { modifier_ms: 3, average_stress_MPa: 0.7, area_m2: 2, modification_c: 1.2, weight_kN: 7000 },
    ...exactly(0.5),
    source: '3 × 700 × 2/(1.2 × 7000)',
    mark: 'own arithmetic',
  },
  {
    id: 'brace-stress',
    method: 'asce41/strength-check/brace-stress',
    inputs: {
      modifier_ms: 3,
      yield_MPa: 250,
      area_m2: 0.02,
      bay_length_m: 4,
      storey_height_m: 3,
      modification_c: 1.2,
      weight_kN: 10000,
    },
    ...exactly(0.5),
    source: '3 × 125,000 × 0.02 × 4/5 = 6000 kN over 1.2 × 10,000',
    mark: 'own arithmetic',
  },
  {
    id: 'SD-61-beta',
    method: 'jbdpa-2001/index/concrete-factor',
    inputs: { concrete_strength_MPa: 18 },
    ...exactly(0.9),
    source: SD61,
    mark: 'own arithmetic',
  },
  {
    id: 'concrete-factor-strong',
    method: 'jbdpa-2001/index/concrete-factor',
    inputs: { concrete_strength_MPa: 28.8 },
    ...exactly(1.2),
    source: '√(28.8/20)',
    mark: 'own arithmetic',
  },
  // C_w 0.35 is 1.2 m² of walls between columns (0.30) and 0.6 m² without (0.05)
  {
    id: 'SD-61-cw',
    method: 'jbdpa-2001/index/strength',
    inputs: { area_m2: 1.2 + 0.6 / 3, stress_MPa: 3, concrete_factor: 0.9, weight_kN: 10800 },
    expected: 0.35,
    tolerance: half(2),
    source: SD61,
    mark: 'own arithmetic',
  },
  {
    id: 'SD-61-cc',
    method: 'jbdpa-2001/index/strength',
    inputs: { area_m2: 4, stress_MPa: 1, concrete_factor: 0.9, weight_kN: 10800 },
    expected: 0.3333,
    tolerance: half(4),
    source: SD61,
    mark: 'own arithmetic',
  },
  {
    id: 'SD-61-e0',
    method: 'jbdpa-2001/index/basic',
    inputs: { storeys: 3, storey: 1, wall_index: 0.35, column_index: 1 / 3, column_share: 0.7 },
    expected: 0.5833,
    tolerance: half(4),
    source: SD61,
    mark: 'own arithmetic',
  },
  {
    id: 'basic-index-top',
    method: 'jbdpa-2001/index/basic',
    inputs: { storeys: 3, storey: 3, wall_index: 0, column_index: 0.6, column_share: 1 },
    ...exactly(0.4),
    source: '4/6 × 0.6',
    mark: 'own arithmetic',
  },
  {
    id: 'priority-index',
    method: 'hassan-sozen-1997/index/priority',
    inputs: { wall_area_m2: 2, masonry_area_m2: 10, column_area_m2: 4, floor_area_m2: 1000 },
    ...exactly(0.5),
    source: '(2 + 10/10 + 4/2)/1000 in per cent',
    mark: 'own arithmetic',
  },
  {
    id: 'mean-stress',
    method: 'shiga-1968/index/mean-stress',
    inputs: { weight_kN: 7200, wall_area_m2: 2, column_area_m2: 4 },
    ...exactly(1.2),
    source: '7200/(1000 × 6): the 12 kgf/cm² of the map in round figures',
    mark: 'own arithmetic',
  },
  {
    id: 'code-ratio',
    method: 'swaymark/capacity/code-ratio',
    inputs: { strength_today: 0.12, strength_then: 0.08, importance_factor: 1.25 },
    ...exactly(1.5),
    source: '0.12/0.08; importance cancels',
    mark: 'own arithmetic',
  },
];
