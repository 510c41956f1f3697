import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { siteClassFromVs30, VS30_TABLES } from '../../../src/engineering/site/vs30.js';
import type { VelocityCode } from '../../../src/engineering/site/vs30.js';

const CODES = Object.keys(VS30_TABLES) as VelocityCode[];

describe('siteClassFromVs30', () => {
  // ASCE 7-16 table 20.3-1; ASCE 7-22 table 20.2-1 in ft/s; EN 1998-1 table 3.1 from memory
  it.each([
    ['asce7-16', 1501, 'A'],
    ['asce7-16', 1500, 'B'],
    ['asce7-16', 760, 'C'],
    ['asce7-16', 500, 'C'],
    ['asce7-16', 360, 'D'],
    ['asce7-16', 270, 'D'],
    ['asce7-16', 179, 'E'],
    ['asce7-22', 5001 * 0.3048, 'A'],
    ['asce7-22', 5000 * 0.3048, 'B'],
    ['asce7-22', 3000 * 0.3048, 'BC'],
    ['asce7-22', 2100 * 0.3048, 'C'],
    ['asce7-22', 1450 * 0.3048, 'CD'],
    ['asce7-22', 1000 * 0.3048, 'D'],
    ['asce7-22', 700 * 0.3048, 'DE'],
    ['asce7-22', 500 * 0.3048, 'E'],
    ['asce7-22', 760, 'BC'],
    ['asce7-22', 530, 'C'],
    ['asce7-22', 260, 'D'],
    ['en1998-1-2004', 900, 'A'],
    ['en1998-1-2004', 800, 'B'],
    ['en1998-1-2004', 270, 'C'],
    ['en1998-1-2004', 120, 'D'],
    ['nbc-2020', 800, 'B'],
    ['nbc-2020', 140, 'F'],
    ['tbdy-2018', 400, 'ZC'],
  ] as const)('%s at %d m/s is class %s', (code, vs30_mps, site_class) => {
    expect(siteClassFromVs30(code, vs30_mps)).toBe(site_class);
  });

  it.each(CODES)('gives a class of %s to every velocity, never a softer one to a faster', (code) => {
    const order = VS30_TABLES[code].classes.map(({ site_class }) => site_class);
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 4000, noNaN: true }),
        fc.double({ min: 1, max: 3, noNaN: true }),
        (vs30_mps, ratio) => {
          const [slow, fast] = [siteClassFromVs30(code, vs30_mps), siteClassFromVs30(code, vs30_mps * ratio)];
          expect(order.indexOf(fast)).toBeLessThanOrEqual(order.indexOf(slow));
        },
      ),
      { numRuns: 200, seed: 31 },
    );
  });

  it.each(CODES)('states bounds of %s that fall', (code) => {
    const bounds = VS30_TABLES[code].classes.map(({ above_mps }) => above_mps);
    expect(bounds).toEqual(bounds.toSorted((a, b) => b - a));
    expect(bounds.at(-1)).toBe(0);
  });

  it('refuses a velocity that is none', () => {
    expect(() => siteClassFromVs30('asce7-16', 0)).toThrow(RangeError);
    expect(() => siteClassFromVs30('asce7-16', NaN)).toThrow('above 0 m/s');
  });
});
