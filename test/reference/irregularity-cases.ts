/** Limits of irregularities. */
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

const storeys = (
  id: string,
  method: string,
  list: readonly number[],
  expected: number,
  source: string,
): ReferenceCase => ({
  id,
  method: `${method}/irregularity/${id.includes('extreme') ? 'extreme-soft-storey' : 'soft-storey'}`,
  inputs: { storey_stiffness_kN_per_m: list },
  ...exactly(expected),
  source,
  mark: 'own arithmetic',
});

const NO = {
  reentrant_factor: 0.9,
  reentrant_chance: 0,
  setback_factor: 0.9,
  setback_chance: 0,
  mass_factor: 0.9,
  mass_chance: 0,
};

export const IRREGULARITY_CASES: readonly ReferenceCase[] = [
  storeys('soft-asce7-16', 'asce7-16', [56, 100, 100, 100], 0.7, '56/(0.8 × 100), less than 56/(0.7 × 100)'),
  storeys(
    'soft-extreme-69',
    'asce7-16',
    [69, 100, 100, 100],
    0.69 / 0.7,
    'data sheet, section 15 row 7: 69/100/100/100 is extreme by the mean of three although over 60 % of the next',
  ),
  storeys('soft-asce7-22', 'asce7-22', [70, 100], 1, 'exactly 70 % of the storey above'),
  storeys(
    'soft-is1893-2002',
    'is1893-2002',
    [100, 100, 70, 100],
    1,
    'exactly 70 % of the storey above, three above the first',
  ),
  storeys('soft-is1893-2016', 'is1893-2016', [100, 80, 100], 0.8, 'any storey less stiff than the next: 80/100'),
  storeys('soft-nzs1170', 'nzs1170-5-2004', [35, 100], 0.5, 'half of 70 % of the storey above'),
  {
    id: 'first-storey-columns',
    method: 'mechanics/irregularity/first-storey-columns',
    inputs: { usual_storey_height_m: 3, first_storey_height_m: 4.5 },
    expected: 0.3,
    tolerance: half(2),
    source: 'data sheet, section 12: 4.5/3.0 m frame gives 0.30 of bare columns',
    mark: 'restated',
  },
  {
    id: 'first-storey-walls',
    method: 'mechanics/irregularity/first-storey-walls',
    inputs: { usual_storey_height_m: 3, first_storey_height_m: 4.5 },
    ...exactly(2 / 3),
    source: '3 m over 4.5 m',
    mark: 'own arithmetic',
  },
  {
    id: 'irregular-known',
    method: 'swaymark/irregularity/factor',
    inputs: { ...NO, storey_factor: 0.7, torsion_factor: 0.8, torsion_chance: 1, setback_chance: 1 },
    ...exactly(0.504),
    source: '0.7 × 0.8 × 0.9',
    mark: 'own arithmetic',
  },
  {
    id: 'irregular-half',
    method: 'swaymark/irregularity/factor',
    inputs: { ...NO, storey_factor: 1, torsion_factor: 0.81, torsion_chance: 0.5 },
    ...exactly(0.9),
    source: 'the root of 0.81',
    mark: 'own arithmetic',
  },
  {
    id: 'irregular-spread',
    method: 'swaymark/irregularity/spread',
    inputs: { ...NO, torsion_factor: 0.8, torsion_chance: 0.5 },
    expected: 0.111572,
    tolerance: half(6),
    source: '√(0.5 × 0.5) × ln 1.25 = 0.223144/2',
    mark: 'own arithmetic',
  },
];
