import { describe, expect, it } from 'vitest';
import { addressed, sheetAddress } from '../../src/browser/address.js';
import { folded, sorted, sortKeys } from '../../src/browser/table/order.js';

describe('sorted', () => {
  const members = [0, 1, 2, 3, 4];

  it('puts unknown numbers last both ways and keeps equal keys as ranked', () => {
    const keys = sortKeys(5, (i) => [2, NaN, 1, 2, NaN][i] ?? NaN);
    expect(sorted(members, keys, 'ascending')).toEqual([2, 0, 3, 1, 4]);
    expect(sorted(members, keys, 'descending')).toEqual([0, 3, 2, 1, 4]);
  });

  it('sorts words as people do and blanks last', () => {
    const keys = sortKeys(5, (i) => ['EX-10', '', 'EX-9', 'ex-1', 'Émile'][i] ?? '');
    expect(sorted(members, keys, 'ascending')).toEqual([4, 3, 2, 0, 1]);
  });
});

describe('folded', () => {
  it('finds accented names by plain letters', () => {
    expect(folded('Café ÉCOLE')).toBe('cafe ecole');
  });
});

describe('addressed', () => {
  it('reads back any identifier', () => {
    for (const id of ['EX-001', 'a b/ü#&=%', '</script>']) expect(addressed(sheetAddress(id))).toBe(id);
    expect(addressed('#list')).toBeNull();
    expect(addressed('#building=%E0%A4%A')).toBeNull();
  });
});
