/** NBC of Canada 2015: site factors F(T), tables 4.1.8.4, by site class and reference peak ground acceleration. */
import { record } from '../formula.js';
import type { MethodRecord } from '../formula.js';
import { factorFamily } from './factor-table.js';
import type { FactorInput, FactorTable } from './factor-table.js';

/** Periods of the factors, s. */
export const NBC_PERIODS_S: readonly number[] = [0.2, 0.5, 1, 2, 5, 10];

const PGA_COLUMNS = [0.1, 0.2, 0.3, 0.4, 0.5];
const same = (value: number): readonly number[] => Array<number>(5).fill(value);

/** A, B, D, E by period; C is 1. All from memory. D and E at 10 s: not in our sheet, the factors at 5 s are held [judgement]. */
const ROWS: readonly (readonly [number, number, readonly number[], readonly number[]])[] = [
  [0.69, 0.77, [1.24, 1.09, 1.0, 0.94, 0.9], [1.64, 1.24, 1.05, 0.93, 0.85]],
  [0.57, 0.65, [1.47, 1.3, 1.2, 1.14, 1.1], [2.47, 1.8, 1.48, 1.3, 1.17]],
  [0.57, 0.63, [1.55, 1.39, 1.31, 1.25, 1.21], [2.81, 2.08, 1.74, 1.53, 1.39]],
  [0.58, 0.63, [1.57, 1.44, 1.36, 1.31, 1.27], [2.9, 2.24, 1.92, 1.72, 1.58]],
  [0.61, 0.64, [1.58, 1.48, 1.41, 1.37, 1.34], [2.93, 2.4, 2.14, 1.96, 1.84]],
  [0.67, 0.69, [1.58, 1.48, 1.41, 1.37, 1.34], [2.93, 2.4, 2.14, 1.96, 1.84]],
];

export const NBC_2015_TABLES: readonly FactorTable[] = ROWS.map(([a, b, d, e]) => ({
  columns: PGA_COLUMNS,
  rows: { A: same(a), B: same(b), C: same(1), D: d, E: e },
}));

export const NBC_CLASSES = ['A', 'B', 'C', 'D', 'E'] as const;

type FactorRecord = MethodRecord<FactorInput<'pga_ref_g'>, Record<never, number>>;

/** Records in the order of NBC_PERIODS_S. */
export const NBC_2015_FACTORS: readonly FactorRecord[] = NBC_PERIODS_S.map((period_s, i) =>
  record({
    id: `nbc-2015/site-factor/f-${String(period_s).replace('.', 'p')}s`,
    title: `Site factor F(${String(period_s)})`,
    family: factorFamily(
      `site-factor/nbc-2015-${String(period_s)}s`,
      'site_factor',
      `F(${String(period_s)})`,
      NBC_2015_TABLES[i]!,
      {
        name: 'pga_ref_g',
        unit: 'g',
        meaning: 'reference peak ground acceleration PGA_ref: 0.8 PGA where S_a(0.2)/PGA is below 2, else PGA',
        from: 0.001,
        to: 3,
      },
    ),
    constants: {},
    source: { standard: 'NBC', edition: '2015', clause: `table 4.1.8.4.-${'BCDEFG'.charAt(i)}` },
    verified: period_s === 10 ? 'judgement' : 'memory',
    limits: [],
    ...(period_s === 10
      ? { note: 'Classes A and B from memory; D and E hold the factor at 5 s, since our sheet has none at 10 s.' }
      : {}),
  }),
);
