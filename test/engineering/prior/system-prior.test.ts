import { describe, expect, it } from 'vitest';
import { matchPrior } from '../../../src/engineering/prior/system-prior.js';
import type { SystemPriorGroup } from '../../../src/engineering/prior/system-prior.js';

function group(label: string, bounds: Partial<SystemPriorGroup>): SystemPriorGroup {
  const any = { use: null, storeysFrom: null, storeysTo: null, builtFrom: null, builtTo: null };
  return { ...any, chances: [{ system: 'timber-light-frame', chance: 1 }], label, ...bounds };
}

// Follows from the contract of the table: the first group that holds the building applies; bounds are inclusive.
describe('matchPrior', () => {
  const groups = [
    group('low offices', { use: 'office', storeysTo: 3 }),
    group('old', { builtTo: 1949 }),
    group('offices', { use: 'office' }),
    group('middling hotels', { use: 'hotel', storeysFrom: 4, storeysTo: 6 }),
  ];
  const match = (...query: [SystemPriorGroup['use'] & string, number, number]): string | undefined =>
    matchPrior(groups, ...query)?.label;

  it('takes the first group that holds the building', () => {
    expect(match('office', 3, 1900)).toBe('low offices');
    expect(match('office', 4, 1949)).toBe('old');
    expect(match('office', 4, 1950)).toBe('offices');
    expect(match('hotel', 6, 1950)).toBe('middling hotels');
    expect(match('hotel', 7, 1950)).toBeUndefined();
  });

  it('rounds storeys inferred from a height', () => {
    expect(match('office', 3.4, 1960)).toBe('low offices');
    expect(match('office', 3.5, 1960)).toBe('offices');
  });

  it('matches an unknown number of storeys or year only where there is no bound', () => {
    expect(match('office', NaN, NaN)).toBe('offices');
    expect(match('hotel', NaN, NaN)).toBeUndefined();
  });
});
