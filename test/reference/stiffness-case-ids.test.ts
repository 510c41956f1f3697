import { describe, expect, it } from 'vitest';
import { measure } from '../support/engineering-measure.js';
import { REFERENCE_CASES } from './cases.js';
import { NOT_COMPARED, STATED } from './stiffness-case-answers.js';
import { NOT_RUN, STIFFNESS_CASE_IDS } from './stiffness-case-ids.js';

describe('STIFFNESS_CASE_IDS', () => {
  it('are each run as a reference case, or listed with the reason', () => {
    const run = new Set(REFERENCE_CASES.map(({ id }) => /^SD-\d\d/.exec(id)?.[0]));
    for (const id of STIFFNESS_CASE_IDS) expect(run.has(id) !== (NOT_RUN[id] !== undefined), id).toBe(true);
  });

  it('are known where a row is left out', () => {
    for (const id of Object.keys(NOT_RUN)) expect(STIFFNESS_CASE_IDS, id).toContain(id);
  });

  it('have the answers their rows state', () => {
    expect(Object.keys(STATED).toSorted()).toEqual(
      STIFFNESS_CASE_IDS.filter((id) => NOT_RUN[id] === undefined).toSorted(),
    );
  });
});

describe('STATED', () => {
  const answers = Object.entries(STATED).flatMap(([row, { within, absolute, answers: named }]) =>
    Object.entries(named).flatMap(([name, list]) =>
      list.map(([stated, id, as], i) => ({ row, name, i, stated, id, as, within, absolute })),
    ),
  );

  it.each(answers)('$row $name $i: $stated, from $id', ({ row, stated, id, as, within, absolute }) => {
    expect(id.startsWith(row)).toBe(true);
    const reference = REFERENCE_CASES.find((one) => one.id === id);
    expect(reference, id).toBeDefined();
    const { value } = measure(reference!);
    const found = as === undefined ? value : as(value);
    expect(Math.abs(found - stated)).toBeLessThanOrEqual(within * (absolute === true ? 1 : Math.abs(stated)) + 1e-12);
  });

  it('names no answer both as compared and as left out', () => {
    for (const [row, named] of Object.entries(NOT_COMPARED))
      for (const name of Object.keys(named)) expect(STATED[row]?.answers[name], `${row} ${name}`).toBeUndefined();
  });
});
