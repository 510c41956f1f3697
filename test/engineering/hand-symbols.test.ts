import { describe, expect, it } from 'vitest';
import { symbol, symbolIn } from '../../src/engineering/hand-symbols.js';
import { METHODS, findMethod } from '../../src/engineering/methods.js';

/** Symbols of the inputs and the result of a record as its formula writes them. */
const symbolsOf = (id: string): Readonly<Record<string, string>> => {
  const { family } = findMethod(id)!;
  return Object.fromEntries(family.inputs.map(({ name }) => [name, symbolIn(family.id)(name)]));
};

describe('symbolIn', () => {
  it('tells C_m of ASCE/SEI 41 from the mass share of the capacity, which stand on one sheet', () => {
    // ASCE/SEI 41-17 Table 7-4 calls it C_m (data sheet 9.5)
    expect(symbolsOf('asce41-17/base-shear/elastic')['mass_share']).toBe('C_m');
    expect(symbolsOf('asce41-17/displacement/strength-ratio')['mass_share']).toBe('C_m');
    expect(symbolsOf('swaymark/capacity/elastic-equivalent')['mass_share']).toBe('α₁');
    // nor is C_s, the strength of the capacity, the base shear of ASCE/SEI 7
    expect(symbol('strength_coefficient')).toBe('C_s');
    expect(findMethod('asce7-16/base-shear/equivalent-lateral-force')!.family.symbol).toBe('V/W');
  });

  it('keeps C_t for the coefficient of a period formula alone', () => {
    expect(symbolIn('period/height-power')('coefficient')).toBe('C_t');
    expect(symbolIn('base-shear/tabled')('coefficient')).toBe('c');
    expect(symbolIn('any')('height_m')).toBe('h');
    expect(symbol('a_name_without_one')).toBe('a_name_without_one');
  });

  it('gives no two quantities of one formula the same symbol', () => {
    const twice = METHODS.flatMap(({ id, family }) => {
      const symbols = family.inputs.map(({ name }) => symbolIn(family.id)(name));
      return new Set(symbols).size === symbols.length ? [] : [`${id}: ${symbols.join(' ')}`];
    });
    expect(twice).toEqual([]);
  });
});
