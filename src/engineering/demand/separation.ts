/** The gap two buildings need so that they do not strike each other. */
import { record } from '../formula.js';
import type { AnyRecord, Family, InputSpec } from '../formula.js';

const U: readonly InputSpec[] = [
  {
    name: 'displacement_1_m',
    kind: 'number',
    unit: 'm',
    from: 0,
    to: 100,
    meaning: 'displacement of the one where they may meet',
  },
  { name: 'displacement_2_m', kind: 'number', unit: 'm', from: 0, to: 100, meaning: 'displacement of the other there' },
];
interface Two {
  readonly displacement_1_m: number;
  readonly displacement_2_m: number;
}
const gap = { yields: 'gap_needed_m', unit: 'm', symbol: 's' } as const;
const common = { limits: [] } as const;

const srss: Family<Two, { readonly aligned_factor: number }> = {
  ...gap,
  id: 'demand/separation-srss',
  inputs: U,
  expression: 'aligned_factor * sqrt(displacement_1_m * displacement_1_m + displacement_2_m * displacement_2_m)',
  evaluate: ({ displacement_1_m: a, displacement_2_m: b }, { aligned_factor }) =>
    aligned_factor * Math.sqrt(a * a + b * b),
};
export const GAP_SRSS = record({
  ...common,
  id: 'asce7-16/separation/srss',
  title: 'Gap between two buildings of one owner: root of the squares',
  family: srss,
  constants: { aligned_factor: 1 },
  source: { standard: 'ASCE/SEI 7', edition: '16', clause: 'eq. 12.12-2' },
  verified: 'restated',
});
export const GAP_ALIGNED = record({
  ...common,
  id: 'en1998-1-2004/separation/floors-aligned',
  title: 'The same where the floors are at one level',
  family: srss,
  constants: { aligned_factor: 0.7 },
  source: { standard: 'EN 1998-1', edition: '2004', clause: '4.4.2.7(3)' },
  verified: 'memory',
});

const sum: Family<Two, Record<never, number>> = {
  ...gap,
  id: 'demand/separation-sum',
  inputs: U,
  expression: 'displacement_1_m + displacement_2_m',
  evaluate: ({ displacement_1_m, displacement_2_m }) => displacement_1_m + displacement_2_m,
};
const GAP_SUM = record({
  ...common,
  id: 'asce7-02/separation/sum',
  title: 'The sum of both displacements, as earlier editions asked',
  family: sum,
  constants: {},
  source: { standard: 'ASCE/SEI 7', edition: '02', clause: 'earlier editions; never less than this can be needed' },
  verified: 'restated',
});

interface Damped {
  readonly damping_1: number;
  readonly damping_2: number;
  readonly period_1_s: number;
  readonly period_2_s: number;
}
const DAMPED: readonly InputSpec[] = [
  { name: 'damping_1', kind: 'number', above: 0, to: 1, meaning: 'damping ratio of the one', fallback: 0.05 },
  { name: 'damping_2', kind: 'number', above: 0, to: 1, meaning: 'damping ratio of the other', fallback: 0.05 },
  { name: 'period_1_s', kind: 'number', unit: 's', above: 0, to: 100, meaning: 'period of the one' },
  { name: 'period_2_s', kind: 'number', unit: 's', above: 0, to: 100, meaning: 'period of the other' },
];
const X = '(period_2_s / period_1_s)';
const correlation: Family<Damped, Record<never, number>> = {
  id: 'demand/separation-correlation',
  yields: 'correlation',
  unit: null,
  symbol: 'ρ',
  inputs: DAMPED,
  expression: `8 * sqrt(damping_1 * damping_2) * (damping_2 + damping_1 * ${X}) * ${X} * sqrt(${X}) / ((1 - ${X} * ${X}) * (1 - ${X} * ${X}) + 4 * damping_1 * damping_2 * (1 + ${X} * ${X}) * ${X} + 4 * (damping_1 * damping_1 + damping_2 * damping_2) * ${X} * ${X})`,
  evaluate: ({ damping_1: a, damping_2: b, period_1_s, period_2_s }) => {
    const x = period_2_s / period_1_s;
    const off = 1 - x * x;
    return (
      (8 * Math.sqrt(a * b) * (b + a * x) * x * Math.sqrt(x)) /
      (off * off + 4 * a * b * (1 + x * x) * x + 4 * (a * a + b * b) * x * x)
    );
  },
};
const DDC = { standard: 'Jeng, Kasai and Maison', edition: '1992', clause: 'double-difference combination' };
export const GAP_CORRELATION = record({
  ...common,
  id: 'jeng-kasai-maison-1992/separation/correlation',
  title: 'Correlation of the motions of two buildings',
  family: correlation,
  constants: {},
  source: DDC,
  verified: 'memory',
});

const difference: Family<Two & { readonly correlation: number }, Record<never, number>> = {
  ...gap,
  id: 'demand/separation-double-difference',
  inputs: [...U, { name: 'correlation', kind: 'number', from: 0, to: 1, meaning: 'correlation of the two motions' }],
  expression:
    'sqrt(max(0, displacement_1_m * displacement_1_m + displacement_2_m * displacement_2_m - 2 * correlation * displacement_1_m * displacement_2_m))',
  evaluate: ({ displacement_1_m: a, displacement_2_m: b, correlation: rho }) =>
    Math.sqrt(Math.max(0, a * a + b * b - 2 * rho * a * b)),
};
export const GAP_DOUBLE_DIFFERENCE = record({
  ...common,
  id: 'jeng-kasai-maison-1992/separation/double-difference',
  title: 'Gap by the double difference: buildings of like period move together',
  family: difference,
  constants: {},
  source: DDC,
  verified: 'memory',
});

const byHeight: Family<{ readonly shorter_height_m: number }, { readonly share: number }> = {
  ...gap,
  id: 'demand/separation-by-height',
  inputs: [
    {
      name: 'shorter_height_m',
      kind: 'number',
      unit: 'm',
      above: 0,
      to: 1000,
      meaning: 'height of the shorter building',
    },
  ],
  expression: 'share * shorter_height_m',
  evaluate: ({ shorter_height_m }, { share }) => share * shorter_height_m,
};
const heightRule = (which: string, share: number) =>
  record({
    ...common,
    id: `asce41-17/separation/by-height-${which}`,
    title: `Gap by height alone, ${which} seismicity`,
    family: byHeight,
    constants: { share },
    source: { standard: 'ASCE/SEI 41', edition: '17', clause: 'Table 17-2, adjacent buildings' },
    verified: 'memory',
  });
export const GAP_BY_HEIGHT = {
  low: heightRule('low', 0.0025),
  moderate: heightRule('moderate', 0.005),
  high: heightRule('high', 0.015),
} as const;

export const SEPARATION_RECORDS: readonly AnyRecord[] = [
  GAP_SRSS,
  GAP_ALIGNED,
  GAP_SUM,
  GAP_CORRELATION,
  GAP_DOUBLE_DIFFERENCE,
  ...Object.values(GAP_BY_HEIGHT),
];
