/** NZS 1170.5:2004: return period factor R, near-fault factor N(T, D), and the horizontal design action coefficient. */
import { record } from '../formula.js';
import type { AnyRecord, Family, MethodRecord, ShownFormula } from '../formula.js';
import { PERIOD_INPUT } from './family.js';

/** Return period (years) and R. */
const RETURN_FACTORS: readonly (readonly [number, number])[] = [
  [20, 0.2],
  [25, 0.25],
  [50, 0.35],
  [100, 0.5],
  [250, 0.75],
  [500, 1.0],
  [1000, 1.3],
  [2000, 1.7],
  [2500, 1.8],
];

function returnFactor(years: number): number {
  const row = RETURN_FACTORS.find(([known]) => known === years);
  if (row === undefined)
    throw new RangeError(
      `table 3.5 has no factor for ${String(years)} years; it has ${RETURN_FACTORS.map(([known]) => String(known)).join(', ')}`,
    );
  return row[1];
}

const byReturnPeriod: Family<{ readonly return_period: string }, Record<never, number>> = {
  id: 'return-factor/nzs1170-5',
  yields: 'return_factor',
  unit: null,
  symbol: 'R',
  inputs: [
    {
      name: 'return_period',
      kind: 'word',
      words: RETURN_FACTORS.map(([years]) => String(years)),
      meaning: 'return period in years; one of the table',
    },
  ],
  expression: null,
  procedure: 'the table by return period',
  shownAt: ({ return_period }) => ({
    expression: String(returnFactor(Number(return_period))),
    clause: `${return_period} years`,
  }),
  evaluate: ({ return_period }) => returnFactor(Number(return_period)),
};

export interface Line {
  readonly from_s: number;
  readonly to_s: number;
  /** N = constant + slope T. */
  readonly constant: number;
  readonly slope: number;
  readonly shown: ShownFormula;
}

/** Share of N_max - 1 that counts: 1 up to 2 km, falling to 0 at 20 km; 0 where R is at most 0.75 (250 years). */
export function nearFaultShare(distance_km: number, return_factor: number): number {
  if (return_factor <= 0.75) return 0;
  return Math.min(Math.max((20 - distance_km) / 18, 0), 1);
}

/** N(T, D) as straight lines in T; `w` names the share in display formulas. */
export function nearFaultLines(share: number, w: string): readonly Line[] {
  const line = (
    from_s: number,
    to_s: number,
    constant: number,
    slope: number,
    expression: string,
    clause: string,
  ): Line => ({
    from_s,
    to_s,
    constant,
    slope,
    shown: { expression, clause },
  });
  if (share === 0) return [line(0, Infinity, 1, 0, '1', 'N = 1')];
  const m = `min(max(${w}, 0), 1)`;
  return [
    line(0, 1.5, 1, 0, '1', 'N = 1 up to 1.5 s'),
    line(1.5, 4, 1 - 0.36 * share, 0.24 * share, `(1 + ${m} * (0.24 * period_s + 0.64 - 1))`, 'N_max = 0.24 T + 0.64'),
    line(4, 5, 1 + 0.12 * share, 0.12 * share, `(1 + ${m} * (0.12 * period_s + 1.12 - 1))`, 'N_max = 0.12 T + 1.12'),
    line(5, Infinity, 1 + 0.72 * share, 0, `(1 + ${m} * 0.72)`, 'N_max = 1.72'),
  ];
}

interface NearFaultInput {
  readonly distance_km: number;
  readonly return_factor: number;
  readonly period_s: number;
}

function lineAt({ distance_km, return_factor, period_s }: NearFaultInput): Line {
  const lines = nearFaultLines(nearFaultShare(distance_km, return_factor), SHARE_TEXT);
  return lines.find(({ to_s }) => period_s < to_s)!;
}

export const SHARE_TEXT = '(20 - distance_km) / 18';

export const RETURN_INPUT = {
  name: 'return_factor',
  kind: 'number',
  from: 0.2,
  to: 1.8,
  meaning: 'return period factor R (1 for 500 years)',
} as const;

