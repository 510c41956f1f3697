import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { UNITS, convert, findUnit, unitsOf } from '../../src/engineering/units.js';

const unit = (spelling: string): NonNullable<ReturnType<typeof findUnit>> => {
  const found = findUnit(spelling);
  if (found === undefined) throw new Error(spelling);
  return found;
};

describe('convert', () => {
  // exact definitions: foot 0.3048 m, inch 0.0254 m, pound-force 4.4482216152605 N, g 9.80665 m/s² (NIST SP 811)
  it.each([
    [1, 'ft', 'm', 0.3048],
    [1, 'in', 'mm', 25.4],
    [100, 'ft2', 'm2', 9.290304],
    [1, 'kip', 'kN', 4.4482216152605],
    [1, 'g', 'm_per_s2', 9.80665],
    [1, 'ha', 'm2', 10000],
    [2500, 'ftps', 'mps', 762],
    [1, 'kip_per_in', 'kN_per_m', 4.4482216152605 / 0.0254],
    [1000, 'lb_per_in', 'kip_per_in', 1],
    [100, 'psf', 'kN_per_m2', 0.44482216152605 / 0.09290304],
    [1, 't', 'kg', 1000],
    [1, 'MN_per_m', 'N_per_m', 1e6],
    [1, 'GPa', 'MPa', 1000],
    [1, 'MPa', 'kN_per_m2', 1000],
    [1000, 'psi', 'ksi', 1],
    [1, 'ksi', 'MPa', 4.4482216152605 / 0.0254 ** 2 / 1000],
    [1, 'm4', 'in4', 1 / 0.0254 ** 4],
  ])('turns %d %s into %s', (value, from, to, expected) => {
    expect(Math.abs(convert(value, unit(from), unit(to)) - expected)).toBeLessThanOrEqual(4e-16 * expected * 2);
  });

  it('comes back to where it started', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...UNITS),
        fc.nat(),
        fc.double({ min: 1e-6, max: 1e6, noNaN: true }),
        (from, pick, value) => {
          const same = unitsOf(from.dimension);
          const to = same[pick % same.length]!;
          expect(Math.abs(convert(convert(value, from, to), to, from) - value)).toBeLessThanOrEqual(1e-15 * value);
        },
      ),
      { numRuns: 500, seed: 19 },
    );
  });

  it('refuses to mix dimensions', () => {
    expect(() => convert(1, unit('m'), unit('kN'))).toThrow('cannot turn m into kN');
  });
});

describe('findUnit', () => {
  it('reads other spellings', () => {
    expect(unit('Ft.').id).toBe('ft');
    expect(unit('SQ FT').id).toBe('ft2');
    expect(unit("'").id).toBe('ft');
    expect(unit('"').id).toBe('in');
    expect(unit('m²').id).toBe('m2');
    expect(unit('kPa').id).toBe('kN_per_m2');
    expect(findUnit('furlong')).toBeUndefined();
  });
});

describe('UNITS', () => {
  it('have ids and spellings that mean one thing', () => {
    expect(new Set(UNITS.map(({ id }) => id)).size).toBe(UNITS.length);
    for (const one of UNITS)
      for (const spelling of [one.id, one.label, ...(one.also ?? [])]) expect(unit(spelling).id, spelling).toBe(one.id);
  });
});
