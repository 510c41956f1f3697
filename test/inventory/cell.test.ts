import { describe, expect, it } from 'vitest';
import { findColumn } from '../../src/engineering/columns.js';
import { findUnit } from '../../src/engineering/units.js';
import { readListCell, readNumberCell, readWordCell } from '../../src/inventory/cell.js';
import type { ReadCell } from '../../src/inventory/cell.js';

function read(text: string, name: string, unit?: string, decimal = '.'): ReadCell {
  const column = findColumn(name)!;
  const stored = column.unit === undefined ? undefined : findUnit(column.unit);
  return readNumberCell(text, column, { decimal, unit: unit === undefined ? stored : findUnit(unit), stored });
}
const value = (...args: Parameters<typeof read>): number => read(...args).value;
const code = (...args: Parameters<typeof read>): string | undefined => read(...args).note?.code;

describe('readNumberCell', () => {
  it('understands thousands separators', () => {
    expect(value('1,234.5', 'floor_area_m2')).toBe(1234.5);
    expect(value('1 234 567', 'floor_area_m2')).toBe(1234567);
    expect(value("12'345", 'floor_area_m2')).toBe(12345);
    expect(value('1\u00a0234', 'floor_area_m2')).toBe(1234);
    expect(value('1.234,5', 'floor_area_m2', 'm2', ',')).toBe(1234.5);
    expect(value('12,5', 'height_m', 'm', ',')).toBe(12.5);
    for (const odd of ['1,23', '12,34,567', '1,2345', '1.234.567'])
      expect(code(odd, 'floor_area_m2')).toBe('not-a-number');
  });

  it('converts a unit the cell names and says so', () => {
    // A foot is 0.3048 m exactly (NIST SP 811, appendix B.8).
    expect(value('46 ft', 'height_m')).toBe(46 * 0.3048);
    expect(code('46 ft', 'height_m')).toBe('unit-suffix');
    expect(value("46'", 'height_m')).toBe(46 * 0.3048);
    expect(value(`12' 6"`, 'first_storey_height_m')).toBeCloseTo(12.5 * 0.3048, 12);
    expect(value('1200 sf', 'floor_area_m2')).toBeCloseTo(1200 * 0.3048 * 0.3048, 9);
    expect(value('14.2 m', 'height_m', 'ft')).toBe(14.2);
    expect(code('46 ft', 'height_m', 'ft')).toBeUndefined();
    expect(code('46 kg', 'height_m')).toBe('unknown-unit');
    expect(value('3 storeys', 'storeys_above')).toBe(3);
  });

  it('refuses what a lax cast would take', () => {
    for (const text of ['0x10', '1_000', 'inf', 'nan', '--3', '3+', '٣', 'ca.', '=1+1']) {
      expect(code(text, 'height_m'), text).toBe('not-a-number');
      expect(value(text, 'height_m'), text).toBeNaN();
    }
  });

  it('keeps to the limits of the column', () => {
    expect(code('99', 'storeys_above')).toBe('outside-limits');
    expect(code('-35616', 'floor_area_m2')).toBe('negative-area');
    expect(read('0', 'year_built').note).toMatchObject({ code: 'zero', kind: 'note' });
    expect(code('2.5', 'count')).toBe('not-whole');
    expect(code('0', 'occupants_peak')).toBeUndefined();
  });

  it('reads years as people write them', () => {
    expect(value('c. 1925', 'year_built')).toBe(1925);
    expect(code('c. 1925', 'year_built')).toBe('year-in-words');
    expect(value('1925?', 'year_built')).toBe(1925);
    expect(value('1925-06-01', 'year_built')).toBe(1925);
    expect(value('1925/27', 'year_built')).toBe(1925);
    expect(read('1920s', 'year_built')).toMatchObject({ decade: 1920, note: { code: 'year-decade' } });
    expect(code('old', 'year_built')).toBe('not-a-number');
    expect(code('19255', 'year_built')).toBe('outside-limits');
  });

  it('takes an approximate value with a note', () => {
    expect(value('approx. 12.5', 'height_m')).toBe(12.5);
    expect(code('~12.5', 'height_m')).toBe('approximate-value');
  });
});

describe('readListCell', () => {
  it('reads numbers bottom to top and refuses a list with a hole', () => {
    const column = findColumn('storey_stiffness_longitudinal_kN_per_m')!;
    const stored = findUnit('kN_per_m');
    const format = { decimal: '.', unit: findUnit('MN_per_m'), stored };
    expect(readListCell('90; 80;80', column, format)).toEqual({ list: '90000;80000;80000' });
    expect(readListCell('90;;80', column, format).note?.code).toBe('not-a-list');
  });
});

describe('readWordCell', () => {
  it('takes the words of the study first, then ours, whatever their case', () => {
    const column = findColumn('use')!;
    const words = new Map([['flats', 'residential']]);
    expect(readWordCell(' Flats ', column, words).word).toBe('residential');
    expect(readWordCell('HOTEL', column, words).word).toBe('hotel');
    expect(readWordCell('castle', column, words)).toMatchObject({
      word: null,
      note: { code: 'unknown-word', kind: 'rejected-cell' },
    });
    // A new word of the owner's: a short message, because it stands in every row with the word.
    expect(readWordCell('lift slab', findColumn('system')!, words).note?.message).toBe(
      '"lift slab" is not a word of system; list it under words.system of the study; the study\'s JSON Schema has all words',
    );
    expect(readWordCell('steel moment fram', findColumn('system')!, words).note?.message).toMatch(
      /^"steel moment fram" is not a word of system \(nearest: [a-z-]+(, [a-z-]+){0,2}\); list/,
    );
    expect(readWordCell('Steel moment frame', findColumn('system')!, words).word).toBe('steel-moment-frame');
    expect(readWordCell('C, dense', findColumn('site_class')!, new Map([['c, dense', 'C']])).word).toBe('C');
  });
});
