import { describe, expect, it } from 'vitest';
import { LEFT_OUT } from '../../../src/engineering/period/left-out.js';
import { PERIOD_RECORDS } from '../../../src/engineering/period/periods.js';
import { REFERENCE_CASES } from '../../reference/cases.js';
import { MEASURED_BUILDINGS } from '../../reference/measured-buildings.js';
import { NOT_RUN, PERIOD_CASE_IDS } from '../../reference/period-case-ids.js';

describe('LEFT_OUT', () => {
  it('gives a reason for each row, once', () => {
    expect(new Set(LEFT_OUT.map(({ row }) => row)).size).toBe(LEFT_OUT.length);
    for (const { row, reason } of LEFT_OUT) expect(reason.length, row).toBeGreaterThan(15);
  });

  it('names no publication that has a record of its own by the same name', () => {
    for (const { id } of PERIOD_RECORDS)
      expect(id).not.toMatch(/^(?:nch433|rpa-2024|oliveira|chun|hafeez|hatzigeorgiou)/);
  });
});

describe('PERIOD_CASE_IDS', () => {
  it('are run, kept as measured buildings, or listed with the reason', () => {
    const run = (id: string): boolean =>
      REFERENCE_CASES.some((one) => one.id === id || one.id.startsWith(`${id}-`)) ||
      MEASURED_BUILDINGS.some((one) => one.id === id);
    expect(PERIOD_CASE_IDS.filter((id) => !run(id) && NOT_RUN[id] === undefined)).toEqual([]);
    expect(Object.keys(NOT_RUN).filter((id) => run(id) || !PERIOD_CASE_IDS.includes(id))).toEqual([]);
    expect(new Set(PERIOD_CASE_IDS).size).toBe(PERIOD_CASE_IDS.length);
  });
});