export const DISTANCE_INPUT = {
  name: 'distance_km',
  kind: 'number',
  unit: 'km',
  from: 0.1,
  to: 1000,
  fallback: 20,
  stated: true,
  meaning: 'shortest distance D to the nearest major fault; beyond 20 km it does not count',
} as const;

const nearFault: Family<NearFaultInput, Record<never, number>> = {
  id: 'near-fault/nzs1170-5',
  yields: 'near_fault_factor',
  unit: null,
  symbol: 'N',
  inputs: [DISTANCE_INPUT, RETURN_INPUT, PERIOD_INPUT],
  expression: null,
  procedure:
    'N_max: 1 to 1.5 s, 0.24 T + 0.64 to 4 s, 0.12 T + 1.12 to 5 s, 1.72 beyond; N = N_max to 2 km, 1 + (N_max - 1)(20 - D)/18 to 20 km, 1 beyond or with R of at most 0.75',
  shownAt: (input) => lineAt(input).shown,
  evaluate: (input) => {
    const { constant, slope } = lineAt(input);
    return constant + slope * input.period_s;
  },
};

interface ActionInput {
  readonly sa_g: number;
  readonly performance_factor: number;
  readonly ductility: number;
  readonly zone_factor: number;
  readonly return_factor: number;
  readonly period_s: number;
}

const designAction: Family<ActionInput, Record<never, number>> = {
  id: 'base-shear/nzs1170-5-design-action',
  yields: 'strength_coefficient',
  unit: null,
  symbol: 'C_d',
  inputs: [
    { name: 'sa_g', kind: 'number', unit: 'g', meaning: 'elastic site spectrum C(T) at the period' },
    { name: 'performance_factor', kind: 'number', from: 0.4, to: 1, meaning: 'structural performance factor S_p' },
    { name: 'ductility', kind: 'number', from: 1, to: 6, meaning: 'structural ductility factor μ' },
    { name: 'zone_factor', kind: 'number', from: 0.05, to: 1, meaning: 'hazard factor Z' },
    RETURN_INPUT,
    PERIOD_INPUT,
  ],
  expression:
    'max(sa_g * performance_factor / (1 + (ductility - 1) * min(max(period_s, 0.4) / 0.7, 1)), (zone_factor / 20 + 0.02) * return_factor, 0.03 * return_factor)',
  evaluate: ({ sa_g, performance_factor, ductility, zone_factor, return_factor, period_s }) => {
    const kMu = 1 + (ductility - 1) * Math.min(Math.max(period_s, 0.4) / 0.7, 1);
    return Math.max((sa_g * performance_factor) / kMu, (zone_factor / 20 + 0.02) * return_factor, 0.03 * return_factor);
  },
};

const NZS = (clause: string) => ({ standard: 'NZS 1170.5', edition: '2004', clause });

const NEAR_FAULT: MethodRecord<NearFaultInput, Record<never, number>> = record({
  id: 'nzs1170-5-2004/near-fault/factor',
  title: 'Near-fault factor N(T, D)',
  family: nearFault,
  constants: {},
  source: NZS('3.1.6, table 3.7'),
  verified: 'restated',
  limits: [],
});

export const NZS1170_FACTOR_RECORDS: readonly AnyRecord[] = [
  record({
    id: 'nzs1170-5-2004/return-factor/table',
    title: 'Return period factor R',
    family: byReturnPeriod,
    constants: {},
    source: NZS('table 3.5'),
    verified: 'restated',
    limits: [],
  }),
  NEAR_FAULT,
  record({
    id: 'nzs1170-5-2004/base-shear/design-action',
    title: 'Horizontal design action coefficient, classes A to D',
    family: designAction,
    constants: {},
    source: NZS('5.2.1.1'),
    verified: 'restated',
    limits: [],
  }),
];

/** For the catalogue. */
export const NZS1170_RETURN_FACTORS = RETURN_FACTORS;
