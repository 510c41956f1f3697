import { describe, expect, it } from 'vitest';
import { siteCloseness } from '../../../src/engineering/site/closeness.js';

describe('siteCloseness', () => {
  // bands used with microtremors, ±15 % and ±25 % (after Gosar 2010, from memory); one-sided rule from 0.7 [judgement]
  it.each([
    [1.0, 'close'],
    [1.14, 'close'],
    [0.86, 'close'],
    [1.2, 'near'],
    [0.76, 'near'],
    [0.72, 'grows-into'],
    [0.69, 'apart'],
    [1.3, 'apart'],
  ])('of a period %d times that of the ground is %s', (ratio, expected) => {
    expect(siteCloseness(2 * ratio, 2)).toBe(expected);
  });

  it('is not told where either is not known', () => {
    expect(siteCloseness(NaN, 1)).toBeNull();
    expect(siteCloseness(1, NaN)).toBeNull();
  });
});
