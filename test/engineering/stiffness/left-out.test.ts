import { describe, expect, it } from 'vitest';
import { STIFFNESS_LEFT_OUT } from '../../../src/engineering/stiffness/left-out.js';

// a contract of the list: nothing outside the program to hold it against
describe('STIFFNESS_LEFT_OUT', () => {
  it('gives a reason for each row, once', () => {
    expect(new Set(STIFFNESS_LEFT_OUT.map(({ row }) => row)).size).toBe(STIFFNESS_LEFT_OUT.length);
    for (const { row, reason } of STIFFNESS_LEFT_OUT) expect(reason.length, row).toBeGreaterThan(15);
  });
});
