/** What damping other than 5 % does to a spectrum: factors that multiply it (η, K_ζ) or divide it (B). */
import { record } from '../formula.js';
import type { AnyRecord, Family, MethodRecord } from '../formula.js';
import { ln } from '../numeric/elementary.js';
import { DAMPING_INPUT } from './family.js';

interface DampingInput {
  readonly damping_ratio: number;
}
type DampingRecord = MethodRecord<DampingInput, Record<never, number>>;

const eta: Family<DampingInput, Record<never, number>> = {
  id: 'damping/en1998-eta',
  yields: 'eta',
  unit: null,
  symbol: 'η',
  inputs: [DAMPING_INPUT],
  expression: 'max(sqrt(10 / (5 + 100 * damping_ratio)), 0.55)',
  evaluate: ({ damping_ratio }) => Math.max(Math.sqrt(10 / (5 + 100 * damping_ratio)), 0.55),
};

export const ETA: DampingRecord = record({
  id: 'en1998-1-2004/damping/eta',
  title: 'Damping correction factor',
  family: eta,
  constants: {},
  source: { standard: 'EN 1998-1', edition: '2004', clause: '3.2.2.2(3)' },
  verified: 'restated',
  limits: [],
});

const b1: Family<DampingInput, Record<never, number>> = {
  id: 'damping/asce41-b1',
  yields: 'b1',
  unit: null,
  symbol: 'B_1',
  inputs: [{ ...DAMPING_INPUT, to: 1 }],
  expression: '4 / (5.6 - ln(100 * damping_ratio))',
  evaluate: ({ damping_ratio }) => 4 / (5.6 - ln(100 * damping_ratio)),
};

export const B1: DampingRecord = record({
  id: 'asce41-17/damping/b1',
  title: 'Divisor of the spectrum for damping',
  family: b1,
  constants: {},
  source: { standard: 'ASCE/SEI 41', edition: '17', clause: '(2-3)' },
  verified: 'restated',
  limits: [],
  note: 'As printed it is 1.0024 at 5 %; the spectrum takes 1 there.',
});

const kZeta: Family<DampingInput, Record<never, number>> = {
  id: 'damping/k-zeta',
  yields: 'k_zeta',
  unit: null,
  symbol: 'K_ζ',
  inputs: [DAMPING_INPUT],
  expression: 'sqrt(7 / (2 + 100 * damping_ratio))',
  evaluate: ({ damping_ratio }) => Math.sqrt(7 / (2 + 100 * damping_ratio)),
};

const K_ZETA: DampingRecord = record({
  id: 'nz-assessment/damping/k-zeta',
  title: 'Damping correction factor of the New Zealand assessment guideline',
  family: kZeta,
  constants: {},
  source: { standard: 'New Zealand seismic assessment guideline', edition: '', clause: 'spectral damping reduction' },
  verified: 'restated',
  limits: [],
});

/** Damping (%) and factor, linear in between, flat outside. */
type Points = readonly (readonly [number, number])[];

/** The two rows of `points` around a damping ratio. */
function around(
  points: Points,
  damping_ratio: number,
): readonly [readonly [number, number], readonly [number, number]] {
  const percent = 100 * damping_ratio;
  const next = points.findIndex(([at]) => at > percent);
  const last = points.length - 1;
  if (next === 0) return [points[0]!, points[0]!];
  return next === -1 ? [points[last]!, points[last]!] : [points[next - 1]!, points[next]!];
}

function tableFamily(id: string, symbol: string, points: Points): Family<DampingInput, Record<never, number>> {
  return {
    id,
    yields: 'damping_factor',
    unit: null,
    symbol,
    inputs: [{ ...DAMPING_INPUT, from: 0, to: 1 }],
    expression: null,
    procedure: 'the table by damping, linear between its rows, flat outside',
    shownAt: ({ damping_ratio }) => {
      const [[p, a], [q, b]] = around(points, damping_ratio);
      const [low, high] = [String(a), String(b)];
      return a === b
        ? { expression: low, clause: `at ${String(p)} %` }
        : {
            expression: `${low} + (${high} - ${low}) * (100 * damping_ratio - ${String(p)}) / (${String(q)} - ${String(p)})`,
            clause: `between ${String(p)} % and ${String(q)} %`,
          };
    },
    evaluate: ({ damping_ratio }) => {
      const [[p, a], [q, b]] = around(points, damping_ratio);
      return a === b ? a : a + ((b - a) * (100 * damping_ratio - p)) / (q - p);
    },
  };
}

const B_18_7: Points = [
  [2, 0.8],
  [5, 1.0],
  [10, 1.2],
  [20, 1.5],
  [30, 1.8],
  [40, 2.1],
  [50, 2.4],
  [60, 2.7],
  [70, 3.0],
  [80, 3.3],
  [90, 3.6],
  [100, 4.0],
];
const B_17_5: Points = [
  [2, 0.8],
  [5, 1.0],
  [10, 1.2],
  [20, 1.5],
  [30, 1.7],
  [40, 1.9],
  [50, 2.0],
];
const MULTIPLIERS_2002: Points = [
  [0, 3.2],
  [2, 1.4],
  [5, 1.0],
  [7, 0.9],
  [10, 0.8],
  [15, 0.7],
  [20, 0.6],
  [25, 0.55],
  [30, 0.5],
];

export const DAMPING_RECORDS: readonly AnyRecord[] = [
  ETA,
  B1,
  K_ZETA,
  record({
    id: 'asce7-16/damping/b-added-damping',
    title: 'Divisor of the spectrum for structures with damping systems',
    family: tableFamily('damping/asce7-table-18-7', 'B', B_18_7),
    constants: {},
    source: { standard: 'ASCE/SEI 7', edition: '16', clause: 'table 18.7-1' },
    verified: 'memory',
    limits: [],
  }),
  record({
    id: 'asce7-16/damping/b-isolated',
    title: 'Divisor of the spectrum for isolated structures',
    family: tableFamily('damping/asce7-table-17-5', 'B', B_17_5),
    constants: {},
    source: { standard: 'ASCE/SEI 7', edition: '16', clause: 'table 17.5-1' },
    verified: 'memory',
    limits: [],
  }),
  record({
    id: 'is1893-2002/damping/multiplier',
    title: 'Multiplying factor for damping',
    family: tableFamily('damping/is1893-table-3', 'factor', MULTIPLIERS_2002),
    constants: {},
    source: { standard: 'IS 1893 (Part 1)', edition: '2002', clause: 'table 3' },
    verified: 'restated',
    limits: [],
    note: 'The edition of 2016 fixes 5 % for buildings [from memory]. Linear between its rows [judgement].',
  }),
];

/** For the catalogue. */
export const DAMPING_TABLES = { B_18_7, B_17_5, MULTIPLIERS_2002 };
