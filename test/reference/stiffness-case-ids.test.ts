import { describe, expect, it } from 'vitest';
import { REFERENCE_CASES } from './cases.js';
import { NOT_RUN, STIFFNESS_CASE_IDS } from './stiffness-case-ids.js';

describe('STIFFNESS_CASE_IDS', () => {
  it('are each run as a reference case, or listed with the reason', () => {
    const run = new Set(REFERENCE_CASES.map(({ id }) => /^SD-\d\d/.exec(id)?.[0]));
    for (const id of STIFFNESS_CASE_IDS) expect(run.has(id) !== (NOT_RUN[id] !== undefined), id).toBe(true);
  });

  it('are known where a row is left out', () => {
    for (const id of Object.keys(NOT_RUN)) expect(STIFFNESS_CASE_IDS, id).toContain(id);
  });
});
