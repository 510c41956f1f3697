import { describe, expect, it } from 'vitest';
import {
  formatCount,
  formatNumber,
  formatPlaces,
  formatQuantity,
  formatShare,
  shownUnit,
  shownValue,
  unitLabel,
  textInDisplay,
} from '../../src/engineering/format.js';

// Contracts of the display.
describe('formatNumber', () => {
  it.each([
    [1.0518, 4, '1.052'],
    [0.04, 3, '0.0400'],
    [12345.6, 3, '12\u202f346'],
    [1234.5, 3, '1235'],
    [-2.5, 3, '−2.50'],
    [0, 3, '0'],
    [NaN, 3, 'not known'],
    [Infinity, 3, '∞'],
    [-Infinity, 3, '−∞'],
    [0.00002, 2, '0.000020'],
    // Rounded first: as many digits as 0.10 has.
    [0.0999, 2, '0.10'],
    [99.96, 3, '100'],
  ])('%d with %i digits', (value, digits, text) => {
    expect(formatNumber(value, digits)).toBe(text);
  });
});

describe('formatShare', () => {
  it('never prints a false 0 or 100 %', () => {
    expect(formatShare(0)).toBe('0 %');
    expect(formatShare(1)).toBe('100 %');
    expect(formatShare(0.001)).toBe('under 1 %');
    expect(formatShare(0.9999)).toBe('over 99 %');
    expect(formatShare(0.626)).toBe('62 %');
    expect(formatShare(0.29)).toBe('29 %');
    // Below a threshold of 80 % it does not print as 80 %.
    expect(formatShare(0.7999)).toBe('79 %');
    expect(formatShare(0.8)).toBe('80 %');
    expect(formatShare(NaN)).toBe('not known');
  });
});

describe('formatPlaces', () => {
  it('names one place, or the first and the last of a shared block', () => {
    expect(formatPlaces(5, 5)).toBe('5');
    expect(formatPlaces(1, 73)).toBe('1 to 73');
    expect(formatPlaces(5, NaN)).toBe('5');
    expect(formatPlaces(NaN, NaN)).toBe('not known');
  });
});

describe('formatQuantity', () => {
  it('shows the unit of the display', () => {
    expect(formatQuantity(12.5, 'm', 'si')).toBe('12.5 m');
    expect(formatQuantity(12.5, 'm', 'us')).toBe('41.0 ft');
    expect(formatQuantity(1.05, 's', 'us')).toBe('1.05 s');
    expect(formatQuantity(NaN, 'm', 'si')).toBe('not known');
    expect(formatQuantity(2, null, 'si')).toBe('2.00');
    expect(formatCount(27528)).toBe('27\u202f528');
    expect(shownUnit('kN_per_m', 'us')).toBe('kip_per_in');
    expect(shownValue(0.3048, 'm', 'us')).toBe(1);
    expect(unitLabel('m2', 'us')).toBe('ft²');
  });
});

describe('textInDisplay', () => {
  it('turns the metres of a sentence into feet, and leaves what the owner wrote', () => {
    const text = '"46 m" read: 63.3 m over 6 storeys is 10.55 m per storey, 588.0 m² in all, 12 mm apart';
    expect(textInDisplay(text, 'us')).toBe(
      '"46 m" read: 208 ft over 6 storeys is 34.6 ft per storey, 6329 ft² in all, 12 mm apart',
    );
    expect(textInDisplay(text, 'si')).toBe(text);
  });
});
