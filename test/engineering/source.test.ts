import { describe, expect, it } from 'vitest';
import { cite } from '../../src/engineering/source.js';

// How the publications write themselves: ASCE/SEI 7-22 and EN 1998-1:2004 on their title pages; authors and year as in any bibliography.
describe('cite', () => {
  it.each([
    ['ASCE/SEI 7', '22', '12.8.2', 'ASCE/SEI 7-22, 12.8.2'],
    ['EN 1998-1', '2004', '3.2.2.2(1)', 'EN 1998-1:2004, 3.2.2.2(1)'],
    ['Cornell, Jalayer, Hamburger and Foutch', '2002', '', 'Cornell, Jalayer, Hamburger and Foutch 2002'],
    ['structural dynamics', '', 'T = 1/f', 'structural dynamics, T = 1/f'],
  ])('%s, %s', (standard, edition, clause, text) => {
    expect(cite({ standard, edition, clause })).toBe(text);
  });
});
