import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cosine, exp, ln, sinOfAcute, sine } from '../../../src/engineering/numeric/elementary.js';

// Judge: the language's own functions, which are within one unit in the last place on every engine.
const close = (value: number, judge: number): void => {
  expect(Math.abs(value - judge)).toBeLessThanOrEqual(4.5e-16 * Math.abs(judge));
};

describe('exp', () => {
  it('agrees with Math.exp to two units in the last place', () => {
    fc.assert(
      fc.property(fc.double({ min: -700, max: 709, noNaN: true }), (x) => close(exp(x), Math.exp(x))),
      { numRuns: 20_000, seed: 1 },
    );
  });
  it('is exact at 0 and answers beyond its range', () => {
    expect(exp(0)).toBe(1);
    expect(exp(1000)).toBe(Infinity);
    expect(exp(-1000)).toBe(0);
    expect(exp(NaN)).toBeNaN();
    expect(exp(-744)).toBeGreaterThan(0);
    expect(exp(-745.1)).toBe(Math.exp(-745.1));
  });
});

describe('ln', () => {
  it('agrees with Math.log to two units in the last place', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-300, max: 1e300, noNaN: true }), (x) => close(ln(x), Math.log(x))),
      { numRuns: 20_000, seed: 2 },
    );
    fc.assert(
      fc.property(fc.double({ min: 0.4, max: 2.5, noNaN: true }), (x) => close(ln(x), Math.log(x))),
      { numRuns: 20_000, seed: 3 },
    );
  });
  it('is exact at 1, takes the smallest numbers and answers beyond its range', () => {
    expect(ln(1)).toBe(0);
    close(ln(5e-324), Math.log(5e-324));
    close(ln(1e-310), Math.log(1e-310));
    expect(ln(0)).toBe(-Infinity);
    expect(ln(-1)).toBeNaN();
    expect(ln(Infinity)).toBe(Infinity);
  });
  it('undoes exp', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -50, max: 50, noNaN: true }),
        (x) => Math.abs(ln(exp(x)) - x) <= 1e-15 * (1 + Math.abs(x)),
      ),
      { numRuns: 5_000, seed: 4 },
    );
  });
});

describe('sinOfAcute', () => {
  it('agrees with Math.sin from 0 to a right angle', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: Math.PI / 2, noNaN: true }), (x) => close(sinOfAcute(x), Math.sin(x))),
      { numRuns: 5_000, seed: 5 },
    );
    expect(sinOfAcute(Math.PI / 2)).toBeCloseTo(1, 15);
    expect(() => sinOfAcute(2)).toThrow(RangeError);
  });
});

describe('sine and cosine', () => {
  it('agree with Math.sin and Math.cos', () => {
    fc.assert(
      fc.property(fc.double({ min: -1000, max: 1000, noNaN: true }), (x) => {
        expect(Math.abs(sine(x) - Math.sin(x))).toBeLessThanOrEqual(2.3e-16);
        expect(Math.abs(cosine(x) - Math.cos(x))).toBeLessThanOrEqual(2.3e-16);
      }),
      { numRuns: 20_000, seed: 6 },
    );
  });
  it('are exact at 0 and refuse what they cannot bring near 0', () => {
    expect(sine(0)).toBe(0);
    expect(cosine(0)).toBe(1);
    expect(() => sine(1e7)).toThrow(RangeError);
    expect(() => cosine(NaN)).toThrow(RangeError);
  });
});
