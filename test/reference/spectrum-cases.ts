/** Spectra and what is read off them. */
import { exactly, half } from './case.js';
import type { ReferenceCase } from './case.js';

const TWO_PERIOD = 'asce7-22/spectrum/two-period';

const US: readonly ReferenceCase[] = [
  {
    id: 'SP-13-zero',
    method: TWO_PERIOD,
    inputs: { sds_g: 1.644, sd1_g: 0.887, tl_s: 8, period_s: 0 },
    expected: 0.66,
    tolerance: half(2),
    source: 'UC Berkeley CE 120, homework 7 of 2015, ASCE 7-10, class C',
    mark: 'restated',
  },
  {
    id: 'SP-13-one',
    method: TWO_PERIOD,
    inputs: { sds_g: 1.644, sd1_g: 0.887, tl_s: 8, period_s: 1 },
    ...exactly(0.887),
    source: 'the same: S_D1 is the ordinate at 1 s',
    mark: 'restated',
  },
  {
    id: 'SP-13-plateau',
    method: TWO_PERIOD,
    inputs: { sds_g: 1.644, sd1_g: 0.887, tl_s: 8, period_s: 0.3 },
    ...exactly(1.644),
    source: 'the same: S_DS between T0 = 0.1 s and Ts',
    mark: 'restated',
  },
  {
    id: 'two-period-ramp',
    method: TWO_PERIOD,
    inputs: { sds_g: 1, sd1_g: 0.5, tl_s: 8, period_s: 0.05 },
    ...exactly(0.7),
    source: 'half of T0 = 0.1 s: 1 × (0.4 + 0.6 × 0.5)',
    mark: 'own arithmetic',
  },
  {
    id: 'two-period-long',
    method: TWO_PERIOD,
    inputs: { sds_g: 1, sd1_g: 0.5, tl_s: 8, period_s: 10 },
    ...exactly(0.04),
    source: '0.5 × 8 / 10²',
    mark: 'own arithmetic',
  },
];

/** Ordinates over a_g at these periods. */
const EN_PERIODS = [0, 0.05, 0.1, 0.2, 0.3, 0.5, 1, 1.5, 2, 3, 4] as const;
const EN_ROWS: readonly (readonly [string, '1' | '2', string, readonly number[]])[] = [
  ['SP-40', '1', 'A', [1.0, 1.5, 2.0, 2.5, 2.5, 2.0, 1.0, 0.666667, 0.5, 0.222222, 0.125]],
  ['SP-41', '1', 'B', [1.2, 1.8, 2.4, 3.0, 3.0, 3.0, 1.5, 1.0, 0.75, 0.333333, 0.1875]],
  ['SP-42', '1', 'C', [1.15, 1.58125, 2.0125, 2.875, 2.875, 2.875, 1.725, 1.15, 0.8625, 0.383333, 0.215625]],
  ['SP-43', '1', 'D', [1.35, 1.85625, 2.3625, 3.375, 3.375, 3.375, 2.7, 1.8, 1.35, 0.6, 0.3375]],
  ['SP-44', '1', 'E', [1.4, 2.1, 2.8, 3.5, 3.5, 3.5, 1.75, 1.166667, 0.875, 0.388889, 0.21875]],
  ['SP-45', '2', 'A', [1.0, 2.5, 2.5, 2.5, 2.083333, 1.25, 0.625, 0.333333, 0.1875, 0.083333, 0.046875]],
  ['SP-46', '2', 'B', [1.35, 3.375, 3.375, 3.375, 2.8125, 1.6875, 0.84375, 0.45, 0.253125, 0.1125, 0.063281]],
  ['SP-47', '2', 'C', [1.5, 2.625, 3.75, 3.75, 3.125, 1.875, 0.9375, 0.5, 0.28125, 0.125, 0.070312]],
  ['SP-48', '2', 'D', [1.8, 3.15, 4.5, 4.5, 4.5, 2.7, 1.35, 0.72, 0.405, 0.18, 0.10125]],
  ['SP-49', '2', 'E', [1.6, 4.0, 4.0, 4.0, 3.333333, 2.0, 1.0, 0.533333, 0.3, 0.133333, 0.075]],
];
const EN: readonly ReferenceCase[] = EN_ROWS.flatMap(([id, type, ground, ordinates]) =>
  EN_PERIODS.map((period_s, i): ReferenceCase => ({
    id: `${id}-${String(period_s)}s`,
    method: `en1998-1-2004/spectrum/elastic-type-${type}`,
    inputs: { ag_g: 1, ground, period_s },
    expected: ordinates[i]!,
    tolerance: half(6),
    source: `EN 1998-1 (3.2) to (3.5), recommended values of type ${type}, ground ${ground}, worked elsewhere`,
    mark: 'own arithmetic',
  })),
);

/** The six values are of NBC 2015 table C-3 for Vancouver, from memory; only the interpolation is checked. */
const TABLE = { periods_s: [0.2, 0.5, 1, 2, 5, 10], ordinates_g: [0.848, 0.751, 0.425, 0.257, 0.08, 0.029] } as const;
const read = (
  id: string,
  which: 'linear' | 'log-log',
  values: readonly (readonly [number, number])[],
): readonly ReferenceCase[] =>
  values.map(([period_s, expected]) => ({
    id: `${id}-${String(period_s)}s`,
    method: `table/spectrum/${which}`,
    inputs: { ...TABLE, period_s },
    expected,
    tolerance: half(6),
    source: `${which} interpolation between six ordinates, worked elsewhere`,
    mark: 'own arithmetic',
  }));

const SPECTRAL_DISPLACEMENT: readonly ReferenceCase[] = [
  {
    id: 'SD-47',
    method: 'mechanics/demand/spectral-displacement',
    inputs: { sa_g: 0.8, period_s: 0.7 },
    expected: 0.0974,
    tolerance: half(4),
    source: 'S_d = S_a g T²/4π² with g = 9.81 m/s²',
    mark: 'own arithmetic',
  },
  {
    id: 'SP-24-1s',
    method: 'mechanics/demand/spectral-displacement',
    inputs: { sa_g: 0.129375, period_s: 1 },
    expected: 0.03,
    tolerance: 0.006,
    source: 'E.030 sheet, column of spectral displacements',
    mark: 'restated',
    note: 'printed to two decimals, unevenly rounded',
  },
];

export const SPECTRUM_CASES: readonly ReferenceCase[] = [
  ...US,
  ...EN,
  ...read('SP-57', 'linear', [
    [0.1, 0.848],
    [0.3, 0.815667],
    [0.75, 0.588],
    [1.5, 0.341],
    [3, 0.198],
    [7, 0.0596],
    [12, 0.029],
  ]),
  ...read('SP-58', 'log-log', [
    [0.1, 0.848],
    [0.3, 0.80362],
    [0.75, 0.538279],
    [1.5, 0.316665],
    [3, 0.153339],
    [7, 0.048884],
    [12, 0.029],
  ]),
  ...SPECTRAL_DISPLACEMENT,
];
