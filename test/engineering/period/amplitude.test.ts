import { describe, expect, it } from 'vitest';
import { MEASURED_SMALL, MEASURED_SMALL_BRITTLE } from '../../../src/engineering/period/measured-records.js';

/** Period in strong shaking over small amplitude, rows P01 to P04 and P06 of the period case file (restated, ratios derived). */
const RATIOS: readonly (readonly [id: string, what: string, ratio: number])[] = [
  ['P01', 'nine-storey steel, Pasadena 1971, longest over ambient after', 1.3],
  ['P01', 'the same over ambient before', 1.43],
  ['P02', 'nine-storey concrete, Pasadena, east-west over 35 years', 1.282],
  ['P02', 'the same, north-south', 1.136],
  ['P03', 'Tsukuba 2011', 1.25],
  ['P04', '54-storey steel, Los Angeles', 1.054],
];
/** P06: cracked over uncracked models of concrete frames. */
const CRACKED = [1.41, 1.51] as const;

describe('MEASURED_SMALL', () => {
  it('lies among the ratios of single buildings, at the longest over ambient of P01', () => {
    const all = RATIOS.map(([, , ratio]) => ratio);
    const { factor } = MEASURED_SMALL.constants;
    expect(factor).toBeGreaterThan(Math.min(...all));
    expect(factor).toBeLessThan(Math.max(...all));
    expect(factor).toBe(RATIOS[0]![2]);
  });
});

describe('MEASURED_SMALL_BRITTLE', () => {
  it('lies within cracked over uncracked concrete frames (P06)', () => {
    const { factor } = MEASURED_SMALL_BRITTLE.constants;
    expect(factor).toBeGreaterThanOrEqual(CRACKED[0]);
    expect(factor).toBeLessThanOrEqual(CRACKED[1]);
  });
});
