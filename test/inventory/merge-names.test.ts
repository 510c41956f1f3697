import { describe, expect, it } from 'vitest';
import { commonName } from '../../src/inventory/merge-names.js';

describe('commonName', () => {
  // The first three pairs: addresses of test/fixtures/assessor-excerpt.csv and of the table it is taken from.
  it.each([
    ['121-123 SPRING ST #121', '121-123 SPRING ST #123C', '121-123 SPRING ST'],
    ['105 GORE ST #1', '105 GORE ST #12', '105 GORE ST'],
    ['224-226 HURLEY ST #224/1', '224-226 HURLEY ST #226', '224-226 HURLEY ST'],
    ['5 Elm St, Unit 4', '5 Elm St, Unit 5', '5 Elm St'],
    ['5 Elm St, Apt 10', '5 Elm St, Apt 12', '5 Elm St'],
    ['Maple Court #1', 'Maple Crescent #1', 'Maple'],
    ['1 Oak Rd #1', '3 Oak Rd #2', '1 Oak Rd'],
    ['12 Oak Rd #1', '12 Pine Rd #2', '12 Oak Rd'],
    ['#1', '#2', '#1'],
    ['5 Elm St #2', '5 Elm St #2', '5 Elm St #2'],
  ])('of %j and %j is %j', (low, high, name) => {
    expect(commonName(low, high)).toBe(name);
  });
});
